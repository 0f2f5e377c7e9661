/* SPDX-License-Identifier: MIT */
/* Trend and Audit as events in and a canvas out. */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "screens/audit_internal.h"
#include "screens/trend_marks.h"
#include "app/desk.h"
#include "app/desk_keys.h"
#include "support/csv.h"
#include "support/golden.h"
#include "support/near.h"
#include "support/run.h"

static void check_golden(const char *name)
{
    settle();
    char *text = drawn();
    golden_check(name, text);
    free(text);
}

/* Choosers by their words, so that a new row changes nothing here. */
static void choose(const char *opener, const char *start)
{
    type(opener);
    ck_assert_ptr_nonnull(app.chooser);
    for (int i = 0; i < app.list.count; i++)
        if (strncmp(app.list.labels[i], start, strlen(start)) == 0) {
            app.list.at = i;
            key(KEY_CODE_ENTER);
            return;
        }
    ck_abort_msg("nothing begins with %s", start);
}

START_TEST(ionization_along_period_4_at_80x24)
{
    choose("w", "ionization");
    type("t");
    check_golden("trend-80x24.txt");
    canvas.ascii = true;
    check_golden("trend-ascii-80x24.txt");
}
END_TEST

START_TEST(two_covalent_sets_down_a_group_at_120x40)
{
    resize(40, 120);
    choose("w", "radius");
    choose("r", "covalent_cordero_2008");
    choose("n", "covalent_single_pyykko_2009");
    type("t");
    choose("z", "group");
    type(".");
    check_golden("trend-two-sets-120x40.txt");
    ck_assert(shows("second - first: -16.0 pm (-12.1 %)"));
    ck_assert(shows("132(3) at low spin, derived from measurements"));
    /* The pane shows other quantities too, for which there is no second set. */
    choose("u", "angstrom");
    type("m");
    ck_assert(shows("> slater") || shows(">slater"));
}
END_TEST

START_TEST(the_trend_stands_beside_a_large_map)
{
    resize(60, 200);
    choose("w", "ionization");
    check_golden("map-trend-200x60.txt");
}
END_TEST

START_TEST(audit_at_three_sizes)
{
    choose("w", "ionization");
    type("d");
    check_golden("audit-80x24.txt");
    key(KEY_CODE_DOWN);
    key(KEY_CODE_DOWN);
    key(KEY_CODE_DOWN);
    key(KEY_CODE_RIGHT);
    key(KEY_CODE_ENTER);
    key(KEY_CODE_DOWN);
    resize(40, 120);
    check_golden("audit-120x40.txt");
    type("v");
    resize(60, 200);
    check_golden("audit-200x60.txt");
}
END_TEST

/* What differs between two drawings, as a mask of rows and columns. */
static int changed_cells(const struct canvas *a, const struct canvas *b,
                         int first_row, int last_row, bool columns[80])
{
    int count = 0;
    for (int r = first_row; r <= last_row; r++)
        for (int c = 0; c < 80; c++) {
            const struct cell *x = &a->cells[r * 80 + c];
            const struct cell *y = &b->cells[r * 80 + c];
            if (x->character == y->character && x->role == y->role)
                continue;
            columns[c] = true;
            count++;
        }
    return count;
}

/* In the plots a step changes the two columns of the cursor and the names that
 * stand at them, nothing else. */
START_TEST(a_step_along_a_trend_redraws_only_the_cursor)
{
    struct canvas before;
    struct status st = status_ok();
    bool columns[80] = {false};
    choose("w", "ionization");
    type("t");
    settle();
    app_draw(&app, &canvas);
    ck_assert(canvas_init(&before, 24, 80, &st));
    memcpy(before.cells, canvas.cells, sizeof *canvas.cells * 24 * 80);
    key(KEY_CODE_RIGHT);
    ck_assert_int_eq(app.session.choice.z, 27);
    app_draw(&app, &canvas);
    int count = changed_cells(&before, &canvas, 1, 18, columns);
    int wide = 0;
    for (int c = 0; c < 80; c++)
        wide += columns[c];
    ck_assert_int_gt(count, 4);
    ck_assert_int_le(count, 2 * 18 + 12);
    ck_assert_int_le(wide, 8);
    canvas_clear(&before);
}
END_TEST

static int marks(uint32_t mark, int first_row, int last_row)
{
    int count = 0;
    for (int r = first_row; r <= last_row; r++)
        for (int c = 0; c < canvas.columns; c++)
            count += canvas.cells[r * canvas.columns + c].character == mark;
    return count;
}

