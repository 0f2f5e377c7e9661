/* SPDX-License-Identifier: MIT */
/* A screen with state, keys, a list, a line, an export and lines of the view
 * file is added through the list alone, and stands wherever screens stand. */
#include <stdlib.h>
#include <string.h>

#include "additions/tally.h"
#include "cli/generate.h"
#include "app/desk.h"
#include "app/desk_keys.h"
#include "support/run.h"

static const char *manual_template;

START_TEST(the_tab_key_comes_to_it_after_all_others)
{
    for (int i = 0; i + 1 < app.session.screen_count; i++) {
        ck_assert_str_ne(app_screen(&app)->id, "tally");
        key(KEY_CODE_TAB);
    }
    ck_assert_str_eq(app_screen(&app)->id, "tally");
    ck_assert(shows("Tally"));
    key(KEY_CODE_TAB);
    ck_assert_int_eq(app.screen, 0);
}
END_TEST

/* The line of keys names it on every screen, and its own keys on it. */
START_TEST(its_key_leads_to_it_from_every_screen)
{
    resize(24, 260);
    for (int i = 0; i < app.session.screen_count; i++) {
        ck_assert_msg(shows("& tally"), "%s", app_screen(&app)->id);
        key(KEY_CODE_TAB);
    }
    for (int i = 0; i < app.session.screen_count; i++) {
        for (int k = 0; k < i; k++)
            key(KEY_CODE_TAB);
        type("&");
        ck_assert_str_eq(app_screen(&app)->id, "tally");
        key(KEY_CODE_ESCAPE);
        ck_assert_int_eq(app.screen, 0);
    }
    type("&");
    ck_assert(shows("# count"));
    ck_assert(shows("% step"));
    ck_assert(shows("! name"));
}
END_TEST

START_TEST(its_keys_change_its_state)
{
    type("&##");
    ck_assert(shows("counted 2 for nobody"));
    type("%");
    ck_assert(shows(" Step "));
    key(KEY_CODE_DOWN);
    key(KEY_CODE_ENTER);
    type("#");
    ck_assert(shows("counted 12 for nobody"));
    type("!");
    ck_assert(shows("for whom:"));
    type("her");
    key(KEY_CODE_ENTER);
    ck_assert(shows("counted 12 for her"));
    type("m&");
    ck_assert(shows("counted 12 for her"));
}
END_TEST

/* A capital letter begins a jump, since it takes the keys of the selection. */
START_TEST(the_common_keys_that_it_takes_work_on_it)
{
    type("&Zr");
    key(KEY_CODE_ENTER);
    ck_assert_int_eq(app.session.choice.z, 40);
    type("p");
    ck_assert_int_eq(app.session.choice.pin_count, 1);
    type("w"); /* it takes no keys of the quantity */
    ck_assert_ptr_null(app.chooser);
}
END_TEST

START_TEST(the_help_tells_of_its_keys)
{
    resize(90, 120);
    type("?");
    ck_assert(shows("count one step on"));
    ck_assert(shows("choose how far a step counts"));
    ck_assert(shows("how often a key was pressed"));
}
END_TEST

START_TEST(the_manual_tells_of_its_keys)
{
    char *text = NULL;
    size_t size = 0;
    struct status st = status_ok();
    FILE *out = open_memstream(&text, &size);
    ck_assert_ptr_nonnull(out);
    ck_assert_msg(generate_manual(out, manual_template, &st), "%s", st.message);
    fclose(out);
    ck_assert_ptr_nonnull(strstr(text, "\ncount one step on\n"));
    ck_assert_ptr_nonnull(strstr(text, "\nhow often a key was pressed\n"));
    free(text);
}
END_TEST

START_TEST(it_is_exported_with_its_command)
{
    char command[SESSION_COMMAND_MAX];
    struct text t = text_over(command, sizeof command);
    char *text = NULL;
    size_t size = 0;
    struct status st = status_ok();
    type("&###e");
    ck_assert(shows("write CSV to: tally.csv"));
    ck_assert_int_eq(key(KEY_CODE_ENTER), EFFECT_WRITE);
    ck_assert(app_export_ready(&app));
    FILE *out = open_memstream(&text, &size);
    ck_assert_ptr_nonnull(out);
    ck_assert(app_export(&app, out, &st));
    fclose(out);
    ck_assert_str_eq(text, "count\r\n3\r\n");
    free(text);
    app_export_command(&app, &t);
    ck_assert_str_eq(command, "outershell tally --format csv");
}
END_TEST

START_TEST(the_view_keeps_its_state)
{
    char view[4096];
    struct text t = text_over(view, sizeof view);
    type("&####Zr");
    key(KEY_CODE_ENTER);
    app_save_view(&app, &t);
    ck_assert_ptr_nonnull(strstr(view, "\ntally 4\n"));
    reopen_app();
    app_load_view(&app, view);
    type("&");
    ck_assert(shows("counted 4 for"));
    ck_assert_int_eq(app.session.choice.z, 40);
    app_load_view(&app, "tally four\ntally\n");
    ck_assert(shows("counted 4 for"));
}
END_TEST

int main(int argc, char **argv)
{
    if (argc != 2)
        return EXIT_FAILURE;
    manual_template = argv[1];
    Suite *suite = suite_create("additions");
    TCase *tc = tcase_create("screen");
    tcase_add_checked_fixture(tc, open_app, close_app);
    tcase_add_test(tc, the_tab_key_comes_to_it_after_all_others);
    tcase_add_test(tc, its_key_leads_to_it_from_every_screen);
    tcase_add_test(tc, its_keys_change_its_state);
    tcase_add_test(tc, the_common_keys_that_it_takes_work_on_it);
    tcase_add_test(tc, the_help_tells_of_its_keys);
    tcase_add_test(tc, the_manual_tells_of_its_keys);
    tcase_add_test(tc, it_is_exported_with_its_command);
    tcase_add_test(tc, the_view_keeps_its_state);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
