/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/units.h"
#include "model/registry.h"
#include "model/slater.h"
#include "support/csv.h"
#include "support/near.h"
#include "support/run.h"

static struct configuration parsed(const char *text)
{
    struct status st = status_ok();
    struct configuration c;
    ck_assert_msg(configuration_parse(text, &c, &st), "%s: %s", text,
                  st.message);
    return c;
}

static struct question question_of(int z, const char *configuration)
{
    struct question q = {.species = {.z = z}};
    q.species.configuration = parsed(configuration);
    q.species.charge =
        z - (int)configuration_electrons(&q.species.configuration);
    return q;
}

/* Asks a closed model one question. */
static struct reading ask(const struct model *model, const struct question *q,
                          enum quantity_id quantity, int n, int l)
{
    int offer = model_offer_for(model, quantity, NULL);
    ck_assert_msg(offer >= 0, "%s offers no %s", model->id,
                  quantity_at(quantity)->id);
    void *work = calloc(1, model->work_size);
    ck_assert_ptr_nonnull(work);
    model->begin(work, q, &(struct model_options){0});
    while (model->step(work) != MODEL_DONE)
        ;
    struct reading r = model->read(work, offer, n, l);
    free(work);
    return r;
}

/* Subshells in the order in which n + l fills them, and electrons taken from
 * highest n, then highest l: enough configurations for property loops. */
static struct configuration filled_by_n_plus_l(int electrons)
{
    struct configuration c = {0};
    for (int sum = 1; electrons > 0; sum++)
        for (int l = (sum - 1) / 2; l >= 0 && electrons > 0; l--) {
            int n = sum - l;
            int room = 4 * l + 2;
            int occ = electrons < room ? electrons : room;
            ck_assert(l > L_MAX || configuration_change(&c, n, l, occ));
            electrons -= occ;
        }
    return c;
}

START_TEST(slater_gives_every_published_example)
{
    struct csv csv = csv_read_file("data/slater_examples.csv");
    ck_assert_uint_eq(csv_rows(&csv), 47);
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        int z = (int)csv_number(&csv, i, "z");
        struct question q = question_of(z, csv_cell(&csv, i, "configuration"));
        int n, l;
        ck_assert(subshell_parse(csv_cell(&csv, i, "subshell"), &n, &l));
        struct reading r = ask(model_find("slater"), &q, QUANTITY_ZEFF, n, l);
        near(r.value.value, csv_number(&csv, i, "zeff"), 1e-9, 0, "Z=%d %s, %s",
             z, csv_cell(&csv, i, "subshell"), csv_cell(&csv, i, "source"));
    }
    csv_free(&csv);
}
END_TEST

/* zeff_from_rule is no printed value: another program evaluated the printed
 * rules for the occupations named. test_rules.c has the printed coefficients
 * and the printed table. */
START_TEST(clementi_gives_what_another_evaluation_of_the_rules_gave)
{
    struct csv csv = csv_read_file("data/clementi_rules_vs_table.csv");
    ck_assert_uint_eq(csv_rows(&csv), 95);
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        int z = (int)csv_number(&csv, i, "z");
        struct question q =
            question_of(z, csv_cell(&csv, i, "occupation_used"));
        int n, l;
        ck_assert(subshell_parse(csv_cell(&csv, i, "subshell"), &n, &l));
        struct reading r = ask(model_find("clementi"), &q, QUANTITY_ZEFF, n, l);
        ck_assert_int_eq(r.state, READING_OK);
        /* The rows have four places. */
        near(r.value.value, csv_number(&csv, i, "zeff_from_rule"), 5.1e-5, 0,
             "Z=%d %s", z, csv_cell(&csv, i, "subshell"));
    }
    csv_free(&csv);
}
END_TEST

/* The number behind `key` in a text such as "Z*=4.85; r_cov=0.72 A". */
static double number_behind(const char *text, const char *key)
{
    const char *at = strstr(text, key);
    ck_assert_msg(at != NULL, "'%s' in '%s'", key, text);
    return strtod(at + strlen(key), NULL);
}

