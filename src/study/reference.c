/* SPDX-License-Identifier: MIT */
#include "study/reference.h"

#include <assert.h>
#include <string.h>

#include "refdata/ground.h"

static void insert(struct reference_list *list, struct reference item)
{
    if (list->count == REFERENCE_MAX)
        return;
    int i = list->count++;
    for (; i > 0; i--) {
        const struct reference *before = &list->items[i - 1];
        bool later =
            item.quantity < before->quantity ||
            (item.quantity == before->quantity && item.rank < before->rank);
        if (!later)
            break;
        list->items[i] = *before;
    }
    list->items[i] = item;
}

/* A set without a rank stands behind all that have one, one that the user
 * added behind all built-in ones. */
#define RANK_NONE 1000
#define RANK_ADDED 1001

static int rank_of(const struct catalogue *catalogue, size_t i)
{
    const struct dataset *set = catalogue_at(catalogue, i);
    if (catalogue_is_added(catalogue, i))
        return RANK_ADDED;
    return set->rank > 0 ? set->rank : RANK_NONE;
}

static bool is_outermost_only(const struct dataset *set)
{
    if (!quantity_at(set->quantity)->per_subshell)
        return false;
    for (int i = 0; i < set->count; i++)
        if (set->values[i].n != 0)
            return false;
    return true;
}

static void add_citation(struct derived_source *source,
                         const struct citation *citation)
{
    for (int i = 0; i < source->provenance.citation_count; i++)
        if (strcmp(source->citations[i].key, citation->key) == 0)
            return;
    if (source->provenance.citation_count < DERIVED_CITATIONS_MAX)
        source->citations[source->provenance.citation_count++] = *citation;
}

/* Cites the formula, then every set that it works on at some charge. */
static void set_derived(struct reference_list *list, int place)
{
    const struct derivation *d = derivation_list[place];
    struct derived_source *source = &list->derived[place];
    source->provenance = (struct provenance){
        .id = d->id,
        .title = d->title,
        .definition = d->definition,
        .citations = source->citations,
        .unsourced = d->unsourced,
    };
    if (d->citation)
        add_citation(source, d->citation);
    for (int charge = 0; charge <= 1; charge++) {
        struct derivation_input inputs[DERIVATION_INPUTS_MAX];
        const char *reason = "";
        int count = d->inputs(charge, inputs, &reason);
        for (int i = 0; i < count; i++) {
            const struct dataset *set = list->firsts[inputs[i].quantity];
            for (int c = 0; set && c < set->provenance.citation_count; c++)
                add_citation(source, &set->provenance.citations[c]);
            /* What every value rests on; of a second set each names its own. */
            if (source->provenance.common == 0)
                source->provenance.common = source->provenance.citation_count;
        }
    }
}

static void insert_derived(struct reference_list *list)
{
    assert(derivation_list_count <= DERIVATION_MAX);
    for (int p = 0; p < derivation_list_count; p++) {
        const struct derivation *d = derivation_list[p];
        struct derivation_input inputs[DERIVATION_INPUTS_MAX];
        const char *reason = "";
        d->inputs(0, inputs, &reason);
        set_derived(list, p);
        insert(list, (struct reference){
                         .provenance = &list->derived[p].provenance,
                         .quantity = d->definition->quantity,
                         .set = list->firsts[inputs[0].quantity],
                         .rank = d->in_front ? 0 : RANK_NONE,
                         .derivation = d,
                         .firsts = list->firsts,
                         .outermost_only = d->of_emptied,
                     });
    }
}

void reference_list_fill(struct reference_list *list,
                         const struct catalogue *catalogue,
                         struct absence_list *absences)
{
    list->count = 0;
    for (int q = 0; q < QUANTITY_COUNT; q++)
        list->firsts[q] =
            catalogue_default(catalogue_builtin(), (enum quantity_id)q);
    for (size_t i = 0; i < catalogue_count(catalogue); i++) {
        const struct dataset *set = catalogue_at(catalogue, i);
        if (set->kind == DATASET_VALUES)
            insert(list, (struct reference){
                             .provenance = &set->provenance,
                             .quantity = set->quantity,
                             .set = set,
                             .rank = rank_of(catalogue, i),
                             .outermost_only = is_outermost_only(set),
                             .absences = absences,
                         });
    }
    insert_derived(list);
}

