/* SPDX-License-Identifier: MIT */
/* Colour of what a command prints on a terminal: its option, then NO_COLOR,
 * then what the terminal can do. */
#include <check.h>
#include <stdbool.h>
#include <stddef.h>
#include <string.h>

#include "support/pty.h"
#include "support/run.h"

struct look {
    bool bold, color;
};

static bool has(const char *bytes, size_t length, const char *part)
{
    size_t size = strlen(part);
    for (size_t i = 0; i + size <= length; i++)
        if (memcmp(bytes + i, part, size) == 0)
            return true;
    return false;
}

/* What `list Fe` writes to a terminal with these settings and options. */
static struct look look_of(const char *const *env, const char *option)
{
    const char *const argv[] = {OUTERSHELL, "list", "Fe", "--model",
                                "slater",   option, NULL};
    struct pty_options options = {
        .argv = argv, .rows = 24, .columns = 120, .env = env};
    struct pty *pty = pty_start(&options);
    size_t length;
    pty_expect(pty, "Reference sets");
    pty_end(pty);
    const char *bytes = pty_output(pty, &length);
    struct look look = {has(bytes, length, "\033[1m"),
                        has(bytes, length, "\033[38;5;")};
    ck_assert(pty_shows(pty, "+0.702"));
    pty_free(pty);
    return look;
}

START_TEST(colour_follows_option_then_no_color_then_terminal)
{
    static const char *const plain[] = {NULL};
    static const char *const refused[] = {"NO_COLOR=1", NULL};
    static const char *const empty[] = {"NO_COLOR=", NULL};
    static const char *const few[] = {"TERM=vt220", NULL};
    static const char *const dumb[] = {"TERM=dumb", NULL};
    static const struct {
        const char *const *env;
        const char *option;
        struct look look;
    } cases[] = {
        {plain, NULL, {true, true}},
        {empty, NULL, {true, true}},
        {refused, NULL, {true, false}},
        {few, NULL, {true, false}},
        {dumb, NULL, {false, false}},
        {plain, "--color=never", {false, false}},
        {refused, "--color=always", {true, true}},
        {dumb, "--color=always", {true, true}},
        {refused, "--color=auto", {true, false}},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        struct look look = look_of(cases[i].env, cases[i].option);
        ck_assert_msg(look.bold == cases[i].look.bold &&
                          look.color == cases[i].look.color,
                      "case %zu: bold %d, colour %d", i, look.bold, look.color);
    }
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("color");
    TCase *c = tcase_create("terminal");
    tcase_add_test(c, colour_follows_option_then_no_color_then_terminal);
    suite_add_tcase(suite, c);
    return run_suite(suite);
}
