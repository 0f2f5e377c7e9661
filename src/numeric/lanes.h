/* SPDX-License-Identifier: MIT */
/* Insides of numeric/radial: what its kernels, one per vector width, share.
 * Levels are worked on in groups, one level per lane. */
#ifndef NUMERIC_LANES_H
#define NUMERIC_LANES_H

#include "numeric/radial.h"

enum { LANES_MAX = 4, LANES_ALIGN = 32 };

/* Levels that share a potential; arrays of points × LANES_MAX,
 * lane fastest. */
struct lane_group {
    int channel, used; /* lanes in use; the others repeat the last one */
    int elements;      /* of the mesh, as far as these levels reach */
    int filled;        /* elements that hold other than zeros */
    double reached;    /* highest energy that `elements` was found for */
    _Alignas(LANES_ALIGN) double kappa[LANES_MAX];
    _Alignas(LANES_ALIGN) double centrifugal[LANES_MAX]; /* κ(κ+1) */
    _Alignas(LANES_ALIGN) double energy[LANES_MAX];
    _Alignas(LANES_ALIGN) double slope[LANES_MAX]; /* χ_t/χ + F, first point */
    _Alignas(LANES_ALIGN) double inner[LANES_MAX]; /* ∫ below / first value */
    /* Results of a step. */
    _Alignas(LANES_ALIGN) double below[LANES_MAX]; /* levels below energy */
    _Alignas(LANES_ALIGN) double shift[LANES_MAX]; /* Rayleigh quotient - E */
    double *chi;                                   /* function */
    double *density;                               /* normalised P² + a2 Q² */
};

/* A potential, as the kernels want it. In all arrays with "hw" the factor is
 * half the element length times the mesh weight. Those with V' are used for
 * a2 > 0 only. */
struct lane_channel {
    double *v;      /* V */
    double *base;   /* hw (schwarz + 2 slope² V) */
    double *moved;  /* weight_y × change of V since the last potential */
    double *radial; /* 2 hw slope² V'/y */
    double *bent;   /* hw slope bend V' */
    double *square; /* hw slope² V'² */
    double *beta;   /* slope V' */
};

struct lane_work {
    double a2;
    const struct mesh *mesh;
    double *stiffness;   /* lower triangle, each entry × width */
    double *derivative;  /* d/dx matrix */
    double *schwarz;     /* hw schwarz */
    double *mass;        /* hw slope² */
    double *centrifugal; /* hw slope²/y² */
    double *square;      /* 2 weight slope² */
    double *origin;      /* hw dF/dt in the field of the origin */
    double *factor;      /* of the matrix, elements × FACTOR × width */
    double *norm;        /* -dG/dE, points × width */
    double *right;       /* right-hand side, points × width */
};

enum {
    LANES_TRIANGLE = LOBATTO_POINTS * (LOBATTO_POINTS + 1) / 2,
    LANES_FACTOR = LANES_TRIANGLE
};

struct lane_kernel {
    int width; /* lanes worked on at a time: the stride of lane_work's arrays */
    /* Elements that the group needs at its energies, at most `limit`. */
    int (*reach)(const struct lane_work *, const struct lane_channel *,
                 const struct lane_group *, int limit);
    /* WKB phase ∫ √(-G) dt of each lane at its energy, into below[]. */
    void (*phase)(const struct lane_work *, const struct lane_channel *,
                  struct lane_group *, int elements);
    /* Factors at energy[], one inverse iteration: chi, below, shift. */
    void (*step)(const struct lane_work *, const struct lane_channel *,
                 struct lane_group *);
    /* Brings chi to size 1 or so. */
    void (*rescale)(const struct lane_work *, struct lane_group *);
    /* Normalises chi, fills density. */
    void (*density)(const struct lane_work *, const struct lane_channel *,
                    struct lane_group *);
    /* Adds weight[lane] × density to sum, points × LANES_MAX; the first time
     * sum is set. */
    void (*add)(const struct lane_group *, const double *weight, bool first,
                int points, double *sum);
    /* First-order change of the energies, into shift[]. */
    void (*moved)(const struct lane_work *, const struct lane_channel *,
                  struct lane_group *);
};

/* Two lanes in portable code; four where the processor has them. Results are
 * the same to the last bit: levels are grouped in the same way, and each lane
 * does the same operations. */
extern const struct lane_kernel lanes_two;
#if defined(__x86_64__)
extern const struct lane_kernel lanes_four;
#endif

#endif
