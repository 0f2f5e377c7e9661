/* SPDX-License-Identifier: MIT */
/* One piece of work: what is asked, what is known so far, what is being
 * solved. Batch commands and screens share everything here. */
#ifndef STUDY_STUDY_H
#define STUDY_STUDY_H

#include "analysis/row.h"
#include "base/status.h"
#include "model/registry.h"
#include "refdata/catalogue.h"
#include "study/reference.h"

/* A question for one row. Zero fields are defaults: the outermost subshell,
 * the ground configuration, the default reference, the base unit. The site is
 * part of the species. model may be
 * NULL: the stored value alone. */
struct ask {
    int z;
    int charge;
    const struct configuration *configuration; /* NULL: ground state */
    enum quantity_id quantity;
    const struct model *model;
    const struct reference *reference;
    const struct reference *against; /* a second one of the quantity, or NULL */
    unsigned evidence;               /* kinds of reference values; 0: all */
    int n, l;
    struct site site;
    const struct unit *unit;
};

struct study;

/* A study over a catalogue, which must outlive it. NULL, with st filled, when
 * memory is short. study_free(NULL) is fine. */
struct study *study_new(const struct catalogue *catalogue, struct status *st);
void study_free(struct study *study);

const struct catalogue *study_catalogue(const struct study *study);
const struct reference_list *study_references(const struct study *study);

/* Options for the models that take some; forgets what was solved. */
void study_set_options(struct study *study,
                       const struct model_options *options);

/* The atom or ion of an ask: the ground state, or its configuration marked
 * ORIGIN_USER unless it is the stored one. Fails with STATUS_USAGE when charge
 * is above z, below -z, or the configuration holds another number of
 * electrons. */
MUST_CHECK bool study_species(const struct study *study, const struct ask *ask,
                              struct species *species, struct status *st);

/* The row of a valid ask. A model that iterates is not started: what it has
 * not solved yet reads ROW_NOT_SOLVED. The row is good as long as the study
 * and its catalogue. */
struct row study_row(const struct study *study, const struct ask *ask);

/* What the ask's model says under one of its offers for the species of that
 * ask, in base units: for a model that offers a quantity under several
 * definitions. Not started either. */
struct reading study_reading(const struct study *study, const struct ask *ask,
                             const struct species *species, int offer);

/* What the ask's model gives of a quantity by a derivation, in base units. Not
 * started either. */
struct reading study_derived(const struct study *study, const struct ask *ask,
                             const struct derivation *derivation);

/* study_row, but solved here and now to the end. Fails with STATUS_MEMORY, or
 * as the model's work space cannot be opened. */
MUST_CHECK bool study_row_now(struct study *study, const struct ask *ask,
                              struct row *row, struct status *st);

/* Work for models that iterate. study_want queues the ask's atom unless it is
 * solved or queued; with `first` it goes to the head of the queue. study_step
 * does one step, at most some milliseconds, and says whether work is left. It
 * fails only with STATUS_MEMORY, which drops the queue: lack of memory is no
 * gap in the science, and the atom stays unsolved. study_stop drops the queue
 * and what is half done, keeping what is solved. */
MUST_CHECK bool study_want(struct study *study, const struct ask *ask,
                           bool first, struct status *st);
/* The same for all quantities of the ask's model, derived ones too. */
MUST_CHECK bool study_want_all(struct study *study, const struct ask *ask,
                               bool first, struct status *st);
bool study_step(struct study *study, struct status *st);
void study_stop(struct study *study);

/* Atoms solved since the queue was last empty, and all of these. */
struct study_progress {
    int done, total;
};
struct study_progress study_progress(const struct study *study);

#endif
