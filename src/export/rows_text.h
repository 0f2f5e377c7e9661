/* SPDX-License-Identifier: MIT */
/* Rows for people. */
#ifndef EXPORT_ROWS_TEXT_H
#define EXPORT_ROWS_TEXT_H

#include "analysis/row.h"
#include "export/table.h"

/* A table with the places that the unit shows; reference sets by a letter and
 * everything that is to be known of a row by a number, both told once below.
 * Fails with STATUS_MEMORY. */
MUST_CHECK bool rows_write_text(FILE *out, const struct row *rows, size_t count,
                                const struct table_style *style,
                                struct status *st);

#endif
