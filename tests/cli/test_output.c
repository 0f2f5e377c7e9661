/* SPDX-License-Identifier: MIT */
/* What the commands print. */
#include <cjson/cJSON.h>
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "element/element.h"
#include "suites.h"
#include "support/csv.h"
#include "support/near.h"
#include "support/program.h"

#define CLOSED "--model shells,slater,clementi"

/* Output of a call that must do well and say nothing else. */
static struct program_result done(const char *line)
{
    struct program_result r = program_call(OUTERSHELL, line);
    ck_assert_msg(r.status == 0 && r.err_size == 0, "%s: %d: %s", line,
                  r.status, r.err);
    return r;
}

static struct csv csv_of(const char *line)
{
    struct program_result r = done(line);
    struct csv csv = csv_read_text(r.out);
    program_free(&r);
    return csv;
}

static void same_output(const char *a, const char *b)
{
    struct program_result x = done(a);
    struct program_result y = done(b);
    ck_assert_msg(strcmp(x.out, y.out) == 0, "%s\n%s\ndiffer", a, b);
    program_free(&x);
    program_free(&y);
}

/* Shell counting along the second period: common practice, no source. */
START_TEST(shell_counting_rises_by_one_half_from_li_to_f)
{
    static const char *const want[] = {"1", "1.5", "2", "2.5", "3", "3.5", "4"};
    struct csv csv =
        csv_of("list Li-F --quantity zeff --model shells --format csv");
    ck_assert_uint_eq(csv_rows(&csv), 7);
    for (size_t i = 0; i < 7; i++)
        ck_assert_str_eq(csv_cell(&csv, i, "value"), want[i]);
    csv_free(&csv);
}
END_TEST

/* Z_eff of Li 2s from its ionization energy is 1.26: common practice, no
 * source. */
START_TEST(z_eff_of_lithium_from_its_ionization_energy_is_1_26)
{
    struct csv csv = csv_of("list Li -q zeff -m shells -f csv "
                            "--reference zeff_from_ionization");
    near(csv_number(&csv, 0, "reference_value"), 1.26, 0.005, 0, "Li 2s");
    ck_assert_str_eq(csv_cell(&csv, 0, "subshell"), "2s");
    csv_free(&csv);
}
END_TEST

/* tests/cli/data/ionization_nist_first.csv: first ionization energies of NIST
 * ASD 5.12, doi 10.18434/T4W30F, digits as served. */
START_TEST(first_ionization_energies_are_those_of_nist_digit_for_digit)
{
    struct csv nist = csv_read_file(NIST_FIRST);
    struct csv csv = csv_of("list -q ionization -m shells -f csv");
    size_t stored = 0;
    ck_assert_uint_eq(csv_rows(&csv), Z_MAX);
    ck_assert_uint_eq(csv_rows(&nist), 108);
    for (size_t i = 0; i < Z_MAX; i++) {
        const char *z = csv_cell(&csv, i, "z");
        ck_assert_int_eq(atoi(z), (int)i + 1);
        bool has = stored < csv_rows(&nist) &&
                   strcmp(csv_cell(&nist, stored, "z"), z) == 0;
        const char *value = csv_cell(&csv, i, "reference_value");
        const char *u = csv_cell(&csv, i, "reference_uncertainty");
        ck_assert_str_eq(csv_cell(&csv, i, "state"),
                         has ? "ok" : "no-reference");
        ck_assert_str_eq(value,
                         has ? csv_cell(&nist, stored, "energy_eV") : "");
        ck_assert_str_eq(u,
                         has ? csv_cell(&nist, stored, "uncertainty_eV") : "");
        stored += has;
    }
    ck_assert_uint_eq(stored, 108);
    csv_free(&csv);
    csv_free(&nist);
}
END_TEST

START_TEST(csv_has_the_agreed_heading_and_ends_its_lines_as_rfc_4180)
{
    static const char heading[] =
        "z,symbol,name,charge,coordination,spin,configuration,subshell,"
        "quantity,unit,model,definition,value,uncertainty,uncertainty_kind,"
        "state,note,reference_set,reference_definition,reference_kind,"
        "reference_value,reference_uncertainty,residual,residual_percent,"
        "suspect,model_source,reference_source,version\r\n";
    struct program_result r = done("list Fe " CLOSED " --format csv");
    ck_assert_int_eq(strncmp(r.out, heading, strlen(heading)), 0);
    for (const char *p = r.out; *p; p++)
        ck_assert_msg((*p != '\n' || p[-1] == '\r') &&
                          (*p != '\r' || p[1] == '\n'),
                      "a line end at byte %td", p - r.out);
    ck_assert(utf8_valid(r.out, r.out_size));
    program_free(&r);
}
END_TEST

