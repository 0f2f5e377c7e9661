/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <cjson/cJSON.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "export/format.h"
#include "export/legend.h"
#include "export/sources.h"
#include "export/table.h"
#include "support/csv.h"
#include "support/run.h"

/* What a function writes; the caller frees it. */
struct memory {
    FILE *stream;
    char *text;
    size_t size;
};

static FILE *begin(struct memory *m)
{
    m->stream = open_memstream(&m->text, &m->size);
    ck_assert_ptr_nonnull(m->stream);
    return m->stream;
}

static const char *end(struct memory *m)
{
    ck_assert_int_eq(fclose(m->stream), 0);
    return m->text;
}

/* Fields that RFC 4180 section 2 speaks of: commas, quotes, line breaks. */
static const char *const awkward[] = {
    "",       "a,b",   "say \"x\"", "\"",      "a\nb",
    "a\r\nb", "plain", " blank ",   "\"\",\"", "Pyykk\xc3\xb6"};
#define AWKWARD (sizeof awkward / sizeof awkward[0])

START_TEST(csv_fields_come_back_as_they_were)
{
    struct memory m;
    char buffer[256];
    FILE *out = begin(&m);
    for (size_t i = 0; i < AWKWARD; i++)
        fprintf(out, i ? ",h%zu" : "h%zu", i);
    csv_end(out);
    for (size_t i = 0; i < AWKWARD; i++)
        csv_field(out, awkward[i], i == 0);
    csv_end(out);
    for (size_t i = 0; i < AWKWARD; i++) {
        struct text t = text_over(buffer, sizeof buffer);
        csv_text(&t, awkward[i]);
        fprintf(out, i ? ",%s" : "%s", buffer);
    }
    csv_end(out);
    struct csv csv = csv_read_text(end(&m));
    ck_assert_uint_eq(csv_rows(&csv), 2);
    for (size_t i = 0; i < AWKWARD; i++) {
        char heading[8];
        snprintf(heading, sizeof heading, "h%zu", i);
        ck_assert_str_eq(csv_cell(&csv, 0, heading), awkward[i]);
        ck_assert_str_eq(csv_cell(&csv, 1, heading), awkward[i]);
    }
    csv_free(&csv);
    free(m.text);
}
END_TEST

START_TEST(json_strings_come_back_as_they_were)
{
    static const char *const more[] = {"\\", "\t\x01", "a/b", "\x7f"};
    struct memory m;
    FILE *out = begin(&m);
    putc('[', out);
    for (size_t i = 0; i < AWKWARD; i++) {
        json_string(out, awkward[i]);
        putc(',', out);
    }
    for (size_t i = 0; i < 4; i++) {
        json_string(out, more[i]);
        putc(',', out);
    }
    json_string(out, "bad \xff byte");
    putc(']', out);
    cJSON *json = cJSON_Parse(end(&m));
    ck_assert_ptr_nonnull(json);
    for (size_t i = 0; i < AWKWARD; i++)
        ck_assert_str_eq(cJSON_GetStringValue(cJSON_GetArrayItem(json, (int)i)),
                         awkward[i]);
    for (size_t i = 0; i < 4; i++)
        ck_assert_str_eq(
            cJSON_GetStringValue(cJSON_GetArrayItem(json, (int)(AWKWARD + i))),
            more[i]);
    ck_assert_str_eq(
        cJSON_GetStringValue(cJSON_GetArrayItem(json, (int)AWKWARD + 4)),
        "bad \xef\xbf\xbd byte");
    cJSON_Delete(json);
    free(m.text);
}
END_TEST

START_TEST(a_table_lines_its_columns_up_and_ends_without_blanks)
{
    static const char *const cells[] = {"name",      "value", "note",
                                        "\xc3\xb6",  "-1.25", "",
                                        "long name", "+10",   "x"};
    struct memory m;
    struct status st = status_ok();
    struct table table = table_new("lsl");
    for (size_t i = 0; i < 9; i++)
        table_cell(&table, cells[i]);
    ck_assert(table_write(&table, begin(&m), &st));
    ck_assert_str_eq(end(&m), "name       value  note\n"
                              "\xc3\xb6          -1.25\n"
                              "long name    +10  x\n");
    free(m.text);
}
END_TEST

START_TEST(marks_stand_around_cells_and_never_around_a_gap)
{
    static const struct table_style style = {"<", "{", "[", ">"};
    static const char *const cells[] = {"r", "+1", "-2", "-", "0"};
    struct memory m;
    struct status st = status_ok();
    struct table table = table_new("s");
    for (size_t i = 0; i < 5; i++)
        table_cell(&table, cells[i]);
    ck_assert(table_write_styled(&table, begin(&m), &style, &st));
    ck_assert_str_eq(end(&m), " <r>\n{+1>\n[-2>\n -\n 0\n");
    free(m.text);
}
END_TEST

