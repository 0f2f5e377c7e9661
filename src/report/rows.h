/* SPDX-License-Identifier: MIT */
/* The report of `list`, and of what the screens export of it. */
#ifndef REPORT_ROWS_H
#define REPORT_ROWS_H

#include "analysis/row.h"
#include "report/report.h"

/* Fills the parts (bits of enum report_part) of an empty report from
 * rows[count], count >= 1, which must outlive it. Records: one per row, with
 * the columns of a second reference where some row has one. Blocks: a table
 * with the places that the unit shows, and its legends. */
void report_rows(struct report *report, unsigned parts, const struct row *rows,
                 size_t count);

/* The columns of its records that are always there. */
#define ROWS_COLUMN_COUNT 20
extern const struct report_column report_rows_columns[];

#endif
