/* SPDX-License-Identifier: MIT */
/* Options that say what is asked: quantities, models, sets, units. */
#include <assert.h>
#include <string.h>

#include "cli/command.h"
#include "cli/read.h"

static void quantity_words(struct words *words,
                           const struct reference_list *references)
{
    (void)references;
    for (int q = 0; q < QUANTITY_COUNT; q++)
        words_add(words, quantity_at((enum quantity_id)q)->id,
                  quantity_at((enum quantity_id)q)->title);
}

/* Two sets are set against each other and no quantity is named: theirs. */
static bool quantities_of_sets(struct request *r)
{
    const char *list = call_value(r->call, &option_against);
    char word[WORD_TEXT_MAX];
    while (list && words_next(&list, word)) {
        const struct reference *found =
            reference_find(study_references(r->study), word);
        bool chosen = found && request_chooses(r, found->quantity);
        if (found && !chosen && r->quantity_count < QUANTITY_COUNT)
            r->quantities[r->quantity_count++] = found->quantity;
    }
    return r->quantity_count > 0;
}

/* Those that are taken where none is named. */
static void take_usual_quantities(struct request *r)
{
    static const enum quantity_id usual[] = {QUANTITY_ZEFF, QUANTITY_RADIUS,
                                             QUANTITY_IONIZATION};
    if (quantities_of_sets(r))
        return;
    if (!r->call->command->manner.all_quantities) {
        memcpy(r->quantities, usual, sizeof usual);
        r->quantity_count = sizeof usual / sizeof usual[0];
        return;
    }
    for (int q = 0; q < QUANTITY_COUNT; q++)
        r->quantities[r->quantity_count++] = (enum quantity_id)q;
}

static bool read_quantities(struct request *r, const struct option *self,
                            const char *value, struct status *st)
{
    char word[WORD_TEXT_MAX];
    r->has_quantities = value != NULL;
    if (!value)
        take_usual_quantities(r);
    while (value) {
        if (!read_next(self, &value, word, st))
            return false;
        int q = read_place(r, self, word, st);
        if (q < 0)
            return false;
        if (request_chooses(r, (enum quantity_id)q))
            return read_twice(self, word, st);
        r->quantities[r->quantity_count++] = (enum quantity_id)q;
    }
    return true;
}

const struct option option_quantity = {
    .name = "quantity",
    .letter = 'q',
    .argument = "IDS",
    .kind = OPTION_VALUE,
    .stage = OPTION_FIRST,
    .words = quantity_words,
    .list = true,
    .always = true,
    .title = "Quantities",
    .help = "quantities to show, separated by commas (list and audit: "
            "zeff,radius,ionization; compare: all)",
    .read = read_quantities,
};

static void model_words(struct words *words,
                        const struct reference_list *references)
{
    (void)references;
    for (int m = 0; m < model_count(); m++)
        words_add(words, model_at(m)->id, model_at(m)->title);
    words_add(words, WORD_NO_MODEL, "");
}

static bool offered(const struct request *r, enum quantity_id quantity)
{
    for (int i = 0; i < r->model_count; i++)
        if (model_gives(r->models[i], quantity))
            return true;
    return false;
}

/* Models were named: each must give one of the quantities, and each quantity
 * must be given by one of them. */
static bool check_models(const struct request *r, struct status *st)
{
    char text[WORD_LIST_TEXT_MAX];
    const char *names[REQUEST_MODEL_MAX];
    for (int m = 0; m < r->model_count; m++) {
        int count = 0;
        if (request_offers(r, r->models[m]))
            continue;
        struct text t = text_over(text, sizeof text);
        for (int q = 0; q < QUANTITY_COUNT; q++)
            if (model_gives(r->models[m], (enum quantity_id)q))
                names[count++] = quantity_at((enum quantity_id)q)->id;
        words_join(&t, names, count, "and");
        return status_fail(st, STATUS_USAGE,
                           "--model %s: gives none of the quantities asked "
                           "for; it gives %s",
                           r->models[m]->id, text);
    }
    /* compare shows references all the same, and so does list for what no
     * model gives. */
    bool needed = r->call->command->manner.needs_models;
    for (int i = 0; needed && i < r->quantity_count; i++) {
        enum quantity_id q = r->quantities[i];
        int count = 0;
        for (int m = 0; m < model_count(); m++)
            if (model_gives(model_at(m), q))
                names[count++] = model_at(m)->id;
        if (offered(r, q) || count == 0 || !r->has_quantities)
            continue;
        struct text t = text_over(text, sizeof text);
        words_join(&t, names, count, "and");
        return status_fail(st, STATUS_USAGE,
                           "--quantity %s: given by none of the models named; "
                           "models that give it: %s",
                           quantity_at(q)->id, text);
    }
    return true;
}

