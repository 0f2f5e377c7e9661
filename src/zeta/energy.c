/* SPDX-License-Identifier: MIT */
/* One evaluation: overlaps and one-electron integrals; orthonormal orbitals
 * and density per l; Coulomb energy of all pair densities; exchange per pair
 * of l (exchange.c); then everything is scaled to fulfil the virial theorem
 * and the derivatives are collected.
 *
 * With one function per subshell the closed subshells of an l span the whole
 * block, so their density is 4l+2 times the inverse overlap whatever the
 * orbitals are: no self-consistent field is needed. Only an open subshell has
 * an orbital of its own. */
#include "zeta/energy.h"

#include <assert.h>
#include <math.h>
#include <stddef.h>
#include <string.h>

#include "zeta/exchange.h"

/* x to the power n >= 1. */
static double whole_power(double x, int n)
{
    double result = n % 2 != 0 ? x : 1.0;
    while ((n /= 2) > 0) {
        x *= x;
        if (n % 2 != 0)
            result *= x;
    }
    return result;
}

static double factorial(int n)
{
    double product = 1.0;
    for (int i = 2; i <= n; i++)
        product *= i;
    return product;
}

static void pairs_add(const struct energy *e, struct energy_pairs *list, int i,
                      int j, double m)
{
    int p = list->count++;
    assert(p < CHARGE_MAX);
    int ni = e->atom.n[i], nj = e->atom.n[j];
    list->N[p] = ni + nj;
    list->i[p] = i;
    list->j[p] = j;
    list->b[p] = i - e->atom.block[e->atom.l[i]].first;
    list->d[p] = j - e->atom.block[e->atom.l[j]].first;
    list->m[p] = m;
    list->at[p] =
        m > 0.0 && e->atom.l[i] == e->atom.l[j] ? e->charge_at[i][j] : 0;
    list->norm[p] = m > 0.0 ? factorial(ni + nj) /
                                  sqrt(factorial(2 * ni) * factorial(2 * nj))
                            : 0.0;
}

/* An empty entry beside the last one where its N stands an odd number of
 * times. */
static void pairs_even(const struct energy *e, struct energy_pairs *list)
{
    if (list->count % 2 != 0) {
        int last = list->count - 1;
        pairs_add(e, list, list->i[last], list->j[last], 0.0);
    }
}

/* The pairs i, j of subshells with n_i + n_j = N between two blocks. */
static void pairs_between(const struct energy *e, struct energy_pairs *list,
                          int N, int l1, int l2)
{
    const struct energy_block *b1 = &e->atom.block[l1];
    const struct energy_block *b2 = &e->atom.block[l2];
    for (int a = 0; a < b1->count; a++) {
        int n2 = N - (l1 + 1 + a), c = n2 - l2 - 1;
        if (c < 0 || c >= b2->count || (l1 == l2 && c < a))
            continue;
        pairs_add(e, list, b1->first + a, b2->first + c,
                  l1 == l2 && a != c ? 2.0 : 1.0);
    }
}

void energy_prepare(struct energy *e)
{
    struct energy_pairs *charges = &e->charges;
    charges->count = 0;
    memset(e->charge_at, 0, sizeof e->charge_at);
    for (int N = 2; N <= SLATER_POWER_MAX; N++) {
        for (int l = 0; l < BLOCK_COUNT; l++)
            pairs_between(e, charges, N, l, l);
        pairs_even(e, charges);
    }
    for (int p = 0; p < charges->count; p++) {
        if (charges->m[p] > 0.0) {
            e->charge_at[charges->i[p]][charges->j[p]] = p;
            e->charge_at[charges->j[p]][charges->i[p]] = p;
        }
    }
    for (int l1 = 0; l1 < BLOCK_COUNT; l1++) {
        for (int l2 = l1; l2 < BLOCK_COUNT; l2++) {
            struct energy_pairs *list = &e->pairs[l1][l2];
            list->count = 0;
            for (int N = 2; N <= SLATER_POWER_MAX; N++) {
                pairs_between(e, list, N, l1, l2);
                pairs_even(e, list);
            }
        }
    }
}

/* Exponents and charges of the pair densities. */
static void pairs_move(const struct energy *e, struct energy_pairs *list)
{
    for (int p = 0; p < list->count; p++) {
        int i = list->i[p], j = list->j[p];
        double a = e->zeta[i] + e->zeta[j];
        list->a[p] = a;
        list->s[p] = list->norm[p] * e->power[i] * e->power[j] /
                     whole_power(a, list->N[p] + 1);
        list->w[p] = 0.0;
        list->v[p] = 0.0;
    }
}

