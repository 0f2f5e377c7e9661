/* SPDX-License-Identifier: MIT */
/* Options that say which species, which part of it, and at which site. */
#include <stdlib.h>
#include <string.h>

#include "cli/command.h"
#include "cli/read.h"
#include "element/subshell.h"

/* "2", "-1", "0..5", "all". */
static bool read_charges(struct request *r, const struct option *self,
                         const char *text, struct status *st)
{
    char first[16];
    struct request_charges *charges = &r->charges;
    (void)self;
    *charges = (struct request_charges){text, 0, 0};
    if (strcmp(text, "all") == 0) {
        charges->high = Z_MAX;
        return true;
    }
    const char *dots = strstr(text, "..");
    size_t length = dots ? (size_t)(dots - text) : strlen(text);
    bool ok = length < sizeof first;
    if (ok) {
        memcpy(first, text, length);
        first[length] = '\0';
        ok = text_to_int(first, &charges->low);
        charges->high = charges->low;
        if (ok && dots)
            ok = text_to_int(dots + 2, &charges->high);
    }
    if (ok && abs(charges->low) <= Z_MAX && abs(charges->high) <= Z_MAX &&
        charges->low <= charges->high)
        return true;
    return status_fail(st, STATUS_USAGE,
                       "--charge %s: expected a whole number from %d to %d, a "
                       "range such as 0..5, or all",
                       text, -Z_MAX, Z_MAX);
}

const struct option option_charge = {
    .name = "charge",
    .letter = 'c',
    .argument = "N",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .help =
        "charge of every chosen element that carries none itself, such as 2 or "
        "-1; a range such as 0..5; all: from the atom to its last electron "
        "(default: 0)",
    .read = read_charges,
};

/* Every subshell that an atom up to Z = 118 may hold. */
static void subshell_words(struct words *words,
                           const struct reference_list *references)
{
    static const char *const subshells[] = {
        "1s", "2s", "2p", "3s", "3p", "3d", "4s", "4p", "4d",
        "4f", "5s", "5p", "5d", "5f", "6s", "6p", "6d", "6f",
        "7s", "7p", "7d", "7f", "8s", "8p", "8d", "8f"};
    (void)references;
    for (size_t i = 0; i < sizeof subshells / sizeof subshells[0]; i++)
        words_add(words, subshells[i], "");
}

static bool read_subshell(struct request *r, const struct option *self,
                          const char *text, struct status *st)
{
    char names[WORD_LIST_TEXT_MAX];
    (void)self;
    if (!subshell_parse(text, &r->n, &r->l))
        return status_fail(st, STATUS_USAGE,
                           "--subshell %s: not a subshell; expected one from "
                           "1s to 8f, such as 3d",
                           text);
    for (int i = 0; i < r->quantity_count; i++)
        if (quantity_at(r->quantities[i])->per_subshell)
            return true;
    struct text t = text_over(names, sizeof names);
    request_quantities(r, &t);
    return status_fail(st, STATUS_USAGE,
                       "--subshell %s: %s has no subshells; expected zeff or "
                       "radius among the quantities",
                       text, names);
}

const struct option option_subshell = {
    .name = "subshell",
    .letter = 's',
    .argument = "NL",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = subshell_words,
    .help = "subshell asked about, such as 3d (default: the outermost)",
    .read = read_subshell,
};

static bool read_configuration(struct request *r, const struct option *self,
                               const char *text, struct status *st)
{
    (void)self;
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

const struct option option_configuration = {
    .name = "configuration",
    .letter = 'C',
    .argument = "TEXT",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .help = "electron configuration in place of the ground state, such as "
            "'[Ar] 3d6 4s2'",
    .read = read_configuration,
};

static void term_words(struct words *words,
                       const struct reference_list *references)
{
    (void)references;
    /* In the order of model_options.average_term: false, true. */
    words_add(words, "hund", "");
    words_add(words, "average", "");
}

/* The term to solve for: one of the chosen models must know the choice. */
static bool read_term(struct request *r, const struct option *self,
                      const char *value, struct status *st)
{
    int average;
    bool taken = false;
    if (!read_choice(r, self, value, &average, st))
        return false;
    for (int i = 0; i < r->model_count; i++)
        taken = taken ||
                (r->models[i]->takes_term && request_offers(r, r->models[i]));
    if (!taken)
        return status_fail(st, STATUS_USAGE,
                           "--term %s: none of the models asked takes it; "
                           "expected single-zeta among them",
                           value);
    struct model_options options = {.average_term = average != 0};
    study_set_options(r->study, &options);
    return true;
}

const struct option option_term = {
    .name = "term",
    .letter = 't',
    .argument = "TERM",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = term_words,
    .help = "for single-zeta: hund, the term of highest S, then highest L, or "
            "average, "
            "the average of the configuration (default: hund)",
    .read = read_term,
};

static bool has_ion(const struct request *r)
{
    for (int i = 0; i < r->atom_count; i++)
        if (r->atoms[i].charge != 0)
            return true;
    return false;
}

/* A site is no idle word: some set that is read must know it. */
static bool check_site(const struct request *r, const struct option *self,
                       const char *value, struct status *st)
{
    const struct reference *set;
    bool taken = self == &option_spin
                     ? r->site_taken.spin == r->site.spin
                     : r->site_taken.coordination == r->site.coordination;
    if (r->atom_count > 0 && !taken)
        return status_fail(st, STATUS_USAGE,
                           "--%s %s: every chosen ion carries its own site",
                           self->name, value);
    return request_site_sets(r, has_ion(r), &set, 1) > 0 ||
           status_fail(st, STATUS_USAGE,
                       "--%s %s: none of the sets taken tells sites apart; "
                       "expected --reference ionic_effective_shannon_1976 or "
                       "another set of ionic radii",
                       self->name, value);
}

static void coordination_words(struct words *words,
                               const struct reference_list *references)
{
    (void)references;
    for (int c = COORDINATION_NONE + 1; c < COORDINATION_COUNT; c++)
        words_add(words, coordination_id((enum coordination)c), "");
}

/* Roman in any case, or a number: more than the words that are offered. */
static bool read_coordination(struct request *r, const struct option *self,
                              const char *value, struct status *st)
{
    int place;
    return coordination_find(value, &r->site.coordination) ||
           read_choice(r, self, value, &place, st);
}

const struct option option_coordination = {
    .name = "coordination",
    .argument = "CN",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = coordination_words,
    .apart = true, /* roman numbers a letter apart are other numbers */
    .help =
        "coordination of the site, for sets of ionic radii: roman or a number, "
        "such as VI, vi or 6, with PY for pyramidal and SQ for square "
        "(default: "
        "the set's own, VI)",
    .read = read_coordination,
    .check = check_site,
};

static void spin_words(struct words *words,
                       const struct reference_list *references)
{
    (void)references;
    for (int s = SPIN_NONE + 1; s < SPIN_COUNT; s++)
        words_add(words, spin_id((enum spin_state)s),
                  spin_word((enum spin_state)s));
}

static bool read_spin(struct request *r, const struct option *self,
                      const char *value, struct status *st)
{
    int spin;
    if (!read_choice(r, self, value, &spin, st))
        return false;
    /* The words leave out the first enumerator, which stands for none. */
    r->site.spin = (enum spin_state)(SPIN_NONE + 1 + spin);
    return true;
}

const struct option option_spin = {
    .name = "spin",
    .argument = "STATE",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = spin_words,
    .help = "low or high, the spin state of the ion, for sets of ionic radii "
            "(default: the one that the set prefers)",
    .read = read_spin,
    .check = check_site,
};
