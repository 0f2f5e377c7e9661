/* SPDX-License-Identifier: MIT */
#include "export/table.h"

#include <assert.h>
#include <stdarg.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"

const struct table_style table_plain = {"", "", "", ""};

struct table table_new(const char *alignment)
{
    struct table t = {.columns = (int)strlen(alignment)};
    assert(t.columns > 0 && t.columns <= TABLE_COLUMNS_MAX);
    for (int c = 0; c < t.columns; c++) {
        t.signs[c] = alignment[c] == 's';
        t.right[c] = t.signs[c] || alignment[c] == 'r';
    }
    return t;
}

void table_cell(struct table *table, const char *text)
{
    if (table->count == table->capacity) {
        size_t capacity = table->capacity ? 2 * table->capacity : 256;
        char **more = realloc(table->cells, capacity * sizeof *more);
        if (!more) {
            table->failed = true;
            return;
        }
        table->cells = more;
        table->capacity = capacity;
    }
    size_t size = strlen(text) + 1;
    char *copy = malloc(size);
    if (!copy) {
        table->failed = true;
        return;
    }
    memcpy(copy, text, size);
    table->cells[table->count++] = copy;
}

void table_cellf(struct table *table, const char *format, ...)
{
    char text[1024];
    va_list args;
    va_start(args, format);
    vsnprintf(text, sizeof text, format, args);
    va_end(args);
    table_cell(table, text);
}

static void spaces(FILE *out, int count)
{
    for (int i = 0; i < count; i++)
        putc(' ', out);
}

static const char *mark_of(const struct table *table, size_t row, int column,
                           const char *cell, const struct table_style *style)
{
    if (row == 0)
        return style->heading;
    if (!table->signs[column])
        return "";
    return cell[0] == '+'                      ? style->plus
           : cell[0] == '-' && cell[1] != '\0' ? style->minus
                                               : "";
}

static void write_row(const struct table *table, size_t row, const int *widths,
                      const struct table_style *style, FILE *out)
{
    int pending = 0;
    for (int c = 0; c < table->columns; c++) {
        const char *cell =
            table->cells[row * (size_t)table->columns + (size_t)c];
        int length = (int)utf8_length(cell);
        int pad = widths[c] - length;
        if (table->right[c])
            pending += pad;
        if (length > 0) {
            spaces(out, pending);
            pending = 0;
            const char *mark = mark_of(table, row, c, cell, style);
            fputs(mark, out);
            fputs(cell, out);
            if (mark[0])
                fputs(style->end, out);
        }
        if (!table->right[c])
            pending += pad;
        pending += 2;
    }
    putc('\n', out);
}

void table_free(struct table *table)
{
    for (size_t i = 0; i < table->count; i++)
        free(table->cells[i]);
    free(table->cells);
    *table = (struct table){.columns = table->columns};
}

bool table_write(struct table *table, FILE *out, struct status *st)
{
    return table_write_styled(table, out, &table_plain, st);
}

bool table_write_styled(struct table *table, FILE *out,
                        const struct table_style *style, struct status *st)
{
    int widths[TABLE_COLUMNS_MAX] = {0};
    size_t columns = (size_t)table->columns;
    bool ok = !table->failed;
    assert(!ok || table->count % columns == 0);
    for (size_t i = 0; i < table->count; i++) {
        int length = (int)utf8_length(table->cells[i]);
        if (length > widths[i % columns])
            widths[i % columns] = length;
    }
    for (size_t row = 0; ok && row < table->count / columns; row++)
        write_row(table, row, widths, style, out);
    table_free(table);
    return ok || status_fail(st, STATUS_MEMORY, "out of memory");
}
