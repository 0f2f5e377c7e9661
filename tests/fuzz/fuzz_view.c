/* SPDX-License-Identifier: MIT */
/* View files: whatever one holds, the screens start, draw and export from it;
 * what no longer holds is dropped, and what is kept comes back the same. */
#include "fuzz/target.h"

#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "screens/parts.h"

#define VIEW_MAX 8192
#define STEPS 3 /* of the work that each screen asks for */

static void require(bool held)
{
    if (!held)
        abort();
}

static bool same_quantity(const struct ui *ui, const struct reference *r)
{
    return !r || r->quantity == ui->choice.quantity;
}

/* Nothing chosen contradicts the rest. */
static void check_choice(const struct ui *ui)
{
    const struct choice *c = &ui->choice;
    struct ask ask;
    require(ui_ask(ui, c->z, c->charge, &ask));
    require(same_quantity(ui, c->reference) && same_quantity(ui, c->against));
    if (c->model)
        require(model_offer_for(c->model, c->quantity, NULL) >= 0);
    else
        require(c->shown == SHOWN_REFERENCE);
    require(c->n == 0 || quantity_at(c->quantity)->per_subshell);
    for (int i = 0; i < c->pin_count; i++)
        require(ui_ask(ui, c->pins[i].z, c->pins[i].charge, &ask) &&
                ui_pin_place(ui, c->pins[i].z, c->pins[i].charge) == i);
}

/* What is saved is read back as the same view. */
static void check_again(const struct ui *ui)
{
    struct ui *other = malloc(sizeof *other);
    char first[VIEW_MAX];
    char second[VIEW_MAX];
    struct text a = text_over(first, sizeof first);
    struct text b = text_over(second, sizeof second);
    require(other);
    ui_save_view(ui, &a);
    ui_init(other, ui->study);
    ui_load_view(other, first);
    ui_save_view(other, &b);
    require(!a.cut && strcmp(first, second) == 0);
    ui_clear(other);
    free(other);
}

static void check_exports(struct ui *ui)
{
    for (int s = SCOPE_ROW; s <= SCOPE_AUDIT; s++) {
        char command[UI_COMMAND_MAX];
        struct text t = text_over(command, sizeof command);
        struct status st = status_ok();
        char *data = NULL;
        size_t size = 0;
        ui->scope = (enum export_scope)s;
        if (!ui_export_ready(ui)) {
            ui->awaiting = false;
            continue;
        }
        FILE *out = open_memstream(&data, &size);
        require(out);
        require(ui_export(ui, out, &st) || st.message[0]);
        fclose(out);
        free(data);
        ui_export_command(ui, &t);
        require(utf8_valid(command, t.length));
    }
}

static void draw_screens(struct ui *ui, struct canvas *canvas)
{
    static const int sizes[][2] = {{24, 80}, {12, 40}, {60, 200}};
    for (int s = SCREEN_MAP; s <= SCREEN_KEYS; s++) {
        bool changed;
        ui->screen = (enum screen_id)s;
        ui->wanting = true;
        for (int i = 0; i < STEPS && ui_has_work(ui); i++)
            (void)ui_step(ui, &changed);
        for (size_t i = 0; i < sizeof sizes / sizeof sizes[0]; i++) {
            struct status st = status_ok();
            require(canvas_resize(canvas, sizes[i][0], sizes[i][1], &st));
            ui_draw(ui, canvas);
        }
    }
}

int LLVMFuzzerTestOneInput(const uint8_t *data, size_t size)
{
    static struct study *study; /* kept: what is solved stays solved */
    struct status st = status_ok();
    struct canvas canvas;
    struct ui *ui = malloc(sizeof *ui);
    char *text = malloc(size + 1);
    if (!study)
        study = study_new(catalogue_builtin(), &st);
    require(ui && text && study && canvas_init(&canvas, 24, 80, &st));
    if (size > 0)
        memcpy(text, data, size);
    text[size] = '\0';
    ui_init(ui, study);
    ui_load_view(ui, text);
    check_choice(ui);
    check_again(ui);
    draw_screens(ui, &canvas);
    check_choice(ui);
    check_exports(ui);
    ui_clear(ui);
    study_stop(study);
    canvas_clear(&canvas);
    free(text);
    free(ui);
    return 0;
}
