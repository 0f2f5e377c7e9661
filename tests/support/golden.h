/* SPDX-License-Identifier: MIT */
/* Texts kept in tests/golden and compared byte for byte. They are renewed only
 * by running the tests with OUTERSHELL_RENEW_GOLDEN=1, and read in review. */
#ifndef SUPPORT_GOLDEN_H
#define SUPPORT_GOLDEN_H

/* Aborts the test, naming the first line that differs, unless text equals the
 * file tests/golden/<name>. GOLDEN_DIR is set by the build. */
void golden_check(const char *name, const char *text);

#endif
