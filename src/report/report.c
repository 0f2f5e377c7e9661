/* SPDX-License-Identifier: MIT */
#include "report/report.h"

#include <assert.h>
#include <stdarg.h>
#include <stddef.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/array.h"
#include "base/number.h"

/* Where the texts of a report are kept: pieces in a list, the newest first. */
#define STORE_BYTES 16384
struct report_store {
    struct report_store *older;
    size_t used, size;
    max_align_t bytes[];
};

void report_begin(struct report *report)
{
    *report = (struct report){0};
}

void report_clear(struct report *report)
{
    for (size_t i = 0; i < report->block_count; i++)
        if (report->blocks[i].table) {
            free(report->blocks[i].table->cells);
            free(report->blocks[i].table);
        }
    while (report->store) {
        struct report_store *older = report->store->older;
        free(report->store);
        report->store = older;
    }
    free(report->blocks);
    free(report->sets);
    free(report->notes);
    free(report->sources);
    report_begin(report);
}

bool report_whole(const struct report *report, struct status *st)
{
    return !report->failed || status_fail(st, STATUS_MEMORY, "out of memory");
}

static void *take(struct report *report, size_t size)
{
    struct report_store *s = report->store;
    if (!s || s->size - s->used < size) {
        size_t room = size > STORE_BYTES ? size : STORE_BYTES;
        s = malloc(sizeof *s + room);
        if (!s) {
            report->failed = true;
            return NULL;
        }
        s->older = report->store;
        s->used = 0;
        s->size = room;
        report->store = s;
    }
    void *memory = (char *)s->bytes + s->used;
    s->used += size;
    return memory;
}

void *report_memory(struct report *report, size_t size)
{
    /* A piece of its own: texts before it leave no alignment. */
    struct report_store *s = malloc(sizeof *s + size);
    if (!s) {
        report->failed = true;
        return NULL;
    }
    s->used = s->size = size;
    s->older = report->store ? report->store->older : NULL;
    if (report->store)
        report->store->older = s;
    else
        report->store = s;
    return s->bytes;
}

/* A copy in the store; "" where memory is short. */
static const char *keep(struct report *report, const char *text)
{
    size_t size = strlen(text) + 1;
    char *copy = size == 1 ? NULL : take(report, size);
    if (!copy)
        return "";
    memcpy(copy, text, size);
    return copy;
}

/* The text of a format, kept whole. */
PRINTF_LIKE(2, 0)
static const char *keep_printed(struct report *report, const char *format,
                                va_list args)
{
    va_list again;
    va_copy(again, args);
    int length = vsnprintf(NULL, 0, format, again);
    va_end(again);
    assert(length >= 0);
    char *copy = take(report, (size_t)length + 1);
    if (!copy)
        return "";
    vsnprintf(copy, (size_t)length + 1, format, args);
    return copy;
}

/* array_grow; a failure is kept. */
static bool grow(struct report *report, void *items, size_t count,
                 size_t *capacity, size_t size)
{
    if (array_grow(items, count, capacity, size))
        return true;
    report->failed = true;
    return false;
}

void report_member(struct report *report, const char *key,
                   enum column_kind kind, const char *format, ...)
{
    va_list args;
    assert(report->member_count < REPORT_MEMBERS_MAX);
    va_start(args, format);
    report->members[report->member_count++] =
        (struct report_member){key, kind, keep_printed(report, format, args)};
    va_end(args);
}

void report_source(struct report *report, struct cited_source source)
{
    if (!source.provenance)
        return;
    for (size_t i = 0; i < report->source_count; i++)
        if (report->sources[i].provenance == source.provenance &&
            report->sources[i].only == source.only)
            return;
    if (grow(report, &report->sources, report->source_count,
             &report->source_capacity, sizeof *report->sources))
        report->sources[report->source_count++] = source;
}

static void add(struct report *report, struct report_block block)
{
    if (grow(report, &report->blocks, report->block_count,
             &report->block_capacity, sizeof *report->blocks))
        report->blocks[report->block_count++] = block;
}

void report_gap(struct report *report)
{
    add(report, (struct report_block){.kind = BLOCK_GAP});
}

void report_line(struct report *report, const char *text)
{
    add(report,
        (struct report_block){.kind = BLOCK_LINE, .text = keep(report, text)});
}

void report_linef(struct report *report, const char *format, ...)
{
    va_list args;
    va_start(args, format);
    add(report,
        (struct report_block){.kind = BLOCK_LINE,
                              .text = keep_printed(report, format, args)});
    va_end(args);
}

void report_heading(struct report *report, const char *format, ...)
{
    va_list args;
    va_start(args, format);
    add(report,
        (struct report_block){.kind = BLOCK_HEADING,
                              .text = keep_printed(report, format, args)});
    va_end(args);
}

