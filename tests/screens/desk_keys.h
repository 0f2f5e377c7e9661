/* SPDX-License-Identifier: MIT */
/* What a user does at the desk; nothing is drawn or solved meanwhile. */
#ifndef TESTS_SCREENS_DESK_KEYS_H
#define TESTS_SCREENS_DESK_KEYS_H

#include "app/app.h"

void resize(int rows, int columns);
enum effect key(enum key code);

/* Types characters; gives the effect of the last one. */
enum effect type(const char *text);

#endif
