/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <math.h>
#include <stdio.h>
#include <stdlib.h>

#include "numeric/lobatto.h"
#include "numeric/mesh.h"
#include "numeric/mixer.h"
#include "numeric/poisson.h"
#include "numeric/radial.h"
#include "numeric/repulsion.h"
#include "support/near.h"
#include "support/run.h"

/* Abramowitz, Stegun, Handbook of Mathematical Functions, table 25.6
 * (Lobatto abscissas and weights): the rule of 9 points. */
START_TEST(lobatto_points_are_the_handbook_ones)
{
    static const double x[] = {0.0, 0.363117463826, 0.677186279511,
                               0.899757995411, 1.0};
    static const double w[] = {0.371519274376, 0.346428510973, 0.274538712500,
                               0.165495361561, 0.027777777778};
    struct lobatto rule;
    lobatto_make(&rule);
    ck_assert_int_eq(LOBATTO_POINTS, 9);
    for (int i = 0; i < 5; i++) {
        near(rule.x[4 + i], x[i], 1e-12, 0.0, "point %d", i);
        near(rule.x[4 - i], -x[i], 1e-12, 0.0, "point -%d", i);
        near(rule.w[4 + i], w[i], 1e-11, 0.0, "weight %d", i);
    }
}
END_TEST

START_TEST(polynomials_are_differentiated_and_integrated_exactly)
{
    struct lobatto rule;
    lobatto_make(&rule);
    for (int k = 1; k <= LOBATTO_ORDER; k++)
        for (int i = 0; i < LOBATTO_POINTS; i++) {
            double first = 0.0, integral = 0.0;
            double x = rule.x[i];
            for (int j = 0; j < LOBATTO_POINTS; j++) {
                double f = pow(rule.x[j], k);
                first += rule.derivative[i][j] * f;
                integral += rule.cumulative[i][j] * f;
            }
            near(first, k * pow(x, k - 1), 1e-12, 1e-12, "x^%d'", k);
            near(integral, (pow(x, k + 1) - pow(-1.0, k + 1)) / (k + 1), 1e-13,
                 1e-13, "integral of x^%d", k);
        }
}
END_TEST

START_TEST(mesh_integrates_interpolates_and_cumulates)
{
    struct status st = status_ok();
    struct mesh mesh;
    ck_assert(mesh_init(&mesh, 1e-3, 60.0, 1.0, &st));
    double *f = calloc((size_t)mesh.points, sizeof *f);
    double *g = calloc((size_t)mesh.points, sizeof *g);
    double sum = 0.0;
    for (int i = 0; i < mesh.points; i++) {
        f[i] = mesh.y[i] * mesh.y[i] * exp(-mesh.y[i]);
        sum += mesh.weight_y[i] * f[i];
    }
    /* y³/3 (1 - 3y/4 …) below; d f/dt = f' dy/dt */
    double y0 = mesh.y[0];
    double inner =
        mesh_inner(&mesh, f[0], f[0] * (2.0 / y0 - 1.0) * mesh.slope[0], 2.0);
    near(inner, y0 * y0 * y0 * (1.0 / 3.0 - y0 / 4.0), 0.0, 1e-5, "inner");
    near(sum + inner, 2.0, 1e-9, 0.0, "∫ y² exp(-y)");
    mesh_cumulate(&mesh, mesh.elements, f, inner, g);
    for (int k = 0; k < 27; k++) {
        double y = 0.01 * pow(1.37, k);
        double exact = 2.0 - exp(-y) * (y * y + 2.0 * y + 2.0);
        near(mesh_value(&mesh, g, y), exact, 1e-7, 0.0, "to y=%g", y);
        near(mesh_value(&mesh, f, y), y * y * exp(-y), 1e-7, 0.0, "at %g", y);
    }
    free(f);
    free(g);
    mesh_clear(&mesh);
}
END_TEST

/* Exact levels of the Coulomb field, in units of Z² hartree: -1/2n², and
 * Sommerfeld's formula (Darwin, Proc. R. Soc. A 118, 654 (1928)). */
static double coulomb_energy(double a2, int kappa, int n)
{
    if (a2 <= 0.0)
        return -0.5 / (n * n);
    double gamma = sqrt(kappa * kappa - a2);
    double nr = n - abs(kappa) + gamma;
    double root = sqrt(nr * nr + a2);
    return -1.0 / (root * (root + nr));
}

/* Exact mean radius in units of 1/Z: (3n² - l(l+1))/2, and with the Dirac
 * equation ((3N² - κ²) √(1 - a2/N²) - κ)/2 with
 * the apparent quantum number N (Burke, Grant, Proc. Phys. Soc. 90, 297
 * (1967)). */
