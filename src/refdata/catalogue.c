/* SPDX-License-Identifier: MIT */
#include "refdata/catalogue.h"

#include <assert.h>
#include <limits.h>
#include <string.h>

#include "refdata/builtin.h"
#include "refdata/loader.h"

const struct catalogue *catalogue_builtin(void)
{
    static const struct catalogue builtin = {0};
    return &builtin;
}

size_t catalogue_count(const struct catalogue *catalogue)
{
    return refdata_builtin_count + (size_t)catalogue->added_count;
}

const struct dataset *catalogue_at(const struct catalogue *catalogue, size_t i)
{
    assert(i < catalogue_count(catalogue));
    if (i < refdata_builtin_count)
        return refdata_builtin[i];
    return &catalogue->added[i - refdata_builtin_count]->set;
}

bool catalogue_is_added(const struct catalogue *catalogue, size_t i)
{
    assert(i < catalogue_count(catalogue));
    return i >= refdata_builtin_count;
}

const struct dataset *catalogue_find(const struct catalogue *catalogue,
                                     const char *id)
{
    for (size_t i = 0; i < catalogue_count(catalogue); i++) {
        const struct dataset *set = catalogue_at(catalogue, i);
        if (strcmp(set->provenance.id, id) == 0)
            return set;
    }
    return NULL;
}

/* Added sets come after the built-in ones, whatever rank they claim. */
static int rank_of(const struct catalogue *catalogue, size_t i)
{
    const struct dataset *set = catalogue_at(catalogue, i);
    return !catalogue_is_added(catalogue, i) && set->rank > 0 ? set->rank
                                                              : INT_MAX;
}

size_t catalogue_references(const struct catalogue *catalogue,
                            enum quantity_id quantity,
                            const struct dataset **sets, size_t max)
{
    size_t found = 0;
    size_t count = catalogue_count(catalogue);
    /* Selection by rising (rank, place): there are a few dozen sets. */
    size_t last = SIZE_MAX;
    for (;;) {
        size_t best = SIZE_MAX;
        for (size_t i = 0; i < count; i++) {
            const struct dataset *set = catalogue_at(catalogue, i);
            if (set->kind != DATASET_VALUES || set->quantity != quantity)
                continue;
            int rank = rank_of(catalogue, i);
            bool after = last == SIZE_MAX || rank > rank_of(catalogue, last) ||
                         (rank == rank_of(catalogue, last) && i > last);
            if (after && (best == SIZE_MAX || rank < rank_of(catalogue, best)))
                best = i;
        }
        if (best == SIZE_MAX)
            return found;
        if (found < max)
            sets[found] = catalogue_at(catalogue, best);
        found++;
        last = best;
    }
}

const struct dataset *catalogue_default(const struct catalogue *catalogue,
                                        enum quantity_id quantity)
{
    const struct dataset *first = NULL;
    (void)catalogue_references(catalogue, quantity, &first, 1);
    return first;
}

/* Why a set that is in order by itself cannot join; "" when it can. */
static bool check_joins(const struct catalogue *catalogue,
                        const struct dataset *set, struct status *st)
{
    const char *id = set->provenance.id;
    if (set->kind != DATASET_VALUES)
        return status_fail(st, STATUS_DATA,
                           "set %s: kind %s cannot be added; expected values",
                           id, dataset_kind_id(set->kind));
    if (catalogue_find(catalogue, id) ||
        strcmp(id, CATALOGUE_ZEFF_FROM_IONIZATION) == 0)
        return status_fail(st, STATUS_DATA,
                           "set %s: there is a set with this id already", id);
    return true;
}

bool catalogue_add_file(struct catalogue *catalogue, const char *path,
                        struct status *st)
{
    struct loaded *loaded;
    if (catalogue->added_count == CATALOGUE_ADDED_MAX)
        return status_fail(st, STATUS_DATA, "%s: more than %d added data sets",
                           path, CATALOGUE_ADDED_MAX);
    if (!dataset_load_file(path, &loaded, st))
        return false;
    if (!check_joins(catalogue, &loaded->set, st)) {
        loaded_free(loaded);
        return status_context(st, "%s", path);
    }
    catalogue->added[catalogue->added_count++] = loaded;
    return true;
}

void catalogue_clear(struct catalogue *catalogue)
{
    while (catalogue->added_count > 0)
        loaded_free(catalogue->added[--catalogue->added_count]);
}

/* The one built-in set of a kind. */
static const struct dataset *only(enum dataset_kind kind)
{
    size_t i = 0;
    while (refdata_builtin[i]->kind != kind)
        i++;
    return refdata_builtin[i];
}

const struct dataset *catalogue_elements(void)
{
    return only(DATASET_ELEMENTS);
}

const struct dataset *catalogue_availability(void)
{
    return only(DATASET_AVAILABILITY);
}

const struct dataset *catalogue_oxidation_states(void)
{
    return only(DATASET_OXIDATION_STATES);
}
