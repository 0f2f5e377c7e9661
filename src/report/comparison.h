/* SPDX-License-Identifier: MIT */
/* The report of `compare`, and of the screen Compare. */
#ifndef REPORT_COMPARISON_H
#define REPORT_COMPARISON_H

#include "analysis/comparison.h"
#include "report/report.h"

/* Fills the parts (bits of enum report_part) of an empty report from a
 * comparison, which must outlive it. Records: one per line and species. Blocks:
 * what is known in words, then tables with a column per species and, from the
 * second on, its difference from the first. */
void report_comparison(struct report *report, unsigned parts,
                       const struct comparison *comparison);

#endif
