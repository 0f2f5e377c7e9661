/* SPDX-License-Identifier: MIT */
#include "support/bibtex.h"

#include <check.h>
#include <ctype.h>
#include <stdbool.h>
#include <stdlib.h>
#include <string.h>
#include <strings.h>

static char *copy(const char *from, size_t length)
{
    char *to = malloc(length + 1);
    ck_assert_ptr_nonnull(to);
    memcpy(to, from, length);
    to[length] = '\0';
    return to;
}

static const char *blanks(const char *p)
{
    return p + strspn(p, " \t\r\n");
}

/* Behind the brace that closes the one at p; BibTeX counts every brace. */
static const char *closing(const char *p)
{
    const char *start = p;
    int depth = 0;
    do {
        ck_assert_msg(*p != '\0', "a brace is not closed: %.60s", start);
        depth += *p == '{' ? 1 : *p == '}' ? -1 : 0;
        p++;
    } while (depth > 0);
    return p;
}

static const char *read_field(const char *p, struct bibtex_entry *e)
{
    ck_assert_int_lt(e->field_count, BIBTEX_FIELDS_MAX);
    size_t length = strspn(p, "abcdefghijklmnopqrstuvwxyz");
    ck_assert_msg(length > 0, "a field without a name: %.60s", p);
    e->names[e->field_count] = copy(p, length);
    p = blanks(p + length);
    ck_assert_msg(*p == '=', "a field without '=': %.60s", p);
    p = blanks(p + 1);
    ck_assert_msg(*p == '{', "a value without braces: %.60s", p);
    const char *end = closing(p);
    for (int i = 0; i < e->field_count; i++)
        ck_assert_str_ne(e->names[i], e->names[e->field_count]);
    e->values[e->field_count++] = copy(p + 1, (size_t)(end - p) - 2);
    return blanks(end);
}

static const char *read_entry(const char *p, struct bibtex_entry *e)
{
    *e = (struct bibtex_entry){0};
    size_t length = strspn(++p, "abcdefghijklmnopqrstuvwxyz");
    e->kind = copy(p, length);
    p += length;
    ck_assert_msg(length > 0 && *p == '{', "no entry: %.60s", p);
    const char *end = closing(p);
    length = strcspn(++p, ", \t\r\n{}\"#%'()=~\\");
    e->key = copy(p, length);
    p += length;
    while (*p == ',')
        p = read_field(blanks(p + 1), e);
    p = blanks(p);
    ck_assert_msg(p == end - 1, "%s: text behind the last field: %.60s", e->key,
                  p);
    return end;
}

struct bibtex bibtex_read(const char *text)
{
    struct bibtex b = {0};
    bool line_start = true;
    for (const char *p = text; *p;) {
        if (*p == '%' && line_start) {
            size_t length = strcspn(p, "\n");
            ck_assert_ptr_null(memchr(p, '@', length));
            p += length;
            continue;
        }
        line_start = *p == '\n';
        if (isspace((unsigned char)*p)) {
            p++;
            continue;
        }
        ck_assert_msg(*p == '@', "text between entries: %.60s", p);
        b.entries = realloc(b.entries, (b.count + 1) * sizeof *b.entries);
        ck_assert_ptr_nonnull(b.entries);
        p = read_entry(p, &b.entries[b.count]);
        for (size_t i = 0; i < b.count; i++)
            ck_assert_msg(
                strcasecmp(b.entries[i].key, b.entries[b.count].key) != 0,
                "key %s stands twice", b.entries[i].key);
        b.count++;
    }
    return b;
}

void bibtex_free(struct bibtex *b)
{
    for (size_t i = 0; i < b->count; i++) {
        struct bibtex_entry *e = &b->entries[i];
        free(e->kind);
        free(e->key);
        for (int f = 0; f < e->field_count; f++) {
            free(e->names[f]);
            free(e->values[f]);
        }
    }
    free(b->entries);
    *b = (struct bibtex){0};
}

const char *bibtex_field(const struct bibtex_entry *entry, const char *name)
{
    for (int f = 0; f < entry->field_count; f++)
        if (strcmp(entry->names[f], name) == 0)
            return entry->values[f];
    return NULL;
}

/* A command of TeX and the character that it prints. */
static const struct {
    const char *command;
    char prints;
} commands[] = {
    {"textbackslash", '\\'}, {"textbraceleft", '{'},   {"textbraceright", '}'},
    {"textasciitilde", '~'}, {"textasciicircum", '^'},
};

static const char *decode_command(const char *p, char **out)
{
    if (strchr("&%$#_", *p)) {
        *(*out)++ = *p;
        return p + 1;
    }
    for (size_t i = 0; i < sizeof commands / sizeof commands[0]; i++) {
        size_t length = strlen(commands[i].command);
        if (strncmp(p, commands[i].command, length) == 0 &&
            !isalpha((unsigned char)p[length])) {
            /* A blank behind a command would be swallowed. */
            ck_assert_int_ne(p[length], ' ');
            *(*out)++ = commands[i].prints;
            return p + length;
        }
    }
    ck_abort_msg("an unknown command: %.40s", p);
    return p;
}

char *bibtex_plain(const char *value)
{
    char *plain = malloc(strlen(value) + 1);
    ck_assert_ptr_nonnull(plain);
    char *out = plain;
    for (const char *p = value; *p;) {
        ck_assert_msg(!strchr("&%$#_~^", *p), "bare '%c' in %.60s", *p, value);
        if (*p == '\\')
            p = decode_command(p + 1, &out);
        else if (*p == '{' || *p == '}')
            p++;
        else
            *out++ = *p++;
    }
    *out = '\0';
    return plain;
}

int bibtex_names(const char *value, char **names, int max)
{
    int count = 0;
    int depth = 0;
    const char *start = value;
    for (const char *p = value;; p++) {
        depth += *p == '{' ? 1 : *p == '}' ? -1 : 0;
        bool ends = *p == '\0';
        bool splits = depth == 0 && strncasecmp(p, " and ", 5) == 0;
        if (!ends && !splits)
            continue;
        ck_assert_int_lt(count, max);
        char *name = copy(start, (size_t)(p - start));
        names[count++] = bibtex_plain(name);
        free(name);
        if (ends)
            return count;
        p += 4;
        start = p + 1;
    }
}
