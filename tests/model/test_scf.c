/* SPDX-License-Identifier: MIT */
/* The scf model: what its numbers are and when it has none. test_scf_errors.c
 * compares them with outside values. */
#include <check.h>
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/units.h"
#include "scf_case.h"
#include "support/near.h"
#include "support/run.h"

/* One electron has the energy mc² (1 - √(1 - (Zα)²)) with the Dirac equation
 * (C. G. Darwin, Proc. R. Soc. A 118, 654 (1928)); the model errs by what its
 * functionals leave of the electron's repulsion of itself. */
START_TEST(a_one_electron_ion_is_nearly_exact)
{
    struct scf_case scf;
    scf_open(&scf);
    struct question q = {.has_cation = true};
    struct status st = status_ok();
    q.species = (struct species){.z = 92, .charge = 91};
    q.cation = (struct species){.z = 92, .charge = 92};
    ck_assert(configuration_parse("1s1", &q.species.configuration, &st));
    scf_ask(&scf, &q);
    double za = 92.0 / SPEED_OF_LIGHT_AU;
    double exact = SPEED_OF_LIGHT_AU * SPEED_OF_LIGHT_AU *
                   (1.0 - sqrt(1.0 - za * za)) * HARTREE_EV;
    struct reading r = scf_read(&scf, QUANTITY_IONIZATION, NULL, 0, 0);
    ck_assert_int_eq(r.state, READING_OK);
    near(r.value.value, exact, 0.0, 2e-3, "U91+");
    ck_assert(!r.has_u);
    r = scf_read(&scf, QUANTITY_ISODENSITY, NULL, 0, 0);
    ck_assert_int_eq(r.state, READING_OK);
    scf_close(&scf);
}
END_TEST

START_TEST(definitions_of_the_effective_charge_are_kept_apart)
{
    struct scf_case scf;
    scf_open(&scf);
    scf_solve(&scf, 26, 0);
    double ionization =
        scf_read(&scf, QUANTITY_IONIZATION, NULL, 0, 0).value.value;
    struct reading outer =
        scf_read(&scf, QUANTITY_ZEFF, &definition_zeff_energy, 0, 0);
    ck_assert(outer.n == 4 && outer.l == 0);
    near(outer.value.value, 4.0 * sqrt(ionization / RYDBERG_EV), 0.0, 1e-8,
         "Fe 4s from the energy");
    /* by size and by Gauss's law the charge falls from shell to shell */
    const struct definition *const definitions[] = {&definition_zeff_size,
                                                    &definition_zeff_enclosed};
    for (size_t d = 0; d < 2; d++) {
        double before = 26.0;
        for (int n = 1; n <= 4; n++) {
            struct reading r =
                scf_read(&scf, QUANTITY_ZEFF, definitions[d], n, 0);
            ck_assert_int_eq(r.state, READING_OK);
            ck_assert(r.value.value < before && r.value.value > 1.0);
            before = r.value.value;
        }
    }
    ck_assert_int_eq(scf_read(&scf, QUANTITY_RADIUS, NULL, 5, 0).state,
                     READING_OUTSIDE);
    scf_close(&scf);
}
END_TEST

/* What is not bound is outside the model, with that reason. */
START_TEST(an_unbound_anion_gives_gaps_with_the_reason)
{
    struct scf_case scf;
    scf_open(&scf);
    struct question q = {.has_cation = true};
    struct status st = status_ok();
    q.species = (struct species){.z = 1, .charge = -1};
    q.cation = (struct species){.z = 1};
    ck_assert(configuration_parse("1s2", &q.species.configuration, &st));
    ck_assert(configuration_parse("1s1", &q.cation.configuration, &st));
    scf_ask(&scf, &q);
    for (int offer = 0; offer < scf.model->offer_count; offer++) {
        struct reading r = scf.model->read(scf.work, offer, 0, 0);
        ck_assert_int_eq(r.state, READING_OUTSIDE);
        ck_assert_ptr_nonnull(strstr(r.reason, "bound"));
    }
    scf_close(&scf);
}
END_TEST

/* Maxima of 6p1/2 in relativistic atoms with Slater's exchange: 131.9 and 121.5
 * pm (J. T. Waber, D. T. Cromer, J. Chem. Phys. 42, 4116 (1965); the two values
 * from memory). The mean over j is 15 % larger. */
START_TEST(the_outermost_radius_is_that_of_the_highest_level)
{
    static const struct {
        int z;
        double radius;
    } maximum[] = {{81, 131.9}, {82, 121.5}};
    struct scf_case scf;
    scf_open(&scf);
    for (int i = 0; i < 2; i++) {
        scf_solve(&scf, maximum[i].z, 0);
        struct reading r = scf_read(&scf, QUANTITY_RADIUS, NULL, 0, 0);
        ck_assert_int_eq(r.state, READING_OK);
        near(r.value.value, maximum[i].radius, 0.0, 0.06, "Z = %d",
             maximum[i].z);
        ck_assert_str_eq(r.remark, "of 6p1/2, the highest occupied level");
        r = scf_read(&scf, QUANTITY_RADIUS, NULL, 6, 1);
        ck_assert_str_eq(r.remark, "of 6p1/2, the highest occupied level");
        r = scf_read(&scf, QUANTITY_RADIUS, NULL, 5, 2);
        ck_assert(!r.remark || !strstr(r.remark, "/2"));
    }
    scf_solve(&scf, 83, 0); /* the third electron goes to 6p3/2 */
    struct reading r = scf_read(&scf, QUANTITY_RADIUS, NULL, 0, 0);
    ck_assert_str_eq(r.remark, "of 6p3/2, the highest occupied level");
    double bismuth = r.value.value;
    scf_solve(&scf, 82, 0);
    ck_assert(bismuth > scf_value(&scf, QUANTITY_RADIUS, NULL, 0, 0));
    scf_close(&scf);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("model scf");
    TCase *c = tcase_create("scf");
    suite_add_tcase(suite, c);
    suite_add_tcase(suite, case_scf_errors());
    tcase_add_test(c, a_one_electron_ion_is_nearly_exact);
    tcase_add_test(c, definitions_of_the_effective_charge_are_kept_apart);
    tcase_add_test(c, an_unbound_anion_gives_gaps_with_the_reason);
    tcase_add_test(c, the_outermost_radius_is_that_of_the_highest_level);
    return run_suite(suite);
}
