/* SPDX-License-Identifier: MIT */
/* Orbitals, orbital energies and radii of a finished atom. */
#ifndef ZETA_ORBITAL_H
#define ZETA_ORBITAL_H

#include "zeta/energy.h"
#include "zeta/zeta.h"

/* Fills shells[e->atom.shells], in the order of e->atom, at the last
 * evaluation. */
void orbitals_fill(const struct energy *e, struct zeta_subshell shells[]);

/* P(r) of an orbital over count functions of one l whose exponents are
 * zeta[count], the first with n = l+1. */
double zeta_orbital_value(int l, int count, const double zeta[],
                          const double coefficient[], double r);

#endif
