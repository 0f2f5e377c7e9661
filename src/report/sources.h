/* SPDX-License-Identifier: MIT */
/* The report of `sources`: what every number rests on. */
#ifndef REPORT_SOURCES_H
#define REPORT_SOURCES_H

#include "analysis/source.h"
#include "report/report.h"

/* Fills the parts (bits of enum report_part) of an empty report from
 * sources[count], which must outlive it. */
void report_sources(struct report *report, unsigned parts,
                    const struct source *sources, int count);

#endif
