/* SPDX-License-Identifier: MIT */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "suites.h"
#include "support/near.h"
#include "zeta/descent.h"
#include "zeta/layout.h"
#include "zeta/start.h"

static struct energy *energy_of(int z, const char *text,
                                enum zeta_coupling coupling, double x[])
{
    struct status st = status_ok();
    struct configuration c;
    char reason[ZETA_REASON_MAX] = "";
    struct energy *e = malloc(sizeof *e);
    ck_assert_ptr_nonnull(e);
    ck_assert_msg(configuration_parse(text, &c, &st), "%s", st.message);
    struct zeta_problem problem = {z, &c, coupling, NULL};
    zeta_slater_tables_fill(&e->tables);
    ck_assert_msg(layout_fill(&e->atom, &problem, reason), "%s", reason);
    energy_prepare(e);
    double z_eff[ENERGY_SHELL_MAX];
    start_charges(&e->atom, z_eff);
    for (int i = 0; i < e->atom.variables; i++)
        x[i] = i < e->atom.shells ? log(z_eff[i] / e->atom.n[i]) : 0.0;
    return e;
}

static const struct {
    int z;
    const char *configuration;
} atoms[] = {
    {2, "1s2"},
    {3, "[He] 2s1"},
    {8, "[He] 2s2 2p4"},
    {14, "[Ne] 3s2 3p2"},
    {24, "[Ar] 3d5 4s1"},
    {23, "[Ar] 3d2 4s1 4p2"}, /* three open subshells, multipoles between */
    {41, "[Kr] 4d4 5s1"},
    {64, "[Xe] 4f7 5d1 6s2"},
    {59, "[Xe] 4f2 5d1 6s1 6p1"}, /* four */
    {92, "[Rn] 5f3 6d1 7s2"},
};

START_TEST(gradient_agrees_with_finite_differences)
{
    for (size_t a = 0; a < sizeof atoms / sizeof atoms[0]; a++) {
        for (int coupling = ZETA_HUND; coupling <= ZETA_AVERAGE; coupling++) {
            double x[ENERGY_VARIABLE_MAX], g[ENERGY_VARIABLE_MAX];
            struct energy *e =
                energy_of(atoms[a].z, atoms[a].configuration, coupling, x);
            int count = e->atom.variables;
            for (int i = 0; i < count; i++) /* away from any minimum */
                x[i] += i < e->atom.shells ? 0.02 * (i % 3 - 1)
                                           : 0.07 * (i % 2 == 0 ? 1 : -1);
            ck_assert(energy_evaluate(e, x));
            memcpy(g, e->gradient, sizeof g);
            double sum = 0.0, size = fabs(e->total);
            for (int i = 0; i < count; i++) {
                /* two steps, extrapolated: the error is of order h^4 */
                double slope[2];
                for (int k = 0; k < 2; k++) {
                    double h = 2e-3 / (k + 1), moved[ENERGY_VARIABLE_MAX];
                    memcpy(moved, x, sizeof moved);
                    moved[i] += h;
                    ck_assert(energy_evaluate(e, moved));
                    double up = e->total;
                    memcpy(moved, x, sizeof moved);
                    moved[i] -= h;
                    ck_assert(energy_evaluate(e, moved));
                    slope[k] = (up - e->total) / (2 * h);
                }
                near(g[i], (4 * slope[1] - slope[0]) / 3, 2e-9 * size, 1e-7,
                     "%s coupling %d variable %d", atoms[a].configuration,
                     coupling, i);
                sum += i < e->atom.shells ? g[i] : 0.0;
            }
            /* the common scale is at its best already */
            near(sum, 0, 1e-11 * size, 0, "%s virial", atoms[a].configuration);
            free(e);
        }
    }
}
END_TEST

/* Löwdin's scaling: a second evaluation at the scaled exponents moves
 * nothing, and -V/T is 2. */
