/* SPDX-License-Identifier: MIT */
/* BibTeX read as its manual describes it (O. Patashnik, BibTeXing, 1988),
 * without any of the program's code. */
#ifndef SUPPORT_BIBTEX_H
#define SUPPORT_BIBTEX_H

#include <stddef.h>

#define BIBTEX_FIELDS_MAX 16

/* values are what stands between the outer braces of a field, undecoded. */
struct bibtex_entry {
    char *kind, *key;
    int field_count;
    char *names[BIBTEX_FIELDS_MAX];
    char *values[BIBTEX_FIELDS_MAX];
};

struct bibtex {
    struct bibtex_entry *entries;
    size_t count;
};

/* Reads a whole file. Aborts the test where it is not well formed: a brace
 * that does not close, a field without braces, a field or a key that stands
 * twice, anything but blanks and lines that begin with % between entries. */
struct bibtex bibtex_read(const char *text);
void bibtex_free(struct bibtex *b);

/* A field undecoded, NULL when the entry has none. */
const char *bibtex_field(const struct bibtex_entry *entry, const char *name);

/* What TeX would print of a value, braces dropped; aborts the test where TeX
 * would stumble: a bare special character. The caller frees it. */
char *bibtex_plain(const char *value);

/* The names of an author field, split where BibTeX splits them: at "and"
 * between blanks outside of braces. Each is the caller's to free. */
int bibtex_names(const char *value, char **names, int max);

#endif
