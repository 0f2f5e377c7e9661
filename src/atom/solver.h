/* SPDX-License-Identifier: MIT */
/* Insides of the atom solver, shared by the files of this folder. */
#ifndef ATOM_SOLVER_H
#define ATOM_SOLVER_H

#include "atom/atom.h"
#include "atom/gradient.h"
#include "numeric/mesh.h"
#include "numeric/mixer.h"
#include "numeric/radial.h"

enum { ATOM_CHANNELS = 2, ATOM_SPACES = 4 };

/* A mesh and what is sized by it; one for each equation and kind of
 * functional, made when first needed. Arrays are mesh.points long. */
struct atom_space {
    struct mesh mesh;
    struct radial *radial;
    struct mixer *mixer;
    struct gradient *gradient; /* made when first needed */
    double *q;      /* y V of the trial potential, channel after channel; with
                       the Dirac equation y² dV/dy in the same way behind it */
    double *out;    /* the same from the new density */
    double *weight; /* metric of the mixing */
    double *D[ATOM_CHANNELS]; /* radial density per y, electrons */
    double *total;            /* sum of both */
    double *enclosed;         /* electrons within */
    double *field;            /* y times their potential */
    double *rho[ATOM_CHANNELS];
    double *energy; /* exchange-correlation energy per electron */
    double *v[ATOM_CHANNELS];
    double *scratch;
    double *block;
};

struct atom_solver {
    struct atom_space space[ATOM_SPACES]; /* by equation and functional */
    struct atom_space *now;
    int Z;
    struct configuration configuration;
    struct atom_options options;
    double c;     /* speed of light */
    double a2;    /* (Z/c)², 0 for Schrödinger */
    double power; /* of the density at the origin */
    double electrons;
    int channels, elements, count;
    struct radial_level level[RADIAL_LEVELS_MAX];
    struct atom_level label[RADIAL_LEVELS_MAX];
    enum atom_state state;
    int cycles, culprit;
    int above[RADIAL_LEVELS_MAX]; /* cycles that ended with energy >= 0 */
    bool warm;                    /* started from another solution */
    bool found;                   /* levels have been found once */
    double residual, last_total;
    struct atom_energy result;
};

/* Puts a starting potential into space->q. */
void atom_start_potential(struct atom_solver *solver);

/* Makes space->gradient if it is not there; STATUS_MEMORY, STATUS_DATA. */
MUST_CHECK bool space_gradient(struct atom_space *space, struct status *st);

/* Integral over y of a density times a potential-like factor, both at the
 * points, that together go like y^power at the origin. */
double space_integral(const struct atom_solver *solver, const double *f,
                      double power);

#endif
