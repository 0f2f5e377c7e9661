/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <cjson/cJSON.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "element/reading.h"
#include "support/csv.h"
#include "support/run.h"
#include "write/format.h"

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

/* Records of one text each: what comes out is to be what went in. */
static void put_word(const void *record, struct text *t)
{
    text_add(t, *(const char *const *)record);
}

static const void *word_at(const void *data, size_t i, void *room)
{
    (void)room;
    return (const char *const *)data + i;
}

static const struct report_column word_column[] = {
    {"a \"word\", really", COLUMN_TEXT, .put = put_word}};

static void write_words(struct memory *m, const struct format *format,
                        const char *const *words, size_t count)
{
    struct report report;
    struct status st = status_ok();
    report_begin(&report);
    report.records = (struct report_records){.name = "words",
                                             .columns = word_column,
                                             .column_count = 1,
                                             .data = words,
                                             .count = count,
                                             .at = word_at};
    ck_assert(format_write(format, begin(m), &report, &write_plain, &st));
    end(m);
    report_clear(&report);
}

START_TEST(csv_fields_come_back_as_they_were)
{
    struct memory m;
    /* An empty line is no record: the empty field is tried with others. */
    write_words(&m, &format_csv, awkward + 1, AWKWARD - 1);
    struct csv csv = csv_read_text(m.text);
    ck_assert_uint_eq(csv_rows(&csv), AWKWARD - 1);
    for (size_t i = 1; i < AWKWARD; i++)
        ck_assert_str_eq(csv_cell(&csv, i - 1, word_column[0].id), awkward[i]);
    csv_free(&csv);
    free(m.text);
}
END_TEST

START_TEST(csv_ends_every_record_by_carriage_return_and_line_feed)
{
    static const char *const words[] = {"x", "y"};
    struct memory m;
    write_words(&m, &format_csv, words, 2);
    ck_assert_str_eq(m.text, "\"a \"\"word\"\", really\"\r\nx\r\ny\r\n");
    free(m.text);
}
END_TEST

START_TEST(json_strings_come_back_as_they_were)
{
    static const char *const more[] = {"\\", "\t\x01", "a/b", "\x7f"};
    const char *words[AWKWARD + 5];
    struct memory m;
    for (size_t i = 0; i < AWKWARD; i++)
        words[i] = awkward[i];
    for (size_t i = 0; i < 4; i++)
        words[AWKWARD + i] = more[i];
    words[AWKWARD + 4] = "bad \xff byte";
    write_words(&m, &format_json, words, AWKWARD + 5);
    cJSON *json = cJSON_Parse(m.text);
    ck_assert_ptr_nonnull(json);
    cJSON *records = cJSON_GetObjectItem(json, "words");
    ck_assert_int_eq(cJSON_GetArraySize(records), (int)AWKWARD + 5);
    for (size_t i = 0; i < AWKWARD + 5; i++) {
        const cJSON *field = cJSON_GetArrayItem(records, (int)i)->child;
        ck_assert_str_eq(field->string, word_column[0].id);
        if (words[i][0] == '\0')
            ck_assert(cJSON_IsNull(field));
        else if (i == AWKWARD + 4)
            ck_assert_str_eq(field->valuestring, "bad \xef\xbf\xbd byte");
        else
            ck_assert_str_eq(field->valuestring, words[i]);
    }
    cJSON_Delete(json);
    free(m.text);
}
END_TEST

/* A record of two fields of which the first is shared by neighbours of the same
 * parity; how often it was made is counted. */
static int made;

static void put_parity(const void *record, struct text *t)
{
    made++;
    text_add(t, *(const int *)record < 10 ? "small" : "large");
}

static void put_number(const void *record, struct text *t)
{
    text_addf(t, "%d", *(const int *)record);
}

static bool same_size(const void *a, const void *b)
{
    return (*(const int *)a < 10) == (*(const int *)b < 10);
}

/* Made in the room that the reader provides. */
static const void *number_at(const void *data, size_t i, void *room)
{
    *(int *)room = ((const int *)data)[i];
    return room;
}

