/* SPDX-License-Identifier: MIT */
#include "support/fault.h"

#include <stddef.h>

void *__real_malloc(size_t size);
void *__real_calloc(size_t count, size_t size);
void *__real_realloc(void *old, size_t size);
void *__wrap_malloc(size_t size);
void *__wrap_calloc(size_t count, size_t size);
void *__wrap_realloc(void *old, size_t size);
void *__real_aligned_alloc(size_t alignment, size_t size);
void *__wrap_aligned_alloc(size_t alignment, size_t size);
int __wrap_xc_func_init(void *functional, int id, int spins);
/* Weak: not every test has libxc. */
int __real_xc_func_init(void *functional, int id, int spins)
    __attribute__((weak));

/* Allocations still to be granted; negative: no limit. */
static long granted = -1;
static int once;    /* only the next after these is refused */
static int refused; /* some were */

void fault_grant(long allocations)
{
    granted = allocations;
    once = 0;
    if (allocations >= 0)
        refused = 0;
}

void fault_refuse(long before)
{
    granted = before;
    once = 1;
    refused = 0;
}

int fault_happened(void)
{
    return refused;
}

static int suspended; /* in a library that does not bear a refusal */

static int refuse(void)
{
    if (suspended)
        return 0;
    if (granted < 0)
        return 0;
    if (granted == 0) {
        refused = 1;
        if (once)
            granted = -1;
        return 1;
    }
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

void *__wrap_aligned_alloc(size_t alignment, size_t size)
{
    return refuse() ? NULL : __real_aligned_alloc(alignment, size);
}

/* libxc uses what it allocates without a look, wherever it is linked in. */
int __wrap_xc_func_init(void *functional, int id, int spins)
{
    suspended = 1;
    int failed = __real_xc_func_init(functional, id, spins);
    suspended = 0;
    return failed;
}
