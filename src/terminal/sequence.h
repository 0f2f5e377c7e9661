/* SPDX-License-Identifier: MIT */
/* Swallows control sequences that the terminal's description does not know:
 * without it they would arrive as Escape, a bracket and letters, and the
 * letters would run commands. */
#ifndef TERMINAL_SEQUENCE_H
#define TERMINAL_SEQUENCE_H

#include <stdbool.h>
#include <stdint.h>

enum sequence_state {
    SEQUENCE_NONE,
    SEQUENCE_ESCAPE,  /* an Escape has been read */
    SEQUENCE_CONTROL, /* ESC [ : parameters until a final byte */
    SEQUENCE_CONSOLE, /* ESC [ [ : one more byte */
    SEQUENCE_SINGLE,  /* ESC O : digits, then one byte */
    SEQUENCE_STRING,  /* ESC ] P X ^ _ : until ST or BEL */
    SEQUENCE_STRING_ESCAPE,
    SEQUENCE_BEGUN,   /* ESC [ : nothing behind it yet */
    SEQUENCE_MOUSE_3, /* ESC [ M : a mouse report, three more bytes */
    SEQUENCE_MOUSE_2,
    SEQUENCE_MOUSE_1
};

/* Takes one character of a sequence that has begun (*state is not
 * SEQUENCE_NONE) and moves on; *state is SEQUENCE_NONE after the last one.
 * Grammar: ECMA-48, 5th edition, sections 5.4 and 5.6. An Escape and one other
 * character are a key pressed with Alt: taken whole. */
void sequence_feed(enum sequence_state *state, uint32_t character);

#endif
