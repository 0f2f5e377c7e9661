/* SPDX-License-Identifier: MIT */
/* The keys of a list of screens: which ones a screen has, and what the help
 * says of all of them. */
#ifndef SESSION_KEYS_H
#define SESSION_KEYS_H

#include "session/screen.h"

#define KEY_ROWS_MAX 128
#define SCREENS_MAX 32

/* The rows of one screen by their place: those for all screens, those that
 * lead to the others, its own. */
struct key_set {
    int count;
    const struct key_row *rows[KEY_ROWS_MAX];
};

void session_key_set(const struct screen_ops *const *screens, int count,
                     const struct screen_ops *screen, struct key_set *set);

/* The row of an event, or NULL when the key means nothing. */
const struct key_row *session_key_find(const struct key_set *set,
                                       const struct event *event);

/* What a key that means nothing here is called: its name on another screen, its
 * character, or "this key". Returns a text of the table, or out. */
#define KEY_NAME_MAX 8
const char *session_key_name(const struct screen_ops *const *screens, int count,
                             const struct event *event, char out[KEY_NAME_MAX]);

/* The screen that a row leads to, or -1. */
int session_key_screen(const struct screen_ops *const *screens, int count,
                       const struct key_row *row);

/* One line of the help: a row, and the screens that have it or one of the same
 * words, bit by place in the list. */
struct key_help {
    const struct key_row *row;
    unsigned screens;
};

/* Everything that the help lists, by place; gives how much that is. */
int session_key_help(const struct screen_ops *const *screens, int count,
                     struct key_help help[KEY_ROWS_MAX]);

/* What the i-th line of a help says; in front the screens, where another line
 * has the same key. */
void session_key_explain(const struct screen_ops *const *screens, int count,
                         const struct key_help *help, int help_count, int i,
                         struct text *t);

#endif
