/* SPDX-License-Identifier: MIT */
/* Assertions that print what they compared. */
#ifndef SUPPORT_NEAR_H
#define SUPPORT_NEAR_H

#include <check.h>
#include <math.h>
#include <stdio.h>

/* |got - want| <= absolute + relative*|want|; the context is a format string
 * with its arguments naming Z, subshell, model … */
#define near(got, want, absolute, relative, ...)                               \
    do {                                                                       \
        double near_got = (got), near_want = (want);                           \
        double near_tol = (absolute) + (relative)*fabs(near_want);             \
        if (!(fabs(near_got - near_want) <= near_tol)) {                       \
            char near_context[256];                                            \
            snprintf(near_context, sizeof near_context, __VA_ARGS__);          \
            ck_abort_msg("%s: got %.15g, want %.15g, off by %.3g > %.3g",      \
                         near_context, near_got, near_want,                    \
                         near_got - near_want, near_tol);                      \
        }                                                                      \
    } while (0)

#endif
