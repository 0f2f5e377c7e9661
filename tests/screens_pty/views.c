/* SPDX-License-Identifier: MIT */
/* Getting about: screens, lists, jumps, pins, and the view that comes back. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/wait.h>
#include <unistd.h>

#include "screens_pty/session.h"

static const struct {
    const char *key, *shows, *also;
} screens[] = {
    {"c", "Compare", "configuration"},  {"t", "Trend", "along the period"},
    {"d", "Audit", "no best is named"}, {"a", "Atom", "total energy"},
    {"s", "Sources", "Slater's rules"}, {"?", "Keys", "what every key does"},
};

START_TEST(every_screen_is_one_key_away_and_leads_back)
{
    struct pty *p = session_map();
    for (int i = 0; i < COUNT(screens); i++) {
        pty_type(p, screens[i].key);
        pty_expect(p, screens[i].also);
        ck_assert_msg(strncmp(pty_row(p, 0), screens[i].shows,
                              strlen(screens[i].shows)) == 0,
                      "%s: %s", screens[i].key, pty_row(p, 0));
        pty_expect(p, "? keys  q quit");
        pty_type(p, screens[i].key[0] == '?' ? "?" : "");
        pty_type(p, "m");
        pty_expect(p, "effective nuclear charge, e   slater   neutral");
    }
    session_quit(p);
}
END_TEST

START_TEST(tab_goes_through_all_screens)
{
    struct pty *p = session_map();
    static const char *const order[] = {
        "pin species on the map", "along the period", "no best is named",
        "total energy",           "model for zeff",   "what every key does"};
    for (int i = 0; i < COUNT(order); i++) {
        pty_type(p, "\t");
        pty_expect(p, order[i]);
    }
    pty_type(p, "\t");
    pty_expect(p, "Fe  26  iron");
    session_quit(p);
}
END_TEST

static const int sizes[][2] = {{40, 120}, {60, 200}, {12, 40}, {6, 24},
                               {5, 20},   {1, 1},    {1, 200}, {60, 1}};

START_TEST(every_screen_stands_every_size)
{
    struct pty *p = session_map();
    for (int i = 0; i < COUNT(screens); i++) {
        pty_resize(p, 24, 80);
        pty_expect(p, "q quit");
        pty_type(p, screens[i].key);
        pty_expect(p, screens[i].also);
        pty_resize(p, sizes[_i][0], sizes[_i][1]);
        if (sizes[_i][0] >= 12 && sizes[_i][1] >= 40)
            pty_expect(p, "? keys  q quit");
        pty_type(p, i == COUNT(screens) - 1 ? "?" : "");
    }
    session_quit(p);
}
END_TEST

/* What is typed, and what is selected by then. */
static const struct {
    const char *typed, *shows;
} jumps[] = {
    {"Lu\r", "Lu  71  lutetium"},        {"71\r", "Lu  71  lutetium"},
    {"/lutetium\r", "Lu  71  lutetium"}, {"/gold\r", "Au  79  gold"},
    {"Og\r", "Og  118  oganesson"},      {"/xe\r", "Xe  54  xenon"},
};

START_TEST(a_symbol_a_name_or_a_number_jumps)
{
    struct pty *p = session_map();
    pty_type(p, jumps[_i].typed);
    pty_expect(p, jumps[_i].shows);
    pty_type(p, "/nothing\r");
    pty_expect(p, "nothing: no element has this symbol, name or number");
    pty_expect(p, jumps[_i].shows);
    session_quit(p);
}
END_TEST

static const struct {
    const char *key, *title, *to, *taken;
} choosers[] = {
    {"w", "─ Quantity ─", "i", "ionization energy, eV"},
    {"b", "─ Model ─", "c", "e   clementi"},
    {"o", "─ Subshell ─", "3", "neutral, 3s"},
    {"r", "─ Reference ─", "zz", "reference zeff_clementi_1963"},
};

START_TEST(a_list_offers_and_takes)
{
    struct pty *p = session_map();
    for (int i = 0; i < COUNT(choosers); i++) {
        pty_type(p, choosers[i].key);
        pty_expect(p, choosers[i].title);
        pty_type(p, "\033"); /* taken back */
        pty_expect_gone(p, choosers[i].title);
        pty_expect(p, "effective nuclear charge, e   slater   neutral");
    }
    pty_type(p, choosers[_i].key);
    pty_expect(p, choosers[_i].title);
    pty_type(p, choosers[_i].to);
    pty_type(p, "\r");
    pty_expect(p, choosers[_i].taken);
    session_quit(p);
}
END_TEST

