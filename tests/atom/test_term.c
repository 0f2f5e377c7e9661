/* SPDX-License-Identifier: MIT */
/* The closed forms of atom/term.c against the mechanics that they come from:
 * all determinants of a configuration, with one-electron spin-orbit coupling
 * and the repulsion of the electrons. Nothing here is taken from term.c. */
#include <math.h>
#include <stdlib.h>

#include "atom/hybrid.h"
#include "atom/term.h"
#include "base/units.h"
#include "case.h"
#include "support/near.h"

/* Normalised Θ(l, m) of x = cos θ, m >= 0, by the recursion in l; E. U.
 * Condon, G. H. Shortley, The Theory of Atomic Spectra (1935), section 4³,
 * without the sign of odd m. */
static double theta(int l, int m, double x)
{
    double before = 0.0, p = sqrt(0.5);
    for (int i = 1; i <= m; i++)
        p *= sqrt((2.0 * i + 1.0) / (2.0 * i) * (1.0 - x * x));
    for (int i = m + 1; i <= l; i++) {
        double a = sqrt((4.0 * i * i - 1.0) / (i * i - m * m));
        double b = sqrt(((2.0 * i + 1.0) * (i - 1.0 - m) * (i - 1.0 + m)) /
                        ((2.0 * i - 3.0) * (i * i - m * m)));
        double next = a * x * p - (i > m + 1 ? b * before : 0.0);
        before = p;
        p = next;
    }
    return p;
}

static double signed_theta(int l, int m, double x)
{
    return (m > 0 && m % 2 != 0 ? -1.0 : 1.0) * theta(l, abs(m), x);
}

/* c^k(l m, l m') by Simpson's rule in θ. */
static double gaunt(int k, int l, int m, int mp)
{
    enum { POINTS = 2001 };
    double sum = 0.0, step = acos(-1.0) / (POINTS - 1);
    if (abs(m - mp) > k)
        return 0.0;
    for (int i = 0; i < POINTS; i++) {
        double x = cos(i * step), weight = i == 0 || i == POINTS - 1 ? 1.0
                                           : i % 2                   ? 4.0
                                                                     : 2.0;
        sum += weight * sin(i * step) * signed_theta(k, m - mp, x) *
               signed_theta(l, m, x) * signed_theta(l, mp, x);
    }
    return sqrt(2.0 / (2.0 * k + 1.0)) * sum * step / 3.0;
}

/* Spin orbitals of a p subshell: 0, 1, 2 with m = 1, 0, -1 and spin up, 3, 4,
 * 5 the same with spin down. */
enum { ORBITALS = 6, STATES_MAX = 20 };

static int m_of(int orbital)
{
    return 1 - orbital % 3;
}

static double spin_of(int orbital)
{
    return orbital < 3 ? 0.5 : -0.5;
}

/* l·s between two spin orbitals. */
static double l_dot_s(int a, int b)
{
    if (a == b)
        return m_of(a) * spin_of(a);
    if (spin_of(a) == spin_of(b) ||
        m_of(a) + spin_of(a) != m_of(b) + spin_of(b))
        return 0.0;
    return 0.5 * sqrt(2.0); /* half of l± between m and m ± 1, l = 1 */
}

/* F² part of (ab|1/r|cd), a and c of the first electron. */
static double repulsion(int a, int b, int c, int d)
{
    if (spin_of(a) != spin_of(c) || spin_of(b) != spin_of(d) ||
        m_of(a) + m_of(b) != m_of(c) + m_of(d))
        return 0.0;
    return gaunt(2, 1, m_of(a), m_of(c)) * gaunt(2, 1, m_of(d), m_of(b));
}

/* Electrons of determinant `state` before orbital a: its sign. */
static double place(unsigned state, int a)
{
    int before = 0;
    for (int i = 0; i < a; i++)
        before += state >> i & 1;
    return before % 2 ? -1.0 : 1.0;
}

/* One matrix element between determinants, by applying the operators
 * a†c and ½ a†b†dc to the right one. */
