/* SPDX-License-Identifier: MIT */
/* How the colours of src/terminal/palette.c were found. The program that
 * prints them (find_palette) and the test that compares them share this. */
#ifndef TESTS_TERMINAL_SEARCH_H
#define TESTS_TERMINAL_SEARCH_H

#include <stdint.h>

#include "canvas/role.h"
#include "support/oklab.h"

/* 0xRRGGBB of an index 16 … 255, by a formula of its own. */
uint32_t fixed_rgb(int index);

/* The scales by rule, in full colour.
 * Sequential: lightness rises evenly, the hue turns evenly from plum through
 * blue to green, the chroma is a fixed share of what sRGB holds, capped.
 * Diverging: lightness falls evenly from the neutral middle to either side,
 * chroma rises evenly, blue below and orange above. */
struct oklab ramp_target(int step);
struct oklab balance_target(int step);

/* The same among the indexes 16 … 255: the choice with the smallest sum of
 * squared distances from the targets among all that keep the rules (lightness
 * strictly monotone by a least step for every vision; the two sides of the
 * diverging scale equally light). Exact, by dynamic programming. */
void search_ramp(int index[RAMP_STEPS]);
void search_balance(int index[BALANCE_STEPS]);

/* The index nearest to a lightness, chroma and hue that has at least this
 * contrast against each background; -1 when there is none. */
int search_accent(double L, double chroma, double hue, double least,
                  const uint32_t *backgrounds, int count);

/* Five colours for curves, each near a hue of its own and with at least this
 * contrast (at most `most` with the first background: no near-blacks), the
 * smallest distance between any two for any vision as large as it can be. */
#define CURVES 5
void search_curves(double least, double most, const uint32_t *backgrounds,
                   int count, int index[CURVES]);

#endif
