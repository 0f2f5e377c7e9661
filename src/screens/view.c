/* SPDX-License-Identifier: MIT */
/* The remembered view: text with one `key value` per line. */
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "screens/parts.h"

#define VALUE_MAX 128

static const char *const shown_names[SHOWN_COUNT] = {
    [SHOWN_VALUE] = "value",
    [SHOWN_REFERENCE] = "reference",
    [SHOWN_RESIDUAL] = "residual",
};

static const char *const curves_names[CURVES_COUNT] = {
    [CURVES_SHELL] = "subshell",
    [CURVES_ALL] = "all",
    [CURVES_CHARGE] = "charge",
};

void ui_save_view(const struct ui *ui, struct text *t)
{
    const struct choice *c = &ui->choice;
    char label[SUBSHELL_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    text_addf(t, "quantity %s\n", quantity_at(c->quantity)->id);
    if (c->model)
        text_addf(t, "model %s\n", c->model->id);
    if (c->reference)
        text_addf(t, "reference %s\n", c->reference->provenance->id);
    if (c->against)
        text_addf(t, "against %s\n", c->against->provenance->id);
    for (int e = 0; e < EVIDENCE_COUNT && c->evidence; e++)
        if (c->evidence >> e & 1u)
            text_addf(t, "evidence %s\n", evidence_id((enum evidence)e));
    text_addf(t, "walk %s\n", walk_id(c->walk));
    for (int m = 0; m < model_count(); m++)
        if (c->hidden_curves >> m & 1u)
            text_addf(t, "hidden %s\n", model_at(m)->id);
    text_addf(t, "shown %s\n", shown_names[c->shown]);
    text_addf(t, "element %s\n", element_at(c->z)->symbol);
    text_addf(t, "charge %d\n", c->charge);
    if (c->n)
        text_addf(t, "subshell %s\n", subshell_print(c->n, c->l, label));
    if (c->site.coordination != COORDINATION_NONE)
        text_addf(t, "coordination %s\n",
                  coordination_id(c->site.coordination));
    if (c->site.spin != SPIN_NONE)
        text_addf(t, "spin %s\n", spin_id(c->site.spin));
    for (int d = 0; d <= DIMENSION_VOLUME; d++)
        if (c->units[d])
            text_addf(t, "unit %s\n", c->units[d]->id);
    text_addf(t, "columns %d\n", c->grid == GRID_18 ? 18 : 32);
    text_addf(t, "group3 %s\n", c->group3 == GRID_LU_LR ? "Lu" : "La");
    for (int i = 0; i < c->pin_count; i++)
        text_addf(t, "pin %s\n",
                  ion_print(c->pins[i].z, c->pins[i].charge, ion));
    text_addf(t, "functional %s\n", functional_id(c->atom.method.functional));
    text_addf(t, "relativity %s\n", relativity_id(c->atom.method.relativity));
    text_addf(t, "curves %s\n", curves_names[c->atom.curves]);
    text_addf(t, "axis %s\n", c->atom.root ? "root" : "log");
    text_addf(t, "dots %s\n", c->atom.braille ? "on" : "off");
    text_addf(t, "mouse %s\n", ui->mouse ? "on" : "off");
}

static void load_pin(struct ui *ui, const char *value)
{
    struct choice *c = &ui->choice;
    struct selection s = {0};
    struct status st = status_ok();
    if (!selection_add(&s, value, &st) || s.count != 1 ||
        c->pin_count == PIN_MAX ||
        ui_pin_place(ui, s.items[0].z, s.items[0].charge) >= 0)
        return;
    struct ask ask;
    if (ui_ask(ui, s.items[0].z, s.items[0].charge, &ask))
        c->pins[c->pin_count++] = (struct pin){s.items[0].z, s.items[0].charge};
}

static void load_reference(struct ui *ui, const char *value)
{
    const struct reference *r =
        reference_find(study_references(ui->study), value);
    if (r && r->quantity == ui->choice.quantity)
        ui->choice.reference = r;
}

static void load_against(struct ui *ui, const char *value)
{
    const struct reference *r =
        reference_find(study_references(ui->study), value);
    if (r && r->quantity == ui->choice.quantity)
        ui->choice.against = r;
}

static void load_evidence(struct ui *ui, const char *value)
{
    enum evidence found;
    if (evidence_find(value, &found))
        ui->choice.evidence |= 1u << found;
}

static void load_walk(struct ui *ui, const char *value)
{
    for (int k = 0; k < WALK_COUNT; k++)
        if (strcmp(value, walk_id((enum walk_kind)k)) == 0)
            ui->choice.walk = (enum walk_kind)k;
}

static void load_hidden(struct ui *ui, const char *value)
{
    const struct model *m = model_find(value);
    if (m)
        ui->choice.hidden_curves |= 1u << model_index(m);
}

static void load_model(struct ui *ui, const char *value)
{
    const struct model *m = model_find(value);
    if (m && model_offer_for(m, ui->choice.quantity, NULL) >= 0)
        ui->choice.model = m;
}

static void load_quantity(struct ui *ui, const char *value)
{
    enum quantity_id q;
    if (quantity_find(value, &q))
        ui_select_quantity(ui, q);
}

static void load_shown(struct ui *ui, const char *value)
{
    for (int s = 0; s < SHOWN_COUNT && ui->choice.model; s++)
        if (strcmp(value, shown_names[s]) == 0)
            ui->choice.shown = (enum shown)s;
}

static void load_element(struct ui *ui, const char *value)
{
    const struct element *e = element_by_symbol(value);
    if (e)
        ui->choice.z = e->z;
}

static void load_charge(struct ui *ui, const char *value)
{
    int charge;
    if (text_to_int(value, &charge))
        ui->choice.charge = charge;
}

static void load_subshell(struct ui *ui, const char *value)
{
    int n, l;
    if (quantity_at(ui->choice.quantity)->per_subshell &&
        subshell_parse(value, &n, &l)) {
        ui->choice.n = n;
        ui->choice.l = l;
    }
}

static void load_coordination(struct ui *ui, const char *value)
{
    for (int i = COORDINATION_NONE + 1; i < COORDINATION_COUNT; i++)
        if (strcmp(value, coordination_id((enum coordination)i)) == 0)
            ui->choice.site.coordination = (enum coordination)i;
}

static void load_spin(struct ui *ui, const char *value)
{
    for (int i = SPIN_NONE + 1; i < SPIN_COUNT; i++)
        if (strcmp(value, spin_id((enum spin_state)i)) == 0)
            ui->choice.site.spin = (enum spin_state)i;
}

static void load_unit(struct ui *ui, const char *value)
{
    const struct unit *unit = unit_find(value);
    if (unit)
        ui->choice.units[unit->dimension] = unit;
}

static void load_columns(struct ui *ui, const char *value)
{
    ui->choice.grid = strcmp(value, "32") == 0 ? GRID_32 : GRID_18;
}

static void load_group3(struct ui *ui, const char *value)
{
    ui->choice.group3 = strcmp(value, "La") == 0 ? GRID_LA_AC : GRID_LU_LR;
}

static void load_mouse(struct ui *ui, const char *value)
{
    ui->mouse = strcmp(value, "on") == 0;
}

static void load_functional(struct ui *ui, const char *value)
{
    for (int f = 0; f < FUNCTIONAL_COUNT; f++)
        if (strcmp(value, functional_id((enum functional)f)) == 0)
            ui->choice.atom.method.functional = (enum functional)f;
}

static void load_relativity(struct ui *ui, const char *value)
{
    for (int r = 0; r < RELATIVITY_COUNT; r++)
        if (strcmp(value, relativity_id((enum relativity)r)) == 0)
            ui->choice.atom.method.relativity = (enum relativity)r;
}

static void load_curves(struct ui *ui, const char *value)
{
    for (int c = 0; c < CURVES_COUNT; c++)
        if (strcmp(value, curves_names[c]) == 0)
            ui->choice.atom.curves = (enum atom_curves)c;
}

static void load_axis(struct ui *ui, const char *value)
{
    ui->choice.atom.root = strcmp(value, "root") == 0;
}

static void load_dots(struct ui *ui, const char *value)
{
    ui->choice.atom.braille = strcmp(value, "on") == 0;
}

/* In the order in which they are written. A model, a reference and a subshell
 * are judged by the quantity before them, and go with it when another one
 * follows; a charge is judged when the element is known (settle). */
static const struct {
    const char *key;
    void (*load)(struct ui *ui, const char *value);
} keys[] = {
    {"quantity", load_quantity},
    {"model", load_model},
    {"reference", load_reference},
    {"against", load_against},
    {"evidence", load_evidence},
    {"walk", load_walk},
    {"hidden", load_hidden},
    {"shown", load_shown},
    {"element", load_element},
    {"charge", load_charge},
    {"subshell", load_subshell},
    {"unit", load_unit},
    {"coordination", load_coordination},
    {"spin", load_spin},
    {"columns", load_columns},
    {"group3", load_group3},
    {"pin", load_pin},
    {"functional", load_functional},
    {"relativity", load_relativity},
    {"curves", load_curves},
    {"axis", load_axis},
    {"dots", load_dots},
    {"mouse", load_mouse},
};

static void load_line(struct ui *ui, const char *line, size_t length)
{
    for (size_t k = 0; k < sizeof keys / sizeof keys[0]; k++) {
        size_t n = strlen(keys[k].key);
        char value[VALUE_MAX];
        if (length <= n + 1 || length - n > VALUE_MAX ||
            memcmp(line, keys[k].key, n) != 0 || line[n] != ' ')
            continue;
        memcpy(value, line + n + 1, length - n - 1);
        value[length - n - 1] = '\0';
        keys[k].load(ui, value);
        return;
    }
}

/* What only the whole view can tell: lines may come in any order. */
static void settle(struct ui *ui)
{
    struct ask ask;
    if (!ui_ask(ui, ui->choice.z, ui->choice.charge, &ask))
        ui->choice.charge = 0;
}

void ui_load_view(struct ui *ui, const char *text)
{
    while (*text) {
        size_t length = strcspn(text, "\n");
        load_line(ui, text, length);
        text += length + (text[length] == '\n');
    }
    settle(ui);
    ui->stale = ui->comparison_stale = true;
}
