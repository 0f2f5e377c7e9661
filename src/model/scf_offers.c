/* SPDX-License-Identifier: MIT */
/* Sources of the scf model and what each of its numbers rests on. */
#include "model/scf_offers.h"

#include "model/scf.h"

static const struct citation citations[] = {
    {"kohn1965", "article", "W. Kohn and L. J. Sham",
     "Self-consistent equations including exchange and correlation effects",
     "Phys. Rev.", 1965, "140", "A1133", "10.1103/PhysRev.140.A1133"},
    {"macdonald1979", "article", "A. H. MacDonald and S. H. Vosko",
     "A relativistic density functional formalism", "J. Phys. C", 1979, "12",
     "2977", "10.1088/0022-3719/12/15/007"},
    {"vosko1980", "article", "S. H. Vosko, L. Wilk and M. Nusair",
     "Accurate spin-dependent electron liquid correlation energies for local "
     "spin density calculations: a critical analysis",
     "Can. J. Phys.", 1980, "58", "1200", "10.1139/p80-159"},
    {"perdew1996", "article", "J. P. Perdew, K. Burke and M. Ernzerhof",
     "Generalized gradient approximation made simple", "Phys. Rev. Lett.", 1996,
     "77", "3865", "10.1103/PhysRevLett.77.3865"},
    {"perdew1996b", "article", "J. P. Perdew, M. Ernzerhof and K. Burke",
     "Rationale for mixing exact exchange with density functional "
     "approximations",
     "J. Chem. Phys.", 1996, "105", "9982", "10.1063/1.472933"},
    {"perdew2009", "article",
     "J. P. Perdew, A. Ruzsinszky, G. I. Csonka, L. A. Constantin and J. Sun",
     "Workhorse semilocal density functional for condensed matter physics and "
     "quantum chemistry",
     "Phys. Rev. Lett.", 2009, "103", "026403",
     "10.1103/PhysRevLett.103.026403"},
    {"mann2000", "article", "J. B. Mann, T. L. Meek and L. C. Allen",
     "Configuration energies of the main group elements", "J. Am. Chem. Soc.",
     2000, "122", "2780", "10.1021/ja992866e"},
};

#define PROVENANCE(what, count)                                                \
    {                                                                          \
        true, "scf", "self-consistent Kohn-Sham atom", what, citations, count  \
    }
enum {
    SOURCES_DENSITY = 3,
    SOURCES_GRADIENT = 4,
    SOURCES_ENERGY = 6,
    SOURCES_ALLEN = 7
};

const struct provenance *scf_atom_source(bool gradient)
{
    static const struct provenance sources[] = {
        PROVENANCE(NULL, SOURCES_DENSITY), PROVENANCE(NULL, SOURCES_GRADIENT)};
    return &sources[gradient];
}

const struct model_offer scf_offers[OFFER_COUNT] = {
    [OFFER_ZEFF] = {QUANTITY_ZEFF,
                    PROVENANCE(&definition_zeff_energy, SOURCES_ENERGY)},
    [OFFER_ZEFF_SIZE] = {QUANTITY_ZEFF,
                         PROVENANCE(&definition_zeff_size, SOURCES_DENSITY)},
    [OFFER_ZEFF_ENCLOSED] = {QUANTITY_ZEFF,
                             PROVENANCE(&definition_zeff_enclosed,
                                        SOURCES_DENSITY)},
    [OFFER_RADIUS] = {QUANTITY_RADIUS,
                      PROVENANCE(&definition_radial_maximum, SOURCES_DENSITY)},
    [OFFER_ISODENSITY] = {QUANTITY_ISODENSITY,
                          PROVENANCE(&definition_isodensity, SOURCES_DENSITY)},
    [OFFER_IONIZATION] = {QUANTITY_IONIZATION,
                          PROVENANCE(&definition_ionization, SOURCES_ENERGY)},
    [OFFER_ALLEN] = {QUANTITY_ELECTRONEGATIVITY,
                     PROVENANCE(&definition_allen, SOURCES_ALLEN)},
};
