/* SPDX-License-Identifier: MIT */
/* Where a number comes from: a citation and the source that used it. */
#ifndef ELEMENT_PROVENANCE_H
#define ELEMENT_PROVENANCE_H

#include <stdbool.h>
#include <stddef.h>

#include "base/text.h"
#include "element/definition.h"

/* A list of names for a citation that is a constant of a file. */
#define CITATION_NAMES(...) ((const char *const[]){__VA_ARGS__, NULL})

/* A bibliographic record. Fields that do not apply are NULL or 0. key is a
 * BibTeX key; kind a BibTeX entry type: "article", "book", "misc", … What is
 * not certain of the record is said in it: from_memory and not_known name
 * fields, joined by ", ". */
struct citation {
    const char *key;
    const char *kind;
    /* Persons, given names first; the last may be "others". The list ends with
     * NULL, as that of the organizations that sign behind them. */
    const char *const *authors;
    const char *const *organizations;
    const char *title;
    const char *container; /* journal, book or publisher */
    int year;
    const char *volume;
    const char *pages;
    const char *doi;
    const char *note; /* how it was seen: "read in the abstract" */
    const char *from_memory;
    const char *not_known;
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
    /* What no work is cited for: "common practice, no source"; or NULL. */
    const char *unsourced;
    /* So many of the first works are those of every value, also where a value
     * names another one as its own. */
    int common;
};

/* What a number rests on: all works of a source, or only one of them. */
struct cited_source {
    const struct provenance *provenance; /* NULL: nothing */
    const struct citation *only;         /* NULL: all of them */
};

/* Whether a source cites the i-th work of its provenance. */
bool cited_holds(struct cited_source source, int i);

/* What its numbers are, in words: its definition's, or its title. */
const char *provenance_definition(const struct provenance *provenance);

/* Appends "A. Author and B. Author, Journal 36, 57 (1930), doi 10.… [read in
 * the abstract]": how a citation stands beside a number. CITATION_FULL adds
 * the title of an article and what of the record is from memory. */
enum citation_form { CITATION_SHORT, CITATION_FULL };
void citation_text(struct text *t, const struct citation *citation,
                   enum citation_form form);

/* Appends the works joined by "; ", behind what no work is cited for. */
void cited_text(struct text *t, struct cited_source source,
                enum citation_form form);

#endif
