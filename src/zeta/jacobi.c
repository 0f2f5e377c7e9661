/* SPDX-License-Identifier: MIT */
#include "zeta/jacobi.h"

#include <math.h>
#include <stdbool.h>
#include <stddef.h>

/* Quadratic convergence sets in after a few sweeps; this many are never used
 * up for finite matrices. */
#define SWEEPS_MAX 50

/* Columns p and q of m turned by cosine c and sine s. */
static void turn_columns(int count, int stride, double *m, int p, int q,
                         double c, double s)
{
    for (int k = 0; k < count; k++) {
        double *row = m + (ptrdiff_t)k * stride;
        double x = row[p], y = row[q];
        row[p] = c * x - s * y;
        row[q] = s * x + c * y;
    }
}

/* Makes a[p][q] zero; false when it is as good as zero already. */
static bool turn(int count, int stride, double *a, double *vectors, int p,
                 int q)
{
    double *row_p = a + (ptrdiff_t)p * stride;
    double *row_q = a + (ptrdiff_t)q * stride;
    if (fabs(row_p[q]) <= 1e-15 * sqrt(fabs(row_p[p] * row_q[q])) + 1e-300)
        return false;
    double theta = 0.5 * (row_q[q] - row_p[p]) / row_p[q];
    double t = copysign(1.0, theta) / (fabs(theta) + hypot(theta, 1.0));
    double c = 1.0 / hypot(t, 1.0), s = t * c;
    turn_columns(count, stride, a, p, q, c, s);
    for (int k = 0; k < count; k++) {
        double x = row_p[k], y = row_q[k];
        row_p[k] = c * x - s * y;
        row_q[k] = s * x + c * y;
    }
    if (vectors)
        turn_columns(count, stride, vectors, p, q, c, s);
    return true;
}

void jacobi(int count, int stride, double *a, double *vectors)
{
    for (int i = 0; i < count && vectors; i++)
        for (int j = 0; j < count; j++)
            vectors[(ptrdiff_t)i * stride + j] = i == j ? 1.0 : 0.0;
    bool turned = true;
    for (int sweep = 0; turned && sweep < SWEEPS_MAX; sweep++) {
        turned = false;
        for (int p = 0; p < count; p++)
            for (int q = p + 1; q < count; q++)
                turned |= turn(count, stride, a, vectors, p, q);
    }
}
