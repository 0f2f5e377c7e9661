/* SPDX-License-Identifier: MIT */
/* For every element, quantity, closed model and reference set: the residual is
 * the difference of the printed numbers to the last digit, and where there is
 * none the fields are empty and the state says why. */
#include <math.h>
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "decimal.h"
#include "model/registry.h"
#include "refdata/catalogue.h"
#include "study/reference.h"
#include "suites.h"
#include "support/csv.h"
#include "support/program.h"

START_TEST(the_arithmetic_of_the_test_is_right)
{
    static const struct {
        const char *a, *b, *difference;
    } cases[] = {
        {"1.5", "2.25", "-0.75"},
        {"-1.5", "2.25", "-3.75"},
        {"1.5", "-2.25", "3.75"},
        {"-1.5", "-2.25", "0.75"},
        {"0", "0.001", "-0.001"},
        {"0", "-3", "3"},
        {"3", "0", "3"},
        {"-3", "0.0", "-3"},
        {"5", "5.000", "0"},
        {"1000000", "0.000000000000001", "999999.999999999999999"},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++)
        ck_assert_int_eq(
            decimal_compare(decimal_subtract(decimal_read(cases[i].a),
                                             decimal_read(cases[i].b)),
                            decimal_read(cases[i].difference)),
            0);
}
END_TEST

/* A value has a number at 7 significant digits or more, or is shorter because
 * it ends there. */
static void check_row(const struct csv *csv, size_t i, const char *call)
{
    const char *value = csv_cell(csv, i, "value");
    const char *reference = csv_cell(csv, i, "reference_value");
    const char *residual = csv_cell(csv, i, "residual");
    const char *percent = csv_cell(csv, i, "residual_percent");
    const char *state = csv_cell(csv, i, "state");
    bool ok = strcmp(state, "ok") == 0;
    ck_assert_msg(ok == (residual[0] != '\0'), "%s row %zu: %s", call, i,
                  state);
    ck_assert_msg(ok || percent[0] == '\0', "%s row %zu", call, i);
    ck_assert_msg(strcmp(state, "outside-model") != 0 || value[0] == '\0',
                  "%s row %zu: outside, but %s", call, i, value);
    ck_assert_msg(strcmp(state, "no-reference") != 0 || reference[0] == '\0',
                  "%s row %zu: no reference, but %s", call, i, reference);
    ck_assert_msg(strcmp(state, "not-solved") != 0, "%s row %zu", call, i);
    if (!ok)
        return;
    struct decimal want =
        decimal_subtract(decimal_read(value), decimal_read(reference));
    ck_assert_msg(decimal_compare(want, decimal_read(residual)) == 0,
                  "%s, %s: %s - %s is not %s", call, csv_cell(csv, i, "symbol"),
                  value, reference, residual);
    double share =
        100.0 * strtod(residual, NULL) / fabs(strtod(reference, NULL));
    ck_assert_msg(fabs(share - strtod(percent, NULL)) <=
                      1e-6 * fabs(share) + 1e-9,
                  "%s row %zu: %s is not %g per cent", call, i, percent, share);
}

/* Runs a list and checks its rows; gives how many have a residual. */
static size_t check_list(const char *call)
{
    struct program_result r = program_call(OUTERSHELL, call);
    ck_assert_msg(r.status == 0 && r.err_size == 0, "%s: %s", call, r.err);
    struct csv csv = csv_read_text(r.out);
    size_t compared = 0;
    ck_assert_uint_gt(csv_rows(&csv), 0);
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        check_row(&csv, i, call);
        compared += csv_cell(&csv, i, "residual")[0] != '\0';
    }
    program_free(&r);
    csv_free(&csv);
    return compared;
}

/* "--model a,b" of the closed models that give a quantity; empty when none
 * does. */
static const char *closed_models(enum quantity_id quantity, char *out,
                                 size_t size)
{
    struct text t = text_over(out, size);
    for (int m = 0; m < model_count(); m++)
        if (model_at(m)->closed &&
            model_gives(model_at(m), quantity))
            text_addf(&t, "%s%s", t.length ? "," : " --model ",
                      model_at(m)->id);
    return out;
}

START_TEST(residuals_are_exact_for_every_element_model_and_reference_set)
{
    static struct reference_list list;
    static const char *const more[] = {"",
                                       " --charge 1",
                                       " --charge 2",
                                       " --charge 3",
                                       " --unit angstrom,hartree",
                                       " --unit bohr,kJ/mol --charge 1",
                                       " --unit cm-1"};
    size_t compared = 0;
    int calls = 0;
    reference_list_fill(&list, catalogue_builtin(), NULL);
    ck_assert_int_gt(list.count, 20);
    for (int i = 0; i < list.count; i++) {
        const struct reference *ref = &list.items[i];
        enum dimension d = quantity_at(ref->quantity)->dimension;
        for (size_t m = 0; m < sizeof more / sizeof more[0]; m++) {
            char models[128];
            char call[512];
            bool both = strchr(more[m], ',') != NULL;
            bool energy = strstr(more[m], "cm-1") != NULL;
            if ((both || energy) && d != DIMENSION_ENERGY)
                continue;
            if (!closed_models(ref->quantity, models, sizeof models)[0])
                continue;
            snprintf(call, sizeof call,
                     "list --format csv --quantity %s%s --reference %s%s%s",
                     quantity_at(ref->quantity)->id, both ? ",radius" : "",
                     ref->provenance->id, models, more[m]);
            compared += check_list(call);
            calls++;
        }
    }
    ck_assert_int_gt(calls, 60);
    ck_assert_uint_gt(compared, 5000);
}
END_TEST

TCase *residual_cases(void)
{
    TCase *c = tcase_create("residual");
    tcase_add_test(c, the_arithmetic_of_the_test_is_right);
    tcase_add_test(
        c, residuals_are_exact_for_every_element_model_and_reference_set);
    return c;
}
