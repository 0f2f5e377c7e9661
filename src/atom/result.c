/* SPDX-License-Identifier: MIT */
#include "atom/result.h"

#include <assert.h>
#include <math.h>
#include <string.h>

#include "atom/solver.h"
#include "numeric/poisson.h"

enum { P = LOBATTO_ORDER, BISECTIONS = 60 };

/* A maximum of D counts when it is this part of the largest: what is lower is
 * rounding in the tail. */
static const double PEAK_MIN = 1e-6;

int atom_subshell_count(const struct atom_solver *solver)
{
    return solver->configuration.count;
}

static int points(const struct atom_solver *s)
{
    return s->elements * P + 1;
}

/* Density per y of subshell i into D, or of its levels of one j unless twice_j
 * is 0; its electrons are returned and the mean energy of the levels set. */
static double subshell_density(const struct atom_solver *s, int i, int twice_j,
                               double *D, double *energy)
{
    struct atom_space *space = s->now;
    const struct subshell *shell = &s->configuration.shells[i];
    double electrons = 0.0, *one = space->scratch + space->mesh.points;
    *energy = 0.0;
    memset(D, 0, (size_t)points(s) * sizeof *D);
    for (int k = 0; k < s->count; k++) {
        const struct atom_level *level = &s->label[k];
        if (level->n != shell->n || level->l != shell->l ||
            (twice_j > 0 && level->twice_j != twice_j))
            continue;
        radial_density(space->radial, k, one);
        for (int j = 0; j < points(s); j++)
            D[j] += level->occ * one[j];
        electrons += level->occ;
        *energy += level->occ * level->energy;
    }
    if (electrons > 0.0)
        *energy /= electrons;
    return electrons;
}

/* y between a and b, within one element, where f passes `level`. */
static double crossing(const struct mesh *mesh, const double *f, double level,
                       double a, double b)
{
    bool above = mesh_value(mesh, f, a) > level;
    for (int k = 0; k < BISECTIONS; k++) {
        double middle = 0.5 * (a + b);
        if ((mesh_value(mesh, f, middle) > level) == above)
            a = middle;
        else
            b = middle;
    }
    return 0.5 * (a + b);
}

/* y of the outermost maximum of D. slope[] is work space. */
static double outermost_maximum(const struct atom_solver *s, const double *D,
                                double *slope)
{
    const struct mesh *mesh = &s->now->mesh;
    int last = points(s) - 1;
    double most = 0.0;
    for (int i = 0; i <= last; i++)
        most = D[i] > most ? D[i] : most;
    mesh_derivative(mesh, s->elements, D, slope);
    for (int i = last; i > 0; i--)
        if (D[i] > PEAK_MIN * most && slope[i] <= 0.0 && slope[i - 1] > 0.0)
            return crossing(mesh, slope, 0.0, mesh->y[i - 1], mesh->y[i]);
    return mesh->y[0];
}

static double interpolate(const struct atom_solver *s, const double *f,
                          double y, double power)
{
    const struct mesh *mesh = &s->now->mesh;
    if (y < mesh->y[0])
        return f[0] * pow(y / mesh->y[0], power);
    return mesh_value(mesh, f, y);
}

/* Everything about one density that holds one electron per unit of norm. */
static void measure(const struct atom_solver *s, struct atom_orbital *o,
                    const double *D, double norm, double *work)
{
    const struct mesh *mesh = &s->now->mesh;
    double mean = 0.0, Z = s->Z;
    for (int i = 0; i < points(s); i++)
        mean += mesh->weight_y[i] * mesh->y[i] * D[i];
    double y = outermost_maximum(s, D, work);
    o->mean_radius = mean / norm / Z;
    o->peak_radius = y / Z;
    o->zeff_energy = o->energy < 0.0 ? o->n * sqrt(-2.0 * o->energy) : 0.0;
    o->zeff_size =
        0.5 * (3.0 * o->n * o->n - o->l * (o->l + 1.0)) / o->mean_radius;
    o->zeff_enclosed = Z - mesh_value(mesh, s->now->enclosed, y);
}

