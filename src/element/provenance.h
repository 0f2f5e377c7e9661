/* SPDX-License-Identifier: MIT */
/* Where a number comes from: a citation and the source that used it. */
#ifndef ELEMENT_PROVENANCE_H
#define ELEMENT_PROVENANCE_H

#include <stdbool.h>

#include "base/text.h"
#include "element/definition.h"

/* A bibliographic record. Fields that do not apply are NULL or 0. key is a
 * BibTeX key; kind a BibTeX entry type: "article", "book", "misc", … */
struct citation {
    const char *key;
    const char *kind;
    const char *authors; /* "E. Clementi and D. L. Raimondi" */
    const char *title;
    const char *container; /* journal, book or publisher */
    int year;
    const char *volume;
    const char *pages;
    const char *doi;
};

/* The source of a reading; lives as long as the program or its data set.
 * definition says what the numbers are: only equal ones are like with like. */
struct provenance {
    bool computed;
    const char *id;                      /* model or data set */
    const char *title;                   /* one line */
    const struct definition *definition; /* NULL for a table of facts */
    const struct citation *citations;    /* citations[citation_count] */
    int citation_count;
};

/* Appends "E. Author, Journal 36, 57 (1930), doi 10.…". */
void citation_text(struct text *t, const struct citation *citation);

/* What its numbers are, in words: its definition's, or its title. */
const char *provenance_definition(const struct provenance *provenance);

/* Appends all citations of a source joined by "; ", nothing for NULL. */
void provenance_text(struct text *t, const struct provenance *provenance);

#endif
