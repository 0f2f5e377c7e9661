/* SPDX-License-Identifier: MIT */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "solve.h"
#include "suites.h"
#include "support/csv.h"
#include "support/near.h"
#include "support/run.h"
#include "zeta/coupling.h"
#include "zeta/zeta.h"

/* Configurations of the 1963 table where they are not the ground ones. */
static const char *configuration_1963(const struct csv *species, int z)
{
    if (z == 24)
        return "[Ar] 3d4 4s2";
    if (z == 29)
        return "[Ar] 3d9 4s2";
    return csv_cell(species, (size_t)z - 1, "configuration");
}

START_TEST(every_value_of_the_1963_table_is_reproduced)
{
    struct zeta *work = work_space();
    struct csv table = csv_read_file("data/single_zeta_1963.csv");
    struct csv species = csv_read_file("data/species.csv");
    static const double p3_2p[COUPLING_ORDERS] = {3, 0, 0, 0};
    struct zeta_result r = {0};
    int solved = 0, elements = 0;
    double square[2] = {0.0, 0.0};
    int count[2] = {0, 0};
    for (size_t i = 0; i < csv_rows(&table); i++) {
        int z = (int)csv_number(&table, i, "z"), n, l;
        const char *label = csv_cell(&table, i, "subshell");
        if (z != solved) {
            /* arsenic stands there by its 2P term, not the ground term 4S */
            r = solve(work, z, configuration_1963(&species, z), ZETA_HUND,
                      z == 33 ? p3_2p : NULL);
            ck_assert(has_values(&r));
            solved = z;
            elements++;
        }
        ck_assert(subshell_parse(label, &n, &l));
        double got = subshell_of(&r, n, l)->z_eff;
        double want = csv_number(&table, i, "zeff");
        near(got, want, z <= 20 ? 0.002 : 0.015, 0, "Z=%d %s", z, label);
        square[z > 20] += (got - want) * (got - want);
        count[z > 20]++;
    }
    ck_assert_int_eq(elements, 35);
    ck_assert(sqrt(square[0] / count[0]) < 0.0005);
    ck_assert(sqrt(square[1] / count[1]) < 0.005);
    csv_free(&species);
    csv_free(&table);
    zeta_free(work);
}
END_TEST

/* Hund's term of arsenic gives another 4p: the table's is not that one. 7.573
 * is from a trial of this calculation, not an outside source; 7.449 is the
 * printed value. */
START_TEST(the_term_moves_an_exponent)
{
    struct zeta *work = work_space();
    struct zeta_result s =
        solve(work, 33, "[Ar] 3d10 4s2 4p3", ZETA_HUND, NULL);
    double z_eff = subshell_of(&s, 4, 1)->z_eff;
    ck_assert_msg(z_eff > 7.449 + 0.05, "As 4S 4p: %g", z_eff);
    near(z_eff, 7.573, 5e-4, 0, "As 4S 4p");
    zeta_free(work);
}
END_TEST

/* Totals and where each comes from. Those of the trial guard against change
 * alone; the outside check of the method is the table of 1963, above. */
#define EXACT "textbook variational value, exact"
#define TABLES                                                                 \
    "E. Clementi, C. Roetti, At. Data Nucl. Data Tables 14, 177 (1974), "      \
    "single zeta, value from memory"
#define TRIAL "from a trial of this calculation, not an outside source"
static const struct {
    int z;
    const char *configuration;
    double total;
    const char *source;
} totals[] = {
    {2, "1s2", -2.84765625, EXACT},
    {3, "[He] 2s1", -7.418482, TABLES},
    {6, "[He] 2s2 2p2", -37.622389, TABLES},
    {10, "[He] 2s2 2p6", -127.812181, TABLES},
    {18, "[Ne] 3s2 3p6", -525.765254, TRIAL},
    {26, "[Ar] 3d6 4s2", -1259.085497, TRIAL},
    {36, "[Ar] 3d10 4s2 4p6", -2744.519687, TRIAL},
    {54, "[Kr] 4d10 5s2 5p6", -7219.792278, TRIAL},
};

