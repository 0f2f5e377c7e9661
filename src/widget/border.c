/* SPDX-License-Identifier: MIT */
#include "widget/border.h"

void border_draw(struct canvas *canvas, struct area a, const char *title)
{
    int right = a.column + a.columns - 1;
    int bottom = a.row + a.rows - 1;
    canvas_fill(canvas, a.row, a.column, a.rows, a.columns, ROLE_TEXT, ' ');
    canvas_fill(canvas, a.row, a.column, 1, a.columns, ROLE_QUIET, 0x2500);
    canvas_fill(canvas, bottom, a.column, 1, a.columns, ROLE_QUIET, 0x2500);
    canvas_fill(canvas, a.row, a.column, a.rows, 1, ROLE_QUIET, 0x2502);
    canvas_fill(canvas, a.row, right, a.rows, 1, ROLE_QUIET, 0x2502);
    canvas_put(canvas, a.row, a.column, ROLE_QUIET, 0x250C);
    canvas_put(canvas, a.row, right, ROLE_QUIET, 0x2510);
    canvas_put(canvas, bottom, a.column, ROLE_QUIET, 0x2514);
    canvas_put(canvas, bottom, right, ROLE_QUIET, 0x2518);
    canvas_textf(canvas, a.row, a.column + 2, a.columns - 4, ROLE_HEADING,
                 " %s ", title);
}
