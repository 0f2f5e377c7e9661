/* SPDX-License-Identifier: MIT */
#include "session/view.h"

#include <string.h>

#include "element/selection.h"

static const char *const shown_names[SHOWN_COUNT] = {
    [SHOWN_VALUE] = "value",
    [SHOWN_REFERENCE] = "reference",
    [SHOWN_RESIDUAL] = "residual",
};

void session_save(const struct session *s, struct text *t)
{
    const struct choice *c = &s->choice;
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
        if (c->hidden_models >> m & 1u)
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
    text_addf(t, "dots %s\n", c->braille ? "on" : "off");
    text_addf(t, "mouse %s\n", s->mouse ? "on" : "off");
}

static void load_pin(struct session *s, const char *value)
{
    struct choice *c = &s->choice;
    struct selection found = {0};
    struct status st = status_ok();
    if (!selection_add(&found, value, &st) || found.count != 1 ||
        c->pin_count == PIN_MAX ||
        session_pin_place(s, found.items[0].z, found.items[0].charge) >= 0)
        return;
    struct ask ask;
    if (session_ask(s, found.items[0].z, found.items[0].charge, &ask))
        c->pins[c->pin_count++] =
            (struct pin){found.items[0].z, found.items[0].charge};
}

static void load_reference(struct session *s, const char *value)
{
    const struct reference *r =
        reference_find(study_references(s->study), value);
    if (r && r->quantity == s->choice.quantity)
        s->choice.reference = r;
}

static void load_against(struct session *s, const char *value)
{
    const struct reference *r =
        reference_find(study_references(s->study), value);
    if (r && r->quantity == s->choice.quantity)
        s->choice.against = r;
}

static void load_evidence(struct session *s, const char *value)
{
    enum evidence found;
    if (evidence_find(value, &found))
        s->choice.evidence |= 1u << found;
}

static void load_walk(struct session *s, const char *value)
{
    for (int k = 0; k < WALK_COUNT; k++)
        if (strcmp(value, walk_id((enum walk_kind)k)) == 0)
            s->choice.walk = (enum walk_kind)k;
}

static void load_hidden(struct session *s, const char *value)
{
    const struct model *m = model_find(value);
    if (m)
        s->choice.hidden_models |= 1u << model_index(m);
}

static void load_model(struct session *s, const char *value)
{
    const struct model *m = model_find(value);
    if (m && model_gives(m, s->choice.quantity))
        s->choice.model = m;
}

static void load_quantity(struct session *s, const char *value)
{
    enum quantity_id q;
    if (quantity_find(value, &q))
        session_select_quantity(s, q);
}

static void load_shown(struct session *s, const char *value)
{
    for (int i = 0; i < SHOWN_COUNT && s->choice.model; i++)
        if (strcmp(value, shown_names[i]) == 0)
            s->choice.shown = (enum shown)i;
}

static void load_element(struct session *s, const char *value)
{
    const struct element *e = element_by_symbol(value);
    if (e)
        s->choice.z = e->z;
}

static void load_charge(struct session *s, const char *value)
{
    int charge;
    if (text_to_int(value, &charge))
        s->choice.charge = charge;
}

static void load_subshell(struct session *s, const char *value)
{
    int n, l;
    if (quantity_at(s->choice.quantity)->per_subshell &&
        subshell_parse(value, &n, &l)) {
        s->choice.n = n;
        s->choice.l = l;
    }
}

static void load_coordination(struct session *s, const char *value)
{
    for (int i = COORDINATION_NONE + 1; i < COORDINATION_COUNT; i++)
        if (strcmp(value, coordination_id((enum coordination)i)) == 0)
            s->choice.site.coordination = (enum coordination)i;
}

static void load_spin(struct session *s, const char *value)
{
    for (int i = SPIN_NONE + 1; i < SPIN_COUNT; i++)
        if (strcmp(value, spin_id((enum spin_state)i)) == 0)
            s->choice.site.spin = (enum spin_state)i;
}

static void load_unit(struct session *s, const char *value)
{
    const struct unit *unit = unit_find(value);
    if (unit)
        s->choice.units[unit->dimension] = unit;
}

static void load_columns(struct session *s, const char *value)
{
    s->choice.grid = strcmp(value, "32") == 0 ? GRID_32 : GRID_18;
}

static void load_group3(struct session *s, const char *value)
{
    s->choice.group3 = strcmp(value, "La") == 0 ? GRID_LA_AC : GRID_LU_LR;
}

static void load_mouse(struct session *s, const char *value)
{
    s->mouse = strcmp(value, "on") == 0;
}

static void load_dots(struct session *s, const char *value)
{
    s->choice.braille = strcmp(value, "on") == 0;
}

/* In the order in which they are written. A model, a reference and a subshell
 * are judged by the quantity before them, and go with it when another one
 * follows; a charge is judged when the element is known (session_settle). */
static const struct {
    const char *key;
    void (*load)(struct session *s, const char *value);
} lines[] = {
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
    {"dots", load_dots},
    {"mouse", load_mouse},
};

bool session_load(struct session *s, const char *key, const char *value)
{
    for (size_t i = 0; i < sizeof lines / sizeof lines[0]; i++)
        if (strcmp(lines[i].key, key) == 0) {
            lines[i].load(s, value);
            return true;
        }
    return false;
}

void session_settle(struct session *s)
{
    struct ask ask;
    if (!session_ask(s, s->choice.z, s->choice.charge, &ask))
        s->choice.charge = 0;
    session_touch(s);
}
