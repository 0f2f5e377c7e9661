/* SPDX-License-Identifier: MIT */
#include "support/pty.h"

#include <check.h>
#include <errno.h>
#include <fcntl.h>
#include <poll.h>
#include <signal.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/ioctl.h>
#include <sys/wait.h>
#include <time.h>
#include <unistd.h>
#include <vterm.h>

/* The deadline is for what never comes: a loaded machine is slow, not wrong. */
enum { DEADLINE_MS = 120000, ROW_BYTES = 4 * 1024, ENV_MAX = 64 };

struct pty {
    int master, slave;
    int reports;  /* from the parent process: struct report */
    int commands; /* to it: one byte lets the program go on */
    int pid, parent_pid;
    struct termios before;
    bool ended, stopped;
    int status;
    VTerm *vterm;
    VTermScreen *screen;
    int rows, columns;
    bool cursor_visible, full_screen;
    char *output;
    size_t length, capacity;
    char term[64];
    char row[ROW_BYTES];
    /* of a sequence that may be a repeat, and what it would repeat */
    char held[16];
    size_t held_length;
    char last;
    int marks; /* of the harness that have come through */
};

struct report {
    int pid, status;
};

static long long now_ms(void)
{
    struct timespec now;
    clock_gettime(CLOCK_MONOTONIC, &now);
    return (long long)now.tv_sec * 1000 + now.tv_nsec / 1000000;
}

/* ---- the parent process: what a shell does for one job ---- */

static volatile sig_atomic_t parent_job;

static void pass_hangup(int signal)
{
    if (parent_job > 0)
        kill(-parent_job, signal);
}

static void report(int to, int pid, int status)
{
    struct report r = {pid, status};
    if (write(to, &r, sizeof r) != (ssize_t)sizeof r)
        _exit(125);
}

/* How the tests themselves were started, by a script in the background or
 * one that ignores hang-ups, must not reach the program. */
static void default_signals(void)
{
    static const int signals[] = {SIGHUP,  SIGINT,  SIGQUIT, SIGTERM, SIGTSTP,
                                  SIGCONT, SIGTTIN, SIGTTOU, SIGPIPE, SIGCHLD};
    sigset_t none;
    for (size_t i = 0; i < sizeof signals / sizeof signals[0]; i++)
        signal(signals[i], SIG_DFL);
    sigemptyset(&none);
    sigprocmask(SIG_SETMASK, &none, NULL);
}

static void run_job(const struct pty_options *options, char **environment)
{
    setpgid(0, 0);
    tcsetpgrp(STDIN_FILENO, getpgrp());
    default_signals();
    if (options->ignore_stop)
        signal(SIGTSTP, SIG_IGN);
    if (options->directory != NULL && chdir(options->directory) != 0)
        _exit(126);
    /* exec asks for pointers to char; it does not write through them */
    char *argv[32] = {NULL};
    for (int i = 0; i < 31 && options->argv[i] != NULL; i++)
        argv[i] = strdup(options->argv[i]);
    execve(argv[0], argv, environment);
    _exit(127);
}

static void parent_main(const struct pty_options *options, char **environment,
                        int reports, int commands)
{
    default_signals();
    signal(SIGTTOU, SIG_IGN);
    signal(SIGINT, SIG_IGN); /* of its own group only, before the job's */
    signal(SIGHUP, options->keep_hangup ? SIG_IGN : pass_hangup);
    pid_t job = fork();
    if (job == 0) {
        close(reports);
        close(commands);
        run_job(options, environment);
    }
    setpgid(job, job);
    tcsetpgrp(STDIN_FILENO, job);
    parent_job = job;
    report(reports, job, 0);
    for (;;) {
        int status;
        if (waitpid(job, &status, WUNTRACED) < 0) {
            if (errno == EINTR)
                continue;
            _exit(124);
        }
        report(reports, job, status);
        if (!WIFSTOPPED(status))
            break;
        tcsetpgrp(STDIN_FILENO, getpgrp());
        char byte;
        if (read(commands, &byte, 1) != 1)
            break;
        tcsetpgrp(STDIN_FILENO, job);
        kill(-job, SIGCONT);
    }
    /* stay until the test has read everything */
    char byte;
    while (read(commands, &byte, 1) < 0 && errno == EINTR)
        ;
    _exit(0);
}

