/* SPDX-License-Identifier: MIT */
/* The kinds of data set that are not plain values. */
#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "element/configuration.h"
#include "element/species.h"
#include "refdata/load.h"

#define ID3(name, id, words) id,
#define FIELD_COUNT(fields) (sizeof(fields) / sizeof(fields)[0])

static const char *const status_words[] = {CONFIGURATION_STATUS_LIST(ID3)};

/* Oxidation states that occur: -5 in borides and such, 9 in IrO4+. */
#define OXIDATION_MIN (-5)
#define OXIDATION_MAX 9
#define MASS_NUMBER_MAX 350
/* Nothing weighs more than the earth's crust holds of it: mg per kg. */
#define ABUNDANCE_MAX 1e6
#define WEIGHT_MAX 400.0

/* The text of a configuration and its term, checked: it holds z - charge
 * electrons. */
static bool load_configuration(struct load *ld, const cJSON *object, int z,
                               int charge, text_offset *configuration,
                               text_offset *shells, text_offset *term)
{
    const char *text = object_text(object, "configuration");
    const char *term_text = object_text(object, "term");
    struct configuration c;
    /* The parser of configurations cuts words by bytes. */
    for (const char *p = text; *p; p++)
        if ((unsigned char)*p >= 0x80)
            return status_fail(ld->st, STATUS_DATA,
                               "configuration '%s': expected one such as "
                               "'[Ar] 3d6 4s2'",
                               quoted(text).text);
    if (!configuration_parse(text, &c, ld->st)) {
        ld->st->code = STATUS_DATA;
        return false;
    }
    double electrons = configuration_electrons(&c);
    if (fabs(electrons - (z - charge)) > 1e-9)
        return status_fail(ld->st, STATUS_DATA,
                           "configuration '%s' holds %g electrons; expected "
                           "%d for charge %d",
                           quoted(text).text, electrons, z - charge, charge);
    if (term_text && strlen(term_text) >= TERM_TEXT_MAX)
        return status_fail(ld->st, STATUS_DATA,
                           "term '%s': longer than %d bytes",
                           quoted(term_text).text, TERM_TEXT_MAX - 1);
    char packed[CONFIGURATION_PACKED_MAX];
    for (int i = 0; i < c.count; i++)
        if (c.shells[i].occ != floor(c.shells[i].occ))
            return status_fail(ld->st, STATUS_DATA,
                               "configuration '%s': expected whole electrons",
                               quoted(text).text);
    return load_text(ld, object, "configuration", configuration) &&
           pool_add(&ld->pool, configuration_pack(&c, packed), shells,
                    ld->st) &&
           load_text(ld, object, "term", term);
}

/* How rows of one kind are read and ordered. compare gives 0 for rows that
 * would stand for the same thing. */
struct row_kind {
    size_t size;
    bool (*read)(struct load *ld, const cJSON *object, void *row);
    int (*compare)(const void *a, const void *b);
    int (*z_of)(const void *row);
    int (*charge_of)(const void *row); /* NULL: there is one per element */
};

/* Says which entries stand for the same species. */
static void fail_twice(struct load *ld, const cJSON *entries, int z, int charge)
{
    int first = 0;
    int place = 0;
    const cJSON *object;
    const char *symbol = element_at(z)->symbol;
    cJSON_ArrayForEach(object, entries)
    {
        place++;
        if (strcmp(object_text(object, "element"), symbol) != 0 ||
            object_integer(object, "charge", 0) != charge)
            continue;
        if (first != 0)
            (void)status_fail(ld->st, STATUS_DATA,
                              "entry %d (%s): repeats entry %d", place, symbol,
                              first);
        else
            first = place;
    }
}

