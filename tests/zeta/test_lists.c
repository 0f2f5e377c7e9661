/* SPDX-License-Identifier: MIT */
/* Long lists and random configurations: all end in a minimum or a state. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "solve.h"
#include "suites.h"
#include "support/csv.h"
#include "support/near.h"

/* Every listed atom and ion ends in a true minimum with its shells in order. */
START_TEST(every_listed_atom_and_cation_ends_in_a_minimum)
{
    struct zeta *work = work_space();
    struct csv csv = csv_read_file("data/species.csv");
    ck_assert_uint_eq(csv_rows(&csv), 118 + 828);
    int unbound = 0;
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        int z = (int)csv_number(&csv, i, "z");
        const char *text = csv_cell(&csv, i, "configuration");
        double mean = 0.0, lowest;
        for (int c = ZETA_AVERAGE; c >= ZETA_HUND; c--) {
            struct zeta_result r =
                solve(work, z, text, (enum zeta_coupling)c, NULL);
            ck_assert_msg(has_values(&r), "Z=%d %s: %s", z, text, r.reason);
            near(r.virial, 2.0, 1e-12, 0, "Z=%d %s virial", z, text);
            ck_assert_msg(r.gradient_norm < 1e-7 * fabs(r.total),
                          "Z=%d %s gradient %g", z, text, r.gradient_norm);
            ck_assert_msg(zeta_is_minimum(work, &lowest), "Z=%d %s: %g", z,
                          text, lowest);
            if (c == ZETA_AVERAGE)
                mean = r.total;
            else if (mean < r.total - 1e-9)
                /* highest S, then highest L need not be lowest of two open
                 * subshells; of one it is (no row of the list has more
                 * than three) */
                ck_assert_msg(strlen(text) > 12, "Z=%d %s", z, text);
            if (c == ZETA_HUND && i < 103)
                unbound += r.state == ZETA_UNBOUND;
        }
    }
    ck_assert_int_eq(unbound, 35);
    csv_free(&csv);
    zeta_free(work);
}
END_TEST

/* Every charge of every element down to one electron, taken by rule from
 * highest n, then highest l. */
START_TEST(every_charge_of_every_element_ends_in_a_minimum)
{
    struct zeta *work = work_space();
    struct csv csv = csv_read_file("data/species.csv");
    int solved = 0;
    for (int z = 1; z <= 118; z++) {
        struct status st = status_ok();
        struct configuration c;
        const char *text = csv_cell(&csv, (size_t)z - 1, "configuration");
        ck_assert(configuration_parse(text, &c, &st));
        for (int charge = 0; charge < z; charge++) {
            struct zeta_problem problem = {z, &c, ZETA_HUND, NULL};
            struct zeta_result r;
            double lowest;
            ck_assert(zeta_begin(work, &problem));
            while (zeta_step(work))
                ;
            zeta_read(work, &r);
            ck_assert_msg(has_values(&r), "Z=%d charge %d: %s", z, charge,
                          r.reason);
            near(r.virial, 2.0, 1e-12, 0, "Z=%d charge %d", z, charge);
            if (charge % 5 == 0)
                ck_assert_msg(zeta_is_minimum(work, &lowest),
                              "Z=%d charge %d: %g", z, charge, lowest);
            const struct subshell *outer = configuration_outermost(&c);
            ck_assert(configuration_change(&c, outer->n, outer->l, -1.0));
            solved++;
        }
    }
    ck_assert_int_eq(solved, 118 * 119 / 2);
    csv_free(&csv);
    zeta_free(work);
}
END_TEST

/* A linear congruential generator of the test's own (Knuth, The Art of
 * Computer Programming, vol. 2, section 3.3.4, table 1, line 26): the same
 * numbers everywhere. */
static unsigned random_below(unsigned long long *state, unsigned bound)
{
    *state = *state * 6364136223846793005ULL + 1442695040888963407ULL;
    return (unsigned)(*state >> 33) % bound;
}

