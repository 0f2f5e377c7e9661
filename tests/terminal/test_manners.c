/* SPDX-License-Identifier: MIT */
/* Every manner of the terminal, on a pseudo-terminal: test_manners DEMO. */
#include <check.h>
#include <signal.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/wait.h>

#include "support/pty.h"
#include "support/run.h"

static const char *demo;

static struct pty *start_with(const char *const *arguments, int rows,
                              int columns, const char *const *env)
{
    const char *argv[16] = {demo};
    for (int i = 0; arguments != NULL && arguments[i] != NULL && i < 14; i++)
        argv[i + 1] = arguments[i];
    struct pty_options options = {
        .argv = argv, .rows = rows, .columns = columns, .env = env};
    return pty_start(&options);
}

/* Waits until a first screen is whole: the cursor is put on the chosen cell of
 * the grid after all else; while the grid is written it is there but once,
 * before the cell with Cc. */
static void first_screen(struct pty *p)
{
    pty_expect(p, "Cc");
    pty_expect_cursor(p, 8, 1);
}

static struct pty *start(void)
{
    struct pty *p = start_with(NULL, 24, 80, NULL);
    pty_expect(p, "DEMO 24x80");
    first_screen(p);
    return p;
}

/* Presses x until it arrives as itself. What was broken off before is given up
 * after a time without a byte; how long that takes on a busy machine nobody
 * knows, so each pause is twice the last. */
static void press_until_seen(struct pty *p)
{
    int pause = 200;
    for (int i = 0; i < 7 && !pty_shows(p, "last: character x."); i++) {
        pty_type(p, "x");
        pty_settle(p, pause);
        pause *= 2;
    }
    ck_assert(pty_shows(p, "last: character x."));
}

/* Everything as it was before the program came. */
static void restored(struct pty *p)
{
    int row;
    int column;
    bool visible;
    pty_cursor(p, &row, &column, &visible);
    ck_assert(!pty_full_screen(p));
    ck_assert(visible);
    ck_assert(!pty_mode(p, 1000));
    ck_assert(pty_modes_same(p));
    ck_assert(!pty_mode(p, 2004));
}

static void quits(struct pty *p)
{
    pty_type(p, "q");
    int status = pty_end(p);
    ck_assert_msg(WIFEXITED(status) && WEXITSTATUS(status) == 0,
                  "wait status %#x", status);
}

START_TEST(quit_leaves_the_terminal_as_found)
{
    struct pty *p = start();
    ck_assert(pty_full_screen(p));
    ck_assert(!pty_modes_same(p));
    quits(p);
    restored(p);
    pty_free(p);
}
END_TEST

static const int deaths[] = {SIGINT, SIGTERM, SIGHUP, SIGQUIT};

START_TEST(the_parent_sees_the_true_signal)
{
    struct pty *p = start();
    pty_signal(p, deaths[_i]);
    int status = pty_end(p);
    ck_assert_msg(WIFSIGNALED(status) && WTERMSIG(status) == deaths[_i],
                  "signal %d, wait status %#x", deaths[_i], status);
    restored(p);
    pty_free(p);
}
END_TEST

/* As from a script in the background, or under one that ignores hang-ups. */
START_TEST(what_the_tests_ignore_or_hold_back_does_not_reach_the_program)
{
    sigset_t one;
    sigemptyset(&one);
    sigaddset(&one, deaths[_i]);
    signal(deaths[_i], SIG_IGN);
    sigprocmask(SIG_BLOCK, &one, NULL);
    struct pty *p = start();
    pty_signal(p, deaths[_i]);
    int status = pty_end(p);
    ck_assert_msg(WIFSIGNALED(status) && WTERMSIG(status) == deaths[_i],
                  "signal %d, wait status %#x", deaths[_i], status);
    pty_free(p);
}
END_TEST

START_TEST(the_interrupt_key_stops_work_first_and_quits_next)
{
    struct pty *p = start();
    pty_type(p, "w");
    pty_expect(p, "left: 1");
    pty_type(p, "\003");
    pty_expect(p, "last: stopped.");
    pty_type(p, "\003");
    int status = pty_end(p);
    ck_assert(WIFSIGNALED(status) && WTERMSIG(status) == SIGINT);
    restored(p);
    pty_free(p);
}
END_TEST

