/* SPDX-License-Identifier: MIT */
/* What the test files of this folder share. */
#ifndef ATOM_CASE_H
#define ATOM_CASE_H

#include <check.h>

#include "atom/atom.h"
#include "element/species.h"
#include "support/csv.h"

/* A solver; never NULL. */
struct atom_solver *case_solver(void);

/* Parses, begins, solves; aborts the test unless the state is the wanted. */
void case_solve(struct atom_solver *solver, int Z, const char *configuration,
                const struct atom_options *options, enum atom_state want);

/* Ground species from data/configurations.csv, 0 <= charge < Z; ions that it
 * does not hold lose electrons from highest n, then highest l. */
struct cases {
    struct csv csv;
};
struct cases cases_read(void);
void cases_free(struct cases *cases);
void cases_species(const struct cases *cases, int Z, int charge,
                   struct species *species);

TCase *case_nist(void);
TCase *case_states(void);
TCase *case_functionals(void);
TCase *case_hybrid(void);
TCase *case_term(void);
TCase *case_correlation(void);
TCase *case_level(void);

#endif
