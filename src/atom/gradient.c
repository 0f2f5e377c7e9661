/* SPDX-License-Identifier: MIT */
#include "atom/gradient.h"

#include <math.h>
#include <stddef.h>
#include <stdlib.h>
#include <string.h>
#include <xc.h>

enum { P = LOBATTO_ORDER, FUNCTIONALS = 4 };
enum { EXCHANGE, CORRELATION, CORRELATION_VWN, META };

/* Density (electrons/bohr³) below which nothing is evaluated: that far out
 * there is no energy and the potential would be noise. */
static const double RHO_MIN = 1e-13;

/* Arrays over the points; rho, grad2 and by_* interleaved as libxc wants. */
struct gradient {
    const struct mesh *mesh;
    xc_func_type functional[FUNCTIONALS];
    int made;
    double Z;
    int elements, points;
    double *rho, *grad2, *tau, *laplacian;
    double *slope[2]; /* dρ/dr of each channel */
    double *value, *by_rho, *by_grad2;
    double *total[3]; /* sums of the last two over functionals, and a flux */
    double *block;
};

/* libxc uses what it allocates without a look: what it needs, with much to
 * spare, is asked for before and given back at once. */
static bool room_for_functionals(void)
{
    enum { BYTES = 1 << 16 };
    void *volatile room = malloc(BYTES); /* or the compiler leaves it out */
    bool found = room != NULL;
    free(room);
    return found;
}

struct gradient *gradient_new(const struct mesh *mesh, struct status *st)
{
    static const int id[FUNCTIONALS] = {XC_GGA_X_PBE, XC_GGA_C_PBE,
                                        XC_GGA_C_PBE_VWN, XC_MGGA_C_REVTPSS};
    struct gradient *g = calloc(1, sizeof *g);
    size_t n = (size_t)mesh->points;
    double *at = calloc(n * 23, sizeof *at);
    if (!g || !at || !room_for_functionals()) {
        free(g);
        free(at);
        status_fail(st, STATUS_MEMORY,
                    "out of memory for functionals on %zu points", n);
        return NULL;
    }
    g->mesh = mesh;
    g->block = at;
    g->rho = at;
    g->grad2 = at + 2 * n;
    g->tau = at + 5 * n;
    g->laplacian = at + 7 * n;
    g->slope[0] = at + 9 * n;
    g->slope[1] = at + 10 * n;
    g->value = at + 11 * n;
    g->by_rho = at + 12 * n;
    g->by_grad2 = at + 14 * n;
    g->total[0] = at + 17 * n;
    g->total[1] = at + 19 * n;
    g->total[2] = at + 22 * n;
    for (; g->made < FUNCTIONALS; g->made++) {
        xc_func_type *f = &g->functional[g->made];
        if (xc_func_init(f, id[g->made], XC_POLARIZED) != 0) {
            status_fail(st, STATUS_DATA, "libxc has no functional %d",
                        id[g->made]);
            gradient_free(g);
            return NULL;
        }
        xc_func_set_dens_threshold(f, RHO_MIN);
    }
    return g;
}

void gradient_free(struct gradient *gradient)
{
    if (!gradient)
        return;
    for (int i = 0; i < gradient->made; i++)
        xc_func_end(&gradient->functional[i]);
    free(gradient->block);
    free(gradient);
}

void gradient_density(struct gradient *gradient, double Z, int elements,
                      const double *major, const double *minor)
{
    struct gradient *g = gradient;
    const double *rho[2] = {major, minor};
    g->Z = Z;
    g->elements = elements;
    g->points = elements * P + 1;
    for (int c = 0; c < 2; c++) {
        mesh_derivative(g->mesh, elements, rho[c], g->slope[c]);
        for (ptrdiff_t i = 0; i < g->points; i++) {
            g->slope[c][i] *= Z / g->mesh->slope[i];
            g->rho[2 * i + c] = rho[c][i] > 0.0 ? rho[c][i] : 0.0;
        }
    }
    for (ptrdiff_t i = 0; i < g->points; i++) {
        double a = g->slope[0][i], b = g->slope[1][i];
        g->grad2[3 * i] = a * a;
        g->grad2[3 * i + 1] = a * b;
        g->grad2[3 * i + 2] = b * b;
    }
}

void gradient_exchange(struct gradient *gradient, double *energy)
{
    xc_gga_exc(&gradient->functional[EXCHANGE], (size_t)gradient->points,
               gradient->rho, gradient->grad2, energy);
}

void gradient_correlation(struct gradient *gradient, bool vwn, double *energy)
{
    int which = vwn ? CORRELATION_VWN : CORRELATION;
    xc_gga_exc(&gradient->functional[which], (size_t)gradient->points,
               gradient->rho, gradient->grad2, energy);
}

