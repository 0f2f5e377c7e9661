/* SPDX-License-Identifier: MIT */
/* `sources`: every model and data set with its citation. */
#include <stdlib.h>

#include "cli/command.h"
#include "cli/output.h"
#include "report/sources.h"
#include "study/facts.h"

static bool run(struct request *r, struct status *st)
{
    struct report report;
    struct source *sources = calloc(SOURCES_MAX, sizeof *sources);
    if (!sources)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    int count = study_sources(r->study, sources, SOURCES_MAX);
    report_begin(&report);
    report_sources(&report, r->format->uses, sources, count);
    bool ok = output_check(r, st) && output_report(r, &report, st);
    report_clear(&report);
    free(sources);
    return ok;
}

static const struct option *const options[] = {
    OPTIONS_OF_OUTPUT,
    NULL,
};

const struct command command_sources = {
    .name = "sources",
    .operands = "",
    .least = 0,
    .most = 0,
    .options = options,
    .summary = "print every model and data set with its citation",
    .about = "Prints what every number rests on: models with their domain, "
             "data sets "
             "with their terms and notes, all with their citations.",
    .example = "sources --format bibtex --output outershell.bib",
    .run = run,
};
