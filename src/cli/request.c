/* SPDX-License-Identifier: MIT */
#include "cli/request.h"

#include <assert.h>
#include <string.h>

#include "cli/choose.h"
#include "cli/words.h"
#include "element/subshell.h"

/* Wider than anything of use; the atom itself asks for more than its Z. */
#define SPEED_OF_LIGHT_MIN 1.0
#define SPEED_OF_LIGHT_MAX 1e6

static const char *given(const struct request *r, enum option_id id)
{
    return r->call->value[id];
}

/* Place of a word among those of the option's kind, -1 with st filled when it
 * is none of them. */
static int place_of(const struct request *r, enum option_id id,
                    const char *word, struct status *st)
{
    const struct option *option = option_at((int)id);
    struct words words;
    const struct reference_list *references =
        r->study ? study_references(r->study) : NULL;
    words_fill(&words, option->words, references);
    for (int i = 0; i < words.count; i++)
        if (strcmp(words.items[i], word) == 0)
            return i;
    word_refuse(option, word, &words, st);
    return -1;
}

static bool too_long(enum option_id id, const char *list, struct status *st)
{
    return status_fail(st, STATUS_USAGE, "--%s %.20s...: no such word",
                       option_at((int)id)->name, list);
}

static bool twice(enum option_id id, const char *word, struct status *st)
{
    return status_fail(st, STATUS_USAGE, "--%s %s: named twice",
                       option_at((int)id)->name, word);
}

static bool is_chosen(const struct request *r, enum quantity_id quantity)
{
    for (int i = 0; i < r->quantity_count; i++)
        if (r->quantities[i] == quantity)
            return true;
    return false;
}

/* Two sets are set against each other and no quantity is named: theirs. */
static bool quantities_of_sets(struct request *r)
{
    const char *list = given(r, OPTION_AGAINST);
    char word[WORD_TEXT_MAX];
    while (list && words_next(&list, word)) {
        const struct reference *found =
            reference_find(study_references(r->study), word);
        bool chosen = found && is_chosen(r, found->quantity);
        if (found && !chosen && r->quantity_count < QUANTITY_COUNT)
            r->quantities[r->quantity_count++] = found->quantity;
    }
    return r->quantity_count > 0;
}

static bool read_quantities(struct request *r, struct status *st)
{
    static const enum quantity_id usual[] = {QUANTITY_ZEFF, QUANTITY_RADIUS,
                                             QUANTITY_IONIZATION};
    const char *list = given(r, OPTION_QUANTITY);
    char word[WORD_TEXT_MAX];
    r->has_quantities = list != NULL;
    bool usual_ones = r->call->command->id == COMMAND_LIST ||
                      r->call->command->id == COMMAND_AUDIT;
    if (!list && quantities_of_sets(r))
        return true;
    if (!list && usual_ones) {
        memcpy(r->quantities, usual, sizeof usual);
        r->quantity_count = sizeof usual / sizeof usual[0];
    } else if (!list) {
        for (int q = 0; q < QUANTITY_COUNT; q++)
            r->quantities[r->quantity_count++] = (enum quantity_id)q;
    }
    while (list) {
        if (!words_next(&list, word))
            return too_long(OPTION_QUANTITY, list, st);
        int q = place_of(r, OPTION_QUANTITY, word, st);
        if (q < 0)
            return false;
        for (int i = 0; i < r->quantity_count; i++)
            if (r->quantities[i] == (enum quantity_id)q)
                return twice(OPTION_QUANTITY, word, st);
        r->quantities[r->quantity_count++] = (enum quantity_id)q;
    }
    return true;
}

static bool offers_any(const struct request *r, const struct model *model)
{
    for (int i = 0; i < r->quantity_count; i++)
        if (model_offer_for(model, r->quantities[i], NULL) >= 0)
            return true;
    return false;
}

