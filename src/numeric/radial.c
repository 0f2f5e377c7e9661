/* SPDX-License-Identifier: MIT */
#include "numeric/radial.h"

#include <assert.h>
#include <float.h>
#include <math.h>
#include <stdint.h>
#include <stdlib.h>
#include <string.h>

#include "numeric/lanes.h"

enum {
    P = LOBATTO_ORDER,
    GROUPS = RADIAL_LEVELS_MAX / 2 + RADIAL_CHANNELS,
    BISECTIONS = 9, /* of WKB energies: to 3 % */
    RESCALE = 4,    /* steps of a search between rescalings */
    SERIES = 7,     /* terms of the expansion at the origin */
    FIND_MAX = 200, /* steps before a search is given up */
};

/* A search ends when a Rayleigh quotient moves the energy by less than this
 * part of it: the step is of third order, and further ones follow. */
static const double FOUND = 1e-3;
/* First part of the energy by which a search moves when it can only guess. */
static const double NUDGE = 0.06;
/* Change of the highest energy of a group, relative, at which its reach is
 * found anew. */
static const double REACH_KEPT = 0.01;
/* A first-order shift is followed up to this part of the energy. */
static const double SHIFT_MAX = 0.3, SHIFT_SMALL = 0.03;

/* Search of one level. Energies lo and hi with at most, and more than `nodes`
 * levels below. */
struct search {
    double lo, hi;
    bool open; /* hi is not known to be above */
    bool lost; /* must be found anew */
    int tries; /* energies that were no more than guessed */
};

struct radial {
    struct lane_work work;
    struct lane_channel channel[RADIAL_CHANNELS];
    const struct lane_kernel *kernel;
    int elements, count, groups;
    struct radial_level level[RADIAL_LEVELS_MAX];
    struct search search[RADIAL_LEVELS_MAX];
    int member[GROUPS][LANES_MAX]; /* level of each lane */
    struct lane_group group[GROUPS];
    double *origin; /* of work, writable */
    double *sum;    /* densities of a channel by lane, points × width */
    double *block;
    int room; /* groups that have arrays */
};

static double *take(double **at, size_t n)
{
    double *p = *at;
    *at += (n + 3) / 4 * 4;
    return p;
}

/* Hands out the arrays, each aligned for the widest vectors; with at = NULL
 * only counts the numbers needed. */
static size_t carve(struct radial *r, double *base)
{
    size_t n = (size_t)r->work.mesh->points;
    size_t width = (size_t)r->kernel->width;
    size_t factor = (size_t)r->work.mesh->elements * LANES_FACTOR;
    double *at = base;
    r->work.stiffness = take(&at, LANES_TRIANGLE * width);
    r->work.derivative = take(&at, LOBATTO_POINTS * LOBATTO_POINTS);
    r->work.schwarz = take(&at, n);
    r->work.mass = take(&at, n);
    r->work.centrifugal = take(&at, n);
    r->work.square = take(&at, n);
    r->work.factor = take(&at, factor * width);
    r->work.norm = take(&at, n * width);
    r->work.right = take(&at, n * width);
    r->sum = take(&at, n * width);
    r->work.origin = r->origin = take(&at, n);
    for (int c = 0; c < RADIAL_CHANNELS; c++) {
        struct lane_channel *ch = &r->channel[c];
        double **array[] = {&ch->v,    &ch->base,   &ch->moved, &ch->radial,
                            &ch->bent, &ch->square, &ch->beta};
        for (size_t k = 0; k < sizeof array / sizeof *array; k++)
            *array[k] = take(&at, n);
    }
    for (int g = 0; g < r->room; g++) {
        r->group[g].chi = take(&at, n * width);
        r->group[g].density = take(&at, n * width);
    }
    return (size_t)(at - base);
}

