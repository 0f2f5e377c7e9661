/* SPDX-License-Identifier: MIT */
#include "canvas/plot.h"

#include <assert.h>
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"

#define COLUMNS_MIN 16
#define ROWS_MIN 5
#define RULE_LEVEL 0x2500
#define RULE_UPRIGHT 0x2502
#define CORNER 0x2514
#define TICK_LEVEL 0x2534 /* on the level axis, upwards into the plot */
#define TICK_UPRIGHT 0x251C
#define DOTS_UPRIGHT 0x250A
#define DOTS_LEVEL 0x2508
#define BRAILLE 0x2800
#define EIGHTH 0x2580 /* + 1…8: lower eighths */
#define TICK_TEXT_MAX 24
#define TICKS_MAX 96
#define FAR_BELOW (-1e9)

/* Quarters of a cell: bit 0 upper left, 1 upper right, 2 lower left, 3 lower
 * right. */
static const uint32_t quarters[16] = {
    ' ',    0x2598, 0x259D, 0x2580, 0x2596, 0x258C, 0x259E, 0x259B,
    0x2597, 0x259A, 0x2590, 0x259C, 0x2584, 0x2599, 0x259F, 0x2588};

/* Dots of braille by row and column of a cell (Unicode, chapter "Braille"). */
static const uint32_t dots[4][2] = {
    {0x01, 0x08}, {0x02, 0x10}, {0x04, 0x20}, {0x40, 0x80}};

static double scaled(const struct plot_axis *axis, double value)
{
    switch (axis->scale) {
    case PLOT_LOG:
        return value > 0.0 ? log(value) : FAR_BELOW;
    case PLOT_SQRT:
        return value >= 0.0 ? sqrt(value) : FAR_BELOW;
    case PLOT_LINEAR:
        break;
    }
    return value;
}

double plot_part(const struct plot_axis *axis, double value)
{
    double low = scaled(axis, axis->low);
    double part =
        (scaled(axis, value) - low) / (scaled(axis, axis->high) - low);
    return part > FAR_BELOW ? part : FAR_BELOW;
}

double plot_value(const struct plot_axis *axis, double part)
{
    double low = scaled(axis, axis->low);
    double s = low + part * (scaled(axis, axis->high) - low);
    switch (axis->scale) {
    case PLOT_LOG:
        return exp(s);
    case PLOT_SQRT:
        return s > 0.0 ? s * s : 0.0;
    case PLOT_LINEAR:
        break;
    }
    return s;
}

double plot_round_up(double value)
{
    static const double steps[] = {1.0, 1.2, 1.5, 2.0, 2.5,
                                   3.0, 4.0, 5.0, 6.0, 8.0};
    assert(value > 0.0);
    double power = pow(10.0, floor(log10(value)));
    for (size_t i = 0; i < sizeof steps / sizeof steps[0]; i++)
        if (steps[i] * power >= value * (1.0 - 1e-12))
            return steps[i] * power;
    return 10.0 * power;
}

/* 1, 2 or 5 times a power of ten, not below a positive value. */
static double round_step(double value)
{
    double power = pow(10.0, floor(log10(value)));
    double first = value / power;
    double step = first <= 1.0   ? 1.0
                  : first <= 2.0 ? 2.0
                  : first <= 5.0 ? 5.0
                                 : 10.0;
    return step * power;
}

static double linear_step(const struct plot_axis *axis, int most)
{
    double step = round_step((axis->high - axis->low) / (most > 1 ? most : 1));
    return axis->whole && step < 1.0 ? 1.0 : step;
}

/* Values that may bear a tick, the most wanted ones first; gives their count.
 */
