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

void draw_message(const struct ui *ui, struct canvas *canvas, int row)
{
    if (ui->prompt.kind != PROMPT_NONE) {
        prompt_draw(ui, canvas, row);
        return;
    }
    struct study_progress p = study_progress(ui->study);
    if (ui->message[0] != '\0')
        canvas_text(canvas, row, 0, canvas->columns,
                    ui->caution ? ROLE_CAUTION : ROLE_TEXT, ui->message);
    else if (p.total > 0)
        canvas_textf(canvas, row, 0, canvas->columns, ROLE_TEXT,
                     "solving %d of %d; interrupt (Ctrl-C) stops", p.done,
                     p.total);
}
