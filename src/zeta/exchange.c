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

/* Fills e->sum and e->sum_a for row p, columns 0 … p. */
static void sum_row(struct energy *e, const struct energy_pairs *list, int p,
                    const struct weights *k)
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
        *(slater_lanes *)&e->sum[1][p][q] = extra;
        *(slater_lanes *)&e->sum_a[1][p][q] = extra_a;
    }
}

static void sum_all(struct energy *e, const struct energy_pairs *list,
                    const struct weights *k)
{
    for (int p = 0; p < list->count; p++)
        if (list->m[p] > 0.0)
            sum_row(e, list, p, k);
}

/* k = 0 of one l comes from the Coulomb integrals. */
static void sum_monopole(struct energy *e, const struct energy_pairs *list,
                         double closed, double extra, bool add)
{
    for (int p = 0; p < list->count; p++) {
        if (list->m[p] <= 0.0)
            continue;
        const double *R = e->coulomb[list->at[p]];
        const double *R_a = e->coulomb_a[list->at[p]];
        for (int q = 0; q <= p; q++) {
            int at = list->at[q];
            if (list->m[q] <= 0.0)
                continue;
            e->sum[0][p][q] = closed * R[at] + (add ? e->sum[0][p][q] : 0.0);
            e->sum_a[0][p][q] =
                closed * R_a[at] + (add ? e->sum_a[0][p][q] : 0.0);
            e->sum[1][p][q] = extra * R[at] + (add ? e->sum[1][p][q] : 0.0);
            e->sum_a[1][p][q] =
                extra * R_a[at] + (add ? e->sum_a[1][p][q] : 0.0);
        }
    }
}

/* Exchange among the subshells of one l. A pair of pairs (ac), (bd) stands for
 * the two products P_ab P_cd and P_ad P_cb. */
static void contract_same(struct energy *e, int l)
{
    struct energy_pairs *list = &e->pairs[l][l], *c = &e->charges;
    struct energy_matrices *mat = &e->matrices[l];
    int first = e->atom.block[l].first;
    for (int p = 0; p < list->count; p++) {
        if (list->m[p] <= 0.0)
            continue;
        int at = list->at[p];
        const double *pa = mat->density[list->i[p] - first];
        const double *pc = mat->density[list->j[p] - first];
        double *fa = mat->fock[list->i[p] - first];
        double *fc = mat->fock[list->j[p] - first];
        double row = -0.25 * list->m[p] * c->s[at], w = 0.0, v = 0.0;
        for (int q = 0; q <= p; q++) {
            if (list->m[q] <= 0.0)
                continue;
            int b = list->i[q] - first, d = list->j[q] - first;
            double factor = row * list->m[q] * c->s[list->at[q]];
            if (q == p)
                factor *= 0.5;
            double R = factor * e->sum[0][p][q];
            double R_a = factor * e->sum_a[0][p][q];
            double product = pa[b] * pc[d] + pa[d] * pc[b];
            fa[b] += pc[d] * R;
            fc[d] += pa[b] * R;
            fa[d] += pc[b] * R;
            fc[b] += pa[d] * R;
            w += product * R;
            v += product * R_a;
            c->w[list->at[q]] += product * R;
            c->v[list->at[q]] += product * (R - R_a);
        }
        c->w[at] += w;
        c->v[at] += v;
    }
}

/* Exchange between the subshells of two l: (ac), (bd) with a, b of the first
 * and c, d of the second, the product P_ab P_cd. */
static void contract_cross(struct energy *e, int l1, int l2)
{
    struct energy_pairs *list = &e->pairs[l1][l2];
    struct energy_matrices *m1 = &e->matrices[l1], *m2 = &e->matrices[l2];
    int first1 = e->atom.block[l1].first, first2 = e->atom.block[l2].first;
    for (int p = 0; p < list->count; p++) {
        if (list->m[p] <= 0.0)
            continue;
        const double *pa = m1->density[list->i[p] - first1];
        const double *pc = m2->density[list->j[p] - first2];
        double *fa = m1->fock[list->i[p] - first1];
        double *fc = m2->fock[list->j[p] - first2];
        double w = 0.0, v = 0.0;
        for (int q = 0; q <= p; q++) {
            if (list->m[q] <= 0.0)
                continue;
            int b = list->i[q] - first1, d = list->j[q] - first2;
            double factor = -list->s[p] * list->s[q];
            if (q == p)
                factor *= 0.5;
            double R = factor * e->sum[0][p][q];
            double R_a = factor * e->sum_a[0][p][q];
            double product = pa[b] * pc[d];
            fa[b] += pc[d] * R;
            fc[d] += pa[b] * R;
            w += product * R;
            v += product * R_a;
            list->w[q] += product * R;
            list->v[q] += product * (R - R_a);
        }
        list->w[p] += w;
        list->v[p] += v;
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
                R += weight[k / 2] * slater_integral(&e->tables, p1->N[p],
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
    sum_monopole(e, &e->pairs[l][l], coupling_zero(l, 0, l), b->within[0],
                 l > 0);
    contract_same(e, l);
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
    contract_cross(e, l1, l2);
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