static double element(unsigned left, unsigned right, double zeta,
                      double v[ORBITALS][ORBITALS][ORBITALS][ORBITALS])
{
    double sum = 0.0;
    for (int c = 0; c < ORBITALS; c++) {
        if (!(right >> c & 1))
            continue;
        unsigned one = right & ~(1u << c);
        double sign = place(right, c);
        for (int a = 0; a < ORBITALS; a++)
            if (!(one >> a & 1) && (one | 1u << a) == left)
                sum += zeta * sign * place(one, a) * l_dot_s(a, c);
        for (int d = 0; d < ORBITALS; d++) {
            if (!(one >> d & 1))
                continue;
            unsigned two = one & ~(1u << d);
            double both = sign * place(one, d);
            for (int b = 0; b < ORBITALS; b++)
                for (int a = 0; a < ORBITALS && !(two >> b & 1); a++) {
                    unsigned three = two | 1u << b;
                    if ((three >> a & 1) || (three | 1u << a) != left)
                        continue;
                    sum += 0.5 * both * place(two, b) * place(three, a) *
                           v[a][b][c][d];
                }
        }
    }
    return sum;
}

/* Lowest eigenvalue of a symmetric matrix: the power method on it, shifted
 * below zero. */
static double lowest(double h[STATES_MAX][STATES_MAX], int n)
{
    double shift = 1.0, value = 0.0, x[STATES_MAX], y[STATES_MAX];
    for (int i = 0; i < n; i++) {
        double row = 0.0;
        for (int j = 0; j < n; j++)
            row += fabs(h[i][j]);
        shift = fmax(shift, row + 1.0);
        x[i] = 1.0 + 0.37 * sin(1.0 + 3.0 * i);
    }
    for (int turn = 0; turn < 6000; turn++) {
        double norm = 0.0;
        value = 0.0;
        for (int i = 0; i < n; i++) {
            y[i] = shift * x[i];
            for (int j = 0; j < n; j++)
                y[i] -= h[i][j] * x[j];
            norm += y[i] * y[i];
        }
        norm = sqrt(norm);
        for (int i = 0; i < n; i++)
            x[i] = y[i] / norm;
        value = shift - norm;
    }
    return value;
}

static double ground_energy(int electrons, double zeta, double f2)
{
    static double v[ORBITALS][ORBITALS][ORBITALS][ORBITALS];
    double h[STATES_MAX][STATES_MAX];
    unsigned state[STATES_MAX];
    int n = 0;
    for (unsigned s = 0; s < 1u << ORBITALS; s++)
        if (__builtin_popcount(s) == electrons)
            state[n++] = s;
    for (int a = 0; a < ORBITALS; a++)
        for (int b = 0; b < ORBITALS; b++)
            for (int c = 0; c < ORBITALS; c++)
                for (int d = 0; d < ORBITALS; d++)
                    v[a][b][c][d] = f2 * repulsion(a, b, c, d);
    for (int i = 0; i < n; i++)
        for (int j = 0; j < n; j++)
            h[i][j] = element(state[i], state[j], zeta, v);
    return lowest(h, n);
}

/* Between both limits of the coupling. */
START_TEST(p_shifts_are_those_of_all_determinants)
{
    static const double ratios[] = {0.02, 0.11, 0.31, 0.83};
    struct term unknown = {"", -1, -1, -1};
    const double f2 = 1.73;
    for (int n = 1; n <= 5; n++)
        for (size_t i = 0; i < sizeof ratios / sizeof *ratios; i++) {
            double zeta = ratios[i] * f2;
            struct open_subshell p = {
                .l = 1, .electrons = n, .zeta = zeta, .f2 = f2};
            near(atom_term_spin_orbit(&p, 1, &unknown),
                 ground_energy(n, zeta, f2) - ground_energy(n, 0.0, f2), 2e-7,
                 0.0, "p%d, zeta/F2 %g", n, ratios[i]);
        }
}
END_TEST

/* Hund's term is the determinant with m = l, l-1 … and one spin; the mean of
 * the terms of highest spin is that of all determinants of one spin. */
