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

static void put_words(FILE *out, const char *title, enum word_kind kind)
{
    char list[512];
    struct words words;
    struct text t = text_over(list, sizeof list);
    words_fill(&words, kind, NULL);
    text_addf(&t, "%s: ", title);
    words_join(&t, words.items, words.count, "and");
    put_wrapped(out, list, 0);
}

static void put_options(FILE *out, enum command_id command)
{
    fprintf(out, "\nOptions:\n");
    for (int i = 0; i < OPTION_COUNT; i++)
        if (option_belongs(option_at(i), command))
            put_option(out, option_at(i));
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
    put_wrapped(out, command_at(COMMAND_SCREENS)->about, 0);
    fprintf(out, "\nCommands:\n");
    for (int i = 1; i < COMMAND_COUNT; i++)
        fprintf(out, "  %-9s %s\n", command_at(i)->name,
                command_at(i)->summary);
    put_options(out, COMMAND_SCREENS);
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
    put_options(out, command->id);
    putc('\n', out);
    if (option_belongs(option_at(OPTION_QUANTITY), command->id))
        put_words(out, "Quantities", WORDS_QUANTITY);
    if (option_belongs(option_at(OPTION_MODEL), command->id))
        put_words(out, "Models", WORDS_MODEL);
    if (option_belongs(option_at(OPTION_UNIT), command->id))
        put_words(out, "Units", WORDS_UNIT);
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