/* The published rules of clementi end at Kr: along the fifth period there is
 * no mark and no name of it. A curve that is turned off goes too. */
START_TEST(a_gap_stays_a_gap_and_a_curve_can_be_turned_off)
{
    choose("w", "zeff");
    type("Zr");
    key(KEY_CODE_ENTER);
    type("t");
    settle();
    app_draw(&app, &canvas);
    ck_assert_int_eq(marks(screen_trend_mark(model_find("clementi")), 1, 18),
                     0);
    ck_assert_int_gt(marks(screen_trend_mark(model_find("slater")), 1, 18), 10);
    ck_assert(shows("clementi outside-model"));
    choose("b", "[x] slater");
    key(KEY_CODE_ESCAPE);
    ck_assert(!shows("slater"));
    choose("b", "[ ] slater");
    key(KEY_CODE_ESCAPE);
    ck_assert(shows("slater"));
}
END_TEST

START_TEST(every_walk_is_gone_along_and_across)
{
    type("t");
    app_draw(&app, &canvas);
    key(KEY_CODE_HOME);
    ck_assert_int_eq(app.session.choice.z, 19);
    key(KEY_CODE_END);
    ck_assert_int_eq(app.session.choice.z, 36);
    choose("z", "group");
    key(KEY_CODE_RIGHT);
    ck_assert_int_eq(app.session.choice.z, 54);
    key(KEY_CODE_UP); /* the group before: I */
    ck_assert_int_eq(app.session.choice.z, 53);
    choose("z", "block");
    key(KEY_CODE_HOME);
    ck_assert_int_eq(app.session.choice.z, 49);
    choose("z", "charges");
    key(KEY_CODE_RIGHT);
    key(KEY_CODE_RIGHT);
    ck_assert_int_eq(app.session.choice.charge, 2);
    ck_assert(shows("charges of the element"));
    key(KEY_CODE_END);
    ck_assert_int_eq(app.session.choice.charge, 48);
    key(KEY_CODE_HOME);
    choose("z", "isoelectronic");
    key(KEY_CODE_RIGHT);
    ck_assert_int_eq(app.session.choice.z, 50);
    ck_assert_int_eq(app.session.choice.charge, 1);
    resize(40, 120);
    ck_assert(shows("series of 49 electrons"));
}
END_TEST

START_TEST(a_configuration_is_typed_and_taken_back)
{
    choose("w", "ionization");
    type("t:");
    for (int i = 0; i < 40; i++)
        key(KEY_CODE_ERASE);
    type("[Ar] 3d7 4s1");
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(app.session.choice.configuration.count, 7);
    resize(40, 120);
    ck_assert(shows("[Ar] 3d7 4s1 (given)"));
    type("m");
    ck_assert(shows("(given)"));
    key(KEY_CODE_RIGHT);
    ck_assert(!shows("(given)")); /* for that species alone */
    key(KEY_CODE_LEFT);
    type(":");
    for (int i = 0; i < 40; i++)
        key(KEY_CODE_ERASE);
    type("[Ar] 3d7");
    key(KEY_CODE_ENTER);
    ck_assert(shows("expected 26"));
    type(":");
    for (int i = 0; i < 40; i++)
        key(KEY_CODE_ERASE);
    key(KEY_CODE_ENTER);
    ck_assert(!shows("(given)"));
}
END_TEST

START_TEST(the_worst_species_is_reached_from_the_audit)
{
    choose("w", "radius");
    type("d");
    app_draw(&app, &canvas);
    const struct audit_series *s =
        screen_audit_chosen(&app.session, app_state(&app, "audit"));
    ck_assert_ptr_nonnull(s);
    struct audit_part all = {AUDIT_ALL, 0};
    struct summary sum = audit_summary(s, all);
    key(KEY_CODE_ENTER);
    key(KEY_CODE_ENTER);
    ck_assert_str_eq(app_screen(&app)->id, "map");
    ck_assert_int_eq(app.session.choice.z, sum.largest_z);
}
END_TEST

/* The pane's line is the audit of the block without the element: worked out
 * here from the rows of the others. */
