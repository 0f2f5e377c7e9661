/* SPDX-License-Identifier: MIT */
/* The corpus of wrong calls: tests/cases/calls/calls.tsv, one per line, parted
 * by tabs: exit status, standard input ("-" for none), call, message without
 * the program's name. '*' in a message stands for any text: lists that grow. */
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>
#include <unistd.h>

#include "base/file.h"
#include "base/text.h"
#include "suites.h"
#include "support/program.h"

#define CALLS_LEAST 150 /* the corpus never shrinks below this */

static bool matches(const char *pattern, const char *text)
{
    if (*pattern == '*')
        return matches(pattern + 1, text) ||
               (*text && matches(pattern, text + 1));
    if (*pattern == '\0' || *pattern != *text)
        return *pattern == *text;
    return matches(pattern + 1, text + 1);
}

static void put_file(const char *path, const char *text)
{
    FILE *f = fopen(path, "wb");
    ck_assert_ptr_nonnull(f);
    fputs(text, f);
    ck_assert_int_eq(fclose(f), 0);
}

/* A folder with what the calls speak of. */
static void make_folder(char *folder)
{
    char path[256];
    ck_assert_ptr_nonnull(mkdtemp(folder));
    snprintf(path, sizeof path, "%s/exists.csv", folder);
    put_file(path, "keep\n");
    snprintf(path, sizeof path, "%s/plain", folder);
    put_file(path, "x\n");
    snprintf(path, sizeof path, "%s/folder", folder);
    ck_assert_int_eq(mkdir(path, 0755), 0);
    snprintf(path, sizeof path, "%s/data", folder);
    ck_assert_int_eq(symlink(CASES_DIR "/data", path), 0);
}

/* Nothing was made, nothing was changed: removing what we put there leaves
 * the folder empty. */
static void check_and_remove(const char *folder)
{
    static const char *const names[] = {"exists.csv", "plain", "data"};
    char path[256];
    char *text;
    size_t size;
    struct status st;
    snprintf(path, sizeof path, "%s/exists.csv", folder);
    ck_assert(file_read(path, 100, &text, &size, &st));
    ck_assert_str_eq(text, "keep\n");
    free(text);
    for (size_t i = 0; i < sizeof names / sizeof names[0]; i++) {
        snprintf(path, sizeof path, "%s/%s", folder, names[i]);
        ck_assert_int_eq(unlink(path), 0);
    }
    snprintf(path, sizeof path, "%s/folder", folder);
    ck_assert_int_eq(rmdir(path), 0);
    ck_assert_msg(rmdir(folder) == 0, "a wrong call left a file behind");
}

static void check_call(const char *folder, char *line)
{
    char store[4096];
    char *fields[4];
    for (int i = 0; i < 4; i++) {
        fields[i] = line;
        line = strchr(line, '\t');
        ck_assert_msg((line != NULL) == (i < 3), "fields: %s", fields[0]);
        if (line)
            *line++ = '\0';
    }
    struct program p = {.path = OUTERSHELL, .folder = folder};
    char *call = fields[2];
    if (strcmp(fields[1], "-") != 0) {
        p.input = fields[1];
        p.input_size = program_unescape(fields[1]);
    }
    program_split(&p, call, store, sizeof store);
    struct program_result r = program_run(&p);
    ck_assert_msg(r.status == fields[0][0] - '0', "%s: status %d, not %s", call,
                  r.status, fields[0]);
    ck_assert_msg(r.out_size == 0, "%s: something on standard output", call);
    ck_assert_msg(r.err_size > 12 && strncmp(r.err, "outershell: ", 12) == 0,
                  "%s: %s", call, r.err);
    ck_assert_msg(strchr(r.err, '\n') == r.err + r.err_size - 1,
                  "%s: not one line: %s", call, r.err);
    r.err[r.err_size - 1] = '\0';
    ck_assert_msg(matches(fields[3], r.err + 12), "%s:\n got %s\nwant %s", call,
                  r.err + 12, fields[3]);
    ck_assert_msg(utf8_valid(r.err, r.err_size - 1), "%s: no UTF-8", call);
    for (const char *c = r.err; *c; c++)
        ck_assert_msg((unsigned char)*c >= 0x20 && *c != 0x7F,
                      "%s: a control character", call);
    program_free(&r);
}

START_TEST(every_wrong_call_gets_one_clear_line_and_its_status)
{
    char folder[] = "/tmp/outershell-calls-XXXXXX";
    char *text;
    size_t size;
    struct status st;
    int count = 0;
    ck_assert(
        file_read(CASES_DIR "/calls/calls.tsv", 1 << 20, &text, &size, &st));
    make_folder(folder);
    for (char *line = text; *line; count++) {
        char *end = strchr(line, '\n');
        ck_assert_ptr_nonnull(end);
        *end = '\0';
        check_call(folder, line);
        line = end + 1;
    }
    free(text);
    check_and_remove(folder);
    ck_assert_int_ge(count, CALLS_LEAST);
}
END_TEST

/* What data/ refuses alone, the program refuses with status 1. */
START_TEST(every_wrong_data_file_of_the_corpus_is_refused_by_the_program)
{
    char *text;
    size_t size;
    struct status st;
    int count = 0;
    ck_assert(
        file_read(CASES_DIR "/data/expected.txt", 1 << 20, &text, &size, &st));
    for (char *line = text; *line; count++) {
        char *end = strchr(line, '\n');
        char *tab = strchr(line, '\t');
        char call[512];
        ck_assert(end && tab && tab < end);
        *end = '\0';
        *tab = '\0';
        snprintf(call, sizeof call, "list H --data '%s/data/bad/%s.json'",
                 CASES_DIR, line);
        struct program_result r = program_call(OUTERSHELL, call);
        ck_assert_msg(r.status == 1 && r.out_size == 0, "%s: status %d", line,
                      r.status);
        ck_assert_msg(r.err_size > 0 &&
                          strchr(r.err, '\n') == r.err + r.err_size - 1,
                      "%s: not one line: %s", line, r.err);
        program_free(&r);
        line = end + 1;
    }
    free(text);
    ck_assert_int_ge(count, 50);
}
END_TEST

TCase *call_cases(void)
{
    TCase *c = tcase_create("calls");
    tcase_add_test(c, every_wrong_call_gets_one_clear_line_and_its_status);
    tcase_add_test(
        c, every_wrong_data_file_of_the_corpus_is_refused_by_the_program);
    return c;
}
