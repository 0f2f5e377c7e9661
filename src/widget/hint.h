/* SPDX-License-Identifier: MIT */
/* A row of keys with what they do. */
#ifndef WIDGET_HINT_H
#define WIDGET_HINT_H

#include "canvas/canvas.h"

/* Draws a key and its label at a column where both fit; gives the column of
 * the next one, or the same column when they do not fit. */
int hint_draw(struct canvas *canvas, int row, int column, const char *key,
              const char *label);

#endif
