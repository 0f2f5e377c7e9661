/* SPDX-License-Identifier: MIT */
/* Anderson's extrapolation for a fixed point x = g(x): D. G. Anderson,
 * J. ACM 12, 547 (1965), doi 10.1145/321296.321305. */
#ifndef NUMERIC_MIXER_H
#define NUMERIC_MIXER_H

#include "base/status.h"

enum { MIXER_HISTORY = 5 };

struct mixer;

/* Work space for vectors of up to `capacity` numbers; NULL with
 * STATUS_MEMORY. */
MUST_CHECK struct mixer *mixer_new(int capacity, struct status *st);
void mixer_free(struct mixer *mixer);

/* Forgets the history; vectors of n numbers follow, n <= capacity. Only the
 * first `measured` of them enter the metric; the others go along, which is
 * right for anything that depends linearly on the first. */
void mixer_reset(struct mixer *mixer, int n, int measured);

/* Replaces x by the next trial, from x and g = g(x). weight[measured] is the
 * metric in which the residual g - x is made small; beta in (0, 1] is the part
 * of the extrapolated residual that is followed. Returns the residual's norm
 * √(Σ weight (g - x)²). */
double mixer_next(struct mixer *mixer, const double *weight, double beta,
                  double *x, const double *g);

#endif
