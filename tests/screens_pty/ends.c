/* SPDX-License-Identifier: MIT */
/* Ways out, stops, sizes that change while atoms are being solved, and what
 * arrives that was not typed. */
#include <signal.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/wait.h>

#include "screens_pty/session.h"

/* The map coloured by the model that is solved as one looks. */
static struct pty *start_solving(void)
{
    struct pty *p = session_map();
    pty_type(p, "b");
    pty_expect(p, "─ Model ─");
    pty_key(p, "kend");
    pty_expect(p, "> scf");
    pty_type(p, "\r");
    pty_expect(p, "solving ");
    return p;
}

START_TEST(quit_leaves_the_terminal_as_found)
{
    struct pty *p = session_map();
    ck_assert(pty_full_screen(p));
    ck_assert(!pty_modes_same(p));
    session_quit(p);
}
END_TEST

START_TEST(quit_does_not_wait_for_the_atoms)
{
    session_quit(start_solving());
}
END_TEST

static const int deaths[] = {SIGINT, SIGTERM, SIGHUP, SIGQUIT};

START_TEST(a_signal_is_seen_by_the_parent_and_the_view_is_kept)
{
    size_t size;
    struct pty *p = session_map();
    pty_type(p, "Lu\r");
    pty_expect(p, "Lu  71  lutetium");
    pty_expect(p, "8.802"); /* both models that are solved have their value */
    pty_expect(p, "3.546");
    pty_signal(p, deaths[_i]);
    int status = pty_end(p);
    ck_assert_msg(WIFSIGNALED(status) && WTERMSIG(status) == deaths[_i],
                  "signal %d, wait status %#x", deaths[_i], status);
    session_restored(p);
    pty_free(p);
    char *view = session_read("state/outershell/view", &size);
    ck_assert_ptr_nonnull(strstr(view, "element Lu\n"));
    free(view);
}
END_TEST

static const int crashes[] = {SIGABRT, SIGSEGV, SIGBUS, SIGFPE, SIGILL};

START_TEST(a_crash_leaves_the_terminal_as_found)
{
    struct pty *p = session_map();
    pty_type(p, "i");
    pty_expect(p, "mouse on");
    pty_signal(p, crashes[_i]);
    int status = pty_end(p);
    /* a checker built in may report in place of dying by the signal */
    ck_assert_msg(!WIFEXITED(status) || WEXITSTATUS(status) != 0,
                  "wait status %#x", status);
    session_restored(p);
    pty_free(p);
}
END_TEST

START_TEST(interrupt_stops_the_solving_first_and_ends_next)
{
    struct pty *p = session_map();
    pty_type(p, "d"); /* all elements under all models: some seconds */
    pty_expect(p, "solving ");
    pty_type(p, "\003");
    pty_expect(p, "stopped; what is solved stays");
    pty_type(p, "\003");
    int status = pty_end(p);
    ck_assert_msg(WIFSIGNALED(status) && WTERMSIG(status) == SIGINT,
                  "wait status %#x", status);
    session_restored(p);
    pty_free(p);
}
END_TEST

START_TEST(a_stop_gives_the_terminal_back_and_takes_it_again)
{
    struct pty *p = start_solving();
    for (int round = 0; round < 3; round++) {
        pty_type(p, "\032");
        pty_expect_stopped(p);
        session_restored(p);
        pty_continue(p);
        pty_type(p, round % 2 ? "Fe\r" : "Co\r");
        pty_expect(p, round % 2 ? "Fe  26  iron" : "Co  27  cobalt");
        ck_assert(pty_full_screen(p));
        ck_assert(!pty_modes_same(p));
        ck_assert(pty_mode(p, 2004));
    }
    pty_type(p, "\032");
    pty_expect_stopped(p);
    pty_resize(p, 12, 40);
    pty_continue(p);
    pty_expect(p, "LiBe");
    session_quit(p);
}
END_TEST

START_TEST(a_lost_terminal_ends_the_program)
{
    char home[96];
    snprintf(home, sizeof home, "HOME=%s", session_folder());
    const char *argv[] = {outershell, NULL};
    const char *env[] = {home, NULL};
    struct pty_options options = {.argv = argv,
                                  .rows = 24,
                                  .columns = 80,
                                  .env = env,
                                  .directory = session_folder(),
                                  .keep_hangup = _i == 1};
    struct pty *p = pty_start(&options);
    pty_expect(p, "? keys");
    pty_hangup(p);
    int status = pty_end(p);
    ck_assert_msg(WIFSIGNALED(status) && WTERMSIG(status) == SIGHUP,
                  "wait status %#x", status);
    pty_free(p);
}
END_TEST

START_TEST(a_resize_storm_during_the_solving_loses_nothing)
{
    struct pty *p = start_solving();
    for (int i = 0; i < 120; i++) {
        pty_resize(p, 1 + i * 7 % 61, 1 + i * 13 % 201);
        if (i % 40 == 20)
            pty_key(p, "kcuf1"); /* Fe, Co, Ni, Cu */
    }
    pty_resize(p, 24, 80);
    pty_expect(p, "effective nuclear charge, e   scf");
    pty_expect(p, "Cu  29  copper");
    pty_expect(p, "118/118");
    pty_expect(p, ">scf");
    session_quit(p);
}
END_TEST

