/* SPDX-License-Identifier: MIT */
/* Full disks, closed pipes, files that are there or cannot be: nothing is
 * lost and nothing is said twice. Runs as root too, so that "cannot be written"
 * never rests on permissions alone. */
#include <dirent.h>
#include <fcntl.h>
#include <signal.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>
#include <sys/wait.h>
#include <time.h>
#include <unistd.h>

#include "base/file.h"
#include "suites.h"
#include "support/program.h"

static const char *const calls[] = {
    "list --model shells",
    "list Fe --model shells --format csv",
    "list --model shells -f json",
    "compare Fe Cr --model shells",
    "sources",
    "sources --format bibtex",
    "--help",
    "list --help",
    "--version",
};
#define CALL_COUNT (sizeof calls / sizeof calls[0])

static struct program_result run_to(enum program_output output,
                                    const char *call)
{
    static char store[1024];
    struct program p = {.path = OUTERSHELL, .output = output};
    program_split(&p, call, store, sizeof store);
    return program_run(&p);
}

static void check_failed(struct program_result *r, const char *call,
                         const char *why)
{
    char want[128];
    snprintf(want, sizeof want,
             "outershell: standard output: cannot write: %s\n", why);
    ck_assert_msg(r->status == 1, "%s: status %d, signal %d", call, r->status,
                  r->signal);
    ck_assert_str_eq(r->err, want);
    program_free(r);
}

START_TEST(a_full_device_is_reported_once)
{
    for (size_t i = 0; i < CALL_COUNT; i++) {
        struct program_result r = run_to(PROGRAM_FULL, calls[i]);
        check_failed(&r, calls[i], "No space left on device");
    }
}
END_TEST

START_TEST(a_closed_standard_output_is_reported_once)
{
    for (size_t i = 0; i < CALL_COUNT; i++) {
        struct program_result r = run_to(PROGRAM_CLOSED, calls[i]);
        check_failed(&r, calls[i], "Bad file descriptor");
    }
}
END_TEST

START_TEST(a_pipe_without_a_reader_ends_it_by_its_signal_and_in_silence)
{
    for (size_t i = 0; i < CALL_COUNT; i++) {
        struct program_result r = run_to(PROGRAM_BROKEN, calls[i]);
        ck_assert_msg(r.signal == SIGPIPE, "%s: status %d", calls[i], r.status);
        ck_assert_uint_eq(r.err_size, 0);
        program_free(&r);
        r = run_to(PROGRAM_BROKEN_MUTE, calls[i]);
        check_failed(&r, calls[i], "Broken pipe");
    }
}
END_TEST

/* A folder for one test; everything in it is removed by scratch_end, which
 * counts it. */
static void scratch_begin(char *folder)
{
    ck_assert_ptr_nonnull(mkdtemp(folder));
}

static void put_file(const char *folder, const char *name, const char *text,
                     mode_t mode)
{
    char path[256];
    snprintf(path, sizeof path, "%s/%s", folder, name);
    FILE *f = fopen(path, "wb");
    ck_assert_ptr_nonnull(f);
    fputs(text, f);
    ck_assert_int_eq(fclose(f), 0);
    ck_assert_int_eq(chmod(path, mode), 0);
}

/* The file's text, NULL when there is none; the caller frees it. */
static char *text_of(const char *folder, const char *name)
{
    char path[256];
    char *text;
    size_t size;
    struct status st;
    snprintf(path, sizeof path, "%s/%s", folder, name);
    return file_read(path, 1 << 22, &text, &size, &st) ? text : NULL;
}

static void scratch_end(const char *folder, const char *const *names)
{
    for (; *names; names++) {
        char path[256];
        snprintf(path, sizeof path, "%s/%s", folder, *names);
        ck_assert_msg(unlink(path) == 0, "no %s", path);
    }
    ck_assert_msg(rmdir(folder) == 0, "something else was left in %s", folder);
}

static struct program_result run_in(const char *folder, const char *call)
{
    static char store[1024];
    struct program p = {.path = OUTERSHELL, .folder = folder};
    program_split(&p, call, store, sizeof store);
    return program_run(&p);
}

