/* SPDX-License-Identifier: MIT */
/* The self-consistent atom as a model: Dirac equation, spin-polarised local
 * density, one hybrid energy on that density, the shift of the ground level by
 * spin-orbit coupling (atom/hybrid.h). Solved for the atom and for the ion
 * that it leaves behind. */
#include <math.h>

#include "atom/hybrid.h"
#include "atom/result.h"
#include "base/text.h"
#include "base/units.h"
#include "model/models.h"
#include "model/neighbour.h"
#include "model/scf.h"
#include "model/scf_offers.h"
#include "model/rule.h"

#define ISODENSITY 0.001 /* electrons/bohr^3, as the reference sets */
/* Allen's scale: 2.30016 per rydberg of configuration energy (L. C. Allen,
 * J. Am. Chem. Soc. 111, 9003 (1989); J. B. Mann, T. L. Meek, L. C. Allen, J.
 * Am. Chem. Soc. 122, 2780 (2000), doi 10.1021/ja992866e). */
#define ALLEN_PER_RYDBERG 2.30016

static const struct model_offer *const offers = scf_offers;

/* Standard uncertainty of a first ionization energy in eV, by block: the root
 * mean square of its deviations from NIST ASD 5.12, Z = 1…103, as this model
 * gives them (tests/model/test_scf.c checks the coverage). Nothing is known
 * that would bound the errors of higher charges as well. */
static double uncertainty_ev(const struct species *species)
{
    if (species->charge != 0)
        return 0.0;
    switch (element_at(species->z)->block) {
    case 's':
        return 0.09;
    case 'p':
        return 0.12;
    case 'd':
        return 0.18;
    default:
        return 0.10;
    }
}

/* One of the two solutions: that of the configuration which is asked about, or
 * of the lowest neighbour where that one is doubtful (model/neighbour.h). */
struct half {
    enum atom_state state;
    bool evaluated;  /* energy holds the hybrid energy with its shift */
    bool unsound;    /* its correlation cannot be right (hybrid.h) */
    bool by_hund;    /* its level J is by Hund's rules */
    double energy;   /* hartree */
    double with_pbe; /* the same with PBE correlation */
    struct configuration configuration;
    double moved; /* how far below the configuration asked about, hartree */
};

/* PHASE_SOLVE and PHASE_ENERGY are of one half, and of trial - 1 among its
 * neighbours unless trial is 0. */
enum phase { PHASE_SOLVE, PHASE_ENERGY, DONE };

#define REMARK_MAX 320

/* The highest level that is occupied of the outermost subshell, when that has
 * two of different j: l - 1/2 is filled before l + 1/2. */
struct frontier {
    int n, l;
    double peak_radius; /* bohr */
    char remark[48];
};

struct work {
    struct atom_solver *solver;
    struct hybrid *hybrid;
    struct question question;
    enum phase phase;
    bool starved;        /* no memory: nothing is to be read */
    struct half half[2]; /* the atom, the ion */
    int now;             /* which of them is at work */
    int trial;
    int neighbour_count;
    struct configuration neighbour[NEIGHBOURS_MAX];
    int count;
    struct atom_orbital orbital[SUBSHELL_MAX];
    double top[SUBSHELL_MAX]; /* highest level of each, hartree */
    double isodensity;        /* bohr */
    struct frontier frontier;
    char remark[REMARK_MAX]; /* of the ionization energy */
};

enum { ATOM, ION };

static bool open_work(void *work, struct status *st)
{
    struct work *w = work;
    w->solver = atom_solver_new(st);
    w->hybrid = w->solver ? hybrid_new(st) : NULL;
    if (!w->hybrid)
        atom_solver_free(w->solver);
    return w->hybrid != NULL;
}

static void close_work(void *work)
{
    struct work *w = work;
    hybrid_free(w->hybrid);
    atom_solver_free(w->solver);
    w->hybrid = NULL;
    w->solver = NULL;
}

static const struct species *species_of(const struct work *w)
{
    return w->now == ATOM ? &w->question.species : &w->question.cation;
}

