/* SPDX-License-Identifier: MIT */
#include "write/fields.h"

#include <assert.h>
#include <stdlib.h>

#define SOURCES_KEPT 32 /* citations remembered at once, the oldest goes */

struct kept_source {
    struct cited_source source;
    struct text encoded;
};

struct fields {
    const struct report_records *records;
    fields_encode *encode;
    const void *record; /* the present one */
    int turn;           /* which room holds it */
    void *room[2];      /* the present record and the one before */
    struct text scratch;
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
    text_free(&f->scratch);
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
        f->scratch = text_growing();
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

/* Puts the field of a column at the end of a text, encoded. A number or a truth
 * value is one in every format; an empty field is the format's. */
static void fill(struct fields *f, const struct report_column *column,
                 struct text *out)
{
    size_t start = out->length;
    column->put(f->record, out);
    if (column->kind == COLUMN_TEXT || out->length == start)
        f->encode(out, start, &f->scratch);
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
            f->failed = f->failed || f->shared[c].cut;
        }
}

/* The citations of a source, encoded. */
static const struct text *source_text(struct fields *f,
                                      struct cited_source source)
{
    for (int i = 0; i < f->source_count; i++)
        if (f->sources[i].source.provenance == source.provenance &&
            f->sources[i].source.only == source.only)
            return &f->sources[i].encoded;
    struct kept_source *kept = &f->sources[f->source_next];
    if (f->source_count < SOURCES_KEPT) {
        f->source_count++;
        kept->encoded = text_growing();
    }
    f->source_next = (f->source_next + 1) % SOURCES_KEPT;
    kept->source = source;
    text_empty(&kept->encoded);
    cited_text(&kept->encoded, source, CITATION_SHORT);
    f->encode(&kept->encoded, 0, &f->scratch);
    f->failed = f->failed || kept->encoded.cut;
    return &kept->encoded;
}

void fields_append(struct fields *f, int column, struct text *line)
{
    const struct report_column *c = &f->records->columns[column];
    const struct text *made = NULL;
    assert(f->record);
    if (c->repeats) {
        made = &f->shared[column];
    } else if (c->source) {
        struct cited_source source = c->source(f->record);
        if (source.provenance)
            made = source_text(f, source);
        else
            f->encode(line, line->length, &f->scratch);
    } else {
        fill(f, c, line);
    }
    if (made)
        text_add_bytes(line, made->data, made->length);
    f->failed = f->failed || f->scratch.cut || line->cut;
}

bool fields_close(struct fields *f, struct status *st)
{
    bool ok = !f->failed;
    fields_free(f);
    return ok || status_fail(st, STATUS_MEMORY, "out of memory");
}
