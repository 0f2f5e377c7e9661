/* SPDX-License-Identifier: MIT */
/* Text that flows down an area, wrapped at blanks. */
#ifndef CANVAS_FLOW_H
#define CANVAS_FLOW_H

#include "canvas/area.h"
#include "canvas/canvas.h"

/* Rows above `skip` are passed over, `used` counts all. */
struct flow {
    struct canvas *canvas;
    struct area area;
    int skip;
    int used;
};

/* UTF-8 text in one role, every row of it `indent` columns to the right; where
 * fewer than 8 columns would be left it is not indented. */
void flow_text(struct flow *flow, enum role role, int indent, const char *text);

/* An empty row. */
void flow_blank(struct flow *flow);

#endif