static void compare_field(const cJSON *json, const char *text, const char *name)
{
    if (cJSON_IsNull(json))
        ck_assert_msg(text[0] == '\0', "%s: null, but %s", name, text);
    else if (cJSON_IsNumber(json))
        ck_assert_msg(json->valuedouble == strtod(text, NULL), "%s: %s", name,
                      text);
    else
        ck_assert_str_eq(cJSON_GetStringValue(json), text);
}

/* JSON and CSV of one call: the same rows and fields in the same order. */
static void check_same_fields(const char *call, const char *array)
{
    char line[256];
    snprintf(line, sizeof line, "%s --format csv", call);
    struct csv csv = csv_of(line);
    snprintf(line, sizeof line, "%s --format json", call);
    struct program_result r = done(line);
    const char *end;
    cJSON *json = cJSON_ParseWithOpts(r.out, &end, 0);
    ck_assert_ptr_nonnull(json);
    ck_assert_str_eq(end, "\n");
    ck_assert(cJSON_GetObjectItemCaseSensitive(json, "schema")->valueint == 1);
    const cJSON *rows = cJSON_GetObjectItemCaseSensitive(json, array);
    ck_assert_int_eq(cJSON_GetArraySize(rows), (int)csv_rows(&csv));
    ck_assert_uint_gt(csv_rows(&csv), 0);
    size_t i = 0;
    const cJSON *row;
    cJSON_ArrayForEach(row, rows)
    {
        const cJSON *field = row->child;
        for (size_t c = 0; c < csv.columns; c++, field = field->next) {
            ck_assert_ptr_nonnull(field);
            ck_assert_str_eq(field->string, csv.cells[c]);
            compare_field(field, csv_cell(&csv, i, csv.cells[c]), csv.cells[c]);
        }
        i++;
    }
    cJSON_Delete(json);
    program_free(&r);
    csv_free(&csv);
}

START_TEST(json_carries_the_fields_of_csv)
{
    check_same_fields("list " CLOSED, "rows");
    check_same_fields("list -q affinity,polarizability,isodensity", "rows");
    check_same_fields("list --charge 3 --unit kJ/mol,angstrom " CLOSED, "rows");
    check_same_fields("compare Fe3+ Al3+ O Xe " CLOSED, "comparison");
    check_same_fields("sources", "sources");
}
END_TEST

/* A locale with a decimal comma is made for the purpose where that can be
 * done; else the program sees the C locale, as a user there would. */
START_TEST(no_locale_brings_a_decimal_comma)
{
    static const char *const calls[] = {
        "list " CLOSED " --format csv", "list Fe --format json " CLOSED,
        "list period:4 " CLOSED, "compare Fe Cr " CLOSED};
    char folder[] = "/tmp/outershell-locale-XXXXXX";
    char place[64];
    char script[256];
    ck_assert_ptr_nonnull(mkdtemp(folder));
    snprintf(place, sizeof place, "LOCPATH=%s", folder);
    snprintf(script, sizeof script,
             "localedef -i de_DE -f UTF-8 %s/de_DE.UTF-8 >%s/log 2>&1", folder,
             folder);
    struct program maker = {
        .path = "/bin/sh", .count = 2, .arguments = {"-c", script}};
    struct program_result made = program_run(&maker);
    program_free(&made);
    const char *const german[] = {"LC_ALL=de_DE.UTF-8", place, NULL};
    static const char *const plain[] = {"LC_ALL=C", NULL};
    for (size_t i = 0; i < sizeof calls / sizeof calls[0]; i++) {
        char store[512];
        struct program p = {.path = OUTERSHELL, .environment = plain};
        program_split(&p, calls[i], store, sizeof store);
        struct program_result a = program_run(&p);
        p.environment = german;
        struct program_result b = program_run(&p);
        ck_assert_int_eq(a.status, 0);
        ck_assert_str_eq(a.out, b.out);
        program_free(&a);
        program_free(&b);
    }
    snprintf(script, sizeof script, "rm -r %s", folder);
    made = program_run(&maker);
    ck_assert_int_eq(made.status, 0);
    program_free(&made);
}
END_TEST

START_TEST(the_same_choice_in_other_words_prints_the_same)
{
    same_output("list period:3 " CLOSED " -f csv",
                "list Na-Ar " CLOSED " -f csv");
    same_output("list Fe " CLOSED, "list 26 iron Fe IRON " CLOSED);
    same_output("list Fe3+ " CLOSED " -f csv",
                "list Fe --charge 3 " CLOSED " -f csv");
    same_output("list Fe " CLOSED " -f csv",
                "list Fe --configuration '[Ar] 4s2 3d6' " CLOSED " -f csv");
    same_output("list Fe " CLOSED " -f csv",
                "--output - list Fe -fcsv -qzeff,radius,ionization --charge 0 "
                "--unit pm,eV " CLOSED);
    same_output("list " CLOSED " -f csv", "list 1-118 " CLOSED " -f csv");
}
END_TEST

