/* SPDX-License-Identifier: MIT */
/* The built-in sets against the texts that they were made from. */
#include <stdio.h>
#include <string.h>

#include "element/configuration.h"
#include "element/element.h"
#include "refdata/catalogue.h"
#include "refdata/dataset.h"
#include "refdata/suites.h"
#include "base/text.h"
#include "support/csv.h"
#include "support/near.h"

static struct csv read_source(const char *name)
{
    char path[512];
    snprintf(path, sizeof path, "%s/data/%s", TEST_DIR, name);
    return csv_read_file(path);
}

static const char *cell(const struct csv *csv, int row, const char *heading)
{
    return csv_cell(csv, (size_t)row, heading);
}

static int cell_int(const struct csv *csv, int row, const char *heading)
{
    int value;
    ck_assert(text_to_int(cell(csv, row, heading), &value));
    return value;
}

/* A printed number equals the text of the source. */
static void same_digits(struct number n, const char *want, const char *where,
                        int z)
{
    char got[NUMBER_TEXT_MAX];
    number_print(n, got);
    ck_assert_msg(strcmp(got, want) == 0, "%s, Z = %d: %s, source %s", where, z,
                  got, want);
}

/* An entry holds exactly what two cells print; an empty cell is nothing. */
static void same_entry(const struct dataset *set, const struct entry *e, int z,
                       const char *value, const char *u)
{
    const char *id = set->provenance.id;
    ck_assert_msg(e != NULL, "%s: no entry for Z = %d", id, z);
    ck_assert_int_eq(e->gap, value[0] ? GAP_NONE : e->gap);
    ck_assert_msg((e->gap == GAP_NONE) == (value[0] != '\0'),
                  "%s, Z = %d: value against gap", id, z);
    if (value[0])
        same_digits(e->value, value, id, z);
    ck_assert_int_eq(e->has_u, u[0] != '\0');
    if (e->has_u)
        same_digits(e->u, u, id, z);
}

/* Numbers of values as counted in the source tables. */
START_TEST(test_every_set_holds_all_its_values)
{
    static const struct {
        const char *id;
        int values;
    } sets[] = {
        {"ionization_nist_asd_2024", 5847},
        {"affinity_compiled_2024", 65},
        {"polarizability_schwerdtfeger_2019", 118},
        {"electronegativity_pauling_1961", 94},
        {"electronegativity_pauling_crc_2005", 85},
        {"electronegativity_pauling_untraced", 4},
        {"electronegativity_allred_rochow_1958", 66},
        {"electronegativity_allen_2000", 74},
        {"electronegativity_mulliken_2016", 97},
        {"calculated_clementi_1967", 83},
        {"covalent_cordero_2008", 101},
        {"covalent_single_pyykko_2009", 118},
        {"covalent_double_pyykko_2009", 109},
        {"covalent_triple_pyykko_2005", 80},
        {"empirical_slater_1964", 87},
        {"metallic_12coord", 49},
        {"metallic_12coord_teatum_1968", 23},
        {"metallic_greenwood_1997", 66},
        {"vdw_bondi_1964", 38},
        {"vdw_alvarez_2013", 93},
        {"vdw_vogt_alvarez_2014", 4},
        {"isodensity_rahm_2016", 96},
        {"isodensity_rahm_2017_corrected", 96},
        {"ionic_effective_shannon_1976", 493},
        {"ionic_crystal_shannon_1976", 493},
        {"zeff_clementi_1963", 95},
    };
    int of_values = 0;
    const struct catalogue *all = catalogue_builtin();
    for (size_t i = 0; i < sizeof sets / sizeof *sets; i++)
        ck_assert_msg(dataset_value_count(need(sets[i].id)) == sets[i].values,
                      "%s: %d values, source has %d", sets[i].id,
                      dataset_value_count(need(sets[i].id)), sets[i].values);
    for (size_t i = 0; i < catalogue_count(all); i++)
        of_values += catalogue_at(all, i)->kind == DATASET_VALUES;
    ck_assert_int_eq(of_values, (int)(sizeof sets / sizeof *sets));
    ck_assert_int_eq(dataset_value_count(catalogue_elements()), 118);
    ck_assert_int_eq(need("cations_nist_asd_2024")->count, 5911);
    ck_assert_int_eq(need("anions_ning_lu_2022")->count, 78);
    ck_assert_int_eq(catalogue_oxidation_states()->count, 373);
    ck_assert_int_eq(catalogue_availability()->count, 118);
}
END_TEST

