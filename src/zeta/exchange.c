/* SPDX-License-Identifier: MIT */
/* Exchange goes by pairs of l. All orders k of a pair of l have the same
 * density factors, so their integrals are first summed with their weights. */
#include "zeta/exchange.h"

#include <stdlib.h>

/* Weights of the orders k = low, low+2, … high of one pair of l. */
struct weights {
    int low, high;
    bool open; /* whether extra[] is wanted */
    double closed[COUPLING_ORDERS], extra[COUPLING_ORDERS];
};

/* Row p, columns 0 … p, of e->sum[0] and e->sum_a[0] for one order alone. */
static void sum_single(struct energy *e, const struct energy_pairs *list, int p,
                       const struct weights *k)
{
    slater_lanes a = {list->a[p], list->a[p]};
    int N = list->N[p], order = k->high;
    double weight = k->closed[0];
    double outer = weight * (order + 1), inner = weight * order;
    for (int q = 0; q <= p; q += 2) {
        struct slater_halves h;
        slater_top(&e->tables, a, N, *(const slater_lanes *)&list->a[q],
                   list->N[q], order, &h);
        *(slater_lanes *)&e->sum[0][p][q] = (h.inner + h.outer) * weight;
        *(slater_lanes *)&e->sum_a[0][p][q] = h.outer * outer - h.inner * inner;
    }
}

/* The same for several orders, and with the extra weights in e->sum[1]. */
static void sum_several(struct energy *e, const struct energy_pairs *list,
                        int p, const struct weights *k)
{
    slater_lanes a = {list->a[p], list->a[p]};
    int N = list->N[p];
    for (int q = 0; q <= p; q += 2) {
        struct slater_halves h;
        slater_top(&e->tables, a, N, *(const slater_lanes *)&list->a[q],
                   list->N[q], k->high, &h);
        slater_lanes sum = {0.0, 0.0}, sum_a = sum, extra = sum, extra_a = sum;
        for (int order = k->high;; order -= 2) {
            int i = (order - k->low) / 2;
            slater_lanes R = h.inner + h.outer;
            slater_lanes R_a = h.outer * (order + 1.0) - h.inner * order;
            sum += R * k->closed[i];
            sum_a += R_a * k->closed[i];
            if (k->open) {
                extra += R * k->extra[i];
                extra_a += R_a * k->extra[i];
            }
            if (i == 0)
                break;
            slater_descend(&e->tables, N, list->N[q], order - 1, &h);
            slater_descend(&e->tables, N, list->N[q], order - 2, &h);
        }
        *(slater_lanes *)&e->sum[0][p][q] = sum;
        *(slater_lanes *)&e->sum_a[0][p][q] = sum_a;
        if (k->open) {
            *(slater_lanes *)&e->sum[1][p][q] = extra;
            *(slater_lanes *)&e->sum_a[1][p][q] = extra_a;
        }
    }
}

static void sum_all(struct energy *e, const struct energy_pairs *list,
                    const struct weights *k)
{
    for (int p = 0; p < list->count; p++) {
        if (list->m[p] <= 0.0)
            continue;
        if (k->low == k->high && !k->open)
            sum_single(e, list, p, k);
        else
            sum_several(e, list, p, k);
    }
}

/* k = 0 of one l comes from the Coulomb integrals: added to the higher orders
 * where there are any, with the weights closed and extra. */
static void sum_monopole(struct energy *e, const struct energy_pairs *list,
                         double closed, double extra, const struct weights *k)
{
    bool add = k->high > 0;
    for (int p = 0; p < list->count; p++) {
        const double *R = e->coulomb[list->at[p]];
        const double *R_a = e->coulomb_a[list->at[p]];
        double *sum = e->sum[0][p], *sum_a = e->sum_a[0][p];
        for (int q = 0; q <= p && list->m[p] > 0.0; q++) {
            sum[q] = closed * R[list->at[q]] + (add ? sum[q] : 0.0);
            sum_a[q] = closed * R_a[list->at[q]] + (add ? sum_a[q] : 0.0);
        }
        sum = e->sum[1][p];
        sum_a = e->sum_a[1][p];
        for (int q = 0; q <= p && list->m[p] > 0.0 && k->open; q++) {
            sum[q] = extra * R[list->at[q]] + (add ? sum[q] : 0.0);
            sum_a[q] = extra * R_a[list->at[q]] + (add ? sum_a[q] : 0.0);
        }
    }
}

static inline slater_lanes gather(const double v[], const int at[])
{
    return (slater_lanes){v[at[0]], v[at[1]]};
}

static inline void scatter(double v[], const int at[], slater_lanes x)
{
    v[at[0]] += x[0];
    v[at[1]] += x[1];
}

/* Rows of the densities and Fock matrices that a pair (ac) works with, and
 * what it gathers. */
struct row {
    const double *pa, *pc;
    double *fa, *fc;
    slater_lanes w, v;
};

/* Two products (ac), (bd) of one l: P_ab P_cd and P_ad P_cb. R and R_a carry
 * all factors; w and v those of the other pair. */
