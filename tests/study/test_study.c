/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "refdata/ground.h"
#include "study/study.h"
#include "study/trend.h"
#include "support/near.h"
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

static struct row row_of(int z, enum quantity_id quantity, const char *model)
{
    struct ask ask = {.z = z, .quantity = quantity, .model = model_find(model)};
    return study_row(study, &ask);
}

START_TEST(z_eff_of_lithium_from_its_ionization_energy)
{
    /* Common practice, no source: 1.26 for Li 2s. */
    struct row row = row_of(3, QUANTITY_ZEFF, "slater");
    ck_assert_str_eq(row.reference.provenance->id,
                     REFERENCE_ZEFF_FROM_IONIZATION);
    near(row.reference.value.value, 1.26, 0.005, 0, "Li 2s");
    ck_assert(row.reference.has_u);
}
END_TEST

START_TEST(every_row_has_a_residual_or_a_reason)
{
    int ok = 0;
    for (int q = 0; q < QUANTITY_COUNT; q++)
        for (int m = -1; m < model_count(); m++)
            for (int z = 1; z <= Z_MAX; z++) {
                struct ask ask = {.z = z, .quantity = (enum quantity_id)q};
                ask.model = m < 0 ? NULL : model_at(m);
                struct row row = study_row(study, &ask);
                if (row.state == ROW_OK) {
                    ok++;
                    struct number d =
                        number_subtract(row.value.value, row.reference.value);
                    ck_assert(d.value == row.residual.value);
                    ck_assert_str_eq(row.reason, "");
                } else {
                    ck_assert_str_ne(row.reason, "");
                }
                ck_assert_ptr_nonnull(row.unit);
            }
    ck_assert_int_gt(ok, 700);
}
END_TEST

START_TEST(every_reference_answers_every_ask)
{
    const struct reference_list *list = study_references(study);
    ck_assert_int_gt(list->count, 20);
    for (int r = 0; r < list->count; r++) {
        int values = 0;
        for (int z = 1; z <= Z_MAX; z++)
            for (int charge = 0; charge <= (z < 4 ? z : 4); charge++) {
                struct ask ask = {.z = z,
                                  .charge = charge,
                                  .quantity = list->items[r].quantity,
                                  .reference = &list->items[r]};
                struct row row = study_row(study, &ask);
                values += row.reference.state == READING_OK;
                ck_assert(row.reference.state == READING_OK ||
                          row.reference.reason[0] != '\0');
            }
        ck_assert_msg(values > 0 || list->items[r].quantity == QUANTITY_ZEFF,
                      "%s", list->items[r].provenance->id);
        ck_assert_ptr_eq(reference_find(list, list->items[r].provenance->id),
                         &list->items[r]);
    }
}
END_TEST

START_TEST(like_is_set_against_like_unless_told_otherwise)
{
    struct row radius = row_of(26, QUANTITY_RADIUS, "slater");
    ck_assert(radius.like_with_like);
    struct row chi = row_of(26, QUANTITY_ELECTRONEGATIVITY, "slater");
    ck_assert_int_eq(chi.state, ROW_OK);
    ck_assert(chi.like_with_like);
    struct ask ask = {.z = 26,
                      .quantity = QUANTITY_ELECTRONEGATIVITY,
                      .model = model_find("slater")};
    for (int r = 0; r < study_references(study)->count; r++) {
        const struct reference *reference = &study_references(study)->items[r];
        if (reference->provenance->definition != &definition_pauling)
            continue;
        ask.reference = reference;
        struct row other = study_row(study, &ask);
        ck_assert(other.state == ROW_OTHER_SCALE ||
                  other.state == ROW_NO_REFERENCE);
    }
    ck_assert_ptr_nonnull(ask.reference);
}
END_TEST

START_TEST(an_inner_subshell_is_set_against_a_table_of_subshells)
{
    struct ask ask = {.z = 25,
                      .quantity = QUANTITY_ZEFF,
                      .model = model_find("clementi"),
                      .n = 3,
                      .l = 2};
    struct row row = study_row(study, &ask);
    ck_assert_int_eq(row.state, ROW_OK);
    /* 10.528, the printed exponent of Mn 3d times 3: Clementi and Raimondi
     * 1963, doi 10.1063/1.1733573. */
    near(row.reference.value.value, 10.528, 0.001, 0, "Mn 3d");
    ck_assert_int_eq(row.n, 3);
    ask.n = 4;
    ask.l = 1;
    row = study_row(study, &ask);
    ck_assert_int_eq(row.state, ROW_OUTSIDE_MODEL);
}
END_TEST

