/* SPDX-License-Identifier: MIT */
/* The parts of the suite for cli/. */
#ifndef TESTS_CLI_SUITES_H
#define TESTS_CLI_SUITES_H

#include <check.h>

TCase *parse_cases(void);
TCase *made_cases(void);
TCase *call_cases(void);
TCase *output_cases(void);
TCase *residual_cases(void);
TCase *stream_cases(void);
TCase *atom_cases(void);
TCase *audit_cases(void);
TCase *compare_cases(void);
TCase *site_cases(void);
TCase *source_cases(void);
TCase *good_cases(void);

#endif
