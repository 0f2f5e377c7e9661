/* SPDX-License-Identifier: MIT */
/* Arrays that grow by one item at a time. */
#ifndef BASE_ARRAY_H
#define BASE_ARRAY_H

#include <stdbool.h>
#include <stddef.h>

/* Makes room for one more item in the array that *items points to (the address
 * of a pointer to items of `size` bytes; NULL while *capacity is 0), which
 * holds `count` of at most *capacity items. False when memory is short: then
 * array and capacity are as before. The caller frees the array. */
bool array_grow(void *items, size_t count, size_t *capacity, size_t size);

#endif
