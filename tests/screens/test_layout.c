/* SPDX-License-Identifier: MIT */
#include <check.h>

#include "screens/map_layout.h"
#include "screens/suites.h"

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
                    screen_map_layout(rows, columns, (enum grid_width)width);
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
                    if (!inside(screen_map_cell(&l, z, GRID_LU_LR), rows,
                                columns))
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
            struct map_layout l = screen_map_layout(rows, columns, GRID_18);
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
    ck_assert_int_eq(screen_map_layout(24, 80, GRID_18).form, FORM_WHOLE);
    ck_assert_int_eq(screen_map_layout(60, 200, GRID_18).form, FORM_WHOLE);
    ck_assert_int_gt(screen_map_layout(60, 200, GRID_18).cell_rows, 1);
    ck_assert_int_eq(screen_map_layout(60, 200, GRID_32).width, GRID_32);
    ck_assert_int_eq(screen_map_layout(24, 80, GRID_32).width, GRID_18);
    ck_assert_int_eq(screen_map_layout(12, 40, GRID_18).form, FORM_SINGLE);
    ck_assert_int_eq(screen_map_layout(10, 30, GRID_18).form, FORM_LIST);
    ck_assert_int_eq(screen_map_layout(5, 20, GRID_18).form, FORM_SENTENCE);
}
END_TEST

TCase *layout_case(void)
{
    TCase *tc = tcase_create("layout");
    tcase_add_test(tc, every_size_gives_areas_on_the_screen);
    tcase_add_test(tc, areas_do_not_overlap_where_all_stand_together);
    tcase_add_test(tc, the_sizes_that_were_promised);
    return tc;
}