static int tick_values(const struct plot_axis *axis, int most,
                       double values[TICKS_MAX])
{
    int count = 0;
    if (axis->scale == PLOT_LINEAR) {
        double step = linear_step(axis, most);
        for (double v = ceil(axis->low / step - 1e-9) * step;
             v <= axis->high + 1e-9 * step && count < TICKS_MAX; v += step)
            values[count++] = v;
        return count;
    }
    /* Powers of ten before 5 and 2 of each decade, large before small. */
    static const double firsts[] = {1.0, 5.0, 2.0};
    double low = axis->low > 0.0 ? axis->low : axis->high * 1e-4;
    int least = (int)floor(log10(low));
    int last = (int)floor(log10(axis->high));
    if (axis->low <= 0.0)
        values[count++] = 0.0;
    for (size_t f = 0; f < sizeof firsts / sizeof firsts[0]; f++)
        for (int k = last; k >= least && count < TICKS_MAX; k--)
            values[count++] = firsts[f] * pow(10.0, k);
    return count;
}

static const char *tick_text(double value, char out[TICK_TEXT_MAX])
{
    snprintf(out, TICK_TEXT_MAX, "%.6g", fabs(value) < 1e-12 ? 0.0 : value);
    return out;
}

/* Columns that the numbers of the upright axis need. */
static int upright_width(const struct plot_axis *axis, const double *values,
                         int count)
{
    char out[TICK_TEXT_MAX];
    int widest = 1;
    for (int i = 0; i < count; i++) {
        double part = plot_part(axis, values[i]);
        int width = (int)strlen(tick_text(values[i], out));
        if (part > -1e-9 && part < 1.0 + 1e-9 && width > widest)
            widest = width;
    }
    return widest;
}

static void draw_upright_ticks(const struct plot *plot, const double *values,
                               int count)
{
    char out[TICK_TEXT_MAX];
    bool taken[CANVAS_ROWS_MAX + 2] = {false}; /* rows from one above on */
    const struct area *in = &plot->inside;
    for (int i = 0; i < count; i++) {
        int row;
        if (!plot_row(plot, values[i], &row))
            continue;
        bool *at = &taken[row - in->row + 1];
        if (at[-1] || at[0] || at[1])
            continue;
        at[0] = true;
        canvas_right(plot->canvas, row, plot->area.column,
                     in->column - 1 - plot->area.column, ROLE_TEXT,
                     tick_text(values[i], out));
        canvas_put(plot->canvas, row, in->column - 1, ROLE_QUIET, TICK_UPRIGHT);
    }
}

/* A tick with its number on the level axis, unless it would touch another.
 * taken: columns that hold numbers. */
static void level_tick(const struct plot *plot, double value, bool *taken)
{
    char out[TICK_TEXT_MAX];
    const struct area *a = &plot->area;
    int row = plot->inside.row + plot->inside.rows;
    int column;
    if (!plot_column(plot, value, &column))
        return;
    int width = (int)strlen(tick_text(value, out));
    int first = column - (width - 1) / 2;
    if (first < a->column)
        first = a->column;
    for (int c = first - 1; c <= first + width; c++)
        if (c >= a->column + a->columns ||
            (c >= a->column && taken[c - a->column]))
            return;
    for (int c = first; c < first + width; c++)
        taken[c - a->column] = true;
    canvas_put(plot->canvas, row, column, ROLE_QUIET, TICK_LEVEL);
    canvas_text(plot->canvas, row + 1, first, width, ROLE_TEXT, out);
}

static void draw_level_ticks(const struct plot *plot)
{
    double values[TICKS_MAX];
    bool taken[CANVAS_COLUMNS_MAX] = {false};
    int title = (int)utf8_length(plot->x.title);
    int columns = plot->area.columns;
    for (int c = columns > title + 1 ? columns - title - 1 : 0; c < columns;
         c++)
        taken[c] = true;
    int count = tick_values(&plot->x, plot->inside.columns / 8, values);
    for (int i = 0; i < count; i++)
        level_tick(plot, values[i], taken);
}

