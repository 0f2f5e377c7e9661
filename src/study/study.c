/* SPDX-License-Identifier: MIT */
#include "study/study.h"

#include <assert.h>
#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "refdata/ground.h"
#include "study/solution.h"

/* Models that can stand in the registry, and atoms that can wait. */
#define WORK_MAX 16
#define QUEUE_MAX 1024
#define MISSING_TEXT_MAX 80

/* Single-bond radii of all elements: the radius in the Allred-Rochow scale. */
#define COVALENT_SET "covalent_single_pyykko_2009"

struct task {
    const struct model *model;
    struct question question;
};

/* What was last asked of an element in its ground state: rows of one element
 * share it, and a screen asks for the same rows again and again. */
struct ground {
    bool known;
    struct question question;
};

struct study {
    const struct catalogue *catalogue;
    /* What a model's derived values come from, by place of model and
     * derivation. */
    struct provenance derived[WORK_MAX][DERIVATION_MAX];
    char missing[QUANTITY_COUNT][MISSING_TEXT_MAX]; /* no such input */
    struct ground *grounds;                         /* grounds[Z_MAX + 1] */
    struct reference_list references;
    struct absence_list *absences;
    struct model_options options;
    void *works[WORK_MAX]; /* by place in the registry; made when needed */
    const struct dataset *covalent;
    struct solution_store solutions;
    struct task *queue; /* queue[queued], the next one last */
    int queued;
    bool running; /* the last task of the queue has begun */
    int done, total;
};

/* A derived value of a model is the model's, under the derivation's
 * definition. */
static void set_derived(struct study *study)
{
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        struct text t = text_over(study->missing[q], MISSING_TEXT_MAX);
        text_addf(&t, "the model gives no %s",
                  quantity_at((enum quantity_id)q)->title);
    }
    for (int m = 0; m < model_count(); m++)
        for (int d = 0; d < derivation_list_count; d++) {
            const struct model *model = model_at(m);
            struct provenance *p = &study->derived[m][d];
            int offer = model_offer_for(model, QUANTITY_IONIZATION, NULL);
            *p = model->offers[offer < 0 ? 0 : offer].provenance;
            p->definition = derivation_list[d]->definition;
        }
}

struct study *study_new(const struct catalogue *catalogue, struct status *st)
{
    struct study *study = calloc(1, sizeof *study);
    if (!study) {
        status_fail(st, STATUS_MEMORY, "out of memory");
        return NULL;
    }
    study->grounds = calloc(Z_MAX + 1, sizeof *study->grounds);
    study->absences = calloc(1, sizeof *study->absences);
    if (!study->grounds || !study->absences) {
        free(study->grounds);
        free(study->absences);
        free(study);
        status_fail(st, STATUS_MEMORY, "out of memory");
        return NULL;
    }
    assert(model_count() <= WORK_MAX);
    study->catalogue = catalogue;
    study->covalent = catalogue_find(catalogue, COVALENT_SET);
    reference_list_fill(&study->references, catalogue, study->absences);
    set_derived(study);
    return study;
}

void study_free(struct study *study)
{
    if (!study)
        return;
    for (int m = 0; m < model_count(); m++) {
        if (study->works[m] && model_at(m)->close)
            model_at(m)->close(study->works[m]);
        free(study->works[m]);
    }
    solution_free(&study->solutions);
    free(study->queue);
    free(study->grounds);
    absence_clear(study->absences);
    free(study->absences);
    free(study);
}

const struct catalogue *study_catalogue(const struct study *study)
{
    return study->catalogue;
}

const struct reference_list *study_references(const struct study *study)
{
    return &study->references;
}

void study_set_options(struct study *study, const struct model_options *options)
{
    study_stop(study);
    solution_clear(&study->solutions);
    study->options = *options;
}

/* One electron less: the stored ion where the atom is the stored one, else
 * the outermost electron of the given configuration goes. */
static bool cation_of(const struct species *species, struct species *cation)
{
    if (species->charge >= species->z)
        return false;
    struct status st = status_ok();
    if (species->origin != ORIGIN_USER)
        return ground_state(species->z, species->charge + 1, cation, &st);
    *cation = *species;
    cation->charge++;
    const struct subshell *outer =
        configuration_outermost(&species->configuration);
    return outer && configuration_change(&cation->configuration, outer->n,
                                         outer->l, -fmin(1.0, outer->occ));
}

static struct question question_of(const struct study *study,
                                   const struct species *species)
{
    struct question q = {.species = *species};
    q.has_cation = cation_of(species, &q.cation);
    struct status st = status_ok();
    q.has_anion = species->origin != ORIGIN_USER &&
                  ground_state(species->z, species->charge - 1, &q.anion, &st);
    if (study->covalent) {
        struct reading r =
            dataset_reading(study->covalent, species->z, 0, 0, 0);
        q.has_covalent_radius = r.state == READING_OK;
        q.covalent_radius_pm = q.has_covalent_radius ? r.value.value : 0.0;
    }
    return q;
}

