/* SPDX-License-Identifier: MIT */
/* Runs a program on a pseudo-terminal whose other end is a terminal emulator
 * (libvterm), so that a test sees the screen as a user would. Between them
 * stands a small job-controlling parent, as a shell would be, so that stopping
 * works. Everything waits for what it expects with a deadline; a deadline that
 * passes aborts the test and prints the screen. */
#ifndef SUPPORT_PTY_H
#define SUPPORT_PTY_H

#include <stdbool.h>
#include <stddef.h>
#include <stdint.h>
#include <termios.h>

struct pty_options {
    const char *const *argv; /* NULL at the end; argv[0] is the path */
    int rows, columns;
    /* NAME=VALUE …, NULL at the end, put over a bare environment with TERM
     * xterm-256color, LC_ALL C.UTF-8; NAME alone removes one. May be NULL. */
    const char *const *env;
    const char *directory; /* to run in; NULL: as is */
    bool keep_hangup;      /* the parent does not pass SIGHUP on */
    bool ignore_stop;      /* SIGTSTP is ignored from the start */
};

struct pty;

/* Starts the program; aborts the test when that fails. */
struct pty *pty_start(const struct pty_options *options);

/* Ends what still runs (SIGKILL) and frees; NULL is fine. */
void pty_free(struct pty *pty);

/* Bytes to the program; text without its terminator. */
void pty_send(struct pty *pty, const void *bytes, size_t length);
void pty_type(struct pty *pty, const char *text);

/* What the terminal's description says that a key sends ("kcuu1"). */
void pty_key(struct pty *pty, const char *capability);

/* Reads what comes until the screen holds the text, or no longer does. Only a
 * text that was expected before may be expected to go: otherwise its absence
 * may come before it. */
void pty_expect(struct pty *pty, const char *text);
void pty_expect_gone(struct pty *pty, const char *text);

/* Reads what comes until the cursor stands there. */
void pty_expect_cursor(struct pty *pty, int row, int column);

/* Reads all that has been written to the terminal until now. */
void pty_drain(struct pty *pty);

/* Reads what comes until the program has switched a private mode on or off. */
void pty_expect_mode(struct pty *pty, int mode, bool on);

/* Reads what comes until the bytes written after the first `from` (as by
 * pty_count) hold the text. */
void pty_expect_output(struct pty *pty, size_t from, const char *text);

/* Reads what comes until the program shows the second screen. */
void pty_expect_full_screen(struct pty *pty);

/* Reads until nothing has come for quiet_ms. */
void pty_settle(struct pty *pty, int quiet_ms);

bool pty_shows(struct pty *pty, const char *text);

/* One row, trailing blanks cut; valid until the next call for any row. */
const char *pty_row(struct pty *pty, int row);

/* The whole screen, rows parted by newlines; the caller frees it. */
char *pty_screen(struct pty *pty);

struct pty_look {
    uint32_t character;
    uint32_t foreground, background; /* 0xRRGGBB */
    bool default_foreground, default_background;
    bool bold, underline, reverse;
};
struct pty_look pty_look(struct pty *pty, int row, int column);

void pty_cursor(struct pty *pty, int *row, int *column, bool *visible);
/* True while the program shows the second screen. */
bool pty_full_screen(const struct pty *pty);
/* True when the program has switched a private mode on: 1000 clicks are
 * reported, 2004 bracketed paste. Read from what it wrote. */
bool pty_mode(const struct pty *pty, int mode);

/* All bytes the program has written so far, and their number. */
const char *pty_output(const struct pty *pty, size_t *length);
size_t pty_count(const struct pty *pty);

void pty_resize(struct pty *pty, int rows, int columns);
void pty_signal(struct pty *pty, int signal);
int pty_pid(const struct pty *pty);
/* Processor time used so far, in clock ticks; -1 when not known. */
long pty_cpu(const struct pty *pty);

/* Waits until the program is stopped, and lets it go on. */
void pty_expect_stopped(struct pty *pty);
void pty_continue(struct pty *pty);

/* Closes the terminal under the program. */
void pty_hangup(struct pty *pty);

/* Waits for the end; gives the wait status (WIFEXITED …). */
int pty_end(struct pty *pty);

/* Modes of the terminal before the start, and now. */
struct termios pty_modes_before(const struct pty *pty);
struct termios pty_modes(const struct pty *pty);

/* True when the modes are as before the start. */
bool pty_modes_same(const struct pty *pty);

/* True when this system describes a terminal (term_string.c). */
bool pty_has_term(const char *term);

/* A string capability of a terminal; false when it has none. */
bool term_string(const char *term, const char *name, char *out, size_t size);

#endif
