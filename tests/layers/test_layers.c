/* SPDX-License-Identifier: MIT */
/* The house: a folder includes only lower layers, outside libraries stay in
 * their room, and the calls that the house does without are not there. */
#include <check.h>
#include <dirent.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "support/run.h"

static const char *source_folder;

/* From DEVELOPERS.md, "The house". */
static const struct {
    const char *folder;
    int layer;
} layers[] = {
    {"base", 0},     {"numeric", 1}, {"element", 1}, {"atom", 2},
    {"zeta", 2},     {"refdata", 2}, {"canvas", 2},  {"analysis", 2},
    {"model", 3},    {"report", 3},  {"widget", 3},  {"write", 4},
    {"study", 4},    {"session", 5}, {"screens", 6}, {"app", 7},
    {"terminal", 8}, {"cli", 9},
};
#define LAYER_COUNT (sizeof layers / sizeof layers[0])

/* A library's header, and the only folder that may include it. */
static const struct {
    const char *header;
    const char *folder;
} rooms[] = {
    {"<xc.h>", "atom"},         {"<cjson/cJSON.h>", "refdata"},
    {"<curses.h>", "terminal"}, {"<ncurses.h>", "terminal"},
    {"<term.h>", "terminal"},
};

static const char *const banned[] = {"strcpy(", "strcat(", "sprintf(",
                                     "gets(",   "atoi(",   "atof(",
                                     "strtok(", "alloca("};

static int layer_of(const char *folder, size_t length)
{
    for (size_t i = 0; i < LAYER_COUNT; i++)
        if (strlen(layers[i].folder) == length &&
            strncmp(layers[i].folder, folder, length) == 0)
            return layers[i].layer;
    return -1;
}

/* Folders that see fewer than all lower layers. */
static const struct {
    const char *folder;
    const char *seen; /* with a blank on each side */
} narrow[] = {
    {"canvas", " base "},
    {"widget", " base canvas "},
    {"terminal", " base canvas "},
};

static bool sees(const char *folder, const char *included, size_t length)
{
    char word[64];
    snprintf(word, sizeof word, " %.*s ", (int)length, included);
    for (size_t i = 0; i < sizeof narrow / sizeof narrow[0]; i++)
        if (strcmp(narrow[i].folder, folder) == 0)
            return strstr(narrow[i].seen, word) != NULL;
    return true;
}

static void check_project_include(const char *folder, const char *file,
                                  const char *included)
{
    const char *slash = strchr(included, '/');
    if (!slash) /* made by the build, or a piece of the very file */
        return;
    size_t length = (size_t)(slash - included);
    if (strlen(folder) == length && strncmp(folder, included, length) == 0)
        return;
    int own = layer_of(folder, strlen(folder));
    int other = layer_of(included, length);
    bool ok = other >= 0 && other < own && sees(folder, included, length);
    ck_assert_msg(ok, "%s/%s includes %.30s", folder, file, included);
}

static void check_line(const char *folder, const char *file, const char *line)
{
    const char *quote = strchr(line, '"');
    if (quote && strncmp(line, "#include \"", 10) == 0)
        check_project_include(folder, file, quote + 1);
    if (strncmp(line, "#include <", 10) == 0)
        for (size_t i = 0; i < sizeof rooms / sizeof rooms[0]; i++)
            if (strncmp(line + 9, rooms[i].header, strlen(rooms[i].header)) ==
                0)
                ck_assert_msg(strcmp(folder, rooms[i].folder) == 0,
                              "%s/%s includes %s", folder, file,
                              rooms[i].header);
}

/* True where the call stands by itself: snprintf( is not sprintf(. */
static bool calls(const char *text, const char *name)
{
    for (const char *at = text; (at = strstr(at, name)) != NULL; at++)
        if (at == text || !strchr("abcdefghijklmnopqrstuvwxyz_", at[-1]))
            return true;
    return false;
}

static void check_file(const char *folder, const char *file)
{
    char path[1024];
    struct status st = status_ok();
    char *text = NULL;
    size_t size = 0;
    snprintf(path, sizeof path, "%s/%s/%s", source_folder, folder, file);
    ck_assert_msg(file_read(path, 1 << 20, &text, &size, &st), "%s",
                  st.message);
    ck_assert_msg(strncmp(text, "/* SPDX-License-Identifier: MIT */", 34) == 0,
                  "%s", path);
    for (size_t b = 0; b < sizeof banned / sizeof banned[0]; b++)
        ck_assert_msg(!calls(text, banned[b]), "%s calls %s)", path, banned[b]);
    for (char *line = text; *line;) {
        size_t n = strcspn(line, "\n");
        char mark = line[n];
        line[n] = '\0';
        check_line(folder, file, line);
        line += n + (mark != '\0');
    }
    free(text);
}

/* Sources of one folder; gives how many there are. */
static int check_folder(const char *folder)
{
    char path[1024];
    int count = 0;
    snprintf(path, sizeof path, "%s/%s", source_folder, folder);
    DIR *dir = opendir(path);
    ck_assert_msg(dir != NULL, "%s", path);
    for (struct dirent *e; (e = readdir(dir)) != NULL;) {
        size_t length = strlen(e->d_name);
        if (length < 3 || (strcmp(e->d_name + length - 2, ".c") != 0 &&
                           strcmp(e->d_name + length - 2, ".h") != 0))
            continue;
        check_file(folder, e->d_name);
        count++;
    }
    closedir(dir);
    return count;
}

START_TEST(folders_include_only_lower_layers)
{
    int files = 0;
    for (size_t i = 0; i < LAYER_COUNT; i++)
        files += check_folder(layers[i].folder);
    ck_assert_int_gt(files, 100);
}
END_TEST

START_TEST(every_folder_has_a_layer)
{
    DIR *dir = opendir(source_folder);
    ck_assert_ptr_nonnull(dir);
    for (struct dirent *e; (e = readdir(dir)) != NULL;)
        if (!strchr(e->d_name, '.'))
            ck_assert_msg(layer_of(e->d_name, strlen(e->d_name)) >= 0, "%s",
                          e->d_name);
    closedir(dir);
}
END_TEST

int main(int argc, char **argv)
{
    if (argc != 2)
        return EXIT_FAILURE;
    source_folder = argv[1];
    Suite *suite = suite_create("layers");
    TCase *house = tcase_create("house");
    tcase_add_test(house, folders_include_only_lower_layers);
    tcase_add_test(house, every_folder_has_a_layer);
    suite_add_tcase(suite, house);
    return run_suite(suite);
}