START_TEST(known_totals_are_reproduced)
{
    struct zeta *work = work_space();
    for (size_t i = 0; i < sizeof totals / sizeof totals[0]; i++) {
        struct zeta_result r =
            solve(work, totals[i].z, totals[i].configuration, ZETA_HUND, NULL);
        near(r.total, totals[i].total, 1e-6, 0, "Z=%d, %s", totals[i].z,
             totals[i].source);
        near(r.virial, 2.0, 1e-12, 0, "Z=%d virial", totals[i].z);
    }
    zeta_free(work);
}
END_TEST

/* The totals of 1967 were read once from a copy. Lithium, caesium and europium
 * lie up to 0.005 hartree above the minimum, as exponents that are not quite
 * converged do. The printed lanthanum is the solution with a diffuse 4f
 * (-8207.7080 here); praseodymium and promethium lie below the minimum, so
 * they hold a misprint or a misread digit. */
START_TEST(totals_of_1967_are_reproduced_within_their_reading)
{
    struct zeta *work = work_space();
    struct csv csv = csv_read_file("data/single_zeta_totals.csv");
    ck_assert_uint_eq(csv_rows(&csv), 6);
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        int z = (int)csv_number(&csv, i, "z");
        double want = csv_number(&csv, i, "etot_hartree");
        struct zeta_result r =
            solve(work, z, csv_cell(&csv, i, "configuration"), ZETA_HUND, NULL);
        ck_assert(has_values(&r));
        bool clean = z == 3 || z == 55 || z == 63;
        near(r.total, want, clean ? 0.005 : 0.0, clean ? 0.0 : 6e-5, "Z=%d", z);
        if (clean) /* the printed energy is an upper bound */
            ck_assert_msg(r.total < want + 5e-6, "Z=%d", z);
    }
    csv_free(&csv);
    zeta_free(work);
}
END_TEST

START_TEST(one_electron_is_hydrogen)
{
    struct zeta *work = work_space();
    for (int z = 1; z <= 118; z++) {
        struct zeta_result r = solve(work, z, "1s1", ZETA_HUND, NULL);
        ck_assert_int_eq(r.state, ZETA_SOLVED);
        near(r.total, -0.5 * z * z, 0, 1e-12, "Z=%d energy", z);
        near(r.shells[0].z_eff, z, 0, 1e-12, "Z=%d", z);
        near(r.shells[0].energy, -0.5 * z * z, 0, 1e-12, "Z=%d orbital", z);
        near(r.shells[0].peak_radius, 1.0 / z, 0, 1e-9, "Z=%d peak", z);
        near(r.shells[0].mean_radius, 1.5 / z, 0, 1e-12, "Z=%d mean", z);
    }
    zeta_free(work);
}
END_TEST

START_TEST(what_this_method_cannot_do_is_refused_with_the_reason)
{
    static const struct {
        const char *configuration, *words;
    } cases[] = {
        {"1s1 2s2 2p6", "2s is occupied outside"}, /* core hole */
        {"1s2 2s1 2p6 3s1", "3s is occupied outside"},
        {"1s2 3s1", "3s is occupied but an inner"}, /* excited, same l */
        {"1s2 2s2 3p1", "3p is occupied but an inner"},
        {"1s2 2s2 2p1.5", "2p holds 1.5 electrons"},
    };
    struct zeta *work = work_space();
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        struct zeta_result r =
            solve(work, 11, cases[i].configuration, ZETA_HUND, NULL);
        ck_assert_int_eq(r.state, ZETA_REFUSED);
        ck_assert_msg(strstr(r.reason, cases[i].words) != NULL, "%s: %s",
                      cases[i].configuration, r.reason);
        ck_assert_int_eq(r.count, 0);
    }
    struct configuration none = {0};
    struct zeta_result r;
    ck_assert(
        !zeta_begin(work, &(struct zeta_problem){3, &none, ZETA_HUND, NULL}));
    zeta_read(work, &r);
    ck_assert_str_eq(r.reason, "there are no electrons");
    static const double term[COUPLING_ORDERS] = {3, 0, 0, 0};
    r = solve(work, 24, "[Ar] 3d5 4s1", ZETA_HUND, term);
    ck_assert_int_eq(r.state, ZETA_REFUSED);
    zeta_free(work);
}
END_TEST

