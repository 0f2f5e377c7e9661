/* SPDX-License-Identifier: MIT */
/* What there is to say of one self-consistent atom: plain values, whoever
 * solved it and whoever shows it. */
#ifndef ANALYSIS_ATOM_REPORT_H
#define ANALYSIS_ATOM_REPORT_H

#include <stdbool.h>

#include "element/species.h"

/* Approximations, each with its id, as typed and as in CSV, and its words. */
#define FUNCTIONAL_LIST(X)                                                     \
    X(FUNCTIONAL_LDA, "lda", "LDA")                                            \
    X(FUNCTIONAL_LSD, "lsd", "LSD")                                            \
    X(FUNCTIONAL_PBE, "pbe", "PBE")

enum functional {
#define FUNCTIONAL_ENUM(functional, id, title) functional,
    FUNCTIONAL_LIST(FUNCTIONAL_ENUM)
#undef FUNCTIONAL_ENUM
        FUNCTIONAL_COUNT
};

#define RELATIVITY_LIST(X)                                                     \
    X(RELATIVITY_NONE, "none", "Schrödinger equation")                         \
    X(RELATIVITY_DIRAC, "dirac", "Dirac equation")

enum relativity {
#define RELATIVITY_ENUM(relativity, id, title) relativity,
    RELATIVITY_LIST(RELATIVITY_ENUM)
#undef RELATIVITY_ENUM
        RELATIVITY_COUNT
};

const char *functional_id(enum functional functional);
const char *functional_title(enum functional functional);
const char *relativity_id(enum relativity relativity);
const char *relativity_title(enum relativity relativity);

/* How an atom is solved. speed_of_light in atomic units, 0 for CODATA's; the
 * Schrödinger equation does not look at it. */
struct atom_method {
    enum functional functional;
    enum relativity relativity;
    double speed_of_light;
};

/* The method of the model scf: LSD on the Dirac equation. */
extern const struct atom_method method_default;

/* A level, or a whole subshell (twice_j and spin 0, energy the mean over its
 * electrons). twice_j: 2j, 0 where levels are not told apart by j; spin: +1
 * majority, -1 minority, 0 where they are not told apart by spin. energy in
 * hartree, lengths in bohr. peak_radius: outermost maximum of the radial
 * density. Z_eff: n sqrt(-2 energy); mean radius of hydrogen's n l over this
 * one's; Z less all electrons inside peak_radius. */
struct report_level {
    int n, l, twice_j, spin;
    double occ, energy;
    double mean_radius, peak_radius;
    double zeff_energy, zeff_radius, zeff_enclosed;
};

#define REPORT_LEVELS_MAX (4 * SUBSHELL_MAX)
#define REPORT_REASON_MAX 160

enum report_state {
    REPORT_RUNNING,
    REPORT_SOLVED,
    REPORT_FAILED, /* reason says why; there are no numbers */
};

/* Energies in hartree, residual in electrons. Energies, levels and subshells
 * are results in REPORT_SOLVED alone. */
struct atom_report {
    struct species species;
    struct atom_method method;
    double speed_of_light; /* used by the Dirac equation, atomic units */
    enum report_state state;
    char reason[REPORT_REASON_MAX]; /* "" unless REPORT_FAILED */
    int cycles;
    double residual;
    double etot, ekin, ecoul, eenuc, exc;
    int level_count;
    struct report_level levels[REPORT_LEVELS_MAX];
    int subshell_count; /* in the order of the configuration */
    struct report_level subshells[SUBSHELL_MAX];
};

#define LEVEL_TEXT_MAX 12

/* "2p", or "2p1/2" where j is known; returns out. */
const char *level_print(const struct report_level *level,
                        char out[LEVEL_TEXT_MAX]);

/* "", "majority" or "minority". */
const char *level_spin_text(int spin);

#endif
