/* SPDX-License-Identifier: MIT */
/* Pieces of a screen on a canvas of their own: a line being typed, a list to
 * choose from, rows that scroll, keys in a row. */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "support/run.h"
#include "widget/border.h"
#include "widget/chooser.h"
#include "widget/field.h"
#include "widget/hint.h"
#include "widget/message.h"
#include "widget/scroll.h"

static struct canvas canvas;

static void open_canvas(void)
{
    struct status st = status_ok();
    ck_assert(canvas_init(&canvas, 12, 40, &st));
}

static void close_canvas(void)
{
    canvas_clear(&canvas);
}

/* A row of the canvas as ASCII, trailing blanks cut. */
static const char *row_text(int row)
{
    static char line[200];
    int length = 0;
    for (int c = 0; c < canvas.columns; c++) {
        uint32_t character = canvas.cells[row * canvas.columns + c].character;
        line[c] = character < 0x80 ? (char)character : '?';
        length = line[c] == ' ' ? length : c + 1;
    }
    line[length] = '\0';
    return line;
}

static bool type(struct field *field, const char *text)
{
    bool taken = true;
    for (; *text; text++) {
        struct event event = {.kind = EVENT_CHARACTER,
                              .character = (unsigned char)*text};
        taken = taken && field_edit(field, &event);
    }
    return taken;
}

static bool press(struct field *field, enum key key)
{
    struct event event = {.kind = EVENT_KEY, .key = key};
    return field_edit(field, &event);
}

START_TEST(a_field_takes_what_is_typed_and_pasted)
{
    struct field field = {0};
    struct event paste = {.kind = EVENT_PASTE, .character = 0x3A6};
    ck_assert(type(&field, "D(r)"));
    ck_assert(field_edit(&field, &paste));
    ck_assert_str_eq(field.text, "D(r)\xCE\xA6");
    ck_assert_int_eq(field.length, 6);
    ck_assert(press(&field, KEY_CODE_ERASE)); /* the letter, not a byte */
    ck_assert_str_eq(field.text, "D(r)");
    ck_assert(press(&field, KEY_CODE_CLEAR));
    ck_assert_str_eq(field.text, "");
    ck_assert(press(&field, KEY_CODE_ERASE));
    ck_assert_int_eq(field.length, 0);
}
END_TEST

START_TEST(a_field_leaves_other_keys_alone)
{
    struct field field = {0};
    struct event click = {.kind = EVENT_MOUSE};
    ck_assert(type(&field, "Fe"));
    ck_assert(!press(&field, KEY_CODE_ENTER));
    ck_assert(!press(&field, KEY_CODE_LEFT));
    ck_assert(!field_edit(&field, &click));
    field_type(&field, 0x1B); /* a control character has no place */
    ck_assert_str_eq(field.text, "Fe");
}
END_TEST

/* Characters of one to four bytes: a full field takes none in part. */
START_TEST(a_full_field_stays_whole)
{
    static const uint32_t letters[] = {'a', 0xE9, 0x20AC, 0x1F600};
    for (int i = 0; i < 4; i++) {
        struct field field = {0};
        for (int k = 0; k < 2 * FIELD_TEXT_MAX; k++)
            field_type(&field, letters[i]);
        ck_assert_int_lt(field.length, FIELD_TEXT_MAX);
        ck_assert_int_eq(field.length % (i + 1), 0);
        ck_assert(utf8_valid(field.text, (size_t)field.length));
    }
}
END_TEST

START_TEST(the_end_of_a_long_line_is_in_sight)
{
    struct field field = {0};
    ck_assert(type(&field, "0123456789012345678901234567890123456789 end"));
    field_draw(&field, &canvas, 3, "file: ");
    ck_assert_ptr_nonnull(strstr(row_text(3), "file: "));
    ck_assert_ptr_nonnull(strstr(row_text(3), " end"));
    ck_assert_int_eq(canvas.cursor_row, 3);
    ck_assert_int_lt(canvas.cursor_column, canvas.columns);
    ck_assert(canvas.cursor_visible);
    ck_assert_str_eq(field_tail("\xCE\xA6\xCE\xA7\xCE\xA8", 2),
                     "\xCE\xA7\xCE\xA8");
}
END_TEST

