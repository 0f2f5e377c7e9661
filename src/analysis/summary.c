/* SPDX-License-Identifier: MIT */
#include "analysis/summary.h"

#include <assert.h>
#include <math.h>

void summary_add(struct summary *summary, const struct row *row)
{
    if (row->state != ROW_OK) {
        summary->gaps++;
        return;
    }
    double r = row->residual.value;
    summary->count++;
    summary->sum += r;
    summary->sum_absolute += fabs(r);
    summary->sum_square += r * r;
    if (row->has_percent) {
        summary->percent_count++;
        summary->sum_absolute_percent += fabs(row->percent.value);
    }
    if (summary->largest_z == 0 || fabs(r) > fabs(summary->largest)) {
        summary->largest = r;
        summary->largest_z = row->species.z;
    }
}

double summary_mean(const struct summary *summary)
{
    assert(summary->count > 0);
    return summary->sum / summary->count;
}

double summary_mean_absolute(const struct summary *summary)
{
    assert(summary->count > 0);
    return summary->sum_absolute / summary->count;
}

double summary_rms(const struct summary *summary)
{
    assert(summary->count > 0);
    return sqrt(summary->sum_square / summary->count);
}

double summary_mean_absolute_percent(const struct summary *summary)
{
    assert(summary->percent_count > 0);
    return summary->sum_absolute_percent / summary->percent_count;
}
