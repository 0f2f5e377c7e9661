/* SPDX-License-Identifier: MIT */
#include "element/reading.h"

#include <assert.h>
#include <math.h>

/* More than the seven digits that are promised, less than the noise of
 * double precision: 2.55 stays 2.55. */
#define COMPUTED_DIGITS 9

static const struct {
    const char *id;
    const char *word;
} states[READING_STATE_COUNT] = {
#define READING_ROW(state, id, word) {id, word},
    READING_STATE_LIST(READING_ROW)
#undef READING_ROW
};

const char *reading_state_id(enum reading_state state)
{
    return states[state].id;
}

const char *reading_state_word(enum reading_state state)
{
    return states[state].word;
}

struct reading reading_computed(enum quantity_id quantity, double value,
                                const struct provenance *provenance)
{
    assert(isfinite(value));
    return (struct reading){
        .state = READING_OK,
        .quantity = quantity,
        .value = number_round(value, COMPUTED_DIGITS, 0),
        .provenance = provenance,
        .reason = "",
        .remark = "",
    };
}

struct reading reading_gap(enum quantity_id quantity, enum reading_state state,
                           const char *reason,
                           const struct provenance *provenance)
{
    assert(state != READING_OK);
    return (struct reading){
        .state = state,
        .quantity = quantity,
        .provenance = provenance,
        .reason = reason,
        .remark = "",
    };
}

struct reading reading_in_unit(struct reading reading, const struct unit *unit)
{
    /* A base unit changes nothing, so an electronegativity in electronvolts
     * passes. */
    assert(unit->per_base == 1.0 ||
           unit->dimension == quantity_at(reading.quantity)->dimension);
    if (reading.state != READING_OK)
        return reading;
    reading.value = number_scale(reading.value, unit->per_base);
    if (reading.has_u)
        reading.u = number_scale_uncertainty(reading.u, unit->per_base);
    return reading;
}

struct cited_source reading_cited(const struct reading *reading)
{
    return (struct cited_source){reading->provenance, reading->cited};
}

struct site reading_site(const struct reading *reading, struct site asked)
{
    bool found = reading->state == READING_OK && site_named(reading->site);
    return found ? reading->site : asked;
}

void reading_text(struct text *t, const struct reading *reading)
{
    char value[NUMBER_TEXT_MAX];
    char u[NUMBER_TEXT_MAX];
    if (!reading->has_u || reading->u.decimals > reading->value.decimals) {
        text_add(t, number_print(reading->value, value));
        if (reading->has_u)
            text_addf(t, " +- %s", number_print(reading->u, u));
        return;
    }
    /* A derived value may have more places than its uncertainty. */
    int places = reading->u.decimals;
    double last = reading->u.value * pow(10, places);
    text_addf(t, "%s(%.0f)",
              number_print_places(reading->value.value, places, value), last);
}
