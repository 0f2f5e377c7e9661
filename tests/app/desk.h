/* SPDX-License-Identifier: MIT */
/* The screens over the built-in data with a canvas of 80x24, for a test case.
 */
#ifndef TESTS_APP_DESK_H
#define TESTS_APP_DESK_H

#include "app/app.h"

extern struct study *study;
extern struct app app;
extern struct canvas canvas;

/* Fixture of a case: makes all three, and releases them. */
void open_app(void);
void close_app(void);

/* Begins again over the same study. */
void reopen_app(void);

/* The drawn screen: characters and, below, roles. The caller frees it. */
char *drawn(void);

#endif
