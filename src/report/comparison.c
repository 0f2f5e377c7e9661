/* SPDX-License-Identifier: MIT */
#include "report/comparison.h"

#include <string.h>

#include "element/selection.h"

#define FACT_INDENT 2
#define FACT_COLUMN 20
#define OTHERS_MAX 2 /* species beside the first in one table: 132 columns */

/* One record: a line of the comparison for one species. */
struct record {
    const struct comparison *comparison;
    const struct comparison_line *line;
    const struct reading *reading;
    int which;
    bool differs;
    struct difference difference;
};

static void put_quantity(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, quantity_at(r->line->quantity)->id);
}

static void put_kind(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, r->line->provenance->computed ? "model" : "reference");
}

static void put_source(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, r->line->provenance->id);
}

static void put_definition(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, provenance_definition(r->line->provenance));
}

static void put_unit(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, r->line->unit->id);
}

static const struct species *species_of(const struct record *r)
{
    return &r->comparison->species[r->which];
}

static void put_z(const void *record, struct text *t)
{
    text_addf(t, "%d", species_of(record)->z);
}

static void put_symbol(const void *record, struct text *t)
{
    text_add(t, element_at(species_of(record)->z)->symbol);
}

static void put_charge(const void *record, struct text *t)
{
    text_addf(t, "%d", species_of(record)->charge);
}

static void put_coordination(const void *record, struct text *t)
{
    const struct record *r = record;
    struct site site = reading_site(r->reading, species_of(r)->site);
    text_add(t, coordination_id(site.coordination));
}

static void put_spin(const void *record, struct text *t)
{
    const struct record *r = record;
    struct site site = reading_site(r->reading, species_of(r)->site);
    text_add(t, spin_id(site.spin));
}

static void put_configuration(const void *record, struct text *t)
{
    species_configuration_text(t, species_of(record));
}

static void put_subshell(const void *record, struct text *t)
{
    const struct record *r = record;
    char label[SUBSHELL_TEXT_MAX];
    if (r->reading->n)
        text_add(t, subshell_print(r->reading->n, r->reading->l, label));
}

static void put_value(const void *record, struct text *t)
{
    const struct record *r = record;
    char out[NUMBER_TEXT_MAX];
    if (r->reading->state != READING_OK)
        return;
    text_add(t, r->line->provenance->computed
                    ? number_print_short(r->reading->value, out)
                    : number_print(r->reading->value, out));
}

static void put_uncertainty(const void *record, struct text *t)
{
    const struct record *r = record;
    char out[NUMBER_TEXT_MAX];
    if (r->reading->state == READING_OK && r->reading->has_u)
        text_add(t, number_print(r->reading->u, out));
}

static void put_difference(const void *record, struct text *t)
{
    const struct record *r = record;
    char out[NUMBER_TEXT_MAX];
    if (r->differs)
        text_add(t, number_print_short(r->difference.value, out));
}

static void put_percent(const void *record, struct text *t)
{
    const struct record *r = record;
    char out[NUMBER_TEXT_MAX];
    if (r->differs && r->difference.has_percent)
        text_add(t, number_print_short(r->difference.percent, out));
}

static void put_state(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, reading_state_id(r->reading->state));
}

static void put_remark(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, r->reading->state == READING_OK ? r->reading->remark
                                                : r->reading->reason);
}

static void put_evidence(const void *record, struct text *t)
{
    const struct record *r = record;
    if (!r->line->provenance->computed && r->reading->state == READING_OK)
        text_add(t, evidence_id(r->reading->evidence));
}

/* A fact of the record's species by its label. */
static void put_fact(const struct record *r, const char *label, struct text *t)
{
    const struct comparison *c = r->comparison;
    for (int f = 0; f < c->fact_count; f++)
        if (strcmp(c->facts[f].label, label) == 0)
            text_add(t, c->facts[f].text[r->which]);
}

static void put_caution(const void *record, struct text *t)
{
    put_fact(record, "caution", t);
}

static void put_supply(const void *record, struct text *t)
{
    put_fact(record, "supply", t);
}

