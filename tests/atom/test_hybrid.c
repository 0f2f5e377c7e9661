/* SPDX-License-Identifier: MIT */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "atom/hybrid.h"
#include "atom/result.h"
#include "atom/term.h"
#include "base/units.h"
#include "case.h"
#include "support/near.h"

static const struct atom_options LSD = {.functional = ATOM_LSD};
static const struct atom_options DIRAC = {.functional = ATOM_LSD,
                                          .relativity = ATOM_DIRAC};

/* Edmonds, Angular Momentum in Quantum Mechanics (1957), table 2. */
START_TEST(three_j_symbols_are_the_tabulated_ones)
{
    near(atom_three_j(0, 1, 1), 1.0 / 3.0, 1e-15, 0.0, "0 1 1");
    near(atom_three_j(1, 2, 1), 2.0 / 15.0, 1e-15, 0.0, "1 2 1");
    near(atom_three_j(2, 2, 2), 2.0 / 35.0, 1e-15, 0.0, "2 2 2");
    near(atom_three_j(2, 4, 2), 2.0 / 35.0, 1e-15, 0.0, "2 4 2");
    near(atom_three_j(3, 6, 3), 100.0 / 3003.0, 1e-15, 0.0, "3 6 3");
    ck_assert(atom_three_j(1, 1, 1) == 0.0 && atom_three_j(0, 1, 2) == 0.0);
}
END_TEST

/* One electron has no exchange but with itself, and two of opposite spin
 * none with each other: E_x = -E_coul and -E_coul/2. */
START_TEST(exact_exchange_cancels_self_repulsion)
{
    struct atom_solver *solver = case_solver();
    struct status st = status_ok();
    struct hybrid *hybrid = hybrid_new(&st);
    struct hybrid_energy e;
    case_solve(solver, 1, "1s1", &LSD, ATOM_CONVERGED);
    ck_assert(hybrid_evaluate(hybrid, solver, &e, &st));
    near(e.exchange_exact, -atom_energies(solver).coulomb, 1e-8, 0.0, "H");
    near(e.correlation, 0.0, 1e-6, 0.0, "revTPSS has no self-correlation");
    case_solve(solver, 2, "1s2", &LSD, ATOM_CONVERGED);
    ck_assert(hybrid_evaluate(hybrid, solver, &e, &st));
    near(e.exchange_exact, -0.5 * atom_energies(solver).coulomb, 1e-8, 0.0,
         "He");
    near(e.lsd, atom_energies(solver).total, 0.0, 0.0, "He LSD");
    hybrid_free(hybrid);
    atom_solver_free(solver);
}
END_TEST

/* Limits of pⁿ: Landé's interval rule for small ζ, jj coupling for large
 * (Condon, Shortley, The Theory of Atomic Spectra (1935), chapter 11). */
START_TEST(p_shifts_have_both_coupling_limits)
{
    static const double lande[] = {-1.0, -1.0, 0.0, -0.5, -0.5};
    static const double jj[] = {-1.0, -2.0, -1.5, -1.0, -0.5};
    struct term unknown = {"", -1, -1, -1};
    for (int n = 1; n <= 5; n++) {
        struct open_subshell p = {
            .l = 1, .electrons = n, .zeta = 1e-6, .f2 = 2.385};
        near(atom_term_spin_orbit(&p, 1, &unknown) / 1e-6, lande[n - 1], 1e-4,
             0.0, "p%d, weak", n);
        p.zeta = 1e6;
        near(atom_term_spin_orbit(&p, 1, &unknown) / 1e6, jj[n - 1], 1e-4, 0.0,
             "p%d, strong", n);
    }
}
END_TEST

/* 3F2 of d²: L = 3, S = 1, λ = ζ/2; 4I15/2 of f¹¹: λ = -ζ/3. */
START_TEST(d_and_f_shifts_follow_the_interval_rule)
{
    struct term term;
    struct open_subshell d2 = {.l = 2, .electrons = 2, .zeta = 0.1},
                         f11 = {.l = 3, .electrons = 11, .zeta = 0.1};
    ck_assert(term_parse("3F2", &term));
    near(atom_term_spin_orbit(&d2, 1, &term), -0.2, 1e-14, 0.0, "d2");
    ck_assert(term_parse("4I*15/2", &term));
    near(atom_term_spin_orbit(&f11, 1, &term), -0.3, 1e-14, 0.0, "f11");
    /* the same J by Hund's rule when no term is known */
    struct term unknown = {"", -1, -1, -1};
    near(atom_term_spin_orbit(&d2, 1, &unknown), -0.2, 1e-14, 0.0,
         "d2, by rule");
    /* (15/2,1/2)8 of f11 s: the stretched state keeps the core's shift */
    struct open_subshell pair[2] = {f11, {.l = 0, .electrons = 1}};
    ck_assert(term_parse("(15/2,1/2)*8", &term));
    near(atom_term_spin_orbit(pair, 2, &term), -0.3, 1e-14, 0.0, "f11 s");
}
END_TEST

