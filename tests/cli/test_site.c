/* SPDX-License-Identifier: MIT */
/* A species carries its site: what is chosen, printed and exported names it. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "element/site.h"
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

static const char *spin_of_source(const struct csv *source, size_t row)
{
    const char *spin = csv_cell(source, row, "spin");
    return strcmp(spin, "HS") == 0   ? "high"
           : strcmp(spin, "LS") == 0 ? "low"
                                     : "";
}

static bool is_row(const struct csv *out, size_t i, const struct csv *source,
                   size_t row)
{
    return strcmp(csv_cell(out, i, "z"), csv_cell(source, row, "z")) == 0 &&
           strcmp(csv_cell(out, i, "charge"),
                  csv_cell(source, row, "charge")) == 0 &&
           strcmp(csv_cell(out, i, "coordination"),
                  csv_cell(source, row, "coordination")) == 0 &&
           strcmp(csv_cell(out, i, "spin"), spin_of_source(source, row)) == 0;
}

/* R. D. Shannon, Acta Cryst. A32, 751 (1976), as typed by J. D. Van Horn,
 * Electronic table of Shannon ionic radii (2001): every line of the table but
 * those of deuterium, which has no symbol of its own here. */
START_TEST(every_stored_ionic_radius_is_listed_with_its_site)
{
    struct csv source = csv_read_file(SHANNON);
    char *text = printed("list 1-118@all --charge -4..9 --quantity radius "
                         "--model none --format csv");
    struct csv out = csv_read_text(text);
    size_t wanted = 0;
    for (size_t row = 0; row < csv_rows(&source); row++) {
        int found = 0;
        if (strcmp(csv_cell(&source, row, "symbol"), "D") == 0)
            continue;
        wanted++;
        for (size_t i = 0; i < csv_rows(&out); i++) {
            if (!is_row(&out, i, &source, row))
                continue;
            found++;
            ck_assert_msg(csv_number(&out, i, "reference_value") ==
                              csv_number(&source, row, "ionic_radius_pm"),
                          "line %zu", row);
        }
        ck_assert_msg(found == 1, "line %zu of the table: %d rows", row, found);
    }
    ck_assert_uint_eq(csv_rows(&out), wanted);
    csv_free(&out);
    csv_free(&source);
    free(text);
}
END_TEST

/* The same table: Fe3+ VI high spin 64.5, low spin 55; Co3+ VI 54.5 and 61;
 * Sr2+ VI 118, XII 144; Lu3+ VIII 97.7, Y3+ VIII 101.9 pm. */
START_TEST(an_ion_at_two_sites_is_two_species)
{
    static const struct {
        const char *species, *coordination, *spin, *radius;
    } cases[] = {
        {"Fe3+", "VI", "high", "64.5"},
        {"Fe3+@VI", "VI", "high", "64.5"},
        {"Fe3+@vi,low", "VI", "low", "55"},
        {"Co3+@VI,low", "VI", "low", "54.5"},
        {"Co3+@6,HIGH", "VI", "high", "61"},
        {"Co3+@low", "VI", "low", "54.5"},
        {"Sr2+@6", "VI", "", "118"},
        {"Sr2+@XII", "XII", "", "144"},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        char call[128];
        snprintf(call, sizeof call,
                 "list %s --quantity radius --model slater --format csv",
                 cases[i].species);
        char *text = printed(call);
        struct csv csv = csv_read_text(text);
        ck_assert_uint_eq(csv_rows(&csv), 1);
        ck_assert_str_eq(csv_cell(&csv, 0, "coordination"),
                         cases[i].coordination);
        ck_assert_str_eq(csv_cell(&csv, 0, "spin"), cases[i].spin);
        ck_assert_str_eq(csv_cell(&csv, 0, "reference_value"), cases[i].radius);
        ck_assert_str_eq(csv_cell(&csv, 0, "reference_definition"),
                         "effective ionic radius");
        csv_free(&csv);
        free(text);
    }
    char *text = printed("list Co3+@VI,low Co3+@VI,high Co3+@6,low --quantity "
                         "radius --model none");
    const char *low = strstr(text, "\nCo3+@VI,low "),
               *high = strstr(text, "\nCo3+@VI,high ");
    ck_assert(low && high && !strstr(low + 1, "\nCo3+@VI,low "));
    free(text);
    text = printed("compare Lu3+@VIII Y3+@VIII --quantity radius --model none "
                   "--reference ionic_effective_shannon_1976");
    ck_assert_ptr_nonnull(strstr(text, "less Lu3+@VIII"));
    ck_assert_ptr_nonnull(strstr(text, "97.7"));
    ck_assert_ptr_nonnull(strstr(text, "101.9"));
    free(text);
}
END_TEST

