/* SPDX-License-Identifier: MIT */
/* Exchange energy, and what open subshells have beyond the closed formula. */
#ifndef ZETA_EXCHANGE_H
#define ZETA_EXCHANGE_H

#include "zeta/energy.h"

/* Adds to w and v of the pairs, to the Fock matrices (not yet symmetric) and
 * to the pull of the open orbitals. The density, the open orbitals and the
 * Coulomb integrals of e are those of the present exponents. */
void exchange(struct energy *e);

#endif
