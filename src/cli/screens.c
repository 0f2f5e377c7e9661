/* SPDX-License-Identifier: MIT */
/* The call without a command: the screens, and what they want done outside. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include "base/file.h"
#include "cli/command.h"
#include "cli/loop.h"
#include "cli/remember.h"
#include "app/app.h"
#include "cli/request.h"

struct shown_app {
    struct terminal *terminal;
    struct app app;
    bool changed; /* the picture moved on since it was drawn */
    char data[SESSION_COMMAND_MAX];
};

static void write_export(struct app *app)
{
    struct file_draft draft;
    struct status st = status_ok();
    char command[SESSION_COMMAND_MAX];
    struct text t = text_over(command, sizeof command);
    if (!app->replace && access(app->path, F_OK) == 0) {
        app_ask_overwrite(app);
        return;
    }
    if (!app_export_ready(app))
        return;
    bool ok = file_draft_open(&draft, app->path, app->replace, &st);
    if (ok && app_export(app, draft.stream, &st))
        ok = file_draft_commit(&draft, &st);
    else if (ok) {
        file_draft_discard(&draft);
        ok = false;
    }
    app_export_command(app, &t);
    if (ok && t.cut)
        session_report(&app->session, false, "%s written", app->path);
    else if (ok && command[0])
        session_report(&app->session, false, "%s written; the same: %s",
                       app->path, command);
    else if (ok)
        session_report(&app->session, false,
                       "%s written; no one command prints the same, for the "
                       "configuration of your own",
                       app->path);
    else
        session_report(&app->session, true, "nothing written: %s", st.message);
}

static enum loop_effect update(void *state, const struct event *event)
{
    struct shown_app *s = state;
    struct status st = status_ok();
    enum effect effect = app_update(&s->app, event);
    if (effect == EFFECT_NONE)
        return LOOP_NOTHING;
    if (effect == EFFECT_REPAINT)
        return LOOP_REPAINT;
    if (effect == EFFECT_QUIT)
        return LOOP_QUIT;
    if (effect == EFFECT_WRITE)
        write_export(&s->app);
    else if (effect == EFFECT_FORGET && !view_forget(&st))
        session_report(&s->app.session, true, "%s", st.message);
    else if (effect == EFFECT_MOUSE)
        terminal_mouse(s->terminal, s->app.session.mouse);
    return LOOP_REDRAW;
}

static void draw(void *state, struct canvas *canvas)
{
    struct shown_app *s = state;
    canvas->ascii = terminal_ascii(s->terminal);
    app_draw(&s->app, canvas);
}

static bool has_work(void *state)
{
    return app_has_work(&((struct shown_app *)state)->app);
}

static void step(void *state)
{
    struct shown_app *s = state;
    bool changed;
    app_step(&s->app, &changed);
    s->changed = s->changed || changed;
}

static bool keep_view(const struct app *app, struct status *st)
{
    char view[VIEW_BYTES_MAX];
    struct text t = text_over(view, sizeof view);
    if (app->session.forgotten)
        return true;
    app_save_view(app, &t);
    return view_keep(view, st) ||
           status_context(st, "the view is not remembered");
}

static bool run(struct shown_app *s, const struct terminal_options *options,
                int *signal, struct status *st)
{
    const struct loop_client client = {s, update, draw, has_work, step, 8};
    if (!terminal_open(&s->terminal, options, st))
        return false;
    bool ok = loop_run(s->terminal, &client, signal, st);
    terminal_close(s->terminal);
    return ok;
}

/* `--data FILE …` as a shell reads it. */
static void quote_data(const struct call *call, struct text *t)
{
    for (int i = 0; i < call->option_count; i++) {
        if (call->options[i].option != &option_data)
            continue;
        text_add(t, t->length ? " --data " : "--data ");
        const char *path = call->options[i].value;
        bool plain =
            path[strcspn(path, " \t\n\"'`$&|;<>()*?[]#~\\!{}")] == '\0';
        text_add(t, plain ? "" : "'");
        for (; *path; path++)
            text_add_bytes(t, *path == '\'' ? "'\\''" : path,
                           *path == '\'' ? 4 : 1);
        text_add(t, plain ? "" : "'");
    }
}

static bool run_screens(struct request *request, struct status *st)
{
    int signal = 0;
    char view[VIEW_BYTES_MAX];
    struct shown_app *s = calloc(1, sizeof *s);
    if (!s)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    if (!app_init(&s->app, request->study, st)) {
        free(s);
        return false;
    }
    struct text data = text_over(s->data, sizeof s->data);
    quote_data(request->call, &data);
    s->app.session.data_option = data.length ? s->data : NULL;
    view_recall(view);
    app_load_view(&s->app, view);
    struct terminal_options options = {
        .color = request->color,
        .scheme = request->scheme,
        .ascii = request->ascii,
        .mouse = s->app.session.mouse,
    };
    bool ok = run(s, &options, &signal, st) && keep_view(&s->app, st);
    app_clear(&s->app);
    free(s);
    if (signal)
        terminal_die(signal);
    return ok;
}

static const struct option *const options[] = {
    &option_data, &option_color,   &option_ascii, &option_background,
    &option_help, &option_version, NULL,
};

const struct command command_screens = {
    .operands = "",
    .least = 0,
    .most = 0,
    .manner = {.needs_terminal = true},
    .options = options,
    .summary = "open the screens",
    .about =
        "Without a command, on a terminal, the screens open: everything that a "
        "command prints, on one sheet to move about in.",
    .example = "",
    .run = run_screens,
};
