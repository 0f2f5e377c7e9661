/* SPDX-License-Identifier: MIT */
/* The loader on good and bad files. Every bad file under tests/cases/data/bad
 * holds one mistake and is named by it; expected.txt holds the whole message
 * behind the path. */
#include <dirent.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include "base/file.h"
#include "refdata/catalogue.h"
#include "element/definition.h"
#include "refdata/loader.h"
#include "refdata/suites.h"
#include "support/near.h"

static char *read_text(const char *path, size_t *size)
{
    char *text;
    struct status st = status_ok();
    ck_assert_msg(file_read(path, (size_t)4 << 20, &text, size, &st), "%s",
                  st.message);
    return text;
}

static struct loaded *load_good(const char *name)
{
    char path[512];
    struct loaded *loaded;
    struct status st = status_ok();
    snprintf(path, sizeof path, "%s/good/%s.json", CASES_DIR, name);
    ck_assert_msg(dataset_load_file(path, &loaded, &st), "%s", st.message);
    return loaded;
}

static void must_fail(const char *text, const char *message)
{
    struct loaded *loaded;
    struct status st = status_ok();
    ck_assert(!dataset_load(text, strlen(text), &loaded, &st));
    ck_assert_ptr_null(loaded);
    ck_assert_int_eq(st.code, STATUS_DATA);
    ck_assert_str_eq(st.message, message);
}

static int count_files(const char *folder)
{
    char path[512];
    int count = 0;
    snprintf(path, sizeof path, "%s/%s", CASES_DIR, folder);
    DIR *dir = opendir(path);
    ck_assert_ptr_nonnull(dir);
    for (struct dirent *item; (item = readdir(dir)) != NULL;)
        count += item->d_name[0] != '.';
    closedir(dir);
    return count;
}

START_TEST(test_every_bad_file_gets_its_one_sentence)
{
    char path[512];
    size_t size;
    int count = 0;
    snprintf(path, sizeof path, "%s/expected.txt", CASES_DIR);
    char *manifest = read_text(path, &size);
    for (char *line = manifest, *next; *line; line = next) {
        next = strchr(line, '\n');
        ck_assert_ptr_nonnull(next);
        *next++ = '\0';
        char *want = strchr(line, '\t');
        ck_assert_ptr_nonnull(want);
        *want++ = '\0';
        struct loaded *loaded;
        struct status st = status_ok();
        snprintf(path, sizeof path, "%s/bad/%s.json", CASES_DIR, line);
        ck_assert_msg(!dataset_load_file(path, &loaded, &st), "%s: loaded",
                      line);
        ck_assert_int_eq(st.code, STATUS_DATA);
        ck_assert_ptr_null(loaded);
        ck_assert_int_eq(strncmp(st.message, path, strlen(path)), 0);
        ck_assert_msg(strcmp(st.message + strlen(path), want) == 0,
                      "%s:\n got %s\nwant %s", line, st.message + strlen(path),
                      want);
        count++;
    }
    free(manifest);
    ck_assert_int_ge(count, 80);
    ck_assert_int_eq(count, count_files("bad"));
}
END_TEST

START_TEST(test_every_good_file_loads)
{
    char path[512];
    int count = 0;
    snprintf(path, sizeof path, "%s/good", CASES_DIR);
    DIR *dir = opendir(path);
    ck_assert_ptr_nonnull(dir);
    for (struct dirent *item; (item = readdir(dir)) != NULL;) {
        char *dot = strrchr(item->d_name, '.');
        if (item->d_name[0] == '.')
            continue;
        *dot = '\0';
        struct loaded *loaded = load_good(item->d_name);
        ck_assert_int_gt(loaded->set.count, 0);
        loaded_free(loaded);
        count++;
    }
    closedir(dir);
    ck_assert_int_ge(count, 15);
}
END_TEST

/* A cut file is never a data set: only white space may be cut away. */
START_TEST(test_every_cut_of_a_file_is_refused)
{
    char path[512];
    size_t size;
    snprintf(path, sizeof path, "%s/good/marks_and_sources.json", CASES_DIR);
    char *text = read_text(path, &size);
    while (size > 0 && text[size - 1] != '}')
        size--;
    for (size_t cut = 0; cut < size; cut++) {
        struct loaded *loaded;
        struct status st = status_ok();
        char kept = text[cut];
        text[cut] = '\0';
        ck_assert_msg(!dataset_load(text, cut, &loaded, &st), "cut at %zu",
                      cut);
        ck_assert_int_eq(st.code, STATUS_DATA);
        text[cut] = kept;
    }
    free(text);
}
END_TEST

