/* SPDX-License-Identifier: MIT */
/* For realpath. */
#define _XOPEN_SOURCE 700

#include "base/file.h"

#include <errno.h>
#include <fcntl.h>
#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>
#include <unistd.h>

static bool read_stream(FILE *f, const char *path, size_t limit, char **data,
                        size_t *size, struct status *st)
{
    size_t capacity = 16384;
    size_t used = 0;
    char *buffer = malloc(capacity + 1);
    if (!buffer)
        return status_fail(st, STATUS_MEMORY, "%s: out of memory", path);
    for (;;) {
        used += fread(buffer + used, 1, capacity - used, f);
        if (ferror(f)) {
            free(buffer);
            return status_fail(st, STATUS_FILE, "%s: cannot read: %s", path,
                               strerror(errno));
        }
        if (used > limit) {
            free(buffer);
            return status_fail(st, STATUS_DATA,
                               "%s: larger than the limit of %zu bytes", path,
                               limit);
        }
        if (feof(f))
            break;
        if (used < capacity)
            continue;
        char *larger = realloc(buffer, capacity * 2 + 1);
        if (!larger) {
            free(buffer);
            return status_fail(st, STATUS_MEMORY, "%s: out of memory", path);
        }
        buffer = larger;
        capacity *= 2;
    }
    buffer[used] = '\0';
    *data = buffer;
    *size = used;
    return true;
}

bool file_read(const char *path, size_t limit, char **data, size_t *size,
               struct status *st)
{
    struct stat info;
    if (stat(path, &info) == 0 && S_ISDIR(info.st_mode))
        return status_fail(st, STATUS_FILE, "%s: is a folder, not a file",
                           path);
    FILE *f = fopen(path, "rb");
    if (!f)
        return status_fail(st, STATUS_FILE, "%s: cannot open: %s", path,
                           strerror(errno));
    bool ok = read_stream(f, path, limit, data, size, st);
    fclose(f);
    return ok;
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

static bool open_at(struct file_draft *draft, const char *target,
                    struct status *st)
{
    static const char suffix[] = ".XXXXXX";
    size_t length = strlen(target);
    draft->target = malloc(length + 1);
    draft->temporary = malloc(length + sizeof suffix);
    if (!draft->target || !draft->temporary) {
        file_draft_discard(draft);
        return status_fail(st, STATUS_MEMORY, "%s: out of memory", target);
    }
    memcpy(draft->target, target, length + 1);
    memcpy(draft->temporary, target, length);
    memcpy(draft->temporary + length, suffix, sizeof suffix);
    if (!target_free(draft, st)) {
        file_draft_discard(draft);
        return false;
    }
    int fd = mkstemp(draft->temporary);
    if (fd < 0) {
        int why = errno;
        free(draft->temporary);
        draft->temporary = NULL;
        file_draft_discard(draft);
        return status_fail(st, STATUS_FILE, "%s: cannot create: %s", target,
                           strerror(why));
    }
    draft->stream = fdopen(fd, "wb");
    if (!draft->stream) {
        close(fd);
        file_draft_discard(draft);
        return status_fail(st, STATUS_MEMORY, "%s: out of memory", target);
    }
    return true;
}

bool file_draft_open(struct file_draft *draft, const char *target, bool replace,
                     struct status *st)
{
    *draft = (struct file_draft){.replace = replace};
    if (target[0] == '\0')
        return status_fail(st, STATUS_FILE, "the file name is empty");
    /* What a link leads to is replaced, not the link. */
    struct stat info;
    bool linked = replace && lstat(target, &info) == 0 && S_ISLNK(info.st_mode);
    char *real = linked ? realpath(target, NULL) : NULL;
    bool ok = open_at(draft, real ? real : target, st);
    free(real);
    return ok;
}

/* mkstemp makes a private file; a new one gets what umask allows, a replaced
 * one keeps its mode. */
static mode_t wanted_mode(const char *target)
{
    struct stat info;
    if (stat(target, &info) == 0)
        return info.st_mode & 07777;
    mode_t mask = umask(0);
    umask(mask);
    return 0666 & ~mask;
}

bool file_draft_commit(struct file_draft *draft, struct status *st)
{
    bool ok = target_free(draft, st);
    if (ok && (fflush(draft->stream) != 0 || ferror(draft->stream) ||
               fchmod(fileno(draft->stream), wanted_mode(draft->target)) != 0))
        ok = status_fail(st, STATUS_FILE, "%s: cannot write: %s", draft->target,
                         strerror(errno));
    bool closed = fclose(draft->stream) == 0;
    draft->stream = NULL;
    if (ok && !closed)
        ok = status_fail(st, STATUS_FILE, "%s: cannot write: %s", draft->target,
                         strerror(errno));
    /* link refuses an existing name, so a file that appeared meanwhile is
     * not overwritten; where links do not exist, rename does the work. */
    if (ok && !draft->replace) {
        if (link(draft->temporary, draft->target) == 0) {
            file_draft_discard(draft);
            return true;
        }
        if (errno == EEXIST)
            ok = status_fail(st, STATUS_FILE,
                             "%s: exists already; not overwritten",
                             draft->target);
    }
    if (ok && rename(draft->temporary, draft->target) != 0)
        ok = status_fail(st, STATUS_FILE, "%s: cannot write: %s", draft->target,
                         strerror(errno));
    if (ok) {
        free(draft->temporary);
        draft->temporary = NULL;
    }
    file_draft_discard(draft);
    return ok;
}

void file_draft_discard(struct file_draft *draft)
{
    if (draft->stream)
        fclose(draft->stream);
    if (draft->temporary)
        unlink(draft->temporary);
    free(draft->temporary);
    free(draft->target);
    *draft = (struct file_draft){0};
}

bool file_flush(FILE *stream, const char *name, struct status *st)
{
    bool before = ferror(stream) != 0;
    if (fflush(stream) != 0 || before)
        return status_fail(st, STATUS_FILE, "%s: cannot write: %s", name,
                           errno ? strerror(errno) : "write error");
    return true;
}
