/* SPDX-License-Identifier: MIT */
/* The head of a data set: who made it, what it holds. The entries are read by
 * one function per kind. */
#include "refdata/loader.h"

#include <assert.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "base/text.h"
#include "refdata/json.h"
#include "refdata/load.h"

#define ID2(name, id) id,
#define ID3(name, id, words) id,

static const struct field root_fields[] = {
    {"format", FIELD_INTEGER, true},
    {"id", FIELD_TEXT, true},
    {"kind", FIELD_TEXT, true},
    {"title", FIELD_TEXT, true},
    {"citations", FIELD_OBJECTS, true},
    {"licence", FIELD_TEXT, false},
    {"notes", FIELD_TEXTS, false},
    {"absent", FIELD_TEXT, false},
    {"entries", FIELD_OBJECTS, true},
    /* The rest belongs to values alone; see values_only. */
    {"quantity", FIELD_TEXT, false},
    {"definition", FIELD_TEXT, false},
    {"unit", FIELD_TEXT, false},
    {"evidence", FIELD_TEXT, false},
    {"rank", FIELD_INTEGER, false},
    {"default_coordination", FIELD_TEXT, false},
    {"marks", FIELD_OBJECTS, false},
};
#define ROOT_FIELD_COUNT (sizeof root_fields / sizeof root_fields[0])
#define VALUES_ONLY_FROM 9

static const struct field mark_fields[] = {
    {"id", FIELD_TEXT, true},
    {"meaning", FIELD_TEXT, true},
};

#define FIELD_COUNT(fields) (sizeof(fields) / sizeof(fields)[0])

#define NOTES_MAX 100

static bool load_notes(struct load *ld)
{
    const cJSON *list = object_member(ld->root, "notes");
    int count = list ? cJSON_GetArraySize(list) : 0;
    if (count > NOTES_MAX)
        return status_fail(ld->st, STATUS_DATA, "notes: more than %d",
                           NOTES_MAX);
    const char **notes =
        arena_array(&ld->out->arena, (size_t)count, sizeof *notes, ld->st);
    if (!notes)
        return false;
    int place = 0;
    const cJSON *item;
    cJSON_ArrayForEach(item, list)
    {
        notes[place] = load_copy(ld, item->valuestring);
        if (!notes[place++])
            return false;
    }
    ld->out->set.notes = notes;
    ld->out->set.note_count = count;
    return true;
}

static bool load_marks(struct load *ld)
{
    const cJSON *list = object_member(ld->root, "marks");
    int count = list ? cJSON_GetArraySize(list) : 0;
    if (count > MARK_MAX)
        return status_fail(ld->st, STATUS_DATA, "marks: more than %d",
                           MARK_MAX);
    struct mark *marks =
        arena_array(&ld->out->arena, (size_t)count, sizeof *marks, ld->st);
    if (!marks)
        return false;
    int place = 0;
    const cJSON *object;
    cJSON_ArrayForEach(object, list)
    {
        struct mark *m = &marks[place++];
        if (!object_check(object, mark_fields, FIELD_COUNT(mark_fields),
                          ld->st))
            return status_context(ld->st, "mark %d", place);
        for (int i = 0; i < place - 1; i++)
            if (strcmp(marks[i].id, object_text(object, "id")) == 0)
                return status_fail(ld->st, STATUS_DATA,
                                   "mark %d: id '%s' stands there twice", place,
                                   quoted(marks[i].id).text);
        if (!load_member(ld, object, "id", &m->id) ||
            !load_member(ld, object, "meaning", &m->meaning))
            return false;
    }
    ld->out->set.marks = marks;
    ld->out->set.mark_count = count;
    return true;
}

static bool need(struct load *ld, const char *key)
{
    return object_member(ld->root, key) ||
           status_fail(ld->st, STATUS_DATA,
                       "key '%s' is missing; a set of values needs it", key);
}

/* Quantity, definition and unit, which must belong together. */
static bool load_quantity(struct load *ld)
{
    struct dataset *set = &ld->out->set;
    if (!need(ld, "quantity") || !need(ld, "unit"))
        return false;
    const char *names[QUANTITY_COUNT];
    int quantity;
    for (int q = 0; q < QUANTITY_COUNT; q++)
        names[q] = quantity_at((enum quantity_id)q)->id;
    if (!load_word(ld, ld->root, "quantity", names, QUANTITY_COUNT, &quantity))
        return false;
    set->quantity = (enum quantity_id)quantity;

    const char *texts[16];
    int place;
    size_t count = definition_count(set->quantity);
    assert(count <= FIELD_COUNT(texts));
    for (size_t i = 0; i < count; i++)
        texts[i] = definition_at(set->quantity, i)->text;
    if (count > 1 && !need(ld, "definition"))
        return false;
    if (!load_word(ld, ld->root, "definition", texts, (int)count, &place))
        return false;
    ld->definition = definition_at(set->quantity, (size_t)place);
    set->provenance.definition = ld->definition;

    const char *ids[16];
    const struct unit *units[16];
    int unit_total = 0;
    assert(unit_count() <= FIELD_COUNT(ids));
    for (size_t i = 0; i < unit_count(); i++)
        if (unit_at(i)->dimension == ld->definition->dimension) {
            units[unit_total] = unit_at(i);
            ids[unit_total++] = unit_at(i)->id;
        }
    if (!load_word(ld, ld->root, "unit", ids, unit_total, &place))
        return false;
    set->unit = units[place];
    return true;
}

