/* SPDX-License-Identifier: MIT */
#include <stdint.h>
#include <math.h>
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>
#include <unistd.h>

#include "base/file.h"
#include "base/number.h"
#include "base/status.h"
#include "base/text.h"
#include "base/units.h"
#include "support/near.h"
#include "support/run.h"

START_TEST(every_status_code_has_text_and_exit_status)
{
    for (int c = 0; c < STATUS_COUNT; c++) {
        ck_assert_int_gt((int)strlen(status_text((enum status_code)c)), 0);
        int e = status_exit((enum status_code)c);
        ck_assert(c == STATUS_OK ? e == 0 : e == 1 || e == 2);
    }
}
END_TEST

START_TEST(context_stands_before_the_message)
{
    struct status st = status_ok();
    ck_assert(!status_fail(&st, STATUS_DATA, "entry %d: no symbol", 12));
    ck_assert(!status_context(&st, "%s", "fe.json"));
    ck_assert_str_eq(st.message, "fe.json: entry 12: no symbol");
    ck_assert_int_eq(st.code, STATUS_DATA);
}
END_TEST

START_TEST(long_messages_end_in_whole_characters)
{
    char longer[2 * STATUS_MESSAGE_MAX + 2];
    for (size_t i = 0; i + 2 < sizeof longer; i += 2)
        memcpy(longer + i, "\xC3\xA9", 3);
    for (int shift = 0; shift < 2; shift++) {
        struct status st = status_ok();
        status_fail(&st, STATUS_DATA, "%s%s", shift ? "x" : "", longer);
        ck_assert(utf8_valid(st.message, strlen(st.message)));
        status_context(&st, "%s", longer);
        ck_assert(utf8_valid(st.message, strlen(st.message)));
    }
}
END_TEST

START_TEST(text_is_cut_between_characters)
{
    char room[6];
    struct text t = text_over(room, sizeof room);
    text_add(&t, "ab");
    text_add(&t, "\xE2\x84\xAB\xE2\x84\xAB");
    ck_assert_str_eq(room, "ab\xE2\x84\xAB");
    ck_assert(t.cut);
}
END_TEST

/* Longer than the room in which the format is printed first. */
START_TEST(formatted_text_is_cut_between_characters)
{
    static char room[3000];
    static char word[2100];
    static const char *const letters[] = {"\xC3\xA9", "\xE2\x84\xAB",
                                          "\xF0\x9F\x9C\x81"};
    for (int lead = 0; lead < 4; lead++) {
        memset(word, 'x', (size_t)lead);
        word[lead] = '\0';
        while (strlen(word) < 2000)
            snprintf(word + strlen(word), 8, "%s", letters[_i]);
        struct text t = text_over(room, sizeof room);
        text_addf(&t, "%s", word);
        ck_assert(t.cut && t.length > 1000);
        ck_assert(utf8_valid(room, t.length));
        ck_assert_uint_eq(strlen(room), t.length);
        ck_assert_int_eq(strncmp(room, word, t.length), 0);
    }
}
END_TEST

START_TEST(whole_characters_are_counted)
{
    ck_assert_uint_eq(utf8_whole("ab", 2), 2);
    ck_assert_uint_eq(utf8_whole("a\xE2\x84\xAB", 4), 4);
    ck_assert_uint_eq(utf8_whole("a\xE2\x84\xAB", 3), 1);
    ck_assert_uint_eq(utf8_whole("a\xE2\x84\xAB", 2), 1);
    ck_assert_uint_eq(utf8_whole("\xC3", 1), 0);
    ck_assert_uint_eq(utf8_whole("", 0), 0);
}
END_TEST

START_TEST(utf8_round_trips_and_refuses_malformed_bytes)
{
    for (uint32_t c = 1; c <= 0x10FFFF; c += c < 0x1000 ? 1 : 257) {
        if (c >= 0xD800 && c <= 0xDFFF)
            continue;
        char out[4];
        uint32_t back;
        size_t n = utf8_encode(c, out);
        ck_assert_uint_eq(utf8_decode(out, n, &back), n);
        ck_assert_uint_eq(back, c);
    }
    /* Malformed by Unicode 15, table 3-7: overlong, surrogate, above the
     * range, truncated, stray continuation. */
    static const char *const bad[] = {
        "\xC0\x80", "\xED\xA0\x80", "\xF4\x90\x80\x80",
        "\xE2\x84", "\x80",         "\xFF"};
    for (size_t i = 0; i < sizeof bad / sizeof bad[0]; i++)
        ck_assert(!utf8_valid(bad[i], strlen(bad[i])));
}
END_TEST

