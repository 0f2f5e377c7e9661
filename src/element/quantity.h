/* SPDX-License-Identifier: MIT */
/* What can be asked for: one row per quantity, iterated by everything. */
#ifndef ELEMENT_QUANTITY_H
#define ELEMENT_QUANTITY_H

#include <stdbool.h>

#include "base/units.h"

enum quantity_id {
    QUANTITY_ZEFF,
    QUANTITY_RADIUS,
    QUANTITY_IONIZATION,
    QUANTITY_ELECTRONEGATIVITY,
    QUANTITY_ISODENSITY,
    QUANTITY_AFFINITY,
    QUANTITY_POLARIZABILITY,
    QUANTITY_HARDNESS,
    QUANTITY_COUNT
};

/* lowest…highest: plausible range in the base unit, the limits that the
 * data loader enforces. per_subshell: the answer depends on the subshell
 * asked about. modelled: at least one model offers it. */
struct quantity {
    const char *id;     /* as typed, as in CSV */
    const char *title;  /* "effective nuclear charge" */
    const char *symbol; /* short heading: "Z_eff" */
    enum dimension dimension;
    double lowest, highest;
    bool per_subshell;
    bool modelled;
};

/* The row of a quantity. */
const struct quantity *quantity_at(enum quantity_id id);

/* By id; false when there is none. */
bool quantity_find(const char *id, enum quantity_id *found);

#endif
