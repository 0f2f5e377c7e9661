/* SPDX-License-Identifier: MIT */
/* State of the screens: choices, actions that all screens share, and what is
 * derived from them. */
#include <assert.h>
#include <stdarg.h>
#include <stdio.h>
#include <string.h>

#include "screens/atom.h"
#include "screens/parts.h"

static const struct screen_ops *const screens[] = {
    [SCREEN_MAP] = &screen_map,     [SCREEN_COMPARE] = &screen_compare,
    [SCREEN_TREND] = &screen_trend, [SCREEN_AUDIT] = &screen_audit,
    [SCREEN_ATOM] = &screen_atom,   [SCREEN_SOURCES] = &screen_sources,
    [SCREEN_KEYS] = &screen_keys,
};

void ui_init(struct ui *ui, struct study *study)
{
    *ui = (struct ui){
        .study = study,
        .choice =
            {
                .z = 26,
                .quantity = QUANTITY_ZEFF,
                .model = model_find("slater"),
                .shown = SHOWN_VALUE,
                .atom = {.method = atom_method_default},
            },
        .screen = SCREEN_MAP,
        .wanting = true,
        .stale = true,
        .comparison_stale = true,
        .trend_stale = true,
        .audit_stale = true,
    };
}

void ui_clear(struct ui *ui)
{
    comparison_clear(&ui->comparison);
    audit_clear(&ui->audit);
    audit_clear(&ui->usual);
    atom_work_free(ui->atom);
    ui->atom = NULL;
}

void ui_report(struct ui *ui, bool caution, const char *format, ...)
{
    va_list args;
    va_start(args, format);
    vsnprintf(ui->message, sizeof ui->message, format, args);
    va_end(args);
    ui->caution = caution;
}

void ui_ask_overwrite(struct ui *ui)
{
    ui->prompt = (struct prompt){.kind = PROMPT_OVERWRITE};
}

const struct unit *ui_unit(const struct ui *ui, enum quantity_id quantity)
{
    enum dimension d = quantity_at(quantity)->dimension;
    return ui->choice.units[d] ? ui->choice.units[d] : unit_base(d);
}

bool ui_ask(const struct ui *ui, int z, int charge, struct ask *ask)
{
    const struct choice *c = &ui->choice;
    *ask = (struct ask){
        .z = z,
        .charge = charge,
        .quantity = c->quantity,
        .model = c->model,
        .reference = c->reference,
        .against = c->against,
        .evidence = c->evidence,
        .n = c->n,
        .l = c->l,
        .site = c->site,
        .unit = ui_unit(ui, c->quantity),
    };
    bool own = c->configuration.count > 0 && c->configured.z == z &&
               c->configured.charge == charge;
    if (own)
        ask->configuration = &c->configuration;
    struct species species;
    struct status st = status_ok();
    return study_species(ui->study, ask, &species, &st);
}

/* The number that the map shows of a row, if there is one. */
static bool shown_number(const struct row *row, enum shown shown, double *value)
{
    if (shown == SHOWN_RESIDUAL) {
        *value = row->residual.value;
        return row->state == ROW_OK;
    }
    const struct reading *r =
        shown == SHOWN_VALUE ? &row->value : &row->reference;
    *value = r->value.value;
    return r->state == READING_OK;
}

static void fill_cell(struct ui *ui, int z)
{
    struct map_cell *cell = &ui->cells[z];
    struct ask ask;
    *cell = (struct map_cell){.state = ROW_OUTSIDE_MODEL};
    if (!ui_ask(ui, z, ui->choice.charge, &ask))
        return;
    struct row row = study_row(ui->study, &ask);
    cell->state = row.state;
    cell->has_value = shown_number(&row, ui->choice.shown, &cell->value);
    cell->has_percent = row.state == ROW_OK && row.has_percent;
    cell->percent = cell->has_percent ? row.percent.value : 0.0;
    struct status st = status_ok();
    if (!audit_add(&ui->usual, &row, &st))
        ui_report(ui, true, "%s", st.message);
}

