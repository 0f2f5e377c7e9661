/* SPDX-License-Identifier: MIT */
/* A rectangle on the canvas. */
#ifndef CANVAS_AREA_H
#define CANVAS_AREA_H

/* Top left place and size; rows or columns 0: nothing is there. */
struct area {
    int row, column, rows, columns;
};

#endif