static bool offered(const struct request *r, enum quantity_id quantity)
{
    for (int i = 0; i < r->model_count; i++)
        if (model_offer_for(r->models[i], quantity, NULL) >= 0)
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
        if (offers_any(r, r->models[m]))
            continue;
        struct text t = text_over(text, sizeof text);
        for (int q = 0; q < QUANTITY_COUNT; q++)
            if (model_offer_for(r->models[m], (enum quantity_id)q, NULL) >= 0)
                names[count++] = quantity_at((enum quantity_id)q)->id;
        words_join(&t, names, count, "and");
        return status_fail(st, STATUS_USAGE,
                           "--model %s: gives none of the quantities asked "
                           "for; it gives %s",
                           r->models[m]->id, text);
    }
    /* compare shows references all the same, and so does list for what no
     * model gives. */
    bool needs_models = r->call->command->id == COMMAND_LIST;
    for (int i = 0; needs_models && i < r->quantity_count; i++) {
        enum quantity_id q = r->quantities[i];
        int count = 0;
        for (int m = 0; m < model_count(); m++)
            if (model_offer_for(model_at(m), q, NULL) >= 0)
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

static bool read_models(struct request *r, struct status *st)
{
    const char *list = given(r, OPTION_MODEL);
    char word[WORD_TEXT_MAX];
    r->has_models = list != NULL;
    assert(model_count() <= REQUEST_MODEL_MAX);
    /* Set against set needs no model. */
    bool sets_alone = given(r, OPTION_AGAINST) && !r->has_quantities &&
                      r->call->command->id != COMMAND_COMPARE;
    for (int m = 0; !list && !sets_alone && m < model_count(); m++)
        r->models[r->model_count++] = model_at(m);
    if (list && strcmp(list, WORD_NO_MODEL) == 0)
        return true;
    while (list) {
        if (!words_next(&list, word))
            return too_long(OPTION_MODEL, list, st);
        int m = place_of(r, OPTION_MODEL, word, st);
        if (m < 0)
            return false;
        if (m >= model_count())
            return status_fail(st, STATUS_USAGE,
                               "--model %s: stands alone; expected it without "
                               "a model beside it",
                               WORD_NO_MODEL);
        for (int i = 0; i < r->model_count; i++)
            if (r->models[i] == model_at(m))
                return twice(OPTION_MODEL, word, st);
        r->models[r->model_count++] = model_at(m);
    }
    return !r->has_models || check_models(r, st);
}

/* Writes the ids of the chosen quantities. */
static void quantity_names(const struct request *r, struct text *t)
{
    const char *names[QUANTITY_COUNT];
    for (int i = 0; i < r->quantity_count; i++)
        names[i] = quantity_at(r->quantities[i])->id;
    words_join(t, names, r->quantity_count, "and");
}

/* Puts a set into the slot of its quantity. Only list and what is "against" it
 * are bound to one set per quantity. */
static bool take_set(struct request *r, enum option_id id,
                     const struct reference *found,
                     const struct reference **slots, struct status *st)
{
    char text[WORD_LIST_TEXT_MAX];
    struct text t = text_over(text, sizeof text);
    const char *name = option_at((int)id)->name;
    const char *word = found->provenance->id;
    const struct reference **slot = &slots[found->quantity];
    bool single = id == OPTION_AGAINST || r->call->command->id == COMMAND_LIST;
    quantity_names(r, &t);
    if (!is_chosen(r, found->quantity))
        return status_fail(st, STATUS_USAGE,
                           "--%s %s: holds %s, but the quantities asked for "
                           "are %s",
                           name, word, quantity_at(found->quantity)->id, text);
    if (*slot == found)
        return twice(id, word, st);
    if (*slot && single)
        return status_fail(st, STATUS_USAGE,
                           "--%s %s: contradicts %s; expected one set for %s",
                           name, word, (*slot)->provenance->id,
                           quantity_at(found->quantity)->id);
    for (int i = 0; id == OPTION_REFERENCE && i < r->set_count; i++)
        if (r->sets[i] == found)
            return twice(id, word, st);
    if (id == OPTION_REFERENCE)
        r->sets[r->set_count++] = found;
    if (!*slot)
        *slot = found;
    return true;
}

static bool read_sets(struct request *r, enum option_id id,
                      const struct reference **slots, struct status *st)
{
    const char *list = given(r, id);
    char word[WORD_TEXT_MAX];
    while (list) {
        if (!words_next(&list, word))
            return too_long(id, list, st);
        if (place_of(r, id, word, st) < 0)
            return false;
        const struct reference *found =
            reference_find(study_references(r->study), word);
        if (!take_set(r, id, found, slots, st))
            return false;
    }
    return true;
}

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

static bool read_references(struct request *r, struct status *st)
{
    r->has_against = given(r, OPTION_AGAINST) != NULL;
    return read_sets(r, OPTION_REFERENCE, r->references, st) &&
           read_sets(r, OPTION_AGAINST, r->against, st) && check_against(r, st);
}

/* Words of a list option as bits by their place. */
static bool read_bits(struct request *r, enum option_id id, unsigned *bits,
                      struct status *st)
{
    const char *list = given(r, id);
    char word[WORD_TEXT_MAX];
    *bits = 0;
    while (list) {
        if (!words_next(&list, word))
            return too_long(id, list, st);
        int place = place_of(r, id, word, st);
        if (place < 0)
            return false;
        if (*bits >> place & 1u)
            return twice(id, word, st);
        *bits |= 1u << place;
    }
    return true;
}

static bool fits_any(const struct request *r, enum dimension dimension)
{
    for (int i = 0; i < r->quantity_count; i++)
        if (quantity_at(r->quantities[i])->dimension == dimension)
            return true;
    return false;
}

static bool read_units(struct request *r, struct status *st)
{
    const char *list = given(r, OPTION_UNIT);
    char word[WORD_TEXT_MAX];
    char text[WORD_LIST_TEXT_MAX];
    while (list) {
        if (!words_next(&list, word))
            return too_long(OPTION_UNIT, list, st);
        if (place_of(r, OPTION_UNIT, word, st) < 0)
            return false;
        const struct unit *unit = unit_find(word);
        struct text t = text_over(text, sizeof text);
        quantity_names(r, &t);
        if (!fits_any(r, unit->dimension))
            return status_fail(
                st, STATUS_USAGE,
                "--unit %s: a unit of %s fits none of the "
                "quantities asked for, %s",
                word, unit->dimension == DIMENSION_LENGTH ? "length" : "energy",
                text);
        const struct unit **slot = &r->units[unit->dimension];
        if (*slot == unit)
            return twice(OPTION_UNIT, word, st);
        if (*slot)
            return status_fail(st, STATUS_USAGE,
                               "--unit %s: contradicts %s; expected one unit "
                               "of each kind",
                               word, (*slot)->id);
        *slot = unit;
    }
    return true;
}

static bool read_subshell(struct request *r, struct status *st)
{
    const char *text = given(r, OPTION_SUBSHELL);
    char names[WORD_LIST_TEXT_MAX];
    if (!text)
        return true;
    if (!subshell_parse(text, &r->n, &r->l))
        return status_fail(st, STATUS_USAGE,
                           "--subshell %s: not a subshell; expected one from "
                           "1s to 8f, such as 3d",
                           text);
    for (int i = 0; i < r->quantity_count; i++)
        if (quantity_at(r->quantities[i])->per_subshell)
            return true;
    struct text t = text_over(names, sizeof names);
    quantity_names(r, &t);
    return status_fail(st, STATUS_USAGE,
                       "--subshell %s: %s has no subshells; expected zeff or "
                       "radius among the quantities",
                       text, names);
}

static bool read_configuration(struct request *r, struct status *st)
{
    const char *text = given(r, OPTION_CONFIGURATION);
    if (!text)
        return true;
    r->has_configuration = true;
    if (!configuration_parse(text, &r->configuration, st))
        return false;
    if (r->call->operand_count == 0)
        return status_fail(st, STATUS_USAGE,
                           "--configuration %s: expected the element or ion "
                           "that it belongs to",
                           text);
    return true;
}

/* An option that is one word out of a few: *choice becomes its place, or stays
 * what it is when the option was not given. */
static bool read_choice(const struct request *r, enum option_id id, int *choice,
                        struct status *st)
{
    const char *word = given(r, id);
    if (!word)
        return true;
    *choice = place_of(r, id, word, st);
    return *choice >= 0;
}

static bool read_output(struct request *r, struct status *st)
{
    int format = 0;
    int color = COLOR_AUTO;
    int scheme = SCHEME_TERMINAL;
    if (!read_choice(r, OPTION_FORMAT, &format, st) ||
        !read_choice(r, OPTION_COLOR, &color, st) ||
        !read_choice(r, OPTION_BACKGROUND, &scheme, st))
        return false;
    r->scheme = (enum scheme)scheme;
    r->format = format_list[format];
    r->color = (enum color_option)color;
    r->ascii = given(r, OPTION_ASCII) != NULL;
    if (r->ascii && !r->format->for_people)
        return status_fail(st, STATUS_USAGE,
                           "--ascii: %s is always UTF-8; expected it with "
                           "--format text or bibtex",
                           given(r, OPTION_FORMAT));
    r->force = given(r, OPTION_FORCE) != NULL;
    r->output = given(r, OPTION_OUTPUT);
    if (r->output && strcmp(r->output, "-") == 0)
        r->output = NULL;
    if (r->force && !r->output)
        return status_fail(st, STATUS_USAGE,
                           "--force: nothing to replace without --output FILE");
    return true;
}

static bool read_order(struct request *r, struct status *st)
{
    int order = 0;
    r->has_order = given(r, OPTION_SORT) != NULL;
    if (!read_choice(r, OPTION_SORT, &order, st))
        return false;
    r->order = (enum row_order)order;
    return true;
}

static bool read_data(struct request *r, struct status *st)
{
    for (int i = 0; i < r->call->repeat_count; i++)
        if (!catalogue_add_file(&r->catalogue, r->call->repeats[i].value, st))
            return status_context(st, "--data");
    r->study = study_new(&r->catalogue, st);
    return r->study;
}

static bool has_ion(const struct request *r)
{
    for (int i = 0; i < r->atom_count; i++)
        if (r->atoms[i].charge != 0)
            return true;
    return false;
}

/* True when one of the sets that will be read tells sites apart. */
static bool has_sites(const struct request *r)
{
    /* An ion's radius stands against such a set where none is named. */
    if (is_chosen(r, QUANTITY_RADIUS) && !r->references[QUANTITY_RADIUS] &&
        has_ion(r))
        return true;
    for (int i = 0; i < r->set_count; i++)
        if (reference_has_sites(r->sets[i]))
            return true;
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        const struct reference *sets[] = {r->references[q], r->against[q]};
        for (int i = 0; i < 2; i++)
            if (sets[i] && reference_has_sites(sets[i]))
                return true;
    }
    /* compare takes every set where none is named. */
    return r->call->command->id == COMMAND_COMPARE && r->set_count == 0;
}