/* d²: mean of 3F and 3P by degeneracy is zero, 3P - 3F = 15 B. */
START_TEST(hund_shifts_have_their_closed_values)
{
    near(atom_term_hund_shift(2, 2, 49.0, 0.0, 0.0), -4.5, 1e-14, 0.0, "d2");
    near(atom_term_hund_shift(2, 7, 49.0, 0.0, 0.0), -4.5, 1e-14, 0.0, "d7");
    ck_assert(atom_term_hund_shift(2, 5, 49.0, 7.0, 0.0) == 0.0);
    near(atom_term_hund_shift(3, 3, 135.0, 0.0, 0.0), -21.0, 1e-13, 0.0, "f3");
    near(atom_term_hund_shift(3, 12, 135.0, 0.0, 0.0), -9.0, 1e-13, 0.0, "f12");
}
END_TEST

static void evaluate(struct atom_solver *solver, struct hybrid *hybrid,
                     const struct species *species,
                     struct hybrid_energy *energy, double *shift)
{
    struct status st = status_ok();
    ck_assert_msg(
        atom_begin(solver, species->z, &species->configuration, &DIRAC, &st),
        "%s", st.message);
    ck_assert_int_eq(atom_solve(solver), ATOM_CONVERGED);
    ck_assert_msg(hybrid_evaluate(hybrid, solver, energy, &st), "%s",
                  st.message);
    *shift = hybrid_spin_orbit(hybrid, &species->term);
}

/* Closed and half-filled p subshells are round, those with a fraction of an
 * electron have no determinant; an open one gains by its shape in oxygen, where
 * the ion is round: the ionization energy, 13.618055 eV (NIST ASD 5.12), is
 * too low without. */
START_TEST(only_open_p_subshells_have_a_shape)
{
    static const struct {
        const char *configuration;
        int Z;
        bool open;
    } atom[] = {
        {"[He] 2s2 2p3", 7, false},  {"[He] 2s2 2p6", 10, false},
        {"[Ar] 3d1 4s2", 21, false}, {"[He] 2s2 2p3.5", 8, false},
        {"[He] 2s2 2p4", 8, true},   {"[Xe] 4f14 5d10 6s2 6p1", 81, true}};
    struct atom_solver *solver = case_solver();
    struct status st = status_ok();
    struct hybrid *hybrid = hybrid_new(&st);
    struct hybrid_energy e;
    for (size_t i = 0; i < sizeof atom / sizeof *atom; i++) {
        case_solve(solver, atom[i].Z, atom[i].configuration, &DIRAC,
                   ATOM_CONVERGED);
        ck_assert(hybrid_evaluate(hybrid, solver, &e, &st));
        ck_assert_msg((fabs(e.shape) > 1e-4) == atom[i].open, "Z=%d: %g",
                      atom[i].Z, e.shape);
        ck_assert(fabs(e.shape) < 0.02);
    }
    case_solve(solver, 8, "[He] 2s2 2p3", &DIRAC, ATOM_CONVERGED);
    ck_assert(hybrid_evaluate(hybrid, solver, &e, &st));
    double ion = e.total;
    case_solve(solver, 8, "[He] 2s2 2p4", &DIRAC, ATOM_CONVERGED);
    ck_assert(hybrid_evaluate(hybrid, solver, &e, &st));
    ck_assert(HARTREE_EV * (ion - e.total + e.shape) < 13.618055);
    near(HARTREE_EV * (ion - e.total), 13.618055, 0.1, 0.0, "O");
    hybrid_free(hybrid);
    atom_solver_free(solver);
}
END_TEST

/* Mean absolute error of the stages against NIST ASD (data/ionization.csv):
 * 0.097 eV for the first, Z = 1…103, 0.174 and 0.218 eV for second and third
 * up to Kr, each to 0.01 eV on both sides: a smaller one would be a claim to
 * renew. The figures are the program's own, the energies are not. */
START_TEST(ionization_energies_are_as_good_as_claimed)
{
    static const double claim[] = {0.097, 0.174, 0.218};
    static const int values[] = {103, 35, 34};
    struct csv csv = csv_read_file(DATA_DIR "/ionization.csv");
    struct cases cases = cases_read();
    struct atom_solver *solver = case_solver();
    struct status st = status_ok();
    struct hybrid *hybrid = hybrid_new(&st);
    double sum[3] = {0.0, 0.0, 0.0};
    int count[3] = {0, 0, 0};
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        int Z = (int)csv_number(&csv, i, "z");
        int stage = (int)csv_number(&csv, i, "stage");
        struct species species;
        struct hybrid_energy atom, ion = {0};
        double atom_shift, ion_shift = 0.0;
        cases_species(&cases, Z, stage - 1, &species);
        evaluate(solver, hybrid, &species, &atom, &atom_shift);
        if (Z > stage) {
            cases_species(&cases, Z, stage, &species);
            evaluate(solver, hybrid, &species, &ion, &ion_shift);
        }
        double got =
            HARTREE_EV * (ion.total + ion_shift - atom.total - atom_shift);
        sum[stage - 1] += fabs(got - csv_number(&csv, i, "energy_ev"));
        count[stage - 1]++;
    }
    for (int k = 0; k < 3; k++) {
        ck_assert_int_eq(count[k], values[k]);
        printf("# ionization energy %d: %d values, mean absolute error "
               "%.4f eV\n",
               k + 1, count[k], sum[k] / count[k]);
        near(sum[k] / count[k], claim[k], 0.01, 0.0, "stage %d", k + 1);
    }
    hybrid_free(hybrid);
    atom_solver_free(solver);
    cases_free(&cases);
    csv_free(&csv);
}
END_TEST