void ui_refresh(struct ui *ui)
{
    double values[Z_MAX];
    int count = 0;
    if (!ui->stale)
        return;
    audit_clear(&ui->usual);
    if (!ui->trend_keeps)
        ui->trend_stale = true;
    ui->trend_keeps = false;
    ui->audit_stale = true;
    for (int z = 1; z <= Z_MAX; z++) {
        fill_cell(ui, z);
        if (ui->cells[z].has_value)
            values[count++] = ui->cells[z].value;
    }
    ui->scale = scale_fit(values, count, ui->choice.shown == SHOWN_RESIDUAL);
    for (int z = 1; z <= Z_MAX; z++)
        if (ui->cells[z].has_value)
            ui->cells[z].class_index =
                scale_class(&ui->scale, ui->cells[z].value);
    ui->stale = false;
}

void ui_select(struct ui *ui, int z)
{
    ui->choice.z = z;
    ui->comparison_stale = true;
}

void ui_select_species(struct ui *ui, int z, int charge, bool along)
{
    bool fresh = !ui->stale;
    ui_select(ui, z);
    if (charge == ui->choice.charge)
        return;
    ui->choice.charge = charge;
    ui->stale = true;
    ui->trend_keeps = along && fresh;
}

void ui_select_quantity(struct ui *ui, enum quantity_id quantity)
{
    struct choice *c = &ui->choice;
    c->quantity = quantity;
    c->reference = c->against = NULL;
    if (!quantity_at(quantity)->per_subshell)
        c->n = c->l = 0;
    if (c->model && model_offer_for(c->model, quantity, NULL) >= 0)
        return;
    c->model = NULL;
    for (int m = 0; m < model_count() && !c->model; m++)
        if (model_offer_for(model_at(m), quantity, NULL) >= 0)
            c->model = model_at(m);
    if (!c->model)
        c->shown = SHOWN_REFERENCE;
}

int ui_pin_place(const struct ui *ui, int z, int charge)
{
    for (int i = 0; i < ui->choice.pin_count; i++)
        if (ui->choice.pins[i].z == z && ui->choice.pins[i].charge == charge)
            return i;
    return -1;
}

static void toggle_pin(struct ui *ui)
{
    struct choice *c = &ui->choice;
    char ion[ION_TEXT_MAX];
    int at = ui_pin_place(ui, c->z, c->charge);
    ion_print(c->z, c->charge, ion);
    ui->comparison_stale = true;
    if (at >= 0) {
        memmove(&c->pins[at], &c->pins[at + 1],
                (size_t)(c->pin_count - at - 1) * sizeof c->pins[0]);
        c->pin_count--;
        ui_report(ui, false, "%s unpinned; %d pinned", ion, c->pin_count);
    } else if (c->pin_count == PIN_MAX) {
        ui_report(ui, true, "%s not pinned: at most %d species at once", ion,
                  PIN_MAX);
    } else {
        c->pins[c->pin_count++] = (struct pin){c->z, c->charge};
        ui_report(ui, false, "%s pinned; %d pinned, c compares", ion,
                  c->pin_count);
    }
}

static void change_charge(struct ui *ui, int by)
{
    struct ask ask;
    char ion[ION_TEXT_MAX];
    int charge = ui->choice.charge + by;
    if (!ui_ask(ui, ui->choice.z, charge, &ask)) {
        ui_report(ui, true, "%s has no charge %+d",
                  element_at(ui->choice.z)->name, charge);
        return;
    }
    ui->choice.charge = charge;
    ui->stale = ui->comparison_stale = true;
    ui_report(ui, false, "charge %+d: %s and all others", charge,
              ion_print(ui->choice.z, charge, ion));
}

static void show_next(struct ui *ui)
{
    if (!ui->choice.model) {
        ui_report(ui, false, "no model computes %s: the reference is shown",
                  quantity_at(ui->choice.quantity)->id);
        return;
    }
    ui->choice.shown = (enum shown)((ui->choice.shown + 1) % SHOWN_COUNT);
    ui->stale = true;
}

static enum effect go(struct ui *ui, enum screen_id screen)
{
    if (screen == SCREEN_KEYS && ui->screen != SCREEN_KEYS)
        ui->before_keys = ui->screen;
    ui->message[0] = '\0';
    if (screen == ui->screen)
        ui_report(ui, false, "%s is in front already", ui_screen_name(screen));
    ui->screen = screen;
    return EFFECT_REDRAW;
}

