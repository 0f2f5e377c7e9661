/* SPDX-License-Identifier: MIT */
/* Every allocation of a call fails once in turn: status 1, one line that says
 * so, no file left behind, nothing leaked (the sanitizer build looks). */
#include <check.h>
#include <fcntl.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include "base/file.h"
#include "cli/run.h"
#include "support/program.h"
#include "support/fault.h"
#include "support/run.h"

/* How allocations are refused: all from one on, or that one alone. */
enum manner { ALL_FROM, ONE_ALONE, MANNERS };

/* Runs a call with `limit` allocations granted before the refusal; the message
 * goes to complaint[size]. */
static int run_with(const char *line, enum manner manner, long limit,
                    char *complaint, size_t size)
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
    if (manner == ALL_FROM)
        fault_grant(limit);
    else
        fault_refuse(limit);
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

/* Every command in every format that it has. The models that iterate come
 * last: theirs are the most allocations. */
static const char *const calls[] = {
    "list Fe Zr --model shells,slater,clementi --output new",
    "list Fe --model slater --format csv --output new",
    "list Fe --model slater --format json --output new",
    "list Fe --model slater --ascii --output new",
    "list C N --against covalent_cordero_2008 --sort disagreement --output new",
    "list Fe --model slater --data " CASES_DIR
    "/data/good/marks_and_sources.json --output new",
    "compare Fe Cr --model slater --output new",
    "compare Fe Cr --model slater --format csv --output new",
    "compare Fe Cr --model slater --format json --output new",
    "compare C N --model slater --against covalent_cordero_2008 --output new",
    "audit Li-Ne --model shells,slater --scope all,block --output new",
    "audit Li-Ne --model slater --format csv --output new",
    "audit Li-Ne --model slater --format json --output new",
    "audit C N --against covalent_cordero_2008 --format csv --output new",
    "sources --output new",
    "sources --format csv --output new",
    "sources --format json --output new",
    "sources --format bibtex --output new",
    "atom He --output new",
    "atom He --format csv --output new",
    "atom He --format json --functional pbe --output new",
    "atom He --ascii --output new",
    "list He Li --model scf,single-zeta --output new",
    "compare He Li --model scf,single-zeta --output new",
};
#define CALLS ((int)(sizeof calls / sizeof calls[0]))

static void check_told(const char *call, long limit, int status,
                       const char *complaint)
{
    ck_assert_msg(status == 1 && strstr(complaint, "memory") &&
                      strncmp(complaint, "outershell: ", 12) == 0 &&
                      strchr(complaint, '\n') ==
                          complaint + strlen(complaint) - 1,
                  "%s: %ld: %d: %s", call, limit, status, complaint);
    ck_assert_int_ne(access("new", F_OK), 0);
}

/* The file "new", taken away; the caller frees it. */
static char *take_output(void)
{
    char *text;
    size_t size;
    struct status st = status_ok();
    ck_assert_msg(file_read("new", 1 << 22, &text, &size, &st), "%s",
                  st.message);
    ck_assert_int_eq(unlink("new"), 0);
    return text;
}

/* A refusal that was made good later on: the output is whole. */
static void check_whole(const char *call, long limit, const char *whole)
{
    char *text = take_output();
    ck_assert_msg(strcmp(text, whole) == 0, "%s: %ld: cut", call, limit);
    free(text);
}

START_TEST(every_allocation_of_a_call_may_fail)
{
    const char *call = calls[_i / MANNERS];
    enum manner manner = (enum manner)(_i % MANNERS);
    char folder[] = "/tmp/outershell-fault-XXXXXX";
    ck_assert_ptr_nonnull(mkdtemp(folder));
    ck_assert_int_eq(chdir(folder), 0);
    long limit = 0;
    char complaint[1024];
    ck_assert_int_eq(run_with(call, ALL_FROM, -1, complaint, sizeof complaint),
                     0);
    char *whole = take_output();
    for (;; limit++) {
        ck_assert_int_lt(limit, 100000);
        int status = run_with(call, manner, limit, complaint, sizeof complaint);
        if (!fault_happened()) {
            ck_assert_msg(status == 0, "%s: %s", call, complaint);
            break;
        }
        if (manner == ONE_ALONE && status == 0)
            check_whole(call, limit, whole);
        else
            check_told(call, limit, status, complaint);
    }
    free(whole);
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
                        CALLS * MANNERS);
    suite_add_tcase(suite, c);
    return run_suite(suite);
}