/* One wrong byte: loads or says why, and never anything else. */
START_TEST(test_one_wrong_byte_is_survived)
{
    static const char wrong[] = {'\0', '"', '9', '}', '\x80', '\\', ' '};
    char path[512];
    size_t size;
    int refused = 0;
    snprintf(path, sizeof path, "%s/good/site.json", CASES_DIR);
    char *text = read_text(path, &size);
    for (size_t i = 0; i < size; i++)
        for (size_t w = 0; w < sizeof wrong; w++) {
            struct loaded *loaded;
            struct status st = status_ok();
            char kept = text[i];
            text[i] = wrong[w];
            if (!dataset_load(text, size, &loaded, &st)) {
                ck_assert_int_eq(st.code, STATUS_DATA);
                ck_assert_int_gt((int)strlen(st.message), 0);
                refused++;
            }
            loaded_free(loaded);
            text[i] = kept;
        }
    free(text);
    ck_assert_int_gt(refused, (int)size);
}
END_TEST

START_TEST(test_numbers_and_units_keep_their_digits)
{
    static const struct {
        const char *name;
        int z, charge;
        const char *value, *u;
    } rows[] = {
        /* Tenths of a nanometre: the point moves, the digits stay. */
        {"angstrom", 1, 0, "31", "5"},
        {"angstrom", 26, 0, "130", ""},
        {"angstrom", 55, 0, "244.5", ""},
        /* 52.9177210544 pm (CODATA 2022), one digit more than printed */
        {"bohr", 1, 0, "52.92", ""},
        /* 1312.0 and 1562.98 kJ/mol / 96.48533212331 (CODATA 2022) */
        {"kj_per_mol", 1, 0, "13.5979", ""},
        {"kj_per_mol", 26, 1, "16.19915", ""},
        {"smallest", 26, 0, "132", ""},
        /* As many digits as a number may have. */
        {"many_digits", 1, 0, "0.123456789012345", "0.000000000000012"},
        {"many_digits", 3, 0, "-1.23456789012345", ""},
        {"many_digits", 9, 0, "3.40", ""},
        {"many_digits", 17, 0, "0.000", ""},
    };
    for (size_t i = 0; i < sizeof rows / sizeof *rows; i++) {
        char text[NUMBER_TEXT_MAX];
        struct loaded *loaded = load_good(rows[i].name);
        struct reading r =
            dataset_reading(&loaded->set, rows[i].z, rows[i].charge, 0, 0);
        ck_assert_int_eq(r.state, READING_OK);
        ck_assert_str_eq(number_print(r.value, text), rows[i].value);
        ck_assert_int_eq(r.has_u, rows[i].u[0] != '\0');
        if (r.has_u)
            ck_assert_str_eq(number_print(r.u, text), rows[i].u);
        loaded_free(loaded);
    }
}
END_TEST

START_TEST(test_a_file_keeps_everything_it_says)
{
    struct loaded *loaded = load_good("marks_and_sources");
    const struct dataset *set = &loaded->set;
    const struct entry *e = dataset_lookup(set, 26, 0, 0, 0);
    ck_assert_str_eq(set->provenance.id, "own_2026");
    ck_assert_str_eq(set->provenance.title, "Own radii");
    ck_assert_ptr_eq(set->provenance.definition, &definition_covalent);
    ck_assert_str_eq(set->provenance.citations[0].authors[0], "A. Nobody");
    ck_assert_int_eq(set->provenance.citations[0].year, 2026);
    ck_assert_str_eq(set->provenance.citations[e->source - 1].key, "b.1");
    ck_assert_str_eq(set->provenance.citations[1].doi, "10.1000/x");
    ck_assert_ptr_null(set->provenance.citations[1].title);
    ck_assert_str_eq(set->licence, "own work");
    ck_assert_int_eq(set->note_count, 2);
    ck_assert_str_eq(set->notes[1], "two");
    ck_assert_int_eq(set->rank, 3);
    ck_assert_str_eq(dataset_text(set, e->note), "Grüße");
    ck_assert_int_eq(e->marks, 3);
    ck_assert_str_eq(dataset_text(set, e->remark),
                     "estimated; most reliable; Grüße");
    ck_assert_str_eq(dataset_reading(set, 1, 0, 0, 0).reason,
                     "never looked at");
    loaded_free(loaded);
}
END_TEST

