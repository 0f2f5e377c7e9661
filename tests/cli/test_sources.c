/* SPDX-License-Identifier: MIT */
/* What is cited for a number, in every format that tells it. */
#include <dirent.h>
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include <cjson/cJSON.h>

#include "base/text.h"
#include "suites.h"
#include "support/bibtex.h"
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

/* A citation as the other formats print it, made again from its BibTeX. */
static char *citation_of(const struct bibtex_entry *e)
{
    static const char *const containers[] = {
        "journal", "publisher", "booktitle", "institution", "howpublished"};
    struct text t = text_growing();
    char *names[1100];
    int count = 0;
    if (bibtex_field(e, "author"))
        count = bibtex_names(bibtex_field(e, "author"), names, 1100);
    for (int i = 0; i < count; i++) {
        text_add(&t, i == 0 ? "" : i == count - 1 ? " and " : ", ");
        text_add(&t, names[i]);
        free(names[i]);
    }
    const char *container = NULL;
    for (size_t i = 0; i < 5 && !container; i++)
        container = bibtex_field(e, containers[i]);
    const struct {
        const char *before, *value, *behind;
    } parts[] = {{", ", bibtex_field(e, "title"), ""},
                 {", ", container, ""},
                 {container ? " " : ", volume ", bibtex_field(e, "volume"), ""},
                 {", ", bibtex_field(e, "pages"), ""},
                 {" (", bibtex_field(e, "year"), ")"},
                 {", doi ", NULL, ""},
                 {" [", bibtex_field(e, "note"), "]"}};
    for (size_t i = 0; i < sizeof parts / sizeof parts[0]; i++) {
        bool doi = i == 5 && bibtex_field(e, "doi");
        if (!parts[i].value && !doi)
            continue;
        char *plain = parts[i].value ? bibtex_plain(parts[i].value) : NULL;
        if (t.length > 0)
            text_add(&t, parts[i].before);
        text_add(&t, doi ? bibtex_field(e, "doi") : plain);
        text_add(&t, parts[i].behind);
        free(plain);
    }
    ck_assert(!t.cut);
    return t.data;
}

struct works {
    int count;
    char *texts[400];
};

static struct works works_of(const char *call)
{
    struct works w = {0};
    struct program_result r = done(call);
    struct bibtex b = bibtex_read(r.out);
    ck_assert_uint_le(b.count, 400);
    for (size_t i = 0; i < b.count; i++)
        w.texts[w.count++] = citation_of(&b.entries[i]);
    bibtex_free(&b);
    program_free(&r);
    return w;
}

static void works_free(struct works *w)
{
    for (int i = 0; i < w->count; i++)
        free(w->texts[i]);
}

/* Behind the longest work of the list that p starts with. */
static const char *behind_work(const struct works *w, const char *p, bool *used)
{
    int best = -1;
    for (int i = 0; i < w->count; i++)
        if (strncmp(p, w->texts[i], strlen(w->texts[i])) == 0 &&
            (best < 0 || strlen(w->texts[i]) > strlen(w->texts[best])))
            best = i;
    ck_assert_msg(best >= 0, "no BibTeX entry for: %.200s", p);
    used[best] = true;
    return p + strlen(w->texts[best]);
}

/* A list of works is made of whole ones and of what no work is cited for. */
static void check_list(const struct works *w, const char *list, bool *used)
{
    static const char *const unsourced[] = {
        "formula n sqrt(I/Ry): common practice, no source",
        "common practice, no source"};
    const char *p = list;
    for (size_t i = 0; i < 2; i++)
        if (p == list && strncmp(p, unsourced[i], strlen(unsourced[i])) == 0)
            p += strlen(unsourced[i]);
    while (*p) {
        if (p != list) {
            ck_assert_msg(strncmp(p, "; ", 2) == 0, "%.80s", p);
            p += 2;
        }
        p = behind_work(w, p, used);
    }
}

/* The text without its line breaks and indents, for a search. */
static void unfold(char *text)
{
    char *out = text;
    for (const char *p = text; *p; p++) {
        bool blank = *p == ' ' || *p == '\n';
        if (!blank || (out > text && out[-1] != ' '))
            *out++ = blank ? ' ' : *p;
    }
    *out = '\0';
}

static void check_formats_agree(const char *options)
{
    char line[700];
    snprintf(line, sizeof line, "sources -f bibtex%s", options);
    struct works w = works_of(line);
    bool *used = calloc((size_t)w.count, sizeof *used);
    ck_assert_ptr_nonnull(used);
    snprintf(line, sizeof line, "sources -f csv%s", options);
    struct csv csv = csv_of(line);
    snprintf(line, sizeof line, "sources -f json%s", options);
    struct program_result r = done(line);
    cJSON *json = cJSON_Parse(r.out);
    const cJSON *rows = cJSON_GetObjectItemCaseSensitive(json, "sources");
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        const char *source = csv_cell(&csv, i, "source");
        ck_assert_str_ne(source, "");
        check_list(&w, source, used);
        ck_assert_str_eq(source,
                         cJSON_GetStringValue(cJSON_GetObjectItemCaseSensitive(
                             cJSON_GetArrayItem(rows, (int)i), "source")));
    }
    for (int i = 0; i < w.count; i++)
        ck_assert_msg(used[i], "only in BibTeX: %s", w.texts[i]);
    cJSON_Delete(json);
    program_free(&r);
    snprintf(line, sizeof line, "sources%s", options);
    r = done(line);
    unfold(r.out);
    for (int i = 0; i < w.count; i++) {
        unfold(w.texts[i]);
        ck_assert_msg(strstr(r.out, w.texts[i]), "not in the text: %s",
                      w.texts[i]);
    }
    program_free(&r);
    csv_free(&csv);
    works_free(&w);
    free(used);
}