/* Starts the self-consistent solution of one configuration. */
static bool start(struct work *w, const struct configuration *configuration)
{
    /* the ion from its atom, the atom from nothing: an answer must not depend
     * on what was asked before */
    const struct atom_options options = {
        .functional = ATOM_LSD,
        .relativity = ATOM_DIRAC,
        .warm = w->now == ION || w->trial > 0,
    };
    struct status st = status_ok();
    w->phase = PHASE_SOLVE;
    bool begun = atom_begin(w->solver, w->question.species.z, configuration,
                            &options, &st);
    w->starved = w->starved || (!begun && st.code == STATUS_MEMORY);
    return begun;
}

/* Starts one of the two; where there is nothing to solve (a bare nucleus) its
 * energy is zero. */
static void start_half(struct work *w, int now)
{
    struct half *half = &w->half[now];
    w->now = now;
    w->trial = w->neighbour_count = 0;
    const struct configuration *c = &species_of(w)->configuration;
    *half = (struct half){.state = ATOM_RUNNING, .configuration = *c};
    if (c->count > 0 && start(w, c))
        return;
    half->state = c->count == 0 ? ATOM_CONVERGED : ATOM_LOST;
    half->evaluated = c->count == 0;
    w->phase = DONE;
}

static void begin(void *work, const struct question *question,
                  const struct model_options *options)
{
    (void)options;
    struct work *w = work;
    w->question = *question;
    w->starved = false;
    w->count = 0;
    w->remark[0] = '\0';
    w->half[ION] = (struct half){.state = ATOM_RUNNING};
    start_half(w, ATOM);
}

/* A configuration that the user gives comes without a level J: then neither
 * the atom nor its ion is moved off the mean of its term. */
static bool is_given(const struct species *species)
{
    return species->origin == ORIGIN_USER;
}

/* Whether there is a J to choose. */
static bool has_levels(const struct configuration *c)
{
    for (int i = 0; i < c->count; i++)
        if (c->shells[i].l > 0 && c->shells[i].occ < 4 * c->shells[i].l + 1.5)
            return true;
    return false;
}

/* Fills energies of a half from the solver, which holds that configuration
 * with a ground term (none: by Hund's rules). */
static void evaluate(struct work *w, const struct configuration *configuration,
                     const struct term *term, struct half *half)
{
    struct status st = status_ok();
    struct hybrid_energy energy;
    half->configuration = *configuration;
    half->evaluated = hybrid_evaluate(w->hybrid, w->solver, &energy, &st);
    w->starved = w->starved || st.code == STATUS_MEMORY;
    if (!half->evaluated)
        return;
    bool given = is_given(&w->question.species);
    double shift = given ? 0.0 : hybrid_spin_orbit(w->hybrid, term);
    half->by_hund = !given && term->twice_j < 0 && has_levels(configuration);
    half->unsound = !energy.sound;
    half->energy = energy.total + shift;
    half->with_pbe = energy.with_pbe + shift;
}

static void keep_frontier(struct work *w)
{
    const struct subshell *outer =
        configuration_outermost(&w->question.species.configuration);
    w->frontier = (struct frontier){0};
    for (int i = 0; outer && outer->l > 0 && i < w->count; i++) {
        if (w->orbital[i].n != outer->n || w->orbital[i].l != outer->l)
            continue;
        int twice_j = 2 * outer->l + (outer->occ > 2 * outer->l ? 1 : -1);
        struct text t =
            text_over(w->frontier.remark, sizeof w->frontier.remark);
        w->frontier.n = outer->n;
        w->frontier.l = outer->l;
        w->frontier.peak_radius = atom_subshell_peak_of(w->solver, i, twice_j);
        text_addf(&t, "of %d%c%d/2, the highest occupied level", outer->n,
                  "spdf"[outer->l], twice_j);
    }
}

/* Keeps what is read off the density of the atom. */
static void keep(struct work *w)
{
    w->count = atom_subshell_count(w->solver);
    for (int i = 0; i < w->count; i++) {
        w->orbital[i] = atom_subshell_at(w->solver, i);
        w->top[i] = -HUGE_VAL;
    }
    for (int k = 0; k < atom_level_count(w->solver); k++) {
        struct atom_level level = atom_level_at(w->solver, k);
        for (int i = 0; i < w->count; i++)
            if (w->orbital[i].n == level.n && w->orbital[i].l == level.l)
                w->top[i] = fmax(w->top[i], level.energy);
    }
    keep_frontier(w);
    w->isodensity = atom_isodensity_radius(w->solver, ISODENSITY);
}

