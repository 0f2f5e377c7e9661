/* SPDX-License-Identifier: MIT */
/* In determinants of m and spin with M_J = 0 or ½, which every level has one
 * state of: the matrix is real and sparse, its lowest root comes from Lanczos'
 * recursion. */
#include "atom/level.h"

#include <math.h>
#include <stdint.h>
#include <string.h>

/* STATES: of one electron in f; BLOCK: determinants of f⁷ with M_J = ½;
 * ENTRIES: non-zero elements above the diagonal, f⁷; STEPS: of the recursion.
 * PAIRS: values of m_a, m_b, m_c. */
enum { STATES = 14, BLOCK = 327, ENTRIES = 12000, STEPS = 100, M_MAX = 7 };

struct entry {
    int16_t row, column;
    double coulomb, spin_orbit;
};

struct block {
    int l, size, entries;
    uint16_t determinant[BLOCK];
    double coulomb[BLOCK], spin_orbit[BLOCK]; /* the diagonal */
    struct entry entry[ENTRIES];
    double gaunt[4][M_MAX][M_MAX]; /* c^k(l m, l m'), k = 0, 2, 4, 6 */
};

static double factorial(int n)
{
    double product = 1.0;
    for (int i = 2; i <= n; i++)
        product *= i;
    return product;
}

/* 3j symbol (l k l; -m q m'), q = m - m'; Racah's formula as in A. R. Edmonds,
 * Angular Momentum in Quantum Mechanics, equation 3.6.10. */
static double three_j(int l, int k, int m, int n)
{
    int a = l, b = k, c = l, am = -m, bm = m - n, cm = n;
    if (bm > b || bm < -b)
        return 0.0;
    double triangle = factorial(a + b - c) * factorial(a - b + c) *
                      factorial(-a + b + c) / factorial(a + b + c + 1);
    double root = sqrt(triangle * factorial(a + am) * factorial(a - am) *
                       factorial(b + bm) * factorial(b - bm) *
                       factorial(c + cm) * factorial(c - cm));
    double sum = 0.0;
    for (int t = 0; t <= a + b - c; t++) {
        int x[] = {t,          c - b + t + am, c - a + t - bm, a + b - c - t,
                   a - t - am, b - t + bm};
        double product = 1.0;
        for (int i = 0; i < 6; i++)
            product = x[i] < 0 ? 0.0 : product * factorial(x[i]);
        if (product > 0.0)
            sum += (t % 2 ? -1.0 : 1.0) / product;
    }
    return ((a - b - cm) % 2 ? -1.0 : 1.0) * root * sum;
}

static void fill_gaunt(struct block *b)
{
    int l = b->l;
    for (int k = 0; k <= 2 * l; k += 2)
        for (int m = -l; m <= l; m++)
            for (int n = -l; n <= l; n++)
                b->gaunt[k / 2][m + l][n + l] =
                    (m % 2 ? -1.0 : 1.0) * (2 * l + 1) * three_j(l, k, 0, 0) *
                    three_j(l, k, m, n);
}

/* State i: m = i mod (2l+1) - l, spin up in the lower half. */
static int m_of(const struct block *b, int i)
{
    return i % (2 * b->l + 1) - b->l;
}

static int twice_spin(const struct block *b, int i)
{
    return i < 2 * b->l + 1 ? 1 : -1;
}

/* ⟨pq|rs⟩ of 1/r12 without F⁰, which is the same for all. */
static double repulsion(const struct block *b, int p, int q, int r, int s,
                        const double f[3])
{
    int l = b->l, mp = m_of(b, p), mq = m_of(b, q), mr = m_of(b, r),
        ms = m_of(b, s);
    double sum = 0.0;
    if (mp + mq != mr + ms || twice_spin(b, p) != twice_spin(b, r) ||
        twice_spin(b, q) != twice_spin(b, s))
        return 0.0;
    for (int k = 1; k <= l; k++)
        sum += b->gaunt[k][mp + l][mr + l] * b->gaunt[k][ms + l][mq + l] *
               f[k - 1];
    return sum;
}

/* Sign of the operator that moves an electron from state i of a determinant to
 * state j. */
static double sign_of(uint16_t determinant, int i, int j)
{
    int low = i < j ? i : j, high = i < j ? j : i, between = 0;
    for (int k = low + 1; k < high; k++)
        between += determinant >> k & 1;
    return between % 2 ? -1.0 : 1.0;
}

/* The matrix element of l·s between two states of opposite spin. */
static double flip(const struct block *b, int i, int j)
{
    int l = b->l, up = twice_spin(b, i) > 0 ? i : j, down = up == i ? j : i;
    int m = m_of(b, up);
    if (twice_spin(b, up) == twice_spin(b, down) || m_of(b, down) != m + 1)
        return 0.0;
    return 0.5 * sqrt((l - m) * (l + m + 1.0));
}

/* One element off the diagonal, of determinants that differ in one state or in
 * two. */