static void fill_tables(struct radial *r)
{
    const struct mesh *mesh = r->work.mesh;
    int width = r->kernel->width;
    double *stiffness = (double *)(uintptr_t)r->work.stiffness;
    double *derivative = (double *)(uintptr_t)r->work.derivative;
    double *schwarz = (double *)(uintptr_t)r->work.schwarz;
    double *mass = (double *)(uintptr_t)r->work.mass;
    double *centrifugal = (double *)(uintptr_t)r->work.centrifugal;
    double *square = (double *)(uintptr_t)r->work.square;
    for (int i = 0; i <= P; i++)
        for (int j = 0; j <= i; j++)
            for (int k = 0; k < width; k++)
                *stiffness++ = mesh->rule.stiffness[i][j];
    for (int i = 0; i <= P; i++)
        for (int j = 0; j <= P; j++)
            *derivative++ = mesh->rule.derivative[i][j];
    for (int i = 0; i < mesh->points; i++) {
        double hw = 0.5 * mesh->length * mesh->weight[i];
        double relative = mesh->slope[i] / mesh->y[i];
        schwarz[i] = hw * mesh->schwarz[i];
        mass[i] = hw * mesh->slope[i] * mesh->slope[i];
        centrifugal[i] = hw * relative * relative;
        square[i] = 2.0 * mesh->weight[i] * mesh->slope[i] * mesh->slope[i];
    }
}

static const struct lane_kernel *choose_kernel(int width)
{
#if defined(__x86_64__)
    if (width != 2 && __builtin_cpu_supports("avx2"))
        return &lanes_four;
#endif
    (void)width;
    return &lanes_two;
}

struct radial *radial_new(const struct mesh *mesh, int width, struct status *st)
{
    /* the vectors in it need more than malloc's alignment */
    struct radial *r = aligned_alloc(LANES_ALIGN, sizeof *r);
    if (!r) {
        status_fail(st, STATUS_MEMORY, "radial solver");
        return NULL;
    }
    memset(r, 0, sizeof *r);
    r->work.mesh = mesh;
    r->kernel = choose_kernel(width);
    r->room = (RADIAL_LEVELS_MAX + r->kernel->width - 1) / r->kernel->width +
              RADIAL_CHANNELS - 1;
    static double nothing[1];
    size_t total = carve(r, nothing) + LANES_ALIGN / sizeof(double);
    /* calloc: memory that is not touched costs nothing */
    r->block = calloc(total, sizeof *r->block);
    if (!r->block) {
        free(r);
        status_fail(st, STATUS_MEMORY, "radial solver, %d points",
                    mesh->points);
        return NULL;
    }
    uintptr_t odd = (uintptr_t)r->block % LANES_ALIGN;
    carve(r, r->block + (odd ? (LANES_ALIGN - odd) / sizeof(double) : 0));
    fill_tables(r);
    return r;
}

void radial_free(struct radial *radial)
{
    if (!radial)
        return;
    free(radial->block);
    free(radial);
}

/* Lanes are filled in the order of the list, one channel after the other. */
static void make_groups(struct radial *r)
{
    int width = r->kernel->width;
    r->groups = 0;
    for (int c = 0; c < RADIAL_CHANNELS; c++) {
        struct lane_group *g = NULL;
        for (int i = 0; i < r->count; i++) {
            if (r->level[i].channel != c)
                continue;
            if (!g || g->used == width) {
                assert(r->groups < r->room);
                g = &r->group[r->groups++];
                g->channel = c;
                g->used = 0;
                g->filled = r->elements;
                g->elements = r->elements;
                g->reached = 0.0;
            }
            r->member[g - r->group][g->used++] = i;
        }
    }
    for (int k = 0; k < r->groups; k++) {
        struct lane_group *g = &r->group[k];
        for (int lane = 0; lane < width; lane++) {
            int from = lane < g->used ? lane : g->used - 1;
            r->member[k][lane] = r->member[k][from];
            double kappa = r->level[r->member[k][lane]].kappa;
            g->kappa[lane] = kappa;
            g->centrifugal[lane] = kappa * (kappa + 1.0);
        }
    }
}

/* In the Coulomb field of the origin F is -a2/2 slope/y / (2y + a2); its
 * derivative belongs to G where only its sign and size are asked for. */
static void fill_origin(struct radial *r)
{
    const struct mesh *mesh = r->work.mesh;
    double a2 = r->work.a2;
    for (int i = 0; i <= r->elements * P; i++) {
        double d = 2.0 * mesh->y[i] + a2;
        r->origin[i] = 0.5 * mesh->length * mesh->weight[i] * a2 *
                       mesh->slope[i] / (d * d);
    }
}

