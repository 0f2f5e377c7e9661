/* SPDX-License-Identifier: MIT */
/* Files written whole, by a draft without a name and by one with: each claim
 * is tried both ways. The linker sends open and link through here, so that a
 * system without such files, or without links, can be played. */
#include <check.h>
#include <dirent.h>
#include <errno.h>
#include <fcntl.h>
#include <signal.h>
#include <stdarg.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/resource.h>
#include <sys/stat.h>
#include <sys/wait.h>
#include <time.h>
#include <unistd.h>

#include "base/file.h"
#include "support/run.h"

int __real_open(const char *path, int flags, ...);
int __wrap_open(const char *path, int flags, ...);
int __real_open64(const char *path, int flags, ...);
int __wrap_open64(const char *path, int flags, ...);
int __real_link(const char *from, const char *to);
int __wrap_link(const char *from, const char *to);

static bool no_unnamed; /* as on a disk of an older kind */
static bool no_links;

/* O_TMPFILE of Linux, which ISO C mode hides: its bits beside O_DIRECTORY. */
#define TMPFILE_BIT 020000000

static int open_or_not(int (*real)(const char *, int, ...), const char *path,
                       int flags, mode_t mode)
{
    if (no_unnamed && (flags & TMPFILE_BIT)) {
        errno = EOPNOTSUPP;
        return -1;
    }
    return real(path, flags, mode);
}

int __wrap_open(const char *path, int flags, ...)
{
    va_list args;
    va_start(args, flags);
    mode_t mode = flags & (O_CREAT | TMPFILE_BIT) ? va_arg(args, mode_t) : 0;
    va_end(args);
    return open_or_not(__real_open, path, flags, mode);
}

int __wrap_open64(const char *path, int flags, ...)
{
    va_list args;
    va_start(args, flags);
    mode_t mode = flags & (O_CREAT | TMPFILE_BIT) ? va_arg(args, mode_t) : 0;
    va_end(args);
    return open_or_not(__real_open64, path, flags, mode);
}

int __wrap_link(const char *from, const char *to)
{
    if (no_links) {
        errno = EPERM;
        return -1;
    }
    return __real_link(from, to);
}

static char folder[64];

static void make_folder(void)
{
    snprintf(folder, sizeof folder, "/tmp/outershell-draft-XXXXXX");
    ck_assert_ptr_nonnull(mkdtemp(folder));
    ck_assert_int_eq(chdir(folder), 0);
    no_unnamed = no_links = false;
}

/* Removes what the test leaves; a draft among it fails in count_files. */
static void remove_folder(void)
{
    DIR *all = opendir(".");
    struct dirent *item;
    while ((item = readdir(all)) != NULL)
        if (item->d_name[0] != '.')
            unlink(item->d_name);
    closedir(all);
    ck_assert_int_eq(chdir("/"), 0);
    ck_assert_int_eq(rmdir(folder), 0);
}

static int count_files(void)
{
    int count = 0;
    DIR *all = opendir(".");
    struct dirent *item;
    while ((item = readdir(all)) != NULL)
        count += item->d_name[0] != '.';
    closedir(all);
    return count;
}

/* Which way a loop's turn takes. */
enum way { UNNAMED, NAMED, NAMED_WITHOUT_LINKS, WAYS };

static void take_way(int way)
{
    no_unnamed = way != UNNAMED;
    no_links = way == NAMED_WITHOUT_LINKS;
}

static void put(const char *name, const char *text)
{
    FILE *f = fopen(name, "w");
    ck_assert_ptr_nonnull(f);
    fputs(text, f);
    fclose(f);
}

static void holds(const char *name, const char *text)
{
    char *data;
    size_t size;
    struct status st = status_ok();
    ck_assert_msg(file_read(name, 1000, &data, &size, &st), "%s", st.message);
    ck_assert_str_eq(data, text);
    free(data);
}

static bool write_file(const char *name, const char *text, bool replace,
                       struct status *st)
{
    struct file_draft draft;
    if (!file_draft_open(&draft, name, replace, st))
        return false;
    fputs(text, draft.stream);
    return file_draft_commit(&draft, st);
}

