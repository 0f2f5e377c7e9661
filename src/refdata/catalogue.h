/* SPDX-License-Identifier: MIT */
/* All data sets at hand: those built in, and those that the user added. */
#ifndef REFDATA_CATALOGUE_H
#define REFDATA_CATALOGUE_H

#include <stdbool.h>
#include <stddef.h>

#include "base/status.h"
#include "refdata/dataset.h"

#define CATALOGUE_ADDED_MAX 32

/* The set of effective charges that follows from the built-in ionization
 * energies has this id, so that no added set may take it. */
#define CATALOGUE_ZEFF_FROM_IONIZATION "zeff_from_ionization"

struct loaded;

/* A catalogue starts as {0}: the built-in sets alone. It owns the added ones;
 * release them with catalogue_clear. */
struct catalogue {
    int added_count;
    struct loaded *added[CATALOGUE_ADDED_MAX];
};

/* The built-in sets alone. */
const struct catalogue *catalogue_builtin(void);

/* Adds the user's own set of values from a file. Refused (STATUS_DATA): a file
 * that is not in order, a kind other than values, an id that is taken, more
 * than CATALOGUE_ADDED_MAX sets. Also STATUS_FILE, STATUS_MEMORY. On failure
 * the catalogue is as before. */
MUST_CHECK bool catalogue_add_file(struct catalogue *catalogue,
                                   const char *path, struct status *st);

void catalogue_clear(struct catalogue *catalogue);

/* All sets: the built-in ones by id, then the added ones in order. */
size_t catalogue_count(const struct catalogue *catalogue);
const struct dataset *catalogue_at(const struct catalogue *catalogue, size_t i);

/* Whether the i-th is one that the user added. */
bool catalogue_is_added(const struct catalogue *catalogue, size_t i);

/* By id; NULL when there is none. */
const struct dataset *catalogue_find(const struct catalogue *catalogue,
                                     const char *id);

/* The references of a quantity, best first: by rank, then the added ones.
 * Writes at most max to sets and gives their number in all. */
size_t catalogue_references(const struct catalogue *catalogue,
                            enum quantity_id quantity,
                            const struct dataset **sets, size_t max);

/* The first of them, or NULL. */
const struct dataset *catalogue_default(const struct catalogue *catalogue,
                                        enum quantity_id quantity);

/* The built-in tables; each holds all its elements and never is NULL. */
const struct dataset *catalogue_elements(void);
const struct dataset *catalogue_availability(void);
const struct dataset *catalogue_oxidation_states(void);

#endif
