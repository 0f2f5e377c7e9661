/* SPDX-License-Identifier: MIT */
/* Reference data: any bytes either load or fail with one clean sentence. */
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "fuzz/target.h"
#include "refdata/loader.h"

static void require(bool held)
{
    if (!held)
        abort();
}

static void check_message(const char *message)
{
    size_t length = strlen(message);
    require(length > 0 && utf8_valid(message, length));
    for (size_t i = 0; i < length;) {
        uint32_t code;
        i += utf8_decode(message + i, length - i, &code);
        require(!utf8_is_control(code));
    }
}

static void check_set(const struct dataset *set)
{
    require(set->count > 0 && set->first[Z_MAX + 1] == set->count);
    require(set->provenance.citation_count > 0);
    if (set->kind != DATASET_VALUES)
        return;
    for (int i = 0; i < set->count; i++) {
        const struct entry *e = &set->values[i];
        struct reading r = dataset_entry_reading(set, e);
        require((r.state == READING_OK) == (e->gap == GAP_NONE));
        require(r.reason && r.remark);
    }
}

int LLVMFuzzerTestOneInput(const uint8_t *data, size_t size)
{
    struct loaded *loaded;
    struct status st = status_ok();
    char *text = malloc(size + 1);
    if (!text)
        return 0;
    if (size > 0)
        memcpy(text, data, size);
    text[size] = '\0';
    if (dataset_load(text, size, &loaded, &st)) {
        check_set(&loaded->set);
        loaded_free(loaded);
    } else {
        require(st.code == STATUS_DATA || st.code == STATUS_MEMORY);
        check_message(st.message);
    }
    free(text);
    return 0;
}
