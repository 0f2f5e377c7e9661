/* SPDX-License-Identifier: MIT */
#include "numeric/lanes.h"

#if defined(__x86_64__)
#pragma GCC target("avx2")
#define WIDTH 4
#define KERNEL lanes_four
#include "numeric/lanes.inc"
#endif
