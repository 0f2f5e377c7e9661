/* SPDX-License-Identifier: MIT */
/* bench_start BASE MARK PROGRAM [ARGUMENT…]: time from the start of a program
 * until its first screen has reached MARK, a text near its lower end, against
 * BASE, which only opens and closes curses; both by turns in one run, the
 * median of each. */
#include <stdio.h>
#include <stdlib.h>

#include "bench_pty.h"

enum { ROUNDS = 41, QUIET_MS = 60 };
static const double limit = 2;

static double one(char *const *argv, const char *mark)
{
    struct bench b = bench_start(argv);
    struct burst burst = bench_read(&b, QUIET_MS, mark);
    bench_end(&b);
    if (burst.bytes == 0) {
        fprintf(stderr, "%s showed nothing\n", argv[0]);
        exit(EXIT_FAILURE);
    }
    return burst.last - b.started;
}

int main(int argc, char **argv)
{
    if (argc < 4)
        return EXIT_FAILURE;
    char *base[] = {argv[1], NULL};
    double base_s[ROUNDS];
    double program_s[ROUNDS];
    one(base, NULL); /* into the cache */
    one(argv + 3, argv[2]);
    for (int i = 0; i < ROUNDS; i++) {
        base_s[i] = one(base, NULL);
        program_s[i] = one(argv + 3, argv[2]);
    }
    double base_ms = 1e3 * bench_median(base_s, ROUNDS);
    double program_ms = 1e3 * bench_median(program_s, ROUNDS);
    double ratio = program_ms / base_ms;
    printf("start to first screen: %.2f ms; opening and closing curses: "
           "%.2f ms; ratio %.2f (at most %.0f)\n",
           program_ms, base_ms, ratio, limit);
    return ratio <= limit ? EXIT_SUCCESS : EXIT_FAILURE;
}
