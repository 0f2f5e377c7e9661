/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <math.h>

#include "canvas/scale.h"
#include "canvas/suites.h"

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

TCase *scale_case(void)
{
    TCase *tc = tcase_create("scale");
    tcase_add_test(tc, classes_are_ordered_and_hold_every_value);
    tcase_add_test(tc, a_balance_is_symmetric_and_zero_stands_in_its_middle);
    tcase_add_test(tc, one_value_or_none_make_a_scale_too);
    return tc;
}
