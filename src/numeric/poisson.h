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

#endif
