/* SPDX-License-Identifier: MIT */
#include "atom/atom.h"

#include <assert.h>
#include <math.h>
#include <stddef.h>
#include <stdlib.h>
#include <string.h>

#include "atom/solver.h"
#include "atom/uniform.h"
#include "base/units.h"
#include "numeric/poisson.h"

/* CYCLES_MAX: after them an atom is given up; those that converge take a
 * quarter of it. PATIENCE, ABOVE: an atom that has not converged by then and
 * in which the same occupied level lay at or above zero so many times since
 * half of it has no solution with that level bound: with it bound the field
 * does not hold it, without it the field does. */
/* OUTER: electrons counted as outer ones in a warm start. */
enum { OUTER = 5 };

enum { P = LOBATTO_ORDER, CYCLES_MAX = 150, PATIENCE = 80, ABOVE = 10 };

/* Everything that decides accuracy and convergence. */
static const struct {
    double first[2];     /* y of the first point, by equation: the Dirac
                            density has a weak singularity at the origin */
    double length[2];    /* of an element; shorter for the derivatives of a
                            gradient functional */
    double core;         /* y within which a gradient potential is smoothed */
    double last;         /* y where the mesh ends */
    double reach;        /* bohr, for a start */
    double first_mixing; /* the start is far off; later */
    double mixing;       /* of Anderson's extrapolation */
    double residual;     /* electrons */
    double energy;       /* change of the total energy, hartree, */
    double energy_part;  /* and relative: rounding */
    double tail;         /* density near the end of the mesh / its maximum */
} CHOICE = {
    .first = {1e-3, 1e-5},
    .length = {1.1, 0.8},
    .core = 1e-2,
    .last = 118.0 * 100.0,
    .reach = 45.0,
    .first_mixing = 0.5,
    .mixing = 0.75,
    .residual = 3e-7,
    .energy = 1e-9,
    .energy_part = 1e-13,
    .tail = 1e-8,
};

const char *atom_state_text(enum atom_state state)
{
    static const char *const text[] = {
#define ATOM_STATE_TEXT(state, words) words,
        ATOM_STATE_LIST(ATOM_STATE_TEXT)
#undef ATOM_STATE_TEXT
    };
    return text[state];
}

static void space_clear(struct atom_space *space)
{
    radial_free(space->radial);
    mixer_free(space->mixer);
    gradient_free(space->gradient);
    free(space->block);
    mesh_clear(&space->mesh);
    memset(space, 0, sizeof *space);
}

static bool space_make(struct atom_space *space, double first, double length,
                       struct status *st)
{
    if (space->block && fabs(space->mesh.length - length) < 1e-12)
        return true;
    space_clear(space);
    if (!mesh_init(&space->mesh, first, CHOICE.last, length, st))
        return false;
    size_t n = (size_t)space->mesh.points;
    space->radial = radial_new(&space->mesh, 0, st);
    space->mixer = mixer_new(2 * ATOM_CHANNELS * space->mesh.points, st);
    space->block = calloc(n * 22, sizeof *space->block);
    if (!space->radial || !space->mixer || !space->block) {
        space_clear(space);
        return status_fail(st, STATUS_MEMORY,
                           "out of memory for an atom on %zu points", n);
    }
    double *at = space->block;
    space->q = at;
    space->out = at + 4 * n;
    space->weight = at + 8 * n;
    double **single[] = {&space->D[0],     &space->D[1],   &space->total,
                         &space->enclosed, &space->field,  &space->rho[0],
                         &space->rho[1],   &space->energy, &space->v[0],
                         &space->v[1]};
    for (size_t k = 0; k < sizeof single / sizeof *single; k++)
        *single[k] = at + (10 + k) * n;
    space->scratch = at + 20 * n;
    return true;
}

bool space_gradient(struct atom_space *space, struct status *st)
{
    if (!space->gradient)
        space->gradient = gradient_new(&space->mesh, st);
    return space->gradient != NULL;
}

struct atom_solver *atom_solver_new(struct status *st)
{
    struct atom_solver *solver = calloc(1, sizeof *solver);
    if (!solver)
        status_fail(st, STATUS_MEMORY, "out of memory for the atom solver");
    return solver;
}

