/* SPDX-License-Identifier: MIT */
#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "canvas/plot.h"
#include "canvas/suites.h"
#include "support/near.h"

#define POINTS 201

static struct canvas canvas;
static struct plot plot;
static struct plot_point points[POINTS];

static void open_canvas(void)
{
    struct status st = status_ok();
    ck_assert(canvas_init(&canvas, 20, 60, &st));
}

static void close_canvas(void)
{
    canvas_clear(&canvas);
}

static void open_plot(enum plot_style style, enum plot_scale scale)
{
    struct plot_axis x = {"r, pm", scale, 1.0, 1000.0, false};
    struct plot_axis y = {"D", PLOT_LINEAR, 0.0, 1.0, false};
    canvas_erase(&canvas);
    ck_assert(
        plot_open(&plot, &canvas, (struct area){0, 0, 20, 60}, style, x, y));
}

/* A hump over the whole axis: sin of the part, 1 in the middle. */
static void make_hump(void)
{
    for (int i = 0; i < POINTS; i++) {
        double part = (double)i / (POINTS - 1);
        points[i] = (struct plot_point){plot_value(&plot.x, part),
                                        sin(3.14159265358979 * part), true};
    }
}

static const struct cell *at(int row, int column)
{
    return &canvas.cells[row * canvas.columns + column];
}

/* Row of the topmost cell of a role in a column, -1 when there is none. */
static int top_of(enum role role, int column)
{
    for (int row = 0; row < plot.inside.row + plot.inside.rows; row++)
        if (at(row, column)->role == role && at(row, column)->character != ' ')
            return row;
    return -1;
}

START_TEST(values_and_parts_are_each_others_inverse)
{
    static const enum plot_scale scales[] = {PLOT_LINEAR, PLOT_LOG, PLOT_SQRT};
    for (int s = 0; s < 3; s++) {
        struct plot_axis axis = {"", scales[s], 0.35, 417.0, false};
        near(plot_part(&axis, 0.35), 0.0, 1e-12, 0.0, "low");
        near(plot_part(&axis, 417.0), 1.0, 1e-12, 0.0, "high");
        for (int i = 0; i < 8; i++) {
            double part = -0.1 + 0.17 * i;
            if (plot_value(&axis, part) > 0.0)
                near(plot_part(&axis, plot_value(&axis, part)), part, 1e-12,
                     0.0, "scale %d", s);
        }
    }
    struct plot_axis log_axis = {"", PLOT_LOG, 0.35, 417.0, false};
    ck_assert(plot_part(&log_axis, 0.0) < -1e6);
}
END_TEST

START_TEST(upper_ends_are_round_and_not_below)
{
    near(plot_round_up(0.0137), 0.015, 0.0, 1e-12, "0.0137");
    near(plot_round_up(2.385), 2.5, 0.0, 1e-12, "2.385");
    near(plot_round_up(8.7e5), 1e6, 0.0, 1e-12, "8.7e5");
    double v = 1e-7;
    for (int i = 0; i < 100; i++, v *= 1.37)
        ck_assert(plot_round_up(v) >= v * (1.0 - 1e-9) &&
                  plot_round_up(v) <= 1.5 * v);
}
END_TEST

/* The three ways of drawing follow the same curve: in each column the line
 * stands where the value is, to a row. */
START_TEST(every_style_draws_the_curve_where_it_is)
{
    for (int style = 0; style < 3; style++)
        for (int scale = 0; scale < 3; scale++) {
            open_plot((enum plot_style)style, (enum plot_scale)scale);
            make_hump();
            plot_curve(&plot, (struct plot_line){ROLE_CURVE_1, PLOT_SOLID, '*'},
                       points, POINTS);
            for (int c = plot.inside.column;
                 c < plot.inside.column + plot.inside.columns; c++) {
                double part = plot_part(&plot.x, plot_column_x(&plot, c));
                int want;
                ck_assert(plot_row(&plot, sin(3.14159265358979 * part), &want));
                int got = top_of(ROLE_CURVE_1, c);
                ck_assert_msg(abs(got - want) <= 1,
                              "style %d scale %d column %d: row %d, not %d",
                              style, scale, c, got, want);
            }
        }
}
END_TEST

START_TEST(areas_reach_from_the_curve_to_the_axis)
{
    for (int style = 0; style < 3; style++) {
        open_plot((enum plot_style)style, PLOT_LINEAR);
        make_hump();
        plot_fill(&plot, ROLE_CURVE_5, points, POINTS);
        int bottom = plot.inside.row + plot.inside.rows - 1;
        int middle = plot.inside.column + plot.inside.columns / 2;
        ck_assert_int_eq(top_of(ROLE_CURVE_5, middle), plot.inside.row);
        for (int row = plot.inside.row; row <= bottom; row++)
            ck_assert_int_eq(at(row, middle)->role, ROLE_CURVE_5);
    }
}
END_TEST

/* Where there is no value nothing is drawn, and nothing across. */
START_TEST(a_gap_stays_empty)
{
    for (int style = 0; style < 3; style++) {
        open_plot((enum plot_style)style, PLOT_LINEAR);
        make_hump();
        for (int i = 80; i < 120; i++)
            points[i].there = false;
        plot_curve(&plot, (struct plot_line){ROLE_CURVE_1, PLOT_SOLID, '*'},
                   points, POINTS);
        plot_fill(&plot, ROLE_CURVE_2, points, POINTS);
        int first, last;
        ck_assert(plot_column(&plot, points[80].x, &first));
        ck_assert(plot_column(&plot, points[119].x, &last));
        for (int c = first + 1; c < last; c++)
            for (int row = plot.inside.row;
                 row < plot.inside.row + plot.inside.rows; row++)
                ck_assert_uint_eq(at(row, c)->character, ' ');
    }
}
END_TEST

