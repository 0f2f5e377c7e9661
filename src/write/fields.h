/* SPDX-License-Identifier: MIT */
/* Going through the records of a report, field by field. */
#ifndef WRITE_FIELDS_H
#define WRITE_FIELDS_H

#include "report/report.h"

/* How a format writes the text of one field: it stands at the end of t, from
 * `start` on, as the column put it, and is replaced where the format has it
 * otherwise. scratch is for copies. */
typedef void fields_encode(struct text *t, size_t start, struct text *scratch);

/* What is made once and used again: citations by their source, and the fields
 * that neighbouring records share. */
struct fields;

/* A walk through the records of a report in which fields are encoded. NULL,
 * with st filled, when memory is short. */
struct fields *fields_open(const struct report_records *records,
                           fields_encode *encode, struct status *st);

/* Goes to record i, in rising order. */
void fields_record(struct fields *fields, size_t i);

/* Appends one field of the present record, encoded. */
void fields_append(struct fields *fields, int column, struct text *line);

/* Ends the walk; false when memory was short on the way. */
MUST_CHECK bool fields_close(struct fields *fields, struct status *st);

#endif
