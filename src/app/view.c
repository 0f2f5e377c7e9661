/* SPDX-License-Identifier: MIT */
/* The remembered view: text with one `key value` per line, of the session and
 * of every screen. */
#include <string.h>

#include "app/app_internal.h"
#include "screens/list.h"
#include "session/view.h"

#define LINE_MAX_BYTES 192

void app_save_view(const struct app *app, struct text *t)
{
    session_save(&app->session, t);
    for (int i = 0; i < screen_list_count; i++)
        if (screen_list[i]->save)
            screen_list[i]->save(&app->session, app->states[i], t);
}

static void load_line(struct app *app, const char *line, size_t length)
{
    char key[LINE_MAX_BYTES];
    if (length >= sizeof key)
        return;
    memcpy(key, line, length);
    key[length] = '\0';
    char *value = strchr(key, ' ');
    if (!value || value[1] == '\0')
        return;
    *value++ = '\0';
    bool taken = session_load(&app->session, key, value);
    for (int i = 0; i < screen_list_count && !taken; i++)
        taken = screen_list[i]->load &&
                screen_list[i]->load(&app->session, app->states[i], key, value);
}

void app_load_view(struct app *app, const char *text)
{
    while (*text) {
        size_t length = strcspn(text, "\n");
        load_line(app, text, length);
        text += length + (text[length] == '\n');
    }
    session_settle(&app->session);
}
