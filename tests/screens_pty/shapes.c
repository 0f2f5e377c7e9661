/* SPDX-License-Identifier: MIT */
/* What stands on the screen, at every size and on every terminal. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/wait.h>

#include "base/text.h"
#include "element/element.h"
#include "screens_pty/session.h"

/* Where the grid stands: its first row of elements, columns before the first
 * symbol, size of a cell, and whether a row parts the f block from the rest. */
struct shape {
    int rows, columns;
    int top, lead, width, height, gap;
};
static const struct shape shapes[] = {
    {24, 80, 2, 4, 4, 1, 1},
    {40, 120, 2, 4, 6, 2, 1},
    {60, 200, 2, 4, 7, 3, 1},
    {12, 40, 1, 3, 2, 1, 0},
};

static void cell_place(const struct shape *s, int z, int *row, int *column)
{
    struct grid_place place = element_place(z, GRID_18, GRID_LU_LR);
    *row = s->top + place.row * s->height + (place.row >= 7 ? s->gap : 0);
    *column = s->lead + place.column * s->width;
}

/* Every one of the 118 symbols in its place. */
static void grid_stands(struct pty *p, const struct shape *s)
{
    char missing[600] = "";
    struct text t = text_over(missing, sizeof missing);
    for (int z = 1; z <= Z_MAX; z++) {
        int row;
        int column;
        const char *symbol = element_at(z)->symbol;
        cell_place(s, z, &row, &column);
        for (int i = 0; symbol[i]; i++)
            if (pty_look(p, row, column + i).character !=
                (unsigned char)symbol[i]) {
                text_addf(&t, "%s ", symbol);
                break;
            }
    }
    ck_assert_msg(missing[0] == '\0', "not in its place: %s", missing);
}

static void cursor_on(struct pty *p, const struct shape *s, int z)
{
    int row;
    int column;
    cell_place(s, z, &row, &column);
    pty_expect_cursor(p, row, column);
}

/* All of the map at 24x80: title, grid, scale, pane, keys. */
static void map_is_complete(struct pty *p, const struct shape *s)
{
    static const char *const parts[] = {
        "effective nuclear charge, e   slater   neutral, outermost", "118/118",
        "Fe  26  iron", "[Ar] 3d6 4s2", "transition metal",
        /* pane: each model, the reference, the residual */
        " shells           1.500", ">slater           3.750", " clementi",
        " single-zeta", " scf", "3.04846372(23)", "+0.702", "+23.0",
        "reference zeff_from_ionization",
        /* scale and keys */
        "1.0  1  2.4  2  3.2 [3] 4.0", "8.0  9  8.2", "? keys  q quit"};
    for (int i = 0; i < COUNT(parts); i++)
        pty_expect(p, parts[i]);
    grid_stands(p, s);
}

START_TEST(the_whole_map_stands_on_24_rows_of_80)
{
    struct pty *p = session_map();
    map_is_complete(p, &shapes[0]);
    cursor_on(p, &shapes[0], 26);
    session_quit(p);
}
END_TEST

START_TEST(every_symbol_stands_at_every_size)
{
    const struct shape *s = &shapes[_i];
    struct pty *p = session_start(s->rows, s->columns, NULL, NULL);
    pty_expect(p, "? keys  q quit");
    grid_stands(p, s);
    cursor_on(p, s, 26);
    session_quit(p);
}
END_TEST

START_TEST(a_large_screen_uses_its_room)
{
    struct pty *p = session_start(60, 200, NULL, NULL);
    /* numbers in the cells, a trend beside them, all quantities below */
    static const char *const parts[] = {"category: transition metal",
                                        "model - reference, e",
                                        "r 4s, pm",
                                        "I, eV",
                                        "chi, 1",
                                        "r_iso, pm"};
    for (int i = 0; i < COUNT(parts); i++)
        pty_expect(p, parts[i]);
    pty_expect(p, "3.750  3.900  4.050"); /* below Fe Co Ni */
    session_quit(p);
}
END_TEST

START_TEST(a_small_screen_shows_one_thing_at_a_time)
{
    struct pty *p = session_start(12, 40, NULL, NULL);
    pty_expect(p, "? keys  q quit");
    pty_type(p, "\r");
    pty_expect(p, ">slater        3.750");
    pty_expect_gone(p, "LiBe");
    pty_type(p, "\r");
    pty_expect(p, "LiBe");
    session_quit(p);
}
END_TEST

static const struct {
    int rows, columns;
    const char *says;
} tiny[] = {{5, 20, "needs 24x6, is 20x5"},
            {1, 1, NULL},
            {1, 40, "needs 24x6"},
            {24, 10, "needs"}};

START_TEST(a_tiny_screen_says_what_it_needs_and_still_quits)
{
    struct pty *p = session_start(tiny[_i].rows, tiny[_i].columns, NULL, NULL);
    if (tiny[_i].says)
        pty_expect(p, tiny[_i].says);
    pty_resize(p, 24, 80);
    pty_expect(p, "? keys  q quit");
    grid_stands(p, &shapes[0]);
    pty_resize(p, tiny[_i].rows, tiny[_i].columns);
    if (tiny[_i].says)
        pty_expect(p, tiny[_i].says);
    session_quit(p);
}
END_TEST

