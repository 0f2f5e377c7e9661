/* SPDX-License-Identifier: MIT */
/* JSON as RFC 8259 has it: one object, its records an array in it. */
#include <string.h>

#include "write/fields.h"
#include "write/format.h"

/* A string with its quotes; invalid UTF-8 becomes U+FFFD. */
static void add_string(struct text *t, const char *text)
{
    size_t length = strlen(text);
    text_add_bytes(t, "\"", 1);
    for (size_t i = 0; i < length;) {
        uint32_t code;
        size_t n = utf8_decode(text + i, length - i, &code);
        if (code == UTF8_INVALID)
            text_add(t, "\\ufffd");
        else if (code == '"' || code == '\\')
            text_addf(t, "\\%c", (int)code);
        else if (code < 0x20)
            text_addf(t, "\\u%04x", (unsigned)code);
        else
            text_add_bytes(t, text + i, n);
        i += n;
    }
    text_add_bytes(t, "\"", 1);
}

static void encode(struct text *t, size_t start, struct text *scratch)
{
    if (t->length == start) {
        text_add(t, "null");
        return;
    }
    text_empty(scratch);
    text_add(scratch, t->data + start);
    text_truncate(t, start);
    add_string(t, scratch->data);
}

static void add_key(struct text *t, const char *key)
{
    add_string(t, key);
    text_add(t, ": ");
}

static void write_members(FILE *out, const struct report *report,
                          struct text *line)
{
    for (int i = 0; i < report->member_count; i++) {
        const struct report_member *m = &report->members[i];
        add_key(line, m->key);
        if (m->kind == COLUMN_TEXT)
            add_string(line, m->text);
        else
            text_add(line, m->text[0] ? m->text : "null");
        text_add(line, ", ");
    }
    add_key(line, report->records.name);
    text_add(line, "[");
    fwrite(line->data, 1, line->length, out);
}

static bool write_json(FILE *out, const struct report *report,
                       const struct write_style *style, struct status *st)
{
    const struct report_records *r = &report->records;
    struct fields *fields = fields_open(r, encode, st);
    struct text line = text_growing();
    (void)style;
    if (!fields)
        return false;
    fputs("{\"schema\": 1, ", out);
    write_members(out, report, &line);
    for (size_t i = 0; i < r->count; i++) {
        text_empty(&line);
        text_add(&line, i ? ",\n  {" : "\n  {");
        fields_record(fields, i);
        for (int c = 0; c < r->column_count; c++) {
            text_add(&line, c ? ", " : "");
            add_key(&line, r->columns[c].id);
            fields_append(fields, c, &line);
        }
        text_add(&line, "}");
        fwrite(line.data, 1, line.length, out);
    }
    fputs("\n]}\n", out);
    bool cut = line.cut;
    text_free(&line);
    return fields_close(fields, st) &&
           (!cut || status_fail(st, STATUS_MEMORY, "out of memory"));
}

const struct format format_json = {
    .id = "json",
    .title = "JSON, RFC 8259",
    .uses = REPORT_RECORDS,
    .write = write_json,
};
