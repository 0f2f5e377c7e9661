/* SPDX-License-Identifier: MIT */
/* bench_wait PROGRAM: how long a key waits for its answer while the map is
 * being filled by the self-consistent atom, how long filling takes, and what
 * memory that needs. The model is chosen by keys: `b` opens the list at slater,
 * the letter s goes to the next that begins with it, Enter takes it. */
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "bench_pty.h"

enum { KEYS_MAX = 400, GAP_MS = 20, SETTLE_MS = 400, ANSWER_MS = 500 };
static const double limit_ms = 20;

/* A line of /proc/PID/status, in kB; 0 when there is none. */
static long status_kb(int pid, const char *name)
{
    char path[64], line[256];
    long kb = 0;
    snprintf(path, sizeof path, "/proc/%d/status", pid);
    FILE *f = fopen(path, "r");
    while (f && fgets(line, sizeof line, f))
        if (strncmp(line, name, strlen(name)) == 0)
            kb = strtol(line + strlen(name) + 1, NULL, 10);
    if (f)
        fclose(f);
    return kb;
}

/* Processor time of a process in ms, from /proc/PID/stat (fields 14, 15). */
static double cpu_ms(int pid)
{
    char path[64], line[1024];
    double ticks = 0;
    snprintf(path, sizeof path, "/proc/%d/stat", pid);
    FILE *f = fopen(path, "r");
    if (f && fgets(line, sizeof line, f)) {
        char *at = strrchr(line, ')');
        for (int field = 2; at && field < 14; field++)
            at = strchr(at + 1, ' ');
        char *next = at;
        if (at)
            ticks =
                (double)strtol(at, &next, 10) + (double)strtol(next, NULL, 10);
    }
    if (f)
        fclose(f);
    return 10.0 * ticks;
}

static void choose_scf(struct bench *b)
{
    bench_read(b, SETTLE_MS, NULL);
    bench_send(b, "b");
    bench_read(b, SETTLE_MS, NULL);
    bench_send(b, "s");
    bench_read(b, SETTLE_MS, NULL);
    bench_send(b, "s");
    bench_read(b, SETTLE_MS, NULL);
    bench_send(b, "\r");
    struct burst taken = bench_read(b, SETTLE_MS, "scf");
    if (taken.bytes == 0) {
        fprintf(stderr, "the model scf was not chosen\n");
        exit(EXIT_FAILURE);
    }
}

int main(int argc, char **argv)
{
    /* to and fro in the keypad's cursor mode */
    static const char *const keys[] = {"\033OC", "\033OD"};
    static double waits[KEYS_MAX];
    int count = 0;
    if (argc != 2)
        return EXIT_FAILURE;
    struct bench b = bench_start(argv + 1);
    choose_scf(&b);
    double cpu = cpu_ms(b.pid);
    double begun = bench_now();
    double busy = begun;
    /* The map is full when the processor is not asked for any more. */
    while (count < KEYS_MAX && bench_now() - busy < 1.0) {
        double before = cpu_ms(b.pid);
        bench_read(&b, GAP_MS, NULL);
        double sent = bench_now();
        bench_send(&b, keys[count % 2]);
        struct burst answer = bench_read(&b, ANSWER_MS, "");
        if (answer.bytes == 0)
            break;
        waits[count++] = 1e3 * (answer.last - sent);
        if (cpu_ms(b.pid) - before > 10.0)
            busy = bench_now();
    }
    double spent = cpu_ms(b.pid) - cpu;
    long memory = status_kb(b.pid, "VmHWM:");
    bench_end(&b);
    if (count == 0)
        return EXIT_FAILURE;
    double median = bench_median(waits, count);
    printf("%d keys while the map fills: answered after %.2f ms (median), "
           "%.2f ms (most; at most %.0f)\n",
           count, median, waits[count - 1], limit_ms);
    printf("map filled in %.0f ms of processor time; peak memory %ld kB\n",
           spent, memory);
    return median <= limit_ms ? EXIT_SUCCESS : EXIT_FAILURE;
}