/* Y3+ is stored at VI 90, VII 96, VIII 101.9 and IX 107.5 pm; Sr2+ up to XII
 * 144; Be2+ at III 16, IV 27, VI 45. */
START_TEST(a_site_that_is_not_stored_names_the_nearest)
{
    static const char *const cases[][2] = {
        {"Y3+@XII", "XII not stored; VIII 101.9, IX 107.5"},
        {"Be2+@V", "V not stored; IV 27, VI 45"},
        {"Be2+@I", "I not stored; III 16, IV 27"},
        {"Fe2+@VIII,low", "VIII,low not stored; VIII,high 92"},
        {"Fe2+@V", "V not stored; IVSQ,high 64, VI,high 78, VI,low 61"},
        {"Fe5+@VI", "Shannon lists no radius for this ion"},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        char call[128];
        snprintf(call, sizeof call,
                 "list %s --quantity radius --model slater --format csv",
                 cases[i][0]);
        char *text = printed(call);
        struct csv csv = csv_read_text(text);
        ck_assert_str_eq(csv_cell(&csv, 0, "state"), "no-reference");
        ck_assert_str_eq(csv_cell(&csv, 0, "reference_value"), "");
        const char *at = strchr(cases[i][0], '@') + 1;
        ck_assert(strncmp(at, csv_cell(&csv, 0, "coordination"),
                          strcspn(at, ",")) == 0);
        ck_assert_msg(strncmp(csv_cell(&csv, 0, "note"), cases[i][1],
                              strlen(cases[i][1])) == 0,
                      "%s: %s", call, csv_cell(&csv, 0, "note"));
        csv_free(&csv);
        free(text);
    }
}
END_TEST

/* NIST ASD 5.12: Fe 7.9024681(12) eV, measured. */
START_TEST(a_row_names_kind_and_definition_of_its_reference)
{
    char *text = printed("list Fe --quantity ionization --model slater "
                         "--format csv");
    struct csv csv = csv_read_text(text);
    static const char *const cells[][2] = {
        {"coordination", ""},
        {"spin", ""},
        {"definition", "ionization energy"},
        {"uncertainty", ""}, /* the rule states none, so it has no kind */
        {"uncertainty_kind", ""},
        {"reference_definition", "ionization energy"},
        {"reference_kind", "measured"},
        {"reference_uncertainty", "0.0000012"},
        {"suspect", ""},
    };
    for (size_t i = 0; i < sizeof cells / sizeof cells[0]; i++)
        ck_assert_str_eq(csv_cell(&csv, 0, cells[i][0]), cells[i][1]);
    csv_free(&csv);
    free(text);
}
END_TEST

TCase *site_cases(void)
{
    TCase *c = tcase_create("site");
    tcase_set_timeout(c, 60);
    tcase_add_test(c, every_stored_ionic_radius_is_listed_with_its_site);
    tcase_add_test(c, an_ion_at_two_sites_is_two_species);
    tcase_add_test(c, a_site_that_is_not_stored_names_the_nearest);
    tcase_add_test(c, a_row_names_kind_and_definition_of_its_reference);
    return c;
}
