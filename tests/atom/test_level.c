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

/* Lowest root of a symmetric matrix of two or three rows with a[0][0] <=
 * a[1][1], by halving the interval below the first pivot. */
static double lowest_root(double a, double b, double c, double ab, double ac,
                          double bc)
{
    double low = a - fabs(ab) - fabs(ac) - fabs(b) - fabs(c) - fabs(bc),
           high = least(a, least(b, c));
    for (int k = 0; k < 200; k++) {
        double x = 0.5 * (low + high), p = b - x - ab * ab / (a - x);
        double q = bc - ab * ac / (a - x);
        double r = c - x - ac * ac / (a - x) - q * q / p;
        if (a - x > 0.0 && p > 0.0 && r > 0.0)
            low = x;
        else
            high = x;
    }
    return low;
}

/* d2 J = 2 (3F, 3P, 1D), f2 J = 4 (3H, 3F, 1G) and f12 J = 6 (3H, 1I). Terms:
 * Condon and Shortley, section 5 of chapter 7, with F_k = F^k/D_k, D = 49, 441
 * for d and 225, 1089, 7361.64 for f. Spin-orbit: the diagonal is Landé's; what
 * is beside it follows from the roots without repulsion, those of jj coupling
 * (trace of the square, determinant). */
START_TEST(levels_of_two_electrons_are_those_of_three_terms)
{
    for (int k = 0; k <= 8; k++) {
        double z = 0.02 * pow(3.0, k), f[3] = {11.0, 7.1, 5.2};
        double d2 = f[0] / 49.0, d4 = f[1] / 441.0;
        double root = lowest_root(-2.0 * z, 0.5 * z + 15.0 * d2 - 75.0 * d4,
                                  5.0 * d2 + 45.0 * d4, 0.0, sqrt(2.4) * z,
                                  sqrt(2.1) * z);
        near(atom_level_spin_orbit(2, 2, z, f), root, 1e-8, 1e-8, "d2 %g", z);
        double f2 = f[0] / 225.0, f4 = f[1] / 1089.0, f6 = f[2] / 7361.64;
        root =
            lowest_root(-3.0 * z, 1.5 * z + 15.0 * f2 + 18.0 * f4 - 273.0 * f6,
                        -5.0 * f2 + 148.0 * f4 + 91.0 * f6, 0.0,
                        sqrt(10.0 / 3.0) * z, sqrt(11.0 / 3.0) * z);
        near(atom_level_spin_orbit(3, 2, z, f), root, 1e-8, 1e-8, "f2 %g", z);
        root = lowest_root(-2.5 * z, 50.0 * f2 + 60.0 * f4 + 14.0 * f6, 1e9,
                           sqrt(1.5) * z, 0.0, 0.0);
        near(atom_level_spin_orbit(3, 12, z, f), root, 1e-8, 1e-8, "f12 %g", z);
    }
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
    tcase_add_test(tc, levels_of_two_electrons_are_those_of_three_terms);
    tcase_add_test(tc, a_level_that_cannot_be_is_not_taken);
    tcase_add_test(tc, open_subshells_without_a_term_are_shifted);
    return tc;
}