/* Roman in any case, or a number: more than the words that are offered. */
static bool read_coordination(struct request *r, struct status *st)
{
    const char *word = given(r, OPTION_COORDINATION);
    int place;
    return !word || coordination_find(word, &r->site.coordination) ||
           read_choice(r, OPTION_COORDINATION, &place, st);
}

/* Coordination and spin of the site. */
static bool read_site(struct request *r, struct status *st)
{
    int spin = -1;
    if (!read_coordination(r, st) || !read_choice(r, OPTION_SPIN, &spin, st))
        return false;
    /* The words leave out the first enumerator, which stands for none. */
    r->site.spin = (enum spin_state)(SPIN_NONE + 1 + spin);
    return true;
}

/* A site is no idle word: some set that is read must know it. */
static bool check_site(const struct request *r, struct status *st)
{
    bool coordination = r->site.coordination != COORDINATION_NONE;
    if ((!coordination && r->site.spin == SPIN_NONE) || has_sites(r))
        return true;
    return status_fail(
        st, STATUS_USAGE,
        "--%s %s: none of the sets taken tells sites apart; "
        "expected --reference ionic_effective_shannon_1976 or "
        "another set of ionic radii",
        coordination ? "coordination" : "spin",
        given(r, coordination ? OPTION_COORDINATION : OPTION_SPIN));
}

