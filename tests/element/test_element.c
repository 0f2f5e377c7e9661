/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <stdio.h>
#include <string.h>

#include "element/configuration.h"
#include "element/element.h"
#include "element/evidence.h"
#include "element/walk.h"
#include "element/quantity.h"
#include "element/reading.h"
#include "element/selection.h"
#include "element/species.h"
#include "support/near.h"
#include "support/run.h"

START_TEST(every_element_is_found_by_symbol_name_and_number)
{
    for (int z = 1; z <= Z_MAX; z++) {
        const struct element *e = element_at(z);
        char number[8];
        snprintf(number, sizeof number, "%d", z);
        ck_assert_int_eq(e->z, z);
        ck_assert_ptr_eq(element_find(e->symbol), e);
        ck_assert_ptr_eq(element_find(e->name), e);
        ck_assert_ptr_eq(element_find(number), e);
        ck_assert_ptr_eq(element_jump(e->symbol), e);
    }
    ck_assert_ptr_null(element_find("CO"));
    ck_assert_ptr_null(element_find("119"));
    ck_assert_ptr_null(element_find("0"));
    ck_assert_str_eq(element_find("Caesium")->symbol, "Cs");
    ck_assert_str_eq(element_find("aluminum")->symbol, "Al");
    ck_assert_str_eq(element_nearest("CO")->symbol, "Co");
    ck_assert_str_eq(element_nearest("zirkonium")->symbol, "Zr");
    ck_assert_str_eq(element_nearest("Fee")->symbol, "Fe");
    ck_assert_str_eq(element_nearest("Irn")->symbol, "Fe");
    ck_assert_str_eq(element_nearest("Alu")->symbol, "Al");
    /* a wrong letter in a symbol, the beginning of several names, no word */
    static const char *const unclear[] = {"xq", "Xx", "Fe3", "colour"};
    for (size_t i = 0; i < sizeof unclear / sizeof unclear[0]; i++)
        ck_assert_msg(!element_nearest(unclear[i]), "%s", unclear[i]);
    ck_assert_str_eq(element_jump("ger")->symbol, "Ge");
}
END_TEST

START_TEST(no_two_elements_share_a_place_and_all_stand_inside)
{
    for (int width = 0; width < 2; width++)
        for (int g3 = 0; g3 < 2; g3++) {
            bool taken[9][32] = {{false}};
            for (int z = 1; z <= Z_MAX; z++) {
                struct grid_place p = element_place(z, (enum grid_width)width,
                                                    (enum grid_group3)g3);
                ck_assert_int_ge(p.row, 0);
                ck_assert_int_lt(p.row, grid_rows((enum grid_width)width));
                ck_assert_int_ge(p.column, 0);
                ck_assert_int_lt(p.column,
                                 grid_columns((enum grid_width)width));
                ck_assert_msg(!taken[p.row][p.column], "Z=%d", z);
                taken[p.row][p.column] = true;
            }
        }
}
END_TEST

START_TEST(group_three_is_lu_lr_or_la_ac)
{
    struct grid_place y = element_place(39, GRID_18, GRID_LU_LR);
    ck_assert_int_eq(element_place(71, GRID_18, GRID_LU_LR).column, y.column);
    ck_assert_int_eq(element_place(57, GRID_18, GRID_LA_AC).column, y.column);
    ck_assert_int_eq(element_place(71, GRID_18, GRID_LA_AC).row, 7);
    ck_assert_int_eq(element_place(57, GRID_18, GRID_LU_LR).row, 7);
}
END_TEST

START_TEST(every_element_is_reached_by_arrows)
{
    static const int step[4][2] = {{1, 0}, {-1, 0}, {0, 1}, {0, -1}};
    for (int width = 0; width < 2; width++) {
        bool seen[Z_MAX + 1] = {false};
        int queue[Z_MAX] = {1};
        int head = 0, tail = 1;
        seen[1] = true;
        while (head < tail) {
            int z = queue[head++];
            for (int d = 0; d < 4; d++) {
                int next =
                    element_neighbour(z, step[d][0], step[d][1],
                                      (enum grid_width)width, GRID_LU_LR);
                if (!seen[next]) {
                    seen[next] = true;
                    queue[tail++] = next;
                }
            }
        }
        ck_assert_int_eq(tail, Z_MAX);
    }
    ck_assert_int_eq(element_neighbour(1, -1, 0, GRID_18, GRID_LU_LR), 1);
    ck_assert_int_eq(element_neighbour(1, 1, 0, GRID_18, GRID_LU_LR), 2);
}
END_TEST

