/* SPDX-License-Identifier: MIT */
/* The lists from which the session's choices are taken. */
#include "session/common.h"

static void fill_quantities(struct session *s, void *state, struct chooser *c)
{
    (void)state;
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        const struct quantity *row = quantity_at((enum quantity_id)q);
        chooser_add(c, q, s->choice.quantity == (enum quantity_id)q, "%s: %s%s",
                    row->id, row->title, row->modelled ? "" : " (stored only)");
    }
}

static void take_quantity(struct session *s, void *state, int value)
{
    (void)state;
    session_select_quantity(s, (enum quantity_id)value);
}

const struct chooser_ops session_choose_quantity = {
    .title = "Quantity",
    .fill = fill_quantities,
    .take = take_quantity,
};

static void fill_models(struct session *s, void *state, struct chooser *c)
{
    (void)state;
    for (int m = 0; m < model_count(); m++) {
        const struct model *model = model_at(m);
        if (model_gives(model, s->choice.quantity))
            chooser_add(c, m, s->choice.model == model, "%s: %s; %s", model->id,
                        model->title, model->domain);
    }
}

static void take_model(struct session *s, void *state, int value)
{
    (void)state;
    s->choice.model = model_at(value);
    if (s->choice.shown == SHOWN_REFERENCE)
        s->choice.shown = SHOWN_VALUE;
}

const struct chooser_ops session_choose_model = {
    .title = "Model",
    .fill = fill_models,
    .take = take_model,
};

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
#define KINDS_FROM (-10) /* value of the first of them, and downwards */
#define NO_SET (-1)

/* The sets of the chosen quantity; their values are places in the list. */
static void add_references(const struct session *s, struct chooser *c,
                           const struct reference *now)
{
    const struct reference_list *list = study_references(s->study);
    for (int r = 0; r < list->count; r++) {
        const struct reference *ref = &list->items[r];
        if (ref->quantity == s->choice.quantity)
            chooser_add(c, r, now == ref, "%s: %s", ref->provenance->id,
                        provenance_definition(ref->provenance));
    }
}

static const struct reference *reference_of(const struct session *s, int value)
{
    return value == NO_SET ? NULL : &study_references(s->study)->items[value];
}

static void fill_references(struct session *s, void *state, struct chooser *c)
{
    (void)state;
    chooser_add(c, NO_SET, s->choice.reference == NULL,
                "default: the set with the model's own definition; of ions' "
                "radii the ionic one");
    add_references(s, c, s->choice.reference);
    for (size_t k = 0; k < sizeof kinds / sizeof kinds[0]; k++)
        chooser_add(c, KINDS_FROM - (int)k, false, "values: %s%s",
                    kinds[k].words,
                    s->choice.evidence == kinds[k].set ? ", as now" : "");
}

static void take_reference(struct session *s, void *state, int value)
{
    (void)state;
    if (value <= KINDS_FROM)
        s->choice.evidence = kinds[KINDS_FROM - value].set;
    else
        s->choice.reference = reference_of(s, value);
}

const struct chooser_ops session_choose_reference = {
    .title = "Reference",
    .fill = fill_references,
    .take = take_reference,
};

static void fill_against(struct session *s, void *state, struct chooser *c)
{
    (void)state;
    chooser_add(c, NO_SET, s->choice.against == NULL, "no second set");
    add_references(s, c, s->choice.against);
}

static void take_against(struct session *s, void *state, int value)
{
    (void)state;
    s->choice.against = reference_of(s, value);
}

const struct chooser_ops session_choose_against = {
    .title = "Second reference",
    .fill = fill_against,
    .take = take_against,
};

#define SUBSHELL_VALUE 8 /* value: n times this, and l */

static void fill_subshells(struct session *s, void *state, struct chooser *c)
{
    (void)state;
    struct species species;
    char label[SUBSHELL_TEXT_MAX];
    chooser_add(c, 0, s->choice.n == 0, "outermost");
    if (!session_species(s, &species))
        return;
    for (int i = 0; i < species.configuration.count; i++) {
        const struct subshell *shell = &species.configuration.shells[i];
        chooser_add(c, shell->n * SUBSHELL_VALUE + shell->l,
                    s->choice.n == shell->n && s->choice.l == shell->l,
                    "%s  %.10g electrons",
                    subshell_print(shell->n, shell->l, label), shell->occ);
    }
}

static void take_subshell(struct session *s, void *state, int value)
{
    (void)state;
    s->choice.n = value / SUBSHELL_VALUE;
    s->choice.l = value % SUBSHELL_VALUE;
}

const struct chooser_ops session_choose_subshell = {
    .title = "Subshell",
    .fill = fill_subshells,
    .take = take_subshell,
};

