/* SPDX-License-Identifier: MIT */
/* A model's value beside the stored one: the line that every screen and every
 * command shows. */
#ifndef ANALYSIS_ROW_H
#define ANALYSIS_ROW_H

#include <stdbool.h>

#include "element/reading.h"
#include "element/species.h"

/* What a row says of itself, its id in CSV. The first is the only one with a
 * residual. */
#define ROW_STATE_LIST(X)                                                      \
    X(ROW_OK, "ok")                                                            \
    X(ROW_NO_REFERENCE, "no-reference")                                        \
    X(ROW_OTHER_SCALE, "other-scale")                                          \
    X(ROW_REFERENCE_ONLY, "reference-only")                                    \
    X(ROW_OUTSIDE_MODEL, "outside-model")                                      \
    X(ROW_NOT_CONVERGED, "not-converged")                                      \
    X(ROW_NOT_SOLVED, "not-solved")

enum row_state {
#define ROW_ENUM(state, id) state,
    ROW_STATE_LIST(ROW_ENUM)
#undef ROW_ENUM
        ROW_STATE_COUNT
};

const char *row_state_id(enum row_state state);

/* value and reference are in `unit`. value.provenance is NULL when no model
 * offers the quantity; reference.provenance is NULL when no set was chosen.
 * residual = value - reference, exact in decimal, and in per cent of the
 * reference, only in ROW_OK (percent only where the reference is not zero).
 * like_with_like: both have the same definition. repeats: the reference is the
 * model's own calculation, published. reason: "" in ROW_OK, else one
 * clause that says why there is no residual; borrowed. */
struct row {
    struct species species;
    enum quantity_id quantity;
    const struct unit *unit;
    int n, l; /* subshell asked about; n = 0 where the quantity has none */
    struct reading value;
    struct reading reference;
    enum row_state state;
    bool like_with_like;
    bool repeats;
    bool has_percent;
    struct number residual;
    struct number percent;
    const char *reason;
    /* A second reference beside the first, where one was asked for (else its
     * provenance is NULL), and how far it is from the first. */
    struct reading against;
    bool disagrees; /* both hold a number on one scale */
    bool has_disagreement_percent;
    struct number disagreement;
    struct number disagreement_percent;
};

/* Fills state, residual, percent and reason of a row whose species, quantity,
 * unit and subshell are set, from two readings in base units. Numbers on two
 * scales (DIMENSION_NUMBER with other definitions) are never subtracted. */
void row_compare(struct row *row, struct reading value,
                 struct reading reference);

/* Adds a second reference, in base units, to a row that row_compare filled:
 * disagreement = against - reference, and in per cent of the reference. */
void row_disagree(struct row *row, struct reading against);

/* The row in which the second reference takes the place of the model: its
 * residual is the disagreement. */
struct row row_of_sets(const struct row *row);

#endif
