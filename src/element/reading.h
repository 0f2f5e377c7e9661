/* SPDX-License-Identifier: MIT */
/* One number with everything that belongs to it, or the reason why there is
 * none. */
#ifndef ELEMENT_READING_H
#define ELEMENT_READING_H

#include <stdbool.h>

#include "base/number.h"
#include "element/element.h"
#include "element/evidence.h"
#include "element/provenance.h"
#include "element/quantity.h"
#include "element/site.h"

/* state, its id in CSV, its word on screen */
#define READING_STATE_LIST(X)                                                  \
    X(READING_OK, "ok", "value")                                               \
    X(READING_MISSING, "no-reference", "not stored")                           \
    X(READING_OUTSIDE, "outside-model", "outside the model")                   \
    X(READING_NOT_CONVERGED, "not-converged", "not converged")                 \
    X(READING_PENDING, "not-solved", "not solved yet")

enum reading_state {
#define READING_ENUM(state, id, word) state,
    READING_STATE_LIST(READING_ENUM)
#undef READING_ENUM
        READING_STATE_COUNT
};

const char *reading_state_id(enum reading_state state);
const char *reading_state_word(enum reading_state state);

/* value and u are in the base unit of the quantity's dimension unless a caller
 * has converted them (reading_in_unit). u is one standard uncertainty. reason
 * and remark are borrowed, never NULL: reason says why there is no number (""
 * when there is one), remark what to know about the number ("" for nothing). */
struct reading {
    enum reading_state state;
    enum quantity_id quantity;
    int n, l;         /* the subshell it belongs to; n = 0 when none */
    struct site site; /* that a stored value was found at; none elsewhere */
    struct number value;
    struct number u;
    bool has_u;
    const struct provenance *provenance;
    /* The one work of the provenance that this very value rests on; NULL where
     * it rests on all of them. */
    const struct citation *cited;
    const char *reason;
    const char *remark;
    enum evidence evidence; /* of a stored value; unstated when computed */
};

/* A reading with a computed value: decimal from here on, at least 9
 * significant digits, finite. */
struct reading reading_computed(enum quantity_id quantity, double value,
                                const struct provenance *provenance);

/* A reading without a number. */
struct reading reading_gap(enum quantity_id quantity, enum reading_state state,
                           const char *reason,
                           const struct provenance *provenance);

/* The same reading in another unit of its dimension. */
struct reading reading_in_unit(struct reading reading, const struct unit *unit);

/* What it rests on. */
struct cited_source reading_cited(const struct reading *reading);

/* The site of what is said about a species asked about at a site (none where
 * none was named): that of the stored value where it has one. */
struct site reading_site(const struct reading *reading, struct site asked);

/* Appends a number in the concise form of tables, "6.634126(5)"; "31 +- 0.5"
 * where the uncertainty has finer digits than the value. */
void reading_text(struct text *t, const struct reading *reading);

/* One quantity from one source for all elements; readings[z], z = 1…Z_MAX,
 * [0] unused. */
struct sheet {
    enum quantity_id quantity;
    const struct provenance *provenance;
    struct reading readings[Z_MAX + 1];
};

#endif