/* ---- environment ---- */

static void put_env(char **list, const char *entry)
{
    size_t name = strcspn(entry, "=");
    int i = 0;
    while (list[i] != NULL &&
           (strncmp(list[i], entry, name) != 0 || list[i][name] != '='))
        i++;
    ck_assert_int_lt(i, ENV_MAX - 1);
    free(list[i]);
    if (entry[name] == '=') {
        list[i] = strdup(entry);
        return;
    }
    for (; list[i] != NULL; i++)
        list[i] = list[i + 1];
}

static void make_env(const struct pty_options *options, char **list)
{
    static const char *const bare[] = {"TERM=xterm-256color", "LC_ALL=C.UTF-8",
                                       "TZ=UTC", NULL};
    static const char *const kept[] = {"PATH",          "ASAN_OPTIONS",
                                       "UBSAN_OPTIONS", "LSAN_OPTIONS",
                                       "TMPDIR",        "TERMINFO_DIRS"};
    for (int i = 0; bare[i] != NULL; i++)
        put_env(list, bare[i]);
    for (size_t i = 0; i < sizeof kept / sizeof kept[0]; i++) {
        char entry[4096];
        const char *value = getenv(kept[i]);
        if (value == NULL)
            continue;
        snprintf(entry, sizeof entry, "%s=%s", kept[i], value);
        put_env(list, entry);
    }
    for (int i = 0; options->env != NULL && options->env[i] != NULL; i++)
        put_env(list, options->env[i]);
}

/* ---- emulator ---- */

static int on_property(VTermProp property, VTermValue *value, void *user)
{
    struct pty *pty = user;
    if (property == VTERM_PROP_CURSORVISIBLE)
        pty->cursor_visible = value->boolean;
    else if (property == VTERM_PROP_ALTSCREEN)
        pty->full_screen = value->boolean;
    return 1;
}

static const VTermScreenCallbacks callbacks = {.settermprop = on_property};

static void open_emulator(struct pty *pty, int rows, int columns)
{
    pty->rows = rows > 0 ? rows : 24;
    pty->columns = columns > 0 ? columns : 80;
    pty->vterm = vterm_new(pty->rows, pty->columns);
    ck_assert_ptr_nonnull(pty->vterm);
    vterm_set_utf8(pty->vterm, 1);
    pty->screen = vterm_obtain_screen(pty->vterm);
    vterm_screen_set_callbacks(pty->screen, &callbacks, pty);
    vterm_screen_enable_altscreen(pty->screen, 1);
    vterm_screen_reset(pty->screen, 1);
    pty->cursor_visible = true;
}

/* ---- start and end ---- */

static void open_pair(struct pty *pty, int rows, int columns)
{
    pty->master = posix_openpt(O_RDWR | O_NOCTTY);
    ck_assert_int_ge(pty->master, 0);
    ck_assert_int_eq(grantpt(pty->master), 0);
    ck_assert_int_eq(unlockpt(pty->master), 0);
    pty->slave = open(ptsname(pty->master), O_RDWR | O_NOCTTY);
    ck_assert_int_ge(pty->slave, 0);
    struct winsize size = {.ws_row = (unsigned short)rows,
                           .ws_col = (unsigned short)columns};
    ck_assert_int_eq(ioctl(pty->master, TIOCSWINSZ, &size), 0);
    ck_assert_int_eq(tcgetattr(pty->slave, &pty->before), 0);
    fcntl(pty->master, F_SETFD, FD_CLOEXEC);
}

