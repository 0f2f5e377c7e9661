/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <math.h>
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "atom/atom.h"
#include "case.h"
#include "support/csv.h"
#include "support/near.h"

/* Configuration of an atom or cation of NIST SRD 141. */
static const char *nist_configuration(const struct csv *csv, int Z, int charge)
{
    for (size_t i = 0; i < csv_rows(csv); i++)
        if ((int)csv_number(csv, i, "z") == Z &&
            (int)csv_number(csv, i, "charge") == charge)
            return csv_cell(csv, i, "subshells");
    ck_abort_msg("no configuration for Z=%d charge %d", Z, charge);
    return NULL;
}

/* The computed value for a quantity of the table; false for a level that
 * holds no electron. */
static bool computed(const struct atom_solver *solver, const char *quantity,
                     double *value)
{
    struct atom_energy e = atom_energies(solver);
    const struct {
        const char *name;
        double value;
    } part[] = {{"etot", e.total},
                {"ekin", e.kinetic},
                {"ecoul", e.coulomb},
                {"eenuc", e.nuclear},
                {"exc", e.xc}};
    for (size_t i = 0; i < sizeof part / sizeof *part; i++)
        if (strcmp(part[i].name, quantity) == 0) {
            *value = part[i].value;
            return true;
        }
    int n = quantity[0] - '0', twice_j = 0, spin = 0;
    int l = (int)(strchr("spdf", quantity[1]) - "spdf");
    if (strcmp(quantity + 2, "_down") == 0)
        spin = 1;
    else if (strcmp(quantity + 2, "_up") == 0)
        spin = -1;
    else if (quantity[2] == '_')
        twice_j = quantity[3] - '0';
    for (int i = 0; i < atom_level_count(solver); i++) {
        struct atom_level level = atom_level_at(solver, i);
        if (level.n == n && level.l == l && level.twice_j == twice_j &&
            level.spin == spin) {
            *value = level.energy;
            return true;
        }
    }
    return false;
}

/* NIST SRD 141 (tests/atom/data/SOURCES.md): all rows of an approximation;
 * totals to 2e-6, eigenvalues of occupied levels to 5e-6, parts to 1e-4. */
static void check_nist(const char *approximation,
                       const struct atom_options *options, int least)
{
    struct csv values = csv_read_file(DATA_DIR "/nist_dft.csv");
    struct csv shells = csv_read_file(DATA_DIR "/nist_configurations.csv");
    struct atom_solver *solver = case_solver();
    int Z = 0, charge = -1, checked = 0;
    double largest[3] = {0.0, 0.0, 0.0};
    static const double tolerance[3] = {2e-6, 5e-6, 1e-4};
    for (size_t i = 0; i < csv_rows(&values); i++) {
        if (strcmp(csv_cell(&values, i, "approximation"), approximation) != 0)
            continue;
        int z = (int)csv_number(&values, i, "z");
        int q = (int)csv_number(&values, i, "charge");
        if (z != Z || q != charge)
            case_solve(solver, z, nist_configuration(&shells, z, q), options,
                       ATOM_CONVERGED);
        Z = z;
        charge = q;
        const char *quantity = csv_cell(&values, i, "quantity");
        double got, want = csv_number(&values, i, "value_hartree");
        if (!computed(solver, quantity, &got))
            continue;
        int kind = strcmp(quantity, "etot") == 0 ? 0
                   : quantity[0] == 'e'          ? 2
                                                 : 1;
        near(got, want, tolerance[kind], 0.0, "%s Z=%d charge %d %s",
             approximation, Z, charge, quantity);
        if (fabs(got - want) > largest[kind])
            largest[kind] = fabs(got - want);
        checked++;
    }
    ck_assert_int_ge(checked, least);
    printf("# %s: %d values, largest deviation total %.2g eigenvalue %.2g "
           "part %.2g\n",
           approximation, checked, largest[0], largest[1], largest[2]);
    atom_solver_free(solver);
    csv_free(&values);
    csv_free(&shells);
}

START_TEST(lda_meets_the_nist_table)
{
    check_nist("LDA", &(struct atom_options){.functional = ATOM_LDA}, 1500);
}
END_TEST

START_TEST(lsd_meets_the_nist_table)
{
    check_nist("LSD", &(struct atom_options){.functional = ATOM_LSD}, 1500);
}
END_TEST

START_TEST(relativistic_lda_meets_the_nist_table)
{
    check_nist("RLDA",
               &(struct atom_options){.functional = ATOM_LDA,
                                      .relativity = ATOM_DIRAC,
                                      .speed_of_light = 137.0359895},
               1500);
}
END_TEST

TCase *case_nist(void)
{
    TCase *c = tcase_create("nist");
    tcase_add_test(c, lda_meets_the_nist_table);
    tcase_add_test(c, lsd_meets_the_nist_table);
    tcase_add_test(c, relativistic_lda_meets_the_nist_table);
    return c;
}