START_TEST(allred_rochow_gives_the_printed_values)
{
    static const struct {
        int z;
        const char *symbol, *configuration;
    } atoms[] = {
        {9, "F;", "[He] 2s2 2p5"},        {7, "N;", "[He] 2s2 2p3"},
        {14, "Si;", "[Ne] 3s2 3p2"},      {16, "S;", "[Ne] 3s2 3p4"},
        {13, "Al;", "[Ne] 3s2 3p1"},      {19, "K;", "[Ar] 4s1"},
        {33, "As;", "[Ar] 3d10 4s2 4p3"}, {35, "Br;", "[Ar] 3d10 4s2 4p5"},
    };
    struct csv csv = csv_read_file("data/worked_examples_screening.csv");
    int seen = 0;
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        const char *inputs = csv_cell(&csv, i, "inputs");
        if (strcmp(csv_cell(&csv, i, "method"), "allred_rochow") != 0)
            continue;
        for (size_t a = 0; a < sizeof atoms / sizeof atoms[0]; a++) {
            if (strncmp(inputs, atoms[a].symbol, strlen(atoms[a].symbol)) != 0)
                continue;
            struct question q = question_of(atoms[a].z, atoms[a].configuration);
            q.has_covalent_radius = true;
            q.covalent_radius_pm = 100.0 * number_behind(inputs, "r_cov=");
            struct reading r =
                ask(model_find("slater"), &q, QUANTITY_ELECTRONEGATIVITY, 0, 0);
            near(r.value.value, csv_number(&csv, i, "value"),
                 csv_number(&csv, i, "tolerance"), 0, "%s", inputs);
            seen++;
        }
    }
    ck_assert_int_eq(seen, 8);
    csv_free(&csv);
}
END_TEST

START_TEST(shell_counting_of_the_second_period)
{
    /* Common practice, no source: 1, 1.5, … 4 from Li to F. */
    static const char *const period[] = {
        "[He] 2s1",     "[He] 2s2",     "[He] 2s2 2p1", "[He] 2s2 2p2",
        "[He] 2s2 2p3", "[He] 2s2 2p4", "[He] 2s2 2p5"};
    for (int i = 0; i < 7; i++) {
        struct question q = question_of(3 + i, period[i]);
        struct reading r = ask(model_find("shells"), &q, QUANTITY_ZEFF, 0, 0);
        near(r.value.value, 1.0 + 0.5 * i, 1e-12, 0, "Z=%d", 3 + i);
    }
}
END_TEST

START_TEST(one_electron_is_not_screened)
{
    for (int m = 0; m < model_count(); m++) {
        const struct model *model = model_at(m);
        if (!model->closed)
            continue;
        for (int z = 1; z <= Z_MAX; z++) {
            struct question q = question_of(z, "1s1");
            struct reading r = ask(model, &q, QUANTITY_ZEFF, 0, 0);
            near(r.value.value, z, 1e-9, 0, "%s Z=%d", model->id, z);
            struct reading radius = ask(model, &q, QUANTITY_RADIUS, 0, 0);
            near(radius.value.value, BOHR_PM / z, 0, 1e-8, "%s Z=%d radius",
                 model->id, z);
        }
    }
}
END_TEST

START_TEST(every_model_answers_every_atom_and_ion_with_a_number_or_a_reason)
{
    int numbers = 0;
    for (int m = 0; m < model_count(); m++) {
        const struct model *model = model_at(m);
        if (!model->closed)
            continue;
        for (int z = 1; z <= Z_MAX; z++)
            for (int charge = 0; charge < z; charge += 1 + charge) {
                struct question q = {.species = {.z = z, .charge = charge}};
                q.species.configuration = filled_by_n_plus_l(z - charge);
                q.has_cation = charge + 1 < z;
                q.cation = (struct species){.z = z, .charge = charge + 1};
                if (q.has_cation)
                    q.cation.configuration = filled_by_n_plus_l(z - charge - 1);
                for (int o = 0; o < model->offer_count; o++) {
                    struct reading r =
                        ask(model, &q, model->offers[o].quantity, 0, 0);
                    if (r.state == READING_OK)
                        numbers++;
                    else
                        ck_assert_msg(r.reason[0] != '\0', "%s Z=%d", model->id,
                                      z);
                    ck_assert_ptr_eq(r.provenance,
                                     &model->offers[o].provenance);
                }
            }
    }
    ck_assert_int_gt(numbers, 4000);
}
END_TEST