START_TEST(configurations_print_as_they_were_typed)
{
    static const char *const usual[] = {
        "1s1",
        "1s2",
        "[He] 2s2 2p6",
        "[Ar] 3d6 4s2",
        "[Ar] 3d10",
        "[Xe] 4f14 5d10 6s2 6p2",
        "1s1 2s1",
        "[Ne] 3s2 3p3.5",
        "[Rn] 5f14 6d10 7s2 7p6",
        "[He] 2p6 3s2",
    };
    for (size_t i = 0; i < sizeof usual / sizeof usual[0]; i++) {
        struct status st = status_ok();
        struct configuration c;
        char out[CONFIGURATION_TEXT_MAX];
        ck_assert_msg(configuration_parse(usual[i], &c, &st), "%s", usual[i]);
        ck_assert_str_eq(configuration_print(&c, out), usual[i]);
        if (strchr(usual[i], '.'))
            continue;
        char packed[CONFIGURATION_PACKED_MAX];
        struct configuration back;
        configuration_unpack(configuration_pack(&c, packed), &back);
        ck_assert(configuration_same(&c, &back));
        ck_assert_ptr_null(strpbrk(packed, "\\\"?"));
    }
}
END_TEST

START_TEST(order_spaces_and_a_missing_one_do_not_matter)
{
    struct status st = status_ok();
    struct configuration a, b;
    ck_assert(configuration_parse("[Ar]4s2  3d", &a, &st));
    ck_assert(configuration_parse(" 1s2 2s2 2p6 3s2 3p6 3d1 4s2 ", &b, &st));
    ck_assert(configuration_same(&a, &b));
    near(configuration_electrons(&a), 21, 0, 1e-12, "electrons of Sc");
    ck_assert_int_eq(configuration_outermost(&a)->n, 4);
    near(configuration_shell(&a, 3), 9, 0, 1e-12, "electrons in shell 3");
}
END_TEST

START_TEST(wrong_configurations_are_refused_with_the_reason)
{
    static const char *const wrong[][2] = {
        {"", "empty"},
        {"[Zn] 4s2", "not a noble gas"},
        {"[Ar 4s2", "without"},
        {"3d11", "overfull"},
        {"2d1", "no subshell"},
        {"1s2 1s1", "twice"},
        {"[Ar] 3p2", "core"},
        {"4s0", "holds no"},
        {"9s1", "no subshell"},
        {"4g2", "no subshell"},
        {"3dx", "no subshell"},
        {"3d-2", "no subshell"},
        {"s2", "no subshell"},
        {"1s2,2s2", "no subshell"},
        {"3d1e1", "no subshell"},
    };
    for (size_t i = 0; i < sizeof wrong / sizeof wrong[0]; i++) {
        struct status st = status_ok();
        struct configuration c;
        ck_assert_msg(!configuration_parse(wrong[i][0], &c, &st), "'%s'",
                      wrong[i][0]);
        ck_assert_int_eq(st.code, STATUS_USAGE);
        ck_assert_msg(strstr(st.message, wrong[i][1]) != NULL, "'%s': %s",
                      wrong[i][0], st.message);
    }
}
END_TEST

START_TEST(a_change_that_does_not_fit_changes_nothing)
{
    struct status st = status_ok();
    struct configuration c;
    ck_assert(configuration_parse("[He] 2s2 2p5", &c, &st));
    ck_assert(!configuration_change(&c, 2, 1, 2));
    ck_assert(!configuration_change(&c, 2, 1, -6));
    ck_assert(configuration_change(&c, 2, 1, -5));
    ck_assert_int_eq(c.count, 2);
    ck_assert(configuration_change(&c, 3, 0, 0));
    ck_assert_int_eq(c.count, 2);
}
END_TEST