START_TEST(test_variants_and_gaps_of_a_file)
{
    struct loaded *loaded = load_good("variants");
    struct reading r = dataset_reading(&loaded->set, 26, 0, 0, 0);
    near(r.value.value, 132, 0, 0, "Fe, low spin is preferred");
    ck_assert_str_eq(r.remark, "low spin");
    near(dataset_lookup_site(&loaded->set, 26, 0, COORDINATION_NONE, SPIN_HIGH)
             ->value.value,
         152, 0, 0, "Fe, high spin");
    loaded_free(loaded);
    loaded = load_good("gaps");
    r = dataset_reading(&loaded->set, 2, 0, 0, 0);
    ck_assert_int_eq(r.state, READING_MISSING);
    ck_assert_str_eq(r.reason, "no stable negative ion");
    r = dataset_reading(&loaded->set, 3, 0, 0, 0);
    ck_assert_str_eq(r.reason, "not in this data set");
    loaded_free(loaded);
}
END_TEST

START_TEST(test_a_file_too_large_is_refused)
{
    struct loaded *loaded;
    struct status st = status_ok();
    char path[] = "/tmp/outershell-test-XXXXXX";
    int fd = mkstemp(path);
    FILE *f = fdopen(fd, "wb");
    ck_assert_ptr_nonnull(f);
    for (size_t i = 0; i <= DATASET_BYTES_MAX; i++)
        fputc(' ', f);
    fclose(f);
    ck_assert(!dataset_load_file(path, &loaded, &st));
    ck_assert_int_eq(st.code, STATUS_DATA);
    ck_assert_ptr_nonnull(
        strstr(st.message, "larger than the limit of 4194304 bytes"));
    remove(path);
}
END_TEST

START_TEST(test_too_many_entries_are_refused)
{
    static const char head[] =
        "{\"format\":1,\"id\":\"x\",\"kind\":\"values\",\"title\":\"x\","
        "\"quantity\":\"affinity\",\"unit\":\"eV\",\"citations\":[{\"key\":"
        "\"x\",\"type\":\"misc\",\"authors\":[\"x\"],\"title\":\"x\",\"year\":"
        "2000}],\"entries\":[{\"element\":\"H\",\"value\":\"1\"}";
    static const char more[] = ",{\"element\":\"H\",\"value\":\"1\"}";
    size_t capacity = sizeof head + DATASET_ENTRIES_MAX * sizeof more + 3;
    char *text = malloc(capacity);
    ck_assert_ptr_nonnull(text);
    size_t length = sizeof head - 1;
    memcpy(text, head, length);
    for (int i = 0; i < DATASET_ENTRIES_MAX; i++) {
        memcpy(text + length, more, sizeof more - 1);
        length += sizeof more - 1;
    }
    memcpy(text + length, "]}", 3);
    must_fail(text, "set x: entries: more than 20000");
    free(text);
}
END_TEST

START_TEST(test_files_that_cannot_be_read_are_named)
{
    struct loaded *loaded;
    struct status st = status_ok();
    ck_assert(!dataset_load_file("no/such/file.json", &loaded, &st));
    ck_assert_int_eq(st.code, STATUS_FILE);
    ck_assert_int_eq(strncmp(st.message, "no/such/file.json: ", 19), 0);
    ck_assert(!dataset_load_file(CASES_DIR, &loaded, &st));
    ck_assert_int_eq(st.code, STATUS_FILE);
    ck_assert_ptr_null(loaded);
}
END_TEST

static bool add(struct catalogue *catalogue, const char *name,
                struct status *st)
{
    char path[512];
    snprintf(path, sizeof path, "%s/good/%s.json", CASES_DIR, name);
    return catalogue_add_file(catalogue, path, st);
}

