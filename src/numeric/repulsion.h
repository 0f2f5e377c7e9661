/* SPDX-License-Identifier: MIT */
/* Slater's radial integrals of products of two functions with themselves. */
#ifndef NUMERIC_REPULSION_H
#define NUMERIC_REPULSION_H

#include "numeric/mesh.h"

enum { REPULSION_K_MAX = 6 };

/* Powers of y with the weights of the mesh; arrays of mesh->points. */
struct repulsion {
    const struct mesh *mesh;
    double *up[REPULSION_K_MAX + 1];   /* y^k dy/dt length/2 */
    double *down[REPULSION_K_MAX + 1]; /* y^(-k-1) weight_y */
    double *block;
};

/* Makes the tables for a mesh, which must outlive them; STATUS_MEMORY.
 * repulsion_clear frees. */
MUST_CHECK bool repulsion_init(struct repulsion *tables,
                               const struct mesh *mesh, struct status *st);
void repulsion_clear(struct repulsion *tables);

/* ∫∫ ρ(s) ρ(y) s_<^k / s_>^(k+1) ds dy over the first `elements` elements,
 * with ρ = a b at the points, 0 <= k <= REPULSION_K_MAX: F^k for a = b, G^k
 * else (J. C. Slater, Phys. Rev. 34, 1293 (1929), doi
 * 10.1103/PhysRev.34.1293). What lies below the first point is left out. */
double repulsion_integral(const struct repulsion *tables, int elements,
                          const double *a, const double *b, int k);

#endif
