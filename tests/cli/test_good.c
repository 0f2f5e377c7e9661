/* SPDX-License-Identifier: MIT */
/* Each file of the corpus that is in order, through every command in every
 * format: status 0 and well-formed output, judged by readers that share
 * nothing with what wrote it. */
#include <cjson/cJSON.h>
#include <dirent.h>
#include <stdbool.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "base/text.h"
#include "suites.h"
#include "support/csv.h"
#include "support/program.h"
#include "write/format.h"

#define TAKEN_LEAST 15 /* the corpus never shrinks below this */

/* What the test itself reads of a file. */
struct good {
    char path[512];
    char id[64], quantity[32];
    bool values; /* of a kind that a user may add, under an id that is free */
};

static const char *member(const cJSON *json, const char *key)
{
    const char *text = cJSON_GetStringValue(cJSON_GetObjectItem(json, key));
    return text ? text : "";
}

static struct good read_good(const char *name)
{
    struct good g;
    struct status st = status_ok();
    char *text;
    size_t size;
    snprintf(g.path, sizeof g.path, "%s/data/good/%s", CASES_DIR, name);
    ck_assert_msg(file_read(g.path, 1 << 20, &text, &size, &st), "%s",
                  st.message);
    cJSON *json = cJSON_ParseWithLength(text, size);
    ck_assert_msg(json != NULL, "%s", g.path);
    snprintf(g.id, sizeof g.id, "%s", member(json, "id"));
    snprintf(g.quantity, sizeof g.quantity, "%s", member(json, "quantity"));
    g.values = strcmp(member(json, "kind"), "values") == 0 &&
               strncmp(g.id, "own", 3) == 0;
    cJSON_Delete(json);
    free(text);
    return g;
}

static void check_json(const char *call, const struct program_result *r)
{
    const char *end;
    cJSON *json = cJSON_ParseWithLengthOpts(r->out, r->out_size, &end, false);
    ck_assert_msg(json && cJSON_IsObject(json), "%s: no JSON", call);
    ck_assert_msg(strcmp(end, "\n") == 0, "%s: more behind the JSON", call);
    cJSON_Delete(json);
}

/* Entries of the form "@type{key," … "}", braces in pairs, nothing else. */
static void check_bibtex(const char *call, const char *text)
{
    int depth = 0;
    int entries = 0;
    for (const char *c = text; *c; c++) {
        if (depth == 0 && *c == '%') { /* a comment goes to the line's end */
            c += strcspn(c, "\n");
            ck_assert_msg(*c == '\n', "%s: an open comment", call);
        } else if (depth == 0 && *c == '@') {
            size_t type = strspn(c + 1, "abcdefghijklmnopqrstuvwxyz");
            ck_assert_msg(type > 0 && c[1 + type] == '{', "%s: %.40s", call, c);
            c += type + 1;
            ck_assert_msg(strcspn(c + 1, ",\n{}") > 0, "%s: no key", call);
            depth = 1;
            entries++;
        } else {
            depth += (*c == '{') - (*c == '}');
            ck_assert_msg(depth > 0 || strchr("}\n", *c), "%s: %.40s", call, c);
        }
    }
    ck_assert_msg(depth == 0 && entries > 0, "%s: %d open", call, depth);
}

static void check_form(const char *call, const char *format,
                       const struct program_result *r)
{
    ck_assert_msg(r->out_size > 0 && utf8_valid(r->out, r->out_size), "%s: %s",
                  call, r->out_size ? "no UTF-8" : "nothing");
    for (const char *c = r->out; *c; c++)
        ck_assert_msg((unsigned char)*c >= 0x20 || *c == '\n' ||
                          (*c == '\r' && c[1] == '\n'),
                      "%s: a control character", call);
    ck_assert_msg(!strstr(r->out, "(null)"), "%s: (null)", call);
    if (strcmp(format, "csv") == 0) {
        struct csv csv = csv_read_text(r->out);
        ck_assert_uint_gt(csv_rows(&csv), 0);
        csv_free(&csv);
    } else if (strcmp(format, "json") == 0) {
        check_json(call, r);
    } else if (strcmp(format, "bibtex") == 0) {
        check_bibtex(call, r->out);
    }
}

static void check_call(const struct good *g, const char *command)
{
    for (int f = 0; f < format_list_count; f++) {
        const char *format = format_list[f]->id;
        char call[1024];
        snprintf(call, sizeof call, "%s --format %s --data '%s'", command,
                 format, g->path);
        struct program_result r = program_call(OUTERSHELL, call);
        ck_assert_msg(r.status == 0 && r.err_size == 0, "%s: %d (%d): %s", call,
                      r.status, r.signal, r.err);
        check_form(call, format, &r);
        program_free(&r);
    }
}

/* No model computes an affinity; of the rest one that needs no solving. */
static void check_good(const struct good *g)
{
    bool affinity = strcmp(g->quantity, "affinity") == 0;
    const char *model = affinity ? "" : " --model slater";
    char command[512];
    check_call(g, "sources");
    check_call(g, "atom H");
    snprintf(command, sizeof command, "list --quantity %s --reference %s%s",
             g->quantity, g->id, model);
    check_call(g, command);
    snprintf(command, sizeof command,
             "compare Fe Cl --model slater --quantity %s --reference %s",
             affinity ? "zeff,affinity" : g->quantity, g->id);
    check_call(g, command);
    snprintf(command, sizeof command, "audit --quantity %s --%s %s%s",
             g->quantity, affinity ? "against" : "reference", g->id, model);
    check_call(g, command);
}

/* A kind that cannot be added, or an id that is taken: one sentence. */
static void check_refused(const struct good *g)
{
    char call[600];
    snprintf(call, sizeof call, "sources --data '%s'", g->path);
    struct program_result r = program_call(OUTERSHELL, call);
    ck_assert_msg(r.status == 1 && r.out_size == 0 && r.err_size > 12 &&
                      strchr(r.err, '\n') == r.err + r.err_size - 1,
                  "%s: %d (%d): %s", call, r.status, r.signal, r.err);
    program_free(&r);
}

static struct dirent **files;
static int file_count;

static int is_file(const struct dirent *item)
{
    return item->d_name[0] != '.';
}

START_TEST(a_file_in_order_passes_through_every_command_and_format)
{
    struct good g = read_good(files[_i]->d_name);
    if (g.values)
        check_good(&g);
    else
        check_refused(&g);
}
END_TEST

START_TEST(most_files_of_the_corpus_are_taken)
{
    int count = 0;
    for (int i = 0; i < file_count; i++)
        count += read_good(files[i]->d_name).values;
    ck_assert_int_ge(count, TAKEN_LEAST);
}
END_TEST

/* The list of files lives as long as the tests. */
TCase *good_cases(void)
{
    TCase *c = tcase_create("good");
    file_count = scandir(CASES_DIR "/data/good", &files, is_file, alphasort);
    tcase_add_test(c, most_files_of_the_corpus_are_taken);
    tcase_add_loop_test(c,
                        a_file_in_order_passes_through_every_command_and_format,
                        0, file_count);
    return c;
}
