/* SPDX-License-Identifier: MIT */
/* Every species of every element, from the atom to its last electron: what scf
 * says of its ionization energy is an energy, or a state with a reason. The
 * stored energies are those of NIST ASD 5.12 (2024), doi 10.18434/T4W30F.
 * Arguments: the first and the last atomic number, the step of the charges. */
#include <check.h>
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "study/study.h"

static int first_z, last_z, charge_step;

/* A species that one of the claims below does not hold for. */
struct exception {
    int z, charge;
};

static bool is_among(const struct row *row, const struct exception *list,
                     size_t count)
{
    for (size_t i = 0; i < count; i++)
        if (list[i].z == row->species.z &&
            list[i].charge == row->species.charge)
            return true;
    return false;
}

/* Within 12 % and 0.6 eV of the stored energy. Of six species it is the stored
 * value that is uncertain (theory or extrapolation, up to 9 %): for these, and
 * only for them, two of its own standard uncertainties are added. */
static void check_reference(const struct row *row)
{
    static const struct exception uncertain[] = {
        {84, 1},   /* Po+ 15.8, stored 19.3(1.7) */
        {94, 5},   /* Pu5+ 68.2, 80(4) */
        {103, 10}, /* Lr10+ 172.6, 197.0(2.4) */
        {109, 12}, /* Mt12+ 225.4, 257(3) */
        {110, 12}, /* Ds12+ 232.6, 266(3) */
        {110, 13}, /* Ds13+ 249.6, 288(3) */
    };
    double value = row->value.value.value, stored = row->reference.value.value;
    double off = fabs(value - stored), bound = 0.12 * stored + 0.6;
    bool named =
        is_among(row, uncertain, sizeof uncertain / sizeof uncertain[0]);
    ck_assert_msg(named == (off > bound), "%s, charge %d: %g eV, stored %g, %s",
                  element_at(row->species.z)->symbol, row->species.charge,
                  value, stored, named ? "no exception any more" : "too far");
    ck_assert(!named || (row->reference.has_u &&
                         off < bound + 2.0 * row->reference.u.value));
}

/* Each electron is harder to remove than the last, whatever subshell it is in.
 * One energy falls, by 0.5 %: about the model's error there, with both ions by
 * rule. */
static void check_rise(const struct row *row, const struct row *next)
{
    static const struct exception falls[] = {{111, 16} /* Rg16+ */};
    double value = row->value.value.value, after = next->value.value.value;
    bool named = is_among(row, falls, sizeof falls / sizeof falls[0]);
    ck_assert_msg(named == (after <= value) && after > 0.994 * value,
                  "%s, charge %d to %d: %g to %g eV",
                  element_at(row->species.z)->symbol, row->species.charge,
                  next->species.charge, value, after);
}

static struct row row_of(struct study *study, int z, int charge)
{
    const struct ask ask = {.z = z,
                            .charge = charge,
                            .quantity = QUANTITY_IONIZATION,
                            .model = model_find("scf")};
    struct row row;
    struct status st = status_ok();
    ck_assert_msg(study_row_now(study, &ask, &row, &st), "%s", st.message);
    if (row.value.state != READING_OK) {
        ck_assert_msg(row.value.reason[0] != '\0', "Z = %d, charge %d", z,
                      charge);
        return row;
    }
    ck_assert_msg(row.value.value.value > 0.0, "Z = %d, charge %d: %g eV", z,
                  charge, row.value.value.value);
    ck_assert_msg(!strstr(row.value.remark, "PBE correlation"),
                  "Z = %d, charge %d: %s", z, charge, row.value.remark);
    if (row.reference.state == READING_OK)
        check_reference(&row);
    return row;
}

START_TEST(every_ionization_energy_is_one)
{
    struct status st = status_ok();
    struct study *study = study_new(catalogue_builtin(), &st);
    int energies = 0, species = 0;
    ck_assert_ptr_nonnull(study);
    for (int z = first_z; z <= last_z; z++) {
        struct row before = {.value = {.state = READING_MISSING}};
        for (int charge = 0; charge < z; charge++) {
            if (charge / 2 % charge_step != 0)
                continue; /* in pairs, so that there is a rise to see */
            struct row row = row_of(study, z, charge);
            species++;
            energies += row.value.state == READING_OK;
            if (row.value.state == READING_OK &&
                before.value.state == READING_OK &&
                before.species.charge == charge - 1)
                check_rise(&before, &row);
            before = row;
        }
    }
    printf("# Z = %d to %d: %d species, %d energies\n", first_z, last_z,
           species, energies);
    /* gaps are for atoms that do not converge, not a way out */
    ck_assert_int_ge(energies, species - species / 100);
    study_free(study);
}
END_TEST

int main(int argc, char **argv)
{
    if (argc != 4)
        return 2;
    first_z = (int)strtol(argv[1], NULL, 10);
    last_z = (int)strtol(argv[2], NULL, 10);
    charge_step = (int)strtol(argv[3], NULL, 10);
    Suite *suite = suite_create("species");
    TCase *tc = tcase_create("species");
    tcase_set_timeout(tc, 600);
    tcase_add_test(tc, every_ionization_energy_is_one);
    suite_add_tcase(suite, tc);
    SRunner *runner = srunner_create(suite);
    srunner_run_all(runner, CK_ENV);
    int failed = srunner_ntests_failed(runner);
    srunner_free(runner);
    return failed > 0;
}