/* The set whose sites are offered where the chosen one knows none. */
#define SITE_SET "ionic_effective_shannon_1976"

static bool is_offered(const struct chooser *c, int value)
{
    for (int i = 0; i < c->count; i++)
        if (c->values[i] == value)
            return true;
    return false;
}

/* The sites that a set holds for one ion, each once, with its radius; named
 * where there are several ions. */
static void add_sites(const struct session *s, struct chooser *c,
                      const struct dataset *set, struct pin of, bool named)
{
    const struct site *now = &s->choice.site;
    char out[NUMBER_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    for (int i = set->first[of.z]; i < set->first[of.z + 1]; i++) {
        const struct entry *e = &set->values[i];
        int value = e->coordination * SPIN_COUNT + e->spin;
        bool here =
            now->coordination == e->coordination && now->spin == e->spin;
        if (e->charge == of.charge && e->gap == GAP_NONE &&
            !is_offered(c, value))
            chooser_add(c, value, here, "%s%s%s  %s%s%s %s",
                        coordination_id(e->coordination), e->spin ? ", " : "",
                        spin_word((enum spin_state)e->spin),
                        named ? ion_print(of.z, of.charge, ion) : "",
                        named ? " " : "", number_print(e->value, out),
                        set->unit->id);
    }
}

/* The sites of some ions. Without any there is nothing to choose, but the way
 * back to the default. */
static void offer_sites(const struct session *s, struct chooser *c,
                        const struct pin *ions, int count)
{
    const struct choice *choice = &s->choice;
    const struct reference *r = choice->reference;
    if (!r || !reference_has_sites(r))
        r = reference_find(study_references(s->study), SITE_SET);
    if (!r)
        return;
    chooser_add(c, 0, true, "%s, the default of %s",
                coordination_id(r->set->default_coordination),
                r->provenance->id);
    for (int i = 0; i < count; i++)
        add_sites(s, c, r->set, ions[i], count > 1);
    if (c->count == 1 && choice->site.coordination == COORDINATION_NONE &&
        choice->site.spin == SPIN_NONE)
        c->count = 0;
}

static void fill_sites(struct session *s, void *state, struct chooser *c)
{
    (void)state;
    struct pin selected = {s->choice.z, s->choice.charge};
    offer_sites(s, c, &selected, 1);
}

static void fill_compared_sites(struct session *s, void *state,
                                struct chooser *c)
{
    if (s->choice.pin_count > 0)
        offer_sites(s, c, s->choice.pins, s->choice.pin_count);
    else
        fill_sites(s, state, c);
}

/* Takes the site and says it, since the radii may be out of sight. */
static void take_compared_site(struct session *s, void *state, int value)
{
    (void)state;
    const struct reference *r =
        reference_find(study_references(s->study), SITE_SET);
    char site[SESSION_TEXT_MAX];
    struct text t = text_over(site, sizeof site);
    s->choice.site = (struct site){(enum coordination)(value / SPIN_COUNT),
                                   (enum spin_state)(value % SPIN_COUNT)};
    if (r)
        reference_asked_site(r, s->choice.site, &t);
    session_report(s, false, "site %s, for the stored radii of ions", site);
}

/* A site speaks of ionic radii: they take the place of a set that knows
 * none. */
static void take_site(struct session *s, void *state, int value)
{
    struct choice *c = &s->choice;
    const struct reference *r = c->reference;
    take_compared_site(s, state, value);
    if (c->quantity == QUANTITY_RADIUS &&
        !(r ? reference_has_sites(r) : c->charge != 0))
        c->reference = reference_find(study_references(s->study), SITE_SET);
}

#define NO_SITE                                                                \
    "no ion with stored radii here, so no site to choose; + and - change the " \
    "charge"

const struct chooser_ops session_choose_site = {
    .title = "Site",
    .empty = NO_SITE,
    .fill = fill_sites,
    .take = take_site,
};

const struct chooser_ops session_choose_compared_site = {
    .title = "Site",
    .empty = NO_SITE,
    .fill = fill_compared_sites,
    .take = take_compared_site,
};

static void fill_units(struct session *s, void *state, struct chooser *c)
{
    (void)state;
    const struct unit *now = session_unit(s, s->choice.quantity);
    for (size_t u = 0; u < unit_count(); u++) {
        const struct unit *unit = unit_at(u);
        if (unit->dimension == now->dimension)
            chooser_add(c, (int)u, unit == now, "%s: %s", unit->id,
                        unit->title);
    }
}

static void take_unit(struct session *s, void *state, int value)
{
    (void)state;
    const struct unit *unit = unit_at((size_t)value);
    s->choice.units[unit->dimension] = unit;
}

const struct chooser_ops session_choose_unit = {
    .title = "Unit",
    .fill = fill_units,
    .take = take_unit,
};