START_TEST(keys_are_answered_while_atoms_are_solved)
{
    struct pty *p = start_solving();
    pty_type(p, "Og\r");
    pty_expect(p, "Og  118  oganesson");
    pty_type(p, "s");
    pty_expect(p, "Slater's rules");
    pty_type(p, "m");
    pty_expect(p, "Og  118  oganesson");
    session_quit(p);
}
END_TEST

#define PASTE(text) "\033[200~" text "\033[201~"

START_TEST(pasted_text_never_runs_commands)
{
    struct pty *p = session_map();
    pty_type(p, PASTE("qqd?\rLu\rpx\n\033[B"));
    /* the next key finds the map as it was */
    pty_key(p, "kcuf1");
    pty_expect(p, "Co  27  cobalt");
    pty_expect(p, "effective nuclear charge, e   slater   neutral");
    ck_assert(!pty_shows(p, "pinned"));
    session_quit(p);
}
END_TEST

START_TEST(pasted_text_goes_into_an_open_field_and_no_further)
{
    struct pty *p = session_map();
    pty_type(p, "e\r");
    pty_expect(p, "write CSV to: Fe-zeff.csv");
    pty_type(p, PASTE("-q\ry\n.csv\r"));
    pty_expect(p, "write CSV to: Fe-zeff.csv-qy.csv");
    ck_assert_int_eq(session_file_count(), 0);
    pty_type(p, "\033");
    pty_expect_gone(p, "write CSV to: ");
    ck_assert_int_eq(session_file_count(), 0);
    session_quit(p);
}
END_TEST

static const char *const strange[] = {"\033[99~", "\033[1;9q", "\033[27;5;113~",
                                      "\033]11;rgb:0/0/q\007",
                                      "\033Pq1;2q\033\\"};

START_TEST(unknown_sequences_run_no_commands)
{
    struct pty *p = session_map();
    pty_type(p, strange[_i]);
    pty_key(p, "kcuf1");
    pty_expect(p, "Co  27  cobalt");
    pty_expect(p, "effective nuclear charge, e   slater   neutral");
    session_quit(p);
}
END_TEST

/* Any keys, parts of sequences, pastes and sizes in any order: it still quits,
 * and the terminal is as found. */
START_TEST(any_mix_of_input_leaves_a_program_that_quits)
{
    static const char *const pieces[] = {
        "w",      "b",      "r",        "v",          "t",        "p",
        "c",      "d",      "a",        "s",          "?",        "m",
        "e",      "+",      "-",        "o",          "u",        "n",
        "z",      "g",      "y",        ".",          ":",        "/",
        "x",      "i",      "\t",       "\r",         "\r",       "\033",
        "\033OA", "\033OB", "\033OC",   "\033OD",     "\033[H",   "\033[6~",
        "Lu",     "118",    "\177",     "\025",       "\014",     "é",
        "\xC3",   "\033[",  "\033]0;q", "\033[200~q", "\033[201~"};
    unsigned seed = 71u + (unsigned)_i;
    struct pty *p = session_map();
    for (int i = 0; i < 300; i++) {
        seed = seed * 1103515245u + 12345u;
        unsigned pick = seed >> 16;
        if (pick % 17 == 0)
            pty_resize(p, 1 + (int)(pick / 17 % 50), 1 + (int)(pick % 150));
        else
            pty_type(p, pieces[pick % COUNT(pieces)]);
    }
    /* what is open is closed: sequences, a paste, lists, fields */
    pty_resize(p, 24, 80);
    pty_type(p, "\033\\\033[201~");
    pty_settle(p, 600);
    /* an Escape is one when nothing follows for a time, on a busy machine a
     * longer one: each pause is twice the last */
    int pause = 100;
    for (int i = 0; i == 0 || (i < 7 && !pty_shows(p, "? keys  q quit")); i++) {
        for (int j = 0; j < 3; j++) {
            pty_type(p, "\033");
            pty_settle(p, pause);
        }
        pty_type(p, "m");
        pty_settle(p, pause);
        pause *= 2;
    }
    pty_expect(p, "? keys  q quit");
    session_quit(p);
}
END_TEST

TCase *case_ends(void)
{
    TCase *tc = tcase_create("ends");
    tcase_add_test(tc, quit_leaves_the_terminal_as_found);
    tcase_add_test(tc, quit_does_not_wait_for_the_atoms);
    tcase_add_loop_test(tc, a_signal_is_seen_by_the_parent_and_the_view_is_kept,
                        0, COUNT(deaths));
    tcase_add_loop_test(tc, a_crash_leaves_the_terminal_as_found, 0,
                        COUNT(crashes));
    tcase_add_test(tc, interrupt_stops_the_solving_first_and_ends_next);
    tcase_add_test(tc, a_stop_gives_the_terminal_back_and_takes_it_again);
    tcase_add_loop_test(tc, a_lost_terminal_ends_the_program, 0, 2);
    tcase_add_test(tc, a_resize_storm_during_the_solving_loses_nothing);
    tcase_add_test(tc, keys_are_answered_while_atoms_are_solved);
    tcase_add_test(tc, pasted_text_never_runs_commands);
    tcase_add_test(tc, pasted_text_goes_into_an_open_field_and_no_further);
    tcase_add_loop_test(tc, unknown_sequences_run_no_commands, 0,
                        COUNT(strange));
    tcase_add_loop_test(tc, any_mix_of_input_leaves_a_program_that_quits, 0, 4);
    return tc;
}