static bool load_values_head(struct load *ld)
{
    static const char *const evidence[] = {EVIDENCE_LIST(ID3)};
    static const char *const coordinations[] = {COORDINATION_LIST(ID3)};
    struct dataset *set = &ld->out->set;
    int word;
    if (!load_quantity(ld) || !load_marks(ld) ||
        !load_word(ld, ld->root, "evidence", evidence, EVIDENCE_COUNT, &word))
        return false;
    set->evidence = (enum evidence)word;
    if (!load_word(ld, ld->root, "default_coordination", coordinations,
                   COORDINATION_COUNT, &word))
        return false;
    set->default_coordination = (enum coordination)word;
    set->rank = object_integer(ld->root, "rank", 0);
    if (object_member(ld->root, "rank") && (set->rank < 1 || set->rank > 1000))
        return status_fail(ld->st, STATUS_DATA,
                           "rank %d: expected 1 to 1000, or leave it out",
                           set->rank);
    return true;
}

static bool load_head(struct load *ld)
{
    static const char *const kinds[] = {DATASET_KIND_LIST(ID2)};
    struct dataset *set = &ld->out->set;
    int kind;
    int format = object_integer(ld->root, "format", 0);
    if (format != 1)
        return status_fail(ld->st, STATUS_DATA,
                           "format %d: expected 1, the only one there is",
                           format);
    if (!load_word(ld, ld->root, "kind", kinds, DATASET_KIND_COUNT, &kind))
        return false;
    set->kind = (enum dataset_kind)kind;
    set->licence = "not stated";
    set->absent = "not in this data set";
    if (!load_member(ld, ld->root, "title", &set->provenance.title) ||
        !load_member(ld, ld->root, "licence", &set->licence) ||
        !load_member(ld, ld->root, "absent", &set->absent) ||
        !load_citations(ld) || !load_notes(ld))
        return false;
    if (set->kind == DATASET_VALUES)
        return load_values_head(ld);
    for (size_t i = VALUES_ONLY_FROM; i < ROOT_FIELD_COUNT; i++)
        if (object_member(ld->root, root_fields[i].key))
            return status_fail(ld->st, STATUS_DATA,
                               "key '%s' belongs to sets of kind values only",
                               root_fields[i].key);
    return true;
}

static bool load_entries(struct load *ld)
{
    static bool (*const readers[DATASET_KIND_COUNT])(struct load *,
                                                     const cJSON *) = {
        [DATASET_VALUES] = load_values,
        [DATASET_ELEMENTS] = load_elements,
        [DATASET_CONFIGURATIONS] = load_configurations,
        [DATASET_OXIDATION_STATES] = load_oxidation_states,
        [DATASET_AVAILABILITY] = load_availability,
    };
    const cJSON *entries = object_member(ld->root, "entries");
    if (cJSON_GetArraySize(entries) > DATASET_ENTRIES_MAX)
        return status_fail(ld->st, STATUS_DATA, "entries: more than %d",
                           DATASET_ENTRIES_MAX);
    uint32_t empty;
    if (!pool_add(&ld->pool, "", &empty, ld->st) ||
        !readers[ld->out->set.kind](ld, entries))
        return false;
    char *strings = arena_array(&ld->out->arena, ld->pool.size, 1, ld->st);
    if (!strings)
        return false;
    memcpy(strings, ld->pool.data, ld->pool.size);
    ld->out->set.strings = strings;
    ld->out->set.strings_size = ld->pool.size;
    return true;
}

static bool load_checked_root(struct load *ld)
{
    return object_check(ld->root, root_fields, ROOT_FIELD_COUNT, ld->st) &&
           load_check_id(object_text(ld->root, "id"), "id", ld->st) &&
           load_member(ld, ld->root, "id", &ld->out->set.provenance.id) &&
           load_head(ld) && load_entries(ld);
}

static bool load_root(struct load *ld)
{
    struct status unused;
    if (load_checked_root(ld))
        return true;
    /* Even a wrong file may say which set it wants to be. */
    const cJSON *id =
        cJSON_IsObject(ld->root) ? object_member(ld->root, "id") : NULL;
    if (id && cJSON_IsString(id) &&
        load_check_id(id->valuestring, "id", &unused))
        return status_context(ld->st, "set %s", id->valuestring);
    return false;
}

bool dataset_load(const char *text, size_t size, struct loaded **out,
                  struct status *st)
{
    *out = NULL;
    if (!json_check(text, size, st))
        return false;
    struct load ld = {.st = st};
    cJSON *root = cJSON_ParseWithLength(text, size);
    bool ok = false;
    ld.root = root;
    ld.out = calloc(1, sizeof *ld.out);
    if (!root || !ld.out)
        (void)status_fail(st, STATUS_MEMORY, "out of memory");
    else
        ok = load_root(&ld);
    cJSON_Delete(root);
    pool_clear(&ld.pool);
    if (ok)
        *out = ld.out;
    else
        loaded_free(ld.out);
    return ok;
}

bool dataset_load_file(const char *path, struct loaded **out, struct status *st)
{
    char *text;
    size_t size;
    *out = NULL;
    if (!file_read(path, DATASET_BYTES_MAX, &text, &size, st))
        return false;
    bool ok = dataset_load(text, size, out, st);
    free(text);
    return ok || status_context(st, "%s", path);
}

void loaded_free(struct loaded *loaded)
{
    if (!loaded)
        return;
    arena_clear(&loaded->arena);
    free(loaded);
}
