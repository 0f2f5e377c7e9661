/* SPDX-License-Identifier: MIT */
/* The screen shown, with its title, message and keys, and what lies over it.
 */
#include "app/app_internal.h"
#include "widget/hint.h"
#include "widget/message.h"

static void draw_message(const struct app *app, struct canvas *canvas, int row)
{
    const struct session *s = &app->session;
    struct study_progress p = study_progress(s->study);
    if (app_prompt_is_open(app))
        app_prompt_draw(app, canvas, row);
    else if (app->awaiting)
        canvas_textf(canvas, row, 0, canvas->columns, ROLE_TEXT,
                     "solving %d of %d for %s; any key gives it up", p.done,
                     p.total, app->path);
    else if (s->message[0] != '\0')
        message_draw(canvas, row, s->caution ? ROLE_CAUTION : ROLE_TEXT,
                     s->message);
    else if (p.total > 0)
        canvas_textf(canvas, row, 0, canvas->columns, ROLE_TEXT,
                     "solving %d of %d; interrupt (Ctrl-C) stops", p.done,
                     p.total);
}

static void draw_keys(const struct app *app, struct canvas *canvas, int row)
{
    int column = 0;
    /* While a line is typed its error stands where no key is needed. */
    if (app_prompt_is_open(app) && app->session.message[0] != '\0') {
        canvas_text(canvas, row, 0, canvas->columns, ROLE_CAUTION,
                    app->session.message);
        return;
    }
    for (int i = 0; i < app->keys.count; i++) {
        const struct key_row *r = app->keys.rows[i];
        if (r->on_line)
            column = hint_draw(canvas, row, column, r->name, r->label);
    }
}

/* Message and keys; where both have one row, the message when there is one. */
static void draw_bottom(const struct app *app, struct canvas *canvas)
{
    const struct session *s = &app->session;
    const struct screen_ops *ops = app_screen(app);
    int message_row = canvas->rows - 2;
    int key_row = canvas->rows - 1;
    if (ops->bottom)
        ops->bottom(s, app->states[app->screen], &message_row, &key_row);
    bool shared = message_row == key_row;
    bool busy = app_prompt_is_open(app) || s->message[0] != '\0' ||
                study_progress(s->study).total > 0;
    if (!shared || !busy)
        draw_keys(app, canvas, key_row);
    if (!shared || busy)
        draw_message(app, canvas, message_row);
}

void app_draw(struct app *app, struct canvas *canvas)
{
    struct session *s = &app->session;
    const struct screen_ops *ops = app_screen(app);
    canvas_erase(canvas);
    s->rows = canvas->rows;
    s->columns = canvas->columns;
    if (canvas->rows < NEEDED_ROWS || canvas->columns < NEEDED_COLUMNS) {
        canvas_textf(canvas, 0, 0, canvas->columns, ROLE_TEXT,
                     "needs %dx%d, is %dx%d; q quits", NEEDED_COLUMNS,
                     NEEDED_ROWS, canvas->columns, canvas->rows);
        return;
    }
    ops->draw(s, app->states[app->screen], canvas);
    if (!ops->own_title)
        canvas_text(canvas, 0, 0, canvas->columns, ROLE_TITLE, ops->title);
    draw_bottom(app, canvas);
    if (app->chooser)
        chooser_draw(&app->list, canvas, app->chooser->title);
}
