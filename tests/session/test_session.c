/* SPDX-License-Identifier: MIT */
/* What all screens share, without any screen. */
#include <check.h>
#include <stdlib.h>
#include <string.h>

#include "report/report.h"
#include "session/command.h"
#include "session/common.h"
#include "session/keys.h"
#include "session/rows.h"
#include "session/view.h"
#include "support/run.h"

static struct study *study;
static struct session session;

static void open_session(void)
{
    struct status st = status_ok();
    study = study_new(catalogue_builtin(), &st);
    ck_assert_ptr_nonnull(study);
    session_init(&session, study);
}

static void close_session(void)
{
    study_free(study);
}

START_TEST(a_changed_choice_has_another_version)
{
    unsigned choice = session.choice_version;
    unsigned selection = session.selection_version;
    session_select(&session, 40);
    ck_assert_uint_eq(session.choice_version, choice);
    ck_assert_uint_ne(session.selection_version, selection);
    selection = session.selection_version;
    session_select_species(&session, 40, 2);
    ck_assert_uint_ne(session.choice_version, choice);
    ck_assert_uint_ne(session.selection_version, selection);
    choice = session.choice_version;
    session_select_species(&session, 41, 2); /* no other charge */
    ck_assert_uint_eq(session.choice_version, choice);
}
END_TEST

/* After any quantity the choice holds nothing of another one. */
START_TEST(a_quantity_takes_nothing_from_the_one_before)
{
    const struct reference_list *list = study_references(study);
    for (int a = 0; a < QUANTITY_COUNT; a++)
        for (int r = 0; r < list->count; r++) {
            struct choice *c = &session.choice;
            enum quantity_id q = (enum quantity_id)a;
            c->reference = c->against = &list->items[r];
            c->n = 3;
            c->l = 2;
            session_select_quantity(&session, q);
            ck_assert_int_eq(c->quantity, q);
            ck_assert_ptr_null(c->reference);
            ck_assert_ptr_null(c->against);
            ck_assert(c->n == 0 || quantity_at(q)->per_subshell);
            ck_assert(!c->model || model_gives(c->model, q));
            ck_assert(c->model || c->shown == SHOWN_REFERENCE);
        }
}
END_TEST

START_TEST(own_electrons_belong_to_one_species)
{
    struct status st = status_ok();
    struct ask ask;
    struct species species;
    ck_assert(configuration_parse("[Ar] 3d7 4s1", &session.choice.configuration,
                                  &st));
    session.choice.configured = (struct pin){26, 0};
    ck_assert(session_is_own(&session, 26, 0));
    ck_assert(!session_is_own(&session, 26, 1));
    ck_assert(session_ask(&session, 26, 0, &ask));
    ck_assert_ptr_eq(ask.configuration, &session.choice.configuration);
    ck_assert(session_ask(&session, 27, 0, &ask));
    ck_assert_ptr_null(ask.configuration);
    ck_assert(session_species(&session, &species));
    ck_assert_int_eq(species.origin, ORIGIN_USER);
    session_select_species(&session, 1, 2); /* no such ion */
    ck_assert(!session_species(&session, &species));
}
END_TEST

/* Every line that the session writes is its own and comes back. */
START_TEST(every_line_of_the_view_is_taken_back)
{
    char view[2048];
    char again[2048];
    struct text t = text_over(view, sizeof view);
    session_select_species(&session, 25, 2);
    session.choice.pins[session.choice.pin_count++] = (struct pin){24, 3};
    session.choice.braille = session.mouse = true;
    session.choice.site = (struct site){COORDINATION_VI, SPIN_NONE + 1};
    session_save(&session, &t);
    session_init(&session, study);
    for (const char *line = view; *line; line = strchr(line, '\n') + 1) {
        char key[64];
        char value[64];
        ck_assert_int_eq(sscanf(line, "%63s %63[^\n]", key, value), 2);
        ck_assert_msg(session_load(&session, key, value), "%s", key);
    }
    session_settle(&session);
    t = text_over(again, sizeof again);
    session_save(&session, &t);
    ck_assert_str_eq(view, again);
    ck_assert(!session_load(&session, "functional", "lda")); /* a screen's */
}
END_TEST

START_TEST(a_charge_that_the_element_lacks_is_dropped_at_the_end)
{
    ck_assert(session_load(&session, "charge", "40"));
    ck_assert(session_load(&session, "element", "H"));
    session_settle(&session);
    ck_assert_int_eq(session.choice.z, 1);
    ck_assert_int_eq(session.choice.charge, 0);
}
END_TEST

/* Two screens of the test's own. */
static enum effect first_act(struct session *s, void *state)
{
    (void)s;
    (void)state;
    return EFFECT_REDRAW;
}

static const struct key_row first_keys[] = {
    {35, 'v', 0, "v", "one", "does one thing", true, 0, first_act, 0, 0, 0},
};
static const struct key_row second_keys[] = {
    {36, 'v', 0, "v", "two", "does another", true, 0, first_act, 0, 0, 0},
};
static const struct screen_ops first = {
    .id = "first",
    .title = "First",
    .key = {15, '1', 0, "1", "first", "the first", true, 0, 0, 0, 0, 0},
    .groups = KEYS_QUANTITY,
    .keys = first_keys,
    .key_count = 1,
};
static const struct screen_ops second = {
    .id = "second",
    .title = "Second",
    .key = {25, '2', 0, "2", "second", "the second", true, 0, 0, 0, 0, 0},
    .keys = second_keys,
    .key_count = 1,
};
static const struct screen_ops *const both[] = {&first, &second};

