/* SPDX-License-Identifier: MIT */
/* A list to choose from, laid over the screen. */
#include <stdarg.h>
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "screens/parts.h"

static void add(struct chooser *c, int value, bool current, const char *format,
                ...) PRINTF_LIKE(4, 5);

static void add(struct chooser *c, int value, bool current, const char *format,
                ...)
{
    if (c->count == CHOOSER_MAX)
        return;
    va_list args;
    va_start(args, format);
    vsnprintf(c->labels[c->count], sizeof c->labels[0], format, args);
    va_end(args);
    c->values[c->count] = value;
    if (current)
        c->at = c->count;
    c->count++;
}

static void fill_quantities(struct ui *ui, struct chooser *c)
{
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        const struct quantity *row = quantity_at((enum quantity_id)q);
        add(c, q, ui->choice.quantity == (enum quantity_id)q, "%s: %s%s",
            row->id, row->title, row->modelled ? "" : " (stored only)");
    }
}

static void fill_models(struct ui *ui, struct chooser *c)
{
    for (int m = 0; m < model_count(); m++) {
        const struct model *model = model_at(m);
        if (model_offer_for(model, ui->choice.quantity, NULL) >= 0)
            add(c, m, ui->choice.model == model, "%s: %s; %s", model->id,
                model->title, model->domain);
    }
}

/* Kinds of stored values as the list of references offers them. */
static const struct {
    const char *words;
    unsigned set;
} kinds[] = {
    {"all kinds", 0},
    {"measured alone", 1u << EVIDENCE_MEASURED},
    {"extrapolated alone", 1u << EVIDENCE_EXTRAPOLATED},
    {"theoretical alone", 1u << EVIDENCE_THEORETICAL},
};
/* The set whose sites are offered where the chosen one knows none. */
#define SITE_SET "ionic_effective_shannon_1976"

#define KINDS_FROM (-10) /* value of the first of them, and downwards */

static void fill_references(struct ui *ui, struct chooser *c)
{
    const struct reference_list *list = study_references(ui->study);
    add(c, -1, ui->choice.reference == NULL,
        "default: the set with the model's own definition; of ions' radii the "
        "ionic one");
    for (int r = 0; r < list->count; r++) {
        const struct reference *ref = &list->items[r];
        if (ref->quantity == ui->choice.quantity)
            add(c, r, ui->choice.reference == ref, "%s: %s",
                ref->provenance->id, ref->provenance->definition);
    }
    for (size_t k = 0; k < sizeof kinds / sizeof kinds[0]; k++)
        add(c, KINDS_FROM - (int)k, false, "values: %s%s", kinds[k].words,
            ui->choice.evidence == kinds[k].set ? ", as now" : "");
}

static void fill_against(struct ui *ui, struct chooser *c)
{
    const struct reference_list *list = study_references(ui->study);
    add(c, -1, ui->choice.against == NULL, "no second set");
    for (int r = 0; r < list->count; r++) {
        const struct reference *ref = &list->items[r];
        if (ref->quantity == ui->choice.quantity)
            add(c, r, ui->choice.against == ref, "%s: %s", ref->provenance->id,
                ref->provenance->definition);
    }
}

/* One line per model, on or off; Enter turns it and the list stays. */
static void fill_curves(struct ui *ui, struct chooser *c)
{
    for (int m = 0; m < model_count(); m++)
        if (model_offer_for(model_at(m), ui->choice.quantity, NULL) >= 0)
            add(c, m, false, "[%c] %s",
                ui->choice.hidden_curves >> m & 1u ? ' ' : 'x',
                model_at(m)->id);
}

/* The one after the present walk is offered first: opened and accepted, the
 * list goes through them. */
static void fill_walks(struct ui *ui, struct chooser *c)
{
    enum walk_kind next = (enum walk_kind)((ui->choice.walk + 1) % WALK_COUNT);
    for (int k = 0; k < WALK_COUNT; k++)
        add(c, k, k == (int)next, "%s: %s%s", walk_id((enum walk_kind)k),
            walk_words((enum walk_kind)k),
            k == (int)ui->choice.walk ? ", as now" : "");
}

