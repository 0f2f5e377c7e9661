/* SPDX-License-Identifier: MIT */
#ifndef TESTS_SCREENS_SUITES_H
#define TESTS_SCREENS_SUITES_H

#include <check.h>

TCase *layout_case(void);
TCase *agree_case(void);

#endif
