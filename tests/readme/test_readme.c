/* SPDX-License-Identifier: MIT */
/* README shows real output: every command in a block marked `console` is run
 * again, every screen in a block marked `screen ROWSxCOLUMNS KEYS` is drawn
 * again, and what comes out must stand there, but for the last digits of
 * decimal numbers. With OUTERSHELL_RENEW_GOLDEN=1 README is written anew. */
#include <check.h>
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include "base/file.h"
#include "app/app.h"
#include "support/run.h"

static const char *readme_path;
static char folder[] = "/tmp/outershell-readme-XXXXXX";

/* Appends what a command prints; aborts when it fails. */
static void put_output(FILE *out, const char *command)
{
    char line[4096];
    FILE *pipe = popen(command, "r");
    ck_assert_msg(pipe != NULL, "%s", command);
    while (fgets(line, sizeof line, pipe))
        fputs(line, out);
    ck_assert_msg(pclose(pipe) == 0, "fails: %s", command);
}

/* Commands and their output, from the old block's `$ ` lines. */
static void put_console(FILE *out, const char *block)
{
    while (*block) {
        size_t n = strcspn(block, "\n");
        if (strncmp(block, "$ ", 2) == 0) {
            char command[1024];
            snprintf(command, sizeof command, "%.*s", (int)n - 2, block + 2);
            fprintf(out, "$ %s\n", command);
            fflush(out);
            put_output(out, command);
        }
        block += n + (block[n] == '\n');
    }
}

static void press(struct app *app, const char *keys)
{
    bool changed;
    for (; *keys; keys++) {
        struct event event = {.kind = EVENT_CHARACTER,
                              .character = (unsigned char)*keys};
        /* '~' stands for Enter. */
        if (*keys == '~')
            event = (struct event){.kind = EVENT_KEY, .key = KEY_CODE_ENTER};
        app_update(app, &event);
    }
    while (app_has_work(app))
        app_step(app, &changed);
}

static void put_screen(FILE *out, int rows, int columns, const char *keys)
{
    struct status st = status_ok();
    struct study *study = study_new(catalogue_builtin(), &st);
    struct canvas canvas;
    static struct app app;
    ck_assert_ptr_nonnull(study);
    ck_assert(canvas_init(&canvas, rows, columns, &st));
    ck_assert(app_init(&app, study, &st));
    struct event size = {.kind = EVENT_RESIZE, .row = rows, .column = columns};
    app_update(&app, &size);
    press(&app, keys);
    app_draw(&app, &canvas);
    char *text = canvas_to_text(&canvas);
    ck_assert_ptr_nonnull(text);
    char *roles = strstr(text, "\n==");
    ck_assert_ptr_nonnull(roles);
    roles[1] = '\0';
    fputs(text, out);
    free(text);
    app_clear(&app);
    study_free(study);
    canvas_clear(&canvas);
}

/* The block behind a fence line, made again; true when it was one of ours. */
static bool put_block(FILE *out, const char *fence, const char *block)
{
    int rows, columns;
    char keys[128] = "";
    if (strcmp(fence, "```console") == 0) {
        put_console(out, block);
        return true;
    }
    if (sscanf(fence, "```screen %dx%d %127s", &columns, &rows, keys) < 2)
        return false;
    put_screen(out, rows, columns, keys);
    return true;
}

