/* SPDX-License-Identifier: MIT */
#include "analysis/order.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

const char *row_order_id(enum row_order order)
{
    static const char *const ids[ROW_ORDER_COUNT] = {
#define ROW_ORDER_ID(order, id) id,
        ROW_ORDER_LIST(ROW_ORDER_ID)
#undef ROW_ORDER_ID
    };
    return ids[order];
}

/* What a row is sorted by; false when it has no such number. */
static bool key_of(const struct row *row, enum row_order order, double *key)
{
    const struct reading *shown =
        row->value.provenance ? &row->value : &row->reference;
    switch (order) {
    case ROW_ORDER_VALUE:
        *key = shown->value.value;
        return shown->state == READING_OK;
    case ROW_ORDER_RESIDUAL:
        *key = fabs(row->residual.value);
        return row->state == ROW_OK;
    case ROW_ORDER_PERCENT:
        *key = fabs(row->percent.value);
        return row->state == ROW_OK && row->has_percent;
    case ROW_ORDER_DISAGREEMENT:
        *key = fabs(row->disagreement.value);
        return row->disagrees;
    case ROW_ORDER_DISAGREEMENT_PERCENT:
        *key = fabs(row->disagreement_percent.value);
        return row->disagrees && row->has_disagreement_percent;
    case ROW_ORDER_COUNT:
        break;
    }
    return false;
}

static int compare(const struct row *a, const struct row *b,
                   enum row_order order)
{
    double x = 0.0;
    double y = 0.0;
    bool has_x = key_of(a, order, &x);
    bool has_y = key_of(b, order, &y);
    if (has_x != has_y)
        return has_x ? -1 : 1;
    if (has_x && x < y)
        return 1;
    if (has_x && x > y)
        return -1;
    if (a->species.z != b->species.z)
        return a->species.z - b->species.z;
    return a->species.charge - b->species.charge;
}

/* A merge sort keeps the order of equal rows, and qsort takes no context. */
static void merge(struct row *rows, size_t half, size_t count,
                  enum row_order order, struct row *left)
{
    memcpy(left, rows, half * sizeof *left);
    size_t i = 0;
    size_t j = half;
    for (size_t k = 0; i < half; k++)
        rows[k] = j < count && compare(&rows[j], &left[i], order) < 0
                      ? rows[j++]
                      : left[i++];
}

static void sort(struct row *rows, size_t count, enum row_order order,
                 struct row *left)
{
    if (count < 2)
        return;
    size_t half = count / 2;
    sort(rows, half, order, left);
    sort(rows + half, count - half, order, left);
    merge(rows, half, count, order, left);
}

bool order_rows(struct row *rows, size_t count, enum row_order order,
                struct status *st)
{
    struct row *left = calloc(count / 2 + 1, sizeof *left);
    if (!left)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    sort(rows, count, order, left);
    free(left);
    return true;
}
