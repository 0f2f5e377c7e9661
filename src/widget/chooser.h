/* SPDX-License-Identifier: MIT */
/* A list to choose one entry from, laid over the screen. */
#ifndef WIDGET_CHOOSER_H
#define WIDGET_CHOOSER_H

#include "canvas/canvas.h"
#include "canvas/event.h"

#define CHOOSER_MAX 64
#define CHOOSER_LABEL_MAX 80

/* values: what an entry stands for, as its owner likes; at: the entry under
 * the cursor. Starts as {0}. */
struct chooser {
    int count, at;
    char labels[CHOOSER_MAX][CHOOSER_LABEL_MAX];
    int values[CHOOSER_MAX];
};

/* Adds an entry; the cursor goes to it when it is the current one. A list that
 * is full stays as it is. */
void chooser_add(struct chooser *chooser, int value, bool current,
                 const char *format, ...) PRINTF_LIKE(4, 5);

enum chooser_answer {
    CHOOSER_NOTHING, /* the event is none of the list's */
    CHOOSER_MOVED,
    CHOOSER_LEFT,
    CHOOSER_TAKEN /* values[at] is chosen */
};
enum chooser_answer chooser_update(struct chooser *chooser,
                                   const struct event *event);

void chooser_draw(const struct chooser *chooser, struct canvas *canvas,
                  const char *title);

#endif