struct pty *pty_start(const struct pty_options *options)
{
    signal(SIGPIPE, SIG_IGN);
    struct pty *pty = calloc(1, sizeof *pty);
    ck_assert_ptr_nonnull(pty);
    open_pair(pty, options->rows, options->columns);
    char *environment[ENV_MAX] = {NULL};
    make_env(options, environment);
    for (int i = 0; environment[i] != NULL; i++)
        if (strncmp(environment[i], "TERM=", 5) == 0)
            snprintf(pty->term, sizeof pty->term, "%s", environment[i] + 5);
    int up[2];
    int down[2];
    ck_assert_int_eq(pipe(up), 0);
    ck_assert_int_eq(pipe(down), 0);
    pty->parent_pid = fork();
    ck_assert_int_ge(pty->parent_pid, 0);
    if (pty->parent_pid == 0) {
        setsid();
        if (ioctl(pty->slave, TIOCSCTTY, 0) != 0)
            _exit(123);
        for (int i = 0; i < 3; i++)
            dup2(pty->slave, i);
        close(pty->slave);
        close(pty->master);
        close(up[0]);
        close(down[1]);
        parent_main(options, environment, up[1], down[0]);
    }
    close(up[1]);
    close(down[0]);
    for (int i = 0; environment[i] != NULL; i++)
        free(environment[i]);
    pty->reports = up[0];
    pty->commands = down[1];
    struct report r;
    ck_assert_int_eq(read(pty->reports, &r, sizeof r), sizeof r);
    pty->pid = r.pid;
    open_emulator(pty, options->rows, options->columns);
    return pty;
}

void pty_free(struct pty *pty)
{
    if (pty == NULL)
        return;
    if (!pty->ended)
        kill(pty->pid, SIGKILL);
    close(pty->commands);
    kill(pty->parent_pid, SIGKILL);
    waitpid(pty->parent_pid, NULL, 0);
    close(pty->reports);
    if (pty->master >= 0)
        close(pty->master);
    close(pty->slave);
    vterm_free(pty->vterm);
    free(pty->output);
    free(pty);
}

/* ---- reading ---- */

/* The emulator misplaces its cursor when a repeated character ends at the
 * margin (REP, ECMA-48 8.3.103), so that it is given the characters. */
static void feed(struct pty *pty, char byte)
{
    char *held = pty->held;
    size_t n = pty->held_length;
    held[n++] = byte;
    bool digit = byte >= '0' && byte <= '9';
    pty->held_length = n;
    if ((n == 1 && byte == '\033') || (n == 2 && byte == '[') ||
        (n > 2 && n < sizeof pty->held - 1 && digit))
        return;
    held[n] = '\0';
    pty->held_length = 0;
    if (n > 3 && byte == 'b') {
        for (long left = strtol(held + 2, NULL, 10); left > 0; left--)
            vterm_input_write(pty->vterm, &pty->last, 1);
        return;
    }
    pty->last = byte;
    vterm_input_write(pty->vterm, held, n);
}

/* The harness's own mark in the stream; no program writes this character. */
static const char MARK = '\035';

static size_t without_marks(struct pty *pty, char *bytes, size_t length)
{
    size_t kept = 0;
    for (size_t i = 0; i < length; i++) {
        if (bytes[i] == MARK)
            pty->marks++;
        else
            bytes[kept++] = bytes[i];
    }
    return kept;
}

static void keep_output(struct pty *pty, const char *bytes, size_t length)
{
    while (pty->length + length + 1 > pty->capacity) {
        pty->capacity = pty->capacity ? 2 * pty->capacity : 1 << 16;
        pty->output = realloc(pty->output, pty->capacity);
        ck_assert_ptr_nonnull(pty->output);
    }
    memcpy(pty->output + pty->length, bytes, length);
    pty->length += length;
    pty->output[pty->length] = '\0';
    for (size_t i = 0; i < length; i++)
        feed(pty, bytes[i]);
}