void atom_solver_free(struct atom_solver *solver)
{
    if (!solver)
        return;
    for (int i = 0; i < ATOM_SPACES; i++)
        space_clear(&solver->space[i]);
    free(solver);
}

/* Adds the levels of one subshell in one channel: occ electrons, spread over
 * j by 2j+1. */
static void add_levels(struct atom_solver *s, const struct subshell *shell,
                       int channel, int spin, double occ)
{
    int l = shell->l;
    if (occ <= 0.0)
        return;
    for (int kappa = l; kappa >= -l - 1; kappa -= 2 * l + 1) {
        bool dirac = s->options.relativity == ATOM_DIRAC;
        if (kappa == 0 || (!dirac && kappa > 0))
            continue;
        double share = dirac ? (double)abs(kappa) / (2 * l + 1) : 1.0;
        struct radial_level *level = &s->level[s->count];
        struct atom_level *label = &s->label[s->count++];
        level->kappa = kappa;
        level->nodes = shell->n - l - 1;
        level->channel = channel;
        level->weight = occ * share;
        label->n = shell->n;
        label->l = l;
        label->twice_j = dirac ? 2 * abs(kappa) - 1 : 0;
        label->spin = spin;
        label->occ = occ * share;
        label->energy = 0.0;
    }
}

static bool check(const struct configuration *configuration, int Z,
                  struct status *st)
{
    if (Z < 1 || Z > 118)
        return status_fail(st, STATUS_USAGE, "nuclear charge %d: 1 to 118", Z);
    double electrons = 0.0;
    for (int i = 0; i < configuration->count; i++) {
        const struct subshell *s = &configuration->shells[i];
        if (s->n < 1 || s->n > N_MAX || s->l < 0 || s->l > L_MAX ||
            s->l >= s->n || !(s->occ >= 0.0) || s->occ > 4 * s->l + 2)
            return status_fail(st, STATUS_USAGE,
                               "subshell n=%d l=%d with %g electrons", s->n,
                               s->l, s->occ);
        electrons += s->occ;
    }
    if (!(electrons > 0.0))
        return status_fail(st, STATUS_USAGE, "an atom without electrons");
    return true;
}

static bool has_electrons(const struct atom_solver *s, int channel)
{
    for (int i = 0; i < s->count; i++)
        if (s->level[i].channel == channel)
            return true;
    return false;
}

/* Starts self-consistency over `elements` of the mesh. */
static void start(struct atom_solver *s, int elements, bool warm)
{
    struct atom_space *space = s->now;
    s->elements = elements;
    int points = elements * P + 1;
    for (int c = 0; c < s->channels; c++) {
        /* the potential of a channel without electrons has no say */
        double share = has_electrons(s, c) ? 1.0 / s->channels : 0.0;
        for (int i = 0; i < points; i++)
            space->weight[c * points + i] =
                share * space->mesh.weight_y[i] / space->mesh.y[i];
    }
    radial_begin(space->radial, s->a2, elements, s->count, s->level);
    int n = s->channels * points;
    mixer_reset(space->mixer, s->a2 > 0.0 ? 2 * n : n, n);
    if (!warm)
        atom_start_potential(s);
    s->warm = warm;
    s->found = false;
    s->last_total = 0.0;
}

/* Starts from the last potential of an atom of the same nucleus: where the
 * outermost electrons are, their charge is scaled to what is left. */
static void warm_potential(struct atom_solver *s, double electrons)
{
    struct atom_space *space = s->now;
    int points = s->elements * P + 1;
    double Z = s->Z, change = s->electrons - electrons;
    for (int i = 0; i < points; i++) {
        double outer = space->enclosed[i] - (electrons - OUTER);
        double part = outer > 0.0 ? outer / OUTER : 0.0;
        for (int c = 0; c < s->channels; c++) {
            space->q[c * points + i] += part * change / Z;
            if (s->a2 > 0.0)
                space->q[(s->channels + c) * points + i] -= part * change / Z;
        }
    }
}

