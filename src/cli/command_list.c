/* SPDX-License-Identifier: MIT */
#include "cli/command.h"

const struct command *const command_list[] = {
    &command_screens, &command_print, &command_compare,
    &command_atom,    &command_audit, &command_sources,
};
const int command_list_count = sizeof command_list / sizeof command_list[0];
