/* SPDX-License-Identifier: MIT */
/* For nftw. */
#ifndef _XOPEN_SOURCE
#define _XOPEN_SOURCE 700
#endif

#include "screens_pty/session.h"

#include <dirent.h>
#include <ftw.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/wait.h>
#include <unistd.h>

#include "base/file.h"
#include "support/program.h"

const char *outershell;
static char folder[64];

void session_make_folder(void)
{
    snprintf(folder, sizeof folder, "/tmp/outershell-screens-XXXXXX");
    ck_assert_ptr_nonnull(mkdtemp(folder));
}

static int remove_entry(const char *path, const struct stat *info, int kind,
                        struct FTW *place)
{
    (void)info;
    (void)kind;
    (void)place;
    return remove(path);
}

void session_remove_folder(void)
{
    ck_assert_int_eq(nftw(folder, remove_entry, 8, FTW_DEPTH | FTW_PHYS), 0);
}

const char *session_folder(void)
{
    return folder;
}

const char *session_path(const char *name)
{
    static char path[512];
    snprintf(path, sizeof path, "%s/%s", folder, name);
    return path;
}

struct pty *session_start(int rows, int columns, const char *const *arguments,
                          const char *const *env)
{
    char home[96];
    char state[96];
    const char *argv[16] = {outershell};
    const char *all[16] = {home, state};
    snprintf(home, sizeof home, "HOME=%s", folder);
    snprintf(state, sizeof state, "XDG_STATE_HOME=%s/state", folder);
    for (int i = 0; arguments && arguments[i]; i++) {
        ck_assert_int_lt(i, 14);
        argv[i + 1] = arguments[i];
    }
    for (int i = 0; env && env[i]; i++) {
        ck_assert_int_lt(i, 12);
        all[i + 2] = env[i];
    }
    struct pty_options options = {.argv = argv,
                                  .rows = rows,
                                  .columns = columns,
                                  .env = all,
                                  .directory = folder};
    return pty_start(&options);
}

struct pty *session_map(void)
{
    struct pty *p = session_start(24, 80, NULL, NULL);
    pty_expect(p, "effective nuclear charge, e   slater");
    pty_expect(p, "? keys");
    return p;
}

void session_restored(struct pty *p)
{
    int row;
    int column;
    bool visible;
    pty_cursor(p, &row, &column, &visible);
    ck_assert_msg(!pty_full_screen(p), "the second screen is left");
    ck_assert_msg(visible, "the cursor is back");
    ck_assert_msg(!pty_mode(p, 1000), "clicks are not reported");
    ck_assert_msg(!pty_mode(p, 2004), "paste mode is off");
    ck_assert_msg(pty_modes_same(p), "the modes of the line are as before");
}

void session_quit(struct pty *p)
{
    pty_type(p, "q");
    int status = pty_end(p);
    ck_assert_msg(WIFEXITED(status) && WEXITSTATUS(status) == 0,
                  "wait status %#x", status);
    session_restored(p);
    pty_free(p);
}

char *session_read(const char *name, size_t *size)
{
    struct status st = status_ok();
    char *text = NULL;
    ck_assert_msg(file_read(session_path(name), 1 << 24, &text, size, &st),
                  "%s", st.message);
    return text;
}

void session_write(const char *name, const char *text)
{
    FILE *f = fopen(session_path(name), "wb");
    ck_assert_ptr_nonnull(f);
    ck_assert_int_ge(fputs(text, f), 0);
    ck_assert_int_eq(fclose(f), 0);
}

int session_file_count(void)
{
    int count = 0;
    DIR *d = opendir(folder);
    ck_assert_ptr_nonnull(d);
    for (struct dirent *e = readdir(d); e; e = readdir(d))
        count += e->d_name[0] != '.' && strcmp(e->d_name, "state") != 0;
    closedir(d);
    return count;
}

void session_named_command(struct pty *p, char *out, size_t size)
{
    static const char mark[] = "the same: ";
    pty_expect(p, mark);
    pty_expect(p, "--format csv");
    char *screen = pty_screen(p);
    char *from = strstr(screen, mark);
    ck_assert_ptr_nonnull(from);
    from += sizeof mark - 1;
    /* a long one goes on in the next rows, parted at blanks */
    char *end = strstr(from, "--format csv");
    ck_assert_msg(end != NULL, "no whole command: %s", from);
    end[strlen("--format csv")] = '\0';
    for (char *c = from; *c; c++)
        if (*c == '\n')
            *c = ' ';
    ck_assert_uint_lt(strlen(from), size);
    memcpy(out, from, strlen(from) + 1);
    free(screen);
}

char *session_output(const char *command, size_t *size)
{
    char path[4096];
    char home[96];
    const char *slash = strrchr(outershell, '/');
    ck_assert_ptr_nonnull(slash);
    snprintf(path, sizeof path, "PATH=%.*s:/usr/bin:/bin",
             (int)(slash - outershell), outershell);
    snprintf(home, sizeof home, "HOME=%s", folder);
    const char *env[] = {path, home, NULL};
    struct program program = {.path = "/bin/sh",
                              .count = 2,
                              .arguments = {"-c", command},
                              .environment = env,
                              .folder = folder};
    struct program_result result = program_run(&program);
    ck_assert_msg(result.status == 0, "%s: status %d: %s", command,
                  result.status, result.err);
    char *out = malloc(result.out_size + 1);
    ck_assert_ptr_nonnull(out);
    memcpy(out, result.out, result.out_size + 1);
    *size = result.out_size;
    program_free(&result);
    return out;
}
