/* SPDX-License-Identifier: MIT */
#include "element/definition.h"

#include <assert.h>
#include <string.h>

#define DEFINITION_OBJECT(name, quantity, text, dimension, traits)             \
    const struct definition definition_##name = {                              \
        #name, QUANTITY_##quantity, text, DIMENSION_##dimension, traits};
DEFINITION_LIST(DEFINITION_OBJECT)
#undef DEFINITION_OBJECT

static const struct definition *const definitions[] = {
#define DEFINITION_POINTER(name, quantity, text, dimension, traits)            \
    &definition_##name,
    DEFINITION_LIST(DEFINITION_POINTER)
#undef DEFINITION_POINTER
};
#define DEFINITION_COUNT (sizeof definitions / sizeof definitions[0])

size_t definition_count(enum quantity_id quantity)
{
    size_t count = 0;
    for (size_t i = 0; i < DEFINITION_COUNT; i++)
        count += definitions[i]->quantity == quantity;
    return count;
}

const struct definition *definition_at(enum quantity_id quantity, size_t place)
{
    assert(place < definition_count(quantity));
    size_t i = 0;
    for (;; i++)
        if (definitions[i]->quantity == quantity && place-- == 0)
            return definitions[i];
}

const struct definition *definition_find(enum quantity_id quantity,
                                         const char *text)
{
    for (size_t i = 0; i < DEFINITION_COUNT; i++)
        if (definitions[i]->quantity == quantity &&
            strcmp(definitions[i]->text, text) == 0)
            return definitions[i];
    return NULL;
}

bool definition_subtracts(const struct definition *a,
                          const struct definition *b)
{
    if (!a || !b)
        return false;
    unsigned either = a->traits | b->traits;
    return a == b ||
           (a->quantity == b->quantity && a->dimension == b->dimension &&
            !(either & DEFINITION_SCALE));
}
