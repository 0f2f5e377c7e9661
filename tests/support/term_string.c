/* SPDX-License-Identifier: MIT */
/* Apart from pty.c, since term.h makes macros of many words. */
#include "support/pty.h"

#include <curses.h>
#include <stdio.h>
#include <term.h>
#include <unistd.h>

bool term_string(const char *term, const char *name, char *out, size_t size)
{
    int found;
    if (setupterm(term, STDERR_FILENO, &found) != OK)
        return false;
    const char *value = tigetstr(name);
    bool ok = value != NULL && value != (const char *)-1;
    if (ok)
        snprintf(out, size, "%s", value);
    del_curterm(cur_term);
    return ok;
}

bool pty_has_term(const char *term)
{
    int found;
    bool ok = setupterm(term, STDERR_FILENO, &found) == OK;
    if (cur_term != NULL)
        del_curterm(cur_term);
    return ok;
}
