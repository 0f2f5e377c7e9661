/* SPDX-License-Identifier: MIT */
/* The calculation behind the 1963 exponents, solved live (zeta/zeta.h). */
#include "base/units.h"
#include "model/citations.h"
#include "model/models.h"
#include "model/rule.h"
#include "zeta/zeta.h"

/* Non-relativistic exponents lose their meaning with growing Z; the published
 * tables end with Rn, the stored ground configurations that are measured with
 * Lr. */
#define Z_LAST 103

static const struct citation citations[] = {
    CITATION_CLEMENTI_1963,
    {.key = "koopmans1934",
     .kind = "article",
     .authors = CITATION_NAMES("T. Koopmans"),
     .title = "Über die Zuordnung von Wellenfunktionen und Eigenwerten zu den "
              "einzelnen Elektronen eines Atoms",
     .container = "Physica",
     .year = 1934,
     .volume = "1",
     .pages = "104",
     .doi = "10.1016/S0031-8914(34)90011-2",
     .from_memory = "title, container, volume, pages, doi"},
};

/* The energy of the average of configuration goes back to this book; the
 * record says in an export which of the two energies a number belongs to. */
static const struct citation average_citations[] = {
    {.key = "slater1960",
     .kind = "book",
     .authors = CITATION_NAMES("J. C. Slater"),
     .title = "Quantum Theory of Atomic Structure, vol. 1 (average of "
              "configuration)",
     .container = "McGraw-Hill",
     .year = 1960,
     .from_memory = "title, container"},
    CITATION_CLEMENTI_1963,
};

#define PROVENANCE(what, cited, count)                                         \
    {                                                                          \
        .computed = true, .id = "single-zeta",                                 \
        .title = "single-zeta Hartree-Fock", .definition = (what),             \
        .citations = (cited), .citation_count = (count)                        \
    }

enum { OFFER_ZEFF, OFFER_RADIUS, OFFER_IONIZATION, OFFER_COUNT };

static const struct model_offer offers[OFFER_COUNT] = {
    [OFFER_ZEFF] = {QUANTITY_ZEFF,
                    PROVENANCE(&definition_zeff_exponent, citations, 1)},
    [OFFER_RADIUS] = {QUANTITY_RADIUS,
                      PROVENANCE(&definition_radial_maximum, citations, 1)},
    [OFFER_IONIZATION] = {QUANTITY_IONIZATION,
                          PROVENANCE(&definition_ionization, citations, 2)},
};

static const struct model_offer average_offers[OFFER_COUNT] = {
    [OFFER_ZEFF] = {QUANTITY_ZEFF, PROVENANCE(&definition_zeff_exponent,
                                              average_citations, 2)},
    [OFFER_RADIUS] = {QUANTITY_RADIUS, PROVENANCE(&definition_radial_maximum,
                                                  average_citations, 2)},
    [OFFER_IONIZATION] = {QUANTITY_IONIZATION,
                          PROVENANCE(&definition_ionization, average_citations,
                                     2)},
};

struct work {
    struct zeta *zeta;
    struct species species;
    bool average;
    struct zeta_result result;
};

static bool open_work(void *work, struct status *st)
{
    struct work *w = work;
    w->zeta = zeta_new(st);
    return w->zeta != NULL;
}

static void close_work(void *work)
{
    struct work *w = work;
    zeta_free(w->zeta);
    w->zeta = NULL;
}

static bool covered(const struct species *species)
{
    return species->z <= Z_LAST;
}

static void begin(void *work, const struct question *question,
                  const struct model_options *options)
{
    struct work *w = work;
    w->species = question->species;
    w->average = options && options->average_term;
    w->result = (struct zeta_result){.state = ZETA_RUNNING};
    struct zeta_problem problem = {
        .z = w->species.z,
        .configuration = &w->species.configuration,
        .coupling = w->average ? ZETA_AVERAGE : ZETA_HUND,
    };
    if (!covered(&w->species) || !zeta_begin(w->zeta, &problem))
        w->result.state = ZETA_REFUSED;
}

