/* SPDX-License-Identifier: MIT */
#ifndef TESTS_SCREEN_TEST_PLOT_H
#define TESTS_SCREEN_TEST_PLOT_H

#include <check.h>

TCase *plot_cases(void);

#endif
