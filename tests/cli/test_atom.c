/* SPDX-License-Identifier: MIT */
/* `atom` through the program itself. */
#include <cjson/cJSON.h>
#include <math.h>
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include "suites.h"
#include "support/csv.h"
#include "support/near.h"
#include "support/program.h"

/* The field names of the contract, in order. */
#define HEADER                                                                 \
    "z,symbol,charge,configuration,functional,relativity,quantity,subshell,"   \
    "spin,value,unit\r\n"

/* CODATA 2022: E. Tiesinga et al., hartree in eV, bohr radius in pm
 * (https://physics.nist.gov/cuu/Constants). */
#define HARTREE_IN_EV 27.211386245981
#define BOHR_IN_PM 52.9177210544

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

/* Row of a quantity; -1 when there is none. */
static long find(const struct csv *csv, const char *quantity,
                 const char *subshell, const char *spin)
{
    for (size_t i = 0; i < csv_rows(csv); i++)
        if (strcmp(csv_cell(csv, i, "quantity"), quantity) == 0 &&
            strcmp(csv_cell(csv, i, "subshell"), subshell) == 0 &&
            strcmp(csv_cell(csv, i, "spin"), spin) == 0)
            return (long)i;
    return -1;
}

static double number(const struct csv *csv, const char *quantity,
                     const char *subshell, const char *spin)
{
    long row = find(csv, quantity, subshell, spin);
    ck_assert_msg(row >= 0, "no row %s %s %s", quantity, subshell, spin);
    return csv_number(csv, (size_t)row, "value");
}

/* Row of NIST's table ("3d_down", "3d_3/2", "etot") in ours; its spin down is
 * the majority. -1: a level without an electron, which we leave out. */
static long find_nist(const struct csv *csv, const char *label)
{
    char subshell[12];
    const char *tail = strchr(label, '_');
    if (label[0] == 'e')
        return find(csv, label, "", "");
    bool spin =
        tail && (strcmp(tail, "_down") == 0 || strcmp(tail, "_up") == 0);
    snprintf(subshell, sizeof subshell, "%.2s%s", label,
             tail && !spin ? tail + 1 : "");
    return find(csv, "eigenvalue", subshell,
                !spin                      ? ""
                : strcmp(tail, "_up") == 0 ? "minority"
                                           : "majority");
}

static double nist_tolerance(const char *label)
{
    return strcmp(label, "etot") == 0 ? 2e-6 : label[0] == 'e' ? 1e-4 : 5e-6;
}

static void nist_configuration(int z, int charge, char *out, size_t size)
{
    struct csv csv = csv_read_file(NIST_DFT "/nist_configurations.csv");
    out[0] = '\0';
    for (size_t i = 0; i < csv_rows(&csv); i++)
        if ((int)csv_number(&csv, i, "z") == z &&
            (int)csv_number(&csv, i, "charge") == charge)
            snprintf(out, size, "%s", csv_cell(&csv, i, "subshells"));
    ck_assert(out[0] != '\0');
    csv_free(&csv);
}

static void check_nist(int z, int charge, const char *approximation,
                       const char *options, int rows, int empty)
{
    char line[512];
    char configuration[200];
    int checked = 0, none = 0;
    nist_configuration(z, charge, configuration, sizeof configuration);
    snprintf(line, sizeof line,
             "atom %d --charge %d --configuration '%s' --format csv "
             "--speed-of-light 137.0359895 %s",
             z, charge, configuration, options);
    struct csv got = csv_of(line);
    struct csv want = csv_read_file(NIST_DFT "/nist_dft.csv");
    for (size_t i = 0; i < csv_rows(&want); i++) {
        const char *label = csv_cell(&want, i, "quantity");
        if ((int)csv_number(&want, i, "z") != z ||
            (int)csv_number(&want, i, "charge") != charge ||
            strcmp(csv_cell(&want, i, "approximation"), approximation) != 0)
            continue;
        long row = find_nist(&got, label);
        /* the table alone has minority levels without electrons */
        if (row < 0 && strstr(label, "_up") != NULL) {
            none++;
            continue;
        }
        ck_assert_msg(row >= 0, "Z=%d %s: no %s", z, approximation, label);
        near(csv_number(&got, (size_t)row, "value"),
             csv_number(&want, i, "value_hartree"), nist_tolerance(label), 0.0,
             "Z=%d charge %d %s %s", z, charge, approximation, label);
        ck_assert_str_eq(csv_cell(&got, (size_t)row, "unit"), "hartree");
        checked++;
    }
    ck_assert_int_eq(checked, rows);
    ck_assert_int_eq(none, empty);
    csv_free(&got);
    csv_free(&want);
}

