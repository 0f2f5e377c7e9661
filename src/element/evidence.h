/* SPDX-License-Identifier: MIT */
/* How a number came about. */
#ifndef ELEMENT_EVIDENCE_H
#define ELEMENT_EVIDENCE_H

#include <stdbool.h>

/* its id in files and options, its words */
#define EVIDENCE_LIST(X)                                                       \
    X(EVIDENCE_UNSTATED, "unstated", "kind of value not stated")               \
    X(EVIDENCE_MEASURED, "measured", "measured")                               \
    X(EVIDENCE_EXTRAPOLATED, "extrapolated", "interpolated or extrapolated")   \
    X(EVIDENCE_THEORETICAL, "theoretical", "theoretical")                      \
    X(EVIDENCE_DERIVED, "derived", "derived from measurements")                \
    X(EVIDENCE_RECOMMENDED, "recommended", "recommended by an evaluation")     \
    X(EVIDENCE_ESTIMATED, "estimated", "estimated")

enum evidence {
#define EVIDENCE_ENUM(name, id, words) name,
    EVIDENCE_LIST(EVIDENCE_ENUM)
#undef EVIDENCE_ENUM
        EVIDENCE_COUNT
};

/* Never NULL. */
const char *evidence_id(enum evidence evidence);
const char *evidence_word(enum evidence evidence);

/* Why a value of this kind is left out where other kinds were asked for. */
const char *evidence_left_out(enum evidence evidence);

/* By id; false when there is none. */
bool evidence_find(const char *id, enum evidence *found);

/* Whether a choice of kinds holds this one: choice has bit 1 << evidence for
 * each of them, or is 0 for all. */
bool evidence_chosen(unsigned choice, enum evidence evidence);

#endif