/* Every set, whatever it holds. */
START_TEST(test_every_set_says_where_it_comes_from)
{
    const struct catalogue *all = catalogue_builtin();
    for (size_t i = 0; i < catalogue_count(all); i++) {
        const struct dataset *set = catalogue_at(all, i);
        const struct provenance *p = &set->provenance;
        ck_assert_msg(p->citation_count > 0, "%s: citation", p->id);
        for (int k = 0; set->values && k < set->count; k++)
            ck_assert_msg(set->values[k].source <= p->citation_count,
                          "%s: entry %d: source", p->id, k);
        ck_assert_msg(set->note_count > 0, "%s: notes", p->id);
        ck_assert_str_eq(set->licence, "facts; cited");
        ck_assert(!p->computed && set->absent[0] &&
                  (set->kind != DATASET_VALUES || p->definition));
        ck_assert_msg(catalogue_find(all, p->id) == set, "%s: twice", p->id);
        ck_assert(set->kind != DATASET_VALUES || set->rank > 0);
        ck_assert_int_eq(set->first[Z_MAX + 1], set->count);
    }
}
END_TEST

/* One paper has one key, so that a bibliography holds it once. */
static void same_paper(const struct citation *a, const struct citation *b)
{
    bool same_key = strcmp(a->key, b->key) == 0;
    bool same_doi = a->doi && b->doi && strcmp(a->doi, b->doi) == 0;
    ck_assert_msg(!same_doi || same_key, "%s and %s: one doi", a->key, b->key);
    if (!same_key)
        return;
    ck_assert_msg((!a->doi && !b->doi) || same_doi, "%s: two dois", a->key);
    ck_assert_int_eq(a->year, b->year);
    ck_assert_msg(a->title == b->title || strcmp(a->title, b->title) == 0,
                  "%s: two titles", a->key);
}

START_TEST(test_one_paper_has_one_key)
{
    const struct catalogue *all = catalogue_builtin();
    for (size_t i = 0; i < catalogue_count(all); i++) {
        const struct provenance *a = &catalogue_at(all, i)->provenance;
        for (size_t j = 0; j <= i; j++) {
            const struct provenance *b = &catalogue_at(all, j)->provenance;
            for (int m = 0; m < a->citation_count; m++)
                for (int n = 0; n < b->citation_count; n++)
                    same_paper(&a->citations[m], &b->citations[n]);
        }
    }
}
END_TEST

