/* SPDX-License-Identifier: MIT */
/* Every allocation of a session without a terminal may fail: all from one on,
 * or one alone. The screens say so, export nothing half, keep what is chosen,
 * and go on when there is memory again. */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "canvas/canvas.h"
#include "app/app_internal.h"
#include "screens/atom_internal.h"
#include "screens/list.h"
#include "support/fault.h"
#include "support/run.h"

#define STEPS_MAX 400
#define LIMIT_MAX 3000

/* A light atom: the same allocations as any, and few cycles. */
static const char view[] = "element He\nquantity ionization\nmodel scf\n"
                           "pin He\npin Li+\nwalk charges\n";

struct desk {
    struct study *study;
    struct app app;
    struct canvas canvas;
    bool told;  /* a caution that names memory was shown */
    bool wrong; /* an export failed for another reason; asserting allocates, so
                 * not while memory is short */
};

/* True when a row of the canvas holds the word. */
static bool drawn(const struct canvas *c, const char *word)
{
    size_t length = strlen(word);
    size_t count = (size_t)c->rows * (size_t)c->columns;
    for (size_t i = 0; i + length <= count; i++) {
        size_t k = 0;
        while (k < length &&
               c->cells[i + k].character == (unsigned char)word[k])
            k++;
        if (k == length)
            return true;
    }
    return false;
}

/* Told in the message line or, of an atom, where its number would stand. */
static void look(struct desk *s)
{
    s->told = s->told || (app_screen(&s->app) == &screen_atom &&
                          drawn(&s->canvas, "of memory"));
    s->told = s->told || (s->app.session.caution &&
                          strstr(s->app.session.message, "memory"));
}

static void solve(struct desk *s)
{
    bool changed;
    for (int i = 0; i < STEPS_MAX && app_has_work(&s->app); i++) {
        (void)app_step(&s->app, &changed);
        look(s);
    }
}

/* Exports into a file of the test's own; false with the reason told. */
static bool write_export(struct desk *s, const struct export_ops *export,
                         FILE *out)
{
    struct status st = status_ok();
    s->app.export = export;
    if (!app_export_ready(&s->app)) {
        s->app.awaiting = false;
        look(s);
        return false;
    }
    bool ok = app_export(&s->app, out, &st);
    s->wrong = s->wrong || !(ok || st.code == STATUS_MEMORY ||
                             st.code == STATUS_CONVERGENCE);
    s->told = s->told || st.code == STATUS_MEMORY;
    return ok;
}

/* One screen after its start from a view file: solved, drawn, exported. */
static void use(struct desk *s, int screen, FILE *out)
{
    const struct screen_ops *ops = screen_list[screen];
    app_show(&s->app, screen);
    s->app.session.wanting = ops != &screen_audit && ops != &screen_map;
    solve(s);
    app_draw(&s->app, &s->canvas);
    look(s);
    for (int i = 0; i < ops->export_count; i++)
        write_export(s, &ops->exports[i], out);
    study_stop(s->study);
}

static struct desk *open_session(void)
{
    struct status st = status_ok();
    struct desk *s = calloc(1, sizeof *s);
    ck_assert_ptr_nonnull(s);
    s->study = study_new(catalogue_builtin(), &st);
    ck_assert_ptr_nonnull(s->study);
    ck_assert(canvas_init(&s->canvas, 40, 120, &st));
    ck_assert(app_init(&s->app, s->study, &st));
    app_load_view(&s->app, view);
    return s;
}

static void close_session(struct desk *s)
{
    app_clear(&s->app);
    study_free(s->study);
    canvas_clear(&s->canvas);
    free(s);
}

/* After the shortage: a fresh look shows no trace of it. */
static void check_recovered(struct desk *s, int screen)
{
    struct session *session = &s->app.session;
    session->stopped = false;
    session_touch(session);
    session->message[0] = '\0';
    session->caution = false;
    s->told = false;
    canvas_erase(&s->canvas);
    (void)screen_atom_resume(app_state(&s->app, "atom"));
    FILE *out = tmpfile();
    ck_assert_ptr_nonnull(out);
    use(s, screen, out);
    ck_assert_msg(!s->told, "%s", session->message);
    fclose(out);
    ck_assert_int_eq(session->choice.z, 2);
    ck_assert_int_eq(session->choice.pin_count, 2);
}

START_TEST(every_allocation_of_a_screen_may_fail)
{
    int screen = _i / 2;
    FILE *out = tmpfile();
    ck_assert_ptr_nonnull(out);
    long limit = 0;
    bool refused = true;
    for (; refused && limit < LIMIT_MAX; limit++) {
        struct desk *s = open_session();
        if (_i % 2)
            fault_refuse(limit);
        else
            fault_grant(limit);
        use(s, screen, out);
        refused = fault_happened();
        fault_grant(-1);
        /* One alone may be made good later on. */
        ck_assert_msg(!refused || s->told || _i % 2, "%s, %ld: nothing said",
                      screen_list[screen]->title, limit);
        ck_assert_msg(!s->wrong, "%s, %ld", screen_list[screen]->title, limit);
        check_recovered(s, screen);
        close_session(s);
    }
    fclose(out);
    ck_assert_int_lt(limit, LIMIT_MAX);
}
END_TEST

START_TEST(a_study_without_memory_says_so)
{
    for (long limit = 0;; limit++) {
        struct status st = status_ok();
        fault_grant(limit);
        struct study *study = study_new(catalogue_builtin(), &st);
        bool refused = fault_happened();
        fault_grant(-1);
        study_free(study);
        if (!refused)
            break;
        ck_assert_ptr_null(study);
        ck_assert_int_eq(st.code, STATUS_MEMORY);
    }
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("app_fault");
    TCase *tc = tcase_create("fault");
    tcase_add_test(tc, a_study_without_memory_says_so);
    tcase_add_loop_test(tc, every_allocation_of_a_screen_may_fail, 0,
                        2 * screen_list_count);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
