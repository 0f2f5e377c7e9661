/* SPDX-License-Identifier: MIT */
#include "terminal/inside.h"

#include <errno.h>
#include <langinfo.h>
#include <locale.h>
#include <poll.h>
#include <stdlib.h>
#include <string.h>
#include <sys/ioctl.h>
#include <unistd.h>

#include "base/text.h"
#include "terminal/guard.h"

/* A named constant each, so that the reason has a place. */
enum {
    ESCAPE_DELAY_MS =
        50,       /* longer is felt, shorter splits keys on slow lines */
    EMPTY_MAX = 5 /* readable but empty so often: the other end is gone */
};

/* ---- locale ---- */

static bool asks_for_utf8(void)
{
    static const char *const names[] = {"LC_ALL", "LC_CTYPE", "LANG"};
    for (int i = 0; i < 3; i++) {
        const char *value = getenv(names[i]);
        if (value == NULL || *value == '\0')
            continue;
        const char *codeset = strchr(value, '.');
        return codeset != NULL &&
               (text_starts_ignoring_case(codeset, ".UTF-8") ||
                text_starts_ignoring_case(codeset, ".UTF8"));
    }
    return false;
}

/* True when the locale can show more than ASCII. Only LC_CTYPE is taken: a
 * decimal comma must never enter our numbers. */
static bool take_locale(void)
{
    if (setlocale(LC_CTYPE, "") == NULL && asks_for_utf8())
        setlocale(LC_CTYPE, "C.UTF-8");
    return strcmp(nl_langinfo(CODESET), "UTF-8") == 0;
}

/* ---- checks before anything is written ---- */

static bool check_streams(const struct terminal *t,
                          const struct terminal_options *options,
                          struct status *st)
{
    if (options->output == NULL && !isatty(t->output_fd))
        return status_fail(st, STATUS_TERMINAL,
                           "standard output is not a terminal" NO_SCREEN_HINT);
    if (options->input == NULL && !isatty(t->input_fd))
        return status_fail(st, STATUS_TERMINAL,
                           "standard input is not a terminal" NO_SCREEN_HINT);
    return true;
}

static void send(const struct terminal *t, const struct capability *c)
{
    terminal_send(t, c->bytes, c->length);
}

/* ---- open and close ---- */

static void set_modes(struct terminal *t)
{
    cbreak(); /* not raw: the interrupt and suspend keys keep working */
    noecho();
    nonl();
    intrflush(stdscr, FALSE);
    keypad(stdscr, TRUE);
    nodelay(stdscr, TRUE);
    typeahead(-1);          /* or a key could leave a screen half painted */
    leaveok(stdscr, FALSE); /* the cursor marks the selection */
    mouseinterval(0);
    if (getenv("ESCDELAY") == NULL)
        set_escdelay(ESCAPE_DELAY_MS);
    t->paste_on = capability_get("BE");
    t->paste_off = capability_get("BD");
    if (t->paste_off.length == 0)
        t->paste_on.length = 0;
    struct capability mouse = capability_get("kmous");
    t->short_mouse = mouse.length > 0 && mouse.bytes[mouse.length - 1] == 'M';
    keys_define(t);
}

static bool start_screen(struct terminal *t,
                         const struct terminal_options *options,
                         struct status *st)
{
    FILE *in = options->input ? options->input : stdin;
    int fd = dup(t->output_fd);
    t->stream = fd >= 0 ? fdopen(fd, "w") : NULL;
    if (t->stream == NULL && fd >= 0)
        close(fd);
    if (t->stream != NULL)
        t->screen = newterm(NULL, t->stream, in);
    if (t->screen == NULL)
        return status_fail(st, STATUS_TERMINAL,
                           "the screen cannot be opened" NO_SCREEN_HINT);
    set_modes(t);
    enum color_tier tier = colors_capability();
    t->tier = terminal_color_choice(options->color, getenv("NO_COLOR"), tier);
    t->has_default = tier != TIER_MONO && use_default_colors() == OK;
    t->scheme = options->scheme;
    colors_assign(t);
    struct guard_rescue rescue = capability_rescue(t);
    if (!guard_open(&rescue, st))
        return false;
    send(t, &t->paste_on);
    terminal_mouse(t, options->mouse);
    return true;
}

