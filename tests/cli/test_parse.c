/* SPDX-License-Identifier: MIT */
#include <stdio.h>
#include <string.h>

#include "cli/parse.h"
#include "cli/sha256.h"
#include "cli/words.h"
#include "suites.h"
#include "support/program.h"

/* Parses a line as the program's arguments. */
static bool parse(const char *line, struct call *call, struct status *st)
{
    static char store[4096];
    static char *argv[PROGRAM_ARGUMENTS_MAX + 1];
    static char name[] = "outershell";
    struct program p = {.path = name};
    program_split(&p, line, store, sizeof store);
    argv[0] = name;
    for (int i = 0; i < p.count; i++)
        memcpy(&argv[i + 1], &p.arguments[i], sizeof argv[0]);
    *st = status_ok();
    return call_parse(p.count + 1, argv, call, st);
}

/* The same, and it must be in order. */
static struct call parsed(const char *line)
{
    struct call call;
    struct status st;
    ck_assert_msg(parse(line, &call, &st), "%s: %s", line, st.message);
    return call;
}

START_TEST(options_stand_before_and_behind_command_and_operands)
{
    static const char *const lines[] = {
        "--quantity zeff list Fe --format csv Cr",
        "list --quantity=zeff Fe Cr --format=csv",
        "list Fe Cr -q zeff -f csv",
        "list -qzeff -fcsv -- Fe Cr",
        "-fcsv list Fe --quantity zeff -- Cr",
    };
    for (size_t i = 0; i < sizeof lines / sizeof lines[0]; i++) {
        struct call c = parsed(lines[i]);
        ck_assert_int_eq(c.command->id, COMMAND_LIST);
        ck_assert_str_eq(c.value[OPTION_QUANTITY], "zeff");
        ck_assert_str_eq(c.value[OPTION_FORMAT], "csv");
        ck_assert_int_eq(c.operand_count, 2);
        ck_assert_str_eq(c.operands[0], "Fe");
        ck_assert_str_eq(c.operands[1], "Cr");
    }
}
END_TEST

START_TEST(letters_stand_together_and_the_last_may_take_an_argument)
{
    struct call c = parsed("list -aFo out.txt Fe");
    ck_assert_ptr_nonnull(c.value[OPTION_ASCII]);
    ck_assert_ptr_nonnull(c.value[OPTION_FORCE]);
    ck_assert_str_eq(c.value[OPTION_OUTPUT], "out.txt");
    c = parsed("list -aFoout.txt Fe");
    ck_assert_str_eq(c.value[OPTION_OUTPUT], "out.txt");
    ck_assert_int_eq(c.operand_count, 1);
}
END_TEST

START_TEST(an_argument_may_begin_with_one_dash_but_is_no_long_option)
{
    ck_assert_str_eq(parsed("list --charge -1 O").value[OPTION_CHARGE], "-1");
    ck_assert_str_eq(parsed("list --charge=-1 O").value[OPTION_CHARGE], "-1");
    ck_assert_str_eq(parsed("list --output=--x O").value[OPTION_OUTPUT], "--x");
    struct call call;
    struct status st;
    ck_assert(!parse("list --output --force", &call, &st));
    ck_assert_int_eq(st.code, STATUS_USAGE);
}
END_TEST

START_TEST(behind_two_dashes_there_are_only_operands)
{
    struct call c = parsed("list -- --format -q - --");
    ck_assert_int_eq(c.operand_count, 4);
    ck_assert_str_eq(c.operands[0], "--format");
    ck_assert_str_eq(c.operands[3], "--");
    ck_assert(!parsed("list -- --help").help);
}
END_TEST

START_TEST(repeated_options_keep_their_order)
{
    struct call c = parsed("--data a list --data=b -dc");
    ck_assert_int_eq(c.repeat_count, 3);
    ck_assert_str_eq(c.repeats[0].value, "a");
    ck_assert_str_eq(c.repeats[1].value, "b");
    ck_assert_str_eq(c.repeats[2].value, "c");
}
END_TEST

START_TEST(help_and_version_win_over_every_mistake)
{
    static const char *const lines[] = {"--help",
                                        "-h",
                                        "list --help --bogus",
                                        "--output --help",
                                        "lits --format --help",
                                        "list -h -h --charge x"};
    for (size_t i = 0; i < sizeof lines / sizeof lines[0]; i++)
        ck_assert_msg(parsed(lines[i]).help, "%s", lines[i]);
    ck_assert_int_eq(parsed("compare --help").command->id, COMMAND_COMPARE);
    ck_assert_int_eq(parsed("--help sources").command->id, COMMAND_SOURCES);
    ck_assert_int_eq(parsed("--help").command->id, COMMAND_SCREENS);
    ck_assert(parsed("list --bogus --version").version);
}
END_TEST

/* Every option with every command: taken exactly where the table says. */
START_TEST(an_option_is_taken_where_it_belongs_and_nowhere_else)
{
    int refused = 0;
    for (int c = 0; c < COMMAND_COUNT; c++)
        for (int i = 0; i < OPTION_COUNT; i++) {
            const struct option *o = option_at(i);
            const char *name = command_at(c)->name;
            char line[128];
            struct call call;
            struct status st;
            if (i == OPTION_HELP || i == OPTION_VERSION)
                continue;
            snprintf(line, sizeof line, "--%s %s %s %s", o->name,
                     o->argument ? "word" : "", name ? name : "",
                     command_at(c)->least > 0 ? "Fe" : "");
            bool ok = parse(line, &call, &st);
            ck_assert_msg(ok == option_belongs(o, (enum command_id)c), "%s",
                          line);
            refused += !ok;
        }
    ck_assert_int_gt(refused, 0);
}
END_TEST

