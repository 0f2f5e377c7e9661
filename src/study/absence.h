/* SPDX-License-Identifier: MIT */
/* Why a set has no value for an ion at a site, and where it has one. */
#ifndef STUDY_ABSENCE_H
#define STUDY_ABSENCE_H

#include "element/species.h"
#include "refdata/dataset.h"

/* Sentences made so far; readings refer to them. Starts as {0}. */
struct absence_list {
    struct absence **items; /* items[count], each of them owned */
    size_t count, capacity;
};
void absence_clear(struct absence_list *list);

/* "XII not stored; VIII 101.9, IX 107.5": the two stored coordinations nearest
 * to the one that the species is asked at (its own, or the set's default), or
 * the other spin states there, with their values in the set's
 * unit. The set's general reason when it holds no site of this ion, list is
 * NULL or memory is short. Good as long as the list and the set. */
const char *absence_text(struct absence_list *list, const struct dataset *set,
                         const struct species *species);

#endif
