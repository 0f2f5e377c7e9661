/* SPDX-License-Identifier: MIT */
#include <stdio.h>
#include <stdlib.h>

#include "zeta/coupling.h"
#include "suites.h"
#include "support/near.h"

/* Condon and Shortley, The Theory of Atomic Spectra (1935), section 5^6 and
 * tables 1^6, 3^6: F_k = F^k/D_k. */
static const double d_k[4][4] = {
    {1, 0, 0, 0},
    {1, 25, 0, 0},
    {1, 49, 441, 0},
    {1, 225, 1089, 7361.64},
};

/* Energies of the lowest terms over F_0, F_2, F_4, F_6 as the textbook prints
 * them (the same, section 5^7 to 5^9; quoted from memory). */
static const struct {
    double f[4];
    const char *term;
    int l, q;
} terms[] = {
    {{1, -5, 0, 0}, "p2 3P", 1, 2},      {{3, -15, 0, 0}, "p3 4S", 1, 3},
    {{6, -15, 0, 0}, "p4 3P", 1, 4},     {{1, -8, -9, 0}, "d2 3F", 2, 2},
    {{3, -15, -72, 0}, "d3 4F", 2, 3},   {{10, -35, -315, 0}, "d5 6S", 2, 5},
    {{1, -25, -51, -13}, "f2 3H", 3, 2}, {{3, -65, -141, -221}, "f3 4I", 3, 3},
};

START_TEST(stretched_terms_are_those_of_the_textbook)
{
    for (size_t t = 0; t < sizeof terms / sizeof terms[0]; t++) {
        double f[COUPLING_ORDERS];
        coupling_within_stretched(terms[t].l, terms[t].q, f);
        for (int i = 0; i <= terms[t].l; i++)
            near(f[i] * d_k[terms[t].l][i], terms[t].f[i], 1e-11, 1e-12,
                 "%s F_%d", terms[t].term, 2 * i);
    }
}
END_TEST

/* Condon and Shortley, table 1^6, squares over D_k (quoted from memory). */
static const struct {
    int k, l, m, lp, mp, sign;
    double square;
} gaunt[] = {
    {1, 0, 0, 1, 0, 1, 1.0 / 3},   {2, 1, 1, 1, 1, -1, 1.0 / 25},
    {2, 1, 0, 1, 0, 1, 4.0 / 25},  {2, 1, 1, 1, -1, -1, 6.0 / 25},
    {2, 0, 0, 2, 2, 1, 1.0 / 5},   {2, 2, 2, 2, 2, -1, 4.0 / 49},
    {2, 2, 1, 2, 1, 1, 1.0 / 49},  {2, 2, 0, 2, 0, 1, 4.0 / 49},
    {4, 2, 2, 2, 2, 1, 1.0 / 441}, {4, 2, 0, 2, 0, 1, 36.0 / 441},
    {1, 1, 0, 2, 0, 1, 4.0 / 15},  {3, 1, 1, 2, 2, 1, 3.0 / 245},
};

START_TEST(gaunt_coefficients_are_those_of_the_textbook)
{
    for (size_t i = 0; i < sizeof gaunt / sizeof gaunt[0]; i++) {
        double c = coupling_gaunt(gaunt[i].k, gaunt[i].l, gaunt[i].m,
                                  gaunt[i].lp, gaunt[i].mp);
        near(c, gaunt[i].sign * sqrt(gaunt[i].square), 1e-14, 0,
             "c^%d(%d %d, %d %d)", gaunt[i].k, gaunt[i].l, gaunt[i].m,
             gaunt[i].lp, gaunt[i].mp);
    }
}
END_TEST

/* Unsoeld's theorem: the sum over m' of c^k(lm, l'm')^2 does not depend on m
 * and is (2l'+1) (l k l'; 000)^2. */
START_TEST(a_full_subshell_looks_the_same_from_every_m)
{
    for (int l = 0; l <= 3; l++)
        for (int lp = 0; lp <= 3; lp++)
            for (int k = 0; k <= 6; k++)
                for (int m = -l; m <= l; m++) {
                    double sum = 0.0;
                    for (int mp = -lp; mp <= lp; mp++) {
                        double c = coupling_gaunt(k, l, m, lp, mp);
                        sum += c * c;
                    }
                    near(sum, (2 * lp + 1) * coupling_zero(l, k, lp), 1e-13, 0,
                         "l=%d l'=%d k=%d m=%d", l, lp, k, m);
                }
}
END_TEST

