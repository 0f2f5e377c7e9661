/* SPDX-License-Identifier: MIT */
/* What the test files of the scf model share. */
#ifndef MODEL_SCF_CASE_H
#define MODEL_SCF_CASE_H

#include <check.h>

#include "model/registry.h"
#include "support/csv.h"

/* The model and a work space of it, with the ground states of
 * tests/atom/data/configurations.csv; never NULL. */
struct scf_case {
    const struct model *model;
    void *work;
    struct csv configurations;
};

void scf_open(struct scf_case *scf);
void scf_close(struct scf_case *scf);

/* Solves a question, or an atom and its next ion in their ground states. */
void scf_ask(struct scf_case *scf, const struct question *question);
void scf_solve(struct scf_case *scf, int z, int charge);

/* A reading of what was solved; definition NULL for the first one. */
struct reading scf_read(struct scf_case *scf, enum quantity_id quantity,
                        const struct definition *definition, int n, int l);

/* Its value; aborts the test where there is none. */
double scf_value(struct scf_case *scf, enum quantity_id quantity,
                 const struct definition *definition, int n, int l);

TCase *case_scf_errors(void);

#endif
