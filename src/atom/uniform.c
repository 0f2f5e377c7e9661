/* SPDX-License-Identifier: MIT */
#include "atom/uniform.h"

#include <math.h>
#include <stddef.h>

static const double PI = 3.14159265358979323846;
/* Below this density (electrons/bohr³) nothing is evaluated. */
static const double RHO_MIN = 1e-30;

/* One of the three fits of Vosko, Wilk, Nusair, equation 4.4, x = √r_s:
 *   a { ln(x²/X) + (2b/q) arc - (b x0/X0) [ ln((x-x0)²/X)
 *       + (2(b+2x0)/q) arc ] }, X = x² + bx + c, q = √(4c-b²),
 * arc = atan(q/(2x+b)). s = b x0/X0 and t = b - s (b+2x0). */
struct fit {
    double a, x0, b, c, q, s, t;
};
#define FIT(a, x0, b, c, q, s)                                                 \
    {                                                                          \
        a, x0, b, c, q, s, (b) - (s) * ((b) + 2.0 * (x0))                      \
    }
static const struct fit PARA = FIT(0.0310907, -0.10498, 3.72744, 12.9352,
                                   6.15199081975908, -0.031167608678943783);
static const struct fit FERRO = FIT(0.01554535, -0.32500, 7.06042, 18.0578,
                                    4.730926909560113, -0.14460061018520726);
/* a = -1/6π² */
static const struct fit STIFF =
    FIT(-0.016886863940389627, -0.0047584, 1.13107, 13.0045, 7.123108917818118,
        -0.00041403379428206277);

/* Value, and derivative with respect to x. */
static double fit_at(const struct fit *f, double x, double *slope)
{
    double width = 2.0 * x + f->b, d = x - f->x0;
    double t = 1.0 / (x * (x + f->b) + f->c), lead = x * x * t;
    double angle = atan(f->q / width), w = width * t;
    double value =
        log(lead) - f->s * log(d * d * t) + 2.0 * f->t / f->q * angle;
    /* d arc/dx = -q/2X */
    *slope = f->a * (2.0 / x - w - f->s * (2.0 / d - w) - f->t * t);
    return f->a * value;
}

/* Fermi wave number (3π²ρ)^(1/3). exp(ln/3) costs half of what cbrt does. */
static double wave_number(double rho)
{
    return rho > 0.0 ? exp(log(3.0 * PI * PI * rho) / 3.0) : 0.0;
}

/* x = √r_s, with r_s = (9π/4)^(1/3)/k. */
static double root_rs(double k)
{
    static const double factor = 1.9191582926775128;
    return sqrt(factor / k);
}

/* Exchange of the unpolarised gas at wave number k, and its potential. */
static double exchange(double k, double c, double *v)
{
    double e = -0.75 / PI * k;
    *v = e * (4.0 / 3.0);
    if (c <= 0.0)
        return e;
    double b = k / c, b2 = b * b, factor_e, factor_v;
    if (b < 0.02) {
        double t = b * (2.0 / 3.0 - b2 * (0.2 - b2 * (3.0 / 28.0)));
        factor_e = 1.0 - 1.5 * t * t;
        factor_v = 1.0 - b2 * (1.0 - b2 * (0.8 - b2 * (24.0 / 35.0)));
    } else {
        double eta = sqrt(1.0 + b2), xi = log(b + eta);
        double t = (b * eta - xi) / b2;
        factor_e = 1.0 - 1.5 * t * t;
        factor_v = 1.5 * xi / (b * eta) - 0.5;
    }
    *v *= factor_v;
    return e * factor_e;
}

void uniform_lda(int n, const double *rho, double c, double *energy, double *v)
{
    for (int i = 0; i < n; i++) {
        if (!(rho[i] > RHO_MIN)) {
            energy[i] = v[i] = 0.0;
            continue;
        }
        double k = wave_number(rho[i]), x = root_rs(k), slope, vx;
        double ex = exchange(k, c, &vx);
        double ec = fit_at(&PARA, x, &slope);
        energy[i] = ex + ec;
        /* v = ε - (r_s/3) dε/dr_s = ε - (x/6) dε/dx */
        v[i] = vx + ec - x / 6.0 * slope;
    }
}

/* Correlation, and its derivatives with respect to x and ζ. */
static double correlation(double x, double zeta, double *by_x, double *by_zeta)
{
    static const double norm = 1.9236610509315362; /* 1/(2 (2^(1/3) - 1)) */
    static const double f20 = 1.7099209341613657;  /* 4/(9 (2^(1/3) - 1)) */
    double pa, fa, sa;
    double p = fit_at(&PARA, x, &pa);
    if (fabs(zeta) < 1e-12) {
        *by_x = pa;
        *by_zeta = 0.0;
        return p;
    }
    double ferro = fit_at(&FERRO, x, &fa), stiff = fit_at(&STIFF, x, &sa);
    double more = cbrt(1.0 + zeta), less = cbrt(1.0 - zeta);
    double f = norm * (more * (1.0 + zeta) + less * (1.0 - zeta) - 2.0);
    double f1 = norm * (4.0 / 3.0) * (more - less);
    double z3 = zeta * zeta * zeta, z4 = z3 * zeta;
    double gs = f * (1.0 - z4) / f20, gf = f * z4;
    double gs1 = (f1 * (1.0 - z4) - 4.0 * f * z3) / f20;
    double gf1 = f1 * z4 + 4.0 * f * z3;
    *by_x = pa + sa * gs + (fa - pa) * gf;
    *by_zeta = stiff * gs1 + (ferro - p) * gf1;
    return p + stiff * gs + (ferro - p) * gf;
}

void uniform_lsd(int n, const double *up, const double *down, double c,
                 double *energy, double *v_up, double *v_down)
{
    for (int i = 0; i < n; i++) {
        double rho = up[i] + down[i];
        if (!(rho > RHO_MIN)) {
            energy[i] = v_up[i] = v_down[i] = 0.0;
            continue;
        }
        double vu, vd, by_x, by_zeta, x = root_rs(wave_number(rho));
        double zeta = (up[i] - down[i]) / rho;
        double ex =
            0.5 * ((1.0 + zeta) * exchange(wave_number(2.0 * up[i]), c, &vu) +
                   (1.0 - zeta) * exchange(wave_number(2.0 * down[i]), c, &vd));
        double ec = correlation(x, zeta, &by_x, &by_zeta);
        double v = ec - x / 6.0 * by_x;
        energy[i] = ex + ec;
        v_up[i] = vu + v + (1.0 - zeta) * by_zeta;
        v_down[i] = vd + v - (1.0 + zeta) * by_zeta;
    }
}
