/* SPDX-License-Identifier: MIT */
#include "study/facts.h"

#include <stdlib.h>
#include <string.h>

/* What is said of every element with a tag. The program gives no advice on
 * handling: it names who does. */
#define DEFER "see the safety data sheet, local codes, licensed practice"

static const char *const labels[FACT_COUNT] = {
    [FACT_CONFIGURATION] = "configuration",
    [FACT_PLACE] = "place",
    [FACT_CATEGORY] = "category",
    [FACT_WEIGHT] = "atomic weight",
    [FACT_OXIDATION] = "oxidation states",
    [FACT_CAUTION] = "caution",
    [FACT_SUPPLY] = "supply",
    [FACT_ABUNDANCE] = "abundance",
};

const char *fact_label(enum fact_id id)
{
    return labels[id];
}

static void put_configuration(const struct species *species, struct text *t)
{
    char out[CONFIGURATION_TEXT_MAX];
    text_add(t, configuration_print(&species->configuration, out));
    if (species->term.text[0])
        text_addf(t, "  %s", species->term.text);
    if (species->origin != ORIGIN_STORED)
        text_addf(t, " (%s)", configuration_origin_text(species->origin));
}

static void put_place(const struct element *e, struct text *t)
{
    text_addf(t, "period %d, ", e->period);
    if (e->group)
        text_addf(t, "group %d, ", e->group);
    text_addf(t, "%c block", e->block);
}

static void put_weight(const struct element_facts *facts, struct text *t)
{
    char out[NUMBER_TEXT_MAX];
    if (facts->has_weight)
        text_add(t, number_print(facts->weight, out));
    else if (facts->longest_lived)
        text_addf(t, "none; longest-lived isotope has mass number %d",
                  facts->longest_lived);
}

/* The common states first, the others behind them. */
static void put_oxidation(int z, struct text *t)
{
    const struct dataset *set = catalogue_oxidation_states();
    bool any = false;
    for (int pass = 0; pass < 2; pass++) {
        bool begun = false;
        for (int i = set->first[z]; i < set->first[z + 1]; i++) {
            const struct oxidation_state *o = &set->oxidation_states[i];
            if (o->main != (pass == 0))
                continue;
            if (!begun && pass == 1)
                text_add(t, any ? "; also " : "seldom ");
            text_addf(t, begun ? ", %+d" : "%+d", o->state);
            begun = any = true;
        }
    }
}

/* `begun` says whether this fact has a clause already. */
static void add_clause(struct text *t, bool *begun, const char *clause)
{
    if (clause[0] == '\0')
        return;
    if (*begun)
        text_add(t, "; ");
    text_add(t, clause);
    *begun = true;
}

static void put_caution(int z, struct text *t)
{
    const struct dataset *set = catalogue_availability();
    const struct availability *a = dataset_availability(set, z);
    bool begun = false;
    if (!a)
        return;
    if (a->radioactive != RADIOACTIVE_NO)
        add_clause(t, &begun,
                   radioactive_word((enum radioactive)a->radioactive));
    add_clause(t, &begun, dataset_text(set, a->hazards));
    if (begun)
        add_clause(t, &begun, DEFER);
    const char *basis = dataset_text(set, a->hazard_basis);
    if (basis[0]) {
        add_clause(t, &begun, "tagged by ");
        text_add(t, basis);
    }
}

static void put_supply(int z, struct text *t)
{
    const struct dataset *set = catalogue_availability();
    const struct availability *a = dataset_availability(set, z);
    if (a)
        text_add(t, dataset_text(set, a->critical));
}

/* Both stored estimates, each with its book or list. */
static void put_abundance(int z, struct text *t)
{
    const struct dataset *set = catalogue_availability();
    const struct availability *a = dataset_availability(set, z);
    char out[NUMBER_TEXT_MAX];
    if (a && a->has_abundance)
        text_addf(t, "%s mg/kg in the crust (2016)",
                  number_print(a->abundance, out));
    if (a && a->has_abundance_2014)
        text_addf(t, "%s%s mg/kg in the bulk continental crust (2014)",
                  a->has_abundance ? "; " : "",
                  number_print(a->abundance_2014, out));
}

