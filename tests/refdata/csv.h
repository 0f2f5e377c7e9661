/* SPDX-License-Identifier: MIT */
/* Reads the CSV copies of the sources (RFC 4180), for comparison only. */
#ifndef REFDATA_TEST_CSV_H
#define REFDATA_TEST_CSV_H

#include <stddef.h>

#define CSV_COLUMNS_MAX 16

struct csv_row {
    const char *cell[CSV_COLUMNS_MAX];
};
struct csv {
    char *text;
    int columns;
    int count; /* rows without the header */
    struct csv_row header;
    struct csv_row *rows;
};

/* Reads tests/refdata/data/NAME; a failure ends the test. */
struct csv csv_read(const char *name);
void csv_free(struct csv *csv);

/* The cell of a row under a heading; an unknown heading ends the test. */
const char *csv_cell(const struct csv *csv, int row, const char *heading);
int csv_int(const struct csv *csv, int row, const char *heading);

#endif
