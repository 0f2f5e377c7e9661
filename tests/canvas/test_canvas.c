/* SPDX-License-Identifier: MIT */
#include <check.h>
#include <limits.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "canvas/canvas.h"
#include "canvas/suites.h"
#include "support/run.h"

static struct canvas fresh(int rows, int columns, bool ascii)
{
    struct canvas canvas;
    struct status st = status_ok();
    ck_assert_msg(canvas_init(&canvas, rows, columns, &st), "%s", st.message);
    canvas.ascii = ascii;
    return canvas;
}

static void reads(const struct canvas *canvas, const char *want)
{
    char *got = canvas_to_text(canvas);
    ck_assert_ptr_nonnull(got);
    ck_assert_str_eq(got, want);
    free(got);
}

START_TEST(every_role_has_a_letter_of_its_own)
{
    for (int a = 0; a < ROLE_COUNT; a++) {
        char letter = role_letter((enum role)a);
        ck_assert(letter > ' ' && letter <= '~' && letter != '@');
        for (int b = 0; b < a; b++)
            ck_assert_msg(letter != role_letter((enum role)b),
                          "roles %d and %d share '%c'", a, b, letter);
    }
}
END_TEST

START_TEST(sizes_are_clamped_and_resize_blanks)
{
    struct canvas c = fresh(-4, INT_MAX, false);
    ck_assert_int_eq(c.rows, 0);
    ck_assert_int_eq(c.columns, CANVAS_COLUMNS_MAX);
    canvas_put(&c, 0, 0, ROLE_TEXT, 'x');
    struct status st = status_ok();
    c.ascii = true;
    ck_assert(canvas_resize(&c, 1, 3, &st));
    ck_assert(c.ascii);
    canvas_text(&c, 0, 0, 3, ROLE_TITLE, "abc");
    reads(&c, "abc\n===\nTTT\n");
    ck_assert(canvas_resize(&c, 2, 2, &st));
    reads(&c, "\n\n==\n\n\n");
    canvas_clear(&c);
    ck_assert_ptr_null(c.cells);
    canvas_clear(&c);
}
END_TEST

START_TEST(text_is_clipped_at_every_edge)
{
    struct canvas c = fresh(2, 4, false);
    ck_assert_int_eq(canvas_text(&c, 0, -2, 9, ROLE_TEXT, "abcdefgh"), 6);
    canvas_text(&c, 2, 0, 4, ROLE_TEXT, "below");
    canvas_text(&c, -1, 0, 4, ROLE_TEXT, "above");
    canvas_text(&c, 1, INT_MAX, 4, ROLE_TEXT, "far");
    canvas_text(&c, 1, 3, 4, ROLE_TEXT, "edge");
    ck_assert_int_eq(canvas_text(&c, 1, 0, 0, ROLE_TEXT, "none"), 0);
    ck_assert_int_eq(canvas_text(&c, 1, 0, -3, ROLE_TEXT, "none"), 0);
    reads(&c, "cdef\n   e\n====\n\n\n");
    canvas_clear(&c);
}
END_TEST

START_TEST(longer_text_ends_in_a_mark)
{
    struct canvas c = fresh(3, 6, false);
    ck_assert_int_eq(canvas_text(&c, 0, 0, 6, ROLE_TEXT, "abcdefg"), 6);
    ck_assert_int_eq(canvas_text(&c, 1, 0, 6, ROLE_TEXT, "abcdef"), 6);
    canvas_text(&c, 2, 0, 1, ROLE_TEXT, "ab");
    reads(&c, "abcde…\nabcdef\n…\n======\n\n\n\n");
    c.ascii = true;
    canvas_text(&c, 0, 0, 6, ROLE_TEXT, "abcdefg");
    canvas_text(&c, 2, 0, 1, ROLE_TEXT, "ab");
    reads(&c, "abcde>\nabcdef\n>\n======\n\n\n\n");
    canvas_clear(&c);
}
END_TEST

START_TEST(text_from_files_cannot_reach_the_terminal)
{
    struct canvas c = fresh(1, 16, false);
    /* escape, newline, delete, C1, a stray byte, a wide character, a
     * combining mark, a soft hyphen, a direction mark */
    canvas_text(&c, 0, 0, 16, ROLE_TEXT,
                "\x1B\n\x7F\xC2\x9B\xFF漢e\xCC\x81\xC2\xAD\xE2\x80\x8F");
    reads(&c, "␛␊␡���e���\n================\n\n");
    canvas_erase(&c);
    c.ascii = true;
    canvas_text(&c, 0, 0, 16, ROLE_TEXT, "\x1B\n\x7F\xC2\x9B\xFF漢e");
    reads(&c, "^^^???e\n================\n\n");
    canvas_clear(&c);
}
END_TEST

START_TEST(right_text_ends_where_told)
{
    struct canvas c = fresh(3, 8, false);
    canvas_right(&c, 0, 1, 5, ROLE_TEXT, "1.5");
    canvas_right(&c, 1, 1, 5, ROLE_TEXT, "−2.25±");
    canvas_right(&c, 2, 1, 5, ROLE_TEXT, "");
    reads(&c, "   1.5\n −2.2…\n\n========\n\n\n\n");
    canvas_clear(&c);
}
END_TEST

