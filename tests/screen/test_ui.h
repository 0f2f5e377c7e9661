/* SPDX-License-Identifier: MIT */
#ifndef TESTS_SCREEN_TEST_UI_H
#define TESTS_SCREEN_TEST_UI_H

#include <check.h>

TCase *layout_case(void);

#endif
