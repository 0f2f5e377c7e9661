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
    return a && b && a->definition == b->definition;
}

static bool subtracts(const struct provenance *a, const struct provenance *b)
{
    return a && b && definition_subtracts(a->definition, b->definition);
}

/* A percentage of a signed quantity is meant as a share of its size. False
 * where the reference is zero. */
static bool percent_of(struct number difference, struct number reference,
                       struct number *percent)
{
    double size = fabs(reference.value);
    if (size > 0.0)
        *percent =
            number_round(100.0 * difference.value / size, PERCENT_DIGITS, 0);
    return size > 0.0;
}

static void subtract(struct row *row)
{
    row->residual = number_subtract(row->value.value, row->reference.value);
    row->has_percent =
        percent_of(row->residual, row->reference.value, &row->percent);
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
    row->has_percent = row->repeats = false;
    row->disagrees = row->has_disagreement_percent = false;
    row->against = (struct reading){.reason = "", .remark = ""};
    row->reason = "";
    if (!value.provenance) {
        row->state = ROW_REFERENCE_ONLY;
        row->reason = value.reason;
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
    } else if (!subtracts(value.provenance, reference.provenance)) {
        row->state = ROW_OTHER_SCALE;
        row->reason = "the reference is on another scale";
    } else {
        row->state = ROW_OK;
        subtract(row);
    }
}

void row_disagree(struct row *row, struct reading against)
{
    row->against = reading_in_unit(against, row->unit);
    row->disagrees = against.state == READING_OK &&
                     row->reference.state == READING_OK &&
                     subtracts(against.provenance, row->reference.provenance);
    if (!row->disagrees)
        return;
    row->disagreement =
        number_subtract(row->against.value, row->reference.value);
    row->has_disagreement_percent = percent_of(
        row->disagreement, row->reference.value, &row->disagreement_percent);
}

struct row row_of_sets(const struct row *row)
{
    struct row sets = *row;
    sets.value = row->against;
    sets.like_with_like =
        same_definition(row->against.provenance, row->reference.provenance);
    sets.repeats = false;
    sets.residual = row->disagreement;
    sets.has_percent = row->has_disagreement_percent;
    sets.percent = row->disagreement_percent;
    sets.state = ROW_OK;
    sets.reason = "";
    if (row->disagrees)
        return sets;
    sets.state = ROW_NO_REFERENCE;
    sets.reason = row->reference.state != READING_OK ? row->reference.reason
                  : row->against.state != READING_OK
                      ? row->against.reason
                      : "the sets are on other scales";
    return sets;
}
