/* SPDX-License-Identifier: MIT */
#include "atom/shape.h"

#include <math.h>
#include <stddef.h>

enum { P = LOBATTO_ORDER, ANGLES = 5 };

static const double PI = 3.14159265358979323846;

/* Gauss's rule of 10 points for cos θ, its upper half (Abramowitz, Stegun,
 * Handbook of Mathematical Functions, table 25.4). */
static const double COSINE[ANGLES] = {
    0.148874338981631211, 0.433395394129247191, 0.679409568299024406,
    0.865063366688984511, 0.973906528517171720};
static const double WEIGHT[ANGLES] = {
    0.295524224714752870, 0.269266719309996355, 0.219086362515982044,
    0.149451349150580593, 0.066671344308688138};

/* Radial parts of one channel: the density of one p electron and its slope,
 * the slope of the round density, (dR/dr)² and (R/r)². */
struct radial_part {
    double *p, *p_slope, *rho_slope, *slope2, *over2;
};

static void fill(const struct shape *s, int c, struct radial_part *part,
                 double *scratch)
{
    const struct mesh *mesh = s->mesh;
    double Z = s->Z, z3 = Z * Z * Z;
    int points = s->elements * P + 1;
    for (int i = 0; i < points; i++) {
        double r = s->p[c][i] / mesh->y[i];
        scratch[i] = r;
        part->p[i] = z3 * r * r / (4.0 * PI);
        part->over2[i] = z3 * Z * Z * r * r / (mesh->y[i] * mesh->y[i]);
    }
    mesh_derivative(mesh, s->elements, scratch, part->slope2);
    mesh_derivative(mesh, s->elements, part->p, part->p_slope);
    mesh_derivative(mesh, s->elements, s->rho[c], part->rho_slope);
    for (int i = 0; i < points; i++) {
        double to_r = Z / mesh->slope[i];
        part->slope2[i] *= part->slope2[i] * z3 * to_r * to_r;
        part->p_slope[i] *= to_r;
        part->rho_slope[i] *= to_r;
    }
}

/* Arrays for libxc at one angle. One electron in p_z has the density
 * p (1 + 2 P2(cos θ)) and, with |∇_Ω Y|² = 2|Y|² + ½∇²_Ω|Y|², the kinetic
 * energy density [(dR/dr)² (1 + 2 P2) + (R/r)² (2 - 2 P2)]/8π; what is short
 * of one has the opposite deviation. */
static void at_angle(const struct shape *s, const struct radial_part part[2],
                     double cosine, double *rho, double *grad2, double *tau)
{
    const struct mesh *mesh = s->mesh;
    double p2 = 1.5 * cosine * cosine - 0.5;
    double by_angle = -3.0 * cosine * sqrt(1.0 - cosine * cosine);
    const ptrdiff_t points = (ptrdiff_t)s->elements * P + 1;
    for (ptrdiff_t i = 0; i < points; i++) {
        double radial[2], around[2];
        for (int c = 0; c < 2; c++) {
            double a = 2.0 * s->axial[c];
            double n = s->rho[c][i] + a * p2 * part[c].p[i];
            double t =
                s->tau[c][i] +
                a * p2 * (part[c].slope2[i] - part[c].over2[i]) / (8.0 * PI);
            rho[2 * i + c] = n > 0.0 ? n : 0.0;
            tau[2 * i + c] = t;
            radial[c] = part[c].rho_slope[i] + a * p2 * part[c].p_slope[i];
            around[c] = a * by_angle * part[c].p[i] * s->Z / mesh->y[i];
        }
        grad2[3 * i] = radial[0] * radial[0] + around[0] * around[0];
        grad2[3 * i + 1] = radial[0] * radial[1] + around[0] * around[1];
        grad2[3 * i + 2] = radial[1] * radial[1] + around[1] * around[1];
    }
}

void shape_change(const struct shape *shape, struct gradient *gradient,
                  double *exchange, double *correlation)
{
    const struct mesh *mesh = shape->mesh;
    size_t points = (size_t)shape->elements * P + 1;
    double *work = shape->work;
    double *rho = work, *grad2 = work + 2 * points, *tau = work + 5 * points;
    double *ex = work + 7 * points, *ec = work + 8 * points;
    struct radial_part part[2];
    for (int c = 0; c < 2; c++) {
        double *at = work + (size_t)(9 + 5 * c) * points;
        part[c] = (struct radial_part){at, at + points, at + 2 * points,
                                       at + 3 * points, at + 4 * points};
        fill(shape, c, &part[c], work + 19 * points);
    }
    struct shape round = *shape;
    round.axial[0] = round.axial[1] = 0;
    *exchange = *correlation = 0.0;
    double z3 = shape->Z * shape->Z * shape->Z;
    for (int k = -1; k < ANGLES; k++) {
        at_angle(k < 0 ? &round : shape, part, k < 0 ? 0.0 : COSINE[k], rho,
                 grad2, tau);
        gradient_at(gradient, (int)points, rho, grad2, tau, ex, ec);
        double weight = (k < 0 ? -1.0 : WEIGHT[k]) * 4.0 * PI / z3;
        for (size_t i = 0; i < points; i++) {
            double w = weight * mesh->weight_y[i] * mesh->y[i] * mesh->y[i] *
                       (rho[2 * i] + rho[2 * i + 1]);
            *exchange += w * ex[i];
            *correlation += w * ec[i];
        }
    }
}
