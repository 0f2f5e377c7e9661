/* SPDX-License-Identifier: MIT */
#include <math.h>
#include <string.h>

#include "element/selection.h"
#include "refdata/catalogue.h"
#include "refdata/ground.h"
#include "refdata/suites.h"

static struct species ground(int z, int charge)
{
    struct species s;
    struct status st = status_ok();
    ck_assert_msg(ground_state(z, charge, &s, &st), "%s", st.message);
    return s;
}

static void is(int z, int charge, const char *configuration,
               enum configuration_origin origin, const char *term)
{
    char text[CONFIGURATION_TEXT_MAX];
    struct species s = ground(z, charge);
    ck_assert_str_eq(configuration_print(&s.configuration, text),
                     configuration);
    ck_assert_int_eq(s.origin, origin);
    ck_assert_str_eq(s.term.text, term);
}

START_TEST(test_every_ground_state_holds_z_minus_charge_electrons)
{
    for (int z = 1; z <= Z_MAX; z++)
        for (int charge = 0; charge <= z; charge++) {
            struct species s = ground(z, charge);
            double electrons = configuration_electrons(&s.configuration);
            ck_assert_msg(fabs(electrons - (z - charge)) < 1e-9 && s.z == z &&
                              s.charge == charge,
                          "Z = %d, charge %d: %g electrons", z, charge,
                          electrons);
        }
}
END_TEST

/* NIST ASD 5.12: chromium, its irregular ions, and Th2+. */
START_TEST(test_stored_states_come_first)
{
    is(24, 0, "[Ar] 3d5 4s1", ORIGIN_STORED, "7S3");
    is(26, 2, "[Ar] 3d6", ORIGIN_STORED, "5D4");
    is(90, 2, "[Rn] 5f1 6d1", ORIGIN_STORED, "3H*4");
    is(1, 0, "1s1", ORIGIN_STORED, "2S1/2");
    is(17, -1, "[Ne] 3s2 3p6", ORIGIN_STORED, "1S0");
    is(108, 0, "[Rn] 5f14 6d6 7s2", ORIGIN_PREDICTED, "J=4");
    is(118, 0, "[Rn] 5f14 6d10 7s2 7p6", ORIGIN_PREDICTED, "");
    struct species s = ground(24, 0);
    ck_assert_int_eq(s.term.multiplicity, 7);
    ck_assert_int_eq(s.term.big_l, 0);
    ck_assert_int_eq(s.term.twice_j, 6);
}
END_TEST

/* NIST ASD 5.12: where 4f, 5s and 5p compete the rule is wrong. */
START_TEST(test_highly_charged_ions_are_stored)
{
    is(26, 8, "[Ne] 3s2 3p6", ORIGIN_STORED, "1S0");
    is(26, 10, "[Ne] 3s2 3p4", ORIGIN_STORED, "3P2");
    is(26, 25, "1s1", ORIGIN_STORED, "2S1/2");
    is(74, 10, "[Kr] 4d10 4f14 5s2 5p2", ORIGIN_STORED, "3P0");
    is(74, 11, "[Kr] 4d10 4f13 5s2 5p2", ORIGIN_STORED, "4F*7/2");
    is(74, 12, "[Kr] 4d10 4f14 5s2", ORIGIN_STORED, "1S0");
    is(74, 14, "[Kr] 4d10 4f12 5s2", ORIGIN_STORED, "3H6");
    is(108, 107, "1s1", ORIGIN_PREDICTED, "2S1/2");
}
END_TEST

START_TEST(test_ions_beyond_the_tables_lose_the_outermost_electrons)
{
    /* Nothing is stored of element 118 but the atom: 7p goes before 7s. */
    is(118, 6, "[Rn] 5f14 6d10 7s2", ORIGIN_RULE, "");
    is(118, 7, "[Rn] 5f14 6d10 7s1", ORIGIN_RULE, "");
    is(118, 9, "[Rn] 5f14 6d9", ORIGIN_RULE, "");
    is(118, 117, "1s1", ORIGIN_RULE, "");
    is(26, 26, "none", ORIGIN_RULE, "");
    is(1, 1, "none", ORIGIN_RULE, "");
    is(118, 1, "[Rn] 5f14 6d10 7s2 7p5", ORIGIN_RULE, "");
}
END_TEST

/* The subshell with the highest n, then highest l, outside the noble-gas core.
 */
