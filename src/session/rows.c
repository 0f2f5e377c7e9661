/* SPDX-License-Identifier: MIT */
#include "session/rows.h"

#include <stdlib.h>
#include <string.h>

#include "base/array.h"
#include "report/rows.h"

bool session_rows_add(const struct session *s, struct rows *rows,
                      const struct ask *ask, struct status *st)
{
    if (!array_grow(&rows->items, rows->count, &rows->capacity,
                    sizeof *rows->items))
        return status_fail(st, STATUS_MEMORY, "out of memory");
    rows->items[rows->count++] = study_row(s->study, ask);
    return true;
}

bool session_rows_models(const struct session *s, struct rows *rows, int z,
                         int charge, struct status *st)
{
    struct ask ask;
    bool any = false;
    if (!session_ask(s, z, charge, &ask))
        return true;
    for (int m = 0; m < model_count(); m++) {
        ask.model = model_at(m);
        if (!model_gives(ask.model, ask.quantity))
            continue;
        any = true;
        if (!session_rows_add(s, rows, &ask, st))
            return false;
    }
    ask.model = NULL;
    return any || session_rows_add(s, rows, &ask, st);
}

bool session_rows_report(struct rows *rows, bool gathered, unsigned parts,
                         struct report *report, struct status *st)
{
    /* A species that does not exist leaves a heading without rows. */
    size_t size = rows->count * sizeof *rows->items;
    struct row *kept = gathered ? report_memory(report, size + 1) : NULL;
    if (gathered && !kept)
        gathered = status_fail(st, STATUS_MEMORY, "out of memory");
    if (kept) {
        if (size > 0)
            memcpy(kept, rows->items, size);
        report_rows(report, parts, kept, rows->count);
    }
    free(rows->items);
    *rows = (struct rows){0};
    return gathered;
}

int session_lacks(struct session *s, int z, int charge,
                  const struct model *model)
{
    struct ask ask;
    struct status st = status_ok();
    if (model->closed || !session_ask(s, z, charge, &ask))
        return 0;
    ask.model = model;
    if (!model_gives(model, ask.quantity) ||
        study_row(s->study, &ask).state != ROW_NOT_SOLVED)
        return 0;
    if (study_want(s->study, &ask, true, &st))
        return 1;
    /* Not queued, and lacking all the same: no export tells it as a gap. */
    session_report(s, true, "nothing written: %s", st.message);
    return 1;
}

int session_lacks_models(struct session *s, int z, int charge)
{
    int count = 0;
    for (int m = 0; m < model_count(); m++)
        count += session_lacks(s, z, charge, model_at(m));
    return count;
}
