/* SPDX-License-Identifier: MIT */
/* What the ground term of an open subshell adds to the average energy that a
 * spherical, spin-polarised atom has: closed forms in Slater integrals and
 * the spin–orbit parameter. Energies in the unit of what is passed in. */
#ifndef ATOM_TERM_H
#define ATOM_TERM_H

#include "element/species.h"

/* Square of the 3j symbol (a b c; 0 0 0), for a, b, c >= 0; 0 unless they form
 * a triangle with an even sum. */
double atom_three_j(int a, int b, int c);

/* Energy of Hund's term of a d or f subshell with `electrons` electrons above
 * the mean of the terms of highest spin: d2, d3, d7, d8: -4.5 B; f2, f5, f9,
 * f12: -9 E3; f3, f4, f10, f11: -21 E3; else 0. Racah's parameters from the
 * Slater integrals F^k (G. Racah, Phys. Rev. 62, 438 (1942), doi
 * 10.1103/PhysRev.62.438; 76, 1352 (1949), doi 10.1103/PhysRev.76.1352). */
double atom_term_hund_shift(int l, int electrons, double f2, double f4,
                            double f6);

/* Spin–orbit energy of the ground level of a configuration, zero at the mean of
 * its term: the parameters zeta and F^k of each open subshell, in the order of
 * open[count]; of d and f subshells 0 for all F^k stands for LS coupling. L, S
 * and J are those of the term as far as it is known and can be; what is missing
 * follows from Hund's rules. See term.c for the cases. 0 when no subshell with
 * l > 0 is open. */
struct open_subshell {
    int l, electrons;
    double zeta, f2, f4, f6;
};
double atom_term_spin_orbit(const struct open_subshell *open, int count,
                            const struct term *term);

#endif
