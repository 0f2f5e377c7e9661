/* SPDX-License-Identifier: MIT */
#include <assert.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "element/subshell.h"
#include "refdata/load.h"

#define ID3(name, id, words) id,

static const struct field value_fields[] = {
    {"element", FIELD_TEXT, true},       {"charge", FIELD_INTEGER, false},
    {"subshell", FIELD_TEXT, false},     {"coordination", FIELD_TEXT, false},
    {"spin", FIELD_TEXT, false},         {"variant", FIELD_TEXT, false},
    {"preferred", FIELD_BOOLEAN, false}, {"value", FIELD_DECIMAL, false},
    {"u", FIELD_DECIMAL, false},         {"evidence", FIELD_TEXT, false},
    {"gap", FIELD_TEXT, false},          {"source", FIELD_TEXT, false},
    {"marks", FIELD_TEXTS, false},       {"note", FIELD_TEXT, false},
};
#define VALUE_FIELD_COUNT (sizeof value_fields / sizeof value_fields[0])

/* The most negative ion that anybody tabulates. */
#define CHARGE_MIN (-4)

/* An entry and its place in the file, for messages after sorting. */
struct placed {
    struct entry e;
    int place;
};

static bool load_charge(struct load *ld, const cJSON *object, struct entry *e)
{
    enum quantity_id quantity = ld->out->set.quantity;
    int charge = object_integer(object, "charge", 0);
    int lowest = quantity == QUANTITY_IONIZATION ? 0 : CHARGE_MIN;
    int highest = quantity == QUANTITY_IONIZATION || quantity == QUANTITY_ZEFF
                      ? e->z - 1
                      : e->z;
    if (charge < lowest || charge > highest)
        return status_fail(ld->st, STATUS_DATA, "charge %d: expected %d to %d",
                           charge, lowest, highest);
    e->charge = (int8_t)charge;
    return true;
}

static bool load_subshell(struct load *ld, const cJSON *object, struct entry *e)
{
    const struct quantity *quantity = quantity_at(ld->out->set.quantity);
    const char *label = object_text(object, "subshell");
    if (!label)
        return ld->out->set.quantity != QUANTITY_ZEFF ||
               status_fail(ld->st, STATUS_DATA,
                           "key 'subshell' is missing; a value of zeff needs "
                           "one such as 3d");
    int n, l;
    if (!quantity->per_subshell)
        return status_fail(ld->st, STATUS_DATA,
                           "key 'subshell': %s does not depend on a subshell",
                           quantity->id);
    if (!subshell_parse(label, &n, &l))
        return status_fail(ld->st, STATUS_DATA,
                           "subshell '%s': expected one such as 3d",
                           quoted(label).text);
    e->n = (int8_t)n;
    e->l = (int8_t)l;
    return true;
}

/* Coordination and spin, which only radii have. */
static bool load_site(struct load *ld, const cJSON *object, struct entry *e)
{
    static const char *const coordinations[] = {COORDINATION_LIST(ID3)};
    static const char *const spins[] = {SPIN_LIST(ID3)};
    const struct dataset *set = &ld->out->set;
    int coordination, spin;
    if (!load_word(ld, object, "coordination", coordinations,
                   COORDINATION_COUNT, &coordination) ||
        !load_word(ld, object, "spin", spins, SPIN_COUNT, &spin))
        return false;
    if (spin != SPIN_NONE && set->quantity != QUANTITY_RADIUS)
        return status_fail(ld->st, STATUS_DATA,
                           "key 'spin': only a radius depends on a spin state");
    bool site = coordination != COORDINATION_NONE;
    bool wanted = set->default_coordination != COORDINATION_NONE;
    if (site && !wanted)
        return status_fail(ld->st, STATUS_DATA,
                           "key 'coordination': the set must name its "
                           "default_coordination");
    if (!site && wanted)
        return status_fail(ld->st, STATUS_DATA,
                           "key 'coordination' is missing; the set has a "
                           "default_coordination");
    e->coordination = (uint8_t)coordination;
    e->spin = (uint8_t)spin;
    return true;
}