bool atom_begin(struct atom_solver *solver, int Z,
                const struct configuration *configuration,
                const struct atom_options *options, struct status *st)
{
    struct atom_solver *s = solver;
    if (!check(configuration, Z, st))
        return false;
    int before_Z = s->Z, before_channels = s->channels,
        before_elements = s->elements;
    const struct atom_space *before_space = s->now;
    double before = s->electrons;
    bool warm = options->warm && s->state == ATOM_CONVERGED;
    s->state = ATOM_LOST; /* until there is something to step */
    s->Z = Z;
    s->configuration = *configuration;
    s->options = *options;
    bool dirac = options->relativity == ATOM_DIRAC;
    bool gradient =
        options->functional == ATOM_PBE || options->functional == ATOM_PBE_VWN;
    s->now = &s->space[2 * gradient + dirac];
    double length = options->element_length > 0.0 ? options->element_length
                                                  : CHOICE.length[gradient];
    if (!space_make(s->now, CHOICE.first[dirac], length, st))
        return false;
    if (gradient && !space_gradient(s->now, st))
        return false;
    s->c = options->speed_of_light > 0.0 ? options->speed_of_light
                                         : SPEED_OF_LIGHT_AU;
    s->a2 = dirac ? Z / s->c * (Z / s->c) : 0.0;
    s->power = 2.0 * sqrt(1.0 - s->a2);
    s->electrons = configuration_electrons(configuration);
    s->channels = options->functional == ATOM_LDA ? 1 : 2;
    s->count = 0;
    for (int spin = 0; spin < s->channels; spin++)
        for (int i = 0; i < configuration->count; i++) {
            const struct subshell *shell = &configuration->shells[i];
            double half = 2 * shell->l + 1;
            double major = shell->occ < half ? shell->occ : half;
            add_levels(s, shell, spin, s->channels == 1 ? 0 : 1 - 2 * spin,
                       s->channels == 1 ? shell->occ
                       : spin == 0      ? major
                                        : shell->occ - major);
        }
    s->state = ATOM_RUNNING;
    s->culprit = -1;
    s->cycles = 0;
    memset(&s->result, 0, sizeof s->result);
    memset(s->above, 0, sizeof s->above);
    int elements = mesh_elements_to(&s->now->mesh, CHOICE.reach * Z);
    warm = warm && before_Z == Z && before_channels == s->channels &&
           before_space == s->now && before_elements == elements;
    start(s, elements, warm);
    if (warm)
        warm_potential(s, before);
    return true;
}

double space_integral(const struct atom_solver *solver, const double *f,
                      double power)
{
    const struct mesh *mesh = &solver->now->mesh;
    double sum = 0.0, slope = 0.0;
    for (int j = 0; j <= P; j++)
        slope += 2.0 / mesh->length * mesh->rule.derivative[0][j] * f[j];
    for (int i = 0; i <= solver->elements * P; i++)
        sum += mesh->weight_y[i] * f[i];
    return sum + mesh_inner(mesh, f[0], slope, power);
}

/* Exchange and correlation of the density in D, into energy and v. */
/* Close to the nucleus the gradient of the density is the small difference of
 * large numbers, and a potential with its second derivative would be noise
 * that the Dirac equation, which knows the slope of the potential, feeds
 * back. There, within 1e-6 of the innermost shell's charge, the potential is
 * continued with the shape of the local one. The energy is not touched. */
static void smooth_core(struct atom_solver *s)
{
    struct atom_space *space = s->now;
    int last = 0;
    while (space->mesh.y[last] < CHOICE.core && last < s->elements * P)
        last += P;
    /* the new potential, not there yet, lends its room */
    double *energy = space->out, *up = energy + space->mesh.points;
    double *down = up + space->mesh.points;
    uniform_lsd(last + 1, space->rho[0], space->rho[1], 0.0, energy, up, down);
    double shift[2] = {space->v[0][last] - up[last],
                       space->v[1][last] - down[last]};
    for (int i = 0; i < last; i++) {
        space->v[0][i] = up[i] + shift[0];
        space->v[1][i] = down[i] + shift[1];
    }
}

