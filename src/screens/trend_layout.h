/* SPDX-License-Identifier: MIT */
#ifndef SCREENS_TREND_LAYOUT_H
#define SCREENS_TREND_LAYOUT_H

#include <stdbool.h>

#include "canvas/area.h"

/* The trend in an area: plots one above the other, the numbers of the selected
 * step as a full table beside or below them, or below in few rows. Without
 * rows a part is absent. */
struct trend_layout {
    struct area values, residuals, table;
    bool full;
};

struct trend_layout screen_trend_layout(struct area area);

#endif
