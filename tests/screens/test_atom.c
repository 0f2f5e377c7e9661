/* SPDX-License-Identifier: MIT */
/* The screen Atom as events in and a canvas out. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "screens/atom_internal.h"
#include "screens/list.h"
#include "app/desk.h"
#include "support/csv.h"
#include "support/golden.h"
#include "support/near.h"
#include "support/run.h"

static struct atom_state *atom(void)
{
    return app_state(&app, "atom");
}

static void open_drawn(void)
{
    open_app();
    app_draw(&app, &canvas);
}

static void resize(int rows, int columns)
{
    struct status st = status_ok();
    ck_assert(canvas_resize(&canvas, rows, columns, &st));
    struct event event = {.kind = EVENT_RESIZE, .row = rows, .column = columns};
    ck_assert_int_eq(app_update(&app, &event), EFFECT_REDRAW);
    app_draw(&app, &canvas);
}

static void settle(void)
{
    bool changed;
    while (app_has_work(&app))
        app_step(&app, &changed);
    app_draw(&app, &canvas);
}

static enum effect event_only(const struct event *event)
{
    enum effect effect = app_update(&app, event);
    app_draw(&app, &canvas);
    return effect;
}

static enum effect key(enum key code)
{
    struct event event = {.kind = EVENT_KEY, .key = code};
    enum effect effect = app_update(&app, &event);
    settle();
    return effect;
}

static void type(const char *text)
{
    for (; *text; text++) {
        struct event event = {.kind = EVENT_CHARACTER,
                              .character = (unsigned char)*text};
        app_update(&app, &event);
        settle();
    }
}

/* Jumps to an element with Enter behind it. */
static void jump(const char *symbol)
{
    type(symbol);
    key(KEY_CODE_ENTER);
}

static char *characters(void)
{
    char *text = canvas_to_text(&canvas);
    ck_assert_ptr_nonnull(text);
    char *roles = strstr(text, "\n==");
    ck_assert_ptr_nonnull(roles);
    roles[1] = '\0';
    return text;
}

static bool shows(const char *words)
{
    char *text = characters();
    bool found = strstr(text, words) != NULL;
    free(text);
    return found;
}

static void check_golden(const char *name)
{
    char *text = canvas_to_text(&canvas);
    ck_assert_ptr_nonnull(text);
    golden_check(name, text);
    free(text);
}

START_TEST(iron_at_80x24)
{
    type("a");
    check_golden("atom-80x24.txt");
}
END_TEST

START_TEST(all_subshells_at_120x40)
{
    resize(40, 120);
    type("av");
    check_golden("atom-all-120x40.txt");
}
END_TEST

START_TEST(uranium_at_200x60_from_the_nucleus_on)
{
    resize(60, 200);
    jump("U");
    type("az");
    check_golden("atom-200x60.txt");
}
END_TEST

START_TEST(an_ion_over_the_atom_in_braille)
{
    resize(30, 100);
    type("a.n");
    type("j");
    key(KEY_CODE_ENTER);
    check_golden("atom-overlay-100x30.txt");
}
END_TEST

START_TEST(a_small_terminal_shows_the_table_or_the_plot_in_ascii)
{
    canvas.ascii = true;
    resize(12, 40);
    type("a");
    check_golden("atom-40x12.txt");
    key(KEY_CODE_ENTER);
    check_golden("atom-plot-40x12.txt");
}
END_TEST

/* One step is one cycle, so that no key waits for more. */
START_TEST(an_atom_is_solved_one_cycle_at_a_time)
{
    struct event a = {.kind = EVENT_CHARACTER, .character = 'a'};
    bool changed;
    int cycles = 0;
    app_update(&app, &a);
    ck_assert(app_has_work(&app));
    ck_assert(app_step(&app, &changed)); /* begins */
    app_draw(&app, &canvas);
    ck_assert(shows("solving"));
    while (screen_atom_pending(&app.session, atom())) {
        const struct atom_report *r =
            run_atom_report(atom()->slots[SLOT_CHOSEN].run);
        ck_assert_int_eq(r->cycles, cycles);
        app_step(&app, &changed);
        cycles++;
    }
    ck_assert_int_gt(cycles, 5);
    ck_assert(changed);
    ck_assert_ptr_nonnull(
        screen_atom_solved(&app.session, atom(), SLOT_CHOSEN));
}
END_TEST

