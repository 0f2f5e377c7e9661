/* SPDX-License-Identifier: MIT */
#include "widget/scroll.h"

#define TO_THE_END 10000
#define WHEEL_ROWS 3

int scroll_move(int first, enum move move, int rows)
{
    int page = rows > 8 ? rows - 6 : 2;
    int to = first + (move == MOVE_UP          ? -1
                      : move == MOVE_DOWN      ? 1
                      : move == MOVE_PAGE_UP   ? -page
                      : move == MOVE_PAGE_DOWN ? page
                      : move == MOVE_END       ? TO_THE_END
                                               : 0);
    return to < 0 || move == MOVE_HOME ? 0 : to;
}

int scroll_wheel(int first, bool up)
{
    int to = first + (up ? -WHEEL_ROWS : WHEEL_ROWS);
    return to < 0 ? 0 : to;
}
