/* SPDX-License-Identifier: MIT */
/* What every model is: a const struct, solved once, read many times. */
#ifndef MODEL_MODEL_H
#define MODEL_MODEL_H

#include <stdbool.h>
#include <stddef.h>

#include "base/status.h"
#include "element/derivation.h"
#include "element/provenance.h"
#include "element/reading.h"
#include "element/species.h"

/* One electron more, or less: what an energy difference needs. */
struct question {
    struct species species;
    bool has_cation; /* the next charge state up; false for a bare nucleus */
    struct species cation;
    bool has_anion;
    struct species anion;
    /* Covalent radius of the element in pm, for scales that need one. */
    bool has_covalent_radius;
    double covalent_radius_pm;
};

/* Choices that some models take. */
struct model_options {
    bool average_term; /* average of configuration instead of Hund's term */
};

/* One kind of number that a model gives. */
struct model_offer {
    enum quantity_id quantity;
    struct provenance provenance;
};

enum model_progress { MODEL_RUNNING, MODEL_DONE, MODEL_NO_MEMORY };

/* id, title, domain: as shown. work_size: bytes of a work space, zeroed by the
 * caller, opened once, used for any number of questions, closed. A closed rule
 * is done in its first step. open and close may be NULL.
 *   begin  takes a question; what is outside the model shows in read.
 *   step   one unit of work, at most some milliseconds. MODEL_NO_MEMORY: given
 *          up for lack of memory, nothing to read.
 *   read   after MODEL_DONE: offer is an index into offers; n = 0 asks for
 *          the outermost subshell, else for subshell n, l. Always a reading:
 *          a number, or a state with its reason. A remark may live in the work
 *          space: good until the next begin.
 * repeats: ids of the data sets that hold this very calculation, published,
 * ended by NULL; NULL for none. A residual against one checks the program, and
 * says nothing of the model. */
struct model {
    const char *id;
    const char *title;
    const char *domain;
    bool closed;
    bool takes_term; /* model_options.average_term matters */
    const char *const *repeats;
    const struct model_offer *offers;
    int offer_count;
    size_t work_size;
    bool (*open)(void *work, struct status *st);
    void (*close)(void *work);
    void (*begin)(void *work, const struct question *question,
                  const struct model_options *options);
    enum model_progress (*step)(void *work);
    struct reading (*read)(const void *work, int offer, int n, int l);
};

/* Index of the offer for a quantity whose definition is the given one, or the
 * first for that quantity; -1 when the model does not offer it. definition may
 * be NULL. */
int model_offer_for(const struct model *model, enum quantity_id quantity,
                    const struct definition *definition);

/* The derivation by which a quantity follows from what the model offers, for
 * atoms or for ions; NULL when the model offers the quantity itself, or not
 * even what it follows from. */
const struct derivation *model_derivation(const struct model *model,
                                          enum quantity_id quantity);

/* Whether the model gives the quantity, of itself or by a derivation. */
bool model_gives(const struct model *model, enum quantity_id quantity);

#endif
