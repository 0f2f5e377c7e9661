/* SPDX-License-Identifier: MIT */
#include "numeric/mesh.h"

#include <math.h>
#include <stddef.h>
#include <stdlib.h>
#include <string.h>

enum { P = LOBATTO_ORDER, ARRAYS = 6 };

/* The c of t = ln y + c √y: about as many points per node of a wave far out
 * as near the origin. */
static const double ROOT = 0.3;

double mesh_t(double y)
{
    return log(y) + ROOT * sqrt(y);
}

/* y at a given t, starting from a lower estimate of y. t is concave in ln y,
 * so Newton's method in ln y converges from there. */
static double y_at(double t, double y)
{
    for (int step = 0; step < 60; step++) {
        double s = sqrt(y);
        double d = (t - log(y) - ROOT * s) / (1.0 + 0.5 * ROOT * s);
        y *= exp(d);
        if (fabs(d) < 1e-15)
            break;
    }
    return y;
}

/* dy/dt and its logarithmic derivatives in closed form, with s = √y and
 * c = ROOT/2: dy/dt = y/(1+cs). */
static void make_point(struct mesh *mesh, int i)
{
    const double c = 0.5 * ROOT, y = mesh->y[i], s = sqrt(y), d = 1.0 + c * s;
    double slope = y / d, bend = (1.0 + 0.5 * c * s) / (d * d);
    double bend_y = -0.25 * c * (3.0 + c * s) / (s * d * d * d);
    mesh->slope[i] = slope;
    mesh->bend[i] = bend;
    mesh->schwarz[i] = 0.25 * bend * bend - 0.5 * slope * bend_y;
}

bool mesh_init(struct mesh *mesh, double first, double last, double length,
               struct status *st)
{
    memset(mesh, 0, sizeof *mesh);
    lobatto_make(&mesh->rule);
    for (int j = 0; j <= P; j++)
        for (int i = 0; i <= P; i++) {
            mesh->running[j][i] = mesh->rule.cumulative[i][j];
            mesh->rising[j][i] = mesh->rule.derivative[i][j];
        }
    mesh->first = first;
    mesh->length = length;
    double t0 = mesh_t(first);
    mesh->elements = (int)ceil((mesh_t(last) - t0) / length - 1e-9);
    mesh->points = mesh->elements * P + 1;
    size_t n = (size_t)mesh->points;
    double *block = calloc(ARRAYS * n, sizeof *block);
    if (!block)
        return status_fail(st, STATUS_MEMORY,
                           "out of memory for a radial mesh of %d points",
                           mesh->points);
    mesh->y = block;
    mesh->slope = block + n;
    mesh->bend = block + 2 * n;
    mesh->schwarz = block + 3 * n;
    mesh->weight = block + 4 * n;
    mesh->weight_y = block + 5 * n;
    double y = first;
    for (int e = 0; e < mesh->elements; e++) {
        for (int i = e == 0 ? 0 : 1; i <= P; i++) {
            double t = t0 + length * (e + 0.5 * (mesh->rule.x[i] + 1.0));
            mesh->y[e * P + i] = y = y_at(t, y);
            make_point(mesh, e * P + i);
        }
        for (int i = 0; i <= P; i++)
            mesh->weight[e * P + i] += 0.5 * length * mesh->rule.w[i];
    }
    for (int i = 0; i < mesh->points; i++)
        mesh->weight_y[i] = mesh->weight[i] * mesh->slope[i];
    return true;
}

void mesh_clear(struct mesh *mesh)
{
    free(mesh->y);
    memset(mesh, 0, sizeof *mesh);
}

int mesh_elements_to(const struct mesh *mesh, double last)
{
    double span = mesh_t(last) - mesh_t(mesh->first);
    int elements = (int)ceil(span / mesh->length - 1e-9);
    if (elements < 1)
        return 1;
    return elements < mesh->elements ? elements : mesh->elements;
}

double mesh_value(const struct mesh *mesh, const double *f, double y)
{
    double at = (mesh_t(y) - mesh_t(mesh->first)) / mesh->length;
    int e = (int)at;
    if (e >= mesh->elements)
        e = mesh->elements - 1;
    double basis[LOBATTO_POINTS], sum = 0.0;
    lobatto_basis(&mesh->rule, 2.0 * (at - e) - 1.0, basis);
    for (int i = 0; i <= P; i++)
        sum += basis[i] * f[e * P + i];
    return sum;
}

/* Two numbers at a time, anywhere in memory. */
typedef double pair __attribute__((vector_size(16), aligned(8), may_alias));
enum { PAIRS = (LOBATTO_POINTS + 1) / 2 };

/* out = Σ_j column j × g[j], with the columns padded. */
static void apply(const double column[LOBATTO_POINTS][LOBATTO_POINTS + 1],
                  const double *g, double out[LOBATTO_POINTS + 1])
{
    pair total[PAIRS] = {{0}};
    for (int j = 0; j <= P; j++) {
        const pair *c = (const pair *)(const void *)column[j];
        _Pragma("GCC unroll 8") for (int i = 0; i < PAIRS; i++)
        {
            total[i] += c[i] * g[j];
        }
    }
    for (int i = 0; i < PAIRS; i++)
        ((pair *)(void *)out)[i] = total[i];
}

void mesh_derivative(const struct mesh *mesh, int elements, const double *f,
                     double *out)
{
    double factor = 2.0 / mesh->length, slope[LOBATTO_POINTS + 1];
    out[0] = 0.0;
    for (int e = 0; e < elements; e++) {
        apply(mesh->rising, f + (ptrdiff_t)e * P, slope);
        double *at = out + (ptrdiff_t)e * P;
        at[0] = e > 0 ? 0.5 * (at[0] + factor * slope[0]) : factor * slope[0];
        for (int i = 1; i <= P; i++)
            at[i] = factor * slope[i];
    }
}

double mesh_inner(const struct mesh *mesh, double value, double derivative,
                  double power)
{
    /* f = value (y/y0)^power (1 + b (y - y0)/y0) */
    if (fabs(value) < 1e-300)
        return 0.0;
    double b = derivative / mesh->slope[0] * mesh->first / value - power;
    return value * mesh->first *
           ((1.0 - b) / (power + 1.0) + b / (power + 2.0));
}

void mesh_running(const struct mesh *mesh, const double g[LOBATTO_POINTS],
                  double sum[LOBATTO_POINTS + 1])
{
    apply(mesh->running, g, sum);
}

void mesh_cumulate(const struct mesh *mesh, int elements, const double *f,
                   double inner, double *out)
{
    double total = inner;
    out[0] = inner;
    for (int e = 0; e < elements; e++) {
        double g[LOBATTO_POINTS], sum[LOBATTO_POINTS + 1];
        for (int j = 0; j <= P; j++)
            g[j] = 0.5 * mesh->length * mesh->slope[e * P + j] * f[e * P + j];
        mesh_running(mesh, g, sum);
        for (int i = 1; i <= P; i++)
            out[e * P + i] = total + sum[i];
        total = out[(ptrdiff_t)(e + 1) * P];
    }
}