START_TEST(rectangles_are_filled_painted_and_turned)
{
    struct canvas c = fresh(3, 5, false);
    canvas_fill(&c, -1, -1, 3, 3, ROLE_RAMP, '#');
    canvas_fill(&c, 2, 3, INT_MAX, INT_MAX, ROLE_BALANCE, '%');
    canvas_fill(&c, 0, 4, -1, 5, ROLE_PIN, 'x');
    canvas_paint(&c, 1, 0, 1, 1, ROLE_KEY);
    canvas_reverse(&c, 2, 4, 1, 9);
    canvas_reverse(&c, 0, 0, 1, 1);
    canvas_reverse(&c, 0, 0, 1, 1);
    canvas_reverse(&c, INT_MIN, INT_MIN, INT_MAX, INT_MAX);
    reads(&c, "##\n##\n   %%\n=====\n11\nK1\n...s@\n");
    canvas_textf(&c, 0, 0, 5, ROLE_TEXT, "%s %d", "Z", 26);
    reads(&c, "Z 26\n##\n   %%\n=====\n\nK1\n...s@\n");
    canvas_clear(&c);
}
END_TEST

START_TEST(erase_blanks_and_hides_the_cursor)
{
    struct canvas c = fresh(1, 2, false);
    canvas_fill(&c, 0, 0, 1, 2, ROLE_GAP, 0x2571);
    c.cursor_row = 7;
    c.cursor_column = 8;
    c.cursor_visible = true;
    canvas_erase(&c);
    ck_assert(!c.cursor_visible && c.cursor_row == 0 && c.cursor_column == 0);
    reads(&c, "\n==\n\n");
    canvas_clear(&c);
}
END_TEST

/* What the screens draw, and what stands for it in ASCII. */
static const char *const twins[][2] = {
    {"±−×·…–—°Åµ", "~-x..--oAu"},
    {"ζχασεπλδΔΣΩ", "zxasepldDSW"},
    {"⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻", "0123456789+-"},
    {"₀₁₂₃₄₅₆₇₈₉₊₋", "0123456789+-"},
    {"▁▂▃▄▅▆▇█", ".:-=+*%#"},
    {"▏▎▍▌▋▊▉█", ".:-=+*%#"},
    {"░▒▓█╱╲", ".:%#/\\"},
    {"─│┌┐└┘├┤┬┴┼═║╭╯", "-|+++++++++=|++"},
    {"━┃┏╋╌╎╔╬╴╵╿", "-|++-|++-||"},
    {"←↑→↓↔↕", "<^>v-|"},
    {"▲▼●○◆◇■□✚", "^v@o*x#%+"},
    {"≤≥≈√∂∝∑", "<>~vd~S"},
    {"‘’“”†‡•′″‹›«»", "''\"\"+#*'\"<><>"},
    {"äöüßéèñçØøÅłŠž", "aouseencOoAlSz"},
    {"␀␛␡", "^^^"},
    {"⠀⠁⠃⠇⡇⡗⡷⣷⣿", " ..::**##"},
};

START_TEST(every_glyph_of_the_screens_has_its_twin)
{
    for (size_t i = 0; i < sizeof twins / sizeof twins[0]; i++) {
        const char *s = twins[i][0];
        const char *want = twins[i][1];
        size_t at = 0;
        ck_assert_uint_eq(utf8_length(s), strlen(want));
        for (size_t k = 0; want[k]; k++) {
            uint32_t character;
            at += utf8_decode(s + at, strlen(s + at), &character);
            ck_assert_msg(glyph_is_single(character), "U+%04X", character);
            ck_assert_msg(glyph_ascii(character) == (unsigned char)want[k],
                          "U+%04X: '%c', not '%c'", character,
                          (char)glyph_ascii(character), want[k]);
        }
    }
}
END_TEST

START_TEST(twins_are_printable_ascii_and_ascii_is_its_own)
{
    for (uint32_t c = 0; c <= 0x20000; c++) {
        uint32_t twin = glyph_ascii(c);
        ck_assert(twin >= 0x20 && twin <= 0x7E);
        if (c >= 0x20 && c <= 0x7E)
            ck_assert_uint_eq(twin, c);
        else if (!glyph_is_single(c))
            ck_assert_msg(twin == '?', "U+%04X has twin '%c' and no width", c,
                          (char)twin);
    }
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("canvas");
    TCase *tc = tcase_create("canvas");
    tcase_add_test(tc, every_role_has_a_letter_of_its_own);
    tcase_add_test(tc, sizes_are_clamped_and_resize_blanks);
    tcase_add_test(tc, text_is_clipped_at_every_edge);
    tcase_add_test(tc, longer_text_ends_in_a_mark);
    tcase_add_test(tc, text_from_files_cannot_reach_the_terminal);
    tcase_add_test(tc, right_text_ends_where_told);
    tcase_add_test(tc, rectangles_are_filled_painted_and_turned);
    tcase_add_test(tc, erase_blanks_and_hides_the_cursor);
    tcase_add_test(tc, every_glyph_of_the_screens_has_its_twin);
    tcase_add_test(tc, twins_are_printable_ascii_and_ascii_is_its_own);
    suite_add_tcase(suite, tc);
    suite_add_tcase(suite, plot_cases());
    suite_add_tcase(suite, scale_case());
    return run_suite(suite);
}
