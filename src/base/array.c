/* SPDX-License-Identifier: MIT */
#include "base/array.h"

#include <stdint.h>
#include <stdlib.h>
#include <string.h>

#define FIRST_CAPACITY 32

bool array_grow(void *items, size_t count, size_t *capacity, size_t size)
{
    void *old;
    if (count < *capacity)
        return true;
    size_t larger = *capacity ? 2 * *capacity : FIRST_CAPACITY;
    if (larger > SIZE_MAX / size)
        return false;
    /* Copied, for the pointer is of another type than void *. */
    memcpy(&old, items, sizeof old);
    void *more = realloc(old, larger * size);
    if (!more)
        return false;
    memcpy(items, &more, sizeof more);
    *capacity = larger;
    return true;
}
