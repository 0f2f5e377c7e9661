/* SPDX-License-Identifier: MIT */
#include "bench_pty.h"

#include <fcntl.h>
#include <poll.h>
#include <signal.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/ioctl.h>
#include <sys/wait.h>
#include <termios.h>
#include <time.h>
#include <unistd.h>

double bench_now(void)
{
    struct timespec now;
    clock_gettime(CLOCK_MONOTONIC, &now);
    return (double)now.tv_sec + 1e-9 * (double)now.tv_nsec;
}

static void fail(const char *what)
{
    perror(what);
    exit(EXIT_FAILURE);
}

struct bench bench_start(char *const *argv)
{
    static char term[] = "TERM=xterm-256color";
    static char locale[] = "LC_ALL=C.UTF-8";
    static char home[] = "HOME=none";
    static char memory[] = "XDG_STATE_HOME=none";
    char *environment[] = {term, locale, home, memory, NULL};
    struct bench b = {.master = posix_openpt(O_RDWR | O_NOCTTY)};
    if (b.master < 0 || grantpt(b.master) != 0 || unlockpt(b.master) != 0)
        fail("pseudo-terminal");
    struct winsize size = {.ws_row = 24, .ws_col = 80};
    ioctl(b.master, TIOCSWINSZ, &size);
    const char *name = ptsname(b.master);
    fcntl(b.master, F_SETFD, FD_CLOEXEC);
    b.started = bench_now();
    b.pid = fork();
    if (b.pid < 0)
        fail("fork");
    if (b.pid == 0) {
        setsid();
        int slave = open(name, O_RDWR); /* becomes the controlling terminal */
        for (int i = 0; i < 3; i++)
            dup2(slave, i);
        execve(argv[0], argv, environment);
        _exit(127);
    }
    return b;
}

struct burst bench_read(struct bench *b, int quiet_ms, const char *mark)
{
    static char kept[1 << 16];
    struct burst burst = {0};
    struct pollfd fd = {.fd = b->master, .events = POLLIN};
    while (poll(&fd, 1, quiet_ms) > 0 && burst.bytes < sizeof kept - 1) {
        ssize_t n =
            read(b->master, kept + burst.bytes, sizeof kept - 1 - burst.bytes);
        if (n <= 0)
            break; /* the program has ended */
        burst.bytes += (size_t)n;
        burst.last = bench_now();
        kept[burst.bytes] = '\0';
        if (mark != NULL && strstr(kept, mark) != NULL)
            break;
    }
    return burst;
}

void bench_send(struct bench *b, const char *bytes)
{
    if (write(b->master, bytes, strlen(bytes)) < 0)
        fail("write");
}

void bench_end(struct bench *b)
{
    kill(b->pid, SIGTERM);
    bench_read(b, 200, NULL);
    kill(b->pid, SIGKILL);
    waitpid(b->pid, NULL, 0);
    close(b->master);
}

static int ascending(const void *a, const void *b)
{
    double x = *(const double *)a;
    double y = *(const double *)b;
    return (x > y) - (x < y);
}

double bench_median(double *values, int count)
{
    qsort(values, (size_t)count, sizeof values[0], ascending);
    return values[count / 2];
}