static void take_report(struct pty *pty)
{
    struct report r;
    if (read(pty->reports, &r, sizeof r) != (ssize_t)sizeof r) {
        pty->ended = true;
        return;
    }
    pty->status = r.status;
    pty->stopped = WIFSTOPPED(r.status);
    pty->ended = !pty->stopped;
}

/* Reads what has come, waiting at most timeout_ms for it; false: nothing. */
static bool pump(struct pty *pty, int timeout_ms)
{
    struct pollfd fds[2] = {
        {.fd = pty->master, .events = POLLIN},
        {.fd = pty->ended ? -1 : pty->reports, .events = POLLIN}};
    if (poll(fds, 2, timeout_ms) <= 0)
        return false;
    bool any = false;
    if (fds[0].revents & POLLIN) {
        char bytes[8192];
        ssize_t got = read(pty->master, bytes, sizeof bytes);
        if (got > 0) {
            keep_output(pty, bytes, without_marks(pty, bytes, (size_t)got));
            any = true;
        }
    }
    if (fds[1].revents != 0) {
        take_report(pty);
        any = true;
    }
    return any;
}

static void give_up(struct pty *pty, const char *what, const char *detail)
{
    char *screen = pty_screen(pty);
    /* Check's messages are short, a screen is not */
    fprintf(stderr, "%s", screen);
    ck_abort_msg("waited in vain for %s '%s'%s", what, detail,
                 pty->ended ? " (the program has ended)" : "");
}

static void wait_text(struct pty *pty, const char *text, bool present)
{
    long long deadline = now_ms() + DEADLINE_MS;
    while (pty_shows(pty, text) != present) {
        bool any = pump(pty, 50);
        if ((!any && pty->ended) || now_ms() > deadline)
            give_up(pty, present ? "the text" : "the end of the text", text);
    }
}

void pty_expect(struct pty *pty, const char *text)
{
    wait_text(pty, text, true);
}

void pty_expect_gone(struct pty *pty, const char *text)
{
    wait_text(pty, text, false);
}

void pty_expect_cursor(struct pty *pty, int row, int column)
{
    long long deadline = now_ms() + DEADLINE_MS;
    VTermPos place;
    for (;;) {
        vterm_state_get_cursorpos(vterm_obtain_state(pty->vterm), &place);
        if (place.row == row && place.col == column)
            return;
        bool any = pump(pty, 50);
        if ((!any && pty->ended) || now_ms() > deadline) {
            char wanted[64];
            snprintf(wanted, sizeof wanted, "row %d, column %d, not %d, %d",
                     row, column, place.row, place.col);
            give_up(pty, "the cursor", wanted);
        }
    }
}

void pty_settle(struct pty *pty, int quiet_ms)
{
    long long deadline = now_ms() + DEADLINE_MS;
    while (pump(pty, quiet_ms))
        if (now_ms() > deadline)
            give_up(pty, "quiet", "");
}

void pty_drain(struct pty *pty)
{
    long long deadline = now_ms() + DEADLINE_MS;
    int wanted = pty->marks + 1;
    while (pump(pty, 0)) /* makes room, so that the write does not block */
        ;
    ck_assert_int_eq(write(pty->slave, &MARK, 1), 1);
    while (pty->marks < wanted) {
        pump(pty, 50);
        if (now_ms() > deadline)
            give_up(pty, "what was written", "");
    }
}

void pty_expect_mode(struct pty *pty, int mode, bool on)
{
    long long deadline = now_ms() + DEADLINE_MS;
    while (pty_mode(pty, mode) != on) {
        bool any = pump(pty, 50);
        if ((!any && pty->ended) || now_ms() > deadline)
            give_up(pty, "a private mode", "");
    }
}

void pty_expect_output(struct pty *pty, size_t from, const char *text)
{
    long long deadline = now_ms() + DEADLINE_MS;
    while (pty_count(pty) < from || !pty->output ||
           !strstr(pty->output + from, text)) {
        bool any = pump(pty, 50);
        if ((!any && pty->ended) || now_ms() > deadline)
            give_up(pty, "an output", "");
    }
}