void study_fact(const struct study *study, const struct species *species,
                enum fact_id id, struct text *t)
{
    (void)study;
    const struct dataset *elements = catalogue_elements();
    const struct element_facts *facts = dataset_element(elements, species->z);
    switch (id) {
    case FACT_CONFIGURATION:
        put_configuration(species, t);
        break;
    case FACT_PLACE:
        put_place(element_at(species->z), t);
        break;
    case FACT_CATEGORY:
        if (facts)
            text_add(t, dataset_text(elements, facts->category));
        break;
    case FACT_WEIGHT:
        if (facts)
            put_weight(facts, t);
        break;
    case FACT_OXIDATION:
        put_oxidation(species->z, t);
        break;
    case FACT_CAUTION:
        put_caution(species->z, t);
        break;
    case FACT_SUPPLY:
        put_supply(species->z, t);
        break;
    case FACT_ABUNDANCE:
        put_abundance(species->z, t);
        break;
    case FACT_COUNT:
        break;
    }
}

/* A line with the unit it is shown in; false without memory. */
static struct comparison_line *add_line(struct comparison *c, int *capacity,
                                        enum quantity_id quantity,
                                        const struct unit *const *units,
                                        const struct provenance *provenance)
{
    if (c->line_count == *capacity) {
        int more = *capacity ? 2 * *capacity : 32;
        struct comparison_line *lines =
            realloc(c->lines, (size_t)more * sizeof *lines);
        if (!lines)
            return NULL;
        c->lines = lines;
        *capacity = more;
    }
    enum dimension d = provenance->definition->dimension;
    struct comparison_line *line = &c->lines[c->line_count++];
    line->quantity = quantity;
    /* A scale in a unit of its own keeps it. */
    bool plain = d == quantity_at(quantity)->dimension;
    line->unit = plain && units && units[d] ? units[d] : unit_base(d);
    line->provenance = provenance;
    return line;
}

static bool out_of_memory(struct status *st)
{
    return status_fail(st, STATUS_MEMORY, "out of memory");
}

static bool add_model(const struct study *study, const struct ask *asks,
                      const struct model *model, enum quantity_id quantity,
                      const struct unit *const *units, struct comparison *c,
                      int *capacity)
{
    for (int offer = 0; offer < model->offer_count; offer++) {
        if (model->offers[offer].quantity != quantity)
            continue;
        struct comparison_line *line = add_line(
            c, capacity, quantity, units, &model->offers[offer].provenance);
        if (!line)
            return false;
        for (int w = 0; w < c->count; w++) {
            struct ask ask = asks[w];
            ask.model = model;
            ask.quantity = quantity;
            if (!quantity_at(quantity)->per_subshell)
                ask.n = ask.l = 0;
            line->readings[w] = reading_in_unit(
                study_reading(study, &ask, &c->species[w], offer), line->unit);
        }
    }
    return true;
}

/* What follows from the model's values, where it does for one of them. */
static bool add_derived(const struct study *study, const struct ask *asks,
                        const struct model *model, enum quantity_id quantity,
                        const struct unit *const *units, struct comparison *c,
                        int *capacity)
{
    const struct derivation *d = model_derivation(model, quantity);
    struct reading readings[COMPARISON_MAX];
    bool any = false;
    for (int w = 0; d && w < c->count; w++) {
        struct ask ask = asks[w];
        ask.model = model;
        ask.quantity = quantity;
        readings[w] = study_derived(study, &ask, d);
        any = any || readings[w].state != READING_OUTSIDE;
    }
    if (!any)
        return true;
    struct comparison_line *line =
        add_line(c, capacity, quantity, units, readings[0].provenance);
    for (int w = 0; line && w < c->count; w++)
        line->readings[w] = reading_in_unit(readings[w], line->unit);
    return line != NULL;
}

static bool add_reference(const struct reference *reference,
                          const struct ask *asks,
                          const struct unit *const *units, struct comparison *c,
                          int *capacity)
{
    bool by_subshell = quantity_at(reference->quantity)->per_subshell;
    struct reading readings[COMPARISON_MAX];
    bool any = false;
    for (int w = 0; w < c->count; w++) {
        readings[w] = reference_read(reference, &c->species[w],
                                     by_subshell ? asks[w].n : 0, asks[w].l);
        any = any || readings[w].state == READING_OK;
    }
    if (!any)
        return true;
    struct comparison_line *line = add_line(c, capacity, reference->quantity,
                                            units, reference->provenance);
    if (!line)
        return false;
    for (int w = 0; w < c->count; w++)
        line->readings[w] = reading_in_unit(readings[w], line->unit);
    return true;
}

static bool add_lines(struct study *study, const struct ask *asks,
                      const struct unit *const *units, struct comparison *c)
{
    int capacity = 0;
    const struct reference_list *references = study_references(study);
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        for (int m = 0; m < model_count(); m++)
            if (!add_model(study, asks, model_at(m), (enum quantity_id)q, units,
                           c, &capacity) ||
                !add_derived(study, asks, model_at(m), (enum quantity_id)q,
                             units, c, &capacity))
                return false;
        for (int i = 0; i < references->count; i++)
            if (references->items[i].quantity == (enum quantity_id)q &&
                !add_reference(&references->items[i], asks, units, c,
                               &capacity))
                return false;
    }
    return true;
}

