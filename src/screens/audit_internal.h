/* SPDX-License-Identifier: MIT */
/* The state of the screen Audit, shared by its files. */
#ifndef SCREENS_AUDIT_INTERNAL_H
#define SCREENS_AUDIT_INTERNAL_H

#include "analysis/audit.h"
#include "canvas/area.h"
#include "session/screen.h"

/* Which figure the table holds. */
enum statistic {
    STATISTIC_MEAN_ABSOLUTE,
    STATISTIC_PERCENT,
    STATISTIC_MEAN,
    STATISTIC_RMS,
    STATISTIC_LARGEST,
    STATISTIC_COUNTS,
    STATISTIC_KINDS
};

struct audit_state {
    struct audit audit; /* of the chosen quantity, all elements */
    unsigned choice_version, solved_version;
    enum statistic statistic;
    struct audit_part part;
    bool points; /* the cursor is among the species of the part */
    int point;
};

/* The series of the chosen model, or NULL. */
const struct audit_series *screen_audit_chosen(const struct session *session,
                                               const struct audit_state *own);

/* Species of a series in the chosen part that have a residual, the largest
 * first; gives their number, at most Z_MAX. */
int screen_audit_outliers(const struct audit_state *own,
                          const struct audit_series *series,
                          const struct audit_point *points[Z_MAX]);

/* The scatter, and the species below it. */
void screen_audit_scatter_draw(const struct session *session,
                               const struct audit_state *own,
                               struct canvas *canvas, struct area area);
void screen_audit_outliers_draw(const struct session *session,
                                const struct audit_state *own,
                                struct canvas *canvas, struct area area);

#endif