START_TEST(test_a_user_adds_a_set)
{
    struct catalogue catalogue = {0};
    struct status st = status_ok();
    size_t before = catalogue_count(&catalogue);
    const struct dataset *sets[32];
    ck_assert_msg(add(&catalogue, "marks_and_sources", &st), "%s", st.message);
    ck_assert_uint_eq(catalogue_count(&catalogue), before + 1);
    const struct dataset *own = catalogue_find(&catalogue, "own_2026");
    ck_assert_ptr_nonnull(own);
    ck_assert_ptr_eq(catalogue_at(&catalogue, before), own);
    /* It claims rank 3 and still stands last. */
    size_t count = catalogue_references(&catalogue, QUANTITY_RADIUS, sets, 32);
    ck_assert_uint_eq(count, 15);
    ck_assert_ptr_eq(sets[14], own);
    /* The same id again, and a kind that cannot be added. */
    ck_assert(!add(&catalogue, "smallest", &st));
    ck_assert_int_eq(st.code, STATUS_DATA);
    ck_assert_ptr_nonnull(strstr(
        st.message, "smallest.json: set own_2026: there is a set with this id "
                    "already"));
    ck_assert(!add(&catalogue, "elements", &st));
    ck_assert_ptr_nonnull(
        strstr(st.message,
               "elements.json: set own_2026: kind elements cannot be added; "
               "expected values"));
    ck_assert_uint_eq(catalogue_count(&catalogue), before + 1);
    catalogue_clear(&catalogue);
    ck_assert_uint_eq(catalogue_count(&catalogue), before);
    ck_assert_ptr_null(catalogue_find(&catalogue, "own_2026"));
}
END_TEST

START_TEST(test_a_full_catalogue_refuses_more)
{
    char path[512], copy[] = "/tmp/outershell-test-XXXXXX";
    size_t size;
    struct catalogue catalogue = {0};
    struct status st = status_ok();
    snprintf(path, sizeof path, "%s/good/smallest.json", CASES_DIR);
    char *text = read_text(path, &size);
    char *number = strstr(text, "own_2026\"");
    ck_assert_ptr_nonnull(number);
    close(mkstemp(copy));
    for (int i = 0; i <= CATALOGUE_ADDED_MAX; i++) {
        FILE *f = fopen(copy, "wb");
        ck_assert_ptr_nonnull(f);
        number[6] = (char)('0' + i / 10);
        number[7] = (char)('0' + i % 10);
        fwrite(text, 1, size, f);
        fclose(f);
        bool added = catalogue_add_file(&catalogue, copy, &st);
        ck_assert_int_eq(added, i < CATALOGUE_ADDED_MAX);
    }
    ck_assert_ptr_nonnull(strstr(st.message, "more than 32 added data sets"));
    ck_assert_int_eq(catalogue.added_count, CATALOGUE_ADDED_MAX);
    ck_assert_ptr_nonnull(catalogue_find(&catalogue, "own_2031"));
    catalogue_clear(&catalogue);
    remove(copy);
    free(text);
}
END_TEST

START_TEST(test_a_built_in_id_is_taken)
{
    char path[512];
    struct catalogue catalogue = {0};
    struct status st = status_ok();
    snprintf(path, sizeof path, "%s/metallic_12coord.json", BUILTIN_DIR);
    ck_assert(!catalogue_add_file(&catalogue, path, &st));
    ck_assert_ptr_nonnull(
        strstr(st.message, "set metallic_12coord: there is a set with this id "
                           "already"));
    ck_assert_int_eq(catalogue.added_count, 0);
}
END_TEST

