/* SPDX-License-Identifier: MIT */
/* The linear screening rules that Clementi and Raimondi fitted in 1963 to
 * their minimal-basis Hartree-Fock exponents of the neutral atoms up to Kr.
 * The paper's table of exponents is a reference set, not this model. */
#include <stddef.h>

#include "model/citations.h"
#include "model/models.h"
#include "model/rule.h"

static const struct citation citations[] = {
    CITATION_CLEMENTI_1963,
};

#define PROVENANCE(what)                                                       \
    {                                                                          \
        .computed = true, .id = "clementi",                                    \
        .title = "Clementi-Raimondi rules of 1963", .definition = (what),      \
        .citations = citations, .citation_count = 1                            \
    }

static const struct model_offer offers[RULE_OFFERS] = {
    [RULE_ZEFF] = {QUANTITY_ZEFF, PROVENANCE(&definition_zeff_rule)},
    [RULE_RADIUS] = {QUANTITY_RADIUS, PROVENANCE(&definition_radial_maximum)},
    [RULE_IONIZATION] = {QUANTITY_IONIZATION,
                         PROVENANCE(&definition_ionization)},
};

/* Subshells of the rules, as bits in the order in which they fill a row. */
enum {
    S1 = 1 << 0,
    S2 = 1 << 1,
    P2 = 1 << 2,
    S3 = 1 << 3,
    P3 = 1 << 4,
    D3 = 1 << 5,
    S4 = 1 << 6,
    P4 = 1 << 7,
    BEYOND_3P = D3 | S4 | P4,
    OUTSIDE_2 = S3 | P3 | BEYOND_3P,
};
#define SUBSHELL_KINDS 8

static const struct subshell kinds[SUBSHELL_KINDS] = {
    {1, 0, 2}, {2, 0, 2},  {2, 1, 6}, {3, 0, 2},
    {3, 1, 6}, {3, 2, 10}, {4, 0, 2}, {4, 1, 6},
};

/* S = constant + sum of coefficient * (electrons in counted - less). filled:
 * what the constant takes for granted; elsewhere the rule says nothing. */
#define TERMS_MAX 5
struct screening_rule {
    double constant;
    unsigned filled;
    struct {
        double coefficient;
        unsigned counted;
        double less;
    } terms[TERMS_MAX];
};

static const struct screening_rule rules[SUBSHELL_KINDS] = {
    /* 1s */
    {0.0, 0, {{0.3, S1, 1}, {0.0072, S2 | P2, 0}, {0.0158, OUTSIDE_2, 0}}},
    /* 2s */
    {1.7208, S1, {{0.3601, S2 | P2, 1}, {0.2062, OUTSIDE_2, 0}}},
    /* 2p */
    {2.5787,
     S1 | S2,
     {{0.3326, P2, 1},
      {-0.0773, S3, 0},
      {-0.0161, P3 | S4, 0},
      {-0.0048, D3, 0},
      {0.0085, P4, 0}}},
    /* 3s */
    {8.4927,
     S1 | S2 | P2,
     {{0.2501, S3 | P3, 1}, {0.0778, S4, 0}, {0.3382, D3, 0}, {0.1978, P4, 0}}},
    /* 3p */
    {9.3345,
     S1 | S2 | P2 | S3,
     {{0.3803, P3, 1}, {0.0526, S4, 0}, {0.3289, D3, 0}, {0.1558, P4, 0}}},
    /* 3d */
    {13.5894, S1 | S2 | P2 | S3 | P3, {{0.2693, D3, 1}, {-0.1065, P4, 0}}},
    /* 4s */
    {15.505,
     S1 | S2 | P2 | S3 | P3,
     {{0.0971, S4, 1}, {0.8433, D3, 0}, {0.0687, P4, 0}}},
    /* 4p */
    {24.7782, S1 | S2 | P2 | S3 | P3 | D3 | S4, {{0.2905, P4, 1}}},
};

static int kind_of(int n, int l)
{
    for (int k = 0; k < SUBSHELL_KINDS; k++)
        if (kinds[k].n == n && kinds[k].l == l)
            return k;
    return -1;
}

static bool all_covered(const struct configuration *c)
{
    for (int i = 0; i < c->count; i++)
        if (kind_of(c->shells[i].n, c->shells[i].l) < 0)
            return false;
    return true;
}

static bool is_filled(const struct configuration *c, unsigned subshells)
{
    for (int k = 0; k < SUBSHELL_KINDS; k++)
        if ((subshells >> k & 1) &&
            configuration_occupation(c, kinds[k].n, kinds[k].l) < kinds[k].occ)
            return false;
    return true;
}

static double electrons_in(const struct configuration *c, unsigned subshells)
{
    double sum = 0.0;
    for (int k = 0; k < SUBSHELL_KINDS; k++)
        if (subshells >> k & 1)
            sum += configuration_occupation(c, kinds[k].n, kinds[k].l);
    return sum;
}

static bool sigma(const struct species *species,
                  const struct subshell *subshell, double *s,
                  const char **reason, const char **remark)
{
    const struct configuration *c = &species->configuration;
    *reason = "the rules of 1963 end with Kr: they know no subshell beyond 4p";
    if (!all_covered(c))
        return false;
    const struct screening_rule *rule =
        &rules[kind_of(subshell->n, subshell->l)];
    *reason = "the rule takes filled inner subshells for granted";
    if (!is_filled(c, rule->filled))
        return false;
    *s = rule->constant;
    for (int t = 0; t < TERMS_MAX; t++) {
        double counted =
            electrons_in(c, rule->terms[t].counted) - rule->terms[t].less;
        if (counted > 0.0)
            *s += rule->terms[t].coefficient * counted;
    }
    *remark =
        species->charge != 0 ? "the rules were fitted to neutral atoms" : "";
    return true;
}

static struct reading read(const void *work, int offer, int n, int l)
{
    struct reading r = rule_read(work, offers, offer, sigma, n, l);
    if (offer == RULE_IONIZATION && r.state == READING_OK)
        r.remark = "one-electron estimate; the paper gives no energies";
    return r;
}

const struct model model_clementi = {
    .id = "clementi",
    .title = "Clementi-Raimondi rules of 1963",
    .domain = "configurations up to 4p, so up to Kr",
    .closed = true,
    .offers = offers,
    .offer_count = RULE_OFFERS,
    .work_size = sizeof(struct rule_work),
    .begin = rule_begin,
    .step = rule_step,
    .read = read,
};
