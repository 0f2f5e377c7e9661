/* SPDX-License-Identifier: MIT */
#include "zeta/orbital.h"

#include <math.h>
#include <stdbool.h>

#include "zeta/jacobi.h"

/* An orthonormal basis over Schmidt's orbitals: columns 0 … count-2 span what
 * the open orbital leaves, the last is the open orbital (Householder). With
 * no open orbital the unit matrix. */
static void block_basis(const struct energy_block *b,
                        const struct energy_matrices *mat,
                        double basis[][BLOCK_MAX])
{
    int last = b->count - 1;
    double v[BLOCK_MAX] = {0.0}, norm = 0.0;
    for (int i = 0; i <= last && b->open > 0; i++) {
        v[i] = mat->turn[i] + (i == last ? copysign(1.0, mat->turn[last]) : 0);
        norm += v[i] * v[i];
    }
    for (int i = 0; i <= last; i++)
        for (int j = 0; j <= last; j++)
            basis[i][j] = (i == j ? 1.0 : 0.0) -
                          (b->open > 0 ? 2.0 * v[i] * v[j] / norm : 0.0);
}

/* Fock matrix of a block over the columns of basis; returns its last element,
 * that of the open orbital. */
static double block_fock(const struct energy_block *b,
                         const struct energy_matrices *mat,
                         double basis[][BLOCK_MAX], double out[][BLOCK_MAX])
{
    int count = b->count;
    double functions[BLOCK_MAX][BLOCK_MAX], half[BLOCK_MAX][BLOCK_MAX];
    for (int i = 0; i < count; i++) {
        for (int j = 0; j < count; j++) {
            functions[i][j] = 0.0;
            for (int k = i; k < count; k++)
                functions[i][j] += mat->linv[k][i] * basis[k][j];
        }
    }
    for (int i = 0; i < count; i++) {
        for (int j = 0; j < count; j++) {
            half[i][j] = 0.0;
            for (int k = 0; k < count; k++)
                half[i][j] += mat->fock[i][k] * functions[k][j];
        }
    }
    for (int i = 0; i < count; i++) {
        for (int j = 0; j < count; j++) {
            out[i][j] = 0.0;
            for (int k = 0; k < count; k++)
                out[i][j] += functions[k][i] * half[k][j];
        }
    }
    return out[count - 1][count - 1];
}

/* Coefficients over the functions of the orbital basis times vector. */
static void orbital_functions(const struct energy_block *b,
                              const struct energy_matrices *mat,
                              double basis[][BLOCK_MAX],
                              double vectors[][BLOCK_MAX], int closed,
                              int column, double coefficient[])
{
    double schmidt[BLOCK_MAX];
    for (int i = 0; i < b->count; i++) {
        schmidt[i] = 0.0;
        for (int k = 0; k < closed; k++)
            schmidt[i] += basis[i][k] * vectors[k][column];
    }
    for (int i = 0; i < b->count; i++) {
        coefficient[i] = 0.0;
        for (int k = i; k < b->count; k++)
            coefficient[i] += mat->linv[k][i] * schmidt[k];
    }
}

/* Canonical closed orbitals in order of energy, then the open one. */
static void block_orbitals(const struct energy *e, int l,
                           struct zeta_subshell shells[])
{
    const struct energy_block *b = &e->atom.block[l];
    const struct energy_matrices *mat = &e->matrices[l];
    double basis[BLOCK_MAX][BLOCK_MAX], fock[BLOCK_MAX][BLOCK_MAX];
    double vectors[BLOCK_MAX][BLOCK_MAX];
    int closed = b->open > 0 ? b->count - 1 : b->count;
    block_basis(b, mat, basis);
    double open_energy = block_fock(b, mat, basis, fock);
    jacobi(closed, BLOCK_MAX, &fock[0][0], &vectors[0][0]);
    bool used[BLOCK_MAX] = {false};
    for (int i = 0; i < closed; i++) {
        int lowest = -1;
        for (int j = 0; j < closed; j++)
            if (!used[j] && (lowest < 0 || fock[j][j] < fock[lowest][lowest]))
                lowest = j;
        used[lowest] = true;
        shells[i].energy = fock[lowest][lowest];
        orbital_functions(b, mat, basis, vectors, closed, lowest,
                          shells[i].coefficient);
    }
    if (b->open > 0) {
        struct zeta_subshell *open = &shells[closed];
        double pull = 0.0;
        for (int i = 0; i < b->count; i++) {
            open->coefficient[i] = mat->open[i];
            pull += mat->open[i] * mat->pull[i];
        }
        open->energy = open_energy + 0.5 * pull / b->open;
    }
}

