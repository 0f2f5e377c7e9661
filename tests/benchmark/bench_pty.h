/* SPDX-License-Identifier: MIT */
/* A program on a pseudo-terminal of 24 x 80 with nothing in between, for
 * measuring: bytes and the moment of the last one. */
#ifndef BENCHMARK_BENCH_PTY_H
#define BENCHMARK_BENCH_PTY_H

#include <stddef.h>

struct bench {
    int pid, master;
    double started; /* seconds */
};

/* What came until nothing came for a while, the program ended, or the mark
 * (unless NULL) had come. */
struct burst {
    size_t bytes;
    double last; /* seconds, when the last of them came; 0: none did */
};

double bench_now(void);

/* Starts argv (NULL at the end) in an environment of its own; ends the
 * benchmark when it cannot. */
struct bench bench_start(char *const *argv);
struct burst bench_read(struct bench *bench, int quiet_ms, const char *mark);
void bench_send(struct bench *bench, const char *bytes);
/* Ends the program, by force if it must. */
void bench_end(struct bench *bench);

/* The middle one of count values, which are sorted. */
double bench_median(double *values, int count);

#endif