/* Electrons thrown one by one into the valence subshells outside a core. */
static int random_valence(unsigned long long *state, char text[80], int *charge)
{
    static const struct {
        const char *core;
        int electrons, count;
        struct {
            int n, l;
        } valence[4];
    } rooms[] = {
        {"He", 2, 2, {{2, 0}, {2, 1}}},
        {"Ne", 10, 3, {{3, 0}, {3, 1}, {3, 2}}},
        {"Ar", 18, 3, {{4, 0}, {3, 2}, {4, 1}}},
        {"Kr", 36, 4, {{5, 0}, {4, 2}, {5, 1}, {4, 3}}},
        {"Xe", 54, 4, {{6, 0}, {4, 3}, {5, 2}, {6, 1}}},
        {"Rn", 86, 4, {{7, 0}, {5, 3}, {6, 2}, {7, 1}}},
    };
    for (;;) {
        unsigned k = random_below(state, 6);
        int room = 0, occ[4] = {0};
        for (int i = 0; i < rooms[k].count; i++)
            room += 4 * rooms[k].valence[i].l + 2;
        int valence = 1 + (int)random_below(state, (unsigned)room);
        *charge = (int)random_below(state, 4);
        int z = rooms[k].electrons + valence + *charge;
        if (z > 118)
            continue;
        for (int left = valence; left > 0;) {
            unsigned i = random_below(state, (unsigned)rooms[k].count);
            if (occ[i] < 4 * rooms[k].valence[i].l + 2) {
                occ[i]++;
                left--;
            }
        }
        int length = snprintf(text, 80, "[%s]", rooms[k].core);
        for (int i = 0; i < rooms[k].count; i++)
            if (occ[i] > 0)
                length +=
                    snprintf(text + length, (size_t)(80 - length), " %d%c%d",
                             rooms[k].valence[i].n,
                             subshell_letter(rooms[k].valence[i].l), occ[i]);
        return z;
    }
}

START_TEST(random_valence_configurations_end_in_a_minimum)
{
    struct zeta *work = work_space();
    unsigned long long state = 1963;
    for (int i = 0; i < 4000; i++) {
        char text[80];
        int charge, z = random_valence(&state, text, &charge);
        enum zeta_coupling coupling = i % 4 == 3 ? ZETA_AVERAGE : ZETA_HUND;
        struct zeta_result r = solve(work, z, text, coupling, NULL);
        ck_assert_msg(has_values(&r), "Z=%d %s: %s", z, text, r.reason);
        near(r.virial, 2.0, 1e-12, 0, "Z=%d %s", z, text);
        double lowest;
        if (i % 3 == 0)
            ck_assert_msg(zeta_is_minimum(work, &lowest), "Z=%d %s: %g", z,
                          text, lowest);
    }
    zeta_free(work);
}
END_TEST

/* Anything at all, sense or nonsense, ends in a state with a reason. */
START_TEST(any_configuration_at_all_ends_in_a_state)
{
    struct zeta *work = work_space();
    unsigned long long state = 1967;
    int seen[ZETA_STATE_COUNT] = {0};
    for (int i = 0; i < 4000; i++) {
        struct configuration c = {0};
        bool sane = random_below(&state, 2) == 0;
        for (int n = 1; n <= N_MAX; n++)
            for (int l = 0; l < n && l <= L_MAX; l++) {
                unsigned room = (unsigned)(4 * l + 2);
                unsigned depth = random_below(&state, 8);
                double occ = sane && n <= (int)depth
                                 ? room
                                 : random_below(&state, room + 1);
                if (random_below(&state, 5) == 0 || n > (int)depth + 1)
                    continue;
                if (random_below(&state, 200) == 0)
                    occ *= 0.7;
                if (occ > 0)
                    ck_assert(configuration_change(&c, n, l, occ));
            }
        int z = 1 + (int)random_below(&state, 118);
        struct zeta_problem problem = {z, &c, ZETA_HUND, NULL};
        if (zeta_begin(work, &problem))
            while (zeta_step(work))
                ;
        struct zeta_result r;
        zeta_read(work, &r);
        ck_assert_int_ne(r.state, ZETA_RUNNING);
        seen[r.state]++;
        ck_assert_msg(r.state == ZETA_SOLVED || r.reason[0] != '\0',
                      "%s without a reason", zeta_state_text(r.state));
        ck_assert_int_eq(r.count, has_values(&r) ? c.count : 0);
        for (int k = 0; k < r.count; k++) {
            ck_assert(isfinite(r.shells[k].z_eff) && r.shells[k].z_eff > 0);
            ck_assert(isfinite(r.shells[k].energy));
            ck_assert(r.shells[k].peak_radius > 0);
        }
    }
    ck_assert_int_gt(seen[ZETA_SOLVED], 0);
    ck_assert_int_gt(seen[ZETA_UNBOUND], 0);
    ck_assert_int_gt(seen[ZETA_REFUSED], 0);
    ck_assert_int_gt(
        seen[ZETA_UNCONVERGED] + seen[ZETA_ESCAPED] + seen[ZETA_DISORDERED], 0);
    zeta_free(work);
}
END_TEST

TCase *list_cases(void)
{
    TCase *tc = tcase_create("lists");
    tcase_set_timeout(tc, 60);
    tcase_add_test(tc, every_listed_atom_and_cation_ends_in_a_minimum);
    tcase_add_test(tc, every_charge_of_every_element_ends_in_a_minimum);
    tcase_add_test(tc, random_valence_configurations_end_in_a_minimum);
    tcase_add_test(tc, any_configuration_at_all_ends_in_a_state);
    return tc;
}