START_TEST(terms_are_read)
{
    struct term t;
    ck_assert(term_parse("2P*1/2", &t));
    ck_assert_int_eq(t.multiplicity, 2);
    ck_assert_int_eq(t.big_l, 1);
    ck_assert_int_eq(t.twice_j, 1);
    ck_assert(term_parse("5I8", &t));
    ck_assert_int_eq(t.big_l, 6);
    ck_assert_int_eq(t.twice_j, 16);
    ck_assert(term_parse("J=7/2", &t));
    ck_assert_int_eq(t.multiplicity, -1);
    ck_assert_int_eq(t.twice_j, 7);
    ck_assert(term_parse("", &t) && t.big_l == -1);
    ck_assert(!term_parse("P1/2", &t) && !term_parse("2Z", &t));
}
END_TEST

static int chosen_count(const char *word)
{
    struct status st = status_ok();
    static struct selection s;
    s = (struct selection){0};
    return selection_add(&s, word, &st) ? s.count : -1;
}

START_TEST(selections_name_what_the_trade_names)
{
    ck_assert_int_eq(chosen_count("Sc-Zn"), 10);
    ck_assert_int_eq(chosen_count("21-30"), 10);
    ck_assert_int_eq(chosen_count("period:4"), 18);
    ck_assert_int_eq(chosen_count("group:13"), 6);
    ck_assert_int_eq(chosen_count("block:f"), 28);
    ck_assert_int_eq(chosen_count("iron"), 1);
    struct status st = status_ok();
    struct selection s = {0};
    ck_assert(selection_add(&s, "Fe3+", &st) && s.items[0].charge == 3);
    ck_assert(selection_add(&s, "Cs+", &st) && s.items[1].charge == 1);
    ck_assert(selection_add(&s, "O2-", &st) && s.items[2].charge == -2);
    ck_assert(selection_add(&s, "Fe3+", &st) && s.count == 3);
    ck_assert(selection_add(&s, "H+", &st) && s.items[3].charge == 1);
    char out[ION_TEXT_MAX];
    ck_assert_str_eq(ion_print(8, -2, out), "O2-");
    ck_assert_str_eq(ion_print(55, 1, out), "Cs+");
    ck_assert_str_eq(ion_print(26, 0, out), "Fe");
}
END_TEST

/* What stands behind '@' is read as people write it and printed in one way. */
START_TEST(a_site_goes_with_its_ion)
{
    static const struct {
        const char *word, *printed;
    } cases[] = {
        {"Co3+@VI,low", "Co3+@VI,low"},
        {"Co3+@6,LOW", "Co3+@VI,low"},
        {"Sr2+@xii", "Sr2+@XII"},
        {"Cu2+@4sq", "Cu2+@IVSQ"},
        {"Fe3+@high", "Fe3+@high"},
        {"Cs+@12", "Cs+@XII"},
        {"O2-@IV", "O2-@IV"},
        {"Fe@VIII", "Fe@VIII"},
        {"Sn2+@IIIPY,low", "Sn2+@IIIPY,low"},
    };
    struct status st = status_ok();
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        struct selection s = {0};
        char out[ION_TEXT_MAX];
        ck_assert_msg(selection_add(&s, cases[i].word, &st), "%s", st.message);
        ck_assert_int_eq(s.count, 1);
        ck_assert_str_eq(
            ion_print_at(s.items[0].z, s.items[0].charge, s.items[0].site, out),
            cases[i].printed);
        /* What is printed is read as the same. */
        ck_assert(selection_add(&s, out, &st) && s.count == 1);
    }
    struct selection s = {0};
    ck_assert(selection_add(&s, "Co3+@VI,low", &st) &&
              selection_add(&s, "Co3+@VI,high", &st) &&
              selection_add(&s, "Co3+", &st) && s.count == 3);
    ck_assert(selection_add(&s, "Fe2+@all", &st) && s.items[3].every_site &&
              !site_named(s.items[3].site));
    s.count = 0;
    ck_assert(selection_add(&s, "electrons:10@VI", &st) && s.count > 5 &&
              s.items[2].site.coordination == COORDINATION_VI);
}
END_TEST

/* Other ways to write an ion are understood well enough to name the right one.
 */
