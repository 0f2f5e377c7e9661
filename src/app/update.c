/* SPDX-License-Identifier: MIT */
/* The way of an event: an export that waits, the line being typed, the open
 * list, then the keys of the screen. */
#include "app/app_internal.h"
#include "screens/list.h"
#include "session/common.h"

/* Back to where the screen was opened, or to the first one. */
static void leave(struct app *app)
{
    const struct screen_ops *ops = app_screen(app);
    if (ops->back && ops->back(&app->session, app->states[app->screen]))
        return;
    app_show(app, ops->returns ? app->before : 0);
}

static void go_to(struct app *app, int i)
{
    if (i != app->screen)
        app_show(app, i);
    else if (app_screen(app)->returns)
        leave(app);
    else
        session_report(&app->session, false, "%s is in front already",
                       app_screen(app)->title);
}

/* What a key's function asks of the app is done here. */
static enum effect carry_out(struct app *app, enum effect effect)
{
    if (effect > EFFECT_NONE && effect <= EFFECT_QUIT)
        return effect;
    if (effect == EFFECT_BACK)
        leave(app);
    else if (effect == EFFECT_NEXT)
        app_show(app, (app->screen + 1) % screen_list_count);
    else if (effect == EFFECT_EXPORT)
        app_export_open(app);
    return EFFECT_REDRAW;
}

/* No key is silent: one that means nothing here says so. */
static enum effect refuse(struct app *app, const struct event *event)
{
    char out[KEY_NAME_MAX];
    if (event->kind != EVENT_KEY && event->kind != EVENT_CHARACTER)
        return EFFECT_NONE;
    session_report(&app->session, false,
                   "%s does nothing on %s; ? lists the keys",
                   session_key_name(screen_list, screen_list_count, event, out),
                   app_screen(app)->title);
    return EFFECT_REDRAW;
}

static bool does_nothing(const struct key_row *row, int to)
{
    return to < 0 && !row->act && !row->chooser && !row->prompt && !row->move;
}

static enum effect press(struct app *app, const struct key_row *row,
                         const struct event *event)
{
    const struct screen_ops *ops = app_screen(app);
    struct session *s = &app->session;
    void *state = app->states[app->screen];
    int to = session_key_screen(screen_list, screen_list_count, row);
    enum effect effect = EFFECT_REDRAW;
    if (does_nothing(row, to))
        return refuse(app, event);
    s->message[0] = '\0';
    if (to >= 0)
        go_to(app, to);
    else if (row->chooser)
        app_chooser_open(app, row->chooser);
    else if (row->prompt)
        app_prompt_begin(app, row->prompt);
    else if (row->act)
        effect = row->act(s, state);
    else if (ops->move)
        effect = ops->move(s, state, row->move);
    app_follow(app);
    return carry_out(app, effect);
}

/* A capital letter or a digit is the start of a symbol, name or number. */
static bool starts_jump(const struct app *app, const struct event *event)
{
    uint32_t c = event->character;
    return event->kind == EVENT_CHARACTER &&
           (app_screen(app)->groups & KEYS_SPECIES) != 0 &&
           ((c >= 'A' && c <= 'Z') || (c >= '1' && c <= '9'));
}

static enum effect interrupt(struct app *app)
{
    struct session *s = &app->session;
    const struct screen_ops *ops = app_screen(app);
    if (ops->stop && ops->stop(s, app->states[app->screen]))
        return EFFECT_REDRAW;
    if (study_progress(s->study).total > 0) {
        study_stop(s->study);
        app_stop(app);
        session_report(s, false, "stopped; what is solved stays");
        return EFFECT_REDRAW;
    }
    if (!app_prompt_is_open(app) && !app->chooser)
        return EFFECT_QUIT;
    app_prompt_close(app);
    app->chooser = NULL;
    return EFFECT_REDRAW;
}

/* While an export waits for its atoms: the last tick writes it, a key gives it
 * up, all else is as ever. */
static bool await(struct app *app, const struct event *event,
                  enum effect *effect)
{
    *effect = EFFECT_REDRAW;
    if (event->kind == EVENT_RESIZE ||
        (event->kind == EVENT_TICK && app_has_work(app)))
        return false;
    app->awaiting = false;
    if (event->kind == EVENT_TICK) {
        *effect = EFFECT_WRITE;
        return true;
    }
    if (event->kind == EVENT_INTERRUPT) {
        study_stop(app->session.study);
        app_stop(app);
    }
    session_report(&app->session, false, "%s: nothing written", app->path);
    return true;
}

static enum effect take_key(struct app *app, const struct event *event)
{
    const struct screen_ops *ops = app_screen(app);
    if (event->kind == EVENT_MOUSE) {
        enum effect effect =
            ops->mouse
                ? ops->mouse(&app->session, app->states[app->screen], event)
                : EFFECT_NONE;
        app_follow(app);
        return effect;
    }
    if (starts_jump(app, event)) {
        app_prompt_begin(app, &session_prompt_jump);
        return app_prompt_update(app, event);
    }
    const struct key_row *row = session_key_find(&app->keys, event);
    return row ? press(app, row, event) : refuse(app, event);
}

static enum effect take_event(struct app *app, const struct event *event)
{
    enum effect effect = EFFECT_AGAIN;
    if (app->awaiting && await(app, event, &effect))
        return effect;
    if (event->kind == EVENT_RESIZE) {
        app->session.rows = event->row;
        app->session.columns = event->column;
        return EFFECT_REDRAW;
    }
    if (event->kind == EVENT_TICK)
        return EFFECT_REDRAW;
    if (event->kind == EVENT_INTERRUPT)
        return interrupt(app);
    effect = EFFECT_AGAIN;
    if (app_prompt_is_open(app))
        effect = app_prompt_update(app, event);
    else if (app->chooser)
        effect = app_chooser_update(app, event);
    return effect == EFFECT_AGAIN ? take_key(app, event) : effect;
}

enum effect app_update(struct app *app, const struct event *event)
{
    struct session *s = &app->session;
    enum effect effect = take_event(app, event);
    bool user = event->kind != EVENT_TICK && event->kind != EVENT_RESIZE &&
                event->kind != EVENT_INTERRUPT;
    if (user && effect != EFFECT_NONE) {
        s->wanting = true;
        s->stopped = s->stopped && s->choice_version == s->stopped_version;
    }
    return effect;
}
