/* SPDX-License-Identifier: MIT */
/* The orbitals of a screening model for one atom or ion, to be laid over a
 * solved one: Slater-type functions from Slater's rules, or single-zeta
 * Hartree-Fock. */
#ifndef STUDY_ORBITAL_RUN_H
#define STUDY_ORBITAL_RUN_H

#include "base/status.h"
#include "element/species.h"

enum orbital_kind { ORBITAL_SLATER, ORBITAL_ZETA };

enum orbital_state { ORBITAL_RUNNING, ORBITAL_SOLVED, ORBITAL_FAILED };

struct orbital_run;

/* Work space for any number of atoms; NULL with STATUS_MEMORY.
 * orbital_run_free(NULL) is fine. */
MUST_CHECK struct orbital_run *orbital_run_new(struct status *st);
void orbital_run_free(struct orbital_run *run);

/* Starts an atom or ion; then step while it gives true. What a model cannot do
 * is ORBITAL_FAILED with a reason. Slater: P = N r^n* e^(-zeta r), zeta =
 * (Z - S)/n* (J. C. Slater, Phys. Rev. 36, 57 (1930)). */
void orbital_run_begin(struct orbital_run *run, enum orbital_kind kind,
                       const struct species *species);
bool orbital_run_step(struct orbital_run *run);

enum orbital_state orbital_run_state(const struct orbital_run *run);
const char *orbital_run_reason(const struct orbital_run *run);

/* Radial density out[count], electrons/bohr, of a subshell with all its
 * electrons (place in the configuration) or of all of them (-1) at radii
 * r[count] in bohr; in ORBITAL_SOLVED. */
void orbital_run_density(const struct orbital_run *run, int subshell, int count,
                         const double *r, double *out);

#endif
