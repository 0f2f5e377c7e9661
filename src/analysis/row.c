/* SPDX-License-Identifier: MIT */
#include "analysis/row.h"

#include <math.h>
#include <string.h>

#define PERCENT_DIGITS 7

const char *row_state_id(enum row_state state)
{
    static const char *const ids[ROW_STATE_COUNT] = {
#define ROW_ID(state, id) id,
        ROW_STATE_LIST(ROW_ID)
#undef ROW_ID
    };
    return ids[state];
}

static bool same_definition(const struct provenance *a,
                            const struct provenance *b)
{
    return a && b && strcmp(a->definition, b->definition) == 0;
}

/* A percentage of a signed quantity is meant as a share of its size. */
static void subtract(struct row *row)
{
    row->residual = number_subtract(row->value.value, row->reference.value);
    double reference = fabs(row->reference.value.value);
    row->has_percent = reference > 0.0;
    if (row->has_percent)
        row->percent = number_round(100.0 * row->residual.value / reference,
                                    PERCENT_DIGITS, 0);
}

static enum row_state state_without_value(enum reading_state state)
{
    if (state == READING_NOT_CONVERGED)
        return ROW_NOT_CONVERGED;
    return state == READING_PENDING ? ROW_NOT_SOLVED : ROW_OUTSIDE_MODEL;
}

void row_compare(struct row *row, struct reading value,
                 struct reading reference)
{
    row->value = reading_in_unit(value, row->unit);
    row->reference = reading_in_unit(reference, row->unit);
    row->like_with_like =
        same_definition(value.provenance, reference.provenance);
    row->has_percent = false;
    row->reason = "";
    if (!value.provenance) {
        row->state = ROW_REFERENCE_ONLY;
        row->reason = "no model computes this quantity";
        if (reference.state != READING_OK) {
            row->state = ROW_NO_REFERENCE;
            row->reason = reference.reason;
        }
    } else if (value.state != READING_OK) {
        row->state = state_without_value(value.state);
        row->reason = value.reason;
    } else if (reference.state != READING_OK) {
        row->state = ROW_NO_REFERENCE;
        row->reason = reference.reason;
    } else if (row->unit->dimension == DIMENSION_NUMBER &&
               !row->like_with_like) {
        row->state = ROW_OTHER_SCALE;
        row->reason = "the reference is on another scale";
    } else {
        row->state = ROW_OK;
        subtract(row);
    }
}