START_TEST(hund_shifts_are_those_of_the_stretched_determinant)
{
    const double f[4] = {0.0, 1.31, 0.83, 0.59}; /* F², F⁴, F⁶ */
    for (int l = 2; l <= 3; l++)
        for (int n = 1; n <= 2 * l + 1; n++) {
            double stretched = 0.0, all = 0.0;
            for (int m = l; m >= -l; m--)
                for (int mp = l; mp > m; mp--) {
                    double pair = 0.0;
                    for (int i = 1; i <= l; i++) {
                        double cross = gaunt(2 * i, l, m, mp);
                        pair += f[i] * (gaunt(2 * i, l, m, m) *
                                            gaunt(2 * i, l, mp, mp) -
                                        cross * cross);
                    }
                    all += pair;
                    stretched += l - m < n ? pair : 0.0;
                }
            double mean = all * n * (n - 1.0) / ((2.0 * l + 1.0) * 2.0 * l);
            near(atom_term_hund_shift(l, n, f[1], f[2], l > 2 ? f[3] : 0.0),
                 stretched - mean, 1e-8, 0.0, "l=%d, %d electrons", l, n);
            /* a half-filled subshell more is a sphere more */
            if (n < 2 * l + 1)
                near(atom_term_hund_shift(l, n + 2 * l + 1, f[1], f[2],
                                          l > 2 ? f[3] : 0.0),
                     stretched - mean, 1e-8, 0.0, "l=%d, %d electrons", l,
                     n + 2 * l + 1);
        }
}
END_TEST

/* Interval between the levels j = l ± ½ of one electron: (l + ½) ζ (Condon,
 * Shortley, section 5⁴); of the orbitals as they were solved, exactly, and of
 * the ground terms ²P measured in Al, Ga, In, Tl (NIST ASD: 112.06, 826.19,
 * 2212.60, 7792.7 per cm; values from memory), which a local potential gives a
 * tenth to a fifth too wide. */
START_TEST(spin_orbit_parameters_are_those_of_the_intervals)
{
    static const struct {
        const char *configuration;
        int Z, n, l;
        double interval, ratio; /* 1/cm, 0: not compared; computed / it */
    } atom[] = {
        {"[Ne] 3s2 3p1", 13, 3, 1, 112.06, 1.22},
        {"[Ar] 3d10 4s2 4p1", 31, 4, 1, 826.19, 1.19},
        {"[Kr] 4d10 5s2 5p1", 49, 5, 1, 2212.60, 1.15},
        {"[Xe] 4f14 5d10 6s2 6p1", 81, 6, 1, 7792.7, 1.11},
        {"[Xe] 4f14 5d10 6s2 6p1", 81, 5, 2, 0.0, 0.0},
        {"[Xe] 4f14 5d10 6s2 6p1", 81, 4, 3, 0.0, 0.0},
    };
    struct atom_options dirac = {.functional = ATOM_LDA,
                                 .relativity = ATOM_DIRAC};
    struct atom_solver *solver = case_solver();
    for (size_t i = 0; i < sizeof atom / sizeof *atom; i++) {
        double upper = 0.0, lower = 0.0;
        int n = atom[i].n, l = atom[i].l;
        case_solve(solver, atom[i].Z, atom[i].configuration, &dirac,
                   ATOM_CONVERGED);
        for (int k = 0; k < atom_level_count(solver); k++) {
            struct atom_level level = atom_level_at(solver, k);
            if (level.n == n && level.l == l && level.twice_j == 2 * l + 1)
                upper = level.energy;
            if (level.n == n && level.l == l && level.twice_j == 2 * l - 1)
                lower = level.energy;
        }
        double zeta = atom_zeta(solver, n, l);
        near((l + 0.5) * zeta, upper - lower, 0.0, 1e-12, "Z=%d %d %d",
             atom[i].Z, n, l);
        if (atom[i].interval > 0.0)
            near((l + 0.5) * zeta * HARTREE_EV * EV_PER_CM / atom[i].interval,
                 atom[i].ratio, 0.01, 0.0, "Z=%d interval", atom[i].Z);
    }
    atom_solver_free(solver);
}
END_TEST

TCase *case_term(void)
{
    TCase *c = tcase_create("term");
    tcase_set_timeout(c, 20.0);
    tcase_add_test(c, p_shifts_are_those_of_all_determinants);
    tcase_add_test(c, hund_shifts_are_those_of_the_stretched_determinant);
    tcase_add_test(c, spin_orbit_parameters_are_those_of_the_intervals);
    return c;
}