/* The question about a ground state; NULL as ground_state fails. Good until
 * the next one about the same element. */
static const struct question *ground_question(const struct study *study, int z,
                                              int charge, struct status *st)
{
    struct ground *g = &study->grounds[z];
    struct species species;
    if (g->known && g->question.species.charge == charge)
        return &g->question;
    if (!ground_state(z, charge, &species, st))
        return NULL;
    *g = (struct ground){true, question_of(study, &species)};
    struct question *q = &g->question;
    const struct subshell *emptied =
        q->has_cation ? configuration_emptied(&q->species.configuration,
                                              &q->cation.configuration)
                      : NULL;
    q->species.emptied =
        emptied ? 1 + (int)(emptied - q->species.configuration.shells) : -1;
    return q;
}

bool study_species(const struct study *study, const struct ask *ask,
                   struct species *species, struct status *st)
{
    const struct question *ground =
        ground_question(study, ask->z, ask->charge, st);
    if (!ground)
        return false;
    *species = ground->species;
    species->site = ask->site;
    if (!ask->configuration ||
        configuration_same(ask->configuration, &species->configuration))
        return true;
    double held = configuration_electrons(ask->configuration);
    if (fabs(held - (ask->z - ask->charge)) > 1e-9)
        return status_fail(st, STATUS_USAGE,
                           "%s, charge %d: the configuration holds %.10g "
                           "electrons; expected %d",
                           element_at(ask->z)->symbol, ask->charge, held,
                           ask->z - ask->charge);
    *species = (struct species){
        .z = ask->z,
        .charge = ask->charge,
        .site = ask->site,
        .configuration = *ask->configuration,
        .origin = ORIGIN_USER,
        .term = {"", -1, -1, -1},
    };
    return true;
}

/* The work space of a model, opened at its first use. */
static void *work_of(struct study *study, const struct model *model,
                     struct status *st)
{
    void **work = &study->works[model_index(model)];
    if (*work)
        return *work;
    *work = calloc(1, model->work_size);
    if (!*work) {
        status_fail(st, STATUS_MEMORY, "out of memory");
    } else if (model->open && !model->open(*work, st)) {
        free(*work);
        *work = NULL;
    }
    return *work;
}

/* A closed rule fits on the stack of its caller: no state is kept. */
static struct reading ask_closed(const struct study *study,
                                 const struct model *model,
                                 const struct species *species, int offer,
                                 int n, int l)
{
    union {
        max_align_t align;
        unsigned char bytes[4096];
    } work = {.bytes = {0}};
    assert(model->work_size <= sizeof work && !model->open);
    struct question own;
    struct status st = status_ok();
    const struct question *q = &own;
    if (species->origin != ORIGIN_USER)
        q = ground_question(study, species->z, species->charge, &st);
    else
        own = question_of(study, species);
    assert(q);
    model->begin(&work, q, &study->options);
    while (model->step(&work) != MODEL_DONE)
        ;
    return model->read(&work, offer, n, l);
}

static struct reading value_of(const struct study *study, const struct ask *ask,
                               const struct species *species, int offer)
{
    const struct model *model = ask->model;
    if (model->closed)
        return ask_closed(study, model, species, offer, ask->n, ask->l);
    const struct solution *s = solution_find(&study->solutions, model, species);
    if (s)
        return solution_read(s, offer, ask->n, ask->l);
    return reading_gap(ask->quantity, READING_PENDING, "not solved yet",
                       &model->offers[offer].provenance);
}

static const struct provenance *
derived_provenance(const struct study *study, const struct model *model,
                   const struct derivation *derivation)
{
    int d = 0;
    while (derivation_list[d] != derivation)
        d++;
    return &study->derived[model_index(model)][d];
}

/* What a model gives of an input: the same quantity for another charge state.
 */
static struct reading input_of(const struct study *study, const struct ask *ask,
                               struct derivation_input input)
{
    struct ask each = {.z = ask->z,
                       .charge = ask->charge + input.step,
                       .model = ask->model,
                       .quantity = input.quantity,
                       .configuration =
                           input.step == 0 ? ask->configuration : NULL};
    struct species species;
    struct status st = status_ok();
    int offer = model_offer_for(ask->model, input.quantity, NULL);
    if (offer < 0 || !study_species(study, &each, &species, &st))
        return reading_gap(input.quantity, READING_OUTSIDE,
                           study->missing[input.quantity], NULL);
    return value_of(study, &each, &species, offer);
}