static const struct {
    const char *key;
    int signal;
} crashes[] = {{"1", SIGSEGV}, {"2", SIGABRT}, {"3", SIGBUS}, {"4", SIGFPE},
               {"5", SIGILL},  {"6", SIGABRT}, {"7", SIGSEGV}};

/* A checker built in reports instead of dying by the signal. */
static bool checked_build(void)
{
#if defined(__SANITIZE_ADDRESS__)
    return true;
#else
    return false;
#endif
}

START_TEST(a_crash_leaves_the_terminal_as_found)
{
    struct pty *p = start_with((const char *[]){"--mouse", NULL}, 24, 80, NULL);
    pty_expect(p, "DEMO 24x80");
    pty_expect_mode(p, 1000, true);
    pty_type(p, crashes[_i].key);
    int status = pty_end(p);
    if (!checked_build())
        ck_assert_msg(WIFSIGNALED(status) &&
                          WTERMSIG(status) == crashes[_i].signal,
                      "signal %d, wait status %#x", crashes[_i].signal, status);
    else
        ck_assert(!WIFEXITED(status) || WEXITSTATUS(status) != 0);
    restored(p);
    pty_free(p);
}
END_TEST

START_TEST(suspend_gives_the_terminal_back_and_takes_it_again)
{
    struct pty *p = start();
    for (int round = 0; round < 3; round++) {
        pty_type(p, "\032");
        pty_expect_stopped(p);
        restored(p);
        pty_continue(p);
        pty_expect_full_screen(p);
        pty_expect(p, "DEMO 24x80");
        ck_assert(!pty_modes_same(p));
        pty_key(p, "kcuu1");
        pty_expect(p, "last: key up.");
        pty_key(p, "kcud1");
        pty_expect(p, "last: key down.");
    }
    /* the size changed meanwhile */
    pty_type(p, "\032");
    pty_expect_stopped(p);
    pty_resize(p, 30, 60);
    pty_continue(p);
    pty_expect(p, "DEMO 30x60");
    quits(p);
    restored(p);
    pty_free(p);
}
END_TEST

