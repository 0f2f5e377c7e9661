/* SPDX-License-Identifier: MIT */
#include "widget/message.h"

#include "base/text.h"
#include "canvas/flow.h"

static void draw_long(struct canvas *canvas, int row, enum role role,
                      const char *text)
{
    struct flow count = {canvas, {row, 0, 0, canvas->columns}, 0, 0};
    flow_text(&count, role, 0, text);
    int rows = count.used < row ? count.used : row;
    struct area area = {row - rows + 1, 0, rows, canvas->columns};
    struct flow flow = {canvas, area, 0, 0};
    canvas_fill(canvas, area.row, 0, rows, canvas->columns, ROLE_TEXT, ' ');
    flow_text(&flow, role, 0, text);
}

void message_draw(struct canvas *canvas, int row, enum role role,
                  const char *text)
{
    if ((int)utf8_length(text) > canvas->columns)
        draw_long(canvas, row, role, text);
    else
        canvas_text(canvas, row, 0, canvas->columns, role, text);
}