START_TEST(what_steers_a_text_unseen_is_a_control_character)
{
    /* Unicode 15, general category Cf: zero width, direction, byte mark. */
    static const uint32_t unseen[] = {0x200B, 0x200F, 0x202E, 0x2066, 0xFEFF};
    for (size_t i = 0; i < sizeof unseen / sizeof unseen[0]; i++)
        ck_assert(utf8_is_control(unseen[i]));
    ck_assert(!utf8_is_control(0x2026) && !utf8_is_control(0xE9));
}
END_TEST

START_TEST(edit_distance_counts_edits)
{
    ck_assert_uint_eq(text_edit_distance("zeff", "zef"), 1);
    ck_assert_uint_eq(text_edit_distance("Radius", "radius"), 0);
    ck_assert_uint_eq(text_edit_distance("", "abc"), 3);
}
END_TEST

START_TEST(integers_and_doubles_are_read_whole)
{
    int i;
    double d;
    ck_assert(text_to_int("-12", &i) && i == -12);
    ck_assert(!text_to_int("12x", &i) && !text_to_int("", &i));
    ck_assert(!text_to_int("99999999999", &i) && !text_to_int("+", &i));
    ck_assert(text_to_double("1.5e2", &d) && d == 150.0);
    ck_assert(!text_to_double("0x10", &d) && !text_to_double("nan", &d));
    ck_assert(!text_to_double("1e999", &d) && !text_to_double("1,5", &d));
}
END_TEST

START_TEST(numbers_print_digit_for_digit)
{
    char out[NUMBER_TEXT_MAX];
    static const char *const printed[] = {"13.598434599702", "5.391714996",
                                          "0.0000000010", "6.50", "104050.2"};
    for (size_t i = 0; i < sizeof printed / sizeof printed[0]; i++) {
        struct number n = {strtod(printed[i], NULL),
                           number_places_of(printed[i])};
        ck_assert_str_eq(number_print(n, out), printed[i]);
    }
    ck_assert_int_eq(number_places_of("1.5e-3"), 4);
    ck_assert_int_eq(number_places_of("12e2"), 0);
}
END_TEST

START_TEST(differences_are_exact_in_decimal)
{
    char out[NUMBER_TEXT_MAX];
    struct number a = number_round(3.0 - 1.7, 7, 6);
    ck_assert_str_eq(number_print_short(a, out), "1.3");
    struct number d = number_subtract(a, (struct number){0.9995, 4});
    ck_assert_str_eq(number_print_short(d, out), "0.3005");
    ck_assert_str_eq(number_print_places(-0.04, 1, out), "0.0");
}
END_TEST

START_TEST(change_of_unit_keeps_significant_digits)
{
    char out[NUMBER_TEXT_MAX];
    struct number pm = {128.0, 0};
    number_print(number_scale(pm, 0.01), out);
    near(strtod(out, NULL), 1.28, 1e-12, 0, "128 pm in angstrom");
    /* 1 eV = 96.485332123 kJ/mol, CODATA 2022 (exact by definition). */
    struct number ev = {1.000000000, 9};
    near(number_scale(ev, EV_KJ_PER_MOL).value, 96.485332123, 1e-8, 0, "eV");
    struct number u = {0.0000012, 7};
    number_print(number_scale_uncertainty(u, EV_KJ_PER_MOL), out);
    ck_assert_str_eq(out, "0.00012");
    near(EV_PER_CM, 8065.543937, 1e-6, 0, "eV in cm-1, CODATA 2022");
}
END_TEST

