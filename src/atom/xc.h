/* SPDX-License-Identifier: MIT */
/* Exchange and correlation of a spherical density. */
#ifndef ATOM_XC_H
#define ATOM_XC_H

#include <stdbool.h>

#include "base/status.h"
#include "numeric/mesh.h"

/* LDA and LSD: uniform-gas exchange with the correlation of Vosko, Wilk,
 * Nusair, Can. J. Phys. 58, 1200 (1980), doi 10.1139/p80-159 (the fit to the
 * Ceperley-Alder data). PBE: Perdew, Burke, Ernzerhof, Phys. Rev. Lett. 77,
 * 3865 (1996), doi 10.1103/PhysRevLett.77.3865, spin-polarised. PBE_VWN: the
 * same with the VWN fit as its local correlation. */
enum atom_functional { ATOM_LDA, ATOM_LSD, ATOM_PBE, ATOM_PBE_VWN };

/* One or two spin channels. */
int xc_channels(enum atom_functional functional);

/* Closed forms, evaluated here because they are most of the work of an LDA
 * cycle; libxc is the reference they are tested against. n points; rho in
 * electrons/bohr³; energy per electron and potential in hartree. c > 0 adds
 * the relativistic factor of MacDonald and Vosko, J. Phys. C 12, 2977 (1979),
 * doi 10.1088/0022-3719/12/15/007, to exchange (Coulomb and transverse part;
 * for each spin at twice its density). */
void xc_lda(int n, const double *rho, double c, double *energy, double *v);
void xc_lsd(int n, const double *up, const double *down, double c,
            double *energy, double *v_up, double *v_down);

/* Gradient functionals, through libxc, on a mesh scaled by Z. */
struct xc;
MUST_CHECK struct xc *xc_new(const struct mesh *mesh, struct status *st);
void xc_free(struct xc *xc);

/* rho[2][points] spin densities; energy per electron and potentials. */
MUST_CHECK bool xc_pbe(struct xc *xc, enum atom_functional functional, double Z,
                       int elements, const double *const rho[2], double *energy,
                       double *const v[2], struct status *st);

#endif
