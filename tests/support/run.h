/* SPDX-License-Identifier: MIT */
/* The same main for every test executable. */
#ifndef SUPPORT_RUN_H
#define SUPPORT_RUN_H

#include <check.h>

/* Runs a suite and gives the exit status: 0 when all passed and at least one
 * ran. Meson reads TAP from standard output when CK_TAP_LOG_FILE_NAME is "-".
 */
int run_suite(Suite *suite);

#endif