static struct cited_source number_source(const void *record)
{
    static const char *const names[] = {"A. Author", NULL};
    static const struct citation a[] = {{.key = "a",
                                         .kind = "misc",
                                         .authors = names,
                                         .title = "T",
                                         .year = 1999}};
    static const struct provenance sources[] = {
        {.id = "one", .title = "One", .citations = a, .citation_count = 1}};
    return (struct cited_source){*(const int *)record == 1 ? NULL : &sources[0],
                                 NULL};
}

START_TEST(neighbours_share_what_repeats_and_a_source_is_cited_alike)
{
    static const int numbers[] = {1, 2, 12, 3};
    static const struct report_column columns[] = {
        {"size", COLUMN_TEXT, .put = put_parity, .repeats = true},
        {"n", COLUMN_NUMBER, .put = put_number},
        {"source", COLUMN_TEXT, .source = number_source},
        {"hidden", COLUMN_TRUTH, .put = put_number, .json_only = true}};
    struct report report;
    struct memory m;
    struct status st = status_ok();
    report_begin(&report);
    report.records = (struct report_records){.name = "numbers",
                                             .columns = columns,
                                             .column_count = 4,
                                             .data = numbers,
                                             .count = 4,
                                             .room_size = sizeof(int),
                                             .at = number_at,
                                             .same_group = same_size};
    made = 0;
    ck_assert(format_write(&format_csv, begin(&m), &report, &write_plain, &st));
    ck_assert_str_eq(end(&m), "size,n,source\r\n"
                              "small,1,\r\n"
                              "small,2,\"A. Author, T (1999)\"\r\n"
                              "large,12,\"A. Author, T (1999)\"\r\n"
                              "small,3,\"A. Author, T (1999)\"\r\n");
    ck_assert_int_eq(made, 3);
    report_clear(&report);
    free(m.text);
}
END_TEST

static char *write_text(const struct report *report,
                        const struct write_style *style)
{
    struct memory m;
    struct status st = status_ok();
    ck_assert(format_write(&format_text, begin(&m), report, style, &st));
    end(&m);
    return m.text;
}

START_TEST(a_table_lines_its_columns_up_and_ends_without_blanks)
{
    static const struct table_column columns[] = {
        {"name", CELL_WORDS}, {"value", CELL_SIGNED}, {"note", CELL_WORDS}};
    static const char *const cells[] = {"\xc3\xb6",  "-1.25", "",
                                        "long name", "+10",   "x"};
    struct report report;
    report_begin(&report);
    struct report_table *table = report_table(&report, columns, 3);
    for (size_t i = 0; i < 6; i++)
        report_cell(&report, table, cells[i]);
    char *text = write_text(&report, &write_plain);
    ck_assert_str_eq(text, "name       value  note\n"
                           "\xc3\xb6          -1.25\n"
                           "long name    +10  x\n");
    free(text);
    report_clear(&report);
}
END_TEST

START_TEST(marks_stand_around_cells_and_never_around_a_gap)
{
    static const struct write_style style = {"<", "{", "[", ">"};
    static const struct table_column column = {"r", CELL_SIGNED};
    static const char *const cells[] = {"+1", "-2", "-", "0"};
    struct report report;
    report_begin(&report);
    struct report_table *table = report_table(&report, &column, 1);
    for (size_t i = 0; i < 4; i++)
        report_cell(&report, table, cells[i]);
    char *text = write_text(&report, &style);
    ck_assert_str_eq(text, " <r>\n{+1>\n[-2>\n -\n 0\n");
    free(text);
    report_clear(&report);
}
END_TEST

