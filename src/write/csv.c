/* SPDX-License-Identifier: MIT */
/* CSV as RFC 4180 has it: UTF-8, one heading, records ended by CRLF. */
#include <string.h>

#include "write/fields.h"
#include "write/format.h"

/* Quoted where it holds a comma, a quote or a line break. */
static void encode(struct text *t, size_t start, struct text *scratch)
{
    const char *field = t->data + start;
    if (field[strcspn(field, ",\"\r\n")] == '\0')
        return;
    text_empty(scratch);
    text_add(scratch, field);
    text_truncate(t, start);
    text_add_bytes(t, "\"", 1);
    for (field = scratch->data; *field;) {
        size_t plain = strcspn(field, "\"");
        text_add_bytes(t, field, plain);
        field += plain;
        if (*field == '"') {
            text_add_bytes(t, "\"\"", 2);
            field++;
        }
    }
    text_add_bytes(t, "\"", 1);
}

static void write_line(FILE *out, struct text *line)
{
    text_add_bytes(line, "\r\n", 2);
    fwrite(line->data, 1, line->length, out);
    text_empty(line);
}

static void write_heading(FILE *out, const struct report_records *r,
                          struct text *line, struct text *scratch)
{
    for (int c = 0; c < r->column_count; c++) {
        if (r->columns[c].json_only)
            continue;
        if (line->length)
            text_add_bytes(line, ",", 1);
        size_t start = line->length;
        text_add(line, r->columns[c].id);
        encode(line, start, scratch);
    }
    write_line(out, line);
}

static bool write_csv(FILE *out, const struct report *report,
                      const struct write_style *style, struct status *st)
{
    const struct report_records *r = &report->records;
    struct fields *fields = fields_open(r, encode, st);
    struct text line = text_growing();
    struct text scratch = text_growing();
    (void)style;
    if (!fields)
        return false;
    write_heading(out, r, &line, &scratch);
    text_free(&scratch);
    for (size_t i = 0; i < r->count; i++) {
        bool first = true;
        fields_record(fields, i);
        for (int c = 0; c < r->column_count; c++) {
            if (r->columns[c].json_only)
                continue;
            if (!first)
                text_add_bytes(&line, ",", 1);
            first = false;
            fields_append(fields, c, &line);
        }
        write_line(out, &line);
    }
    bool cut = line.cut;
    text_free(&line);
    return fields_close(fields, st) &&
           (!cut || status_fail(st, STATUS_MEMORY, "out of memory"));
}

const struct format format_csv = {
    .id = "csv",
    .title = "comma-separated values, RFC 4180",
    .uses = REPORT_RECORDS,
    .write = write_csv,
};
