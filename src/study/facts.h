/* SPDX-License-Identifier: MIT */
/* What is known of an element in words, and comparisons and sources made
 * from everything that a study knows. */
#ifndef STUDY_FACTS_H
#define STUDY_FACTS_H

#include "analysis/comparison.h"
#include "analysis/source.h"
#include "study/study.h"

/* The facts shown of a species, in order: what stands for each. */
enum fact_id {
    FACT_CONFIGURATION, /* "[Kr] 4d2 5s2, stored, 3F2" */
    FACT_PLACE,         /* "period 5, group 4, d block" */
    FACT_CATEGORY,      /* "transition metal" */
    FACT_WEIGHT,        /* "91.222", or the longest-lived mass number */
    FACT_OXIDATION,     /* common oxidation states */
    FACT_CAUTION,       /* "no stable isotope", tags; safety data sheet */
    FACT_SUPPLY,        /* lists of critical materials with their year */
    FACT_ABUNDANCE,     /* "56300 mg/kg in the crust" */
    FACT_COUNT
};

const char *fact_label(enum fact_id id);

/* Writes the fact; nothing when there is none. */
void study_fact(const struct study *study, const struct species *species,
                enum fact_id id, struct text *t);

/* Everything known of count (1…COMPARISON_MAX) asks side by side: all
 * quantities, each by all models that offer it and all references that hold a
 * value for one of them. Models that iterate are solved here when `solve`,
 * else read as not solved yet. Only z, charge, configuration and
 * subshell of the asks count; units[dimension] where set replaces the base
 * unit. The result is released with comparison_clear. Fails with STATUS_MEMORY
 * or as study_species. */
MUST_CHECK bool study_compare(struct study *study, const struct ask *asks,
                              int count, bool solve,
                              const struct unit *const *units,
                              struct comparison *comparison, struct status *st);

/* All models and data sets in use; gives how many there are, at most max. */
#define SOURCES_MAX 160
int study_sources(const struct study *study, struct source *sources, int max);

#endif