/* One row per entry, sorted; NULL with a failed status. */
static void *load_rows(struct load *ld, const cJSON *entries,
                       const struct row_kind *kind)
{
    int count = cJSON_GetArraySize(entries);
    char *rows =
        arena_array(&ld->out->arena, (size_t)count, kind->size, ld->st);
    if (!rows)
        return NULL;
    int place = 0;
    const cJSON *object;
    cJSON_ArrayForEach(object, entries)
    {
        void *row = rows + (size_t)place++ * kind->size;
        if (!kind->read(ld, object, row)) {
            (void)load_entry_context(ld, object, place);
            return NULL;
        }
    }
    qsort(rows, (size_t)count, kind->size, kind->compare);
    for (int i = 1; i < count; i++) {
        const char *row = rows + (size_t)i * kind->size;
        if (kind->compare(row - kind->size, row) == 0) {
            int charge = kind->charge_of ? kind->charge_of(row) : 0;
            fail_twice(ld, entries, kind->z_of(row), charge);
            return NULL;
        }
    }
    load_index(&ld->out->set, count, kind->z_of, rows, kind->size);
    return rows;
}

static bool too_large(struct load *ld, const char *key, double limit)
{
    return status_fail(ld->st, STATUS_DATA, "%s: expected above 0, up to %g",
                       key, limit);
}

/* --- elements --- */

static const struct field element_fields[] = {
    {"element", FIELD_TEXT, true},
    {"configuration", FIELD_TEXT, true},
    {"term", FIELD_TEXT, false},
    {"status", FIELD_TEXT, true},
    {"weight", FIELD_DECIMAL, false},
    {"longest_lived", FIELD_INTEGER, false},
    {"stable_isotope", FIELD_BOOLEAN, true},
    {"category", FIELD_TEXT, true},
    {"note", FIELD_TEXT, false},
};

static bool read_element(struct load *ld, const cJSON *object, void *row)
{
    struct element_facts *f = row;
    int status;
    if (!object_check(object, element_fields, FIELD_COUNT(element_fields),
                      ld->st))
        return false;
    f->z = (int16_t)load_element(ld, object);
    if (f->z == 0 ||
        !load_configuration(ld, object, f->z, 0, &f->configuration, &f->shells,
                            &f->term) ||
        !load_word(ld, object, "status", status_words,
                   CONFIGURATION_STATUS_COUNT, &status))
        return false;
    f->status = (uint8_t)status;
    f->has_weight = object_decimal(object, "weight", &f->weight);
    if (f->has_weight &&
        (f->weight.value <= 0.0 || f->weight.value > WEIGHT_MAX))
        return too_large(ld, "weight", WEIGHT_MAX);
    int mass = object_integer(object, "longest_lived", 0);
    if (object_member(object, "longest_lived") &&
        (mass < f->z || mass > MASS_NUMBER_MAX))
        return status_fail(ld->st, STATUS_DATA,
                           "longest_lived %d: expected a mass number from %d "
                           "to %d",
                           mass, f->z, MASS_NUMBER_MAX);
    f->longest_lived = (int16_t)mass;
    f->has_stable_isotope = object_boolean(object, "stable_isotope");
    return load_text(ld, object, "category", &f->category) &&
           load_text(ld, object, "note", &f->note);
}

static int element_z(const void *row)
{
    return ((const struct element_facts *)row)->z;
}

static int compare_elements(const void *a, const void *b)
{
    return element_z(a) - element_z(b);
}

bool load_elements(struct load *ld, const cJSON *entries)
{
    static const struct row_kind kind = {
        .size = sizeof(struct element_facts),
        .read = read_element,
        .compare = compare_elements,
        .z_of = element_z,
    };
    ld->out->set.elements = load_rows(ld, entries, &kind);
    return ld->out->set.elements != NULL;
}

/* --- configurations of ions --- */

static const struct field configuration_fields[] = {
    {"element", FIELD_TEXT, true},       {"charge", FIELD_INTEGER, true},
    {"configuration", FIELD_TEXT, true}, {"term", FIELD_TEXT, false},
    {"status", FIELD_TEXT, true},        {"irregular", FIELD_BOOLEAN, false},
    {"note", FIELD_TEXT, false},
};

