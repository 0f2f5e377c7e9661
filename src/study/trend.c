/* SPDX-License-Identifier: MIT */
#include "study/trend.h"

static struct trend_set *
set_of(struct trend *trend, const struct provenance *provenance, bool against)
{
    for (int i = 0; i < trend->set_count; i++)
        if (trend->sets[i].provenance == provenance &&
            trend->sets[i].against == against)
            return &trend->sets[i];
    if (trend->set_count == TREND_SETS_MAX)
        return NULL;
    struct trend_set *set = &trend->sets[trend->set_count++];
    *set = (struct trend_set){.provenance = provenance, .against = against};
    return set;
}

static void take_stored(struct trend *trend, int step,
                        const struct reading *stored, bool against)
{
    if (!stored->provenance)
        return;
    struct trend_set *set = set_of(trend, stored->provenance, against);
    if (!set || stored->state != READING_OK)
        return;
    set->values[step] = (struct trend_stored){
        .there = true,
        .has_u = stored->has_u,
        .value = stored->value.value,
        .u = stored->has_u ? stored->u.value : 0.0,
        .evidence = stored->evidence,
    };
}

static struct trend_value value_of(const struct row *row)
{
    bool ok = row->state == ROW_OK;
    return (struct trend_value){
        .state = row->state,
        .there = row->value.provenance && row->value.state == READING_OK,
        .has_residual = ok,
        .has_percent = ok && row->has_percent,
        .value = row->value.value.value,
        .residual = ok ? row->residual.value : 0.0,
        .percent = ok && row->has_percent ? row->percent.value : 0.0,
    };
}

static void take_row(struct trend *trend, int step, const struct row *row)
{
    trend->unit = row->unit;
    take_stored(trend, step, &row->reference, false);
    if (!row->against.provenance)
        return;
    take_stored(trend, step, &row->against, true);
    struct row sets = row_of_sets(row);
    trend->disagreement[step] = value_of(&sets);
}

/* The ask at one step; false where there is no such ion. */
static bool ask_at(const struct study *study, const struct ask *ask,
                   struct walk_step step, struct ask *at)
{
    struct species species;
    struct status st = status_ok();
    *at = *ask;
    at->z = step.z;
    at->charge = step.charge;
    if (step.z != ask->z || step.charge != ask->charge)
        at->configuration = NULL;
    return study_species(study, at, &species, &st);
}

void trend_fill(struct trend *trend, const struct study *study,
                const struct ask *ask, const struct model *const *models,
                int count)
{
    struct walk walk = trend->walk;
    *trend = (struct trend){.walk = walk,
                            .quantity = ask->quantity,
                            .unit = ask->unit,
                            .site = ask->site};
    for (int m = 0; m < count && m < TREND_MODELS_MAX; m++)
        trend->series[trend->series_count++].model = models[m];
    for (int i = 0; i < walk.count; i++) {
        struct ask at;
        if (!ask_at(study, ask, walk.steps[i], &at))
            continue;
        for (int m = 0; m < trend->series_count; m++) {
            at.model = models[m];
            struct row row = study_row(study, &at);
            trend->series[m].values[i] = value_of(&row);
            trend->series[m].like_with_like = row.like_with_like;
            take_row(trend, i, &row);
        }
        if (count > 0)
            continue;
        at.model = NULL;
        struct row row = study_row(study, &at);
        take_row(trend, i, &row);
    }
}
