/* SPDX-License-Identifier: MIT */
/* What a request has chosen so far; options ask while they are read. */
#include "cli/request.h"

#include "cli/words.h"

bool request_chooses(const struct request *r, enum quantity_id quantity)
{
    for (int i = 0; i < r->quantity_count; i++)
        if (r->quantities[i] == quantity)
            return true;
    return false;
}

bool request_offers(const struct request *r, const struct model *model)
{
    for (int i = 0; i < r->quantity_count; i++)
        if (model_gives(model, r->quantities[i]))
            return true;
    return false;
}

void request_quantities(const struct request *r, struct text *t)
{
    const char *names[QUANTITY_COUNT];
    for (int i = 0; i < r->quantity_count; i++)
        names[i] = quantity_at(r->quantities[i])->id;
    words_join(t, names, r->quantity_count, "and");
}