void pty_expect_full_screen(struct pty *pty)
{
    long long deadline = now_ms() + DEADLINE_MS;
    while (!pty->full_screen) {
        bool any = pump(pty, 50);
        if ((!any && pty->ended) || now_ms() > deadline)
            give_up(pty, "the second screen", "");
    }
}

/* ---- the screen ---- */

const char *pty_row(struct pty *pty, int row)
{
    VTermRect line = {.start_row = row,
                      .end_row = row + 1,
                      .start_col = 0,
                      .end_col = pty->columns};
    size_t n =
        vterm_screen_get_text(pty->screen, pty->row, sizeof pty->row - 1, line);
    if (n > sizeof pty->row - 1)
        n = sizeof pty->row - 1;
    while (n > 0 && (pty->row[n - 1] == ' ' || pty->row[n - 1] == '\n'))
        n--;
    pty->row[n] = '\0';
    return pty->row;
}

char *pty_screen(struct pty *pty)
{
    size_t size = (size_t)pty->rows * ROW_BYTES + 1;
    char *text = malloc(size);
    ck_assert_ptr_nonnull(text);
    size_t used = 0;
    for (int r = 0; r < pty->rows; r++) {
        const char *row = pty_row(pty, r);
        size_t n = strlen(row);
        memcpy(text + used, row, n);
        used += n;
        text[used++] = '\n';
    }
    text[used] = '\0';
    return text;
}

bool pty_shows(struct pty *pty, const char *text)
{
    for (int r = 0; r < pty->rows; r++)
        if (strstr(pty_row(pty, r), text) != NULL)
            return true;
    return false;
}

static uint32_t rgb_of(struct pty *pty, VTermColor color)
{
    vterm_screen_convert_color_to_rgb(pty->screen, &color);
    return (uint32_t)color.rgb.red << 16 | (uint32_t)color.rgb.green << 8 |
           color.rgb.blue;
}

struct pty_look pty_look(struct pty *pty, int row, int column)
{
    VTermScreenCell cell;
    VTermPos place = {.row = row, .col = column};
    ck_assert(vterm_screen_get_cell(pty->screen, place, &cell));
    return (struct pty_look){
        .character = cell.chars[0] ? cell.chars[0] : ' ',
        .default_foreground = VTERM_COLOR_IS_DEFAULT_FG(&cell.fg),
        .default_background = VTERM_COLOR_IS_DEFAULT_BG(&cell.bg),
        .foreground = rgb_of(pty, cell.fg),
        .background = rgb_of(pty, cell.bg),
        .bold = cell.attrs.bold,
        .underline = cell.attrs.underline != 0,
        .reverse = cell.attrs.reverse};
}

void pty_cursor(struct pty *pty, int *row, int *column, bool *visible)
{
    VTermPos place;
    vterm_state_get_cursorpos(vterm_obtain_state(pty->vterm), &place);
    *row = place.row;
    *column = place.col;
    *visible = pty->cursor_visible;
}

bool pty_full_screen(const struct pty *pty)
{
    return pty->full_screen;
}

bool pty_mode(const struct pty *pty, int mode)
{
    bool on = false;
    const char *s = pty->output ? pty->output : "";
    while ((s = strstr(s, "\033[?")) != NULL) {
        bool named = false;
        for (s += 3; *s >= '0' && *s <= ';'; s += *s == ';') {
            char *end;
            named |= strtol(s, &end, 10) == mode;
            s = end;
        }
        if (named && (*s == 'h' || *s == 'l'))
            on = *s == 'h';
    }
    return on;
}

const char *pty_output(const struct pty *pty, size_t *length)
{
    *length = pty->length;
    return pty->output ? pty->output : "";
}

size_t pty_count(const struct pty *pty)
{
    return pty->length;
}