/* The term to solve for: one of the chosen models must know the choice. */
static bool read_term(struct request *r, struct status *st)
{
    int average = 0;
    bool taken = false;
    if (!read_choice(r, OPTION_TERM, &average, st))
        return false;
    for (int i = 0; i < r->model_count; i++)
        taken =
            taken || (r->models[i]->takes_term && offers_any(r, r->models[i]));
    if (given(r, OPTION_TERM) && !taken)
        return status_fail(st, STATUS_USAGE,
                           "--term %s: none of the models asked takes it; "
                           "expected single-zeta among them",
                           given(r, OPTION_TERM));
    struct model_options options = {.average_term = average != 0};
    study_set_options(r->study, &options);
    return true;
}

/* How `atom` solves. */
static bool read_method(struct request *r, struct status *st)
{
    int functional = (int)atom_method_default.functional;
    int relativity = (int)atom_method_default.relativity;
    const char *c = given(r, OPTION_SPEED_OF_LIGHT);
    if (!read_choice(r, OPTION_FUNCTIONAL, &functional, st) ||
        !read_choice(r, OPTION_RELATIVITY, &relativity, st))
        return false;
    r->method.functional = (enum functional)functional;
    r->method.relativity = (enum relativity)relativity;
    double *speed = &r->method.speed_of_light;
    if (c && (!text_to_double(c, speed) || *speed < SPEED_OF_LIGHT_MIN ||
              *speed > SPEED_OF_LIGHT_MAX))
        return status_fail(st, STATUS_USAGE,
                           "--speed-of-light %s: expected a number of atomic "
                           "units from %g to %g, such as 137.035999177",
                           c, SPEED_OF_LIGHT_MIN, SPEED_OF_LIGHT_MAX);
    return true;
}

