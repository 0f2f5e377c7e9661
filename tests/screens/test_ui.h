/* SPDX-License-Identifier: MIT */
#ifndef TESTS_SCREENS_TEST_UI_H
#define TESTS_SCREENS_TEST_UI_H

#include <check.h>

TCase *layout_case(void);
TCase *agree_case(void);
TCase *keys_case(void);

#endif
