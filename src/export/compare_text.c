/* SPDX-License-Identifier: MIT */
#include <string.h>

#include "element/selection.h"
#include "export/compare.h"
#include "export/legend.h"

#define CELL_TEXT_MAX 256
#define WIDTH 100 /* columns of the facts */
#define FACT_COLUMN 20
#define OTHERS_MAX 2 /* atoms beside the first in one table: 132 columns */

/* Words of a text in lines of WIDTH columns, the first one begun already. */
static void put_wrapped(FILE *out, const char *text)
{
    size_t column = FACT_COLUMN;
    bool first = true;
    while (*text) {
        size_t length = strcspn(text, " ");
        if (!first && column + 1 + length > WIDTH) {
            fprintf(out, "\n%*s", FACT_COLUMN, "");
            column = FACT_COLUMN;
            first = true;
        }
        column += length + (first ? 0 : 1);
        fprintf(out, "%s%.*s", first ? "" : " ", (int)length, text);
        first = false;
        text += length;
        text += strspn(text, " ");
    }
    putc('\n', out);
}

static void write_facts(FILE *out, const struct comparison *c,
                        const struct table_style *style)
{
    char ion[ION_TEXT_MAX];
    for (int w = 0; w < c->count; w++) {
        const struct species *s = &c->species[w];
        fprintf(out, "%s%s  %s%s\n", style->heading,
                ion_print(s->z, s->charge, ion), element_at(s->z)->name,
                style->end);
        for (int f = 0; f < c->fact_count; f++) {
            if (c->facts[f].text[w][0] == '\0')
                continue;
            fprintf(out, "  %-*s", FACT_COLUMN - 2, c->facts[f].label);
            put_wrapped(out, c->facts[f].text[w]);
        }
        putc('\n', out);
    }
}

static void add_value(struct table *table, const struct comparison_line *line,
                      int which)
{
    char buffer[CELL_TEXT_MAX];
    char out[NUMBER_TEXT_MAX];
    const struct reading *r = &line->readings[which];
    struct text t = text_over(buffer, sizeof buffer);
    if (r->state != READING_OK)
        text_add(&t, "-");
    else if (line->provenance->computed)
        text_add(
            &t, number_print_places(r->value.value, line->unit->decimals, out));
    else
        reading_text(&t, r);
    table_cell(table, buffer);
}

static void add_difference(struct table *table,
                           const struct comparison_line *line, int which)
{
    char out[NUMBER_TEXT_MAX];
    struct difference d;
    if (!comparison_difference(line, which, &d)) {
        table_cell(table, "-");
        table_cell(table, "-");
        return;
    }
    table_cellf(table, "%s%s", d.value.value > 0.0 ? "+" : "",
                number_print_places(d.value.value, line->unit->decimals, out));
    if (!d.has_percent)
        table_cell(table, "-");
    else
        table_cellf(table, "%s%s", d.percent.value > 0.0 ? "+" : "",
                    number_print_places(d.percent.value, 1, out));
}

/* Notes on the atoms 0 and from … to - 1. */
static void add_notes(struct table *table, struct legend *legend,
                      const struct comparison_line *line, int from, int to)
{
    char buffer[CELL_TEXT_MAX];
    struct note notes[ROW_NOTES_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    int count = 0;
    for (int w = 0; w < to; w = w == 0 ? from : w + 1) {
        const struct reading *r = &line->readings[w];
        notes[count++] =
            (struct note){"", r->state == READING_OK ? r->remark : r->reason};
    }
    legend_notes(legend, notes, count, &t);
    table_cell(table, buffer);
}

static void add_heading(struct table *table, const struct comparison *c,
                        int from, int to)
{
    char ion[ION_TEXT_MAX];
    char first[ION_TEXT_MAX];
    ion_print(c->species[0].z, c->species[0].charge, first);
    table_cell(table, "");
    table_cell(table, "");
    table_cell(table, first);
    for (int w = from; w < to; w++) {
        table_cell(table,
                   ion_print(c->species[w].z, c->species[w].charge, ion));
        table_cellf(table, "less %s", first);
        table_cell(table, "%");
    }
    table_cell(table, "notes");
}

/* A line that names quantity and unit of those below. */
static void add_quantity(struct table *table,
                         const struct comparison_line *line)
{
    const struct quantity *q = quantity_at(line->quantity);
    if (strcmp(line->unit->id, "1") == 0)
        table_cell(table, q->id);
    else
        table_cellf(table, "%s, %s", q->id, line->unit->id);
    for (int i = 1; i < table->columns; i++)
        table_cell(table, "");
}

/* The numbers of atom 0 and of the atoms from … to - 1, which may be none. */
static bool write_numbers(FILE *out, const struct comparison *c, int from,
                          int to, const struct table_style *style,
                          struct legend *legend, struct status *st)
{
    static const char *const aligned[] = {"llrl", "llrrssl", "llrrssrssl"};
    struct table table = table_new(aligned[to - from]);
    add_heading(&table, c, from, to);
    for (int i = 0; i < c->line_count; i++) {
        const struct comparison_line *line = &c->lines[i];
        char buffer[CELL_TEXT_MAX];
        struct text t = text_over(buffer, sizeof buffer);
        if (i == 0 || line->quantity != line[-1].quantity ||
            line->unit != line[-1].unit)
            add_quantity(&table, line);
        text_add(&t, "  ");
        comparison_label(c, i, &t);
        table_cell(&table, buffer);
        t = text_over(buffer, sizeof buffer);
        if (!line->provenance->computed)
            legend_set(legend, line->provenance, &t);
        table_cell(&table, buffer);
        add_value(&table, line, 0);
        for (int w = from; w < to; w++) {
            add_value(&table, line, w);
            add_difference(&table, line, w);
        }
        add_notes(&table, legend, line, from, to);
    }
    return table_write_styled(&table, out, style, st);
}

bool compare_write_text(FILE *out, const struct comparison *comparison,
                        const struct table_style *style, struct status *st)
{
    struct legend legend = {0};
    bool ok = true;
    write_facts(out, comparison, style);
    int from = 1;
    do {
        int to = from + OTHERS_MAX;
        if (to > comparison->count)
            to = comparison->count;
        if (from > 1)
            putc('\n', out);
        ok = write_numbers(out, comparison, from, to, style, &legend, st);
        from += OTHERS_MAX;
    } while (ok && from < comparison->count);
    if (ok && legend.failed)
        ok = status_fail(st, STATUS_MEMORY, "out of memory");
    if (ok)
        legend_write(&legend, "Reference sets", out);
    else
        legend_free(&legend);
    return ok;
}
