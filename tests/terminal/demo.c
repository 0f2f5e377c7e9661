/* SPDX-License-Identifier: MIT */
/* A program without chemistry on the real loop and terminal, to try every
 * terminal manner on. It shows what it was told:
 *   demo [--ascii] [--color auto|always|never] [--scheme 0…3] [--mouse] */
#include <signal.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "cli/loop.h"

enum { GRID_ROWS = 6, GRID_COLUMNS = 12, WORK_STEPS = 2000 };

struct demo {
    struct terminal *terminal;
    char last[64];
    int events, draws, resizes, ticks, row, column;
    int work; /* steps left */
    char field[256];
    struct text typed;
    bool mouse;
};

static const char *const key_names[] = {
    [KEY_CODE_UP] = "up",           [KEY_CODE_DOWN] = "down",
    [KEY_CODE_LEFT] = "left",       [KEY_CODE_RIGHT] = "right",
    [KEY_CODE_HOME] = "home",       [KEY_CODE_END] = "end",
    [KEY_CODE_PAGE_UP] = "page-up", [KEY_CODE_PAGE_DOWN] = "page-down",
    [KEY_CODE_ENTER] = "enter",     [KEY_CODE_ESCAPE] = "escape",
    [KEY_CODE_TAB] = "tab",         [KEY_CODE_BACKTAB] = "backtab",
    [KEY_CODE_ERASE] = "erase",     [KEY_CODE_DELETE] = "delete",
    [KEY_CODE_CLEAR] = "clear",     [KEY_CODE_REPAINT] = "repaint",
};

static void overflow(volatile int *depth)
{
    volatile int room[4096];
    room[0] = *depth + 1;
    if (*depth >= 0)
        overflow(&room[0]);
    *depth = room[1];
}

static void crash(uint32_t how)
{
    static const struct {
        uint32_t key;
        int signal;
    } crashes[] = {{'1', SIGSEGV},
                   {'2', SIGABRT},
                   {'3', SIGBUS},
                   {'4', SIGFPE},
                   {'5', SIGILL}};
    for (size_t i = 0; i < sizeof crashes / sizeof crashes[0]; i++)
        if (crashes[i].key == how)
            raise(crashes[i].signal);
    if (how == '6')
        abort();
    int depth = 0;
    if (how == '7')
        overflow(&depth);
}

static enum loop_effect on_character(struct demo *d, uint32_t c)
{
    char bytes[5] = "";
    bytes[utf8_encode(c, bytes)] = '\0';
    snprintf(d->last, sizeof d->last, "character %s", bytes);
    if (c == 'q')
        return LOOP_QUIT;
    if (c >= '1' && c <= '7')
        crash(c);
    if (c == 'w')
        d->work = WORK_STEPS;
    if (c == 'm')
        terminal_mouse(d->terminal, d->mouse = !d->mouse);
    if (c == 's')
        terminal_scheme(d->terminal, SCHEME_CONTRAST);
    return LOOP_REDRAW;
}

static enum loop_effect on_key(struct demo *d, enum key key)
{
    snprintf(d->last, sizeof d->last, "key %s", key_names[key]);
    if (key == KEY_CODE_REPAINT)
        return LOOP_REPAINT;
    d->row += (key == KEY_CODE_DOWN) - (key == KEY_CODE_UP);
    d->column += (key == KEY_CODE_RIGHT) - (key == KEY_CODE_LEFT);
    d->row = (d->row + GRID_ROWS) % GRID_ROWS;
    d->column = (d->column + GRID_COLUMNS) % GRID_COLUMNS;
    return LOOP_REDRAW;
}

static enum loop_effect on_interrupt(struct demo *d)
{
    if (d->work == 0)
        return LOOP_QUIT;
    d->work = 0;
    snprintf(d->last, sizeof d->last, "stopped");
    return LOOP_REDRAW;
}

static enum loop_effect update(void *state, const struct event *event)
{
    struct demo *d = state;
    char bytes[5] = "";
    d->events++;
    switch (event->kind) {
    case EVENT_KEY:
        return on_key(d, event->key);
    case EVENT_CHARACTER:
        return on_character(d, event->character);
    case EVENT_PASTE:
        bytes[utf8_encode(event->character == '\n' ? '/' : event->character,
                          bytes)] = '\0';
        text_add(&d->typed, bytes);
        return LOOP_REDRAW;
    case EVENT_MOUSE:
        snprintf(d->last, sizeof d->last, "mouse %d at %d,%d",
                 (int)event->button, event->row, event->column);
        return LOOP_REDRAW;
    case EVENT_RESIZE:
        d->resizes++;
        return LOOP_REDRAW;
    case EVENT_TICK:
        d->ticks++;
        return LOOP_REDRAW;
    case EVENT_INTERRUPT:
        return on_interrupt(d);
    case EVENT_NONE:
        break;
    }
    return LOOP_NOTHING;
}