void radial_begin(struct radial *radial, double a2, int elements, int count,
                  const struct radial_level *levels)
{
    assert(count <= RADIAL_LEVELS_MAX && a2 >= 0.0 && a2 < 1.0);
    assert(elements >= 1 && elements <= radial->work.mesh->elements);
    radial->work.a2 = a2;
    radial->elements = elements;
    radial->count = count;
    memcpy(radial->level, levels, (size_t)count * sizeof *levels);
    memset(radial->search, 0, sizeof radial->search);
    for (int i = 0; i < count; i++)
        radial->search[i].lost = true;
    make_groups(radial);
    fill_origin(radial);
}

void radial_potential(struct radial *radial, int channel, const double *q,
                      const double *force)
{
    const struct mesh *mesh = radial->work.mesh;
    struct lane_channel *c = &radial->channel[channel];
    int points = radial->elements * P + 1;
    for (int i = 0; i < points; i++) {
        double v = q[i] / mesh->y[i];
        c->moved[i] = mesh->weight_y[i] * (v - c->v[i]);
        c->v[i] = v;
        c->base[i] = radial->work.schwarz[i] + 2.0 * radial->work.mass[i] * v;
    }
    if (radial->work.a2 <= 0.0)
        return;
    if (!force)
        mesh_derivative(mesh, radial->elements, q, c->beta);
    for (int i = 0; i < points; i++) {
        double y = mesh->y[i], slope = mesh->slope[i];
        double v1 =
            force ? force[i] / (y * y) : (c->beta[i] / slope - c->v[i]) / y;
        double mass = radial->work.mass[i];
        c->beta[i] = slope * v1;
        c->radial[i] = 2.0 * mass * v1 / y;
        c->bent[i] = mass / slope * mesh->bend[i] * v1;
        c->square[i] = mass * v1 * v1;
    }
}

/* Power series at the origin, P = y^γ Σ a_k y^k, Q = y^γ Σ b_k y^k, in the
 * potential -1/y + v0: sets the boundary condition χ_t/χ at the first point
 * and the integral of the density below it. */
static void set_boundary(const struct radial *r, struct lane_group *g, int lane)
{
    const struct mesh *mesh = r->work.mesh;
    const struct lane_channel *c = &r->channel[g->channel];
    double a2 = r->work.a2, kappa = g->kappa[lane], y = mesh->y[0];
    double gamma = sqrt(kappa * kappa - a2);
    double e = g->energy[lane] - (c->v[0] + 1.0 / y);
    double a, b, power = 1.0, p, dp;
    if (kappa < 0.0) {
        a = 1.0;
        b = -1.0 / (gamma - kappa);
    } else {
        a = a2 / (gamma + kappa);
        b = 1.0;
    }
    p = a;
    dp = gamma * a;
    for (int k = 1; k < SERIES; k++) {
        /* (γ+k+κ) a_k - a2 b_k = (2 + a2 e) b_{k-1};
         * a_k + (γ+k-κ) b_k = -e a_{k-1} */
        double s = (2.0 + a2 * e) * b, t = -e * a;
        double f = gamma + k, det = k * (2.0 * gamma + k);
        a = ((f - kappa) * s + a2 * t) / det;
        b = ((f + kappa) * t - s) / det;
        power *= y;
        p += a * power;
        dp += (f)*a * power;
    }
    double rise = dp / p; /* y P'/P */
    /* χ_t/χ + F = slope P'/P - bend/2 */
    double slope = mesh->slope[0] / y * rise - 0.5 * mesh->bend[0];
    g->slope[lane] = 0.5 * mesh->length * slope;
    double s = 2.0 * gamma, more = 2.0 * rise - s;
    g->inner[lane] = y * ((1.0 - more) / (s + 1.0) + more / (s + 2.0));
}

static void step(struct radial *r, struct lane_group *g)
{
    const struct lane_channel *c = &r->channel[g->channel];
    for (int lane = 0; lane < r->kernel->width; lane++)
        set_boundary(r, g, lane);
    double highest = g->energy[0];
    for (int lane = 1; lane < r->kernel->width; lane++)
        highest = fmax(highest, g->energy[lane]);
    /* looked up again when the highest level has moved */
    if (fabs(highest - g->reached) > REACH_KEPT * fabs(highest)) {
        g->elements = r->kernel->reach(&r->work, c, g, r->elements);
        g->reached = highest;
    }
    r->kernel->step(&r->work, c, g);
}