static void exchange_correlation(struct atom_solver *s)
{
    struct atom_space *space = s->now;
    int points = s->elements * P + 1;
    double Z = s->Z, c = s->options.relativity == ATOM_DIRAC ? s->c : 0.0;
    const double scale = Z * Z * Z / (4.0 * 3.14159265358979323846);
    for (int k = 0; k < s->channels; k++)
        for (int i = 0; i < points; i++) {
            double y = space->mesh.y[i];
            space->rho[k][i] = scale * space->D[k][i] / (y * y);
        }
    switch (s->options.functional) {
    case ATOM_LDA:
        uniform_lda(points, space->rho[0], c, space->energy, space->v[0]);
        break;
    case ATOM_LSD:
        uniform_lsd(points, space->rho[0], space->rho[1], c, space->energy,
                    space->v[0], space->v[1]);
        break;
    case ATOM_PBE:
    case ATOM_PBE_VWN:
        gradient_density(space->gradient, Z, s->elements, space->rho[0],
                         space->rho[1]);
        gradient_potential(space->gradient,
                           s->options.functional == ATOM_PBE_VWN, space->energy,
                           space->v[0], space->v[1]);
        smooth_core(s);
        break;
    }
}

/* Total energy of the new density: E = Σ f ε - ∫ D V_in + its own potential
 * terms; correct to second order in the difference of new and old. */
static void add_energies(struct atom_solver *s)
{
    struct atom_space *space = s->now;
    const double *y = space->mesh.y;
    double *f = space->scratch, Z = s->Z, z2 = Z * Z;
    int points = s->elements * P + 1;
    for (int i = 0; i < points; i++) {
        f[i] = 0.0;
        for (int k = 0; k < s->channels; k++)
            f[i] += space->D[k][i] * space->q[k * points + i] / y[i];
    }
    double potential = z2 * space_integral(s, f, s->power - 1.0);
    for (int i = 0; i < points; i++)
        f[i] = -space->total[i] / y[i];
    s->result.nuclear = z2 * space_integral(s, f, s->power - 1.0);
    for (int i = 0; i < points; i++)
        f[i] = space->total[i] * space->field[i] / y[i];
    s->result.coulomb = 0.5 * Z * space_integral(s, f, s->power);
    for (int i = 0; i < points; i++)
        f[i] = space->total[i] * space->energy[i];
    s->result.xc = space_integral(s, f, s->power + (s->power - 2.0) / 3.0);
    s->result.kinetic = z2 * radial_sum(space->radial) - potential;
    s->result.total = s->result.kinetic + s->result.nuclear +
                      s->result.coulomb + s->result.xc;
}

/* Potential of the new density, and for the Dirac equation its derivative:
 * that of nucleus and electrons follows from the enclosed charge. */
static void new_potential(struct atom_solver *s, int channel)
{
    struct atom_space *space = s->now;
    const double *y = space->mesh.y, *v = space->v[channel];
    int points = s->elements * P + 1;
    double Z = s->Z, *out = space->out + (ptrdiff_t)channel * points;
    for (int i = 0; i < points; i++)
        out[i] = -1.0 + space->field[i] / Z + y[i] * v[i] / (Z * Z);
    if (s->a2 <= 0.0)
        return;
    out += (ptrdiff_t)s->channels * points;
    mesh_derivative(&space->mesh, s->elements, v, space->scratch);
    for (int i = 0; i < points; i++)
        out[i] =
            1.0 - space->enclosed[i] / Z +
            space->scratch[i] / space->mesh.slope[i] * (y[i] * y[i] / (Z * Z));
}

/* New density and potential from the trial potential. */
static int cycle(struct atom_solver *s)
{
    struct atom_space *space = s->now;
    int points = s->elements * P + 1;
    for (int k = 0; k < s->channels; k++)
        radial_potential(space->radial, k, space->q + (ptrdiff_t)k * points,
                         s->a2 > 0.0
                             ? space->q + (ptrdiff_t)(s->channels + k) * points
                             : NULL);
    int missing =
        s->found ? radial_update(space->radial) : radial_find(space->radial);
    s->found = true;
    for (int k = 0; k < s->channels; k++)
        radial_total(space->radial, k, space->D[k]);
    for (int i = 0; i < points; i++)
        space->total[i] =
            space->D[0][i] + (s->channels > 1 ? space->D[1][i] : 0.0);
    poisson_solve(&space->mesh, s->elements, space->total, s->power,
                  space->enclosed, space->field, space->scratch);
    exchange_correlation(s);
    for (int k = 0; k < s->channels; k++)
        new_potential(s, k);
    add_energies(s);
    return missing;
}