START_TEST(anions_are_marked_and_may_escape)
{
    struct zeta *work = work_space();
    struct zeta_result r = solve(work, 17, "[Ne] 3s2 3p6", ZETA_HUND, NULL);
    ck_assert_int_eq(r.state, ZETA_SOLVED);
    ck_assert(r.anion);
    r = solve(work, 9, "[He] 2s2 2p6", ZETA_HUND, NULL);
    ck_assert_int_eq(r.state, ZETA_UNBOUND);
    ck_assert_msg(strstr(r.reason, "2p") != NULL, "%s", r.reason);
    r = solve(work, 18, "[Ar] 4s1", ZETA_HUND, NULL);
    ck_assert_int_eq(r.state, ZETA_ESCAPED);
    ck_assert_msg(strstr(r.reason, "4s") != NULL, "%s", r.reason);
    r = solve(work, 1, "1s2 2s2 2p6", ZETA_HUND, NULL);
    ck_assert_int_eq(r.state, ZETA_UNCONVERGED);
    r = solve(work, 18, "[Ne] 3s2 3p6", ZETA_HUND, NULL);
    ck_assert(!r.anion);
    zeta_free(work);
}
END_TEST

/* Lone d and f functions have a diffuse minimum too; the compact one counts.
 * The limits are from a trial of this calculation, not an outside source. */
START_TEST(lone_d_and_f_electrons_stay_compact)
{
    static const struct {
        int z;
        const char *configuration;
        int n, l;
        double least;
    } cases[] = {
        {21, "[Ar] 3d1 4s2", 3, 2, 7.0},
        {57, "[Xe] 5d1 6s2", 5, 2, 14.0},
        {57, "[Xe] 4f1 6s2", 4, 3, 17.0},
        {58, "[Xe] 4f1 5d1 6s2", 4, 3, 18},
        {58, "[Xe] 4f1 5d2", 4, 3, 17.0},
        {71, "[Xe] 4f14 5d1 6s2", 5, 2, 14},
        {103, "[Rn] 5f14 6d1 7s2", 6, 2, 17},
    };
    struct zeta *work = work_space();
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        struct zeta_result r =
            solve(work, cases[i].z, cases[i].configuration, ZETA_HUND, NULL);
        double z_eff = subshell_of(&r, cases[i].n, cases[i].l)->z_eff;
        ck_assert_msg(z_eff > cases[i].least, "Z=%d %s: %g", cases[i].z,
                      cases[i].configuration, z_eff);
    }
    zeta_free(work);
}
END_TEST

/* Overlap of two orbitals and the mean radius by Simpson's rule in ln r. */
static double integral(const struct zeta_result *r, int i, int j, int power)
{
    enum { POINTS = 6001 };
    const double low = -13.0, step = 18.0 / (POINTS - 1);
    double sum = 0.0;
    for (int k = 0; k < POINTS; k++) {
        double x = exp(low + k * step);
        int weight = k == 0 || k == POINTS - 1 ? 1 : k % 2 ? 4 : 2;
        sum += weight * pow(x, 1 + power) * zeta_orbital(r, i, x) *
               zeta_orbital(r, j, x);
    }
    return sum * step / 3;
}

START_TEST(orbitals_are_orthonormal_and_have_the_stated_radii)
{
    static const struct {
        int z;
        const char *configuration;
    } atoms[] = {
        {3, "[He] 2s1"},      {14, "[Ne] 3s2 3p2"},     {26, "[Ar] 3d6 4s2"},
        {41, "[Kr] 4d4 5s1"}, {92, "[Rn] 5f3 6d1 7s2"},
    };
    struct zeta *work = work_space();
    for (size_t a = 0; a < sizeof atoms / sizeof atoms[0]; a++) {
        struct zeta_result r =
            solve(work, atoms[a].z, atoms[a].configuration, ZETA_HUND, NULL);
        for (int i = 0; i < r.count; i++) {
            const struct zeta_subshell *s = &r.shells[i];
            for (int j = 0; j <= i; j++)
                if (r.shells[j].l == s->l)
                    near(integral(&r, i, j, 0), i == j, 1e-8, 0,
                         "Z=%d orbitals %d %d", atoms[a].z, i, j);
            near(integral(&r, i, i, 1), s->mean_radius, 0, 1e-8,
                 "Z=%d mean radius %d", atoms[a].z, i);
            /* no larger P^2 anywhere */
            double top = fabs(zeta_orbital(&r, i, s->peak_radius));
            for (int k = -9000; k < 4000; k++)
                ck_assert_msg(fabs(zeta_orbital(&r, i, exp(0.001 * k))) <
                                  top * (1 + 1e-12),
                              "Z=%d orbital %d is larger at %g than at %g",
                              atoms[a].z, i, exp(0.001 * k), s->peak_radius);
            ck_assert(zeta_orbital(&r, i, 3 * s->peak_radius) > 0 || i > 0);
        }
    }
    zeta_free(work);
}
END_TEST

