/* SPDX-License-Identifier: MIT */
/* A few atoms or ions side by side, the first one the yardstick. */
#ifndef ANALYSIS_COMPARISON_H
#define ANALYSIS_COMPARISON_H

#include "analysis/row.h"
#include "base/text.h"

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

/* lines[line_count] and facts[fact_count] are owned; comparison_clear frees
 * them. */
struct comparison {
    int count;
    struct species species[COMPARISON_MAX];
    int line_count;
    struct comparison_line *lines;
    int fact_count;
    struct comparison_fact *facts;
};

void comparison_clear(struct comparison *comparison);

/* What a line is called: the id of its source, with the definition where the
 * source gives several numbers for the quantity. */
void comparison_label(const struct comparison *comparison, int line,
                      struct text *t);

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
