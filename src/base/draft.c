/* SPDX-License-Identifier: MIT */
/* Files written whole: the draft, and how it gets its name. Three ways to name
 * it, from best to worst: a link to a file without a name; the same under a
 * passing name that is then renamed over an existing target; a file that had
 * such a name from the start. */

/* For O_TMPFILE and fopencookie; realpath comes along. */
#define _GNU_SOURCE

#include <dirent.h>
#include <errno.h>
#include <fcntl.h>
#include <signal.h>
#include <stdint.h>
#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>
#include <time.h>
#include <unistd.h>

#include "base/file.h"

/* Behind the target's name, for a draft that has one. */
#define SUFFIX ".XXXXXX"
#define SUFFIX_LENGTH (sizeof SUFFIX - 1)
#define NAMES_MAX 1000    /* names tried before giving up */
#define LEFT_SECONDS 3600 /* older drafts belong to nobody */
#define DESCRIPTOR_MAX 64 /* bytes of "/proc/self/fd/N" */

/* Where a draft's stream goes. stdio keeps that a write failed and forgets
 * why; the reason of the first failure stays here. */
struct file_sink {
    int fd;
    int error;
};

static ssize_t sink_write(void *cookie, const char *data, size_t size)
{
    struct file_sink *sink = cookie;
    size_t done = 0;
    while (done < size) {
        ssize_t n = write(sink->fd, data + done, size - done);
        if (n < 0 && errno == EINTR)
            continue;
        if (n <= 0) {
            if (sink->error == 0)
                sink->error = n < 0 ? errno : ENOSPC;
            break;
        }
        done += (size_t)n;
    }
    return (ssize_t)done;
}

/* Signals from outside that end a program. Those of its own faults are not
 * held: they would kill it unseen. */
static void hold_signals(struct file_draft *draft)
{
    static const int ending[] = {SIGHUP,  SIGINT,  SIGQUIT, SIGTERM, SIGALRM,
                                 SIGUSR1, SIGUSR2, SIGPIPE, SIGXCPU};
    sigset_t set;
    if (draft->holding)
        return;
    sigemptyset(&set);
    for (size_t i = 0; i < sizeof ending / sizeof ending[0]; i++)
        sigaddset(&set, ending[i]);
    draft->holding = sigprocmask(SIG_BLOCK, &set, &draft->before) == 0;
}

static bool target_free(const struct file_draft *draft, struct status *st)
{
    struct stat info;
    if (stat(draft->target, &info) != 0)
        return true;
    if (S_ISDIR(info.st_mode))
        return status_fail(st, STATUS_FILE, "%s: is a folder, not a file",
                           draft->target);
    /* A draft that takes the name of a device would do away with it. */
    if (!S_ISREG(info.st_mode))
        return status_fail(st, STATUS_FILE,
                           "%s: is no regular file; not overwritten",
                           draft->target);
    if (!draft->replace)
        return status_fail(st, STATUS_FILE,
                           "%s: exists already; not overwritten",
                           draft->target);
    return true;
}

/* The name by which a file without one can be linked. */
static void descriptor_path(int fd, char path[DESCRIPTOR_MAX])
{
    snprintf(path, DESCRIPTOR_MAX, "/proc/self/fd/%d", fd);
}

/* A file without a name in the target's folder; -1 where there is none, or no
 * way to give it one later. */
static int open_unnamed(char *target)
{
    int fd = -1;
#ifdef O_TMPFILE
    char path[DESCRIPTOR_MAX];
    char *slash = strrchr(target, '/');
    if (slash > target) {
        *slash = '\0';
        fd = open(target, O_TMPFILE | O_WRONLY | O_CLOEXEC, 0600);
        *slash = '/';
    } else {
        fd = open(slash ? "/" : ".", O_TMPFILE | O_WRONLY | O_CLOEXEC, 0600);
    }
    if (fd < 0)
        return -1;
    descriptor_path(fd, path);
    if (access(path, F_OK) == 0)
        return fd;
    close(fd);
    fd = -1;
#else
    (void)target;
#endif
    return fd;
}

