/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "analysis/audit.h"
#include "analysis/comparison.h"
#include "analysis/order.h"
#include "analysis/row.h"
#include "analysis/summary.h"
#include "support/near.h"
#include "support/run.h"

static const struct provenance rule = {.computed = true,
                                       .id = "rule",
                                       .title = "",
                                       .definition = &definition_covalent};
static const struct provenance same = {
    .id = "same", .title = "", .definition = &definition_covalent};
static const struct provenance other = {
    .id = "other", .title = "", .definition = &definition_metallic_12};

/* Scales of electronegativity. */
static const struct provenance pauling = {
    .id = "pauling", .title = "", .definition = &definition_pauling};
static const struct provenance allen = {.computed = true,
                                        .id = "allen",
                                        .title = "",
                                        .definition = &definition_allen};

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
               reading_computed(QUANTITY_ELECTRONEGATIVITY, 2.1, &allen),
               stored(QUANTITY_ELECTRONEGATIVITY, 2.2, 2, &pauling));
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

START_TEST(two_sets_disagree_only_on_one_scale)
{
    struct row row =
        row_of(QUANTITY_RADIUS, "angstrom",
               reading_gap(QUANTITY_RADIUS, READING_MISSING, "none", NULL),
               stored(QUANTITY_RADIUS, 132, 0, &same));
    row_disagree(&row, stored(QUANTITY_RADIUS, 116, 0, &other));
    ck_assert(row.disagrees);
    near(row.disagreement.value, -0.16, 1e-12, 0, "in the row's unit");
    near(row.disagreement_percent.value, -100.0 * 16 / 132, 1e-5, 0, "%%");
    struct row sets = row_of_sets(&row);
    ck_assert_int_eq(sets.state, ROW_OK);
    ck_assert(!sets.like_with_like);
    near(sets.residual.value, -0.16, 1e-12, 0, "as a residual");
    row = row_of(
        QUANTITY_ELECTRONEGATIVITY, "1",
        reading_gap(QUANTITY_ELECTRONEGATIVITY, READING_MISSING, "none", NULL),
        stored(QUANTITY_ELECTRONEGATIVITY, 1.83, 2, &pauling));
    row_disagree(&row, stored(QUANTITY_ELECTRONEGATIVITY, 1.64, 2, &allen));
    ck_assert(!row.disagrees);
    ck_assert_str_ne(row_of_sets(&row).reason, "");
    row_disagree(&row, reading_gap(QUANTITY_ELECTRONEGATIVITY, READING_MISSING,
                                   "why", &same));
    ck_assert(!row.disagrees);
    ck_assert_str_eq(row_of_sets(&row).reason, "why");
}
END_TEST

START_TEST(rows_are_sorted_by_size_and_gaps_come_last)
{
    static const double residuals[] = {0.3, -0.5, 0, 0.5, 0.1};
    static const int want[] = {2, 4, 1, 5, 3}; /* z; 3 has no residual */
    struct row rows[5];
    struct status st = status_ok();
    for (int i = 0; i < 5; i++) {
        rows[i] = row_of(
            QUANTITY_RADIUS, "pm",
            i == 2 ? reading_gap(QUANTITY_RADIUS, READING_OUTSIDE, "x", &rule)
                   : reading_computed(QUANTITY_RADIUS, 2 + residuals[i], &rule),
            stored(QUANTITY_RADIUS, 2, 0, &same));
        rows[i].species.z = i + 1;
    }
    ck_assert(order_rows(rows, 5, ROW_ORDER_RESIDUAL, &st));
    for (int i = 0; i < 5; i++)
        ck_assert_int_eq(rows[i].species.z, want[i]);
    ck_assert(order_rows(rows, 0, ROW_ORDER_VALUE, &st));
}
END_TEST

/* Five rows whose order is another one by each number; the fourth has no model
 * value, the fifth no second set. */
