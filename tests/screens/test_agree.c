/* SPDX-License-Identifier: MIT */
/* What two places say of the same thing agrees: title and row, screen and
 * command. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "app/desk.h"
#include "app/desk_keys.h"
#include "screens/list.h"
#include "screens/suites.h"

/* The first line of the screen. */
static char *title(void)
{
    char *text = drawn();
    *strchr(text, '\n') = '\0';
    return text;
}

/* The title of the map names the set of the selected row, at every charge, for
 * inner subshells and for what does not exist. */
START_TEST(the_title_of_the_map_names_the_set_of_its_row)
{
    static const int elements[] = {1, 8, 26, 58};
    int named = 0;
    resize(60, 200);
    app.session.choice.shown = SHOWN_REFERENCE;
    for (int q = 0; q < QUANTITY_COUNT; q++)
        for (size_t i = 0; i < sizeof elements / sizeof elements[0]; i++)
            for (int charge = -1; charge <= 4; charge++)
                for (int n = 0; n <= 2; n += 2) {
                    struct ask ask;
                    app.session.choice.quantity = (enum quantity_id)q;
                    app.session.choice.z = elements[i];
                    app.session.choice.charge = charge;
                    app.session.choice.n =
                        quantity_at(app.session.choice.quantity)->per_subshell
                            ? n
                            : 0;
                    session_touch(&app.session);
                    if (!session_ask(&app.session, elements[i], charge, &ask))
                        continue;
                    struct row row = study_row(study, &ask);
                    const struct provenance *p = row.reference.provenance;
                    char *line = title();
                    ck_assert_msg(strstr(line, p ? p->id : "no reference"),
                                  "%s does not name %s", line,
                                  p ? p->id : "no reference");
                    free(line);
                    named += p != NULL;
                }
    ck_assert_int_ge(named, 100);
}
END_TEST

/* Without a curve an export holds the stored values alone, and its command
 * says so. */
START_TEST(a_trend_without_curves_names_no_model)
{
    char buffer[SESSION_COMMAND_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    type("t");
    app.session.choice.hidden_models = ~0u;
    session_touch(&app.session);
    free(drawn());
    app.export = &screen_trend.exports[0];
    app_export_command(&app, &t);
    ck_assert_ptr_nonnull(strstr(buffer, " --model none"));
}
END_TEST

/* Shannon's radius of Fe3+ is 64.5 pm at VI, high spin, 55 pm low spin, and
 * 49 pm at IV (Acta Cryst. A32, 751 (1976)); wherever it stands its site stands
 * beside it. */
START_TEST(a_stored_radius_stands_with_its_site)
{
    static const struct {
        const char *keys;
        int rows, columns;
        bool radius;
    } places[] = {
        {"", 24, 80, true},   {"", 60, 200, true},  {"", 60, 200, false},
        {"", 50, 100, false}, {"c", 60, 200, true}, {"t", 60, 200, true},
        {"t", 24, 80, true},  {"d", 24, 120, true},
    };
    for (size_t i = 0; i < sizeof places / sizeof places[0]; i++) {
        reopen_app();
        resize(places[i].rows, places[i].columns);
        app.session.choice.charge = 3;
        if (places[i].radius)
            app.session.choice.quantity = QUANTITY_RADIUS;
        type(places[i].keys);
        char *text = drawn();
        bool audit = places[i].keys[0] == 'd';
        bool whole = strstr(text, "VI") &&
                     (audit || (strstr(text, "64.5") && strstr(text, "high")));
        if (!whole)
            fputs(text, stderr);
        ck_assert_msg(whole, "place %zu", i);
        free(text);
    }
}
END_TEST

TCase *agree_case(void)
{
    TCase *tc = tcase_create("agree");
    tcase_add_checked_fixture(tc, open_app, close_app);
    tcase_add_test(tc, the_title_of_the_map_names_the_set_of_its_row);
    tcase_add_test(tc, a_trend_without_curves_names_no_model);
    tcase_add_test(tc, a_stored_radius_stands_with_its_site);
    return tc;
}