/* Slater, Quantum Theory of Atomic Structure (1960), vol. 1, chapter 14: the
 * mean energy of a pair of equivalent electrons (quoted from memory). */
START_TEST(average_of_a_pair_is_the_textbooks)
{
    static const double pair[4][4] = {
        {1, 0, 0, 0},
        {1, -2.0 / 25, 0, 0},
        {1, -2.0 / 63, -2.0 / 63, 0},
        {1, -4.0 / 195, -2.0 / 143, -100.0 / 5577},
    };
    for (int l = 0; l <= 3; l++)
        for (int q = 0; q <= 4 * l + 2; q++) {
            double f[COUPLING_ORDERS];
            coupling_within_average(l, q, f);
            for (int i = 0; i <= l; i++)
                near(f[i], 0.5 * q * (q - 1) * pair[l][i], 1e-12, 1e-13,
                     "l=%d q=%d F^%d", l, q, 2 * i);
        }
}
END_TEST

/* One electron, a full subshell and one hole have one term: no choice. */
START_TEST(subshells_with_one_term_have_the_average_energy)
{
    for (int l = 0; l <= 3; l++) {
        const int counts[] = {0, 1, 4 * l + 1, 4 * l + 2};
        for (int c = 0; c < 4; c++) {
            double f[COUPLING_ORDERS], mean[COUPLING_ORDERS];
            coupling_within_stretched(l, counts[c], f);
            coupling_within_average(l, counts[c], mean);
            for (int i = 0; i < COUPLING_ORDERS; i++)
                near(f[i], mean[i], 1e-11, 0, "l=%d q=%d i=%d", l, counts[c],
                     i);
        }
    }
}
END_TEST

START_TEST(a_full_subshell_couples_as_the_average)
{
    for (int l1 = 0; l1 <= 3; l1++)
        for (int l2 = 0; l2 <= 3; l2++)
            for (int q = 0; q <= 4 * l2 + 2; q++) {
                double direct[COUPLING_ORDERS], exchange[COUPLING_ORDERS];
                int full = 4 * l1 + 2, k0 = abs(l1 - l2);
                if (l1 == l2)
                    continue;
                coupling_between_stretched(l1, full, l2, q, direct, exchange);
                near(direct[0], full * q, 1e-10, 0, "l=%d %d q=%d", l1, l2, q);
                for (int i = 0; i < COUPLING_ORDERS; i++) {
                    if (i > 0)
                        near(direct[i], 0, 1e-12, 0, "l=%d %d q=%d F", l1, l2,
                             q);
                    near(exchange[i],
                         -0.5 * full * q * coupling_zero(l1, k0 + 2 * i, l2),
                         1e-11, 0, "l=%d %d q=%d G", l1, l2, q);
                }
            }
}
END_TEST

/* s d5, seven parallel spins less one: each s-d pair has exchange G^2/5
 * (Condon and Shortley, section 8^6). */
START_TEST(parallel_spins_exchange_fully)
{
    double direct[COUPLING_ORDERS], exchange[COUPLING_ORDERS];
    coupling_between_stretched(0, 1, 2, 5, direct, exchange);
    near(direct[0], 5, 1e-12, 0, "s d5 F^0");
    near(exchange[0], -1, 1e-12, 0, "s d5 G^2");
}
END_TEST

TCase *coupling_cases(void)
{
    TCase *tc = tcase_create("coupling");
    tcase_add_test(tc, stretched_terms_are_those_of_the_textbook);
    tcase_add_test(tc, gaunt_coefficients_are_those_of_the_textbook);
    tcase_add_test(tc, a_full_subshell_looks_the_same_from_every_m);
    tcase_add_test(tc, average_of_a_pair_is_the_textbooks);
    tcase_add_test(tc, subshells_with_one_term_have_the_average_energy);
    tcase_add_test(tc, a_full_subshell_couples_as_the_average);
    tcase_add_test(tc, parallel_spins_exchange_fully);
    return tc;
}