START_TEST(slater_ionization_energies_rise_with_the_charge)
{
    const struct model *slater = model_find("slater");
    for (int z = 2; z <= 36; z++) {
        double last = 0.0;
        struct configuration c = filled_by_n_plus_l(z);
        for (int charge = 0; charge < z - 1; charge++) {
            struct question q = {.species = {.z = z, .charge = charge},
                                 .has_cation = true};
            q.species.configuration = c;
            const struct subshell *outer = configuration_outermost(&c);
            ck_assert(configuration_change(&c, outer->n, outer->l, -1));
            q.cation = (struct species){.z = z, .charge = charge + 1};
            q.cation.configuration = c;
            struct reading r = ask(slater, &q, QUANTITY_IONIZATION, 0, 0);
            ck_assert_msg(r.value.value > last, "Z=%d charge %d", z, charge);
            last = r.value.value;
        }
    }
}
END_TEST

START_TEST(gaps_have_the_reason_that_is_theirs)
{
    struct question rb = question_of(37, "[Kr] 5s1");
    struct reading r = ask(model_find("clementi"), &rb, QUANTITY_ZEFF, 0, 0);
    ck_assert_int_eq(r.state, READING_OUTSIDE);
    ck_assert_ptr_nonnull(strstr(r.reason, "Kr"));
    struct question fe = question_of(26, "[Ar] 3d6 4s2");
    r = ask(model_find("slater"), &fe, QUANTITY_ZEFF, 4, 1);
    ck_assert_ptr_nonnull(strstr(r.reason, "no electron"));
    struct question hole = question_of(26, "1s2 2s1 2p6 3s2 3p6 3d6 4s2");
    r = ask(model_find("clementi"), &hole, QUANTITY_ZEFF, 4, 0);
    ck_assert_ptr_nonnull(strstr(r.reason, "filled inner"));
    struct question og = question_of(118, "[Rn] 5f14 6d10 7s2 7p6");
    r = ask(model_find("slater"), &og, QUANTITY_ZEFF, 0, 0);
    ck_assert_ptr_nonnull(strstr(r.remark, "extension"));
    struct question n8 = question_of(119, "[Og] 8s1");
    r = ask(model_find("slater"), &n8, QUANTITY_ZEFF, 0, 0);
    ck_assert_int_eq(r.state, READING_OUTSIDE);
    r = ask(model_find("slater"), &fe, QUANTITY_ELECTRONEGATIVITY, 0, 0);
    ck_assert_ptr_nonnull(strstr(r.reason, "covalent radius"));
    r = ask(model_find("slater"), &fe, QUANTITY_IONIZATION, 0, 0);
    ck_assert_int_eq(r.state, READING_OUTSIDE);
    struct question fluoride = question_of(1, "1s2 2s2 2p6");
    r = ask(model_find("slater"), &fluoride, QUANTITY_ZEFF, 0, 0);
    ck_assert_ptr_nonnull(strstr(r.reason, "screening"));
}
END_TEST

START_TEST(the_registry_has_distinct_models_with_sources)
{
    for (int m = 0; m < model_count(); m++) {
        const struct model *model = model_at(m);
        ck_assert_ptr_eq(model_find(model->id), model);
        ck_assert_int_eq(model_index(model), m);
        ck_assert_int_gt(model->offer_count, 0);
        for (int o = 0; o < model->offer_count; o++) {
            const struct provenance *p = &model->offers[o].provenance;
            ck_assert_str_eq(p->id, model->id);
            ck_assert(p->citation_count > 0 || p->unsourced);
            ck_assert(p->computed && p->definition);
            ck_assert_int_eq(model_offer_for(model, model->offers[o].quantity,
                                             p->definition),
                             o);
        }
    }
    ck_assert_ptr_null(model_find("none"));
    ck_assert_int_eq(
        model_offer_for(model_find("shells"), QUANTITY_POLARIZABILITY, NULL),
        -1);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("model");
    TCase *outside = tcase_create("outside values");
    tcase_add_test(outside, slater_gives_every_published_example);
    tcase_add_test(outside,
                   clementi_gives_what_another_evaluation_of_the_rules_gave);
    tcase_add_test(outside, allred_rochow_gives_the_printed_values);
    tcase_add_test(outside, shell_counting_of_the_second_period);
    suite_add_tcase(suite, outside);
    TCase *properties = tcase_create("properties");
    tcase_add_test(properties, one_electron_is_not_screened);
    tcase_add_test(
        properties,
        every_model_answers_every_atom_and_ion_with_a_number_or_a_reason);
    tcase_add_test(properties, slater_ionization_energies_rise_with_the_charge);
    tcase_add_test(properties, gaps_have_the_reason_that_is_theirs);
    tcase_add_test(properties, the_registry_has_distinct_models_with_sources);
    suite_add_tcase(suite, properties);
    return run_suite(suite);
}
