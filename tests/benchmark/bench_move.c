/* SPDX-License-Identifier: MIT */
/* bench_move PROGRAM [ARGUMENT…]: bytes to the terminal and time per move of
 * the selection at 80 x 24, round and round six cells, and bytes while idle.
 * The first round is apart: it may set work going. */
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>

#include "bench_pty.h"

enum { CELLS = 6, ROUNDS = 8, QUIET_MS = 50, SETTLE_MS = 300, BYTES_MAX = 200 };

struct moves {
    double bytes[CELLS * ROUNDS], ms[CELLS * ROUNDS], most;
    int count;
};

static void move(struct bench *b, struct moves *m, const char *key)
{
    double sent = bench_now();
    bench_send(b, key);
    struct burst burst = bench_read(b, QUIET_MS, NULL);
    m->bytes[m->count] = (double)burst.bytes;
    m->ms[m->count++] = burst.bytes ? 1e3 * (burst.last - sent) : 0;
    if ((double)burst.bytes > m->most)
        m->most = (double)burst.bytes;
}

static double print(const char *what, struct moves *m)
{
    double median = bench_median(m->bytes, m->count);
    printf("%s: %.0f bytes (median), %.0f (most), %.2f ms (median)\n", what,
           median, m->most, bench_median(m->ms, m->count));
    return median;
}

int main(int argc, char **argv)
{
    /* right, right, down, left, left, up in the keypad's cursor mode */
    static const char *const keys[CELLS] = {"\033OC", "\033OC", "\033OB",
                                            "\033OD", "\033OD", "\033OA"};
    static struct moves first;
    static struct moves again;
    if (argc < 2)
        return EXIT_FAILURE;
    struct bench b = bench_start(argv + 1);
    struct burst screen = bench_read(&b, SETTLE_MS, NULL);
    for (int round = 0; round < ROUNDS; round++)
        for (int i = 0; i < CELLS; i++)
            move(&b, round == 0 ? &first : &again, keys[i]);
    struct burst idle = bench_read(&b, 1000, NULL);
    bench_end(&b);
    printf("first screen: %zu bytes; idle: %zu bytes\n", screen.bytes,
           idle.bytes);
    print("a move to a new cell", &first);
    double median = print("a move (at most 200 bytes)", &again);
    bool fits = median > 0 && again.most <= BYTES_MAX && idle.bytes == 0;
    return fits ? EXIT_SUCCESS : EXIT_FAILURE;
}
