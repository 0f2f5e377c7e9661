/* SPDX-License-Identifier: MIT */
#include "screens/desk.h"

#include <check.h>

#include "screens/desk_keys.h"

struct study *study;
struct ui ui;
struct canvas canvas;

void open_ui(void)
{
    struct status st = status_ok();
    study = study_new(catalogue_builtin(), &st);
    ck_assert_ptr_nonnull(study);
    ui_init(&ui, study);
    ck_assert(canvas_init(&canvas, 24, 80, &st));
}

void close_ui(void)
{
    ui_clear(&ui);
    study_free(study);
    canvas_clear(&canvas);
}

void resize(int rows, int columns)
{
    struct status st = status_ok();
    ck_assert(canvas_resize(&canvas, rows, columns, &st));
    struct event event = {.kind = EVENT_RESIZE, .row = rows, .column = columns};
    ck_assert_int_eq(ui_update(&ui, &event), EFFECT_REDRAW);
}

enum effect key(enum key code)
{
    struct event event = {.kind = EVENT_KEY, .key = code};
    return ui_update(&ui, &event);
}

enum effect type(const char *text)
{
    enum effect effect = EFFECT_NONE;
    for (; *text; text++) {
        struct event event = {.kind = EVENT_CHARACTER,
                              .character = (unsigned char)*text};
        effect = ui_update(&ui, &event);
    }
    return effect;
}

char *drawn(void)
{
    ui_draw(&ui, &canvas);
    char *text = canvas_to_text(&canvas);
    ck_assert_ptr_nonnull(text);
    return text;
}
