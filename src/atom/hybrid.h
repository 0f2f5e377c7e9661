/* SPDX-License-Identifier: MIT */
/* A better total energy for a self-consistent spin-polarised atom, evaluated
 * once on its density and orbitals, with no constant fitted to atoms:
 *   E = E_kin + E_nuc + E_coul + ¾ E_x[PBE] + ¼ (E_x[exact] + ΔLS)
 *       + E_c[revTPSS] + ΔP.
 * ΔP takes an open p subshell for what it is: not round. Hund's determinant in
 * real p orbitals has one (p1, p4) or is short of one (p2, p5) along an axis;
 * its repulsion, PBE exchange and revTPSS correlation differ from those of the
 * average: ΔP = ¾ (ΔE_coul + ΔE_x[PBE]) + ΔE_c[revTPSS]. The remaining quarter
 * is exact, and there Coulomb and exchange cancel for p.
 * The quarter is that of J. P. Perdew, M. Ernzerhof, K. Burke, J. Chem. Phys.
 * 105, 9982 (1996), doi 10.1063/1.472933. Hartree. */
#ifndef ATOM_HYBRID_H
#define ATOM_HYBRID_H

#include "atom/atom.h"
#include "element/species.h"

struct hybrid_energy {
    double total;
    bool sound;             /* the correlation is what it must look like */
    double with_pbe;        /* the same with E_c[PBE] in place of E_c[revTPSS],
                               to be taken when it is not sound */
    double lsd, pbe;        /* totals on the same density */
    double exchange_pbe;    /* E_x[PBE] */
    double exchange_exact;  /* E_x of spherically averaged shells */
    double correlation;     /* E_c[revTPSS] */
    double correlation_pbe; /* E_c[PBE] */
    double term;            /* ΔLS */
    double shape;           /* ΔP */
};

/* Work space, made for the first solver it is used with and grown when
 * needed. NULL with STATUS_MEMORY. */
struct hybrid;
MUST_CHECK struct hybrid *hybrid_new(struct status *st);
void hybrid_free(struct hybrid *hybrid);

/* Evaluates the energies of a solver that is in ATOM_CONVERGED with two spin
 * channels. Fails with STATUS_MEMORY, STATUS_DATA (no functional). */
MUST_CHECK bool hybrid_evaluate(struct hybrid *hybrid,
                                struct atom_solver *solver,
                                struct hybrid_energy *energy,
                                struct status *st);

/* Whether a revTPSS correlation energy can be one: over all atoms and ions of
 * all elements in their ground configurations it is 1.004 to 1.18 times that
 * of PBE. Where all electrons have one spin (one_spin) it may be any part of
 * it: revTPSS knows that an electron does not repel itself, PBE does not. */
bool hybrid_correlation_sound(double correlation, double correlation_pbe,
                              bool one_spin);

/* Slater integral F^k of one subshell of the atom evaluated last, for the
 * average of its spins by occupation; hartree. 0 when it is not occupied. */
double hybrid_slater(const struct hybrid *hybrid, int n, int l, int k);

/* Spin–orbit energy of the ground level of the atom evaluated last, solved
 * with the Dirac equation, from the average that its levels filled by 2j+1
 * have; hartree. Its term tells L, S and J (atom_term_spin_orbit). */
double hybrid_spin_orbit(const struct hybrid *hybrid, const struct term *term);

/* Spin–orbit parameter ζ = (ε(l+½) - ε(l-½))/(l+½) of a subshell of an atom
 * solved with the Dirac equation, averaged over spins by occupation;
 * hartree. 0 for l = 0 and empty subshells. */
double atom_zeta(const struct atom_solver *solver, int n, int l);

#endif