static enum chooser_answer answer(struct chooser *c, enum key key)
{
    struct event event = {.kind = EVENT_KEY, .key = key};
    return chooser_update(c, &event);
}

static enum chooser_answer letter(struct chooser *c, char character)
{
    struct event event = {.kind = EVENT_CHARACTER,
                          .character = (unsigned char)character};
    return chooser_update(c, &event);
}

/* Four subshells, 3p under the cursor. */
static struct chooser subshells(void)
{
    static const char *const names[] = {"2s", "2p", "3s", "3p"};
    struct chooser c = {0};
    for (int i = 0; i < 4; i++)
        chooser_add(&c, 10 + i, i == 3, "%s electrons", names[i]);
    return c;
}

START_TEST(a_list_begins_at_the_current_entry_and_ends_at_its_ends)
{
    struct chooser c = subshells();
    ck_assert_int_eq(c.at, 3);
    ck_assert_int_eq(answer(&c, KEY_CODE_DOWN), CHOOSER_MOVED);
    ck_assert_int_eq(c.at, 3);
    answer(&c, KEY_CODE_HOME);
    ck_assert_int_eq(c.at, 0);
    answer(&c, KEY_CODE_UP);
    ck_assert_int_eq(c.at, 0);
    ck_assert_int_eq(letter(&c, '3'), CHOOSER_MOVED);
    ck_assert_int_eq(c.values[c.at], 12);
    letter(&c, '3');
    ck_assert_int_eq(c.values[c.at], 13);
    letter(&c, '3'); /* around */
    ck_assert_int_eq(c.values[c.at], 12);
    letter(&c, 'k');
    ck_assert_int_eq(c.values[c.at], 11);
    letter(&c, 'x'); /* nothing begins so */
    ck_assert_int_eq(c.values[c.at], 11);
}
END_TEST

START_TEST(a_list_is_left_or_an_entry_taken)
{
    struct chooser c = subshells();
    struct event click = {.kind = EVENT_MOUSE};
    ck_assert_int_eq(answer(&c, KEY_CODE_ENTER), CHOOSER_TAKEN);
    ck_assert_int_eq(answer(&c, KEY_CODE_ESCAPE), CHOOSER_LEFT);
    ck_assert_int_eq(letter(&c, 'q'), CHOOSER_LEFT);
    ck_assert_int_eq(chooser_update(&c, &click), CHOOSER_NOTHING);
}
END_TEST

START_TEST(a_full_list_takes_no_more)
{
    struct chooser c = {0};
    for (int i = 0; i < 2 * CHOOSER_MAX; i++)
        chooser_add(&c, i, true, "entry %d", i);
    ck_assert_int_eq(c.count, CHOOSER_MAX);
    ck_assert_int_eq(c.at, CHOOSER_MAX - 1);
}
END_TEST

/* More entries than rows: the one under the cursor is always in sight. */
START_TEST(a_long_list_is_drawn_around_its_cursor)
{
    struct chooser c = {0};
    for (int i = 0; i < 30; i++)
        chooser_add(&c, i, false, "entry %d", i);
    for (int at = 0; at < 30; at++) {
        char words[32];
        snprintf(words, sizeof words, "> entry %d", at);
        c.at = at;
        canvas_erase(&canvas);
        chooser_draw(&c, &canvas, "Title");
        ck_assert_msg(strstr(row_text(canvas.cursor_row), words), "%d: %s", at,
                      row_text(canvas.cursor_row));
        ck_assert_ptr_nonnull(strstr(row_text(1), " Title "));
    }
}
END_TEST

