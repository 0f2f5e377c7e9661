/* SPDX-License-Identifier: MIT */
/* What the curves say at the selected step, in numbers. */
#ifndef SCREENS_TREND_TABLE_H
#define SCREENS_TREND_TABLE_H

#include "canvas/area.h"
#include "canvas/canvas.h"
#include "session/session.h"
#include "study/trend.h"

/* A full table, or a few rows. at: place of the selected species in the walk,
 * -1 when it is not there. */
void screen_trend_table_draw(const struct session *session,
                             const struct trend *trend, struct canvas *canvas,
                             struct area area, int at);
void screen_trend_lines_draw(const struct session *session,
                             const struct trend *trend, struct canvas *canvas,
                             struct area area, int at);

#endif
