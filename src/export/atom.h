/* SPDX-License-Identifier: MIT */
/* One self-consistent atom as text, CSV and JSON: what `atom` prints and the
 * screen Atom exports. */
#ifndef EXPORT_ATOM_H
#define EXPORT_ATOM_H

#include "analysis/atom_report.h"
#include "base/units.h"
#include "export/format.h"
#include "export/table.h"

/* Writes a report in REPORT_SOLVED as CSV or JSON: a row for each part of the
 * energy, then for each level a row per number. energy, length: units to write
 * in. Energies carry at least 7 decimal places. Write errors are the stream's.
 */
void atom_write(FILE *out, enum export_format format,
                const struct atom_report *report, const struct unit *energy,
                const struct unit *length);

/* The same for people: energy and its parts, whole subshells, and the levels
 * where they are parted by spin or j. Fails with STATUS_MEMORY. */
MUST_CHECK bool atom_write_text(FILE *out, const struct atom_report *report,
                                const struct unit *energy,
                                const struct unit *length,
                                const struct table_style *style,
                                struct status *st);

#endif
