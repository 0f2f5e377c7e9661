/* SPDX-License-Identifier: MIT */
/* The event loop: one thread, no ticks while nothing is pending. */
#ifndef CLI_LOOP_H
#define CLI_LOOP_H

#include <stdbool.h>

#include "base/status.h"
#include "canvas/canvas.h"
#include "canvas/event.h"
#include "terminal/terminal.h"

enum loop_effect {
    LOOP_NOTHING, /* the canvas would stay the same */
    LOOP_REDRAW,  /* draw again when all input is read */
    LOOP_REPAINT, /* the same, and write every cell */
    LOOP_QUIT
};

/* What the loop serves. state is passed to every call. */
struct loop_client {
    void *state;

    /* One event; effects other than the screen's are carried out inside. The
     * first event of a loop is EVENT_RESIZE with the size. EVENT_TICK comes
     * at most twice a second while there is work, and once when the last of it
     * is done. EVENT_INTERRUPT comes before the keys that wait. */
    enum loop_effect (*update)(void *state, const struct event *event);

    /* Draws everything on an erased canvas of the terminal's size. */
    void (*draw)(void *state, struct canvas *canvas);

    /* One small piece of the pending work; the longest one is the longest wait
     * of a key. Both may be NULL when there is never any. */
    bool (*has_work)(void *state);
    void (*step)(void *state);

    /* A redraw waits so long for pending work, unless a key waits: short work
     * then shows its result in the same screen, without a flicker. 0: never.
     */
    int grace_ms;
};

/* Runs until update says quit, the terminal has gone, or a signal ends it.
 * *signal is 0, or the signal that the program should end by: after
 * terminal_close call terminal_die(*signal). An interrupt that update answers
 * with LOOP_QUIT gives SIGINT. Fails with STATUS_MEMORY. */
MUST_CHECK bool loop_run(struct terminal *terminal,
                         const struct loop_client *client, int *signal,
                         struct status *st);

#endif
