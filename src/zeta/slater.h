/* SPDX-License-Identifier: MIT */
/* Slater integrals R^k between pair densities of Slater-type orbitals. */
#ifndef ZETA_SLATER_H
#define ZETA_SLATER_H

#include "element/subshell.h"

#define SLATER_POWER_MAX                                                       \
    (2 * N_MAX)                      /* largest power of r in a pair density   \
                                      */
#define SLATER_ORDER_MAX (2 * L_MAX) /* largest k */
#define SLATER_CHAIN_MAX (SLATER_POWER_MAX - 1)
#define SLATER_SECOND_MAX (SLATER_POWER_MAX + SLATER_ORDER_MAX)

/* Two integrals at a time, in the two lanes of one vector; it may lie over two
 * neighbours of an array of double at an address divisible by 16. */
typedef double slater_lanes __attribute__((vector_size(16), may_alias));

/* The numbers that depend on powers and order alone. */
struct slater_tables {
    /* ratio[Q][u] = u/(u+Q), in both lanes */
    slater_lanes ratio[SLATER_SECOND_MAX + 1][SLATER_CHAIN_MAX + 1];
    /* choose[N][M] = (N+M-1)!/(N! M!) */
    double choose[SLATER_POWER_MAX + 1][SLATER_POWER_MAX + 1];
    /* descend[k][N][M] = (N-k-1)/(M+k+1): from order k+1 to order k */
    double descend[SLATER_ORDER_MAX][SLATER_POWER_MAX + 1]
                  [SLATER_POWER_MAX + 1];
};

/* Fills the tables. */
void zeta_slater_tables_fill(struct slater_tables *tables);

/* R^k of the densities a^(N+1)/N! r^N e^(-ar) and b^(M+1)/M! r^M e^(-br), both
 * of unit charge: the double integral of their product with r<^k/r>^(k+1), in
 * hartree. *log_a receives a dR/da; b dR/db is R minus that, because R grows
 * as the common scale of a and b. 2 <= N, M <= SLATER_POWER_MAX, k < N, M,
 * 0 <= k <= SLATER_ORDER_MAX; a, b > 0 in 1/bohr. */
double zeta_slater_integral(const struct slater_tables *tables, int N, double a,
                            int M, double b, int k, double *log_a);

/* A call would cost as much as a short chain. */
#define SLATER_INLINE static inline __attribute__((always_inline))

/* One step of slater_chain. */
#define SLATER_STEP(u)                                                         \
    case u:                                                                    \
        w *= y;                                                                \
        t = t * ratio[1 - (u)] + w;                                            \
        __attribute__((fallthrough));

/* T_P of the recurrence T_u = y^u + u/(u+Q) T_(u-1), T_0 = 1, all of whose
 * terms are positive; *power receives y^P. ratio points to ratio[Q][P]. */
SLATER_INLINE slater_lanes slater_chain(slater_lanes y,
                                        const slater_lanes *ratio, int P,
                                        slater_lanes *power)
{
    slater_lanes w = {1.0, 1.0}, t = {1.0, 1.0};
    switch (P) {
        SLATER_STEP(15)
        SLATER_STEP(14)
        SLATER_STEP(13)
        SLATER_STEP(12)
        SLATER_STEP(11)
        SLATER_STEP(10)
        SLATER_STEP(9)
        SLATER_STEP(8)
        SLATER_STEP(7)
        SLATER_STEP(6)
        SLATER_STEP(5)
        SLATER_STEP(4)
        SLATER_STEP(3)
        SLATER_STEP(2)
        SLATER_STEP(1)
    case 0:
        break;
    default:
        __builtin_unreachable(); /* P <= SLATER_CHAIN_MAX */
    }
    *power = w;
    return t;
}

/* The two halves of an integral and what the next lower order needs. */
struct slater_halves {
    slater_lanes inner; /* the part in which the density N lies inside */
    slater_lanes outer; /* the part in which it lies outside; R is the sum */
    slater_lanes x, z;  /* a/(a+b), b/(a+b) */
    slater_lanes rise_inner, rise_outer;
};

/* Both halves at order k. With p = M-k-1, q = N+k the inner half is
 * A(p, q) = int r^p e^(-br) int_0^r r'^q e^(-ar'), and integrating by parts
 * b A(p, q) = p A(p-1, q) + (p+q)!/(a+b)^(p+q+1): the chain. */
SLATER_INLINE void slater_top(const struct slater_tables *tables,
                              slater_lanes a, int N, slater_lanes b, int M,
                              int k, struct slater_halves *h)
{
    slater_lanes s = a + b;
    slater_lanes x = a / s, z = b / s, v, w;
    slater_lanes inner =
        slater_chain(z, &tables->ratio[N + k][M - k - 1], M - k - 1, &w);
    slater_lanes outer =
        slater_chain(x, &tables->ratio[M + k][N - k - 1], N - k - 1, &v);
    slater_lanes xz = x * z, g = s * tables->choose[N][M] * xz;
    for (int i = 0; i < k; i++)
        g *= xz;
    slater_lanes gx = g * x * v, gz = g * z * w;
    h->inner = gx * inner;
    h->outer = gz * outer;
    h->x = x;
    h->z = z;
    h->rise_inner = gx * w;
    h->rise_outer = gz * v;
}

/* From order k+1 to order k, again with positive terms only: by parts in the
 * inner integral, A(p-1, q) = (a A(p-1, q+1) + (p+q)!/s^(p+q+1))/(q+1). */
SLATER_INLINE void slater_descend(const struct slater_tables *tables, int N,
                                  int M, int k, struct slater_halves *h)
{
    double down_inner = tables->descend[k][M][N];
    double down_outer = tables->descend[k][N][M];
    slater_lanes ratio = h->x / h->z, back = h->z / h->x;
    h->inner = (h->inner * ratio + h->rise_inner) * down_inner + h->rise_inner;
    h->outer = (h->outer * back + h->rise_outer) * down_outer + h->rise_outer;
}

#endif
