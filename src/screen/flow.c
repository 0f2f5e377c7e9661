/* SPDX-License-Identifier: MIT */
/* Small pieces that several screens draw. */
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "screen/parts.h"

/* Bytes of text that fit into `columns` characters, broken at a blank where
 * there is one. */
static size_t line_length(const char *text, int columns)
{
    size_t length = strlen(text);
    size_t at = 0;
    size_t blank = 0;
    for (int c = 0; at < length; c++) {
        if (c == columns)
            return blank > 0 ? blank : at;
        if (text[at] == ' ')
            blank = at;
        uint32_t code;
        at += utf8_decode(text + at, length - at, &code);
    }
    return length;
}

void flow_text(struct flow *flow, enum role role, int indent, const char *text)
{
    int columns = flow->area.columns - indent;
    if (columns < 8) {
        indent = 0;
        columns = flow->area.columns > 0 ? flow->area.columns : 1;
    }
    do {
        char line[1024];
        struct text t = text_over(line, sizeof line);
        size_t n = line_length(text, columns);
        int row = flow->used - flow->skip;
        text_add_bytes(&t, text, n);
        if (row >= 0 && row < flow->area.rows)
            canvas_text(flow->canvas, flow->area.row + row,
                        flow->area.column + indent, columns, role, line);
        flow->used++;
        text += n;
        text += strspn(text, " ");
    } while (*text);
}

void flow_blank(struct flow *flow)
{
    flow->used++;
}

const char *number_fit(double value, int places, int width,
                       char out[NUMBER_TEXT_MAX])
{
    for (; places >= 0; places--)
        if ((int)strlen(number_print_places(value, places, out)) <= width)
            return out;
    out[0] = '\0';
    return out;
}

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
