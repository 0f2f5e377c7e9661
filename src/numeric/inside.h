/* SPDX-License-Identifier: MIT */
/* Insides of numeric/radial, shared by its files: radial.c sets a problem up
 * and does single steps, search.c finds levels and keeps them, read.c gives
 * them away. */
#ifndef NUMERIC_INSIDE_H
#define NUMERIC_INSIDE_H

#include <stdbool.h>

#include "numeric/lanes.h"

enum { RADIAL_GROUPS = RADIAL_LEVELS_MAX / LANES_MAX + RADIAL_CHANNELS };

/* Search of one level. Energies lo and hi with at most, and more than `nodes`
 * levels below. */
struct search {
    double lo, hi;
    bool open; /* hi is not known to be above */
    bool lost; /* must be found anew */
    int tries; /* energies that were no more than guessed */
};

struct radial {
    struct lane_group group[RADIAL_GROUPS];
    struct lane_work work;
    struct lane_channel channel[RADIAL_CHANNELS];
    const struct lane_kernel *kernel;
    double *sum; /* densities of a channel by lane, points × LANES_MAX */
    double *block;
    struct search search[RADIAL_LEVELS_MAX];
    struct radial_level level[RADIAL_LEVELS_MAX];
    int member[RADIAL_GROUPS][LANES_MAX]; /* level of each lane */
    int elements, count, groups;
    int room; /* groups that have arrays */
};

/* Factors the matrices of a group at its energies and does one inverse
 * iteration. */
void inside_step(struct radial *r, struct lane_group *g);

#endif