struct reading study_derived(const struct study *study, const struct ask *ask,
                             const struct derivation *derivation)
{
    const struct provenance *p =
        derived_provenance(study, ask->model, derivation);
    struct derivation_input inputs[DERIVATION_INPUTS_MAX];
    struct reading readings[DERIVATION_INPUTS_MAX];
    const char *reason = "";
    int count = derivation->inputs(ask->charge, inputs, &reason);
    if (count == 0)
        return reading_gap(ask->quantity, READING_OUTSIDE, reason, p);
    for (int i = 0; i < count; i++) {
        readings[i] = input_of(study, ask, inputs[i]);
        if (readings[i].state != READING_OK)
            return reading_gap(ask->quantity, readings[i].state,
                               readings[i].reason, p);
    }
    return derivation_reading(derivation, readings, count, 0, p);
}

struct reading study_reading(const struct study *study, const struct ask *ask,
                             const struct species *species, int offer)
{
    return value_of(study, ask, species, offer);
}

static bool is_inner(const struct ask *ask, const struct species *species)
{
    const struct subshell *outer =
        configuration_outermost(&species->configuration);
    const struct subshell *emptied = reference_emptied(species);
    bool is_outer = outer && outer->n == ask->n && outer->l == ask->l;
    bool leaves = emptied && emptied->n == ask->n && emptied->l == ask->l;
    return ask->n != 0 && !is_outer && !leaves;
}

/* Subshell of a row: the one asked about, or the outermost. */
static void set_subshell(struct row *row, const struct ask *ask)
{
    const struct subshell *outer =
        configuration_outermost(&row->species.configuration);
    if (!quantity_at(ask->quantity)->per_subshell)
        return;
    row->n = ask->n ? ask->n : outer ? outer->n : 0;
    row->l = ask->n ? ask->l : outer ? outer->l : 0;
}

/* A scale may have a unit of its own: Mulliken's values are energies. */
static const struct unit *unit_of(const struct ask *ask,
                                  const struct definition *definition)
{
    enum dimension dimension = definition
                                   ? definition->dimension
                                   : quantity_at(ask->quantity)->dimension;
    if (ask->unit && ask->unit->dimension == dimension)
        return ask->unit;
    return unit_base(dimension);
}

/* A stored value of a kind that was not asked for is left out. */
static struct reading chosen_kind(const struct ask *ask, struct reading stored)
{
    if (stored.state != READING_OK ||
        evidence_chosen(ask->evidence, stored.evidence))
        return stored;
    struct reading gap =
        reading_gap(stored.quantity, READING_MISSING,
                    evidence_left_out(stored.evidence), stored.provenance);
    gap.evidence = stored.evidence;
    return gap;
}

/* Whether a set holds the model's own calculation. */
static bool is_repeated(const struct model *model,
                        const struct reference *reference)
{
    const char *const *ids = model->repeats;
    while (ids && *ids && strcmp(*ids, reference->provenance->id) != 0)
        ids++;
    return ids && *ids;
}

struct row study_row(const struct study *study, const struct ask *ask)
{
    struct row row = {.quantity = ask->quantity};
    struct status st = status_ok();
    if (!study_species(study, ask, &row.species, &st))
        assert(!"the caller has checked the ask with study_species");
    set_subshell(&row, ask);

    const struct reference *reference = ask->reference;
    const struct definition *definition =
        reference ? reference->provenance->definition : NULL;
    int offer = ask->model
                    ? model_offer_for(ask->model, ask->quantity, definition)
                    : -1;
    struct reading value = reading_gap(ask->quantity, READING_MISSING,
                                       quantity_at(ask->quantity)->modelled
                                           ? "no model was asked for"
                                           : "no model computes this "
                                             "quantity",
                                       NULL);
    if (offer >= 0) {
        value = value_of(study, ask, &row.species, offer);
        definition = ask->model->offers[offer].provenance.definition;
    }
    const struct derivation *derivation =
        offer < 0 && ask->model ? model_derivation(ask->model, ask->quantity)
                                : NULL;
    if (derivation) {
        value = study_derived(study, ask, derivation);
        definition = derivation->definition;
    }
    if (!reference)
        reference = reference_default(&study->references, ask->quantity,
                                      &row.species, ask->n, ask->l, definition,
                                      is_inner(ask, &row.species));
    struct reading stored =
        reference ? reference_read(reference, &row.species, ask->n, ask->l)
                  : reading_gap(ask->quantity, READING_MISSING,
                                "no reference set for this quantity", NULL);
    if (reference && !definition)
        definition = reference->provenance->definition;
    row.unit = unit_of(ask, definition);
    row_compare(&row, value, chosen_kind(ask, stored));
    row.repeats = reference && offer >= 0 && is_repeated(ask->model, reference);
    assert(!ask->against || ask->against->quantity == ask->quantity);
    if (ask->against)
        row_disagree(&row,
                     chosen_kind(ask, reference_read(ask->against, &row.species,
                                                     ask->n, ask->l)));
    return row;
}