static void fill_subshells(struct ui *ui, struct chooser *c)
{
    struct ask ask;
    struct species species;
    struct status st = status_ok();
    char label[SUBSHELL_TEXT_MAX];
    add(c, 0, ui->choice.n == 0, "outermost");
    if (!ui_ask(ui, ui->choice.z, ui->choice.charge, &ask) ||
        !study_species(ui->study, &ask, &species, &st))
        return;
    for (int i = 0; i < species.configuration.count; i++) {
        const struct subshell *s = &species.configuration.shells[i];
        add(c, s->n * 8 + s->l, ui->choice.n == s->n && ui->choice.l == s->l,
            "%s  %.10g electrons", subshell_print(s->n, s->l, label), s->occ);
    }
}

static bool is_offered(const struct chooser *c, int value)
{
    for (int i = 0; i < c->count; i++)
        if (c->values[i] == value)
            return true;
    return false;
}

/* The sites that a set holds for one ion, each once, with its radius; named
 * where there are several ions. */
static void add_sites(const struct ui *ui, struct chooser *c,
                      const struct dataset *set, struct pin of, bool named)
{
    const struct site *now = &ui->choice.site;
    char out[NUMBER_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    for (int i = set->first[of.z]; i < set->first[of.z + 1]; i++) {
        const struct entry *e = &set->values[i];
        int value = e->coordination * SPIN_COUNT + e->spin;
        bool here =
            now->coordination == e->coordination && now->spin == e->spin;
        if (e->charge == of.charge && e->gap == GAP_NONE &&
            !is_offered(c, value))
            add(c, value, here, "%s%s%s  %s%s%s %s",
                coordination_id(e->coordination), e->spin ? ", " : "",
                spin_word((enum spin_state)e->spin),
                named ? ion_print(of.z, of.charge, ion) : "", named ? " " : "",
                number_print(e->value, out), set->unit->id);
    }
}

/* The sites of the selected ion, on Compare of all that are compared. Without
 * any there is nothing to choose, but the way back to the default. */
static void fill_sites(struct ui *ui, struct chooser *c)
{
    const struct choice *choice = &ui->choice;
    const struct reference *r = choice->reference;
    bool pins = ui->screen == SCREEN_COMPARE && choice->pin_count > 0;
    struct pin one = {choice->z, choice->charge};
    if (!r || !reference_has_sites(r))
        r = reference_find(study_references(ui->study), SITE_SET);
    if (!r)
        return;
    add(c, 0, true, "%s, the default of %s",
        coordination_id(r->set->default_coordination), r->provenance->id);
    for (int i = 0; pins && i < choice->pin_count; i++)
        add_sites(ui, c, r->set, choice->pins[i], choice->pin_count > 1);
    if (!pins)
        add_sites(ui, c, r->set, one, false);
    if (c->count == 1 && choice->site.coordination == COORDINATION_NONE &&
        choice->site.spin == SPIN_NONE)
        c->count = 0;
}

/* Units of the quantity, or of everything that the screen Atom shows. */
static void fill_units(struct ui *ui, struct chooser *c)
{
    const struct unit *now = ui_unit(ui, ui->choice.quantity);
    bool atom = ui->screen == SCREEN_ATOM;
    for (size_t u = 0; u < unit_count(); u++) {
        const struct unit *unit = unit_at(u);
        bool length = unit->dimension == DIMENSION_LENGTH;
        bool energy = unit->dimension == DIMENSION_ENERGY;
        if (atom)
            now = ui_unit(ui, length ? QUANTITY_RADIUS : QUANTITY_IONIZATION);
        if (atom ? length || energy : unit->dimension == now->dimension)
            add(c, (int)u, unit == now && (!atom || length), "%s: %s%s",
                unit->id, unit->title, atom && unit == now ? ", shown" : "");
    }
}

/* value: functional and equation in one number. */
static void fill_methods(struct ui *ui, struct chooser *c)
{
    struct atom_method now = ui->choice.atom.method;
    for (int f = 0; f < FUNCTIONAL_COUNT; f++)
        for (int r = 0; r < RELATIVITY_COUNT; r++)
            add(c, f * RELATIVITY_COUNT + r,
                (int)now.functional == f && (int)now.relativity == r, "%s, %s",
                functional_title((enum functional)f),
                relativity_title((enum relativity)r));
}

/* value: the kind of overlay; for another species OVERLAY_COUNT and on. */
static void fill_overlays(struct ui *ui, struct chooser *c)
{
    const struct choice *choice = &ui->choice;
    const struct atom_choice *a = &choice->atom;
    char ion[ION_TEXT_MAX];
    struct ask ask;
    add(c, OVERLAY_NONE, a->overlay == OVERLAY_NONE, "nothing");
    for (int i = 0; i < choice->pin_count; i++) {
        const struct pin *p = &choice->pins[i];
        if (p->z != choice->z || p->charge != choice->charge)
            add(c, OVERLAY_COUNT + i,
                a->overlay == OVERLAY_SPECIES && a->over.z == p->z &&
                    a->over.charge == p->charge,
                "%s, pinned", ion_print(p->z, p->charge, ion));
    }
    if (ui_ask(ui, choice->z, choice->charge + 1, &ask) &&
        choice->charge + 1 < choice->z)
        add(c, OVERLAY_COUNT + PIN_MAX,
            a->overlay == OVERLAY_SPECIES && a->over.z == choice->z &&
                a->over.charge == choice->charge + 1,
            "%s, one electron less",
            ion_print(choice->z, choice->charge + 1, ion));
    add(c, OVERLAY_RELATIVITY, a->overlay == OVERLAY_RELATIVITY,
        "the same by the %s",
        relativity_title(a->method.relativity == RELATIVITY_DIRAC
                             ? RELATIVITY_NONE
                             : RELATIVITY_DIRAC));
    add(c, OVERLAY_SLATER, a->overlay == OVERLAY_SLATER,
        "slater: Slater-type orbitals by Slater's rules");
    add(c, OVERLAY_ZETA, a->overlay == OVERLAY_ZETA,
        "single-zeta: orbitals of single-zeta Hartree-Fock");
}

static void fill_exports(struct ui *ui, struct chooser *c)
{
    add(c, SCOPE_ROW, true, "the selected species, all models");
    if (ui->choice.pin_count > 0)
        add(c, SCOPE_PINS, false, "the pinned species, all models");
    add(c, SCOPE_SHEET, false, "the sheet: all elements, the chosen model");
}

void chooser_open(struct ui *ui, enum chooser_kind kind)
{
    static void (*const fill[])(struct ui *, struct chooser *) = {
        [CHOOSER_QUANTITY] = fill_quantities,
        [CHOOSER_MODEL] = fill_models,
        [CHOOSER_REFERENCE] = fill_references,
        [CHOOSER_SUBSHELL] = fill_subshells,
        [CHOOSER_UNIT] = fill_units,
        [CHOOSER_SITE] = fill_sites,
        [CHOOSER_EXPORT] = fill_exports,
        [CHOOSER_METHOD] = fill_methods,
        [CHOOSER_OVERLAY] = fill_overlays,
        [CHOOSER_AGAINST] = fill_against,
        [CHOOSER_CURVES] = fill_curves,
        [CHOOSER_WALK] = fill_walks,
    };
    ui->chooser = (struct chooser){.kind = kind};
    ui->message[0] = '\0';
    fill[kind](ui, &ui->chooser);
    if (kind == CHOOSER_CURVES)
        ui_report(ui, false, "Enter turns a curve on or off; Esc ends");
    if (ui->chooser.count == 0 && kind == CHOOSER_SITE) {
        ui->chooser.kind = CHOOSER_NONE;
        ui_report(ui, false,
                  "no ion with stored radii here, so no site to choose; + and "
                  "- change the charge");
    } else if (ui->chooser.count == 0) {
        ui->chooser.kind = CHOOSER_NONE;
        ui_report(ui, false, "nothing to choose from: no model computes %s",
                  quantity_at(ui->choice.quantity)->id);
    }
}

static void take_overlay(struct ui *ui, int value)
{
    struct choice *c = &ui->choice;
    if (value < OVERLAY_COUNT) {
        c->atom.overlay = (enum atom_overlay)value;
        return;
    }
    int pin = value - OVERLAY_COUNT;
    c->atom.overlay = OVERLAY_SPECIES;
    c->atom.over =
        pin < PIN_MAX ? c->pins[pin] : (struct pin){c->z, c->charge + 1};
}

/* A site speaks of ionic radii: on the map they take the place of a set that
 * knows none. */
static void take_site_set(struct ui *ui)
{
    struct choice *c = &ui->choice;
    const struct reference *r = c->reference;
    if (ui->screen == SCREEN_COMPARE || c->quantity != QUANTITY_RADIUS ||
        (r ? reference_has_sites(r) : c->charge != 0))
        return;
    c->reference = reference_find(study_references(ui->study), SITE_SET);
}

/* What was chosen, since the radii may be out of sight. */
static void report_site(struct ui *ui)
{
    const struct reference *r =
        reference_find(study_references(ui->study), SITE_SET);
    char site[UI_TEXT_MAX];
    struct text t = text_over(site, sizeof site);
    if (r)
        reference_asked_site(r, ui->choice.site, &t);
    ui_report(ui, false, "site %s, for the stored radii of ions", site);
}

static enum effect take(struct ui *ui)
{
    struct chooser *c = &ui->chooser;
    int value = c->values[c->at];
    enum chooser_kind kind = c->kind;
    c->kind = CHOOSER_NONE;
    ui->stale = ui->comparison_stale = true;
    if (kind == CHOOSER_QUANTITY) {
        ui_select_quantity(ui, (enum quantity_id)value);
    } else if (kind == CHOOSER_MODEL) {
        ui->choice.model = model_at(value);
        if (ui->choice.shown == SHOWN_REFERENCE)
            ui->choice.shown = SHOWN_VALUE;
    } else if (kind == CHOOSER_REFERENCE && value <= KINDS_FROM) {
        ui->choice.evidence = kinds[KINDS_FROM - value].set;
    } else if (kind == CHOOSER_REFERENCE) {
        ui->choice.reference =
            value < 0 ? NULL : &study_references(ui->study)->items[value];
    } else if (kind == CHOOSER_SUBSHELL) {
        ui->choice.n = value / 8;
        ui->choice.l = value % 8;
    } else if (kind == CHOOSER_SITE) {
        ui->choice.site = (struct site){(enum coordination)(value / SPIN_COUNT),
                                        (enum spin_state)(value % SPIN_COUNT)};
        take_site_set(ui);
        report_site(ui);
    } else if (kind == CHOOSER_UNIT) {
        const struct unit *unit = unit_at((size_t)value);
        ui->choice.units[unit->dimension] = unit;
    } else if (kind == CHOOSER_METHOD) {
        ui->choice.atom.method.functional =
            (enum functional)(value / RELATIVITY_COUNT);
        ui->choice.atom.method.relativity =
            (enum relativity)(value % RELATIVITY_COUNT);
    } else if (kind == CHOOSER_AGAINST) {
        ui->choice.against =
            value < 0 ? NULL : &study_references(ui->study)->items[value];
    } else if (kind == CHOOSER_CURVES) {
        ui->choice.hidden_curves ^= 1u << value;
        int at = c->at;
        chooser_open(ui, CHOOSER_CURVES);
        c->at = at;
    } else if (kind == CHOOSER_WALK) {
        ui->choice.walk = (enum walk_kind)value;
    } else if (kind == CHOOSER_OVERLAY) {
        take_overlay(ui, value);
    } else {
        export_prompt(ui, (enum export_scope)value);
    }
    return EFFECT_REDRAW;
}

static void move(struct chooser *c, int by)
{
    c->at += by;
    if (c->at < 0)
        c->at = 0;
    if (c->at >= c->count)
        c->at = c->count - 1;
}

/* A letter goes to the next entry that starts with it. */
static void seek(struct chooser *c, uint32_t letter)
{
    for (int i = 1; i <= c->count; i++) {
        int at = (c->at + i) % c->count;
        if ((unsigned char)c->labels[at][0] == letter) {
            c->at = at;
            return;
        }
    }
}

static void leave(struct ui *ui)
{
    ui->chooser.kind = CHOOSER_NONE;
    ui->message[0] = '\0';
}

enum effect chooser_update(struct ui *ui, const struct event *event)
{
    struct chooser *c = &ui->chooser;
    if (event->kind == EVENT_CHARACTER) {
        if (event->character == 'j' || event->character == 'k')
            move(c, event->character == 'j' ? 1 : -1);
        else if (event->character == 'q')
            leave(ui);
        else
            seek(c, event->character);
        return EFFECT_REDRAW;
    }
    if (event->kind != EVENT_KEY)
        return EFFECT_NONE;
    if (event->key == KEY_CODE_ENTER || event->key == KEY_CODE_RIGHT)
        return take(ui);
    if (event->key == KEY_CODE_ESCAPE || event->key == KEY_CODE_LEFT)
        leave(ui);
    else if (event->key == KEY_CODE_UP)
        move(c, -1);
    else if (event->key == KEY_CODE_DOWN)
        move(c, 1);
    else if (event->key == KEY_CODE_HOME || event->key == KEY_CODE_PAGE_UP)
        c->at = 0;
    else if (event->key == KEY_CODE_END || event->key == KEY_CODE_PAGE_DOWN)
        c->at = c->count - 1;
    return EFFECT_REDRAW;
}

static void draw_frame(struct canvas *canvas, struct area a, const char *title)
{
    int right = a.column + a.columns - 1;
    int bottom = a.row + a.rows - 1;
    canvas_fill(canvas, a.row, a.column, a.rows, a.columns, ROLE_TEXT, ' ');
    canvas_fill(canvas, a.row, a.column, 1, a.columns, ROLE_QUIET, 0x2500);
    canvas_fill(canvas, bottom, a.column, 1, a.columns, ROLE_QUIET, 0x2500);
    canvas_fill(canvas, a.row, a.column, a.rows, 1, ROLE_QUIET, 0x2502);
    canvas_fill(canvas, a.row, right, a.rows, 1, ROLE_QUIET, 0x2502);
    canvas_put(canvas, a.row, a.column, ROLE_QUIET, 0x250C);
    canvas_put(canvas, a.row, right, ROLE_QUIET, 0x2510);
    canvas_put(canvas, bottom, a.column, ROLE_QUIET, 0x2514);
    canvas_put(canvas, bottom, right, ROLE_QUIET, 0x2518);
    canvas_textf(canvas, a.row, a.column + 2, a.columns - 4, ROLE_HEADING,
                 " %s ", title);
}

void chooser_draw(const struct ui *ui, struct canvas *canvas)
{
    static const char *const titles[] = {
        [CHOOSER_AGAINST] = "Second reference",
        [CHOOSER_CURVES] = "Curves",
        [CHOOSER_WALK] = "Walk",
        [CHOOSER_NONE] = "",
        [CHOOSER_QUANTITY] = "Quantity",
        [CHOOSER_MODEL] = "Model",
        [CHOOSER_REFERENCE] = "Reference",
        [CHOOSER_SUBSHELL] = "Subshell",
        [CHOOSER_UNIT] = "Unit",
        [CHOOSER_SITE] = "Site",
        [CHOOSER_EXPORT] = "Export",
        [CHOOSER_METHOD] = "Method",
        [CHOOSER_OVERLAY] = "Laid over",
    };
    const struct chooser *c = &ui->chooser;
    int width = 24;
    for (int i = 0; i < c->count; i++) {
        int need = (int)utf8_length(c->labels[i]) + 6;
        width = need > width ? need : width;
    }
    width = width < canvas->columns ? width : canvas->columns;
    int room = canvas->rows - 2;
    int rows = c->count + 2 < room ? c->count + 2 : room;
    if (rows < 3)
        return;
    int top = c->at - (rows - 3) > 0 ? c->at - (rows - 3) : 0;
    struct area a = {(canvas->rows - rows) / 2, (canvas->columns - width) / 2,
                     rows, width};
    draw_frame(canvas, a, titles[c->kind]);
    for (int i = 0; i < rows - 2; i++) {
        int item = top + i;
        bool at = item == c->at;
        int row = a.row + 1 + i;
        canvas_textf(canvas, row, a.column + 1, a.columns - 2,
                     at ? ROLE_CHOSEN : ROLE_TEXT, "%s %-*s", at ? ">" : " ",
                     a.columns - 4, c->labels[item]);
        if (at) {
            canvas->cursor_row = row;
            canvas->cursor_column = a.column + 1;
        }
    }
}
