/* SPDX-License-Identifier: MIT */
/* A quantity along a walk: what every model and every reference says at each
 * step. What is drawn, and what a table of the same would hold. */
#ifndef STUDY_TREND_H
#define STUDY_TREND_H

#include "element/walk.h"
#include "study/study.h"

#define TREND_MODELS_MAX 16
#define TREND_SETS_MAX 4

/* One step of one model; numbers in the trend's unit. there: it has a value. */
struct trend_value {
    enum row_state state;
    bool there, has_residual, has_percent;
    double value, residual, percent;
};

/* One step of one reference set. */
struct trend_stored {
    bool there, has_u;
    double value, u;
    enum evidence evidence;
};

struct trend_series {
    const struct model *model;
    bool like_with_like;
    struct trend_value values[WALK_MAX];
};

/* against: the second reference; its residual is how far it is from the first.
 */
struct trend_set {
    const struct provenance *provenance;
    bool against;
    struct trend_stored values[WALK_MAX];
};

struct trend {
    struct walk walk;
    enum quantity_id quantity;
    const struct unit *unit;
    struct site site; /* of every step */
    int series_count;
    struct trend_series series[TREND_MODELS_MAX];
    int set_count;
    struct trend_set sets[TREND_SETS_MAX];
    /* Second less first reference, where both are there. */
    struct trend_value disagreement[WALK_MAX];
};

/* Fills a trend for models[count] along trend->walk, which is set. ask: what is
 * asked at each step, but for element, charge and model; a configuration holds
 * at the step whose species it is given for (z, charge of the ask). */
void trend_fill(struct trend *trend, const struct study *study,
                const struct ask *ask, const struct model *const *models,
                int count);

#endif
