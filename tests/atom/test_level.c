/* SPDX-License-Identifier: MIT */
/* Levels of one open subshell between LS and jj coupling. */
#include <math.h>

#include "atom/level.h"
#include "atom/term.h"
#include "case.h"
#include "support/near.h"

static double least(double a, double b)
{
    return a < b ? a : b;
}

/* Weak coupling: Landé's interval rule for Hund's level of each lⁿ, λ/2 [J(J+1)
 * - L(L+1) - S(S+1)]; strong: the levels ε = -(l+1)/2 ζ of l-½ fill before the
 * +l/2 ζ of l+½ (E. U. Condon, G. H. Shortley, The Theory of Atomic Spectra
 * (1935), chapters 7 and 10). F^k in the ratio of a hydrogen-like 4f. */
START_TEST(levels_have_both_coupling_limits)
{
    static const double f[3] = {1.0, 0.6681, 0.4943};
    for (int l = 1; l <= 3; l++)
        for (int n = 1; n <= 4 * l + 1; n++) {
            int half = 2 * l + 1, k = n % half;
            double s = 0.5 * (n > half ? 2 * half - n : n);
            double big_l = 0.5 * k * (half - k);
            double j = n > half ? big_l + s : fabs(big_l - s);
            double lande = (n > half ? -1.0 : 1.0) / (2.0 * s) * 0.5 *
                           (j * (j + 1) - big_l * (big_l + 1) - s * (s + 1));
            double jj = -0.5 * (l + 1) * least(n, 2 * l) +
                        0.5 * l * (n > 2 * l ? n - 2 * l : 0);
            near(atom_level_spin_orbit(l, n, 1e-4, f) / 1e-4, lande, 0.01, 0.0,
                 "l = %d, n = %d, weak", l, n);
            near(atom_level_spin_orbit(l, n, 1e4, f) / 1e4, jj, 2e-4, 0.0,
                 "l = %d, n = %d, strong", l, n);
        }
}
END_TEST

/* p² J = 0 and p⁴ J = 2 in closed form, F² = 25: lowest roots of
 * [[-ζ, √2 ζ], [√2 ζ, 15]] and [[-ζ/2, ζ/√2], [ζ/√2, 6]] (Condon and Shortley,
 * chapter 11). */
START_TEST(levels_between_the_limits_are_the_closed_ones)
{
    static const double f[3] = {25.0, 0.0, 0.0}, zeta = 7.3;
    double p2 = 0.5 * (15.0 - zeta) -
                sqrt(0.25 * (15.0 + zeta) * (15.0 + zeta) + 2.0 * zeta * zeta);
    double p4 = 0.5 * (6.0 - 0.5 * zeta) -
                sqrt(0.25 * (6.0 + 0.5 * zeta) * (6.0 + 0.5 * zeta) +
                     0.5 * zeta * zeta);
    near(atom_level_spin_orbit(1, 2, zeta, f), p2, 1e-8, 0.0, "p2");
    near(atom_level_spin_orbit(1, 4, zeta, f), p4, 1e-8, 0.0, "p4");
}
END_TEST

/* A stored J that no level of the stored term has ("3P10" in the source) is
 * not taken: Hund's is. */
START_TEST(a_level_that_cannot_be_is_not_taken)
{
    struct open_subshell d4 = {.l = 2, .electrons = 4, .zeta = 0.1};
    struct term wrong, hund;
    ck_assert(term_parse("3P10", &wrong) && term_parse("5D0", &hund));
    near(atom_term_spin_orbit(&d4, 1, &wrong),
         atom_term_spin_orbit(&d4, 1, &hund), 1e-14, 0.0, "d4");
}
END_TEST

/* Of two open subshells without a stored term neither goes without its shift:
 * a strongly coupled p2 beside f1 is p1/2 twice. */
START_TEST(open_subshells_without_a_term_are_shifted)
{
    const struct term none = {"", -1, -1, -1};
    struct open_subshell pair[2] = {
        {.l = 3, .electrons = 1, .zeta = 1e-6, .f2 = 1.0},
        {.l = 1, .electrons = 2, .zeta = 1e3, .f2 = 1.0}};
    near(atom_term_spin_orbit(pair, 2, &none), -2e3, 0.5, 0.0, "f p2");
}
END_TEST

TCase *case_level(void)
{
    TCase *tc = tcase_create("level");
    tcase_add_test(tc, levels_have_both_coupling_limits);
    tcase_add_test(tc, levels_between_the_limits_are_the_closed_ones);
    tcase_add_test(tc, a_level_that_cannot_be_is_not_taken);
    tcase_add_test(tc, open_subshells_without_a_term_are_shifted);
    return tc;
}
