/* SPDX-License-Identifier: MIT */
/* What a user does and sees; keys draw and solve nothing. */
#ifndef TESTS_APP_DESK_KEYS_H
#define TESTS_APP_DESK_KEYS_H

#include "app/app.h"

void resize(int rows, int columns);
enum effect key(enum key code);

/* Types characters; gives the effect of the last one. */
enum effect type(const char *text);

/* Draws, then solves what is wanted for that. */
void settle(void);

/* Draws; true when the characters hold the words. */
bool shows(const char *words);

#endif
