/* SPDX-License-Identifier: MIT */
#include "support/csv.h"

#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

struct parser {
    struct csv csv;
    size_t count, capacity, in_row;
};

static void push(struct parser *p, char *cell)
{
    if (p->count == p->capacity) {
        p->capacity = p->capacity ? 2 * p->capacity : 256;
        p->csv.cells =
            realloc(p->csv.cells, p->capacity * sizeof p->csv.cells[0]);
        ck_assert_ptr_nonnull(p->csv.cells);
    }
    p->csv.cells[p->count++] = cell;
    p->in_row++;
}

static void end_row(struct parser *p)
{
    if (p->csv.rows == 0)
        p->csv.columns = p->in_row;
    ck_assert_msg(p->in_row == p->csv.columns,
                  "row %zu has %zu fields, not %zu", p->csv.rows + 1, p->in_row,
                  p->csv.columns);
    p->csv.rows++;
    p->in_row = 0;
}

/* Unquotes the field that starts at s in place; gives what follows it. */
static char *quoted(char *s, char **cell)
{
    char *out = s;
    *cell = out;
    for (s++; *s; s++) {
        if (*s == '"' && s[1] != '"')
            break;
        if (*s == '"')
            s++;
        *out++ = *s;
    }
    ck_assert_msg(*s == '"', "open quote");
    char *next = s + 1;
    ck_assert_msg(*next == '\0' || strchr(",\r\n", *next) != NULL,
                  "text behind a closing quote");
    *out = '\0';
    return next;
}

static struct csv parse(char *text)
{
    struct parser p = {.csv.text = text};
    char *s = text;
    while (*s) {
        char *cell = s;
        char *next;
        if (*s == '"') {
            next = quoted(s, &cell);
        } else {
            next = s + strcspn(s, ",\r\n\"");
            if (*next == '"')
                ck_abort_msg("stray quote");
        }
        char mark = *next;
        char after = mark ? next[1] : '\0';
        *next = '\0';
        push(&p, cell);
        if (mark == ',') {
            s = next + 1;
            if (after == '\0' || after == '\r' || after == '\n') {
                static char empty[] = "";
                push(&p, empty);
                end_row(&p);
                s += after == '\r' ? 2 : after == '\n' ? 1 : 0;
            }
            continue;
        }
        end_row(&p);
        if (mark == '\r')
            ck_assert_msg(after == '\n', "CR without LF");
        s = mark == '\r' ? next + 2 : mark == '\n' ? next + 1 : next;
    }
    return p.csv;
}

struct csv csv_read_text(const char *text)
{
    size_t size = strlen(text) + 1;
    char *copy = malloc(size);
    ck_assert_ptr_nonnull(copy);
    memcpy(copy, text, size);
    return parse(copy);
}

struct csv csv_read_file(const char *path)
{
    FILE *f = fopen(path, "rb");
    ck_assert_msg(f != NULL, "%s", path);
    size_t used = 0;
    size_t capacity = 1 << 16;
    char *text = malloc(capacity);
    ck_assert_ptr_nonnull(text);
    size_t got;
    while ((got = fread(text + used, 1, capacity - used - 1, f)) > 0) {
        used += got;
        if (used + 1 < capacity)
            continue;
        capacity *= 2;
        text = realloc(text, capacity);
        ck_assert_ptr_nonnull(text);
    }
    fclose(f);
    text[used] = '\0';
    return parse(text);
}

size_t csv_rows(const struct csv *csv)
{
    return csv->rows ? csv->rows - 1 : 0;
}

const char *csv_cell(const struct csv *csv, size_t row, const char *heading)
{
    /* no assertion where all is well: Check notes each in a file */
    if (row + 1 >= csv->rows)
        ck_abort_msg("no row %zu", row);
    for (size_t c = 0; c < csv->columns; c++)
        if (strcmp(csv->cells[c], heading) == 0)
            return csv->cells[(row + 1) * csv->columns + c];
    ck_abort_msg("no column '%s'", heading);
}

double csv_number(const struct csv *csv, size_t row, const char *heading)
{
    const char *cell = csv_cell(csv, row, heading);
    char *end;
    double value = strtod(cell, &end);
    if (end == cell || *end != '\0')
        ck_abort_msg("row %zu, %s: '%s'", row, heading, cell);
    return value;
}

void csv_free(struct csv *csv)
{
    free(csv->cells);
    free(csv->text);
    *csv = (struct csv){0};
}
