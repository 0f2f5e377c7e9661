/* SPDX-License-Identifier: MIT */
/* Runs a fuzz target over files and folders of files named on the command
 * line: the corpus as a plain test, everywhere. */
#include <dirent.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>

#include "base/file.h"
#include "fuzz/target.h"

static int runs;

static int replay_file(const char *path)
{
    char *data;
    size_t size;
    struct status st = status_ok();
    if (!file_read(path, (size_t)16 << 20, &data, &size, &st)) {
        fprintf(stderr, "%s\n", st.message);
        return 1;
    }
    LLVMFuzzerTestOneInput((const uint8_t *)data, size);
    free(data);
    runs++;
    return 0;
}

static int replay_folder(const char *path, DIR *folder)
{
    int failed = 0;
    struct dirent *item;
    while ((item = readdir(folder)) != NULL) {
        char file[4096];
        if (item->d_name[0] == '.')
            continue;
        snprintf(file, sizeof file, "%s/%s", path, item->d_name);
        failed |= replay_file(file);
    }
    return failed;
}

int main(int argc, char **argv)
{
    int failed = 0;
    for (int i = 1; i < argc; i++) {
        DIR *folder = opendir(argv[i]);
        failed |=
            folder ? replay_folder(argv[i], folder) : replay_file(argv[i]);
        if (folder)
            closedir(folder);
    }
    printf("%d inputs\n", runs);
    return failed || runs == 0;
}
