/* SPDX-License-Identifier: MIT */
/* How the built-in sets are asked: values, gaps, sites, order. */
#include <string.h>

#include "element/element.h"
#include "refdata/catalogue.h"
#include "refdata/dataset.h"
#include "refdata/suites.h"
#include "support/near.h"

const struct dataset *need(const char *id)
{
    const struct dataset *set = catalogue_find(catalogue_builtin(), id);
    ck_assert_msg(set != NULL, "no data set %s", id);
    return set;
}

/* Spot values as the publications print them. */
START_TEST(test_spot_values_of_the_sources)
{
    static const struct {
        const char *id;
        const char *symbol;
        int charge, n, l;
        double value;
    } spots[] = {
        /* NIST ASD 5.12: H and Fe first energies; Fe stage 2 */
        {"ionization_nist_asd_2024", "H", 0, 0, 0, 13.598434599702},
        {"ionization_nist_asd_2024", "Fe", 0, 0, 0, 7.9024681},
        {"ionization_nist_asd_2024", "Fe", 1, 0, 0, 16.19921},
        /* Cordero 2008: C sp3, low-spin Fe */
        {"covalent_cordero_2008", "C", 0, 0, 0, 76},
        {"covalent_cordero_2008", "Fe", 0, 0, 0, 132},
        /* Shannon 1976: Al3+ VI 53.5, Fe2+ VI high spin 78, Li+ VI 76 */
        {"ionic_effective_shannon_1976", "Al", 3, 0, 0, 53.5},
        {"ionic_effective_shannon_1976", "Fe", 2, 0, 0, 78},
        {"ionic_crystal_shannon_1976", "Li", 1, 0, 0, 90},
        /* Allred 1961; Allred, Rochow 1958 */
        {"electronegativity_pauling_1961", "F", 0, 0, 0, 3.98},
        {"electronegativity_allred_rochow_1958", "F", 0, 0, 0, 4.10},
        /* Rahm corrigendum 2017 against 2016 */
        {"isodensity_rahm_2017_corrected", "Fe", 0, 0, 0, 237},
        {"isodensity_rahm_2016", "Fe", 0, 0, 0, 226},
        /* Clementi, Raimondi 1963: Na 3s */
        {"zeff_clementi_1963", "Na", 0, 3, 0, 2.5074},
        /* Teatum 1968: Mn of valence 5 is the preferred one */
        {"metallic_12coord_teatum_1968", "Mn", 0, 0, 0, 130.7},
        /* Andersen 1999: Cl is decoded from the later 3.612725(28) */
        {"affinity_compiled_2024", "Cl", 0, 0, 0, 3.612725},
    };
    for (size_t i = 0; i < sizeof spots / sizeof *spots; i++) {
        int z = element_by_symbol(spots[i].symbol)->z;
        struct reading r = dataset_reading(
            need(spots[i].id), z, spots[i].charge, spots[i].n, spots[i].l);
        ck_assert_int_eq(r.state, READING_OK);
        near(r.value.value, spots[i].value, 0.0, 0.0, "%s %s", spots[i].id,
             spots[i].symbol);
        ck_assert_ptr_eq(r.provenance, &need(spots[i].id)->provenance);
    }
}
END_TEST

START_TEST(test_gaps_say_why)
{
    const struct dataset *affinity = need("affinity_compiled_2024");
    struct reading r = dataset_reading(affinity, 10, 0, 0, 0);
    ck_assert_int_eq(r.state, READING_MISSING);
    ck_assert_str_eq(r.reason, "no stable negative ion");
    r = dataset_reading(need("calculated_clementi_1967"), 57, 0, 0, 0);
    ck_assert_int_eq(r.state, READING_MISSING);
    ck_assert_ptr_nonnull(strstr(r.reason, "copies disagree"));
    /* No other coordination in the place of the one asked for. */
    const struct dataset *shannon = need("ionic_effective_shannon_1976");
    r = dataset_reading(shannon, 83, 5, 0, 0);
    ck_assert_int_eq(r.state, READING_OK);
    r = dataset_reading(shannon, 1, 1, 0, 0);
    ck_assert_int_eq(r.state, READING_MISSING);
    ck_assert_str_eq(r.reason, shannon->absent);
    /* Every gap of every set has its reason. */
    const struct catalogue *all = catalogue_builtin();
    for (size_t i = 0; i < catalogue_count(all); i++) {
        const struct dataset *set = catalogue_at(all, i);
        for (int k = 0; set->values && k < set->count; k++)
            ck_assert(set->values[k].gap == GAP_NONE ||
                      dataset_text(set, set->values[k].note)[0]);
    }
}
END_TEST