START_TEST(what_is_outside_is_cut_off)
{
    open_plot(PLOT_BLOCK, PLOT_LINEAR);
    for (int i = 0; i < POINTS; i++)
        points[i] = (struct plot_point){-500.0 + 10.0 * i,
                                        i % 2 ? 1e300 : -1e300, true};
    plot_curve(&plot, (struct plot_line){ROLE_CURVE_1, PLOT_SOLID, '*'}, points,
               POINTS);
    plot_marks(&plot, ROLE_CURVE_2, '+', points, POINTS);
    for (int row = 0; row < canvas.rows; row++)
        for (int c = 0; c < canvas.columns; c++)
            if (at(row, c)->role == ROLE_CURVE_1)
                ck_assert(row >= plot.inside.row &&
                          row < plot.inside.row + plot.inside.rows &&
                          c >= plot.inside.column);
    for (int i = 0; i < canvas.rows * canvas.columns; i++)
        ck_assert(canvas.cells[i].role != ROLE_CURVE_2);
}
END_TEST

START_TEST(marks_and_labels_stand_at_their_place)
{
    struct plot_point one = {500.5, 0.5, true};
    int row, column;
    open_plot(PLOT_BLOCK, PLOT_LINEAR);
    ck_assert(plot_column(&plot, one.x, &column));
    ck_assert(plot_row(&plot, one.y, &row));
    plot_marks(&plot, ROLE_CURVE_2, 'o', &one, 1);
    ck_assert_uint_eq(at(row, column)->character, 'o');
    ck_assert(plot_label(&plot, ROLE_CURVE_2, one.x, one.y, "4s"));
    ck_assert_uint_eq(at(row - 1, column - 1)->character, '4');
    ck_assert_uint_eq(at(row - 1, column)->character, 's');
    /* the next one at the same place stands below, the third nowhere */
    ck_assert(plot_label(&plot, ROLE_CURVE_2, one.x, one.y, "3d"));
    ck_assert_uint_eq(at(row + 1, column)->character, 'd');
    ck_assert_uint_eq(at(row - 1, column)->character, 's');
    ck_assert(!plot_label(&plot, ROLE_CURVE_2, one.x, one.y, "3p"));
}
END_TEST

START_TEST(a_place_too_small_is_refused)
{
    struct plot_axis axis = {"x", PLOT_LINEAR, 0.0, 1.0, false};
    ck_assert(!plot_open(&plot, &canvas, (struct area){0, 0, 4, 60}, PLOT_BLOCK,
                         axis, axis));
    ck_assert(!plot_open(&plot, &canvas, (struct area){0, 0, 20, 15},
                         PLOT_BLOCK, axis, axis));
    for (int i = 0; i < canvas.rows * canvas.columns; i++)
        ck_assert_uint_eq(canvas.cells[i].character, ' ');
    for (int rows = 5; rows < 20; rows++)
        for (int columns = 16; columns < 60; columns++)
            ck_assert(plot_open(&plot, &canvas,
                                (struct area){0, 0, rows, columns}, PLOT_BLOCK,
                                axis, axis));
}
END_TEST

START_TEST(an_ascii_canvas_gets_ascii_alone)
{
    canvas.ascii = true;
    open_plot(PLOT_BRAILLE, PLOT_LOG);
    make_hump();
    plot_fill(&plot, ROLE_CURVE_5, points, POINTS);
    plot_curve(&plot, (struct plot_line){ROLE_CURVE_1, PLOT_DASHED, 'x'},
               points, POINTS);
    plot_upright(&plot, ROLE_TITLE, 10.0);
    int letters = 0;
    for (int i = 0; i < canvas.rows * canvas.columns; i++) {
        ck_assert(canvas.cells[i].character < 0x7F);
        letters += canvas.cells[i].character == 'x';
    }
    ck_assert_int_gt(letters, 20);
}
END_TEST

/* Values so far below that their eighths of a row are beyond an int. */
START_TEST(an_area_far_below_is_not_drawn)
{
    static const double below[] = {-1e6,   -3e7, -5e7,  -1e8,   -2e8,
                                   -2.5e8, -1e9, -1e12, -1e300, -HUGE_VAL};
    open_plot(PLOT_BLOCK, PLOT_LOG);
    for (size_t b = 0; b < sizeof below / sizeof below[0]; b++) {
        for (int i = 0; i < POINTS; i++) {
            double x = plot_value(&plot.x, (double)i / (POINTS - 1));
            points[i] = (struct plot_point){x, below[b], true};
        }
        plot_fill(&plot, ROLE_CURVE_5, points, POINTS);
        for (int c = 0; c < canvas.columns; c++)
            ck_assert_msg(top_of(ROLE_CURVE_5, c) == -1, "%g", below[b]);
    }
}
END_TEST

TCase *plot_cases(void)
{
    TCase *tc = tcase_create("plot");
    tcase_add_checked_fixture(tc, open_canvas, close_canvas);
    tcase_add_test(tc, values_and_parts_are_each_others_inverse);
    tcase_add_test(tc, upper_ends_are_round_and_not_below);
    tcase_add_test(tc, every_style_draws_the_curve_where_it_is);
    tcase_add_test(tc, areas_reach_from_the_curve_to_the_axis);
    tcase_add_test(tc, a_gap_stays_empty);
    tcase_add_test(tc, what_is_outside_is_cut_off);
    tcase_add_test(tc, an_area_far_below_is_not_drawn);
    tcase_add_test(tc, marks_and_labels_stand_at_their_place);
    tcase_add_test(tc, a_place_too_small_is_refused);
    tcase_add_test(tc, an_ascii_canvas_gets_ascii_alone);
    return tc;
}
