/* SPDX-License-Identifier: MIT */
/* What every number rests on: models and data sets with their citations. */
#ifndef EXPORT_SOURCES_H
#define EXPORT_SOURCES_H

#include "export/format.h"

#define SOURCE_QUANTITY_MAX 96

/* One model or data set. Texts are borrowed; "" or NULL where none. */
struct source {
    const struct provenance *provenance;
    char quantity[SOURCE_QUANTITY_MAX]; /* ids joined by a space */
    const char *unit;                   /* "" for a model */
    const char *domain;       /* a model's domain, a data set's licence */
    const char *const *notes; /* notes[note_count] */
    int note_count;
    int count; /* stored values; 0 for a model */
};

MUST_CHECK bool sources_write(FILE *out, enum export_format format,
                              const struct source *sources, int count,
                              struct status *st);

/* BibTeX, one entry per citation, each key once. */
void sources_write_bibtex(FILE *out, const struct source *sources, int count);

#endif
