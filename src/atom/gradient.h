/* SPDX-License-Identifier: MIT */
/* Functionals of the density gradient and of the kinetic energy density, all
 * through libxc, for a spherical spin density on the mesh of an atom. */
#ifndef ATOM_GRADIENT_H
#define ATOM_GRADIENT_H

#include <stdbool.h>

#include "base/status.h"
#include "numeric/mesh.h"

struct gradient;

/* Work space for densities on a mesh; NULL with STATUS_MEMORY, or STATUS_DATA
 * when the library lacks a functional. */
MUST_CHECK struct gradient *gradient_new(const struct mesh *mesh,
                                         struct status *st);
void gradient_free(struct gradient *gradient);

/* Takes the spin densities (electrons/bohr³, each [points in use]) of an atom
 * whose mesh is scaled by Z. */
void gradient_density(struct gradient *gradient, double Z, int elements,
                      const double *major, const double *minor);

/* PBE exchange: J. P. Perdew, K. Burke, M. Ernzerhof, Phys. Rev. Lett. 77,
 * 3865 (1996), doi 10.1103/PhysRevLett.77.3865. Energy per electron of the
 * density given last, hartree. */
void gradient_exchange(struct gradient *gradient, double *energy);

/* PBE correlation; with vwn its local part is the Vosko-Wilk-Nusair fit. */
void gradient_correlation(struct gradient *gradient, bool vwn, double *energy);

/* Both, with their potentials for the two channels. */
void gradient_potential(struct gradient *gradient, bool vwn, double *energy,
                        double *major, double *minor);

/* Correlation of revised TPSS: J. P. Perdew et al., Phys. Rev. Lett. 103,
 * 026403 (2009), doi 10.1103/PhysRevLett.103.026403. tau: kinetic energy
 * densities of the channels, ½ Σ |∇φ|², hartree/bohr³; where rounding has put
 * one below |∇ρ|²/8ρ it counts as that. */
void gradient_meta_correlation(struct gradient *gradient, const double *major,
                               const double *minor, double *energy);

/* PBE exchange and revised TPSS correlation, energies per electron, at points
 * that are given directly: rho[2n] spin densities, grad2[3n] products of their
 * gradients (aa, ab, bb), tau[2n] kinetic energy densities; n at most the
 * points of the mesh. What they cannot be together is mended in place, as in
 * gradient_meta_correlation. */
void gradient_at(struct gradient *gradient, int n, double *rho, double *grad2,
                 double *tau, double *exchange, double *correlation);

#endif
