/* SPDX-License-Identifier: MIT */
#include "atom/hybrid.h"

#include <assert.h>
#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "atom/shape.h"
#include "atom/solver.h"
#include "atom/term.h"
#include "numeric/repulsion.h"

enum { P = LOBATTO_ORDER, SHELLS = 2 * SUBSHELL_MAX, SHAPE_ARRAYS = 20 };

/* Part of exact exchange. */
static const double QUARTER = 0.25;

/* Bounds of E_c[revTPSS]/E_c[PBE], wider than what atoms and ions reach, and
 * hartree for rounding. */
static const double RATIO_LEAST = 0.99, RATIO_MOST = 1.25,
                    RATIO_ROUNDING = 1e-9;

/* A subshell in one spin channel: its electrons and large component, averaged
 * over j by 2j+1 and normalised. */
struct shell {
    int n, l, spin;
    double f;
    double *p;
};

struct hybrid {
    const struct atom_solver *solver;
    int points, capacity, count;
    struct shell shell[SHELLS];
    struct repulsion repulsion;
    double *p; /* functions of the shells */
    double *tau[2], *one, *two, *three, *shape;
    double *block;
};

struct hybrid *hybrid_new(struct status *st)
{
    struct hybrid *h = calloc(1, sizeof *h);
    if (!h)
        status_fail(st, STATUS_MEMORY, "out of memory for the hybrid energy");
    return h;
}

void hybrid_free(struct hybrid *hybrid)
{
    if (!hybrid)
        return;
    repulsion_clear(&hybrid->repulsion);
    free(hybrid->block);
    free(hybrid);
}

/* Work space for the mesh of a solver, with its tables. */
static bool prepare(struct hybrid *h, const struct atom_solver *solver,
                    struct status *st)
{
    const struct mesh *mesh = &solver->now->mesh;
    h->solver = solver;
    h->points = solver->elements * P + 1;
    if (h->capacity == mesh->points)
        return true;
    size_t n = (size_t)mesh->points;
    free(h->block);
    h->block = NULL;
    repulsion_clear(&h->repulsion);
    h->capacity = 0;
    if (!repulsion_init(&h->repulsion, mesh, st))
        return false;
    h->block = calloc(n * (SHELLS + 5 + SHAPE_ARRAYS), sizeof *h->block);
    if (!h->block)
        return status_fail(st, STATUS_MEMORY,
                           "out of memory for a hybrid energy on %zu points",
                           n);
    h->capacity = mesh->points;
    double *at = h->block;
    h->p = at;
    at += n * SHELLS;
    h->tau[0] = at;
    h->tau[1] = at + n;
    h->one = at + 2 * n;
    h->two = at + 3 * n;
    h->three = at + 4 * n;
    h->shape = at + 5 * n;
    return true;
}

/* Adds f/(8π) [ (d(P/y)/dy)² + l(l+1) P²/y⁴ ] to tau, in units of Z⁵. */
static void add_kinetic(struct hybrid *h, double f, int l, const double *p,
                        double *tau)
{
    const struct mesh *mesh = &h->solver->now->mesh;
    double *slope = h->two, factor = f / (8.0 * 3.14159265358979323846);
    mesh_derivative(mesh, h->solver->elements, p, slope);
    for (int i = 0; i < h->points; i++) {
        double y = mesh->y[i];
        double d = (slope[i] / mesh->slope[i] - p[i] / y) / y;
        double a = p[i] / (y * y);
        tau[i] += factor * (d * d + l * (l + 1.0) * a * a);
    }
}

/* Fills the shells and the kinetic energy densities. */
static void take_shells(struct hybrid *h)
{
    const struct atom_solver *s = h->solver;
    const struct mesh *mesh = &s->now->mesh;
    h->count = 0;
    memset(h->tau[0], 0, (size_t)h->points * sizeof(double));
    memset(h->tau[1], 0, (size_t)h->points * sizeof(double));
    for (int i = 0; i < s->count; i++) {
        const struct atom_level *level = &s->label[i];
        struct shell *a = h->count > 0 ? &h->shell[h->count - 1] : NULL;
        if (!a || a->n != level->n || a->l != level->l ||
            a->spin != level->spin) {
            a = &h->shell[h->count];
            *a = (struct shell){level->n, level->l, level->spin, 0.0,
                                h->p + (size_t)h->count * (size_t)h->capacity};
            h->count++;
            memset(a->p, 0, (size_t)h->points * sizeof *a->p);
        }
        radial_functions(s->now->radial, i, h->one, NULL);
        add_kinetic(h, level->occ, level->l, h->one,
                    h->tau[level->spin > 0 ? 0 : 1]);
        double sign = h->one[P] < 0.0 ? -1.0 : 1.0;
        for (int k = 0; k < h->points; k++)
            a->p[k] += sign * level->occ * h->one[k];
        a->f += level->occ;
    }
    for (int c = 0; c < h->count; c++) {
        double norm = 0.0, *p = h->shell[c].p;
        for (int k = 0; k < h->points; k++)
            norm += mesh->weight_y[k] * p[k] * p[k];
        norm = 1.0 / sqrt(norm);
        for (int k = 0; k < h->points; k++)
            p[k] *= norm;
    }
}

