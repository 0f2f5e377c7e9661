/* SPDX-License-Identifier: MIT */
/* One ui over the built-in data with a canvas of 80x24, for a test case. */
#ifndef TESTS_SCREENS_DESK_H
#define TESTS_SCREENS_DESK_H

#include "screens/ui.h"

extern struct study *study;
extern struct ui ui;
extern struct canvas canvas;

/* Fixture of a case: makes all three, and releases them. */
void open_ui(void);
void close_ui(void);

/* The drawn screen: characters and, below, roles. The caller frees it. */
char *drawn(void);

#endif
