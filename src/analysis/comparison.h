/* SPDX-License-Identifier: MIT */
/* A few atoms or ions side by side, the first one the yardstick. */
#ifndef ANALYSIS_COMPARISON_H
#define ANALYSIS_COMPARISON_H

#include "analysis/row.h"
#include "base/text.h"
#include "base/status.h"

#define COMPARISON_MAX 12 /* atoms side by side */
#define FACT_TEXT_MAX 320

/* One quantity from one source for all atoms, in one unit. */
struct comparison_line {
    enum quantity_id quantity;
    const struct unit *unit;
    const struct provenance *provenance;
    struct reading readings[COMPARISON_MAX];
};

/* A fact that is words, not a number: configuration, block, cautions. */
struct comparison_fact {
    const char *label;
    char text[COMPARISON_MAX][FACT_TEXT_MAX];
};

/* How far a second reference is from the first, as a source of lines. */
struct comparison_pair {
    struct provenance provenance; /* cites nothing itself: see below */
    const struct provenance *first, *second;
    char id[128];
};

/* lines[line_count] and facts[fact_count] are owned; comparison_clear frees
 * them. */
struct comparison {
    int count;
    struct species species[COMPARISON_MAX];
    int line_count;
    struct comparison_line *lines;
    int fact_count;
    struct comparison_fact *facts;
    int pair_count;
    struct comparison_pair *pairs[QUANTITY_COUNT]; /* owned */
};

void comparison_clear(struct comparison *comparison);

/* What a line is called: the id of its source, with the definition where the
 * source gives several numbers for the quantity. */
void comparison_label(const struct comparison *comparison, int line,
                      struct text *t);
/* Adds, behind the line of the second set, a line that holds the second less
 * the first; nothing where one of them has no line, or they are scales that
 * cannot be subtracted. Fails with STATUS_MEMORY. */
MUST_CHECK bool comparison_add_pair(struct comparison *comparison,
                                    const struct provenance *first,
                                    const struct provenance *second,
                                    struct status *st);

/* The two readings behind one cell of a line that comparison_add_pair added,
 * which rest on works of their own; false for any other line. */
bool comparison_pair_readings(const struct comparison *comparison,
                              const struct comparison_line *line, int which,
                              struct reading readings[2]);

/* Difference of atom `which` from atom 0 in a line: false when either has no
 * number or which is 0. percent is of the size of the first; has_percent only
 * where that is not zero. */
struct difference {
    struct number value;
    bool has_percent;
    struct number percent;
};
bool comparison_difference(const struct comparison_line *line, int which,
                           struct difference *difference);

#endif
