/* SPDX-License-Identifier: MIT */
#ifndef SCREENS_AUDIT_LAYOUT_H
#define SCREENS_AUDIT_LAYOUT_H

#include "canvas/area.h"

/* Audit: the table of figures, the scatter, its species, a few rows of words.
 * scatter and points have no rows where only the table fits. */
struct audit_layout {
    struct area table, scatter, points, words;
    int cell_columns;
};

/* models: columns of the table. */
struct audit_layout screen_audit_layout(int rows, int columns, int models);

#endif
