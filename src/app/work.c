/* SPDX-License-Identifier: MIT */
/* What the screens want solved, in the order in which someone looks. */
#include "app/app_internal.h"

static bool own_work(const struct app *app)
{
    const struct screen_ops *ops = app_screen(app);
    return ops->has_work &&
           ops->has_work(&app->session, app->states[app->screen]);
}

bool app_has_work(const struct app *app)
{
    return own_work(app) || study_progress(app->session.study).total > 0 ||
           app->session.wanting;
}

bool app_step(struct app *app, bool *changed)
{
    struct session *s = &app->session;
    const struct screen_ops *ops = app_screen(app);
    if (own_work(app)) {
        *changed = false;
        ops->step(s, app->states[app->screen], changed);
        /* A list or line that is open belongs to the screen that is left. */
        if (s->go) {
            app->chooser = NULL;
            app->prompt = NULL;
        }
        app_follow(app);
        return true;
    }
    struct study_progress before = study_progress(s->study);
    if (s->wanting && !s->stopped && ops->wants)
        ops->wants(s, app->states[app->screen]);
    s->wanting = false;
    struct status st = status_ok();
    bool more = study_step(s->study, &st);
    if (st.code != STATUS_OK) {
        session_report(s, true, "%s; the solving is stopped", st.message);
        app_stop(app);
    }
    struct study_progress after = study_progress(s->study);
    *changed = after.done != before.done || (before.total > 0 && !more);
    if (*changed)
        s->solved_version++;
    return more;
}