/* All of them where none is named; set against set needs none. */
static void take_all_models(struct request *r)
{
    bool sets_alone = call_value(r->call, &option_against) &&
                      !r->has_quantities &&
                      !r->call->command->manner.sets_beside;
    for (int m = 0; !sets_alone && m < model_count(); m++)
        r->models[r->model_count++] = model_at(m);
}

static bool read_models(struct request *r, const struct option *self,
                        const char *value, struct status *st)
{
    char word[WORD_TEXT_MAX];
    r->has_models = value != NULL;
    assert(model_count() <= REQUEST_MODEL_MAX);
    if (!value)
        take_all_models(r);
    if (!value || strcmp(value, WORD_NO_MODEL) == 0)
        return true;
    while (value) {
        if (!read_next(self, &value, word, st))
            return false;
        int m = read_place(r, self, word, st);
        if (m < 0)
            return false;
        if (m >= model_count())
            return status_fail(st, STATUS_USAGE,
                               "--model %s: stands alone; expected it without "
                               "a model beside it",
                               WORD_NO_MODEL);
        for (int i = 0; i < r->model_count; i++)
            if (r->models[i] == model_at(m))
                return read_twice(self, word, st);
        r->models[r->model_count++] = model_at(m);
    }
    return check_models(r, st);
}

const struct option option_model = {
    .name = "model",
    .letter = 'm',
    .argument = "IDS",
    .kind = OPTION_VALUE,
    .stage = OPTION_FIRST,
    .words = model_words,
    .list = true,
    .always = true,
    .title = "Models",
    .help = "models to ask, separated by commas; none: stored values alone "
            "(default: "
            "all)",
    .read = read_models,
};

static void reference_words(struct words *words,
                            const struct reference_list *references)
{
    for (int i = 0; references && i < references->count; i++)
        words_add(words, references->items[i].provenance->id,
                  references->items[i].provenance->title);
}

/* Puts a set into the slot of its quantity. Only list and what is "against" it
 * are bound to one set per quantity. */
static bool take_set(struct request *r, const struct option *self,
                     const struct reference *found,
                     const struct reference **slots, struct status *st)
{
    char text[WORD_LIST_TEXT_MAX];
    struct text t = text_over(text, sizeof text);
    const char *name = self->name;
    bool reference = self == &option_reference;
    const char *word = found->provenance->id;
    const struct reference **slot = &slots[found->quantity];
    bool single = !reference || r->call->command->manner.one_set;
    request_quantities(r, &t);
    if (!request_chooses(r, found->quantity))
        return status_fail(st, STATUS_USAGE,
                           "--%s %s: holds %s, but the quantities asked for "
                           "are %s",
                           name, word, quantity_at(found->quantity)->id, text);
    if (*slot == found)
        return read_twice(self, word, st);
    if (*slot && single)
        return status_fail(st, STATUS_USAGE,
                           "--%s %s: contradicts %s; expected one set for %s",
                           name, word, (*slot)->provenance->id,
                           quantity_at(found->quantity)->id);
    for (int i = 0; reference && i < r->set_count; i++)
        if (r->sets[i] == found)
            return read_twice(self, word, st);
    if (reference)
        r->sets[r->set_count++] = found;
    if (!*slot)
        *slot = found;
    return true;
}

static bool read_sets(struct request *r, const struct option *self,
                      const char *value, const struct reference **slots,
                      struct status *st)
{
    char word[WORD_TEXT_MAX];
    while (value) {
        if (!read_next(self, &value, word, st) ||
            read_place(r, self, word, st) < 0)
            return false;
        const struct reference *found =
            reference_find(study_references(r->study), word);
        if (!take_set(r, self, found, slots, st))
            return false;
    }
    return true;
}

