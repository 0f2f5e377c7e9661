/* SPDX-License-Identifier: MIT */
/* Hartree-Fock energy of an atom in a minimal Slater-type basis, and its
 * gradient in the exponents and in the rotation of the open orbitals. */
#ifndef ZETA_ENERGY_H
#define ZETA_ENERGY_H

#include <stdbool.h>

#include "element/subshell.h"
#include "zeta/coupling.h"
#include "zeta/slater.h"

#define BLOCK_MAX N_MAX         /* subshells of one l */
#define BLOCK_COUNT (L_MAX + 1) /* s, p, d, f */
#define ENERGY_SHELL_MAX 26     /* all n l with n <= N_MAX, l <= L_MAX */
#define ENERGY_VARIABLE_MAX 52  /* an exponent and a rotation for each */
#define CHARGE_MAX 116          /* pairs of one l, all l, each N even */
#define PAIR_MAX 72             /* pairs of two l, each N made even */

/* The subshells of one l: n = l+1, l+2, …, all full but perhaps the last. */
struct energy_block {
    int count;
    int first; /* its first subshell in energy_atom.n */
    int full;  /* 4l+2 */
    int open;  /* electrons in the last subshell when it is open, else 0 */
    int kappa; /* first rotation variable, when open and count > 1 */
    /* within[i]: coefficient of F^(2i) of the open subshell beyond what the
     * closed-shell formula gives already */
    double within[COUPLING_ORDERS];
};

/* What is between two open subshells beyond the closed-shell formula:
 * coefficients of F^(2i) and of G^(|l1-l2|+2i). */
struct energy_between {
    bool direct_any, exchange_any;
    double direct[COUPLING_ORDERS], exchange[COUPLING_ORDERS];
};

/* The problem: everything that does not move with the exponents. */
struct energy_atom {
    double Z;
    int shells;    /* subshells, ordered by l, then n */
    int variables; /* ln zeta of each subshell, then the rotations */
    int n[ENERGY_SHELL_MAX], l[ENERGY_SHELL_MAX], occ[ENERGY_SHELL_MAX];
    struct energy_block block[BLOCK_COUNT];
    struct energy_between between[BLOCK_COUNT][BLOCK_COUNT]; /* l1 < l2 */
};

/* Pair densities N_i N_j r^N e^(-ar), N = n_i + n_j, a = zeta_i + zeta_j, in
 * order of N; each N stands an even number of times, filled up with empty
 * entries (m = 0), so that two neighbours share it. */
struct energy_pairs {
    int count;
    int N[CHARGE_MAX];
    int i[CHARGE_MAX], j[CHARGE_MAX]; /* subshells in energy_atom.n */
    int b[CHARGE_MAX], d[CHARGE_MAX]; /* the same, counted in their blocks */
    int at[CHARGE_MAX];               /* the same pair in `charges` */
    double m[CHARGE_MAX];             /* 1 for i = j, 2 otherwise, 0 empty */
    double norm[CHARGE_MAX];          /* s in units of the powers below */
    _Alignas(16) double a[CHARGE_MAX];
    _Alignas(16) double s[CHARGE_MAX]; /* charge: the overlap if one l */
    _Alignas(16) double w[CHARGE_MAX]; /* dE/d ln s */
    _Alignas(16) double v[CHARGE_MAX]; /* dE/d ln a at fixed s */
};

/* One-electron parts and density of a block at the last evaluation. Orbitals
 * are over the normalised functions of the block. */
struct energy_matrices {
    double linv[BLOCK_MAX][BLOCK_MAX]; /* inverse Cholesky factor of S */
    double density[BLOCK_MAX][BLOCK_MAX];
    double fock[BLOCK_MAX][BLOCK_MAX]; /* dE/d density, closed formula */
    double kinetic[BLOCK_MAX][BLOCK_MAX];
    double attraction[BLOCK_MAX][BLOCK_MAX]; /* of the nucleus */
    double turn[BLOCK_MAX]; /* the open orbital over Schmidt's orbitals */
    double open[BLOCK_MAX]; /* the open orbital over the functions */
    double pull[BLOCK_MAX]; /* dE/d open of the terms beyond that formula */
};

/* Work space and result of an evaluation. */
struct energy {
    struct energy_atom atom;
    struct slater_tables tables;
    double zeta[ENERGY_SHELL_MAX]; /* 1/bohr, after the exact scaling */
    double total, kinetic;         /* hartree, after the exact scaling */
    double gradient[ENERGY_VARIABLE_MAX];
    struct energy_matrices matrices[BLOCK_COUNT];
    struct energy_pairs charges;
    struct energy_pairs pairs[BLOCK_COUNT][BLOCK_COUNT]; /* l1 <= l2 */
    int charge_at[ENERGY_SHELL_MAX][ENERGY_SHELL_MAX];
    double power[ENERGY_SHELL_MAX];         /* (2 zeta)^(n+1/2) */
    _Alignas(16) double charge[CHARGE_MAX]; /* electrons in each pair */
    double kinetic_charge[CHARGE_MAX];      /* kinetic energy over s */
    double kinetic_i[CHARGE_MAX], kinetic_j[CHARGE_MAX]; /* its derivatives */
    /* integrals of unit charges, row >= column, and a times their derivative
     * by the exponent of the row */
    _Alignas(16) double coulomb[CHARGE_MAX][CHARGE_MAX];
    _Alignas(16) double coulomb_a[CHARGE_MAX][CHARGE_MAX];
    /* sums over k > 0 for one pair of l: [0] with the weights of the closed
     * formula, [1] with those of the open subshells */
    _Alignas(16) double sum[2][PAIR_MAX][PAIR_MAX];
    _Alignas(16) double sum_a[2][PAIR_MAX][PAIR_MAX];
};

/* Lays out the pair lists for e->atom, whose subshells, blocks and
 * coefficients the caller has filled. Once per atom. */
void energy_prepare(struct energy *e);

/* Energy and gradient at the variables x[atom.variables]: ln zeta of every
 * subshell, then the rotations. All exponents are then scaled by the one
 * factor that fulfils the virial theorem (Löwdin, J. Mol. Spectrosc. 3, 46
 * (1959), doi 10.1016/0022-2852(59)90006-2), exactly and at no cost; x
 * receives the scaled values, and total, kinetic, zeta and gradient belong to
 * them. False when the overlap is numerically singular. */
bool energy_evaluate(struct energy *e, double x[]);

#endif