static bool check_range(struct load *ld, const cJSON *object,
                        const struct entry *e)
{
    const struct dataset *set = &ld->out->set;
    const struct quantity *quantity = quantity_at(set->quantity);
    double lowest = quantity->lowest, highest = quantity->highest;
    if (!(ld->definition->traits & DEFINITION_SIGNED) && lowest < 0.0)
        lowest = 0.0;
    double scale = set->unit->per_base;
    lowest *= scale;
    highest *= scale;
    bool above_zero = !(ld->definition->traits & DEFINITION_SIGNED);
    if (e->value.value < lowest || e->value.value > highest ||
        (above_zero && e->value.value == 0.0))
        return status_fail(
            ld->st, STATUS_DATA, "value %s: expected %s %s %g %s %g %s",
            object_text(object, "value"), ld->definition->text,
            above_zero ? "above" : "from", lowest,
            above_zero ? "and up to" : "to", highest, set->unit->id);
    if (e->has_u && (e->u.value <= 0.0 || e->u.value > highest - lowest))
        return status_fail(ld->st, STATUS_DATA,
                           "u %s: expected a standard uncertainty above 0 "
                           "and within the range of the quantity; leave it "
                           "out when it is not known",
                           object_text(object, "u"));
    return true;
}

/* The value with its uncertainty, or the gap with its reason. */
static bool load_value(struct load *ld, const cJSON *object, struct entry *e)
{
    static const char *const gaps[] = {GAP_LIST(ID3)};
    int gap;
    if (!load_word(ld, object, "gap", gaps, GAP_COUNT, &gap))
        return false;
    e->gap = (uint8_t)gap;
    bool has_value = object_decimal(object, "value", &e->value);
    e->has_u = object_decimal(object, "u", &e->u);
    if (has_value == (gap != GAP_NONE))
        return status_fail(ld->st, STATUS_DATA,
                           has_value ? "value and gap exclude each other"
                                     : "expected a value, or a gap with its "
                                       "reason in note");
    if (has_value)
        return check_range(ld, object, e);
    if (e->has_u)
        return status_fail(ld->st, STATUS_DATA, "u: a gap has no uncertainty");
    if (!object_member(object, "note"))
        return status_fail(ld->st, STATUS_DATA,
                           "key 'note' is missing; a gap needs its reason");
    return true;
}

static bool load_entry_marks(struct load *ld, const cJSON *object,
                             struct entry *e)
{
    const struct dataset *set = &ld->out->set;
    const cJSON *item;
    cJSON_ArrayForEach(item, object_member(object, "marks"))
    {
        int i = 0;
        while (i < set->mark_count &&
               strcmp(set->marks[i].id, item->valuestring) != 0)
            i++;
        if (i == set->mark_count)
            return status_fail(ld->st, STATUS_DATA,
                               "mark '%s': not explained in the set's marks",
                               quoted(item->valuestring).text);
        if (e->marks >> i & 1)
            return status_fail(ld->st, STATUS_DATA,
                               "mark '%s' stands there twice",
                               set->marks[i].id);
        e->marks = (uint16_t)(e->marks | 1u << i);
    }
    return true;
}

static bool load_source(struct load *ld, const cJSON *object, struct entry *e)
{
    const struct provenance *p = &ld->out->set.provenance;
    const char *key = object_text(object, "source");
    int i = 0;
    if (!key)
        return true;
    while (i < p->citation_count && strcmp(p->citations[i].key, key) != 0)
        i++;
    if (i == p->citation_count)
        return status_fail(ld->st, STATUS_DATA,
                           "source '%s': expected the key of a citation",
                           quoted(key).text);
    e->source = (uint8_t)(i + 1);
    return true;
}

static void add_part(struct text *t, const char *before, const char *part)
{
    if (!part[0])
        return;
    text_add(t, t->length ? "; " : "");
    text_add(t, before);
    text_add(t, part);
}

/* One line of what to know beside the number. */
static bool compose_remark(struct load *ld, const cJSON *object,
                           struct entry *e)
{
    const struct dataset *set = &ld->out->set;
    const char *variant = object_text(object, "variant");
    const char *note = object_text(object, "note");
    struct text t = text_growing();
    add_part(&t, "", variant ? variant : "");
    add_part(&t, "coordination ",
             coordination_id((enum coordination)e->coordination));
    add_part(&t, "", spin_word((enum spin_state)e->spin));
    const char *kind = e->evidence != set->evidence
                           ? evidence_word((enum evidence)e->evidence)
                           : "";
    add_part(&t, "", kind);
    for (int i = 0; i < set->mark_count; i++)
        if (e->marks >> i & 1 && strcmp(set->marks[i].meaning, kind) != 0)
            add_part(&t, "", set->marks[i].meaning);
    add_part(&t, "", note ? note : "");
    bool ok = !t.cut || status_fail(ld->st, STATUS_MEMORY, "out of memory");
    ok = ok && load_text(ld, object, "variant", &e->variant) &&
         load_text(ld, object, "note", &e->note) &&
         pool_add(&ld->pool, t.data, &e->remark, ld->st);
    text_free(&t);
    return ok;
}