START_TEST(interrupt_stops_and_enter_goes_on)
{
    struct event a = {.kind = EVENT_CHARACTER, .character = 'a'};
    struct event interrupt = {.kind = EVENT_INTERRUPT};
    bool changed;
    app_update(&app, &a);
    for (int i = 0; i < 4; i++)
        app_step(&app, &changed);
    ck_assert_int_eq(event_only(&interrupt), EFFECT_REDRAW);
    ck_assert(!screen_atom_pending(&app.session, atom()));
    ck_assert(shows("stopped at cycle 3"));
    ck_assert_ptr_null(screen_atom_solved(&app.session, atom(), SLOT_CHOSEN));
    key(KEY_CODE_ENTER);
    ck_assert_ptr_nonnull(
        screen_atom_solved(&app.session, atom(), SLOT_CHOSEN));
    ck_assert_int_eq(event_only(&interrupt), EFFECT_QUIT);
}
END_TEST

START_TEST(the_cursor_reads_at_its_radius_and_charges_add_up_to_z)
{
    type("a");
    const struct atom_report *r =
        screen_atom_solved(&app.session, atom(), SLOT_CHOSEN);
    near(screen_atom_radius(atom(), r), r->subshells[6].peak_radius, 0.0, 1e-12,
         "4s");
    for (int i = 0; i < 7; i++)
        key(KEY_CODE_LEFT);
    double radius = atom()->radius;
    ck_assert(radius > 0.0 && radius < r->subshells[6].peak_radius);
    double density, within, zeff;
    const struct atom_run *run = atom()->slots[SLOT_CHOSEN].run;
    run_atom_curve(run, RUN_DENSITY, -1, 1, &radius, &density);
    run_atom_curve(run, RUN_ENCLOSED, -1, 1, &radius, &within);
    run_atom_curve(run, RUN_ZEFF, -1, 1, &radius, &zeff);
    near(within + zeff, 26.0, 1e-12, 0.0, "Gauss");
    char words[64];
    snprintf(words, sizeof words, "%.4f   %.4f", within, zeff);
    char *text = characters();
    char want[16];
    snprintf(want, sizeof want, " %.4g ", density / 52.9177210544);
    ck_assert_msg(strstr(text, words), "no %s in\n%s", words, text);
    ck_assert_msg(strstr(text, want), "no %s in\n%s", want, text);
    free(text);
    key(KEY_CODE_HOME);
    ck_assert(atom()->radius < radius);
    key(KEY_CODE_END);
    key(KEY_CODE_RIGHT);
    ck_assert(atom()->radius > radius);
}
END_TEST

START_TEST(up_and_down_choose_a_subshell_or_all)
{
    type("a");
    for (int i = 0; i < 20; i++)
        key(KEY_CODE_UP);
    ck_assert_int_eq(atom()->n, -1);
    ck_assert(shows(">all"));
    key(KEY_CODE_DOWN);
    ck_assert(shows(">1s"));
    /* of an atom without 4s the outermost one */
    for (int i = 0; i < 20; i++)
        key(KEY_CODE_DOWN);
    ck_assert(shows(">4s"));
    jump("Ar");
    ck_assert(shows(">3p"));
}
END_TEST

START_TEST(the_next_element_is_solved_as_well)
{
    type("a");
    key(KEY_CODE_PAGE_DOWN);
    ck_assert(shows("cobalt"));
    ck_assert_int_eq(
        screen_atom_solved(&app.session, atom(), SLOT_CHOSEN)->species.z, 27);
    type("+++");
    ck_assert(shows("Co3+"));
    ck_assert_int_eq(
        screen_atom_solved(&app.session, atom(), SLOT_CHOSEN)->species.charge,
        3);
}
END_TEST

START_TEST(what_does_not_bind_has_a_reason_and_no_number)
{
    jump("F");
    type("a-");
    ck_assert(shows("no number: "));
    ck_assert(!shows("max D"));
    ck_assert_int_eq(app_has_work(&app), false);
    struct status st = status_ok();
    char *out;
    size_t size;
    FILE *f = open_memstream(&out, &size);
    app.export = &screen_atom.exports[0];
    ck_assert(!app_export(&app, f, &st));
    fclose(f);
    ck_assert_uint_eq(size, 0);
    free(out);
}
END_TEST

