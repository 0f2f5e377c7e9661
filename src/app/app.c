/* SPDX-License-Identifier: MIT */
#include "app/app_internal.h"

#include <assert.h>
#include <stdalign.h>
#include <stddef.h>
#include <stdlib.h>
#include <string.h>

#include "screens/list.h"

/* Each block begins where any type may. */
static size_t block_size(const struct screen_ops *ops)
{
    size_t unit = alignof(max_align_t);
    return (ops->state_size + unit - 1) / unit * unit;
}

bool app_init(struct app *app, struct study *study, struct status *st)
{
    size_t size = 1;
    assert(screen_list_count > 0 && screen_list_count <= SCREENS_MAX);
    *app = (struct app){0};
    for (int i = 0; i < screen_list_count; i++)
        size += block_size(screen_list[i]);
    app->blocks = calloc(1, size);
    if (!app->blocks)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    session_init(&app->session, study);
    app->session.screens = screen_list;
    app->session.screen_count = screen_list_count;
    char *at = app->blocks;
    for (int i = 0; i < screen_list_count; i++) {
        app->states[i] = at;
        at += block_size(screen_list[i]);
        if (screen_list[i]->init)
            screen_list[i]->init(&app->session, app->states[i]);
    }
    app_show(app, 0);
    return true;
}

void app_clear(struct app *app)
{
    for (int i = 0; app->blocks && i < screen_list_count; i++)
        if (screen_list[i]->clear)
            screen_list[i]->clear(app->states[i]);
    free(app->blocks);
    app->blocks = NULL;
}

const struct screen_ops *app_screen(const struct app *app)
{
    return screen_list[app->screen];
}

void app_stop(struct app *app)
{
    struct session *s = &app->session;
    session_touch(s);
    s->stopped = true;
    s->stopped_version = s->choice_version;
    app->awaiting = false;
}

static int place_of(const char *id)
{
    for (int i = 0; i < screen_list_count; i++)
        if (strcmp(screen_list[i]->id, id) == 0)
            return i;
    return -1;
}

void *app_state(const struct app *app, const char *id)
{
    int i = place_of(id);
    return i < 0 ? NULL : app->states[i];
}

void app_show(struct app *app, int i)
{
    if (screen_list[i]->returns && i != app->screen)
        app->before = app->screen;
    app->screen = i;
    session_key_set(screen_list, screen_list_count, screen_list[i], &app->keys);
}

void app_follow(struct app *app)
{
    const char *id = app->session.go;
    app->session.go = NULL;
    if (!id)
        return;
    int i = place_of(id);
    assert(i >= 0 || id[0] == '\0');
    app_show(app, i < 0 ? 0 : i);
}