START_TEST(a_file_holds_what_standard_output_would_have_shown)
{
    static const char *const names[] = {"a", NULL};
    for (size_t i = 0; i < 6; i++) {
        char folder[] = "/tmp/outershell-streams-XXXXXX";
        char call[256];
        scratch_begin(folder);
        snprintf(call, sizeof call, "%s --output a", calls[i]);
        struct program_result r = run_in(folder, call);
        struct program_result plain = run_in(folder, calls[i]);
        ck_assert_int_eq(r.status, 0);
        ck_assert_uint_eq(r.out_size + r.err_size, 0);
        char *text = text_of(folder, "a");
        ck_assert_ptr_nonnull(text);
        ck_assert_str_eq(text, plain.out);
        free(text);
        program_free(&r);
        program_free(&plain);
        scratch_end(folder, names);
    }
}
END_TEST

START_TEST(force_replaces_a_file_and_keeps_its_mode)
{
    static const char *const names[] = {"a", NULL};
    char folder[] = "/tmp/outershell-streams-XXXXXX";
    char path[256];
    struct stat info;
    scratch_begin(folder);
    put_file(folder, "a", "old", 0640);
    struct program_result r =
        run_in(folder, "list Fe -m shells --output a --force");
    ck_assert_int_eq(r.status, 0);
    program_free(&r);
    char *text = text_of(folder, "a");
    ck_assert_int_eq(strncmp(text, "species", 7), 0);
    free(text);
    snprintf(path, sizeof path, "%s/a", folder);
    ck_assert_int_eq(stat(path, &info), 0);
    ck_assert_uint_eq(info.st_mode & 07777, 0640);
    scratch_end(folder, names);
}
END_TEST

START_TEST(a_link_stays_one_and_what_it_leads_to_is_replaced)
{
    static const char *const names[] = {"link", "a", NULL};
    char folder[] = "/tmp/outershell-streams-XXXXXX";
    char path[256];
    struct stat info;
    scratch_begin(folder);
    put_file(folder, "a", "old", 0644);
    snprintf(path, sizeof path, "%s/link", folder);
    ck_assert_int_eq(symlink("a", path), 0);
    struct program_result r =
        run_in(folder, "list Fe -m shells --output link --force");
    ck_assert_int_eq(r.status, 0);
    program_free(&r);
    ck_assert_int_eq(lstat(path, &info), 0);
    ck_assert(S_ISLNK(info.st_mode));
    char *text = text_of(folder, "a");
    ck_assert_int_eq(strncmp(text, "species", 7), 0);
    free(text);
    scratch_end(folder, names);
}
END_TEST

/* A limit on file size stands for a disk that fills up half-way: the program
 * ignores SIGXFSZ, so that the write fails as it does on a full disk. */
START_TEST(a_disk_that_fills_up_leaves_the_old_file_and_no_other)
{
    static const char *const names[] = {"old", NULL};
    static const char *const tries[] = {
        "list --model shells --output new",
        "list --model shells --output old --force",
        "sources --format json --output new"};
    char folder[] = "/tmp/outershell-streams-XXXXXX";
    scratch_begin(folder);
    put_file(folder, "old", "old", 0644);
    for (size_t i = 0; i < sizeof tries / sizeof tries[0]; i++) {
        /* In the child alone: this process writes files of its own. */
        char script[512];
        snprintf(script, sizeof script, "ulimit -f 10; exec '%s' %s",
                 OUTERSHELL, tries[i]);
        struct program p = {.path = "/bin/sh",
                            .count = 2,
                            .arguments = {"-c", script},
                            .folder = folder};
        struct program_result r = program_run(&p);
        ck_assert_msg(r.status == 1, "%s: status %d, signal %d", tries[i],
                      r.status, r.signal);
        ck_assert_ptr_nonnull(strstr(r.err, "cannot write: File too large\n"));
        ck_assert_uint_eq(r.out_size, 0);
        program_free(&r);
    }
    char *text = text_of(folder, "old");
    ck_assert_str_eq(text, "old");
    free(text);
    scratch_end(folder, names);
}
END_TEST

/* Bytes that a process has written so far; 0 before the first. */
static long written(pid_t pid)
{
    char path[64];
    char line[128];
    long bytes = 0;
    snprintf(path, sizeof path, "/proc/%ld/io", (long)pid);
    FILE *f = fopen(path, "r");
    while (f && fgets(line, sizeof line, f))
        if (strncmp(line, "wchar: ", 7) == 0)
            bytes = strtol(line + 7, NULL, 10);
    if (f)
        fclose(f);
    return bytes;
}

