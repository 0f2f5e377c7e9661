/* SPDX-License-Identifier: MIT */
/* The levels of one open subshell lⁿ in intermediate coupling: Coulomb
 * repulsion and spin–orbit coupling diagonalised together, whatever their
 * ratio. Energies in the unit of what is passed in. */
#ifndef ATOM_LEVEL_H
#define ATOM_LEVEL_H

/* Lowest level of lⁿ (1 <= l <= 3) with H = ζ Σ l·s + Σ 1/r_ij, above the
 * lowest one with ζ = 0, which is that of Hund's term; <= 0. f[3]: Slater
 * integrals F², F⁴, F⁶, those above 2l not looked at. J. C. Slater, Quantum
 * Theory of Atomic Structure I (1960), chapter 13; E. U. Condon, G. H.
 * Shortley, The Theory of Atomic Spectra (1935), chapters 6 and 11. */
double atom_level_spin_orbit(int l, int electrons, double zeta,
                             const double f[3]);

#endif
