/* SPDX-License-Identifier: MIT */
/* The audit: how large the residuals of each model are, and where; model
 * against reference as a scatter whose species can be reached. */
#ifndef SCREENS_AUDIT_H
#define SCREENS_AUDIT_H

#include "screens/parts.h"

/* Adds all models over all elements at the chosen charge to an audit that is
 * empty. Fails with STATUS_MEMORY. */
MUST_CHECK bool audit_fill(const struct ui *ui, struct audit *audit,
                           struct status *st);

/* Brings ui->audit up to date with the choice. */
void audit_refresh(struct ui *ui);

/* The series of the chosen model, or NULL. */
const struct audit_series *audit_chosen(const struct ui *ui);

/* Species of a series in the chosen part that have a residual, the largest
 * first; gives their number, at most Z_MAX. */
int audit_outliers(const struct ui *ui, const struct audit_series *series,
                   const struct audit_point *points[Z_MAX]);

/* The scatter, and the species below it. */
void draw_scatter(const struct ui *ui, struct canvas *canvas, struct area area);
void draw_outliers(const struct ui *ui, struct canvas *canvas,
                   struct area area);

#endif
