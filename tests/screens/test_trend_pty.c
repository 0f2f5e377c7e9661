/* SPDX-License-Identifier: MIT */
/* Trend and Audit of the program itself on a pseudo-terminal:
 * test_trend_pty OUTERSHELL. */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/wait.h>
#include <unistd.h>

#include "support/csv.h"
#include "support/program.h"
#include "support/pty.h"
#include "support/run.h"

/* Most bytes of one step along a trend at 80 x 24: the cursor's two columns,
 * its names and the numbers below; the whole screen is near 4000. */
#define STEP_BYTES_MAX 900

static const char *outershell;
static char folder[] = "/tmp/outershell-trend-XXXXXX";

static struct pty *start(const char *term, int rows, int columns)
{
    static int count;
    char state_home[64]; /* a view of its own for every start */
    char terminal[64];
    snprintf(state_home, sizeof state_home, "XDG_STATE_HOME=%s/%d-%d", folder,
             (int)getpid(), count++);
    snprintf(terminal, sizeof terminal, "TERM=%s", term);
    const char *argv[] = {outershell, NULL};
    const char *env[] = {state_home, terminal, NULL};
    struct pty_options options = {.argv = argv,
                                  .rows = rows,
                                  .columns = columns,
                                  .env = env,
                                  .directory = folder};
    struct pty *p = pty_start(&options);
    pty_expect(p, "? keys");
    return p;
}

static void quits(struct pty *p)
{
    pty_type(p, "q");
    int status = pty_end(p);
    ck_assert_msg(WIFEXITED(status) && WEXITSTATUS(status) == 0,
                  "wait status %#x", status);
    ck_assert(pty_modes_same(p));
    pty_free(p);
}

/* The list of quantities goes by the first letter: i is ionization. */
static void to_ionization(struct pty *p)
{
    pty_type(p, "wi\r");
    pty_expect(p, "ionization energy, eV");
}

static void to_charges(struct pty *p)
{
    pty_type(p, "t");
    pty_expect(p, "along the period");
    pty_type(p, "zc\r");
    pty_expect(p, "along the charges");
}

/* An export waits for all that it holds: written, everything is solved. */
static void all_solved(struct pty *p)
{
    char command[160];
    pty_type(p, "e");
    pty_expect(p, "write CSV to: ");
    pty_type(p, "\r");
    pty_expect(p, "the same: outershell ");
    snprintf(command, sizeof command, "rm '%s'/*.csv", folder);
    ck_assert_int_eq(system(command), 0);
}

START_TEST(a_step_along_a_trend_costs_few_bytes)
{
    struct pty *p = start("xterm-256color", 24, 80);
    to_ionization(p);
    pty_type(p, "t");
    pty_expect(p, "scf");
    all_solved(p);
    pty_settle(p, 300);
    pty_key(p, "kcuf1");
    pty_expect(p, "Co  ");
    pty_settle(p, 300);
    size_t before = pty_count(p);
    pty_key(p, "kcub1");
    pty_expect(p, "Fe  ");
    pty_settle(p, 300);
    size_t bytes = pty_count(p) - before;
    ck_assert_msg(bytes > 20 && bytes <= STEP_BYTES_MAX, "%zu bytes", bytes);
    before = pty_count(p);
    pty_settle(p, 700);
    ck_assert_uint_eq(pty_count(p), before); /* idle costs nothing */
    quits(p);
}
END_TEST

/* Uranium down to its last electron: keys are answered while it is solved,
 * and every charge ends in a number or a state. */
START_TEST(keys_stay_live_while_uranium_is_followed)
{
    struct pty *p = start("xterm-256color", 40, 120);
    to_ionization(p);
    pty_type(p, "U\r");
    pty_expect(p, "uranium");
    to_charges(p);
    for (int i = 1; i <= 6; i++) {
        char ion[16];
        snprintf(ion, sizeof ion, i == 1 ? "U+  92" : "U%d+  92", i);
        pty_key(p, "kcuf1");
        pty_expect(p, ion);
    }
    pty_key(p, "kend");
    pty_expect(p, "U91+  92");
    pty_key(p, "khome");
    pty_expect(p, "U  92  uranium");
    all_solved(p);
    ck_assert(!pty_shows(p, "not solved"));
    pty_type(p, "q");
    (void)pty_end(p);
    pty_free(p);
}
END_TEST

