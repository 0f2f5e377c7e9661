/* SPDX-License-Identifier: MIT */
/* Signals while the screen is open. Handlers only note the signal and write a
 * byte to a pipe that the event loop polls; a crash writes a reset string made
 * beforehand and puts the terminal's modes back, both async-signal-safe, and
 * then lets the signal take its course. */
#ifndef TERMINAL_GUARD_H
#define TERMINAL_GUARD_H

#include <stdbool.h>
#include <stddef.h>
#include <termios.h>

#include "base/status.h"

#define GUARD_RESET_MAX 256

/* What to do when the program dies in the middle of something. */
struct guard_rescue {
    int fd;               /* terminal to write to; -1: none */
    struct termios modes; /* as found */
    bool has_modes;
    char reset[GUARD_RESET_MAX]; /* leaves the screen, cursor on, … */
    size_t reset_length;
};

/* Signals noted since the last call of guard_take. */
struct guard_news {
    bool interrupt; /* SIGINT */
    bool stop;      /* SIGTSTP */
    bool resumed;   /* SIGCONT */
    int death;      /* SIGTERM, SIGHUP or SIGQUIT; 0: none */
};

/* Notes every handler as it is: before newterm, which installs its own. */
void guard_remember(void);

/* Installs the handlers, after newterm; signals that were ignored stay
 * ignored. SIGWINCH still reaches the handler of curses. Fails with
 * STATUS_TERMINAL when no pipe can be made. */
MUST_CHECK bool guard_open(const struct guard_rescue *rescue,
                           struct status *st);

/* Puts every handler back as guard_remember found it. Safe to call again. */
void guard_close(void);

/* The end of the pipe to poll; it is readable when there is news. */
int guard_fd(void);

struct guard_news guard_take(void);

/* Keep SIGTSTP waiting while curses writes: it ignores the signal meanwhile,
 * and a suspend key pressed just then would be lost. */
void guard_hold(void);
void guard_release(void);

/* Stops this process as SIGTSTP does by default; returns when it goes on. */
void guard_stop(void);

/* Ends this process by the signal's default action, so that the parent sees
 * which one it was. Returns only if the signal is ignored. */
void guard_die(int signal);

#endif
