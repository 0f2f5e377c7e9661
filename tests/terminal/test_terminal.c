/* SPDX-License-Identifier: MIT */
/* Curses itself, on a null device; and the swallower of sequences. */
#include <check.h>
#include <signal.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "canvas/canvas.h"
#include "support/run.h"
#include "terminal/sequence.h"
#include "terminal/terminal.h"

static FILE *null_output, *null_input;

static struct terminal *open_on_null(const char *term, enum scheme scheme)
{
    null_output = fopen("/dev/null", "w");
    null_input = fopen("/dev/null", "r");
    ck_assert(null_output != NULL && null_input != NULL);
    setenv("TERM", term, 1);
    struct terminal_options options = {
        .scheme = scheme, .output = null_output, .input = null_input};
    struct terminal *t;
    struct status st = status_ok();
    ck_assert_msg(terminal_open(&t, &options, &st), "%s", st.message);
    return t;
}

static void close_null(struct terminal *t)
{
    terminal_close(t);
    fclose(null_output);
    fclose(null_input);
}

START_TEST(every_role_is_painted_in_every_scheme)
{
    static const char *const terms[] = {"xterm-256color", "xterm", "linux",
                                        "vt220"};
    unsetenv("NO_COLOR");
    for (size_t i = 0; i < sizeof terms / sizeof terms[0]; i++)
        for (int s = 0; s < SCHEME_COUNT; s++) {
            struct terminal *t = open_on_null(terms[i], (enum scheme)s);
            struct canvas canvas;
            struct status st = status_ok();
            int rows;
            int columns;
            terminal_size(t, &rows, &columns);
            ck_assert(rows > 0 && columns > 0);
            ck_assert(canvas_init(&canvas, rows, columns, &st));
            for (int r = 0; r < ROLE_COUNT; r++) {
                canvas_put(&canvas, r % rows, r, (enum role)r, 0x2588);
                canvas_reverse(&canvas, r % rows, r, 1, 1);
            }
            canvas.cursor_row = 1000;
            canvas.cursor_column = -4;
            terminal_paint(t, &canvas);
            canvas_put(&canvas, rows - 1, columns - 1, ROLE_TEXT, 'x');
            terminal_paint(t, &canvas);
            ck_assert(canvas_resize(&canvas, 2 * rows, 2 * columns, &st));
            terminal_paint(t, &canvas);
            ck_assert(canvas_resize(&canvas, 0, 0, &st));
            terminal_paint(t, &canvas);
            terminal_scheme(t, SCHEME_LIGHT);
            terminal_mouse(t, true);
            terminal_repaint(t);
            terminal_paint(t, &canvas);
            canvas_clear(&canvas);
            close_null(t);
        }
}
END_TEST

START_TEST(the_tier_is_that_of_the_description)
{
    static const struct {
        const char *term;
        enum color_tier tier;
    } terms[] = {
        {"vt220", TIER_MONO}, {"xterm", TIER_8}, {"xterm-256color", TIER_256}};
    unsetenv("NO_COLOR");
    for (size_t i = 0; i < sizeof terms / sizeof terms[0]; i++) {
        struct terminal *t = open_on_null(terms[i].term, SCHEME_TERMINAL);
        ck_assert_int_eq(terminal_tier(t), terms[i].tier);
        close_null(t);
    }
    setenv("NO_COLOR", "1", 1);
    struct terminal *t = open_on_null("xterm-256color", SCHEME_TERMINAL);
    ck_assert_int_eq(terminal_tier(t), TIER_MONO);
    close_null(t);
    unsetenv("NO_COLOR");
}
END_TEST

START_TEST(input_at_its_end_is_a_hangup_and_not_an_endless_loop)
{
    struct terminal *t = open_on_null("xterm-256color", SCHEME_TERMINAL);
    bool gone = false;
    for (int i = 0; i < 20 && !gone; i++) {
        struct event event;
        gone = terminal_wait(t, 0).hangup;
        while (terminal_read(t, &event))
            ck_assert_int_eq(event.kind, EVENT_RESIZE);
    }
    ck_assert(gone);
    close_null(t);
}
END_TEST

START_TEST(signals_are_news_and_the_handlers_go_again)
{
    struct sigaction before;
    struct sigaction after;
    sigaction(SIGTERM, NULL, &before);
    struct terminal *t = open_on_null("xterm-256color", SCHEME_TERMINAL);
    raise(SIGINT);
    raise(SIGTERM);
    struct terminal_news news = terminal_wait(t, 1000);
    ck_assert(news.interrupt);
    ck_assert_int_eq(news.death, SIGTERM);
    news = terminal_wait(t, 0);
    ck_assert(!news.interrupt && news.death == 0);
    close_null(t);
    sigaction(SIGTERM, NULL, &after);
    ck_assert(before.sa_handler == after.sa_handler);
}
END_TEST

START_TEST(a_bad_term_is_refused_before_anything_is_written)
{
    static const char *const bad[] = {"dumb", "no-such-terminal", ""};
    for (size_t i = 0; i < sizeof bad / sizeof bad[0]; i++) {
        FILE *out = tmpfile();
        FILE *in = fopen("/dev/null", "r");
        ck_assert(out != NULL && in != NULL);
        setenv("TERM", bad[i], 1);
        struct terminal_options options = {.output = out, .input = in};
        struct terminal *t;
        struct status st = status_ok();
        ck_assert(!terminal_open(&t, &options, &st));
        ck_assert_int_eq(st.code, STATUS_TERMINAL);
        ck_assert_ptr_nonnull(strstr(st.message, "TERM"));
        ck_assert_ptr_null(t);
        fflush(out);
        ck_assert_int_eq(ftell(out), 0);
        fclose(out);
        fclose(in);
    }
    terminal_close(NULL);
}
END_TEST

/* Each is swallowed whole, and the last byte ends it. */
START_TEST(sequences_end_where_ecma_48_says)
{
    static const char *const whole[] = {
        "[A",       "[1;5C",     "[?1;2c",   "[ q",      "[[A",
        "[M !!",    "OP",        "O1;2P",    "]0;x\007", "]0;x\033\\",
        "Pq\033\\", "_x\033\\",  "^x\033\\", "Xx\033\\", "q",
        "\033[A",   "[12\033[A", "[1\030",   "]0;\032",  "\177"};
    for (size_t i = 0; i < sizeof whole / sizeof whole[0]; i++) {
        enum sequence_state state = SEQUENCE_ESCAPE;
        size_t length = strlen(whole[i]);
        for (size_t k = 0; k < length; k++) {
            ck_assert_msg(state != SEQUENCE_NONE, "%s ends before %zu",
                          whole[i], k);
            sequence_feed(&state, (unsigned char)whole[i][k]);
        }
        ck_assert_msg(state == SEQUENCE_NONE, "%s goes on", whole[i]);
    }
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("terminal");
    TCase *tc = tcase_create("terminal");
    tcase_set_timeout(tc, 30);
    tcase_add_test(tc, every_role_is_painted_in_every_scheme);
    tcase_add_test(tc, the_tier_is_that_of_the_description);
    tcase_add_test(tc, input_at_its_end_is_a_hangup_and_not_an_endless_loop);
    tcase_add_test(tc, signals_are_news_and_the_handlers_go_again);
    tcase_add_test(tc, a_bad_term_is_refused_before_anything_is_written);
    tcase_add_test(tc, sequences_end_where_ecma_48_says);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
