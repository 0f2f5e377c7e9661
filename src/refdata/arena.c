/* SPDX-License-Identifier: MIT */
#include "refdata/arena.h"

#include <stdalign.h>
#include <stdlib.h>
#include <string.h>

struct arena_block {
    struct arena_block *next;
    alignas(max_align_t) char data[];
};

static bool out_of_memory(struct status *st)
{
    return status_fail(st, STATUS_MEMORY, "out of memory");
}

void *arena_array(struct arena *arena, size_t count, size_t size,
                  struct status *st)
{
    struct arena_block *block = NULL;
    if (count <= (SIZE_MAX - sizeof *block - 1) / size)
        block = calloc(1, sizeof *block + count * size + 1);
    if (!block) {
        (void)out_of_memory(st);
        return NULL;
    }
    block->next = arena->blocks;
    arena->blocks = block;
    return block->data;
}

void arena_clear(struct arena *arena)
{
    while (arena->blocks) {
        struct arena_block *next = arena->blocks->next;
        free(arena->blocks);
        arena->blocks = next;
    }
}

/* FNV-1a (Fowler, Noll, Vo), 32 bits. */
static uint32_t hash(const char *s)
{
    uint32_t h = UINT32_C(2166136261);
    for (; *s; s++)
        h = (h ^ (unsigned char)*s) * UINT32_C(16777619);
    return h;
}

/* The slot that holds text, or the free one where it would go. */
static size_t slot_of(const struct pool *pool, const char *text)
{
    size_t i = hash(text) & (pool->slot_count - 1);
    while (pool->slots[i] && strcmp(pool->data + pool->slots[i] - 1, text) != 0)
        i = (i + 1) & (pool->slot_count - 1);
    return i;
}

static bool grow_slots(struct pool *pool)
{
    uint32_t *old = pool->slots;
    size_t old_count = pool->slot_count;
    size_t count = old_count ? old_count * 2 : 64;
    uint32_t *slots = calloc(count, sizeof *slots);
    if (!slots)
        return false;
    pool->slots = slots;
    pool->slot_count = count;
    for (size_t i = 0; i < old_count; i++)
        if (old[i])
            slots[slot_of(pool, pool->data + old[i] - 1)] = old[i];
    free(old);
    return true;
}

static bool reserve(struct pool *pool, size_t more)
{
    if (pool->size + more <= pool->capacity)
        return true;
    size_t capacity = pool->capacity ? pool->capacity * 2 : 1024;
    while (capacity < pool->size + more)
        capacity *= 2;
    char *data = realloc(pool->data, capacity);
    if (!data)
        return false;
    pool->data = data;
    pool->capacity = capacity;
    return true;
}

/* Appends text without looking whether it is there. */
static bool append(struct pool *pool, const char *text, uint32_t *offset)
{
    size_t length = strlen(text) + 1;
    if (pool->size + length >= UINT32_MAX || !reserve(pool, length))
        return false;
    memcpy(pool->data + pool->size, text, length);
    *offset = (uint32_t)pool->size;
    pool->size += length;
    pool->slots[slot_of(pool, text)] = *offset + 1;
    pool->used++;
    return true;
}

bool pool_add(struct pool *pool, const char *text, uint32_t *offset,
              struct status *st)
{
    uint32_t empty;
    if (pool->used * 2 >= pool->slot_count && !grow_slots(pool))
        return out_of_memory(st);
    if (pool->used == 0 && !append(pool, "", &empty))
        return out_of_memory(st);
    size_t slot = slot_of(pool, text);
    if (pool->slots[slot]) {
        *offset = pool->slots[slot] - 1;
        return true;
    }
    return append(pool, text, offset) || out_of_memory(st);
}

void pool_clear(struct pool *pool)
{
    free(pool->data);
    free(pool->slots);
    *pool = (struct pool){0};
}
