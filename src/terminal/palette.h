/* SPDX-License-Identifier: MIT */
/* Role x scheme x tier -> colours and attributes, as plain values: no curses
 * here, so a test can look at every one of them. */
#ifndef TERMINAL_PALETTE_H
#define TERMINAL_PALETTE_H

#include <stdbool.h>
#include <stdint.h>

#include "canvas/role.h"

/* What the terminal can do, poorest first. */
enum color_tier {
    TIER_MONO,
    TIER_8,     /* the user's theme: five classes per scale at most */
    TIER_16,    /* the same, with bright white for text */
    TIER_256,   /* indexes 16-255, which no theme changes */
    TIER_DIRECT /* red, green, blue of 8 bits each */
};

/* What the user asks for. */
enum color_option { COLOR_AUTO, COLOR_ALWAYS, COLOR_NEVER };

/* SCHEME_TERMINAL leaves the terminal's own foreground and background in
 * place and colours only what bears a meaning, in colours that are readable
 * on black and on white; the other three set every colour. */
enum scheme { SCHEME_TERMINAL, SCHEME_LIGHT, SCHEME_DARK, SCHEME_CONTRAST };
#define SCHEME_COUNT 4

enum { PAINT_BOLD = 1, PAINT_UNDERLINE = 2, PAINT_REVERSE = 4 };

/* A colour: an index (TIER_8 … TIER_256), 0xRRGGBB (TIER_DIRECT), or the
 * terminal's own. */
#define PAINT_DEFAULT (-1)

struct paint {
    int foreground, background;
    unsigned style; /* PAINT_BOLD | … */
};

/* How a role looks. */
struct paint palette_paint(enum role role, enum scheme scheme,
                           enum color_tier tier);

/* Classes that a scale can be told apart in by colour: RAMP_STEPS with 256
 * colours and more, 5 with 16 and 8, 1 in monochrome. */
int palette_classes(enum color_tier tier);

/* The class, 0 … palette_classes - 1, of a step 0 … RAMP_STEPS - 1 of either
 * scale; the middle step of the diverging scale has the middle class to
 * itself. */
int palette_class(int step, enum color_tier tier);

/* 0xRRGGBB of an index 16 … 255 of the fixed part of the 256 colours: the
 * 6 x 6 x 6 cube of levels 0, 95, 135, 175, 215, 255, then 24 greys from 8 by
 * tens (common practice, no source). */
uint32_t palette_rgb(int index);

/* The tier to use. option: the command line's choice or, without one, the
 * settings file's; no_color: the value of NO_COLOR, NULL when unset (an empty
 * one counts as unset); tier: what the terminal can do. NO_COLOR gives way to
 * COLOR_ALWAYS; nothing makes colours that the terminal does not have. */
enum color_tier terminal_color_choice(enum color_option option,
                                      const char *no_color,
                                      enum color_tier tier);

#endif
