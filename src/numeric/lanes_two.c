/* SPDX-License-Identifier: MIT */
#define WIDTH 2
#define KERNEL lanes_two
#include "numeric/lanes.inc"
