/* SPDX-License-Identifier: MIT */
#include "study/solution.h"

#include <stdint.h>
#include <stdlib.h>
#include <string.h>

struct solution_remark {
    struct solution_remark *next;
    char text[];
};

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

static bool lives_in(const char *text, const void *work, size_t size)
{
    uintptr_t at = (uintptr_t)text, start = (uintptr_t)work;
    return at >= start && at - start < size;
}

/* Moves a remark out of the work space. Of one text there is one copy. */
static bool keep_remark(struct solution_store *store, struct reading *reading,
                        const struct model *model, const void *work)
{
    const char *text = reading->remark;
    if (!lives_in(text, work, model->work_size))
        return true;
    if (!text[0]) {
        reading->remark = "";
        return true;
    }
    struct solution_remark *r = store->remarks;
    while (r && strcmp(r->text, text) != 0)
        r = r->next;
    if (!r) {
        size_t size = strlen(text) + 1;
        r = malloc(sizeof *r + size);
        if (!r)
            return false;
        memcpy(r->text, text, size);
        r->next = store->remarks;
        store->remarks = r;
    }
    reading->remark = r->text;
    return true;
}

bool solution_keep(struct solution_store *store, const struct model *model,
                   const void *work, const struct species *species,
                   struct status *st)
{
    const struct configuration *c = &species->configuration;
    struct reading *readings =
        calloc(reading_count(model, c->count), sizeof *readings);
    bool whole = readings != NULL;
    size_t next = (size_t)model->offer_count;
    for (int o = 0; whole && o < model->offer_count; o++) {
        readings[o] = model->read(work, o, 0, 0);
        whole = keep_remark(store, &readings[o], model, work);
        for (int i = 0; whole && by_subshell(model, o) && i < c->count; i++) {
            readings[next] =
                model->read(work, o, c->shells[i].n, c->shells[i].l);
            whole = keep_remark(store, &readings[next++], model, work);
        }
    }
    struct solution *s = whole ? room(store) : NULL;
    if (!s) {
        free(readings);
        return status_fail(st, STATUS_MEMORY, "out of memory");
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
    store->items = NULL;
    store->count = store->oldest = 0;
}

void solution_free(struct solution_store *store)
{
    solution_clear(store);
    while (store->remarks) {
        struct solution_remark *next = store->remarks->next;
        free(store->remarks);
        store->remarks = next;
    }
}