static void lists_move(struct energy *e)
{
    pairs_move(e, &e->charges);
    for (int l1 = 0; l1 < BLOCK_COUNT; l1++) {
        for (int l2 = l1 + 1; l2 < BLOCK_COUNT; l2++)
            pairs_move(e, &e->pairs[l1][l2]);
        for (int p = 0; p < e->pairs[l1][l1].count; p++)
            e->pairs[l1][l1].a[p] =
                e->zeta[e->pairs[l1][l1].i[p]] + e->zeta[e->pairs[l1][l1].j[p]];
    }
}

/* Cholesky factor of the overlap of a block, inverted: the rows of linv are
 * Schmidt's orbitals from the inside out. */
static bool block_orthonormalise(struct energy *e, int l)
{
    const struct energy_block *b = &e->atom.block[l];
    struct energy_matrices *mat = &e->matrices[l];
    double factor[BLOCK_MAX][BLOCK_MAX];
    for (int i = 0; i < b->count; i++) {
        for (int j = 0; j <= i; j++) {
            double sum = e->charges.s[e->charge_at[b->first + i][b->first + j]];
            for (int k = 0; k < j; k++)
                sum -= factor[i][k] * factor[j][k];
            if (j < i) {
                factor[i][j] = sum * factor[j][j];
                continue;
            }
            if (!(sum > 1e-10))
                return false;
            factor[i][i] = 1.0 / sqrt(sum); /* the reciprocal diagonal */
        }
    }
    for (int i = 0; i < b->count; i++) {
        for (int j = 0; j < i; j++) {
            double sum = 0.0;
            for (int k = j; k < i; k++)
                sum -= factor[i][k] * mat->linv[k][j];
            mat->linv[i][j] = sum * factor[i][i];
        }
        mat->linv[i][i] = factor[i][i];
    }
    return true;
}

/* Cayley's rotation of the outermost orbital into the inner ones. */
static void block_open(const struct energy_block *b,
                       struct energy_matrices *mat, const double x[])
{
    int last = b->count - 1;
    double square = 0.0;
    for (int i = 0; i < last; i++)
        square += x[b->kappa + i] * x[b->kappa + i];
    for (int i = 0; i < last; i++)
        mat->turn[i] = 2.0 * x[b->kappa + i] / (1.0 + square);
    mat->turn[last] = (1.0 - square) / (1.0 + square);
    for (int i = 0; i <= last; i++) {
        mat->open[i] = 0.0;
        mat->pull[i] = 0.0;
        for (int k = i; k <= last; k++)
            mat->open[i] += mat->linv[k][i] * mat->turn[k];
    }
}

/* Density of a block: every subshell full, less the holes of the open one. */
static void block_density(const struct energy_block *b,
                          struct energy_matrices *mat)
{
    double holes = b->open > 0 ? b->full - b->open : 0.0;
    for (int i = 0; i < b->count; i++) {
        for (int j = 0; j <= i; j++) {
            double sum = 0.0;
            for (int k = i; k < b->count; k++)
                sum += mat->linv[k][i] * mat->linv[k][j];
            sum *= b->full;
            if (b->open > 0)
                sum -= holes * mat->open[i] * mat->open[j];
            mat->density[i][j] = sum;
            mat->density[j][i] = sum;
            mat->fock[i][j] = 0.0;
            mat->fock[j][i] = 0.0;
        }
    }
}

/* Coulomb integrals of pair p with all before it, and what it gives to the
 * potentials w and to v, the derivatives by ln a. */
