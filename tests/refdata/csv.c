/* SPDX-License-Identifier: MIT */
#include "refdata/csv.h"

#include <check.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "base/text.h"

/* Cuts one cell out of *at, in place; true when another follows on the line.
 */
static bool take_cell(char **at, const char **cell)
{
    char *from = *at;
    char *to = from;
    *cell = to;
    bool quoted = *from == '"';
    from += quoted;
    while (*from && (quoted || (*from != ',' && *from != '\n'))) {
        if (quoted && *from == '"') {
            from++;
            if (*from != '"') {
                quoted = false;
                continue;
            }
        }
        *to++ = *from++;
    }
    bool more = *from == ',';
    *at = from + (*from != '\0');
    *to = '\0';
    return more;
}

struct csv csv_read(const char *name)
{
    char path[512];
    struct csv csv = {0};
    size_t size;
    struct status st = status_ok();
    snprintf(path, sizeof path, "%s/data/%s", TEST_DIR, name);
    ck_assert_msg(file_read(path, (size_t)4 << 20, &csv.text, &size, &st), "%s",
                  st.message);
    int lines = 0;
    for (size_t i = 0; i < size; i++)
        lines += csv.text[i] == '\n';
    csv.rows = calloc((size_t)lines, sizeof *csv.rows);
    ck_assert_ptr_nonnull(csv.rows);
    char *at = csv.text;
    while (take_cell(&at, &csv.header.cell[csv.columns++]))
        ck_assert_int_lt(csv.columns, CSV_COLUMNS_MAX);
    while (*at) {
        int column = 0;
        struct csv_row *row = &csv.rows[csv.count++];
        while (take_cell(&at, &row->cell[column++]))
            ck_assert_int_lt(column, csv.columns);
        ck_assert_int_eq(column, csv.columns);
    }
    return csv;
}

void csv_free(struct csv *csv)
{
    free(csv->text);
    free(csv->rows);
}

const char *csv_cell(const struct csv *csv, int row, const char *heading)
{
    for (int c = 0; c < csv->columns; c++)
        if (strcmp(csv->header.cell[c], heading) == 0)
            return csv->rows[row].cell[c];
    ck_abort_msg("no column %s", heading);
    return "";
}

int csv_int(const struct csv *csv, int row, const char *heading)
{
    int value;
    ck_assert(text_to_int(csv_cell(csv, row, heading), &value));
    return value;
}