START_TEST(test_ionization_energies_are_the_source_digit_for_digit)
{
    static const struct {
        const char *kind;
        enum evidence evidence;
        int count;
    } kinds[] = {
        {"measured", EVIDENCE_MEASURED, 311},
        {"interpolated_or_extrapolated", EVIDENCE_EXTRAPOLATED, 919},
        {"theoretical", EVIDENCE_THEORETICAL, 4617},
    };
    int counts[3] = {0};
    const struct dataset *set = need("ionization_nist_asd_2024");
    struct csv csv = read_source("ionization.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 5847);
    for (int i = 0; i < (int)csv_rows(&csv); i++) {
        int z = cell_int(&csv, i, "z");
        const struct entry *e =
            dataset_lookup(set, z, cell_int(&csv, i, "stage") - 1, 0, 0);
        same_entry(set, e, z, cell(&csv, i, "energy_eV"),
                   cell(&csv, i, "uncertainty_eV"));
        ck_assert_str_eq(cell(&csv, i, "symbol"), element_at(z)->symbol);
        int k = 0;
        while (strcmp(kinds[k].kind, cell(&csv, i, "kind")) != 0)
            ck_assert_int_lt(++k, 3);
        ck_assert_int_eq(e->evidence, kinds[k].evidence);
        ck_assert_str_eq(dataset_text(set, e->remark),
                         k == 0 ? "" : evidence_word(kinds[k].evidence));
        counts[k]++;
    }
    for (int k = 0; k < 3; k++)
        ck_assert_int_eq(counts[k], kinds[k].count);
    csv_free(&csv);
}
END_TEST

START_TEST(test_ionization_energies_rise_with_the_stage)
{
    const struct dataset *set = need("ionization_nist_asd_2024");
    for (int i = 1; i < set->count; i++) {
        const struct entry *a = &set->values[i - 1];
        const struct entry *b = &set->values[i];
        if (a->z == b->z)
            ck_assert_msg(b->charge > a->charge &&
                              b->value.value > a->value.value,
                          "Z = %d, charge %d", b->z, b->charge);
    }
}
END_TEST

START_TEST(test_radii_are_the_source_digit_for_digit)
{
    struct csv csv = read_source("radii.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 1043);
    for (int i = 0; i < (int)csv_rows(&csv); i++) {
        const struct dataset *set = need(cell(&csv, i, "set"));
        int z = cell_int(&csv, i, "z");
        const char *note = cell(&csv, i, "note");
        const char *value = cell(&csv, i, "value_pm");
        /* Variants: take the one with these digits. */
        const struct entry *found = NULL;
        for (int k = set->first[z]; k < set->first[z + 1]; k++) {
            char text[NUMBER_TEXT_MAX];
            if (strcmp(number_print(set->values[k].value, text), value) == 0)
                found = &set->values[k];
        }
        same_entry(set, found, z, value, cell(&csv, i, "uncertainty_pm"));
        /* What the note says of the value is kept, as text or as state. */
        if (strstr(note, "low spin"))
            ck_assert_int_eq(found->spin, SPIN_LOW);
        else if (strstr(note, "high spin"))
            ck_assert_int_eq(found->spin, SPIN_HIGH);
        else if (set == need("metallic_greenwood_1997"))
            ck_assert_ptr_nonnull(strstr(set->notes[0], "as found"));
        else
            ck_assert_msg(strcmp(note, dataset_text(set, found->remark)) == 0 ||
                              found->evidence == EVIDENCE_ESTIMATED,
                          "%s, Z = %d: '%s' against '%s'", set->provenance.id,
                          z, note, dataset_text(set, found->remark));
    }
    csv_free(&csv);
}
END_TEST

START_TEST(test_ionic_radii_are_the_source_digit_for_digit)
{
    const struct dataset *sets[] = {need("ionic_effective_shannon_1976"),
                                    need("ionic_crystal_shannon_1976")};
    static const char *const headings[] = {"ionic_radius_pm",
                                           "crystal_radius_pm"};
    struct csv csv = read_source("ionic_radii_shannon_1976.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 493);
    for (int i = 0; i < (int)csv_rows(&csv); i++) {
        int z = cell_int(&csv, i, "z");
        const char *spin = cell(&csv, i, "spin");
        bool deuterium = strcmp(cell(&csv, i, "symbol"), "D") == 0;
        for (int s = 0; s < 2; s++) {
            const struct dataset *set = sets[s];
            const struct entry *found = NULL;
            for (int k = set->first[z]; k < set->first[z + 1]; k++) {
                const struct entry *e = &set->values[k];
                if (e->charge == cell_int(&csv, i, "charge") &&
                    strcmp(coordination_id((enum coordination)e->coordination),
                           cell(&csv, i, "coordination")) == 0 &&
                    e->spin == (strcmp(spin, "HS") == 0   ? SPIN_HIGH
                                : strcmp(spin, "LS") == 0 ? SPIN_LOW
                                                          : SPIN_NONE) &&
                    deuterium == (e->variant != 0))
                    found = e;
            }
            same_entry(set, found, z, cell(&csv, i, headings[s]), "");
            const char *flag = cell(&csv, i, "flag");
            unsigned marks = 0;
            for (int m = 0; m < set->mark_count; m++)
                if (strstr(flag, set->marks[m].id))
                    marks |= 1u << m;
            ck_assert_uint_eq(found->marks, marks);
        }
    }
    csv_free(&csv);
}
END_TEST

START_TEST(test_electronegativities_are_the_source_digit_for_digit)
{
    static const struct {
        const char *scale, *id;
    } sets[] = {
        {"pauling", "electronegativity_pauling_1961"},
        {"pauling_crc", "electronegativity_pauling_crc_2005"},
        {"pauling_untraced", "electronegativity_pauling_untraced"},
        {"allred_rochow_1958", "electronegativity_allred_rochow_1958"},
        {"allen", "electronegativity_allen_2000"},
        {"mulliken", "electronegativity_mulliken_2016"},
    };
    struct csv csv = read_source("electronegativity.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 420);
    for (int i = 0; i < (int)csv_rows(&csv); i++) {
        size_t s = 0;
        while (strcmp(sets[s].scale, cell(&csv, i, "scale")) != 0)
            ck_assert_uint_lt(++s, sizeof sets / sizeof *sets);
        const struct dataset *set = need(sets[s].id);
        int z = cell_int(&csv, i, "z");
        const struct entry *e = dataset_lookup(set, z, 0, 0, 0);
        same_entry(set, e, z, cell(&csv, i, "value"), "");
        const char *note = cell(&csv, i, "note");
        if (strncmp(note, "eV", 2) == 0)
            note += note[2] ? 4 : 2;
        ck_assert_str_eq(dataset_text(set, e->note), note);
    }
    ck_assert_str_eq(need("electronegativity_mulliken_2016")->unit->id, "eV");
    csv_free(&csv);
}
END_TEST

START_TEST(test_affinities_and_polarizabilities_are_the_source)
{
    const struct dataset *affinity = need("affinity_compiled_2024");
    const struct dataset *anions = need("anions_ning_lu_2022");
    struct csv csv = read_source("electron_affinity.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 118);
    for (int i = 0; i < (int)csv_rows(&csv); i++) {
        int z = cell_int(&csv, i, "z");
        const char *status = cell(&csv, i, "status");
        const char *configuration = cell(&csv, i, "anion_configuration");
        const struct entry *e = dataset_lookup(affinity, z, 0, 0, 0);
        same_entry(affinity, e, z, cell(&csv, i, "energy_eV"),
                   cell(&csv, i, "uncertainty_eV"));
        ck_assert_str_eq(e->gap ? gap_id((enum gap)e->gap) : "measured",
                         status);
        ck_assert(!e->gap || dataset_text(affinity, e->note)[0]);
        ck_assert_int_eq(e->gap == GAP_NONE, e->marks != 0);
        const struct configuration_entry *c =
            dataset_configuration(anions, z, -1);
        ck_assert_str_eq(c ? dataset_text(anions, c->configuration) : "",
                         configuration);
        ck_assert_str_eq(c ? dataset_text(anions, c->term) : "",
                         cell(&csv, i, "anion_term"));
    }
    csv_free(&csv);
    const struct dataset *alpha = need("polarizability_schwerdtfeger_2019");
    csv = read_source("polarizability.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 118);
    ck_assert_int_eq((int)csv_rows(&csv), 118);
    for (int i = 0; i < (int)csv_rows(&csv); i++)
        same_entry(alpha, dataset_lookup(alpha, i + 1, 0, 0, 0), i + 1,
                   cell(&csv, i, "value_au"), cell(&csv, i, "uncertainty_au"));
    csv_free(&csv);
}
END_TEST

/* zeff is n times the printed exponent (Clementi, Raimondi 1963). */
START_TEST(test_the_1963_table_is_the_source)
{
    const struct dataset *set = need("zeff_clementi_1963");
    struct csv csv = read_source("clementi_zeff.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 95);
    for (int i = 0; i < (int)csv_rows(&csv); i++) {
        int n, l;
        double zeta;
        int z = cell_int(&csv, i, "z");
        ck_assert(subshell_parse(cell(&csv, i, "subshell"), &n, &l));
        const struct entry *e = dataset_lookup(set, z, 0, n, l);
        same_entry(set, e, z, cell(&csv, i, "zeff"), "");
        ck_assert(sscanf(cell(&csv, i, "zeta"), "%lf", &zeta) == 1);
        near(e->value.value, n * zeta, 6e-5, 0.0, "Z = %d, n = %d", z, n);
    }
    csv_free(&csv);
}
END_TEST

START_TEST(test_elements_are_the_source_and_agree_with_the_grid)
{
    const struct dataset *set = catalogue_elements();
    struct csv csv = read_source("elements.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 118);
    for (int z = 1; z <= (int)csv_rows(&csv); z++) {
        const struct element *e = element_at(z);
        const struct element_facts *f = dataset_element(set, z);
        const char *group = cell(&csv, z - 1, "group");
        const char *weight = cell(&csv, z - 1, "standard_atomic_weight");
        const char *mass = cell(&csv, z - 1, "longest_lived_mass_number");
        ck_assert_int_eq(cell_int(&csv, z - 1, "z"), z);
        ck_assert_str_eq(cell(&csv, z - 1, "symbol"), e->symbol);
        ck_assert_int_eq(cell_int(&csv, z - 1, "period"), e->period);
        ck_assert_int_eq(group[0] ? cell_int(&csv, z - 1, "group") : 0,
                         e->group);
        ck_assert_int_eq(cell(&csv, z - 1, "block")[0], e->block);
        ck_assert_str_eq(cell(&csv, z - 1, "configuration"),
                         dataset_text(set, f->configuration));
        ck_assert_str_eq(cell(&csv, z - 1, "term"), dataset_text(set, f->term));
        ck_assert_str_eq(cell(&csv, z - 1, "category"),
                         dataset_text(set, f->category));
        ck_assert_str_eq(cell(&csv, z - 1, "note"), dataset_text(set, f->note));
        ck_assert_int_eq(f->has_weight, weight[0] != '\0');
        if (f->has_weight)
            same_digits(f->weight, weight, "weight", z);
        ck_assert_int_eq(
            f->longest_lived,
            mass[0] ? cell_int(&csv, z - 1, "longest_lived_mass_number") : 0);
        ck_assert_int_eq(
            f->has_stable_isotope,
            strcmp(cell(&csv, z - 1, "has_stable_isotope"), "yes") == 0);
        ck_assert_int_eq(f->status, z <= 103 ? CONFIGURATION_LISTED
                                             : CONFIGURATION_PREDICTED);
    }
    csv_free(&csv);
}
END_TEST

START_TEST(test_cations_are_the_source)
{
    const struct dataset *set = need("cations_nist_asd_2024");
    struct csv csv = read_source("cation_configurations.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 5911);
    for (int i = 0; i < (int)csv_rows(&csv); i++) {
        int z = cell_int(&csv, i, "z");
        const struct configuration_entry *c =
            dataset_configuration(set, z, cell_int(&csv, i, "charge"));
        ck_assert_ptr_nonnull(c);
        ck_assert_str_eq(cell(&csv, i, "configuration"),
                         dataset_text(set, c->configuration));
        ck_assert_str_eq(cell(&csv, i, "term"), dataset_text(set, c->term));
        ck_assert_str_eq(cell(&csv, i, "note"), dataset_text(set, c->note));
        ck_assert_int_eq(c->irregular,
                         strcmp(cell(&csv, i, "irregular"), "yes") == 0);
    }
    csv_free(&csv);
}
END_TEST

START_TEST(test_oxidation_states_and_availability_are_the_source)
{
    const struct dataset *set = catalogue_oxidation_states();
    struct csv csv = read_source("oxidation_states.csv");
    ck_assert_int_eq((int)csv_rows(&csv), set->count);
    for (int i = 0; i < (int)csv_rows(&csv); i++) {
        int z = cell_int(&csv, i, "z");
        bool found = false;
        for (int k = set->first[z]; k < set->first[z + 1]; k++) {
            const struct oxidation_state *o = &set->oxidation_states[k];
            bool is_main = strcmp(cell(&csv, i, "kind"), "main") == 0;
            if (o->state == cell_int(&csv, i, "state") && o->main == is_main)
                found = true;
        }
        ck_assert_msg(found, "Z = %d, row %d", z, i);
    }
    csv_free(&csv);
    set = catalogue_availability();
    csv = read_source("availability.csv");
    ck_assert_int_eq((int)csv_rows(&csv), 118);
    for (int i = 0; i < (int)csv_rows(&csv); i++) {
        const struct availability *a = dataset_availability(set, i + 1);
        const char *crust = cell(&csv, i, "crustal_abundance_mg_per_kg");
        const char *bulk = cell(&csv, i, "crustal_abundance_rg2014_mg_per_kg");
        ck_assert_int_eq(a->has_abundance, crust[0] != '\0');
        if (a->has_abundance)
            same_digits(a->abundance, crust, "abundance", i + 1);
        ck_assert_int_eq(a->has_abundance_2014, bulk[0] != '\0');
        if (a->has_abundance_2014)
            same_digits(a->abundance_2014, bulk, "abundance_2014", i + 1);
        ck_assert_str_eq(radioactive_id((enum radioactive)a->radioactive),
                         cell(&csv, i, "radioactive"));
        ck_assert_str_eq(dataset_text(set, a->hazards),
                         cell(&csv, i, "hazard"));
        ck_assert_str_eq(dataset_text(set, a->critical),
                         cell(&csv, i, "critical_raw_material"));
        ck_assert_int_eq(a->hazards != 0, a->hazard_basis != 0);
    }
    csv_free(&csv);
}
END_TEST

TCase *builtin_case(void)
{
    TCase *tc = tcase_create("builtin");
    tcase_add_test(tc, test_every_set_holds_all_its_values);
    tcase_add_test(tc, test_every_set_says_where_it_comes_from);
    tcase_add_test(tc, test_one_paper_has_one_key);
    tcase_add_test(tc, test_ionization_energies_are_the_source_digit_for_digit);
    tcase_add_test(tc, test_ionization_energies_rise_with_the_stage);
    tcase_add_test(tc, test_radii_are_the_source_digit_for_digit);
    tcase_add_test(tc, test_ionic_radii_are_the_source_digit_for_digit);
    tcase_add_test(tc, test_electronegativities_are_the_source_digit_for_digit);
    tcase_add_test(tc, test_affinities_and_polarizabilities_are_the_source);
    tcase_add_test(tc, test_the_1963_table_is_the_source);
    tcase_add_test(tc, test_elements_are_the_source_and_agree_with_the_grid);
    tcase_add_test(tc, test_cations_are_the_source);
    tcase_add_test(tc, test_oxidation_states_and_availability_are_the_source);
    return tc;
}