static void add_moved(const struct half *half, const char *what, struct text *t)
{
    char out[CONFIGURATION_TEXT_MAX];
    if (half->moved > 0.0)
        text_addf(t, "%s%s is %s, %.1f eV below its listed configuration",
                  t->length ? "; " : "", what,
                  configuration_print(&half->configuration, out),
                  half->moved * HARTREE_EV);
}

/* What to know about the ionization energy. */
static void write_remark(struct work *w)
{
    struct text t = text_over(w->remark, sizeof w->remark);
    const struct half *atom = &w->half[ATOM], *ion = &w->half[ION];
    if (is_given(&w->question.species))
        text_add(&t, "no level is given with a configuration: without "
                     "spin-orbit shifts");
    add_moved(atom,
              atom->moved > 0.0 && w->question.species.charge > 0 ? "this ion"
                                                                  : "the atom",
              &t);
    add_moved(ion, "the ion left", &t);
    if (atom->by_hund || ion->by_hund)
        text_addf(&t, "%slevel J of %s by Hund's rules", t.length ? "; " : "",
                  atom->by_hund && ion->by_hund ? "both"
                  : atom->by_hund               ? "the first"
                                                : "the ion left");
    if (atom->unsound || ion->unsound)
        text_addf(&t,
                  "%swith PBE correlation: that of revTPSS cannot be right "
                  "here",
                  t.length ? "; " : "");
}

/* The next neighbour that can be begun, else the ion, else the end. */
static void go_on(struct work *w)
{
    while (w->trial < w->neighbour_count)
        if (start(w, &w->neighbour[w->trial++]))
            return;
    w->phase = DONE;
    if (w->now == ATOM && w->question.has_cation)
        start_half(w, ION);
}

/* Neighbours of the configuration that the solver holds. */
static void list_neighbours(struct work *w)
{
    w->trial = w->neighbour_count = 0;
    if (!neighbour_doubtful(species_of(w)))
        return;
    w->neighbour_count =
        neighbour_list(w->solver, &w->half[w->now].configuration,
                       neighbour_emptied(species_of(w)), w->neighbour);
}

/* Takes the solution in the solver: the one asked about, or a neighbour that
 * lies lower, from which the search goes on. */
static void take(struct work *w)
{
    static const struct term none = {"", -1, -1, -1};
    struct half *half = &w->half[w->now];
    if (w->trial == 0) {
        if (w->now == ATOM)
            keep(w);
        evaluate(w, &species_of(w)->configuration, &species_of(w)->term, half);
        list_neighbours(w);
        return;
    }
    struct half other = *half;
    evaluate(w, &w->neighbour[w->trial - 1], &none, &other);
    double gain = half->energy - other.energy;
    if (!other.evaluated || other.unsound || half->unsound ||
        !(gain > neighbour_error(w->solver)))
        return;
    other.moved += gain;
    *half = other;
    list_neighbours(w);
}

/* One cycle, or one evaluation. */
static enum model_progress step(void *work)
{
    struct work *w = work;
    if (w->phase == PHASE_SOLVE) {
        enum atom_state state = atom_step(w->solver);
        if (w->trial == 0)
            w->half[w->now].state = state;
        if (state == ATOM_CONVERGED)
            w->phase = PHASE_ENERGY;
        else if (state != ATOM_RUNNING && w->trial > 0)
            go_on(w);
        else if (state != ATOM_RUNNING)
            w->phase = DONE;
    } else if (w->phase == PHASE_ENERGY) {
        take(w);
        go_on(w);
    }
    if (w->starved)
        return MODEL_NO_MEMORY;
    if (w->phase == DONE)
        write_remark(w);
    return w->phase == DONE ? MODEL_DONE : MODEL_RUNNING;
}

static struct reading gap(int offer, enum reading_state state,
                          const char *reason)
{
    return reading_gap(offers[offer].quantity, state, reason,
                       &offers[offer].provenance);
}

