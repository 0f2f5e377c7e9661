/* SPDX-License-Identifier: MIT */
/* Atoms side by side as text, CSV and JSON. */
#ifndef EXPORT_COMPARE_H
#define EXPORT_COMPARE_H

#include "analysis/comparison.h"
#include "export/format.h"
#include "export/table.h"

/* Text: one column per atom and, from the second on, its difference from the
 * first. CSV and JSON: one record per line and atom. Fails with
 * STATUS_MEMORY. */
MUST_CHECK bool compare_write(FILE *out, enum export_format format,
                              const struct comparison *comparison,
                              struct status *st);

/* Its text, with marks for a terminal. */
MUST_CHECK bool compare_write_text(FILE *out,
                                   const struct comparison *comparison,
                                   const struct table_style *style,
                                   struct status *st);

#endif
