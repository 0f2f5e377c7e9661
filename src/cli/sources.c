/* SPDX-License-Identifier: MIT */
/* `sources`: every model and data set with its citation. */
#include <stdlib.h>

#include "cli/commands.h"
#include "cli/output.h"
#include "report/sources.h"
#include "study/facts.h"

bool cli_sources(struct request *r, struct status *st)
{
    struct report report;
    struct source *sources = calloc(SOURCES_MAX, sizeof *sources);
    if (!sources)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    int count = study_sources(r->study, sources, SOURCES_MAX);
    report_begin(&report);
    sources_report(&report, r->format->uses, sources, count);
    bool ok = output_check(r, st) && output_report(r, &report, st);
    report_clear(&report);
    free(sources);
    return ok;
}
