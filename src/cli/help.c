/* SPDX-License-Identifier: MIT */
#include "cli/help.h"

#include <string.h>

#include "base/text.h"
#include "cli/words.h"
#include "data_hash.h"
#include "refdata/catalogue.h"

#define WIDTH 79        /* columns of the help */
#define OPTION_INDENT 4 /* of an option's clause */

const char *data_hash(void)
{
    return DATA_HASH;
}

/* Writes text in lines of WIDTH columns, each after `indent` blanks. */
static void put_wrapped(FILE *out, const char *text, int indent)
{
    int column = 0;
    while (*text) {
        size_t length = strcspn(text, " ");
        if (column > 0 && column + 1 + (int)length > WIDTH) {
            putc('\n', out);
            column = 0;
        }
        if (column == 0)
            column = fprintf(out, "%*s", indent, "");
        else
            column += fprintf(out, " ");
        fwrite(text, 1, length, out);
        column += (int)length;
        text += length;
        text += strspn(text, " ");
    }
    putc('\n', out);
}

static void put_option(FILE *out, const struct option *o)
{
    if (o->letter)
        fprintf(out, "  -%c, ", o->letter);
    else
        fprintf(out, "      ");
    fprintf(out, o->argument ? "--%s %s\n" : "--%s\n", o->name, o->argument);
    put_wrapped(out, o->help, 2 * OPTION_INDENT + 2);
}

/* The words of the options that show theirs. */
static void put_words(FILE *out, const struct option *option)
{
    char list[512];
    struct words words;
    struct text t = text_over(list, sizeof list);
    words_fill(&words, option, NULL);
    text_addf(&t, "%s: ", option->title);
    words_join(&t, words.items, words.count, "and");
    put_wrapped(out, list, 0);
}

static void put_options(FILE *out, const struct command *command)
{
    fprintf(out, "\nOptions:\n");
    for (const struct option *const *o = command->options; *o; o++)
        put_option(out, *o);
}

static void put_general(FILE *out)
{
    fprintf(out, "Usage: outershell [OPTION...]\n"
                 "       outershell COMMAND [OPTION...] [OPERAND...]\n\n");
    put_wrapped(out,
                "Trends of effective nuclear charge, radius and ionization "
                "energy over the elements: each model's value, the stored "
                "reference and the residual.",
                0);
    putc('\n', out);
    put_wrapped(out, command_list[0]->about, 0);
    fprintf(out, "\nCommands:\n");
    for (int i = 1; i < command_list_count; i++)
        fprintf(out, "  %-9s %s\n", command_list[i]->name,
                command_list[i]->summary);
    put_options(out, command_list[0]);
    fprintf(out, "\noutershell COMMAND --help tells more of a command.\n");
}

void help_print(FILE *out, const struct command *command)
{
    if (!command->name) {
        put_general(out);
        return;
    }
    fprintf(out, "Usage: outershell %s [OPTION...]%s%s\n\n", command->name,
            command->operands[0] ? " " : "", command->operands);
    put_wrapped(out, command->about, 0);
    put_options(out, command);
    putc('\n', out);
    for (const struct option *const *o = command->options; *o; o++)
        if ((*o)->title)
            put_words(out, *o);
    fprintf(out, "Example: outershell %s\n", command->example);
}

void version_print(FILE *out)
{
    fprintf(out,
            "outershell %s\n"
            "Licence: MIT; stored values carry their own citations, see "
            "outershell sources\n"
            "Data sets: %zu\n"
            "Data SHA-256: %s\n",
            OUTERSHELL_VERSION, catalogue_count(catalogue_builtin()),
            data_hash());
}
