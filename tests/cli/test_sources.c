/* SPDX-License-Identifier: MIT */
/* What is cited for a number, in every format that tells it. */
#include <dirent.h>
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "suites.h"
#include "support/csv.h"
#include "support/program.h"

#define CLOSED "--model shells,slater,clementi"

static struct program_result done(const char *line)
{
    struct program_result r = program_call(OUTERSHELL, line);
    ck_assert_msg(r.status == 0 && r.err_size == 0, "%s: %d: %s", line,
                  r.status, r.err);
    return r;
}

static struct csv csv_of(const char *line)
{
    struct program_result r = done(line);
    struct csv csv = csv_read_text(r.out);
    program_free(&r);
    return csv;
}

/* Calls check(path) for each file of the user that the program takes. */
static int each_good_file(void (*check)(const char *path))
{
    int count = 0;
    DIR *folder = opendir(CASES_DIR "/data/good");
    ck_assert_ptr_nonnull(folder);
    for (const struct dirent *item; (item = readdir(folder)) != NULL;) {
        char path[512];
        char line[600];
        if (item->d_name[0] == '.')
            continue;
        snprintf(path, sizeof path, "%s/data/good/%s", CASES_DIR, item->d_name);
        snprintf(line, sizeof line, "sources --data %s", path);
        struct program_result r = program_call(OUTERSHELL, line);
        /* Kinds that cannot be added, and an id that is taken. */
        bool taken = r.status == 0;
        ck_assert_msg(taken || strstr(r.err, "cannot be added") ||
                          strstr(r.err, "with this id already"),
                      "%s: %d: %s", path, r.status, r.err);
        program_free(&r);
        if (taken)
            check(path);
        count += taken;
    }
    closedir(folder);
    return count;
}

/* All rows of elements that the files speak of, and of their neighbours. */
static void check_rows_stay(const char *path)
{
    static const char *const calls[] = {
        "list period:1 period:2 period:4 La -f csv " CLOSED,
        "list Fe+ Fe2+ Fe3+ Co3+ O2- -f csv " CLOSED,
        "list Fe La -q affinity,polarizability,isodensity,electronegativity "
        "-f csv"};
    for (size_t i = 0; i < sizeof calls / sizeof calls[0]; i++) {
        char line[700];
        snprintf(line, sizeof line, "%s --data %s", calls[i], path);
        struct program_result own = done(line);
        struct program_result ours = done(calls[i]);
        ck_assert_msg(strcmp(own.out, ours.out) == 0, "%s: other rows", line);
        program_free(&own);
        program_free(&ours);
    }
}

START_TEST(a_file_of_the_user_changes_no_row_that_did_not_ask_for_it)
{
    ck_assert_int_ge(each_good_file(check_rows_stay), 15);
}
END_TEST

/* The sources without the file are all there, as they were, and one more. */
static void check_sources_stay(const char *path)
{
    char line[600];
    snprintf(line, sizeof line, "sources -f csv --data %s", path);
    struct csv own = csv_of(line);
    struct csv ours = csv_of("sources -f csv");
    size_t extra = 0;
    ck_assert_uint_eq(csv_rows(&own), csv_rows(&ours) + 1);
    for (size_t i = 0; i < csv_rows(&own); i++) {
        bool same = i - extra < csv_rows(&ours);
        for (size_t c = 0; same && c < own.columns; c++)
            same = strcmp(csv_cell(&own, i, own.cells[c]),
                          csv_cell(&ours, i - extra, own.cells[c])) == 0;
        if (same)
            continue;
        ck_assert_str_eq(csv_cell(&own, i, "kind"), "data set");
        ck_assert_msg(strncmp(csv_cell(&own, i, "id"), "own", 3) == 0,
                      "%s: %s tells something else", path,
                      csv_cell(&own, i, "id"));
        extra++;
    }
    ck_assert_uint_eq(extra, 1);
    csv_free(&own);
    csv_free(&ours);
}

START_TEST(a_file_of_the_user_changes_no_citation_but_its_own)
{
    ck_assert_int_ge(each_good_file(check_sources_stay), 15);
}
END_TEST

TCase *source_cases(void)
{
    TCase *c = tcase_create("sources");
    tcase_add_test(c,
                   a_file_of_the_user_changes_no_row_that_did_not_ask_for_it);
    tcase_add_test(c, a_file_of_the_user_changes_no_citation_but_its_own);
    return c;
}
