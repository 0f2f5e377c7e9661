/* SPDX-License-Identifier: MIT */
/* What the screens ask the models that iterate to solve, in the order in which
 * someone looks: the selected species first, then the map. */
#include "screens/atom.h"
#include "screens/audit.h"
#include "screens/parts.h"
#include "screens/trend.h"

static void want(struct ui *ui, int z, int charge, const struct model *model,
                 bool first)
{
    struct ask ask;
    struct status st = status_ok();
    if (model->closed || !ui_ask(ui, z, charge, &ask))
        return;
    ask.model = model;
    if (model_offer_for(model, ask.quantity, NULL) >= 0 &&
        !study_want(ui->study, &ask, first, &st))
        ui_report(ui, true, "%s", st.message);
}

/* Queues what is shown and not solved yet. */
static void want_trend(struct ui *ui)
{
    const struct model *models[TREND_MODELS_MAX];
    struct walk walk;
    int count = trend_models(ui, models);
    walk_fill(&walk, ui->choice.walk, ui->choice.z, ui->choice.charge);
    for (int m = count - 1; m >= 0; m--)
        for (int i = walk.count - 1; i >= 0; i--)
            want(ui, walk.steps[i].z, walk.steps[i].charge, models[m], true);
}

static void want_shown(struct ui *ui)
{
    const struct choice *c = &ui->choice;
    if (ui->screen == SCREEN_ATOM)
        return;
    if (ui->screen == SCREEN_TREND || trend_on_map(ui))
        want_trend(ui);
    for (int m = 0; ui->screen == SCREEN_AUDIT && m < model_count(); m++)
        for (int z = 1; z <= Z_MAX; z++)
            want(ui, z, c->charge, model_at(m), false);
    if (c->model && !c->model->closed && ui->screen == SCREEN_MAP)
        for (int z = 1; z <= Z_MAX; z++)
            want(ui, z, c->charge, c->model, false);
    for (int p = 0; ui->screen == SCREEN_COMPARE && p < c->pin_count; p++)
        for (int m = 0; m < model_count(); m++)
            want(ui, c->pins[p].z, c->pins[p].charge, model_at(m), true);
    for (int m = model_count() - 1; m >= 0; m--)
        want(ui, c->z, c->charge, model_at(m), true);
}

bool ui_has_work(const struct ui *ui)
{
    return atom_pending(ui) || study_progress(ui->study).total > 0 ||
           ui->wanting;
}

bool ui_step(struct ui *ui, bool *changed)
{
    if (atom_pending(ui)) {
        atom_step_work(ui, changed);
        return true;
    }
    struct study_progress before = study_progress(ui->study);
    if (ui->wanting && !ui->stopped)
        want_shown(ui);
    ui->wanting = false;
    bool more = study_step(ui->study);
    struct study_progress after = study_progress(ui->study);
    *changed = after.done != before.done || (before.total > 0 && !more);
    if (*changed) {
        /* The map changes with its own model alone. */
        const struct model *model = ui->choice.model;
        ui->stale = ui->stale || (model && !model->closed);
        ui->comparison_stale = ui->trend_stale = ui->audit_stale = true;
    }
    return more;
}

/* Queues an atom that an export holds; true when it is not solved yet. */
static bool lacks(struct ui *ui, int z, int charge, const struct model *model)
{
    struct ask ask;
    struct status st = status_ok();
    if (model->closed || !ui_ask(ui, z, charge, &ask))
        return false;
    ask.model = model;
    if (ui->scope == SCOPE_COMPARE) { /* holds all quantities */
        ask.quantity = model->offers[0].quantity;
        ask.reference = ask.against = NULL;
    }
    if (model_offer_for(model, ask.quantity, NULL) < 0 ||
        study_row(ui->study, &ask).state != ROW_NOT_SOLVED)
        return false;
    if (study_want(ui->study, &ask, true, &st))
        return true;
    ui_report(ui, true, "%s", st.message);
    return false;
}

static int lacks_models(struct ui *ui, int z, int charge)
{
    int count = 0;
    for (int m = 0; m < model_count(); m++)
        count += lacks(ui, z, charge, model_at(m));
    return count;
}

static int lacks_scope(struct ui *ui)
{
    const struct choice *c = &ui->choice;
    const struct trend *trend = &ui->trend;
    int count = 0;
    if (ui->scope == SCOPE_ATOM)
        return atom_pending(ui);
    if (ui->scope == SCOPE_ROW ||
        (ui->scope == SCOPE_COMPARE && c->pin_count == 0))
        return lacks_models(ui, c->z, c->charge);
    if (ui->scope == SCOPE_PINS || ui->scope == SCOPE_COMPARE)
        for (int p = 0; p < c->pin_count; p++)
            count += lacks_models(ui, c->pins[p].z, c->pins[p].charge);
    for (int i = 0; ui->scope == SCOPE_TREND && i < trend->walk.count; i++)
        for (int s = 0; s < trend->series_count; s++)
            count += lacks(ui, trend->walk.steps[i].z,
                           trend->walk.steps[i].charge, trend->series[s].model);
    for (int z = 1; ui->scope == SCOPE_AUDIT && z <= Z_MAX; z++)
        count += lacks_models(ui, z, c->charge);
    for (int z = 1; ui->scope == SCOPE_SHEET && c->model && z <= Z_MAX; z++)
        count += lacks(ui, z, c->charge, c->model);
    return count;
}

bool ui_export_ready(struct ui *ui)
{
    if (ui->scope == SCOPE_TREND)
        trend_refresh(ui);
    ui->awaiting = lacks_scope(ui) > 0;
    if (ui->awaiting)
        return false;
    /* The work may be further than the picture. */
    ui_refresh(ui);
    if (ui->scope == SCOPE_TREND)
        trend_refresh(ui);
    else if (ui->scope == SCOPE_AUDIT)
        audit_refresh(ui);
    else if (ui->scope == SCOPE_COMPARE)
        (void)compare_refresh(ui);
    return true;
}
