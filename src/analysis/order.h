/* SPDX-License-Identifier: MIT */
/* The order of rows by what they say. */
#ifndef ANALYSIS_ORDER_H
#define ANALYSIS_ORDER_H

#include <stddef.h>

#include "analysis/row.h"
#include "base/status.h"

/* By value, or by the size of a difference, the largest first; its id as an
 * option's word. */
#define ROW_ORDER_LIST(X)                                                      \
    X(ROW_ORDER_VALUE, "value")                                                \
    X(ROW_ORDER_RESIDUAL, "residual")                                          \
    X(ROW_ORDER_PERCENT, "percent")                                            \
    X(ROW_ORDER_DISAGREEMENT, "disagreement")                                  \
    X(ROW_ORDER_DISAGREEMENT_PERCENT, "disagreement-percent")

enum row_order {
#define ROW_ORDER_ENUM(order, id) order,
    ROW_ORDER_LIST(ROW_ORDER_ENUM)
#undef ROW_ORDER_ENUM
        ROW_ORDER_COUNT
};

const char *row_order_id(enum row_order order);

/* Sorts rows[count]; those without the number come last, equal ones stay in
 * the order of atomic number, then charge. Fails with STATUS_MEMORY. */
MUST_CHECK bool order_rows(struct row *rows, size_t count, enum row_order order,
                           struct status *st);

#endif
