/* SPDX-License-Identifier: MIT */
/* A tool of the build: writes the SHA-256 of the data files named on its
 * command line, joined in the order of their names, as a header.
 * Usage: digest OUTPUT.h INPUT... */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "cli/sha256.h"

#define BYTES_MAX ((size_t)64 << 20)

static bool write_header(const char *path, const char *sum, struct status *st)
{
    struct file_draft draft;
    if (!file_draft_open(&draft, path, true, st))
        return false;
    fprintf(draft.stream, "#define DATA_HASH \"%s\"\n", sum);
    return file_draft_commit(&draft, st);
}

static int by_name(const void *a, const void *b)
{
    return strcmp(*(char *const *)a, *(char *const *)b);
}

int main(int argc, char **argv)
{
    struct status st = status_ok();
    struct sha256 s;
    char sum[SHA256_TEXT_MAX];
    bool ok = argc > 2;
    if (ok)
        qsort(argv + 2, (size_t)argc - 2, sizeof *argv, by_name);
    sha256_begin(&s);
    for (int i = 2; ok && i < argc; i++) {
        char *data;
        size_t size;
        ok = file_read(argv[i], BYTES_MAX, &data, &size, &st);
        if (!ok)
            break;
        sha256_add(&s, data, size);
        free(data);
    }
    sha256_end(&s, sum);
    ok = ok && write_header(argv[1], sum, &st);
    if (!ok)
        fprintf(stderr, "digest: %s\n", st.message);
    return ok ? EXIT_SUCCESS : EXIT_FAILURE;
}