/* Room for the name of a draft beside its target. */
static char *make_name(const char *target)
{
    size_t length = strlen(target);
    char *name = malloc(length + SUFFIX_LENGTH + 1);
    if (!name)
        return NULL;
    memcpy(name, target, length);
    memcpy(name + length, SUFFIX, SUFFIX_LENGTH + 1);
    return name;
}

static bool open_named(struct file_draft *draft, struct status *st)
{
    draft->temporary = make_name(draft->target);
    if (!draft->temporary)
        return status_fail(st, STATUS_MEMORY, "%s: out of memory",
                           draft->target);
    hold_signals(draft);
    draft->sink->fd = mkstemp(draft->temporary);
    if (draft->sink->fd >= 0)
        return true;
    int why = errno;
    free(draft->temporary);
    draft->temporary = NULL;
    return status_fail(st, STATUS_FILE, "%s: cannot create: %s", draft->target,
                       strerror(why));
}

static bool open_stream(struct file_draft *draft, struct status *st)
{
    const cookie_io_functions_t functions = {.write = sink_write};
    draft->sink = malloc(sizeof *draft->sink);
    if (!draft->sink)
        return status_fail(st, STATUS_MEMORY, "%s: out of memory",
                           draft->target);
    *draft->sink = (struct file_sink){open_unnamed(draft->target), 0};
    if (draft->sink->fd < 0 && !open_named(draft, st))
        return false;
    draft->stream = fopencookie(draft->sink, "w", functions);
    return draft->stream ||
           status_fail(st, STATUS_MEMORY, "%s: out of memory", draft->target);
}

/* The target; what a link leads to is replaced, not the link. A link that
 * leads nowhere is replaced itself. NULL without memory. */
static char *find_target(const char *target, bool replace)
{
    struct stat info;
    if (replace && lstat(target, &info) == 0 && S_ISLNK(info.st_mode)) {
        char *real = realpath(target, NULL);
        if (real || errno == ENOMEM)
            return real;
    }
    size_t size = strlen(target) + 1;
    char *copy = malloc(size);
    return copy ? memcpy(copy, target, size) : NULL;
}

bool file_draft_open(struct file_draft *draft, const char *target, bool replace,
                     struct status *st)
{
    *draft = (struct file_draft){.replace = replace};
    if (target[0] == '\0')
        return status_fail(st, STATUS_FILE, "the file name is empty");
    draft->target = find_target(target, replace);
    if (!draft->target)
        return status_fail(st, STATUS_MEMORY, "%s: out of memory", target);
    if (target_free(draft, st) && open_stream(draft, st))
        return true;
    file_draft_discard(draft);
    return false;
}

/* A draft is private; a new file gets what umask allows, a replaced one keeps
 * its mode. */
static mode_t wanted_mode(const char *target)
{
    struct stat info;
    if (stat(target, &info) == 0)
        return info.st_mode & 07777;
    mode_t mask = umask(0);
    umask(mask);
    return 0666 & ~mask;
}

static bool cannot_write(const struct file_draft *draft, int why,
                         struct status *st)
{
    return status_fail(st, STATUS_FILE, "%s: cannot write: %s", draft->target,
                       why ? strerror(why) : "write error");
}

static bool exists_already(const struct file_draft *draft, struct status *st)
{
    return status_fail(st, STATUS_FILE, "%s: exists already; not overwritten",
                       draft->target);
}

static bool flush(struct file_draft *draft, struct status *st)
{
    const struct file_sink *sink = draft->sink;
    if (fflush(draft->stream) != 0 || ferror(draft->stream))
        return cannot_write(draft, sink->error, st);
    if (fchmod(sink->fd, wanted_mode(draft->target)) != 0)
        return cannot_write(draft, errno, st);
    return true;
}

/* Links the file without a name to a passing one beside the target. */
static bool link_beside(struct file_draft *draft, const char *path)
{
    static const char letters[] = "abcdefghijklmnopqrstuvwxyz234567";
    char *name = make_name(draft->target);
    if (!name) {
        errno = ENOMEM;
        return false;
    }
    char *end = name + strlen(draft->target) + 1;
    uint64_t seed = (uint64_t)getpid() << 20 ^ (uint64_t)time(NULL);
    for (int i = 0; i < NAMES_MAX; i++) {
        uint64_t bits = seed + (uint64_t)i;
        for (size_t k = 0; k + 1 < SUFFIX_LENGTH; k++, bits >>= 5)
            end[k] = letters[bits & 31];
        if (linkat(AT_FDCWD, path, AT_FDCWD, name, AT_SYMLINK_FOLLOW) == 0) {
            draft->temporary = name;
            return true;
        }
        if (errno != EEXIST)
            break;
    }
    int why = errno;
    free(name);
    errno = why;
    return false;
}

