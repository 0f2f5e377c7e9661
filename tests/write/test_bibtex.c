/* SPDX-License-Identifier: MIT */
/* What is written as BibTeX, read back by a reader of its own. */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "report/report.h"
#include "support/bibtex.h"
#include "support/run.h"
#include "write/format.h"

static const char *const awkward_names[] = {
    "A. Author", "Barnes and Noble", "Smith, J., Jr., M.D.", "others", NULL};
static const char *const bodies[] = {"Commission on Weights and Measures",
                                     NULL};

/* Every character that TeX or BibTeX reads, braces that do not balance. */
static const struct citation citations[] = {
    {.key = "key_a",
     .kind = "article",
     .authors = awkward_names,
     .organizations = bodies,
     .title = "50 % of & more: $x_1$ {open, # ~ ^ \\ }} \"quoted\" @here",
     .container = "J. Things",
     .year = 1999,
     .volume = "1",
     .pages = "2",
     .doi = "10.1000/x_y%3C(1)",
     .note = "read in the summary",
     .from_memory = "title",
     .not_known = "doi"},
    {.key = "key_b", .kind = "misc", .title = "Title"},
    {.key = "key_b", .kind = "misc", .title = "Title"},
};
static const struct citation others[] = {
    {.key = "key_a", .kind = "misc", .title = "Another work"},
    {.key = "key_a", .kind = "misc", .title = "A third one"},
};

static struct bibtex written(const struct provenance *p, int count, char **text)
{
    struct report report;
    struct status st = status_ok();
    size_t size;
    FILE *out = open_memstream(text, &size);
    ck_assert_ptr_nonnull(out);
    report_begin(&report);
    report_source(&report, (struct cited_source){NULL, NULL});
    for (int i = 0; i < count; i++)
        report_source(&report, (struct cited_source){&p[i], NULL});
    ck_assert(format_write(&format_bibtex, out, &report, &write_plain, &st));
    report_clear(&report);
    ck_assert_int_eq(fclose(out), 0);
    return bibtex_read(*text);
}

static void plain_is(const struct bibtex_entry *e, const char *name,
                     const char *want)
{
    const char *value = bibtex_field(e, name);
    ck_assert_msg(value != NULL, "%s: no %s", e->key, name);
    char *plain = bibtex_plain(value);
    ck_assert_str_eq(plain, want);
    free(plain);
}

START_TEST(fields_come_back_as_they_were)
{
    static const struct provenance p = {
        .id = "one", .citations = citations, .citation_count = 1};
    char *text;
    char *names[8];
    struct bibtex b = written(&p, 1, &text);
    ck_assert_uint_eq(b.count, 1);
    const struct bibtex_entry *e = &b.entries[0];
    ck_assert_str_eq(e->kind, "article");
    ck_assert_str_eq(e->key, "key_a");
    plain_is(e, "title", citations[0].title);
    plain_is(e, "journal", "J. Things");
    plain_is(e, "volume", "1");
    plain_is(e, "year", "1999");
    plain_is(e, "note",
             "read in the summary; not known: doi; from memory: title");
    ck_assert_str_eq(bibtex_field(e, "doi"), citations[0].doi);
    int count = bibtex_names(bibtex_field(e, "author"), names, 8);
    ck_assert_int_eq(count, 5);
    for (int i = 0; i < 4; i++)
        ck_assert_str_eq(names[i], awkward_names[i]);
    ck_assert_str_eq(names[4], bodies[0]);
    for (int i = 0; i < count; i++)
        free(names[i]);
    bibtex_free(&b);
    free(text);
}
END_TEST

START_TEST(one_work_is_one_entry_and_two_works_are_two)
{
    static const struct provenance p[] = {
        {.id = "one", .citations = citations, .citation_count = 3},
        {.id = "two", .citations = others, .citation_count = 2},
        {.id = "three", .citations = citations, .citation_count = 2}};
    char *text;
    struct bibtex b = written(p, 3, &text);
    ck_assert_uint_eq(b.count, 4);
    ck_assert_str_eq(b.entries[2].key, "two.key_a");
    plain_is(&b.entries[2], "title", "Another work");
    ck_assert_str_eq(b.entries[3].key, "two.key_a.2");
    plain_is(&b.entries[3], "title", "A third one");
    bibtex_free(&b);
    free(text);
}
END_TEST

START_TEST(what_no_work_is_cited_for_is_a_comment)
{
    static const struct provenance p[] = {
        {.id = "one", .unsourced = "common practice, no source"},
        {.id = "one", .unsourced = "common practice, no source"}};
    char *text;
    struct bibtex b = written(p, 2, &text);
    ck_assert_uint_eq(b.count, 0);
    ck_assert_str_eq(text, "% one: common practice, no source\n\n");
    bibtex_free(&b);
    free(text);
}
END_TEST

START_TEST(a_field_that_is_not_there_is_not_written)
{
    static const struct provenance p = {
        .id = "one", .citations = citations + 1, .citation_count = 1};
    char *text;
    struct bibtex b = written(&p, 1, &text);
    ck_assert_int_eq(b.entries[0].field_count, 1);
    bibtex_free(&b);
    free(text);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("bibtex");
    TCase *c = tcase_create("bibtex");
    tcase_add_test(c, fields_come_back_as_they_were);
    tcase_add_test(c, one_work_is_one_entry_and_two_works_are_two);
    tcase_add_test(c, what_no_work_is_cited_for_is_a_comment);
    tcase_add_test(c, a_field_that_is_not_there_is_not_written);
    suite_add_tcase(suite, c);
    return run_suite(suite);
}
