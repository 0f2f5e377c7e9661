/* SPDX-License-Identifier: MIT */
#include "support/golden.h"

#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"

static void renew(const char *path, const char *text)
{
    FILE *f = fopen(path, "wb");
    ck_assert_msg(f != NULL, "%s", path);
    fputs(text, f);
    ck_assert_int_eq(fclose(f), 0);
}

void golden_check(const char *name, const char *text)
{
    char path[1024];
    struct status st = status_ok();
    char *want = NULL;
    size_t size = 0;
    snprintf(path, sizeof path, "%s/%s", GOLDEN_DIR, name);
    const char *asked = getenv("OUTERSHELL_RENEW_GOLDEN");
    if (asked && strcmp(asked, "1") == 0)
        renew(path, text);
    ck_assert_msg(file_read(path, 1 << 20, &want, &size, &st), "%s",
                  st.message);
    const char *a = want;
    const char *b = text;
    for (int line = 1; *a || *b; line++) {
        size_t na = strcspn(a, "\n");
        size_t nb = strcspn(b, "\n");
        if (na != nb || memcmp(a, b, na) != 0 || a[na] != b[nb])
            ck_abort_msg("%s, line %d:\n want: %.*s\n  got: %.*s", name, line,
                         (int)na, a, (int)nb, b);
        a += na + (a[na] == '\n');
        b += nb + (b[nb] == '\n');
    }
    free(want);
}