/* v = ∂e/∂ρ - div(2 ∂e/∂γ_aa ∇ρ_a + ∂e/∂γ_ab ∇ρ_b) for channel c. */
static void channel_potential(struct gradient *g, int c, double *v)
{
    const double *by_rho = g->total[0], *by_grad2 = g->total[1];
    const double *y = g->mesh->y;
    double *flux = g->total[2];
    for (ptrdiff_t i = 0; i < g->points; i++)
        flux[i] = y[i] * y[i] *
                  (2.0 * by_grad2[3 * i + (ptrdiff_t)2 * c] * g->slope[c][i] +
                   by_grad2[3 * i + 1] * g->slope[1 - c][i]);
    mesh_derivative(g->mesh, g->elements, flux, v);
    for (ptrdiff_t i = 0; i < g->points; i++)
        v[i] =
            by_rho[2 * i + c] - v[i] * g->Z / (g->mesh->slope[i] * y[i] * y[i]);
}

void gradient_potential(struct gradient *gradient, bool vwn, double *energy,
                        double *major, double *minor)
{
    struct gradient *g = gradient;
    const int which[2] = {EXCHANGE, vwn ? CORRELATION_VWN : CORRELATION};
    size_t n = (size_t)g->points;
    memset(energy, 0, n * sizeof *energy);
    memset(g->total[0], 0, 2 * n * sizeof(double));
    memset(g->total[1], 0, 3 * n * sizeof(double));
    for (int k = 0; k < 2; k++) {
        xc_gga_exc_vxc(&g->functional[which[k]], n, g->rho, g->grad2, g->value,
                       g->by_rho, g->by_grad2);
        for (size_t i = 0; i < n; i++)
            energy[i] += g->value[i];
        for (size_t i = 0; i < 2 * n; i++)
            g->total[0][i] += g->by_rho[i];
        for (size_t i = 0; i < 3 * n; i++)
            g->total[1][i] += g->by_grad2[i];
    }
    channel_potential(g, 0, major);
    channel_potential(g, 1, minor);
}

/* No kinetic energy density is below |∇ρ|²/8ρ (C. F. von Weizsäcker, Z. Phys.
 * 96, 431 (1935)). Where one orbital is all there is, as in the tail of a
 * channel whose outermost subshell is s, the two are equal, and tau, which is
 * made of large components alone, falls short of it by the small ones and by
 * rounding. libxc then lowers |∇ρ_c|² to 8ρτ but leaves ∇ρ_a·∇ρ_b as it was,
 * |∇ζ|² made from the three turns negative, and with it the denominator
 * (1 + ξ²[(1+ζ)^-4/3 + (1-ζ)^-4/3]/2)⁴ of C(ζ, ξ) passes through zero: one
 * point of the mesh is enough for any energy. tau is raised to its bound
 * instead, and a channel too thin to count is emptied whole. */
static void make_consistent(ptrdiff_t n, double *rho, double *grad2,
                            double *tau)
{
    for (ptrdiff_t i = 0; i < n; i++)
        for (ptrdiff_t c = 0; c < 2; c++) {
            double *of_c = &rho[2 * i + c], *tau_c = &tau[2 * i + c];
            if (*of_c < RHO_MIN) {
                *of_c = *tau_c = 0.0;
                grad2[3 * i + 1] = grad2[3 * i + 2 * c] = 0.0;
            } else {
                *tau_c = fmax(*tau_c, grad2[3 * i + 2 * c] / (8.0 * *of_c));
            }
        }
}

void gradient_meta_correlation(struct gradient *gradient, const double *major,
                               const double *minor, double *energy)
{
    struct gradient *g = gradient;
    size_t n = (size_t)g->points;
    double *rho = g->by_rho, *grad2 = g->by_grad2;
    memcpy(rho, g->rho, 2 * n * sizeof *rho);
    memcpy(grad2, g->grad2, 3 * n * sizeof *grad2);
    for (size_t i = 0; i < n; i++) {
        g->tau[2 * i] = major[i];
        g->tau[2 * i + 1] = minor[i];
    }
    make_consistent(g->points, rho, grad2, g->tau);
    xc_mgga_exc(&g->functional[META], n, rho, grad2, g->laplacian, g->tau,
                energy);
}

void gradient_at(struct gradient *gradient, int n, double *rho, double *grad2,
                 double *tau, double *exchange, double *correlation)
{
    struct gradient *g = gradient;
    make_consistent(n, rho, grad2, tau);
    xc_gga_exc(&g->functional[EXCHANGE], (size_t)n, rho, grad2, exchange);
    xc_mgga_exc(&g->functional[META], (size_t)n, rho, grad2, g->laplacian, tau,
                correlation);
}
