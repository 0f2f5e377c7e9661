/* SPDX-License-Identifier: MIT */
/* What is read off a self-consistent atom: radii, effective charges, curves.
 * Everything here asks for a solver in ATOM_CONVERGED. Lengths in bohr. */
#ifndef ATOM_RESULT_H
#define ATOM_RESULT_H

#include "atom/atom.h"

/* A subshell, or one of its levels. twice_j and spin as in struct atom_level;
 * both 0 for a whole subshell, whose energy is then the mean over its
 * electrons.
 * peak_radius: outermost maximum of the radial density D(r).
 * zeff_energy: n √(-2ε); zeff_size: mean radius of hydrogen's n l over this
 * one's; zeff_enclosed: Z minus the charge of all electrons inside
 * peak_radius (Gauss's law). */
struct atom_orbital {
    int n, l, twice_j, spin;
    double occ, energy;
    double mean_radius, peak_radius;
    double zeff_energy, zeff_size, zeff_enclosed;
};

/* Subshells in the order of the configuration; subshell 0 … count-1. */
int atom_subshell_count(const struct atom_solver *solver);
struct atom_orbital atom_subshell_at(const struct atom_solver *solver, int i);

/* peak_radius of the levels of subshell i with one j, both spins together; 0
 * when there are none. */
double atom_subshell_peak_of(const struct atom_solver *solver, int i,
                             int twice_j);

/* The same for level i of atom_level_at. */
struct atom_orbital atom_level_orbital(const struct atom_solver *solver, int i);

/* The outermost radius at which the density of all electrons is rho > 0
 * electrons/bohr³; 0 when it is nowhere that high. */
double atom_isodensity_radius(const struct atom_solver *solver, double rho);

enum atom_curve {
    ATOM_CURVE_DENSITY,  /* D(r) = 4πr²ρ, electrons/bohr */
    ATOM_CURVE_ENCLOSED, /* electrons within r */
    ATOM_CURVE_ZEFF,     /* Z minus all electrons within r */
};

/* Values out[n] at the radii r[n] >= 0, from the elements' polynomials.
 * subshell -1 stands for all electrons; it is not looked at for
 * ATOM_CURVE_ZEFF. */
void atom_curve_at(const struct atom_solver *solver, enum atom_curve curve,
                   int subshell, int n, const double *r, double *out);

/* Radius beyond which less than `electrons` of the density lie. */
double atom_extent(const struct atom_solver *solver, double electrons);

#endif