/* A quarter of exact exchange with its term: J. P. Perdew, M. Ernzerhof, K.
 * Burke, J. Chem. Phys. 105, 9982 (1996), doi 10.1063/1.472933. The energy is
 * put together from the parts that stand beside it. */
START_TEST(the_hybrid_energy_is_made_of_its_parts)
{
    static const struct {
        int Z;
        const char *configuration;
    } atom[] = {{8, "[He] 2s2 2p4"},
                {23, "[Ar] 3d3 4s2"},
                {54, "[Kr] 4d10 5s2 5p6"},
                {60, "[Xe] 4f4 6s2"}};
    struct atom_solver *solver = case_solver();
    struct status st = status_ok();
    struct hybrid *hybrid = hybrid_new(&st);
    for (size_t i = 0; i < sizeof atom / sizeof *atom; i++) {
        struct hybrid_energy e;
        case_solve(solver, atom[i].Z, atom[i].configuration, &DIRAC,
                   ATOM_CONVERGED);
        ck_assert(hybrid_evaluate(hybrid, solver, &e, &st));
        struct atom_energy a = atom_energies(solver);
        double rest = a.kinetic + a.nuclear + a.coulomb;
        near(e.lsd, a.total, 1e-9, 0.0, "Z=%d lsd", atom[i].Z);
        near(e.pbe, rest + e.exchange_pbe + e.correlation_pbe, 1e-9, 0.0,
             "Z=%d pbe", atom[i].Z);
        near(e.total,
             rest + 0.75 * e.exchange_pbe + 0.25 * (e.exchange_exact + e.term) +
                 e.correlation + e.shape,
             1e-9, 0.0, "Z=%d hybrid", atom[i].Z);
    }
    hybrid_free(hybrid);
    atom_solver_free(solver);
}
END_TEST

static int ascending(const void *a, const void *b)
{
    double x = *(const double *)a, y = *(const double *)b;
    return (x > y) - (x < y);
}

/* Against the corrected table of Rahm et al. (data/isodensity.csv): median
 * deviation 0.55 %, largest 4.0 %, the program's own claim, to 0.05 and 0.2 %
 * on both sides. */
START_TEST(isodensity_radii_are_as_good_as_claimed)
{
    struct csv csv = csv_read_file(DATA_DIR "/isodensity.csv");
    struct cases cases = cases_read();
    struct atom_solver *solver = case_solver();
    struct status st = status_ok();
    double off[118];
    int count = 0;
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        struct species species;
        int Z = (int)csv_number(&csv, i, "z");
        cases_species(&cases, Z, 0, &species);
        ck_assert(atom_begin(solver, Z, &species.configuration, &DIRAC, &st));
        ck_assert_int_eq(atom_solve(solver), ATOM_CONVERGED);
        double got = BOHR_PM * atom_isodensity_radius(solver, 0.001);
        off[count++] =
            100.0 * fabs(got / csv_number(&csv, i, "radius_pm") - 1.0);
    }
    qsort(off, (size_t)count, sizeof *off, ascending);
    printf("# isodensity radius: %d elements, median deviation %.2f %%, "
           "largest %.2f %%\n",
           count, off[count / 2], off[count - 1]);
    ck_assert_int_eq(count, 96);
    near(off[count / 2], 0.55, 0.05, 0.0, "median");
    near(off[count - 1], 4.0, 0.2, 0.0, "largest");
    atom_solver_free(solver);
    cases_free(&cases);
    csv_free(&csv);
}
END_TEST

TCase *case_hybrid(void)
{
    TCase *c = tcase_create("hybrid");
    tcase_set_timeout(c, 20.0);
    tcase_add_test(c, three_j_symbols_are_the_tabulated_ones);
    tcase_add_test(c, exact_exchange_cancels_self_repulsion);
    tcase_add_test(c, p_shifts_have_both_coupling_limits);
    tcase_add_test(c, d_and_f_shifts_follow_the_interval_rule);
    tcase_add_test(c, hund_shifts_have_their_closed_values);
    tcase_add_test(c, the_hybrid_energy_is_made_of_its_parts);
    tcase_add_test(c, only_open_p_subshells_have_a_shape);
    tcase_add_test(c, ionization_energies_are_as_good_as_claimed);
    tcase_add_test(c, isodensity_radii_are_as_good_as_claimed);
    return c;
}
