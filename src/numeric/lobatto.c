/* SPDX-License-Identifier: MIT */
#include "numeric/lobatto.h"

#include <float.h>
#include <math.h>

enum { P = LOBATTO_ORDER };

/* Legendre polynomials 0…P+1 at x. */
static void legendre(double x, double value[P + 2])
{
    value[0] = 1.0;
    value[1] = x;
    for (int k = 1; k <= P; k++)
        value[k + 1] =
            ((2 * k + 1) * x * value[k] - k * value[k - 1]) / (k + 1);
}

/* The points are ±1 and the zeros of P_P', found by Newton's method on
 * (1 - x²) P_P'(x), which is P (P_{P-1} - x P_P). */
static void make_points(struct lobatto *rule)
{
    const double pi = acos(-1.0);
    for (int i = 0; i <= P; i++) {
        double x = -cos(pi * i / P), v[P + 2];
        for (int step = 0; step < 50; step++) {
            legendre(x, v);
            double dx = (x * v[P] - v[P - 1]) / ((P + 1) * v[P]);
            x -= dx;
            if (fabs(dx) < 2 * DBL_EPSILON)
                break;
        }
        rule->x[i] = x;
    }
    rule->x[0] = -1.0;
    rule->x[P] = 1.0;
    rule->x[P / 2] = P % 2 == 0 ? 0.0 : rule->x[P / 2];
    for (int i = 0; i <= P; i++) {
        double v[P + 2];
        legendre(rule->x[i], v);
        rule->w[i] = 2.0 / (P * (P + 1) * v[P] * v[P]);
        rule->legendre[0][i] = v[P];
        rule->legendre[1][i] = v[P + 1];
    }
}

static void make_derivative(struct lobatto *rule)
{
    for (int i = 0; i <= P; i++) {
        double product = 1.0;
        for (int j = 0; j <= P; j++)
            if (j != i)
                product *= rule->x[i] - rule->x[j];
        rule->barycentric[i] = 1.0 / product;
    }
    for (int i = 0; i <= P; i++) {
        double sum = 0.0;
        for (int j = 0; j <= P; j++) {
            if (j == i)
                continue;
            double d = rule->barycentric[j] / rule->barycentric[i] /
                       (rule->x[i] - rule->x[j]);
            rule->derivative[i][j] = d;
            sum += d;
        }
        rule->derivative[i][i] = -sum;
    }
}

/* l_j = w_j Σ_k P_k(x_j) P_k / γ_k, with γ_k the discrete norms: 2/(2k+1),
 * and 2/P for k = P. ∫ P_k = (P_{k+1} - P_{k-1}) / (2k+1). */
static void make_cumulative(struct lobatto *rule)
{
    for (int i = 0; i <= P; i++) {
        double at[P + 2], integral[P + 1];
        legendre(rule->x[i], at);
        integral[0] = rule->x[i] + 1.0;
        for (int k = 1; k <= P; k++)
            integral[k] = (at[k + 1] - at[k - 1]) / (2 * k + 1);
        for (int j = 0; j <= P; j++) {
            double v[P + 2], sum = 0.0;
            legendre(rule->x[j], v);
            for (int k = 0; k <= P; k++)
                sum += v[k] * integral[k] * (k < P ? k + 0.5 : 0.5 * P);
            rule->cumulative[i][j] = sum * rule->w[j];
        }
    }
}

void lobatto_make(struct lobatto *rule)
{
    make_points(rule);
    make_derivative(rule);
    make_cumulative(rule);
    for (int i = 0; i <= P; i++) {
        for (int j = 0; j <= P; j++) {
            double stiffness = 0.0;
            for (int q = 0; q <= P; q++)
                stiffness += rule->w[q] * rule->derivative[q][i] *
                             rule->derivative[q][j];
            rule->stiffness[i][j] = stiffness;
        }
    }
}

void lobatto_basis(const struct lobatto *rule, double x,
                   double value[LOBATTO_POINTS])
{
    double sum = 0.0;
    for (int i = 0; i <= P; i++) {
        double d = x - rule->x[i];
        if (fabs(d) < DBL_EPSILON) {
            for (int j = 0; j <= P; j++)
                value[j] = j == i ? 1.0 : 0.0;
            return;
        }
        value[i] = rule->barycentric[i] / d;
        sum += value[i];
    }
    for (int i = 0; i <= P; i++)
        value[i] /= sum;
}