/* Starts a call that writes a file; back when it is the program that runs. */
static pid_t start_writing(const char *folder, int number)
{
    int started[2];
    char byte;
    ck_assert_int_eq(pipe(started), 0);
    ck_assert_int_eq(fcntl(started[1], F_SETFD, FD_CLOEXEC), 0);
    pid_t child = fork();
    ck_assert_int_ge(child, 0);
    if (child == 0) {
        signal(number, SIG_DFL);
        if (chdir(folder) == 0)
            execl(OUTERSHELL, "outershell", "list", "-m", "shells,slater", "-f",
                  "json", "--force", "--output", "old", (char *)NULL);
        _exit(127);
    }
    close(started[1]);
    ck_assert_int_eq(read(started[0], &byte, 1), 0);
    close(started[0]);
    return child;
}

/* Sends the signal once the call has begun to write; true when it died of it.
 * A call that was quicker ends as ever. */
static bool interrupt_writing(const char *folder, int number)
{
    int status = 0;
    pid_t child = start_writing(folder, number);
    long before = written(child);
    while (waitpid(child, &status, WNOHANG) == 0)
        if (written(child) > before) {
            kill(child, number);
            ck_assert_int_eq(waitpid(child, &status, 0), child);
            break;
        }
    bool died = WIFSIGNALED(status) && WTERMSIG(status) == number;
    ck_assert_msg(died || (WIFEXITED(status) && WEXITSTATUS(status) == 0),
                  "status %x", (unsigned)status);
    return died;
}

static int files_in(const char *folder)
{
    int count = 0;
    struct dirent *item;
    DIR *all = opendir(folder);
    ck_assert_ptr_nonnull(all);
    while ((item = readdir(all)) != NULL)
        count += item->d_name[0] != '.';
    closedir(all);
    return count;
}

/* Whatever ends it, the old file is there whole, or the new one, and no other.
 * A signal that comes in the last moments finds the work done. */
START_TEST(a_signal_while_a_file_is_written_leaves_no_other_file)
{
    enum { TRIES = 40, ENOUGH = 5 };
    static const char *const names[] = {"old", NULL};
    static const int ending[] = {SIGINT, SIGTERM, SIGHUP};
    char folder[] = "/tmp/outershell-streams-XXXXXX";
    int died = 0;
    scratch_begin(folder);
    put_file(folder, "old", "old", 0644);
    for (int i = 0; i < TRIES && died < ENOUGH; i++) {
        died += interrupt_writing(folder, ending[_i]);
        ck_assert_int_eq(files_in(folder), 1);
    }
    ck_assert_int_eq(died, ENOUGH);
    scratch_end(folder, names);
}
END_TEST

/* True where a folder's disk has files without a name. */
static bool has_unnamed(const char *folder)
{
    char path[256];
    struct status st = status_ok();
    struct file_draft draft;
    snprintf(path, sizeof path, "%s/probe", folder);
    ck_assert_msg(file_draft_open(&draft, path, false, &st), "%s", st.message);
    bool unnamed = draft.temporary == NULL;
    file_draft_discard(&draft);
    return unnamed;
}

/* Kills a call some while after its start; true when it died of it. */
static bool kill_after(const char *folder, long microseconds)
{
    int status;
    struct timespec wait = {0, microseconds * 1000};
    pid_t child = start_writing(folder, SIGTERM);
    nanosleep(&wait, NULL);
    kill(child, SIGKILL);
    ck_assert_int_eq(waitpid(child, &status, 0), child);
    return WIFSIGNALED(status);
}

/* The file "old" is what it was before (NULL: not there) or the whole output.
 */
static void check_kept_or_whole(const char *folder, const char *before,
                                const char *whole)
{
    char path[256];
    snprintf(path, sizeof path, "%s/old", folder);
    if (access(path, F_OK) != 0) {
        ck_assert_ptr_null(before);
        return;
    }
    char *text = text_of(folder, "old");
    ck_assert_msg(strcmp(text, whole) == 0 || (before && !strcmp(text, before)),
                  "neither the old file nor the new one");
    free(text);
    ck_assert_int_eq(unlink(path), 0);
}

/* Removes all that begins with "old."; gives how much that was. */
static int take_leftovers(const char *folder)
{
    int count = 0;
    struct dirent *item;
    DIR *all = opendir(folder);
    ck_assert_ptr_nonnull(all);
    while ((item = readdir(all)) != NULL)
        if (strncmp(item->d_name, "old.", 4) == 0)
            count += unlinkat(dirfd(all), item->d_name, 0) == 0;
    closedir(all);
    return count;
}

/* No handler sees it: where files need no name nothing is left of a new file,
 * and of one that replaces another only in the moment between link and
 * rename. */