/* Hydrogen-like energy, below every level of a screened potential. */
static double lowest(double a2, double kappa, int nodes)
{
    double gamma = sqrt(kappa * kappa - a2), n = nodes + fabs(kappa);
    if (kappa > 0.0)
        n += 1.0;
    double nr = n - fabs(kappa) + gamma;
    if (a2 <= 0.0)
        return -0.5 / (n * n);
    double root = sqrt(nr * nr + a2);
    /* (nr/√(nr²+a2) - 1)/a2 without cancellation */
    return -1.0 / (root * (root + nr));
}

/* Energies of the lost levels at which the WKB phase is (nodes + ½)π, by
 * bisection in ln(-E) with all lanes at once. In t the centrifugal term has
 * Langer's form by itself. */
static void guess(struct radial *r, int k)
{
    struct lane_group *g = &r->group[k];
    const struct lane_channel *c = &r->channel[g->channel];
    const double pi = acos(-1.0);
    double lo[LANES_MAX], hi[LANES_MAX], goal[LANES_MAX], kept[LANES_MAX];
    int width = r->kernel->width;
    for (int lane = 0; lane < width; lane++) {
        const struct radial_level *level = &r->level[r->member[k][lane]];
        struct search *s = &r->search[r->member[k][lane]];
        kept[lane] = g->energy[lane];
        s->lo = 1.001 * lowest(r->work.a2, level->kappa, level->nodes);
        s->hi = -1e-9;
        s->open = true;
        s->tries = 0;
        lo[lane] = log(-s->lo);
        hi[lane] = lo[lane] - 14.0;
        goal[lane] = (level->nodes + 0.5) * pi;
    }
    for (int step = 0; step < BISECTIONS; step++) {
        for (int lane = 0; lane < width; lane++)
            g->energy[lane] = -exp(0.5 * (lo[lane] + hi[lane]));
        r->kernel->phase(&r->work, c, g, r->elements);
        for (int lane = 0; lane < width; lane++) {
            double middle = 0.5 * (lo[lane] + hi[lane]);
            if (g->below[lane] < goal[lane])
                lo[lane] = middle;
            else
                hi[lane] = middle;
        }
    }
    for (int lane = 0; lane < width; lane++)
        g->energy[lane] = r->search[r->member[k][lane]].lost
                              ? -exp(0.5 * (lo[lane] + hi[lane]))
                              : kept[lane];
}

/* A next energy when the quotient is of no use: away from `energy` to the
 * side where the level is, by parts that double from try to try, and halfway
 * within the bracket once that is narrower; upwards without end as long as
 * the upper end is open. */
static double between(struct search *s, double energy)
{
    bool above = energy >= s->hi;
    double part = NUDGE * (double)(1 << (s->tries < 8 ? s->tries : 8));
    s->tries++;
    if (s->open && s->lo >= s->hi) {
        s->hi = s->lo > 0.0 ? 4.0 * s->lo : 1e-9;
        return s->hi;
    }
    if (s->hi < 0.0) {
        double near_it = above ? energy * (1.0 + part) : energy / (1.0 + part);
        double middle = -sqrt(s->lo * s->hi);
        return above ? fmax(near_it, middle) : fmin(near_it, middle);
    }
    if (s->lo < 0.0)
        return s->lo < -1e-9 ? -1e-9 : 0.5 * (s->lo + s->hi);
    return 0.5 * (s->lo + s->hi);
}

/* Judges a step of a searched level; returns the next energy. */
static double judge(struct search *s, int nodes, double energy, double below,
                    double shift)
{
    bool above = below > nodes;
    if (above) {
        s->hi = energy;
        s->open = false;
    } else {
        s->lo = energy;
    }
    double next = energy + shift;
    bool near_it = above ? below < nodes + 1.5 : below > nodes - 0.5;
    bool fits = near_it && isfinite(next) &&
                (s->open ? next > s->lo : next <= s->hi && next >= s->lo);
    if (fits && fabs(shift) <= FOUND * (fabs(energy) + 1e-9)) {
        s->lost = false;
        return next;
    }
    return fits ? next : between(s, energy);
}

