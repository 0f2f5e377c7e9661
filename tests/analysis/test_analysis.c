/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "analysis/row.h"
#include "analysis/summary.h"
#include "support/near.h"
#include "support/run.h"

static const struct provenance rule = {true, "rule", "", "scale a", NULL, 0};
static const struct provenance same = {false, "same", "", "scale a", NULL, 0};
static const struct provenance other = {false, "other", "", "scale b", NULL, 0};

static struct reading stored(enum quantity_id q, double value, int decimals,
                             const struct provenance *p)
{
    struct reading r = reading_computed(q, value, p);
    r.value = (struct number){value, decimals};
    return r;
}

static struct row row_of(enum quantity_id q, const char *unit,
                         struct reading value, struct reading reference)
{
    struct row row = {.quantity = q, .unit = unit_find(unit)};
    row.species.z = 40;
    row_compare(&row, value, reference);
    return row;
}

START_TEST(the_residual_is_exact_to_the_last_digit)
{
    char out[NUMBER_TEXT_MAX];
    struct row row = row_of(QUANTITY_IONIZATION, "eV",
                            reading_computed(QUANTITY_IONIZATION, 5.5, &rule),
                            stored(QUANTITY_IONIZATION, 5.391714996, 9, &same));
    ck_assert_int_eq(row.state, ROW_OK);
    ck_assert_str_eq(number_print_short(row.residual, out), "0.108285004");
    near(row.percent.value, 100 * 0.108285004 / 5.391714996, 0, 1e-6, "%%");
    ck_assert_str_eq(row.reason, "");
}
END_TEST

START_TEST(unlike_definitions_are_marked_and_unlike_scales_not_subtracted)
{
    struct row radius = row_of(QUANTITY_RADIUS, "pm",
                               reading_computed(QUANTITY_RADIUS, 150, &rule),
                               stored(QUANTITY_RADIUS, 140, 0, &other));
    ck_assert_int_eq(radius.state, ROW_OK);
    ck_assert(!radius.like_with_like);
    struct row chi =
        row_of(QUANTITY_ELECTRONEGATIVITY, "1",
               reading_computed(QUANTITY_ELECTRONEGATIVITY, 2.1, &rule),
               stored(QUANTITY_ELECTRONEGATIVITY, 2.2, 2, &other));
    ck_assert_int_eq(chi.state, ROW_OTHER_SCALE);
    ck_assert_str_ne(chi.reason, "");
}
END_TEST

START_TEST(every_gap_gives_its_state_and_reason)
{
    struct reading ok = reading_computed(QUANTITY_RADIUS, 1, &rule);
    struct reading none =
        reading_gap(QUANTITY_RADIUS, READING_MISSING, "not stored", &same);
    struct {
        struct reading value;
        enum row_state state;
    } cases[] = {
        {ok, ROW_NO_REFERENCE},
        {reading_gap(QUANTITY_RADIUS, READING_OUTSIDE, "a", &rule),
         ROW_OUTSIDE_MODEL},
        {reading_gap(QUANTITY_RADIUS, READING_NOT_CONVERGED, "b", &rule),
         ROW_NOT_CONVERGED},
        {reading_gap(QUANTITY_RADIUS, READING_PENDING, "c", &rule),
         ROW_NOT_SOLVED},
        {reading_gap(QUANTITY_RADIUS, READING_MISSING, "d", NULL),
         ROW_NO_REFERENCE},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        struct row row = row_of(QUANTITY_RADIUS, "pm", cases[i].value, none);
        ck_assert_int_eq(row.state, cases[i].state);
        ck_assert_str_ne(row.reason, "");
        ck_assert_str_ne(row_state_id(row.state), "ok");
    }
    struct row only = row_of(QUANTITY_RADIUS, "pm", cases[4].value,
                             stored(QUANTITY_RADIUS, 3, 0, &same));
    ck_assert_int_eq(only.state, ROW_REFERENCE_ONLY);
}
END_TEST

START_TEST(statistics_count_gaps_and_follow_their_definitions)
{
    static const double residuals[] = {0.3, -0.5, 0.25, 0.1};
    struct summary s = {0};
    for (int i = 0; i < 4; i++) {
        struct row row =
            row_of(QUANTITY_RADIUS, "pm",
                   reading_computed(QUANTITY_RADIUS, 2 + residuals[i], &rule),
                   stored(QUANTITY_RADIUS, 2, 0, &same));
        row.species.z = 10 + i;
        summary_add(&s, &row);
    }
    struct row gap =
        row_of(QUANTITY_RADIUS, "pm",
               reading_gap(QUANTITY_RADIUS, READING_OUTSIDE, "x", &rule),
               stored(QUANTITY_RADIUS, 2, 0, &same));
    summary_add(&s, &gap);
    ck_assert_int_eq(s.count, 4);
    ck_assert_int_eq(s.gaps, 1);
    near(summary_mean(&s), 0.15 / 4, 1e-12, 0, "mean");
    near(summary_mean_absolute(&s), 1.15 / 4, 1e-12, 0, "mean absolute");
    near(summary_rms(&s), sqrt((0.09 + 0.25 + 0.0625 + 0.01) / 4), 1e-12, 0,
         "rms");
    near(summary_mean_absolute_percent(&s), 115.0 / 8, 1e-9, 0, "per cent");
    near(s.largest, -0.5, 1e-12, 0, "largest");
    ck_assert_int_eq(s.largest_z, 11);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("analysis");
    TCase *rows = tcase_create("rows");
    tcase_add_test(rows, the_residual_is_exact_to_the_last_digit);
    tcase_add_test(
        rows, unlike_definitions_are_marked_and_unlike_scales_not_subtracted);
    tcase_add_test(rows, every_gap_gives_its_state_and_reason);
    tcase_add_test(rows, statistics_count_gaps_and_follow_their_definitions);
    suite_add_tcase(suite, rows);
    return run_suite(suite);
}