static void put_abundance(const void *record, struct text *t)
{
    put_fact(record, "abundance", t);
}

/* A disagreement rests on what both of its readings rest on. */
static void put_citation(const void *record, struct text *t)
{
    const struct record *r = record;
    struct reading pair[2];
    if (!comparison_pair_readings(r->comparison, r->line, r->which, pair)) {
        cited_text(t, reading_cited(r->reading), CITATION_SHORT);
        return;
    }
    cited_text(t, reading_cited(&pair[0]), CITATION_SHORT);
    text_add(t, "; ");
    cited_text(t, reading_cited(&pair[1]), CITATION_SHORT);
}

static void put_version(const void *record, struct text *t)
{
    (void)record;
    text_add(t, OUTERSHELL_VERSION);
}

static const struct report_column columns[] = {
    {"quantity", COLUMN_TEXT, .put = put_quantity},
    {"source_kind", COLUMN_TEXT, .put = put_kind},
    {"source_id", COLUMN_TEXT, .put = put_source},
    {"definition", COLUMN_TEXT, .put = put_definition},
    {"unit", COLUMN_TEXT, .put = put_unit},
    {"z", COLUMN_NUMBER, .put = put_z},
    {"symbol", COLUMN_TEXT, .put = put_symbol},
    {"charge", COLUMN_NUMBER, .put = put_charge},
    {"coordination", COLUMN_TEXT, .put = put_coordination},
    {"spin", COLUMN_TEXT, .put = put_spin},
    {"configuration", COLUMN_TEXT, .put = put_configuration},
    {"subshell", COLUMN_TEXT, .put = put_subshell},
    {"value", COLUMN_NUMBER, .put = put_value},
    {"uncertainty", COLUMN_NUMBER, .put = put_uncertainty},
    {"evidence", COLUMN_TEXT, .put = put_evidence},
    {"difference", COLUMN_NUMBER, .put = put_difference},
    {"difference_percent", COLUMN_NUMBER, .put = put_percent},
    {"state", COLUMN_TEXT, .put = put_state},
    {"remark", COLUMN_TEXT, .put = put_remark},
    {"caution", COLUMN_TEXT, .put = put_caution},
    {"supply", COLUMN_TEXT, .put = put_supply},
    {"abundance", COLUMN_TEXT, .put = put_abundance},
    {"source", COLUMN_TEXT, .put = put_citation},
    {"version", COLUMN_TEXT, .put = put_version},
};

static const void *record_at(const void *data, size_t i, void *room)
{
    const struct comparison *c = data;
    struct record *r = room;
    size_t count = (size_t)c->count;
    *r = (struct record){.comparison = c,
                         .line = &c->lines[i / count],
                         .which = (int)(i % count)};
    r->reading = &r->line->readings[r->which];
    r->differs = comparison_difference(r->line, r->which, &r->difference);
    return r;
}

static void add_facts(struct report *report, const struct comparison *c)
{
    char ion[ION_TEXT_MAX];
    for (int w = 0; w < c->count; w++) {
        const struct species *s = &c->species[w];
        report_heading(report, "%s  %s", species_print(s, ion),
                       element_at(s->z)->name);
        for (int f = 0; f < c->fact_count; f++)
            if (c->facts[f].text[w][0] != '\0')
                report_labelled(report, FACT_INDENT, FACT_COLUMN,
                                c->facts[f].label, c->facts[f].text[w]);
        report_gap(report);
    }
}

static void add_value(struct report *report, struct report_table *table,
                      const struct comparison_line *line, int which)
{
    char buffer[2 * NUMBER_TEXT_MAX + 4];
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
    report_cell(report, table, buffer);
}

static void add_difference(struct report *report, struct report_table *table,
                           const struct comparison_line *line, int which)
{
    struct difference d = {.has_percent = false};
    bool there = comparison_difference(line, which, &d);
    report_cell_number(report, table, there, d.value.value,
                       line->unit->decimals, true);
    report_cell_number(report, table, there && d.has_percent, d.percent.value,
                       1, true);
}

