/* SPDX-License-Identifier: MIT */
#include "numeric/poisson.h"

enum { P = LOBATTO_ORDER };

/* d f/dt at the first point. */
static double first_slope(const struct mesh *mesh, const double *f)
{
    double sum = 0.0;
    for (int j = 0; j <= P; j++)
        sum += mesh->rule.derivative[0][j] * f[j];
    return 2.0 / mesh->length * sum;
}

double poisson_solve(const struct mesh *mesh, int elements, const double *D,
                     double power, double *enclosed, double *field,
                     double *scratch)
{
    int points = elements * P + 1;
    double inner = mesh_inner(mesh, D[0], first_slope(mesh, D), power);
    mesh_cumulate(mesh, elements, D, inner, enclosed);
    for (int i = 0; i < points; i++)
        scratch[i] = D[i] / mesh->y[i];
    mesh_cumulate(mesh, elements, scratch, 0.0, field);
    double whole = field[points - 1];
    for (int i = 0; i < points; i++)
        field[i] = enclosed[i] + mesh->y[i] * (whole - field[i]);
    return enclosed[points - 1];
}
