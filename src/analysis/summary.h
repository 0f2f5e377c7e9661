/* SPDX-License-Identifier: MIT */
/* How large residuals are: running statistics over rows. */
#ifndef ANALYSIS_SUMMARY_H
#define ANALYSIS_SUMMARY_H

#include "analysis/row.h"

/* Sums over rows in ROW_OK (count) and the number of others (gaps). The
 * statistics are in the rows' unit; percent sums over those rows that have a
 * percentage. */
struct summary {
    int count;
    int gaps;
    int percent_count;
    double sum, sum_absolute, sum_square, sum_absolute_percent;
    double largest; /* the residual of largest size, with its sign */
    int largest_z;  /* 0 while count is 0 */
    int largest_charge;
    struct site largest_site;
};

void summary_add(struct summary *summary, const struct row *row);

/* One residual of a species, with its percentage where there is one. */
void summary_add_residual(struct summary *summary, int z, int charge,
                          struct site site, double residual,
                          const double *percent);

/* Of the residuals; count must be at least 1. */
double summary_mean(const struct summary *summary);
double summary_mean_absolute(const struct summary *summary);
double summary_rms(const struct summary *summary);

/* Mean size of the residual in per cent of the reference; percent_count must
 * be at least 1. */
double summary_mean_absolute_percent(const struct summary *summary);

#endif
