/* SPDX-License-Identifier: MIT */
/* Sources of the scf model and what each of its numbers rests on. */
#include "model/scf_offers.h"

#include "model/citations.h"
#include "model/scf.h"

static const struct citation citations[] = {
    {.key = "kohn1965",
     .kind = "article",
     .authors = CITATION_NAMES("W. Kohn", "L. J. Sham"),
     .title =
         "Self-consistent equations including exchange and correlation effects",
     .container = "Physical Review",
     .year = 1965,
     .volume = "140",
     .pages = "A1133",
     .doi = "10.1103/PhysRev.140.A1133",
     .from_memory = "title, volume, pages, doi"},
    {.key = "macdonald1979",
     .kind = "article",
     .authors = CITATION_NAMES("A. H. MacDonald", "S. H. Vosko"),
     .title = "A relativistic density functional formalism",
     .container = "Journal of Physics C",
     .year = 1979,
     .volume = "12",
     .pages = "2977",
     .doi = "10.1088/0022-3719/12/15/007",
     .from_memory = "title, volume, pages, doi"},
    {.key = "vosko1980",
     .kind = "article",
     .authors = CITATION_NAMES("S. H. Vosko", "L. Wilk", "M. Nusair"),
     .title = "Accurate spin-dependent electron liquid correlation energies "
              "for local spin density calculations: a critical analysis",
     .container = "Canadian Journal of Physics",
     .year = 1980,
     .volume = "58",
     .pages = "1200",
     .doi = "10.1139/p80-159",
     .from_memory = "title, volume, pages, doi"},
    {.key = "perdew1996",
     .kind = "article",
     .authors = CITATION_NAMES("J. P. Perdew", "K. Burke", "M. Ernzerhof"),
     .title = "Generalized gradient approximation made simple",
     .container = "Physical Review Letters",
     .year = 1996,
     .volume = "77",
     .pages = "3865",
     .doi = "10.1103/PhysRevLett.77.3865",
     .from_memory = "title, volume, pages, doi"},
    {.key = "perdew1996b",
     .kind = "article",
     .authors = CITATION_NAMES("J. P. Perdew", "M. Ernzerhof", "K. Burke"),
     .title = "Rationale for mixing exact exchange with density functional "
              "approximations",
     .container = "Journal of Chemical Physics",
     .year = 1996,
     .volume = "105",
     .pages = "9982",
     .doi = "10.1063/1.472933",
     .from_memory = "title, volume, pages, doi"},
    {.key = "perdew2009",
     .kind = "article",
     .authors = CITATION_NAMES("J. P. Perdew", "A. Ruzsinszky", "G. I. Csonka",
                               "L. A. Constantin", "J. Sun"),
     .title = "Workhorse semilocal density functional for condensed matter "
              "physics and quantum chemistry",
     .container = "Physical Review Letters",
     .year = 2009,
     .volume = "103",
     .pages = "026403",
     .doi = "10.1103/PhysRevLett.103.026403",
     .from_memory = "title, volume, pages, doi"},
    CITATION_MANN_2000_MAIN,
};

#define PROVENANCE(what, count)                                                \
    {                                                                          \
        .computed = true, .id = "scf",                                         \
        .title = "self-consistent Kohn-Sham atom", .definition = (what),       \
        .citations = citations, .citation_count = (count)                      \
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