const struct reference *reference_find(const struct reference_list *list,
                                       const char *id)
{
    for (int i = 0; i < list->count; i++)
        if (strcmp(list->items[i].provenance->id, id) == 0)
            return &list->items[i];
    return NULL;
}

const struct subshell *reference_emptied(const struct species *species)
{
    struct species ion;
    struct status st = status_ok();
    if (species->emptied != 0)
        return species->emptied > 0
                   ? &species->configuration.shells[species->emptied - 1]
                   : NULL;
    if (species->charge >= species->z ||
        !ground_state(species->z, species->charge + 1, &ion, &st))
        return NULL;
    return configuration_emptied(&species->configuration, &ion.configuration);
}

/* Why Z_eff from the energy says nothing of a subshell, "" when it does. */
static const char *not_emptied(const struct species *species,
                               const struct subshell *asked)
{
    const struct subshell *emptied = reference_emptied(species);
    if (!asked)
        return "no electron left";
    if (!emptied)
        return "the ion differs from its atom in more than one subshell";
    if (emptied->n != asked->n || emptied->l != asked->l)
        return "the electron that the energy removes leaves another subshell";
    return "";
}

/* The stored value of an input. */
static struct reading read_input(const struct reference *reference,
                                 const struct species *species,
                                 struct derivation_input input)
{
    const struct dataset *set = reference->firsts[input.quantity];
    return set ? dataset_reading(set, species->z, species->charge + input.step,
                                 0, 0)
               : reading_gap(input.quantity, READING_MISSING,
                             "no set holds what it follows from", NULL);
}

/* The work that a derived value rests on beside those of every value: the one
 * that an input names as its own; where no input names one, none (then the
 * first, which all rest on). NULL where an input rests on all of its set. */
static const struct citation *
own_work(const struct provenance *p, const struct reading *readings, int count)
{
    const struct citation *own = p->citations;
    for (int i = 0; i < count; i++) {
        const struct citation *cited = readings[i].cited;
        if (!cited && readings[i].provenance->citation_count > 1)
            return NULL;
        for (int c = p->common; cited && c < p->citation_count; c++)
            if (strcmp(p->citations[c].key, cited->key) == 0)
                own = &p->citations[c];
    }
    return own;
}

static struct reading derive(const struct reference *reference,
                             const struct species *species,
                             const struct subshell *asked)
{
    const struct derivation *d = reference->derivation;
    struct derivation_input inputs[DERIVATION_INPUTS_MAX];
    struct reading readings[DERIVATION_INPUTS_MAX];
    const char *reason = "";
    int count = d->inputs(species->charge, inputs, &reason);
    if (d->of_emptied && count > 0) {
        reason = not_emptied(species, asked);
        count = reason[0] ? 0 : count;
    }
    if (count == 0)
        return reading_gap(reference->quantity, READING_MISSING, reason,
                           reference->provenance);
    for (int i = 0; i < count; i++) {
        readings[i] = read_input(reference, species, inputs[i]);
        if (readings[i].state != READING_OK)
            return reading_gap(reference->quantity, READING_MISSING,
                               readings[i].reason, reference->provenance);
    }
    struct reading r =
        derivation_reading(d, readings, count, d->of_emptied ? asked->n : 0,
                           reference->provenance);
    r.cited = own_work(reference->provenance, readings, count);
    if (d->of_emptied) {
        r.n = asked->n;
        r.l = asked->l;
    }
    return r;
}

bool reference_has_sites(const struct reference *reference)
{
    return !reference->derivation &&
           reference->set->default_coordination != COORDINATION_NONE;
}

/* The entry of an ion at a site, NULL when there is none. Another site is
 * never put in its place. */
