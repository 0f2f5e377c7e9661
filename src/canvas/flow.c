/* SPDX-License-Identifier: MIT */
#include "canvas/flow.h"

#include <string.h>

#include "base/text.h"

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