START_TEST(every_order_is_by_its_own_number)
{
    static const double value[] = {10, 30, 20, 0, 25};
    static const double reference[] = {8, 33, 19, 9, 26};
    static const double against[] = {8.5, 30, 12, 11.5, 0};
    static const int want[ROW_ORDER_COUNT][5] = {
        [ROW_ORDER_VALUE] = {2, 5, 3, 1, 4},
        [ROW_ORDER_RESIDUAL] = {2, 1, 3, 5, 4},             /* 2 -3 1 -1 */
        [ROW_ORDER_PERCENT] = {1, 2, 3, 5, 4},              /* 25 -9 5 -4 */
        [ROW_ORDER_DISAGREEMENT] = {3, 2, 4, 1, 5},         /* .5 -3 -7 2.5 */
        [ROW_ORDER_DISAGREEMENT_PERCENT] = {3, 4, 2, 1, 5}, /* 6 -9 -37 28 */
    };
    struct status st = status_ok();
    for (int o = 0; o < ROW_ORDER_COUNT; o++) {
        struct row rows[5];
        for (int i = 0; i < 5; i++) {
            rows[i] = row_of(
                QUANTITY_RADIUS, "pm",
                i == 3
                    ? reading_gap(QUANTITY_RADIUS, READING_OUTSIDE, "x", &rule)
                    : reading_computed(QUANTITY_RADIUS, value[i], &rule),
                stored(QUANTITY_RADIUS, reference[i], 0, &same));
            rows[i].species.z = i + 1;
            row_disagree(
                &rows[i],
                i == 4
                    ? reading_gap(QUANTITY_RADIUS, READING_MISSING, "y", &other)
                    : stored(QUANTITY_RADIUS, against[i], 1, &other));
        }
        ck_assert(order_rows(rows, 5, (enum row_order)o, &st));
        for (int i = 0; i < 5; i++)
            ck_assert_msg(rows[i].species.z == want[o][i], "%s, place %d: %d",
                          row_order_id((enum row_order)o), i,
                          rows[i].species.z);
    }
}
END_TEST

/* Another less the first, in per cent of the first. */
START_TEST(differences_are_against_the_first)
{
    struct comparison_line line = {.quantity = QUANTITY_RADIUS};
    struct difference d;
    line.readings[0] = stored(QUANTITY_RADIUS, 132, 0, &same);
    line.readings[1] = stored(QUANTITY_RADIUS, 116.5, 1, &same);
    line.readings[2] =
        reading_gap(QUANTITY_RADIUS, READING_MISSING, "none", &same);
    line.readings[3] = stored(QUANTITY_RADIUS, 140, 0, &same);
    ck_assert(comparison_difference(&line, 1, &d));
    near(d.value.value, -15.5, 1e-12, 0, "second");
    ck_assert(d.has_percent);
    near(d.percent.value, -100.0 * 15.5 / 132.0, 0, 1e-6, "second, %%");
    ck_assert(comparison_difference(&line, 3, &d));
    near(d.value.value, 8.0, 1e-12, 0, "fourth");
    near(d.percent.value, 100.0 * 8.0 / 132.0, 0, 1e-6, "fourth, %%");
    ck_assert(!comparison_difference(&line, 0, &d));
    ck_assert(!comparison_difference(&line, 2, &d));
    /* of a negative first value per cent are of its size, of zero none */
    line.readings[0] = stored(QUANTITY_RADIUS, -40, 0, &same);
    ck_assert(comparison_difference(&line, 3, &d));
    near(d.percent.value, 450.0, 1e-9, 0, "of a negative one");
    line.readings[0] = stored(QUANTITY_RADIUS, 0, 0, &same);
    ck_assert(comparison_difference(&line, 3, &d) && !d.has_percent);
}
END_TEST

/* Adds model + residual against 2 for z = first … last. */
static void add_run(struct audit *audit, const struct provenance *model,
                    int first, int last, double residual)
{
    struct status st = status_ok();
    for (int z = first; z <= last; z++) {
        struct row row =
            row_of(QUANTITY_RADIUS, "pm",
                   reading_computed(QUANTITY_RADIUS, 2 + residual, model),
                   stored(QUANTITY_RADIUS, 2, 0, &same));
        row.species.z = z;
        ck_assert(audit_add(audit, &row, &st));
    }
}

