/* SPDX-License-Identifier: MIT */
#include "screens/atom_layout.h"

#include "session/screen.h"

#define TABLE_COLUMNS 34
#define TABLE_COLUMNS_WIDE 64
#define CURSOR_ROWS 4
#define CHARGE_ROWS_MIN 14 /* below it a second plot shows too little */
#define LEVELS_ROWS_MIN 4

static struct atom_layout layout_single(int rows, int columns)
{
    /* Numbers and plot where both fit, else one of them. */
    int free = rows - 4;
    int cursor = free >= 12 ? CURSOR_ROWS : free < 5 ? free : 0;
    struct area all = {2, 0, free, columns};
    return (struct atom_layout){
        .form = FORM_SINGLE,
        .wide = columns >= TABLE_COLUMNS_WIDE,
        .table = all,
        .cursor = {2, 0, cursor, columns},
        .plot = {2 + cursor, 0, free - cursor, columns},
    };
}

struct atom_layout screen_atom_layout(int rows, int columns, int shells)
{
    if (rows < NEEDED_ROWS || columns < NEEDED_COLUMNS)
        return (struct atom_layout){.form = FORM_SENTENCE};
    if (rows < 20 || columns < 60)
        return layout_single(rows, columns);
    struct atom_layout l = {.form = FORM_WHOLE, .wide = columns >= 110};
    int left = l.wide ? TABLE_COLUMNS_WIDE : TABLE_COLUMNS;
    int height = rows - 4;
    int used = shells + 3; /* two headings and all electrons */
    l.table = (struct area){2, 0, used < height ? used : height, left};
    if (height - used - 1 >= LEVELS_ROWS_MIN)
        l.levels = (struct area){2 + used + 1, 0, height - used - 1, left};
    int column = left + 2;
    int right = columns - column;
    l.cursor = (struct area){2, column, CURSOR_ROWS, right};
    int top = 2 + CURSOR_ROWS;
    int free = height - CURSOR_ROWS;
    int charge = free * 2 / 5 >= CHARGE_ROWS_MIN ? free * 2 / 5 : 0;
    l.plot = (struct area){top, column, free - charge, right};
    l.charge = (struct area){top + free - charge, column, charge, right};
    return l;
}
