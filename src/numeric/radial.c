/* SPDX-License-Identifier: MIT */
#include "numeric/radial.h"

#include <assert.h>
#include <math.h>
#include <stdint.h>
#include <stdlib.h>
#include <string.h>

#include "numeric/inside.h"

enum {
    P = LOBATTO_ORDER,
    SERIES = 7, /* terms of the expansion at the origin */
};

/* Change of the highest energy of a group, relative, at which its reach is
 * found anew. */
static const double REACH_KEPT = 0.01;

/* A block being shared out: used numbers of it; without a block they are only
 * counted. */
struct share {
    double *block;
    size_t used;
};

static double *take(struct share *at, size_t n)
{
    double *p = at->block ? at->block + at->used : NULL;
    at->used += (n + 3) / 4 * 4;
    return p;
}

/* Hands out the arrays, each aligned for the widest vectors; with block = NULL
 * only counts the numbers needed. */
static size_t carve(struct radial *r, double *block)
{
    size_t n = (size_t)r->work.mesh->points;
    size_t width = (size_t)r->kernel->width;
    size_t factor = (size_t)r->work.mesh->elements * LANES_FACTOR;
    struct share at = {block, 0};
    r->work.stiffness = take(&at, LANES_TRIANGLE * width);
    r->work.derivative = take(&at, (size_t)LOBATTO_POINTS * LOBATTO_POINTS);
    r->work.schwarz = take(&at, n);
    r->work.mass = take(&at, n);
    r->work.centrifugal = take(&at, n);
    r->work.square = take(&at, n);
    r->work.factor = take(&at, factor * width);
    r->work.norm = take(&at, n * width);
    r->work.right = take(&at, n * width);
    r->sum = take(&at, n * LANES_MAX);
    r->work.origin = take(&at, n);
    for (int c = 0; c < RADIAL_CHANNELS; c++) {
        struct lane_channel *ch = &r->channel[c];
        double **array[] = {&ch->v,    &ch->base,   &ch->moved, &ch->radial,
                            &ch->bent, &ch->square, &ch->beta};
        for (size_t k = 0; k < sizeof array / sizeof *array; k++)
            *array[k] = take(&at, n);
    }
    for (int g = 0; g < r->room; g++) {
        r->group[g].chi = take(&at, n * LANES_MAX);
        r->group[g].density = take(&at, n * LANES_MAX);
    }
    return at.used;
}

static void fill_tables(struct radial *r)
{
    const struct mesh *mesh = r->work.mesh;
    int width = r->kernel->width;
    double *stiffness = r->work.stiffness;
    double *derivative = r->work.derivative;
    double *schwarz = r->work.schwarz;
    double *mass = r->work.mass;
    double *centrifugal = r->work.centrifugal;
    double *square = r->work.square;
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
        status_fail(st, STATUS_MEMORY, "out of memory for the radial solver");
        return NULL;
    }
    memset(r, 0, sizeof *r);
    r->work.mesh = mesh;
    r->kernel = choose_kernel(width);
    r->room =
        (RADIAL_LEVELS_MAX + LANES_MAX - 1) / LANES_MAX + RADIAL_CHANNELS - 1;
    size_t total = carve(r, NULL) + LANES_ALIGN / sizeof(double);
    /* calloc: memory that is not touched costs nothing */
    r->block = calloc(total, sizeof *r->block);
    if (!r->block) {
        free(r);
        status_fail(st, STATUS_MEMORY,
                    "out of memory for the radial solver, %d points",
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
    r->groups = 0;
    for (int c = 0; c < RADIAL_CHANNELS; c++) {
        struct lane_group *g = NULL;
        for (int i = 0; i < r->count; i++) {
            if (r->level[i].channel != c)
                continue;
            if (!g || g->used == LANES_MAX) {
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
        for (int lane = 0; lane < LANES_MAX; lane++) {
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
        r->work.origin[i] = 0.5 * mesh->length * mesh->weight[i] * a2 *
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

void inside_step(struct radial *r, struct lane_group *g)
{
    const struct lane_channel *c = &r->channel[g->channel];
    for (int lane = 0; lane < LANES_MAX; lane++)
        set_boundary(r, g, lane);
    double highest = g->energy[0];
    for (int lane = 1; lane < LANES_MAX; lane++)
        highest = fmax(highest, g->energy[lane]);
    /* looked up again when the highest level has moved */
    if (fabs(highest - g->reached) > REACH_KEPT * fabs(highest)) {
        g->elements = r->kernel->reach(&r->work, c, g, r->elements);
        g->reached = highest;
    }
    r->kernel->step(&r->work, c, g);
}
