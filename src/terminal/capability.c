/* SPDX-License-Identifier: MIT */
/* Everything asked of the terminal's description. Apart from the other files,
 * since term.h makes macros of words such as columns. */
#include "terminal/inside.h"

#include <stdint.h>
#include <stdlib.h>
#include <string.h>
#include <term.h>

#include "base/text.h"

/* TERM as it may stand in a message. */
static void printable_term(char out[64])
{
    const char *term = getenv("TERM");
    struct text t = text_over(out, 64);
    for (; term != NULL && *term; term++) {
        bool plain = *term > ' ' && *term <= '~';
        text_add_bytes(&t, plain ? term : "?", 1);
    }
}

/* NULL when the terminal has no such string; curses also says -1. */
static const char *string_of(const char *name)
{
    const char *value = tigetstr(name);
    return (intptr_t)value == -1 ? NULL : value;
}

bool capability_check(int fd, struct status *st)
{
    char term[64];
    printable_term(term);
    if (term[0] == '\0')
        return status_fail(st, STATUS_TERMINAL,
                           "TERM is not set, so the terminal is not "
                           "known" NO_SCREEN_HINT);
    int found = 0;
    if (setupterm(NULL, fd, &found) == ERR && found != 1)
        return status_fail(
            st, STATUS_TERMINAL,
            "TERM is '%s', which this system does not describe (its terminfo "
            "entry is missing; many more are in the package "
            "ncurses-term)" NO_SCREEN_HINT,
            term);
    bool usable = found == 1 && string_of("cup") != NULL;
    if (cur_term != NULL)
        del_curterm(cur_term);
    if (!usable)
        return status_fail(st, STATUS_TERMINAL,
                           "TERM is '%s', a terminal that cannot place its "
                           "cursor" NO_SCREEN_HINT,
                           term);
    return true;
}

/* Appends a capability without its delays ("$<5/>"). */
static void add_capability(struct text *out, const char *value)
{
    while (value != NULL && *value) {
        const char *end =
            value[0] == '$' && value[1] == '<' ? strchr(value, '>') : NULL;
        if (end != NULL) {
            value = end + 1;
            continue;
        }
        text_add_bytes(out, value, 1);
        value++;
    }
}

struct capability capability_get(const char *name)
{
    struct capability c = {.length = 0};
    struct text t = text_over(c.bytes, sizeof c.bytes);
    add_capability(&t, string_of(name));
    c.length = t.cut ? 0 : t.length;
    return c;
}

struct guard_rescue capability_rescue(const struct terminal *t)
{
    struct guard_rescue r = {
        .fd = t->output_fd, .modes = t->modes, .has_modes = t->has_modes};
    struct text out = text_over(r.reset, sizeof r.reset);
    text_add_bytes(&out, t->paste_off.bytes, t->paste_off.length);
    const char *mouse = string_of("XM");
    if (mouse != NULL)
        add_capability(&out, tparm(mouse, 0L, 0L, 0L, 0L, 0L, 0L, 0L, 0L, 0L));
    else if (string_of("kmous") != NULL)
        text_add(&out, "\033[?1000l");
    static const char *const names[] = {"rmkx", "sgr0", "op", "cnorm"};
    for (size_t i = 0; i < sizeof names / sizeof names[0]; i++)
        add_capability(&out, string_of(names[i]));
    const char *leave = string_of("rmcup");
    if (leave != NULL)
        add_capability(&out, leave);
    else
        text_add(&out, "\r\n");
    r.reset_length = out.length;
    return r;
}

bool capability_direct(void)
{
    return tigetflag("RGB") > 0;
}