START_TEST(the_worst_one_is_opened_from_the_audit)
{
    struct pty *p = start("xterm-256color", 24, 80);
    to_ionization(p);
    pty_type(p, "d");
    pty_expect(p, "Audit   ionization energy, eV: mean size");
    all_solved(p);
    pty_expect(p, "worst, eV: Enter");
    pty_key(p, "kcud1");
    pty_expect(p, ">s block");
    pty_type(p, "\r");
    pty_expect(p, "Enter opens");
    pty_type(p, "\r");
    pty_expect(p, "without");
    ck_assert(!pty_shows(p, "Audit"));
    quits(p);
}
END_TEST

/* Without colours, with eight, and where nothing but ASCII may be sent the
 * names, marks and numbers are the same. */
START_TEST(every_terminal_shows_names_and_numbers)
{
    static const char *const terms[] = {"vt220", "linux", "screen",
                                        "xterm-256color"};
    for (size_t i = 0; i < sizeof terms / sizeof terms[0]; i++) {
        struct pty *p = start(terms[i], 24, 80);
        to_ionization(p);
        pty_type(p, "t");
        pty_expect(p, "single-zeta");
        pty_expect(p, "model - reference, eV");
        pty_expect(p, "7.9024681(12)");
        pty_type(p, "d");
        pty_expect(p, "best * on the");
        quits(p);
    }
}
END_TEST

/* The file that the screen writes is what the command it names prints. */
START_TEST(an_exported_trend_is_the_output_of_its_command)
{
    char path[128];
    struct pty *p = start("xterm-256color", 40, 120);
    to_ionization(p);
    to_charges(p);
    pty_type(p, "e");
    pty_expect(p, "write CSV to: trend-ionization.csv");
    pty_type(p, "\r");
    pty_expect(p, "the same: outershell list Fe --charge all");
    quits(p);
    snprintf(path, sizeof path, "%s/trend-ionization.csv", folder);
    struct csv file = csv_read_file(path);
    struct program_result r =
        program_call(outershell, "list Fe --charge all --quantity ionization "
                                 "--format csv");
    struct csv command = csv_read_text(r.out);
    ck_assert_uint_eq(csv_rows(&file), csv_rows(&command));
    ck_assert_uint_eq(file.columns, command.columns);
    for (size_t i = 0; i < file.rows * file.columns; i++)
        ck_assert_str_eq(file.cells[i], command.cells[i]);
    csv_free(&file);
    csv_free(&command);
    program_free(&r);
    ck_assert_int_eq(unlink(path), 0);
}
END_TEST

int main(int argc, char **argv)
{
    if (argc != 2)
        return EXIT_FAILURE;
    /* It runs in another folder: the path must not depend on this one. */
    outershell = realpath(argv[1], NULL);
    if (!outershell || !mkdtemp(folder))
        return EXIT_FAILURE;
    Suite *suite = suite_create("trend on a terminal");
    TCase *tc = tcase_create("pty");
    tcase_set_timeout(tc, 60);
    tcase_add_test(tc, a_step_along_a_trend_costs_few_bytes);
    tcase_add_test(tc, keys_stay_live_while_uranium_is_followed);
    tcase_add_test(tc, the_worst_one_is_opened_from_the_audit);
    tcase_add_test(tc, every_terminal_shows_names_and_numbers);
    tcase_add_test(tc, an_exported_trend_is_the_output_of_its_command);
    suite_add_tcase(suite, tc);
    int status = run_suite(suite);
    char command[160];
    snprintf(command, sizeof command, "rm -rf '%s'", folder);
    return system(command) == 0 ? status : EXIT_FAILURE;
}
