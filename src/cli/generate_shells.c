/* SPDX-License-Identifier: MIT */
#include "cli/generate.h"

#include <string.h>

#include "cli/command.h"

/* True when a command takes elements. */
static bool takes_elements(const struct command *command)
{
    return command->operands[0] != '\0';
}

static bool has_words(const struct option *o)
{
    return o->words != NULL;
}

static void put_bash_arguments(FILE *out)
{
    const struct option *options[COMMAND_OPTIONS_MAX];
    int count = command_options(options);
    fputs("    case $option in\n", out);
    for (int i = 0; i < count; i++) {
        const struct option *o = options[i];
        if (!o->argument)
            continue;
        fprintf(out, "    --%s", o->name);
        if (o->letter)
            fprintf(out, "|-%c", o->letter);
        fputs(")\n        ", out);
        if (o->file) {
            fputs("compopt -o filenames 2>/dev/null\n"
                  "        mapfile -t COMPREPLY < <(compgen -f -- \"$cur\")",
                  out);
        } else if (has_words(o)) {
            fputs(o->list ? "_outershell_words list '"
                          : "_outershell_words one '",
                  out);
            generate_words(out, o);
            fputs("'", out);
        } else {
            fputs(":", out);
        }
        fputs("\n        return\n        ;;\n", out);
    }
    fputs("    esac\n", out);
}

static void put_bash_options(FILE *out)
{
    fputs("    case $command in\n", out);
    for (int c = 0; c < command_list_count; c++) {
        const struct command *command = command_list[c];
        const char *name = command->name;
        fprintf(out, "    %s)\n        options='", name ? name : "''");
        for (const struct option *const *o = command->options; *o; o++)
            fprintf(out, " --%s", (*o)->name);
        fputs("'\n", out);
        if (!name) {
            fputs("        operands='", out);
            generate_commands(out, " ");
            fputs("'\n", out);
        } else if (takes_elements(command)) {
            fputs("        operands=$elements\n", out);
        }
        fputs("        ;;\n", out);
    }
    fputs("    esac\n", out);
}

void generate_bash(FILE *out)
{
    fputs("# bash completion for outershell; made from its tables\n"
          "_outershell_words()\n{\n"
          "    local head=\n"
          "    if [[ $1 == list && $cur == *,* ]]; then\n"
          "        head=${cur%,*},\n"
          "    fi\n"
          "    mapfile -t COMPREPLY < <(compgen -P \"$head\" -W \"$2\" -- "
          "\"${cur#\"$head\"}\")\n"
          "}\n\n"
          "_outershell()\n{\n"
          "    local cur=${COMP_WORDS[COMP_CWORD]}\n"
          "    local option=${COMP_WORDS[COMP_CWORD-1]}\n"
          "    local command='' options='' operands='' i\n"
          "    local elements='",
          out);
    generate_symbols(out);
    fputs("'\n"
          "    COMPREPLY=()\n"
          "    if [[ $cur == = ]]; then\n"
          "        cur=\n"
          "    elif [[ $option == = ]]; then\n"
          "        option=${COMP_WORDS[COMP_CWORD-2]}\n"
          "    fi\n"
          "    for ((i = 1; i < COMP_CWORD; i++)); do\n"
          "        case ${COMP_WORDS[i]} in\n"
          "        ",
          out);
    generate_commands(out, "|");
    fputs(")\n"
          "            command=${COMP_WORDS[i]}\n"
          "            break\n"
          "            ;;\n"
          "        esac\n"
          "    done\n",
          out);
    put_bash_arguments(out);
    put_bash_options(out);
    fputs("    if [[ $cur == -* ]]; then\n"
          "        operands=$options\n"
          "    fi\n"
          "    mapfile -t COMPREPLY < <(compgen -W \"$operands\" -- "
          "\"$cur\")\n"
          "}\n"
          "complete -F _outershell outershell\n",
          out);
}

/* A text inside single quotes of zsh, and inside the brackets of a
 * specification. */
static void put_zsh_text(FILE *out, const char *text)
{
    for (; *text; text++) {
        if (*text == '\'')
            fputs("'\\''", out);
        else if (strchr("[]\\", *text))
            fprintf(out, "\\%c", *text);
        else
            putc(*text, out);
    }
}

static void put_zsh_action(FILE *out, const struct option *o)
{
    fprintf(out, ":%s:", o->argument);
    if (o->file) {
        fputs("_files", out);
    } else if (has_words(o) && o->list) {
        fprintf(out, "_values -s , %s ", o->argument);
        generate_words(out, o);
    } else if (has_words(o)) {
        fputs("(", out);
        generate_words(out, o);
        fputs(")", out);
    }
}

