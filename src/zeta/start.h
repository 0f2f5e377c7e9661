/* SPDX-License-Identifier: MIT */
/* Where the search for the exponents begins. */
#ifndef ZETA_START_H
#define ZETA_START_H

#include "zeta/energy.h"

/* Effective charges to begin with, one for each subshell of the atom. */
void start_charges(const struct energy_atom *atom, double z_eff[]);

/* Estimate of the Hessian in the variables of energy_evaluate at e->zeta, lower
 * triangle, diagonal positive. */
void start_hessian(const struct energy *e,
                   double hessian[][ENERGY_VARIABLE_MAX]);

#endif
