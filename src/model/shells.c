/* SPDX-License-Identifier: MIT */
/* Shell counting by Gauss's law. Seen from an electron in shell n, charge that
 * lies wholly inside acts as if it sat at the nucleus and charge that lies
 * outside not at all; of two electrons in one shell each is inside the other
 * for half of the time. So S = (electrons in shells below n) + 1/2 (others in
 * shell n). Common practice, no source. */
#include "model/models.h"
#include "model/rule.h"

static const struct citation citations[] = {
    {"shell_counting", "misc", "common practice, no source",
     "Shell counting by Gauss's law", NULL, 0, NULL, NULL, NULL},
};

#define PROVENANCE(what)                                                       \
    {                                                                          \
        true, "shells", "Shell counting by Gauss's law", what, citations, 1    \
    }

enum { OFFER_ZEFF, OFFER_RADIUS, OFFER_IONIZATION, OFFER_COUNT };

static const struct model_offer offers[OFFER_COUNT] = {
    [OFFER_ZEFF] = {QUANTITY_ZEFF, PROVENANCE(DEFINITION_ZEFF_RULE)},
    [OFFER_RADIUS] = {QUANTITY_RADIUS, PROVENANCE(DEFINITION_RADIAL_MAXIMUM)},
    [OFFER_IONIZATION] = {QUANTITY_IONIZATION,
                          PROVENANCE(DEFINITION_IONIZATION)},
};

static bool sigma(const struct species *species,
                  const struct subshell *subshell, double *s,
                  const char **reason, const char **remark)
{
    (void)reason;
    const struct configuration *c = &species->configuration;
    double others = configuration_shell(c, subshell->n) - 1.0;
    *s = others > 0.0 ? 0.5 * others : 0.0;
    for (int n = 1; n < subshell->n; n++)
        *s += configuration_shell(c, n);
    *remark = "";
    return true;
}

static double n_star(int n)
{
    return n;
}

static struct reading read(const void *work, int offer, int n, int l)
{
    const struct question *q = &((const struct rule_work *)work)->question;
    const struct model_offer *o = &offers[offer];
    if (offer == OFFER_ZEFF)
        return rule_zeff(o, q, sigma, n, l);
    if (offer == OFFER_RADIUS)
        return rule_radius(o, q, sigma, n_star, n, l);
    return rule_ionization(o, q, sigma);
}

const struct model model_shells = {
    .id = "shells",
    .title = "Shell counting by Gauss's law",
    .domain = "every element and charge",
    .closed = true,
    .offers = offers,
    .offer_count = OFFER_COUNT,
    .work_size = sizeof(struct rule_work),
    .begin = rule_begin,
    .step = rule_step,
    .read = read,
};
