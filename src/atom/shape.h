/* SPDX-License-Identifier: MIT */
/* What a p subshell that is not round changes in a functional of the density.
 */
#ifndef ATOM_SHAPE_H
#define ATOM_SHAPE_H

#include "atom/gradient.h"

/* A spherical atom with one p subshell in it, on the mesh scaled by Z; arrays
 * [elements * LOBATTO_ORDER + 1], by spin channel. rho, tau: spin densities
 * and kinetic energy densities of the whole atom. p: radial function of the
 * subshell, per √y, normalised; axial: 1 when it holds one electron more along
 * the axis than around it in that channel, -1 one less, 0 when it is round.
 * work: 20 arrays of that size. */
struct shape {
    const struct mesh *mesh;
    double Z;
    int elements;
    const double *rho[2], *tau[2], *p[2];
    int axial[2];
    double *work;
};

/* Changes of PBE exchange and revTPSS correlation energy, hartree, from the
 * round atom to the one with that axis. */
void shape_change(const struct shape *shape, struct gradient *gradient,
                  double *exchange, double *correlation);

#endif