static enum effect forget(struct ui *ui)
{
    ui->forgotten = true;
    ui_report(ui, false,
              "the remembered view is forgotten; none is kept at the end");
    return EFFECT_FORGET;
}

static enum effect open_export(struct ui *ui)
{
    if (ui->screen == SCREEN_COMPARE)
        export_prompt(ui, SCOPE_COMPARE);
    else if (ui->screen == SCREEN_ATOM)
        export_prompt(ui, SCOPE_ATOM);
    else if (ui->screen == SCREEN_TREND)
        export_prompt(ui, SCOPE_TREND);
    else if (ui->screen == SCREEN_AUDIT)
        export_prompt(ui, SCOPE_AUDIT);
    else
        chooser_open(ui, CHOOSER_EXPORT);
    return EFFECT_REDRAW;
}

/* Actions that open a list. */
static bool open_list(struct ui *ui, enum action action)
{
    static const struct {
        enum action action;
        enum chooser_kind kind;
    } lists[] = {
        {ACTION_QUANTITY, CHOOSER_QUANTITY},
        {ACTION_MODEL, CHOOSER_MODEL},
        {ACTION_REFERENCE, CHOOSER_REFERENCE},
        {ACTION_SUBSHELL, CHOOSER_SUBSHELL},
        {ACTION_UNIT, CHOOSER_UNIT},
        {ACTION_SITE, CHOOSER_SITE},
        {ACTION_METHOD, CHOOSER_METHOD},
        {ACTION_OVERLAY, CHOOSER_OVERLAY},
        {ACTION_AGAINST, CHOOSER_AGAINST},
        {ACTION_MODELS, CHOOSER_CURVES},
        {ACTION_WALK, CHOOSER_WALK},
    };
    for (size_t i = 0; i < sizeof lists / sizeof lists[0]; i++)
        if (lists[i].action == action) {
            chooser_open(ui, lists[i].kind);
            return true;
        }
    return false;
}

/* Actions that lead to another screen. */
static bool open_screen(struct ui *ui, enum action action)
{
    if (action == ACTION_MAP ||
        (action == ACTION_BACK &&
         (ui->screen == SCREEN_COMPARE || ui->screen == SCREEN_TREND ||
          ui->screen == SCREEN_ATOM || ui->screen == SCREEN_SOURCES)))
        go(ui, SCREEN_MAP);
    else if (action == ACTION_COMPARE)
        go(ui, SCREEN_COMPARE);
    else if (action == ACTION_TREND)
        go(ui, SCREEN_TREND);
    else if (action == ACTION_AUDIT)
        go(ui, SCREEN_AUDIT);
    else if (action == ACTION_ATOM)
        go(ui, SCREEN_ATOM);
    else if (action == ACTION_SOURCES)
        go(ui, SCREEN_SOURCES);
    else if (action == ACTION_KEYS && ui->screen != SCREEN_KEYS)
        go(ui, SCREEN_KEYS);
    else if (action == ACTION_NEXT_SCREEN)
        go(ui, (enum screen_id)((ui->screen + 1) % (SCREEN_KEYS + 1)));
    else
        return false;
    return true;
}

/* Told in words too: where the values leave no choice nothing is seen. */
static void next_axis(struct ui *ui)
{
    static const char *const words[TREND_AXIS_COUNT] = {
        [TREND_AXIS_AUTO] = "as the values ask for",
        [TREND_AXIS_LINEAR] = "linear",
        [TREND_AXIS_LOG] = "logarithmic where all values are above zero",
    };
    struct choice *c = &ui->choice;
    c->trend_axis = (enum trend_axis)((c->trend_axis + 1) % TREND_AXIS_COUNT);
    ui_report(ui, false, "axis: %s", words[c->trend_axis]);
}

static void change_dots(struct ui *ui)
{
    ui->choice.atom.braille = !ui->choice.atom.braille;
    ui_report(ui, false, "curves in %s",
              ui->choice.atom.braille ? "braille dots" : "blocks");
}

static void change_grid(struct ui *ui)
{
    struct choice *c = &ui->choice;
    c->grid = c->grid == GRID_18 ? GRID_32 : GRID_18;
    if (layout_map(ui->rows, ui->columns, c->grid).width != c->grid)
        ui_report(ui, false, "32 columns, where the terminal is wide enough");
}

