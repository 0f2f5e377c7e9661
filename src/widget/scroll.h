/* SPDX-License-Identifier: MIT */
/* Movements, and how rows that are longer than their area follow them. */
#ifndef WIDGET_SCROLL_H
#define WIDGET_SCROLL_H

#include <stdbool.h>

/* What a key that moves asks for. */
enum move {
    MOVE_NONE,
    MOVE_UP,
    MOVE_DOWN,
    MOVE_LEFT,
    MOVE_RIGHT,
    MOVE_HOME,
    MOVE_END,
    MOVE_PAGE_UP,
    MOVE_PAGE_DOWN
};

/* The first row shown after a movement; rows: of the screen. Never below 0,
 * and beyond the last row after MOVE_END: who draws brings it back. Left and
 * right change nothing. */
int scroll_move(int first, enum move move, int rows);

/* The same after a step of the mouse wheel. */
int scroll_wheel(int first, bool up);

#endif