static struct subshell outside_core(const struct configuration *c)
{
    char text[CONFIGURATION_TEXT_MAX];
    struct status st = status_ok();
    struct configuration outer;
    configuration_print(c, text);
    const char *close = strchr(text, ']');
    ck_assert_msg(configuration_parse(close ? close + 1 : text, &outer, &st),
                  "%s", st.message);
    return *configuration_outermost(&outer);
}

/* Configurations marked irregular are those that differ from the next lower
 * charge by more than one electron of the outermost subshell, up to charge 8
 * outside the noble-gas core (definition in the notes of the data set). */
START_TEST(test_a_regular_ion_lost_an_outer_electron)
{
    const struct dataset *set =
        catalogue_find(catalogue_builtin(), "cations_nist_asd_2024");
    ck_assert_ptr_nonnull(set);
    int irregular = 0;
    for (int i = 0; i < set->count; i++) {
        const struct configuration_entry *c = &set->configurations[i];
        struct species before = ground(c->z, c->charge - 1);
        struct species after = ground(c->z, c->charge);
        struct configuration *b = &before.configuration;
        struct subshell outer =
            c->charge > 8 ? *configuration_outermost(b) : outside_core(b);
        if (before.origin == ORIGIN_RULE)
            continue; /* the source has no next lower charge */
        bool removed = configuration_change(b, outer.n, outer.l, -1.0);
        ck_assert(removed);
        bool same = configuration_same(b, &after.configuration);
        irregular += c->irregular;
        ck_assert_msg(same == !c->irregular, "%s%d+", element_at(c->z)->symbol,
                      c->charge);
        ck_assert(!c->irregular || dataset_text(set, c->note)[0]);
        ck_assert_str_eq(ground_note(c->z, c->charge),
                         dataset_text(set, c->note));
    }
    ck_assert_int_eq(irregular, 266);
}
END_TEST

START_TEST(test_what_is_no_ion_is_refused)
{
    struct species s = {.z = -1};
    struct status st = status_ok();
    ck_assert(!ground_state(3, 4, &s, &st));
    ck_assert_int_eq(st.code, STATUS_USAGE);
    ck_assert_str_eq(st.message, "charge 4: Li has only 3 electrons to lose");
    ck_assert(!ground_state(8, CHARGE_LOWEST - 1, &s, &st));
    ck_assert_int_eq(st.code, STATUS_USAGE);
    ck_assert_int_eq(s.z, -1);
}
END_TEST

START_TEST(test_anions_fill_the_first_room_by_rule)
{
    for (int z = 1; z <= Z_MAX; z++)
        for (int charge = CHARGE_LOWEST; charge < 0; charge++) {
            struct species s;
            struct status st = status_ok();
            ck_assert(ground_state(z, charge, &s, &st));
            ck_assert(configuration_electrons(&s.configuration) == z - charge);
        }
    /* Common practice, no source: the closed shells of oxide, nitride and
     * hydride. */
    static const struct {
        int z, charge;
        const char *configuration;
    } anions[] = {{8, -2, "[He] 2s2 2p6"},
                  {7, -3, "[He] 2s2 2p6"},
                  {16, -2, "[Ne] 3s2 3p6"},
                  {2, -1, "[He] 2s1"}};
    for (size_t i = 0; i < sizeof anions / sizeof anions[0]; i++) {
        struct species s;
        struct status st = status_ok();
        char out[CONFIGURATION_TEXT_MAX];
        ck_assert(ground_state(anions[i].z, anions[i].charge, &s, &st));
        ck_assert_int_eq(s.origin, ORIGIN_RULE);
        ck_assert_str_eq(configuration_print(&s.configuration, out),
                         anions[i].configuration);
    }
}
END_TEST

TCase *ground_case(void)
{
    TCase *tc = tcase_create("ground");
    tcase_add_test(tc, test_anions_fill_the_first_room_by_rule);
    tcase_add_test(tc, test_every_ground_state_holds_z_minus_charge_electrons);
    tcase_add_test(tc, test_stored_states_come_first);
    tcase_add_test(tc, test_highly_charged_ions_are_stored);
    tcase_add_test(tc,
                   test_ions_beyond_the_tables_lose_the_outermost_electrons);
    tcase_add_test(tc, test_a_regular_ion_lost_an_outer_electron);
    tcase_add_test(tc, test_what_is_no_ion_is_refused);
    return tc;
}