static bool any_lost(const struct radial *r, int k)
{
    for (int lane = 0; lane < r->group[k].used; lane++)
        if (r->search[r->member[k][lane]].lost)
            return true;
    return false;
}

/* Finds the lost levels of a group; the others keep their energies and are
 * iterated along. Gives the number not found. */
static int find_group(struct radial *r, int k)
{
    struct lane_group *g = &r->group[k];
    int width = r->kernel->width, missing = 0;
    for (int turn = 0; turn < FIND_MAX && any_lost(r, k); turn++) {
        step(r, g);
        if (turn % RESCALE == RESCALE - 1)
            r->kernel->rescale(&r->work, g);
        for (int lane = 0; lane < g->used; lane++) {
            int i = r->member[k][lane];
            if (!r->search[i].lost)
                continue;
            g->energy[lane] =
                judge(&r->search[i], r->level[i].nodes, g->energy[lane],
                      g->below[lane], g->shift[lane]);
        }
        for (int lane = g->used; lane < width; lane++)
            g->energy[lane] = g->energy[g->used - 1];
    }
    for (int lane = 0; lane < g->used; lane++)
        missing += r->search[r->member[k][lane]].lost;
    r->kernel->density(&r->work, &r->channel[g->channel], g);
    return missing;
}

int radial_find(struct radial *radial)
{
    int missing = 0;
    for (int k = 0; k < radial->groups; k++) {
        struct lane_group *g = &radial->group[k];
        int n = (radial->elements * P + 1) * radial->kernel->width;
        for (int i = 0; i < n; i++)
            g->chi[i] = 1.0;
        g->filled = radial->elements;
        for (int lane = 0; lane < g->used; lane++)
            radial->search[radial->member[k][lane]].lost = true;
        guess(radial, k);
        missing += find_group(radial, k);
    }
    return missing;
}

/* Whether a step led nearer to the level itself: as many levels below as it
 * has nodes (then it lies above) or one more, and a shift to that side, unless
 * it is small. A step towards a neighbour shows in the next count. */
static bool fits(int nodes, double energy, double below, double shift)
{
    bool above = below > nodes + 0.5;
    double size = fabs(shift), whole = fabs(energy);
    return isfinite(shift) && below > nodes - 0.5 && below < nodes + 1.5 &&
           (size < SHIFT_SMALL * whole ||
            (size < SHIFT_MAX * whole && (shift < 0.0) == above));
}

/* One step of every lane; lost levels are searched for from the whole
 * range. */
static int update_group(struct radial *r, int k)
{
    struct lane_group *g = &r->group[k];
    bool lost = false;
    step(r, g);
    for (int lane = 0; lane < g->used; lane++) {
        int i = r->member[k][lane];
        bool good = fits(r->level[i].nodes, g->energy[lane], g->below[lane],
                         g->shift[lane]);
        r->search[i].lost = !good;
        lost |= !good;
        if (good)
            g->energy[lane] += g->shift[lane];
    }
    for (int lane = g->used; lane < r->kernel->width; lane++)
        g->energy[lane] = g->energy[g->used - 1];
    if (lost) {
        guess(r, k);
        return find_group(r, k);
    }
    r->kernel->density(&r->work, &r->channel[g->channel], g);
    return 0;
}

int radial_update(struct radial *radial)
{
    int missing = 0;
    for (int k = 0; k < radial->groups; k++) {
        struct lane_group *g = &radial->group[k];
        radial->kernel->moved(&radial->work, &radial->channel[g->channel], g);
        for (int lane = 0; lane < radial->kernel->width; lane++) {
            double most = SHIFT_MAX * fabs(g->energy[lane]);
            double shift = g->shift[lane];
            g->energy[lane] += shift > most    ? most
                               : shift < -most ? -most
                                               : shift;
        }
        missing += update_group(radial, k);
    }
    return missing;
}

