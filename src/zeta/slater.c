/* SPDX-License-Identifier: MIT */
#include "zeta/slater.h"

#include <assert.h>

void zeta_slater_tables_fill(struct slater_tables *tables)
{
    for (int Q = 0; Q <= SLATER_SECOND_MAX; Q++) {
        tables->ratio[Q][0] = (slater_lanes){0.0, 0.0};
        for (int u = 1; u <= SLATER_CHAIN_MAX; u++) {
            double ratio = (double)u / (u + Q);
            tables->ratio[Q][u] = (slater_lanes){ratio, ratio};
        }
    }
    for (int N = 1; N <= SLATER_POWER_MAX; N++) {
        double column = 1.0 / N; /* (N-1)!/N! */
        for (int M = 0; M <= SLATER_POWER_MAX; M++) {
            tables->choose[N][M] = column;
            column *= (double)(N + M) / (M + 1);
        }
    }
    for (int k = 0; k < SLATER_ORDER_MAX; k++)
        for (int N = k + 1; N <= SLATER_POWER_MAX; N++)
            for (int M = k + 1; M <= SLATER_POWER_MAX; M++)
                tables->descend[k][N][M] = (double)(N - k - 1) / (M + k + 1);
}

double zeta_slater_integral(const struct slater_tables *tables, int N, double a,
                            int M, double b, int k, double *log_a)
{
    assert(N > k && M > k && N <= SLATER_POWER_MAX && M <= SLATER_POWER_MAX);
    assert(k >= 0 && k <= SLATER_ORDER_MAX);
    struct slater_halves h;
    slater_top(tables, (slater_lanes){a, a}, N, (slater_lanes){b, b}, M, k, &h);
    /* a dR/da of the unnormalised integral is -(N+k+1) inner - (N-k) outer;
     * the normalisation a^(N+1) adds N+1 */
    *log_a = (k + 1) * h.outer[0] - k * h.inner[0];
    return h.inner[0] + h.outer[0];
}
