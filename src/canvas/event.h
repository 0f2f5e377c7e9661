/* SPDX-License-Identifier: MIT */
/* Everything that can happen to the screens, as plain values: a test is a list
 * of these. */
#ifndef CANVAS_EVENT_H
#define CANVAS_EVENT_H

#include <stdint.h>

enum event_kind {
    EVENT_NONE,
    EVENT_KEY,       /* a key without a character: key */
    EVENT_CHARACTER, /* a printable character: character */
    EVENT_PASTE,     /* one character of pasted text: character */
    EVENT_MOUSE,     /* a click or a wheel step: row, column, button */
    EVENT_RESIZE,    /* rows, columns */
    EVENT_TICK,      /* half a second went by while a job is running */
    EVENT_INTERRUPT  /* the user's interrupt key */
};

enum key {
    KEY_CODE_UP = 1,
    KEY_CODE_DOWN,
    KEY_CODE_LEFT,
    KEY_CODE_RIGHT,
    KEY_CODE_HOME,
    KEY_CODE_END,
    KEY_CODE_PAGE_UP,
    KEY_CODE_PAGE_DOWN,
    KEY_CODE_ENTER,
    KEY_CODE_ESCAPE,
    KEY_CODE_TAB,
    KEY_CODE_BACKTAB,
    KEY_CODE_ERASE, /* backspace, either code */
    KEY_CODE_DELETE,
    KEY_CODE_CLEAR,  /* control-U */
    KEY_CODE_REPAINT /* control-L */
};

enum mouse_button { MOUSE_LEFT = 1, MOUSE_WHEEL_UP, MOUSE_WHEEL_DOWN };

struct event {
    enum event_kind kind;
    enum key key;
    uint32_t character;
    int row, column;
    enum mouse_button button;
};

#endif
