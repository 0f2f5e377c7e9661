/* SPDX-License-Identifier: MIT */
#ifndef TESTS_APP_SUITES_H
#define TESTS_APP_SUITES_H

#include <check.h>

TCase *keys_case(void);

#endif