static void draw_grid(const struct demo *d, struct canvas *canvas)
{
    static const char *const labels[] = {"Aa", "Bb", "Cc", "Dd"};
    for (int r = 0; r < GRID_ROWS; r++)
        for (int c = 0; c < GRID_COLUMNS; c++) {
            enum role role = (enum role)(ROLE_RAMP + (r + c) % RAMP_STEPS);
            int row = 8 + r;
            canvas_textf(canvas, row, 4 * c, 4, role, " %s ",
                         labels[(r + c) % 4]);
            if (r != d->row || c != d->column)
                continue;
            canvas_put(canvas, row, 4 * c, role, '[');
            canvas_put(canvas, row, 4 * c + 3, role, ']');
            canvas_reverse(canvas, row, 4 * c, 1, 4);
            canvas->cursor_row = row;
            canvas->cursor_column = 4 * c + 1;
        }
}

static void draw(void *state, struct canvas *canvas)
{
    struct demo *d = state;
    int wide = canvas->columns;
    d->draws++;
    canvas_textf(canvas, 0, 0, wide, ROLE_TITLE, "DEMO %dx%d tier %d",
                 canvas->rows, canvas->columns, terminal_tier(d->terminal));
    canvas_textf(canvas, 1, 0, wide, ROLE_TEXT, "last: %s.", d->last);
    canvas_textf(canvas, 2, 0, wide, ROLE_LABEL, "events: %d.", d->events);
    canvas_textf(canvas, 3, 0, wide, ROLE_FIELD, "field: %s.", d->field);
    canvas_textf(canvas, 4, 0, wide, ROLE_QUIET,
                 "resizes: %d. ticks: %d. left: %d.", d->resizes, d->ticks,
                 d->work);
    canvas_text(canvas, 5, 0, wide, ROLE_TEXT, "±−Å─│ζχ▁▄█╱");
    for (int i = 0; i < BALANCE_STEPS; i++)
        canvas_put(canvas, 6, i, (enum role)(ROLE_BALANCE + i), '0' + i);
    for (int i = 0; i < ROLE_RAMP; i++)
        canvas_put(canvas, 7, i, (enum role)i, (uint32_t)('A' + i));
    draw_grid(d, canvas);
}

static bool has_work(void *state)
{
    const struct demo *d = state;
    return d->work > 0;
}

/* A millisecond or so of arithmetic. */
static void step(void *state)
{
    struct demo *d = state;
    volatile double x = 2.385;
    for (int i = 0; i < 200000; i++)
        x = x * 0.99 + 0.01;
    d->work--;
}

static void take_options(int argc, char **argv, struct terminal_options *o)
{
    for (int i = 1; i < argc; i++) {
        const char *next = i + 1 < argc ? argv[i + 1] : "";
        int number;
        o->ascii |= strcmp(argv[i], "--ascii") == 0;
        o->mouse |= strcmp(argv[i], "--mouse") == 0;
        if (strcmp(argv[i], "--scheme") == 0 && text_to_int(next, &number))
            o->scheme = (enum scheme)number;
        if (strcmp(argv[i], "--color") == 0)
            o->color = strcmp(next, "always") == 0  ? COLOR_ALWAYS
                       : strcmp(next, "never") == 0 ? COLOR_NEVER
                                                    : COLOR_AUTO;
    }
}

int main(int argc, char **argv)
{
    struct terminal_options options = {.scheme = SCHEME_TERMINAL};
    struct demo d = {.last = "nothing"};
    struct status st = status_ok();
    int signal = 0;
    take_options(argc, argv, &options);
    d.typed = text_over(d.field, sizeof d.field);
    d.mouse = options.mouse;
    struct loop_client client = {&d, update, draw, has_work, step, 4};
    bool ok = terminal_open(&d.terminal, &options, &st);
    if (ok) {
        ok = loop_run(d.terminal, &client, &signal, &st);
        terminal_close(d.terminal);
    }
    if (signal != 0)
        terminal_die(signal);
    if (!ok)
        fprintf(stderr, "demo: %s\n", st.message);
    else
        printf("demo: %d events, %d draws, %d resizes\n", d.events, d.draws,
               d.resizes);
    return ok ? EXIT_SUCCESS : status_exit(st.code);
}
