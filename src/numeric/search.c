/* SPDX-License-Identifier: MIT */
#include <float.h>
#include <math.h>
#include <string.h>

#include "numeric/inside.h"

enum {
    P = LOBATTO_ORDER,
    BISECTIONS = 9, /* of WKB energies: to 3 % */
    RESCALE = 4,    /* steps of a search between rescalings */
    FIND_MAX = 200, /* steps before a search is given up */
};

/* A search ends when a Rayleigh quotient moves the energy by less than this
 * part of it: the step is of third order, and further ones follow. */
static const double FOUND = 1e-3;
/* First part of the energy by which a search moves when it can only guess. */
static const double NUDGE = 0.06;
/* A first-order shift is followed up to this part of the energy. */
static const double SHIFT_MAX = 0.3, SHIFT_SMALL = 0.03;

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
    for (int lane = 0; lane < LANES_MAX; lane++) {
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
        for (int lane = 0; lane < LANES_MAX; lane++)
            g->energy[lane] = -exp(0.5 * (lo[lane] + hi[lane]));
        r->kernel->phase(&r->work, c, g, r->elements);
        for (int lane = 0; lane < LANES_MAX; lane++) {
            double middle = 0.5 * (lo[lane] + hi[lane]);
            if (g->below[lane] < goal[lane])
                lo[lane] = middle;
            else
                hi[lane] = middle;
        }
    }
    for (int lane = 0; lane < LANES_MAX; lane++)
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
    int missing = 0;
    for (int turn = 0; turn < FIND_MAX && any_lost(r, k); turn++) {
        inside_step(r, g);
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
        for (int lane = g->used; lane < LANES_MAX; lane++)
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
        int n = (radial->elements * P + 1) * LANES_MAX;
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
    inside_step(r, g);
    for (int lane = 0; lane < g->used; lane++) {
        int i = r->member[k][lane];
        bool good = fits(r->level[i].nodes, g->energy[lane], g->below[lane],
                         g->shift[lane]);
        r->search[i].lost = !good;
        lost |= !good;
        if (good)
            g->energy[lane] += g->shift[lane];
    }
    for (int lane = g->used; lane < LANES_MAX; lane++)
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
        for (int lane = 0; lane < LANES_MAX; lane++) {
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
