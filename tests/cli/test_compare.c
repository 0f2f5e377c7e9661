/* SPDX-License-Identifier: MIT */
/* `compare` and what it leaves out or in. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "suites.h"
#include "support/csv.h"
#include "support/program.h"

/* What a call prints; aborts when it fails. The caller frees it. */
static char *printed(const char *call)
{
    struct program_result r = program_call(OUTERSHELL, call);
    ck_assert_msg(r.status == 0, "%s: %s", call, r.err);
    char *out = r.out;
    r.out = NULL;
    program_free(&r);
    return out;
}

/* Each number of one element stands in its text as in its CSV. The stored
 * energy: NIST ASD 5.12, Fe 7.9024681(12) eV. */
START_TEST(one_element_has_its_numbers)
{
    char *text = printed("compare Fe --model shells,slater");
    char *written = printed("compare Fe --model shells,slater --format csv");
    struct csv csv = csv_read_text(written);
    ck_assert_ptr_nonnull(strstr(text, "7.9024681(12)"));
    ck_assert_ptr_nonnull(strstr(text, "covalent_cordero_2008"));
    for (size_t i = 0; i < csv_rows(&csv); i++)
        ck_assert_msg(strstr(text, csv_cell(&csv, i, "source_id")), "%s",
                      csv_cell(&csv, i, "source_id"));
    ck_assert_ptr_null(strstr(text, "less Fe"));
    csv_free(&csv);
    free(text);
    free(written);
}
END_TEST

/* --model none: what is stored, and nothing that is computed. */
START_TEST(stored_values_alone_are_a_view_of_their_own)
{
    static const char *const calls[] = {
        "compare Fe Co --model none --format csv",
        "list Fe Co --model none --format csv",
    };
    char *all = printed("compare Fe Co --format csv");
    struct csv csv = csv_read_text(all);
    size_t stored = 0;
    for (size_t i = 0; i < csv_rows(&csv); i++)
        stored += strcmp(csv_cell(&csv, i, "source_kind"), "reference") == 0;
    csv_free(&csv);
    free(all);
    for (int c = 0; c < 2; c++) {
        char *out = printed(calls[c]);
        csv = csv_read_text(out);
        ck_assert_uint_eq(csv_rows(&csv), c == 0 ? stored : 6);
        for (size_t i = 0; i < csv_rows(&csv); i++)
            ck_assert_str_eq(c == 0 ? csv_cell(&csv, i, "source_kind")
                                    : csv_cell(&csv, i, "state"),
                             c == 0 ? "reference" : "reference-only");
        csv_free(&csv);
        free(out);
    }
}
END_TEST

/* The same site however it is written. R. D. Shannon, Acta Cryst. A32, 751
 * (1976), effective ionic radii: Ga3+ VI 62, IV 47 pm; Cu2+ IVSQ 57 pm. */
START_TEST(a_coordination_is_taken_as_people_write_it)
{
    static const struct {
        const char *species, *site, *radius;
    } cases[] = {
        {"Ga3+", "VI", "62.0"}, {"Ga3+", "vi", "62.0"}, {"Ga3+", "6", "62.0"},
        {"Ga3+", "IV", "47"},   {"Ga3+", "4", "47"},    {"Cu2+", "IVSQ", "57"},
        {"Cu2+", "ivsq", "57"}, {"Cu2+", "4SQ", "57"},  {"Cu2+", "IVsq", "57"},
        {"Cu2+", "4sq", "57"},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        char call[256];
        snprintf(call, sizeof call,
                 "list %s --quantity radius --model none --reference "
                 "ionic_effective_shannon_1976 --coordination %s --format csv",
                 cases[i].species, cases[i].site);
        char *out = printed(call);
        struct csv csv = csv_read_text(out);
        ck_assert_msg(csv_number(&csv, 0, "reference_value") ==
                          strtod(cases[i].radius, NULL),
                      "%s", call);
        csv_free(&csv);
        free(out);
    }
}
END_TEST

TCase *compare_cases(void)
{
    TCase *c = tcase_create("compare");
    tcase_set_timeout(c, 120);
    tcase_add_test(c, one_element_has_its_numbers);
    tcase_add_test(c, stored_values_alone_are_a_view_of_their_own);
    tcase_add_test(c, a_coordination_is_taken_as_people_write_it);
    return c;
}
