/* SPDX-License-Identifier: MIT */
#ifndef WIDGET_BORDER_H
#define WIDGET_BORDER_H

#include "canvas/area.h"
#include "canvas/canvas.h"

/* Blanks an area (3 rows and 6 columns at least) and draws a border with a
 * title. */
void border_draw(struct canvas *canvas, struct area area, const char *title);

#endif
