/* SPDX-License-Identifier: MIT */
#ifndef REFDATA_TEST_SUITES_H
#define REFDATA_TEST_SUITES_H

#include <check.h>

TCase *builtin_case(void);
TCase *ground_case(void);
TCase *loader_case(void);

#endif
