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
    double *sum;
    double *block;
};

struct mixer *mixer_new(int capacity, struct status *st)
{
    struct mixer *m = calloc(1, sizeof *m);
    size_t n = (size_t)capacity + 2;
    double *block = calloc(n * (2 * H + 1), sizeof *block);
    if (!m || !block) {
        free(m);
        free(block);
        status_fail(st, STATUS_MEMORY, "out of memory for mixing %d numbers",
                    capacity);
        return NULL;
    }
    m->block = block;
    m->capacity = capacity;
    for (int k = 0; k < H; k++) {
        m->x[k] = block + n * (size_t)(2 * k);
        m->f[k] = block + n * (size_t)(2 * k + 1);
    }
    m->sum = block + n * 2 * H;
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

/* Two numbers at a time, anywhere in memory; the work space is padded. */
typedef double pair __attribute__((vector_size(16), aligned(8), may_alias));

static pair load(const double *at)
{
    return *(const pair *)(const void *)at;
}

static void store(double *at, pair value)
{
    *(pair *)(void *)at = value;
}

static double dot(int n, const double *a, const double *b)
{
    pair sum = {0};
    for (int i = 0; i + 1 < n; i += 2)
        sum += load(a + i) * load(b + i);
    return sum[0] + sum[1] + (n % 2 ? a[n - 1] * b[n - 1] : 0.0);
}

/* x = Σ part_k (x_k + beta f_k) over the trials held, newest first. */
static void combine(struct mixer *m, int now, const double *part, double beta,
                    double *x)
{
    memset(m->sum, 0, (size_t)(m->n + 1) * sizeof *m->sum);
    for (int k = 0; k < m->held; k++) {
        int old = (now - k + H) % H;
        double a = part[k], b = part[k] * beta;
        for (int i = 0; i < m->n; i += 2)
            store(m->sum + i, load(m->sum + i) + a * load(m->x[old] + i) +
                                  b * load(m->f[old] + i));
    }
    memcpy(x, m->sum, (size_t)m->n * sizeof *x);
}

/* Cholesky solution of the m×m system in the differences of residuals, the
 * newest first; a direction that depends on earlier ones gets 0. */
static void solve(int m, double a[H][H], double *b)
{
    bool used[H] = {false};
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
    for (int i = 0; i < m->measured; i++)
        m->sum[i] = weight[i] * m->f[now][i];
    for (int k = 0; k < m->held; k++) {
        int old = (now - k + H) % H;
        double p = dot(m->measured, m->sum, m->f[old]);
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
    double part[H] = {1.0};
    for (int j = 1; j < m->held; j++) {
        part[j] = theta[j - 1];
        part[0] -= theta[j - 1];
    }
    combine(m, now, part, beta, x);
    return sqrt(whole);
}
