/* SPDX-License-Identifier: MIT */
/* Ways through the table along which a quantity is followed. */
#ifndef ELEMENT_WALK_H
#define ELEMENT_WALK_H

#include <stdbool.h>

/* Its id in a remembered view, its words. */
#define WALK_LIST(X)                                                           \
    X(WALK_PERIOD, "period", "along the period")                               \
    X(WALK_GROUP, "group", "down the group")                                   \
    X(WALK_BLOCK, "block", "along the row of the block")                       \
    X(WALK_CHARGES, "charges", "along the charges of the element")             \
    X(WALK_ISOELECTRONIC, "isoelectronic", "along the isoelectronic series")

enum walk_kind {
#define WALK_ENUM(kind, id, words) kind,
    WALK_LIST(WALK_ENUM)
#undef WALK_ENUM
        WALK_COUNT
};

const char *walk_id(enum walk_kind kind);
const char *walk_words(enum walk_kind kind);

/* The species of a walk in order; never empty. */
#define WALK_MAX 128
struct walk {
    enum walk_kind kind;
    int count;
    struct walk_step {
        int z, charge;
    } steps[WALK_MAX];
};

/* The walk of a kind through a species: elements that have its charge (the f
 * elements go down in pairs, Ce Th); all charges
 * from 0, or from that of an anion, to the last electron; all atoms and ions
 * with as many electrons. A bare nucleus walks alone or with its element. */
void walk_fill(struct walk *walk, enum walk_kind kind, int z, int charge);

/* Place of a species in a walk, or -1. */
int walk_place(const struct walk *walk, int z, int charge);

#endif
