/* SPDX-License-Identifier: MIT */
#include "model/rule.h"

#include "base/units.h"

void rule_begin(void *work, const struct question *question,
                const struct model_options *options)
{
    (void)options;
    ((struct rule_work *)work)->question = *question;
}

enum model_progress rule_step(void *work)
{
    (void)work;
    return MODEL_DONE;
}

const struct subshell *rule_subshell(const struct species *species, int n,
                                     int l, const char **reason)
{
    const struct configuration *c = &species->configuration;
    *reason = "no electron left";
    if (n == 0)
        return configuration_outermost(c);
    for (int i = 0; i < c->count; i++)
        if (c->shells[i].n == n && c->shells[i].l == l)
            return &c->shells[i];
    *reason = "the subshell holds no electron in this configuration";
    return NULL;
}

struct reading rule_zeff(const struct model_offer *offer,
                         const struct question *question, rule_sigma *sigma,
                         int n, int l)
{
    const char *reason;
    const char *remark = "";
    double s = 0.0;
    const struct subshell *shell =
        rule_subshell(&question->species, n, l, &reason);
    if (!shell || !sigma(&question->species, shell, &s, &reason, &remark))
        return reading_gap(offer->quantity, READING_OUTSIDE, reason,
                           &offer->provenance);
    double z_eff = question->species.z - s;
    if (z_eff <= 0.0)
        return reading_gap(offer->quantity, READING_OUTSIDE,
                           "the screening is not below the nuclear charge",
                           &offer->provenance);
    struct reading r =
        reading_computed(offer->quantity, z_eff, &offer->provenance);
    r.n = shell->n;
    r.l = shell->l;
    r.remark = remark;
    return r;
}

struct reading rule_radius(const struct model_offer *offer,
                           const struct question *question, rule_sigma *sigma,
                           double (*n_star)(int n), int n, int l)
{
    struct reading r = rule_zeff(offer, question, sigma, n, l);
    if (r.state != READING_OK)
        return r;
    double effective = n_star(r.n);
    struct reading radius = reading_computed(
        offer->quantity, effective * effective * BOHR_PM / r.value.value,
        &offer->provenance);
    radius.n = r.n;
    radius.l = r.l;
    radius.remark = r.remark;
    return radius;
}

struct reading rule_ionization(const struct model_offer *offer,
                               const struct question *question,
                               rule_sigma *sigma)
{
    struct reading r = rule_zeff(offer, question, sigma, 0, 0);
    if (r.state != READING_OK)
        return r;
    double ratio = r.value.value / r.n;
    struct reading energy = reading_computed(
        offer->quantity, RYDBERG_EV * ratio * ratio, &offer->provenance);
    energy.remark = r.remark;
    return energy;
}

double rule_plain_n(int n)
{
    return n;
}

struct reading rule_read(const void *work, const struct model_offer *offers,
                         int offer, rule_sigma *sigma, int n, int l)
{
    const struct question *q = &((const struct rule_work *)work)->question;
    const struct model_offer *o = &offers[offer];
    if (offer == RULE_ZEFF)
        return rule_zeff(o, q, sigma, n, l);
    if (offer == RULE_RADIUS)
        return rule_radius(o, q, sigma, rule_plain_n, n, l);
    return rule_ionization(o, q, sigma);
}
