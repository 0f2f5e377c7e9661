/* SPDX-License-Identifier: MIT */
#include <stdio.h>
#include <stdlib.h>

#include "suites.h"
#include "support/near.h"
#include "zeta/slater.h"

/* A hydrogen orbital with Z = 1 as a sum c r^power e^(-zeta r). */
struct hydrogen {
    int terms, power[2];
    double zeta, c[2];
};
static const struct hydrogen h1s = {1, {1}, 1.0, {2.0}};
static const struct hydrogen h2s = {
    2, {1, 2}, 0.5, {0.70710678118654752, -0.35355339059327376}};
static const struct hydrogen h2p = {1, {2}, 0.5, {0.20412414523193151}};

/* Integral of r^power e^(-a r), the charge of one pair density. */
static double charge(int power, double a)
{
    double value = 1.0 / a;
    for (int i = 1; i <= power; i++)
        value *= i / a;
    return value;
}

/* R^k of the pairs (a, b) and (c, d). */
static double radial(const struct hydrogen *a, const struct hydrogen *b,
                     const struct hydrogen *c, const struct hydrogen *d, int k)
{
    struct slater_tables *tables = malloc(sizeof *tables);
    ck_assert_ptr_nonnull(tables);
    zeta_slater_tables_fill(tables);
    double sum = 0.0, log_a, x = a->zeta + b->zeta, y = c->zeta + d->zeta;
    for (int i = 0; i < a->terms; i++)
        for (int j = 0; j < b->terms; j++)
            for (int m = 0; m < c->terms; m++)
                for (int n = 0; n < d->terms; n++) {
                    int N = a->power[i] + b->power[j];
                    int M = c->power[m] + d->power[n];
                    sum += a->c[i] * b->c[j] * c->c[m] * d->c[n] *
                           charge(N, x) * charge(M, y) *
                           zeta_slater_integral(tables, N, x, M, y, k, &log_a);
                }
    free(tables);
    return sum;
}

/* Hydrogen-like values, over Z: Condon and Shortley, The Theory of Atomic
 * Spectra (1935), section 8^6 and the usual tables (quoted from memory). */
START_TEST(hydrogen_integrals_are_the_published_fractions)
{
    near(radial(&h1s, &h1s, &h1s, &h1s, 0), 5.0 / 8, 0, 1e-14, "F0 1s1s");
    near(radial(&h1s, &h1s, &h2s, &h2s, 0), 17.0 / 81, 0, 1e-13, "F0 1s2s");
    near(radial(&h1s, &h1s, &h2p, &h2p, 0), 59.0 / 243, 0, 1e-13, "F0 1s2p");
    near(radial(&h2s, &h2s, &h2s, &h2s, 0), 77.0 / 512, 0, 1e-13, "F0 2s2s");
    near(radial(&h2s, &h2s, &h2p, &h2p, 0), 83.0 / 512, 0, 1e-13, "F0 2s2p");
    near(radial(&h2p, &h2p, &h2p, &h2p, 0), 93.0 / 512, 0, 1e-13, "F0 2p2p");
    near(radial(&h2p, &h2p, &h2p, &h2p, 2), 45.0 / 512, 0, 1e-13, "F2 2p2p");
    near(radial(&h1s, &h2s, &h1s, &h2s, 0), 16.0 / 729, 0, 1e-12, "G0 1s2s");
    near(radial(&h1s, &h2p, &h1s, &h2p, 1), 112.0 / 2187, 0, 1e-13, "G1 1s2p");
    near(radial(&h2s, &h2p, &h2s, &h2p, 1), 15.0 / 512 * 3, 0, 1e-13,
         "G1 2s2p");
}
END_TEST

/* The definition by Simpson's rule on a logarithmic mesh, both orders of r. */
static double by_quadrature(int N, double a, int M, double b, int k)
{
    enum { POINTS = 6001 };
    const double low = -9.0, step = 14.0 / (POINTS - 1);
    double *inner = malloc(POINTS * sizeof *inner), sum = 0.0, outer = 0.0;
    ck_assert_ptr_nonnull(inner);
    /* density times r^(k+1) accumulated outwards by the trapezium rule */
    double before = 0.0, total = 0.0, norm_a = 1 / charge(N, a);
    double norm_b = 1 / charge(M, b);
    for (int i = 0; i < POINTS; i++) {
        double r = exp(low + i * step);
        double now = norm_a * pow(r, N + k + 1) * exp(-a * r);
        total += i ? 0.5 * step * (before + now) : 0.0;
        before = now;
        inner[i] = total;
    }
    before = 0.0;
    for (int i = POINTS - 1; i >= 0; i--) {
        double r = exp(low + i * step);
        double now = norm_a * pow(r, N - k) * exp(-a * r);
        outer += i < POINTS - 1 ? 0.5 * step * (before + now) : 0.0;
        before = now;
        double potential = inner[i] * pow(r, -k - 1) + outer * pow(r, k);
        sum += step * norm_b * pow(r, M + 1) * exp(-b * r) * potential;
    }
    free(inner);
    return sum;
}

