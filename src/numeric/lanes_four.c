/* SPDX-License-Identifier: MIT */
#include <math.h>
#include <stddef.h>

#include "numeric/lanes.h"

#if defined(__x86_64__)
#if defined(__clang__)
#pragma clang attribute push(__attribute__((target("avx2"))),                  \
                             apply_to = function)
#else
#pragma GCC push_options
#pragma GCC target("avx2")
#endif
#define WIDTH 4
#define KERNEL lanes_four
#include "numeric/lanes.inc"
#if defined(__clang__)
#pragma clang attribute pop
#else
#pragma GCC pop_options
#endif
#endif
