/* SPDX-License-Identifier: MIT */
/* Parts of the command that prints what a screen exports. */
#ifndef SESSION_COMMAND_H
#define SESSION_COMMAND_H

#include "session/session.h"

/* An operand: " Fe3+". */
void session_command_species(struct text *t, int z, int charge);

/* Electrons of the user's own: " --configuration '…'". */
void session_command_own(const struct session *s, struct text *t);

/* " --coordination VI --spin high", as far as they are chosen. */
void session_command_site(const struct session *s, struct text *t);

/* " --quantity". */
void session_command_quantity(const struct session *s, struct text *t);

/* The choices that belong to it: subshell, reference, site (where a set that
 * tells sites apart is read; ions: the export holds one), second reference
 * (where `against`), kinds of stored values. */
void session_command_choices(const struct session *s, struct text *t, bool ions,
                             bool against);

/* The units that are not the base units. */
void session_command_units(const struct session *s, struct text *t);

/* The data files of the call, and the format. */
void session_command_data(const struct session *s, struct text *t);

#endif
