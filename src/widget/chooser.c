/* SPDX-License-Identifier: MIT */
#include "widget/chooser.h"

#include <stdarg.h>
#include <stdio.h>

#include "base/text.h"
#include "widget/border.h"

void chooser_add(struct chooser *c, int value, bool current, const char *format,
                 ...)
{
    if (c->count == CHOOSER_MAX)
        return;
    va_list args;
    va_start(args, format);
    char *label = c->labels[c->count];
    int n = vsnprintf(label, sizeof c->labels[0], format, args);
    va_end(args);
    if (n >= (int)sizeof c->labels[0])
        label[utf8_whole(label, sizeof c->labels[0] - 1)] = '\0';
    c->values[c->count] = value;
    if (current)
        c->at = c->count;
    c->count++;
}

static void move(struct chooser *c, int by)
{
    c->at += by;
    if (c->at < 0)
        c->at = 0;
    if (c->at >= c->count)
        c->at = c->count - 1;
}

/* A letter goes to the next entry that starts with it. */
static void seek(struct chooser *c, uint32_t letter)
{
    for (int i = 1; i <= c->count; i++) {
        int at = (c->at + i) % c->count;
        if ((unsigned char)c->labels[at][0] == letter) {
            c->at = at;
            return;
        }
    }
}

static enum chooser_answer take_character(struct chooser *c, uint32_t character)
{
    if (character == 'q')
        return CHOOSER_LEFT;
    if (character == 'j' || character == 'k')
        move(c, character == 'j' ? 1 : -1);
    else
        seek(c, character);
    return CHOOSER_MOVED;
}

enum chooser_answer chooser_update(struct chooser *c, const struct event *event)
{
    if (event->kind == EVENT_CHARACTER)
        return take_character(c, event->character);
    if (event->kind != EVENT_KEY)
        return CHOOSER_NOTHING;
    if (event->key == KEY_CODE_ENTER || event->key == KEY_CODE_RIGHT)
        return CHOOSER_TAKEN;
    if (event->key == KEY_CODE_ESCAPE || event->key == KEY_CODE_LEFT)
        return CHOOSER_LEFT;
    if (event->key == KEY_CODE_UP)
        move(c, -1);
    else if (event->key == KEY_CODE_DOWN)
        move(c, 1);
    else if (event->key == KEY_CODE_HOME || event->key == KEY_CODE_PAGE_UP)
        c->at = 0;
    else if (event->key == KEY_CODE_END || event->key == KEY_CODE_PAGE_DOWN)
        c->at = c->count - 1;
    return CHOOSER_MOVED;
}

void chooser_draw(const struct chooser *c, struct canvas *canvas,
                  const char *title)
{
    int width = 24;
    for (int i = 0; i < c->count; i++) {
        int need = (int)utf8_length(c->labels[i]) + 6;
        width = need > width ? need : width;
    }
    width = width < canvas->columns ? width : canvas->columns;
    int room = canvas->rows - 2;
    int rows = c->count + 2 < room ? c->count + 2 : room;
    if (rows < 3)
        return;
    int top = c->at - (rows - 3) > 0 ? c->at - (rows - 3) : 0;
    struct area a = {(canvas->rows - rows) / 2, (canvas->columns - width) / 2,
                     rows, width};
    border_draw(canvas, a, title);
    for (int i = 0; i < rows - 2; i++) {
        int item = top + i;
        bool at = item == c->at;
        int row = a.row + 1 + i;
        canvas_textf(canvas, row, a.column + 1, a.columns - 2,
                     at ? ROLE_CHOSEN : ROLE_TEXT, "%s %-*s", at ? ">" : " ",
                     a.columns - 4, c->labels[item]);
        if (at) {
            canvas->cursor_row = row;
            canvas->cursor_column = a.column + 1;
        }
    }
}
