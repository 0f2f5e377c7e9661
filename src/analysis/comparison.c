/* SPDX-License-Identifier: MIT */
#include "analysis/comparison.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"

#define PERCENT_DIGITS 7

void comparison_clear(struct comparison *comparison)
{
    free(comparison->lines);
    free(comparison->facts);
    for (int i = 0; i < comparison->pair_count; i++)
        free(comparison->pairs[i]);
    *comparison = (struct comparison){0};
}

static int line_of(const struct comparison *c, const struct provenance *source)
{
    for (int i = 0; i < c->line_count; i++)
        if (c->lines[i].provenance == source)
            return i;
    return -1;
}

/* What a line of differences of two sets holds. */
static const struct definition disagreement_of = {
    .name = "disagreement", .text = "disagreement of two sets"};
static const struct definition unlike = {
    .name = "disagreement_unlike",
    .text = "disagreement of two sets, not like with like"};

static struct comparison_pair *pair_new(const struct provenance *first,
                                        const struct provenance *second)
{
    struct comparison_pair *pair = calloc(1, sizeof *pair);
    if (!pair)
        return NULL;
    pair->first = first;
    pair->second = second;
    struct text t = text_over(pair->id, sizeof pair->id);
    text_addf(&t, "%s - %s", second->id, first->id);
    pair->provenance = (struct provenance){
        .id = pair->id,
        .title = "disagreement of two sets",
        .definition = first->definition == second->definition ? &disagreement_of
                                                              : &unlike,
    };
    return pair;
}

static struct reading disagreement(const struct reading *first,
                                   const struct reading *second,
                                   const struct provenance *provenance)
{
    const struct reading *gap = first->state != READING_OK    ? first
                                : second->state != READING_OK ? second
                                                              : NULL;
    if (gap)
        return reading_gap(first->quantity, gap->state, gap->reason,
                           provenance);
    return (struct reading){
        .state = READING_OK,
        .quantity = first->quantity,
        .value = number_subtract(second->value, first->value),
        .provenance = provenance,
        .reason = "",
        .remark = "",
    };
}

bool comparison_add_pair(struct comparison *comparison,
                         const struct provenance *first,
                         const struct provenance *second, struct status *st)
{
    int a = line_of(comparison, first);
    int b = line_of(comparison, second);
    if (a < 0 || b < 0 ||
        comparison->lines[a].unit != comparison->lines[b].unit)
        return true;
    if (!definition_subtracts(first->definition, second->definition))
        return true;
    size_t count = (size_t)comparison->line_count;
    struct comparison_line *lines =
        realloc(comparison->lines, (count + 1) * sizeof *lines);
    if (lines)
        comparison->lines = lines;
    struct comparison_pair *pair = lines ? pair_new(first, second) : NULL;
    if (!pair || comparison->pair_count == QUANTITY_COUNT) {
        free(pair);
        return status_fail(st, STATUS_MEMORY, "out of memory");
    }
    comparison->pairs[comparison->pair_count++] = pair;
    int at = (a > b ? a : b) + 1;
    memmove(&lines[at + 1], &lines[at], (count - (size_t)at) * sizeof *lines);
    comparison->line_count++;
    lines[at] = (struct comparison_line){.quantity = lines[a].quantity,
                                         .unit = lines[a].unit,
                                         .provenance = &pair->provenance};
    for (int w = 0; w < comparison->count; w++)
        lines[at].readings[w] = disagreement(
            &lines[a].readings[w], &lines[b].readings[w], &pair->provenance);
    return true;
}

bool comparison_pair_readings(const struct comparison *comparison,
                              const struct comparison_line *line, int which,
                              struct reading readings[2])
{
    for (int i = 0; i < comparison->pair_count; i++) {
        const struct comparison_pair *pair = comparison->pairs[i];
        if (line->provenance != &pair->provenance)
            continue;
        int a = line_of(comparison, pair->first);
        int b = line_of(comparison, pair->second);
        readings[0] = comparison->lines[a].readings[which];
        readings[1] = comparison->lines[b].readings[which];
        return true;
    }
    return false;
}

bool comparison_difference(const struct comparison_line *line, int which,
                           struct difference *difference)
{
    const struct reading *first = &line->readings[0];
    const struct reading *other = &line->readings[which];
    if (which == 0 || first->state != READING_OK || other->state != READING_OK)
        return false;
    double size = fabs(first->value.value);
    difference->value = number_subtract(other->value, first->value);
    difference->has_percent = size > 0.0;
    if (difference->has_percent)
        difference->percent = number_round(
            100.0 * difference->value.value / size, PERCENT_DIGITS, 0);
    return true;
}

void comparison_label(const struct comparison *comparison, int line,
                      struct text *t)
{
    const struct comparison_line *self = &comparison->lines[line];
    bool shared = false;
    for (int i = 0; i < comparison->line_count; i++) {
        const struct comparison_line *other = &comparison->lines[i];
        if (i != line && other->quantity == self->quantity &&
            strcmp(other->provenance->id, self->provenance->id) == 0)
            shared = true;
    }
    text_add(t, self->provenance->id);
    if (shared)
        text_addf(t, ": %s", provenance_definition(self->provenance));
}