START_TEST(a_draft_becomes_the_file_and_nothing_else)
{
    struct status st = status_ok();
    struct stat info;
    char path[128];
    take_way(_i);
    mode_t mask = umask(027);
    ck_assert(write_file("a", "one", false, &st));
    umask(mask);
    ck_assert_int_eq(stat("a", &info), 0);
    ck_assert_uint_eq(info.st_mode & 07777, 0640);
    ck_assert_uint_eq(info.st_nlink, 1);
    holds("a", "one");
    ck_assert_int_eq(chmod("a", 0604), 0);
    ck_assert(write_file("a", "two", true, &st));
    holds("a", "two");
    ck_assert_int_eq(stat("a", &info), 0);
    ck_assert_uint_eq(info.st_mode & 07777, 0604);
    snprintf(path, sizeof path, "%s/b", folder);
    ck_assert(write_file(path, "three", true, &st));
    holds("b", "three");
    ck_assert_int_eq(count_files(), 2);
}
END_TEST

START_TEST(what_a_link_leads_to_is_replaced)
{
    struct status st = status_ok();
    struct stat info;
    take_way(_i);
    put("a", "old");
    ck_assert_int_eq(symlink("a", "link"), 0);
    ck_assert_int_eq(symlink("nowhere", "dangling"), 0);
    ck_assert(write_file("link", "new", true, &st));
    holds("a", "new");
    ck_assert_int_eq(lstat("link", &info), 0);
    ck_assert(S_ISLNK(info.st_mode));
    ck_assert(write_file("dangling", "new", true, &st));
    holds("dangling", "new");
    ck_assert_int_eq(count_files(), 3);
}
END_TEST

/* Only link refuses a name that is taken at the last moment. */
START_TEST(a_file_that_appears_meanwhile_is_not_overwritten)
{
    struct status st = status_ok();
    struct file_draft draft;
    take_way(_i);
    ck_assert(file_draft_open(&draft, "a", false, &st));
    fputs("ours", draft.stream);
    put("a", "theirs");
    ck_assert(!file_draft_commit(&draft, &st));
    ck_assert_ptr_nonnull(strstr(st.message, "a: exists already"));
    holds("a", "theirs");
    ck_assert_int_eq(count_files(), 1);
}
END_TEST

START_TEST(a_place_without_a_folder_is_named)
{
    struct status st = status_ok();
    struct file_draft draft;
    take_way(_i);
    ck_assert(!file_draft_open(&draft, "no/such/a", false, &st));
    ck_assert_str_eq(st.message,
                     "no/such/a: cannot create: No such file or directory");
    ck_assert_int_eq(count_files(), 0);
}
END_TEST

/* A limit on file size stands for a full disk. errno has long become another
 * call's when the draft is asked for the reason. */
START_TEST(the_reason_is_that_of_the_first_write_that_failed)
{
    struct status st = status_ok();
    struct file_draft draft;
    struct rlimit limit = {8192, 8192};
    signal(SIGXFSZ, SIG_IGN);
    take_way(_i);
    ck_assert(file_draft_open(&draft, "a", false, &st));
    ck_assert_int_eq(setrlimit(RLIMIT_FSIZE, &limit), 0);
    for (int i = 0; i < 100000; i++)
        fputc('x', draft.stream);
    ck_assert_int_ne(access("nothing", F_OK), 0); /* leaves ENOENT */
    ck_assert(!file_draft_commit(&draft, &st));
    ck_assert_str_eq(st.message, "a: cannot write: File too large");
    ck_assert_int_eq(count_files(), 0);
}
END_TEST

static const int ending[] = {SIGHUP, SIGINT, SIGQUIT, SIGTERM, SIGUSR1};
#define ENDING ((int)(sizeof ending / sizeof ending[0]))

/* A child that writes a draft and gets a signal on the way; what it died of. */
static int die_writing(int way, int signal_number, bool replace)
{
    pid_t child = fork();
    ck_assert_int_ge(child, 0);
    if (child == 0) {
        struct status st = status_ok();
        struct file_draft draft;
        take_way(way);
        signal(signal_number, SIG_DFL);
        if (!file_draft_open(&draft, "a", replace, &st))
            _exit(1);
        fputs("new", draft.stream);
        fflush(draft.stream);
        raise(signal_number);
        _exit(file_draft_commit(&draft, &st) ? 0 : 1);
    }
    int status;
    ck_assert_int_eq(waitpid(child, &status, 0), child);
    return WIFSIGNALED(status) ? WTERMSIG(status) : 0;
}