START_TEST(the_usual_residual_is_that_of_the_others_in_the_block)
{
    double sum = 0.0;
    int count = 0;
    char words[64];
    char number[NUMBER_TEXT_MAX];
    choose("w", "ionization");
    for (int z = 1; z <= Z_MAX; z++) {
        struct ask ask;
        if (z == 26 || element_at(z)->block != 'd' ||
            !session_ask(&app.session, z, 0, &ask))
            continue;
        struct row row = study_row(study, &ask);
        if (row.state != ROW_OK)
            continue;
        sum +=
            row.residual.value > 0 ? row.residual.value : -row.residual.value;
        count++;
    }
    ck_assert_int_eq(count, 35);
    snprintf(words, sizeof words, "d block without Fe: mean size %s eV",
             number_print_places(sum / count, 3, number));
    ck_assert_msg(shows(words), "%s", words);
}
END_TEST

static struct csv exported(void)
{
    struct status st = status_ok();
    char *text = NULL;
    size_t size = 0;
    FILE *out = open_memstream(&text, &size);
    ck_assert_ptr_nonnull(out);
    ck_assert(app_export(&app, out, &st));
    fclose(out);
    struct csv csv = csv_read_text(text);
    free(text);
    return csv;
}

START_TEST(trend_and_audit_are_exported_with_their_command)
{
    char command[SESSION_TEXT_MAX];
    struct text t = text_over(command, sizeof command);
    choose("w", "ionization");
    type("t");
    choose("b", "[x] single-zeta");
    key(KEY_CODE_ESCAPE);
    choose("b", "[x] scf");
    key(KEY_CODE_ESCAPE);
    app_draw(&app, &canvas);
    type("e");
    key(KEY_CODE_ENTER);
    struct csv csv = exported();
    ck_assert_uint_eq(csv_rows(&csv), 54);
    csv_free(&csv);
    app_export_command(&app, &t);
    ck_assert_str_eq(command, "outershell list period:4 --quantity ionization "
                              "--model shells,slater,clementi --format csv");
    type("d");
    app_draw(&app, &canvas);
    type("e");
    key(KEY_CODE_ENTER);
    csv = exported();
    ck_assert_uint_gt(csv_rows(&csv), 100);
    csv_free(&csv);
    t = text_over(command, sizeof command);
    app_export_command(&app, &t);
    ck_assert_str_eq(command,
                     "outershell audit --quantity ionization --format csv");
}
END_TEST

/* Every charge of uranium by scf: a value, or a state with its reason; between
 * two steps of the work a key is answered. */
START_TEST(uranium_is_followed_to_its_last_electron)
{
    bool changed;
    int index = model_index(model_find("scf"));
    int values = 0;
    choose("w", "ionization");
    type("U");
    key(KEY_CODE_ENTER);
    app.session.choice.hidden_models = ~(1u << index);
    type("t");
    choose("z", "charges");
    app_draw(&app, &canvas);
    for (int steps = 0; app_has_work(&app); steps++) {
        app_step(&app, &changed);
        if (steps % 500 == 250) {
            int before = app.session.choice.charge;
            key(before < 91 ? KEY_CODE_RIGHT : KEY_CODE_HOME);
            ck_assert_int_ne(app.session.choice.charge, before);
        }
    }
    for (int charge = 0; charge < 92; charge++) {
        struct ask ask;
        ck_assert(session_ask(&app.session, 92, charge, &ask));
        ask.model = model_find("scf");
        struct row row = study_row(study, &ask);
        ck_assert_int_ne(row.value.state, READING_PENDING);
        ck_assert_msg(row.value.state == READING_OK ||
                          row.value.reason[0] != '\0',
                      "U%d+", charge);
        values += row.value.state == READING_OK;
    }
    ck_assert_int_gt(values, 46);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("trend");
    TCase *c = tcase_create("trend");
    tcase_add_checked_fixture(c, open_app, close_app);
    tcase_set_timeout(c, 60);
    tcase_add_test(c, ionization_along_period_4_at_80x24);
    tcase_add_test(c, two_covalent_sets_down_a_group_at_120x40);
    tcase_add_test(c, the_trend_stands_beside_a_large_map);
    tcase_add_test(c, audit_at_three_sizes);
    tcase_add_test(c, a_step_along_a_trend_redraws_only_the_cursor);
    tcase_add_test(c, a_gap_stays_a_gap_and_a_curve_can_be_turned_off);
    tcase_add_test(c, every_walk_is_gone_along_and_across);
    tcase_add_test(c, a_configuration_is_typed_and_taken_back);
    tcase_add_test(c, the_worst_species_is_reached_from_the_audit);
    tcase_add_test(c, the_usual_residual_is_that_of_the_others_in_the_block);
    tcase_add_test(c, trend_and_audit_are_exported_with_their_command);
    tcase_add_test(c, uranium_is_followed_to_its_last_electron);
    suite_add_tcase(suite, c);
    return run_suite(suite);
}
