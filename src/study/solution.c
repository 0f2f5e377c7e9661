/* SPDX-License-Identifier: MIT */
#include "study/solution.h"

#include <stdlib.h>

static bool same_species(const struct species *a, const struct species *b)
{
    return a->z == b->z && a->charge == b->charge &&
           configuration_same(&a->configuration, &b->configuration);
}

const struct solution *solution_find(const struct solution_store *store,
                                     const struct model *model,
                                     const struct species *species)
{
    for (int i = 0; i < store->count; i++)
        if (store->items[i].model == model &&
            same_species(&store->items[i].species, species))
            return &store->items[i];
    return NULL;
}

static bool by_subshell(const struct model *model, int offer)
{
    return quantity_at(model->offers[offer].quantity)->per_subshell;
}

static size_t reading_count(const struct model *model, int subshells)
{
    size_t count = (size_t)model->offer_count;
    for (int o = 0; o < model->offer_count; o++)
        if (by_subshell(model, o))
            count += (size_t)subshells;
    return count;
}

static struct solution *room(struct solution_store *store)
{
    if (!store->items)
        store->items = calloc(SOLUTION_MAX, sizeof *store->items);
    if (!store->items)
        return NULL;
    if (store->count < SOLUTION_MAX)
        return &store->items[store->count++];
    struct solution *old = &store->items[store->oldest];
    store->oldest = (store->oldest + 1) % SOLUTION_MAX;
    free(old->readings);
    *old = (struct solution){0};
    return old;
}

bool solution_keep(struct solution_store *store, const struct model *model,
                   const void *work, const struct species *species,
                   struct status *st)
{
    const struct configuration *c = &species->configuration;
    struct reading *readings =
        calloc(reading_count(model, c->count), sizeof *readings);
    struct solution *s = readings ? room(store) : NULL;
    if (!s) {
        free(readings);
        return status_fail(st, STATUS_MEMORY, "out of memory");
    }
    size_t next = (size_t)model->offer_count;
    for (int o = 0; o < model->offer_count; o++) {
        readings[o] = model->read(work, o, 0, 0);
        for (int i = 0; by_subshell(model, o) && i < c->count; i++)
            readings[next++] =
                model->read(work, o, c->shells[i].n, c->shells[i].l);
    }
    *s = (struct solution){model, *species, readings};
    return true;
}

struct reading solution_read(const struct solution *solution, int offer, int n,
                             int l)
{
    const struct model *model = solution->model;
    const struct configuration *c = &solution->species.configuration;
    if (n == 0 || !by_subshell(model, offer))
        return solution->readings[offer];
    size_t start = (size_t)model->offer_count;
    for (int o = 0; o < offer; o++)
        if (by_subshell(model, o))
            start += (size_t)c->count;
    for (int i = 0; i < c->count; i++)
        if (c->shells[i].n == n && c->shells[i].l == l)
            return solution->readings[start + (size_t)i];
    return reading_gap(model->offers[offer].quantity, READING_OUTSIDE,
                       "the subshell holds no electron in this configuration",
                       &model->offers[offer].provenance);
}

void solution_clear(struct solution_store *store)
{
    for (int i = 0; i < store->count; i++)
        free(store->items[i].readings);
    free(store->items);
    *store = (struct solution_store){0};
}