START_TEST(words_behind_a_label_are_wrapped_below_each_other)
{
    struct report report;
    char words[300] = "";
    struct text t = text_over(words, sizeof words);
    for (int i = 0; i < 30; i++)
        text_add(&t, i ? " \xc3\xb6ther" : "first");
    report_begin(&report);
    report_labelled(&report, 2, 12, "label", words);
    char *text = write_text(&report, &write_plain);
    ck_assert_int_eq(strncmp(text, "  label     first \xc3\xb6ther", 24), 0);
    for (const char *line = text; *line;) {
        size_t length = strcspn(line, "\n");
        char copy[300];
        ck_assert_uint_lt(length, sizeof copy);
        memcpy(copy, line, length);
        copy[length] = '\0';
        ck_assert_uint_le(utf8_length(copy), 100);
        if (line > text)
            ck_assert_int_eq(strncmp(copy, "            \xc3\xb6ther", 18), 0);
        line += length + 1;
    }
    free(text);
    report_clear(&report);
}
END_TEST

START_TEST(legends_tell_each_note_and_set_once)
{
    static const struct provenance sets[] = {
        {.id = "one", .title = "First set", .definition = &definition_covalent},
        {.id = "two",
         .title = "Second set",
         .definition = &definition_pauling}};
    static const struct table_column columns[] = {{"set", CELL_WORDS},
                                                  {"notes", CELL_WORDS}};
    const struct report_note first[] = {{"", "b"}, {"", ""}, {"", "a"}};
    const struct report_note second[] = {{"", "a"}, {"see: ", "a"}, {"", "b"}};
    struct report report;
    report_begin(&report);
    struct report_table *table = report_table(&report, columns, 2);
    report_cell_set(&report, table, &sets[1]);
    report_cell_notes(&report, table, first, 3);
    report_cell_set(&report, table, &sets[0]);
    report_cell_notes(&report, table, second, 3);
    report_cell_set(&report, table, &sets[1]);
    report_cell_notes(&report, table, first, 0);
    report_legends(&report);
    char *text = write_text(&report, &write_plain);
    ck_assert_str_eq(text, "set  notes\n"
                           "a    1,2\n"
                           "b    1,2,3\n"
                           "a\n"
                           "\nReference sets\n"
                           "  a   two: Second set; Pauling scale\n"
                           "  b   one: First set; covalent radius\n"
                           "\nNotes\n  1   b\n  2   a\n  3   see: a\n");
    free(text);
    report_clear(&report);
}
END_TEST

START_TEST(letters_of_sets_go_on_after_z)
{
    char buffer[128];
    struct text t = text_over(buffer, sizeof buffer);
    for (size_t i = 0; i < 30; i++)
        report_set_letter(i, &t);
    ck_assert_str_eq(buffer, "abcdefghijklmnopqrstuvwxyzaaabacad");
}
END_TEST

START_TEST(texts_of_a_report_are_whole_whatever_their_length)
{
    size_t length = 100000;
    char *words = malloc(length + 1);
    ck_assert_ptr_nonnull(words);
    memset(words, 'x', length);
    words[length] = '\0';
    struct report report;
    report_begin(&report);
    report_line(&report, words);
    report_linef(&report, "<%s>", words);
    char *text = write_text(&report, &write_plain);
    ck_assert_uint_eq(strlen(text), 2 * length + 4);
    free(text);
    free(words);
    report_clear(&report);
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

int main(void)
{
    Suite *suite = suite_create("write");
    TCase *c = tcase_create("formats");
    tcase_add_test(c, csv_fields_come_back_as_they_were);
    tcase_add_test(c, csv_ends_every_record_by_carriage_return_and_line_feed);
    tcase_add_test(c, json_strings_come_back_as_they_were);
    tcase_add_test(c,
                   neighbours_share_what_repeats_and_a_source_is_cited_alike);
    tcase_add_test(c, a_table_lines_its_columns_up_and_ends_without_blanks);
    tcase_add_test(c, marks_stand_around_cells_and_never_around_a_gap);
    tcase_add_test(c, words_behind_a_label_are_wrapped_below_each_other);
    tcase_add_test(c, legends_tell_each_note_and_set_once);
    tcase_add_test(c, letters_of_sets_go_on_after_z);
    tcase_add_test(c, texts_of_a_report_are_whole_whatever_their_length);
    tcase_add_test(c, uncertainties_are_written_in_the_concise_form);
    suite_add_tcase(suite, c);
    return run_suite(suite);
}
