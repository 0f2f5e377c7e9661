/* SPDX-License-Identifier: MIT */
/* Works that several models cite, or a model and a data set: one key is one
 * record, word for word. */
#ifndef MODEL_CITATIONS_H
#define MODEL_CITATIONS_H

#include "element/provenance.h"

#define CITATION_CLEMENTI_1963                                                 \
    {                                                                          \
        .key = "clementi1963", .kind = "article",                              \
        .authors = CITATION_NAMES("E. Clementi", "D. L. Raimondi"),            \
        .title = "Atomic screening constants from SCF functions",              \
        .container = "Journal of Chemical Physics", .year = 1963,              \
        .volume = "38", .pages = "2686", .doi = "10.1063/1.1733573",           \
        .from_memory = "title, doi"                                            \
    }

#define CITATION_ALLRED_1958                                                   \
    {                                                                          \
        .key = "allred1958", .kind = "article",                                \
        .authors = CITATION_NAMES("A. L. Allred", "E. G. Rochow"),             \
        .title = "A scale of electronegativity based on electrostatic force",  \
        .container = "Journal of Inorganic and Nuclear Chemistry",             \
        .year = 1958, .volume = "5", .pages = "264",                           \
        .doi = "10.1016/0022-1902(58)80003-2", .from_memory = "title, doi"     \
    }

#define CITATION_PYYKKO_2009                                                   \
    {                                                                          \
        .key = "pyykko2009", .kind = "article",                                \
        .authors = CITATION_NAMES("P. Pyykkö", "M. Atsumi"),                   \
        .title = "Molecular single-bond covalent radii for elements 1-118",    \
        .container = "Chemistry - A European Journal", .year = 2009,           \
        .volume = "15", .pages = "186", .doi = "10.1002/chem.200800987"        \
    }

#define CITATION_MANN_2000_MAIN                                                \
    {                                                                          \
        .key = "mann_2000_main", .kind = "article",                            \
        .authors = CITATION_NAMES("J. B. Mann", "T. L. Meek", "L. C. Allen"),  \
        .title = "Configuration energies of the main group elements",          \
        .container = "Journal of the American Chemical Society", .year = 2000, \
        .volume = "122", .pages = "2780", .doi = "10.1021/ja992866e",          \
        .from_memory = "title, doi"                                            \
    }

#endif
