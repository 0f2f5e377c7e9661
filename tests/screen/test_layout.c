/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <math.h>

#include "screen/layout.h"
#include "screen/scale.h"
#include "screen/test_ui.h"

/* True when an area lies on the screen. */
static bool inside(struct area a, int rows, int columns)
{
    return a.rows == 0 ||
           (a.row >= 0 && a.column >= 0 && a.rows > 0 && a.columns > 0 &&
            a.row + a.rows <= rows && a.column + a.columns <= columns);
}

START_TEST(every_size_gives_areas_on_the_screen)
{
    for (int rows = 1; rows <= 100; rows++)
        for (int columns = 1; columns <= 300; columns++)
            for (int width = 0; width < 2; width++) {
                struct map_layout l =
                    layout_map(rows, columns, (enum grid_width)width);
                if (l.form == FORM_SENTENCE)
                    continue;
                ck_assert_msg(inside(l.grid, rows, columns) &&
                                  inside(l.scale, rows, columns) &&
                                  inside(l.pane, rows, columns) &&
                                  inside(l.side, rows, columns),
                              "%dx%d", columns, rows);
                ck_assert(l.message_row < rows && l.key_row < rows);
                if (l.form == FORM_LIST)
                    continue;
                int outside = 0;
                for (int z = 1; z <= Z_MAX; z++)
                    if (!inside(layout_cell(&l, z, GRID_LU_LR), rows, columns))
                        outside = z;
                ck_assert_msg(outside == 0, "%dx%d Z=%d", columns, rows,
                              outside);
            }
}
END_TEST

START_TEST(areas_do_not_overlap_where_all_stand_together)
{
    for (int rows = 20; rows <= 80; rows++)
        for (int columns = 57; columns <= 220; columns++) {
            struct map_layout l = layout_map(rows, columns, GRID_18);
            if (l.form != FORM_WHOLE)
                continue;
            ck_assert_int_eq(l.scale.row, l.grid.row + l.grid.rows);
            ck_assert_int_eq(l.pane.row, l.scale.row + 1);
            ck_assert_int_eq(l.message_row, l.pane.row + l.pane.rows);
            ck_assert_int_eq(l.key_row, l.message_row + 1);
            if (l.side.rows)
                ck_assert_int_gt(l.side.column,
                                 l.grid.column + l.grid.columns - 1);
        }
}
END_TEST

START_TEST(the_sizes_that_were_promised)
{
    ck_assert_int_eq(layout_map(24, 80, GRID_18).form, FORM_WHOLE);
    ck_assert_int_eq(layout_map(60, 200, GRID_18).form, FORM_WHOLE);
    ck_assert_int_gt(layout_map(60, 200, GRID_18).cell_rows, 1);
    ck_assert_int_eq(layout_map(60, 200, GRID_32).width, GRID_32);
    ck_assert_int_eq(layout_map(24, 80, GRID_32).width, GRID_18);
    ck_assert_int_eq(layout_map(12, 40, GRID_18).form, FORM_SINGLE);
    ck_assert_int_eq(layout_map(10, 30, GRID_18).form, FORM_LIST);
    ck_assert_int_eq(layout_map(5, 20, GRID_18).form, FORM_SENTENCE);
}
END_TEST

START_TEST(classes_are_ordered_and_hold_every_value)
{
    double values[] = {1.0, 1.3, 2.2, 2.25, 3.9, 4.4, 5.0, 5.5, 7.1, 90.0};
    struct scale s = scale_fit(values, 10, false);
    int last = 0;
    for (int i = 0; i < 10; i++) {
        int c = scale_class(&s, values[i]);
        ck_assert_int_ge(c, last);
        ck_assert_int_lt(c, SCALE_CLASSES);
        last = c;
    }
    for (int i = 0; i + 2 < SCALE_CLASSES; i++)
        ck_assert(s.inner[i] < s.inner[i + 1]);
    ck_assert(s.lowest == 1.0 && s.highest == 90.0);
}
END_TEST

START_TEST(a_balance_is_symmetric_and_zero_stands_in_its_middle)
{
    double values[] = {-3.0, -0.2, 0.1, 0.4, 2.0, 0.0};
    struct scale s = scale_fit(values, 6, true);
    for (int i = 0; i < SCALE_CLASSES - 1; i++)
        ck_assert(fabs(s.inner[i] + s.inner[SCALE_CLASSES - 2 - i]) < 1e-12);
    ck_assert_int_eq(scale_class(&s, 0.0), SCALE_CLASSES / 2);
    ck_assert_int_eq(scale_glyph(&s, SCALE_CLASSES / 2), '=');
    ck_assert_int_eq(scale_glyph(&s, 0), 'v');
    ck_assert_int_eq(scale_glyph(&s, SCALE_CLASSES - 1), '^');
}
END_TEST

START_TEST(one_value_or_none_make_a_scale_too)
{
    double one[] = {4.2};
    double same[] = {0.0, 0.0, 0.0};
    struct scale s = scale_fit(one, 1, false);
    ck_assert_int_lt(scale_class(&s, 4.2), SCALE_CLASSES);
    s = scale_fit(same, 3, true);
    ck_assert_int_eq(scale_class(&s, 0.0), SCALE_CLASSES / 2);
    ck_assert_int_eq(scale_fit(one, 0, false).count, 0);
}
END_TEST

TCase *layout_case(void)
{
    TCase *tc = tcase_create("layout and scale");
    tcase_add_test(tc, every_size_gives_areas_on_the_screen);
    tcase_add_test(tc, areas_do_not_overlap_where_all_stand_together);
    tcase_add_test(tc, the_sizes_that_were_promised);
    tcase_add_test(tc, classes_are_ordered_and_hold_every_value);
    tcase_add_test(tc, a_balance_is_symmetric_and_zero_stands_in_its_middle);
    tcase_add_test(tc, one_value_or_none_make_a_scale_too);
    return tc;
}
