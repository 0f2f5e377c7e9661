/* SPDX-License-Identifier: MIT */
/* A screen that exists only here: it counts how often its key was pressed. */
#ifndef TESTS_ADDITIONS_TALLY_H
#define TESTS_ADDITIONS_TALLY_H

#include "session/screen.h"

extern const struct screen_ops screen_tally;

#endif
