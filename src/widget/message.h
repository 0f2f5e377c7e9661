/* SPDX-License-Identifier: MIT */
#ifndef WIDGET_MESSAGE_H
#define WIDGET_MESSAGE_H

#include "canvas/canvas.h"

/* Draws a message on a row; one that is longer goes upwards over what stands
 * there. */
void message_draw(struct canvas *canvas, int row, enum role role,
                  const char *text);

#endif
