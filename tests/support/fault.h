/* SPDX-License-Identifier: MIT */
/* Allocations that fail: the linker sends malloc, calloc and realloc through
 * here (fault_dep in tests/meson.build). */
#ifndef SUPPORT_FAULT_H
#define SUPPORT_FAULT_H

/* Grants so many further allocations and refuses all after them; a negative
 * number grants all again. */
void fault_grant(long allocations);

#endif
