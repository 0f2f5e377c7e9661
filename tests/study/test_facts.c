/* SPDX-License-Identifier: MIT */
/* Facts in words, everything side by side, and the list of sources. */
#include <check.h>
#include <stdbool.h>
#include <stdlib.h>
#include <string.h>

#include "study/facts.h"
#include "support/run.h"

static struct study *study;

static void open_study(void)
{
    struct status st = status_ok();
    study = study_new(catalogue_builtin(), &st);
    ck_assert_ptr_nonnull(study);
}

static void close_study(void)
{
    study_free(study);
}

/* A fact of an element at a charge. */
static const char *fact_of(int z, int charge, enum fact_id id)
{
    static char buffer[FACT_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    struct ask ask = {.z = z, .charge = charge};
    struct species species;
    struct status st = status_ok();
    ck_assert(study_species(study, &ask, &species, &st));
    study_fact(study, &species, id, &t);
    ck_assert_msg(!t.cut, "Z = %d: cut: %s", z, buffer);
    return buffer;
}

/* Common knowledge of the trade, no source. */
START_TEST(facts_are_those_of_the_element)
{
    const char *ground = fact_of(26, 0, FACT_CONFIGURATION);
    ck_assert_int_eq(strncmp(ground, "[Ar] 3d6 4s2", 12), 0);
    ck_assert_ptr_nonnull(strstr(ground, "5D4"));
    ck_assert_str_eq(fact_of(26, 0, FACT_PLACE), "period 4, group 8, d block");
    ck_assert_str_eq(fact_of(58, 0, FACT_PLACE), "period 6, f block");
    ck_assert_str_eq(fact_of(26, 0, FACT_CATEGORY), "transition metal");
    ck_assert_str_eq(fact_of(26, 0, FACT_WEIGHT), "55.845");
    ck_assert_ptr_nonnull(strstr(fact_of(43, 0, FACT_WEIGHT), "mass number"));
    ck_assert_int_eq(strncmp(fact_of(26, 0, FACT_OXIDATION), "+2, +3", 6), 0);
    ck_assert_ptr_nonnull(strstr(fact_of(26, 3, FACT_CONFIGURATION), "3d5"));
}
END_TEST

START_TEST(every_element_has_its_place_and_labels_differ)
{
    for (int z = 1; z <= Z_MAX; z++)
        for (int f = 0; f <= FACT_WEIGHT; f++)
            ck_assert_msg(fact_of(z, 0, (enum fact_id)f)[0], "Z = %d: %s", z,
                          fact_label((enum fact_id)f));
    for (int a = 0; a < FACT_COUNT; a++)
        for (int b = 0; b < a; b++)
            ck_assert_str_ne(fact_label((enum fact_id)a),
                             fact_label((enum fact_id)b));
}
END_TEST

static bool has_year(const char *text)
{
    for (const char *p = text; *p; p++)
        if (strncmp(p, "20", 2) == 0 && strspn(p, "0123456789") == 4)
            return true;
    return false;
}

/* Whoever carries a tag is sent to those who know; nothing is advised, no
 * limit is quoted. */
START_TEST(a_caution_defers_and_gives_no_advice)
{
    static const char *const never[] = {"mg/m3",  "ppm",   "wear", "glove",
                                        "handle", "store", "avoid"};
    int cautions = 0;
    for (int z = 1; z <= Z_MAX; z++) {
        const char *text = fact_of(z, 0, FACT_CAUTION);
        if (text[0] == '\0')
            continue;
        cautions++;
        ck_assert_msg(strstr(text, "safety data sheet") &&
                          strstr(text, "local codes") &&
                          strstr(text, "licensed practice"),
                      "Z = %d: %s", z, text);
        for (size_t i = 0; i < sizeof never / sizeof never[0]; i++)
            ck_assert_msg(!strstr(text, never[i]), "Z = %d: %s", z, text);
        bool tagged = strstr(text, "tagged by ") != NULL;
        ck_assert_msg(tagged || strstr(text, "stable"), "Z = %d: %s", z, text);
    }
    ck_assert_int_ge(cautions, 40); /* 37 elements without a stable isotope */
    for (int z = 84; z <= Z_MAX; z++)
        ck_assert_ptr_nonnull(
            strstr(fact_of(z, 0, FACT_CAUTION), "no stable isotope"));
    ck_assert_ptr_nonnull(strstr(fact_of(82, 0, FACT_CAUTION), "2011/65/EU"));
}
END_TEST

START_TEST(a_list_of_critical_materials_has_its_year)
{
    int listed = 0;
    for (int z = 1; z <= Z_MAX; z++) {
        const char *text = fact_of(z, 0, FACT_SUPPLY);
        if (text[0] == '\0')
            continue;
        listed++;
        ck_assert_msg(has_year(text), "Z = %d: %s", z, text);
    }
    ck_assert_int_ge(listed, 30);
}
END_TEST

static struct comparison compared(const struct ask *asks, int count,
                                  const struct unit *const *units)
{
    struct comparison c;
    struct status st = status_ok();
    ck_assert(study_compare(study, asks, count, false, units, &c, &st));
    ck_assert_int_eq(c.count, count);
    return c;
}

START_TEST(a_comparison_has_every_offer_once_and_no_empty_reference)
{
    const struct ask asks[] = {{.z = 26, .charge = 3}, {.z = 13, .charge = 3}};
    struct comparison c = compared(asks, 2, NULL);
    for (int m = 0; m < model_count(); m++)
        for (int o = 0; o < model_at(m)->offer_count; o++) {
            int found = 0;
            for (int i = 0; i < c.line_count; i++)
                found +=
                    c.lines[i].provenance == &model_at(m)->offers[o].provenance;
            ck_assert_int_eq(found, 1);
        }
    for (int i = 0; i < c.line_count; i++) {
        const struct comparison_line *line = &c.lines[i];
        bool any = line->provenance->computed;
        for (int w = 0; w < 2; w++)
            any = any || line->readings[w].state == READING_OK;
        ck_assert_msg(any, "%s", line->provenance->id);
        ck_assert(i == 0 || line[-1].quantity <= line->quantity);
    }
    comparison_clear(&c);
}
END_TEST

/* 1 angstrom is 100 pm (SI). */
START_TEST(a_comparison_is_in_the_units_asked_for)
{
    const struct ask asks[] = {{.z = 26}, {.z = 44}};
    const struct unit *units[DIMENSION_VOLUME + 1] = {0};
    units[DIMENSION_LENGTH] = unit_find("angstrom");
    struct comparison pm = compared(asks, 2, NULL);
    struct comparison a = compared(asks, 2, units);
    int lengths = 0;
    ck_assert_int_eq(a.line_count, pm.line_count);
    for (int i = 0; i < a.line_count; i++) {
        bool length = pm.lines[i].unit->dimension == DIMENSION_LENGTH;
        ck_assert_str_eq(a.lines[i].unit->id,
                         length ? "angstrom" : pm.lines[i].unit->id);
        if (!length || a.lines[i].readings[0].state != READING_OK)
            continue;
        lengths++;
        ck_assert_double_eq_tol(a.lines[i].readings[0].value.value * 100,
                                pm.lines[i].readings[0].value.value, 1e-6);
    }
    ck_assert_int_ge(lengths, 5);
    comparison_clear(&pm);
    comparison_clear(&a);
}
END_TEST

START_TEST(a_comparison_of_what_does_not_exist_is_refused)
{
    const struct ask asks[] = {{.z = 26}, {.z = 1, .charge = 2}};
    struct comparison c;
    struct status st = status_ok();
    ck_assert(!study_compare(study, asks, 2, false, NULL, &c, &st));
    ck_assert_int_eq(st.code, STATUS_USAGE);
}
END_TEST

START_TEST(every_model_and_data_set_is_a_source_with_a_citation)
{
    struct source *sources = calloc(SOURCES_MAX, sizeof *sources);
    ck_assert_ptr_nonnull(sources);
    int count = study_sources(study, sources, SOURCES_MAX);
    const struct catalogue *all = catalogue_builtin();
    ck_assert_int_lt(count, SOURCES_MAX);
    for (int i = 0; i < count; i++) {
        ck_assert(sources[i].provenance->citation_count > 0 ||
                  sources[i].provenance->unsourced);
        ck_assert(sources[i].provenance->computed ||
                  sources[i].domain[0] != '\0');
    }
    for (size_t s = 0; s < catalogue_count(all); s++) {
        int found = 0;
        for (int i = 0; i < count; i++)
            found += sources[i].provenance == &catalogue_at(all, s)->provenance;
        ck_assert_int_eq(found, 1);
    }
    for (int m = 0; m < model_count(); m++)
        for (int o = 0; o < model_at(m)->offer_count; o++) {
            const struct model_offer *offer = &model_at(m)->offers[o];
            int found = 0;
            for (int i = 0; i < count; i++)
                found += !strcmp(sources[i].provenance->id, model_at(m)->id) &&
                         strstr(sources[i].quantity,
                                quantity_at(offer->quantity)->id) != NULL;
            ck_assert_int_ge(found, 1);
        }
    ck_assert_int_eq(study_sources(study, sources, 3), 3);
    free(sources);
}
END_TEST

static bool names(const char *list, const char *field)
{
    const char *at = list ? strstr(list, field) : NULL;
    return at != NULL;
}

/* ISO 26324: "10.", the registrant, "/", the item. */
static bool is_doi(const char *doi)
{
    size_t digits =
        strncmp(doi, "10.", 3) == 0 ? strspn(doi + 3, "0123456789") : 0;
    return digits >= 4 && digits <= 9 && doi[3 + digits] == '/' &&
           doi[4 + digits] != '\0' && !strpbrk(doi, " {}\\\"<>");
}

/* Each has author and year and, an article, what finds it, or says that it is
 * not known; nothing is there that is said not to be known. */
static void check_record(const struct citation *c)
{
    const struct {
        const char *field;
        bool there, needed;
    } fields[] = {
        {"authors", c->authors || c->organizations, true},
        {"year", c->year > 0, true},
        {"title", c->title != NULL, true},
        {"container", c->container != NULL, strcmp(c->kind, "misc") != 0},
        {"volume", c->volume || names(c->note, "no volume numbers"),
         strcmp(c->kind, "article") == 0},
        {"pages", c->pages != NULL, strcmp(c->kind, "article") == 0},
    };
    for (size_t i = 0; i < sizeof fields / sizeof fields[0]; i++) {
        bool unknown = names(c->not_known, fields[i].field);
        ck_assert_msg(!fields[i].needed || fields[i].there != unknown, "%s: %s",
                      c->key, fields[i].field);
        ck_assert_msg(fields[i].there ||
                          !names(c->from_memory, fields[i].field),
                      "%s: %s from memory", c->key, fields[i].field);
    }
    ck_assert_msg(!c->doi || is_doi(c->doi), "%s: doi %s", c->key, c->doi);
    for (int kind = 0; kind < 2; kind++)
        for (const char *const *n = kind ? c->organizations : c->authors;
             n && *n; n++)
            ck_assert_msg(!strstr(*n, " and ") || kind == 1, "%s: %s", c->key,
                          *n);
}

static bool same_word(const char *a, const char *b)
{
    return a == b || (a && b && strcmp(a, b) == 0);
}

/* One work has one key and one record, in models and data sets alike. */
static void check_pair(const struct citation *a, const struct citation *b)
{
    bool key = strcmp(a->key, b->key) == 0;
    bool doi = a->doi && same_word(a->doi, b->doi);
    ck_assert_msg(!doi || key, "%s and %s: one doi", a->key, b->key);
    if (!key)
        return;
    ck_assert_msg(same_word(a->doi, b->doi) && same_word(a->title, b->title) &&
                      same_word(a->container, b->container) &&
                      same_word(a->volume, b->volume) &&
                      same_word(a->pages, b->pages) &&
                      same_word(a->note, b->note) &&
                      same_word(a->from_memory, b->from_memory) &&
                      same_word(a->not_known, b->not_known) &&
                      same_word(a->kind, b->kind) && a->year == b->year,
                  "%s: two records", a->key);
}

START_TEST(every_citation_is_whole_or_says_what_is_not_known)
{
    struct source *sources = calloc(SOURCES_MAX, sizeof *sources);
    ck_assert_ptr_nonnull(sources);
    int count = study_sources(study, sources, SOURCES_MAX);
    for (int i = 0; i < count; i++)
        for (int c = 0; c < sources[i].provenance->citation_count; c++) {
            const struct citation *a = &sources[i].provenance->citations[c];
            check_record(a);
            for (int j = 0; j <= i; j++)
                for (int d = 0; d < sources[j].provenance->citation_count; d++)
                    check_pair(a, &sources[j].provenance->citations[d]);
        }
    free(sources);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("facts");
    TCase *c = tcase_create("facts");
    tcase_add_checked_fixture(c, open_study, close_study);
    tcase_add_test(c, facts_are_those_of_the_element);
    tcase_add_test(c, every_element_has_its_place_and_labels_differ);
    tcase_add_test(c, a_caution_defers_and_gives_no_advice);
    tcase_add_test(c, a_list_of_critical_materials_has_its_year);
    tcase_add_test(c, a_comparison_has_every_offer_once_and_no_empty_reference);
    tcase_add_test(c, a_comparison_is_in_the_units_asked_for);
    tcase_add_test(c, a_comparison_of_what_does_not_exist_is_refused);
    tcase_add_test(c, every_model_and_data_set_is_a_source_with_a_citation);
    tcase_add_test(c, every_citation_is_whole_or_says_what_is_not_known);
    suite_add_tcase(suite, c);
    return run_suite(suite);
}