/* R^k of two shells, in units of Z. */
static double repulsion(const struct hybrid *h, const double *a,
                        const double *b, int k)
{
    return repulsion_integral(&h->repulsion, h->solver->elements, a, b, k);
}

static double exact_exchange(struct hybrid *h)
{
    double sum = 0.0;
    for (int i = 0; i < h->count; i++) {
        const struct shell *a = &h->shell[i];
        int l = a->l;
        sum += 0.5 * a->f * repulsion(h, a->p, a->p, 0);
        double pairs = 0.5 * a->f * (a->f - 1.0);
        if (a->f < 1.0)
            pairs = 0.0;
        for (int k = 2; k <= 2 * l && pairs > 0.0; k += 2)
            sum += pairs * (2 * l + 1) / (2.0 * l) * atom_three_j(l, k, l) *
                   repulsion(h, a->p, a->p, k);
        for (int j = 0; j < i; j++) {
            const struct shell *b = &h->shell[j];
            if (b->spin != a->spin)
                continue;
            for (int k = abs(l - b->l); k <= l + b->l; k += 2)
                sum += a->f * b->f * atom_three_j(l, k, b->l) *
                       repulsion(h, a->p, b->p, k);
        }
    }
    return -sum * h->solver->Z;
}

double hybrid_slater(const struct hybrid *hybrid, int n, int l, int k)
{
    double sum = 0.0, f = 0.0;
    const struct hybrid *h = hybrid;
    for (int i = 0; i < h->count; i++)
        if (h->shell[i].n == n && h->shell[i].l == l) {
            const double *p = h->shell[i].p;
            sum += h->shell[i].f * repulsion(h, p, p, k);
            f += h->shell[i].f;
        }
    return f > 0.0 ? h->solver->Z * sum / f : 0.0;
}

double atom_zeta(const struct atom_solver *solver, int n, int l)
{
    double sum = 0.0, occ = 0.0;
    for (int i = 0; i < solver->count; i++) {
        const struct atom_level *level = &solver->label[i];
        if (level->n != n || level->l != l || l == 0)
            continue;
        double sign = level->twice_j > 2 * l ? 1.0 : -1.0;
        /* both levels of a spin have occupations in the ratio of 2j+1 */
        double f = level->occ * (2 * l + 1) / (0.5 * (level->twice_j + 1));
        sum += sign * f * level->energy / (l + 0.5);
        occ += 0.5 * f;
    }
    return occ > 0.0 ? sum / occ : 0.0;
}

double hybrid_spin_orbit(const struct hybrid *hybrid, const struct term *term)
{
    const struct configuration *c = &hybrid->solver->configuration;
    struct open_subshell open[SUBSHELL_MAX];
    int count = 0;
    for (int i = 0; i < c->count; i++) {
        const struct subshell *s = &c->shells[i];
        if (s->occ > 4 * s->l + 1.5 || s->occ < 0.5)
            continue;
        struct open_subshell *o = &open[count++];
        *o =
            (struct open_subshell){.l = s->l, .electrons = (int)lround(s->occ)};
        if (s->l == 0)
            continue;
        o->zeta = atom_zeta(hybrid->solver, s->n, s->l);
        o->f2 = hybrid_slater(hybrid, s->n, s->l, 2);
        if (s->l > 1)
            o->f4 = hybrid_slater(hybrid, s->n, s->l, 4);
        if (s->l > 2)
            o->f6 = hybrid_slater(hybrid, s->n, s->l, 6);
    }
    return atom_term_spin_orbit(open, count, term);
}

/* Terms belong to whole numbers of electrons. */
static bool is_whole(double occ)
{
    return fabs(occ - (double)lround(occ)) < 1e-6;
}

/* ΔLS of all open d and f subshells. */
static double term_shift(struct hybrid *h)
{
    double sum = 0.0;
    const struct configuration *c = &h->solver->configuration;
    for (int i = 0; i < c->count; i++) {
        const struct subshell *s = &c->shells[i];
        if (s->l < 2 || !is_whole(s->occ))
            continue;
        double f2 = hybrid_slater(h, s->n, s->l, 2);
        double f4 = hybrid_slater(h, s->n, s->l, 4);
        double f6 = s->l > 2 ? hybrid_slater(h, s->n, s->l, 6) : 0.0;
        sum += atom_term_hund_shift(s->l, (int)lround(s->occ), f2, f4, f6);
    }
    return sum;
}

