/* SPDX-License-Identifier: MIT */
#include "analysis/comparison.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

#define PERCENT_DIGITS 7

void comparison_clear(struct comparison *comparison)
{
    free(comparison->lines);
    free(comparison->facts);
    *comparison = (struct comparison){0};
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
        text_addf(t, ": %s", self->provenance->definition);
}
