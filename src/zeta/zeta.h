/* SPDX-License-Identifier: MIT */
/* The single-zeta atom: Hartree-Fock in a minimal basis of Slater-type
 * orbitals with every exponent at its best value, for any atom or ion.
 * Method: Clementi, Raimondi, J. Chem. Phys. 38, 2686 (1963), doi
 * 10.1063/1.1733573. Non-relativistic; hartree and bohr throughout.
 *
 *     struct zeta *work = zeta_new(&st);
 *     if (zeta_begin(work, &problem))
 *         while (zeta_step(work))
 *             ;
 *     zeta_read(work, &result);
 *     zeta_free(work);
 *
 * Nothing allocates between zeta_new and zeta_free; a work space serves any
 * number of atoms one after the other. */
#ifndef ZETA_ZETA_H
#define ZETA_ZETA_H

#include <stdbool.h>

#include "base/status.h"
#include "element/configuration.h"

/* State, short text. Values stand in the result for SOLVED and UNBOUND alone.
 */
#define ZETA_STATE_LIST(X)                                                     \
    X(ZETA_RUNNING, "not finished")                                            \
    X(ZETA_SOLVED, "solved")                                                   \
    X(ZETA_UNBOUND, "not bound in this minimal basis")                         \
    X(ZETA_ESCAPED, "an electron escapes in this minimal basis")               \
    X(ZETA_DISORDERED, "shells out of order")                                  \
    X(ZETA_REFUSED, "configuration outside this method")                       \
    X(ZETA_UNCONVERGED, "not converged")

enum zeta_state {
#define ZETA_ENUM(state, text) state,
    ZETA_STATE_LIST(ZETA_ENUM)
#undef ZETA_ENUM
        ZETA_STATE_COUNT
};

/* Short text of a state, never NULL. */
const char *zeta_state_text(enum zeta_state state);

/* Which energy is made least. */
enum zeta_coupling {
    ZETA_HUND,    /* the term of highest S, then highest L */
    ZETA_AVERAGE, /* the average of the configuration */
};

struct zeta_problem {
    int z;                                     /* nuclear charge, 1 … Z_MAX */
    const struct configuration *configuration; /* read in zeta_begin only */
    enum zeta_coupling coupling;
    /* NULL, or for the one open subshell of the configuration the coefficients
     * of F^0, F^2, F^4, F^6 of another term (Condon and Shortley's tables);
     * F^0's is always q(q-1)/2. Example: p3 2P is {3, 0, 0, 0}. Refused when
     * not exactly one subshell is open. Read in zeta_begin only. */
    const double *term;
};

/* One subshell of the result. P_nl is the canonical Hartree-Fock orbital of
 * the closed subshells of this l, or the open orbital. */
struct zeta_subshell {
    int n, l, occ;
    double zeta;   /* exponent of its function, 1/bohr */
    double z_eff;  /* n zeta, elementary charges */
    double energy; /* orbital energy, hartree; Koopmans: minus it estimates an
                      ionization energy within some eV */
    double peak_radius; /* maximum of the radial density P_nl^2, bohr */
    double mean_radius; /* expectation value of r, bohr */
    /* over the normalised functions of the subshells l+1 l, l+2 l, …, in the
     * phase that makes the tail of P_nl positive */
    double coefficient[N_MAX];
};

#define ZETA_REASON_MAX 160

struct zeta_result {
    enum zeta_state state;
    char reason[ZETA_REASON_MAX]; /* one sentence unless solved */
    bool anion; /* more electrons than protons: a solution is no proof that
                   the electron is bound */
    int count;  /* subshells, in the order of the configuration */
    struct zeta_subshell shells[SUBSHELL_MAX];
    double total;         /* energy, hartree */
    double kinetic;       /* hartree */
    double virial;        /* -V/T, 2 at a minimum */
    double gradient_norm; /* root of the sum of squares over ln zeta and the
                             rotations, hartree */
    int evaluations;      /* of energy and gradient */
};

struct zeta; /* work space */

/* A work space; NULL with STATUS_MEMORY. */
struct zeta *zeta_new(struct status *st);
void zeta_free(struct zeta *work);

/* Starts an atom. False when it is refused; zeta_read says why: more than one
 * open subshell of one l or one that is not the outermost of its l (core
 * holes, excited states of the same l), a missing inner subshell, a fraction
 * of an electron, no electrons, a term that does not fit. */
MUST_CHECK bool zeta_begin(struct zeta *work,
                           const struct zeta_problem *problem);

/* One evaluation of energy and gradient and the choice of the next exponents.
 * True while there is more to do. */
bool zeta_step(struct zeta *work);

/* What is known now. */
void zeta_read(const struct zeta *work, struct zeta_result *result);

/* After SOLVED or UNBOUND: whether the Hessian in all variables but the common
 * scale (exact already) is positive, by central differences of the gradient:
 * twice as many evaluations as there are variables. *lowest receives its least
 * eigenvalue, hartree. The result stays as it was. */
MUST_CHECK bool zeta_is_minimum(struct zeta *work, double *lowest);

/* P_nl(r) of a subshell of a result, 1/sqrt(bohr); r in bohr, >= 0. */
double zeta_orbital(const struct zeta_result *result, int shell, double r);

#endif