START_TEST(pins_stand_side_by_side)
{
    struct pty *p = session_map();
    pty_type(p, "Lu\rp");
    pty_expect(p, "Lu pinned; 1 pinned");
    pty_type(p, "Y\rp");
    pty_expect(p, "Y pinned; 2 pinned");
    pty_type(p, "c");
    pty_expect(p, "[Xe] 4f14 5d1 6s2");
    pty_expect(p, "[Kr] 4d1 5s2");
    pty_type(p, "mp");
    pty_expect(p, "Y unpinned; 1 pinned");
    pty_type(p, "x");
    pty_expect(p, "no species pinned");
    session_quit(p);
}
END_TEST

START_TEST(a_click_selects_only_when_the_mouse_is_on)
{
    struct pty *p = session_map();
    ck_assert(!pty_mode(p, 1000));
    pty_type(p, "i");
    pty_expect(p, "mouse on");
    ck_assert(pty_mode(p, 1000));
    /* row and column count from 1: Lu is in row 8, column 13 */
    pty_type(p, "\033[<0;13;8M\033[<0;13;8m");
    pty_expect(p, "Lu  71  lutetium");
    pty_type(p, "i");
    pty_expect(p, "mouse off");
    ck_assert(!pty_mode(p, 1000));
    session_quit(p);
}
END_TEST

static void change_view(struct pty *p)
{
    pty_type(p, "w");
    pty_expect(p, "─ Quantity ─");
    pty_type(p, "r\r");
    pty_expect(p, "radius, pm   slater");
    pty_type(p, "u");
    pty_expect(p, "─ Unit ─");
    pty_type(p, "b\r");
    pty_expect(p, "radius, bohr");
    pty_type(p, "Lu\rp");
    pty_expect(p, "Lu pinned; 1 pinned");
    pty_type(p, "Y\r+++p");
    pty_expect(p, "Y3+ pinned; 2 pinned");
    pty_type(p, "vv");
    pty_expect(p, "slater - ");
}

START_TEST(the_view_comes_back_and_can_be_forgotten)
{
    struct pty *p = session_map();
    change_view(p);
    session_quit(p);
    p = session_start(24, 80, NULL, NULL);
    pty_expect(p, "radius, bohr   slater - ");
    pty_expect(p, "Y3+  39  yttrium");
    pty_type(p, "c");
    pty_expect(p, "[Xe] 4f14 5d1 6s2");
    pty_expect(p, "Y3+");
    pty_type(p, "f");
    pty_expect(p, "the remembered view is forgotten; none is kept at the end");
    session_quit(p);
    ck_assert_int_ne(access(session_path("state/outershell/view"), F_OK), 0);
    session_quit(session_map());
}
END_TEST

/* A view from elsewhere: wrong lines are passed over. */
START_TEST(a_spoilt_view_stops_nothing)
{
    session_quit(session_map());
    session_write("state/outershell/view",
                  "element Lu\nmodel nonsense\ncharge 999\n\033[2Jq\npin Xx\n"
                  "quantity\nunit parsec\nsubshell 9z\ncolumns many\n");
    struct pty *p = session_start(24, 80, NULL, NULL);
    pty_expect(p, "Lu  71  lutetium");
    pty_expect(p, "effective nuclear charge, e   slater   neutral");
    session_quit(p);
}
END_TEST

START_TEST(a_view_that_cannot_be_kept_is_told_after_the_end)
{
    session_write("file", "in the way");
    char state[128];
    snprintf(state, sizeof state, "XDG_STATE_HOME=%s/file", session_folder());
    const char *env[] = {state, NULL};
    struct pty *p = session_start(24, 80, NULL, env);
    pty_expect(p, "? keys");
    pty_type(p, "q");
    int status = pty_end(p);
    ck_assert(WIFEXITED(status) && WEXITSTATUS(status) == 1);
    session_restored(p);
    size_t length;
    ck_assert_ptr_nonnull(
        strstr(pty_output(p, &length), "the view is not remembered"));
    pty_free(p);
}
END_TEST

TCase *case_views(void)
{
    TCase *tc = tcase_create("views");
    tcase_add_test(tc, every_screen_is_one_key_away_and_leads_back);
    tcase_add_test(tc, tab_goes_through_all_screens);
    tcase_add_loop_test(tc, every_screen_stands_every_size, 0, COUNT(sizes));
    tcase_add_loop_test(tc, a_symbol_a_name_or_a_number_jumps, 0, COUNT(jumps));
    tcase_add_loop_test(tc, a_list_offers_and_takes, 0, COUNT(choosers));
    tcase_add_test(tc, pins_stand_side_by_side);
    tcase_add_test(tc, a_click_selects_only_when_the_mouse_is_on);
    tcase_add_test(tc, the_view_comes_back_and_can_be_forgotten);
    tcase_add_test(tc, a_spoilt_view_stops_nothing);
    tcase_add_test(tc, a_view_that_cannot_be_kept_is_told_after_the_end);
    return tc;
}
