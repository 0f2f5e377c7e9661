/* SPDX-License-Identifier: MIT */
/* The report of `atom`, and of the screen Atom. */
#ifndef REPORT_SOLVED_H
#define REPORT_SOLVED_H

#include "analysis/atom_report.h"
#include "base/units.h"
#include "report/report.h"

/* Fills the parts (bits of enum report_part) of an empty report from an atom in
 * REPORT_SOLVED, which must outlive it, as must its source and the units that
 * it is written in. Records: a record for each part of the energy, then for
 * each level one per number. Blocks: energy and its parts, whole subshells, and
 * the levels where they are told apart by spin or j. */
void report_solved(struct report *report, unsigned parts,
                   const struct atom_report *atom,
                   const struct provenance *source, const struct unit *energy,
                   const struct unit *length);

#endif
