/* SPDX-License-Identifier: MIT */
/* bench_move PROGRAM [ARGUMENT…]: bytes to the terminal and time per move of
 * the selection at 80 x 24, and bytes while idle. */
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>

#include "bench_pty.h"

enum { MOVES = 60, QUIET_MS = 15, SETTLE_MS = 300, BYTES_MAX = 200 };

int main(int argc, char **argv)
{
    static const char *const keys[] = {"\033OB", "\033OC", "\033OC",
                                       "\033OB", "\033OC", "\033OA"};
    if (argc < 2)
        return EXIT_FAILURE;
    struct bench b = bench_start(argv + 1);
    struct burst first = bench_read(&b, SETTLE_MS);
    double bytes[MOVES];
    double time_ms[MOVES];
    double most = 0;
    for (int i = 0; i < MOVES; i++) {
        double sent = bench_now();
        bench_send(&b, keys[i % 6]);
        struct burst move = bench_read(&b, QUIET_MS);
        bytes[i] = (double)move.bytes;
        time_ms[i] = move.bytes ? 1e3 * (move.last - sent) : 0;
        most = bytes[i] > most ? bytes[i] : most;
    }
    struct burst idle = bench_read(&b, 1000);
    bench_end(&b);
    double median = bench_median(bytes, MOVES);
    printf("first screen: %zu bytes; a move: %.0f bytes (median), %.0f (most; "
           "at most %d), %.2f ms (median); idle: %zu bytes\n",
           first.bytes, median, most, BYTES_MAX, bench_median(time_ms, MOVES),
           idle.bytes);
    bool fits = most <= BYTES_MAX && median > 0 && idle.bytes == 0;
    return fits ? EXIT_SUCCESS : EXIT_FAILURE;
}
