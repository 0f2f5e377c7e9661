/* SPDX-License-Identifier: MIT */
/* Orbitals of screening models, and the atom run beside them. */
#include <check.h>
#include <math.h>

#include "study/atom_run.h"
#include "study/orbital_run.h"
#include "study/study.h"
#include "support/near.h"
#include "support/run.h"

#define POINTS 4001

static double r[POINTS], d[POINTS];

/* Equal steps up to `last` bohr. */
static void fill_radii(double last)
{
    for (int i = 0; i < POINTS; i++)
        r[i] = last * i / (POINTS - 1);
}

/* Simpson's rule over the density at r. */
static double electrons(void)
{
    double sum = d[0] + d[POINTS - 1];
    for (int i = 1; i < POINTS - 1; i++)
        sum += d[i] * (i % 2 ? 4.0 : 2.0);
    return sum * (r[1] - r[0]) / 3.0;
}

static double radius_of_maximum(void)
{
    int best = 0;
    for (int i = 1; i < POINTS; i++)
        if (d[i] > d[best])
            best = i;
    return r[best];
}

static struct species species_of(int z, int charge)
{
    struct species species;
    struct status st = status_ok();
    struct study *study = study_new(catalogue_builtin(), &st);
    struct ask ask = {.z = z, .charge = charge};
    ck_assert(study_species(study, &ask, &species, &st));
    study_free(study);
    return species;
}

static struct orbital_run *solved(enum orbital_kind kind, int z, int charge)
{
    struct status st = status_ok();
    struct species species = species_of(z, charge);
    struct orbital_run *run = orbital_run_new(&st);
    ck_assert_ptr_nonnull(run);
    orbital_run_begin(run, kind, &species);
    while (orbital_run_step(run))
        ;
    return run;
}

/* Hydrogen 1s: D(r) = 4 r² e^(-2r). A textbook function, and both models give
 * it exactly. */
START_TEST(hydrogen_is_exact)
{
    for (int kind = 0; kind < 2; kind++) {
        struct orbital_run *run = solved((enum orbital_kind)kind, 1, 0);
        ck_assert_int_eq(orbital_run_state(run), ORBITAL_SOLVED);
        fill_radii(12.0);
        orbital_run_density(run, 0, POINTS, r, d);
        for (int i = 0; i < POINTS; i += 97)
            near(d[i], 4.0 * r[i] * r[i] * exp(-2.0 * r[i]), 1e-9, 1e-6,
                 "kind %d r %g", kind, r[i]);
        orbital_run_free(run);
    }
}
END_TEST

/* J. C. Slater, Phys. Rev. 36, 57 (1930): iron 4s has Z - S = 3.75 and
 * n* = 3.7, 3d 6.25 and 3; the maximum of r^2n* e^(-2 zeta r) stands at
 * n*²/(Z - S) bohr. */
START_TEST(slater_functions_are_normalised_and_peak_where_they_must)
{
    static const struct {
        int shell;
        double occ, peak;
    } want[] = {{5, 6.0, 9.0 / 6.25}, {6, 2.0, 3.7 * 3.7 / 3.75}};
    struct orbital_run *run = solved(ORBITAL_SLATER, 26, 0);
    fill_radii(40.0);
    for (int i = 0; i < 2; i++) {
        orbital_run_density(run, want[i].shell, POINTS, r, d);
        near(electrons(), want[i].occ, 0.0, 1e-6, "shell %d", want[i].shell);
        near(radius_of_maximum(), want[i].peak, 0.011, 0.0, "shell %d",
             want[i].shell);
    }
    orbital_run_free(run);
}
END_TEST

START_TEST(all_electrons_are_the_sum_of_the_subshells)
{
    for (int kind = 0; kind < 2; kind++) {
        struct orbital_run *run = solved((enum orbital_kind)kind, 17, 0);
        double sum[11] = {0.0}, one[11], all[11];
        for (int i = 0; i < 11; i++)
            r[i] = 0.3 * i;
        for (int s = 0; s < 5; s++) {
            orbital_run_density(run, s, 11, r, one);
            for (int i = 0; i < 11; i++)
                sum[i] += one[i];
        }
        orbital_run_density(run, -1, 11, r, all);
        for (int i = 0; i < 11; i++)
            near(all[i], sum[i], 1e-12, 1e-12, "kind %d", kind);
        fill_radii(25.0);
        orbital_run_density(run, -1, POINTS, r, d);
        near(electrons(), 17.0, 0.0, 2e-4, "kind %d", kind);
        orbital_run_free(run);
    }
}
END_TEST

