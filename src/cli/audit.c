/* SPDX-License-Identifier: MIT */
/* `audit`: how far each model can be trusted where. */
#include "cli/commands.h"
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
        if (model_offer_for(r->models[m], quantity, NULL) >= 0 &&
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

bool cli_audit(struct request *r, struct status *st)
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
        audit_report(&report, r->format->uses, &audit, r->scopes);
        ok = output_report(r, &report, st);
    }
    report_clear(&report);
    audit_clear(&audit);
    return ok;
}