static inline void products_same(struct row *row, const int b[], const int d[],
                                 slater_lanes R, slater_lanes R_a, double *w,
                                 double *v)
{
    slater_lanes ab = gather(row->pa, b), cd = gather(row->pc, d);
    slater_lanes ad = gather(row->pa, d), cb = gather(row->pc, b);
    slater_lanes both = ab * cd + ad * cb;
    scatter(row->fa, b, cd * R);
    scatter(row->fc, d, ab * R);
    scatter(row->fa, d, cb * R);
    scatter(row->fc, b, ad * R);
    slater_lanes e = both * R, e_a = both * R_a;
    row->w += e;
    row->v += e_a;
    *(slater_lanes *)w += e;
    *(slater_lanes *)v += e - e_a;
}

/* The same for a, b of one l and c, d of another: P_ab P_cd alone. */
static inline void products_cross(struct row *row, const int b[], const int d[],
                                  slater_lanes R, slater_lanes R_a, double *w,
                                  double *v)
{
    slater_lanes ab = gather(row->pa, b), cd = gather(row->pc, d);
    slater_lanes both = ab * cd;
    scatter(row->fa, b, cd * R);
    scatter(row->fc, d, ab * R);
    slater_lanes e = both * R, e_a = both * R_a;
    row->w += e;
    row->v += e_a;
    *(slater_lanes *)w += e;
    *(slater_lanes *)v += e - e_a;
}

/* Columns 0 … p of row p with e->sum[0]; the diagonal counts half, and what
 * lies beyond it not at all. weight[q]: factor of pair q, 0 when empty. */
static void contract_row(struct energy *e, const struct energy_pairs *list,
                         bool same, int p, double factor, const double weight[],
                         struct row *row, double w[], double v[])
{
    const double *sum = e->sum[0][p], *sum_a = e->sum_a[0][p];
    for (int q = 0; q <= p; q += 2) {
        slater_lanes f = *(const slater_lanes *)&weight[q] * factor;
        slater_lanes R = *(const slater_lanes *)&sum[q];
        slater_lanes R_a = *(const slater_lanes *)&sum_a[q];
        if (q == p) {
            f[0] *= 0.5;
            R[1] = 0.0;
            R_a[1] = 0.0;
        } else if (q + 1 == p) {
            f[1] *= 0.5;
        }
        R *= f;
        R_a *= f;
        if (same)
            products_same(row, &list->b[q], &list->d[q], R, R_a, &w[q], &v[q]);
        else
            products_cross(row, &list->b[q], &list->d[q], R, R_a, &w[q], &v[q]);
    }
}

/* Exchange energy between two l, or within one. */
static void contract(struct energy *e, int l1, int l2)
{
    struct energy_pairs *list = &e->pairs[l1][l2];
    struct energy_matrices *m1 = &e->matrices[l1], *m2 = &e->matrices[l2];
    _Alignas(16) double weight[PAIR_MAX], w[PAIR_MAX], v[PAIR_MAX];
    bool same = l1 == l2;
    struct energy_pairs *store = same ? &e->charges : list;
    for (int p = 0; p < list->count; p++) {
        weight[p] = list->m[p] * store->s[same ? list->at[p] : p];
        w[p] = 0.0;
        v[p] = 0.0;
    }
    for (int p = 0; p < list->count; p++) {
        if (list->m[p] <= 0.0)
            continue;
        int a = list->b[p], c = list->d[p];
        struct row row = {m1->density[a], m2->density[c], m1->fock[a],
                          m2->fock[c],    {0.0, 0.0},     {0.0, 0.0}};
        contract_row(e, list, same, p, (same ? -0.25 : -1.0) * weight[p],
                     weight, &row, w, v);
        w[p] += row.w[0] + row.w[1];
        v[p] += row.v[0] + row.v[1];
    }
    for (int p = 0; p < list->count; p++) {
        int at = same ? list->at[p] : p;
        store->w[at] += w[p];
        store->v[at] += v[p];
    }
}

/* The quadratic form of sum[1] in the product of two open orbitals. The
 * products of list p are m a_i b_j s_p; s, w and v stand in `store`. */
