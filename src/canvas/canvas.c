/* SPDX-License-Identifier: MIT */
#include "canvas/canvas.h"

#include <assert.h>
#include <limits.h>
#include <stdarg.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"

#define CUT_MARK UINT32_C(0x2026)
#define CUT_MARK_ASCII ((uint32_t)'>')
#define CONTROL_PICTURES UINT32_C(0x2400)
#define TEXTF_MAX (4 * CANVAS_COLUMNS_MAX + 1)

static int clamp(int value, int low, int high)
{
    return value < low ? low : value > high ? high : value;
}

bool canvas_init(struct canvas *canvas, int rows, int columns,
                 struct status *st)
{
    *canvas = (struct canvas){0};
    return canvas_resize(canvas, rows, columns, st);
}

bool canvas_resize(struct canvas *canvas, int rows, int columns,
                   struct status *st)
{
    rows = clamp(rows, 0, CANVAS_ROWS_MAX);
    columns = clamp(columns, 0, CANVAS_COLUMNS_MAX);
    size_t count = (size_t)rows * (size_t)columns;
    /* one more, so that an empty canvas is not a NULL of unclear meaning */
    struct cell *cells = calloc(count + 1, sizeof *cells);
    if (cells == NULL)
        return status_fail(st, STATUS_MEMORY, "out of memory for %d x %d cells",
                           rows, columns);
    free(canvas->cells);
    canvas->cells = cells;
    canvas->rows = rows;
    canvas->columns = columns;
    canvas_erase(canvas);
    return true;
}

void canvas_clear(struct canvas *canvas)
{
    free(canvas->cells);
    *canvas = (struct canvas){0};
}

void canvas_erase(struct canvas *canvas)
{
    size_t count = (size_t)canvas->rows * (size_t)canvas->columns;
    for (size_t i = 0; i < count; i++)
        canvas->cells[i] = (struct cell){' ', ROLE_TEXT, false};
    canvas->cursor_row = 0;
    canvas->cursor_column = 0;
    canvas->cursor_visible = false;
}

static struct cell *cell_at(struct canvas *canvas, int row, int column)
{
    if (row < 0 || row >= canvas->rows || column < 0 ||
        column >= canvas->columns)
        return NULL;
    return &canvas
                ->cells[(size_t)row * (size_t)canvas->columns + (size_t)column];
}

/* What is put for a character that may come from a file. */
static uint32_t shown(const struct canvas *canvas, uint32_t character)
{
    if (character < 0x20)
        character += CONTROL_PICTURES;
    else if (character == 0x7F)
        character = CONTROL_PICTURES + 0x21;
    else if (!glyph_is_single(character))
        character = UTF8_REPLACEMENT;
    return canvas->ascii ? glyph_ascii(character) : character;
}

void canvas_put(struct canvas *canvas, int row, int column, enum role role,
                uint32_t character)
{
    assert((int)role >= 0 && role < ROLE_COUNT);
    struct cell *cell = cell_at(canvas, row, column);
    if (cell != NULL)
        *cell = (struct cell){shown(canvas, character), (uint8_t)role, false};
}

int canvas_text(struct canvas *canvas, int row, int column, int width,
                enum role role, const char *text)
{
    size_t left = strlen(text);
    int used = 0;
    while (left > 0 && used < width) {
        uint32_t character;
        size_t bytes = utf8_decode(text, left, &character);
        bool last_place = used == width - 1;
        if (last_place && left > bytes)
            character = canvas->ascii ? CUT_MARK_ASCII : CUT_MARK;
        if (column <= INT_MAX - used)
            canvas_put(canvas, row, column + used, role, character);
        used++;
        text += bytes;
        left -= bytes;
    }
    return column <= INT_MAX - used ? column + used : INT_MAX;
}

