/* SPDX-License-Identifier: MIT */
#include <assert.h>
#include <math.h>
#include <string.h>

#include "numeric/inside.h"

enum { P = LOBATTO_ORDER };

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
    int lane;
    const struct lane_group *g = locate(radial, i, &lane);
    memset(density, 0, (size_t)radial->work.mesh->points * sizeof *density);
    for (int k = 0; k <= g->filled * P; k++)
        density[k] = g->density[k * LANES_MAX + lane];
}

double radial_power(const struct radial *radial, int i)
{
    double kappa = radial->level[i].kappa;
    return sqrt(kappa * kappa - radial->work.a2);
}

void radial_functions(const struct radial *radial, int i, double *p, double *q)
{
    int lane;
    const struct lane_group *g = locate(radial, i, &lane);
    const struct mesh *mesh = radial->work.mesh;
    const struct lane_channel *c = &radial->channel[g->channel];
    double a2 = radial->work.a2;
    memset(p, 0, (size_t)mesh->points * sizeof *p);
    for (int k = 0; k <= g->filled * P; k++)
        p[k] = g->chi[k * LANES_MAX + lane];
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
    int points = radial->elements * P + 1;
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
    for (int i = 0; i < points; i++, sum += LANES_MAX) {
        density[i] = first ? 0.0 : sum[0];
        for (int lane = 1; lane < LANES_MAX && !first; lane++)
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
