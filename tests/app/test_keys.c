/* SPDX-License-Identifier: MIT */
/* No key is silent: on every screen it changes what is seen, asks for something
 * outside, or says that and why it does nothing. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "app/desk.h"
#include "app/desk_keys.h"
#include "app/app_internal.h"
#include "screens/list.h"
#include "session/common.h"
#include "app/suites.h"

/* Fresh screens with the i-th one in front, as many species pinned as go in. */
static void begin(int i)
{
    bool changed;
    reopen_app();
    resize(24, 80);
    for (int k = 0; k < PIN_MAX; k++)
        app.session.choice.pins[app.session.choice.pin_count++] =
            (struct pin){20 + k, 2};
    app_show(&app, i);
    free(drawn());
    while (app_screen(&app)->has_work && app_has_work(&app))
        app_step(&app, &changed);
}

/* Sends a key; true when something came of it. */
static bool answers(const struct event *event)
{
    char *before = drawn();
    enum effect effect = app_update(&app, event);
    char *after = drawn();
    bool outside = effect != EFFECT_NONE && effect != EFFECT_REDRAW;
    bool seen = strcmp(before, after) != 0;
    free(before);
    free(after);
    return outside || seen;
}

/* The way back of a move; MOVE_NONE for all else. */
static enum move opposite(enum move move)
{
    static const enum move pairs[][2] = {
        {MOVE_UP, MOVE_DOWN},
        {MOVE_LEFT, MOVE_RIGHT},
        {MOVE_HOME, MOVE_END},
        {MOVE_PAGE_UP, MOVE_PAGE_DOWN},
    };
    for (size_t i = 0; i < sizeof pairs / sizeof pairs[0]; i++)
        for (int k = 0; k < 2; k++)
            if (pairs[i][k] == move)
                return pairs[i][1 - k];
    return MOVE_NONE;
}

static struct event event_of(enum move move)
{
    for (int i = 0; i < session_common_key_count; i++) {
        const struct key_row *r = &session_common_keys[i];
        if (r->move == move && r->character == 0)
            return (struct event){.kind = EVENT_KEY, .key = r->key};
    }
    ck_abort_msg("no key");
}

/* A move at the edge is the one thing that may do nothing: after a move the
 * other way it does. */
static void check_key(int screen, struct event event)
{
    const char *title = screen_list[screen]->title;
    begin(screen);
    const struct key_row *row = session_key_find(&app.keys, &event);
    if (answers(&event))
        return;
    enum move back = row ? opposite(row->move) : MOVE_NONE;
    ck_assert_msg(back != MOVE_NONE, "%s: key %d '%c' does nothing, silently",
                  title, (int)event.key,
                  event.character ? (int)event.character : ' ');
    struct event other = event_of(back);
    app_update(&app, &other);
    ck_assert_msg(answers(&event), "%s: key %d '%c' moves nothing", title,
                  (int)event.key, event.character ? (int)event.character : ' ');
}

START_TEST(no_key_is_silent)
{
    for (int s = 0; s < screen_list_count; s++) {
        for (uint32_t c = ' '; c <= '~'; c++)
            check_key(s,
                      (struct event){.kind = EVENT_CHARACTER, .character = c});
        for (int k = KEY_CODE_UP; k <= KEY_CODE_REPAINT; k++)
            check_key(s, (struct event){.kind = EVENT_KEY, .key = (enum key)k});
    }
}
END_TEST

/* On Compare the sites are those of the compared ions, whatever is selected;
 * where there is none it is said. */
START_TEST(a_site_is_chosen_on_compare)
{
    type("c@");
    ck_assert_ptr_null(app.chooser);
    ck_assert(strstr(app.session.message, "no site to choose"));
    app.session.choice.pins[app.session.choice.pin_count++] =
        (struct pin){31, 3};
    session_touch(&app.session);
    type("@");
    ck_assert_ptr_eq(app.chooser, &session_choose_compared_site);
    key(KEY_CODE_DOWN);
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(app.session.choice.site.coordination, COORDINATION_IV);
    ck_assert(strstr(app.session.message, "site IV"));
}
END_TEST

TCase *keys_case(void)
{
    TCase *tc = tcase_create("keys");
    tcase_set_timeout(tc, 60);
    tcase_add_checked_fixture(tc, open_app, close_app);
    tcase_add_test(tc, no_key_is_silent);
    tcase_add_test(tc, a_site_is_chosen_on_compare);
    return tc;
}
