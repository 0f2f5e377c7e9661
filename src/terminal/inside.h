/* SPDX-License-Identifier: MIT */
/* What the files of this folder share; nobody else includes it. */
#ifndef TERMINAL_INSIDE_H
#define TERMINAL_INSIDE_H

#include <curses.h>
#include <stdbool.h>
#include <stdio.h>
#include <sys/types.h>
#include <termios.h>

#include "canvas/canvas.h"
#include "canvas/event.h"
#include "terminal/guard.h"
#include "terminal/palette.h"
#include "terminal/sequence.h"
#include "terminal/terminal.h"

#define SEQUENCE_TEXT_MAX 64

/* Capabilities of the terminal as bytes, delays taken out; empty: none. */
struct capability {
    char bytes[SEQUENCE_TEXT_MAX];
    size_t length;
};

struct terminal {
    SCREEN *screen;
    FILE *input, *output;
    int input_fd, output_fd;
    FILE *stream;         /* what curses writes to: a duplicate of output */
    int stage_fd;         /* where it writes while a frame is made; -1: none */
    off_t stage_room;     /* bytes set aside for a frame */
    struct termios modes; /* as found */
    bool has_modes;
    bool ascii;
    bool has_default; /* can give text the terminal's own colours */
    enum color_tier tier;
    enum scheme scheme;
    bool mouse;
    struct capability paste_on, paste_off;
    int pair[ROLE_COUNT];
    int turned[ROLE_COUNT]; /* the pair with its colours exchanged; -1: none */
    attr_t style[ROLE_COUNT];

    /* painting */
    struct canvas shown; /* what is on the screen */
    bool everything;     /* paint all of it */
    int cursor;          /* as curs_set has it; -1: not known */

    /* reading */
    char partial[8]; /* the bytes of a character that is not yet whole */
    size_t partial_length;
    bool short_mouse; /* reports are three bytes, not numbers */
    enum sequence_state sequence;
    long long sequence_ms; /* when its last character came */
    bool pasting;
    long long paste_ms;
    bool resized;
    int failures; /* times that it was readable and held nothing */
};

/* Milliseconds of the monotonic clock. */
long long terminal_clock(void);

#define NO_SCREEN_HINT                                                         \
    "; the commands (list, compare, ...) print the same facts without a "      \
    "screen"

/* capability.c: whether TERM is described and can place the cursor; fails with
 * STATUS_TERMINAL and writes nothing. */
MUST_CHECK bool capability_check(int fd, struct status *st);

/* A string capability as bytes; empty when there is none. */
struct capability capability_get(const char *name);

/* What leaves the screen after a crash. */
struct guard_rescue capability_rescue(const struct terminal *t);

/* True when colours are given as red, green, blue. */
bool capability_direct(void);

/* frame.c: between the two calls everything that curses writes is kept, and
 * then sent at once: curses writes a piece at every move of the cursor, which
 * shows half-painted screens and wakes the other end each time. Without a
 * stage they do nothing. */
void frame_open(struct terminal *t);
void frame_close(struct terminal *t);
void frame_begin(struct terminal *t);
void frame_end(struct terminal *t);

/* Writes everything, or until the terminal has gone. */
void terminal_send(const struct terminal *t, const char *bytes, size_t length);

/* keys.c: tells curses the sequences that descriptions often leave out. */
void keys_define(const struct terminal *t);

/* colors.c: tier by capability; pairs and attributes of all roles. */
enum color_tier colors_capability(void);
void colors_assign(struct terminal *t);

#endif