/* The gap that an atom leaves which did not converge. */
static struct reading gap_of(int offer, enum atom_state state)
{
    switch (state) {
    case ATOM_UNBOUND:
        return gap(offer, READING_OUTSIDE,
                   "not all electrons are bound in this approximation");
    case ATOM_OUT_OF_REACH:
        return gap(offer, READING_OUTSIDE,
                   "a subshell reaches beyond the radial mesh");
    case ATOM_LOST:
        return gap(offer, READING_NOT_CONVERGED,
                   "the level of a subshell could not be found");
    case ATOM_RUNNING:
    case ATOM_UNSETTLED:
    case ATOM_CONVERGED:
        break;
    }
    return gap(offer, READING_NOT_CONVERGED,
               "no self-consistency within the allowed cycles");
}

/* Ionization energy in hartree; false, with the gap, when there is none. */
static bool ionization(const struct work *w, int offer, double *energy,
                       struct reading *none)
{
    const struct half *atom = &w->half[ATOM], *ion = &w->half[ION];
    if (!w->question.has_cation)
        *none = gap(offer, READING_OUTSIDE, "no ion to compare with");
    else if (ion->state != ATOM_CONVERGED)
        *none = gap_of(offer, ion->state);
    else if (!atom->evaluated || !ion->evaluated)
        *none = gap(offer, READING_NOT_CONVERGED,
                    "the hybrid energy could not be evaluated");
    else if (atom->unsound || ion->unsound)
        *energy = ion->with_pbe - atom->with_pbe;
    else
        *energy = ion->energy - atom->energy;
    return w->question.has_cation && ion->state == ATOM_CONVERGED &&
           atom->evaluated && ion->evaluated;
}

static struct reading read_ionization(const struct work *w)
{
    double energy;
    struct reading none;
    if (!ionization(w, OFFER_IONIZATION, &energy, &none))
        return none;
    struct reading r =
        reading_computed(QUANTITY_IONIZATION, energy * HARTREE_EV,
                         &offers[OFFER_IONIZATION].provenance);
    double u = uncertainty_ev(&w->question.species);
    r.has_u = u > 0.0 && !is_given(&w->question.species);
    r.u = number_round(u, 2, 2);
    r.remark = w->remark;
    return r;
}

static const struct atom_orbital *find(const struct work *w, int n, int l)
{
    for (int i = 0; i < w->count; i++)
        if (w->orbital[i].n == n && w->orbital[i].l == l)
            return &w->orbital[i];
    return NULL;
}

/* From the energy: the subshell that loses the electron by the energy that it
 * takes, as the measured reference is made; any other by its orbital energy. */
static struct reading read_zeff(const struct work *w,
                                const struct atom_orbital *o)
{
    const struct provenance *provenance = &offers[OFFER_ZEFF].provenance;
    const struct subshell *emptied = configuration_emptied(
        &w->half[ATOM].configuration, &w->half[ION].configuration);
    double value = o->zeff_energy, energy;
    struct reading none;
    const char *remark = "from the orbital energy";
    if (!w->question.has_cation || w->half[ION].configuration.count == 0)
        emptied = configuration_outermost(&w->half[ATOM].configuration);
    if (emptied && o->n == emptied->n && o->l == emptied->l) {
        if (!ionization(w, OFFER_ZEFF, &energy, &none))
            return none;
        if (energy <= 0.0)
            return gap(OFFER_ZEFF, READING_OUTSIDE,
                       "the ion lies lower in this model");
        value = o->n * sqrt(2.0 * energy);
        remark = "from the computed ionization energy";
    }
    struct reading r = reading_computed(QUANTITY_ZEFF, value, provenance);
    r.remark = remark;
    return r;
}

/* Of the outermost subshell its highest level, of the others the mean over j.
 */
static struct reading read_radius(const struct work *w,
                                  const struct atom_orbital *o)
{
    const struct frontier *f = &w->frontier;
    bool resolved = f->n == o->n && f->l == o->l && f->peak_radius > 0.0;
    struct reading r = reading_computed(
        QUANTITY_RADIUS, (resolved ? f->peak_radius : o->peak_radius) * BOHR_PM,
        &offers[OFFER_RADIUS].provenance);
    if (resolved)
        r.remark = f->remark;
    return r;
}