/* The tables in the program are what the loader makes of the files. */
START_TEST(test_the_tables_are_the_files)
{
    const struct catalogue *all = catalogue_builtin();
    for (size_t i = 0; i < catalogue_count(all); i++) {
        const struct dataset *want = catalogue_at(all, i);
        char path[512];
        struct loaded *loaded;
        struct status st = status_ok();
        snprintf(path, sizeof path, "%s/%s.json", BUILTIN_DIR,
                 want->provenance.id);
        ck_assert_msg(dataset_load_file(path, &loaded, &st), "%s", st.message);
        const struct dataset *got = &loaded->set;
        ck_assert_int_eq(got->count, want->count);
        ck_assert_uint_eq(got->strings_size, want->strings_size);
        ck_assert_mem_eq(got->strings, want->strings, want->strings_size);
        ck_assert_mem_eq(got->first, want->first, sizeof want->first);
        ck_assert_ptr_eq(got->unit, want->unit);
        ck_assert_int_eq(got->quantity, want->quantity);
        ck_assert_int_eq(got->mark_count, want->mark_count);
        for (int k = 0; want->values && k < want->count; k++) {
            const struct entry *a = &got->values[k];
            const struct entry *b = &want->values[k];
            ck_assert(a->value.value == b->value.value &&
                      a->value.decimals == b->value.decimals &&
                      a->u.value == b->u.value && a->has_u == b->has_u &&
                      a->remark == b->remark && a->note == b->note &&
                      a->charge == b->charge && a->n == b->n && a->l == b->l &&
                      a->marks == b->marks && a->source == b->source &&
                      a->spin == b->spin && a->variant == b->variant &&
                      a->coordination == b->coordination &&
                      a->evidence == b->evidence && a->gap == b->gap &&
                      a->preferred == b->preferred && a->z == b->z);
        }
        loaded_free(loaded);
    }
}
END_TEST

/* The text of the first literal display behind a heading of the man page. */
static char *man_literal(char *page, const char *heading)
{
    char *from = strstr(page, heading);
    ck_assert_ptr_nonnull(from);
    from = strstr(from, ".Bd -literal\n");
    ck_assert_ptr_nonnull(from);
    from += strlen(".Bd -literal\n");
    char *to = strstr(from, ".Ed\n");
    ck_assert_ptr_nonnull(to);
    *to = '\0';
    return from;
}

START_TEST(test_the_example_of_the_man_page_loads)
{
    size_t size;
    struct loaded *loaded;
    struct status st = status_ok();
    char *page = read_text(MAN_PAGE, &size);
    const char *text = man_literal(page, ".Sh EXAMPLES");
    ck_assert_msg(dataset_load(text, strlen(text), &loaded, &st), "%s",
                  st.message);
    struct reading r = dataset_reading(&loaded->set, 22, 0, 0, 0);
    near(r.value.value, 158, 0, 0, "Ti in pm");
    near(r.u.value, 7, 0, 0, "u of Ti in pm");
    near(dataset_reading(&loaded->set, 26, 0, 0, 0).value.value, 131, 0, 0,
         "Fe, low spin");
    ck_assert_str_eq(dataset_reading(&loaded->set, 54, 0, 0, 0).reason,
                     "two values disagree");
    loaded_free(loaded);
    free(page);
}
END_TEST

/* The words behind "expected one of: " of a message all stand in the page. */
static void words_stand_in(const char *page, const char *file)
{
    char path[512];
    struct loaded *loaded;
    struct status st = status_ok();
    snprintf(path, sizeof path, "%s/bad/%s.json", CASES_DIR, file);
    ck_assert(!dataset_load_file(path, &loaded, &st));
    char *words = strstr(st.message, "expected one of: ");
    ck_assert_msg(words != NULL, "%s: %s", file, st.message);
    words += strlen("expected one of: ");
    const char *gap = strstr(words, " | ") ? " | " : " ";
    while (words) {
        char *next = strstr(words, gap);
        if (next) {
            *next = '\0';
            next += strlen(gap);
        }
        ck_assert_msg(strstr(page, words) != NULL,
                      "man page: nothing on '%s' (%s)", words, file);
        words = next;
    }
}

START_TEST(test_the_man_page_names_every_key_and_word)
{
    static const char *const files[] = {
        "unknown_key",       "citation_key_unknown",
        "entry_key_unknown", "kind_unknown",
        "quantity_unknown",  "definition_of_another_quantity",
        "unit_unknown",      "ionization_in_pm",
        "evidence_unknown",  "gap_unknown",
        "spin_unknown",      "citation_type_unknown",
    };
    size_t size;
    char *page = read_text(MAN_PAGE, &size);
    for (size_t i = 0; i < sizeof files / sizeof *files; i++)
        words_stand_in(page, files[i]);
    free(page);
}
END_TEST

/* Ids are what a file says and what CSV shows: none empty but the first where
 * it means none, none twice. */
static void distinct(const char *(*word)(int), int count)
{
    for (int i = 0; i < count; i++)
        for (int j = 0; j < i; j++)
            ck_assert_str_ne(word(i), word(j));
    for (int i = 1; i < count; i++)
        ck_assert_str_ne(word(i), "");
}

