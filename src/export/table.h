/* SPDX-License-Identifier: MIT */
/* Text in columns: what a command prints for people. */
#ifndef EXPORT_TABLE_H
#define EXPORT_TABLE_H

#include <stdbool.h>
#include <stdio.h>

#include "base/status.h"

#define TABLE_COLUMNS_MAX 40

/* Rows of cells; the first row is the heading. Failure of memory is kept and
 * reported by table_write. */
struct table {
    int columns;
    bool right[TABLE_COLUMNS_MAX]; /* numbers: flush right */
    bool signs[TABLE_COLUMNS_MAX]; /* marked by sign */
    char **cells;                  /* owned */
    size_t count, capacity;
    bool failed;
};

/* Control sequences around marked cells, "" for none: the heading, cells of
 * signed columns that are above and below zero, and what ends a mark. */
struct table_style {
    const char *heading, *plus, *minus, *end;
};
extern const struct table_style table_plain;

/* A table with so many columns; `alignment` has a character per column: 'l',
 * 'r' for numbers, 's' for numbers whose sign is marked. */
struct table table_new(const char *alignment);

/* The next cell, row by row. */
void table_cell(struct table *table, const char *text);
void table_cellf(struct table *table, const char *format, ...)
    PRINTF_LIKE(2, 3);

/* Writes it with two spaces between columns and no blanks at line ends, and
 * frees the cells. */
MUST_CHECK bool table_write(struct table *table, FILE *out, struct status *st);

/* Frees the cells of a table that is not written. */
void table_free(struct table *table);

/* The same with marks. */
MUST_CHECK bool table_write_styled(struct table *table, FILE *out,
                                   const struct table_style *style,
                                   struct status *st);

#endif