START_TEST(an_audit_leaves_one_out_and_ranks_on_common_species)
{
    static const struct provenance good = {.computed = true,
                                           .id = "good",
                                           .title = "",
                                           .definition = &definition_covalent};
    static const struct provenance few = {.computed = true,
                                          .id = "few",
                                          .title = "",
                                          .definition = &definition_covalent};
    struct audit audit = {0};
    struct audit_part all = {AUDIT_ALL, 0};
    struct audit_part d = {AUDIT_BLOCK, 'd'};
    add_run(&audit, &rule, 21, 30, 0.5);
    add_run(&audit, &good, 25, 30, -0.25);
    add_run(&audit, &few, 29, 30, 0.01);
    ck_assert_int_eq(audit.count, 3);
    struct summary s = audit_summary(&audit.series[0], d);
    ck_assert_int_eq(s.count, 10);
    ck_assert_int_eq(audit_summary_without(&audit.series[0], d, 26).count, 9);
    ck_assert_int_eq(audit_summary_without(&audit.series[0], d, 40).count, 10);
    struct audit_rank rank = audit_rank(&audit, QUANTITY_RADIUS, &same, all);
    ck_assert_int_eq(rank.count, 2); /* two of ten are too few */
    ck_assert_int_eq(rank.species, 6);
    ck_assert_ptr_eq(audit.series[rank.series[0]].value, &good);
    near(rank.mean_absolute[0], 0.25, 1e-12, 0, "best");
    near(rank.mean_absolute[1], 0.5, 1e-12, 0, "second");
    struct audit_part p = {AUDIT_GROUP, 12};
    rank = audit_rank(&audit, QUANTITY_RADIUS, &same, p);
    ck_assert_int_eq(rank.count, 3); /* in group 12 all have one */
    ck_assert_ptr_eq(audit.series[rank.series[0]].value, &few);
    ck_assert_int_eq(audit_rank(&audit, QUANTITY_RADIUS, &other, all).count, 0);
    struct audit_part parts[AUDIT_PARTS_MAX];
    ck_assert_int_eq(audit_parts(&audit, QUANTITY_RADIUS, 0, parts),
                     1 + 1 + 1 + 10); /* all, d, period 4, groups 3 to 12 */
    ck_assert_int_eq(audit_parts(&audit, QUANTITY_ZEFF, 0, parts), 1);
    audit_clear(&audit);
    audit_clear(&audit);
}
END_TEST

/* A residual against another thing is no error, one against the model's own
 * calculation no test: neither makes a model best. */
START_TEST(no_model_is_best_across_unlike_definitions)
{
    static const struct provenance near_by = {.computed = true,
                                              .id = "near",
                                              .title = "",
                                              .definition =
                                                  &definition_metallic_12};
    static const struct provenance copy = {.computed = true,
                                           .id = "copy",
                                           .title = "",
                                           .definition = &definition_covalent};
    struct audit audit = {0};
    struct audit_part all = {AUDIT_ALL, 0};
    struct status st = status_ok();
    add_run(&audit, &rule, 21, 30, 0.5);
    add_run(&audit, &near_by, 21, 30, 0.01);
    for (int z = 21; z <= 30; z++) {
        struct row row = row_of(QUANTITY_RADIUS, "pm",
                                reading_computed(QUANTITY_RADIUS, 2, &copy),
                                stored(QUANTITY_RADIUS, 2, 0, &same));
        row.species.z = z;
        row.repeats = true;
        ck_assert(audit_add(&audit, &row, &st));
    }
    struct audit_rank rank = audit_rank(&audit, QUANTITY_RADIUS, &same, all);
    ck_assert_int_eq(rank.count, 1);
    ck_assert_ptr_eq(audit.series[rank.series[0]].value, &rule);
    ck_assert_int_eq(rank.unlike, 1);
    ck_assert_int_eq(rank.repeats, 1);
    audit_clear(&audit);
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
    tcase_add_test(rows, two_sets_disagree_only_on_one_scale);
    tcase_add_test(rows, rows_are_sorted_by_size_and_gaps_come_last);
    tcase_add_test(rows, no_model_is_best_across_unlike_definitions);
    tcase_add_test(rows, every_order_is_by_its_own_number);
    tcase_add_test(rows, differences_are_against_the_first);
    tcase_add_test(rows, an_audit_leaves_one_out_and_ranks_on_common_species);
    suite_add_tcase(suite, rows);
    return run_suite(suite);
}