static const double *shell_function(const struct hybrid *h, int n, int l,
                                    int spin, const double *none)
{
    for (int i = 0; i < h->count; i++)
        if (h->shell[i].n == n && h->shell[i].l == l &&
            h->shell[i].spin == spin)
            return h->shell[i].p;
    return none;
}

/* ΔP of all open p subshells. p_z against p_x and p_y: the multipole that
 * repels itself is 2/5 F² wide, ½ (2/5)² F² = 0.08 F². */
static double shape_shift(struct hybrid *h, double *of_correlation)
{
    const struct atom_solver *s = h->solver;
    const struct configuration *c = &s->configuration;
    double sum = 0.0;
    *of_correlation = 0.0;
    memset(h->one, 0, (size_t)h->points * sizeof *h->one);
    for (int i = 0; i < c->count; i++) {
        const struct subshell *p = &c->shells[i];
        int electrons = (int)lround(p->occ);
        if (p->l != 1 || !is_whole(p->occ) || electrons % 3 == 0)
            continue;
        struct shape shape = {.mesh = &s->now->mesh,
                              .Z = s->Z,
                              .elements = s->elements,
                              .work = h->shape};
        for (int spin = 0; spin < 2; spin++) {
            int held = spin == 0 ? (electrons < 3 ? electrons : 3)
                                 : (electrons < 3 ? 0 : electrons - 3);
            shape.rho[spin] = s->now->rho[spin];
            shape.tau[spin] = h->tau[spin];
            shape.p[spin] = shell_function(h, p->n, p->l, 1 - 2 * spin, h->one);
            shape.axial[spin] = held == 1 ? 1 : held == 2 ? -1 : 0;
        }
        double exchange, correlation;
        shape_change(&shape, s->now->gradient, &exchange, &correlation);
        sum +=
            (1.0 - QUARTER) * (0.08 * hybrid_slater(h, p->n, 1, 2) + exchange);
        *of_correlation += correlation;
    }
    return sum + *of_correlation;
}

bool hybrid_correlation_sound(double correlation, double correlation_pbe,
                              bool one_spin)
{
    double least = one_spin ? 0.0 : RATIO_LEAST;
    return isfinite(correlation) &&
           correlation <= least * correlation_pbe + RATIO_ROUNDING &&
           correlation >= RATIO_MOST * correlation_pbe - RATIO_ROUNDING;
}

/* Sums up, with and without the correlation that may not be sound. */
static void add_up(const struct hybrid *h, struct hybrid_energy *energy,
                   double of_shape)
{
    bool one_spin = true;
    for (int i = 0; i < h->count; i++)
        one_spin = one_spin && h->shell[i].spin == h->shell[0].spin;
    energy->sound = hybrid_correlation_sound(energy->correlation,
                                             energy->correlation_pbe, one_spin);
    double rest = h->solver->result.total - h->solver->result.xc;
    energy->lsd = h->solver->result.total;
    energy->pbe = rest + energy->exchange_pbe + energy->correlation_pbe;
    energy->total = rest + (1.0 - QUARTER) * energy->exchange_pbe +
                    QUARTER * (energy->exchange_exact + energy->term) +
                    energy->correlation + energy->shape;
    energy->with_pbe = rest + (1.0 - QUARTER) * energy->exchange_pbe +
                       QUARTER * (energy->exchange_exact + energy->term) +
                       energy->correlation_pbe + (energy->shape - of_shape);
}

static double weigh(const struct hybrid *h, const double *energy)
{
    const struct atom_space *space = h->solver->now;
    double sum = 0.0;
    for (int i = 0; i < h->points; i++)
        sum += space->mesh.weight_y[i] * space->total[i] * energy[i];
    return sum;
}

bool hybrid_evaluate(struct hybrid *hybrid, struct atom_solver *solver,
                     struct hybrid_energy *energy, struct status *st)
{
    struct hybrid *h = hybrid;
    struct atom_space *space = solver->now;
    assert(solver->state == ATOM_CONVERGED && solver->channels == 2);
    if (!prepare(h, solver, st) || !space_gradient(space, st))
        return false;
    take_shells(h);
    double Z = solver->Z, z5 = Z * Z * Z * Z * Z;
    for (int c = 0; c < 2; c++)
        for (int i = 0; i < h->points; i++)
            h->tau[c][i] *= z5;
    gradient_density(space->gradient, Z, solver->elements, space->rho[0],
                     space->rho[1]);
    gradient_exchange(space->gradient, h->one);
    energy->exchange_pbe = weigh(h, h->one);
    gradient_correlation(space->gradient, false, h->one);
    energy->correlation_pbe = weigh(h, h->one);
    gradient_meta_correlation(space->gradient, h->tau[0], h->tau[1], h->one);
    energy->correlation = weigh(h, h->one);
    energy->exchange_exact = exact_exchange(h);
    energy->term = term_shift(h);
    double of_shape;
    energy->shape = shape_shift(h, &of_shape);
    add_up(h, energy, of_shape);
    return true;
}