static bool load_value_entry(struct load *ld, const cJSON *object,
                             struct entry *e)
{
    static const char *const evidence[] = {EVIDENCE_LIST(ID3)};
    int word;
    if (!object_check(object, value_fields, VALUE_FIELD_COUNT, ld->st))
        return false;
    e->z = (int16_t)load_element(ld, object);
    if (e->z == 0 || !load_charge(ld, object, e) ||
        !load_subshell(ld, object, e) || !load_site(ld, object, e) ||
        !load_value(ld, object, e) || !load_entry_marks(ld, object, e) ||
        !load_source(ld, object, e) ||
        !load_word(ld, object, "evidence", evidence, EVIDENCE_COUNT, &word))
        return false;
    e->evidence =
        (uint8_t)(object_member(object, "evidence") ? (enum evidence)word
                                                    : ld->out->set.evidence);
    e->preferred = object_boolean(object, "preferred");
    return compose_remark(ld, object, e);
}

/* Order of the species and site: entries that are equal here are variants of
 * one value. */
static int compare_group(const struct entry *a, const struct entry *b)
{
    if (a->z != b->z)
        return a->z - b->z;
    if (a->charge != b->charge)
        return a->charge - b->charge;
    if (a->n != b->n)
        return a->n - b->n;
    if (a->l != b->l)
        return a->l - b->l;
    return a->coordination - b->coordination;
}

/* Preferred first, then as they stood in the file. */
static int compare_placed(const void *x, const void *y)
{
    const struct placed *a = x;
    const struct placed *b = y;
    int order = compare_group(&a->e, &b->e);
    if (order != 0)
        return order;
    if (a->e.preferred != b->e.preferred)
        return a->e.preferred ? -1 : 1;
    return a->place - b->place;
}

/* The variants in group[count]: none twice, one of them preferred. */
static bool check_group(struct load *ld, struct placed *group, int count)
{
    const char *symbol = element_at(group[0].e.z)->symbol;
    for (int i = 1; i < count; i++) {
        for (int j = 0; j < i; j++)
            if (group[i].e.spin == group[j].e.spin &&
                group[i].e.variant == group[j].e.variant)
                return status_fail(
                    ld->st, STATUS_DATA,
                    "entry %d (%s): repeats entry %d; expected a different "
                    "charge, subshell, coordination, spin or variant",
                    group[i].place > group[j].place ? group[i].place
                                                    : group[j].place,
                    symbol,
                    group[i].place > group[j].place ? group[j].place
                                                    : group[i].place);
        if (group[i].e.preferred)
            return status_fail(ld->st, STATUS_DATA,
                               "entry %d (%s): entry %d is preferred already",
                               group[i].place, symbol, group[0].place);
    }
    if (count > 1 && !group[0].e.preferred)
        return status_fail(ld->st, STATUS_DATA,
                           "entry %d (%s): one of several variants; one of "
                           "them must be preferred",
                           group[0].place, symbol);
    group[0].e.preferred = true;
    return true;
}

static bool check_groups(struct load *ld, struct placed *all, int count)
{
    for (int i = 0, next; i < count; i = next) {
        next = i + 1;
        while (next < count && compare_group(&all[i].e, &all[next].e) == 0)
            next++;
        if (!check_group(ld, all + i, next - i))
            return false;
    }
    return true;
}

static int entry_z(const void *row)
{
    return ((const struct entry *)row)->z;
}

/* The entries into all[count], sorted and checked against one another. */
static bool place_values(struct load *ld, const cJSON *entries,
                         struct placed *all, int count)
{
    int place = 0;
    const cJSON *object;
    cJSON_ArrayForEach(object, entries)
    {
        struct placed *p = &all[place];
        p->place = ++place;
        if (!load_value_entry(ld, object, &p->e))
            return load_entry_context(ld, object, place);
    }
    qsort(all, (size_t)count, sizeof *all, compare_placed);
    return check_groups(ld, all, count);
}

bool load_values(struct load *ld, const cJSON *entries)
{
    int count = cJSON_GetArraySize(entries);
    struct entry *values =
        arena_array(&ld->out->arena, (size_t)count, sizeof *values, ld->st);
    if (!values)
        return false;
    struct placed *all = calloc((size_t)count, sizeof *all);
    if (!all)
        return status_fail(ld->st, STATUS_MEMORY, "out of memory");
    bool ok = place_values(ld, entries, all, count);
    /* Where some entries name their source, the others rest on the first. */
    bool named = false;
    for (int i = 0; ok && i < count; i++)
        named = named || all[i].e.source != 0;
    for (int i = 0; ok && i < count; i++) {
        values[i] = all[i].e;
        if (named && values[i].source == 0)
            values[i].source = 1;
    }
    free(all);
    ld->out->set.values = values;
    if (ok)
        load_index(&ld->out->set, count, entry_z, values, sizeof *values);
    return ok;
}