/* Actions that change how Trend and Audit show it. */
static bool change_view(struct ui *ui, enum action action)
{
    struct choice *c = &ui->choice;
    if (action == ACTION_PERCENT)
        c->trend_percent = !c->trend_percent;
    else if (action == ACTION_TREND_AXIS)
        next_axis(ui);
    else if (action == ACTION_STATISTIC)
        c->statistic = (enum statistic)((c->statistic + 1) % STATISTIC_KINDS);
    else if (action == ACTION_DOTS)
        change_dots(ui);
    else
        return false;
    return true;
}

/* Actions that change the choice wherever one is; false when not one. */
static bool change_choice(struct ui *ui, enum action action)
{
    struct choice *c = &ui->choice;
    if (action == ACTION_CHARGE_UP || action == ACTION_CHARGE_DOWN) {
        change_charge(ui, action == ACTION_CHARGE_UP ? 1 : -1);
    } else if (action == ACTION_SHOWN) {
        show_next(ui);
    } else if (action == ACTION_PIN) {
        toggle_pin(ui);
    } else if (action == ACTION_UNPIN_ALL) {
        c->pin_count = 0;
        ui->comparison_stale = true;
        ui_report(ui, false, "no species pinned");
    } else if (action == ACTION_GRID) {
        change_grid(ui);
    } else if (action == ACTION_GROUP3) {
        c->group3 = c->group3 == GRID_LU_LR ? GRID_LA_AC : GRID_LU_LR;
    } else {
        return false;
    }
    return true;
}

static void scroll(struct ui *ui, enum action action)
{
    int *at = &ui->scroll[ui->screen];
    int page = ui->rows > 8 ? ui->rows - 6 : 2;
    if (action == ACTION_UP)
        *at -= 1;
    else if (action == ACTION_DOWN)
        *at += 1;
    else if (action == ACTION_PAGE_UP)
        *at -= page;
    else if (action == ACTION_PAGE_DOWN)
        *at += page;
    else if (action == ACTION_HOME)
        *at = 0;
    else if (action == ACTION_END)
        *at += 10000; /* drawing brings it back to the last row */
    if (*at < 0)
        *at = 0;
}

static enum effect act(struct ui *ui, enum action action)
{
    ui->message[0] = '\0';
    if (open_list(ui, action) || open_screen(ui, action) ||
        change_view(ui, action) || change_choice(ui, action))
        return EFFECT_REDRAW;
    if (action == ACTION_QUIT)
        return EFFECT_QUIT;
    if (action == ACTION_REPAINT)
        return EFFECT_REPAINT;
    if (action == ACTION_FORGET)
        return forget(ui);
    if (action == ACTION_EXPORT)
        return open_export(ui);
    if (action == ACTION_CONFIGURATION) {
        configuration_prompt(ui);
        return EFFECT_REDRAW;
    }
    if (action == ACTION_JUMP) {
        prompt_open(ui, PROMPT_JUMP, "");
        return EFFECT_REDRAW;
    }
    if (action == ACTION_MOUSE) {
        ui->mouse = !ui->mouse;
        ui_report(ui, false, ui->mouse ? "mouse on" : "mouse off");
        return EFFECT_MOUSE;
    }
    bool scrolls = ui->screen == SCREEN_COMPARE || ui->screen >= SCREEN_SOURCES;
    if (scrolls && action >= ACTION_UP && action <= ACTION_PAGE_DOWN)
        scroll(ui, action);
    enum effect effect = screens[ui->screen]->update(ui, action);
    return effect == EFFECT_NONE ? EFFECT_REDRAW : effect;
}

/* A capital letter or a digit is the start of a symbol, name or number. */
static bool starts_jump(const struct event *event, enum screen_id screen)
{
    uint32_t c = event->character;
    return event->kind == EVENT_CHARACTER && screen < SCREEN_SOURCES &&
           screen != SCREEN_AUDIT &&
           ((c >= 'A' && c <= 'Z') || (c >= '1' && c <= '9'));
}