START_TEST(rows_and_lines_come_in_the_order_in_which_they_were_asked_for)
{
    struct csv csv = csv_of("list Fe Al -q ionization,zeff -m slater,shells "
                            "-f csv");
    static const char *const want[] = {
        "Fe ionization slater", "Fe ionization shells", "Fe zeff slater",
        "Fe zeff shells",       "Al ionization slater", "Al ionization shells",
        "Al zeff slater",       "Al zeff shells"};
    ck_assert_uint_eq(csv_rows(&csv), 8);
    for (size_t i = 0; i < 8; i++) {
        char got[64];
        snprintf(got, sizeof got, "%s %s %s", csv_cell(&csv, i, "symbol"),
                 csv_cell(&csv, i, "quantity"), csv_cell(&csv, i, "model"));
        ck_assert_str_eq(got, want[i]);
    }
    csv_free(&csv);
    csv = csv_of("compare Fe Al -q ionization,zeff -m slater -f csv");
    ck_assert_str_eq(csv_cell(&csv, 0, "quantity"), "ionization");
    ck_assert_str_eq(csv_cell(&csv, 0, "symbol"), "Fe");
    ck_assert_str_eq(csv_cell(&csv, 1, "symbol"), "Al");
    ck_assert_str_eq(csv_cell(&csv, csv_rows(&csv) - 1, "quantity"), "zeff");
    csv_free(&csv);
}
END_TEST

START_TEST(names_are_read_from_standard_input_one_per_line)
{
    struct program p = {.path = OUTERSHELL,
                        .input = "Fe\n\n  iron \r\nCr3+\nperiod:1"};
    char store[256];
    program_split(&p, "list - V " CLOSED " -f csv", store, sizeof store);
    struct program_result a = program_run(&p);
    struct program_result b = done("list Fe Cr3+ H He V " CLOSED " -f csv");
    ck_assert_int_eq(a.status, 0);
    ck_assert_str_eq(a.out, b.out);
    program_free(&a);
    program_free(&b);
}
END_TEST

/* No model gives an affinity: the stored value stands alone. */
START_TEST(a_quantity_without_a_model_is_listed_by_its_reference)
{
    struct csv csv = csv_of("list Fe -q zeff,affinity -m slater -f csv");
    ck_assert_uint_eq(csv_rows(&csv), 2);
    ck_assert_str_eq(csv_cell(&csv, 1, "state"), "reference-only");
    ck_assert_str_eq(csv_cell(&csv, 1, "model"), "");
    ck_assert_str_ne(csv_cell(&csv, 1, "reference_value"), "");
    csv_free(&csv);
    csv = csv_of("compare Fe Cr -q affinity,zeff -m slater -f csv");
    ck_assert_str_eq(csv_cell(&csv, 0, "source_kind"), "reference");
    csv_free(&csv);
}
END_TEST

START_TEST(a_subshell_is_asked_for_by_name)
{
    struct csv csv = csv_of("list Fe Na --subshell 3d -q zeff,ionization -m "
                            "slater -f csv");
    ck_assert_uint_eq(csv_rows(&csv), 4);
    ck_assert_str_eq(csv_cell(&csv, 0, "subshell"), "3d");
    /* Slater's rules for Fe 3d: 26 - (18 + 5*0.35) = 6.25 (Phys. Rev. 36, 57
     * (1930), rules 1-5, evaluated by hand). */
    ck_assert_str_eq(csv_cell(&csv, 0, "value"), "6.25");
    ck_assert_str_eq(csv_cell(&csv, 1, "subshell"), "");
    ck_assert_str_eq(csv_cell(&csv, 2, "state"), "outside-model");
    ck_assert_str_eq(csv_cell(&csv, 2, "value"), "");
    csv_free(&csv);
}
END_TEST

START_TEST(runs_leave_out_elements_without_the_charge_and_names_do_not)
{
    struct csv csv = csv_of("list H-Be --charge 3 -q zeff -m shells -f csv");
    ck_assert_uint_eq(csv_rows(&csv), 2);
    ck_assert_str_eq(csv_cell(&csv, 0, "symbol"), "Li");
    ck_assert_str_eq(csv_cell(&csv, 0, "configuration"), "none (by rule)");
    csv_free(&csv);
}
END_TEST

