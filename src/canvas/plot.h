/* SPDX-License-Identifier: MIT */
/* A plot on a part of the canvas: axes with ticks, then curves, filled areas,
 * marks and labels in the order of the calls. Every curve is drawn from the
 * same points in one of three ways: block elements, braille dots, or ASCII. */
#ifndef CANVAS_PLOT_H
#define CANVAS_PLOT_H

#include "canvas/area.h"
#include "canvas/canvas.h"

/* PLOT_BLOCK: eighths and quarters of cells. On a canvas that is ASCII only
 * every style becomes PLOT_ASCII. */
enum plot_style { PLOT_BLOCK, PLOT_BRAILLE, PLOT_ASCII };

enum plot_scale { PLOT_LINEAR, PLOT_LOG, PLOT_SQRT };

/* title: quantity and unit. low < high; PLOT_LOG needs low > 0, PLOT_SQRT
 * low >= 0. whole: ticks at whole numbers only. */
struct plot_axis {
    const char *title;
    enum plot_scale scale;
    double low, high;
    bool whole;
};

/* A point of a curve; a curve has a gap where `there` is false. */
struct plot_point {
    double x, y;
    bool there;
};

/* How a curve can be told from others without colour. */
enum plot_pattern { PLOT_SOLID, PLOT_DASHED, PLOT_DOTTED };

/* letter: the mark of the curve in PLOT_ASCII. */
struct plot_line {
    enum role role;
    enum plot_pattern pattern;
    char letter;
};

struct plot {
    struct canvas *canvas;
    struct area area;   /* everything */
    struct area inside; /* between the axes */
    enum plot_style style;
    struct plot_axis x, y;
};

/* Where a value stands on an axis: 0 at low, 1 at high; and back. Values that
 * the scale does not have (zero on PLOT_LOG) stand far below 0. */
double plot_part(const struct plot_axis *axis, double value);
double plot_value(const struct plot_axis *axis, double part);

/* A round number not below a positive value: 1, 1.2, 1.5, 2, 2.5, 3, 4, 5, 6 or
 * 8 times a power of ten; the upper end of an axis. */
double plot_round_up(double value);

/* Draws the axes with their ticks and titles: that of y above it, that of x at
 * the right end of its numbers. False, and nothing drawn, when the area is too
 * small (less than 16 columns or 5 rows). */
MUST_CHECK bool plot_open(struct plot *plot, struct canvas *canvas,
                          struct area area, enum plot_style style,
                          struct plot_axis x, struct plot_axis y);

/* The cell of a value inside the axes; false when outside. */
bool plot_column(const struct plot *plot, double x, int *column);
bool plot_row(const struct plot *plot, double y, int *row);
/* The x in the middle of a column of cells. */
double plot_column_x(const struct plot *plot, int column);

/* points[count] in rising order of x. What lies outside is cut off. */
void plot_curve(const struct plot *plot, struct plot_line line,
                const struct plot_point *points, int count);
/* The area between a curve and the lower end of y. */
void plot_fill(const struct plot *plot, enum role role,
               const struct plot_point *points, int count);
/* A mark at each point, in any order. */
void plot_marks(const struct plot *plot, enum role role, uint32_t mark,
                const struct plot_point *points, int count);

/* Lines through the whole plot at a value: dotted, they leave what is drawn
 * already. */
void plot_upright(const struct plot *plot, enum role role, double x);
void plot_level(const struct plot *plot, enum role role, double y);

/* A text centred above a point, moved where it fits inside. It does not
 * cover another label: false when there is no room. */
bool plot_label(const struct plot *plot, enum role role, double x, double y,
                const char *text);

#endif
