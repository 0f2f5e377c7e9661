/* SPDX-License-Identifier: MIT */
#include "analysis/summary.h"

#include <assert.h>
#include <math.h>

void summary_add_residual(struct summary *summary, int z, int charge,
                          struct site site, double residual,
                          const double *percent)
{
    summary->count++;
    summary->sum += residual;
    summary->sum_absolute += fabs(residual);
    summary->sum_square += residual * residual;
    if (percent) {
        summary->percent_count++;
        summary->sum_absolute_percent += fabs(*percent);
    }
    if (summary->largest_z == 0 || fabs(residual) > fabs(summary->largest)) {
        summary->largest = residual;
        summary->largest_z = z;
        summary->largest_charge = charge;
        summary->largest_site = site;
    }
}

void summary_add(struct summary *summary, const struct row *row)
{
    if (row->state == ROW_OK)
        summary_add_residual(summary, row->species.z, row->species.charge,
                             row->species.site, row->residual.value,
                             row->has_percent ? &row->percent.value : NULL);
    else
        summary->gaps++;
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