/* Judges the levels of a self-consistent atom. */
static enum atom_state judge(struct atom_solver *s)
{
    struct atom_space *space = s->now;
    double *d = space->scratch;
    for (int i = 0; i < s->count; i++) {
        double energy = s->label[i].energy;
        radial_density(space->radial, i, d);
        double most = 0.0;
        for (int k = 0; k <= s->elements * P; k++)
            most = d[k] > most ? d[k] : most;
        bool far = d[(ptrdiff_t)(s->elements - 1) * P] > CHOICE.tail * most;
        if (!far && energy < 0.0)
            continue;
        if (s->elements < space->mesh.elements)
            return ATOM_OUT_OF_REACH;
        s->culprit = i;
        return energy < 0.0 ? ATOM_OUT_OF_REACH : ATOM_UNBOUND;
    }
    return ATOM_CONVERGED;
}

/* Takes over the energies of the levels; gives one that keeps rising above
 * zero, or -1. */
static int take_levels(struct atom_solver *s)
{
    int free = -1;
    for (int i = 0; i < s->count; i++) {
        double energy = (double)s->Z * s->Z * radial_energy(s->now->radial, i);
        s->label[i].energy = energy;
        s->above[i] += energy >= 0.0 && s->cycles > PATIENCE / 2;
        if (energy >= 0.0 && s->above[i] >= ABOVE && s->cycles >= PATIENCE)
            free = i;
    }
    return free;
}

/* The state of an atom that has not converged yet. */
static enum atom_state judge_waiting(struct atom_solver *s, int missing,
                                     int free)
{
    int limit = s->options.cycles_max > 0 ? s->options.cycles_max : CYCLES_MAX;
    if (free >= 0) {
        s->culprit = free;
        return ATOM_UNBOUND;
    }
    if (s->cycles < limit)
        return ATOM_RUNNING;
    for (int i = 0; i < s->count && missing; i++)
        if (radial_level_state(s->now->radial, i) != RADIAL_FOUND)
            s->culprit = i;
    return missing ? ATOM_LOST : ATOM_UNSETTLED;
}

enum atom_state atom_step(struct atom_solver *solver)
{
    struct atom_solver *s = solver;
    if (s->state != ATOM_RUNNING)
        return s->state;
    int missing = cycle(s);
    s->cycles++;
    int free = take_levels(s);
    s->residual =
        s->Z * mixer_next(s->now->mixer, s->now->weight,
                          s->cycles > 1 || s->warm ? CHOICE.mixing
                                                   : CHOICE.first_mixing,
                          s->now->q, s->now->out);
    double change = fabs(s->result.total - s->last_total);
    s->last_total = s->result.total;
    if (missing > 0 || !(s->residual < CHOICE.residual) ||
        !(change <
          CHOICE.energy + CHOICE.energy_part * fabs(s->result.total))) {
        s->state = judge_waiting(s, missing, free);
        return s->state;
    }
    s->state = judge(s);
    if (s->state == ATOM_OUT_OF_REACH && s->culprit < 0) {
        /* the same again on a longer mesh */
        s->state = ATOM_RUNNING;
        start(s, s->now->mesh.elements, false);
    }
    return s->state;
}

enum atom_state atom_solve(struct atom_solver *solver)
{
    while (atom_step(solver) == ATOM_RUNNING)
        ;
    return solver->state;
}

enum atom_state atom_result_state(const struct atom_solver *solver)
{
    return solver->state;
}

int atom_culprit(const struct atom_solver *solver)
{
    return solver->culprit;
}

int atom_cycles(const struct atom_solver *solver)
{
    return solver->cycles;
}

double atom_residual(const struct atom_solver *solver)
{
    return solver->residual;
}

struct atom_energy atom_energies(const struct atom_solver *solver)
{
    return solver->result;
}

int atom_level_count(const struct atom_solver *solver)
{
    return solver->count;
}

struct atom_level atom_level_at(const struct atom_solver *solver, int i)
{
    return solver->label[i];
}
