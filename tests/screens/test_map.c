/* SPDX-License-Identifier: MIT */
/* The screens Map and Compare as events in and a canvas out. */
#include <check.h>
#include <stdlib.h>
#include <string.h>

#include "app/desk.h"
#include "app/desk_keys.h"
#include "screens/map_layout.h"
#include "screens/suites.h"
#include "support/golden.h"
#include "support/run.h"

static void check_golden(const char *name)
{
    settle();
    char *text = drawn();
    golden_check(name, text);
    free(text);
}

START_TEST(the_map_at_80x24)
{
    check_golden("map-80x24.txt");
}
END_TEST

START_TEST(the_map_of_residuals_at_200x60)
{
    resize(60, 200);
    type("vv");
    check_golden("map-residual-200x60.txt");
}
END_TEST

START_TEST(the_map_at_40x12_and_its_pane)
{
    resize(12, 40);
    check_golden("map-40x12.txt");
    key(KEY_CODE_ENTER);
    check_golden("pane-40x12.txt");
}
END_TEST

START_TEST(the_list_at_30x10)
{
    resize(10, 30);
    check_golden("list-30x10.txt");
}
END_TEST

START_TEST(three_species_compared_at_100x40)
{
    resize(40, 100);
    static const int z[] = {40, 72, 22};
    for (int i = 0; i < 3; i++) {
        session_select(&app.session, z[i]);
        type("p");
    }
    type("c");
    check_golden("compare-100x40.txt");
}
END_TEST

START_TEST(every_symbol_stands_on_the_map_at_80x24)
{
    char *text = drawn();
    for (int z = 1; z <= Z_MAX; z++) {
        struct map_layout l = screen_map_layout(24, 80, GRID_18);
        struct area a = screen_map_cell(&l, z, GRID_LU_LR);
        const char *symbol = element_at(z)->symbol;
        for (int i = 0; symbol[i]; i++)
            ck_assert_msg(
                canvas.cells[a.row * 80 + a.column + 1 + i].character ==
                    (unsigned char)symbol[i],
                "%s", symbol);
    }
    ck_assert_ptr_nonnull(strstr(text, "keys"));
    ck_assert_ptr_nonnull(strstr(text, "quit"));
    free(text);
}
END_TEST

START_TEST(the_cursor_stands_on_the_selection)
{
    type("Og");
    key(KEY_CODE_ENTER);
    app_draw(&app, &canvas);
    struct map_layout l = screen_map_layout(24, 80, GRID_18);
    struct area a = screen_map_cell(&l, 118, GRID_LU_LR);
    ck_assert_int_eq(canvas.cursor_row, a.row);
    ck_assert_int_eq(canvas.cursor_column, a.column + 1);
}
END_TEST

/* The second set belongs to the chosen quantity: below it, where others are
 * listed, it has no place, least of all in their units. */
START_TEST(a_second_set_stays_with_its_quantity)
{
    app.session.choice.quantity = QUANTITY_ELECTRONEGATIVITY;
    app.session.choice.against = reference_find(
        study_references(app.session.study), "electronegativity_allen_2000");
    ck_assert_ptr_nonnull(app.session.choice.against);
    app.session.choice.units[DIMENSION_ENERGY] = unit_find("cm-1");
    resize(60, 200);
    settle();
    ck_assert(shows("I, cm-1"));
}
END_TEST

START_TEST(a_coordination_is_never_cut_to_another)
{
    type("Co");
    key(KEY_CODE_ENTER);
    type("++");
    app.session.choice.quantity = QUANTITY_RADIUS;
    app.session.choice.reference = reference_find(
        study_references(app.session.study), "ionic_effective_shannon_1976");
    settle();
    ck_assert(shows("coordination VI; high spin"));
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("map");
    suite_add_tcase(suite, layout_case());
    suite_add_tcase(suite, agree_case());
    TCase *tc = tcase_create("map");
    tcase_add_checked_fixture(tc, open_app, close_app);
    tcase_add_test(tc, the_map_at_80x24);
    tcase_add_test(tc, the_map_of_residuals_at_200x60);
    tcase_add_test(tc, the_map_at_40x12_and_its_pane);
    tcase_add_test(tc, the_list_at_30x10);
    tcase_add_test(tc, three_species_compared_at_100x40);
    tcase_add_test(tc, every_symbol_stands_on_the_map_at_80x24);
    tcase_add_test(tc, the_cursor_stands_on_the_selection);
    tcase_add_test(tc, a_second_set_stays_with_its_quantity);
    tcase_add_test(tc, a_coordination_is_never_cut_to_another);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
