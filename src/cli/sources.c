/* SPDX-License-Identifier: MIT */
/* `sources`: every model and data set with its citation. */
#include <stdlib.h>

#include "cli/commands.h"
#include "cli/output.h"
#include "study/facts.h"

bool cli_sources(struct request *r, struct status *st)
{
    struct output out;
    struct source *sources = calloc(SOURCES_MAX, sizeof *sources);
    if (!sources)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    int count = study_sources(r->study, sources, SOURCES_MAX);
    bool ok = output_check(r, st) && output_open(&out, r, st);
    if (ok && r->bibtex)
        sources_write_bibtex(out.stream, sources, count);
    else if (ok)
        ok = sources_write(out.stream, r->format, sources, count, st);
    ok = ok && output_close(&out, ok, st);
    free(sources);
    return ok;
}
