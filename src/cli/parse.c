/* SPDX-License-Identifier: MIT */
#include "cli/parse.h"

#include <string.h>

#include "base/text.h"
#include "cli/words.h"
#include "element/selection.h"

/* More than any word or list that is accepted. */
#define ARGUMENT_MAX 300
#define OPERAND_MAX 60
#define COMMANDS_MAX 64

static bool is_long(const char *word)
{
    return word[0] == '-' && word[1] == '-' && word[2] != '\0';
}

static bool is_short(const char *word)
{
    return word[0] == '-' && word[1] != '-' && word[1] != '\0';
}

/* --help and --version count wherever they stand, so that someone stuck in a
 * call gets help and not another complaint. */
static void find_help(int argc, char *const *argv, struct call *call)
{
    for (int i = 1; i < argc && strcmp(argv[i], "--") != 0; i++) {
        if (strcmp(argv[i], "--help") == 0 || strcmp(argv[i], "-h") == 0)
            call->help = true;
        if (strcmp(argv[i], "--version") == 0 || strcmp(argv[i], "-V") == 0)
            call->version = true;
        const struct command *command = command_find(argv[i]);
        if (command && !call->command->name)
            call->command = command;
    }
}

const char *call_value(const struct call *call, const struct option *option)
{
    for (int i = call->option_count - 1; i >= 0; i--)
        if (call->options[i].option == option)
            return call->options[i].value;
    return NULL;
}

static bool unknown_option(const char *word, size_t length, struct status *st)
{
    char name[WORD_TEXT_MAX];
    struct text t = text_over(name, sizeof name);
    text_add_bytes(&t, word + 2, length);
    const struct option *options[COMMAND_OPTIONS_MAX];
    const char *names[COMMAND_OPTIONS_MAX];
    int count = command_options(options);
    for (int i = 0; i < count; i++)
        names[i] = options[i]->name;
    const char *near = word_nearest(name, names, count);
    if (near)
        return status_fail(st, STATUS_USAGE,
                           "%.*s: no such option; did you mean --%s?",
                           (int)length + 2, word, near);
    return status_fail(st, STATUS_USAGE,
                       "%.*s: no such option; --help lists them",
                       (int)length + 2, word);
}

static bool check_argument(const struct option *option, const char *value,
                           struct status *st)
{
    if (option->argument && value[0] == '\0')
        return status_fail(st, STATUS_USAGE, "--%s '': expected %s",
                           option->name, option->argument);
    if (option->argument && !option->file && strlen(value) > ARGUMENT_MAX)
        return status_fail(st, STATUS_USAGE,
                           "--%s %.40s...: longer than %d bytes; expected %s",
                           option->name, value, ARGUMENT_MAX, option->argument);
    return true;
}

static bool take(struct call *call, const struct option *option,
                 const char *value, struct status *st)
{
    const char *before = call_value(call, option);
    if (!check_argument(option, value, st))
        return false;
    if (before && option->kind == OPTION_VALUE)
        return status_fail(st, STATUS_USAGE,
                           "--%s: given twice, as '%s' and as '%s'",
                           option->name, before, value);
    if (before && option->kind == OPTION_FLAG)
        return status_fail(st, STATUS_USAGE, "--%s: given twice", option->name);
    if (call->option_count == CALL_OPTIONS_MAX)
        return status_fail(st, STATUS_USAGE,
                           "--%s: more than %d options in one call",
                           option->name, CALL_OPTIONS_MAX);
    call->options[call->option_count++] = (struct call_option){option, value};
    return true;
}

/* The argument that stands in the next word. A word that is itself a long
 * option is not swallowed: a file of that name can be had by --output=--x. */
static bool next_argument(int argc, char *const *argv, int *i,
                          const struct option *option, const char **value,
                          struct status *st)
{
    if (*i + 1 < argc && !is_long(argv[*i + 1]) &&
        strcmp(argv[*i + 1], "--") != 0) {
        *value = argv[++*i];
        return true;
    }
    return status_fail(st, STATUS_USAGE, "--%s: needs an argument, %s",
                       option->name, option->argument);
}

static bool parse_long(int argc, char *const *argv, int *i, struct call *call,
                       struct status *st)
{
    const char *word = argv[*i];
    const char *equals = strchr(word, '=');
    size_t length = equals ? (size_t)(equals - word) - 2 : strlen(word) - 2;
    const struct option *option = command_option(word + 2, length);
    if (!option)
        return unknown_option(word, length, st);
    const char *value = "";
    if (!option->argument && equals)
        return status_fail(st, STATUS_USAGE,
                           "--%s: takes no argument, got '%s'", option->name,
                           equals + 1);
    if (option->argument && equals)
        value = equals + 1;
    else if (option->argument &&
             !next_argument(argc, argv, i, option, &value, st))
        return false;
    return take(call, option, value, st);
}

