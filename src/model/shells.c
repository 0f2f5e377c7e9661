/* SPDX-License-Identifier: MIT */
/* Shell counting by Gauss's law. Seen from an electron in shell n, charge that
 * lies wholly inside acts as if it sat at the nucleus and charge that lies
 * outside not at all; of two electrons in one shell each is inside the other
 * for half of the time. So S = (electrons in shells below n) + 1/2 (others in
 * shell n). Common practice, no source. */
#include "model/models.h"
#include "model/rule.h"

#define PROVENANCE(what)                                                       \
    {                                                                          \
        .computed = true, .id = "shells",                                      \
        .title = "Shell counting by Gauss's law", .definition = (what),        \
        .unsourced = "common practice, no source"                              \
    }

static const struct model_offer offers[RULE_OFFERS] = {
    [RULE_ZEFF] = {QUANTITY_ZEFF, PROVENANCE(&definition_zeff_rule)},
    [RULE_RADIUS] = {QUANTITY_RADIUS, PROVENANCE(&definition_radial_maximum)},
    [RULE_IONIZATION] = {QUANTITY_IONIZATION,
                         PROVENANCE(&definition_ionization)},
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

static struct reading read(const void *work, int offer, int n, int l)
{
    return rule_read(work, offers, offer, sigma, n, l);
}

const struct model model_shells = {
    .id = "shells",
    .title = "Shell counting by Gauss's law",
    .domain = "every element and charge",
    .closed = true,
    .offers = offers,
    .offer_count = RULE_OFFERS,
    .work_size = sizeof(struct rule_work),
    .begin = rule_begin,
    .step = rule_step,
    .read = read,
};