static void add_entry(struct block *b, int row, int column, const double f[3])
{
    uint16_t from = b->determinant[row], to = b->determinant[column];
    int out[2], in[2], outs = 0, ins = 0;
    for (int i = 0; i < STATES; i++) {
        int here = from >> i & 1, there = to >> i & 1;
        if (here > there && outs < 2)
            out[outs++] = i;
        if (here < there && ins < 2)
            in[ins++] = i;
    }
    struct entry e = {(int16_t)row, (int16_t)column, 0.0, 0.0};
    double sign = sign_of(from, out[0], in[0]);
    if (outs == 1) {
        e.spin_orbit = sign * flip(b, out[0], in[0]);
    } else {
        uint16_t moved = (uint16_t)((from & ~(1u << out[0])) | 1u << in[0]);
        sign *= sign_of(moved, out[1], in[1]);
        e.coulomb = sign * (repulsion(b, in[0], in[1], out[0], out[1], f) -
                            repulsion(b, in[0], in[1], out[1], out[0], f));
    }
    if ((fabs(e.coulomb) > 0.0 || fabs(e.spin_orbit) > 0.0) &&
        b->entries < ENTRIES)
        b->entry[b->entries++] = e;
}

static int bits(unsigned x)
{
    int count = 0;
    for (; x; x &= x - 1)
        count++;
    return count;
}

/* All determinants of the block, with the diagonal. */
static void fill_determinants(struct block *b, int electrons, const double f[3])
{
    int states = 4 * b->l + 2;
    for (unsigned d = 0; d < 1u << states; d++) {
        int twice_m = 0;
        if (bits(d) != electrons)
            continue;
        for (int i = 0; i < states; i++)
            if (d >> i & 1)
                twice_m += 2 * m_of(b, i) + twice_spin(b, i);
        if (twice_m != electrons % 2 || b->size == BLOCK)
            continue;
        int at = b->size++;
        b->determinant[at] = (uint16_t)d;
        for (int i = 0; i < states; i++) {
            if (!(d >> i & 1))
                continue;
            b->spin_orbit[at] += 0.5 * m_of(b, i) * twice_spin(b, i);
            for (int j = 0; j < i; j++)
                if (d >> j & 1)
                    b->coulomb[at] += repulsion(b, i, j, i, j, f) -
                                      repulsion(b, i, j, j, i, f);
        }
    }
}

static void multiply(const struct block *b, double zeta, const double *x,
                     double *y)
{
    for (int i = 0; i < b->size; i++)
        y[i] = (b->coulomb[i] + zeta * b->spin_orbit[i]) * x[i];
    for (int k = 0; k < b->entries; k++) {
        const struct entry *e = &b->entry[k];
        double h = e->coulomb + zeta * e->spin_orbit;
        y[e->row] += h * x[e->column];
        y[e->column] += h * x[e->row];
    }
}

/* Lowest root of a symmetric tridiagonal matrix, by counting signs. */
static double lowest_of(const double *diagonal, const double *beside, int n)
{
    double low = HUGE_VAL, high = HUGE_VAL;
    for (int i = 0; i < n; i++) {
        double width = (i > 0 ? fabs(beside[i - 1]) : 0.0) +
                       (i + 1 < n ? fabs(beside[i]) : 0.0);
        low = fmin(low, diagonal[i] - width);
        high = fmin(high, diagonal[i]);
    }
    for (int k = 0; k < 100; k++) {
        double middle = 0.5 * (low + high), d = 1.0;
        int below = 0;
        for (int i = 0; i < n; i++) {
            double b2 = i > 0 ? beside[i - 1] * beside[i - 1] : 0.0;
            d = diagonal[i] - middle - (i > 0 ? b2 / d : 0.0);
            d = fabs(d) < 1e-300 ? 1e-300 : d;
            below += d < 0.0;
        }
        if (below > 0)
            high = middle;
        else
            low = middle;
    }
    return high;
}

static double lowest(const struct block *b, double zeta)
{
    double diagonal[STEPS], beside[STEPS];
    double v[BLOCK], before[BLOCK] = {0.0}, w[BLOCK], last = 0.0;
    int n = 0;
    for (int i = 0; i < b->size; i++) /* has a part of every level */
        v[i] = 1.0 + 0.3 * sin(2.0 * i + 1.0);
    double norm = 0.0;
    for (int i = 0; i < b->size; i++)
        norm += v[i] * v[i];
    for (int i = 0; i < b->size; i++)
        v[i] /= sqrt(norm);
    for (; n < STEPS && n < b->size; n++) {
        double a = 0.0, next = 0.0;
        multiply(b, zeta, v, w);
        for (int i = 0; i < b->size; i++)
            a += v[i] * w[i];
        diagonal[n] = a;
        for (int i = 0; i < b->size; i++) {
            w[i] -= a * v[i] + last * before[i];
            next += w[i] * w[i];
        }
        beside[n] = last = sqrt(next);
        if (last < 1e-12 * (fabs(a) + 1e-300)) {
            n++;
            break;
        }
        for (int i = 0; i < b->size; i++) {
            before[i] = v[i];
            v[i] = w[i] / last;
        }
    }
    return lowest_of(diagonal, beside, n);
}

double atom_level_spin_orbit(int l, int electrons, double zeta,
                             const double f[3])
{
    static struct block b; /* 300 kB: too large for the stack */
    memset(&b, 0, sizeof b);
    b.l = l;
    fill_gaunt(&b);
    fill_determinants(&b, electrons, f);
    for (int i = 0; i < b.size; i++)
        for (int j = i + 1; j < b.size; j++) {
            int apart = bits(b.determinant[i] ^ b.determinant[j]);
            if (apart == 2 || apart == 4)
                add_entry(&b, i, j, f);
        }
    return lowest(&b, zeta) - lowest(&b, 0.0);
}
