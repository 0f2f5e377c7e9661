/* SPDX-License-Identifier: MIT */
#include "write/fields.h"

#include <assert.h>
#include <stdlib.h>

#define SOURCES_KEPT 32 /* citations remembered at once, the oldest goes */

struct kept_source {
    const struct provenance *source;
    struct text encoded;
};

struct fields {
    const struct report_records *records;
    fields_encode *encode;
    const void *record;  /* the present one */
    int turn;            /* which room holds it */
    void *room[2];       /* the present record and the one before */
    struct text plain;   /* one field before it is encoded */
    struct text *shared; /* shared[column_count]: of columns that repeat */
    struct kept_source sources[SOURCES_KEPT];
    int source_count, source_next;
    bool failed;
};

static void fields_free(struct fields *f)
{
    for (int c = 0; f->shared && c < f->records->column_count; c++)
        text_free(&f->shared[c]);
    for (int i = 0; i < f->source_count; i++)
        text_free(&f->sources[i].encoded);
    text_free(&f->plain);
    free(f->shared);
    free(f->room[0]);
    free(f->room[1]);
    free(f);
}

struct fields *fields_open(const struct report_records *records,
                           fields_encode *encode, struct status *st)
{
    struct fields *f = calloc(1, sizeof *f);
    size_t columns = (size_t)records->column_count;
    size_t room = records->room_size ? records->room_size : 1;
    if (f) {
        f->records = records;
        f->encode = encode;
        f->plain = text_growing();
        f->shared = calloc(columns, sizeof *f->shared);
        f->room[0] = malloc(room);
        f->room[1] = malloc(room);
        for (size_t c = 0; f->shared && c < columns; c++)
            f->shared[c] = text_growing();
    }
    if (f && f->shared && f->room[0] && f->room[1])
        return f;
    if (f)
        fields_free(f);
    status_fail(st, STATUS_MEMORY, "out of memory");
    return NULL;
}

static void encode(struct fields *f, const struct report_column *column,
                   struct text *out)
{
    f->failed = f->failed || f->plain.cut;
    if (column->kind == COLUMN_TEXT)
        f->encode(out, column, f->plain.data);
    else if (f->plain.length)
        text_add_bytes(out, f->plain.data, f->plain.length);
    else
        f->encode(out, column, "");
    f->failed = f->failed || out->cut;
}

static void fill(struct fields *f, const struct report_column *column,
                 struct text *out)
{
    text_empty(&f->plain);
    column->put(f->record, &f->plain);
    encode(f, column, out);
}

void fields_record(struct fields *f, size_t i)
{
    const struct report_records *r = f->records;
    const void *before = f->record;
    f->turn = 1 - f->turn;
    f->record = r->at(r->data, i, f->room[f->turn]);
    if (before && r->same_group && r->same_group(before, f->record))
        return;
    for (int c = 0; c < r->column_count; c++)
        if (r->columns[c].repeats) {
            text_empty(&f->shared[c]);
            fill(f, &r->columns[c], &f->shared[c]);
        }
}

/* The citations of a source, encoded. */
static const struct text *source_text(struct fields *f,
                                      const struct report_column *column,
                                      const struct provenance *source)
{
    for (int i = 0; i < f->source_count; i++)
        if (f->sources[i].source == source)
            return &f->sources[i].encoded;
    struct kept_source *kept = &f->sources[f->source_next];
    if (f->source_count < SOURCES_KEPT) {
        f->source_count++;
        kept->encoded = text_growing();
    }
    f->source_next = (f->source_next + 1) % SOURCES_KEPT;
    kept->source = source;
    text_empty(&kept->encoded);
    text_empty(&f->plain);
    provenance_text(&f->plain, source);
    encode(f, column, &kept->encoded);
    return &kept->encoded;
}

void fields_append(struct fields *f, int column, struct text *line)
{
    const struct report_column *c = &f->records->columns[column];
    const struct provenance *source = c->source ? c->source(f->record) : NULL;
    const struct text *made = NULL;
    assert(f->record);
    if (source)
        made = source_text(f, c, source);
    else if (c->repeats)
        made = &f->shared[column];
    if (made) {
        text_add_bytes(line, made->data, made->length);
    } else if (c->source) {
        f->encode(line, c, "");
    } else {
        fill(f, c, line);
    }
    f->failed = f->failed || line->cut;
}

bool fields_close(struct fields *f, struct status *st)
{
    bool ok = !f->failed;
    fields_free(f);
    return ok || status_fail(st, STATUS_MEMORY, "out of memory");
}
