/* SPDX-License-Identifier: MIT */
#include "support/fault.h"

#include <stddef.h>

void *__real_malloc(size_t size);
void *__real_calloc(size_t count, size_t size);
void *__real_realloc(void *old, size_t size);
void *__wrap_malloc(size_t size);
void *__wrap_calloc(size_t count, size_t size);
void *__wrap_realloc(void *old, size_t size);

/* Allocations still to be granted; negative: no limit. */
static long granted = -1;

void fault_grant(long allocations)
{
    granted = allocations;
}

static int refuse(void)
{
    if (granted < 0)
        return 0;
    if (granted == 0)
        return 1;
    granted--;
    return 0;
}

void *__wrap_malloc(size_t size)
{
    return refuse() ? NULL : __real_malloc(size);
}

void *__wrap_calloc(size_t count, size_t size)
{
    return refuse() ? NULL : __real_calloc(count, size);
}

void *__wrap_realloc(void *old, size_t size)
{
    return refuse() ? NULL : __real_realloc(old, size);
}