/* Both equations, and each model that has an orbital. */
START_TEST(every_overlay_is_drawn_and_named)
{
    static const char *const names[] = {"Fe+", "Schr", "slater", "single-zeta"};
    type("a");
    for (int i = 0; i < 4; i++) {
        atom()->overlay = OVERLAY_NONE;
        type("n");
        ck_assert(shows(" Laid over "));
        for (int k = 0; k <= i; k++)
            type("j");
        key(KEY_CODE_ENTER);
        ck_assert_msg(shows(names[i]), "%s", names[i]);
    }
    /* pins come first */
    atom()->overlay = OVERLAY_NONE;
    jump("Ru");
    type("p");
    jump("Fe");
    type("nj");
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(
        screen_atom_solved(&app.session, atom(), SLOT_OVER)->species.z, 44);
    ck_assert(shows("Ru 5s"));
    key(KEY_CODE_UP);
    ck_assert(shows("Ru 4d"));
    key(KEY_CODE_UP); /* 3p is the outermost p of Fe, 4p of Ru */
    ck_assert(shows("Ru 4p"));
    key(KEY_CODE_UP); /* 3s is a core shell in both */
    ck_assert(shows("Ru 3s"));
}
END_TEST

START_TEST(methods_are_chosen_from_a_list)
{
    type("ab");
    ck_assert(shows(" Method "));
    key(KEY_CODE_UP);
    key(KEY_CODE_UP);
    key(KEY_CODE_UP);
    key(KEY_CODE_ENTER);
    ck_assert(shows("LDA, Schr"));
    const struct atom_report *r =
        screen_atom_solved(&app.session, atom(), SLOT_CHOSEN);
    ck_assert_int_eq(r->method.relativity, RELATIVITY_NONE);
    ck_assert_int_eq(r->levels[0].spin, 0);
}
END_TEST

