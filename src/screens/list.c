/* SPDX-License-Identifier: MIT */
/* Nothing but the list: a program that defines its own takes this file's
 * place. */
#include "screens/list.h"

#define SCREEN_ADDRESS(screen) &screen,
const struct screen_ops *const screen_list[] = {SCREEN_LIST(SCREEN_ADDRESS)};
#undef SCREEN_ADDRESS

const int screen_list_count = (int)(sizeof screen_list / sizeof screen_list[0]);