/* Normalisation of r^n e^(-zeta r). */
static double function_norm(int n, double zeta)
{
    double square = 2.0 * zeta;
    for (int i = 1; i <= 2 * n; i++)
        square *= 2.0 * zeta / i;
    return sqrt(square);
}

double zeta_orbital_value(int l, int count, const double zeta[],
                          const double coefficient[], double r)
{
    double sum = 0.0, power = 1.0;
    for (int i = 0; i < l; i++)
        power *= r;
    for (int i = 0; i < count; i++) {
        power *= r;
        sum += coefficient[i] * function_norm(l + 1 + i, zeta[i]) * power *
               exp(-zeta[i] * r);
    }
    return sum;
}

/* An orbital without its normalisations: c[i] r^(l+1+i) e^(-zeta[i] r). */
struct series {
    int l, count;
    const double *zeta;
    double c[BLOCK_MAX];
};

/* r dP/dr, and in *bend r d/dr of that, both over r^(l+1) e^(-zeta r) of the
 * own function, whose size does not matter for their zeros and signs. */
static double series_slope(const struct series *s, double r, double *bend)
{
    double slope = 0.0, power = 1.0;
    *bend = 0.0;
    for (int i = 0; i < s->count; i++) {
        double n = s->l + 1 + i - s->zeta[i] * r;
        double term = s->c[i] * power * exp(-s->zeta[i] * r);
        slope += term * n;
        *bend += term * (n * n - s->zeta[i] * r);
        power *= r;
    }
    return slope;
}

/* The maximum of P^2 that belongs to function `own`: the one next to the
 * maximum n/zeta of that function alone, by Newton's method in ln r kept
 * between the places where the slope is known to turn. */
static double peak_radius(const struct energy *e, int l, int own,
                          const double coefficient[])
{
    const struct energy_block *b = &e->atom.block[l];
    struct series s = {.l = l, .count = b->count, .zeta = &e->zeta[b->first]};
    for (int i = 0; i < b->count; i++)
        s.c[i] = coefficient[i] * function_norm(l + 1 + i, s.zeta[i]);
    double sign = copysign(1.0, s.c[own]);
    double r = (l + 1 + own) / s.zeta[own], low = 0.4 * r, high = 2.5 * r;
    for (int turn = 0; turn < 60; turn++) {
        double bend, slope = sign * series_slope(&s, r, &bend);
        if (slope > 0.0)
            low = r;
        else
            high = r;
        double next = r * exp(-slope / (sign * bend));
        if (!(sign * bend < 0.0) || !(next > low) || !(next < high))
            next = sqrt(low * high);
        if (fabs(next - r) <= 1e-12 * r)
            return next;
        r = next;
    }
    return r;
}

static double mean_radius(const struct energy *e, int l,
                          const double coefficient[])
{
    const struct energy_block *b = &e->atom.block[l];
    double sum = 0.0;
    for (int i = 0; i < b->count; i++) {
        for (int j = 0; j < b->count; j++) {
            int p = e->charge_at[b->first + i][b->first + j];
            double a = e->zeta[b->first + i] + e->zeta[b->first + j];
            sum += coefficient[i] * coefficient[j] * e->charges.s[p] *
                   (e->charges.N[p] + 1) / a;
        }
    }
    return sum;
}

void orbitals_fill(const struct energy *e, struct zeta_subshell shells[])
{
    for (int l = 0; l < BLOCK_COUNT; l++) {
        const struct energy_block *b = &e->atom.block[l];
        if (b->count == 0)
            continue;
        block_orbitals(e, l, &shells[b->first]);
        const double *zeta = &e->zeta[b->first];
        for (int i = 0; i < b->count; i++) {
            struct zeta_subshell *shell = &shells[b->first + i];
            shell->n = l + 1 + i;
            shell->l = l;
            shell->occ = e->atom.occ[b->first + i];
            shell->zeta = zeta[i];
            shell->z_eff = shell->n * zeta[i];
            shell->mean_radius = mean_radius(e, l, shell->coefficient);
            shell->peak_radius = peak_radius(e, l, i, shell->coefficient);
            double tail = zeta_orbital_value(
                l, b->count, zeta, shell->coefficient, shell->peak_radius);
            for (int k = 0; k < N_MAX; k++)
                if (k >= b->count)
                    shell->coefficient[k] = 0.0;
                else if (tail < 0.0)
                    shell->coefficient[k] = -shell->coefficient[k];
        }
    }
}
