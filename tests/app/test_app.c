/* SPDX-License-Identifier: MIT */
/* The screens as events in and a canvas out: no terminal. */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "app/desk.h"
#include "app/desk_keys.h"
#include "app/suites.h"
#include "screens/list.h"
#include "session/common.h"
#include "support/csv.h"
#include "support/run.h"

/* Places among the exports of the map. */
enum { EXPORT_ROW, EXPORT_PINS, EXPORT_SHEET };

START_TEST(small_terminals_say_what_they_need)
{
    resize(5, 20);
    ck_assert(shows("needs 24x6"));
    ck_assert_int_eq(type("q"), EFFECT_QUIT);
    resize(1, 1);
    free(drawn());
}
END_TEST

START_TEST(every_size_is_drawn_on_every_screen)
{
    static const char *const screens[] = {"m", "c", "t", "d", "a", "s", "?"};
    for (size_t s = 0; s < sizeof screens / sizeof screens[0]; s++) {
        type(screens[s]);
        for (int rows = 1; rows < 70; rows += 4)
            for (int columns = 1; columns < 240; columns += 13) {
                resize(rows, columns);
                app_draw(&app, &canvas);
                ck_assert_int_lt(canvas.cursor_row, rows);
                ck_assert_int_lt(canvas.cursor_column, columns);
            }
        key(KEY_CODE_ESCAPE);
    }
}
END_TEST

START_TEST(a_capital_letter_jumps_and_arrows_move_on)
{
    type("Zr");
    ck_assert_int_eq(app.session.choice.z, 40);
    key(KEY_CODE_RIGHT);
    ck_assert_int_eq(app.session.choice.z, 41);
    type("/tung");
    ck_assert(shows("element: tung"));
    key(KEY_CODE_ESCAPE);
    type("92");
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(app.session.choice.z, 92);
    type("/wolf");
    key(KEY_CODE_ENTER);
    ck_assert(shows("no element has this symbol, name or number"));
    ck_assert_int_eq(app.session.choice.z, 92);
}
END_TEST

START_TEST(erasing_takes_whole_characters)
{
    struct event e = {.kind = EVENT_PASTE, .character = 0xE9};
    type("/Z");
    app_update(&app, &e);
    key(KEY_CODE_ERASE);
    ck_assert_str_eq(app.field.text, "Z");
    key(KEY_CODE_ERASE);
    key(KEY_CODE_ERASE);
    ck_assert_str_eq(app.field.text, "");
}
END_TEST

/* On every screen, every character: nothing is done and nothing changes. */
START_TEST(pasted_text_never_is_a_command)
{
    static const char *const screens[] = {"m", "c", "t", "d", "a", "s", "?"};
    for (size_t s = 0; s < sizeof screens / sizeof screens[0]; s++) {
        type(screens[s]);
        char *before = drawn();
        for (uint32_t c = ' '; c < 127; c++) {
            struct event e = {.kind = EVENT_PASTE, .character = c};
            ck_assert_int_eq(app_update(&app, &e), EFFECT_NONE);
        }
        char *after = drawn();
        ck_assert_str_eq(after, before);
        free(after);
        free(before);
        key(KEY_CODE_ESCAPE);
    }
}
END_TEST

START_TEST(charges_and_subshells_are_chosen)
{
    type("++");
    ck_assert_int_eq(app.session.choice.charge, 2);
    ck_assert(shows("charge 2+"));
    type("o");
    ck_assert(shows("outermost"));
    key(KEY_CODE_END);
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(app.session.choice.n, 3);
    ck_assert_int_eq(app.session.choice.l, 2);
    type("---");
    ck_assert_int_eq(app.session.choice.charge, -1);
    type("He");
    key(KEY_CODE_ENTER);
    type("++++");
    ck_assert(shows("has no charge"));
}
END_TEST