static void contract_open(struct energy *e, int l1, int l2)
{
    struct energy_pairs *list = &e->pairs[l1][l2];
    struct energy_pairs *store = l1 == l2 ? &e->charges : list;
    struct energy_matrices *m1 = &e->matrices[l1], *m2 = &e->matrices[l2];
    int first1 = e->atom.block[l1].first, first2 = e->atom.block[l2].first;
    double d[PAIR_MAX], w[PAIR_MAX], v[PAIR_MAX];
    for (int p = 0; p < list->count; p++) {
        int at = l1 == l2 ? list->at[p] : p;
        d[p] = list->m[p] * store->s[at] * m1->open[list->i[p] - first1] *
               m2->open[list->j[p] - first2];
        w[p] = 0.0;
        v[p] = 0.0;
    }
    for (int p = 0; p < list->count; p++) {
        if (list->m[p] <= 0.0)
            continue;
        for (int q = 0; q < p; q++) {
            if (list->m[q] <= 0.0)
                continue;
            double R = e->sum[1][p][q], R_a = e->sum_a[1][p][q];
            w[p] += R * d[q];
            v[p] += R_a * d[q];
            w[q] += R * d[p];
            v[q] += (R - R_a) * d[p];
        }
        w[p] += e->sum[1][p][p] * d[p];
        v[p] += e->sum_a[1][p][p] * d[p];
    }
    for (int p = 0; p < list->count; p++) {
        int at = l1 == l2 ? list->at[p] : p;
        int i = list->i[p] - first1, j = list->j[p] - first2;
        if (list->m[p] <= 0.0)
            continue;
        store->w[at] += 2.0 * d[p] * w[p];
        store->v[at] += 2.0 * d[p] * v[p];
        double pull = 2.0 * list->m[p] * store->s[at] * w[p];
        m1->pull[i] += pull * m2->open[j];
        m2->pull[j] += pull * m1->open[i];
    }
}

/* Coulomb energy between the multipoles k > 0 of two open subshells. */
static void contract_direct(struct energy *e, int l1, int l2,
                            const double weight[COUPLING_ORDERS])
{
    const struct energy_pairs *p1 = &e->pairs[l1][l1], *p2 = &e->pairs[l2][l2];
    struct energy_pairs *c = &e->charges;
    struct energy_matrices *m1 = &e->matrices[l1], *m2 = &e->matrices[l2];
    int first1 = e->atom.block[l1].first, first2 = e->atom.block[l2].first;
    int most = 2 * (l1 < l2 ? l1 : l2);
    for (int p = 0; p < p1->count; p++) {
        for (int q = 0; q < p2->count; q++) {
            if (p1->m[p] <= 0.0 || p2->m[q] <= 0.0)
                continue;
            double R = 0.0, R_a = 0.0, log_a;
            for (int k = 2; k <= most; k += 2) {
                R += weight[k / 2] * zeta_slater_integral(&e->tables, p1->N[p],
                                                          p1->a[p], p2->N[q],
                                                          p2->a[q], k, &log_a);
                R_a += weight[k / 2] * log_a;
            }
            int at1 = p1->at[p], at2 = p2->at[q];
            int i1 = p1->i[p] - first1, j1 = p1->j[p] - first1;
            int i2 = p2->i[q] - first2, j2 = p2->j[q] - first2;
            double s1 = p1->m[p] * c->s[at1], s2 = p2->m[q] * c->s[at2];
            double d1 = s1 * m1->open[i1] * m1->open[j1];
            double d2 = s2 * m2->open[i2] * m2->open[j2];
            c->w[at1] += d1 * d2 * R;
            c->w[at2] += d1 * d2 * R;
            c->v[at1] += d1 * d2 * R_a;
            c->v[at2] += d1 * d2 * (R - R_a);
            m1->pull[i1] += s1 * m1->open[j1] * d2 * R;
            m1->pull[j1] += s1 * m1->open[i1] * d2 * R;
            m2->pull[i2] += s2 * m2->open[j2] * d1 * R;
            m2->pull[j2] += s2 * m2->open[i2] * d1 * R;
        }
    }
}

static void exchange_same(struct energy *e, int l)
{
    const struct energy_block *b = &e->atom.block[l];
    struct weights k = {.low = 2, .high = 2 * l, .open = b->open > 0};
    for (int i = 1; i <= l; i++) {
        k.closed[i - 1] = coupling_zero(l, 2 * i, l);
        k.extra[i - 1] = b->within[i];
    }
    if (l > 0)
        sum_all(e, &e->pairs[l][l], &k);
    sum_monopole(e, &e->pairs[l][l], coupling_zero(l, 0, l), b->within[0], &k);
    contract(e, l, l);
    if (k.open)
        contract_open(e, l, l);
}

static void exchange_cross(struct energy *e, int l1, int l2)
{
    const struct energy_between *between = &e->atom.between[l1][l2];
    struct weights k = {
        .low = l2 - l1, .high = l1 + l2, .open = between->exchange_any};
    for (int i = 0; i <= l1; i++) {
        k.closed[i] = coupling_zero(l1, k.low + 2 * i, l2);
        k.extra[i] = between->exchange[i];
    }
    sum_all(e, &e->pairs[l1][l2], &k);
    contract(e, l1, l2);
    if (k.open)
        contract_open(e, l1, l2);
    if (between->direct_any)
        contract_direct(e, l1, l2, between->direct);
}

void exchange(struct energy *e)
{
    for (int l1 = 0; l1 < BLOCK_COUNT; l1++) {
        if (e->atom.block[l1].count == 0)
            continue;
        exchange_same(e, l1);
        for (int l2 = l1 + 1; l2 < BLOCK_COUNT; l2++)
            if (e->atom.block[l2].count > 0)
                exchange_cross(e, l1, l2);
    }
}
