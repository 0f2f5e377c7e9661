/* SPDX-License-Identifier: MIT */
/* What is drawn: rows and columns of one character and one role. No terminal
 * is needed to draw or to test it. */
#ifndef CANVAS_CANVAS_H
#define CANVAS_CANVAS_H

#include <stdbool.h>
#include <stdint.h>

#include "base/status.h"
#include "canvas/glyph.h"
#include "canvas/role.h"

#define CANVAS_ROWS_MAX 1000
#define CANVAS_COLUMNS_MAX 1000

/* character: a Unicode code point one column wide; reverse: shown with
 * foreground and background exchanged (the selection on a coloured cell). */
struct cell {
    uint32_t character;
    uint8_t role;
    bool reverse;
};

struct canvas {
    int rows, columns;
    struct cell *cells;            /* cells[rows * columns], row by row */
    int cursor_row, cursor_column; /* where the hardware cursor is left */
    bool cursor_visible;
    bool ascii; /* glyphs outside ASCII are replaced by their twins */
};

/* A canvas of this size, all blank; sizes are clamped to 0…MAX. Fails with
 * STATUS_MEMORY. canvas_clear frees it. */
MUST_CHECK bool canvas_init(struct canvas *canvas, int rows, int columns,
                            struct status *st);
/* Gives the canvas another size and blanks it; on failure (STATUS_MEMORY) it
 * stays as it was. The ascii choice is kept. */
MUST_CHECK bool canvas_resize(struct canvas *canvas, int rows, int columns,
                              struct status *st);
void canvas_clear(struct canvas *canvas);

/* Blanks everything (spaces in ROLE_TEXT, cursor at 0, 0, invisible). */
void canvas_erase(struct canvas *canvas);

/* The drawing calls clip at the edges; outside places are ignored. */

/* One character. With canvas.ascii its ASCII twin is put instead; a character
 * that is not one column wide becomes a replacement mark. */
void canvas_put(struct canvas *canvas, int row, int column, enum role role,
                uint32_t character);

/* UTF-8 text in at most `width` columns; a text that is longer ends in a mark
 * that something was cut. Control characters become visible marks, invalid
 * bytes and characters not one column wide a replacement mark. Gives the
 * column behind the text. */
int canvas_text(struct canvas *canvas, int row, int column, int width,
                enum role role, const char *text);
int canvas_textf(struct canvas *canvas, int row, int column, int width,
                 enum role role, const char *format, ...) PRINTF_LIKE(6, 7);

/* The same, ending at column + width - 1. */
void canvas_right(struct canvas *canvas, int row, int column, int width,
                  enum role role, const char *text);

/* Fills a rectangle with one character. */
void canvas_fill(struct canvas *canvas, int row, int column, int rows,
                 int columns, enum role role, uint32_t character);

/* Gives a rectangle another role, or turns it to reverse, keeping what is
 * written there. */
void canvas_paint(struct canvas *canvas, int row, int column, int rows,
                  int columns, enum role role);
void canvas_reverse(struct canvas *canvas, int row, int column, int rows,
                    int columns);

/* Writes the canvas as two text grids separated by a line of '=': characters in
 * UTF-8, then the letters of the roles, '@' where reverse. Trailing blanks are
 * cut, every row ends in a newline. The caller frees the result; NULL when
 * memory is short. */
char *canvas_to_text(const struct canvas *canvas);

#endif
