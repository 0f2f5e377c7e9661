/* SPDX-License-Identifier: MIT */
/* The trend: a quantity along a walk, every chosen model a curve against the
 * stored values, the residual below. A screen of its own, and beside the map.
 */
#ifndef SCREENS_TREND_VIEW_H
#define SCREENS_TREND_VIEW_H

#include "canvas/area.h"
#include "session/screen.h"
#include "study/trend.h"

/* What is drawn, and the versions of the session that it was made for. Starts
 * as zeros, stale. */
struct trend_view {
    struct trend trend;
    unsigned choice_version, solved_version;
};

/* Whether nothing that the trend shows has changed; the walk may be another
 * one. */
bool screen_trend_is_fresh(const struct session *session,
                           const struct trend_view *view);

/* Brings it up to date. */
void screen_trend_refresh(const struct session *session,
                          struct trend_view *view);

/* Models that have a curve, in the order of the registry: at most
 * TREND_MODELS_MAX. */
int screen_trend_models(const struct session *session,
                        const struct model *models[]);

/* Queues what the curves still lack. */
void screen_trend_want(struct session *session);

/* Draws everything into an area, up to date. */
void screen_trend_draw(const struct session *session, struct trend_view *view,
                       struct canvas *canvas, struct area area);

/* Which way through the table; which models have a curve. */
extern const struct chooser_ops screen_trend_choose_walk;
extern const struct chooser_ops screen_trend_choose_curves;

#endif
