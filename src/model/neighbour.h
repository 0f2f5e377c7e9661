/* SPDX-License-Identifier: MIT */
/* Configurations one electron away from one that is known by rule or theory
 * only, and that may lie lower. */
#ifndef MODEL_NEIGHBOUR_H
#define MODEL_NEIGHBOUR_H

#include "atom/atom.h"
#include "element/species.h"

enum { NEIGHBOURS_MAX = 12 };

/* Whether the configuration of an ion rests on theory or on a rule: it is not
 * stored, or its ionization energy is none that was measured or follows from
 * measured ones. Never of an atom, nor of what the user gave, nor of two
 * electrons. */
bool neighbour_doubtful(const struct species *species);

/* What two total energies of one ion must differ by, hartree, to be told
 * apart: 0.5 eV and 0.5 % of the energy of the highest level. A judgement, not
 * a statistic of such differences: by 0.5 eV and 0.5 % of the energy 857 of the
 * 882 ionization energies of NIST ASD 5.12 that were measured or interpolated
 * to 0.2 % bound the model's error (all 97 atoms; of the 25 others no more than
 * 5 at one charge). */
double neighbour_error(const struct atom_solver *solver);

/* Fills out[] with the configurations that differ from c, which the solver
 * holds converged, by one electron moved between its three outermost subshells,
 * and whose energy may be lower: to first order it differs by that of the two
 * levels of j that the electron leaves and enters; what is more than 3 eV above
 * zero is left out (neighbour.c). also: a subshell, empty in c, that
 * may take an electron of d or f as well; n = 0 for none. Returns their number.
 */
int neighbour_list(const struct atom_solver *solver,
                   const struct configuration *c, struct subshell also,
                   struct configuration out[NEIGHBOURS_MAX]);

/* A subshell that is empty but that the true configuration may hold: by rule s
 * goes before the d and f of lower shells, so the lowest s that the atom has
 * and the ion has not; else what the ion of one charge less still has. n = 0
 * when there is none. */
struct subshell neighbour_emptied(const struct species *species);

#endif
