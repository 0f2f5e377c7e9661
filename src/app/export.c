/* SPDX-License-Identifier: MIT */
/* What the user takes away: what the screen exports, and where to. */
#include <assert.h>

#include "app/app_internal.h"
#include "report/report.h"
#include "screens/list.h"
#include "write/format.h"

/* Filled and taken here, since it chooses among the screen's exports. */
static const struct chooser_ops choose_export = {.title = "Export"};

static enum effect accept_file(struct session *s, void *state, const char *line)
{
    (void)state;
    if (line[0] != '\0')
        return EFFECT_WRITE;
    session_report(s, false, "nothing exported");
    return EFFECT_REDRAW;
}

static const struct prompt_ops prompt_file = {
    .label = "write CSV to: ",
    .accept = accept_file,
};

static void open_file(struct app *app, const struct export_ops *export)
{
    char name[FIELD_TEXT_MAX];
    struct text t = text_over(name, sizeof name);
    app->export = export;
    export->file(&app->session, app->states[app->screen], &t);
    app_prompt_open(app, &prompt_file, name);
}

void app_export_open(struct app *app)
{
    const struct screen_ops *ops = app_screen(app);
    if (ops->export_count == 1) {
        open_file(app, &ops->exports[0]);
        return;
    }
    app->list = (struct chooser){0};
    for (int i = 0; i < ops->export_count; i++)
        if (!ops->exports[i].offered ||
            ops->exports[i].offered(&app->session, app->states[app->screen]))
            chooser_add(&app->list, i, i == 0, "%s", ops->exports[i].label);
    app->chooser = &choose_export;
}

void app_chooser_open(struct app *app, const struct chooser_ops *chooser)
{
    struct session *s = &app->session;
    app->list = (struct chooser){0};
    s->message[0] = '\0';
    chooser->fill(s, app->states[app->screen], &app->list);
    if (app->list.count == 0) {
        if (chooser->empty)
            session_report(s, false, "%s", chooser->empty);
        else
            session_report(s, false,
                           "nothing to choose from: no model computes %s",
                           quantity_at(s->choice.quantity)->id);
        return;
    }
    if (chooser->hint)
        session_report(s, false, "%s", chooser->hint);
    app->chooser = chooser;
}

static enum effect take(struct app *app)
{
    const struct chooser_ops *chooser = app->chooser;
    int at = app->list.at;
    int value = app->list.values[at];
    app->chooser = NULL;
    session_touch(&app->session);
    if (chooser == &choose_export) {
        open_file(app, &app_screen(app)->exports[value]);
        return EFFECT_REDRAW;
    }
    chooser->take(&app->session, app->states[app->screen], value);
    if (chooser->stays) {
        app_chooser_open(app, chooser);
        app->list.at = at;
    }
    return EFFECT_REDRAW;
}

enum effect app_chooser_update(struct app *app, const struct event *event)
{
    switch (chooser_update(&app->list, event)) {
    case CHOOSER_NOTHING:
        return EFFECT_NONE;
    case CHOOSER_TAKEN:
        return take(app);
    case CHOOSER_LEFT:
        app->chooser = NULL;
        app->session.message[0] = '\0';
        return EFFECT_REDRAW;
    case CHOOSER_MOVED:
        break;
    }
    return EFFECT_REDRAW;
}

/* State of the screen whose export it is: while one waited for its atoms the
 * screen shown may have become another. */
static void *exporter(const struct app *app)
{
    for (int i = 0; i < screen_list_count; i++)
        for (int e = 0; e < screen_list[i]->export_count; e++)
            if (&screen_list[i]->exports[e] == app->export)
                return app->states[i];
    assert(!"an export belongs to a screen");
    return NULL;
}

bool app_export_ready(struct app *app)
{
    const struct export_ops *e = app->export;
    int lacking = e->lacks ? e->lacks(&app->session, exporter(app)) : 0;
    app->awaiting = lacking > 0 && app_has_work(app);
    return lacking == 0;
}

bool app_export(struct app *app, FILE *out, struct status *st)
{
    struct report report;
    report_begin(&report);
    bool ok = app->export->report(&app->session, exporter(app), format_csv.uses,
                                  &report, st) &&
              format_write(&format_csv, out, &report, &write_plain, st);
    report_clear(&report);
    return ok;
}

void app_export_command(struct app *app, struct text *t)
{
    app->export->command(&app->session, exporter(app), t);
}
