/* SPDX-License-Identifier: MIT */
#include "terminal/guard.h"

#include <errno.h>
#include <fcntl.h>
#include <poll.h>
#include <signal.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

/* A loop that has not looked at this many signals of one kind is stuck, and
 * the next one ends the program at once. */
enum { PATIENCE = 4, CRASH_STACK = 64 * 1024 };

static const int watched[] = {SIGINT,  SIGTERM, SIGHUP,   SIGQUIT,
                              SIGTSTP, SIGCONT, SIGWINCH, SIGSEGV,
                              SIGABRT, SIGBUS,  SIGFPE,   SIGILL};
enum { WATCHED = sizeof watched / sizeof watched[0], FIRST_CRASH = 7 };

/* Handlers can reach nothing else, so this is file-level. */
static struct guard {
    bool open;
    struct guard_rescue rescue;
    int pipe[2];
    struct sigaction found[WATCHED];
    bool taken[WATCHED];
    void (*curses_resize)(int);
    volatile sig_atomic_t count[WATCHED];
    stack_t found_stack;
    void *stack;
} guard = {.pipe = {-1, -1}};

static int place_of(int signal)
{
    for (int i = 0; i < WATCHED; i++)
        if (watched[i] == signal)
            return i;
    return 0;
}

/* Async-signal-safe. A terminal that takes nothing must not keep us. */
static void rescue_terminal(void)
{
    const struct guard_rescue *r = &guard.rescue;
    if (r->fd < 0)
        return;
    struct pollfd ready = {.fd = r->fd, .events = POLLOUT};
    if (poll(&ready, 1, 100) == 1 && (ready.revents & POLLOUT) != 0) {
        ssize_t done = write(r->fd, r->reset, r->reset_length);
        (void)done; /* nothing better can be done here */
    }
    if (r->has_modes)
        tcsetattr(r->fd, TCSANOW, &r->modes);
}

/* Puts back what was there before us (a default action, or a checker's own
 * report) and lets the signal come again. */
static void pass_on(int signal)
{
    sigaction(signal, &guard.found[place_of(signal)], NULL);
    raise(signal);
}

static void on_crash(int signal)
{
    int saved = errno;
    rescue_terminal();
    pass_on(signal);
    errno = saved;
}

static void on_news(int signal)
{
    int saved = errno;
    int i = place_of(signal);
    if (guard.count[i] < PATIENCE) {
        guard.count[i]++;
    } else if (signal == SIGINT || signal == SIGTERM || signal == SIGQUIT) {
        rescue_terminal();
        pass_on(signal);
    }
    char byte = 0;
    ssize_t done = write(guard.pipe[1], &byte, 1);
    (void)done; /* a full pipe wakes the loop as well */
    if (signal == SIGWINCH && guard.curses_resize != NULL)
        guard.curses_resize(signal); /* notes it for the next read */
    errno = saved;
}

static bool open_pipe(struct status *st)
{
    if (pipe(guard.pipe) != 0)
        return status_fail(st, STATUS_TERMINAL, "no pipe for signals: %s",
                           strerror(errno));
    for (int i = 0; i < 2; i++) {
        int flags = fcntl(guard.pipe[i], F_GETFL);
        fcntl(guard.pipe[i], F_SETFL, flags | O_NONBLOCK);
        fcntl(guard.pipe[i], F_SETFD, FD_CLOEXEC);
    }
    return true;
}

/* A crash may be an overflow of the ordinary stack. */
static void open_stack(void)
{
    guard.stack = malloc(CRASH_STACK);
    if (guard.stack == NULL)
        return;
    stack_t own = {.ss_sp = guard.stack, .ss_size = CRASH_STACK};
    if (sigaltstack(&own, &guard.found_stack) != 0) {
        free(guard.stack);
        guard.stack = NULL;
    }
}

void guard_remember(void)
{
    guard_close();
    for (int i = 0; i < WATCHED; i++) {
        guard.taken[i] = false;
        if (sigaction(watched[i], NULL, &guard.found[i]) != 0)
            guard.found[i].sa_handler = SIG_DFL;
    }
}

