/* SPDX-License-Identifier: MIT */
/* The line of messages: what is typed, what happened, what is being solved. */
#include "screens/parts.h"

/* A message longer than its row goes upwards over what stands there. */
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

void draw_message(const struct ui *ui, struct canvas *canvas, int row)
{
    if (ui->prompt.kind != PROMPT_NONE) {
        prompt_draw(ui, canvas, row);
        return;
    }
    struct study_progress p = study_progress(ui->study);
    if (ui->awaiting) {
        canvas_textf(canvas, row, 0, canvas->columns, ROLE_TEXT,
                     "solving %d of %d for %s; any key gives it up", p.done,
                     p.total, ui->path);
        return;
    }
    enum role role = ui->caution ? ROLE_CAUTION : ROLE_TEXT;
    if ((int)utf8_length(ui->message) > canvas->columns)
        draw_long(canvas, row, role, ui->message);
    else if (ui->message[0] != '\0')
        canvas_text(canvas, row, 0, canvas->columns, role, ui->message);
    else if (p.total > 0)
        canvas_textf(canvas, row, 0, canvas->columns, ROLE_TEXT,
                     "solving %d of %d; interrupt (Ctrl-C) stops", p.done,
                     p.total);
}
