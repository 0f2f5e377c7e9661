/* SPDX-License-Identifier: MIT */
/* What a stored number is. Values of one quantity under two definitions are
 * not like with like: a covalent radius is no ionic radius. */
#ifndef REFDATA_DEFINITION_H
#define REFDATA_DEFINITION_H

#include <stdbool.h>
#include <stddef.h>

#include "element/quantity.h"

/* text stands in the file, in provenance and on screen. */
struct definition {
    enum quantity_id quantity;
    const char *text;
    enum dimension dimension; /* of its unit: Mulliken values are energies */
    bool may_be_negative;     /* an ion of hydrogen can have such a radius */
};

/* Number of definitions of a quantity (at least 1) and the i-th one. */
size_t definition_count(enum quantity_id quantity);
const struct definition *definition_at(enum quantity_id quantity, size_t i);

/* By text; NULL when the quantity has none such. */
const struct definition *definition_find(enum quantity_id quantity,
                                         const char *text);

/* Dimension of numbers under a definition: its own, or the quantity's when the
 * quantity has none such. text may be NULL. */
enum dimension definition_dimension(enum quantity_id quantity,
                                    const char *text);

#endif
