/* SPDX-License-Identifier: MIT */
/* Slater's screening rules, his total energies, and the Allred-Rochow scale
 * that stands on them. */
#include "model/slater.h"

#include "base/units.h"
#include "model/citations.h"
#include "model/models.h"
#include "model/rule.h"

#define SAME_GROUP 0.35
#define SAME_GROUP_1S 0.30
#define NEXT_SHELL 0.85 /* from shell n-1 on an s or p electron */
#define N_EXTENDED 7    /* n* given here, but not by Slater */

static const struct citation citations[] = {
    {.key = "slater1930",
     .kind = "article",
     .authors = CITATION_NAMES("J. C. Slater"),
     .title = "Atomic shielding constants",
     .container = "Physical Review",
     .year = 1930,
     .volume = "36",
     .pages = "57",
     .doi = "10.1103/PhysRev.36.57",
     .from_memory = "title, doi"},
    CITATION_ALLRED_1958,
    CITATION_PYYKKO_2009,
};

#define PROVENANCE(what, count)                                                \
    {                                                                          \
        .computed = true, .id = "slater", .title = "Slater's rules",           \
        .definition = (what), .citations = citations,                          \
        .citation_count = (count)                                              \
    }

enum {
    OFFER_ZEFF,
    OFFER_RADIUS,
    OFFER_IONIZATION,
    OFFER_ELECTRONEGATIVITY,
    OFFER_COUNT
};

static const struct model_offer offers[OFFER_COUNT] = {
    [OFFER_ZEFF] = {QUANTITY_ZEFF, PROVENANCE(&definition_zeff_rule, 1)},
    [OFFER_RADIUS] = {QUANTITY_RADIUS,
                      PROVENANCE(&definition_radial_maximum, 1)},
    [OFFER_IONIZATION] = {QUANTITY_IONIZATION,
                          PROVENANCE(&definition_ionization, 1)},
    [OFFER_ELECTRONEGATIVITY] = {QUANTITY_ELECTRONEGATIVITY,
                                 PROVENANCE(&definition_allred_rochow, 3)},
};

double slater_n_star(int n)
{
    static const double table[] = {0, 1, 2, 3, 3.7, 4.0, 4.2, 4.3};
    return n >= 1 && n <= N_EXTENDED ? table[n] : 0.0;
}

/* Groups from inside out: (1s) (2s2p) (3s3p) (3d) (4s4p) (4d) (4f) …: s and p
 * of one shell together, d and f alone, so 4n + {0, 2, 3} puts them in order.
 */
static int group_of(int n, int l)
{
    return 4 * n + (l < 2 ? 0 : l);
}

double slater_sigma(const struct configuration *configuration, int n, int l)
{
    double same = 0.0;
    double s = 0.0;
    int group = group_of(n, l);
    for (int i = 0; i < configuration->count; i++) {
        const struct subshell *other = &configuration->shells[i];
        int other_group = group_of(other->n, other->l);
        if (other_group == group)
            same += other->occ;
        else if (other_group < group)
            s += l < 2 && other->n == n - 1 ? NEXT_SHELL * other->occ
                                            : other->occ;
    }
    double others = same > 1.0 ? same - 1.0 : 0.0;
    return s + others * (n == 1 ? SAME_GROUP_1S : SAME_GROUP);
}

double slater_energy_ev(int z, const struct configuration *configuration)
{
    double sum = 0.0;
    for (int i = 0; i < configuration->count; i++) {
        const struct subshell *shell = &configuration->shells[i];
        double ratio = (z - slater_sigma(configuration, shell->n, shell->l)) /
                       slater_n_star(shell->n);
        sum += shell->occ * ratio * ratio;
    }
    return -RYDBERG_EV * sum;
}

double allred_rochow(double z_star, double radius_angstrom)
{
    return 0.359 * z_star / (radius_angstrom * radius_angstrom) + 0.744;
}

static bool covered(const struct configuration *c, const char **reason,
                    const char **remark)
{
    const struct subshell *last = configuration_outermost(c);
    int n = last ? last->n : 0;
    *remark = n == N_EXTENDED
                  ? "n* = 4.3 for n = 7 is an extension of Slater's table"
                  : "";
    *reason = "no effective quantum number for n above 7";
    return n <= N_EXTENDED;
}

static bool sigma(const struct species *species,
                  const struct subshell *subshell, double *s,
                  const char **reason, const char **remark)
{
    *s = slater_sigma(&species->configuration, subshell->n, subshell->l);
    return covered(&species->configuration, reason, remark);
}

static struct reading read_ionization(const struct model_offer *offer,
                                      const struct question *q)
{
    const char *reason = "no electron left";
    const char *remark = "";
    if (!q->has_cation || !covered(&q->species.configuration, &reason, &remark))
        return reading_gap(offer->quantity, READING_OUTSIDE, reason,
                           &offer->provenance);
    double before = slater_energy_ev(q->species.z, &q->species.configuration);
    double after = slater_energy_ev(q->cation.z, &q->cation.configuration);
    struct reading r =
        reading_computed(offer->quantity, after - before, &offer->provenance);
    r.remark =
        after < before ? "negative: the ion lies lower in this model" : remark;
    return r;
}

static struct reading read_electronegativity(const struct model_offer *offer,
                                             const struct question *q)
{
    const char *reason;
    const char *remark = "";
    const struct subshell *last = rule_subshell(&q->species, 0, 0, &reason);
    if (q->species.charge != 0)
        reason = "the scale is defined for the neutral atom";
    else if (!q->has_covalent_radius)
        reason = "no covalent radius stored";
    else if (last && covered(&q->species.configuration, &reason, &remark)) {
        double s = slater_sigma(&q->species.configuration, last->n, last->l);
        double z_star = q->species.z - s - SAME_GROUP;
        struct reading r = reading_computed(
            offer->quantity,
            allred_rochow(z_star, q->covalent_radius_pm / 100.0),
            &offer->provenance);
        r.remark = remark;
        return r;
    }
    return reading_gap(offer->quantity, READING_OUTSIDE, reason,
                       &offer->provenance);
}

static struct reading read(const void *work, int offer, int n, int l)
{
    const struct question *q = &((const struct rule_work *)work)->question;
    const struct model_offer *o = &offers[offer];
    if (offer == OFFER_ZEFF)
        return rule_zeff(o, q, sigma, n, l);
    if (offer == OFFER_RADIUS)
        return rule_radius(o, q, sigma, slater_n_star, n, l);
    if (offer == OFFER_IONIZATION)
        return read_ionization(o, q);
    return read_electronegativity(o, q);
}

const struct model model_slater = {
    .id = "slater",
    .title = "Slater's rules",
    .domain = "n up to 6; n = 7 as a marked extension",
    .closed = true,
    .offers = offers,
    .offer_count = OFFER_COUNT,
    .work_size = sizeof(struct rule_work),
    .begin = rule_begin,
    .step = rule_step,
    .read = read,
};
