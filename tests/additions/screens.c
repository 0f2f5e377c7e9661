/* SPDX-License-Identifier: MIT */
/* The list of screens with one more: it stands in the place of
 * src/screens/list.c. */
#include "additions/tally.h"
#include "screens/list.h"

#define SCREEN_ADDRESS(screen) &screen,
/* clang-format off */
const struct screen_ops *const screen_list[] = {
    SCREEN_LIST(SCREEN_ADDRESS)
    &screen_tally,
};
/* clang-format on */
#undef SCREEN_ADDRESS

const int screen_list_count = (int)(sizeof screen_list / sizeof screen_list[0]);