START_TEST(text_csv_json_and_bibtex_tell_the_same_sources)
{
    check_formats_agree("");
}
END_TEST

static void check_own_file(const char *path)
{
    char options[600];
    snprintf(options, sizeof options, " --data %s", path);
    check_formats_agree(options);
}

START_TEST(a_file_of_the_user_is_cited_alike_in_all_formats)
{
    ck_assert_int_ge(each_good_file(check_own_file), 15);
}
END_TEST

/* The longest that outershell-data(5) allows: 100 citations whose texts have
 * 1024 bytes each, characters that CSV, JSON and TeX all have to escape. */
#define LONG_CITATIONS 100
#define LONG_BYTES 1024

static void put_long(FILE *f, const char *name, int citation)
{
    fprintf(f, ", \"%s\": \"%03d", name, citation);
    for (int i = 3; i < LONG_BYTES - 1; i++)
        fputs(i % 3 == 0 ? "\\\"" : i % 3 == 1 ? "}" : ",", f);
    fputs(".\"", f);
}

static void write_long_file(const char *path)
{
    FILE *f = fopen(path, "w");
    ck_assert_ptr_nonnull(f);
    fputs("{\"format\": 1, \"id\": \"own_long\", \"kind\": \"values\", "
          "\"title\": \"Own\", \"quantity\": \"ionization\", \"unit\": \"eV\", "
          "\"citations\": [",
          f);
    for (int i = 0; i < LONG_CITATIONS; i++) {
        fprintf(f,
                "%s{\"key\": \"own_%d\", \"type\": \"article\", \"year\": "
                "2026, \"authors\": [\"A. Nobody\", \"others\"], \"doi\": "
                "\"10.1000/",
                i ? ",\n" : "", i);
        for (int b = 8; b < LONG_BYTES - 1; b++)
            fputc("(;)_"[b % 4], f);
        fputs("9\"", f);
        put_long(f, "title", i);
        put_long(f, "container", i);
        put_long(f, "volume", i);
        put_long(f, "pages", i);
        put_long(f, "note", i);
        fputc('}', f);
    }
    fputs("], \"entries\": [{\"element\": \"Fe\", \"value\": \"7.9\"}]}\n", f);
    ck_assert_int_eq(fclose(f), 0);
}

/* How often the last byte of each long text comes in a list of works. */
static size_t whole_parts(const char *text, const char *end)
{
    size_t count = 0;
    for (const char *p = text; (p = strstr(p, end)) != NULL; p++)
        count++;
    return count;
}

START_TEST(the_longest_citations_are_whole_in_every_format)
{
    char path[] = "/tmp/outershell-long-XXXXXX";
    char line[256];
    int descriptor = mkstemp(path);
    ck_assert_int_ge(descriptor, 0);
    close(descriptor);
    write_long_file(path);
    check_own_file(path);
    static const char *const calls[] = {
        "list Fe -q ionization -m shells -r own_long -f csv",
        "list Fe -q ionization -r ionization_nist_asd_2024 --against own_long "
        "-f csv",
        "compare Fe Co -q ionization -r own_long -m shells -f csv"};
    static const char *const columns[] = {"reference_source", "against_source",
                                          "source"};
    for (size_t i = 0; i < 3; i++) {
        snprintf(line, sizeof line, "%s --data %s", calls[i], path);
        struct csv csv = csv_of(line);
        size_t row = 0;
        while (!strstr(csv_cell(&csv, row, columns[i]), "Nobody"))
            ck_assert_uint_lt(++row, csv_rows(&csv));
        const char *cell = csv_cell(&csv, row, columns[i]);
        /* Container, volume, pages, doi and note of each. */
        ck_assert_uint_eq(whole_parts(cell, ",."), 4 * LONG_CITATIONS);
        ck_assert_uint_eq(whole_parts(cell, ";)9"), LONG_CITATIONS);
        ck_assert_uint_gt(strlen(cell), 5 * 1000 * LONG_CITATIONS);
        csv_free(&csv);
    }
    ck_assert_int_eq(remove(path), 0);
}
END_TEST

/* A value that names its work cites that work and no other. */
START_TEST(a_value_cites_its_own_work)
{
    struct csv csv = csv_of("list Fe At Cl Na -q affinity -f csv");
    static const char *const works[] = {"10.1038/srep24996",
                                        "10.1038/s41467-020-17599-2",
                                        "compilation", "10.1063/1.556047"};
    for (size_t i = 0; i < 4; i++) {
        const char *source = csv_cell(&csv, i, "reference_source");
        ck_assert_msg(strstr(source, works[i]), "%s", source);
        for (size_t k = 0; k < 4; k++)
            ck_assert(i == k || !strstr(source, works[k]));
    }
    csv_free(&csv);
}
END_TEST

TCase *source_cases(void)
{
    TCase *c = tcase_create("sources");
    tcase_add_test(c,
                   a_file_of_the_user_changes_no_row_that_did_not_ask_for_it);
    tcase_add_test(c, a_file_of_the_user_changes_no_citation_but_its_own);
    tcase_add_test(c, text_csv_json_and_bibtex_tell_the_same_sources);
    tcase_add_test(c, a_file_of_the_user_is_cited_alike_in_all_formats);
    tcase_add_test(c, the_longest_citations_are_whole_in_every_format);
    tcase_add_test(c, a_value_cites_its_own_work);
    return c;
}
