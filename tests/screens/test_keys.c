/* SPDX-License-Identifier: MIT */
/* No key is silent: on every screen it changes what is seen, asks for something
 * outside, or says that and why it does nothing. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "screens/desk.h"
#include "screens/desk_keys.h"
#include "screens/parts.h"
#include "screens/test_ui.h"

/* A fresh desk with a screen in front, as many species pinned as go in. */
static void begin(enum screen_id screen)
{
    bool changed;
    ui_clear(&ui);
    ui_init(&ui, study);
    resize(24, 80);
    for (int i = 0; i < PIN_MAX; i++)
        ui.choice.pins[ui.choice.pin_count++] = (struct pin){20 + i, 2};
    ui.screen = screen;
    free(drawn());
    while (screen == SCREEN_ATOM && ui_has_work(&ui))
        ui_step(&ui, &changed);
}

/* Sends a key; true when something came of it. */
static bool answers(const struct event *event)
{
    char *before = drawn();
    enum effect effect = ui_update(&ui, event);
    char *after = drawn();
    bool outside = effect != EFFECT_NONE && effect != EFFECT_REDRAW;
    bool seen = strcmp(before, after) != 0;
    free(before);
    free(after);
    return outside || seen;
}

/* The way back of a move; ACTION_NONE for all else. */
static enum action opposite(enum action action)
{
    static const enum action pairs[][2] = {
        {ACTION_UP, ACTION_DOWN},
        {ACTION_LEFT, ACTION_RIGHT},
        {ACTION_HOME, ACTION_END},
        {ACTION_PAGE_UP, ACTION_PAGE_DOWN},
    };
    for (size_t i = 0; i < sizeof pairs / sizeof pairs[0]; i++)
        for (int k = 0; k < 2; k++)
            if (pairs[i][k] == action)
                return pairs[i][1 - k];
    return ACTION_NONE;
}

static struct event event_of(enum action action)
{
    for (int i = 0; i < key_row_count(); i++) {
        const struct key_row *r = key_row_at(i);
        if (r->action == action && r->character == 0)
            return (struct event){.kind = EVENT_KEY, .key = r->key};
    }
    ck_abort_msg("no key");
}

/* A move at the edge is the one thing that may do nothing: after a move the
 * other way it does. */
static void check_key(enum screen_id screen, struct event event)
{
    begin(screen);
    if (answers(&event))
        return;
    enum action back = opposite(key_action(&event, screen));
    ck_assert_msg(back != ACTION_NONE, "%s: key %d '%c' does nothing, silently",
                  ui_screen_name(screen), (int)event.key,
                  event.character ? (int)event.character : ' ');
    struct event other = event_of(back);
    ui_update(&ui, &other);
    ck_assert_msg(answers(&event), "%s: key %d '%c' moves nothing",
                  ui_screen_name(screen), (int)event.key,
                  event.character ? (int)event.character : ' ');
}

START_TEST(no_key_is_silent)
{
    enum screen_id screen = (enum screen_id)_i;
    for (uint32_t c = ' '; c <= '~'; c++)
        check_key(screen,
                  (struct event){.kind = EVENT_CHARACTER, .character = c});
    for (int k = KEY_CODE_UP; k <= KEY_CODE_REPAINT; k++)
        check_key(screen,
                  (struct event){.kind = EVENT_KEY, .key = (enum key)k});
}
END_TEST

/* On Compare the sites are those of the compared ions, whatever is selected;
 * where there is none it is said. */
START_TEST(a_site_is_chosen_on_compare)
{
    type("c@");
    ck_assert_int_eq(ui.chooser.kind, CHOOSER_NONE);
    ck_assert(strstr(ui.message, "no site to choose"));
    ui.choice.pins[ui.choice.pin_count++] = (struct pin){31, 3};
    ui.comparison_stale = true;
    type("@");
    ck_assert_int_eq(ui.chooser.kind, CHOOSER_SITE);
    key(KEY_CODE_DOWN);
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(ui.choice.site.coordination, COORDINATION_IV);
    ck_assert(strstr(ui.message, "site IV"));
}
END_TEST

TCase *keys_case(void)
{
    TCase *tc = tcase_create("keys");
    tcase_set_timeout(tc, 60);
    tcase_add_checked_fixture(tc, open_ui, close_ui);
    tcase_add_loop_test(tc, no_key_is_silent, SCREEN_MAP, SCREEN_KEYS + 1);
    tcase_add_test(tc, a_site_is_chosen_on_compare);
    return tc;
}
