/* SPDX-License-Identifier: MIT */
#include "numeric/repulsion.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

enum { P = LOBATTO_ORDER };

bool repulsion_init(struct repulsion *tables, const struct mesh *mesh,
                    struct status *st)
{
    size_t n = (size_t)mesh->points;
    memset(tables, 0, sizeof *tables);
    double *at = calloc(n * 2 * (REPULSION_K_MAX + 1), sizeof *at);
    if (!at)
        return status_fail(st, STATUS_MEMORY,
                           "out of memory for Slater integrals, %zu points", n);
    tables->mesh = mesh;
    tables->block = at;
    for (int k = 0; k <= REPULSION_K_MAX; k++, at += 2 * n) {
        tables->up[k] = at;
        tables->down[k] = at + n;
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

void repulsion_clear(struct repulsion *tables)
{
    free(tables->block);
    memset(tables, 0, sizeof *tables);
}

/* The integrand is symmetric, so twice the half with s < y is enough: one
 * running integral over the elements. */
double repulsion_integral(const struct repulsion *tables, int elements,
                          const double *a, const double *b, int k)
{
    const double *up = tables->up[k], *down = tables->down[k];
    double total = 0.0, sum = 0.0;
    for (int e = 0; e < elements; e++) {
        double f[LOBATTO_POINTS], g[LOBATTO_POINTS], part[LOBATTO_POINTS + 1];
        for (int j = 0; j <= P; j++) {
            int at = e * P + j;
            f[j] = a[at] * b[at];
            g[j] = f[j] * up[at];
        }
        mesh_running(tables->mesh, g, part);
        for (int i = 1; i <= P; i++)
            sum += f[i] * down[e * P + i] * (total + part[i]);
        total += part[P];
    }
    return 2.0 * sum;
}
