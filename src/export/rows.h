/* SPDX-License-Identifier: MIT */
/* Rows as text, CSV and JSON: what `list` prints and what every screen
 * exports. */
#ifndef EXPORT_ROWS_H
#define EXPORT_ROWS_H

#include "analysis/row.h"
#include "export/format.h"

/* Writes rows[count] with their heading. CSV and JSON carry the same fields;
 * JSON adds the reason of a gap and remarks. Text is for people: the places
 * that the unit shows, the reason where there is no residual. Write errors are
 * the stream's; fails with STATUS_MEMORY. */
MUST_CHECK bool rows_write(FILE *out, enum export_format format,
                           const struct row *rows, size_t count,
                           struct status *st);

/* Fields of the CSV, in order. */
#define ROW_FIELDS_MAX 20 /* those that are always there */
int row_field_count(void);
const char *row_field_name(int field);

/* The text of one field of a row, as in CSV. */
void row_field_text(const struct row *row, int field, struct text *t);

#endif