static void install(int i)
{
    struct sigaction own = {0};
    struct sigaction curses;
    sigemptyset(&own.sa_mask);
    own.sa_handler = i < FIRST_CRASH ? on_news : on_crash;
    own.sa_flags = i < FIRST_CRASH ? 0 : SA_ONSTACK;
    if (sigaction(watched[i], NULL, &curses) != 0)
        return;
    if (watched[i] == SIGWINCH && curses.sa_handler != SIG_DFL &&
        curses.sa_handler != SIG_IGN)
        guard.curses_resize = curses.sa_handler;
    /* what was ignored (nohup, a shell without job control) stays ignored */
    if (guard.found[i].sa_handler != SIG_IGN)
        guard.taken[i] = sigaction(watched[i], &own, NULL) == 0;
}

bool guard_open(const struct guard_rescue *rescue, struct status *st)
{
    guard.curses_resize = NULL;
    if (!open_pipe(st))
        return false;
    guard.rescue = *rescue;
    open_stack();
    for (int i = 0; i < WATCHED; i++) {
        guard.count[i] = 0;
        install(i);
    }
    guard.open = true;
    return true;
}

void guard_close(void)
{
    if (!guard.open)
        return;
    guard.open = false;
    for (int i = 0; i < WATCHED; i++)
        if (guard.taken[i])
            sigaction(watched[i], &guard.found[i], NULL);
    if (guard.stack != NULL) {
        stack_t none = {.ss_flags = SS_DISABLE};
        bool before = (guard.found_stack.ss_flags & SS_DISABLE) == 0;
        sigaltstack(before ? &guard.found_stack : &none, NULL);
        free(guard.stack);
        guard.stack = NULL;
    }
    for (int i = 0; i < 2; i++) {
        close(guard.pipe[i]);
        guard.pipe[i] = -1;
    }
}

int guard_fd(void)
{
    return guard.pipe[0];
}

/* With the handlers held off, or a signal between the two lines is lost. */
static bool take(int signal)
{
    int i = place_of(signal);
    bool noted = guard.count[i] > 0;
    guard.count[i] = 0;
    return noted;
}

struct guard_news guard_take(void)
{
    sigset_t held;
    sigset_t before;
    sigemptyset(&held);
    for (int i = 0; i < FIRST_CRASH; i++)
        sigaddset(&held, watched[i]);
    sigprocmask(SIG_BLOCK, &held, &before);
    char bytes[64];
    while (read(guard.pipe[0], bytes, sizeof bytes) > 0)
        ;
    struct guard_news news = {.interrupt = take(SIGINT),
                              .stop = take(SIGTSTP),
                              .resumed = take(SIGCONT)};
    take(SIGWINCH);
    static const int deaths[] = {SIGQUIT, SIGHUP, SIGTERM};
    for (int i = 0; i < 3; i++)
        if (take(deaths[i]))
            news.death = deaths[i];
    sigprocmask(SIG_SETMASK, &before, NULL);
    return news;
}

static void mask_stop(int how)
{
    sigset_t stop;
    sigemptyset(&stop);
    sigaddset(&stop, SIGTSTP);
    sigprocmask(how, &stop, NULL);
}

void guard_hold(void)
{
    mask_stop(SIG_BLOCK);
}

void guard_release(void)
{
    mask_stop(SIG_UNBLOCK);
}

void guard_stop(void)
{
    struct sigaction before;
    struct sigaction plain = {0};
    sigemptyset(&plain.sa_mask);
    plain.sa_handler = SIG_DFL;
    if (sigaction(SIGTSTP, &plain, &before) != 0)
        return;
    raise(SIGTSTP);
    sigaction(SIGTSTP, &before, NULL);
    guard.count[place_of(SIGCONT)] = 0; /* the one that woke us */
}

void guard_die(int signal)
{
    struct sigaction plain = {0};
    sigemptyset(&plain.sa_mask);
    plain.sa_handler = SIG_DFL;
    sigaction(signal, &plain, NULL);
    sigset_t one;
    sigemptyset(&one);
    sigaddset(&one, signal);
    sigprocmask(SIG_UNBLOCK, &one, NULL);
    raise(signal);
}