static bool iterates(const struct ask *ask)
{
    return ask->model && !ask->model->closed &&
           model_gives(ask->model, ask->quantity);
}

bool study_row_now(struct study *study, const struct ask *ask, struct row *row,
                   struct status *st)
{
    if (iterates(ask)) {
        if (!study_want(study, ask, true, st))
            return false;
        while (study_step(study, st))
            ;
        if (st->code != STATUS_OK)
            return false;
    }
    *row = study_row(study, ask);
    return true;
}

static int find_task(const struct study *study, const struct model *model,
                     const struct species *species)
{
    for (int i = 0; i < study->queued; i++) {
        const struct task *t = &study->queue[i];
        if (t->model == model && t->question.species.z == species->z &&
            t->question.species.charge == species->charge &&
            configuration_same(&t->question.species.configuration,
                               &species->configuration))
            return i;
    }
    return -1;
}

/* A derived quantity needs other charge states as well. */
static bool want_inputs(struct study *study, const struct ask *ask, bool first,
                        struct status *st)
{
    const struct derivation *d = model_derivation(ask->model, ask->quantity);
    struct derivation_input inputs[DERIVATION_INPUTS_MAX];
    const char *reason = "";
    int count = d ? d->inputs(ask->charge, inputs, &reason) : 0;
    for (int i = 0; i < count; i++) {
        struct ask each = {.z = ask->z,
                           .charge = ask->charge + inputs[i].step,
                           .model = ask->model,
                           .quantity = inputs[i].quantity};
        if (inputs[i].step != 0 && !study_want(study, &each, first, st))
            return false;
    }
    return true;
}

bool study_want(struct study *study, const struct ask *ask, bool first,
                struct status *st)
{
    struct species species;
    if (!iterates(ask))
        return true;
    if (!want_inputs(study, ask, first, st))
        return false;
    if (!study_species(study, ask, &species, st))
        return false;
    if (solution_find(&study->solutions, ask->model, &species))
        return true;
    if (!study->queue)
        study->queue = calloc(QUEUE_MAX, sizeof *study->queue);
    if (!study->queue)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    if (!work_of(study, ask->model, st))
        return false;
    int at = find_task(study, ask->model, &species);
    if (at >= 0 && (!first || at == study->queued - 1))
        return true;
    struct task task = {ask->model, question_of(study, &species)};
    /* The task that runs stays last; "first" means right after it. */
    int head = study->queued - (study->running ? 1 : 0);
    if (at >= 0) {
        for (int i = at; i + 1 < head; i++)
            study->queue[i] = study->queue[i + 1];
        study->queue[head - 1] = task;
        return true;
    }
    if (study->queued == QUEUE_MAX)
        return true; /* asked for again when it is drawn again */
    int place = first ? head : 0;
    memmove(&study->queue[place + 1], &study->queue[place],
            (size_t)(study->queued - place) * sizeof task);
    study->queue[place] = task;
    study->queued++;
    study->total++;
    return true;
}

bool study_want_all(struct study *study, const struct ask *ask, bool first,
                    struct status *st)
{
    struct ask each = *ask;
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        each.quantity = (enum quantity_id)q;
        if (model_gives(each.model, each.quantity) &&
            !study_want(study, &each, first, st))
            return false;
    }
    return true;
}

bool study_step(struct study *study, struct status *st)
{
    if (study->queued == 0)
        return false;
    struct task *task = &study->queue[study->queued - 1];
    void *work = study->works[model_index(task->model)];
    if (!study->running) {
        task->model->begin(work, &task->question, &study->options);
        study->running = true;
    }
    enum model_progress progress = task->model->step(work);
    if (progress == MODEL_NO_MEMORY) {
        study_stop(study);
        return status_fail(st, STATUS_MEMORY, "%s: out of memory",
                           task->model->id);
    }
    if (progress == MODEL_DONE) {
        study->running = false;
        study->queued--;
        study->done++;
        if (!solution_keep(&study->solutions, task->model, work,
                           &task->question.species, st)) {
            study_stop(study);
            return false;
        }
    }
    if (study->queued > 0)
        return true;
    study->done = 0;
    study->total = 0;
    return false;
}

void study_stop(struct study *study)
{
    study->queued = 0;
    study->running = false;
    study->done = 0;
    study->total = 0;
}

struct study_progress study_progress(const struct study *study)
{
    return (struct study_progress){study->done, study->total};
}
