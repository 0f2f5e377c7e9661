/* SPDX-License-Identifier: MIT */
/* The cases of the folder's one executable. */
#ifndef TESTS_ZETA_SUITES_H
#define TESTS_ZETA_SUITES_H

#include <check.h>

TCase *coupling_cases(void);
TCase *slater_cases(void);
TCase *energy_cases(void);
TCase *zeta_cases(void);
TCase *list_cases(void);

#endif