/* The Rydberg constant, 10 973 731.568 157(12) per metre (CODATA 2022, value
 * from memory), and the constants that the SI defines give all others: Ry =
 * R h c / e, hartree = 2 Ry, bohr = alpha / 4 pi R. The Faraday constant and
 * the wavenumber of one electronvolt are exact as well: 96 485.332 12… C/mol,
 * 8065.543 937… per cm (SI brochure, 9th edition, value from memory). */
START_TEST(constants_agree_with_the_rydberg_constant_and_the_si)
{
    const double rydberg = 10973731.568157, h = 6.62607015e-34;
    const double e = 1.602176634e-19, c = 299792458.0;
    near(RYDBERG_EV, rydberg * h * c / e, 1e-12, 0.0, "rydberg");
    near(HARTREE_EV, 2.0 * rydberg * h * c / e, 2e-12, 0.0, "hartree");
    near(BOHR_PM * SPEED_OF_LIGHT_AU,
         1e12 / (4.0 * 3.14159265358979324) / rydberg, 0.0, 2e-11,
         "bohr and the fine-structure constant");
    /* 1/alpha apart from bohr: CODATA 2022, value from memory */
    near(SPEED_OF_LIGHT_AU, 137.035999177, 0.0, 1e-13, "1/alpha");
    near(unit_find("kJ/mol")->per_base, 96.4853321233, 0.0, 1e-11, "kJ/mol");
    near(unit_find("cm-1")->per_base, 8065.54393735, 0.0, 1e-11, "cm-1");
    near(unit_find("hartree")->per_base * HARTREE_EV, 1.0, 0.0, 1e-14, "eV");
    near(unit_find("bohr")->per_base * BOHR_PM, 1.0, 0.0, 1e-14, "pm");
    near(unit_find("angstrom")->per_base, 0.01, 0.0, 1e-14, "angstrom");
}
END_TEST

START_TEST(units_are_unique_and_have_a_base)
{
    for (size_t i = 0; i < unit_count(); i++) {
        const struct unit *u = unit_at(i);
        ck_assert_ptr_eq(unit_find(u->id), u);
        ck_assert(unit_base(u->dimension)->per_base == 1.0);
    }
    ck_assert_ptr_null(unit_find("furlong"));
}
END_TEST

static char folder[64];

static void make_folder(void)
{
    snprintf(folder, sizeof folder, "/tmp/outershell-test-XXXXXX");
    ck_assert_ptr_nonnull(mkdtemp(folder));
    ck_assert_int_eq(chdir(folder), 0);
}

static void remove_folder(void)
{
    unlink("a.csv");
    ck_assert_int_eq(chdir("/"), 0);
    ck_assert_int_eq(rmdir(folder), 0);
}

static bool write_file(const char *name, const char *text, bool replace,
                       struct status *st)
{
    struct file_draft draft;
    if (!file_draft_open(&draft, name, replace, st))
        return false;
    fputs(text, draft.stream);
    return file_draft_commit(&draft, st);
}

START_TEST(a_written_file_is_read_back_and_not_overwritten_unasked)
{
    struct status st = status_ok();
    char *data;
    size_t size;
    ck_assert(write_file("a.csv", "one", false, &st));
    ck_assert(!write_file("a.csv", "two", false, &st));
    ck_assert_int_eq(st.code, STATUS_FILE);
    ck_assert(file_read("a.csv", 100, &data, &size, &st));
    ck_assert_str_eq(data, "one");
    free(data);
    ck_assert_int_eq(chmod("a.csv", 0640), 0);
    ck_assert(write_file("a.csv", "three", true, &st));
    struct stat info;
    ck_assert_int_eq(stat("a.csv", &info), 0);
    ck_assert_int_eq(info.st_mode & 0777, 0640);
    ck_assert_int_eq(info.st_size, 5);
}
END_TEST

START_TEST(a_discarded_draft_leaves_nothing)
{
    struct status st = status_ok();
    struct file_draft draft;
    ck_assert(file_draft_open(&draft, "a.csv", false, &st));
    fputs("half", draft.stream);
    file_draft_discard(&draft);
    file_draft_discard(&draft);
    ck_assert_int_ne(access("a.csv", F_OK), 0);
}
END_TEST

