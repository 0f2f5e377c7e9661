/* SPDX-License-Identifier: MIT */
/* The call without a command: the screens, and what they want done outside. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include "base/file.h"
#include "cli/commands.h"
#include "cli/loop.h"
#include "cli/remember.h"
#include "screens/ui.h"

struct session {
    struct terminal *terminal;
    struct ui ui;
    bool changed; /* the picture moved on since it was drawn */
    char data[UI_COMMAND_MAX];
};

static void write_export(struct ui *ui)
{
    struct file_draft draft;
    struct status st = status_ok();
    char command[UI_COMMAND_MAX];
    struct text t = text_over(command, sizeof command);
    if (!ui->replace && access(ui->path, F_OK) == 0) {
        ui_ask_overwrite(ui);
        return;
    }
    if (!ui_export_ready(ui))
        return;
    bool ok = file_draft_open(&draft, ui->path, ui->replace, &st);
    if (ok && ui_export(ui, draft.stream, &st))
        ok = file_draft_commit(&draft, &st);
    else if (ok) {
        file_draft_discard(&draft);
        ok = false;
    }
    ui_export_command(ui, &t);
    if (ok && t.cut)
        ui_report(ui, false, "%s written", ui->path);
    else if (ok && command[0])
        ui_report(ui, false, "%s written; the same: %s", ui->path, command);
    else if (ok)
        ui_report(ui, false,
                  "%s written; no one command prints the same, for the "
                  "configuration of your own",
                  ui->path);
    else
        ui_report(ui, true, "nothing written: %s", st.message);
}

static enum loop_effect update(void *state, const struct event *event)
{
    struct session *s = state;
    struct status st = status_ok();
    switch (ui_update(&s->ui, event)) {
    case EFFECT_NONE:
        return LOOP_NOTHING;
    case EFFECT_REDRAW:
        return LOOP_REDRAW;
    case EFFECT_REPAINT:
        return LOOP_REPAINT;
    case EFFECT_QUIT:
        return LOOP_QUIT;
    case EFFECT_WRITE:
        write_export(&s->ui);
        return LOOP_REDRAW;
    case EFFECT_FORGET:
        if (!view_forget(&st))
            ui_report(&s->ui, true, "%s", st.message);
        return LOOP_REDRAW;
    case EFFECT_MOUSE:
        terminal_mouse(s->terminal, s->ui.mouse);
        return LOOP_REDRAW;
    }
    return LOOP_NOTHING;
}

static void draw(void *state, struct canvas *canvas)
{
    struct session *s = state;
    canvas->ascii = terminal_ascii(s->terminal);
    ui_draw(&s->ui, canvas);
}

static bool has_work(void *state)
{
    return ui_has_work(&((struct session *)state)->ui);
}

static void step(void *state)
{
    struct session *s = state;
    bool changed;
    ui_step(&s->ui, &changed);
    s->changed = s->changed || changed;
}

static bool keep_view(const struct ui *ui, struct status *st)
{
    char view[VIEW_BYTES_MAX];
    struct text t = text_over(view, sizeof view);
    if (ui->forgotten)
        return true;
    ui_save_view(ui, &t);
    return view_keep(view, st) ||
           status_context(st, "the view is not remembered");
}

static bool run(struct session *s, const struct terminal_options *options,
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
    for (int i = 0; i < call->repeat_count; i++) {
        if (call->repeats[i].id != OPTION_DATA)
            continue;
        text_add(t, t->length ? " --data " : "--data ");
        const char *path = call->repeats[i].value;
        bool plain =
            path[strcspn(path, " \t\n\"'`$&|;<>()*?[]#~\\!{}")] == '\0';
        text_add(t, plain ? "" : "'");
        for (; *path; path++)
            text_add_bytes(t, *path == '\'' ? "'\\''" : path,
                           *path == '\'' ? 4 : 1);
        text_add(t, plain ? "" : "'");
    }
}

bool cli_screens(struct request *request, struct status *st)
{
    int signal = 0;
    char view[VIEW_BYTES_MAX];
    struct session *s = calloc(1, sizeof *s);
    if (!s)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    ui_init(&s->ui, request->study);
    struct text data = text_over(s->data, sizeof s->data);
    quote_data(request->call, &data);
    s->ui.data_option = data.length ? s->data : NULL;
    view_recall(view);
    ui_load_view(&s->ui, view);
    struct terminal_options options = {
        .color = request->color,
        .scheme = request->scheme,
        .ascii = request->ascii,
        .mouse = s->ui.mouse,
    };
    bool ok = run(s, &options, &signal, st) && keep_view(&s->ui, st);
    ui_clear(&s->ui);
    free(s);
    if (signal)
        terminal_die(signal);
    return ok;
}