/* Notes on the species 0 and from … to - 1. */
static void add_notes(struct report *report, struct report_table *table,
                      const struct comparison_line *line, int from, int to)
{
    struct report_note notes[REPORT_NOTES_MAX];
    int count = 0;
    for (int w = 0; w < to; w = w == 0 ? from : w + 1) {
        const struct reading *r = &line->readings[w];
        notes[count++] = (struct report_note){
            "", r->state == READING_OK ? r->remark : r->reason};
    }
    report_cell_notes(report, table, notes, count);
}

static struct report_table *
open_table(struct report *report, const struct comparison *c, int from, int to)
{
    char names[1 + OTHERS_MAX][ION_TEXT_MAX];
    char less[ION_TEXT_MAX + 8];
    struct table_column heads[4 + 3 * OTHERS_MAX];
    int count = 0;
    struct text t = text_over(less, sizeof less);
    text_addf(&t, "less %s", species_print(&c->species[0], names[0]));
    heads[count++] = (struct table_column){"", CELL_WORDS};
    heads[count++] = (struct table_column){"", CELL_WORDS};
    heads[count++] = (struct table_column){names[0], CELL_NUMBER};
    for (int w = from; w < to; w++) {
        char *name = names[1 + w - from];
        species_print(&c->species[w], name);
        heads[count++] = (struct table_column){name, CELL_NUMBER};
        heads[count++] = (struct table_column){less, CELL_SIGNED};
        heads[count++] = (struct table_column){"%", CELL_SIGNED};
    }
    heads[count++] = (struct table_column){"notes", CELL_WORDS};
    return report_table(report, heads, count);
}

/* A line that names quantity and unit of those below. */
static void add_quantity(struct report *report, struct report_table *table,
                         const struct comparison_line *line, int columns_used)
{
    const struct quantity *q = quantity_at(line->quantity);
    if (strcmp(line->unit->id, "1") == 0)
        report_cell(report, table, q->id);
    else
        report_cellf(report, table, "%s, %s", q->id, line->unit->id);
    for (int i = 1; i < columns_used; i++)
        report_cell(report, table, "");
}

/* The numbers of species 0 and of the species from … to - 1, which may be none.
 */
static void add_numbers(struct report *report, const struct comparison *c,
                        int from, int to)
{
    struct report_table *table = open_table(report, c, from, to);
    for (int i = 0; i < c->line_count; i++) {
        const struct comparison_line *line = &c->lines[i];
        char label[256];
        struct text t = text_over(label, sizeof label);
        if (i == 0 || line->quantity != line[-1].quantity ||
            line->unit != line[-1].unit)
            add_quantity(report, table, line, 4 + 3 * (to - from));
        text_add(&t, "  ");
        comparison_label(c, i, &t);
        report_cell(report, table, label);
        report_cell_set(report, table,
                        line->provenance->computed ? NULL : line->provenance);
        add_value(report, table, line, 0);
        for (int w = from; w < to; w++) {
            add_value(report, table, line, w);
            add_difference(report, table, line, w);
        }
        add_notes(report, table, line, from, to);
    }
}

static void add_blocks(struct report *report, const struct comparison *c)
{
    int from = 1;
    add_facts(report, c);
    do {
        int to = from + OTHERS_MAX < c->count ? from + OTHERS_MAX : c->count;
        if (from > 1)
            report_gap(report);
        add_numbers(report, c, from, to);
        from += OTHERS_MAX;
    } while (from < c->count);
    report_legends(report);
}

void report_comparison(struct report *report, unsigned parts,
                       const struct comparison *c)
{
    report->records = (struct report_records){
        .name = "comparison",
        .columns = columns,
        .column_count = sizeof columns / sizeof columns[0],
        .data = c,
        .count = (size_t)c->line_count * (size_t)c->count,
        .room_size = sizeof(struct record),
        .at = record_at,
    };
    if (parts & REPORT_BLOCKS)
        add_blocks(report, c);
    for (int i = 0; i < c->line_count && (parts & REPORT_SOURCES); i++)
        for (int w = 0; w < c->count; w++)
            report_source(report, reading_cited(&c->lines[i].readings[w]));
}
