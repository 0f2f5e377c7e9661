/* SPDX-License-Identifier: MIT */
/* The screen Atom of the program itself on a pseudo-terminal:
 * test_atom_pty OUTERSHELL. */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/wait.h>
#include <unistd.h>

#include "support/csv.h"
#include "support/pty.h"
#include "support/run.h"

static const char *outershell;
static char folder[] = "/tmp/outershell-atom-XXXXXX";

static struct pty *start(int rows, int columns)
{
    char state_home[64]; /* a view of its own for every test */
    snprintf(state_home, sizeof state_home, "XDG_STATE_HOME=%s/%d", folder,
             (int)getpid());
    const char *argv[] = {outershell, NULL};
    const char *env[] = {state_home, NULL};
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

START_TEST(an_atom_is_solved_and_read)
{
    struct pty *p = start(24, 80);
    pty_type(p, "a");
    pty_expect(p, "converged in");
    pty_expect(p, ">4s");
    pty_expect(p, "D(r), e/pm");
    pty_expect(p, "Z_eff(r)");
    pty_key(p, "kcuu1");
    pty_expect(p, ">3d");
    pty_type(p, "U\r");
    pty_expect(p, "uranium");
    pty_expect(p, ">3d");
    pty_type(p, "v");
    pty_expect(p, "root axis");
    pty_type(p, "v");
    pty_expect(p, "e within r");
    quits(p);
}
END_TEST

START_TEST(it_follows_the_size_of_the_terminal)
{
    struct pty *p = start(24, 80);
    pty_type(p, "a");
    pty_expect(p, "converged in");
    pty_resize(p, 60, 200);
    pty_expect(p, "minority spin");
    pty_expect(p, "e within r");
    pty_resize(p, 12, 40);
    pty_expect(p, "max D  Z_eff"); /* the narrow table */
    pty_expect(p, ">4s");
    pty_type(p, "\r");
    pty_expect(p, "D(r)");
    pty_resize(p, 4, 20);
    pty_expect(p, "needs");
    pty_resize(p, 24, 80);
    pty_expect(p, "D(r)");
    quits(p);
}
END_TEST

/* The file holds what the command prints. */
START_TEST(the_export_is_the_output_of_the_command)
{
    char path[128], command[256];
    struct pty *p = start(24, 80);
    pty_type(p, "Ne\r");
    pty_expect(p, "neon");
    pty_type(p, "a");
    pty_expect(p, "converged in");
    pty_type(p, "e");
    pty_expect(p, "Ne-atom.csv");
    pty_type(p, "\r");
    pty_expect(p, "written");
    quits(p);
    snprintf(path, sizeof path, "%s/Ne-atom.csv", folder);
    struct csv got = csv_read_file(path);
    unlink(path);
    snprintf(path, sizeof path, "%s/command.csv", folder);
    snprintf(command, sizeof command,
             "'%s' atom Ne --unit pm,eV --format csv --output '%s'", outershell,
             path);
    ck_assert_int_eq(system(command), 0);
    struct csv want = csv_read_file(path);
    unlink(path);
    ck_assert_uint_eq(got.rows, want.rows);
    ck_assert_uint_eq(got.columns, want.columns);
    for (size_t i = 0; i < got.rows * got.columns; i++)
        ck_assert_str_eq(got.cells[i], want.cells[i]);
    csv_free(&got);
    csv_free(&want);
}
END_TEST

/* Idle means idle: nothing is written, no processor time is used. */
START_TEST(a_solved_atom_costs_nothing)
{
    struct pty *p = start(24, 80);
    pty_type(p, "a");
    pty_expect(p, "converged in");
    pty_settle(p, 200);
    size_t bytes = pty_count(p);
    long cpu = pty_cpu(p);
    pty_settle(p, 700);
    ck_assert_uint_eq(pty_count(p), bytes);
    ck_assert_int_le(pty_cpu(p) - cpu, 1);
    quits(p);
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
    Suite *suite = suite_create("atom on a terminal");
    TCase *tc = tcase_create("pty");
    tcase_add_test(tc, an_atom_is_solved_and_read);
    tcase_add_test(tc, it_follows_the_size_of_the_terminal);
    tcase_add_test(tc, the_export_is_the_output_of_the_command);
    tcase_add_test(tc, a_solved_atom_costs_nothing);
    suite_add_tcase(suite, tc);
    int status = run_suite(suite);
    char command[160];
    snprintf(command, sizeof command, "rm -rf '%s'", folder);
    return system(command) == 0 ? status : EXIT_FAILURE;
}
