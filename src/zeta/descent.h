/* SPDX-License-Identifier: MIT */
/* Quasi-Newton descent (BFGS on the inverse Hessian), driven by the caller. */
#ifndef ZETA_DESCENT_H
#define ZETA_DESCENT_H

#include <stdbool.h>

#define DESCENT_MAX 52 /* variables */

enum descent_state {
    DESCENT_MORE,  /* evaluate at d->trial, then descent_take */
    DESCENT_DONE,  /* every component of the next step is below the tolerance */
    DESCENT_STUCK, /* no lower value along the direction of descent */
};

struct descent {
    int count;
    double tolerance; /* largest component of the step left when done */
    double cap;       /* largest component of any step */
    double value;
    double x[DESCENT_MAX], gradient[DESCENT_MAX];
    double step[DESCENT_MAX], trial[DESCENT_MAX];
    double length; /* of the present trial, in steps */
    double inverse[DESCENT_MAX][DESCENT_MAX]; /* lower triangle */
};

/* Starts from the value and gradient at x[count]. The lower triangle of
 * d->inverse holds an estimate of the Hessian with a positive diagonal, and is
 * inverted here; of an estimate that is not positive definite only the diagonal
 * is used. d->tolerance and d->cap are set. count <= DESCENT_MAX. */
enum descent_state descent_begin(struct descent *d, int count, const double x[],
                                 double value, const double gradient[]);

/* Takes the value and gradient at d->trial, which the caller may have moved on
 * to a place of lower value. A value that is not finite counts as too high. */
enum descent_state descent_take(struct descent *d, double value,
                                const double gradient[]);

#endif
