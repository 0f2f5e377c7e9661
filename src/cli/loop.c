/* SPDX-License-Identifier: MIT */
#include "cli/loop.h"

#include <signal.h>
#include <time.h>

enum {
    TICK_MS = 500,
    /* A window being dragged changes its size many times: wait until it has
     * been still for a moment, but not for ever. */
    SETTLE_MS = 25,
    SETTLE_ROUNDS = 8
};

struct loop {
    struct terminal *terminal;
    const struct loop_client *client;
    struct canvas canvas;
    bool redraw, quit, resized;
    int signal;
    bool working;        /* there was work at the last look */
    long long last_tick; /* ms */
};

static long long clock_ms(void)
{
    struct timespec now;
    if (clock_gettime(CLOCK_MONOTONIC, &now) != 0)
        return 0;
    return (long long)now.tv_sec * 1000 + now.tv_nsec / 1000000;
}

static void tell(struct loop *loop, const struct event *event)
{
    const struct loop_client *client = loop->client;
    switch (client->update(client->state, event)) {
    case LOOP_NOTHING:
        break;
    case LOOP_REPAINT:
        terminal_repaint(loop->terminal);
        loop->redraw = true;
        break;
    case LOOP_REDRAW:
        loop->redraw = true;
        break;
    case LOOP_QUIT:
        loop->quit = true;
        if (event->kind == EVENT_INTERRUPT)
            loop->signal = SIGINT;
        break;
    }
}

static void tell_kind(struct loop *loop, enum event_kind kind)
{
    struct event event = {.kind = kind};
    tell(loop, &event);
}

static void tell_size(struct loop *loop)
{
    struct event event = {.kind = EVENT_RESIZE};
    terminal_size(loop->terminal, &event.row, &event.column);
    tell(loop, &event);
    loop->redraw = true;
}

/* All waiting input, so that a held key never runs on after its release. */
static void drain(struct loop *loop)
{
    struct event event;
    while (!loop->quit && terminal_read(loop->terminal, &event)) {
        if (event.kind == EVENT_RESIZE)
            loop->resized = true;
        else
            tell(loop, &event);
    }
}

static void answer(struct loop *loop, const struct terminal_news *news)
{
    if (news->death != 0 || news->hangup) {
        loop->signal = news->death != 0 ? news->death : SIGHUP;
        loop->quit = true;
        return;
    }
    if (news->interrupt)
        tell_kind(loop, EVENT_INTERRUPT);
    if (news->stop)
        terminal_suspend(loop->terminal);
    else if (news->resumed)
        terminal_resume(loop->terminal);
    if (news->stop || news->resumed)
        loop->redraw = true;
    if (!loop->quit)
        drain(loop);
}

static void settle(struct loop *loop)
{
    for (int i = 0; i < SETTLE_ROUNDS && !loop->quit; i++) {
        loop->resized = false;
        struct terminal_news news = terminal_wait(loop->terminal, SETTLE_MS);
        answer(loop, &news);
        if (!loop->resized)
            break;
    }
    loop->resized = false;
    if (!loop->quit)
        tell_size(loop);
}

static bool draw(struct loop *loop, struct status *st)
{
    int rows;
    int columns;
    struct canvas *canvas = &loop->canvas;
    terminal_size(loop->terminal, &rows, &columns);
    if ((rows != canvas->rows || columns != canvas->columns) &&
        !canvas_resize(canvas, rows, columns, st))
        return false;
    canvas_erase(canvas);
    loop->client->draw(loop->client->state, canvas);
    terminal_paint(loop->terminal, canvas);
    loop->redraw = false;
    return true;
}

/* One piece of work, and the ticks that go with it. */
static void work(struct loop *loop)
{
    const struct loop_client *client = loop->client;
    long long now = clock_ms();
    if (!loop->working)
        loop->last_tick = now;
    loop->working = true;
    client->step(client->state);
    if (!client->has_work(client->state)) {
        loop->working = false;
        tell_kind(loop, EVENT_TICK);
    } else if (now - loop->last_tick >= TICK_MS) {
        loop->last_tick = now;
        tell_kind(loop, EVENT_TICK);
    }
}

static bool pending(const struct loop *loop)
{
    const struct loop_client *client = loop->client;
    return client->has_work != NULL && client->has_work(client->state);
}

/* The result of short work in the same screen as what asked for it. */
static void grant_grace(struct loop *loop)
{
    long long start = clock_ms();
    while (!loop->quit && pending(loop) && !terminal_waiting(loop->terminal) &&
           clock_ms() - start < loop->client->grace_ms)
        work(loop);
}

bool loop_run(struct terminal *terminal, const struct loop_client *client,
              int *signal, struct status *st)
{
    struct loop loop = {.terminal = terminal, .client = client};
    *signal = 0;
    bool drawn = false; /* the first screen waits for nothing */
    bool ok = canvas_init(&loop.canvas, 0, 0, st);
    loop.canvas.ascii = terminal_ascii(terminal);
    if (ok)
        tell_size(&loop);
    while (ok && !loop.quit) {
        if (loop.redraw && drawn)
            grant_grace(&loop);
        if (loop.redraw && !(ok = draw(&loop, st)))
            break;
        drawn = true;
        bool busy = pending(&loop);
        struct terminal_news news = terminal_wait(terminal, busy ? 0 : -1);
        answer(&loop, &news);
        if (loop.resized)
            settle(&loop);
        /* only when no input waits, and never before it is shown */
        else if (busy && !loop.quit && !loop.redraw && pending(&loop))
            work(&loop);
    }
    canvas_clear(&loop.canvas);
    *signal = loop.signal;
    return ok;
}