START_TEST(the_export_is_what_the_command_prints)
{
    char buffer[SESSION_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    struct status st = status_ok();
    char *out;
    size_t size;
    type("a++");
    app.export = &screen_atom.exports[0];
    app_export_command(&app, &t);
    ck_assert_str_eq(buffer, "outershell atom Fe2+ --functional lsd "
                             "--relativity dirac --unit pm,eV --format csv");
    FILE *f = open_memstream(&out, &size);
    ck_assert(app_export(&app, f, &st));
    fclose(f);
    struct csv csv = csv_read_text(out);
    ck_assert_str_eq(csv_cell(&csv, 0, "quantity"), "etot");
    near(csv_number(&csv, 0, "value"),
         screen_atom_solved(&app.session, atom(), SLOT_CHOSEN)->etot *
             27.211386245981,
         1e-6, 0.0, "etot, eV");
    csv_free(&csv);
    free(out);
}
END_TEST

/* Electrons of the user's own are those that are solved, shown, written and
 * named: another total energy than the ground state's. */
START_TEST(own_electrons_are_solved_and_named)
{
    char buffer[SESSION_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    struct status st = status_ok();
    type("a");
    double ground = screen_atom_solved(&app.session, atom(), SLOT_CHOSEN)->etot;
    type(":");
    key(KEY_CODE_CLEAR);
    type("[Ar] 3d7 4s1");
    key(KEY_CODE_ENTER);
    const struct atom_report *own =
        screen_atom_solved(&app.session, atom(), SLOT_CHOSEN);
    ck_assert_ptr_nonnull(own);
    ck_assert(shows("[Ar] 3d7 4s1"));
    struct atom_run *run = run_atom_new(&st);
    ck_assert_ptr_nonnull(run);
    struct species species = own->species;
    ck_assert(configuration_parse("[Ar] 3d7 4s1", &species.configuration, &st));
    ck_assert(run_atom_begin(run, &species, &method_default, &st));
    while (run_atom_step(run))
        ;
    near(own->etot, run_atom_report(run)->etot, 1e-9, 0.0, "etot as asked");
    ck_assert(own->etot > ground + 1e-3 || own->etot < ground - 1e-3);
    run_atom_free(run);
    app.export = &screen_atom.exports[0];
    app_export_command(&app, &t);
    ck_assert_ptr_nonnull(strstr(buffer, "--configuration '[Ar] 3d7 4s1'"));
}
END_TEST

START_TEST(the_view_is_remembered)
{
    char buffer[4096];
    struct text t = text_over(buffer, sizeof buffer);
    type("avg.");
    atom()->method = (struct atom_method){FUNCTIONAL_PBE, RELATIVITY_NONE, 0.0};
    app_save_view(&app, &t);
    reopen_app();
    app_load_view(&app, buffer);
    ck_assert_int_eq(atom()->method.functional, FUNCTIONAL_PBE);
    ck_assert_int_eq(atom()->method.relativity, RELATIVITY_NONE);
    ck_assert_int_eq(atom()->curves, CURVES_ALL);
    ck_assert(atom()->root && app.session.choice.braille);
}
END_TEST

START_TEST(a_click_chooses_a_subshell_or_moves_the_cursor)
{
    type("a");
    struct event click = {
        .kind = EVENT_MOUSE, .row = 5, .column = 3, .button = MOUSE_LEFT};
    ck_assert_int_eq(event_only(&click), EFFECT_REDRAW);
    ck_assert(shows(">1s"));
    const struct area in = atom()->plot.inside;
    click.row = in.row + 2;
    click.column = in.column + 9;
    ck_assert_int_eq(event_only(&click), EFFECT_REDRAW);
    int column;
    ck_assert(plot_column(&atom()->plot,
                          atom()->radius * screen_atom_length(&app.session),
                          &column));
    ck_assert_int_eq(column, in.column + 9);
    struct event wheel = {.kind = EVENT_MOUSE, .button = MOUSE_WHEEL_DOWN};
    event_only(&wheel);
    ck_assert_int_eq(app.session.choice.z, 27);
}
END_TEST

/* Nothing overwrites title, message or keys, whatever the size. */
START_TEST(every_size_keeps_title_and_keys)
{
    jump("U");
    type("a");
    for (int rows = NEEDED_ROWS; rows <= 64; rows += 3)
        for (int columns = NEEDED_COLUMNS; columns <= 210; columns += 13)
            for (int detail = 0; detail < 2; detail++)
                for (int curves = 0; curves < CURVES_COUNT; curves++) {
                    app.session.detail = detail;
                    atom()->curves = (enum atom_curves)curves;
                    resize(rows, columns);
                    char *text = characters();
                    ck_assert_int_eq(strncmp(text, "Atom  U  92", 11), 0);
                    const char *keys = strrchr(text, '?');
                    ck_assert_msg(keys && strncmp(keys, "? keys", 6) == 0,
                                  "%dx%d:\n%s", columns, rows, text);
                    free(text);
                }
}
END_TEST

START_TEST(areas_stay_inside_and_apart)
{
    for (int rows = NEEDED_ROWS; rows <= 100; rows++)
        for (int columns = NEEDED_COLUMNS; columns <= 300; columns += 7)
            for (int shells = 1; shells <= SUBSHELL_MAX; shells += 5) {
                struct atom_layout l =
                    screen_atom_layout(rows, columns, shells);
                const struct area all[] = {l.table, l.levels, l.cursor, l.plot,
                                           l.charge};
                for (int i = 0; i < 5; i++) {
                    ck_assert(all[i].rows >= 0);
                    ck_assert(all[i].row + all[i].rows <= rows - 2);
                    ck_assert(all[i].column + all[i].columns <= columns);
                }
                if (l.form != FORM_WHOLE)
                    continue;
                ck_assert(l.table.column + l.table.columns < l.plot.column);
                ck_assert(l.cursor.row + l.cursor.rows <= l.plot.row);
                ck_assert(l.levels.rows == 0 ||
                          l.table.row + l.table.rows < l.levels.row);
            }
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("atom screen");
    TCase *tc = tcase_create("screen");
    tcase_add_checked_fixture(tc, open_drawn, close_app);
    tcase_add_test(tc, iron_at_80x24);
    tcase_add_test(tc, all_subshells_at_120x40);
    tcase_add_test(tc, uranium_at_200x60_from_the_nucleus_on);
    tcase_add_test(tc, an_ion_over_the_atom_in_braille);
    tcase_add_test(tc, a_small_terminal_shows_the_table_or_the_plot_in_ascii);
    tcase_add_test(tc, an_atom_is_solved_one_cycle_at_a_time);
    tcase_add_test(tc, interrupt_stops_and_enter_goes_on);
    tcase_add_test(tc, the_cursor_reads_at_its_radius_and_charges_add_up_to_z);
    tcase_add_test(tc, up_and_down_choose_a_subshell_or_all);
    tcase_add_test(tc, the_next_element_is_solved_as_well);
    tcase_add_test(tc, what_does_not_bind_has_a_reason_and_no_number);
    tcase_add_test(tc, every_overlay_is_drawn_and_named);
    tcase_add_test(tc, methods_are_chosen_from_a_list);
    tcase_add_test(tc, the_export_is_what_the_command_prints);
    tcase_add_test(tc, own_electrons_are_solved_and_named);
    tcase_add_test(tc, the_view_is_remembered);
    tcase_add_test(tc, a_click_chooses_a_subshell_or_moves_the_cursor);
    tcase_add_test(tc, every_size_keeps_title_and_keys);
    tcase_add_test(tc, areas_stay_inside_and_apart);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