START_TEST(file_failures_name_the_file)
{
    struct status st = status_ok();
    char *data;
    size_t size;
    ck_assert(!file_read("missing.json", 9, &data, &size, &st));
    ck_assert_ptr_nonnull(strstr(st.message, "missing.json"));
    ck_assert(!file_read(".", 9, &data, &size, &st));
    ck_assert(write_file("a.csv", "0123456789", false, &st));
    ck_assert(!file_read("a.csv", 9, &data, &size, &st));
    ck_assert_int_eq(st.code, STATUS_DATA);
    ck_assert(!write_file("no/such/folder.csv", "x", false, &st));
    ck_assert_int_eq(st.code, STATUS_FILE);
    ck_assert(!write_file("", "x", false, &st));
}
END_TEST

START_TEST(a_full_device_is_reported)
{
    struct status st = status_ok();
    FILE *full = fopen("/dev/full", "w");
    ck_assert_ptr_nonnull(full);
    fputs("x", full);
    ck_assert(!file_flush(full, "standard output", &st));
    ck_assert_ptr_nonnull(strstr(st.message, "standard output"));
    fclose(full);
}
END_TEST

/* The quick way and printf's agree in every digit, ties and near-ties too. */
START_TEST(numbers_round_and_print_as_printf_does)
{
    uint64_t seed = 88172645463325252u;
    for (int i = 0; i < 200000; i++) {
        seed ^= seed << 13; /* Marsaglia, J. Stat. Softw. 8(14), 2003 */
        seed ^= seed >> 7;
        seed ^= seed << 17;
        double size = pow(10.0, (double)(seed % 23) - 9.0);
        double value = ((double)(seed >> 11) / 4503599627370496.0 - 1.0) * size;
        int places = (int)(seed % 16);
        if (i % 3 == 0) /* a tie: an odd multiple of a half unit */
            value = ((double)(seed % 2000) + 0.5) / pow(10.0, places);
        struct number n = number_round(value, 1, places);
        char want[400];
        char out[NUMBER_TEXT_MAX];
        snprintf(want, sizeof want, "%.*f", n.decimals, value);
        /* printf keeps the sign of what it rounds to zero */
        if (n.value != strtod(want, NULL) ||
            (n.value != 0.0 && strcmp(number_print(n, out), want) != 0))
            ck_abort_msg("%.17g to %d places: %s, not %s", value, n.decimals,
                         number_print(n, out), want);
    }
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("base");
    TCase *plain = tcase_create("values");
    tcase_add_test(plain, every_status_code_has_text_and_exit_status);
    tcase_add_test(plain, context_stands_before_the_message);
    tcase_add_test(plain, long_messages_end_in_whole_characters);
    tcase_add_test(plain, text_is_cut_between_characters);
    tcase_add_loop_test(plain, formatted_text_is_cut_between_characters, 0, 3);
    tcase_add_test(plain, whole_characters_are_counted);
    tcase_add_test(plain, utf8_round_trips_and_refuses_malformed_bytes);
    tcase_add_test(plain, what_steers_a_text_unseen_is_a_control_character);
    tcase_add_test(plain, edit_distance_counts_edits);
    tcase_add_test(plain, integers_and_doubles_are_read_whole);
    tcase_add_test(plain, numbers_print_digit_for_digit);
    tcase_add_test(plain, numbers_round_and_print_as_printf_does);
    tcase_add_test(plain, differences_are_exact_in_decimal);
    tcase_add_test(plain, change_of_unit_keeps_significant_digits);
    tcase_add_test(plain, constants_agree_with_the_rydberg_constant_and_the_si);
    tcase_add_test(plain, units_are_unique_and_have_a_base);
    suite_add_tcase(suite, plain);
    TCase *files = tcase_create("files");
    tcase_add_checked_fixture(files, make_folder, remove_folder);
    tcase_add_test(files,
                   a_written_file_is_read_back_and_not_overwritten_unasked);
    tcase_add_test(files, a_discarded_draft_leaves_nothing);
    tcase_add_test(files, file_failures_name_the_file);
    tcase_add_test(files, a_full_device_is_reported);
    suite_add_tcase(suite, files);
    return run_suite(suite);
}