int radial_settle(struct radial *radial, double tolerance)
{
    int missing = 0;
    for (int k = 0; k < radial->groups; k++) {
        struct lane_group *g = &radial->group[k];
        bool moving = true;
        for (int turn = 0; turn < 12 && moving; turn++) {
            double before[LANES_MAX];
            memcpy(before, g->energy, sizeof before);
            if (update_group(radial, k) > 0)
                break;
            moving = false;
            for (int lane = 0; lane < g->used; lane++)
                moving |= fabs(g->energy[lane] - before[lane]) >
                          tolerance * fabs(g->energy[lane]);
        }
        for (int lane = 0; lane < g->used; lane++)
            missing += radial->search[radial->member[k][lane]].lost;
    }
    return missing;
}

/* Group and lane of a level. */
static const struct lane_group *locate(const struct radial *r, int i, int *lane)
{
    for (int k = 0; k < r->groups; k++)
        for (int l = 0; l < r->group[k].used; l++)
            if (r->member[k][l] == i) {
                *lane = l;
                return &r->group[k];
            }
    assert(!"no such level");
    return NULL;
}

enum radial_state radial_level_state(const struct radial *radial, int i)
{
    return radial->search[i].lost ? RADIAL_UNSETTLED : RADIAL_FOUND;
}

double radial_energy(const struct radial *radial, int i)
{
    int lane;
    return locate(radial, i, &lane)->energy[lane];
}

void radial_density(const struct radial *radial, int i, double *density)
{
    int lane, width = radial->kernel->width;
    const struct lane_group *g = locate(radial, i, &lane);
    memset(density, 0, (size_t)radial->work.mesh->points * sizeof *density);
    for (int k = 0; k <= g->filled * P; k++)
        density[k] = g->density[k * width + lane];
}

double radial_power(const struct radial *radial, int i)
{
    double kappa = radial->level[i].kappa;
    return sqrt(kappa * kappa - radial->work.a2);
}

void radial_functions(const struct radial *radial, int i, double *p, double *q)
{
    int lane, width = radial->kernel->width;
    const struct lane_group *g = locate(radial, i, &lane);
    const struct mesh *mesh = radial->work.mesh;
    const struct lane_channel *c = &radial->channel[g->channel];
    double a2 = radial->work.a2;
    memset(p, 0, (size_t)mesh->points * sizeof *p);
    for (int k = 0; k <= g->filled * P; k++)
        p[k] = g->chi[k * width + lane];
    if (q) {
        memset(q, 0, (size_t)mesh->points * sizeof *q);
        mesh_derivative(mesh, g->filled, p, q);
    }
    for (int k = 0; k <= g->filled * P; k++) {
        double m = 2.0 + a2 * (g->energy[lane] - c->v[k]);
        double beta =
            g->kappa[lane] * mesh->slope[k] / mesh->y[k] + 0.5 * mesh->bend[k];
        if (a2 > 0.0)
            beta -= 0.5 * a2 * c->beta[k] / m;
        if (q)
            q[k] = (q[k] + beta * p[k]) / sqrt(m * mesh->slope[k]);
        p[k] *= sqrt(m * mesh->slope[k]);
    }
}

void radial_total(const struct radial *radial, int channel, double *density)
{
    int width = radial->kernel->width, points = radial->elements * P + 1;
    const double *sum = radial->sum;
    bool first = true;
    for (int k = 0; k < radial->groups; k++) {
        const struct lane_group *g = &radial->group[k];
        _Alignas(LANES_ALIGN) double weight[LANES_MAX] = {0};
        if (g->channel != channel)
            continue;
        for (int lane = 0; lane < g->used; lane++)
            weight[lane] = radial->level[radial->member[k][lane]].weight;
        radial->kernel->add(g, weight, first, points, radial->sum);
        first = false;
    }
    for (int i = 0; i < points; i++, sum += width) {
        density[i] = first ? 0.0 : sum[0];
        for (int lane = 1; lane < width && !first; lane++)
            density[i] += sum[lane];
    }
}

double radial_sum(const struct radial *radial)
{
    double sum = 0.0;
    for (int k = 0; k < radial->groups; k++)
        for (int lane = 0; lane < radial->group[k].used; lane++)
            sum += radial->level[radial->member[k][lane]].weight *
                   radial->group[k].energy[lane];
    return sum;
}