bool terminal_open(struct terminal **terminal,
                   const struct terminal_options *options, struct status *st)
{
    *terminal = NULL;
    struct terminal *t = calloc(1, sizeof *t);
    if (t == NULL)
        return status_fail(st, STATUS_MEMORY, "out of memory for the terminal");
    t->input_fd = options->input ? fileno(options->input) : STDIN_FILENO;
    t->output_fd = options->output ? fileno(options->output) : STDOUT_FILENO;
    if (!check_streams(t, options, st) || !capability_check(t->output_fd, st)) {
        free(t);
        return false;
    }
    t->ascii = !take_locale() || options->ascii;
    t->cursor = -1;
    t->everything = true;
    frame_open(t);
    t->has_modes = tcgetattr(t->output_fd, &t->modes) == 0;
    /* exported ones would freeze the size for good */
    unsetenv("LINES");
    unsetenv("COLUMNS");
    fflush(options->output ? options->output : stdout);
    guard_remember();
    if (!start_screen(t, options, st)) {
        terminal_close(t);
        return false;
    }
    *terminal = t;
    return true;
}

static void leave(struct terminal *t)
{
    send(t, &t->paste_off);
    endwin();
}

void terminal_close(struct terminal *t)
{
    if (t == NULL)
        return;
    if (t->screen != NULL) {
        terminal_mouse(t, false);
        leave(t);
        if (t->has_modes)
            tcsetattr(t->output_fd, TCSADRAIN, &t->modes);
        delscreen(t->screen);
    }
    if (t->stream != NULL)
        fclose(t->stream);
    frame_close(t);
    guard_close();
    canvas_clear(&t->shown);
    free(t);
}

/* ---- in use ---- */

void terminal_size(const struct terminal *t, int *rows, int *columns)
{
    (void)t;
    getmaxyx(stdscr, *rows, *columns);
}

bool terminal_ascii(const struct terminal *t)
{
    return t->ascii;
}

enum color_tier terminal_tier(const struct terminal *t)
{
    return t->tier;
}

void terminal_mouse(struct terminal *t, bool on)
{
    mmask_t wanted = BUTTON1_PRESSED | BUTTON4_PRESSED | BUTTON5_PRESSED;
    if (on != t->mouse)
        mousemask(on ? wanted : 0, NULL);
    t->mouse = on;
}

void terminal_scheme(struct terminal *t, enum scheme scheme)
{
    t->scheme = scheme;
    colors_assign(t);
    t->everything = true;
}

/* Takes a new size over from the terminal. Curses looks for itself when it is
 * told of a change, but asks the stage if that is while a frame is drawn. */
static void check_size(struct terminal *t)
{
    struct winsize size;
    if (ioctl(t->output_fd, TIOCGWINSZ, &size) == 0 && size.ws_row > 0 &&
        size.ws_col > 0 && is_term_resized(size.ws_row, size.ws_col))
        t->resized = resizeterm(size.ws_row, size.ws_col) == OK;
}

struct terminal_news terminal_wait(struct terminal *t, int timeout_ms)
{
    struct terminal_news news = {.input = false};
    struct pollfd fds[2] = {{.fd = t->input_fd, .events = POLLIN},
                            {.fd = guard_fd(), .events = POLLIN}};
    int ready = poll(fds, 2, timeout_ms);
    /* interrupted: a signal is in the pipe; go and look */
    if (ready < 0)
        fds[0].revents = 0;
    struct guard_news noted = guard_take();
    if (ready < 0 || (fds[1].revents & POLLIN) != 0)
        check_size(t);
    news.interrupt = noted.interrupt;
    news.stop = noted.stop;
    news.resumed = noted.resumed;
    news.death = noted.death;
    news.input = ready != 0;
    bool readable = (fds[0].revents & POLLIN) != 0;
    int waiting = 0;
    if (readable && ioctl(t->input_fd, FIONREAD, &waiting) != 0)
        waiting = 0;
    t->failures = readable && waiting == 0 ? t->failures + 1 : 0;
    news.hangup = (fds[0].revents & (POLLHUP | POLLERR | POLLNVAL)) != 0 ||
                  t->failures > EMPTY_MAX;
    return news;
}

bool terminal_waiting(const struct terminal *t)
{
    struct pollfd fds[2] = {{.fd = t->input_fd, .events = POLLIN},
                            {.fd = guard_fd(), .events = POLLIN}};
    return poll(fds, 2, 0) != 0;
}

/* The screen again, after the shell or another program had the terminal. */
static void enter(struct terminal *t)
{
    reset_prog_mode();
    send(t, &t->paste_on);
    t->everything = true;
    t->cursor = -1;
    t->pasting = false;
    t->sequence = SEQUENCE_NONE;
    check_size(t); /* a change can be missed while stopped */
}

void terminal_suspend(struct terminal *t)
{
    leave(t);
    guard_stop();
    enter(t);
}

void terminal_resume(struct terminal *t)
{
    leave(t);
    enter(t);
}

void terminal_die(int signal)
{
    guard_die(signal);
}
