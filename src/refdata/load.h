/* SPDX-License-Identifier: MIT */
/* Shared by the parts of the loader; nobody else includes this. */
#ifndef REFDATA_LOAD_H
#define REFDATA_LOAD_H

#include <cjson/cJSON.h>

#include "element/definition.h"
#include "refdata/loader.h"
#include "refdata/object.h"

/* One data set being loaded. */
struct load {
    const cJSON *root;
    struct loaded *out;
    struct pool pool;
    const struct definition *definition; /* values only */
    struct status *st;
};

/* Reads the entries of one kind into ld->out->set and sets its count and
 * first. The root object has been checked. */
bool load_values(struct load *ld, const cJSON *entries);
bool load_elements(struct load *ld, const cJSON *entries);
bool load_configurations(struct load *ld, const cJSON *entries);
bool load_oxidation_states(struct load *ld, const cJSON *entries);
bool load_availability(struct load *ld, const cJSON *entries);

/* Atomic number of a checked object's element; 0 with a failed status that
 * gives a hint. */
int load_element(struct load *ld, const cJSON *object);

/* Place in words[count] of the text under key, 0 when the key is absent; false
 * with a failed status that lists the words when it is none of them. */
bool load_word(struct load *ld, const cJSON *object, const char *key,
               const char *const *words, int count, int *found);

/* Offset of the text under key, 0 ("") when it is absent. */
bool load_text(struct load *ld, const cJSON *object, const char *key,
               text_offset *offset);

/* Offset of the texts under key joined by "; ", 0 when it is absent. */
bool load_joined(struct load *ld, const cJSON *object, const char *key,
                 text_offset *offset);

/* Puts "entry 12 (Fe)" in front of a failed status; returns false. */
bool load_entry_context(struct load *ld, const cJSON *object, int place);

/* Fills set.first from the z of count rows in ascending order: z_of(row). */
void load_index(struct dataset *set, int count, int (*z_of)(const void *row),
                const void *rows, size_t row_size);

/* The citations of the set, from ld->root. */
bool load_citations(struct load *ld);

/* Whether an id is in order; else a failed status that says what was
 * expected. */
bool load_check_id(const char *id, const char *what, struct status *st);

/* A copied text member; *out stays as it is when the key is absent. */
bool load_member(struct load *ld, const cJSON *object, const char *key,
                 const char **out);

/* Members of a list joined by a separator, copied; NULL without the key. */
bool load_list(struct load *ld, const cJSON *object, const char *key,
               const char *separator, const char **out);

/* A copy in the data set's memory, or NULL with a failed status. */
const char *load_copy(struct load *ld, const char *text);

#endif