static void coulomb_row(struct energy *e, int p, double w[], double v[])
{
    const struct energy_pairs *c = &e->charges;
    const double *charge = e->charge;
    slater_lanes a = {c->a[p], c->a[p]}, own = {charge[p], charge[p]};
    slater_lanes wp = {0.0, 0.0}, vp = {0.0, 0.0};
    struct slater_halves h;
    int q = 0;
    for (; q + 1 < p; q += 2) {
        slater_top(&e->tables, a, c->N[p], *(const slater_lanes *)&c->a[q],
                   c->N[q], 0, &h);
        slater_lanes R = h.inner + h.outer;
        *(slater_lanes *)&e->coulomb[p][q] = R;
        *(slater_lanes *)&e->coulomb_a[p][q] = h.outer;
        slater_lanes other = *(const slater_lanes *)&charge[q];
        wp += R * other;
        vp += h.outer * other;
        *(slater_lanes *)&w[q] += R * own;
        *(slater_lanes *)&v[q] += h.inner * own;
    }
    /* the diagonal lies in the last vector: its first lane where p is even */
    slater_top(&e->tables, a, c->N[p], *(const slater_lanes *)&c->a[q], c->N[q],
               0, &h);
    slater_lanes R = h.inner + h.outer;
    *(slater_lanes *)&e->coulomb[p][q] = R;
    *(slater_lanes *)&e->coulomb_a[p][q] = h.outer;
    wp[0] += R[0] * charge[q];
    vp[0] += h.outer[0] * charge[q];
    if (q < p) {
        wp[1] += R[1] * charge[p];
        vp[1] += h.outer[1] * charge[p];
        w[q] += R[0] * charge[p];
        v[q] += h.inner[0] * charge[p];
    }
    w[p] += wp[0] + wp[1];
    v[p] += vp[0] + vp[1];
}

/* Coulomb energy of the whole density: starts w, v and the Fock matrices. */
static void coulomb(struct energy *e)
{
    struct energy_pairs *c = &e->charges;
    for (int p = 0; p < c->count; p++) {
        int l = e->atom.l[c->i[p]], first = e->atom.block[l].first;
        e->charge[p] = c->m[p] * c->s[p] *
                       e->matrices[l].density[c->i[p] - first][c->j[p] - first];
    }
    for (int p = 0; p < c->count; p++)
        if (c->m[p] > 0.0)
            coulomb_row(e, p, c->w, c->v);
    for (int p = 0; p < c->count; p++) {
        int l = e->atom.l[c->i[p]], first = e->atom.block[l].first;
        double f = c->s[p] * c->w[p];
        c->w[p] *= e->charge[p];
        c->v[p] *= e->charge[p];
        if (c->m[p] <= 0.0)
            continue;
        e->matrices[l].fock[c->i[p] - first][c->j[p] - first] = f;
        e->matrices[l].fock[c->j[p] - first][c->i[p] - first] = f;
    }
}

/* Kinetic and nuclear energy. Kinetic energy of a pair over its charge: half
 * of the integral of P_i' P_j' + l(l+1) P_i P_j/r^2. Adds the nuclear part to w
 * and v; returns it. */
static double one_electron(struct energy *e, double *kinetic)
{
    struct energy_pairs *c = &e->charges;
    double nuclear = 0.0;
    *kinetic = 0.0;
    for (int p = 0; p < c->count; p++) {
        if (c->m[p] <= 0.0)
            continue;
        int i = c->i[p], j = c->j[p], N = c->N[p], l = e->atom.l[i];
        int ni = e->atom.n[i], nj = e->atom.n[j];
        double zi = e->zeta[i], zj = e->zeta[j], a = c->a[p];
        double square = (ni * nj + l * (l + 1)) * a / (N - 1);
        double mixed = ni * zj + nj * zi;
        double over = 1.0 / N;
        double t = 0.5 * ((square - mixed) * a * over + zi * zj);
        double rest = (2.0 * square - mixed) * over;
        e->kinetic_i[p] = 0.5 * zi * (rest - nj * a * over + zj);
        e->kinetic_j[p] = 0.5 * zj * (rest - ni * a * over + zi);
        e->kinetic_charge[p] = t;
        double attraction = -e->atom.Z * a * over;
        *kinetic += e->charge[p] * t;
        nuclear += e->charge[p] * attraction;
        c->w[p] += e->charge[p] * attraction;
        c->v[p] += e->charge[p] * attraction;
        struct energy_matrices *mat = &e->matrices[l];
        int first = e->atom.block[l].first;
        mat->kinetic[i - first][j - first] = c->s[p] * t;
        mat->kinetic[j - first][i - first] = c->s[p] * t;
        mat->attraction[i - first][j - first] = c->s[p] * attraction;
        mat->attraction[j - first][i - first] = c->s[p] * attraction;
    }
    return nuclear;
}

