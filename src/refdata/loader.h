/* SPDX-License-Identifier: MIT */
/* From the JSON of outershell-data(5) to a checked data set. */
#ifndef REFDATA_LOADER_H
#define REFDATA_LOADER_H

#include "base/status.h"
#include "refdata/arena.h"
#include "refdata/dataset.h"

#define DATASET_BYTES_MAX ((size_t)4 << 20)
#define DATASET_ENTRIES_MAX 20000

/* A data set with the memory that it points to. */
struct loaded {
    struct dataset set;
    struct arena arena;
};

/* Reads one data set from text[size], which is followed by a zero byte.
 * Everything is checked: encoding, syntax, keys, types, ranges, duplicates,
 * symbols, electron counts. On success *out is the caller's, to be released
 * with loaded_free. Fails with STATUS_DATA ("set x: entry 12 (Fe): …") or
 * STATUS_MEMORY. */
MUST_CHECK bool dataset_load(const char *text, size_t size, struct loaded **out,
                             struct status *st);

/* dataset_load of a file; messages start with the path. Also STATUS_FILE. */
MUST_CHECK bool dataset_load_file(const char *path, struct loaded **out,
                                  struct status *st);

/* Releases a data set; NULL is fine. */
void loaded_free(struct loaded *loaded);

#endif
