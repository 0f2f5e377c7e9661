/* SPDX-License-Identifier: MIT */
#ifndef REFDATA_TEST_SUITES_H
#define REFDATA_TEST_SUITES_H

#include <check.h>

#include "refdata/dataset.h"

/* A built-in set that must be there. */
const struct dataset *need(const char *id);

TCase *builtin_case(void);
TCase *lookup_case(void);
TCase *ground_case(void);
TCase *loader_case(void);
TCase *worked_case(void);

#endif
