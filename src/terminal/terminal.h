/* SPDX-License-Identifier: MIT */
/* The terminal: open it, read events, paint a canvas, leave it as found. The
 * only folder that knows curses. One terminal at a time. While it is open
 * nothing may be printed on standard output or standard error. */
#ifndef TERMINAL_TERMINAL_H
#define TERMINAL_TERMINAL_H

#include <stdbool.h>
#include <stdio.h>

#include "base/status.h"
#include "canvas/canvas.h"
#include "canvas/event.h"
#include "terminal/palette.h"

struct terminal_options {
    enum color_option color;
    enum scheme scheme;
    bool ascii; /* ASCII glyphs even where the locale has more */
    bool mouse; /* take clicks and the wheel from the start */
    /* For tests: streams to use instead of standard input and output, which
     * then need not be a terminal. */
    FILE *input, *output;
};

struct terminal;

/* Opens the screen: takes LC_CTYPE from the environment (C.UTF-8 when a UTF-8
 * locale is asked for that is not installed), removes LINES and COLUMNS from
 * the environment, enters the full screen and installs the signal handlers.
 * Fails with STATUS_TERMINAL, before anything is written, when standard input
 * or output is no terminal or TERM is missing, unknown or cannot place the
 * cursor; with STATUS_MEMORY. */
MUST_CHECK bool terminal_open(struct terminal **terminal,
                              const struct terminal_options *options,
                              struct status *st);

/* Leaves the terminal as terminal_open found it, on every path; NULL is fine.
 */
void terminal_close(struct terminal *terminal);

/* Rows and columns now. */
void terminal_size(const struct terminal *terminal, int *rows, int *columns);

/* True when only ASCII should be drawn: set canvas.ascii to it. */
bool terminal_ascii(const struct terminal *terminal);

enum color_tier terminal_tier(const struct terminal *terminal);

/* Takes clicks and the wheel, or leaves them to the terminal's own
 * select-and-copy. */
void terminal_mouse(struct terminal *terminal, bool on);

/* Another scheme; takes effect with the next paint. */
void terminal_scheme(struct terminal *terminal, enum scheme scheme);

/* What ended a wait. */
struct terminal_news {
    bool input;     /* terminal_read has something, perhaps */
    bool interrupt; /* the interrupt key */
    bool stop;      /* the suspend key: call terminal_suspend */
    bool resumed;   /* after a stop that nobody asked us about: call
                       terminal_resume */
    bool hangup;    /* the terminal is gone */
    int death;      /* SIGTERM, SIGHUP or SIGQUIT: close, terminal_die */
};

/* Waits for input or a signal, at most timeout_ms (-1: for ever, 0: only
 * looks). */
struct terminal_news terminal_wait(struct terminal *terminal, int timeout_ms);

/* True when input or a signal waits already. */
bool terminal_waiting(const struct terminal *terminal);

/* The next event without waiting (a lone Escape takes the escape delay); false
 * when all are read. However many size changes arrive, they are one
 * EVENT_RESIZE, behind the keys. What the terminal sends that no key is known
 * for gives no event. */
bool terminal_read(struct terminal *terminal, struct event *event);

/* Shows a canvas: writes only what changed since the last one, and leaves the
 * hardware cursor at the canvas's cursor even when it is invisible. */
void terminal_paint(struct terminal *terminal, const struct canvas *canvas);

/* Makes the next paint write everything. */
void terminal_repaint(struct terminal *terminal);

/* Leaves the screen, stops the process, and enters the screen again when it
 * goes on; a size that changed meanwhile comes as EVENT_RESIZE. Paint next. */
void terminal_suspend(struct terminal *terminal);

/* Enters the screen again after a stop that could not be caught. Paint next.
 */
void terminal_resume(struct terminal *terminal);

/* After terminal_close: ends the process by this signal, so that the parent
 * sees the true one. */
void terminal_die(int signal);

#endif
