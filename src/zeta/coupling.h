/* SPDX-License-Identifier: MIT */
/* Angular coefficients of the Slater integrals of open shells. */
#ifndef ZETA_COUPLING_H
#define ZETA_COUPLING_H

#include "element/subshell.h"

#define COUPLING_ORDERS (L_MAX + 1) /* k = 0, 2, 4, 6 or k0, k0+2, … */

/* (l k l'; 0 0 0)^2, the square of Wigner's 3j symbol with all projections
 * zero; 0 where the triangle or the parity forbids it. 0 <= l, l' <= L_MAX,
 * k >= 0. Racah, Phys. Rev. 62, 438 (1942), doi 10.1103/PhysRev.62.438. */
double coupling_zero(int l, int k, int lp);

/* Gaunt coefficient c^k(l m, l' m') as Condon and Shortley define it (The
 * Theory of Atomic Spectra, 1935, section 8^6): sqrt(4 pi/(2k+1)) times the
 * integral of Y*(l m) Y(k m-m') Y(l' m'). |m| <= l, |m'| <= l'. */
double coupling_gaunt(int k, int l, int m, int lp, int mp);

/* Energy of the q electrons of one open subshell among themselves is the sum
 * over i of f[i] F^(2i). Stretched: the determinant with the largest M_S and
 * then the largest M_L, a pure term by itself: highest S, then highest L
 * (Hund). Average: of the configuration (Slater, Quantum Theory of Atomic
 * Structure, 1960, vol. 1, chapter 14). 0 <= q <= 4l+2. */
void coupling_within_stretched(int l, int q, double f[COUPLING_ORDERS]);
void coupling_within_average(int l, int q, double f[COUPLING_ORDERS]);

/* Energy between two open subshells, both stretched and all spins as parallel
 * as they can be: the sum over i of direct[i] F^(2i) + exchange[i] G^(k0+2i),
 * k0 = |l1 - l2|. The average is direct[0] = q1 q2 and exchange[i] =
 * -q1 q2/2 (l1 k l2; 0 0 0)^2 alone. */
void coupling_between_stretched(int l1, int q1, int l2, int q2,
                                double direct[COUPLING_ORDERS],
                                double exchange[COUPLING_ORDERS]);

#endif
