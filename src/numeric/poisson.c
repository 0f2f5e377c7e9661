/* SPDX-License-Identifier: MIT */
#include "numeric/poisson.h"

#include <math.h>

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

void poisson_multipole(const struct mesh *mesh, int elements, const double *D,
                       double power, int k, double *field, double *scratch)
{
    int points = elements * P + 1;
    double *below = scratch + points;
    for (int i = 0; i < points; i++)
        scratch[i] = D[i] * pow(mesh->y[i], k);
    double inner =
        mesh_inner(mesh, scratch[0], first_slope(mesh, scratch), power + k);
    mesh_cumulate(mesh, elements, scratch, inner, below);
    for (int i = 0; i < points; i++)
        scratch[i] = D[i] * pow(mesh->y[i], -k - 1);
    mesh_cumulate(mesh, elements, scratch, 0.0, field);
    double whole = field[points - 1];
    for (int i = 0; i < points; i++) {
        double y = mesh->y[i];
        field[i] = below[i] * pow(y, -k) + (whole - field[i]) * pow(y, k + 1);
    }
}