START_TEST(a_signal_while_a_draft_is_written_leaves_no_draft)
{
    int way = _i / ENDING;
    int number = ending[_i % ENDING];
    put("a", "old");
    ck_assert_int_eq(die_writing(way, number, true), number);
    ck_assert_int_eq(count_files(), 1);
    /* With a name the draft is finished first; without, it vanishes. */
    holds("a", way == UNNAMED ? "old" : "new");
}
END_TEST

/* True where this folder's disk has files without a name. */
static bool has_unnamed(void)
{
    struct status st = status_ok();
    struct file_draft draft;
    ck_assert(file_draft_open(&draft, "probe", false, &st));
    bool unnamed = draft.temporary == NULL;
    file_draft_discard(&draft);
    return unnamed;
}

START_TEST(a_kill_leaves_nothing_where_files_need_no_name)
{
    bool unnamed = has_unnamed();
    ck_assert_int_eq(die_writing(UNNAMED, SIGKILL, false), SIGKILL);
    ck_assert_int_eq(count_files(), unnamed ? 0 : 1);
}
END_TEST

START_TEST(signals_wait_no_longer_than_the_draft)
{
    sigset_t before, after;
    struct status st = status_ok();
    struct file_draft draft;
    take_way(_i);
    put("a", "old");
    ck_assert_int_eq(sigprocmask(SIG_BLOCK, NULL, &before), 0);
    ck_assert(write_file("a", "new", true, &st));
    ck_assert(file_draft_open(&draft, "b", false, &st));
    file_draft_discard(&draft);
    ck_assert(!file_draft_open(&draft, "a", false, &st));
    ck_assert_int_eq(sigprocmask(SIG_BLOCK, NULL, &after), 0);
    for (int s = 0; s < ENDING; s++)
        ck_assert_int_eq(sigismember(&before, ending[s]),
                         sigismember(&after, ending[s]));
}
END_TEST

static void make_old(const char *name)
{
    struct timespec times[2] = {{time(NULL) - 7200, 0}, {time(NULL) - 7200, 0}};
    put(name, "left");
    ck_assert_int_eq(utimensat(AT_FDCWD, name, times, 0), 0);
}

START_TEST(drafts_left_by_a_killed_process_are_swept_and_nothing_else)
{
    static const char *const kept[] = {"view", "view.abcdefg", "view.abc-ef",
                                       "viewer.abcdef", "other.abcdef"};
    char path[128];
    for (size_t i = 0; i < sizeof kept / sizeof kept[0]; i++)
        make_old(kept[i]);
    put("view.fresh1", "another process writes it now");
    make_old("view.aZ09bq");
    snprintf(path, sizeof path, "%s/view", folder);
    file_draft_sweep(path);
    ck_assert_int_ne(access("view.aZ09bq", F_OK), 0);
    ck_assert_int_eq(count_files(), 6);
    make_old("view.aZ09bq");
    file_draft_sweep("view");
    ck_assert_int_eq(count_files(), 6);
    file_draft_sweep("no/such/view");
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("draft");
    TCase *tc = tcase_create("draft");
    tcase_add_checked_fixture(tc, make_folder, remove_folder);
    tcase_add_loop_test(tc, a_draft_becomes_the_file_and_nothing_else, 0, WAYS);
    tcase_add_loop_test(tc, what_a_link_leads_to_is_replaced, 0, WAYS);
    tcase_add_loop_test(tc, a_file_that_appears_meanwhile_is_not_overwritten, 0,
                        WAYS);
    tcase_add_loop_test(tc, a_place_without_a_folder_is_named, 0, WAYS);
    tcase_add_loop_test(tc, the_reason_is_that_of_the_first_write_that_failed,
                        0, WAYS);
    tcase_add_loop_test(tc, a_signal_while_a_draft_is_written_leaves_no_draft,
                        0, ENDING * WAYS);
    tcase_add_test(tc, a_kill_leaves_nothing_where_files_need_no_name);
    tcase_add_loop_test(tc, signals_wait_no_longer_than_the_draft, 0, WAYS);
    tcase_add_test(tc,
                   drafts_left_by_a_killed_process_are_swept_and_nothing_else);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