START_TEST(paste_mode_comes_back_after_a_stop)
{
    struct pty *p = start();
    pty_type(p, "\032");
    pty_expect_stopped(p);
    size_t before = pty_count(p);
    pty_continue(p);
    pty_expect(p, "DEMO 24x80");
    pty_expect_output(p, before, "\033[?2004h");
    pty_type(p, "\033[200~quit?\033[201~");
    pty_expect(p, "field: quit?.");
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(a_stop_that_cannot_be_caught_is_mended_afterwards)
{
    struct pty *p = start();
    pty_signal(p, SIGSTOP);
    pty_expect_stopped(p);
    size_t before = pty_count(p);
    pty_continue(p);
    pty_expect_output(p, before, "DEMO 24x80"); /* written anew */
    ck_assert(pty_full_screen(p));
    quits(p);
    restored(p);
    pty_free(p);
}
END_TEST

START_TEST(an_ignored_stop_stays_ignored)
{
    const char *argv[] = {demo, NULL};
    struct pty_options options = {
        .argv = argv, .rows = 24, .columns = 80, .ignore_stop = true};
    struct pty *p = pty_start(&options);
    pty_expect(p, "DEMO 24x80");
    pty_type(p, "\032x");
    pty_expect(p, "last: character x.");
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(a_lost_terminal_ends_the_program)
{
    const char *argv[] = {demo, NULL};
    struct pty_options options = {
        .argv = argv, .rows = 24, .columns = 80, .keep_hangup = _i == 1};
    struct pty *p = pty_start(&options);
    pty_expect(p, "DEMO 24x80");
    pty_hangup(p);
    int status = pty_end(p);
    ck_assert_msg(WIFSIGNALED(status) && WTERMSIG(status) == SIGHUP,
                  "wait status %#x", status);
    pty_free(p);
}
END_TEST

START_TEST(a_resize_storm_is_laid_out_a_few_times)
{
    struct pty *p = start();
    for (int i = 0; i < 200; i++)
        pty_resize(p, 20 + i % 17, 60 + i % 31);
    pty_resize(p, 33, 77);
    pty_expect(p, "DEMO 33x77");
    pty_type(p, "q");
    pty_end(p);
    restored(p);
    int resizes = 0;
    size_t length;
    const char *last = strstr(pty_output(p, &length), "draws, ");
    ck_assert_ptr_nonnull(last);
    ck_assert_int_eq(sscanf(last, "draws, %d", &resizes), 1);
    ck_assert_int_le(resizes, 50);
    pty_free(p);
}
END_TEST

START_TEST(a_resize_during_work_is_shown_and_work_goes_on)
{
    struct pty *p = start();
    pty_type(p, "w");
    for (int i = 0; i < 40; i++)
        pty_resize(p, 20 + i, 60 + i);
    pty_expect(p, "DEMO 59x99");
    pty_type(p, "x");
    pty_expect(p, "last: character x.");
    pty_expect(p, "left: 0.");
    quits(p);
    pty_free(p);
}
END_TEST

static const int sizes[][2] = {{1, 1},    {0, 0},    {1, 80},  {24, 1},
                               {2, 2},    {5, 20},   {12, 40}, {24, 80},
                               {60, 200}, {100, 300}};

START_TEST(any_size_opens_and_closes)
{
    struct pty *p = start_with(NULL, sizes[_i][0], sizes[_i][1], NULL);
    pty_expect_full_screen(p);
    bool same = sizes[_i][0] == 1 && sizes[_i][1] == 1;
    size_t before = pty_count(p);
    pty_resize(p, 1, 1);
    pty_expect_output(p, same ? 0 : before, "\033[");
    before = pty_count(p);
    pty_resize(p, sizes[_i][0], sizes[_i][1]);
    pty_expect_output(p, same ? 0 : before, "\033[");
    quits(p);
    restored(p);
    pty_free(p);
}
END_TEST

/* TERM as the environment has it, what the message must name. */
static const struct {
    const char *term, *named;
} unusable[] = {{"TERM=dumb", "'dumb'"},
                {"TERM=no-such-terminal", "'no-such-terminal'"},
                {"TERM=unknown", "'unknown'"},
                {"TERM=\033[31mred", "'?[31mred'"},
                {"TERM=", "TERM is not set"},
                {"TERM", "TERM is not set"}};

START_TEST(a_terminal_without_a_cursor_gets_one_sentence)
{
    const char *env[] = {unusable[_i].term, NULL};
    struct pty *p = start_with(NULL, 24, 80, env);
    int status = pty_end(p);
    ck_assert(WIFEXITED(status) && WEXITSTATUS(status) == 1);
    size_t length;
    const char *output = pty_output(p, &length);
    ck_assert_ptr_nonnull(strstr(output, unusable[_i].named));
    ck_assert_ptr_nonnull(strstr(output, "list, compare"));
    ck_assert_msg(strchr(output, '\033') == NULL, "control codes: %s", output);
    ck_assert(pty_modes_same(p));
    pty_free(p);
}
END_TEST

START_TEST(redirected_streams_get_one_sentence)
{
    static const char *const redirections[] = {"> /dev/null", "< /dev/null",
                                               "| cat", "> /dev/null <&0"};
    char command[4096];
    snprintf(command, sizeof command, "'%s' %s; echo status $?.", demo,
             redirections[_i]);
    const char *argv[] = {"/bin/sh", "-c", command, NULL};
    struct pty_options options = {.argv = argv, .rows = 24, .columns = 300};
    struct pty *p = pty_start(&options);
    pty_expect(p, _i == 2 ? "status 0." : "status 1.");
    pty_end(p);
    size_t length;
    const char *output = pty_output(p, &length);
    ck_assert_ptr_nonnull(strstr(output, "is not a terminal"));
    ck_assert_ptr_null(strchr(output, '\033'));
    pty_free(p);
}
END_TEST

static const struct {
    const char *term;
    int tier; /* palette.h */
} terms[] = {{"vt220", 0},
             {"linux", 1},
             {"xterm", 1},
             {"xterm-16color", 2},
             {"xterm-256color", 3},
             {"xterm-direct", 4},
             {"screen", 1},
             {"screen-256color", 3},
             {"tmux-256color", 3},
             {"tmux-direct", 4},
             {"vt100", 0},
             {"xterm-direct256", 4},
             {"rxvt-unicode-256color", 3}};

static void show_term(int i, const char *second, const char *third, int tier)
{
    char term[64];
    char title[64];
    if (!pty_has_term(terms[i].term))
        return; /* main has looked for the package */
    snprintf(term, sizeof term, "TERM=%s", terms[i].term);
    snprintf(title, sizeof title, "DEMO 24x80 tier %d", tier);
    const char *env[] = {term, second, third, NULL};
    struct pty *p = start_with(NULL, 24, 80, env);
    pty_expect(p, title);
    pty_key(p, "kcuu1");
    pty_expect(p, "last: key up.");
    pty_key(p, "kcuf1");
    pty_expect(p, "last: key right.");
    bool plain = second != NULL && strcmp(second, "LC_ALL=C") == 0;
    pty_expect(p, plain ? "~-A-|zx.=#/" : "±−Å─│ζχ▁▄█╱");
    size_t length;
    const char *output = pty_output(p, &length);
    for (size_t k = 0; plain && k < length; k++)
        ck_assert_msg((output[k] & 0x80) == 0, "%s: byte %#x", terms[i].term,
                      (unsigned char)output[k]);
    quits(p);
    restored(p);
    pty_free(p);
}

START_TEST(every_term_shows_its_tier)
{
    show_term(_i, NULL, NULL, terms[_i].tier);
}
END_TEST

START_TEST(no_color_leaves_none)
{
    show_term(_i, "NO_COLOR=1", NULL, 0);
}
END_TEST

START_TEST(the_c_locale_gets_ascii)
{
    show_term(_i, "LC_ALL=C", "NO_COLOR=", terms[_i].tier);
}
END_TEST

START_TEST(a_locale_that_is_not_installed_still_has_its_glyphs)
{
    const char *env[] = {"LC_ALL=xx_XX.UTF-8", NULL};
    struct pty *p = start_with(NULL, 24, 80, env);
    pty_expect(p, "±−Å─│ζχ▁▄█╱");
    quits(p);
    pty_free(p);
    const char *none[] = {"LC_ALL=xx_XX", NULL};
    p = start_with(NULL, 24, 80, none);
    pty_expect(p, "~-A-|zx.=#/");
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(options_come_before_no_color)
{
    const char *env[] = {"NO_COLOR=1", NULL};
    struct pty *p =
        start_with((const char *[]){"--color", "always", NULL}, 24, 80, env);
    pty_expect(p, "tier 3");
    quits(p);
    pty_free(p);
    p = start_with((const char *[]){"--color", "never", NULL}, 24, 80, NULL);
    pty_expect(p, "tier 0");
    first_screen(p);
    struct pty_look cell = pty_look(p, 9, 1);
    ck_assert(cell.default_foreground && cell.default_background);
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(exported_lines_and_columns_do_not_freeze_the_size)
{
    const char *env[] = {"LINES=10", "COLUMNS=20", NULL};
    struct pty *p = start_with(NULL, 24, 80, env);
    pty_expect(p, "DEMO 24x80");
    pty_resize(p, 30, 90);
    pty_expect(p, "DEMO 30x90");
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(pasted_text_never_runs_commands)
{
    struct pty *p = start();
    pty_type(p, "\033[200~q w\n1é\033[A\033[201~x");
    pty_expect(p, "last: character x.");
    pty_expect(p, "field: q w/1é.");
    quits(p);
    pty_free(p);
}
END_TEST

/* Sequences no description of this terminal has, and parts of them. */
static const char *const strange[] = {
    "\033[99~",        "\033[?62;c",       "\033[1;9q", "\033[27;5;113~",
    "\033[[Z",         "\033Oz",           "\033O5w",   "\033]11;rgb:0/0/q\007",
    "\033]11;q\033\\", "\033Pq1;2q\033\\", "\033q",     "\033_Gq\033\\",
    "\033[>q",         "\033[12;4$y",      "\033[<q"};

START_TEST(unknown_sequences_run_no_commands)
{
    struct pty *p = start();
    pty_type(p, strange[_i]);
    pty_type(p, "x");
    pty_expect(p, "last: character x.");
    pty_expect(p, "events: 2.");
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(a_broken_off_sequence_does_not_swallow_for_ever)
{
    struct pty *p = start();
    static const char *const parts[] = {"\033[12;", "\033]11;rgb", "\033O"};
    for (int i = 0; i < 3; i++) {
        pty_type(p, parts[i]);
        pty_settle(p, 500);
        press_until_seen(p);
        pty_type(p, "y");
        pty_expect(p, "last: character y.");
    }
    quits(p);
    pty_free(p);
}
END_TEST

static const struct {
    const char *bytes, *name;
} keys[] = {
    {"\033[A", "up"},       {"\033OB", "down"},       {"\033[C", "right"},
    {"\033OD", "left"},     {"\033[H", "home"},       {"\033OH", "home"},
    {"\033[1~", "home"},    {"\033[7~", "home"},      {"\033[F", "end"},
    {"\033OF", "end"},      {"\033[4~", "end"},       {"\033[8~", "end"},
    {"\033[5~", "page-up"}, {"\033[6~", "page-down"}, {"\r", "enter"},
    {"\n", "enter"},        {"\033OM", "enter"},      {"\t", "tab"},
    {"\033[Z", "backtab"},  {"\010", "erase"},        {"\177", "erase"},
    {"\033[3~", "delete"},  {"\033", "escape"},       {"\025", "clear"},
    {"\014", "repaint"},
};

START_TEST(every_form_of_a_key_is_known)
{
    static const char *const in[] = {"TERM=xterm-256color", "TERM=linux",
                                     "TERM=tmux-256color", "TERM=xterm"};
    const char *env[] = {in[_i], NULL};
    struct pty *p = start_with(NULL, 24, 80, env);
    pty_expect(p, "DEMO 24x80");
    for (size_t k = 0; k < sizeof keys / sizeof keys[0]; k++) {
        char want[64];
        snprintf(want, sizeof want, "last: key %s.", keys[k].name);
        pty_type(p, "x");
        pty_expect(p, "last: character x.");
        pty_type(p, keys[k].bytes);
        pty_expect(p, want);
    }
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(characters_outside_ascii_arrive_whole)
{
    struct pty *p = start();
    pty_type(p, "é");
    pty_expect(p, "last: character é.");
    pty_type(p, "Å");
    pty_expect(p, "last: character Å.");
    pty_type(p, "\xC6\x99"); /* U+0199, the number of a curses key */
    pty_expect(p, "last: character ƙ.");
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(high_bytes_in_the_c_locale_do_no_harm)
{
    const char *env[] = {"LC_ALL=C", NULL};
    struct pty *p = start_with(NULL, 24, 80, env);
    pty_expect(p, "DEMO 24x80");
    for (int i = 0; i < 100; i++)
        pty_type(p, "\xC3\xA9\xFF");
    pty_type(p, "x");
    pty_expect(p, "last: character x.");
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(a_held_key_is_drawn_less_often_than_it_comes)
{
    struct pty *p = start();
    char held[3 * 400 + 1];
    for (int i = 0; i < 400; i++)
        memcpy(held + (size_t)(3 * i), "\033OC", 4);
    pty_send(p, held, sizeof held - 1);
    pty_expect(p, "events: 401.");
    /* 400 steps over 12 columns end in column 4 */
    pty_expect_cursor(p, 8, 4 * (400 % 12) + 1);
    quits(p);
    int draws = 0;
    size_t length;
    const char *last = strstr(pty_output(p, &length), "events, ");
    ck_assert_ptr_nonnull(last);
    ck_assert_int_eq(sscanf(last, "events, %d", &draws), 1);
    ck_assert_int_lt(draws, 300);
    pty_free(p);
}
END_TEST

START_TEST(the_cursor_is_on_the_selection_though_invisible)
{
    struct pty *p = start();
    for (int i = 1; i < 5; i++) {
        int row;
        int column;
        bool visible;
        pty_key(p, "kcud1");
        pty_key(p, "kcuf1");
        pty_expect_cursor(p, 8 + i, 4 * i + 1);
        pty_drain(p);
        pty_cursor(p, &row, &column, &visible);
        ck_assert(!visible);
        /* black or white ground instead of ink */
        uint32_t ground = pty_look(p, row, column).background;
        ck_assert_msg(ground == 0x000000 || ground == 0xFFFFFF, "#%06x",
                      ground);
        ck_assert_uint_eq(pty_look(p, row, column - 1).character, '[');
    }
    quits(p);
    pty_free(p);
}
END_TEST

/* The budget of a selection move (design.md, figures): 200 bytes. The demo
 * changes the counter and the last key as well. */
START_TEST(a_selection_move_costs_few_bytes)
{
    struct pty *p = start();
    pty_key(p, "kcuf1");
    pty_expect_cursor(p, 8, 5);
    int row = 8;
    int column = 5;
    for (int i = 0; i < 10; i++) {
        size_t before = pty_count(p);
        pty_key(p, i % 3 ? "kcuf1" : "kcud1");
        row += i % 3 ? 0 : 1;
        column += i % 3 ? 4 : 0;
        pty_expect_cursor(p, row, column);
        pty_drain(p);
        ck_assert_uint_gt(pty_count(p), before);
        ck_assert_uint_le(pty_count(p) - before, 200);
    }
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(idle_writes_nothing_and_takes_no_time)
{
    struct pty *p = start();
    pty_key(p, "kcuf1");
    pty_expect_cursor(p, 8, 5);
    pty_drain(p);
    size_t before = pty_count(p);
    long cpu = pty_cpu(p);
    pty_settle(p, 1200);
    ck_assert_uint_eq(pty_count(p), before);
    /* what follows the last byte may fill the tick that it began in */
    ck_assert_int_le(pty_cpu(p) - cpu, 1);
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(control_u_is_a_key)
{
    struct pty *p = start();
    pty_type(p, "\025");
    pty_expect(p, "last: key clear.");
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(repaint_writes_everything_again)
{
    struct pty *p = start();
    size_t before = pty_count(p);
    pty_type(p, "\014");
    pty_expect(p, "last: key repaint.");
    pty_expect_output(p, before + 500, "\033[");
    quits(p);
    pty_free(p);
}
END_TEST

START_TEST(the_mouse_is_taken_only_when_told)
{
    struct pty *p = start();
    ck_assert(!pty_mode(p, 1000));
    pty_type(p, "m");
    pty_expect(p, "last: character m.");
    pty_expect_mode(p, 1000, true);
    pty_type(p, "\033[<0;6;4M\033[<0;6;4m");
    pty_expect(p, "last: mouse 1 at 3,5.");
    pty_type(p, "\033[<64;2;2M");
    pty_expect(p, "last: mouse 2 at 1,1.");
    pty_type(p, "\033[<65;2;2M");
    pty_expect(p, "last: mouse 3 at 1,1.");
    pty_type(p, "\032");
    pty_expect_stopped(p);
    restored(p);
    pty_continue(p);
    pty_expect(p, "DEMO 24x80");
    pty_expect_mode(p, 1000, true);
    pty_type(p, "m");
    pty_expect(p, "last: character m.");
    pty_expect_mode(p, 1000, false);
    pty_type(p, "m");
    pty_expect_mode(p, 1000, true);
    quits(p);
    restored(p);
    pty_free(p);
}
END_TEST

START_TEST(schemes_set_both_colours_everywhere)
{
    struct pty *p =
        start_with((const char *[]){"--scheme", "2", NULL}, 24, 80, NULL);
    pty_expect(p, "DEMO 24x80");
    first_screen(p);
    for (int r = 0; r < 24; r++)
        for (int c = 0; c < 80; c++) {
            struct pty_look cell = pty_look(p, r, c);
            ck_assert_msg(!cell.default_background, "row %d column %d", r, c);
            ck_assert(cell.character == ' ' || !cell.default_foreground);
        }
    quits(p);
    pty_free(p);
}
END_TEST

/* A key after stop, resume, resize and paste in any mix still quits. */
START_TEST(any_mix_of_input_leaves_a_program_that_quits)
{
    static const char *const pieces[] = {
        "\033",    "\033[",        "\033[200~", "\033[201~", "w",
        "\033OA",  "\033[<0;1;1M", "m",         "x",         "\xC3",
        "\033]0;", "\014",         "é",         "\t",        "\033[M"};
    enum { PIECES = sizeof pieces / sizeof pieces[0] };
    unsigned seed = 26u + (unsigned)_i;
    struct pty *p = start();
    for (int i = 0; i < 150; i++) {
        seed = seed * 1103515245u + 12345u;
        unsigned pick = seed >> 16;
        if (pick % 11 == 0)
            pty_resize(p, 1 + (int)(pick / 11 % 40), 1 + (int)(pick % 90));
        else if (pick % 29 == 1)
            pty_signal(p, SIGWINCH);
        else
            pty_type(p, pieces[pick % PIECES]);
    }
    /* an open paste is given up by then; in the other rounds it is ended */
    pty_type(p, _i == 0 ? "" : "\033\\\033[201~");
    pty_settle(p, _i == 0 ? 2000 : 600);
    pty_resize(p, 24, 80);
    pty_expect(p, "DEMO 24x80");
    press_until_seen(p);
    quits(p);
    restored(p);
    pty_free(p);
}
END_TEST

#define COUNT(array) (int)(sizeof(array) / sizeof(array)[0])

static void add_ends(TCase *tc)
{
    tcase_add_test(tc, quit_leaves_the_terminal_as_found);
    tcase_add_loop_test(tc, the_parent_sees_the_true_signal, 0, COUNT(deaths));
    tcase_add_loop_test(
        tc, what_the_tests_ignore_or_hold_back_does_not_reach_the_program, 0,
        COUNT(deaths));
    tcase_add_test(tc, the_interrupt_key_stops_work_first_and_quits_next);
    tcase_add_loop_test(tc, a_crash_leaves_the_terminal_as_found, 0,
                        COUNT(crashes));
    tcase_add_test(tc, suspend_gives_the_terminal_back_and_takes_it_again);
    tcase_add_test(tc, paste_mode_comes_back_after_a_stop);
    tcase_add_test(tc, a_stop_that_cannot_be_caught_is_mended_afterwards);
    tcase_add_test(tc, an_ignored_stop_stays_ignored);
    tcase_add_loop_test(tc, a_lost_terminal_ends_the_program, 0, 2);
}

static void add_places(TCase *tc)
{
    tcase_add_test(tc, a_resize_storm_is_laid_out_a_few_times);
    tcase_add_test(tc, a_resize_during_work_is_shown_and_work_goes_on);
    tcase_add_loop_test(tc, any_size_opens_and_closes, 0, COUNT(sizes));
    tcase_add_loop_test(tc, a_terminal_without_a_cursor_gets_one_sentence, 0,
                        COUNT(unusable));
    tcase_add_loop_test(tc, redirected_streams_get_one_sentence, 0, 3);
    tcase_add_loop_test(tc, every_term_shows_its_tier, 0, COUNT(terms));
    tcase_add_loop_test(tc, no_color_leaves_none, 0, COUNT(terms));
    tcase_add_loop_test(tc, the_c_locale_gets_ascii, 0, COUNT(terms));
    tcase_add_test(tc, a_locale_that_is_not_installed_still_has_its_glyphs);
    tcase_add_test(tc, options_come_before_no_color);
    tcase_add_test(tc, exported_lines_and_columns_do_not_freeze_the_size);
}

static void add_input(TCase *tc)
{
    tcase_add_test(tc, pasted_text_never_runs_commands);
    tcase_add_loop_test(tc, unknown_sequences_run_no_commands, 0,
                        COUNT(strange));
    tcase_add_test(tc, a_broken_off_sequence_does_not_swallow_for_ever);
    tcase_add_loop_test(tc, every_form_of_a_key_is_known, 0, 4);
    tcase_add_test(tc, characters_outside_ascii_arrive_whole);
    tcase_add_test(tc, high_bytes_in_the_c_locale_do_no_harm);
    tcase_add_test(tc, a_held_key_is_drawn_less_often_than_it_comes);
    tcase_add_test(tc, the_cursor_is_on_the_selection_though_invisible);
    tcase_add_test(tc, a_selection_move_costs_few_bytes);
    tcase_add_test(tc, idle_writes_nothing_and_takes_no_time);
    tcase_add_test(tc, repaint_writes_everything_again);
    tcase_add_test(tc, control_u_is_a_key);
    tcase_add_test(tc, the_mouse_is_taken_only_when_told);
    tcase_add_test(tc, schemes_set_both_colours_everywhere);
    tcase_add_loop_test(tc, any_mix_of_input_leaves_a_program_that_quits, 0, 5);
}

int main(int argc, char **argv)
{
    if (argc != 2) {
        fprintf(stderr, "usage: test_manners DEMO\n");
        return EXIT_FAILURE;
    }
    demo = argv[1];
    /* the wide descriptions are in a package of their own */
    if (!pty_has_term("xterm-direct") || !pty_has_term("xterm-16color"))
        return 77;
    Suite *suite = suite_create("manners");
    TCase *ends = tcase_create("ends");
    TCase *places = tcase_create("places");
    TCase *input = tcase_create("input");
    tcase_set_timeout(ends, 60);
    tcase_set_timeout(places, 60);
    tcase_set_timeout(input, 60);
    add_ends(ends);
    add_places(places);
    add_input(input);
    suite_add_tcase(suite, ends);
    suite_add_tcase(suite, places);
    suite_add_tcase(suite, input);
    return run_suite(suite);
}
