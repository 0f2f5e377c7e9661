/* SPDX-License-Identifier: MIT */
#include "cli/remember.h"

#include <errno.h>
#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>
#include <unistd.h>

#include "base/file.h"
#include "base/text.h"

#define PATH_TEXT_MAX 4096

/* False where the environment names no absolute folder. */
static bool view_path(char path[PATH_TEXT_MAX])
{
    struct text t = text_over(path, PATH_TEXT_MAX);
    const char *state = getenv("XDG_STATE_HOME");
    const char *home = getenv("HOME");
    /* The specification has relative paths ignored. */
    if (state && state[0] == '/')
        text_addf(&t, "%s", state);
    else if (home && home[0] == '/')
        text_addf(&t, "%s/.local/state", home);
    else
        return false;
    text_add(&t, "/outershell/view");
    return !t.cut;
}

void view_recall(char *text)
{
    char path[PATH_TEXT_MAX];
    struct status st = status_ok();
    char *data = NULL;
    size_t size = 0;
    text[0] = '\0';
    if (!view_path(path) ||
        !file_read(path, VIEW_BYTES_MAX - 1, &data, &size, &st))
        return;
    if (utf8_valid(data, size) && strlen(data) == size)
        memcpy(text, data, size + 1);
    free(data);
}

/* Makes every folder above the file, private as the specification wants. */
static bool make_folders(char *path, struct status *st)
{
    for (char *slash = strchr(path + 1, '/'); slash;
         slash = strchr(slash + 1, '/')) {
        *slash = '\0';
        bool ok = mkdir(path, 0700) == 0 || errno == EEXIST;
        if (!ok)
            status_fail(st, STATUS_FILE, "%s: cannot create: %s", path,
                        strerror(errno));
        *slash = '/';
        if (!ok)
            return false;
    }
    return true;
}

bool view_keep(const char *text, struct status *st)
{
    char path[PATH_TEXT_MAX];
    struct file_draft draft;
    if (!view_path(path))
        return true;
    if (!make_folders(path, st))
        return false;
    file_draft_sweep(path);
    if (!file_draft_open(&draft, path, true, st))
        return false;
    fputs(text, draft.stream);
    return file_draft_commit(&draft, st);
}

bool view_forget(struct status *st)
{
    char path[PATH_TEXT_MAX];
    if (!view_path(path) || unlink(path) == 0 || errno == ENOENT ||
        errno == ENOTDIR)
        return true;
    return status_fail(st, STATUS_FILE, "%s: cannot remove: %s", path,
                       strerror(errno));
}
