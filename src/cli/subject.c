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

/* Adds a set that tells sites apart, each once. */
static int add_site_set(const struct reference *set,
                        const struct reference **sets, int count, int max)
{
    if (!set || !reference_has_sites(set) || count == max)
        return count;
    for (int i = 0; i < count; i++)
        if (sets[i] == set)
            return count;
    sets[count] = set;
    return count + 1;
}

int request_site_sets(const struct request *r, bool ions,
                      const struct reference **sets, int max)
{
    int count = 0;
    const struct command_manner *manner = &r->call->command->manner;
    for (int i = 0; i < r->set_count; i++)
        count = add_site_set(r->sets[i], sets, count, max);
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        count = add_site_set(r->references[q], sets, count, max);
        count = add_site_set(r->against[q], sets, count, max);
    }
    bool by_default = request_chooses(r, QUANTITY_RADIUS) && ions &&
                      !r->references[QUANTITY_RADIUS];
    bool wanted = by_default || (manner->all_sets && r->set_count == 0);
    const struct reference_list *list = study_references(r->study);
    for (int i = 0; wanted && count == 0 && i < list->count; i++)
        count = add_site_set(&list->items[i], sets, count, max);
    return count;
}