START_TEST(a_border_blanks_what_it_encloses)
{
    canvas_fill(&canvas, 0, 0, 12, 40, ROLE_TEXT, 'x');
    border_draw(&canvas, (struct area){2, 5, 4, 12}, "T");
    for (int row = 3; row < 5; row++)
        for (int column = 6; column < 16; column++)
            ck_assert_uint_eq(canvas.cells[row * 40 + column].character, ' ');
    ck_assert_uint_eq(canvas.cells[1 * 40 + 5].character, 'x');
    ck_assert_uint_eq(canvas.cells[6 * 40 + 5].character, 'x');
    ck_assert_uint_eq(canvas.cells[2 * 40 + 17].character, 'x');
}
END_TEST

START_TEST(hints_that_do_not_fit_are_left_out)
{
    int column = hint_draw(&canvas, 0, 0, "q", "quit");
    ck_assert_int_eq(column, 8);
    ck_assert_int_eq(hint_draw(&canvas, 0, 30, "w", "quantities"), 30);
    ck_assert_str_eq(row_text(0), "q quit");
    column = hint_draw(&canvas, 0, column, "w", "what");
    ck_assert_str_eq(row_text(0), "q quit  w what");
    ck_assert_int_eq(column, 16);
}
END_TEST

START_TEST(a_long_message_goes_upwards)
{
    canvas_fill(&canvas, 0, 0, 12, 40, ROLE_TEXT, 'x');
    message_draw(&canvas, 10, ROLE_CAUTION, "short");
    ck_assert_int_eq(row_text(9)[0], 'x');
    message_draw(&canvas, 10, ROLE_CAUTION,
                 "a sentence that is too long for the forty columns of this "
                 "canvas and so takes three rows");
    ck_assert_ptr_nonnull(strstr(row_text(8), "a sentence"));
    ck_assert_ptr_nonnull(strstr(row_text(10), "three rows"));
    ck_assert_int_eq(row_text(7)[0], 'x');
    ck_assert_int_eq(row_text(11)[0], 'x');
}
END_TEST

START_TEST(scrolling_never_goes_above_the_first_row)
{
    static const enum move moves[] = {MOVE_UP, MOVE_PAGE_UP, MOVE_HOME,
                                      MOVE_LEFT, MOVE_RIGHT};
    for (size_t i = 0; i < sizeof moves / sizeof moves[0]; i++)
        ck_assert_int_eq(scroll_move(0, moves[i], 24), 0);
    ck_assert_int_eq(scroll_move(7, MOVE_UP, 24), 6);
    ck_assert_int_eq(scroll_move(7, MOVE_DOWN, 24), 8);
    ck_assert_int_eq(scroll_move(7, MOVE_LEFT, 24), 7);
    ck_assert_int_eq(
        scroll_move(scroll_move(30, MOVE_PAGE_DOWN, 24), MOVE_PAGE_UP, 24), 30);
    ck_assert_int_gt(scroll_move(0, MOVE_PAGE_DOWN, 6), 0);
    ck_assert_int_gt(scroll_move(0, MOVE_END, 24), 1000);
    ck_assert_int_eq(scroll_wheel(1, true), 0);
    ck_assert_int_eq(scroll_wheel(scroll_wheel(5, false), true), 5);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("widget");
    TCase *tc = tcase_create("widget");
    tcase_add_checked_fixture(tc, open_canvas, close_canvas);
    tcase_add_test(tc, a_field_takes_what_is_typed_and_pasted);
    tcase_add_test(tc, a_field_leaves_other_keys_alone);
    tcase_add_test(tc, a_full_field_stays_whole);
    tcase_add_test(tc, the_end_of_a_long_line_is_in_sight);
    tcase_add_test(tc, a_list_begins_at_the_current_entry_and_ends_at_its_ends);
    tcase_add_test(tc, a_list_is_left_or_an_entry_taken);
    tcase_add_test(tc, a_full_list_takes_no_more);
    tcase_add_test(tc, a_long_list_is_drawn_around_its_cursor);
    tcase_add_test(tc, a_border_blanks_what_it_encloses);
    tcase_add_test(tc, hints_that_do_not_fit_are_left_out);
    tcase_add_test(tc, a_long_message_goes_upwards);
    tcase_add_test(tc, scrolling_never_goes_above_the_first_row);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