bool plot_open(struct plot *plot, struct canvas *canvas, struct area area,
               enum plot_style style, struct plot_axis x, struct plot_axis y)
{
    if (area.columns < COLUMNS_MIN || area.rows < ROWS_MIN)
        return false;
    assert(area.rows <= CANVAS_ROWS_MAX && area.columns <= CANVAS_COLUMNS_MAX);
    *plot = (struct plot){canvas, area, area, style, x, y};
    if (canvas->ascii)
        plot->style = PLOT_ASCII;
    struct area *in = &plot->inside;
    in->row += 1; /* title above, axis and its numbers below */
    in->rows -= 3;
    double values[TICKS_MAX];
    int count = tick_values(&y, in->rows / 3 + 1, values);
    int width = upright_width(&y, values, count) + 1;
    in->column += width;
    in->columns -= width;
    int bottom = in->row + in->rows;
    canvas_text(canvas, area.row, area.column, area.columns, ROLE_HEADING,
                y.title);
    canvas_fill(canvas, in->row, in->column - 1, in->rows, 1, ROLE_QUIET,
                RULE_UPRIGHT);
    canvas_fill(canvas, bottom, in->column, 1, in->columns, ROLE_QUIET,
                RULE_LEVEL);
    canvas_put(canvas, bottom, in->column - 1, ROLE_QUIET, CORNER);
    draw_upright_ticks(plot, values, count);
    draw_level_ticks(plot);
    canvas_right(canvas, bottom + 1, area.column, area.columns, ROLE_HEADING,
                 x.title);
    return true;
}

/* Cell of a part 0…1 of `count` cells; false outside. */
static bool cell_of(double part, int count, int *cell)
{
    if (!(part >= -1e-9 && part <= 1.0 + 1e-9))
        return false;
    int at = (int)floor(part * count);
    *cell = at < 0 ? 0 : at >= count ? count - 1 : at;
    return true;
}

bool plot_column(const struct plot *plot, double x, int *column)
{
    int cell;
    if (!cell_of(plot_part(&plot->x, x), plot->inside.columns, &cell))
        return false;
    *column = plot->inside.column + cell;
    return true;
}

bool plot_row(const struct plot *plot, double y, int *row)
{
    int cell;
    if (!cell_of(plot_part(&plot->y, y), plot->inside.rows, &cell))
        return false;
    *row = plot->inside.row + plot->inside.rows - 1 - cell;
    return true;
}

double plot_column_x(const struct plot *plot, int column)
{
    return plot_value(&plot->x, (column - plot->inside.column + 0.5) /
                                    plot->inside.columns);
}

static int dots_across(enum plot_style style)
{
    return style == PLOT_ASCII ? 1 : 2;
}

static int dots_down(enum plot_style style)
{
    return style == PLOT_ASCII ? 1 : style == PLOT_BRAILLE ? 4 : 2;
}

static const struct cell *cell_at(const struct plot *plot, int row, int column)
{
    const struct canvas *c = plot->canvas;
    if (row < 0 || row >= c->rows || column < 0 || column >= c->columns)
        return NULL;
    return &c->cells[(size_t)row * (size_t)c->columns + (size_t)column];
}

/* What a cell shows of the same curve already, as bits of its dots. */
static uint32_t bits_at(const struct plot *plot, int row, int column,
                        enum role role)
{
    const struct cell *cell = cell_at(plot, row, column);
    if (!cell || cell->role != role)
        return 0;
    if (plot->style == PLOT_BRAILLE)
        return cell->character >= BRAILLE && cell->character <= BRAILLE + 0xFF
                   ? cell->character - BRAILLE
                   : 0;
    for (uint32_t b = 1; b < 16; b++)
        if (quarters[b] == cell->character)
            return b;
    return 0;
}

