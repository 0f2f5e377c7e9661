/* SPDX-License-Identifier: MIT */
/* The line being typed, and the question before a file is overwritten. */
#include "app/app_internal.h"

#include <string.h>

bool app_prompt_is_open(const struct app *app)
{
    return app->prompt || app->overwriting;
}

void app_prompt_close(struct app *app)
{
    app->prompt = NULL;
    app->overwriting = false;
    field_set(&app->field, "");
}

void app_prompt_open(struct app *app, const struct prompt_ops *prompt,
                     const char *text)
{
    app->prompt = prompt;
    field_set(&app->field, text);
    app->session.message[0] = '\0';
}

void app_prompt_begin(struct app *app, const struct prompt_ops *prompt)
{
    char text[FIELD_TEXT_MAX] = "";
    struct text start = text_over(text, sizeof text);
    if (prompt->begin &&
        !prompt->begin(&app->session, app->states[app->screen], &start))
        return;
    app_prompt_open(app, prompt, text);
}

void app_ask_overwrite(struct app *app)
{
    app_prompt_close(app);
    app->overwriting = true;
}

static enum effect answer_overwrite(struct app *app, const struct event *event)
{
    bool yes = event->kind == EVENT_CHARACTER && event->character == 'y';
    if (event->kind != EVENT_CHARACTER && event->kind != EVENT_KEY)
        return EFFECT_NONE;
    app_prompt_close(app);
    app->replace = yes;
    if (yes)
        return EFFECT_WRITE;
    session_report(&app->session, false, "%s left as it was", app->path);
    return EFFECT_REDRAW;
}

static enum effect accept(struct app *app)
{
    enum effect effect = app->prompt->accept(
        &app->session, app->states[app->screen], app->field.text);
    if (effect == EFFECT_NONE) /* to be mended */
        return EFFECT_REDRAW;
    if (effect == EFFECT_WRITE) {
        memcpy(app->path, app->field.text, sizeof app->path);
        app->replace = false;
    }
    app_prompt_close(app);
    return effect;
}

static enum effect close_and(struct app *app, enum effect effect)
{
    app_prompt_close(app);
    return effect;
}

enum effect app_prompt_update(struct app *app, const struct event *event)
{
    const struct prompt_ops *p = app->prompt;
    struct session *s = &app->session;
    void *state = app->states[app->screen];
    if (app->overwriting)
        return answer_overwrite(app, event);
    if (event->kind == EVENT_CHARACTER && p->ends &&
        p->ends(app->field.text, event->character))
        return close_and(app, EFFECT_AGAIN);
    if (field_edit(&app->field, event)) {
        if (event->kind != EVENT_KEY)
            s->message[0] = '\0';
        if (p->follow)
            p->follow(s, state, app->field.text);
        return EFFECT_REDRAW;
    }
    if (event->kind != EVENT_KEY)
        return EFFECT_NONE;
    if (event->key == KEY_CODE_ENTER)
        return accept(app);
    if (event->key == KEY_CODE_ESCAPE) {
        if (p->cancel)
            p->cancel(s, state);
        return close_and(app, EFFECT_REDRAW);
    }
    /* An arrow ends a jump and moves on from there. */
    return p->arrows_end ? close_and(app, EFFECT_AGAIN) : EFFECT_REDRAW;
}

void app_prompt_draw(const struct app *app, struct canvas *canvas, int row)
{
    int width = canvas->columns;
    if (app->overwriting) {
        static const char question[] = " exists; overwrite it? y/n";
        const char *name =
            field_tail(app->path, width - (int)sizeof question + 1);
        canvas_textf(canvas, row, 0, width, ROLE_CAUTION, "%s%s", name,
                     question);
        return;
    }
    int column = field_draw(&app->field, canvas, row, app->prompt->label);
    if (app->prompt->explain)
        app->prompt->explain(app->field.text, canvas, row, column);
}