/* The Fock matrix of a block made symmetric, whole and scaled by eta. */
static void block_scale(const struct energy_block *b,
                        struct energy_matrices *mat, double eta)
{
    for (int i = 0; i < b->count; i++) {
        for (int j = 0; j <= i; j++) {
            double f = 0.5 * (mat->fock[i][j] + mat->fock[j][i]);
            f = eta * (f + mat->attraction[i][j] + eta * mat->kinetic[i][j]);
            mat->fock[i][j] = f;
            mat->fock[j][i] = f;
        }
        if (b->open > 0)
            mat->pull[i] *= eta;
    }
}

/* out = L^-1 in L^-T for a symmetric matrix, by the lower triangle linv. */
static void to_orthonormal(int count, double linv[][BLOCK_MAX],
                           double in[][BLOCK_MAX], double out[][BLOCK_MAX])
{
    double half[BLOCK_MAX][BLOCK_MAX];
    for (int i = 0; i < count; i++) {
        for (int j = 0; j < count; j++) {
            double sum = 0.0;
            for (int k = 0; k <= i; k++)
                sum += linv[i][k] * in[k][j];
            half[i][j] = sum;
        }
    }
    for (int i = 0; i < count; i++) {
        for (int j = 0; j <= i; j++) {
            double sum = 0.0;
            for (int k = 0; k <= j; k++)
                sum += half[i][k] * linv[j][k];
            out[i][j] = sum;
            out[j][i] = sum;
        }
    }
}

/* out = L^-T in L^-1, lower triangle of a symmetric result. */
static void from_orthonormal(int count, double linv[][BLOCK_MAX],
                             double in[][BLOCK_MAX], double out[][BLOCK_MAX])
{
    double half[BLOCK_MAX][BLOCK_MAX];
    for (int i = 0; i < count; i++) {
        for (int j = 0; j < count; j++) {
            double sum = 0.0;
            for (int k = i; k < count; k++)
                sum += linv[k][i] * in[k][j];
            half[i][j] = sum;
        }
    }
    for (int i = 0; i < count; i++) {
        for (int j = 0; j <= i; j++) {
            double sum = 0.0;
            for (int k = j; k < count; k++)
                sum += half[i][k] * linv[k][j];
            out[i][j] = sum;
        }
    }
}

/* Derivative by the rotation: pull is dE/d(turn). */
static void gradient_rotation(const struct energy_block *b, const double x[],
                              const double pull[], double gradient[])
{
    int last = b->count - 1;
    double square = 0.0, along = 0.0;
    for (int i = 0; i < last; i++) {
        square += x[b->kappa + i] * x[b->kappa + i];
        along += x[b->kappa + i] * pull[i];
    }
    double d = 1.0 / (1.0 + square);
    for (int i = 0; i < last; i++)
        gradient[b->kappa + i] = 2.0 * d * pull[i] - 4.0 * d * d *
                                                         x[b->kappa + i] *
                                                         (along + pull[last]);
}

/* Derivatives of a block by its overlaps: dE = -sum of y_ij dS_ij, both halves
 * of the matrix; only the lower one is filled. d(L^-1) = -phi(L^-1 dS L^-T)
 * L^-1 with phi the lower triangle and half of the diagonal. */
static void block_overlap(struct energy *e, int l, const double x[],
                          double gradient[], double y[][BLOCK_MAX])
{
    const struct energy_block *b = &e->atom.block[l];
    struct energy_matrices *mat = &e->matrices[l];
    double inside[BLOCK_MAX][BLOCK_MAX], pull[BLOCK_MAX];
    int count = b->count;
    to_orthonormal(count, mat->linv, mat->fock, inside);
    double holes = b->open > 0 ? b->full - b->open : 0.0;
    for (int i = 0; i < count && b->open > 0; i++) {
        pull[i] = 0.0;
        for (int k = 0; k < count; k++)
            pull[i] -= 2.0 * holes * inside[i][k] * mat->turn[k];
        for (int k = 0; k <= i; k++)
            pull[i] += mat->linv[i][k] * mat->pull[k];
    }
    for (int i = 0; i < count; i++) {
        for (int j = 0; j <= i; j++) {
            inside[i][j] *= b->full;
            if (b->open > 0)
                inside[i][j] += 0.5 * mat->turn[i] * pull[j];
            inside[j][i] = inside[i][j];
        }
    }
    if (b->open > 0 && count > 1)
        gradient_rotation(b, x, pull, gradient);
    from_orthonormal(count, mat->linv, inside, y);
}

