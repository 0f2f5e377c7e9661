/* SPDX-License-Identifier: MIT */
/* Broyden, Fletcher, Goldfarb and Shanno's update as in Nocedal and Wright,
 * Numerical Optimization (2006), equation 6.17, with backtracking. */
#include "zeta/descent.h"

#include <assert.h>
#include <math.h>

/* Share of the predicted decrease that a step must bring (Armijo). */
static const double decrease_share = 1e-4;
/* Rounding of the value, relative: smaller differences decide nothing. */
static const double value_noise = 1e-14;
/* Below this part of the full step the search ends. */
static const double shortest_length = 1e-6;
/* Of an estimated Hessian with unit diagonal. */
static const double smallest_pivot = 0.05;

static double dot(const struct descent *d, const double a[], const double b[])
{
    double sum = 0.0;
    for (int i = 0; i < d->count; i++)
        sum += a[i] * b[i];
    return sum;
}

/* out = inverse times v, from the lower triangle. */
static void multiply(const struct descent *d, const double v[], double out[])
{
    for (int i = 0; i < d->count; i++) {
        double sum = d->inverse[i][i] * v[i];
        for (int j = 0; j < i; j++) {
            sum += d->inverse[i][j] * v[j];
            out[j] += d->inverse[i][j] * v[i];
        }
        out[i] = sum;
    }
}

/* The next step, its tolerance, its cap and the trial at its end. */
static enum descent_state aim(struct descent *d)
{
    multiply(d, d->gradient, d->step);
    double largest = 0.0;
    for (int i = 0; i < d->count; i++) {
        d->step[i] = -d->step[i];
        largest = fmax(largest, fabs(d->step[i]));
    }
    if (largest <= d->tolerance)
        return DESCENT_DONE;
    double shrink = largest > d->cap ? d->cap / largest : 1.0;
    for (int i = 0; i < d->count; i++) {
        d->step[i] *= shrink;
        d->trial[i] = d->x[i] + d->step[i];
    }
    d->length = 1.0;
    return DESCENT_MORE;
}

/* The lower triangle of a symmetric matrix becomes that of its inverse, by
 * Cholesky's factor; false, and the matrix lost, when it is not positive. */
static bool invert(int count, double a[][DESCENT_MAX])
{
    for (int i = 0; i < count; i++) {
        for (int j = 0; j <= i; j++) {
            double sum = a[i][j];
            for (int k = 0; k < j; k++)
                sum -= a[i][k] * a[j][k];
            if (j < i)
                a[i][j] = sum * a[j][j];
            else if (sum > smallest_pivot)
                a[i][i] = 1.0 / sqrt(sum); /* the reciprocal diagonal */
            else
                return false;
        }
    }
    for (int i = 0; i < count; i++) {
        for (int j = 0; j < i; j++) {
            double sum = 0.0;
            for (int k = j; k < i; k++)
                sum -= a[i][k] * a[k][j];
            a[i][j] = sum * a[i][i];
        }
    }
    for (int i = 0; i < count; i++) {
        for (int j = 0; j <= i; j++) {
            double sum = 0.0;
            for (int k = i; k < count; k++)
                sum += a[k][i] * a[k][j];
            a[i][j] = sum;
        }
    }
    return true;
}

enum descent_state descent_begin(struct descent *d, int count, const double x[],
                                 double value, const double gradient[])
{
    assert(count <= DESCENT_MAX);
    d->count = count;
    d->value = value;
    double scale[DESCENT_MAX];
    for (int i = 0; i < count; i++) {
        d->x[i] = x[i];
        d->gradient[i] = gradient[i];
        assert(d->inverse[i][i] > 0.0);
        scale[i] = 1.0 / sqrt(d->inverse[i][i]);
        for (int j = 0; j < i; j++)
            d->inverse[i][j] *= scale[i] * scale[j];
        d->inverse[i][i] = 1.0;
    }
    bool positive = invert(count, d->inverse);
    for (int i = 0; i < count; i++) {
        for (int j = 0; j <= i; j++) {
            if (!positive)
                d->inverse[i][j] = i == j ? 1.0 : 0.0;
            d->inverse[i][j] *= scale[i] * scale[j];
        }
    }
    return aim(d);
}

/* Moves to the trial and lets the inverse Hessian learn from it. */
static void accept(struct descent *d, double value, const double gradient[])
{
    double s[DESCENT_MAX] = {0.0}, y[DESCENT_MAX] = {0.0}, hy[DESCENT_MAX];
    for (int i = 0; i < d->count; i++) {
        s[i] = d->trial[i] - d->x[i];
        y[i] = gradient[i] - d->gradient[i];
        d->x[i] = d->trial[i];
        d->gradient[i] = gradient[i];
    }
    d->value = value;
    double sy = dot(d, s, y);
    if (!(sy > 0.0))
        return; /* no curvature to learn along this step */
    multiply(d, y, hy);
    double over = 1.0 / sy;
    double scale = (1.0 + dot(d, y, hy) * over) * over;
    for (int i = 0; i < d->count; i++) {
        double si = scale * s[i] - hy[i] * over, hi = s[i] * over;
        for (int j = 0; j <= i; j++)
            d->inverse[i][j] += si * s[j] - hi * hy[j];
    }
}

enum descent_state descent_take(struct descent *d, double value,
                                const double gradient[])
{
    double slope = dot(d, d->gradient, d->step);
    double noise = value_noise * fabs(d->value);
    if (value <= d->value + decrease_share * d->length * slope + noise) {
        accept(d, value, gradient);
        return aim(d);
    }
    /* the minimum of the parabola through both values and the slope */
    double rise = value - d->value - d->length * slope;
    double shorter = -0.5 * slope * d->length / rise;
    if (!(shorter > 0.1))
        shorter = 0.1;
    d->length *= shorter < 0.5 ? shorter : 0.5;
    if (d->length < shortest_length)
        return DESCENT_STUCK;
    for (int i = 0; i < d->count; i++)
        d->trial[i] = d->x[i] + d->length * d->step[i];
    return DESCENT_MORE;
}
