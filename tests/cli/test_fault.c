/* SPDX-License-Identifier: MIT */
/* Every allocation of a call fails once in turn: status 1, one line that says
 * so, no file left behind, nothing leaked (the sanitizer build looks). */
#include <check.h>
#include <fcntl.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include "cli/run.h"
#include "support/program.h"
#include "support/fault.h"
#include "support/run.h"

/* Runs a call with all but `limit` allocations refused; the message goes to
 * complaint[size]. */
static int run_with(const char *line, long limit, char *complaint, size_t size)
{
    static char store[1024];
    static char name[] = "outershell";
    char *argv[PROGRAM_ARGUMENTS_MAX + 2] = {name};
    struct program p = {.path = name};
    FILE *caught = tmpfile();
    ck_assert_ptr_nonnull(caught);
    program_split(&p, line, store, sizeof store);
    for (int i = 0; i < p.count; i++)
        memcpy(&argv[i + 1], &p.arguments[i], sizeof argv[0]);
    fflush(stderr);
    int kept = dup(STDERR_FILENO);
    dup2(fileno(caught), STDERR_FILENO);
    fault_grant(limit);
    int status = cli_run(p.count + 1, argv);
    fault_grant(-1);
    fflush(stderr);
    dup2(kept, STDERR_FILENO);
    close(kept);
    rewind(caught);
    size_t length = fread(complaint, 1, size - 1, caught);
    complaint[length] = '\0';
    fclose(caught);
    return status;
}

static const char *const calls[] = {
    "list Fe Zr --model shells,slater,clementi --output new",
    "list Fe --model slater --format csv --output new",
    "list Fe --model slater --format json --output new",
    "list Fe --model slater --ascii --output new",
    "compare Fe Cr --model slater --output new",
    "compare Fe Cr --model slater --format csv --output new",
    "audit Li-Ne --model shells,slater --scope all,block --output new",
    "audit Li-Ne --model slater --format json --output new",
    "audit C N --against covalent_cordero_2008 --format csv --output new",
    "list C N --against covalent_cordero_2008 --sort disagreement --output new",
    "compare C N --model slater --against covalent_cordero_2008 --output new",
    "sources --output new",
};

START_TEST(every_allocation_of_a_call_may_fail)
{
    char folder[] = "/tmp/outershell-fault-XXXXXX";
    ck_assert_ptr_nonnull(mkdtemp(folder));
    ck_assert_int_eq(chdir(folder), 0);
    long limit = 0;
    for (;; limit++) {
        char complaint[1024];
        ck_assert_int_lt(limit, 100000);
        int status = run_with(calls[_i], limit, complaint, sizeof complaint);
        if (status == 0)
            break;
        ck_assert_msg(status == 1 && strstr(complaint, "memory") &&
                          strncmp(complaint, "outershell: ", 12) == 0 &&
                          strchr(complaint, '\n') ==
                              complaint + strlen(complaint) - 1,
                      "%s: %ld: %d: %s", calls[_i], limit, status, complaint);
        ck_assert_int_ne(access("new", F_OK), 0);
    }
    ck_assert_int_ge(limit, 5);
    ck_assert_int_eq(unlink("new"), 0);
    ck_assert_int_eq(chdir("/"), 0);
    ck_assert_msg(rmdir(folder) == 0, "a file was left behind");
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("cli_fault");
    TCase *c = tcase_create("memory");
    tcase_add_loop_test(c, every_allocation_of_a_call_may_fail, 0,
                        sizeof calls / sizeof calls[0]);
    suite_add_tcase(suite, c);
    return run_suite(suite);
}