static bool read_configuration(struct load *ld, const cJSON *object, void *row)
{
    struct configuration_entry *c = row;
    int status;
    if (!object_check(object, configuration_fields,
                      FIELD_COUNT(configuration_fields), ld->st))
        return false;
    c->z = (int16_t)load_element(ld, object);
    if (c->z == 0)
        return false;
    int charge = object_integer(object, "charge", 0);
    if (charge == 0 || charge < -4 || charge >= c->z)
        return status_fail(ld->st, STATUS_DATA,
                           "charge %d: expected -4 to %d, not 0", charge,
                           c->z - 1);
    c->charge = (int8_t)charge;
    if (!load_configuration(ld, object, c->z, charge, &c->configuration,
                            &c->shells, &c->term) ||
        !load_word(ld, object, "status", status_words,
                   CONFIGURATION_STATUS_COUNT, &status))
        return false;
    c->status = (uint8_t)status;
    c->irregular = object_boolean(object, "irregular");
    return load_text(ld, object, "note", &c->note);
}

static int configuration_z(const void *row)
{
    return ((const struct configuration_entry *)row)->z;
}

static int configuration_charge(const void *row)
{
    return ((const struct configuration_entry *)row)->charge;
}

static int compare_configurations(const void *a, const void *b)
{
    const struct configuration_entry *x = a;
    const struct configuration_entry *y = b;
    return x->z != y->z ? x->z - y->z : x->charge - y->charge;
}

bool load_configurations(struct load *ld, const cJSON *entries)
{
    static const struct row_kind kind = {
        .size = sizeof(struct configuration_entry),
        .read = read_configuration,
        .compare = compare_configurations,
        .z_of = configuration_z,
        .charge_of = configuration_charge,
    };
    ld->out->set.configurations = load_rows(ld, entries, &kind);
    return ld->out->set.configurations != NULL;
}

/* --- oxidation states --- */

static const struct field oxidation_fields[] = {
    {"element", FIELD_TEXT, true},
    {"main", FIELD_INTEGERS, false},
    {"other", FIELD_INTEGERS, false},
};

static int oxidation_z(const void *row)
{
    return ((const struct oxidation_state *)row)->z;
}

static int compare_oxidation(const void *a, const void *b)
{
    const struct oxidation_state *x = a;
    const struct oxidation_state *y = b;
    return x->z != y->z ? x->z - y->z : x->state - y->state;
}

/* Appends the states under one key to rows. */
static bool read_states(struct load *ld, const cJSON *object, const char *key,
                        int z, struct oxidation_state *rows, int *count)
{
    const cJSON *item;
    cJSON_ArrayForEach(item, object_member(object, key))
    {
        int state = (int)item->valuedouble;
        if (state < OXIDATION_MIN || state > OXIDATION_MAX || state == 0 ||
            state > z)
            return status_fail(ld->st, STATUS_DATA,
                               "%s: state %d: expected %d to %d, not 0 and "
                               "not above Z",
                               key, state, OXIDATION_MIN, OXIDATION_MAX);
        rows[(*count)++] = (struct oxidation_state){(int16_t)z, (int8_t)state,
                                                    strcmp(key, "main") == 0};
    }
    return true;
}

static int count_states(const cJSON *entries)
{
    int count = 0;
    const cJSON *object;
    cJSON_ArrayForEach(object, entries)
    {
        count += cJSON_GetArraySize(object_member(object, "main"));
        count += cJSON_GetArraySize(object_member(object, "other"));
    }
    return count;
}

static bool read_oxidation(struct load *ld, const cJSON *object,
                           struct oxidation_state *rows, int *count)
{
    if (!object_check(object, oxidation_fields, FIELD_COUNT(oxidation_fields),
                      ld->st))
        return false;
    int z = load_element(ld, object);
    int before = *count;
    if (z == 0 || !read_states(ld, object, "main", z, rows, count) ||
        !read_states(ld, object, "other", z, rows, count))
        return false;
    return *count > before || status_fail(ld->st, STATUS_DATA,
                                          "expected states under main or "
                                          "other");
}

