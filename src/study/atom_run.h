/* SPDX-License-Identifier: MIT */
/* One self-consistent atom by itself, solved cycle by cycle: what the command
 * `atom` prints and the screen Atom draws. */
#ifndef STUDY_ATOM_RUN_H
#define STUDY_ATOM_RUN_H

#include "analysis/atom_report.h"
#include "base/status.h"

struct atom_run;

/* Work space for any number of atoms one after the other; NULL with
 * STATUS_MEMORY. run_atom_free(NULL) is fine. */
MUST_CHECK struct atom_run *run_atom_new(struct status *st);
void run_atom_free(struct atom_run *run);

/* Starts an atom or ion. Fails with STATUS_USAGE when it has no electron or
 * the speed of light is not above its nuclear charge, with STATUS_MEMORY or
 * STATUS_DATA (libxc lacks a functional) the first time. */
MUST_CHECK bool run_atom_begin(struct atom_run *run,
                               const struct species *species,
                               const struct atom_method *method,
                               struct status *st);

/* What an atom solved with a functional rests on. */
const struct provenance *run_atom_source(enum functional functional);

/* One self-consistency cycle; true while there is more to do. */
bool run_atom_step(struct atom_run *run);

/* What is known; good until the next begin. Before the first one the state is
 * REPORT_FAILED. */
const struct atom_report *run_atom_report(const struct atom_run *run);

enum atom_run_curve {
    RUN_DENSITY,  /* D(r) = 4 pi r^2 rho, electrons/bohr */
    RUN_ENCLOSED, /* electrons within r */
    RUN_ZEFF,     /* Z less all electrons within r */
};

/* Values out[n] at radii r[n] (bohr, >= 0) of an atom in REPORT_SOLVED, exactly
 * there. subshell: its place in the report, or -1 for all electrons; RUN_ZEFF
 * does not look at it. */
void run_atom_curve(const struct atom_run *run, enum atom_run_curve curve,
                    int subshell, int n, const double *r, double *out);

/* Radius in bohr beyond which less than `electrons` are found; of an atom in
 * REPORT_SOLVED. */
double run_atom_extent(const struct atom_run *run, double electrons);

#endif
