/* SPDX-License-Identifier: MIT */
#include <stdio.h>
#include <string.h>

#include "cli/parse.h"
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
        ck_assert_ptr_eq(c.command, &command_print);
        ck_assert_str_eq(call_value(&c, &option_quantity), "zeff");
        ck_assert_str_eq(call_value(&c, &option_format), "csv");
        ck_assert_int_eq(c.operand_count, 2);
        ck_assert_str_eq(c.operands[0], "Fe");
        ck_assert_str_eq(c.operands[1], "Cr");
    }
}
END_TEST

START_TEST(letters_stand_together_and_the_last_may_take_an_argument)
{
    struct call c = parsed("list -aFo out.txt Fe");
    ck_assert_ptr_nonnull(call_value(&c, &option_ascii));
    ck_assert_ptr_nonnull(call_value(&c, &option_force));
    ck_assert_str_eq(call_value(&c, &option_output), "out.txt");
    c = parsed("list -aFoout.txt Fe");
    ck_assert_str_eq(call_value(&c, &option_output), "out.txt");
    ck_assert_int_eq(c.operand_count, 1);
}
END_TEST

/* The argument of an option in a line that is in order. */
static const char *argument(const char *line, const struct option *option)
{
    struct call c = parsed(line);
    return call_value(&c, option);
}

START_TEST(an_argument_may_begin_with_one_dash_but_is_no_long_option)
{
    ck_assert_str_eq(argument("list --charge -1 O", &option_charge), "-1");
    ck_assert_str_eq(argument("list --charge=-1 O", &option_charge), "-1");
    ck_assert_str_eq(argument("list --output=--x O", &option_output), "--x");
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
    static const char *const values[] = {"a", "b", "c"};
    ck_assert_int_eq(c.option_count, 3);
    for (int i = 0; i < 3; i++) {
        ck_assert_ptr_eq(c.options[i].option, &option_data);
        ck_assert_str_eq(c.options[i].value, values[i]);
    }
    ck_assert_str_eq(call_value(&c, &option_data), "c");
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
    ck_assert_ptr_eq(parsed("compare --help").command, &command_compare);
    ck_assert_ptr_eq(parsed("--help sources").command, &command_sources);
    ck_assert_ptr_eq(parsed("--help").command, &command_screens);
    ck_assert(parsed("list --bogus --version").version);
}
END_TEST

/* Every option with every command: taken exactly where the command lists it.
 */
START_TEST(an_option_is_taken_where_it_belongs_and_nowhere_else)
{
    const struct option *options[COMMAND_OPTIONS_MAX];
    int count = command_options(options);
    int refused = 0;
    for (int c = 0; c < command_list_count; c++)
        for (int i = 0; i < count; i++) {
            const struct option *o = options[i];
            const struct command *command = command_list[c];
            char line[128];
            struct call call;
            struct status st;
            if (o == &option_help || o == &option_version)
                continue;
            snprintf(line, sizeof line, "--%s %s %s %s", o->name,
                     o->argument ? "word" : "",
                     command->name ? command->name : "",
                     command->least > 0 ? "Fe" : "");
            bool ok = parse(line, &call, &st);
            ck_assert_msg(ok == command_takes(command, o), "%s", line);
            refused += !ok;
        }
    ck_assert_int_gt(refused, 0);
}
END_TEST

START_TEST(names_and_letters_of_the_options_are_unique_and_complete)
{
    const struct option *options[COMMAND_OPTIONS_MAX];
    int count = command_options(options);
    ck_assert_int_gt(count, 20);
    for (int i = 0; i < count; i++) {
        const struct option *o = options[i];
        ck_assert_ptr_eq(command_option(o->name, strlen(o->name)), o);
        if (i > 0)
            ck_assert_int_lt(strcmp(options[i - 1]->name, o->name), 0);
        if (o->letter)
            ck_assert_ptr_eq(command_option_letter(o->letter), o);
        ck_assert_int_eq(o->argument == NULL, o->kind == OPTION_FLAG);
        ck_assert_ptr_null(strchr(o->help, '\n'));
        ck_assert(o->read || o == &option_help || o == &option_version);
    }
    for (int c = 1; c < command_list_count; c++)
        ck_assert_ptr_eq(command_find(command_list[c]->name), command_list[c]);
    ck_assert_ptr_null(command_list[0]->name);
    ck_assert_ptr_null(command_option("quant", 5));
    ck_assert_ptr_null(command_option_letter('\0'));
}
END_TEST

START_TEST(the_examples_of_the_help_are_calls_in_order)
{
    for (int c = 1; c < command_list_count; c++)
        ck_assert_ptr_eq(parsed(command_list[c]->example).command,
                         command_list[c]);
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
    tcase_add_test(c, names_and_letters_of_the_options_are_unique_and_complete);
    tcase_add_test(c, the_examples_of_the_help_are_calls_in_order);
    tcase_add_test(c, a_call_may_be_long_but_not_endless);
    tcase_add_test(c, the_nearest_word_is_found_and_no_other_is_made_up);
    tcase_add_test(c, a_list_falls_into_its_words_the_empty_ones_too);
    return c;
}