/* A unit is exact: 1 angstrom is 100 pm (SI). */
START_TEST(units_are_converted_where_they_fit)
{
    struct csv pm = csv_of("list period:4 -q radius -m slater -f csv -r "
                           "covalent_single_pyykko_2009");
    struct csv a = csv_of("list period:4 -q radius,ionization -m slater -f csv "
                          "-r covalent_single_pyykko_2009 -u angstrom");
    for (size_t i = 0; i < csv_rows(&pm); i++) {
        ck_assert_str_eq(csv_cell(&a, 2 * i, "unit"), "angstrom");
        ck_assert_str_eq(csv_cell(&a, 2 * i + 1, "unit"), "eV");
        near(csv_number(&a, 2 * i, "value") * 100, csv_number(&pm, i, "value"),
             0, 1e-8, "row %zu", i);
        near(csv_number(&a, 2 * i, "reference_value") * 100,
             csv_number(&pm, i, "reference_value"), 0, 1e-12, "row %zu", i);
    }
    csv_free(&pm);
    csv_free(&a);
}
END_TEST

START_TEST(text_keeps_within_132_columns_and_ascii_is_ascii)
{
    struct program_result r = done("list " CLOSED);
    size_t rows = 0;
    for (const char *l = r.out; *l != '\n'; l = strchr(l, '\n') + 1, rows++) {
        size_t length = strcspn(l, "\n");
        ck_assert_msg(length <= 132, "%zu columns: %.*s", length, (int)length,
                      l);
        ck_assert(l[length - 1] != ' ');
    }
    ck_assert_uint_eq(rows, 1 + 9 * Z_MAX);
    program_free(&r);
    r = done("sources --ascii");
    for (size_t i = 0; i < r.out_size; i++)
        ck_assert((unsigned char)r.out[i] < 0x80);
    ck_assert_ptr_nonnull(strstr(r.out, "Pyykko"));
    program_free(&r);
    r = done("sources");
    ck_assert_ptr_nonnull(strstr(r.out, "Pyykk\xc3\xb6"));
    program_free(&r);
}
END_TEST

START_TEST(colour_comes_only_where_it_was_asked_for)
{
    static const char *const refuse[] = {"NO_COLOR=1", NULL};
    char store[128];
    struct program_result r = done("list Fe " CLOSED);
    ck_assert_ptr_null(strchr(r.out, '\033'));
    program_free(&r);
    r = done("list Fe --color always --format csv " CLOSED);
    ck_assert_ptr_null(strchr(r.out, '\033'));
    program_free(&r);
    struct program p = {.path = OUTERSHELL, .environment = refuse};
    program_split(&p, "list Fe --color=always --model slater", store,
                  sizeof store);
    r = program_run(&p);
    ck_assert_ptr_nonnull(strstr(r.out, "\033[1m"));
    ck_assert_ptr_nonnull(strstr(r.out, "\033[38;5;"));
    program_free(&r);
}
END_TEST

START_TEST(hazards_are_tagged_and_deferred_and_no_more)
{
    struct program_result r = done("compare Pb Tc " CLOSED);
    ck_assert_ptr_nonnull(strstr(r.out, "safety data sheet"));
    ck_assert_ptr_nonnull(strstr(r.out, "licensed"));
    ck_assert_ptr_nonnull(strstr(r.out, "no stable isotope"));
    program_free(&r);
}
END_TEST

TCase *output_cases(void)
{
    TCase *c = tcase_create("output");
    tcase_add_test(c, shell_counting_rises_by_one_half_from_li_to_f);
    tcase_add_test(c, z_eff_of_lithium_from_its_ionization_energy_is_1_26);
    tcase_add_test(c,
                   first_ionization_energies_are_those_of_nist_digit_for_digit);
    tcase_add_test(c,
                   csv_has_the_agreed_heading_and_ends_its_lines_as_rfc_4180);
    tcase_add_test(c, json_carries_the_fields_of_csv);
    tcase_add_test(c, no_locale_brings_a_decimal_comma);
    tcase_add_test(c, the_same_choice_in_other_words_prints_the_same);
    tcase_add_test(
        c, rows_and_lines_come_in_the_order_in_which_they_were_asked_for);
    tcase_add_test(c, names_are_read_from_standard_input_one_per_line);
    tcase_add_test(c, a_quantity_without_a_model_is_listed_by_its_reference);
    tcase_add_test(c, a_subshell_is_asked_for_by_name);
    tcase_add_test(c,
                   runs_leave_out_elements_without_the_charge_and_names_do_not);
    tcase_add_test(c, units_are_converted_where_they_fit);
    tcase_add_test(c, text_keeps_within_132_columns_and_ascii_is_ascii);
    tcase_add_test(c, colour_comes_only_where_it_was_asked_for);
    tcase_add_test(c, hazards_are_tagged_and_deferred_and_no_more);
    return c;
}
