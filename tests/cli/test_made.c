/* SPDX-License-Identifier: MIT */
/* What is made from the tables says what the tables say: manual, help and
 * completions. */
#include <dirent.h>
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include "base/file.h"
#include "base/text.h"
#include "cli/command.h"
#include "cli/words.h"
#include "suites.h"
#include "support/program.h"

static char *read_whole(const char *path)
{
    char *text;
    size_t size;
    struct status st;
    ck_assert_msg(file_read(path, 1 << 22, &text, &size, &st), "%s",
                  st.message);
    return text;
}

static int count_of(const char *text, const char *part)
{
    int count = 0;
    for (const char *p = text; (p = strstr(p, part)) != NULL; p++)
        count++;
    return count;
}

START_TEST(the_manual_lists_every_option_and_command_and_no_other)
{
    char *text = read_whole(MANUAL);
    char *options = strstr(text, ".Ss Options");
    ck_assert_ptr_nonnull(options);
    *options++ = '\0';
    char *end = strstr(options, "\n.El");
    ck_assert_ptr_nonnull(end);
    *end = '\0';
    const struct option *all[COMMAND_OPTIONS_MAX];
    int count = command_options(all);
    ck_assert_int_eq(count_of(options, "\n.It "), count);
    for (int i = 0; i < count; i++) {
        const struct option *o = all[i];
        char line[128];
        char argument[32] = "";
        for (size_t k = 0; o->argument && o->argument[k]; k++)
            argument[k] = (char)(o->argument[k] | 0x20);
        char letter[16] = "";
        if (o->letter)
            snprintf(letter, sizeof letter, "Fl %c , ", o->letter);
        snprintf(line, sizeof line, "\n.It %sFl Fl %s%s%s\n", letter, o->name,
                 o->argument ? " Ar " : "", argument);
        ck_assert_msg(strstr(options, line), "manual: no %s", line);
    }
    ck_assert_int_eq(count_of(text, "\n.It Cm "), command_list_count - 1);
    for (int c = 1; c < command_list_count; c++) {
        char line[64];
        snprintf(line, sizeof line, "\n.It Cm %s\n", command_list[c]->name);
        char *part = strstr(text, line);
        ck_assert_msg(part, "manual: no %s", line);
        char *next = strstr(part + 1, "\n.It ");
        for (int i = 0; i < count; i++) {
            snprintf(line, sizeof line, "\n.Fl Fl %s ", all[i]->name);
            const char *found = strstr(part, line);
            bool here = found && (!next || found < next);
            ck_assert_msg(here == command_takes(command_list[c], all[i]),
                          "manual: %s in %s", line, command_list[c]->name);
        }
    }
    /* no place is left unfilled */
    for (const char *at = strchr(text, '@'); at; at = strchr(at + 1, '@')) {
        size_t n = strspn(at + 1, "ABCDEFGHIJKLMNOPQRSTUVWXYZ");
        ck_assert_msg(n == 0 || at[1 + n] != '@', "%.20s", at);
    }
    free(text);
}
END_TEST

START_TEST(help_lists_the_options_of_a_command_and_no_other)
{
    const struct option *all[COMMAND_OPTIONS_MAX];
    int count = command_options(all);
    for (int c = 0; c < command_list_count; c++) {
        const char *name = command_list[c]->name;
        char line[64];
        snprintf(line, sizeof line, "%s --help", name ? name : "");
        struct program_result r = program_call(OUTERSHELL, line);
        ck_assert_int_eq(r.status, 0);
        ck_assert_uint_eq(r.err_size, 0);
        for (int i = 0; i < count; i++) {
            const struct option *o = all[i];
            snprintf(line, sizeof line, "--%s%s%s\n", o->name,
                     o->argument ? " " : "", o->argument ? o->argument : "");
            ck_assert_msg((strstr(r.out, line) != NULL) ==
                              command_takes(command_list[c], o),
                          "help of %s: %s", name ? name : "the screens", line);
        }
        for (const char *l = r.out; *l; l = strchr(l, '\n') + 1)
            ck_assert_uint_le(strcspn(l, "\n"), 79);
        program_free(&r);
    }
}
END_TEST

/* Runs the completion in a shell of its own: what it offers for words. */
static struct program_result complete_in_bash(const char *words)
{
    char script[1024];
    snprintf(script, sizeof script,
             "source '%s'; COMP_WORDS=(outershell %s); "
             "COMP_CWORD=$((${#COMP_WORDS[@]}-1)); _outershell; "
             "printf '%%s\\n' \"${COMPREPLY[@]}\"",
             BASH_COMPLETION, words);
    struct program p = {
        .path = BASH, .count = 3, .arguments = {"--norc", "-c", script}};
    struct program_result r = program_run(&p);
    ck_assert_msg(r.status == 0 && r.err_size == 0, "%s: %s", words, r.err);
    return r;
}

static bool has_line(const char *text, const char *line)
{
    size_t length = strlen(line);
    for (const char *p = text; (p = strstr(p, line)) != NULL; p++)
        if ((p == text || p[-1] == '\n') && p[length] == '\n')
            return true;
    return false;
}