static const struct key_row *find(const struct screen_ops *screen, char c)
{
    static struct key_set set;
    struct event event = {.kind = EVENT_CHARACTER,
                          .character = (unsigned char)c};
    session_key_set(both, 2, screen, &set);
    for (int i = 1; i < set.count; i++)
        ck_assert_int_le(set.rows[i - 1]->place, set.rows[i]->place);
    return session_key_find(&set, &event);
}

START_TEST(a_screen_has_its_own_keys_and_the_groups_that_it_takes)
{
    ck_assert_ptr_eq(find(&first, 'v'), &first_keys[0]);
    ck_assert_ptr_eq(find(&second, 'v'), &second_keys[0]);
    ck_assert_ptr_nonnull(find(&first, 'w'));
    ck_assert_ptr_null(find(&second, 'w'));
    ck_assert_ptr_null(find(&first, 'e')); /* it exports nothing */
    ck_assert_ptr_nonnull(find(&second, 'q'));
    ck_assert_int_eq(session_key_screen(both, 2, find(&first, '2')), 1);
    ck_assert_int_eq(session_key_screen(both, 2, find(&first, 'v')), -1);
}
END_TEST

/* In front of a line stand the screens where the key means that, if it means
 * something else on another. */
START_TEST(the_help_tells_namesakes_apart)
{
    struct key_help help[KEY_ROWS_MAX];
    int count = session_key_help(both, 2, help);
    int seen = 0;
    for (int i = 0; i < count; i++) {
        char line[SESSION_TEXT_MAX];
        struct text t = text_over(line, sizeof line);
        session_key_explain(both, 2, help, count, i, &t);
        if (help[i].row == &first_keys[0])
            ck_assert_str_eq(line, "First: does one thing");
        else if (help[i].row == &second_keys[0])
            ck_assert_str_eq(line, "Second: does another");
        else if (strcmp(help[i].row->name, "q") == 0)
            ck_assert_str_eq(line, "leave the program");
        else
            continue;
        seen++;
    }
    ck_assert_int_eq(seen, 3);
}
END_TEST

/* Every list that a common key opens: each entry can be taken, and what is
 * chosen then is the current one of the list. */
START_TEST(every_entry_of_every_list_can_be_taken)
{
    for (int i = 0; i < session_common_key_count; i++) {
        const struct chooser_ops *ops = session_common_keys[i].chooser;
        struct chooser list = {0};
        session_init(&session, study);
        session_select_species(&session, 26, 3);
        if (!ops)
            continue;
        ops->fill(&session, NULL, &list);
        ck_assert_msg(list.count > 0, "%s", ops->title);
        for (int k = 0; k < list.count; k++) {
            struct chooser after = {0};
            ops->take(&session, NULL, list.values[k]);
            ops->fill(&session, NULL, &after);
            ck_assert_msg(after.count > 0, "%s: %s", ops->title,
                          list.labels[k]);
            if (list.values[k] >= 0)
                ck_assert_msg(after.values[after.at] == list.values[k],
                              "%s: %s, but %s is current", ops->title,
                              list.labels[k], after.labels[after.at]);
        }
    }
}
END_TEST

START_TEST(a_command_names_a_site_only_where_a_set_reads_it)
{
    char line[SESSION_TEXT_MAX];
    struct text t = text_over(line, sizeof line);
    session.choice.site.coordination = COORDINATION_IV;
    session_command_choices(&session, &t, true, true);
    ck_assert_str_eq(line, ""); /* Z_eff knows no sites */
    session_select_quantity(&session, QUANTITY_RADIUS);
    session_command_choices(&session, &t, false, true);
    ck_assert_str_eq(line, "");
    session_command_choices(&session, &t, true, true);
    ck_assert_str_eq(line, " --coordination IV");
}
END_TEST

START_TEST(rows_go_over_to_a_report)
{
    struct rows rows = {0};
    struct report report;
    struct status st = status_ok();
    report_begin(&report);
    bool ok = session_rows_models(&session, &rows, 26, 0, &st);
    ck_assert_uint_gt(rows.count, 2);
    size_t count = rows.count;
    ck_assert(session_rows_report(&rows, ok, REPORT_RECORDS, &report, &st));
    ck_assert_uint_eq(report.records.count, count);
    ck_assert_ptr_null(rows.items);
    report_clear(&report);
    report_begin(&report);
    ck_assert(session_rows_models(&session, &rows, 26, 0, &st));
    ck_assert(!session_rows_report(&rows, false, REPORT_RECORDS, &report, &st));
    ck_assert_ptr_null(rows.items);
    report_clear(&report);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("session");
    TCase *tc = tcase_create("session");
    tcase_add_checked_fixture(tc, open_session, close_session);
    tcase_add_test(tc, a_changed_choice_has_another_version);
    tcase_add_test(tc, a_quantity_takes_nothing_from_the_one_before);
    tcase_add_test(tc, own_electrons_belong_to_one_species);
    tcase_add_test(tc, every_line_of_the_view_is_taken_back);
    tcase_add_test(tc, a_charge_that_the_element_lacks_is_dropped_at_the_end);
    tcase_add_test(tc, a_screen_has_its_own_keys_and_the_groups_that_it_takes);
    tcase_add_test(tc, the_help_tells_namesakes_apart);
    tcase_add_test(tc, every_entry_of_every_list_can_be_taken);
    tcase_add_test(tc, a_command_names_a_site_only_where_a_set_reads_it);
    tcase_add_test(tc, rows_go_over_to_a_report);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
