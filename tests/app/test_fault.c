/* SPDX-License-Identifier: MIT */
/* Every allocation of a session without a terminal may fail: all from one on,
 * or one alone. The screens say so, export nothing half, keep what is chosen,
 * and go on when there is memory again. */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "app/app_internal.h"
#include "canvas/canvas.h"
#include "screens/atom_internal.h"
#include "screens/list.h"
#include "support/fault.h"
#include "support/run.h"

#define STEPS_MAX 400
#define LIMIT_MAX 3000
#define QUEUED_MAX 8

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
static void look(struct desk *d)
{
    const struct session *s = &d->app.session;
    d->told = d->told || (app_screen(&d->app) == &screen_atom &&
                          drawn(&d->canvas, "of memory"));
    d->told = d->told || (s->caution && strstr(s->message, "memory"));
}

static void solve(struct desk *d)
{
    bool changed;
    for (int i = 0; i < STEPS_MAX && app_has_work(&d->app); i++) {
        (void)app_step(&d->app, &changed);
        look(d);
    }
}

/* What is exported is solved first, unless it is a whole sheet. */
static bool ready(struct desk *d)
{
    if (app_export_ready(&d->app))
        return true;
    look(d);
    d->app.awaiting = false;
    if (study_progress(d->study).total > QUEUED_MAX)
        return false;
    solve(d);
    bool solved = app_export_ready(&d->app);
    d->app.awaiting = false;
    look(d);
    return solved;
}

/* Exports into a file of the test's own. */
static void export_to(struct desk *d, const struct export_ops *export,
                      FILE *out)
{
    struct status st = status_ok();
    d->app.export = export;
    if (ready(d) && !app_export(&d->app, out, &st)) {
        d->wrong = d->wrong ||
                   !(st.code == STATUS_MEMORY || st.code == STATUS_CONVERGENCE);
        d->told = d->told || st.code == STATUS_MEMORY;
    }
    study_stop(d->study);
}

/* One screen after its start from a view file: solved, drawn, exported. */
static void use(struct desk *d, int screen, FILE *out)
{
    const struct screen_ops *ops = screen_list[screen];
    app_show(&d->app, screen);
    /* These two would want all elements. */
    d->app.session.wanting = ops != &screen_audit && ops != &screen_map;
    solve(d);
    app_draw(&d->app, &d->canvas);
    look(d);
    for (int i = 0; i < ops->export_count; i++)
        export_to(d, &ops->exports[i], out);
    study_stop(d->study);
}

static struct desk *open_desk(void)
{
    struct status st = status_ok();
    struct desk *d = calloc(1, sizeof *d);
    ck_assert_ptr_nonnull(d);
    d->study = study_new(catalogue_builtin(), &st);
    ck_assert_ptr_nonnull(d->study);
    ck_assert(canvas_init(&d->canvas, 40, 120, &st));
    ck_assert(app_init(&d->app, d->study, &st));
    app_load_view(&d->app, view);
    return d;
}

static void close_desk(struct desk *d)
{
    app_clear(&d->app);
    study_free(d->study);
    canvas_clear(&d->canvas);
    free(d);
}

/* After the shortage: a fresh look shows no trace of it. */
static void check_recovered(struct desk *d, int screen)
{
    struct session *s = &d->app.session;
    s->stopped = false;
    session_touch(s);
    s->selection_version++;
    s->solved_version++;
    s->message[0] = '\0';
    s->caution = false;
    d->told = false;
    canvas_erase(&d->canvas);
    (void)screen_atom_resume(app_state(&d->app, "atom"));
    FILE *out = tmpfile();
    ck_assert_ptr_nonnull(out);
    use(d, screen, out);
    ck_assert_msg(!d->told, "%s", s->message);
    /* The audit's waits for all elements; tests/cli/test_fault.c writes it. */
    if (screen_list[screen]->export_count > 0 &&
        screen_list[screen] != &screen_audit)
        ck_assert_int_gt(ftell(out), 0);
    fclose(out);
    ck_assert_int_eq(s->choice.z, 2);
    ck_assert_int_eq(s->choice.pin_count, 2);
}

START_TEST(every_allocation_of_a_screen_may_fail)
{
    int screen = _i / 2;
    const char *id = screen_list[screen]->id;
    FILE *out = tmpfile();
    ck_assert_ptr_nonnull(out);
    long limit = 0;
    bool refused = true;
    for (; refused && limit < LIMIT_MAX; limit++) {
        struct desk *d = open_desk();
        if (_i % 2)
            fault_refuse(limit);
        else
            fault_grant(limit);
        use(d, screen, out);
        refused = fault_happened();
        fault_grant(-1);
        /* One alone may be made good later on. */
        ck_assert_msg(!refused || d->told || _i % 2, "%s, %ld: nothing said",
                      id, limit);
        ck_assert_msg(!d->wrong, "%s, %ld", id, limit);
        check_recovered(d, screen);
        close_desk(d);
    }
    fclose(out);
    ck_assert_int_lt(limit, LIMIT_MAX);
}
END_TEST

START_TEST(the_screens_begin_or_say_why_not)
{
    for (long limit = 0;; limit++) {
        struct status st = status_ok();
        struct app app;
        struct study *study = study_new(catalogue_builtin(), &st);
        ck_assert_ptr_nonnull(study);
        fault_grant(limit);
        bool begun = app_init(&app, study, &st);
        bool refused = fault_happened();
        fault_grant(-1);
        app_clear(&app);
        study_free(study);
        ck_assert_int_eq(begun, !refused);
        if (!refused)
            break;
        ck_assert_int_eq(st.code, STATUS_MEMORY);
    }
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
    tcase_add_test(tc, the_screens_begin_or_say_why_not);
    tcase_add_loop_test(tc, every_allocation_of_a_screen_may_fail, 0,
                        2 * screen_list_count);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