#define WORD_OF(name, type)                                                    \
    static const char *name##_of(int i)                                        \
    {                                                                          \
        return name((enum type)i);                                             \
    }
WORD_OF(dataset_kind_id, dataset_kind)
WORD_OF(evidence_id, evidence)
WORD_OF(evidence_word, evidence)
WORD_OF(gap_id, gap)
WORD_OF(gap_word, gap)
WORD_OF(spin_id, spin_state)
WORD_OF(spin_word, spin_state)
WORD_OF(coordination_id, coordination)
WORD_OF(dataset_configuration_status_id, configuration_status)
WORD_OF(radioactive_id, radioactive)
WORD_OF(radioactive_word, radioactive)

START_TEST(test_words_are_distinct)
{
    distinct(dataset_kind_id_of, DATASET_KIND_COUNT);
    distinct(evidence_id_of, EVIDENCE_COUNT);
    distinct(evidence_word_of, EVIDENCE_COUNT);
    distinct(gap_id_of, GAP_COUNT);
    distinct(gap_word_of, GAP_COUNT);
    distinct(spin_id_of, SPIN_COUNT);
    distinct(spin_word_of, SPIN_COUNT);
    distinct(coordination_id_of, COORDINATION_COUNT);
    distinct(dataset_configuration_status_id_of, CONFIGURATION_STATUS_COUNT);
    distinct(radioactive_id_of, RADIOACTIVE_COUNT);
    distinct(radioactive_word_of, RADIOACTIVE_COUNT);
}
END_TEST

/* Numbers are subtracted within a quantity, but for scales of their own; for
 * radii that is what the audits of unlike definitions rest on. */
START_TEST(test_scales_are_not_subtracted_from_each_other)
{
    ck_assert(definition_subtracts(&definition_pauling, &definition_pauling));
    ck_assert(!definition_subtracts(&definition_pauling, &definition_allen));
    ck_assert(!definition_subtracts(&definition_pauling, &definition_mulliken));
    ck_assert(definition_subtracts(&definition_covalent,
                                   &definition_ionic_effective));
    ck_assert(
        !definition_subtracts(&definition_covalent, &definition_affinity));
    ck_assert(!definition_subtracts(NULL, &definition_covalent));
}
END_TEST

START_TEST(test_definitions_are_found_by_their_text)
{
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        enum quantity_id id = (enum quantity_id)q;
        ck_assert_uint_ge(definition_count(id), 1);
        for (size_t i = 0; i < definition_count(id); i++) {
            const struct definition *d = definition_at(id, i);
            ck_assert_ptr_eq(definition_find(id, d->text), d);
        }
        ck_assert_ptr_null(definition_find(id, "size"));
    }
    ck_assert_int_eq(definition_mulliken.dimension, DIMENSION_ENERGY);
}
END_TEST

TCase *loader_case(void)
{
    TCase *tc = tcase_create("loader");
    tcase_add_test(tc, test_every_bad_file_gets_its_one_sentence);
    tcase_add_test(tc, test_every_good_file_loads);
    tcase_add_test(tc, test_every_cut_of_a_file_is_refused);
    tcase_add_test(tc, test_one_wrong_byte_is_survived);
    tcase_add_test(tc, test_numbers_and_units_keep_their_digits);
    tcase_add_test(tc, test_a_file_keeps_everything_it_says);
    tcase_add_test(tc, test_variants_and_gaps_of_a_file);
    tcase_add_test(tc, test_a_file_too_large_is_refused);
    tcase_add_test(tc, test_too_many_entries_are_refused);
    tcase_add_test(tc, test_files_that_cannot_be_read_are_named);
    tcase_add_test(tc, test_a_user_adds_a_set);
    tcase_add_test(tc, test_a_full_catalogue_refuses_more);
    tcase_add_test(tc, test_a_built_in_id_is_taken);
    tcase_add_test(tc, test_words_are_distinct);
    tcase_add_test(tc, test_definitions_are_found_by_their_text);
    tcase_add_test(tc, test_scales_are_not_subtracted_from_each_other);
    tcase_add_test(tc, test_the_tables_are_the_files);
    tcase_add_test(tc, test_the_example_of_the_man_page_loads);
    tcase_add_test(tc, test_the_man_page_names_every_key_and_word);
    return tc;
}
