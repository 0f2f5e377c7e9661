/* SPDX-License-Identifier: MIT */
/* Exchange and correlation of the uniform gas: exchange of Dirac and Slater,
 * correlation of S. H. Vosko, L. Wilk, M. Nusair, Can. J. Phys. 58, 1200
 * (1980), doi 10.1139/p80-159, the fit to the Ceperley-Alder data. */
#ifndef ATOM_UNIFORM_H
#define ATOM_UNIFORM_H

/* Closed forms, evaluated here because they are most of the work of an LDA
 * cycle; libxc is the reference they are tested against. n points; rho in
 * electrons/bohr³; energy per electron and potential in hartree. c > 0 adds
 * the relativistic factor of MacDonald and Vosko, J. Phys. C 12, 2977 (1979),
 * doi 10.1088/0022-3719/12/15/007, to exchange (Coulomb and transverse part;
 * for each spin at twice its density). */
void uniform_lda(int n, const double *rho, double c, double *energy, double *v);
void uniform_lsd(int n, const double *up, const double *down, double c,
                 double *energy, double *v_up, double *v_down);

#endif