/* Gives a file without a name its own. link refuses an existing name, so a
 * file that appeared meanwhile is not overwritten unasked. */
static bool name_unnamed(struct file_draft *draft, struct status *st)
{
    char path[DESCRIPTOR_MAX];
    descriptor_path(draft->sink->fd, path);
    if (linkat(AT_FDCWD, path, AT_FDCWD, draft->target, AT_SYMLINK_FOLLOW) == 0)
        return true;
    if (errno != EEXIST)
        return cannot_write(draft, errno, st);
    if (!draft->replace)
        return exists_already(draft, st);
    hold_signals(draft);
    if (!link_beside(draft, path))
        return errno == ENOMEM ? status_fail(st, STATUS_MEMORY,
                                             "%s: out of memory", draft->target)
                               : cannot_write(draft, errno, st);
    if (rename(draft->temporary, draft->target) != 0)
        return cannot_write(draft, errno, st);
    free(draft->temporary);
    draft->temporary = NULL;
    return true;
}

/* The same for one that has a name. Where links do not exist, rename does the
 * work. A network's disk may refuse as late as at close. */
static bool name_named(struct file_draft *draft, struct status *st)
{
    int fd = draft->sink->fd;
    draft->sink->fd = -1;
    if (close(fd) != 0)
        return cannot_write(draft, errno, st);
    if (!draft->replace) {
        if (link(draft->temporary, draft->target) == 0)
            return true;
        if (errno == EEXIST)
            return exists_already(draft, st);
    }
    if (rename(draft->temporary, draft->target) != 0)
        return cannot_write(draft, errno, st);
    free(draft->temporary);
    draft->temporary = NULL;
    return true;
}

bool file_draft_commit(struct file_draft *draft, struct status *st)
{
    bool ok =
        flush(draft, st) && target_free(draft, st) &&
        (draft->temporary ? name_named(draft, st) : name_unnamed(draft, st));
    file_draft_discard(draft);
    return ok;
}

void file_draft_discard(struct file_draft *draft)
{
    sigset_t before = draft->before;
    bool holding = draft->holding;
    if (draft->stream)
        fclose(draft->stream);
    if (draft->sink && draft->sink->fd >= 0)
        close(draft->sink->fd);
    if (draft->temporary)
        unlink(draft->temporary);
    free(draft->temporary);
    free(draft->target);
    free(draft->sink);
    *draft = (struct file_draft){0};
    if (holding)
        sigprocmask(SIG_SETMASK, &before, NULL);
}

static bool is_left(const char *name, const char *target)
{
    size_t length = strlen(target);
    return strncmp(name, target, length) == 0 &&
           strlen(name) == length + SUFFIX_LENGTH && name[length] == '.' &&
           strspn(name + length + 1, "abcdefghijklmnopqrstuvwxyz"
                                     "ABCDEFGHIJKLMNOPQRSTUVWXYZ"
                                     "0123456789") == SUFFIX_LENGTH - 1;
}

void file_draft_sweep(const char *target)
{
    const char *slash = strrchr(target, '/');
    const char *name = slash ? slash + 1 : target;
    char *folder = slash ? strndup(target, (size_t)(slash - target) + 1) : NULL;
    DIR *all = slash && !folder ? NULL : opendir(folder ? folder : ".");
    struct dirent *item;
    while (all && (item = readdir(all)) != NULL) {
        struct stat info;
        if (is_left(item->d_name, name) &&
            fstatat(dirfd(all), item->d_name, &info, AT_SYMLINK_NOFOLLOW) ==
                0 &&
            S_ISREG(info.st_mode) && time(NULL) - info.st_mtime > LEFT_SECONDS)
            unlinkat(dirfd(all), item->d_name, 0);
    }
    if (all)
        closedir(all);
    free(folder);
}