static double coulomb_radius(double a2, int kappa, int n)
{
    double l = kappa < 0 ? -kappa - 1 : kappa;
    if (a2 <= 0.0)
        return 0.5 * (3.0 * n * n - l * (l + 1.0));
    double gamma = sqrt(kappa * kappa - a2), nr = n - abs(kappa);
    double big = sqrt(n * n - 2.0 * nr * (abs(kappa) - gamma));
    double root = sqrt(1.0 - a2 / (big * big));
    return 0.5 * ((3.0 * big * big - kappa * kappa) * root - kappa);
}

static void check_coulomb(double Z, double c, double first, double length)
{
    struct status st = status_ok();
    struct mesh mesh;
    double a2 = c > 0.0 ? Z * Z / (c * c) : 0.0;
    ck_assert(mesh_init(&mesh, first, 400.0, length, &st));
    struct radial *radial = radial_new(&mesh, 0, &st);
    ck_assert_ptr_nonnull(radial);
    struct radial_level level[RADIAL_LEVELS_MAX];
    int principal[RADIAL_LEVELS_MAX], count = 0;
    for (int n = 1; n <= 7; n++)
        for (int l = 0; l < n && l < 5; l++)
            for (int kappa = -l - 1; kappa <= l; kappa += 2 * l + 1) {
                if (kappa == 0 || (c <= 0.0 && kappa > 0))
                    break;
                principal[count] = n;
                level[count++] =
                    (struct radial_level){kappa, n - l - 1, 0, 1.0};
            }
    double *q = malloc((size_t)mesh.points * sizeof *q);
    double *d = malloc((size_t)mesh.points * sizeof *d);
    for (int i = 0; i < mesh.points; i++)
        q[i] = -1.0;
    radial_begin(radial, a2, mesh.elements, count, level);
    radial_potential(radial, 0, q, NULL);
    ck_assert_int_eq(radial_find(radial), 0);
    radial_potential(radial, 0, q, NULL);
    ck_assert_int_eq(radial_settle(radial, 1e-13), 0);
    for (int i = 0; i < count; i++) {
        int n = principal[i], kappa = level[i].kappa;
        near(radial_energy(radial, i), coulomb_energy(a2, kappa, n), 0.0, 1e-9,
             "Z=%g c=%g n=%d kappa=%d energy", Z, c, n, kappa);
        radial_density(radial, i, d);
        double r = 0.0;
        for (int k = 0; k < mesh.points; k++)
            r += mesh.weight_y[k] * mesh.y[k] * d[k];
        near(r, coulomb_radius(a2, kappa, n), 0.0, 1e-8,
             "Z=%g c=%g n=%d kappa=%d mean radius", Z, c, n, kappa);
    }
    free(q);
    free(d);
    radial_free(radial);
    mesh_clear(&mesh);
}

START_TEST(coulomb_levels_are_exact_without_light_speed)
{
    check_coulomb(1.0, 0.0, 1e-3, 1.0);
}
END_TEST

START_TEST(coulomb_levels_are_exact_for_dirac)
{
    for (int Z = 1; Z <= 118; Z++)
        check_coulomb(Z, 137.035999177, 1e-5, 1.0);
}
END_TEST

/* Levels are grouped in one way and every lane does the same operations, so the
 * width of the vectors, which follows the processor, shows in no bit. */
START_TEST(results_do_not_depend_on_the_vector_width)
{
    struct status st = status_ok();
    struct mesh mesh;
    ck_assert(mesh_init(&mesh, 1e-5, 2000.0, 1.1, &st));
    static const struct radial_level level[] = {
        {-1, 0, 0, 2.0}, {-1, 1, 0, 2.0}, {1, 0, 0, 2.0}, {-2, 0, 0, 4.0},
        {-1, 2, 0, 1.0}, {2, 0, 0, 3.0},  {-3, 1, 0, 1.5}};
    enum { LEVELS = sizeof level / sizeof *level };
    size_t n = (size_t)mesh.points;
    double *q = malloc(n * sizeof *q), *total[2], energy[2][LEVELS];
    for (size_t i = 0; i < n; i++)
        q[i] = -0.9 * exp(-mesh.y[i] / 12.0) -
               0.1 / (1.0 + 0.01 * mesh.y[i] * mesh.y[i]);
    for (int width = 0; width < 2; width++) {
        struct radial *radial = radial_new(&mesh, width ? 2 : 0, &st);
        ck_assert_ptr_nonnull(radial);
        radial_begin(radial, 0.385, mesh.elements, LEVELS, level);
        radial_potential(radial, 0, q, NULL);
        ck_assert_int_eq(radial_find(radial), 0);
        radial_potential(radial, 0, q, NULL);
        ck_assert_int_eq(radial_settle(radial, 1e-12), 0);
        for (int i = 0; i < LEVELS; i++)
            energy[width][i] = radial_energy(radial, i);
        total[width] = calloc(n, sizeof *q);
        radial_total(radial, 0, total[width]);
        radial_free(radial);
    }
    ck_assert_mem_eq(energy[1], energy[0], sizeof energy[0]);
    ck_assert_mem_eq(total[1], total[0], n * sizeof *q);
    free(q);
    free(total[0]);
    free(total[1]);
    mesh_clear(&mesh);
}
END_TEST

