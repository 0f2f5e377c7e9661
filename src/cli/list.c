/* SPDX-License-Identifier: MIT */
/* `list`: one row per element, quantity and model. */
#include <assert.h>
#include <stdlib.h>

#include "cli/command.h"
#include "cli/output.h"
#include "report/rows.h"

/* Rows being gathered, in the order of the output. */
struct gathered {
    struct row *rows;
    size_t count;
};

static size_t models_for(const struct request *r, enum quantity_id quantity)
{
    size_t count = 0;
    for (int m = 0; m < r->model_count; m++)
        if (model_gives(r->models[m], quantity))
            count++;
    return count;
}

static size_t rows_wanted(const struct request *r)
{
    size_t per_atom = 0;
    for (int q = 0; q < r->quantity_count; q++) {
        size_t models = models_for(r, r->quantities[q]);
        per_atom += models ? models : 1;
    }
    return per_atom * (size_t)r->atom_count;
}

/* The rows of one atom and quantity: one per model that offers it, or the
 * stored value alone where none does. */
static bool gather(struct request *r, int atom, enum quantity_id quantity,
                   struct gathered *g, struct status *st)
{
    if (models_for(r, quantity) == 0) {
        struct ask ask = request_ask(r, atom, quantity, NULL);
        return study_row_now(r->study, &ask, &g->rows[g->count++], st);
    }
    for (int m = 0; m < r->model_count; m++) {
        if (!model_gives(r->models[m], quantity))
            continue;
        struct ask ask = request_ask(r, atom, quantity, r->models[m]);
        if (!study_row_now(r->study, &ask, &g->rows[g->count++], st))
            return false;
    }
    return true;
}

static bool gather_all(struct request *r, struct gathered *g, struct status *st)
{
    for (int a = 0; a < r->atom_count; a++)
        for (int q = 0; q < r->quantity_count; q++)
            if (!gather(r, a, r->quantities[q], g, st))
                return false;
    return true;
}

static bool run(struct request *r, struct status *st)
{
    struct report report;
    size_t wanted = rows_wanted(r);
    assert(wanted > 0); /* at least one atom and one quantity are chosen */
    struct gathered g = {calloc(wanted, sizeof *g.rows), 0};
    if (!g.rows)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    report_begin(&report);
    bool ok = output_check(r, st) && gather_all(r, &g, st) &&
              (!r->has_order || order_rows(g.rows, g.count, r->order, st));
    if (ok) {
        report_rows(&report, r->format->uses, g.rows, g.count);
        ok = output_report(r, &report, st);
    }
    report_clear(&report);
    free(g.rows);
    return ok;
}

static const struct option *const options[] = {
    &option_quantity,  &option_model,         &option_charge,
    &option_subshell,  &option_configuration, &option_term,
    &option_reference, &option_against,       &option_coordination,
    &option_spin,      &option_evidence,      &option_unit,
    &option_sort,      OPTIONS_OF_OUTPUT,     NULL,
};

const struct command command_print = {
    .name = "list",
    .operands = "[SELECTION...]",
    .least = 0,
    .most = -1,
    .manner = {.chooses = true, .one_set = true, .needs_models = true},
    .options = options,
    .summary = "print values, references and residuals, one row each",
    .about =
        "Prints one row per element, quantity and model that offers the "
        "quantity: the model's value, the stored reference and the residual "
        "between them. Without a selection all elements are listed. Runs, "
        "periods, groups, blocks and the whole table leave out elements that "
        "have no such charge. " COMMAND_SELECTION,
    .example = "list Ti-Zn --quantity radius --model slater",
    .run = run,
};
