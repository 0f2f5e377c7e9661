/* SPDX-License-Identifier: MIT */
/* A canvas to the screen. Our own comparison leaves curses only the cells that
 * changed to look at. */
#include "terminal/inside.h"

#include <string.h>
#include <wchar.h>

#include "base/text.h"

static cchar_t curses_cell(const struct terminal *t, const struct cell *cell)
{
    wchar_t text[2] = {(wchar_t)cell->character, L'\0'};
    attr_t style = t->style[cell->role];
    /* the pair as an int beside: a short would wrap */
    int pair = t->pair[cell->role];
    if (cell->reverse && t->turned[cell->role] >= 0)
        pair = t->turned[cell->role];
    else if (cell->reverse)
        style ^= A_REVERSE;
    cchar_t out;
    memset(&out, 0, sizeof out);
    if (setcchar(&out, text, style, 0, &pair) == ERR)
        setcchar(&out, L"?", style, 0, &pair);
    return out;
}

static bool same(const struct cell *a, const struct cell *b)
{
    return a->character == b->character && a->role == b->role &&
           a->reverse == b->reverse;
}

/* Sends what differs in one row, run by run. */
static void paint_row(struct terminal *t, const struct canvas *canvas, int row,
                      int columns)
{
    cchar_t run[CANVAS_COLUMNS_MAX];
    const struct cell *new =
        &canvas->cells[(size_t)row * (size_t)canvas->columns];
    struct cell *old = &t->shown.cells[(size_t)row * (size_t)t->shown.columns];
    for (int c = 0; c < columns; c++) {
        int first = c;
        while (c < columns && (t->everything || !same(&new[c], &old[c]))) {
            run[c - first] = curses_cell(t, &new[c]);
            old[c] = new[c];
            c++;
        }
        if (c > first)
            mvadd_wchnstr(row, first, run, c - first);
    }
}

/* What is kept of the last canvas fits the new one; false without memory. */
static bool keep(struct terminal *t, const struct canvas *canvas)
{
    if (t->shown.rows == canvas->rows && t->shown.columns == canvas->columns &&
        t->shown.cells != NULL)
        return true;
    struct status ignored = status_ok();
    t->everything = true;
    return canvas_resize(&t->shown, canvas->rows, canvas->columns, &ignored);
}

static int within(int value, int limit)
{
    return value >= limit ? limit - 1 : value < 0 ? 0 : value;
}

void terminal_paint(struct terminal *t, const struct canvas *canvas)
{
    int rows;
    int columns;
    terminal_size(t, &rows, &columns);
    if (!keep(t, canvas))
        return; /* tried again with the next paint */
    if (t->everything) {
        erase();
        clearok(stdscr, TRUE);
    }
    int last_row = canvas->rows < rows ? canvas->rows : rows;
    int last_column = canvas->columns < columns ? canvas->columns : columns;
    for (int r = 0; r < last_row; r++)
        paint_row(t, canvas, r, last_column);
    t->everything = false;
    frame_begin(t);
    if (t->cursor != (canvas->cursor_visible ? 1 : 0)) {
        t->cursor = canvas->cursor_visible ? 1 : 0;
        curs_set(t->cursor);
    }
    move(within(canvas->cursor_row, rows),
         within(canvas->cursor_column, columns));
    guard_hold();
    refresh();
    frame_end(t);
    guard_release();
}

void terminal_repaint(struct terminal *t)
{
    t->everything = true;
}
