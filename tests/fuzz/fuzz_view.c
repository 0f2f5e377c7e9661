/* SPDX-License-Identifier: MIT */
/* View files: whatever one holds, the screens start, draw and export from it;
 * what no longer holds is dropped, and what is kept comes back the same. */
#include "fuzz/target.h"

#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "app/app_internal.h"
#include "screens/list.h"

#define VIEW_MAX 8192
#define STEPS 3 /* of the work that each screen asks for */

static void require(bool held)
{
    if (!held)
        abort();
}

static bool same_quantity(const struct session *s, const struct reference *r)
{
    return !r || r->quantity == s->choice.quantity;
}

/* Nothing chosen contradicts the rest. */
static void check_choice(const struct session *s)
{
    const struct choice *c = &s->choice;
    struct ask ask;
    require(session_ask(s, c->z, c->charge, &ask));
    require(same_quantity(s, c->reference) && same_quantity(s, c->against));
    if (c->model)
        require(model_gives(c->model, c->quantity));
    else
        require(c->shown == SHOWN_REFERENCE);
    require(c->n == 0 || quantity_at(c->quantity)->per_subshell);
    for (int i = 0; i < c->pin_count; i++)
        require(session_ask(s, c->pins[i].z, c->pins[i].charge, &ask) &&
                session_pin_place(s, c->pins[i].z, c->pins[i].charge) == i);
}

/* What is saved is read back as the same view. */
static void check_again(const struct app *app)
{
    struct app *other = malloc(sizeof *other);
    char first[VIEW_MAX];
    char second[VIEW_MAX];
    struct text a = text_over(first, sizeof first);
    struct text b = text_over(second, sizeof second);
    require(other);
    app_save_view(app, &a);
    struct status st = status_ok();
    require(app_init(other, app->session.study, &st));
    app_load_view(other, first);
    app_save_view(other, &b);
    require(!a.cut && strcmp(first, second) == 0);
    app_clear(other);
    free(other);
}

static void check_export(struct app *app, const struct export_ops *export)
{
    char command[SESSION_COMMAND_MAX];
    struct text t = text_over(command, sizeof command);
    struct status st = status_ok();
    char *data = NULL;
    size_t size = 0;
    app->export = export;
    if (!app_export_ready(app)) {
        app->awaiting = false;
        return;
    }
    FILE *out = open_memstream(&data, &size);
    require(out);
    require(app_export(app, out, &st) || st.message[0]);
    fclose(out);
    free(data);
    app_export_command(app, &t);
    require(utf8_valid(command, t.length));
}

static void check_exports(struct app *app)
{
    for (int s = 0; s < screen_list_count; s++) {
        app_show(app, s);
        for (int i = 0; i < screen_list[s]->export_count; i++)
            check_export(app, &screen_list[s]->exports[i]);
    }
}

static void draw_screens(struct app *app, struct canvas *canvas)
{
    static const int sizes[][2] = {{24, 80}, {12, 40}, {60, 200}};
    for (int s = 0; s < screen_list_count; s++) {
        bool changed;
        app_show(app, s);
        app->session.wanting = true;
        for (int i = 0; i < STEPS && app_has_work(app); i++)
            (void)app_step(app, &changed);
        for (size_t i = 0; i < sizeof sizes / sizeof sizes[0]; i++) {
            struct status st = status_ok();
            require(canvas_resize(canvas, sizes[i][0], sizes[i][1], &st));
            app_draw(app, canvas);
        }
    }
}

int LLVMFuzzerTestOneInput(const uint8_t *data, size_t size)
{
    static struct study *study; /* kept: what is solved stays solved */
    struct status st = status_ok();
    struct canvas canvas;
    struct app *app = malloc(sizeof *app);
    char *text = malloc(size + 1);
    if (!study)
        study = study_new(catalogue_builtin(), &st);
    require(app && text && study && canvas_init(&canvas, 24, 80, &st));
    if (size > 0)
        memcpy(text, data, size);
    text[size] = '\0';
    require(app_init(app, study, &st));
    app_load_view(app, text);
    check_choice(&app->session);
    check_again(app);
    draw_screens(app, &canvas);
    check_choice(&app->session);
    check_exports(app);
    app_clear(app);
    study_stop(study);
    canvas_clear(&canvas);
    free(text);
    free(app);
    return 0;
}
