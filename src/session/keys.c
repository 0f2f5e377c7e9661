/* SPDX-License-Identifier: MIT */
#include "session/keys.h"

#include <assert.h>
#include <string.h>

#include "base/text.h"

#include "session/common.h"

static bool takes(const struct screen_ops *screen, unsigned group)
{
    if (group == KEYS_EXPORT)
        return screen->export_count > 0;
    return group == KEYS_EVERYWHERE || (screen->groups & group) != 0;
}

/* Rows of the same place stay in the order in which they came. */
static void insert(struct key_set *set, const struct key_row *row)
{
    assert(set->count < KEY_ROWS_MAX);
    int at = set->count++;
    for (; at > 0 && set->rows[at - 1]->place > row->place; at--)
        set->rows[at] = set->rows[at - 1];
    set->rows[at] = row;
}

void session_key_set(const struct screen_ops *const *screens, int count,
                     const struct screen_ops *screen, struct key_set *set)
{
    set->count = 0;
    for (int i = 0; i < session_common_key_count; i++)
        if (takes(screen, session_common_keys[i].group))
            insert(set, &session_common_keys[i]);
    for (int i = 0; i < count; i++)
        insert(set, &screens[i]->key);
    for (int i = 0; i < screen->key_count; i++)
        insert(set, &screen->keys[i]);
}

const struct key_row *session_key_find(const struct key_set *set,
                                       const struct event *event)
{
    for (int i = 0; i < set->count; i++) {
        const struct key_row *r = set->rows[i];
        if (event->kind == EVENT_CHARACTER && r->character != 0 &&
            r->character == event->character)
            return r;
        if (event->kind == EVENT_KEY && r->character == 0 &&
            r->key == event->key)
            return r;
    }
    return NULL;
}

static bool is_named(const struct key_row *row, const struct event *event)
{
    return event->kind == EVENT_KEY && row->character == 0 &&
           row->key == event->key && row->name[0] != '\0';
}

const char *session_key_name(const struct screen_ops *const *screens, int count,
                             const struct event *event, char out[KEY_NAME_MAX])
{
    for (int i = 0; i < session_common_key_count; i++)
        if (is_named(&session_common_keys[i], event))
            return session_common_keys[i].name;
    for (int s = 0; s < count; s++)
        for (int i = 0; i < screens[s]->key_count; i++)
            if (is_named(&screens[s]->keys[i], event))
                return screens[s]->keys[i].name;
    if (event->kind != EVENT_CHARACTER)
        return "this key";
    out[utf8_encode(event->character, out)] = '\0';
    return out;
}

int session_key_screen(const struct screen_ops *const *screens, int count,
                       const struct key_row *row)
{
    for (int i = 0; i < count; i++)
        if (row == &screens[i]->key)
            return i;
    return -1;
}

static bool same_words(const struct key_row *a, const struct key_row *b)
{
    return a == b ||
           (strcmp(a->name, b->name) == 0 && strcmp(a->label, b->label) == 0 &&
            strcmp(a->help, b->help) == 0);
}

/* Adds a row to the lines so far, or its screen to the line that says it. */
static int add_help(struct key_help help[KEY_ROWS_MAX], int used,
                    const struct key_row *row, int screen)
{
    for (int i = 0; i < used; i++)
        if (same_words(help[i].row, row)) {
            help[i].screens |= 1u << screen;
            return used;
        }
    int at = used;
    for (; at > 0 && help[at - 1].row->place > row->place; at--)
        help[at] = help[at - 1];
    help[at] = (struct key_help){row, 1u << screen};
    return used + 1;
}

int session_key_help(const struct screen_ops *const *screens, int count,
                     struct key_help help[KEY_ROWS_MAX])
{
    int used = 0;
    assert(count <= SCREENS_MAX);
    for (int s = 0; s < count; s++) {
        struct key_set set;
        session_key_set(screens, count, screens[s], &set);
        for (int i = 0; i < set.count && used < KEY_ROWS_MAX; i++)
            if (set.rows[i]->name[0] != '\0' && set.rows[i]->label[0] != '\0')
                used = add_help(help, used, set.rows[i], s);
    }
    return used;
}

/* Whether the same key stands for something else on another screen. */
static bool has_namesake(const struct key_help *help, int help_count, int i)
{
    for (int k = 0; k < help_count; k++)
        if (k != i && strcmp(help[k].row->name, help[i].row->name) == 0)
            return true;
    return false;
}

void session_key_explain(const struct screen_ops *const *screens, int count,
                         const struct key_help *help, int help_count, int i,
                         struct text *t)
{
    bool begun = false;
    for (int s = 0; s < count && has_namesake(help, help_count, i); s++)
        if (help[i].screens >> s & 1u) {
            text_addf(t, "%s%s", begun ? ", " : "", screens[s]->title);
            begun = true;
        }
    text_addf(t, "%s%s", begun ? ": " : "", help[i].row->help);
}
