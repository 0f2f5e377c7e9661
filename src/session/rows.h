/* SPDX-License-Identifier: MIT */
/* Rows gathered for an export, and what is to be solved before they can be. */
#ifndef SESSION_ROWS_H
#define SESSION_ROWS_H

#include "report/report.h"
#include "session/session.h"

/* Starts as {0}; items[count] are owned, session_rows_report frees them. */
struct rows {
    struct row *items;
    size_t count, capacity;
};

/* Adds the row of an ask. Fails with STATUS_MEMORY. */
MUST_CHECK bool session_rows_add(const struct session *s, struct rows *rows,
                                 const struct ask *ask, struct status *st);

/* Adds a species under every model that offers the quantity, or its stored
 * value where none does; nothing when there is no such ion. */
MUST_CHECK bool session_rows_models(const struct session *s, struct rows *rows,
                                    int z, int charge, struct status *st);

/* Ends the gathering: the rows go over to an empty report and fill its parts
 * (bits of enum report_part). gathered: false when a step before failed, then
 * they are freed and false is given. Blocks need one row at least. Fails with
 * STATUS_MEMORY. */
MUST_CHECK bool session_rows_report(struct rows *rows, bool gathered,
                                    unsigned parts, struct report *report,
                                    struct status *st);

/* Queues what is not solved yet for the row of a species under a model, or
 * under all; gives how much that is. */
int session_lacks(struct session *s, int z, int charge,
                  const struct model *model);
int session_lacks_models(struct session *s, int z, int charge);

#endif