struct atom_orbital atom_subshell_at(const struct atom_solver *solver, int i)
{
    const struct subshell *shell = &solver->configuration.shells[i];
    struct atom_orbital o = {.n = shell->n, .l = shell->l};
    double *D = solver->now->out;
    o.occ = subshell_density(solver, i, 0, D, &o.energy);
    if (o.occ > 0.0)
        measure(solver, &o, D, o.occ, solver->now->scratch);
    return o;
}

double atom_subshell_peak_of(const struct atom_solver *solver, int i,
                             int twice_j)
{
    double energy, *D = solver->now->out;
    if (subshell_density(solver, i, twice_j, D, &energy) <= 0.0)
        return 0.0;
    return outermost_maximum(solver, D, solver->now->scratch) / solver->Z;
}

struct atom_orbital atom_level_orbital(const struct atom_solver *solver, int i)
{
    const struct atom_level *level = &solver->label[i];
    struct atom_orbital o = {.n = level->n,
                             .l = level->l,
                             .twice_j = level->twice_j,
                             .spin = level->spin,
                             .occ = level->occ,
                             .energy = level->energy};
    double *D = solver->now->out;
    radial_density(solver->now->radial, i, D);
    measure(solver, &o, D, 1.0, solver->now->scratch);
    return o;
}

double atom_isodensity_radius(const struct atom_solver *solver, double rho)
{
    const struct mesh *mesh = &solver->now->mesh;
    double *f = solver->now->out, Z = solver->Z;
    /* ρ = Z³ D/(4πy²) */
    double scale = Z * Z * Z / (4.0 * 3.14159265358979323846);
    int last = points(solver) - 1;
    for (int i = 0; i <= last; i++)
        f[i] = scale * solver->now->total[i] / (mesh->y[i] * mesh->y[i]);
    for (int i = last; i > 0; i--)
        if (f[i] < rho && f[i - 1] >= rho)
            return crossing(mesh, f, rho, mesh->y[i - 1], mesh->y[i]) / Z;
    return 0.0;
}

void atom_curve_at(const struct atom_solver *solver, enum atom_curve curve,
                   int subshell, int n, const double *r, double *out)
{
    struct atom_space *space = solver->now;
    const double *f =
        curve == ATOM_CURVE_DENSITY ? space->total : space->enclosed;
    double power = solver->power, Z = solver->Z, energy;
    double whole = solver->electrons;
    if (subshell >= 0 && curve != ATOM_CURVE_ZEFF) {
        assert(subshell < solver->configuration.count);
        double *D = space->out, *within = D + space->mesh.points;
        whole = subshell_density(solver, subshell, 0, D, &energy);
        int l = solver->configuration.shells[subshell].l;
        if (l > 0 && solver->a2 <= 0.0)
            power = 2.0 * l + 2.0;
        if (curve == ATOM_CURVE_ENCLOSED)
            poisson_solve(&space->mesh, solver->elements, D, power, within,
                          within + space->mesh.points, space->scratch);
        f = curve == ATOM_CURVE_DENSITY ? D : within;
    }
    double last = space->mesh.y[points(solver) - 1];
    for (int i = 0; i < n; i++) {
        double y = Z * r[i], value;
        if (y > last)
            value = curve == ATOM_CURVE_DENSITY ? 0.0 : whole;
        else
            value = interpolate(
                solver, f, y, curve == ATOM_CURVE_DENSITY ? power : power + 1);
        if (curve == ATOM_CURVE_DENSITY)
            value = value > 0.0 ? Z * value : 0.0;
        out[i] = curve == ATOM_CURVE_ZEFF ? Z - value : value;
    }
}

double atom_extent(const struct atom_solver *solver, double electrons)
{
    const struct mesh *mesh = &solver->now->mesh;
    int i = points(solver) - 1;
    double whole = solver->now->enclosed[i];
    while (i > 0 && whole - solver->now->enclosed[i - 1] < electrons)
        i--;
    return mesh->y[i] / solver->Z;
}