/* What the pairs of a list give to the derivatives by ln zeta. */
static void gradient_pairs(const struct energy *e,
                           const struct energy_pairs *list, double gradient[])
{
    for (int p = 0; p < list->count; p++) {
        if (list->m[p] <= 0.0)
            continue;
        int i = list->i[p], j = list->j[p];
        double w = list->w[p];
        double scale = (list->v[p] - w * (list->N[p] + 1)) / list->a[p];
        gradient[i] += w * (e->atom.n[i] + 0.5) + scale * e->zeta[i];
        gradient[j] += w * (e->atom.n[j] + 0.5) + scale * e->zeta[j];
    }
}

/* Adds to w and v of the charges what the scaling and the orthonormality
 * change, and to the gradient what the kinetic energy has beside them. */
static void charges_finish(struct energy *e, double eta, const double x[])
{
    struct energy_pairs *c = &e->charges;
    double y[BLOCK_COUNT][BLOCK_MAX][BLOCK_MAX];
    for (int l = 0; l < BLOCK_COUNT; l++) {
        const struct energy_block *b = &e->atom.block[l];
        if (b->count == 0)
            continue;
        block_scale(b, &e->matrices[l], eta);
        block_overlap(e, l, x, e->gradient, y[l]);
    }
    for (int p = 0; p < c->count; p++) {
        if (c->m[p] <= 0.0)
            continue;
        int i = c->i[p], j = c->j[p], l = e->atom.l[i];
        int first = e->atom.block[l].first;
        double kinetic = eta * eta * e->charge[p];
        c->v[p] *= eta;
        c->w[p] = eta * c->w[p] + kinetic * e->kinetic_charge[p] -
                  c->m[p] * c->s[p] * y[l][j - first][i - first];
        e->gradient[i] += kinetic * e->kinetic_i[p];
        e->gradient[j] += kinetic * e->kinetic_j[p];
    }
}

/* Sum of w over a list. */
static double pairs_energy(const struct energy_pairs *list)
{
    double sum = 0.0;
    for (int p = 0; p < list->count; p++)
        sum += list->w[p];
    return sum;
}

/* Two-electron energy: each charge of a pair stands twice in it. */
static double two_electron(const struct energy *e)
{
    double sum = pairs_energy(&e->charges);
    for (int l1 = 0; l1 < BLOCK_COUNT; l1++)
        for (int l2 = l1 + 1; l2 < BLOCK_COUNT; l2++)
            sum += pairs_energy(&e->pairs[l1][l2]);
    return 0.5 * sum;
}

static void gradient_collect(struct energy *e, double eta, const double x[])
{
    for (int i = 0; i < e->atom.variables; i++)
        e->gradient[i] = 0.0;
    charges_finish(e, eta, x);
    double between[ENERGY_SHELL_MAX] = {0.0};
    for (int l1 = 0; l1 < BLOCK_COUNT; l1++)
        for (int l2 = l1 + 1; l2 < BLOCK_COUNT; l2++)
            gradient_pairs(e, &e->pairs[l1][l2], between);
    for (int i = 0; i < e->atom.shells; i++)
        e->gradient[i] += eta * between[i];
    gradient_pairs(e, &e->charges, e->gradient);
}

bool energy_evaluate(struct energy *e, double x[])
{
    const struct energy_atom *atom = &e->atom;
    for (int i = 0; i < atom->shells; i++) {
        e->zeta[i] = exp(x[i]);
        e->power[i] =
            whole_power(2.0 * e->zeta[i], atom->n[i]) * sqrt(2.0 * e->zeta[i]);
    }
    lists_move(e);
    for (int l = 0; l < BLOCK_COUNT; l++) {
        const struct energy_block *b = &atom->block[l];
        if (b->count == 0)
            continue;
        if (!block_orthonormalise(e, l))
            return false;
        if (b->open > 0)
            block_open(b, &e->matrices[l], x);
        block_density(b, &e->matrices[l]);
    }
    coulomb(e);
    exchange(e);
    double repulsion = two_electron(e), kinetic;
    double potential = repulsion + one_electron(e, &kinetic);
    double eta = -0.5 * potential / kinetic;
    if (!(eta > 0.0) || !isfinite(eta))
        return false;
    gradient_collect(e, eta, x);
    double shift = log(eta);
    for (int i = 0; i < atom->shells; i++) {
        x[i] += shift;
        e->zeta[i] *= eta;
    }
    e->kinetic = eta * eta * kinetic;
    e->total = 0.5 * eta * potential;
    return true;
}
