/* SPDX-License-Identifier: MIT */
/* View files made at random from the words of the program's own tables: lines
 * in any order, twice, damaged. Each goes through the target that the fuzzer
 * drives: loaded, drawn on every screen, exported, saved and read again. */
#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "fuzz/target.h"
#include "analysis/atom_report.h"
#include "app/app.h"
#include "support/run.h"

#define FILES 12 /* per round */
#define ROUNDS 8
#define LINES_MAX 24
#define VIEW_MAX 4096

/* Xorshift, Marsaglia 2003, doi:10.18637/jss.v008.i14: the same files on every
 * machine. */
static uint32_t state;

static int below(int n)
{
    state ^= state << 13;
    state ^= state >> 17;
    state ^= state << 5;
    return (int)(state % (uint32_t)n);
}

static const char *some_set(void)
{
    const struct catalogue *c = catalogue_builtin();
    return catalogue_at(c, (size_t)below((int)catalogue_count(c)))
        ->provenance.id;
}

static void add_ion(struct text *t)
{
    char ion[ION_TEXT_MAX];
    text_add(t, ion_print(1 + below(Z_MAX), below(12) - 3, ion));
}

static void add_subshell(struct text *t)
{
    int n = 1 + below(7);
    char label[SUBSHELL_TEXT_MAX];
    text_add(t, subshell_print(n, below(n < 4 ? n : 4), label));
}

static void add_word(struct text *t)
{
    static const char *const words[] = {
        "value", "reference", "residual", "subshell", "all",  "charge",
        "18",    "32",        "Lu",       "La",       "root", "log",
        "on",    "off",       "",         " ",        "\t",   "-"};
    int n = (int)(sizeof words / sizeof words[0]);
    text_add(t, words[below(n)]);
}

/* A value that the key takes, or sometimes one of another key. */
static void add_value(struct text *t, int key)
{
    switch (key) {
    case 0:
        text_add(t, quantity_at((enum quantity_id)below(QUANTITY_COUNT))->id);
        break;
    case 1:
    case 2:
        text_add(t, model_at(below(model_count()))->id);
        break;
    case 3:
    case 4:
        text_add(t, some_set());
        break;
    case 5:
        text_add(t, evidence_id((enum evidence)below(EVIDENCE_COUNT)));
        break;
    case 6:
        text_add(t, walk_id((enum walk_kind)below(WALK_COUNT)));
        break;
    case 7:
        text_add(t, element_at(1 + below(Z_MAX))->symbol);
        break;
    case 8:
        text_addf(t, "%d", below(130) - 10);
        break;
    case 9:
        add_subshell(t);
        break;
    case 10:
        text_add(t, unit_at((size_t)below((int)unit_count()))->id);
        break;
    case 11:
        text_add(t, coordination_id((enum coordination)(
                        1 + below(COORDINATION_COUNT - 1))));
        break;
    case 12:
        text_add(t, spin_id((enum spin_state)(1 + below(SPIN_COUNT - 1))));
        break;
    case 13:
        add_ion(t);
        break;
    case 14:
        text_add(t, functional_id((enum functional)below(FUNCTIONAL_COUNT)));
        break;
    case 15:
        text_add(t, relativity_id((enum relativity)below(RELATIVITY_COUNT)));
        break;
    default:
        add_word(t);
        break;
    }
}

static void add_line(struct text *t)
{
    static const char *const keys[] = {
        "quantity",   "model",        "hidden",  "reference", "against",
        "evidence",   "walk",         "element", "charge",    "subshell",
        "unit",       "coordination", "spin",    "pin",       "functional",
        "relativity", "shown",        "columns", "group3",    "curves",
        "axis",       "dots",         "mouse"};
    int count = (int)(sizeof keys / sizeof keys[0]);
    int key = below(count);
    text_addf(t, "%s ", keys[key]);
    add_value(t, below(10) == 0 ? below(count) : key);
    text_add(t, "\n");
}

/* Some files are damaged afterwards: a byte changed, the end cut off. */
static size_t make_view(char *view)
{
    struct text t = text_over(view, VIEW_MAX);
    int lines = 1 + below(LINES_MAX);
    for (int i = 0; i < lines; i++)
        add_line(&t);
    ck_assert(!t.cut);
    if (below(4) == 0)
        view[below((int)t.length)] = (char)below(256);
    return below(4) == 0 ? (size_t)below((int)t.length) : t.length;
}

START_TEST(a_view_made_at_random_starts_and_draws)
{
    state = 2463534242u + (uint32_t)_i; /* the seed of the paper, and on */
    for (int i = 0; i < FILES; i++) {
        char view[VIEW_MAX];
        size_t size = make_view(view);
        LLVMFuzzerTestOneInput((const uint8_t *)view, size);
    }
}
END_TEST

static void try_view(const char *view)
{
    LLVMFuzzerTestOneInput((const uint8_t *)view, strlen(view));
}

/* Every quantity after every other, with what was kept of the one before. */
START_TEST(a_quantity_takes_nothing_from_the_one_before)
{
    const struct catalogue *c = catalogue_builtin();
    const char *before = quantity_at((enum quantity_id)_i)->id;
    for (size_t s = 0; s < catalogue_count(c); s++) {
        char view[VIEW_MAX];
        struct text t = text_over(view, sizeof view);
        int other = (int)(s % QUANTITY_COUNT);
        const char *id = catalogue_at(c, s)->provenance.id;
        text_addf(&t, "quantity %s\nsubshell 3d\nreference %s\nagainst %s\n",
                  before, id, id);
        text_addf(&t, "quantity %s\n",
                  quantity_at((enum quantity_id)other)->id);
        try_view(view);
    }
}
END_TEST

START_TEST(a_charge_before_its_element_is_judged_with_it)
{
    struct status st = status_ok();
    struct study *study = study_new(catalogue_builtin(), &st);
    struct app *app = malloc(sizeof *app);
    ck_assert(study && app);
    ck_assert(app_init(app, study, &st));
    app_load_view(app, "charge 20\nelement H\n");
    ck_assert_int_eq(app->session.choice.z, 1);
    ck_assert_int_eq(app->session.choice.charge, 0);
    app_clear(app);
    ck_assert(app_init(app, study, &st));
    app_load_view(app, "charge 40\nelement U\n");
    ck_assert_int_eq(app->session.choice.charge, 40);
    app_clear(app);
    free(app);
    study_free(study);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("view");
    TCase *tc = tcase_create("files");
    tcase_add_test(tc, a_charge_before_its_element_is_judged_with_it);
    tcase_add_loop_test(tc, a_quantity_takes_nothing_from_the_one_before, 0,
                        QUANTITY_COUNT);
    tcase_add_loop_test(tc, a_view_made_at_random_starts_and_draws, 0, ROUNDS);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