static const struct {
    const char *term;
    bool color; /* it has some */
} terms[] = {{"xterm-256color", true}, {"xterm", true}, {"tmux-256color", true},
             {"vt220", false},         {"linux", true}, {"xterm-direct", true},
             {"screen-256color", true}};

static void no_color(struct pty *p)
{
    int wrong = 0;
    for (int r = 0; r < 24; r++)
        for (int c = 0; c < 80; c++) {
            struct pty_look cell = pty_look(p, r, c);
            wrong += !cell.default_background || !cell.default_foreground;
        }
    ck_assert_msg(wrong == 0, "%d cells have a colour", wrong);
}

static void only_ascii(struct pty *p)
{
    size_t length;
    size_t high = 0;
    const char *output = pty_output(p, &length);
    for (size_t i = 0; i < length; i++)
        high += (output[i] & 0x80) != 0;
    ck_assert_msg(high == 0, "%zu bytes are not ASCII", high);
}

/* One terminal: the whole map, arrows by its own description, the key help. */
static struct pty *use_term(int i, const char *argument, const char *setting)
{
    char term[64];
    snprintf(term, sizeof term, "TERM=%s", terms[i].term);
    const char *env[] = {term, setting, NULL};
    const char *arguments[] = {argument, NULL};
    struct pty *p = session_start(24, 80, arguments, env);
    map_is_complete(p, &shapes[0]);
    cursor_on(p, &shapes[0], 26);
    pty_key(p, "kcuf1");
    pty_expect(p, "Co  27  cobalt");
    pty_key(p, "kcud1");
    pty_expect(p, "Rh  45  rhodium");
    pty_type(p, "?");
    pty_expect(p, "what every key does");
    pty_type(p, "?");
    pty_expect(p, "Rh  45  rhodium");
    pty_expect(p, "q quit  w quantity");
    cursor_on(p, &shapes[0], 45);
    return p;
}

START_TEST(every_terminal_shows_the_map)
{
    struct pty *p = use_term(_i, NULL, NULL);
    if (!terms[_i].color)
        no_color(p);
    else /* xenon is in the highest class: its cell has a ground */
        ck_assert(!pty_look(p, 6, 4 + 17 * 4).default_background);
    session_quit(p);
}
END_TEST

START_TEST(no_color_takes_the_colours_away_and_nothing_else)
{
    struct pty *p = use_term(_i, NULL, "NO_COLOR=1");
    no_color(p);
    session_quit(p);
}
END_TEST

START_TEST(the_c_locale_gets_ascii)
{
    struct pty *p = use_term(_i, NULL, "LC_ALL=C");
    only_ascii(p);
    session_quit(p);
}
END_TEST

START_TEST(ascii_can_be_asked_for)
{
    struct pty *p = use_term(_i, "--ascii", NULL);
    only_ascii(p);
    session_quit(p);
}
END_TEST

static const struct {
    const char *setting, *named;
} unusable[] = {{"TERM=dumb", "'dumb'"},
                {"TERM=no-such-terminal", "'no-such-terminal'"},
                {"TERM=unknown", "'unknown'"},
                {"TERM", "TERM is not set"}};

START_TEST(an_unusable_terminal_gets_one_sentence)
{
    const char *env[] = {unusable[_i].setting, NULL};
    struct pty *p = session_start(24, 80, NULL, env);
    int status = pty_end(p);
    ck_assert(WIFEXITED(status) && WEXITSTATUS(status) == 1);
    size_t length;
    const char *output = pty_output(p, &length);
    ck_assert_msg(strncmp(output, "outershell: ", 12) == 0, "%s", output);
    ck_assert_ptr_nonnull(strstr(output, unusable[_i].named));
    ck_assert_ptr_null(strchr(output, '\033'));
    ck_assert(pty_modes_same(p));
    pty_free(p);
}
END_TEST

TCase *case_shapes(void)
{
    TCase *tc = tcase_create("shapes");
    tcase_add_test(tc, the_whole_map_stands_on_24_rows_of_80);
    tcase_add_loop_test(tc, every_symbol_stands_at_every_size, 0,
                        COUNT(shapes));
    tcase_add_test(tc, a_large_screen_uses_its_room);
    tcase_add_test(tc, a_small_screen_shows_one_thing_at_a_time);
    tcase_add_loop_test(tc, a_tiny_screen_says_what_it_needs_and_still_quits, 0,
                        COUNT(tiny));
    tcase_add_loop_test(tc, every_terminal_shows_the_map, 0, COUNT(terms));
    tcase_add_loop_test(tc, no_color_takes_the_colours_away_and_nothing_else, 0,
                        COUNT(terms));
    tcase_add_loop_test(tc, the_c_locale_gets_ascii, 0, COUNT(terms));
    tcase_add_loop_test(tc, ascii_can_be_asked_for, 0, COUNT(terms));
    tcase_add_loop_test(tc, an_unusable_terminal_gets_one_sentence, 0,
                        COUNT(unusable));
    return tc;
}