START_TEST(bash_offers_the_options_of_a_command_and_no_other)
{
    const struct option *all[COMMAND_OPTIONS_MAX];
    int count = command_options(all);
    for (int c = 0; c < command_list_count; c++) {
        const char *name = command_list[c]->name;
        char line[64];
        snprintf(line, sizeof line, "%s --", name ? name : "");
        struct program_result r = complete_in_bash(line);
        for (int i = 0; i < count; i++) {
            snprintf(line, sizeof line, "--%s", all[i]->name);
            ck_assert_msg(has_line(r.out, line) ==
                              command_takes(command_list[c], all[i]),
                          "bash: %s with %s", line, name ? name : "none");
        }
        program_free(&r);
    }
}
END_TEST

START_TEST(bash_completes_words_lists_and_elements)
{
    static const struct {
        const char *words, *offered;
    } cases[] = {
        {"l", "list"},
        {"list --quantity ze", "zeff"},
        {"list --quantity zeff,ra", "zeff,radius"},
        {"list --model = slat", "slater"},
        {"list -f j", "json"},
        {"list --subshell 3", "3d"},
        {"list --reference covalent_cor", "covalent_cordero_2008"},
        {"compare Fe C", "Cr"},
        {"--color al", "always"},
    };
    for (size_t i = 0; i < sizeof cases / sizeof cases[0]; i++) {
        struct program_result r = complete_in_bash(cases[i].words);
        ck_assert_msg(has_line(r.out, cases[i].offered), "%s: %s",
                      cases[i].words, r.out);
        program_free(&r);
    }
}
END_TEST

START_TEST(zsh_and_fish_know_every_option_where_it_belongs)
{
    char *zsh = read_whole(ZSH_COMPLETION);
    char *fish = read_whole(FISH_COMPLETION);
    const struct option *all[COMMAND_OPTIONS_MAX];
    int count = command_options(all);
    for (int i = 0; i < count; i++) {
        const struct option *o = all[i];
        char part[64];
        int commands = 0;
        for (int c = 0; c < command_list_count; c++)
            commands += command_takes(command_list[c], o);
        snprintf(part, sizeof part, "--%s%s", o->name,
                 o->argument ? "="
                 : o->letter ? "}"
                             : "'");
        ck_assert_msg(count_of(zsh, part) == commands, "zsh: %s", part);
        snprintf(part, sizeof part, " -l %s ", o->name);
        ck_assert_msg(count_of(fish, part) == 1, "fish: %s", part);
        char *line = strstr(fish, part);
        while (line > fish && line[-1] != '\n')
            line--;
        char *names = strstr(line, part); /* commands stand before it */
        char kept = *names;
        *names = '\0';
        for (int c = 1; c < command_list_count; c++)
            ck_assert_msg(command_takes(command_list[0], o) ||
                              (strstr(line, command_list[c]->name) != NULL) ==
                                  command_takes(command_list[c], o) ||
                              strstr(o->help, command_list[c]->name) != NULL,
                          "fish: %s", line);
        *names = kept;
    }
    free(zsh);
    free(fish);
}
END_TEST

/* Number of data sets in the folder. */
static size_t count_data(void)
{
    size_t count = 0;
    DIR *folder = opendir(DATA_DIR);
    ck_assert_ptr_nonnull(folder);
    for (struct dirent *d; (d = readdir(folder)) != NULL;) {
        size_t length = strlen(d->d_name);
        count += length > 5 && strcmp(d->d_name + length - 5, ".json") == 0;
    }
    closedir(folder);
    return count;
}

/* The sum that anyone gets of the data, in the order of the names. */
START_TEST(version_names_licence_and_data_with_their_sum)
{
    char sum[65] = "";
    char want[256];
    FILE *tool =
        popen("cd '" DATA_DIR "' && LC_ALL=C && cat *.json | sha256sum", "r");
    ck_assert_ptr_nonnull(tool);
    ck_assert_int_eq(fscanf(tool, "%64s", sum), 1);
    ck_assert_int_eq(pclose(tool), 0);
    struct program_result r = program_call(OUTERSHELL, "--version");
    ck_assert_int_eq(r.status, 0);
    snprintf(want, sizeof want, "outershell %s\n", OUTERSHELL_VERSION);
    ck_assert_int_eq(strncmp(r.out, want, strlen(want)), 0);
    ck_assert_ptr_nonnull(strstr(r.out, "Licence: MIT"));
    snprintf(want, sizeof want, "Data sets: %zu\nData SHA-256: %s\n",
             count_data(), sum);
    ck_assert_msg(strstr(r.out, want), "%s\nwant %s", r.out, want);
    program_free(&r);
}
END_TEST

TCase *made_cases(void)
{
    TCase *c = tcase_create("made");
    tcase_add_test(c, the_manual_lists_every_option_and_command_and_no_other);
    tcase_add_test(c, help_lists_the_options_of_a_command_and_no_other);
    tcase_add_test(c, bash_offers_the_options_of_a_command_and_no_other);
    tcase_add_test(c, bash_completes_words_lists_and_elements);
    tcase_add_test(c, zsh_and_fish_know_every_option_where_it_belongs);
    tcase_add_test(c, version_names_licence_and_data_with_their_sum);
    return c;
}