START_TEST(a_configuration_of_the_user_is_checked_and_marked)
{
    struct status st = status_ok();
    struct configuration excited, ground;
    struct species species;
    ck_assert(configuration_parse("[Ar] 3d7 4s1", &excited, &st));
    ck_assert(configuration_parse("[Ar] 3d6 4s2", &ground, &st));
    struct ask ask = {.z = 26, .configuration = &excited};
    ck_assert(study_species(study, &ask, &species, &st));
    ck_assert_int_eq(species.origin, ORIGIN_USER);
    ask.configuration = &ground;
    ck_assert(study_species(study, &ask, &species, &st));
    ck_assert_int_eq(species.origin, ORIGIN_STORED);
    ask.charge = 1;
    ck_assert(!study_species(study, &ask, &species, &st));
    ck_assert_ptr_nonnull(strstr(st.message, "expected 25"));
    ask.configuration = NULL;
    ask.charge = 27;
    ck_assert(!study_species(study, &ask, &species, &st));
    ask.charge = CHARGE_LOWEST - 1;
    ck_assert(!study_species(study, &ask, &species, &st));
}
END_TEST

START_TEST(the_ion_of_an_excited_configuration_is_that_configuration_less_one)
{
    struct status st = status_ok();
    struct configuration excited;
    ck_assert(configuration_parse("[Ne] 4s1", &excited, &st));
    struct ask ask = {.z = 11,
                      .quantity = QUANTITY_IONIZATION,
                      .model = model_find("slater"),
                      .configuration = &excited};
    struct row row = study_row(study, &ask);
    /* Na+ is [Ne] either way; 4s lies higher than 3s. */
    struct row ground = row_of(11, QUANTITY_IONIZATION, "slater");
    ck_assert(row.value.value.value < ground.value.value.value);
}
END_TEST

START_TEST(units_are_converted_and_a_scale_keeps_its_own)
{
    struct ask ask = {.z = 26,
                      .quantity = QUANTITY_IONIZATION,
                      .model = model_find("slater"),
                      .unit = unit_find("kJ/mol")};
    struct row row = study_row(study, &ask);
    /* 762.5 kJ/mol, the first ionization energy of Fe (value from memory). */
    near(row.reference.value.value, 762.5, 0.1, 0, "Fe in kJ/mol");
    ask.unit = NULL;
    ask.quantity = QUANTITY_ELECTRONEGATIVITY;
    ask.reference = reference_find(study_references(study),
                                   "electronegativity_mulliken_2016");
    ck_assert_ptr_nonnull(ask.reference);
    row = study_row(study, &ask);
    ck_assert_int_eq(row.state, ROW_OTHER_SCALE);
}
END_TEST

START_TEST(an_energy_is_stored_for_the_ground_configuration_only)
{
    struct status st = status_ok();
    struct configuration excited;
    ck_assert(configuration_parse("[Ar] 3d10 4s2 4p5 5s1", &excited, &st));
    struct ask ask = {.z = 36,
                      .quantity = QUANTITY_IONIZATION,
                      .model = model_find("slater"),
                      .configuration = &excited};
    struct row row = study_row(study, &ask);
    ck_assert_int_eq(row.state, ROW_NO_REFERENCE);
    ck_assert_ptr_nonnull(strstr(row.reason, "ground configuration"));
    ask.quantity = QUANTITY_ZEFF;
    row = study_row(study, &ask);
    ck_assert_int_eq(row.state, ROW_NO_REFERENCE);
}
END_TEST

START_TEST(an_ion_is_read_at_its_site_and_no_other)
{
    /* R. D. Shannon, Acta Cryst. A32, 751 (1976): effective ionic radii. */
    static const struct {
        int z, charge;
        struct site site;
        double radius_pm; /* 0: not in the table */
    } sites[] = {
        {31, 3, {COORDINATION_IV, SPIN_NONE}, 47.0},
        {31, 3, {COORDINATION_NONE, SPIN_NONE}, 62.0},
        {31, 3, {COORDINATION_XII, SPIN_NONE}, 0.0},
        {26, 2, {COORDINATION_VI, SPIN_LOW}, 61.0},
        {26, 2, {COORDINATION_NONE, SPIN_HIGH}, 78.0},
        {26, 2, {COORDINATION_VIII, SPIN_LOW}, 0.0},
        {31, 3, {COORDINATION_VI, SPIN_HIGH}, 62.0}, /* no spin to tell */
    };
    for (size_t i = 0; i < sizeof sites / sizeof sites[0]; i++) {
        struct ask ask = {.z = sites[i].z,
                          .charge = sites[i].charge,
                          .quantity = QUANTITY_RADIUS,
                          .site = sites[i].site};
        ask.reference = reference_find(study_references(study),
                                       "ionic_effective_shannon_1976");
        ck_assert_ptr_nonnull(ask.reference);
        struct row row = study_row(study, &ask);
        if (sites[i].radius_pm > 0.0)
            near(row.reference.value.value, sites[i].radius_pm, 1e-9, 0,
                 "Z=%d, site %zu", sites[i].z, i);
        else
            ck_assert_msg(row.reference.state == READING_MISSING &&
                              strstr(row.reference.reason, "not stored; "),
                          "site %zu", i);
    }
}
END_TEST

