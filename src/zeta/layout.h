/* SPDX-License-Identifier: MIT */
/* From a configuration to the problem that energy.h solves. */
#ifndef ZETA_LAYOUT_H
#define ZETA_LAYOUT_H

#include "zeta/energy.h"
#include "zeta/zeta.h"

/* Fills atom. False, with the reason in words, when the configuration is
 * outside this method (zeta_begin lists the cases). */
MUST_CHECK bool layout_fill(struct energy_atom *atom,
                            const struct zeta_problem *problem,
                            char reason[ZETA_REASON_MAX]);

#endif
