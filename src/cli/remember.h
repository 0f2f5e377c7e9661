/* SPDX-License-Identifier: MIT */
/* The last view, kept in the user's state folder (XDG Base Directory
 * Specification 0.8): $XDG_STATE_HOME/outershell/view, by default
 * ~/.local/state/outershell/view. */
#ifndef CLI_REMEMBER_H
#define CLI_REMEMBER_H

#include "base/status.h"

#define VIEW_BYTES_MAX 8192

/* Reads the view into text[VIEW_BYTES_MAX], "" when there is none that can be
 * read: a lost view never stops a start. */
void view_recall(char *text);

/* Keeps a view, making the folders that are missing. True also where there is
 * no place for it (no home). Fails with STATUS_FILE. */
MUST_CHECK bool view_keep(const char *text, struct status *st);

/* Removes it; true when there is none afterwards. */
MUST_CHECK bool view_forget(struct status *st);

#endif
