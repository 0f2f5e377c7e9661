/* SPDX-License-Identifier: MIT */
#include "refdata/dataset.h"

#include <assert.h>
#include <stdio.h>
#include <string.h>

#include "base/text.h"

#define ID3(name, id, words) id,
#define WORDS3(name, id, words) words,
#define ID2(name, id) id,

const char *dataset_kind_id(enum dataset_kind kind)
{
    static const char *const ids[] = {DATASET_KIND_LIST(ID2)};
    return ids[kind];
}

const char *gap_id(enum gap gap)
{
    static const char *const ids[] = {GAP_LIST(ID3)};
    return ids[gap];
}

const char *gap_word(enum gap gap)
{
    static const char *const words[] = {GAP_LIST(WORDS3)};
    return words[gap];
}

const char *dataset_configuration_status_id(enum configuration_status status)
{
    static const char *const ids[] = {CONFIGURATION_STATUS_LIST(ID3)};
    return ids[status];
}

const char *radioactive_id(enum radioactive radioactive)
{
    static const char *const ids[] = {RADIOACTIVE_LIST(ID3)};
    return ids[radioactive];
}

const char *radioactive_word(enum radioactive radioactive)
{
    static const char *const words[] = {RADIOACTIVE_LIST(WORDS3)};
    return words[radioactive];
}

const char *dataset_text(const struct dataset *set, text_offset offset)
{
    assert(offset < set->strings_size);
    return set->strings + offset;
}

int dataset_value_count(const struct dataset *set)
{
    int count = set->count;
    for (int i = 0; set->values && i < set->count; i++)
        count -= set->values[i].gap != GAP_NONE;
    return count;
}

const struct entry *dataset_lookup_site(const struct dataset *set, int z,
                                        int charge,
                                        enum coordination coordination,
                                        enum spin_state spin)
{
    assert(set->kind == DATASET_VALUES && z >= 1 && z <= Z_MAX);
    for (int i = set->first[z]; i < set->first[z + 1]; i++) {
        const struct entry *e = &set->values[i];
        if (e->charge == charge && e->n == 0 &&
            e->coordination == coordination &&
            (spin == SPIN_NONE ? e->preferred : e->spin == spin))
            return e;
    }
    return NULL;
}

const struct entry *dataset_lookup(const struct dataset *set, int z, int charge,
                                   int n, int l)
{
    assert(set->kind == DATASET_VALUES && z >= 1 && z <= Z_MAX);
    /* Binary search over the element's entries: ionization energies have one
     * per charge, up to 110. */
    int low = set->first[z], high = set->first[z + 1];
    while (low < high) {
        int middle = low + (high - low) / 2;
        const struct entry *e = &set->values[middle];
        int order = e->charge != charge ? e->charge - charge
                    : e->n != n         ? e->n - n
                    : e->l != l
                        ? e->l - l
                        : (int)e->coordination - (int)set->default_coordination;
        if (order < 0)
            low = middle + 1;
        else
            high = middle;
    }
    /* The first of a group is its preferred one. */
    if (low == set->first[z + 1])
        return NULL;
    const struct entry *e = &set->values[low];
    bool same = e->charge == charge && e->n == n && e->l == l &&
                e->coordination == set->default_coordination;
    return same ? e : NULL;
}

/* A number in another unit. A change by a power of ten moves the point and
 * keeps the digits as printed. */
static struct number in_base(struct number n, double per_base)
{
    double factor = 1.0 / per_base;
    int shift = 0;
    double power = 1.0;
    while (power < factor * 0.999 && shift < 6) {
        power *= 10.0;
        shift++;
    }
    bool exact = power > factor * (1 - 1e-12) && power < factor * (1 + 1e-12);
    if (!exact)
        return number_scale(n, factor);
    int places = n.decimals > shift ? n.decimals - shift : 0;
    return number_round(n.value * power, 1, places);
}

/* The one work that an entry rests on, NULL for all of the set. That there is
 * no entry rests, in a set whose entries name their works, on the first. */
static const struct citation *cited_of(const struct dataset *set,
                                       const struct entry *entry)
{
    int source = entry            ? entry->source
                 : set->count > 0 ? set->values[0].source != 0
                                  : 0;
    return source ? &set->provenance.citations[source - 1] : NULL;
}

struct reading dataset_entry_reading(const struct dataset *set,
                                     const struct entry *entry)
{
    if (!entry || entry->gap != GAP_NONE) {
        struct reading gap =
            reading_gap(set->quantity, READING_MISSING,
                        entry ? dataset_text(set, entry->note) : set->absent,
                        &set->provenance);
        gap.cited = cited_of(set, entry);
        return gap;
    }
    struct reading r = {
        .state = READING_OK,
        .quantity = set->quantity,
        .n = entry->n,
        .l = entry->l,
        .site = {(enum coordination)entry->coordination,
                 (enum spin_state)entry->spin},
        .value = entry->value,
        .u = entry->u,
        .has_u = entry->has_u,
        .provenance = &set->provenance,
        .cited = cited_of(set, entry),
        .reason = "",
        .remark = dataset_text(set, entry->remark),
        .evidence = (enum evidence)entry->evidence,
    };
    if (set->unit->per_base != 1.0) {
        r.value = in_base(r.value, set->unit->per_base);
        if (r.has_u)
            r.u = in_base(r.u, set->unit->per_base);
    }
    return r;
}

struct reading dataset_reading(const struct dataset *set, int z, int charge,
                               int n, int l)
{
    return dataset_entry_reading(set, dataset_lookup(set, z, charge, n, l));
}

const struct element_facts *dataset_element(const struct dataset *set, int z)
{
    assert(set->kind == DATASET_ELEMENTS && z >= 1 && z <= Z_MAX);
    int i = set->first[z];
    return i < set->first[z + 1] ? &set->elements[i] : NULL;
}

const struct availability *dataset_availability(const struct dataset *set,
                                                int z)
{
    assert(set->kind == DATASET_AVAILABILITY && z >= 1 && z <= Z_MAX);
    int i = set->first[z];
    return i < set->first[z + 1] ? &set->availability[i] : NULL;
}

const struct configuration_entry *
dataset_configuration(const struct dataset *set, int z, int charge)
{
    assert(set->kind == DATASET_CONFIGURATIONS && z >= 1 && z <= Z_MAX);
    for (int i = set->first[z]; i < set->first[z + 1]; i++)
        if (set->configurations[i].charge == charge)
            return &set->configurations[i];
    return NULL;
}