START_TEST(names_letters_and_ids_of_the_tables_are_unique_and_complete)
{
    for (int i = 0; i < OPTION_COUNT; i++) {
        const struct option *o = option_at(i);
        ck_assert_ptr_eq(option_by_name(o->name, strlen(o->name)), o);
        if (o->letter)
            ck_assert_ptr_eq(option_by_letter(o->letter), o);
        ck_assert_int_ne((int)o->commands, 0);
        ck_assert_int_eq(o->argument == NULL, o->kind == OPTION_FLAG);
        ck_assert_ptr_null(strchr(o->help, '\n'));
    }
    for (int c = 1; c < COMMAND_COUNT; c++)
        ck_assert_ptr_eq(command_find(command_at(c)->name), command_at(c));
    ck_assert_ptr_null(option_by_name("quant", 5));
    ck_assert_ptr_null(option_by_letter('\0'));
}
END_TEST

START_TEST(the_examples_of_the_help_are_calls_in_order)
{
    for (int c = 1; c < COMMAND_COUNT; c++)
        ck_assert_int_eq(parsed(command_at(c)->example).command->id, c);
}
END_TEST

START_TEST(a_call_may_be_long_but_not_endless)
{
    static char word[] = "Fe";
    static char name[] = "list";
    static char *argv[CALL_OPERANDS_MAX + 4];
    struct call call;
    struct status st = status_ok();
    argv[0] = word;
    argv[1] = name;
    for (int i = 2; i < CALL_OPERANDS_MAX + 3; i++)
        argv[i] = word;
    ck_assert(call_parse(CALL_OPERANDS_MAX + 2, argv, &call, &st));
    ck_assert_int_eq(call.operand_count, CALL_OPERANDS_MAX);
    ck_assert(!call_parse(CALL_OPERANDS_MAX + 3, argv, &call, &st));
    ck_assert_int_eq(st.code, STATUS_USAGE);
}
END_TEST

START_TEST(the_nearest_word_is_found_and_no_other_is_made_up)
{
    static const char *const items[] = {"text", "csv", "json", "bibtex"};
    static const struct {
        const char *word, *near;
    } cases[] = {{"cvs", "csv"},  {"JSON", "json"}, {"bib", "bibtex"},
                 {"txt", "text"}, {"xml", NULL},    {"", NULL},
                 {"yaml", NULL},  {"b", NULL},      {"jsno", "json"},
                 {"plain", NULL}};
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        const char *near = word_nearest(cases[i].word, items, 4);
        ck_assert_msg(cases[i].near ? near && !strcmp(near, cases[i].near)
                                    : !near,
                      "%s: %s", cases[i].word, near ? near : "none");
    }
}
END_TEST

START_TEST(a_list_falls_into_its_words_the_empty_ones_too)
{
    const char *list = "zeff,,radius,";
    static const char *const want[] = {"zeff", "", "radius", ""};
    char word[WORD_TEXT_MAX];
    int count = 0;
    for (; list; count++) {
        ck_assert(words_next(&list, word));
        ck_assert_str_eq(word, want[count]);
    }
    ck_assert_int_eq(count, 4);
}
END_TEST

/* FIPS 180-4 examples: "abc", the empty text, and the 448-bit text
 * (csrc.nist.gov, Example Algorithms, SHA256.pdf; the empty one from memory).
 */
START_TEST(sha256_gives_the_published_examples)
{
    static const struct {
        const char *text, *sum;
    } cases[] = {
        {"abc",
         "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad"},
        {"",
         "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855"},
        {"abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq",
         "248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1"},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        struct sha256 s;
        char out[SHA256_TEXT_MAX];
        sha256_begin(&s);
        sha256_add(&s, cases[i].text, strlen(cases[i].text));
        sha256_end(&s, out);
        ck_assert_str_eq(out, cases[i].sum);
    }
}
END_TEST

TCase *parse_cases(void)
{
    TCase *c = tcase_create("parse");
    tcase_add_test(c, options_stand_before_and_behind_command_and_operands);
    tcase_add_test(c, letters_stand_together_and_the_last_may_take_an_argument);
    tcase_add_test(c,
                   an_argument_may_begin_with_one_dash_but_is_no_long_option);
    tcase_add_test(c, behind_two_dashes_there_are_only_operands);
    tcase_add_test(c, repeated_options_keep_their_order);
    tcase_add_test(c, help_and_version_win_over_every_mistake);
    tcase_add_test(c, an_option_is_taken_where_it_belongs_and_nowhere_else);
    tcase_add_test(c,
                   names_letters_and_ids_of_the_tables_are_unique_and_complete);
    tcase_add_test(c, the_examples_of_the_help_are_calls_in_order);
    tcase_add_test(c, a_call_may_be_long_but_not_endless);
    tcase_add_test(c, the_nearest_word_is_found_and_no_other_is_made_up);
    tcase_add_test(c, a_list_falls_into_its_words_the_empty_ones_too);
    tcase_add_test(c, sha256_gives_the_published_examples);
    return c;
}