/* A whole atom takes less than a millisecond: one step. */
static enum model_progress step(void *work)
{
    struct work *w = work;
    if (w->result.state != ZETA_RUNNING)
        return MODEL_DONE;
    while (zeta_step(w->zeta))
        ;
    zeta_read(w->zeta, &w->result);
    return MODEL_DONE;
}

/* Why there is no number at all; NULL when there is one. */
static const char *gap_reason(const struct work *w, enum reading_state *state)
{
    *state = READING_OUTSIDE;
    if (!covered(&w->species))
        return "the calculation is not relativistic and ends with Lr";
    switch (w->result.state) {
    case ZETA_SOLVED:
    case ZETA_UNBOUND:
        return NULL;
    case ZETA_REFUSED:
        return "this basis holds no core holes, no electrons excited within "
               "one l and no fractions of electrons";
    case ZETA_ESCAPED:
    case ZETA_DISORDERED:
        return zeta_state_text(w->result.state);
    case ZETA_RUNNING:
    case ZETA_UNCONVERGED:
    case ZETA_STATE_COUNT:
        break;
    }
    *state = READING_NOT_CONVERGED;
    return "the exponents did not converge";
}

static const struct zeta_subshell *result_subshell(const struct zeta_result *r,
                                                   int n, int l)
{
    for (int i = 0; i < r->count; i++)
        if (r->shells[i].n == n && r->shells[i].l == l)
            return &r->shells[i];
    return NULL;
}

static const char *remark(const struct work *w, const struct zeta_subshell *s)
{
    if (s->energy >= 0.0)
        return "not bound in this minimal basis: its orbital energy is "
               "positive";
    if (w->result.anion)
        return "an anion: a minimum in this basis does not prove that it is "
               "bound";
    return w->average ? "average of configuration" : "";
}

static struct reading gap(const struct model_offer *offer,
                          enum reading_state state, const char *reason)
{
    return reading_gap(offer->quantity, state, reason, &offer->provenance);
}

static struct reading read_ionization(const struct model_offer *offer,
                                      const struct work *w,
                                      const struct zeta_subshell *s)
{
    if (s->energy >= 0.0)
        return gap(offer, READING_OUTSIDE,
                   "the outermost subshell is not bound in this minimal basis");
    struct reading r = reading_computed(
        offer->quantity, -s->energy * HARTREE_EV, &offer->provenance);
    r.remark =
        w->result.state == ZETA_UNBOUND
            ? "one-electron estimate (Koopmans), and an inner subshell is not "
              "bound in this minimal basis"
            : "one-electron estimate (Koopmans); audit with --charge and "
              "--scope block says how far off";
    return r;
}

static struct reading read(const void *work, int offer, int n, int l)
{
    const struct work *w = work;
    const struct model_offer *o =
        &(w->average ? average_offers : offers)[offer];
    const char *reason;
    bool outermost = n == 0 || offer == OFFER_IONIZATION;
    const struct subshell *asked = rule_subshell(&w->species, outermost ? 0 : n,
                                                 outermost ? 0 : l, &reason);
    if (!asked)
        return gap(o, READING_OUTSIDE, reason);
    enum reading_state state;
    reason = gap_reason(w, &state);
    if (reason)
        return gap(o, state, reason);
    const struct zeta_subshell *s =
        result_subshell(&w->result, asked->n, asked->l);
    if (offer == OFFER_IONIZATION)
        return read_ionization(o, w, s);
    struct reading r = reading_computed(
        o->quantity, offer == OFFER_ZEFF ? s->z_eff : s->peak_radius * BOHR_PM,
        &o->provenance);
    r.n = s->n;
    r.l = s->l;
    r.remark = remark(w, s);
    return r;
}

/* The tables of 1963 and 1967 are this calculation, printed. */
static const char *const repeats[] = {"zeff_clementi_1963",
                                      "calculated_clementi_1967", NULL};

const struct model model_single_zeta = {
    .id = "single-zeta",
    .title = "single-zeta Hartree-Fock, solved live",
    .domain = "H to Lr, any valence configuration",
    .closed = false,
    .takes_term = true,
    .repeats = repeats,
    .offers = offers,
    .offer_count = OFFER_COUNT,
    .work_size = sizeof(struct work),
    .open = open_work,
    .close = close_work,
    .begin = begin,
    .step = step,
    .read = read,
};
