/* SPDX-License-Identifier: MIT */
/* The pieces that every export is made of. */
#ifndef EXPORT_FORMAT_H
#define EXPORT_FORMAT_H

#include <stdio.h>

#include "base/text.h"
#include "element/provenance.h"
#include "element/reading.h"
#include "element/species.h"

enum export_format { EXPORT_TEXT, EXPORT_CSV, EXPORT_JSON };

/* Appends one CSV field (RFC 4180), quoted where it has to be. */
void csv_text(struct text *t, const char *field);

/* Writes one CSV field (RFC 4180): quoted when it holds a comma, a quote or a
 * line break; `first` leaves out the comma before it. */
void csv_field(FILE *out, const char *text, bool first);

/* Ends a CSV record (CRLF). */
void csv_end(FILE *out);

/* A JSON string with its quotes; invalid UTF-8 becomes U+FFFD. */
void json_string(FILE *out, const char *text);

/* "E. Author, Journal 36, 57 (1930), doi 10.…", all citations of a source
 * joined by "; ". Nothing for NULL. */
void citation_text(struct text *t, const struct citation *citation);
void provenance_text(struct text *t, const struct provenance *provenance);

/* A stored value in the concise form of tables, "6.634126(5)"; "31 +- 0.5"
 * where the uncertainty has finer digits than the value. */
void reading_text(struct text *t, const struct reading *reading);

/* A configuration with where it comes from when that is not a table:
 * "[Ar] 3d6 (by rule)". */
void species_configuration_text(struct text *t, const struct species *species);

#endif
