/* SPDX-License-Identifier: MIT */
/* The radial mesh: equal spectral elements in t = ln y + c √y, where y is the
 * distance in units that make the charge at the origin 1. One mesh serves
 * every charge: only the number of elements in use differs. */
#ifndef NUMERIC_MESH_H
#define NUMERIC_MESH_H

#include <stdbool.h>

#include "base/status.h"
#include "numeric/lobatto.h"

/* Arrays have `points` = elements * LOBATTO_ORDER + 1 entries; element e has
 * the points e*LOBATTO_ORDER … (e+1)*LOBATTO_ORDER. */
struct mesh {
    struct lobatto rule;
    /* cumulative and derivative of the rule, by column and padded */
    double running[LOBATTO_POINTS][LOBATTO_POINTS + 1];
    double rising[LOBATTO_POINTS][LOBATTO_POINTS + 1];
    int elements, points;
    double first;  /* y of the first point */
    double length; /* of an element, in t */
    double *y;
    double *slope;    /* dy/dt */
    double *bend;     /* (d²y/dt²)/(dy/dt) */
    double *schwarz;  /* ¾ bend² - ½ (d³y/dt³)/(dy/dt) */
    double *weight;   /* Σ weight f = ∫ f dt over all elements */
    double *weight_y; /* Σ weight_y f = ∫ f dy */
};

/* Makes a mesh from y = first to at least y = last (0 < first < last) with
 * elements `length` long in t. Fails with STATUS_MEMORY. mesh_clear frees. */
MUST_CHECK bool mesh_init(struct mesh *mesh, double first, double last,
                          double length, struct status *st);
void mesh_clear(struct mesh *mesh);

/* Elements, 1…mesh->elements, that reach y = last (or all there are). */
int mesh_elements_to(const struct mesh *mesh, double last);

/* t of a y > 0. */
double mesh_t(double y);

/* Value at y of a function given at the points (the interpolation polynomial
 * of the element that holds y, which must lie within the mesh). */
double mesh_value(const struct mesh *mesh, const double *f, double y);

/* d f / dt at the points of the first `elements` elements; where two elements
 * meet, the mean of both sides. */
void mesh_derivative(const struct mesh *mesh, int elements, const double *f,
                     double *out);

/* Integral over the part below the first point of a function that goes like
 * y^power (1 + b y) there, from its value and its derivative d f/dt at the
 * first point. power > -1. */
double mesh_inner(const struct mesh *mesh, double value, double derivative,
                  double power);

/* out[i] = inner + ∫ f dy from the first point to point i. */
void mesh_cumulate(const struct mesh *mesh, int elements, const double *f,
                   double inner, double *out);

/* The running integral within one element, of values g (integrand × dx) at
 * its points: sum[i] = integral from its left end to point i. sum has room for
 * one number more. */
void mesh_running(const struct mesh *mesh, const double g[LOBATTO_POINTS],
                  double sum[LOBATTO_POINTS + 1]);

#endif