int canvas_textf(struct canvas *canvas, int row, int column, int width,
                 enum role role, const char *format, ...)
{
    char text[TEXTF_MAX];
    va_list arguments;
    va_start(arguments, format);
    /* Longer than the widest canvas is cut there anyway. */
    vsnprintf(text, sizeof text, format, arguments);
    va_end(arguments);
    return canvas_text(canvas, row, column, width, role, text);
}

void canvas_right(struct canvas *canvas, int row, int column, int width,
                  enum role role, const char *text)
{
    size_t length = utf8_length(text);
    int lead = 0;
    if (width > 0 && length < (size_t)width)
        lead = width - (int)length;
    canvas_text(canvas, row, column + lead, width - lead, role, text);
}

/* A rectangle cut to the canvas. */
struct area {
    int top, bottom, left, right; /* bottom and right are exclusive */
};

static int end_of(int first, int count, int limit)
{
    int64_t end = (int64_t)first + count;
    return end < 0 ? 0 : end > limit ? limit : (int)end;
}

static struct area area_on(const struct canvas *canvas, int row, int column,
                           int rows, int columns)
{
    return (struct area){.top = row < 0 ? 0 : row,
                         .bottom = end_of(row, rows, canvas->rows),
                         .left = column < 0 ? 0 : column,
                         .right = end_of(column, columns, canvas->columns)};
}

void canvas_fill(struct canvas *canvas, int row, int column, int rows,
                 int columns, enum role role, uint32_t character)
{
    struct area a = area_on(canvas, row, column, rows, columns);
    for (int r = a.top; r < a.bottom; r++)
        for (int c = a.left; c < a.right; c++)
            canvas_put(canvas, r, c, role, character);
}

void canvas_paint(struct canvas *canvas, int row, int column, int rows,
                  int columns, enum role role)
{
    assert((int)role >= 0 && role < ROLE_COUNT);
    struct area a = area_on(canvas, row, column, rows, columns);
    for (int r = a.top; r < a.bottom; r++)
        for (int c = a.left; c < a.right; c++)
            cell_at(canvas, r, c)->role = (uint8_t)role;
}

void canvas_reverse(struct canvas *canvas, int row, int column, int rows,
                    int columns)
{
    struct area a = area_on(canvas, row, column, rows, columns);
    for (int r = a.top; r < a.bottom; r++)
        for (int c = a.left; c < a.right; c++) {
            struct cell *cell = cell_at(canvas, r, c);
            cell->reverse = !cell->reverse;
        }
}

static bool is_blank(const struct cell *cell, bool roles)
{
    if (roles)
        return cell->role == ROLE_TEXT && !cell->reverse;
    return cell->character == ' ';
}

static char letter_of(const struct cell *cell)
{
    if (cell->reverse)
        return '@';
    return role_letter((enum role)cell->role);
}

/* One row of either grid; gives the place behind it. */
static char *row_to_text(const struct canvas *canvas, int row, bool roles,
                         char *out)
{
    const struct cell *cells =
        &canvas->cells[(size_t)row * (size_t)canvas->columns];
    int end = canvas->columns;
    while (end > 0 && is_blank(&cells[end - 1], roles))
        end--;
    for (int c = 0; c < end; c++) {
        if (!roles)
            out += utf8_encode(cells[c].character, out);
        else
            *out++ = letter_of(&cells[c]);
    }
    *out++ = '\n';
    return out;
}

char *canvas_to_text(const struct canvas *canvas)
{
    size_t cells = (size_t)canvas->rows * (size_t)canvas->columns;
    size_t size =
        5 * cells + 2 * (size_t)canvas->rows + (size_t)canvas->columns + 2;
    char *text = malloc(size);
    if (text == NULL)
        return NULL;
    char *out = text;
    for (int r = 0; r < canvas->rows; r++)
        out = row_to_text(canvas, r, false, out);
    memset(out, '=', (size_t)canvas->columns);
    out += canvas->columns;
    *out++ = '\n';
    for (int r = 0; r < canvas->rows; r++)
        out = row_to_text(canvas, r, true, out);
    *out = '\0';
    return text;
}