/* One dot; x and y count from the lower left of the inside. */
static void put_dot(const struct plot *plot, struct plot_line line, int x,
                    int y)
{
    int across = dots_across(plot->style);
    int down = dots_down(plot->style);
    const struct area *in = &plot->inside;
    if (x < 0 || y < 0 || x >= in->columns * across || y >= in->rows * down)
        return;
    int column = in->column + x / across;
    int row = in->row + in->rows - 1 - y / down;
    if (plot->style == PLOT_ASCII) {
        canvas_put(plot->canvas, row, column, line.role,
                   (unsigned char)line.letter);
        return;
    }
    uint32_t bits = bits_at(plot, row, column, line.role);
    if (plot->style == PLOT_BRAILLE) {
        bits |= dots[3 - y % 4][x % 2];
        canvas_put(plot->canvas, row, column, line.role, BRAILLE + bits);
    } else {
        bits |= 1u << (2 * (1 - y % 2) + x % 2);
        canvas_put(plot->canvas, row, column, line.role, quarters[bits]);
    }
}

static bool pattern_draws(const struct plot *plot, enum plot_pattern pattern,
                          int x)
{
    int unit = dots_across(plot->style);
    if (pattern == PLOT_DASHED)
        return x / (2 * unit) % 3 != 2;
    return pattern == PLOT_SOLID || x / unit % 2 == 0;
}

/* Dots from one place to the next, all that touch: the usual line walk. */
static void draw_segment(const struct plot *plot, struct plot_line line, int x,
                         int y, int to_x, int to_y)
{
    int dx = abs(to_x - x);
    int dy = -abs(to_y - y);
    int step_x = x < to_x ? 1 : -1;
    int step_y = y < to_y ? 1 : -1;
    int error = dx + dy;
    for (;;) {
        if (pattern_draws(plot, line.pattern, x))
            put_dot(plot, line, x, y);
        if (x == to_x && y == to_y)
            return;
        int twice = 2 * error;
        if (twice >= dy) {
            error += dy;
            x += step_x;
        }
        if (twice <= dx) {
            error += dx;
            y += step_y;
        }
    }
}

/* Dot of a part of an axis; kept within reach of an int, so that a curve that
 * leaves the plot leaves it in the right direction. */
static int dot_of(double part, int count)
{
    double at = floor(part * count);
    double limit = 4.0 * count;
    return (int)(at < -limit ? -limit : at > limit ? limit : at);
}

void plot_curve(const struct plot *plot, struct plot_line line,
                const struct plot_point *points, int count)
{
    int wide = plot->inside.columns * dots_across(plot->style);
    int high = plot->inside.rows * dots_down(plot->style);
    bool drawing = false;
    int x = 0, y = 0;
    for (int i = 0; i < count; i++) {
        if (!points[i].there) {
            drawing = false;
            continue;
        }
        int to_x = dot_of(plot_part(&plot->x, points[i].x), wide);
        int to_y = dot_of(plot_part(&plot->y, points[i].y), high);
        if (to_x == wide) /* the very end of the axis */
            to_x = wide - 1;
        if (to_y == high)
            to_y = high - 1;
        draw_segment(plot, line, drawing ? x : to_x, drawing ? y : to_y, to_x,
                     to_y);
        x = to_x;
        y = to_y;
        drawing = true;
    }
}

/* y of a curve at x between two of its points; false in a gap. */
static bool curve_at(const struct plot_point *points, int count, double x,
                     double *y)
{
    for (int i = 0; i + 1 < count; i++) {
        const struct plot_point *a = &points[i];
        const struct plot_point *b = &points[i + 1];
        if (!a->there || !b->there || x < a->x || x > b->x)
            continue;
        double t = b->x > a->x ? (x - a->x) / (b->x - a->x) : 0.0;
        *y = a->y + t * (b->y - a->y);
        return true;
    }
    return false;
}