START_TEST(a_kill_at_any_moment_leaves_nothing)
{
    enum { KILLS = 40, LONGEST = 40000, RARE = 4 };
    static const char *const names[] = {NULL};
    const char *before = _i == 1 ? "old" : NULL;
    char folder[] = "/tmp/outershell-streams-XXXXXX";
    int left = 0;
    int died = 0;
    unsigned seed = 7;
    scratch_begin(folder);
    struct program_result whole =
        program_call(OUTERSHELL, "list -m shells,slater -f json");
    for (int i = 0; i < KILLS; i++) {
        seed = seed * 1103515245u + 12345u;
        if (before)
            put_file(folder, "old", before, 0644);
        died += kill_after(folder, (long)(seed >> 8) % LONGEST);
        check_kept_or_whole(folder, before, whole.out);
        left += take_leftovers(folder);
    }
    ck_assert_int_ge(died, KILLS / 8);
    if (has_unnamed(folder))
        ck_assert_int_le(left, before ? RARE : 0);
    program_free(&whole);
    scratch_end(folder, names);
}
END_TEST

START_TEST(a_target_that_is_no_regular_file_is_never_replaced)
{
    static const char *const names[] = {"pipe", "dangling", NULL};
    static const char *const tries[] = {"list Fe -m shells -o pipe",
                                        "list Fe -m shells -o pipe --force",
                                        "list Fe -m shells -o dangling"};
    char folder[] = "/tmp/outershell-streams-XXXXXX";
    char path[256];
    struct stat info;
    scratch_begin(folder);
    snprintf(path, sizeof path, "%s/dangling", folder);
    ck_assert_int_eq(symlink("nowhere", path), 0);
    snprintf(path, sizeof path, "%s/pipe", folder);
    ck_assert_int_eq(mkfifo(path, 0644), 0);
    for (size_t i = 0; i < sizeof tries / sizeof tries[0]; i++) {
        struct program_result r = run_in(folder, tries[i]);
        ck_assert_msg(r.status == 1 && r.out_size == 0, "%s: status %d",
                      tries[i], r.status);
        program_free(&r);
    }
    ck_assert_int_eq(stat(path, &info), 0);
    ck_assert(S_ISFIFO(info.st_mode));
    scratch_end(folder, names);
}
END_TEST

/* With standard error closed no file may take its number and receive the
 * complaint. */
START_TEST(closed_standard_streams_harm_no_file)
{
    static const char *const names[] = {"a", NULL};
    char folder[] = "/tmp/outershell-streams-XXXXXX";
    char script[512];
    scratch_begin(folder);
    snprintf(script, sizeof script,
             "'%s' list Fe -m shells --output a <&- >&- 2>&-; "
             "'%s' list Xx --output b <&- >&- 2>&-; echo $?; "
             "'%s' list - --output b <&- 2>&-; echo $?",
             OUTERSHELL, OUTERSHELL, OUTERSHELL);
    struct program p = {.path = "/bin/sh",
                        .count = 2,
                        .arguments = {"-c", script},
                        .folder = folder};
    struct program_result r = program_run(&p);
    ck_assert_str_eq(r.out, "2\n1\n");
    program_free(&r);
    char *text = text_of(folder, "a");
    ck_assert_ptr_nonnull(text);
    ck_assert_int_eq(strncmp(text, "species", 7), 0);
    ck_assert_ptr_null(strstr(text, "outershell:"));
    free(text);
    scratch_end(folder, names);
}
END_TEST

TCase *stream_cases(void)
{
    TCase *c = tcase_create("streams");
    tcase_add_test(c, a_full_device_is_reported_once);
    tcase_add_test(c, a_closed_standard_output_is_reported_once);
    tcase_add_test(
        c, a_pipe_without_a_reader_ends_it_by_its_signal_and_in_silence);
    tcase_add_test(c, a_file_holds_what_standard_output_would_have_shown);
    tcase_add_test(c, force_replaces_a_file_and_keeps_its_mode);
    tcase_add_test(c, a_link_stays_one_and_what_it_leads_to_is_replaced);
    tcase_add_test(c, a_disk_that_fills_up_leaves_the_old_file_and_no_other);
    tcase_add_loop_test(
        c, a_signal_while_a_file_is_written_leaves_no_other_file, 0, 3);
    tcase_add_loop_test(c, a_kill_at_any_moment_leaves_nothing, 0, 2);
    tcase_add_test(c, a_target_that_is_no_regular_file_is_never_replaced);
    tcase_add_test(c, closed_standard_streams_harm_no_file);
    return c;
}
