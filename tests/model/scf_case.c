/* SPDX-License-Identifier: MIT */
#include "scf_case.h"

#include <stdlib.h>

void scf_open(struct scf_case *scf)
{
    struct status st = status_ok();
    scf->model = model_find("scf");
    ck_assert_ptr_nonnull(scf->model);
    scf->work = calloc(1, scf->model->work_size);
    ck_assert_ptr_nonnull(scf->work);
    ck_assert(scf->model->open(scf->work, &st));
    scf->configurations = csv_read_file(ATOM_DATA "/configurations.csv");
}

void scf_close(struct scf_case *scf)
{
    scf->model->close(scf->work);
    free(scf->work);
    csv_free(&scf->configurations);
}

/* Ground species; false when the list ends before this charge. */
static bool ground(const struct csv *csv, int z, int charge,
                   struct species *species)
{
    *species = (struct species){.z = z, .charge = charge};
    for (size_t i = 0; i < csv_rows(csv); i++) {
        struct status st = status_ok();
        if ((int)csv_number(csv, i, "z") != z ||
            (int)csv_number(csv, i, "charge") != charge)
            continue;
        ck_assert(configuration_parse(csv_cell(csv, i, "configuration"),
                                      &species->configuration, &st));
        term_parse(csv_cell(csv, i, "term"), &species->term);
        return true;
    }
    return charge == z;
}

void scf_ask(struct scf_case *scf, const struct question *question)
{
    scf->model->begin(scf->work, question, &(struct model_options){0});
    int steps = 0;
    while (scf->model->step(scf->work) != MODEL_DONE)
        ck_assert_int_lt(++steps, 400);
}

void scf_solve(struct scf_case *scf, int z, int charge)
{
    struct question q = {.has_cation = true};
    ck_assert(ground(&scf->configurations, z, charge, &q.species));
    ck_assert(ground(&scf->configurations, z, charge + 1, &q.cation));
    scf_ask(scf, &q);
}

struct reading scf_read(struct scf_case *scf, enum quantity_id quantity,
                        const struct definition *definition, int n, int l)
{
    int offer = model_offer_for(scf->model, quantity, definition);
    ck_assert_int_ge(offer, 0);
    return scf->model->read(scf->work, offer, n, l);
}

double scf_value(struct scf_case *scf, enum quantity_id quantity,
                 const struct definition *definition, int n, int l)
{
    struct reading r = scf_read(scf, quantity, definition, n, l);
    ck_assert_msg(r.state == READING_OK, "%s: %s", quantity_at(quantity)->id,
                  r.reason);
    return r.value.value;
}