bool load_oxidation_states(struct load *ld, const cJSON *entries)
{
    int place = 0;
    int count = 0;
    int total = count_states(entries);
    if (total > DATASET_ENTRIES_MAX)
        return status_fail(ld->st, STATUS_DATA, "entries: more than %d states",
                           DATASET_ENTRIES_MAX);
    struct oxidation_state *rows =
        arena_array(&ld->out->arena, (size_t)total, sizeof *rows, ld->st);
    if (!rows)
        return false;
    const cJSON *object;
    cJSON_ArrayForEach(object, entries)
    {
        place++;
        if (!read_oxidation(ld, object, rows, &count))
            return load_entry_context(ld, object, place);
    }
    qsort(rows, (size_t)count, sizeof *rows, compare_oxidation);
    for (int i = 1; i < count; i++)
        if (compare_oxidation(&rows[i - 1], &rows[i]) == 0)
            return status_fail(ld->st, STATUS_DATA,
                               "element %s: state %d stands there twice",
                               element_at(rows[i].z)->symbol, rows[i].state);
    load_index(&ld->out->set, count, oxidation_z, rows, sizeof *rows);
    ld->out->set.oxidation_states = rows;
    return true;
}

/* --- availability --- */

static const struct field availability_fields[] = {
    {"element", FIELD_TEXT, true},
    {"radioactive", FIELD_TEXT, true},
    {"abundance", FIELD_DECIMAL, false},
    {"abundance_2014", FIELD_DECIMAL, false},
    {"hazards", FIELD_TEXTS, false},
    {"hazard_basis", FIELD_TEXTS, false},
    {"critical", FIELD_TEXTS, false},
};

static bool read_availability(struct load *ld, const cJSON *object, void *row)
{
    static const char *const words[] = {RADIOACTIVE_LIST(ID3)};
    struct availability *a = row;
    int radioactive;
    if (!object_check(object, availability_fields,
                      FIELD_COUNT(availability_fields), ld->st))
        return false;
    a->z = (int16_t)load_element(ld, object);
    if (a->z == 0 || !load_word(ld, object, "radioactive", words,
                                RADIOACTIVE_COUNT, &radioactive))
        return false;
    a->radioactive = (uint8_t)radioactive;
    a->has_abundance = object_decimal(object, "abundance", &a->abundance);
    a->has_abundance_2014 =
        object_decimal(object, "abundance_2014", &a->abundance_2014);
    if (a->has_abundance &&
        (a->abundance.value <= 0.0 || a->abundance.value > ABUNDANCE_MAX))
        return too_large(ld, "abundance", ABUNDANCE_MAX);
    if (a->has_abundance_2014 && (a->abundance_2014.value <= 0.0 ||
                                  a->abundance_2014.value > ABUNDANCE_MAX))
        return too_large(ld, "abundance_2014", ABUNDANCE_MAX);
    if (!object_member(object, "hazards") !=
        !object_member(object, "hazard_basis"))
        return status_fail(ld->st, STATUS_DATA,
                           "hazards and hazard_basis go together");
    return load_joined(ld, object, "hazards", &a->hazards) &&
           load_joined(ld, object, "hazard_basis", &a->hazard_basis) &&
           load_joined(ld, object, "critical", &a->critical);
}

static int availability_z(const void *row)
{
    return ((const struct availability *)row)->z;
}

static int compare_availability(const void *a, const void *b)
{
    return availability_z(a) - availability_z(b);
}

bool load_availability(struct load *ld, const cJSON *entries)
{
    static const struct row_kind kind = {
        .size = sizeof(struct availability),
        .read = read_availability,
        .compare = compare_availability,
        .z_of = availability_z,
    };
    ld->out->set.availability = load_rows(ld, entries, &kind);
    return ld->out->set.availability != NULL;
}
