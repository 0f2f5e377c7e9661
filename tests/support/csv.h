/* SPDX-License-Identifier: MIT */
/* A CSV reader of the tests' own (RFC 4180), so that what the program writes
 * is checked by code that does not share a line with what wrote it. */
#ifndef SUPPORT_CSV_H
#define SUPPORT_CSV_H

#include <stddef.h>

struct csv {
    char *text;   /* owns all cells */
    char **cells; /* cells[rows * columns], the header row first */
    size_t rows;  /* the header included */
    size_t columns;
};

/* Reads a whole file or a string; aborts the test when it is no CSV: a row
 * with another number of fields, an open quote, a stray quote. */
struct csv csv_read_file(const char *path);
struct csv csv_read_text(const char *text);

/* The cell of a data row (0 = first below the header) under a heading; aborts
 * the test when there is no such heading or row. */
const char *csv_cell(const struct csv *csv, size_t row, const char *heading);

/* The same as a number; aborts when it is empty or no number. */
double csv_number(const struct csv *csv, size_t row, const char *heading);

/* Data rows, the header not counted. */
size_t csv_rows(const struct csv *csv);

void csv_free(struct csv *csv);

#endif