/* ---- the keyboard ---- */

void pty_send(struct pty *pty, const void *bytes, size_t length)
{
    const char *at = bytes;
    while (length > 0) {
        struct pollfd ready = {.fd = pty->master, .events = POLLOUT};
        if (poll(&ready, 1, 1000) > 0 && (ready.revents & POLLOUT)) {
            ssize_t n = write(pty->master, at, length > 256 ? 256 : length);
            ck_assert_int_gt(n, 0);
            at += n;
            length -= (size_t)n;
        }
        while (pump(pty, 0))
            ;
    }
}

void pty_type(struct pty *pty, const char *text)
{
    pty_send(pty, text, strlen(text));
}

void pty_key(struct pty *pty, const char *capability)
{
    char bytes[128];
    ck_assert_msg(term_string(pty->term, capability, bytes, sizeof bytes),
                  "%s has no %s", pty->term, capability);
    pty_type(pty, bytes);
}

/* ---- the outside world ---- */

void pty_resize(struct pty *pty, int rows, int columns)
{
    struct winsize size = {.ws_row = (unsigned short)rows,
                           .ws_col = (unsigned short)columns};
    pty->rows = rows > 0 ? rows : 24;
    pty->columns = columns > 0 ? columns : 80;
    vterm_set_size(pty->vterm, pty->rows, pty->columns);
    ck_assert_int_eq(ioctl(pty->master, TIOCSWINSZ, &size), 0);
}

void pty_signal(struct pty *pty, int signal)
{
    kill(pty->pid, signal);
}

int pty_pid(const struct pty *pty)
{
    return pty->pid;
}

long pty_cpu(const struct pty *pty)
{
    char path[64];
    char line[1024];
    snprintf(path, sizeof path, "/proc/%d/stat", pty->pid);
    FILE *f = fopen(path, "r");
    if (f == NULL)
        return -1;
    bool ok = fgets(line, sizeof line, f) != NULL;
    fclose(f);
    const char *rest = ok ? strrchr(line, ')') : NULL;
    if (rest == NULL)
        return -1;
    long user = 0;
    long system = 0;
    /* fields 14 and 15 of proc(5) */
    int n =
        sscanf(rest + 2, "%*c %*d %*d %*d %*d %*d %*u %*u %*u %*u %*u %ld %ld",
               &user, &system);
    return n == 2 ? user + system : -1;
}

void pty_expect_stopped(struct pty *pty)
{
    long long deadline = now_ms() + DEADLINE_MS;
    while (!pty->stopped) {
        pump(pty, 50);
        if (pty->ended || now_ms() > deadline)
            give_up(pty, "a stop", "");
    }
    pty_drain(pty);
}

void pty_continue(struct pty *pty)
{
    pty->stopped = false;
    ck_assert_int_eq(write(pty->commands, "c", 1), 1);
}

void pty_hangup(struct pty *pty)
{
    close(pty->master);
    pty->master = -1;
}

int pty_end(struct pty *pty)
{
    long long deadline = now_ms() + DEADLINE_MS;
    while (!pty->ended) {
        pump(pty, 50);
        if (now_ms() > deadline)
            give_up(pty, "the end", "");
    }
    if (pty->master >= 0)
        pty_drain(pty);
    return pty->status;
}

struct termios pty_modes_before(const struct pty *pty)
{
    return pty->before;
}

struct termios pty_modes(const struct pty *pty)
{
    struct termios modes;
    ck_assert_int_eq(tcgetattr(pty->slave, &modes), 0);
    return modes;
}

bool pty_modes_same(const struct pty *pty)
{
    struct termios now = pty_modes(pty);
    const struct termios *was = &pty->before;
    return now.c_iflag == was->c_iflag && now.c_oflag == was->c_oflag &&
           now.c_cflag == was->c_cflag && now.c_lflag == was->c_lflag &&
           memcmp(now.c_cc, was->c_cc, sizeof now.c_cc) == 0;
}
