/* SPDX-License-Identifier: MIT */
/* Allocations that fail: the linker sends malloc, calloc,
 * realloc and aligned_alloc through here (fault_dep in tests/meson.build). */
#ifndef SUPPORT_FAULT_H
#define SUPPORT_FAULT_H

/* Grants so many further allocations and refuses all after them; a negative
 * number grants all again. */
void fault_grant(long allocations);

/* Grants so many, refuses the next one, and grants all after it. */
void fault_refuse(long before);

/* Whether an allocation has been refused since the last of these calls that
 * set a limit. */
int fault_happened(void);

#endif