START_TEST(an_ion_written_in_another_way_is_answered_with_the_right_one)
{
    static const char *const cases[][2] = {
        {"Co+3", "Co3+"},    {"Co(III)", "Co3+"}, {"cobalt3+", "Co3+"},
        {"co3+", "Co3+"},    {"iron3+", "Fe3+"},  {"Fe(iii)", "Fe3+"},
        {"Fe+++", "Fe3+"},   {"O-2", "O2-"},      {"Fe^3+", "Fe3+"},
        {"oxygen2-", "O2-"}, {"Ce(4)", "Ce4+"},   {"co3+@VI", "Co3+"},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        struct status st = status_ok();
        struct selection s = {0};
        ck_assert(!selection_add(&s, cases[i][0], &st));
        ck_assert_int_eq(st.code, STATUS_USAGE);
        ck_assert_msg(strstr(st.message, cases[i][1]), "%s", st.message);
    }
}
END_TEST

START_TEST(wrong_selections_are_refused_and_name_the_word)
{
    static const char *const wrong[] = {
        "Xx",         "fe",       "0",        "119",         "-",
        "Fe-",        "Zn-Sc",    "period:8", "group:0",     "group:x",
        "block:g",    "block:sp", "Fe27+",    "Fe0+",        "Fe03+",
        "era:3",      "Li-Xx",    "",         "period:",     "period:+4",
        "H2+",        "2+",       "Fe3+x",    "-Fe",         "Fe3+@",
        "Fe3+@13",    "@VI",      "Fe3+@VI,", "Fe3+@VI,mid", "Fe3+@,low",
        "Fe3+@VI@VI", "Fe(X)y",
    };
    for (size_t i = 0; i < sizeof wrong / sizeof wrong[0]; i++) {
        struct status st = status_ok();
        struct selection s = {0};
        bool ok = selection_add(&s, wrong[i], &st);
        if (strcmp(wrong[i], "Fe-") == 0) {
            ck_assert(ok && s.items[0].charge == -1);
            continue;
        }
        ck_assert_msg(!ok, "'%s'", wrong[i]);
        ck_assert_int_eq(st.code, STATUS_USAGE);
        ck_assert(strncmp(st.message, wrong[i], strlen(wrong[i])) == 0);
    }
}
END_TEST

START_TEST(quantities_and_states_have_distinct_ids)
{
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        enum quantity_id back;
        const struct quantity *row = quantity_at((enum quantity_id)q);
        ck_assert(quantity_find(row->id, &back) && (int)back == q);
        ck_assert(row->lowest < row->highest);
    }
    for (int a = 0; a < READING_STATE_COUNT; a++)
        for (int b = 0; b < a; b++)
            ck_assert_str_ne(reading_state_id((enum reading_state)a),
                             reading_state_id((enum reading_state)b));
}
END_TEST

START_TEST(a_reading_changes_its_unit_and_a_gap_stays_one)
{
    char out[NUMBER_TEXT_MAX];
    struct reading r = reading_computed(QUANTITY_RADIUS, 128.5, NULL);
    struct reading a = reading_in_unit(r, unit_find("angstrom"));
    ck_assert_str_eq(number_print_short(a.value, out), "1.285");
    struct reading gap =
        reading_gap(QUANTITY_RADIUS, READING_OUTSIDE, "beyond Kr", NULL);
    gap = reading_in_unit(gap, unit_find("bohr"));
    ck_assert_int_eq(gap.state, READING_OUTSIDE);
    ck_assert_str_eq(gap.reason, "beyond Kr");
}
END_TEST

/* Every walk holds the species it goes through once, and no species twice. */
START_TEST(walks_hold_their_species_once_in_order)
{
    for (int k = 0; k < WALK_COUNT; k++)
        for (int z = 1; z <= Z_MAX; z++)
            for (int charge = -1; charge <= (z < 3 ? z : 3); charge++) {
                struct walk w;
                walk_fill(&w, (enum walk_kind)k, z, charge);
                int at = walk_place(&w, z, charge);
                ck_assert_msg(at >= 0, "walk %d, Z %d, charge %d", k, z,
                              charge);
                ck_assert_int_ge(w.count, 1);
                for (int i = 1; i < w.count; i++)
                    ck_assert(w.steps[i].z > w.steps[i - 1].z ||
                              w.steps[i].charge > w.steps[i - 1].charge);
            }
    ck_assert_str_eq(walk_id(WALK_GROUP), "group");
    ck_assert_str_ne(walk_words(WALK_GROUP), "");
}
END_TEST

