/* SPDX-License-Identifier: MIT */
/* Ground states of atoms and ions, from the stored tables or by rule. */
#ifndef REFDATA_GROUND_H
#define REFDATA_GROUND_H

#include <stdbool.h>

#include "base/status.h"
#include "element/species.h"

/* Lowest charge that is answered: no ion has taken up more electrons. */
#define CHARGE_LOWEST (-8)

/* The ground state of element z (1…Z_MAX) at a charge. Stored tables first
 * (ORIGIN_STORED, or ORIGIN_PREDICTED where the entry is a prediction). By rule
 * (ORIGIN_RULE, term unknown): a cation that they do not hold loses electrons
 * from the nearest lower charge that they do hold, from the highest n and then
 * the highest l; an anion that they do not hold gains electrons on the nearest
 * higher charge, each in the first subshell with room in the order of n + l.
 * charge == z is the bare nucleus, an empty configuration by rule. Fails with
 * STATUS_USAGE when charge > z or below CHARGE_LOWEST. */
MUST_CHECK bool ground_state(int z, int charge, struct species *species,
                             struct status *st);

/* What the source remarks on this ground state ("from charge 0: 3d+1 4s-2 …"),
 * "" when nothing or not stored. */
const char *ground_note(int z, int charge);

#endif
