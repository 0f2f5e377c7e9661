/* SPDX-License-Identifier: MIT */
/* `compare`: elements or ions side by side. */
#include <string.h>

#include "cli/command.h"
#include "cli/output.h"
#include "report/comparison.h"
#include "study/facts.h"

/* All sets, or those that were named. */
static bool is_wanted_set(const struct request *r,
                          const struct provenance *provenance)
{
    for (int i = 0; i < r->set_count; i++)
        if (r->sets[i]->provenance == provenance)
            return true;
    for (int q = 0; q < QUANTITY_COUNT; q++)
        if (r->against[q] && r->against[q]->provenance == provenance)
            return true;
    return r->set_count == 0;
}

/* Place of a line's quantity among those asked for; -1 when it was not. */
static int rank_of(const struct request *r, const struct comparison_line *line)
{
    for (int i = 0; i < r->quantity_count; i++)
        if (r->quantities[i] == line->quantity)
            return i;
    return -1;
}

static bool is_wanted(const struct request *r,
                      const struct comparison_line *line)
{
    if (rank_of(r, line) < 0)
        return false;
    if (!line->provenance->computed)
        return is_wanted_set(r, line->provenance);
    for (int m = 0; m < r->model_count; m++)
        if (strcmp(r->models[m]->id, line->provenance->id) == 0)
            return true;
    return false;
}

/* Keeps the lines that were asked for, in the order of the quantities asked
 * for. */
static void keep_wanted(const struct request *r, struct comparison *c)
{
    int kept = 0;
    for (int i = 0; i < c->line_count; i++) {
        struct comparison_line line = c->lines[i];
        int place = kept;
        if (!is_wanted(r, &line))
            continue;
        for (;
             place > 0 && rank_of(r, &c->lines[place - 1]) > rank_of(r, &line);
             place--)
            c->lines[place] = c->lines[place - 1];
        c->lines[place] = line;
        kept++;
    }
    c->line_count = kept;
}

/* Models that iterate are solved only when one of them was asked for. */
static bool must_solve(const struct request *r)
{
    for (int m = 0; m < r->model_count; m++)
        for (int q = 0; q < r->quantity_count; q++)
            if (!r->models[m]->closed &&
                model_gives(r->models[m], r->quantities[q]))
                return true;
    return false;
}

/* The first reference of a quantity is the one named, or the first shown. */
static bool add_disagreements(const struct request *r, struct comparison *c,
                              struct status *st)
{
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        const struct provenance *first =
            r->references[q] ? r->references[q]->provenance : NULL;
        if (!r->against[q])
            continue;
        for (int i = 0; i < c->line_count && !first; i++)
            if (c->lines[i].quantity == (enum quantity_id)q &&
                !c->lines[i].provenance->computed)
                first = c->lines[i].provenance;
        if (first && first != r->against[q]->provenance &&
            !comparison_add_pair(c, first, r->against[q]->provenance, st))
            return false;
    }
    return true;
}

static bool write(const struct request *r, const struct comparison *c,
                  struct status *st)
{
    struct report report;
    report_begin(&report);
    report_comparison(&report, r->format->uses, c);
    bool ok = output_report(r, &report, st);
    report_clear(&report);
    return ok;
}

static bool run(struct request *r, struct status *st)
{
    struct ask asks[COMPARISON_MAX];
    struct comparison comparison;
    if (r->atom_count > COMPARISON_MAX)
        return status_fail(st, STATUS_USAGE,
                           "compare: %d atoms chosen; expected 1 to %d",
                           r->atom_count, COMPARISON_MAX);
    for (int a = 0; a < r->atom_count; a++)
        asks[a] = request_ask(r, a, QUANTITY_ZEFF, NULL); /* by subshell */
    if (!output_check(r, st) ||
        !study_compare(r->study, asks, r->atom_count, must_solve(r), r->units,
                       &comparison, st))
        return false;
    keep_wanted(r, &comparison);
    bool ok =
        add_disagreements(r, &comparison, st) && write(r, &comparison, st);
    comparison_clear(&comparison);
    return ok;
}

static const struct option *const options[] = {
    &option_quantity,
    &option_model,
    &option_charge,
    &option_subshell,
    &option_configuration,
    &option_term,
    &option_reference,
    &option_against,
    &option_coordination,
    &option_spin,
    &option_unit,
    OPTIONS_OF_OUTPUT,
    NULL,
};

const struct command command_compare = {
    .name = "compare",
    .operands = "SELECTION...",
    .least = 1,
    .most = -1,
    .manner = {.chooses = true,
               .all_quantities = true,
               .all_sets = true,
               .sets_beside = true},
    .options = options,
    .summary = "print elements or ions side by side",
    .about =
        "Prints up to twelve elements or ions side by side: all quantities, "
        "each from every model and data set that has a value, with differences "
        "from the first. " COMMAND_SELECTION,
    .example = "compare Fe3+ Al3+ Cr3+ --quantity radius",
    .run = run,
};
