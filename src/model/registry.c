/* SPDX-License-Identifier: MIT */
#include "model/registry.h"

#include <assert.h>
#include <string.h>

#include "model/models.h"

int model_count(void)
{
    return model_list_count;
}

const struct model *model_at(int i)
{
    assert(i >= 0 && i < model_count());
    return model_list[i];
}

const struct model *model_find(const char *id)
{
    for (int i = 0; i < model_count(); i++)
        if (strcmp(model_list[i]->id, id) == 0)
            return model_list[i];
    return NULL;
}

int model_index(const struct model *model)
{
    int i = 0;
    while (model_list[i] != model)
        i++;
    return i;
}

int model_offer_for(const struct model *model, enum quantity_id quantity,
                    const struct definition *definition)
{
    int first = -1;
    for (int i = 0; i < model->offer_count; i++) {
        if (model->offers[i].quantity != quantity)
            continue;
        if (first < 0)
            first = i;
        if (definition && model->offers[i].provenance.definition == definition)
            return i;
    }
    return first;
}

/* Whether all inputs at a charge are offered. */
static bool follows(const struct model *model, const struct derivation *d,
                    int charge)
{
    struct derivation_input inputs[DERIVATION_INPUTS_MAX];
    const char *reason = "";
    int count = d->inputs(charge, inputs, &reason);
    for (int i = 0; i < count; i++)
        if (model_offer_for(model, inputs[i].quantity, NULL) < 0)
            return false;
    return count > 0;
}

const struct derivation *model_derivation(const struct model *model,
                                          enum quantity_id quantity)
{
    if (model_offer_for(model, quantity, NULL) >= 0)
        return NULL;
    for (int i = 0; i < derivation_list_count; i++) {
        const struct derivation *d = derivation_list[i];
        if (d->definition->quantity == quantity &&
            (follows(model, d, 0) || follows(model, d, 1)))
            return d;
    }
    return NULL;
}

bool model_gives(const struct model *model, enum quantity_id quantity)
{
    return model_offer_for(model, quantity, NULL) >= 0 ||
           model_derivation(model, quantity);
}
