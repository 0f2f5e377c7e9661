/* SPDX-License-Identifier: MIT */
/* A model or data set as something that numbers rest on. */
#ifndef ANALYSIS_SOURCE_H
#define ANALYSIS_SOURCE_H

#include "element/provenance.h"

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

#endif