START_TEST(test_sites_are_found_by_coordination_and_spin)
{
    const struct dataset *set = need("ionic_effective_shannon_1976");
    /* Shannon 1976: Al3+ at IV, V, VI; Fe2+ VI low and high spin. */
    near(dataset_lookup_site(set, 13, 3, COORDINATION_IV, SPIN_NONE)
             ->value.value,
         39, 0, 0, "Al3+ IV");
    near(
        dataset_lookup_site(set, 13, 3, COORDINATION_V, SPIN_NONE)->value.value,
        48, 0, 0, "Al3+ V");
    near(
        dataset_lookup_site(set, 26, 2, COORDINATION_VI, SPIN_LOW)->value.value,
        61, 0, 0, "Fe2+ VI low spin");
    near(dataset_lookup_site(set, 26, 2, COORDINATION_VI, SPIN_NONE)
             ->value.value,
         78, 0, 0, "Fe2+ VI preferred");
    /* Shannon 1976 marks low spin as most reliable for Co3+ and Ni3+; the
     * cobalt of LiCoO2 is low spin (common practice, no source). */
    near(dataset_lookup_site(set, 27, 3, COORDINATION_VI, SPIN_NONE)
             ->value.value,
         54.5, 0, 0, "Co3+ VI preferred");
    near(dataset_lookup_site(set, 28, 3, COORDINATION_VI, SPIN_NONE)
             ->value.value,
         56, 0, 0, "Ni3+ VI preferred");
    struct reading r = dataset_reading(set, 27, 3, 0, 0);
    ck_assert_ptr_nonnull(strstr(r.remark, "low spin"));
    ck_assert_ptr_nonnull(strstr(r.remark, "high spin: 61 pm"));
    /* A mark that says what the kind says already stands once. */
    ck_assert_str_eq(
        dataset_text(set,
                     dataset_lookup_site(set, 28, 3, COORDINATION_VI, SPIN_HIGH)
                         ->remark),
        "coordination VI; high spin; estimated");
    ck_assert_ptr_null(
        dataset_lookup_site(set, 13, 3, COORDINATION_XII, SPIN_NONE));
    ck_assert_int_eq(coordination_number(COORDINATION_IV_SQ), 4);
}
END_TEST

/* Lookup by search agrees with a walk over all entries. */
START_TEST(test_every_entry_is_found_again)
{
    const struct catalogue *all = catalogue_builtin();
    for (size_t i = 0; i < catalogue_count(all); i++) {
        const struct dataset *set = catalogue_at(all, i);
        for (int k = 0; set->values && k < set->count; k++) {
            const struct entry *e = &set->values[k];
            bool standard = e->coordination == set->default_coordination;
            if (e->preferred && standard)
                ck_assert_ptr_eq(
                    dataset_lookup(set, e->z, e->charge, e->n, e->l), e);
            if (e->preferred && e->n == 0)
                ck_assert_ptr_eq(
                    dataset_lookup_site(set, e->z, e->charge,
                                        (enum coordination)e->coordination,
                                        SPIN_NONE),
                    e);
        }
    }
}
END_TEST

START_TEST(test_references_come_by_rank)
{
    const struct dataset *sets[32];
    const struct catalogue *all = catalogue_builtin();
    size_t count = catalogue_references(all, QUANTITY_RADIUS, sets, 32);
    ck_assert_uint_eq(count, 14);
    ck_assert_str_eq(sets[0]->provenance.id, "calculated_clementi_1967");
    ck_assert_str_eq(sets[1]->provenance.id, "covalent_cordero_2008");
    for (size_t i = 1; i < count; i++)
        ck_assert_int_lt(sets[i - 1]->rank, sets[i]->rank);
    ck_assert_str_eq(catalogue_default(all, QUANTITY_ISODENSITY)->provenance.id,
                     "isodensity_rahm_2017_corrected");
    /* Hardness follows from other quantities: no set of its own is stored. */
    for (int q = 0; q < QUANTITY_COUNT; q++)
        ck_assert_int_eq(catalogue_default(all, (enum quantity_id)q) != NULL,
                         q != QUANTITY_HARDNESS);
}
END_TEST

TCase *lookup_case(void)
{
    TCase *tc = tcase_create("lookup");
    tcase_add_test(tc, test_spot_values_of_the_sources);
    tcase_add_test(tc, test_gaps_say_why);
    tcase_add_test(tc, test_sites_are_found_by_coordination_and_spin);
    tcase_add_test(tc, test_every_entry_is_found_again);
    tcase_add_test(tc, test_references_come_by_rank);
    return tc;
}