static struct reading read_subshell(const struct work *w, int offer, int n,
                                    int l)
{
    const char *reason;
    const struct subshell *asked =
        rule_subshell(&w->question.species, n, l, &reason);
    if (!asked)
        return gap(offer, READING_OUTSIDE, reason);
    const struct atom_orbital *o = find(w, asked->n, asked->l);
    struct reading r;
    if (offer == OFFER_ZEFF)
        r = read_zeff(w, o);
    else if (offer == OFFER_RADIUS)
        r = read_radius(w, o);
    else
        r = reading_computed(offers[offer].quantity,
                             offer == OFFER_ZEFF_SIZE ? o->zeff_size
                                                      : o->zeff_enclosed,
                             &offers[offer].provenance);
    r.n = asked->n;
    r.l = asked->l;
    return r;
}

/* Whether Allen's scale counts a subshell: s and p of the last shell, and in
 * groups 3 to 11 the d subshell below it. */
static bool is_valence(const struct element *element, int last,
                       const struct atom_orbital *o)
{
    if (o->l == 2)
        return o->n == last - 1 && element->group >= 3 && element->group <= 11;
    return o->n == last && o->l < 2;
}

/* Configuration energy, the mean energy to remove a valence electron. The
 * orbital energies of a local potential lie too high by about the same amount
 * for all valence electrons; all are shifted so that the highest level, which
 * the first electron leaves, is the computed ionization energy. */
static struct reading read_allen(const struct work *w)
{
    const struct element *element = element_at(w->question.species.z);
    double energy, sum = 0.0, electrons = 0.0, highest = -HUGE_VAL;
    struct reading none;
    if (w->question.species.charge != 0)
        return gap(OFFER_ALLEN, READING_OUTSIDE,
                   "the scale is defined for the neutral atom");
    if (element->block == 'f')
        return gap(OFFER_ALLEN, READING_OUTSIDE,
                   "the scale has no rule for the valence electrons of the f "
                   "block");
    if (!ionization(w, OFFER_ALLEN, &energy, &none))
        return none;
    int last = element->period;
    for (int i = 0; i < w->count; i++) {
        if (!is_valence(element, last, &w->orbital[i]))
            continue;
        electrons += w->orbital[i].occ;
        sum -= w->orbital[i].occ * w->orbital[i].energy;
        highest = fmax(highest, w->top[i]);
    }
    if (electrons <= 0.0)
        return gap(OFFER_ALLEN, READING_OUTSIDE, "no valence electron");
    double mean = sum / electrons + (energy + highest);
    return reading_computed(QUANTITY_ELECTRONEGATIVITY,
                            ALLEN_PER_RYDBERG * mean * HARTREE_EV / RYDBERG_EV,
                            &offers[OFFER_ALLEN].provenance);
}

static struct reading read(const void *work, int offer, int n, int l)
{
    const struct work *w = work;
    if (w->question.species.configuration.count == 0)
        return gap(offer, READING_OUTSIDE, "no electron left");
    if (w->half[ATOM].state != ATOM_CONVERGED)
        return gap_of(offer, w->half[ATOM].state);
    switch (offer) {
    case OFFER_IONIZATION:
        return read_ionization(w);
    case OFFER_ALLEN:
        return read_allen(w);
    case OFFER_ISODENSITY:
        if (w->isodensity <= 0.0)
            return gap(offer, READING_OUTSIDE,
                       "the density is nowhere so high");
        return reading_computed(QUANTITY_ISODENSITY, w->isodensity * BOHR_PM,
                                &offers[offer].provenance);
    default:
        return read_subshell(w, offer, n, l);
    }
}

const struct model model_scf = {
    .id = "scf",
    .title = "self-consistent Kohn-Sham atom, solved live",
    .domain = "every element, charge >= 0, any configuration",
    .closed = false,
    .offers = scf_offers,
    .offer_count = OFFER_COUNT,
    .work_size = sizeof(struct work),
    .open = open_work,
    .close = close_work,
    .begin = begin,
    .step = step,
    .read = read,
};
