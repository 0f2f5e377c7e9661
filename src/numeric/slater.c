/* SPDX-License-Identifier: MIT */
#include "numeric/slater.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

enum { P = LOBATTO_ORDER };

bool slater_init(struct slater *slater, const struct mesh *mesh,
                 struct status *st)
{
    size_t n = (size_t)mesh->points;
    memset(slater, 0, sizeof *slater);
    double *at = calloc(n * 2 * (SLATER_K_MAX + 1), sizeof *at);
    if (!at)
        return status_fail(st, STATUS_MEMORY, "Slater integrals, %zu points",
                           n);
    slater->mesh = mesh;
    slater->block = at;
    for (int k = 0; k <= SLATER_K_MAX; k++, at += 2 * n) {
        slater->up[k] = at;
        slater->down[k] = at + n;
        for (size_t i = 0; i < n; i++) {
            double y = mesh->y[i], power = 1.0;
            for (int j = 0; j < k; j++)
                power *= y;
            at[i] = 0.5 * mesh->length * mesh->slope[i] * power;
            at[n + i] = mesh->weight_y[i] / (power * y);
        }
    }
    return true;
}

void slater_clear(struct slater *slater)
{
    free(slater->block);
    memset(slater, 0, sizeof *slater);
}

/* The integrand is symmetric, so twice the half with s < y is enough: one
 * running integral over the elements. */
double slater_integral(const struct slater *slater, int elements,
                       const double *a, const double *b, int k)
{
    const struct lobatto *rule = &slater->mesh->rule;
    const double *up = slater->up[k], *down = slater->down[k];
    double total = 0.0, sum = 0.0;
    for (int e = 0; e < elements; e++) {
        double f[LOBATTO_POINTS], g[LOBATTO_POINTS], part = 0.0;
        for (int j = 0; j <= P; j++) {
            int at = e * P + j;
            f[j] = a[at] * b[at];
            g[j] = f[j] * up[at];
        }
        for (int i = 1; i <= P; i++) {
            part = 0.0;
            for (int j = 0; j <= P; j++)
                part += rule->cumulative[i][j] * g[j];
            sum += f[i] * down[e * P + i] * (total + part);
        }
        total += part;
    }
    return 2.0 * sum;
}
