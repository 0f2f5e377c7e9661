/* SPDX-License-Identifier: MIT */
/* A line being typed. */
#ifndef WIDGET_FIELD_H
#define WIDGET_FIELD_H

#include "canvas/canvas.h"
#include "canvas/event.h"

#define FIELD_TEXT_MAX 256

/* text: valid UTF-8, `length` bytes. Starts as {0}. */
struct field {
    char text[FIELD_TEXT_MAX];
    int length;
};

/* Puts a text in place of what was typed; what does not fit is cut off. */
void field_set(struct field *field, const char *text);

/* Adds a character; control characters and what does not fit are passed
 * over. */
void field_type(struct field *field, uint32_t character);

/* Takes a character, a paste or a key that edits; false when the event is
 * another. */
bool field_edit(struct field *field, const struct event *event);

/* The end of a text, at most `columns` characters of it. */
const char *field_tail(const char *text, int columns);

/* Draws the label, at most half the row of it, and the end of the text with
 * the cursor behind it; gives the column behind the text. */
int field_draw(const struct field *field, struct canvas *canvas, int row,
               const char *label);

#endif
