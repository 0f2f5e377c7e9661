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
    char **cells;                  /* owned */
    size_t count, capacity;
    bool failed;
};

/* A table with so many columns; `right` has a character per column, 'r' or
 * 'l'. */
struct table table_new(const char *alignment);

/* The next cell, row by row. */
void table_cell(struct table *table, const char *text);
void table_cellf(struct table *table, const char *format, ...)
    PRINTF_LIKE(2, 3);

/* Writes it with two spaces between columns and no blanks at line ends, and
 * frees the cells. */
MUST_CHECK bool table_write(struct table *table, FILE *out, struct status *st);

#endif