static bool parse_short(int argc, char *const *argv, int *i, struct call *call,
                        struct status *st)
{
    const char *word = argv[*i];
    for (const char *p = word + 1; *p; p++) {
        const struct option *option = command_option_letter(*p);
        uint32_t code;
        size_t bytes = utf8_decode(p, strlen(p), &code);
        if (!option && bytes == 1 && code < 0x7F && code > 0x20)
            return status_fail(st, STATUS_USAGE,
                               "-%c: no such option%s%s; --help lists them", *p,
                               word[2] ? " in " : "", word[2] ? word : "");
        if (!option)
            return status_fail(st, STATUS_USAGE,
                               "%s: no such option; --help lists them", word);
        const char *value = "";
        if (option->argument && p[1]) {
            value = p + 1;
            p += strlen(p) - 1;
        } else if (option->argument &&
                   !next_argument(argc, argv, i, option, &value, st)) {
            return false;
        }
        if (!take(call, option, value, st))
            return false;
    }
    return true;
}

/* Names of the commands that take an option, of all for NULL; gives how many.
 */
static int names_of_commands(const struct option *option,
                             const char *names[COMMANDS_MAX])
{
    int count = 0;
    for (int c = 0; c < command_list_count && count < COMMANDS_MAX; c++)
        if (command_list[c]->name &&
            (!option || command_takes(command_list[c], option)))
            names[count++] = command_list[c]->name;
    return count;
}

static bool unknown_command(const char *word, struct status *st)
{
    const char *names[COMMANDS_MAX];
    char all[WORD_LIST_TEXT_MAX];
    struct text t = text_over(all, sizeof all);
    int count = names_of_commands(NULL, names);
    const char *near = word_nearest(word, names, count);
    words_join(&t, names, count, "or");
    struct selection selection = {0};
    struct status ignored;
    if (near)
        return status_fail(st, STATUS_USAGE,
                           "%s: no such command; did you mean %s?", word, near);
    if (selection_add(&selection, word, &ignored))
        return status_fail(st, STATUS_USAGE,
                           "%s: no such command; did you mean list %s?", word,
                           word);
    const struct element *element = element_nearest(word);
    if (element)
        return status_fail(st, STATUS_USAGE,
                           "%s: no such command; did you mean list %s?", word,
                           element->symbol);
    return status_fail(st, STATUS_USAGE, "%.40s: no such command; expected %s",
                       word[0] ? word : "''", all);
}

/* What a command takes, for a message. */
static const char *operands_of(const struct command *command)
{
    return command->operands[0] ? "an element, an ion or a run" : "no operand";
}

static bool add_operand(struct call *call, const char *word, bool *has_command,
                        struct status *st)
{
    if (!*has_command) {
        *has_command = true;
        call->command = command_find(word);
        return call->command || unknown_command(word, st);
    }
    if (strlen(word) > OPERAND_MAX)
        return status_fail(st, STATUS_USAGE,
                           "%.40s...: longer than %d bytes; expected %s", word,
                           OPERAND_MAX, operands_of(call->command));
    if (word[0] == '\0')
        return status_fail(st, STATUS_USAGE,
                           "'': an empty operand; expected "
                           "%s",
                           operands_of(call->command));
    if (call->operand_count == CALL_OPERANDS_MAX)
        return status_fail(st, STATUS_USAGE, "%s: more than %d operands", word,
                           CALL_OPERANDS_MAX);
    call->operands[call->operand_count++] = word;
    return true;
}

/* Name of a command for a message. */
static const char *name_of(const struct command *command)
{
    return command->name ? command->name : "outershell without a command";
}

static bool check_belongs(const struct call *call, struct status *st)
{
    for (int i = 0; i < call->option_count; i++) {
        const struct option *option = call->options[i].option;
        if (command_takes(call->command, option))
            continue;
        const char *names[COMMANDS_MAX];
        char all[WORD_LIST_TEXT_MAX];
        struct text t = text_over(all, sizeof all);
        words_join(&t, names, names_of_commands(option, names), "and");
        return status_fail(st, STATUS_USAGE,
                           "--%s: not an option of %s; it belongs to %s",
                           option->name, name_of(call->command), all);
    }
    return true;
}

static bool check_operands(const struct call *call, struct status *st)
{
    const struct command *c = call->command;
    if (c->most > 0 && call->operand_count > c->most)
        return status_fail(st, STATUS_USAGE, "%s: too much; %s takes %s alone",
                           call->operands[c->most], name_of(c), c->operands);
    if (c->most == 0 && call->operand_count > 0)
        return status_fail(st, STATUS_USAGE, "%s: %s takes no operand",
                           call->operands[0], name_of(c));
    if (call->operand_count < c->least)
        return status_fail(st, STATUS_USAGE, "%s: names nothing; expected %s",
                           name_of(c), c->operands);
    return true;
}

bool call_parse(int argc, char *const *argv, struct call *call,
                struct status *st)
{
    *call = (struct call){.command = command_list[0]};
    find_help(argc, argv, call);
    if (call->help || call->version)
        return true;
    call->command = command_list[0];
    bool only_operands = false;
    bool has_command = false;
    for (int i = 1; i < argc; i++) {
        bool ok;
        if (!only_operands && strcmp(argv[i], "--") == 0) {
            only_operands = true;
            continue;
        }
        if (!only_operands && is_long(argv[i]))
            ok = parse_long(argc, argv, &i, call, st);
        else if (!only_operands && is_short(argv[i]))
            ok = parse_short(argc, argv, &i, call, st);
        else
            ok = add_operand(call, argv[i], &has_command, st);
        if (!ok)
            return false;
    }
    return check_belongs(call, st) && check_operands(call, st);
}