static const struct entry *entry_at_site(const struct reference *reference,
                                         const struct species *species)
{
    const struct site site = species->site;
    const struct dataset *set = reference->set;
    enum coordination coordination = site.coordination != COORDINATION_NONE
                                         ? site.coordination
                                         : set->default_coordination;
    const struct entry *entry = dataset_lookup_site(
        set, species->z, species->charge, coordination, site.spin);
    /* An ion with closed subshells has one radius, whatever the spin asked. */
    if (!entry)
        entry = dataset_lookup_site(set, species->z, species->charge,
                                    coordination, SPIN_NONE);
    bool fits = entry && (entry->spin == SPIN_NONE || site.spin == SPIN_NONE ||
                          entry->spin == site.spin);
    return fits ? entry : NULL;
}

static struct reading read_at_site(const struct reference *reference,
                                   const struct species *species)
{
    const struct entry *entry = entry_at_site(reference, species);
    if (entry)
        return dataset_entry_reading(reference->set, entry);
    return reading_gap(
        reference->quantity, READING_MISSING,
        absence_text(reference->absences, reference->set, species),
        reference->provenance);
}

void reference_asked_site(const struct reference *reference, struct site site,
                          struct text *t)
{
    if (!reference_has_sites(reference))
        return;
    struct site base = {reference->set->default_coordination, SPIN_NONE};
    site_words(t, site_filled(site, base));
}

static const struct subshell *subshell_of(const struct configuration *c, int n,
                                          int l)
{
    for (int i = 0; i < c->count; i++)
        if (c->shells[i].n == n && c->shells[i].l == l)
            return &c->shells[i];
    return NULL;
}

struct reading reference_read(const struct reference *reference,
                              const struct species *species, int n, int l)
{
    const struct subshell *outer =
        configuration_outermost(&species->configuration);
    bool is_outer = n == 0 || (outer && outer->n == n && outer->l == l);
    if (reference->outermost_only && !reference->derivation && !is_outer)
        return reading_gap(reference->quantity, READING_MISSING,
                           "this set holds outermost subshells only",
                           reference->provenance);
    if (reference->derivation && species->origin == ORIGIN_USER)
        return reading_gap(reference->quantity, READING_MISSING,
                           "stored for the ground configuration only",
                           reference->provenance);
    if (reference->derivation)
        return derive(reference, species,
                      n == 0 ? outer
                             : subshell_of(&species->configuration, n, l));
    /* A set by subshells is asked for the very subshell. */
    bool by_subshell = quantity_at(reference->quantity)->per_subshell &&
                       !reference->outermost_only;
    if (by_subshell && n == 0 && outer) {
        n = outer->n;
        l = outer->l;
    }
    struct reading r =
        reference_has_sites(reference)
            ? read_at_site(reference, species)
            : dataset_reading(reference->set, species->z, species->charge,
                              by_subshell ? n : 0, by_subshell ? l : 0);
    if (r.state != READING_OK || species->origin != ORIGIN_USER)
        return r;
    /* An energy belongs to the level that it was measured for; a size that was
     * found in compounds does not know the configuration. */
    if (reference->quantity != QUANTITY_RADIUS &&
        reference->quantity != QUANTITY_ELECTRONEGATIVITY)
        return reading_gap(reference->quantity, READING_MISSING,
                           "stored for the ground configuration only",
                           reference->provenance);
    r.remark = "stored for the ground configuration";
    return r;
}

const struct reference *
reference_default(const struct reference_list *list, enum quantity_id quantity,
                  const struct species *species, int n, int l,
                  const struct definition *definition, bool inner)
{
    const struct reference *first = NULL, *like = NULL, *of_ions = NULL;
    for (int i = 0; i < list->count; i++) {
        const struct reference *r = &list->items[i];
        const struct definition *own = r->provenance->definition;
        if (r->quantity != quantity || (inner && r->outermost_only))
            continue;
        /* A set of the user stands behind ours and changes no row unasked. */
        if (first && r->rank == RANK_ADDED)
            break;
        if (definition && own == definition) {
            if (reference_read(r, species, n, l).state == READING_OK)
                return r;
            like = like ? like : r;
        }
        if (!of_ions && species->charge != 0 && !inner &&
            (own->traits & DEFINITION_OF_IONS))
            of_ions = r;
        first = first ? first : r;
    }
    if (!first && inner)
        return reference_default(list, quantity, species, n, l, definition,
                                 false);
    return of_ions ? of_ions : like ? like : first;
}