static enum effect interrupt(struct ui *ui)
{
    if (ui->screen == SCREEN_ATOM && atom_stop(ui)) {
        ui_report(ui, false, "stopped; Enter goes on");
        return EFFECT_REDRAW;
    }
    if (study_progress(ui->study).total > 0) {
        study_stop(ui->study);
        ui->stopped = true;
        ui->stale = true;
        ui_report(ui, false, "stopped; what is solved stays");
        return EFFECT_REDRAW;
    }
    if (ui->prompt.kind != PROMPT_NONE || ui->chooser.kind != CHOOSER_NONE) {
        ui->prompt.kind = PROMPT_NONE;
        ui->chooser.kind = CHOOSER_NONE;
        return EFFECT_REDRAW;
    }
    return EFFECT_QUIT;
}

/* While an export waits for its atoms: the last tick writes it, a key gives it
 * up, all else is as ever. */
static bool await(struct ui *ui, const struct event *event, enum effect *effect)
{
    *effect = EFFECT_REDRAW;
    if (event->kind == EVENT_RESIZE ||
        (event->kind == EVENT_TICK && ui_has_work(ui)))
        return false;
    ui->awaiting = false;
    if (event->kind == EVENT_TICK) {
        *effect = EFFECT_WRITE;
        return true;
    }
    if (event->kind == EVENT_INTERRUPT) {
        study_stop(ui->study);
        ui->stopped = ui->stale = true;
    }
    ui_report(ui, false, "%s: nothing written", ui->path);
    return true;
}

static enum effect take_event(struct ui *ui, const struct event *event)
{
    enum effect effect;
    if (ui->awaiting && await(ui, event, &effect))
        return effect;
    if (event->kind == EVENT_RESIZE) {
        ui->rows = event->row;
        ui->columns = event->column;
        return EFFECT_REDRAW;
    }
    if (event->kind == EVENT_TICK)
        return EFFECT_REDRAW;
    if (event->kind == EVENT_INTERRUPT)
        return interrupt(ui);
    if (ui->prompt.kind != PROMPT_NONE)
        return prompt_update(ui, event);
    if (ui->chooser.kind != CHOOSER_NONE)
        return chooser_update(ui, event);
    if (event->kind == EVENT_MOUSE)
        return ui->screen == SCREEN_ATOM ? atom_mouse(ui, event)
                                         : map_mouse(ui, event);
    if (starts_jump(event, ui->screen)) {
        prompt_open(ui, PROMPT_JUMP, "");
        return prompt_update(ui, event);
    }
    enum action action = key_action(event, ui->screen);
    if (action != ACTION_NONE)
        return act(ui, action);
    if (event->kind != EVENT_KEY && event->kind != EVENT_CHARACTER)
        return EFFECT_NONE;
    key_refuse(ui, event);
    return EFFECT_REDRAW;
}

enum effect ui_update(struct ui *ui, const struct event *event)
{
    enum effect effect = take_event(ui, event);
    bool user = event->kind != EVENT_TICK && event->kind != EVENT_RESIZE &&
                event->kind != EVENT_INTERRUPT;
    if (user && effect != EFFECT_NONE) {
        ui->wanting = true;
        ui->stopped = ui->stopped && !ui->stale;
    }
    return effect;
}

void ui_draw(struct ui *ui, struct canvas *canvas)
{
    canvas_erase(canvas);
    ui->rows = canvas->rows;
    ui->columns = canvas->columns;
    if (canvas->rows < NEEDED_ROWS || canvas->columns < NEEDED_COLUMNS) {
        canvas_textf(canvas, 0, 0, canvas->columns, ROLE_TEXT,
                     "needs %dx%d, is %dx%d; q quits", NEEDED_COLUMNS,
                     NEEDED_ROWS, canvas->columns, canvas->rows);
        return;
    }
    ui_refresh(ui);
    screens[ui->screen]->draw(ui, canvas);
    if (ui->screen != SCREEN_MAP) {
        canvas_text(canvas, 0, 0, canvas->columns, ROLE_TITLE,
                    ui_screen_name(ui->screen));
        draw_message(ui, canvas, canvas->rows - 2);
        draw_keys(ui, canvas, canvas->rows - 1);
    }
    if (ui->chooser.kind != CHOOSER_NONE)
        chooser_draw(ui, canvas);
}

const char *ui_screen_name(enum screen_id screen)
{
    return screens[screen]->name;
}