static void put_zsh_option(FILE *out, const struct option *o)
{
    fputs(" \\\n        ", out);
    if (o->kind == OPTION_REPEAT)
        fputs("'*'", out);
    else if (o->letter)
        fprintf(out, "'(-%c --%s)'", o->letter, o->name);
    if (o->letter)
        fprintf(out, "{-%c%s,--%s%s}", o->letter, o->argument ? "+" : "",
                o->name, o->argument ? "=" : "");
    else
        fprintf(out, "--%s%s", o->name, o->argument ? "=" : "");
    fputs("'[", out);
    put_zsh_text(out, o->help);
    fputs("]", out);
    if (o->argument)
        put_zsh_action(out, o);
    fputs("'", out);
}

static void put_zsh_command(FILE *out, const struct command *c)
{
    fprintf(out, "    %s)\n        _arguments -s -S", c->name ? c->name : "''");
    for (const struct option *const *o = c->options; *o; o++)
        put_zsh_option(out, *o);
    if (!c->name) {
        fputs(" \\\n        '1:command:((", out);
        for (int i = 1; i < command_list_count; i++) {
            fprintf(out, i > 1 ? " %s\\:\"" : "%s\\:\"", command_list[i]->name);
            put_zsh_text(out, command_list[i]->summary);
            fputs("\"", out);
        }
        fputs("))'", out);
    } else {
        fputs(" \\\n        '1:command:'", out);
        if (takes_elements(c)) {
            fputs(" \\\n        '*:selection:(", out);
            generate_symbols(out);
            fputs(")'", out);
        }
    }
    fputs("\n        ;;\n", out);
}

void generate_zsh(FILE *out)
{
    fputs("#compdef outershell\n"
          "# made from the tables of outershell\n"
          "_outershell() {\n"
          "    local command= word\n"
          "    for word in ${words[2,CURRENT-1]}; do\n"
          "        case $word in\n"
          "        ",
          out);
    generate_commands(out, "|");
    fputs(") command=$word; break ;;\n"
          "        esac\n"
          "    done\n"
          "    case $command in\n",
          out);
    for (int c = 0; c < command_list_count; c++)
        put_zsh_command(out, command_list[c]);
    fputs("    esac\n}\n_outershell \"$@\"\n", out);
}

static void put_fish_text(FILE *out, const char *text)
{
    for (; *text; text++) {
        if (*text == '\'' || *text == '\\')
            putc('\\', out);
        putc(*text, out);
    }
}

/* The commands that an option belongs to, as a condition. */
static void put_fish_condition(FILE *out, const struct option *o)
{
    if (command_takes(command_list[0], o))
        return;
    fputs(" -n '__fish_seen_subcommand_from", out);
    for (int c = 1; c < command_list_count; c++)
        if (command_takes(command_list[c], o))
            fprintf(out, " %s", command_list[c]->name);
    fputs("'", out);
}

static void put_fish_option(FILE *out, const struct option *o)
{
    fputs("complete -c outershell", out);
    put_fish_condition(out, o);
    if (o->letter)
        fprintf(out, " -s %c", o->letter);
    fprintf(out, " -l %s", o->name);
    if (o->file)
        fputs(" -r -F", out);
    else if (has_words(o) && o->list)
        fprintf(out, " -x -a '(__fish_complete_list , __outershell_%s)'",
                o->name);
    else if (has_words(o)) {
        fputs(" -x -a '", out);
        generate_words(out, o);
        fputs("'", out);
    } else if (o->argument) {
        fputs(" -x", out);
    }
    fputs(" -d '", out);
    put_fish_text(out, o->help);
    fputs("'\n", out);
}

/* A command, and what it takes. */
static void put_fish_command(FILE *out, const struct command *c)
{
    fprintf(out, "complete -c outershell -n __fish_use_subcommand -a %s -d '",
            c->name);
    put_fish_text(out, c->summary);
    fputs("'\n", out);
    if (!takes_elements(c))
        return;
    fprintf(out,
            "complete -c outershell -n '__fish_seen_subcommand_from %s' -a '",
            c->name);
    generate_symbols(out);
    fputs("'\n", out);
}

void generate_fish(FILE *out)
{
    const struct option *options[COMMAND_OPTIONS_MAX];
    int count = command_options(options);
    fputs("# fish completion for outershell; made from its tables\n", out);
    for (int i = 0; i < count; i++) {
        const struct option *o = options[i];
        if (!o->list)
            continue;
        fprintf(out, "function __outershell_%s\n    printf '%%s\\n' ", o->name);
        generate_words(out, o);
        fputs("\nend\n", out);
    }
    fputs("complete -c outershell -f\n", out);
    for (int c = 1; c < command_list_count; c++)
        put_fish_command(out, command_list[c]);
    for (int i = 0; i < count; i++)
        put_fish_option(out, options[i]);
}