static bool read_references(struct request *r, const struct option *self,
                            const char *value, struct status *st)
{
    return read_sets(r, self, value, r->references, st);
}

const struct option option_reference = {
    .name = "reference",
    .letter = 'r',
    .argument = "SETS",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = reference_words,
    .list = true,
    .help =
        "stored data sets to compare with, in list at most one per quantity "
        "(default: for an ion's radius the effective ionic one, else the first "
        "with the model's own definition; compare: all)",
    .read = read_references,
};

/* A second set against itself says nothing. */
static bool check_against(const struct request *r, struct status *st)
{
    for (int q = 0; q < QUANTITY_COUNT; q++)
        if (r->against[q] && r->against[q] == r->references[q])
            return status_fail(st, STATUS_USAGE,
                               "--against %s: is the reference itself; "
                               "expected another set",
                               r->against[q]->provenance->id);
    return true;
}

static bool read_against(struct request *r, const struct option *self,
                         const char *value, struct status *st)
{
    r->has_against = true;
    return read_sets(r, self, value, r->against, st) && check_against(r, st);
}

const struct option option_against = {
    .name = "against",
    .argument = "SETS",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = reference_words,
    .list = true,
    .help =
        "a second data set beside the reference, with how far it is from it; "
        "without --model and --quantity the two sets alone",
    .read = read_against,
};

static void evidence_words(struct words *words,
                           const struct reference_list *references)
{
    (void)references;
    for (int e = 0; e < EVIDENCE_COUNT; e++)
        words_add(words, evidence_id((enum evidence)e),
                  evidence_word((enum evidence)e));
}

static bool read_evidence(struct request *r, const struct option *self,
                          const char *value, struct status *st)
{
    return read_bits(r, self, value, &r->evidence, st);
}

const struct option option_evidence = {
    .name = "evidence",
    .letter = 'e',
    .argument = "KINDS",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = evidence_words,
    .list = true,
    .help = "kinds of reference values to take, separated by commas, such as "
            "measured "
            "(default: all)",
    .read = read_evidence,
};

/* Units that a quantity can be converted to: of a dimension that has a
 * choice. */
static void unit_words(struct words *words,
                       const struct reference_list *references)
{
    (void)references;
    for (size_t i = 0; i < unit_count(); i++) {
        enum dimension d = unit_at(i)->dimension;
        if (d == DIMENSION_LENGTH || d == DIMENSION_ENERGY)
            words_add(words, unit_at(i)->id, unit_at(i)->title);
    }
}

static bool fits_any(const struct request *r, enum dimension dimension)
{
    for (int i = 0; i < r->quantity_count; i++)
        if (quantity_at(r->quantities[i])->dimension == dimension)
            return true;
    return false;
}

static bool read_units(struct request *r, const struct option *self,
                       const char *value, struct status *st)
{
    char word[WORD_TEXT_MAX];
    char text[WORD_LIST_TEXT_MAX];
    while (value) {
        if (!read_next(self, &value, word, st) ||
            read_place(r, self, word, st) < 0)
            return false;
        const struct unit *unit = unit_find(word);
        struct text t = text_over(text, sizeof text);
        request_quantities(r, &t);
        if (!fits_any(r, unit->dimension))
            return status_fail(
                st, STATUS_USAGE,
                "--unit %s: a unit of %s fits none of the "
                "quantities asked for, %s",
                word, unit->dimension == DIMENSION_LENGTH ? "length" : "energy",
                text);
        const struct unit **slot = &r->units[unit->dimension];
        if (*slot == unit)
            return read_twice(self, word, st);
        if (*slot)
            return status_fail(st, STATUS_USAGE,
                               "--unit %s: contradicts %s; expected one unit "
                               "of each kind",
                               word, (*slot)->id);
        *slot = unit;
    }
    return true;
}

const struct option option_unit = {
    .name = "unit",
    .letter = 'u',
    .argument = "UNITS",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = unit_words,
    .list = true,
    .title = "Units",
    .help =
        "units to print in, at most one per kind of quantity (default: pm, eV; "
        "atom: pm, hartree)",
    .read = read_units,
};
