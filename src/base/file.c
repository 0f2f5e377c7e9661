/* SPDX-License-Identifier: MIT */
#include "base/file.h"

#include <errno.h>
#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>

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

bool file_flush(FILE *stream, const char *name, struct status *st)
{
    /* Of an earlier failure the reason is lost; the one that errno holds may
     * be another call's. */
    bool before = ferror(stream) != 0;
    bool now = fflush(stream) != 0;
    if (now || before)
        return status_fail(st, STATUS_FILE, "%s: cannot write: %s", name,
                           now ? strerror(errno) : "write error");
    return true;
}