START_TEST(integrals_are_what_their_definition_gives)
{
    static const struct {
        int N, M, k;
        double a, b;
    } cases[] = {
        {2, 2, 0, 2.385, 1.117}, {3, 7, 0, 5.31, 0.77}, {7, 3, 1, 1.93, 8.4},
        {4, 6, 2, 2.2, 3.7},     {9, 5, 3, 3.3, 1.21},  {8, 8, 4, 1.7, 2.9},
        {11, 7, 5, 2.6, 1.4},    {10, 8, 6, 1.1, 3.3},
    };
    struct slater_tables *tables = malloc(sizeof *tables);
    ck_assert_ptr_nonnull(tables);
    zeta_slater_tables_fill(tables);
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        double log_a;
        int N = cases[i].N, M = cases[i].M, k = cases[i].k;
        near(zeta_slater_integral(tables, N, cases[i].a, M, cases[i].b, k,
                                  &log_a),
             by_quadrature(N, cases[i].a, M, cases[i].b, k), 0, 2e-5,
             "N=%d M=%d k=%d", N, M, k);
    }
    free(tables);
}
END_TEST

START_TEST(integrals_are_symmetric_with_the_right_derivative)
{
    struct slater_tables *tables = malloc(sizeof *tables);
    ck_assert_ptr_nonnull(tables);
    zeta_slater_tables_fill(tables);
    const double a = 1.873, b = 4.119, h = 1e-5;
    for (int N = 2; N <= SLATER_POWER_MAX; N++)
        for (int M = 2; M <= SLATER_POWER_MAX; M++)
            for (int k = 0; k <= SLATER_ORDER_MAX && k < N && k < M; k++) {
                double log_a, log_b, unused;
                double R = zeta_slater_integral(tables, N, a, M, b, k, &log_a);
                near(zeta_slater_integral(tables, M, b, N, a, k, &log_b), R, 0,
                     1e-14, "N=%d M=%d k=%d", N, M, k);
                near(log_a + log_b, R, 0, 1e-13, "N=%d M=%d k=%d scale", N, M,
                     k);
                double up = zeta_slater_integral(tables, N, a * exp(h), M, b, k,
                                                 &unused);
                double down = zeta_slater_integral(tables, N, a * exp(-h), M, b,
                                                   k, &unused);
                near(log_a, (up - down) / (2 * h), 1e-10, 1e-8,
                     "N=%d M=%d k=%d derivative", N, M, k);
            }
    free(tables);
}
END_TEST

START_TEST(lower_orders_follow_from_higher_ones)
{
    struct slater_tables *tables = malloc(sizeof *tables);
    ck_assert_ptr_nonnull(tables);
    zeta_slater_tables_fill(tables);
    const slater_lanes a = {1.873, 0.31}, b = {4.119, 0.87};
    for (int N = 8; N <= SLATER_POWER_MAX; N++)
        for (int M = 8; M <= SLATER_POWER_MAX; M++) {
            struct slater_halves h;
            slater_top(tables, a, N, b, M, 6, &h);
            for (int k = 5; k >= 0; k--) {
                double log_a;
                slater_descend(tables, N, M, k, &h);
                for (int lane = 0; lane < 2; lane++) {
                    double R = zeta_slater_integral(tables, N, a[lane], M,
                                                    b[lane], k, &log_a);
                    near(h.inner[lane] + h.outer[lane], R, 0, 1e-13,
                         "N=%d M=%d k=%d", N, M, k);
                }
            }
        }
    free(tables);
}
END_TEST

TCase *slater_cases(void)
{
    TCase *tc = tcase_create("slater");
    tcase_add_test(tc, hydrogen_integrals_are_the_published_fractions);
    tcase_add_test(tc, integrals_are_what_their_definition_gives);
    tcase_add_test(tc, integrals_are_symmetric_with_the_right_derivative);
    tcase_add_test(tc, lower_orders_follow_from_higher_ones);
    return tc;
}
