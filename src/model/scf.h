/* SPDX-License-Identifier: MIT */
/* What a single self-consistent atom rests on, for whoever solves one by
 * itself. */
#ifndef MODEL_SCF_H
#define MODEL_SCF_H

#include <stdbool.h>

#include "element/provenance.h"

/* Kohn-Sham equations in the local density approximation, and with `gradient`
 * the generalized gradient approximation as well. Never NULL. */
const struct provenance *scf_atom_source(bool gradient);

#endif
