/* SPDX-License-Identifier: MIT */
/* Memory that lives and dies together: everything that a loaded data set
 * points to. */
#ifndef REFDATA_ARENA_H
#define REFDATA_ARENA_H

#include <stdbool.h>
#include <stddef.h>
#include <stdint.h>

#include "base/status.h"

struct arena_block;
struct arena {
    struct arena_block *blocks;
};

/* Zeroed memory for count items of size bytes, aligned for any type; NULL
 * with STATUS_MEMORY when there is none. count may be 0. */
void *arena_array(struct arena *arena, size_t count, size_t size,
                  struct status *st);

/* Releases everything. Safe on an empty arena. */
void arena_clear(struct arena *arena);

/* A growing block of terminated texts in which equal texts are stored once;
 * the first is "". */
struct pool {
    char *data;
    size_t size, capacity;
    uint32_t *slots; /* open hash table of offset + 1 */
    size_t slot_count, used;
};

/* Offset of text, stored on first use; false with STATUS_MEMORY. */
MUST_CHECK bool pool_add(struct pool *pool, const char *text, uint32_t *offset,
                         struct status *st);

void pool_clear(struct pool *pool);

#endif
