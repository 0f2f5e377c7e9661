/* SPDX-License-Identifier: MIT */
/* The words by which elements and ions are chosen. */
#ifndef ELEMENT_SELECTION_H
#define ELEMENT_SELECTION_H

#include <stdbool.h>

#include "base/status.h"
#include "element/element.h"
#include "element/species.h"

#define SELECTION_MAX 512

/* Chosen elements in the order in which they were named, none twice at the
 * same charge and site. has_charge: the word was an ion and carries its charge.
 * every_site: all stored sites were meant; then site is none. */
struct chosen {
    int z;
    int charge;
    bool has_charge;
    bool every_site;
    struct site site;
};
struct selection {
    int count;
    struct chosen items[SELECTION_MAX];
};

/* Adds what one word names: symbol, name or atomic number (Fe, iron, 26); an
 * ion (Fe3+, Cs+, O2-, iron written by its symbol); a run by atomic number
 * (Sc-Zn, 21-30); period:4, group:13, block:d, the row of a block (block:4f),
 * an isoelectronic series (electrons:10), which carries its charges. A site may
 * stand behind any of them (Co3+@VI,low, Sr2+@12, Fe2+@all). Fails with
 * STATUS_USAGE naming the word, what would be accepted and, where one is near,
 * the element or ion that may have been meant. */
MUST_CHECK bool selection_add(struct selection *selection, const char *word,
                              struct status *st);

/* The lightest element of the series with so many electrons, 1…Z_MAX. */
int selection_first_z(int electrons);

/* All elements by atomic number. */
void selection_all(struct selection *selection);

#endif