START_TEST(a_legend_tells_each_note_and_source_once)
{
    static const struct provenance sets[] = {
        {false, "one", "First set", "d1", NULL, 0},
        {false, "two", "Second set", "d2", NULL, 0}};
    const struct note first[] = {{"", "b"}, {"", ""}, {"", "a"}};
    const struct note second[] = {{"", "a"}, {"see: ", "a"}, {"", "b"}};
    struct legend legend = {0};
    struct memory m;
    char buffer[64];
    struct text t = text_over(buffer, sizeof buffer);
    legend_notes(&legend, first, 3, &t);
    text_add(&t, " ");
    legend_notes(&legend, second, 3, &t);
    text_add(&t, " ");
    legend_set(&legend, &sets[1], &t);
    legend_set(&legend, &sets[0], &t);
    legend_set(&legend, &sets[1], &t);
    ck_assert_str_eq(buffer, "1,2 1,2,3 aba");
    ck_assert(!legend.failed);
    legend_write(&legend, "Sets", begin(&m));
    end(&m);
    ck_assert_ptr_nonnull(strstr(m.text, "\nSets\n  a   two: Second set"));
    ck_assert_ptr_nonnull(strstr(m.text, "\n  b   one: First set"));
    ck_assert_ptr_nonnull(
        strstr(m.text, "\nNotes\n  1   b\n  2   a\n  3   see: a\n"));
    free(m.text);
}
END_TEST

START_TEST(letters_of_sources_go_on_after_z)
{
    static struct provenance sets[30];
    struct legend legend = {0};
    char buffer[128];
    struct text t = text_over(buffer, sizeof buffer);
    for (int i = 0; i < 30; i++)
        legend_set(&legend, &sets[i], &t);
    ck_assert_str_eq(buffer, "abcdefghijklmnopqrstuvwxyzaaabacad");
    legend_free(&legend);
}
END_TEST

/* Concise form of uncertainties: Guide to the expression of uncertainty in
 * measurement, JCGM 100:2008, 7.2.2. */
START_TEST(uncertainties_are_written_in_the_concise_form)
{
    static const struct {
        struct number value, u;
        const char *text;
    } cases[] = {
        {{7.9024681, 7}, {0.0000012, 7}, "7.9024681(12)"},
        {{156.0, 0}, {7.0, 0}, "156(7)"},
        {{31.0, 0}, {0.5, 1}, "31 +- 0.5"},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        char buffer[64];
        struct text t = text_over(buffer, sizeof buffer);
        struct reading r = {.state = READING_OK,
                            .value = cases[i].value,
                            .u = cases[i].u,
                            .has_u = true};
        reading_text(&t, &r);
        ck_assert_str_eq(buffer, cases[i].text);
    }
}
END_TEST

START_TEST(bibtex_names_each_key_once_and_escapes_what_tex_reads)
{
    static const struct citation citations[] = {
        {"key_a", "article", "A. Author and B. Author", "50 % of & more",
         "J. Things", 1999, "1", "2", "10.1/x_y"},
        {"key_b", "misc", "C. Author", "Title", NULL, 0, NULL, NULL, NULL}};
    static const struct provenance p[] = {
        {false, "one", "One", "d", citations, 2},
        {false, "two", "Two", "d", citations, 1}};
    struct source sources[] = {{.provenance = &p[0]}, {.provenance = &p[1]}};
    struct memory m;
    sources_write_bibtex(begin(&m), sources, 2);
    end(&m);
    ck_assert_ptr_nonnull(strstr(m.text, "@article{key_a,"));
    ck_assert_ptr_nonnull(strstr(m.text, "50 \\% of \\& more"));
    ck_assert_ptr_nonnull(strstr(m.text, "doi = {10.1/x_y}"));
    ck_assert_ptr_null(strstr(strstr(m.text, "key_a") + 1, "key_a"));
    ck_assert_ptr_nonnull(strstr(m.text, "@misc{key_b,"));
    free(m.text);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("export");
    TCase *c = tcase_create("pieces");
    tcase_add_test(c, csv_fields_come_back_as_they_were);
    tcase_add_test(c, json_strings_come_back_as_they_were);
    tcase_add_test(c, a_table_lines_its_columns_up_and_ends_without_blanks);
    tcase_add_test(c, marks_stand_around_cells_and_never_around_a_gap);
    tcase_add_test(c, a_legend_tells_each_note_and_source_once);
    tcase_add_test(c, letters_of_sources_go_on_after_z);
    tcase_add_test(c, uncertainties_are_written_in_the_concise_form);
    tcase_add_test(c, bibtex_names_each_key_once_and_escapes_what_tex_reads);
    suite_add_tcase(suite, c);
    return run_suite(suite);
}