/* One column of a filled area, `eighths` high. */
static void fill_column(const struct plot *plot, enum role role, int column,
                        int eighths)
{
    static const uint32_t rising[] = {0x2840, 0x28C0, 0x28E4, 0x28F6, 0x28FF};
    const struct area *in = &plot->inside;
    for (int i = 0; i < in->rows && eighths > 0; i++, eighths -= 8) {
        int row = in->row + in->rows - 1 - i;
        int part = eighths < 8 ? eighths : 8;
        uint32_t character = (uint32_t)(EIGHTH + part);
        if (plot->style == PLOT_BRAILLE)
            character = rising[(part + 1) / 2];
        else if (plot->style == PLOT_ASCII)
            character = part < 4 ? '.' : ':';
        canvas_put(plot->canvas, row, column, role, character);
    }
}

void plot_fill(const struct plot *plot, enum role role,
               const struct plot_point *points, int count)
{
    const struct area *in = &plot->inside;
    for (int c = in->column; c < in->column + in->columns; c++) {
        double y;
        if (!curve_at(points, count, plot_column_x(plot, c), &y))
            continue;
        double part = plot_part(&plot->y, y);
        int most = 8 * in->rows;
        /* A value far below, or none on a logarithmic axis, is far out of an
         * int's reach. */
        if (!(part > 0.0))
            continue;
        int eighths = part >= 1.0 ? most : (int)lround(part * most);
        fill_column(plot, role, c, eighths);
    }
}

void plot_marks(const struct plot *plot, enum role role, uint32_t mark,
                const struct plot_point *points, int count)
{
    for (int i = 0; i < count; i++) {
        int row, column;
        if (points[i].there && plot_column(plot, points[i].x, &column) &&
            plot_row(plot, points[i].y, &row))
            canvas_put(plot->canvas, row, column, role, mark);
    }
}

static bool is_blank(const struct plot *plot, int row, int column)
{
    const struct cell *cell = cell_at(plot, row, column);
    return cell && cell->character == ' ';
}

void plot_upright(const struct plot *plot, enum role role, double x)
{
    const struct area *in = &plot->inside;
    int column;
    if (!plot_column(plot, x, &column))
        return;
    for (int row = in->row; row < in->row + in->rows; row++)
        if (is_blank(plot, row, column))
            canvas_put(plot->canvas, row, column, role, DOTS_UPRIGHT);
}

void plot_level(const struct plot *plot, enum role role, double y)
{
    const struct area *in = &plot->inside;
    int row;
    if (!plot_row(plot, y, &row))
        return;
    for (int column = in->column; column < in->column + in->columns; column++)
        if (is_blank(plot, row, column))
            canvas_put(plot->canvas, row, column, role, DOTS_LEVEL);
}

/* True when some letter or digit stands there already: another label. */
static bool has_text(const struct plot *plot, int row, int first, int width)
{
    for (int c = first - 1; c <= first + width; c++) {
        const struct cell *cell = cell_at(plot, row, c);
        uint32_t at = cell ? cell->character : ' ';
        bool letter = (at >= '0' && at <= '9') || (at >= 'A' && at <= 'Z') ||
                      (at >= 'a' && at <= 'z' && plot->style != PLOT_ASCII);
        if (letter)
            return true;
    }
    return false;
}

bool plot_label(const struct plot *plot, enum role role, double x, double y,
                const char *text)
{
    const struct area *in = &plot->inside;
    int width = (int)utf8_length(text);
    int row, column;
    double top = y < plot->y.high ? y : plot->y.high;
    if (width > in->columns || !plot_column(plot, x, &column) ||
        !plot_row(plot, top, &row))
        return false;
    int first = column - width / 2;
    if (first + width > in->column + in->columns)
        first = in->column + in->columns - width;
    if (first < in->column)
        first = in->column;
    for (int up = 1; up >= -1; up--) {
        int at = row - up;
        if (at < in->row || at >= in->row + in->rows ||
            has_text(plot, at, first, width))
            continue;
        canvas_text(plot->canvas, at, first, width, role, text);
        return true;
    }
    return false;
}
