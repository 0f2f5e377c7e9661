/* SPDX-License-Identifier: MIT */
/* A tool of the build: writes the completions, and fills the manual in, from
 * the tables of options and commands.
 * Usage: generate bash|zsh|fish OUTPUT, generate manual OUTPUT TEMPLATE */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "cli/command.h"
#include "cli/generate.h"
#include "cli/option.h"
#include "cli/words.h"
#include "element/element.h"

/* References of the built-in data sets. */
static const struct reference_list *references(void)
{
    static struct reference_list list;
    if (list.count == 0)
        reference_list_fill(&list, catalogue_builtin(), NULL);
    return &list;
}

void generate_words(FILE *out, const struct option *option)
{
    struct words words;
    words_fill(&words, option, references());
    for (int i = 0; i < words.count; i++)
        fprintf(out, i ? " %s" : "%s", words.items[i]);
}

void generate_symbols(FILE *out)
{
    for (int z = 1; z <= Z_MAX; z++)
        fprintf(out, z > 1 ? " %s" : "%s", element_at(z)->symbol);
}

void generate_commands(FILE *out, const char *separator)
{
    for (int i = 1; i < command_list_count; i++)
        fprintf(out, "%s%s", i > 1 ? separator : "", command_list[i]->name);
}

static const struct {
    const char *name;
    void (*write)(FILE *out);
} shells[] = {
    {"bash", generate_bash},
    {"zsh", generate_zsh},
    {"fish", generate_fish},
};

static bool write_all(FILE *out, int argc, char **argv, struct status *st)
{
    if (argc == 4 && strcmp(argv[1], "manual") == 0)
        return generate_manual(out, argv[3], st);
    for (size_t i = 0; argc == 3 && i < sizeof shells / sizeof shells[0]; i++)
        if (strcmp(argv[1], shells[i].name) == 0) {
            shells[i].write(out);
            return true;
        }
    return status_fail(st, STATUS_USAGE, "expected bash, zsh, fish or manual");
}

int main(int argc, char **argv)
{
    struct status st = status_ok();
    struct file_draft draft;
    bool ok = argc >= 3 && file_draft_open(&draft, argv[2], true, &st);
    if (ok && !write_all(draft.stream, argc, argv, &st)) {
        file_draft_discard(&draft);
        ok = false;
    }
    ok = ok && file_draft_commit(&draft, &st);
    if (!ok)
        fprintf(stderr, "generate: %s\n", st.message);
    return ok ? EXIT_SUCCESS : EXIT_FAILURE;
}