/* NIST SRD 141, see tests/atom/data/SOURCES.md. */
START_TEST(the_energies_meet_the_nist_table)
{
    check_nist(7, 0, "LSD", "--functional lsd --relativity none", 10, 1);
    check_nist(10, 0, "LDA", "--functional lda --relativity none", 8, 0);
    check_nist(25, 0, "LSD", "--functional lsd --relativity none", 18, 1);
    check_nist(29, 1, "LDA", "--functional lda --relativity none", 11, 0);
    check_nist(47, 0, "RLDA", "--functional lda --relativity dirac", 20, 0);
    check_nist(54, 0, "LSD", "--functional lsd --relativity none", 27, 0);
    check_nist(92, 0, "LDA", "--functional lda --relativity none", 23, 0);
    check_nist(92, 1, "RLDA", "--functional lda --relativity dirac", 32, 0);
}
END_TEST

START_TEST(the_csv_has_the_fields_of_the_contract)
{
    struct program_result r = done("atom Fe3+ --format csv");
    ck_assert_int_eq(strncmp(r.out, HEADER, strlen(HEADER)), 0);
    struct csv csv = csv_read_text(r.out);
    static const char *const quantities[] = {
        "eigenvalue",  "occupation",  "mean_radius",  "peak_radius",
        "zeff_energy", "zeff_radius", "zeff_enclosed"};
    static const char *const units[] = {"hartree", "electrons", "pm", "pm",
                                        "e",       "e",         "e"};
    size_t levels = 0;
    for (size_t i = 5; i < csv_rows(&csv); i++) {
        ck_assert_str_eq(csv_cell(&csv, i, "quantity"),
                         quantities[(i - 5) % 7]);
        ck_assert_str_eq(csv_cell(&csv, i, "unit"), units[(i - 5) % 7]);
        ck_assert_str_eq(csv_cell(&csv, i, "z"), "26");
        ck_assert_str_eq(csv_cell(&csv, i, "charge"), "3");
        ck_assert_str_eq(csv_cell(&csv, i, "configuration"), "[Ar] 3d5");
        ck_assert_str_eq(csv_cell(&csv, i, "functional"), "lsd");
        ck_assert_str_eq(csv_cell(&csv, i, "relativity"), "dirac");
        levels += (i - 5) % 7 == 0;
    }
    /* 1s 2s 2p 2p 3s 3p 3p twice, and both 3d of the majority alone */
    ck_assert_uint_eq(levels, 16);
    ck_assert(find(&csv, "eigenvalue", "2p1/2", "minority") >= 0);
    ck_assert(find(&csv, "eigenvalue", "3d5/2", "minority") < 0);
    near(number(&csv, "occupation", "3d3/2", "majority"), 2.0, 1e-9, 0.0,
         "5 x 4/10");
    csv_free(&csv);
    program_free(&r);
}
END_TEST

START_TEST(the_parts_add_up_and_the_electrons_are_all_there)
{
    static const char *const lines[] = {
        "atom Gd --functional lda --relativity none --format csv",
        "atom Gd --functional lsd --relativity dirac --format csv",
        "atom Gd --functional pbe --relativity none --format csv"};
    for (size_t k = 0; k < sizeof lines / sizeof lines[0]; k++) {
        struct csv csv = csv_of(lines[k]);
        double electrons = 0.0;
        for (size_t i = 0; i < csv_rows(&csv); i++)
            if (strcmp(csv_cell(&csv, i, "quantity"), "occupation") == 0)
                electrons += csv_number(&csv, i, "value");
        near(electrons, 64.0, 1e-7, 0.0, "%s", lines[k]);
        near(number(&csv, "ekin", "", "") + number(&csv, "ecoul", "", "") +
                 number(&csv, "eenuc", "", "") + number(&csv, "exc", "", ""),
             number(&csv, "etot", "", ""), 4e-7, 0.0, "%s", lines[k]);
        csv_free(&csv);
    }
}
END_TEST

/* n sqrt(-2E) from the eigenvalue of the same table; hydrogen's mean radius
 * (3n² - l(l+1))/2 over the atom's: H. A. Bethe, E. E. Salpeter, Quantum
 * Mechanics of One- and Two-Electron Atoms, section 3. */
START_TEST(effective_charges_follow_from_energy_and_size)
{
    struct csv csv = csv_of("atom Cu --functional lda --relativity none -u "
                            "bohr --format csv");
    double e = number(&csv, "eigenvalue", "3d", "");
    double r = number(&csv, "mean_radius", "3d", "");
    near(number(&csv, "zeff_energy", "3d", ""), 3.0 * sqrt(-2.0 * e), 0.0, 1e-6,
         "energy");
    near(number(&csv, "zeff_radius", "3d", ""), 10.5 / r, 0.0, 1e-7, "size");
    /* In 4s the nucleus shows through more than one charge, less than two:
     * 28 electrons of the core lie nearly all inside. */
    double z = number(&csv, "zeff_enclosed", "4s", "");
    ck_assert(z > 1.0 && z < 2.0);
    csv_free(&csv);
}
END_TEST

START_TEST(units_are_converted_with_codata)
{
    struct csv a = csv_of("atom Xe --functional lda --format csv");
    struct csv b = csv_of("atom Xe --functional lda -u eV,bohr --format csv");
    near(number(&b, "etot", "", ""), number(&a, "etot", "", "") * HARTREE_IN_EV,
         2e-6, 1e-12, "etot");
    near(number(&a, "mean_radius", "5p3/2", ""),
         number(&b, "mean_radius", "5p3/2", "") * BOHR_IN_PM, 0.0, 1e-8,
         "mean radius");
    csv_free(&a);
    csv_free(&b);
}
END_TEST

