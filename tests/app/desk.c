/* SPDX-License-Identifier: MIT */
#include "app/desk.h"

#include <check.h>
#include <stdlib.h>
#include <string.h>

#include "app/desk_keys.h"

struct study *study;
struct app app;
struct canvas canvas;

void open_app(void)
{
    struct status st = status_ok();
    study = study_new(catalogue_builtin(), &st);
    ck_assert_ptr_nonnull(study);
    ck_assert_msg(app_init(&app, study, &st), "%s", st.message);
    ck_assert(canvas_init(&canvas, 24, 80, &st));
}

void reopen_app(void)
{
    struct status st = status_ok();
    app_clear(&app);
    ck_assert_msg(app_init(&app, study, &st), "%s", st.message);
}

void close_app(void)
{
    app_clear(&app);
    study_free(study);
    canvas_clear(&canvas);
}

void resize(int rows, int columns)
{
    struct status st = status_ok();
    ck_assert(canvas_resize(&canvas, rows, columns, &st));
    struct event event = {.kind = EVENT_RESIZE, .row = rows, .column = columns};
    ck_assert_int_eq(app_update(&app, &event), EFFECT_REDRAW);
}

enum effect key(enum key code)
{
    struct event event = {.kind = EVENT_KEY, .key = code};
    return app_update(&app, &event);
}

enum effect type(const char *text)
{
    enum effect effect = EFFECT_NONE;
    for (; *text; text++) {
        struct event event = {.kind = EVENT_CHARACTER,
                              .character = (unsigned char)*text};
        effect = app_update(&app, &event);
    }
    return effect;
}

char *drawn(void)
{
    app_draw(&app, &canvas);
    char *text = canvas_to_text(&canvas);
    ck_assert_ptr_nonnull(text);
    return text;
}

void settle(void)
{
    bool changed;
    app_draw(&app, &canvas);
    while (app_has_work(&app))
        app_step(&app, &changed);
}

bool shows(const char *words)
{
    char *text = drawn();
    char *roles = strstr(text, "\n==");
    if (roles)
        *roles = '\0';
    bool found = strstr(text, words) != NULL;
    free(text);
    return found;
}
