/* SPDX-License-Identifier: MIT */
/* Gauss–Lobatto–Legendre points on [-1, 1] and what is built on them. */
#ifndef NUMERIC_LOBATTO_H
#define NUMERIC_LOBATTO_H

/* Polynomial degree of one element and its number of points. The degree is
 * fixed when the program is built: loops over an element have a constant
 * length. 8 was the cheapest for an error of 1e-7 hartree among 6, 8, 10. */
enum { LOBATTO_ORDER = 8, LOBATTO_POINTS = LOBATTO_ORDER + 1 };

/* Points x, weights w, and the matrices that act on values at the points.
 * Row i of each matrix gives the result at point i. */
struct lobatto {
    double x[LOBATTO_POINTS];                          /* ascending */
    double w[LOBATTO_POINTS];                          /* sum is 2 */
    double derivative[LOBATTO_POINTS][LOBATTO_POINTS]; /* d/dx */
    double cumulative[LOBATTO_POINTS][LOBATTO_POINTS]; /* integral -1…x_i */
    double stiffness[LOBATTO_POINTS][LOBATTO_POINTS];  /* ∫ l_i' l_j' dx */
    double barycentric[LOBATTO_POINTS];
    double legendre[2][LOBATTO_POINTS]; /* P_ORDER and P_(ORDER+1) */
};

/* Fills the rule (Abramowitz, Stegun, Handbook of Mathematical Functions,
 * 25.4.32; differentiation and interpolation in barycentric form, Berrut,
 * Trefethen, SIAM Rev. 46, 501 (2004), doi 10.1137/S0036144502417715). */
void lobatto_make(struct lobatto *rule);

/* Values of the LOBATTO_POINTS interpolation polynomials at x in [-1, 1]. */
void lobatto_basis(const struct lobatto *rule, double x,
                   double value[LOBATTO_POINTS]);

#endif
