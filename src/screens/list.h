/* SPDX-License-Identifier: MIT */
/* All screens in the order of the tab key; the first one is home. */
#ifndef SCREENS_LIST_H
#define SCREENS_LIST_H

#include "session/screen.h"

#define SCREEN_LIST(X)                                                         \
    X(screen_map)                                                              \
    X(screen_compare)                                                          \
    X(screen_trend)                                                            \
    X(screen_audit)                                                            \
    X(screen_atom)                                                             \
    X(screen_sources)                                                          \
    X(screen_keys)

#define SCREEN_DECLARE(screen) extern const struct screen_ops screen;
SCREEN_LIST(SCREEN_DECLARE)
#undef SCREEN_DECLARE

extern const struct screen_ops *const screen_list[];
extern const int screen_list_count;

#endif
