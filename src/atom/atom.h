/* SPDX-License-Identifier: MIT */
/* The self-consistent radial atom: Kohn–Sham equations in a central field,
 * open subshells spread evenly over m, point nucleus. Hartree atomic units
 * throughout. Conventions are those of S. Kotochigova et al., Phys. Rev. A 55,
 * 191 (1997), doi 10.1103/PhysRevA.55.191. */
#ifndef ATOM_ATOM_H
#define ATOM_ATOM_H

#include <stdbool.h>

#include "base/status.h"
#include "element/configuration.h"

enum { ATOM_LEVELS_MAX = 88 }; /* 26 subshells, by j and by spin */

/* LDA, LSD: uniform gas, Vosko–Wilk–Nusair correlation. PBE: Perdew, Burke,
 * Ernzerhof, Phys. Rev. Lett. 77, 3865 (1996), spin-polarised. PBE_VWN: the
 * same with the Vosko–Wilk–Nusair fit as its local correlation. */
enum atom_functional { ATOM_LDA, ATOM_LSD, ATOM_PBE, ATOM_PBE_VWN };

enum atom_relativity { ATOM_SCHROEDINGER, ATOM_DIRAC };

/* functional, relativity: see their types; with the Dirac equation LDA and
 * LSD exchange carries its relativistic factor, PBE does not. Spin-polarised
 * functionals fill the majority channel of every open subshell first.
 * speed_of_light: in atomic units, 0 for CODATA's. warm: start from the last
 * solution of this solver when it has converged and is of the same nucleus and
 * kind; the result is the same to the tolerance of the solver. */
struct atom_options {
    enum atom_functional functional;
    enum atom_relativity relativity;
    double speed_of_light;
    bool warm;
    /* For tests of the mesh: element length in t, 0 for the default, and no
     * other part of the solver's tolerance changes. */
    double element_length;
    int cycles_max; /* 0 for the default, 150 */
};

/* What has become of a solution. */
#define ATOM_STATE_LIST(X)                                                     \
    X(ATOM_RUNNING, "not converged yet")                                       \
    X(ATOM_CONVERGED, "converged")                                             \
    X(ATOM_UNBOUND, "a level is not bound")                                    \
    X(ATOM_LOST, "a level could not be found")                                 \
    X(ATOM_UNSETTLED, "no self-consistency within the allowed cycles")         \
    X(ATOM_OUT_OF_REACH, "a level reaches beyond the mesh")

enum atom_state {
#define ATOM_STATE_ENUM(state, text) state,
    ATOM_STATE_LIST(ATOM_STATE_ENUM)
#undef ATOM_STATE_ENUM
};

/* Words for a state. */
const char *atom_state_text(enum atom_state state);

/* Total energy and its parts, hartree; kinetic without the rest mass. */
struct atom_energy {
    double total, kinetic, coulomb, nuclear, xc;
};

/* A level: spin 0 none, +1 majority, -1 minority; twice_j 0 without the Dirac
 * equation. */
struct atom_level {
    int n, l, twice_j, spin;
    double occ;
    double energy; /* hartree */
};

/* A solver with the work space for any atom; several atoms may be solved with
 * it one after the other. NULL with STATUS_MEMORY. */
struct atom_solver;
MUST_CHECK struct atom_solver *atom_solver_new(struct status *st);
void atom_solver_free(struct atom_solver *solver);

/* Starts an atom of nuclear charge Z (1…118). Fails with STATUS_USAGE when
 * there is no electron, or a subshell is overfull or not one; with
 * STATUS_MEMORY the first time. */
MUST_CHECK bool atom_begin(struct atom_solver *solver, int Z,
                           const struct configuration *configuration,
                           const struct atom_options *options,
                           struct status *st);

/* One self-consistency cycle. After anything but ATOM_RUNNING further calls
 * change nothing. */
enum atom_state atom_step(struct atom_solver *solver);

/* Steps to the end. */
enum atom_state atom_solve(struct atom_solver *solver);

/* What follows belongs to the last cycle; numbers are results only when the
 * state is ATOM_CONVERGED. */
enum atom_state atom_result_state(const struct atom_solver *solver);

/* The level that is to blame for ATOM_UNBOUND, ATOM_LOST and
 * ATOM_OUT_OF_REACH, else -1. */
int atom_culprit(const struct atom_solver *solver);

int atom_cycles(const struct atom_solver *solver);
/* Norm of the change of r V in the last cycle, electrons. */
double atom_residual(const struct atom_solver *solver);
struct atom_energy atom_energies(const struct atom_solver *solver);
int atom_level_count(const struct atom_solver *solver);
struct atom_level atom_level_at(const struct atom_solver *solver, int i);

#endif