/* The sum over all subshells of half of (orbital energy + one-electron energy)
 * is the total for closed shells; with the virial theorem the one-electron
 * energy is not needed apart: neon's orbital energies against the 1963 basis
 * are checked through Koopmans' theorem instead: removing 2p with frozen
 * orbitals costs more than the relaxed difference. */
START_TEST(koopmans_is_above_the_relaxed_difference_for_neon)
{
    struct zeta *work = work_space();
    struct zeta_result atom = solve(work, 10, "[He] 2s2 2p6", ZETA_HUND, NULL);
    struct zeta_result ion = solve(work, 10, "[He] 2s2 2p5", ZETA_HUND, NULL);
    double relaxed = ion.total - atom.total;
    double frozen = -subshell_of(&atom, 2, 1)->energy;
    ck_assert_msg(frozen > relaxed && frozen < relaxed + 0.2, "%g %g", frozen,
                  relaxed);
    zeta_free(work);
}
END_TEST

static void same_result(const struct zeta_result *a,
                        const struct zeta_result *b)
{
    ck_assert_int_eq(a->state, b->state);
    ck_assert_int_eq(a->count, b->count);
    ck_assert_int_eq(a->evaluations, b->evaluations);
    near(a->total, b->total, 0, 0, "total");
    near(a->gradient_norm, b->gradient_norm, 0, 0, "gradient");
    for (int i = 0; i < a->count; i++) {
        near(a->shells[i].zeta, b->shells[i].zeta, 0, 0, "zeta %d", i);
        near(a->shells[i].energy, b->shells[i].energy, 0, 0, "energy %d", i);
        near(a->shells[i].peak_radius, b->shells[i].peak_radius, 0, 0,
             "peak %d", i);
    }
}

/* Asking for the Hessian changes no digit of what is read, and one work space
 * serves the next atom as a new one would. */
START_TEST(a_result_survives_the_question_for_the_hessian)
{
    struct zeta *work = work_space();
    struct zeta_result before =
        solve(work, 26, "[Ar] 3d6 4s2", ZETA_HUND, NULL);
    struct zeta_result after;
    double lowest;
    ck_assert(zeta_is_minimum(work, &lowest));
    zeta_read(work, &after);
    same_result(&before, &after);
    solve(work, 92, "[Rn] 5f3 6d1 7s2", ZETA_HUND, NULL);
    after = solve(work, 26, "[Ar] 3d6 4s2", ZETA_HUND, NULL);
    same_result(&before, &after);
    zeta_free(work);
}
END_TEST

TCase *zeta_cases(void)
{
    TCase *tc = tcase_create("zeta");
    tcase_add_test(tc, every_value_of_the_1963_table_is_reproduced);
    tcase_add_test(tc, the_term_moves_an_exponent);
    tcase_add_test(tc, known_totals_are_reproduced);
    tcase_add_test(tc, totals_of_1967_are_reproduced_within_their_reading);
    tcase_add_test(tc, one_electron_is_hydrogen);
    tcase_add_test(tc, what_this_method_cannot_do_is_refused_with_the_reason);
    tcase_add_test(tc, anions_are_marked_and_may_escape);
    tcase_add_test(tc, lone_d_and_f_electrons_stay_compact);
    tcase_add_test(tc, orbitals_are_orthonormal_and_have_the_stated_radii);
    tcase_add_test(tc, koopmans_is_above_the_relaxed_difference_for_neon);
    tcase_add_test(tc, a_result_survives_the_question_for_the_hessian);
    return tc;
}

int main(void)
{
    Suite *suite = suite_create("zeta");
    suite_add_tcase(suite, coupling_cases());
    suite_add_tcase(suite, slater_cases());
    suite_add_tcase(suite, energy_cases());
    suite_add_tcase(suite, zeta_cases());
    suite_add_tcase(suite, list_cases());
    return run_suite(suite);
}