START_TEST(scaling_fulfils_the_virial_theorem)
{
    for (size_t a = 0; a < sizeof atoms / sizeof atoms[0]; a++) {
        double x[ENERGY_VARIABLE_MAX], again[ENERGY_VARIABLE_MAX];
        struct energy *e =
            energy_of(atoms[a].z, atoms[a].configuration, ZETA_HUND, x);
        ck_assert(energy_evaluate(e, x));
        double total = e->total;
        memcpy(again, x, sizeof again);
        ck_assert(energy_evaluate(e, again));
        near(e->total, total, 0, 1e-13, "%s", atoms[a].configuration);
        near(again[0], x[0], 1e-12, 0, "%s", atoms[a].configuration);
        near(e->kinetic, -e->total, 0, 1e-13, "%s", atoms[a].configuration);
        free(e);
    }
}
END_TEST

/* Helium by hand: E = (Z' - 5/16)^2 with the sign turned. */
START_TEST(helium_is_exact_at_any_start)
{
    double x[ENERGY_VARIABLE_MAX];
    struct energy *e = energy_of(2, "1s2", ZETA_HUND, x);
    x[0] = log(3.1);
    ck_assert(energy_evaluate(e, x));
    near(e->zeta[0], 27.0 / 16, 0, 1e-15, "zeta");
    near(e->total, -2.84765625, 0, 1e-15, "energy");
    free(e);
}
END_TEST

START_TEST(an_exponent_that_is_no_number_is_refused)
{
    double x[ENERGY_VARIABLE_MAX];
    struct energy *e = energy_of(12, "[Ne] 3s2", ZETA_HUND, x);
    x[0] = NAN;
    ck_assert(!energy_evaluate(e, x));
    free(e);
}
END_TEST

/* A quadratic with a known inverse Hessian is done in one step, and the
 * estimate that is not positive falls back on its diagonal. */
START_TEST(descent_solves_a_quadratic_in_one_step)
{
    static const double h[2][2] = {{2.0, 0.7}, {0.7, 1.5}};
    for (int indefinite = 0; indefinite < 2; indefinite++) {
        struct descent d = {.tolerance = 1e-9, .cap = 10.0};
        double x[2] = {0.31, -0.77}, g[2];
        for (int i = 0; i < 2; i++)
            for (int j = 0; j <= i; j++)
                d.inverse[i][j] = i != j && indefinite ? 9.0 : h[i][j];
        double value = 0.0;
        enum descent_state state = DESCENT_MORE;
        int evaluations = 0;
        for (; state == DESCENT_MORE && evaluations < 40; evaluations++) {
            const double *at = evaluations ? d.trial : x;
            value = 0.0;
            for (int i = 0; i < 2; i++) {
                g[i] = h[i][0] * at[0] + h[i][1] * at[1];
                value += 0.5 * g[i] * at[i];
            }
            state = evaluations ? descent_take(&d, value, g)
                                : descent_begin(&d, 2, x, value, g);
        }
        ck_assert_int_eq(state, DESCENT_DONE);
        if (indefinite)
            ck_assert_int_le(evaluations, 12);
        else
            ck_assert_int_eq(evaluations, 2);
        near(d.trial[0], 0, 1e-8, 0, "x");
        near(d.trial[1], 0, 1e-8, 0, "y");
    }
}
END_TEST

START_TEST(descent_says_when_nothing_is_lower)
{
    struct descent d = {.tolerance = 1e-9, .cap = 1.0, .inverse = {{1.0}}};
    double x = 1.0, g = 1.0;
    enum descent_state state = descent_begin(&d, 1, &x, 1.0, &g);
    for (int i = 0; i < 100 && state == DESCENT_MORE; i++)
        state = descent_take(&d, HUGE_VAL, &g);
    ck_assert_int_eq(state, DESCENT_STUCK);
    near(d.x[0], 1.0, 0, 0, "the place stays");
}
END_TEST

TCase *energy_cases(void)
{
    TCase *tc = tcase_create("energy");
    tcase_add_test(tc, gradient_agrees_with_finite_differences);
    tcase_add_test(tc, scaling_fulfils_the_virial_theorem);
    tcase_add_test(tc, helium_is_exact_at_any_start);
    tcase_add_test(tc, an_exponent_that_is_no_number_is_refused);
    tcase_add_test(tc, descent_solves_a_quadratic_in_one_step);
    tcase_add_test(tc, descent_says_when_nothing_is_lower);
    return tc;
}
