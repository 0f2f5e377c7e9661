/* SPDX-License-Identifier: MIT */
/* Bound levels of the radial Schrödinger and Dirac equations in a given
 * central potential, many levels at a time.
 *
 * Scaled units: lengths y = Z r, energies in units of Z² hartree, so that the
 * charge at the origin is 1; a2 = (Z/c)², and a2 = 0 is exactly the
 * Schrödinger equation. The large component P and Q = c × small component obey
 *   P' = -(κ/y) P + m Q,  Q' = (κ/y) Q - (E - V) P,  m = 2 + a2 (E - V).
 * With P = √m u this is u'' = W(E) u, symmetric and of second order, and with
 * u = √(dy/dt) χ the derivative term is the same in every element of the mesh:
 *   -χ_tt + G(E) χ = 0.
 * The symmetric banded matrix of this form is factored at a trial energy; the
 * number of negative pivots is the number of levels below it. */
#ifndef NUMERIC_RADIAL_H
#define NUMERIC_RADIAL_H

#include <stdbool.h>

#include "base/status.h"
#include "numeric/mesh.h"

enum { RADIAL_LEVELS_MAX = 96, RADIAL_CHANNELS = 2 };

/* A level: κ (−(l+1) in the Schrödinger case), the number of nodes of P, the
 * potential it moves in, and the weight of its density in that channel. */
struct radial_level {
    int kappa;
    int nodes;
    int channel;
    double weight;
};

/* What became of a level in the last call. */
enum radial_state {
    RADIAL_FOUND,     /* energy and function belong to it */
    RADIAL_UNSETTLED, /* the count of levels below never fitted */
};

struct radial;

/* A solver on a mesh, which must outlive it. width: levels worked on at a
 * time, 2 or 4; 0 takes what suits the processor, and 4 counts as 2 where it
 * has no vectors of that size. NULL with STATUS_MEMORY. */
MUST_CHECK struct radial *radial_new(const struct mesh *mesh, int width,
                                     struct status *st);
void radial_free(struct radial *radial);

/* Starts a problem: a2 = (Z/c)² in [0, 1), the mesh elements in use, and
 * count <= RADIAL_LEVELS_MAX levels (each with nodes >= 0, kappa != 0). */
void radial_begin(struct radial *radial, double a2, int elements, int count,
                  const struct radial_level *levels);

/* Potential of a channel as q[points] = y V(y), with q -> -1 at the origin,
 * and its derivative as force[points] = y² dV/dy; where force is NULL, q is
 * differentiated. */
void radial_potential(struct radial *radial, int channel, const double *q,
                      const double *force);

/* Finds every level from nothing, each to about 1e-6 of its energy
 * (radial_settle goes on from there). Gives the number not found. */
int radial_find(struct radial *radial);

/* One step after a small change of the potentials: energies shifted to first
 * order, one inverse iteration, one Rayleigh quotient; a level whose count
 * does not fit is found anew. Gives the number not found. */
int radial_update(struct radial *radial);

/* Repeats radial_update with the potential unchanged until every energy
 * stands still to `tolerance`, relative. Gives the number not found. */
int radial_settle(struct radial *radial, double tolerance);

/* Of level i: state, energy, density P² + a2 Q² at the points (normalised,
 * zero beyond the reach of the level), and the exponent of P at the origin. */
enum radial_state radial_level_state(const struct radial *radial, int i);
double radial_energy(const struct radial *radial, int i);
void radial_density(const struct radial *radial, int i, double *density);
double radial_power(const struct radial *radial, int i);

/* P and Q = c × small component of level i at the points (Q NULL allowed; it
 * is also given for a2 = 0, where it is (P' - (l+1) P/y)/2). */
void radial_functions(const struct radial *radial, int i, double *p, double *q);

/* Sum of weight × density over the levels of a channel, at the points. */
void radial_total(const struct radial *radial, int channel, double *density);

/* Sum of weight × energy over all levels. */
double radial_sum(const struct radial *radial);

#endif
