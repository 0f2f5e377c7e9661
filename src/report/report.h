/* SPDX-License-Identifier: MIT */
/* What a command prints or a screen exports, as plain values: whoever worked
 * it out and whoever writes it meet here and nowhere else.
 *
 * A report has three parts. Its records are the exact form: typed columns, one
 * record a line, for CSV and JSON. Its blocks are the form for people: titles,
 * lines, tables and legends in the order of reading. Its sources are what the
 * numbers rest on. A format uses the part that suits it. */
#ifndef REPORT_REPORT_H
#define REPORT_REPORT_H

#include <stdbool.h>
#include <stddef.h>

#include "base/status.h"
#include "base/text.h"
#include "element/provenance.h"

/* ---- Records ---- */

/* What a field holds. A number or a truth value (`true`, `false`) stands bare
 * in JSON; an empty field is null there and nothing in CSV. */
enum column_kind { COLUMN_TEXT, COLUMN_NUMBER, COLUMN_TRUTH };

/* One field of every record. id: heading in CSV, key in JSON. put writes the
 * field of a record, nothing where there is none. A column with `source` holds
 * the citations of what that gives (nothing: an empty field) in place of put; its
 * text is made once for each source. repeats: the field is the same in
 * neighbouring records for which the records' same_group holds. json_only: left
 * out of CSV. */
struct report_column {
    const char *id;
    enum column_kind kind;
    void (*put)(const void *record, struct text *t);
    struct cited_source (*source)(const void *record);
    bool repeats;
    bool json_only;
};

/* Records are read where they are: at gives record i of data, 0 <= i < count,
 * good until the next call; it may be made in `room`, a buffer of room_size
 * bytes that the reader provides. same_group may be NULL. */
struct report_records {
    const char *name; /* of the array in JSON */
    const struct report_column *columns;
    int column_count;
    const void *data;
    size_t count;
    size_t room_size;
    const void *(*at)(const void *data, size_t i, void *room);
    bool (*same_group)(const void *a, const void *b);
};

/* ---- Blocks ---- */

enum block_kind {
    BLOCK_GAP,      /* an empty line */
    BLOCK_LINE,     /* text as it is */
    BLOCK_HEADING,  /* a line in the style of a heading */
    BLOCK_LABELLED, /* a label and words that are wrapped behind it */
    BLOCK_TABLE,
    BLOCK_SETS, /* the reference sets of the tables, by letter */
    BLOCK_NOTES /* the notes of the tables, by number */
};

/* How the cells of a column stand. */
enum cell_form {
    CELL_WORDS,  /* flush left */
    CELL_NUMBER, /* flush right */
    CELL_SIGNED  /* flush right, marked by its sign */
};

struct table_column {
    const char *heading;
    enum cell_form form;
};

#define TABLE_COLUMNS_MAX 40

/* cells[count], row by row; the first row holds the headings. */
struct report_table {
    int columns;
    enum cell_form forms[TABLE_COLUMNS_MAX];
    const char **cells;
    size_t count, capacity;
};

/* text: of a line or heading, or the words behind a label. The label begins at
 * column `indent`, the words at `hang`, both from 0. */
struct report_block {
    enum block_kind kind;
    int indent, hang;
    const char *label, *text;
    struct report_table *table;
};

/* A remark in two pieces, lead then text. */
struct report_note {
    const char *lead, *text;
};

/* ---- The whole ---- */

/* Further members of the JSON object, before the records. */
struct report_member {
    const char *key;
    enum column_kind kind;
    const char *text; /* "" for null */
};
#define REPORT_MEMBERS_MAX 8

/* Parts that a format can use; bits. */
enum report_part { REPORT_RECORDS = 1, REPORT_BLOCKS = 2, REPORT_SOURCES = 4 };

/* Starts with report_begin, ends with report_clear. Texts that are added are
 * copied; what records refer to is borrowed. failed: memory was short, the
 * report is not whole. */
struct report {
    struct report_records records;
    int member_count;
    struct report_member members[REPORT_MEMBERS_MAX];
    size_t block_count, block_capacity;
    struct report_block *blocks;
    size_t set_count, set_capacity;
    const struct provenance **sets;
    size_t note_count, note_capacity;
    struct report_note *notes;
    size_t source_count, source_capacity;
    struct cited_source *sources;
    struct report_store *store;
    bool failed;
};

void report_begin(struct report *report);
void report_clear(struct report *report);

/* True when the report is whole, else fails with STATUS_MEMORY. */
MUST_CHECK bool report_whole(const struct report *report, struct status *st);

/* Memory that lives as long as the report, for what its records refer to; NULL
 * when it is short. */
void *report_memory(struct report *report, size_t size);

/* Adds a member of the JSON object. */
void report_member(struct report *report, const char *key,
                   enum column_kind kind, const char *format, ...)
    PRINTF_LIKE(4, 5);

/* Adds a source, each once in the order of their first use; nothing is passed
 * over. */
void report_source(struct report *report, struct cited_source source);

void report_gap(struct report *report);
void report_line(struct report *report, const char *text);
void report_linef(struct report *report, const char *format, ...)
    PRINTF_LIKE(2, 3);
void report_heading(struct report *report, const char *format, ...)
    PRINTF_LIKE(2, 3);
void report_labelled(struct report *report, int indent, int hang,
                     const char *label, const char *text);

/* Adds a table with its headings; gives it for the cells, NULL where memory is
 * short (then cells are passed over). */
struct report_table *report_table(struct report *report,
                                  const struct table_column *columns,
                                  int count);

/* The next cell of a table, row by row. */
void report_cell(struct report *report, struct report_table *table,
                 const char *text);
void report_cellf(struct report *report, struct report_table *table,
                  const char *format, ...) PRINTF_LIKE(3, 4);

/* A number with so many places, "-" where there is none; with_sign writes the
 * plus. */
void report_cell_number(struct report *report, struct report_table *table,
                        bool there, double value, int places, bool with_sign);

/* Cells that refer to the legends: the letter of a reference set (an empty cell
 * for NULL), and the numbers of those of notes[count] whose text is not empty,
 * "1,4". count is at most REPORT_NOTES_MAX. */
#define REPORT_NOTES_MAX 32
void report_cell_set(struct report *report, struct report_table *table,
                     const struct provenance *set);
void report_cell_notes(struct report *report, struct report_table *table,
                       const struct report_note *notes, int count);

/* The legends, where they are to stand; nothing where they are empty. */
void report_legends(struct report *report);

/* Place of a set in the legend, where it is added when it is new. */
size_t report_set_place(struct report *report, const struct provenance *set);

/* The letter of a set in its legend: a … z, aa, ab, … */
void report_set_letter(size_t place, struct text *t);

#endif
