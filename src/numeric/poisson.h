/* SPDX-License-Identifier: MIT */
/* The field of a spherical charge. */
#ifndef NUMERIC_POISSON_H
#define NUMERIC_POISSON_H

#include "numeric/mesh.h"

/* For a radial density D (charge per unit of y, D ~ y^power at the origin):
 * enclosed[i] = ∫_0^y D, and field[i] = ∫_0^y D + y ∫_y^∞ D/y, which is y
 * times the potential of the charge. scratch[points]. Returns the whole
 * charge. */
double poisson_solve(const struct mesh *mesh, int elements, const double *D,
                     double power, double *enclosed, double *field,
                     double *scratch);

/* Slater's integral kernel of order k: field[i] = y^(-k) ∫_0^y D s^k ds +
 * y^(k+1) ∫_y^∞ D s^(-k-1) ds, y times the potential of multipole k. scratch
 * holds 2 * points. Needs power > k. */
void poisson_multipole(const struct mesh *mesh, int elements, const double *D,
                       double power, int k, double *field, double *scratch);

#endif