/* Hydrogen-like functions: F⁰(1s,1s) = 5/8, F⁰(2p,2p) = 93/512, F²(2p,2p) =
 * 45/512 in units of Z hartree (Condon, Shortley, The Theory of Atomic Spectra
 * (1935), table 2⁶ as worked from its formulas). */
START_TEST(slater_integrals_have_their_closed_values)
{
    struct status st = status_ok();
    struct mesh mesh;
    struct repulsion slater;
    ck_assert(mesh_init(&mesh, 1e-5, 80.0, 1.0, &st));
    ck_assert(repulsion_init(&slater, &mesh, &st));
    double *s = malloc((size_t)mesh.points * sizeof *s);
    double *p = malloc((size_t)mesh.points * sizeof *p);
    for (int i = 0; i < mesh.points; i++) {
        double y = mesh.y[i];
        s[i] = 2.0 * y * exp(-y);
        p[i] = y * y * exp(-0.5 * y) / sqrt(24.0);
    }
    int n = mesh.elements;
    near(repulsion_integral(&slater, n, s, s, 0), 0.625, 1e-8, 0.0, "1s1s");
    near(repulsion_integral(&slater, n, p, p, 0), 93.0 / 512.0, 1e-8, 0.0, "0");
    near(repulsion_integral(&slater, n, p, p, 2), 45.0 / 512.0, 1e-8, 0.0, "2");
    free(s);
    free(p);
    repulsion_clear(&slater);
    mesh_clear(&mesh);
}
END_TEST

/* 1s² density 4y²exp(-2y): y V = 1 - (1 + y) exp(-2y). */
START_TEST(poisson_gives_the_field_of_a_known_charge)
{
    struct status st = status_ok();
    struct mesh mesh;
    ck_assert(mesh_init(&mesh, 1e-3, 60.0, 1.0, &st));
    size_t n = (size_t)mesh.points;
    double *d = calloc(4 * n, sizeof *d);
    for (size_t i = 0; i < n; i++)
        d[i] = 4.0 * mesh.y[i] * mesh.y[i] * exp(-2.0 * mesh.y[i]);
    double whole = poisson_solve(&mesh, mesh.elements, d, 2.0, d + n, d + 2 * n,
                                 d + 3 * n);
    near(whole, 1.0, 1e-9, 0.0, "charge");
    for (size_t i = 0; i < n; i++) {
        double y = mesh.y[i];
        near(d[2 * n + i], 1.0 - (1.0 + y) * exp(-2.0 * y), 5e-8, 0.0,
             "field at %g", y);
        near(d[n + i], 1.0 - (1.0 + 2.0 * y + 2.0 * y * y) * exp(-2.0 * y),
             1e-7, 0.0, "charge within %g", y);
    }
    free(d);
    mesh_clear(&mesh);
}
END_TEST

/* x -> A x + b with |A| < 1 in ten dimensions: Anderson's method needs about
 * as many steps as there are distinct eigenvalues (here 4). */
START_TEST(mixing_solves_a_linear_problem_in_few_steps)
{
    struct status st = status_ok();
    struct mixer *mixer = mixer_new(10, &st);
    ck_assert_ptr_nonnull(mixer);
    double x[10] = {0}, g[10], weight[10], norm = 1.0;
    mixer_reset(mixer, 10, 8);
    for (int i = 0; i < 10; i++)
        weight[i] = 1.0 + 0.1 * i;
    int steps = 0;
    for (; steps < 50 && norm > 1e-12; steps++) {
        for (int i = 0; i < 10; i++)
            g[i] = (0.9 - 0.6 * (i % 4)) * x[i] + 1.385 + i;
        norm = mixer_next(mixer, weight, 0.6, x, g);
    }
    ck_assert_int_le(steps, 12);
    for (int i = 0; i < 8; i++)
        near(x[i], (1.385 + i) / (0.1 + 0.6 * (i % 4)), 0.0, 1e-10, "x%d", i);
    mixer_free(mixer);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("numeric");
    TCase *c = tcase_create("numeric");
    suite_add_tcase(suite, c);
    tcase_add_test(c, lobatto_points_are_the_handbook_ones);
    tcase_add_test(c, polynomials_are_differentiated_and_integrated_exactly);
    tcase_add_test(c, mesh_integrates_interpolates_and_cumulates);
    tcase_add_test(c, coulomb_levels_are_exact_without_light_speed);
    tcase_add_test(c, coulomb_levels_are_exact_for_dirac);
    tcase_add_test(c, results_do_not_depend_on_the_vector_width);
    tcase_add_test(c, slater_integrals_have_their_closed_values);
    tcase_add_test(c, poisson_gives_the_field_of_a_known_charge);
    tcase_add_test(c, mixing_solves_a_linear_problem_in_few_steps);
    return run_suite(suite);
}