/* The trade's own series (common practice, no source). */
START_TEST(walks_are_those_of_the_trade)
{
    struct walk w;
    walk_fill(&w, WALK_PERIOD, 26, 0);
    ck_assert_int_eq(w.count, 18);
    walk_fill(&w, WALK_GROUP, 30, 0); /* Zn Cd Hg Cn */
    ck_assert_int_eq(w.count, 4);
    ck_assert_int_eq(w.steps[3].z, 112);
    walk_fill(&w, WALK_GROUP, 58, 0); /* Ce Th */
    ck_assert_int_eq(w.count, 2);
    ck_assert_int_eq(w.steps[1].z, 90);
    walk_fill(&w, WALK_BLOCK, 64, 3); /* La3+ … Yb3+ */
    ck_assert_int_eq(w.count, 14);
    ck_assert_int_eq(w.steps[0].z, 57);
    walk_fill(&w, WALK_CHARGES, 92, 0); /* U … U91+ */
    ck_assert_int_eq(w.count, 92);
    ck_assert_int_eq(w.steps[91].charge, 91);
    walk_fill(&w, WALK_ISOELECTRONIC, 11, 1); /* N3- O2- F- Ne Na+ … */
    ck_assert_int_eq(w.steps[0].z, 7);
    ck_assert_int_eq(w.steps[0].charge, -3);
    walk_fill(&w, WALK_ISOELECTRONIC, 1, 1); /* no electron: itself */
    ck_assert_int_eq(w.count, 1);
}
END_TEST

START_TEST(kinds_of_values_have_ids_and_can_be_chosen)
{
    for (int e = 0; e < EVIDENCE_COUNT; e++) {
        enum evidence found;
        ck_assert(evidence_find(evidence_id((enum evidence)e), &found));
        ck_assert_int_eq((int)found, e);
        ck_assert_str_ne(evidence_word(found), "");
        ck_assert(evidence_chosen(0, found));
        ck_assert(evidence_chosen(1u << e, found));
        ck_assert(!evidence_chosen(~(1u << e), found));
        ck_assert_ptr_nonnull(
            strstr(evidence_left_out(found), evidence_word(found)));
    }
    enum evidence none;
    ck_assert(!evidence_find("guessed", &none));
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("element");
    TCase *grid = tcase_create("grid");
    tcase_add_test(grid, every_element_is_found_by_symbol_name_and_number);
    tcase_add_test(grid, no_two_elements_share_a_place_and_all_stand_inside);
    tcase_add_test(grid, group_three_is_lu_lr_or_la_ac);
    tcase_add_test(grid, every_element_is_reached_by_arrows);
    suite_add_tcase(suite, grid);
    TCase *nouns = tcase_create("nouns");
    tcase_add_test(nouns, configurations_print_as_they_were_typed);
    tcase_add_test(nouns, order_spaces_and_a_missing_one_do_not_matter);
    tcase_add_test(nouns, wrong_configurations_are_refused_with_the_reason);
    tcase_add_test(nouns, a_change_that_does_not_fit_changes_nothing);
    tcase_add_test(nouns, terms_are_read);
    tcase_add_test(nouns, selections_name_what_the_trade_names);
    tcase_add_test(nouns, wrong_selections_are_refused_and_name_the_word);
    tcase_add_test(nouns, a_site_goes_with_its_ion);
    tcase_add_test(
        nouns, an_ion_written_in_another_way_is_answered_with_the_right_one);
    tcase_add_test(nouns, quantities_and_states_have_distinct_ids);
    tcase_add_test(nouns, a_reading_changes_its_unit_and_a_gap_stays_one);
    tcase_add_test(nouns, walks_hold_their_species_once_in_order);
    tcase_add_test(nouns, walks_are_those_of_the_trade);
    tcase_add_test(nouns, kinds_of_values_have_ids_and_can_be_chosen);
    suite_add_tcase(suite, nouns);
    return run_suite(suite);
}
