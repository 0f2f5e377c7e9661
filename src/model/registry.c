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
