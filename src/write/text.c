/* SPDX-License-Identifier: MIT */
/* A report for people: its blocks, tables in columns. */
#include <assert.h>
#include <string.h>

#include "write/format.h"

#define WIDTH 100 /* columns of words that are wrapped */

static void spaces(FILE *out, int count)
{
    for (int i = 0; i < count; i++)
        putc(' ', out);
}

static void marked(FILE *out, const char *mark, const char *text,
                   const struct write_style *style)
{
    fprintf(out, "%s%s%s", mark, text, mark[0] ? style->end : "");
}

/* A label, then words in lines of WIDTH columns from `hang` on. */
static void write_labelled(FILE *out, const struct report_block *block)
{
    const char *text = block->text;
    int column = block->indent + (int)utf8_length(block->label);
    bool first = true;
    spaces(out, block->indent);
    fputs(block->label, out);
    for (; column < block->hang - 1; column++)
        putc(' ', out);
    while (*text) {
        size_t bytes = strcspn(text, " ");
        int length = 0;
        for (size_t i = 0; i < bytes; i++)
            length += ((unsigned char)text[i] & 0xC0) != 0x80;
        if (!first && column + 1 + length > WIDTH) {
            putc('\n', out);
            spaces(out, block->hang - 1);
            column = block->hang - 1;
        }
        fprintf(out, " %.*s", (int)bytes, text);
        column += 1 + length;
        first = false;
        text += bytes;
        text += strspn(text, " ");
    }
    putc('\n', out);
}

static const char *mark_of(const struct report_table *table, size_t row,
                           int column, const char *cell,
                           const struct write_style *style)
{
    if (row == 0)
        return style->heading;
    if (table->forms[column] != CELL_SIGNED)
        return "";
    return cell[0] == '+'                      ? style->plus
           : cell[0] == '-' && cell[1] != '\0' ? style->minus
                                               : "";
}

static void write_row(FILE *out, const struct report_table *table, size_t row,
                      const int *widths, const struct write_style *style)
{
    int pending = 0; /* blanks are written only before a cell: none at ends */
    for (int c = 0; c < table->columns; c++) {
        const char *cell =
            table->cells[row * (size_t)table->columns + (size_t)c];
        int length = (int)utf8_length(cell);
        int pad = widths[c] - length;
        bool right = table->forms[c] != CELL_WORDS;
        if (right)
            pending += pad;
        if (length > 0) {
            spaces(out, pending);
            pending = 0;
            marked(out, mark_of(table, row, c, cell, style), cell, style);
        }
        if (!right)
            pending += pad;
        pending += 2;
    }
    putc('\n', out);
}

static void write_table(FILE *out, const struct report_table *table,
                        const struct write_style *style)
{
    int widths[TABLE_COLUMNS_MAX] = {0};
    size_t columns = (size_t)table->columns;
    assert(table->count % columns == 0);
    for (size_t i = 0; i < table->count; i++) {
        int length = (int)utf8_length(table->cells[i]);
        if (length > widths[i % columns])
            widths[i % columns] = length;
    }
    for (size_t row = 0; row < table->count / columns; row++)
        write_row(out, table, row, widths, style);
}

static void write_sets(FILE *out, const struct report *report)
{
    char letter[16];
    fputs("Reference sets\n", out);
    for (size_t i = 0; i < report->set_count; i++) {
        const struct provenance *p = report->sets[i];
        struct text t = text_over(letter, sizeof letter);
        report_set_letter(i, &t);
        fprintf(out, "  %-2s  %s: %s; %s\n", letter, p->id, p->title,
                provenance_definition(p));
    }
}

static void write_notes(FILE *out, const struct report *report)
{
    fputs("Notes\n", out);
    for (size_t i = 0; i < report->note_count; i++)
        fprintf(out, "  %-2zu  %s%s\n", i + 1, report->notes[i].lead,
                report->notes[i].text);
}

static void write_block(FILE *out, const struct report *report,
                        const struct report_block *block,
                        const struct write_style *style)
{
    switch (block->kind) {
    case BLOCK_GAP:
        putc('\n', out);
        break;
    case BLOCK_LINE:
        fprintf(out, "%s\n", block->text);
        break;
    case BLOCK_HEADING:
        marked(out, style->heading, block->text, style);
        putc('\n', out);
        break;
    case BLOCK_LABELLED:
        write_labelled(out, block);
        break;
    case BLOCK_TABLE:
        write_table(out, block->table, style);
        break;
    case BLOCK_SETS:
        write_sets(out, report);
        break;
    case BLOCK_NOTES:
        write_notes(out, report);
        break;
    }
}

static bool write_text(FILE *out, const struct report *report,
                       const struct write_style *style, struct status *st)
{
    (void)st;
    for (size_t i = 0; i < report->block_count; i++)
        write_block(out, report, &report->blocks[i], style);
    return true;
}

const struct format format_text = {
    .id = "text",
    .title = "tables for people",
    .uses = REPORT_BLOCKS,
    .for_people = true,
    .write = write_text,
};
