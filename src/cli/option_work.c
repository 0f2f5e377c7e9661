/* SPDX-License-Identifier: MIT */
/* Options of single commands: how an atom is solved, how rows are sorted, by
 * which parts an audit goes. */
#include "cli/command.h"
#include "cli/read.h"

/* Wider than anything of use; the atom itself asks for more than its Z. */
#define SPEED_OF_LIGHT_MIN 1.0
#define SPEED_OF_LIGHT_MAX 1e6

static void functional_words(struct words *words,
                             const struct reference_list *references)
{
    (void)references;
    for (int f = 0; f < FUNCTIONAL_COUNT; f++)
        words_add(words, functional_id((enum functional)f),
                  functional_title((enum functional)f));
}

static bool read_functional(struct request *r, const struct option *self,
                            const char *value, struct status *st)
{
    int place;
    if (!read_choice(r, self, value, &place, st))
        return false;
    r->method.functional = (enum functional)place;
    return true;
}

const struct option option_functional = {
    .name = "functional",
    .argument = "NAME",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = functional_words,
    .help = "exchange and correlation: lda (spins alike), lsd or pbe "
            "(spin-polarised; "
            "default: lsd)",
    .read = read_functional,
};

static void relativity_words(struct words *words,
                             const struct reference_list *references)
{
    (void)references;
    for (int i = 0; i < RELATIVITY_COUNT; i++)
        words_add(words, relativity_id((enum relativity)i),
                  relativity_title((enum relativity)i));
}

static bool read_relativity(struct request *r, const struct option *self,
                            const char *value, struct status *st)
{
    int place;
    if (!read_choice(r, self, value, &place, st))
        return false;
    r->method.relativity = (enum relativity)place;
    return true;
}

const struct option option_relativity = {
    .name = "relativity",
    .argument = "NAME",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = relativity_words,
    .help = "none for the Schrödinger equation, dirac for the Dirac equation "
            "(default: dirac)",
    .read = read_relativity,
};

static bool read_speed_of_light(struct request *r, const struct option *self,
                                const char *value, struct status *st)
{
    double *speed = &r->method.speed_of_light;
    (void)self;
    return (text_to_double(value, speed) && *speed >= SPEED_OF_LIGHT_MIN &&
            *speed <= SPEED_OF_LIGHT_MAX) ||
           status_fail(st, STATUS_USAGE,
                       "--speed-of-light %s: expected a number of atomic "
                       "units from %g to %g, such as 137.035999177",
                       value, SPEED_OF_LIGHT_MIN, SPEED_OF_LIGHT_MAX);
}

const struct option option_speed_of_light = {
    .name = "speed-of-light",
    .argument = "C",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .help = "in atomic units, for the Dirac equation (default: 137.035999177, "
            "CODATA "
            "2022)",
    .read = read_speed_of_light,
};

static void sort_words(struct words *words,
                       const struct reference_list *references)
{
    (void)references;
    for (int s = 0; s < ROW_ORDER_COUNT; s++)
        words_add(words, row_order_id((enum row_order)s), "");
}

static bool read_sort(struct request *r, const struct option *self,
                      const char *value, struct status *st)
{
    int place;
    if (!read_choice(r, self, value, &place, st))
        return false;
    r->has_order = true;
    r->order = (enum row_order)place;
    return true;
}

const struct option option_sort = {
    .name = "sort",
    .argument = "BY",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = sort_words,
    .help = "largest first: value, or the size of residual, percent, "
            "disagreement or "
            "disagreement-percent (default: as chosen)",
    .read = read_sort,
};

static void scope_words(struct words *words,
                        const struct reference_list *references)
{
    (void)references;
    for (int s = 0; s < AUDIT_SCOPE_COUNT; s++)
        words_add(words, audit_scope_id((enum audit_scope)s), "");
}

static bool read_scopes(struct request *r, const struct option *self,
                        const char *value, struct status *st)
{
    return read_bits(r, self, value, &r->scopes, st);
}

const struct option option_scope = {
    .name = "scope",
    .argument = "SCOPES",
    .kind = OPTION_VALUE,
    .stage = OPTION_LATER,
    .words = scope_words,
    .list = true,
    .help = "parts to give figures for: all, block, period, group, charge, "
            "evidence "
            "(default: all, block, period, group; charge and evidence where "
            "there is "
            "more than one)",
    .read = read_scopes,
};