START_TEST(what_a_model_does_not_cover_has_a_reason)
{
    struct orbital_run *run = solved(ORBITAL_ZETA, 110, 0);
    ck_assert_int_eq(orbital_run_state(run), ORBITAL_FAILED);
    ck_assert(orbital_run_reason(run)[0] != '\0');
    /* the same work space serves the next atom */
    struct species neon = species_of(10, 0);
    orbital_run_begin(run, ORBITAL_ZETA, &neon);
    while (orbital_run_step(run))
        ;
    ck_assert_int_eq(orbital_run_state(run), ORBITAL_SOLVED);
    orbital_run_free(run);
    run = solved(ORBITAL_SLATER, 1, -1); /* H-: 2 - 0.3 screened, bound */
    ck_assert_int_eq(orbital_run_state(run), ORBITAL_SOLVED);
    orbital_run_free(run);
}
END_TEST

/* Gauss's law and the electron count, at radii of no mesh. */
START_TEST(curves_of_an_atom_agree_with_each_other)
{
    struct status st = status_ok();
    struct species silver = species_of(47, 1);
    struct atom_run *run = run_atom_new(&st);
    for (int f = 0; f < FUNCTIONAL_COUNT; f++)
        for (int rel = 0; rel < RELATIVITY_COUNT; rel++) {
            struct atom_method method = {(enum functional)f,
                                         (enum relativity)rel, 0.0};
            double enclosed, zeff, part, sum = 0.0, at = 0.7331;
            ck_assert(run_atom_begin(run, &silver, &method, &st));
            while (run_atom_step(run))
                ;
            const struct atom_report *report = run_atom_report(run);
            ck_assert_int_eq(report->state, REPORT_SOLVED);
            run_atom_curve(run, RUN_ENCLOSED, -1, 1, &at, &enclosed);
            run_atom_curve(run, RUN_ZEFF, -1, 1, &at, &zeff);
            near(enclosed + zeff, 47.0, 1e-11, 0.0, "Z_eff(r)");
            for (int s = 0; s < report->subshell_count; s++) {
                run_atom_curve(run, RUN_ENCLOSED, s, 1, &at, &part);
                sum += part;
            }
            near(sum, enclosed, 1e-7, 0.0, "subshells");
            for (int i = 0; i < POINTS; i++)
                r[i] = 2.0 * i / (POINTS - 1);
            run_atom_curve(run, RUN_DENSITY, -1, POINTS, r, d);
            at = 2.0;
            run_atom_curve(run, RUN_ENCLOSED, -1, 1, &at, &enclosed);
            /* the innermost maximum is narrow for equal steps */
            near(electrons(), enclosed, 2e-3, 0.0, "D integrates");
            double beyond = run_atom_extent(run, 1e-3);
            run_atom_curve(run, RUN_ENCLOSED, -1, 1, &beyond, &enclosed);
            ck_assert(enclosed > 46.0 - 1e-3 && enclosed <= 46.0 + 1e-9);
        }
    run_atom_free(run);
}
END_TEST

START_TEST(a_run_refuses_what_has_no_electron)
{
    struct status st = status_ok();
    struct species bare = species_of(1, 1);
    struct atom_run *run = run_atom_new(&st);
    ck_assert_int_eq(run_atom_report(run)->state, REPORT_FAILED);
    ck_assert(!run_atom_begin(run, &bare, &method_default, &st));
    ck_assert_int_eq(st.code, STATUS_USAGE);
    ck_assert(!run_atom_step(run));
    struct species u = species_of(92, 0);
    struct atom_method slow = {FUNCTIONAL_LDA, RELATIVITY_DIRAC, 91.0};
    ck_assert(!run_atom_begin(run, &u, &slow, &st));
    ck_assert_int_eq(st.code, STATUS_USAGE);
    run_atom_free(run);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("runs");
    TCase *tc = tcase_create("runs");
    tcase_add_test(tc, hydrogen_is_exact);
    tcase_add_test(tc,
                   slater_functions_are_normalised_and_peak_where_they_must);
    tcase_add_test(tc, all_electrons_are_the_sum_of_the_subshells);
    tcase_add_test(tc, what_a_model_does_not_cover_has_a_reason);
    tcase_add_test(tc, curves_of_an_atom_agree_with_each_other);
    tcase_add_test(tc, a_run_refuses_what_has_no_electron);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
