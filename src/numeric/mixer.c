/* SPDX-License-Identifier: MIT */
#include "numeric/mixer.h"

#include <assert.h>
#include <math.h>
#include <stdbool.h>
#include <stdlib.h>
#include <string.h>

enum { H = MIXER_HISTORY + 1 };

/* Relative size below which a direction of the history tells nothing new. */
static const double DEPENDENT = 1e-12;

struct mixer {
    int capacity, n, measured, held, newest;
    double *x[H], *f[H];  /* trials and their residuals, a ring */
    double product[H][H]; /* of residuals */
    double *block;
};

struct mixer *mixer_new(int capacity, struct status *st)
{
    struct mixer *m = calloc(1, sizeof *m);
    double *block = calloc((size_t)capacity * 2 * H, sizeof *block);
    if (!m || !block) {
        free(m);
        free(block);
        status_fail(st, STATUS_MEMORY, "mixing %d numbers", capacity);
        return NULL;
    }
    m->block = block;
    m->capacity = capacity;
    for (int k = 0; k < H; k++) {
        m->x[k] = block + (size_t)capacity * (size_t)(2 * k);
        m->f[k] = block + (size_t)capacity * (size_t)(2 * k + 1);
    }
    return m;
}

void mixer_free(struct mixer *mixer)
{
    if (!mixer)
        return;
    free(mixer->block);
    free(mixer);
}

void mixer_reset(struct mixer *mixer, int n, int measured)
{
    assert(n <= mixer->capacity && measured <= n);
    mixer->n = n;
    mixer->measured = measured;
    mixer->held = 0;
    mixer->newest = 0;
}

static double dot(int n, const double *w, const double *a, const double *b)
{
    double sum = 0.0;
    for (int i = 0; i < n; i++)
        sum += w[i] * a[i] * b[i];
    return sum;
}

/* Cholesky solution of the m×m system in the differences of residuals, the
 * newest first; a direction that depends on earlier ones gets 0. */
static void solve(int m, double a[H][H], double *b)
{
    bool used[H];
    for (int k = 0; k < m; k++) {
        double before = a[k][k];
        for (int j = 0; j < k; j++) {
            if (!used[j])
                continue;
            double sum = a[k][j];
            for (int i = 0; i < j; i++)
                if (used[i])
                    sum -= a[k][i] * a[j][i];
            a[k][j] = sum / a[j][j];
            b[k] -= a[k][j] * b[j];
        }
        for (int j = 0; j < k; j++)
            if (used[j])
                a[k][k] -= a[k][j] * a[k][j];
        used[k] = a[k][k] > DEPENDENT * before;
        if (used[k]) {
            a[k][k] = sqrt(a[k][k]);
            b[k] /= a[k][k];
        }
    }
    for (int k = m - 1; k >= 0; k--) {
        if (!used[k]) {
            b[k] = 0.0;
            continue;
        }
        for (int i = k + 1; i < m; i++)
            if (used[i])
                b[k] -= a[i][k] * b[i];
        b[k] /= a[k][k];
    }
}

double mixer_next(struct mixer *mixer, const double *weight, double beta,
                  double *x, const double *g)
{
    struct mixer *m = mixer;
    int n = m->n, now = m->held ? (m->newest + 1) % H : 0;
    m->newest = now;
    m->held = m->held < H ? m->held + 1 : H;
    for (int i = 0; i < n; i++) {
        m->x[now][i] = x[i];
        m->f[now][i] = g[i] - x[i];
    }
    for (int k = 0; k < m->held; k++) {
        int old = (now - k + H) % H;
        double p = dot(m->measured, weight, m->f[now], m->f[old]);
        m->product[now][old] = m->product[old][now] = p;
    }
    double a[H][H], theta[H], whole = m->product[now][now];
    for (int j = 1; j < m->held; j++) {
        int oj = (now - j + H) % H;
        theta[j - 1] = whole - m->product[now][oj];
        for (int k = 1; k <= j; k++) {
            int ok = (now - k + H) % H;
            a[j - 1][k - 1] = whole - m->product[now][oj] -
                              m->product[now][ok] + m->product[oj][ok];
        }
    }
    solve(m->held - 1, a, theta);
    for (int i = 0; i < n; i++)
        x[i] += beta * m->f[now][i];
    for (int j = 1; j < m->held; j++) {
        int old = (now - j + H) % H;
        const double *ox = m->x[old], *of = m->f[old];
        const double *nx = m->x[now], *nf = m->f[now];
        double t = theta[j - 1];
        for (int i = 0; i < n; i++)
            x[i] += t * (ox[i] - nx[i] + beta * (of[i] - nf[i]));
    }
    return sqrt(whole);
}
