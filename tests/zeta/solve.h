/* SPDX-License-Identifier: MIT */
/* Atoms solved for the tests of this folder. */
#ifndef TESTS_ZETA_SOLVE_H
#define TESTS_ZETA_SOLVE_H

#include "zeta/coupling.h"
#include "zeta/zeta.h"

/* A work space; aborts the test without memory. */
struct zeta *work_space(void);

/* Solves to the end; aborts when the text is no configuration. */
struct zeta_result solve(struct zeta *work, int z, const char *text,
                         enum zeta_coupling coupling, const double *term);

bool has_values(const struct zeta_result *r);

/* Aborts when the result has no such subshell. */
const struct zeta_subshell *subshell_of(const struct zeta_result *r, int n,
                                        int l);

#endif
