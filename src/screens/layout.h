/* SPDX-License-Identifier: MIT */
/* Where everything stands for a size of the terminal: one pure function. */
#ifndef SCREENS_LAYOUT_H
#define SCREENS_LAYOUT_H

#include <stdbool.h>

#include "canvas/area.h"
#include "element/element.h"

#define NEEDED_ROWS 6 /* below this only a sentence fits */
#define NEEDED_COLUMNS 24

enum map_form {
    FORM_SENTENCE, /* too small for anything but saying so */
    FORM_LIST,     /* elements below each other */
    FORM_SINGLE,   /* grid or pane, one at a time */
    FORM_WHOLE     /* grid, scale, pane, keys together */
};

/* rows 0 is the title, the last two are message and keys (in FORM_LIST and
 * FORM_SINGLE the last row is both). Areas with no rows are absent. side:
 * facts of the element, right of the grid; where it is absent they stand in
 * the gap of the grid above the d block. */
/* The trend in an area: plots one above the other, the numbers of the selected
 * step as a full table beside or below them, or below in few rows. Without
 * rows a part is absent. */
struct trend_layout {
    struct area values, residuals, table;
    bool full;
};

struct trend_layout layout_trend(struct area area);

/* Audit: the table of figures, the scatter, its species, a few rows of words.
 */
struct audit_layout {
    struct area table, scatter, points, words;
    int cell_columns;
};
struct audit_layout layout_audit(int rows, int columns, int models);

struct map_layout {
    enum map_form form;
    enum grid_width width;
    int cell_columns, cell_rows;
    struct area grid; /* with its headings: one row above, three columns left */
    struct area scale;
    struct area pane;
    struct area side;
    struct area trend; /* below the facts, where the side is large */
    int message_row, key_row;
};

struct map_layout layout_map(int rows, int columns, enum grid_width wanted);

/* Top left of an element's cell. */
struct area layout_cell(const struct map_layout *layout, int z,
                        enum grid_group3 group3);

/* The screen Atom: a table of subshells, numbers at the cursor, plots. In
 * FORM_SINGLE table and plots have the same area, one is shown at a time.
 * levels: energies and levels below the table; charge: the second plot. Areas
 * with no rows are absent. Row 0 is the title, row 1 the state, the last two
 * are message and keys. */
struct atom_layout {
    enum map_form form;
    bool wide; /* the table has all its columns */
    struct area table, levels, cursor, plot, charge;
};

/* shells: subshells of the atom. */
struct atom_layout layout_atom(int rows, int columns, int shells);

#endif