bool request_open(struct request *r, const struct call *call, struct status *st)
{
    *r = (struct request){.call = call};
    bool chooses = call->command->id == COMMAND_LIST ||
                   call->command->id == COMMAND_COMPARE ||
                   call->command->id == COMMAND_ATOM ||
                   call->command->id == COMMAND_AUDIT;
    return read_output(r, st) && read_data(r, st) && read_quantities(r, st) &&
           read_models(r, st) && read_units(r, st) && read_subshell(r, st) &&
           read_configuration(r, st) && read_references(r, st) &&
           read_site(r, st) &&
           read_bits(r, OPTION_EVIDENCE, &r->evidence, st) &&
           read_bits(r, OPTION_SCOPE, &r->scopes, st) && read_order(r, st) &&
           read_term(r, st) && read_method(r, st) &&
           (!chooses || (choose_atoms(r, st) && check_site(r, st)));
}

void request_close(struct request *r)
{
    study_free(r->study);
    catalogue_clear(&r->catalogue);
}

struct ask request_ask(const struct request *r, int atom,
                       enum quantity_id quantity, const struct model *model)
{
    const struct quantity *q = quantity_at(quantity);
    struct ask ask = {.z = r->atoms[atom].z,
                      .charge = r->atoms[atom].charge,
                      .quantity = quantity,
                      .model = model,
                      .reference = r->references[quantity],
                      .against = r->against[quantity],
                      .evidence = r->evidence,
                      .site = r->site,
                      .unit = r->units[q->dimension]};
    if (r->has_configuration)
        ask.configuration = &r->configuration;
    if (q->per_subshell) {
        ask.n = r->n;
        ask.l = r->l;
    }
    return ask;
}
