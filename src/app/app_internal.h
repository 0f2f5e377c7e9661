/* SPDX-License-Identifier: MIT */
/* Shared by the files of the app. */
#ifndef APP_APP_INTERNAL_H
#define APP_APP_INTERNAL_H

#include "app/app.h"

/* Shows the i-th screen, or the one that the session asks for. */
void app_show(struct app *app, int i);
void app_follow(struct app *app);

/* No more is solved, and no export waits, until the user changes something. */
void app_stop(struct app *app);

/* Opens a line that begins with a text. */
void app_prompt_open(struct app *app, const struct prompt_ops *prompt,
                     const char *text);
/* Opens a line that a key leads to. */
void app_prompt_begin(struct app *app, const struct prompt_ops *prompt);
bool app_prompt_is_open(const struct app *app);
void app_prompt_close(struct app *app);
enum effect app_prompt_update(struct app *app, const struct event *event);
void app_prompt_draw(const struct app *app, struct canvas *canvas, int row);

/* The list that a key opens. */
void app_chooser_open(struct app *app, const struct chooser_ops *chooser);
enum effect app_chooser_update(struct app *app, const struct event *event);

/* Asks what to export where the screen has several things, and for the file.
 */
void app_export_open(struct app *app);

#endif