static bool add_facts(const struct study *study, struct comparison *c)
{
    c->facts = calloc(FACT_COUNT, sizeof *c->facts);
    if (!c->facts)
        return false;
    c->fact_count = FACT_COUNT;
    for (int f = 0; f < FACT_COUNT; f++) {
        c->facts[f].label = fact_label((enum fact_id)f);
        for (int w = 0; w < c->count; w++) {
            struct text t = text_over(c->facts[f].text[w], FACT_TEXT_MAX);
            study_fact(study, &c->species[w], (enum fact_id)f, &t);
        }
    }
    return true;
}

/* Solves what models that iterate need for an ask. */
static bool solve_ask(struct study *study, const struct ask *ask,
                      struct status *st)
{
    for (int m = 0; m < model_count(); m++) {
        if (model_at(m)->closed)
            continue;
        struct ask each = *ask;
        each.model = model_at(m);
        if (!study_want_all(study, &each, true, st))
            return false;
        while (study_step(study, st))
            ;
        if (st->code != STATUS_OK)
            return false;
    }
    return true;
}

bool study_compare(struct study *study, const struct ask *asks, int count,
                   bool solve, const struct unit *const *units,
                   struct comparison *comparison, struct status *st)
{
    struct ask plain[COMPARISON_MAX];
    *comparison = (struct comparison){.count = count};
    for (int w = 0; w < count; w++) {
        plain[w] = (struct ask){.z = asks[w].z,
                                .charge = asks[w].charge,
                                .configuration = asks[w].configuration,
                                .n = asks[w].n,
                                .l = asks[w].l,
                                .site = asks[w].site};
        if (!study_species(study, &plain[w], &comparison->species[w], st) ||
            (solve && !solve_ask(study, &plain[w], st)))
            return false;
    }
    if (add_lines(study, plain, units, comparison) &&
        add_facts(study, comparison))
        return true;
    comparison_clear(comparison);
    return out_of_memory(st);
}

/* Same citations: told once, with all quantities that rest on them. */
static bool same_citations(const struct provenance *a,
                           const struct provenance *b)
{
    return a->citation_count == b->citation_count &&
           a->citations == b->citations;
}

static int model_sources(const struct model *model, struct source *sources,
                         int max)
{
    int count = 0;
    for (int o = 0; o < model->offer_count; o++) {
        const struct model_offer *offer = &model->offers[o];
        const char *id = quantity_at(offer->quantity)->id;
        struct source *s = sources;
        while (s < sources + count &&
               !same_citations(s->provenance, &offer->provenance))
            s++;
        if (s == sources + count) {
            if (count == max)
                return count;
            count++;
            *s = (struct source){.provenance = &offer->provenance,
                                 .unit = "",
                                 .domain = model->domain};
        }
        struct text t = {s->quantity, sizeof s->quantity, strlen(s->quantity),
                         false, false};
        if (!strstr(s->quantity, id))
            text_addf(&t, t.length ? " %s" : "%s", id);
    }
    return count;
}

static struct source set_source(const struct dataset *set)
{
    struct source s = {.provenance = &set->provenance,
                       .unit = "",
                       .domain = set->licence,
                       .notes = set->notes,
                       .note_count = set->note_count,
                       .count = dataset_value_count(set)};
    if (set->kind == DATASET_VALUES) {
        struct text t = text_over(s.quantity, sizeof s.quantity);
        text_add(&t, quantity_at(set->quantity)->id);
        s.unit = set->unit->id;
    }
    return s;
}

int study_sources(const struct study *study, struct source *sources, int max)
{
    int count = 0;
    const struct catalogue *catalogue = study_catalogue(study);
    const struct reference_list *references = study_references(study);
    for (int m = 0; m < model_count(); m++)
        count += model_sources(model_at(m), sources + count, max - count);
    for (int i = 0; i < references->count && count < max; i++)
        if (references->items[i].derivation) {
            sources[count] = (struct source){
                .provenance = references->items[i].provenance,
                .unit = "",
                .domain = references->items[i].derivation->domain};
            struct text t = text_over(sources[count].quantity,
                                      sizeof sources[count].quantity);
            text_add(&t, quantity_at(references->items[i].quantity)->id);
            count++;
        }
    for (size_t i = 0; i < catalogue_count(catalogue) && count < max; i++)
        sources[count++] = set_source(catalogue_at(catalogue, i));
    return count;
}