/* By quantity, then by rank, which every built-in set has. */
START_TEST(references_stand_in_the_order_of_their_ranks)
{
    const struct reference_list *list = study_references(study);
    int pairs = 0;
    for (int i = 1; i < list->count; i++) {
        const struct reference *r = &list->items[i], *before = r - 1;
        ck_assert_int_le(before->quantity, r->quantity);
        ck_assert(r->derivation || r->set->rank > 0);
        if (before->quantity != r->quantity || before->derivation || r->derivation)
            continue;
        ck_assert_msg(before->set->rank < r->set->rank, "%s before %s",
                      before->provenance->id, r->provenance->id);
        pairs++;
    }
    ck_assert_int_gt(pairs, 10);
}
END_TEST

/* Along a period, with a second set: what each step holds is what the row of
 * the same ask says, the uncertainty of the stored value included. */
START_TEST(a_trend_holds_what_its_rows_say)
{
    struct trend *trend = calloc(1, sizeof *trend);
    ck_assert_ptr_nonnull(trend);
    const struct model *models[] = {model_find("slater"), model_find("shells")};
    struct ask ask = {.z = 26, .quantity = QUANTITY_IONIZATION};
    int with_u = 0;
    walk_fill(&trend->walk, WALK_PERIOD, 26, 0);
    trend_fill(trend, study, &ask, models, 2);
    ck_assert_int_eq(trend->walk.count, 18);
    ck_assert_int_eq(trend->series_count, 2);
    ck_assert_int_eq(trend->set_count, 1);
    for (int i = 0; i < trend->walk.count; i++) {
        ask.z = trend->walk.steps[i].z;
        ck_assert_int_eq(ask.z, 19 + i);
        for (int m = 0; m < 2; m++) {
            const struct trend_value *v = &trend->series[m].values[i];
            ask.model = models[m];
            struct row row = study_row(study, &ask);
            ck_assert(v->there && v->has_residual && v->has_percent);
            near(v->value, row.value.value.value, 0, 0, "Z=%d", ask.z);
            near(v->residual, row.residual.value, 0, 0, "Z=%d", ask.z);
            near(v->percent, row.percent.value, 0, 0, "Z=%d", ask.z);
            const struct trend_stored *s = &trend->sets[0].values[i];
            ck_assert(s->there && s->has_u == row.reference.has_u);
            near(s->value, row.reference.value.value, 0, 0, "Z=%d", ask.z);
            near(s->u, row.reference.has_u ? row.reference.u.value : 0.0, 0, 0,
                 "Z=%d", ask.z);
            with_u += s->has_u;
        }
    }
    ck_assert_int_eq(with_u, 2 * 18);
    free(trend);
}
END_TEST

/* u of Z_eff = n sqrt(I/Ry) is half of it times the relative uncertainty of
 * I; by the difference quotient, from the stored energies themselves. */
START_TEST(z_eff_from_an_energy_has_its_uncertainty)
{
    struct ask ask = {.quantity = QUANTITY_ZEFF,
                      .reference =
                          reference_find(study_references(study),
                                         REFERENCE_ZEFF_FROM_IONIZATION)};
    struct ask energy = {.quantity = QUANTITY_IONIZATION};
    int seen = 0;
    for (int z = 1; z <= 103; z++) {
        ask.z = energy.z = z;
        struct row row = study_row(study, &ask), of = study_row(study, &energy);
        if (row.reference.state != READING_OK || !row.reference.has_u)
            continue;
        double ev = of.reference.value.value, u = of.reference.u.value;
        double slope = (sqrt((ev + u) / 13.605693122990) -
                        sqrt((ev - u) / 13.605693122990)) /
                       2.0;
        near(row.reference.value.value,
             row.reference.n * sqrt(ev / 13.605693122990), 0, 2e-6, "Z=%d", z);
        /* two significant digits are kept */
        if (u > 1e-7 * ev)
            near(row.reference.u.value, row.reference.n * slope, 0, 0.051,
                 "Z=%d, u", z);
        seen++;
    }
    /* not where another subshell than the outermost loses the electron */
    ck_assert_int_ge(seen, 90);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("study");
    TCase *rows = tcase_create("rows");
    tcase_add_checked_fixture(rows, open_study, close_study);
    tcase_add_test(rows, z_eff_of_lithium_from_its_ionization_energy);
    tcase_add_test(rows, every_row_has_a_residual_or_a_reason);
    tcase_add_test(rows, every_reference_answers_every_ask);
    tcase_add_test(rows, like_is_set_against_like_unless_told_otherwise);
    tcase_add_test(rows, an_inner_subshell_is_set_against_a_table_of_subshells);
    tcase_add_test(rows, a_configuration_of_the_user_is_checked_and_marked);
    tcase_add_test(
        rows,
        the_ion_of_an_excited_configuration_is_that_configuration_less_one);
    tcase_add_test(rows, units_are_converted_and_a_scale_keeps_its_own);
    tcase_add_test(rows, an_energy_is_stored_for_the_ground_configuration_only);
    tcase_add_test(rows, an_ion_is_read_at_its_site_and_no_other);
    tcase_add_test(rows, references_stand_in_the_order_of_their_ranks);
    tcase_add_test(rows, a_trend_holds_what_its_rows_say);
    tcase_add_test(rows, z_eff_from_an_energy_has_its_uncertainty);
    suite_add_tcase(suite, rows);
    return run_suite(suite);
}