START_TEST(an_ion_as_operand_or_by_option_is_the_same)
{
    struct program_result a = done("atom Fe2+ --format csv");
    struct program_result b = done("atom iron --charge 2 --format csv");
    ck_assert_str_eq(a.out, b.out);
    program_free(&a);
    program_free(&b);
}
END_TEST

static const char *json_text(const cJSON *object, const char *name)
{
    const cJSON *item = cJSON_GetObjectItemCaseSensitive(object, name);
    if (cJSON_IsNull(item))
        return "";
    ck_assert_msg(cJSON_IsString(item), "%s", name);
    return item->valuestring;
}

START_TEST(json_carries_the_same_rows)
{
    struct program_result r = done("atom Mn --format json");
    struct csv csv = csv_of("atom Mn --format csv");
    cJSON *root = cJSON_ParseWithOpts(r.out, NULL, false);
    ck_assert_ptr_nonnull(root);
    ck_assert_str_eq(json_text(root, "state"), "ok");
    ck_assert_str_eq(json_text(root, "reason"), "");
    ck_assert_int_gt(cJSON_GetObjectItemCaseSensitive(root, "cycles")->valueint,
                     3);
    ck_assert(cJSON_GetObjectItemCaseSensitive(root, "residual")->valuedouble <
              1e-4);
    const cJSON *rows = cJSON_GetObjectItemCaseSensitive(root, "rows");
    ck_assert_uint_eq((size_t)cJSON_GetArraySize(rows), csv_rows(&csv));
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        static const char *const texts[] = {
            "symbol", "configuration", "quantity", "subshell", "spin", "unit"};
        const cJSON *row = cJSON_GetArrayItem(rows, (int)i);
        for (size_t k = 0; k < sizeof texts / sizeof texts[0]; k++)
            ck_assert_str_eq(json_text(row, texts[k]),
                             csv_cell(&csv, i, texts[k]));
        near(cJSON_GetObjectItemCaseSensitive(row, "value")->valuedouble,
             csv_number(&csv, i, "value"), 0.0, 1e-15, "row %zu", i);
    }
    cJSON_Delete(root);
    csv_free(&csv);
    program_free(&r);
}
END_TEST

/* The local density approximation does not bind the extra electron of a small
 * anion: H. B. Shore, J. H. Rose, E. Zaremba, Phys. Rev. B 15, 2858 (1977)
 * (title and finding from memory). */
START_TEST(an_anion_that_does_not_bind_gives_no_number)
{
    static const char *const lines[] = {
        "atom H- --functional lsd --relativity none --format csv",
        "atom F- --functional lda", "atom Cl- --format json",
        "atom F- --format csv --output /tmp/outershell_no_such_atom.csv"};
    for (size_t i = 0; i < sizeof lines / sizeof lines[0]; i++) {
        struct program_result r = program_call(OUTERSHELL, lines[i]);
        ck_assert_int_eq(r.status, 1);
        ck_assert_uint_eq(r.out_size, 0);
        ck_assert_msg(strncmp(r.err, "outershell: atom: ", 18) == 0 &&
                          strstr(r.err, "no number"),
                      "%s", r.err);
        ck_assert_ptr_eq(strchr(r.err, '\n'), r.err + r.err_size - 1);
        program_free(&r);
    }
    ck_assert_int_ne(access("/tmp/outershell_no_such_atom.csv", F_OK), 0);
}
END_TEST

/* What people read: 80 columns hold all of it. */
START_TEST(the_text_fits_80_columns)
{
    struct program_result r =
        done("atom U --functional lsd --relativity dirac");
    for (const char *line = r.out; *line; line = strchr(line, '\n') + 1)
        ck_assert_uint_le(strcspn(line, "\n"), 80);
    ck_assert_ptr_nonnull(strstr(r.out, "[Rn] 5f3 6d1 7s2"));
    ck_assert_ptr_nonnull(strstr(r.out, "5f7/2"));
    program_free(&r);
}
END_TEST

TCase *atom_cases(void)
{
    TCase *tc = tcase_create("atom");
    tcase_add_test(tc, the_energies_meet_the_nist_table);
    tcase_add_test(tc, the_csv_has_the_fields_of_the_contract);
    tcase_add_test(tc, the_parts_add_up_and_the_electrons_are_all_there);
    tcase_add_test(tc, effective_charges_follow_from_energy_and_size);
    tcase_add_test(tc, units_are_converted_with_codata);
    tcase_add_test(tc, an_ion_as_operand_or_by_option_is_the_same);
    tcase_add_test(tc, json_carries_the_same_rows);
    tcase_add_test(tc, an_anion_that_does_not_bind_gives_no_number);
    tcase_add_test(tc, the_text_fits_80_columns);
    return tc;
}
