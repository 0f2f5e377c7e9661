/* SPDX-License-Identifier: MIT */
/* What a model that iterates has solved, kept as readings. */
#ifndef STUDY_SOLUTION_H
#define STUDY_SOLUTION_H

#include "model/model.h"

#define SOLUTION_MAX 2048 /* kept at once; the oldest goes first */

/* Readings of one atom under one model: readings[offer] for the outermost
 * subshell, then, for offers by subshell, one per subshell. */
struct solution {
    const struct model *model;
    struct species species;
    struct reading *readings;
};

/* A remark that a model wrote for one atom. */
struct solution_remark;

/* remarks: they outlive the solutions, since rows point to them. */
struct solution_store {
    int count;
    int oldest; /* where the next one goes once the store is full */
    struct solution *items;
    struct solution_remark *remarks;
};

/* The solution for a species, or NULL. */
const struct solution *solution_find(const struct solution_store *store,
                                     const struct model *model,
                                     const struct species *species);

/* Reads everything that a solved work space has to say and keeps it. */
MUST_CHECK bool solution_keep(struct solution_store *store,
                              const struct model *model, const void *work,
                              const struct species *species, struct status *st);

/* One reading; n = 0 for the outermost subshell. A subshell that the species
 * does not hold gives a gap. */
struct reading solution_read(const struct solution *solution, int offer, int n,
                             int l);

/* Forgets all solutions; readings given before stay good. */
void solution_clear(struct solution_store *store);

/* Forgets everything. */
void solution_free(struct solution_store *store);

#endif
