/* SPDX-License-Identifier: MIT */
/* `audit`: how far each model can be trusted where. */
#include "cli/command.h"
#include "cli/output.h"
#include "report/audit.h"

/* All chosen atoms under one model and reference; model NULL: the second set
 * in the place of the model. */
static bool add_series(struct request *r, struct audit *audit,
                       enum quantity_id quantity, const struct model *model,
                       const struct reference *reference, struct status *st)
{
    for (int a = 0; a < r->atom_count; a++) {
        struct row row;
        struct ask ask = request_ask(r, a, quantity, model);
        ask.reference = reference;
        if (!study_row_now(r->study, &ask, &row, st))
            return false;
        if (!model)
            row = row_of_sets(&row);
        if (!audit_add(audit, &row, st))
            return false;
    }
    return true;
}

/* All models against one reference, NULL for the default one. */
static bool add_models(struct request *r, struct audit *audit,
                       enum quantity_id quantity,
                       const struct reference *reference, struct status *st)
{
    for (int m = 0; m < r->model_count; m++)
        if (model_gives(r->models[m], quantity) &&
            !add_series(r, audit, quantity, r->models[m], reference, st))
            return false;
    return r->against[quantity] == NULL || r->against[quantity] == reference ||
           add_series(r, audit, quantity, NULL, reference, st);
}

static bool gather(struct request *r, struct audit *audit, struct status *st)
{
    for (int q = 0; q < r->quantity_count; q++) {
        enum quantity_id quantity = r->quantities[q];
        bool named = false;
        for (int s = 0; s < r->set_count; s++) {
            if (r->sets[s]->quantity != quantity)
                continue;
            named = true;
            if (!add_models(r, audit, quantity, r->sets[s], st))
                return false;
        }
        if (!named && !add_models(r, audit, quantity, NULL, st))
            return false;
    }
    return true;
}

static bool run(struct request *r, struct status *st)
{
    struct audit audit = {0};
    struct report report;
    bool ok = output_check(r, st) && gather(r, &audit, st);
    if (ok && audit.count == 0 && r->model_count == 0)
        ok = status_fail(st, STATUS_USAGE,
                         "audit: no model is asked; --against sets two data "
                         "sets against each other");
    if (ok && audit.count == 0)
        ok = status_fail(st, STATUS_USAGE,
                         "audit: no model computes any of the quantities "
                         "asked for; --against sets two data sets against "
                         "each other");
    report_begin(&report);
    if (ok) {
        report_audit(&report, r->format->uses, &audit, r->scopes);
        ok = output_report(r, &report, st);
    }
    report_clear(&report);
    audit_clear(&audit);
    return ok;
}

static const struct option *const options[] = {
    &option_quantity,
    &option_model,
    &option_charge,
    &option_subshell,
    &option_reference,
    &option_against,
    &option_coordination,
    &option_spin,
    &option_evidence,
    &option_unit,
    &option_scope,
    OPTIONS_OF_OUTPUT,
    NULL,
};

const struct command command_audit = {
    .name = "audit",
    .operands = "[SELECTION...]",
    .least = 0,
    .most = -1,
    .manner = {.chooses = true},
    .options = options,
    .summary = "print how large the residuals of each model are, and where",
    .about =
        "Prints statistics of the residuals of each model against a reference "
        "set: count, gaps, mean, mean absolute, root mean square, and the "
        "largest "
        "with its species, for all chosen species and by block, period and "
        "group, "
        "by charge where several were asked for, by the kind of reference "
        "value "
        "where several occur; then which model is best where, over the species "
        "that all of them have. With --against the second set takes the place "
        "of "
        "a model. " COMMAND_SELECTION,
    .example = "audit block:d --quantity ionization",
    .run = run,
};