/* README with all blocks made again. The caller frees it. */
static char *made_again(const char *readme, int *blocks)
{
    char *text = NULL;
    size_t size = 0;
    FILE *out = open_memstream(&text, &size);
    ck_assert_ptr_nonnull(out);
    while (*readme) {
        size_t n = strcspn(readme, "\n");
        char fence[256];
        snprintf(fence, sizeof fence, "%.*s", (int)n, readme);
        fprintf(out, "%.*s\n", (int)n, readme);
        readme += n + (readme[n] == '\n');
        if (strncmp(fence, "```", 3) != 0)
            continue;
        const char *end =
            strncmp(readme, "```", 3) == 0 ? readme : strstr(readme, "\n```");
        ck_assert_msg(end != NULL, "open block: %s", fence);
        size_t length = end == readme ? 0 : (size_t)(end - readme) + 1;
        char *block = strndup(readme, length);
        ck_assert_ptr_nonnull(block);
        if (put_block(out, fence, block))
            (*blocks)++;
        else
            fputs(block, out);
        free(block);
        readme += length;
        fputs("```\n", out);
        readme += strcspn(readme, "\n");
        readme += *readme == '\n';
    }
    fclose(out);
    return text;
}

/* Length of the number at s ("-12.345"), 0 when there is none. */
static size_t number_length(const char *s)
{
    size_t sign = *s == '-' || *s == '+';
    size_t digits = strspn(s + sign, "0123456789.");
    return digits ? sign + digits : 0;
}

/* True when two printed numbers of the same shape differ by no more than two
 * units of their last place: another processor may round there. */
static bool close_enough(const char *a, const char *b, size_t n)
{
    char x[64];
    char y[64];
    if (n != number_length(b) || n >= sizeof x)
        return false;
    snprintf(x, sizeof x, "%.*s", (int)n, a);
    snprintf(y, sizeof y, "%.*s", (int)n, b);
    const char *point = strchr(x, '.');
    double unit = point ? pow(10, -(double)strlen(point + 1)) : 0.0;
    return fabs(strtod(x, NULL) - strtod(y, NULL)) <= 2.001 * unit;
}

/* Bytes that are the same in both, but for last digits of decimal numbers. */
static size_t same_length(const char *a, const char *b)
{
    size_t i = 0;
    while (a[i] && b[i]) {
        bool starts = i == 0 || number_length(a + i - 1) == 0;
        size_t n = starts ? number_length(a + i) : 0;
        if (n > 0 && close_enough(a + i, b + i, n))
            i += n;
        else if (a[i] == b[i])
            i++;
        else
            break;
    }
    return i;
}

static void renew(const char *text)
{
    FILE *f = fopen(readme_path, "wb");
    ck_assert_ptr_nonnull(f);
    fputs(text, f);
    ck_assert_int_eq(fclose(f), 0);
}

START_TEST(every_output_in_readme_is_what_comes_out)
{
    struct status st = status_ok();
    char *readme = NULL;
    size_t size = 0;
    int blocks = 0;
    ck_assert_msg(file_read(readme_path, 1 << 20, &readme, &size, &st), "%s",
                  st.message);
    ck_assert_ptr_nonnull(mkdtemp(folder));
    ck_assert_int_eq(chdir(folder), 0);
    char *again = made_again(readme, &blocks);
    ck_assert_int_ge(blocks, 3);
    ck_assert_int_eq(chdir("/"), 0);
    char remove[64];
    snprintf(remove, sizeof remove, "rm -r %s", folder);
    ck_assert_int_eq(system(remove), 0);
    const char *asked = getenv("OUTERSHELL_RENEW_GOLDEN");
    if (asked && strcmp(asked, "1") == 0) {
        renew(again);
    } else {
        size_t same = same_length(again, readme);
        size_t line = same;
        while (line > 0 && again[line - 1] != '\n')
            line--;
        ck_assert_msg(again[same] == '\0' && readme[same] == '\0',
                      "README differs at byte %zu; comes out: %.*s", same,
                      (int)strcspn(again + line, "\n"), again + line);
    }
    free(again);
    free(readme);
}
END_TEST

int main(int argc, char **argv)
{
    if (argc != 2)
        return EXIT_FAILURE;
    readme_path = argv[1];
    Suite *suite = suite_create("readme");
    TCase *outputs = tcase_create("outputs");
    tcase_add_test(outputs, every_output_in_readme_is_what_comes_out);
    suite_add_tcase(suite, outputs);
    return run_suite(suite);
}
