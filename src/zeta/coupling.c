/* SPDX-License-Identifier: MIT */
#include "zeta/coupling.h"

#include <assert.h>
#include <math.h>
#include <stdbool.h>
#include <stdlib.h>

/* Factorials that occur for l, l' <= 3 and k <= 6: l + k + l' + 1 <= 13. */
static const double factorial[14] = {
    1.0,    1.0,     2.0,      6.0,       24.0,       120.0,       720.0,
    5040.0, 40320.0, 362880.0, 3628800.0, 39916800.0, 479001600.0, 6227020800.0,
};

static bool forbidden(int l, int k, int lp)
{
    return k < abs(l - lp) || k > l + lp || (l + k + lp) % 2 != 0;
}

double coupling_zero(int l, int k, int lp)
{
    if (forbidden(l, k, lp))
        return 0.0;
    int g = (l + k + lp) / 2;
    double ratio = factorial[g] /
                   (factorial[g - l] * factorial[g - k] * factorial[g - lp]);
    return ratio * ratio * factorial[2 * g - 2 * l] * factorial[2 * g - 2 * k] *
           factorial[2 * g - 2 * lp] / factorial[2 * g + 1];
}

static int greatest(int a, int b, int c)
{
    int ab = a > b ? a : b;
    return ab > c ? ab : c;
}

static int least(int a, int b, int c)
{
    int ab = a < b ? a : b;
    return ab < c ? ab : c;
}

/* Wigner's 3j symbol (a b c; alpha beta gamma) for integers, Racah's sum. */
static double wigner(int a, int b, int c, int alpha, int beta)
{
    int gamma = -alpha - beta;
    if (abs(alpha) > a || abs(beta) > b || abs(gamma) > c)
        return 0.0;
    double triangle = factorial[a + b - c] * factorial[a - b + c] *
                      factorial[-a + b + c] / factorial[a + b + c + 1];
    double projections = factorial[a + alpha] * factorial[a - alpha] *
                         factorial[b + beta] * factorial[b - beta] *
                         factorial[c + gamma] * factorial[c - gamma];
    double sum = 0.0;
    int last = least(a + b - c, a - alpha, b + beta);
    for (int t = greatest(0, b - c - alpha, a - c + beta); t <= last; t++) {
        double term = factorial[t] * factorial[c - b + t + alpha] *
                      factorial[c - a + t - beta] * factorial[a + b - c - t] *
                      factorial[a - t - alpha] * factorial[b - t + beta];
        sum += (t % 2 != 0 ? -1.0 : 1.0) / term;
    }
    double sign = abs(a - b - gamma) % 2 != 0 ? -1.0 : 1.0;
    return sign * sqrt(triangle * projections) * sum;
}

double coupling_gaunt(int k, int l, int m, int lp, int mp)
{
    assert(abs(m) <= l && abs(mp) <= lp);
    if (forbidden(l, k, lp))
        return 0.0;
    double sign = abs(m) % 2 != 0 ? -1.0 : 1.0;
    return sign * sqrt((2 * l + 1) * (2 * lp + 1)) * wigner(l, k, lp, 0, 0) *
           wigner(l, k, lp, -m, m - mp);
}

/* Electrons of one spin when q of them stand stretched: up first. */
static int spin_count(int l, int q, bool up)
{
    int room = 2 * l + 1;
    if (up)
        return q < room ? q : room;
    return q > room ? q - room : 0;
}

void coupling_within_stretched(int l, int q, double f[COUPLING_ORDERS])
{
    int up = spin_count(l, q, true), down = spin_count(l, q, false);
    f[0] = 0.5 * q * (q - 1);
    for (int i = 1; i < COUPLING_ORDERS; i++) {
        int k = 2 * i;
        double occupied = 0.0, self = 0.0, exchange = 0.0;
        for (int m = l; k <= 2 * l && m >= -l; m--) {
            int count = (l - m < up) + (l - m < down);
            double c = coupling_gaunt(k, l, m, l, m);
            occupied += count * c;
            self += count * c * c;
            for (int mp = l; count > 0 && mp > m; mp--) {
                double cross = coupling_gaunt(k, l, m, l, mp);
                exchange += count * cross * cross;
            }
        }
        /* direct: pairs = (square of the sum - sum of the squares)/2 */
        f[i] = 0.5 * (occupied * occupied - self) - exchange;
    }
}

void coupling_within_average(int l, int q, double f[COUPLING_ORDERS])
{
    double pairs = 0.5 * q * (q - 1);
    f[0] = pairs;
    for (int i = 1; i < COUPLING_ORDERS; i++)
        f[i] = -pairs * (2 * l + 1) / (4 * l + 1) * coupling_zero(l, 2 * i, l);
}

/* Sum over the occupied projections of c^k(lm, lm). */
static double multipole(int k, int l, int q)
{
    int up = spin_count(l, q, true), down = spin_count(l, q, false);
    double sum = 0.0;
    for (int m = l; m >= -l; m--)
        sum += ((l - m < up) + (l - m < down)) * coupling_gaunt(k, l, m, l, m);
    return sum;
}

/* Sum of c^k(l1 m1, l2 m2)^2 over count1 and count2 electrons of one spin. */
static double exchange_pairs(int k, int l1, int count1, int l2, int count2)
{
    double sum = 0.0;
    for (int m1 = l1; m1 > l1 - count1; m1--) {
        for (int m2 = l2; m2 > l2 - count2; m2--) {
            double c = coupling_gaunt(k, l1, m1, l2, m2);
            sum += c * c;
        }
    }
    return sum;
}

void coupling_between_stretched(int l1, int q1, int l2, int q2,
                                double direct[COUPLING_ORDERS],
                                double exchange[COUPLING_ORDERS])
{
    int most = 2 * (l1 < l2 ? l1 : l2), k0 = abs(l1 - l2);
    for (int i = 0; i < COUPLING_ORDERS; i++) {
        int k = 2 * i;
        direct[i] =
            k <= most ? multipole(k, l1, q1) * multipole(k, l2, q2) : 0.0;
        exchange[i] = 0.0;
        for (int spin = 0; k0 + k <= l1 + l2 && spin < 2; spin++)
            exchange[i] -=
                exchange_pairs(k0 + k, l1, spin_count(l1, q1, spin == 0), l2,
                               spin_count(l2, q2, spin == 0));
    }
}
