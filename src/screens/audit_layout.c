/* SPDX-License-Identifier: MIT */
#include "screens/audit_layout.h"

#define AUDIT_LABEL_COLUMNS 15

struct audit_layout screen_audit_layout(int rows, int columns, int models)
{
    struct audit_layout l = {.cell_columns = columns >= 118 ? 13 : 8};
    int words = columns >= 110 ? 3 : 4;
    int height = rows - 3 - words; /* title, message, keys */
    int table = AUDIT_LABEL_COLUMNS + models * l.cell_columns;
    int right = columns - table - 2;
    l.words = (struct area){rows - 2 - words, 0, words, columns};
    l.table = (struct area){1, 0, height, table < columns ? table : columns};
    if (right < 22)
        return l;
    int scatter = height * 3 / 5;
    if (scatter > right * 2 / 3 && height - right * 2 / 3 > 6)
        scatter = right * 2 / 3;
    l.scatter = (struct area){1, table + 2, scatter, right};
    l.points = (struct area){1 + scatter, table + 2, height - scatter, right};
    return l;
}
