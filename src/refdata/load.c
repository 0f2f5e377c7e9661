/* SPDX-License-Identifier: MIT */
/* What every reader of entries needs of the JSON and of the data set's memory.
 */
#include "refdata/load.h"

#include <assert.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "refdata/json.h"

const char *load_copy(struct load *ld, const char *text)
{
    size_t size = strlen(text) + 1;
    char *copy = arena_array(&ld->out->arena, size, 1, ld->st);
    if (copy)
        memcpy(copy, text, size);
    return copy;
}

bool load_member(struct load *ld, const cJSON *object, const char *key,
                 const char **out)
{
    const char *text = object_text(object, key);
    return !text || (*out = load_copy(ld, text)) != NULL;
}

bool load_list(struct load *ld, const cJSON *object, const char *key,
               const char *separator, const char **out)
{
    size_t size = 1;
    const cJSON *item;
    const cJSON *list = object_member(object, key);
    *out = NULL;
    if (!list)
        return true;
    cJSON_ArrayForEach(item, list)
    {
        size += strlen(item->valuestring) + strlen(separator);
    }
    char *joined = arena_array(&ld->out->arena, size, 1, ld->st);
    if (!joined)
        return false;
    struct text t = text_over(joined, size);
    cJSON_ArrayForEach(item, list)
    {
        text_add(&t, t.length ? separator : "");
        text_add(&t, item->valuestring);
    }
    *out = joined;
    return true;
}

bool load_joined(struct load *ld, const cJSON *object, const char *key,
                 text_offset *offset)
{
    const char *joined;
    *offset = 0;
    return load_list(ld, object, key, "; ", &joined) &&
           (!joined || pool_add(&ld->pool, joined, offset, ld->st));
}

bool load_text(struct load *ld, const cJSON *object, const char *key,
               text_offset *offset)
{
    const char *text = object_text(object, key);
    *offset = 0;
    return !text || pool_add(&ld->pool, text, offset, ld->st);
}

bool load_word(struct load *ld, const cJSON *object, const char *key,
               const char *const *words, int count, int *found)
{
    const char *text = object_text(object, key);
    *found = 0;
    if (!text)
        return true;
    char known[400];
    struct text list = text_over(known, sizeof known);
    for (int i = 0; i < count; i++) {
        if (strcmp(words[i], text) == 0) {
            *found = i;
            return true;
        }
        if (words[i][0])
            text_addf(&list, "%s%s", list.length ? " | " : "", words[i]);
    }
    return status_fail(ld->st, STATUS_DATA, "%s '%s': expected one of: %s", key,
                       quoted(text).text, known);
}

int load_element(struct load *ld, const cJSON *object)
{
    const char *symbol = object_text(object, "element");
    const struct element *e = element_by_symbol(symbol);
    if (e)
        return e->z;
    const struct element *meant = element_find(symbol);
    if (!meant)
        meant = element_nearest(symbol);
    if (meant)
        (void)status_fail(ld->st, STATUS_DATA,
                          "element '%s': no such symbol; did you mean %s?",
                          quoted(symbol).text, meant->symbol);
    else
        (void)status_fail(ld->st, STATUS_DATA,
                          "element '%s': expected a symbol from H to Og%s",
                          quoted(symbol).text,
                          strpbrk(symbol, "+-0123456789")
                              ? "; a charge goes under the key charge"
                              : "");
    return 0;
}

bool load_entry_context(struct load *ld, const cJSON *object, int place)
{
    const cJSON *symbol =
        cJSON_IsObject(object) ? object_member(object, "element") : NULL;
    if (symbol && cJSON_IsString(symbol) &&
        element_by_symbol(symbol->valuestring))
        return status_context(ld->st, "entry %d (%s)", place,
                              symbol->valuestring);
    return status_context(ld->st, "entry %d", place);
}

void load_index(struct dataset *set, int count, int (*z_of)(const void *row),
                const void *rows, size_t row_size)
{
    int row = 0;
    for (int z = 0; z <= Z_MAX + 1; z++) {
        while (row < count &&
               z_of((const char *)rows + (size_t)row * row_size) < z)
            row++;
        set->first[z] = (uint16_t)row;
    }
    set->count = count;
}

#define ID_BYTES_MAX 48

static const char id_characters[] = "abcdefghijklmnopqrstuvwxyz0123456789_-.";

bool load_check_id(const char *id, const char *what, struct status *st)
{
    if (strlen(id) <= ID_BYTES_MAX && id[strspn(id, id_characters)] == '\0' &&
        id[0] >= 'a' && id[0] <= 'z')
        return true;
    return status_fail(st, STATUS_DATA,
                       "%s '%s': expected a letter and then letters, digits, "
                       "'_', '-' or '.', all lower case, at most %d",
                       what, quoted(id).text, ID_BYTES_MAX);
}
