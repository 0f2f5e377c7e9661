/* SPDX-License-Identifier: MIT */
/* Characters that may stand on a canvas. */
#ifndef CANVAS_GLYPH_H
#define CANVAS_GLYPH_H

#include <stdbool.h>
#include <stdint.h>

/* True for a printable character that fills exactly one column; only those
 * are put on a canvas. */
bool glyph_is_single(uint32_t character);

/* The ASCII twin of a character of our screens: itself when it is ASCII, '?'
 * when it has none. One column for one column, so that a screen keeps its
 * layout. */
uint32_t glyph_ascii(uint32_t character);

#endif
