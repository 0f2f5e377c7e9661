/* SPDX-License-Identifier: MIT */
/* The screens as a whole: a session, one opaque block of state for each screen
 * of the list (screens/list.c), the line being typed, the open list and the
 * export under way. Nothing here knows a terminal or writes a file: what is to
 * be done outside comes back as an effect. */
#ifndef APP_APP_H
#define APP_APP_H

#include "session/keys.h"
#include "session/screen.h"
#include "widget/field.h"

struct app {
    struct session session;
    void *blocks; /* all states, owned */
    void *states[SCREENS_MAX];
    int screen;          /* place in the list */
    int before;          /* where a screen that returns was opened */
    struct key_set keys; /* of the screen it was asked on */

    const struct prompt_ops *prompt; /* NULL: no line is typed */
    struct field field;
    bool overwriting;                  /* "… exists; overwrite it?" waits */
    const struct chooser_ops *chooser; /* NULL: no list is open */
    struct chooser list;

    const struct export_ops *export; /* of the screen it was asked on */
    char path[FIELD_TEXT_MAX];
    bool replace;
    bool awaiting; /* an export waits until its atoms are solved */
};

/* The screens over a study, which must outlive them, with the first view.
 * Fails with STATUS_MEMORY. */
MUST_CHECK bool app_init(struct app *app, struct study *study,
                         struct status *st);
/* Releases what the app holds; not the study. */
void app_clear(struct app *app);

/* The screen shown, and the state of any by its id (NULL: no such screen). */
const struct screen_ops *app_screen(const struct app *app);
void *app_state(const struct app *app, const char *id);

/* Takes one event and says what is to be done: at most EFFECT_QUIT. */
enum effect app_update(struct app *app, const struct event *event);

/* Draws everything; changes nothing but the canvas and what is derived. */
void app_draw(struct app *app, struct canvas *canvas);

/* Work for the models that iterate: queues what the screen wants to show, does
 * one step, says whether more is left; *changed when the picture moved on. */
bool app_step(struct app *app, bool *changed);
bool app_has_work(const struct app *app);

/* Makes ready what the export holds. False when atoms are to be solved first:
 * they are queued, the last tick of the work comes back as EFFECT_WRITE, and
 * any key gives the export up. */
bool app_export_ready(struct app *app);

/* Writes the export that the user asked for, as the command of the same choice
 * prints it. */
MUST_CHECK bool app_export(struct app *app, FILE *out, struct status *st);

/* That command, as it would be typed; nothing where no single command prints
 * the same. */
void app_export_command(struct app *app, struct text *t);

/* The file is there already: asks whether to overwrite it. */
void app_ask_overwrite(struct app *app);

/* The view as text, one `key value` per line, and back. Unknown or impossible
 * lines are passed over: an old view never stops a start. */
void app_save_view(const struct app *app, struct text *t);
void app_load_view(struct app *app, const char *text);

#endif
