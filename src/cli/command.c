/* SPDX-License-Identifier: MIT */
#include "cli/command.h"

#include <assert.h>
#include <string.h>

const struct command *command_find(const char *name)
{
    for (int i = 0; i < command_list_count; i++)
        if (command_list[i]->name && strcmp(command_list[i]->name, name) == 0)
            return command_list[i];
    return NULL;
}

bool command_takes(const struct command *command, const struct option *option)
{
    for (const struct option *const *o = command->options; *o; o++)
        if (*o == option)
            return true;
    return false;
}

/* Puts an option in its place by name, once. */
static int insert(const struct option *options[COMMAND_OPTIONS_MAX], int count,
                  const struct option *option)
{
    int at = 0;
    while (at < count && strcmp(options[at]->name, option->name) < 0)
        at++;
    if (at < count && options[at] == option)
        return count;
    assert(count < COMMAND_OPTIONS_MAX);
    memmove(&options[at + 1], &options[at],
            (size_t)(count - at) * sizeof options[0]);
    options[at] = option;
    return count + 1;
}

int command_options(const struct option *options[COMMAND_OPTIONS_MAX])
{
    int count = 0;
    for (int c = 0; c < command_list_count; c++)
        for (const struct option *const *o = command_list[c]->options; *o; o++)
            count = insert(options, count, *o);
    return count;
}

const struct option *command_option(const char *name, size_t length)
{
    for (int c = 0; c < command_list_count; c++)
        for (const struct option *const *o = command_list[c]->options; *o; o++)
            if (strlen((*o)->name) == length &&
                memcmp((*o)->name, name, length) == 0)
                return *o;
    return NULL;
}

const struct option *command_option_letter(char letter)
{
    for (int c = 0; letter && c < command_list_count; c++)
        for (const struct option *const *o = command_list[c]->options; *o; o++)
            if ((*o)->letter == letter)
                return *o;
    return NULL;
}
