/* SPDX-License-Identifier: MIT */
/* Slater's rules as functions, for those who need their parts. */
#ifndef MODEL_SLATER_H
#define MODEL_SLATER_H

#include "element/configuration.h"

/* Screening constant of one electron in subshell n, l of a configuration, in
 * electrons. J. C. Slater, Phys. Rev. 36, 57 (1930), rules 1-5. */
double slater_sigma(const struct configuration *configuration, int n, int l);

/* Effective quantum number n*: 1, 2, 3, 3.7, 4.0, 4.2 for n = 1…6 (same
 * paper); 4.3 for n = 7 is an extension (common practice, no source); 0 for
 * any other n. */
double slater_n_star(int n);

/* Total energy -Ry sum (Z_eff/n*)^2 over all electrons, in eV; same paper. All
 * n at most 7. */
double slater_energy_ev(int z, const struct configuration *configuration);

/* Allred-Rochow electronegativity 0.359 z_star/r^2 + 0.744, r in angstrom;
 * z_star counts the screening of every valence electron, the one at the
 * surface included: Slater's Z_eff less 0.35. A. L. Allred and E. G. Rochow,
 * J. Inorg. Nucl. Chem. 5, 264 (1958), doi 10.1016/0022-1902(58)80003-2. */
double allred_rochow(double z_star, double radius_angstrom);

#endif
