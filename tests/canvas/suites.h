/* SPDX-License-Identifier: MIT */
#ifndef TESTS_CANVAS_SUITES_H
#define TESTS_CANVAS_SUITES_H

#include <check.h>

TCase *plot_cases(void);
TCase *scale_case(void);

#endif