START_TEST(a_site_is_chosen_with_its_radius_in_sight)
{
    char buffer[SESSION_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    session_select(&app.session, 31);
    type("+++wr");
    key(KEY_CODE_ENTER);
    type("@");
    /* R. D. Shannon, Acta Cryst. A32, 751 (1976): Ga3+ IV 47 pm, effective
     * ionic radius. */
    ck_assert(shows("IV  47 pm"));
    key(KEY_CODE_DOWN);
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(app.session.choice.site.coordination, COORDINATION_IV);
    ck_assert(shows("coordination IV"));
    app.export = &screen_map.exports[EXPORT_ROW];
    app_export_command(&app, &t);
    ck_assert_ptr_nonnull(strstr(buffer, "--coordination IV"));
    char view[2048];
    t = text_over(view, sizeof view);
    app_save_view(&app, &t);
    reopen_app();
    app_load_view(&app, view);
    ck_assert_int_eq(app.session.choice.site.coordination, COORDINATION_IV);
}
END_TEST

START_TEST(a_wrong_configuration_stays_to_be_mended)
{
    type(":x");
    ck_assert_int_eq(key(KEY_CODE_ENTER), EFFECT_REDRAW);
    ck_assert_ptr_eq(app.prompt, &session_prompt_configuration);
    ck_assert(shows("is no subshell"));
    type("y");
    ck_assert(!shows("is no subshell"));
    key(KEY_CODE_ESCAPE);
    ck_assert_ptr_null(app.prompt);
}
END_TEST

START_TEST(quantities_without_a_model_show_their_reference)
{
    type("wpol");
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(app.session.choice.quantity, QUANTITY_POLARIZABILITY);
    ck_assert_int_eq(app.session.choice.shown, SHOWN_REFERENCE);
    type("v");
    ck_assert(shows("no model computes"));
    type("b");
    ck_assert(shows("nothing to choose from"));
}
END_TEST

START_TEST(a_chooser_goes_by_letter_and_can_be_left)
{
    type("w");
    type("i");
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(app.session.choice.quantity, QUANTITY_IONIZATION);
    type("w");
    key(KEY_CODE_ESCAPE);
    ck_assert_int_eq(app.session.choice.quantity, QUANTITY_IONIZATION);
    type("u");
    type("k");
    key(KEY_CODE_DOWN);
    key(KEY_CODE_ENTER);
    ck_assert(shows("kJ/mol"));
}
END_TEST

/* What the i-th export of the map holds, as text. The caller frees it. */
static char *exported(int i)
{
    struct status st = status_ok();
    char *text = NULL;
    size_t size = 0;
    FILE *out = open_memstream(&text, &size);
    ck_assert_ptr_nonnull(out);
    app.export = &screen_map.exports[i];
    ck_assert(app_export(&app, out, &st));
    fclose(out);
    return text;
}

START_TEST(exports_ask_for_a_file_and_hold_what_is_shown)
{
    type("e");
    key(KEY_CODE_ENTER);
    ck_assert(shows("write CSV to: Fe-zeff.csv"));
    ck_assert_int_eq(key(KEY_CODE_ENTER), EFFECT_WRITE);
    ck_assert_str_eq(app.path, "Fe-zeff.csv");
    ck_assert(!app.replace);
    char *row = exported(EXPORT_ROW);
    struct csv csv = csv_read_text(row);
    int offering = 0;
    for (int m = 0; m < model_count(); m++)
        offering += model_gives(model_at(m), QUANTITY_ZEFF);
    ck_assert_uint_eq(csv_rows(&csv), (size_t)offering);
    ck_assert_str_eq(csv_cell(&csv, 0, "symbol"), "Fe");
    csv_free(&csv);
    free(row);
    char *sheet = exported(EXPORT_SHEET);
    csv = csv_read_text(sheet);
    ck_assert_uint_eq(csv_rows(&csv), Z_MAX);
    csv_free(&csv);
    free(sheet);
}
END_TEST

START_TEST(an_existing_file_is_asked_about)
{
    snprintf(app.path, sizeof app.path, "there.csv");
    app_ask_overwrite(&app);
    ck_assert(shows("there.csv exists; overwrite it? y/n"));
    ck_assert_int_eq(type("n"), EFFECT_REDRAW);
    ck_assert(shows("left as it was"));
    app_ask_overwrite(&app);
    ck_assert_int_eq(type("y"), EFFECT_WRITE);
    ck_assert(app.replace);
}
END_TEST

START_TEST(the_command_of_an_export_names_every_choice)
{
    char buffer[SESSION_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    app.session.choice.charge = 2;
    app.session.choice.n = 3;
    app.session.choice.l = 2;
    app.export = &screen_map.exports[EXPORT_SHEET];
    app_export_command(&app, &t);
    ck_assert_str_eq(buffer, "outershell list --quantity zeff --model slater "
                             "--charge 2 --subshell 3d --format csv");
}
END_TEST

START_TEST(a_key_behind_a_whole_symbol_ends_the_jump)
{
    type("Nip");
    ck_assert_ptr_null(app.prompt);
    ck_assert_int_eq(app.session.choice.z, 28);
    ck_assert_int_eq(app.session.choice.pin_count, 1);
    type("Cop"); /* copper */
    ck_assert_ptr_eq(app.prompt, &session_prompt_jump);
    ck_assert_int_eq(app.session.choice.z, 29);
    ck_assert_int_eq(app.session.choice.pin_count, 1);
    key(KEY_CODE_ENTER);
    type("Sodiux"); /* a slip does not drop the pins */
    ck_assert_ptr_eq(app.prompt, &session_prompt_jump);
    ck_assert_int_eq(app.session.choice.pin_count, 1);
    ck_assert(shows("no such element"));
}
END_TEST

/* A long file name leaves neither the command nor the question cut off. */
START_TEST(long_messages_are_read_whole)
{
    char path[181];
    memset(path, 'd', sizeof path - 1);
    path[sizeof path - 1] = '\0';
    session_report(&app.session, false, "%s written; the same: outershell END",
                   path);
    ck_assert(shows("outershell END"));
    ck_assert(shows("? keys"));
    snprintf(app.path, sizeof app.path, "%s", path);
    app_ask_overwrite(&app);
    ck_assert(shows("exists; overwrite it? y/n"));
}
END_TEST

START_TEST(a_narrow_prompt_shows_what_is_typed)
{
    resize(6, 30);
    type(":");
    key(KEY_CODE_CLEAR);
    type("[Ar] 3d7");
    ck_assert(shows("configuration"));
    ck_assert(shows("[Ar] 3d7"));
}
END_TEST

START_TEST(a_view_comes_back_as_it_was_left)
{
    char first[2048];
    char second[2048];
    struct text t = text_over(first, sizeof first);
    type("v+");
    type("p");
    app.session.choice.n = 3;
    app.session.choice.l = 1;
    app.session.choice.units[DIMENSION_LENGTH] = unit_find("bohr");
    app_save_view(&app, &t);
    reopen_app();
    app_load_view(&app, first);
    t = text_over(second, sizeof second);
    app_save_view(&app, &t);
    ck_assert_str_eq(first, second);
    ck_assert_ptr_nonnull(strstr(first, "pin Fe+"));
}
END_TEST

START_TEST(a_broken_view_is_passed_over)
{
    app_load_view(&app,
                  "quantity\nmodel none\nelement Xx\ncharge 999\n\n\nunit\n"
                  "subshell 9z\npin Fe99+\npin \nreference nothing\n"
                  "shown never\nnonsense of the past\ncolumns x");
    ck_assert_int_eq(app.session.choice.z, 26);
    ck_assert_int_eq(app.session.choice.charge, 0);
    ck_assert_int_eq(app.session.choice.pin_count, 0);
    free(drawn());
}
END_TEST

START_TEST(twelve_pins_and_no_more)
{
    for (int z = 1; z <= PIN_MAX + 1; z++) {
        session_select(&app.session, z);
        type("p");
    }
    ck_assert_int_eq(app.session.choice.pin_count, PIN_MAX);
    ck_assert(shows("not pinned"));
    type("c");
    key(KEY_CODE_RIGHT);
    free(drawn());
    type("x");
    ck_assert_int_eq(app.session.choice.pin_count, 0);
}
END_TEST

START_TEST(keys_do_one_thing_on_each_screen)
{
    for (int s = 0; s < screen_list_count; s++) {
        struct key_set set;
        session_key_set(screen_list, screen_list_count, screen_list[s], &set);
        for (int i = 0; i < set.count; i++)
            for (int k = 0; k < i; k++) {
                const struct key_row *a = set.rows[i];
                const struct key_row *b = set.rows[k];
                ck_assert_msg(a->character != b->character || a->key != b->key,
                              "%s: %s", screen_list[s]->id, a->name);
                ck_assert_int_ne(a->place, b->place);
            }
    }
}
END_TEST

/* A picture: something in it unless there is hardly a place, the cursor
 * within, no control character; and drawn again it is the same. */
static void check_picture(int turn)
{
    char *text = drawn();
    int written = 0, places = canvas.rows * canvas.columns;
    for (int i = 0; i < places; i++) {
        if (canvas.cells[i].character < ' ')
            ck_abort_msg("turn %d: a control character", turn);
        written += canvas.cells[i].character != ' ';
    }
    ck_assert_msg(written > 0 || places < 24 * 6, "turn %d: %dx%d is blank",
                  turn, canvas.columns, canvas.rows);
    ck_assert(canvas.cursor_row >= 0 && canvas.cursor_row < canvas.rows);
    ck_assert(canvas.cursor_column >= 0 &&
              canvas.cursor_column < canvas.columns);
    char *again = drawn();
    ck_assert_str_eq(again, text);
    free(again);
    free(text);
}

/* What every function behind the keys takes for granted. */
static void check_choice(int turn)
{
    const struct choice *c = &app.session.choice;
    ck_assert_msg(c->z >= 1 && c->z <= Z_MAX, "turn %d: Z=%d", turn, c->z);
    ck_assert_msg(c->charge <= Z_MAX, "turn %d: Z=%d charge %d", turn, c->z,
                  c->charge);
    ck_assert(c->pin_count >= 0 && c->pin_count <= PIN_MAX);
    ck_assert(c->quantity < QUANTITY_COUNT && c->shown < SHOWN_COUNT);
    ck_assert(app.screen >= 0 && app.screen < screen_list_count);
    ck_assert_uint_lt(strlen(app.field.text), sizeof app.field.text);
}

START_TEST(random_keys_always_leave_something_to_draw)
{
    unsigned seed = 12345, screens = 0;
    for (int i = 0; i < 3000; i++) {
        seed = seed * 1103515245u + 12345u;
        unsigned r = seed >> 16;
        if (r % 3 == 0)
            key((enum key)(1 + r / 3 % KEY_CODE_REPAINT));
        else if (r % 97 == 1)
            resize((int)(1 + r / 97 % 60), (int)(1 + r / 7 % 210));
        else {
            char c[2] = {(char)(' ' + r / 3 % 95), '\0'};
            type(c);
        }
        check_choice(i);
        screens |= 1u << app.screen;
        if (i % 5 == 0)
            check_picture(i);
    }
    ck_assert_uint_eq(screens,
                      (1u << screen_list_count) - 1); /* all were seen */
    /* and whatever is open, it can be left */
    for (int i = 0; i < 4; i++)
        key(KEY_CODE_ESCAPE);
    ck_assert_int_eq(type("q"), EFFECT_QUIT);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("app");
    suite_add_tcase(suite, keys_case());
    TCase *use = tcase_create("use");
    tcase_add_checked_fixture(use, open_app, close_app);
    tcase_add_test(use, small_terminals_say_what_they_need);
    tcase_add_test(use, every_size_is_drawn_on_every_screen);
    tcase_add_test(use, a_capital_letter_jumps_and_arrows_move_on);
    tcase_add_test(use, erasing_takes_whole_characters);
    tcase_add_test(use, pasted_text_never_is_a_command);
    tcase_add_test(use, charges_and_subshells_are_chosen);
    tcase_add_test(use, a_site_is_chosen_with_its_radius_in_sight);
    tcase_add_test(use, a_wrong_configuration_stays_to_be_mended);
    tcase_add_test(use, quantities_without_a_model_show_their_reference);
    tcase_add_test(use, a_chooser_goes_by_letter_and_can_be_left);
    tcase_add_test(use, exports_ask_for_a_file_and_hold_what_is_shown);
    tcase_add_test(use, an_existing_file_is_asked_about);
    tcase_add_test(use, the_command_of_an_export_names_every_choice);
    tcase_add_test(use, a_key_behind_a_whole_symbol_ends_the_jump);
    tcase_add_test(use, long_messages_are_read_whole);
    tcase_add_test(use, a_narrow_prompt_shows_what_is_typed);
    tcase_add_test(use, a_view_comes_back_as_it_was_left);
    tcase_add_test(use, a_broken_view_is_passed_over);
    tcase_add_test(use, twelve_pins_and_no_more);
    tcase_add_test(use, keys_do_one_thing_on_each_screen);
    tcase_add_test(use, random_keys_always_leave_something_to_draw);
    suite_add_tcase(suite, use);
    return run_suite(suite);
}