void report_labelled(struct report *report, int indent, int hang,
                     const char *label, const char *text)
{
    add(report, (struct report_block){.kind = BLOCK_LABELLED,
                                      .indent = indent,
                                      .hang = hang,
                                      .label = keep(report, label),
                                      .text = keep(report, text)});
}

struct report_table *report_table(struct report *report,
                                  const struct table_column *columns, int count)
{
    assert(count > 0 && count <= TABLE_COLUMNS_MAX);
    struct report_table *table = calloc(1, sizeof *table);
    if (!table) {
        report->failed = true;
        return NULL;
    }
    table->columns = count;
    size_t before = report->block_count;
    add(report, (struct report_block){.kind = BLOCK_TABLE, .table = table});
    if (report->block_count == before) {
        free(table);
        return NULL;
    }
    for (int c = 0; c < count; c++) {
        table->forms[c] = columns[c].form;
        report_cell(report, table, columns[c].heading);
    }
    return table;
}

/* text is kept already. */
static void add_cell(struct report *report, struct report_table *table,
                     const char *text)
{
    if (table && grow(report, &table->cells, table->count, &table->capacity,
                      sizeof *table->cells))
        table->cells[table->count++] = text;
}

void report_cell(struct report *report, struct report_table *table,
                 const char *text)
{
    add_cell(report, table, keep(report, text));
}

void report_cellf(struct report *report, struct report_table *table,
                  const char *format, ...)
{
    va_list args;
    va_start(args, format);
    add_cell(report, table, keep_printed(report, format, args));
    va_end(args);
}

void report_cell_number(struct report *report, struct report_table *table,
                        bool there, double value, int places, bool with_sign)
{
    char out[NUMBER_TEXT_MAX];
    if (!there)
        report_cell(report, table, "-");
    else
        report_cellf(report, table, "%s%s", with_sign && value > 0.0 ? "+" : "",
                     number_print_places(value, places, out));
}

void report_set_letter(size_t place, struct text *t)
{
    if (place >= 26)
        report_set_letter(place / 26 - 1, t);
    text_addf(t, "%c", (int)('a' + place % 26));
}

size_t report_set_place(struct report *report, const struct provenance *set)
{
    size_t i = 0;
    while (i < report->set_count && report->sets[i] != set)
        i++;
    if (i == report->set_count &&
        grow(report, &report->sets, report->set_count, &report->set_capacity,
             sizeof *report->sets))
        report->sets[report->set_count++] = set;
    return i;
}

void report_cell_set(struct report *report, struct report_table *table,
                     const struct provenance *set)
{
    char letters[16];
    struct text t = text_over(letters, sizeof letters);
    if (set)
        report_set_letter(report_set_place(report, set), &t);
    report_cell(report, table, letters);
}

/* Number of a note, from 1. */
static size_t note_number(struct report *report, struct report_note note)
{
    for (size_t i = 0; i < report->note_count; i++)
        if (strcmp(report->notes[i].text, note.text) == 0 &&
            strcmp(report->notes[i].lead, note.lead) == 0)
            return i + 1;
    if (!grow(report, &report->notes, report->note_count,
              &report->note_capacity, sizeof *report->notes))
        return 0;
    report->notes[report->note_count++] =
        (struct report_note){keep(report, note.lead), keep(report, note.text)};
    return report->note_count;
}

void report_cell_notes(struct report *report, struct report_table *table,
                       const struct report_note *notes, int count)
{
    char text[8 * REPORT_NOTES_MAX];
    size_t numbers[REPORT_NOTES_MAX];
    struct text t = text_over(text, sizeof text);
    int used = 0;
    assert(count <= REPORT_NOTES_MAX);
    for (int i = 0; i < count; i++) {
        if (notes[i].text[0] == '\0')
            continue;
        size_t number = note_number(report, notes[i]);
        int place = used;
        while (place > 0 && numbers[place - 1] >= number)
            place--;
        if (place < used && numbers[place] == number)
            continue;
        memmove(numbers + place + 1, numbers + place,
                (size_t)(used - place) * sizeof *numbers);
        numbers[place] = number;
        used++;
    }
    for (int i = 0; i < used; i++)
        text_addf(&t, i ? ",%zu" : "%zu", numbers[i]);
    report_cell(report, table, text);
}

void report_legends(struct report *report)
{
    if (report->set_count) {
        report_gap(report);
        add(report, (struct report_block){.kind = BLOCK_SETS});
    }
    if (report->note_count) {
        report_gap(report);
        add(report, (struct report_block){.kind = BLOCK_NOTES});
    }
}
