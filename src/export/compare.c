/* SPDX-License-Identifier: MIT */
#include "export/compare.h"

#include <string.h>

#define FIELD_TEXT_MAX 1024

static void put_number(bool there, struct number n, struct text *t)
{
    char out[NUMBER_TEXT_MAX];
    if (there)
        text_add(t, number_print_short(n, out));
}

/* One record of the long form: a line of the comparison for one atom. */
struct record {
    const struct comparison *comparison;
    const struct comparison_line *line;
    const struct reading *reading;
    int which;
    bool differs;
    struct difference difference;
};

static void put_quantity(const struct record *r, struct text *t)
{
    text_add(t, quantity_at(r->line->quantity)->id);
}

static void put_kind(const struct record *r, struct text *t)
{
    text_add(t, r->line->provenance->computed ? "model" : "reference");
}

static void put_source(const struct record *r, struct text *t)
{
    text_add(t, r->line->provenance->id);
}

static void put_definition(const struct record *r, struct text *t)
{
    text_add(t, r->line->provenance->definition);
}

static void put_unit(const struct record *r, struct text *t)
{
    text_add(t, r->line->unit->id);
}

static void put_z(const struct record *r, struct text *t)
{
    text_addf(t, "%d", r->comparison->species[r->which].z);
}

static void put_symbol(const struct record *r, struct text *t)
{
    text_add(t, element_at(r->comparison->species[r->which].z)->symbol);
}

static void put_charge(const struct record *r, struct text *t)
{
    text_addf(t, "%d", r->comparison->species[r->which].charge);
}

static void put_configuration(const struct record *r, struct text *t)
{
    species_configuration_text(t, &r->comparison->species[r->which]);
}

static void put_subshell(const struct record *r, struct text *t)
{
    char label[SUBSHELL_TEXT_MAX];
    if (r->reading->n)
        text_add(t, subshell_print(r->reading->n, r->reading->l, label));
}

static void put_value(const struct record *r, struct text *t)
{
    char out[NUMBER_TEXT_MAX];
    if (r->reading->state != READING_OK)
        return;
    text_add(t, r->line->provenance->computed
                    ? number_print_short(r->reading->value, out)
                    : number_print(r->reading->value, out));
}

static void put_uncertainty(const struct record *r, struct text *t)
{
    char out[NUMBER_TEXT_MAX];
    if (r->reading->state == READING_OK && r->reading->has_u)
        text_add(t, number_print(r->reading->u, out));
}

static void put_difference(const struct record *r, struct text *t)
{
    put_number(r->differs, r->difference.value, t);
}

static void put_percent(const struct record *r, struct text *t)
{
    put_number(r->differs && r->difference.has_percent, r->difference.percent,
               t);
}

static void put_state(const struct record *r, struct text *t)
{
    text_add(t, reading_state_id(r->reading->state));
}

static void put_remark(const struct record *r, struct text *t)
{
    text_add(t, r->reading->state == READING_OK ? r->reading->remark
                                                : r->reading->reason);
}

static void put_evidence(const struct record *r, struct text *t)
{
    if (!r->line->provenance->computed && r->reading->state == READING_OK)
        text_add(t, evidence_id(r->reading->evidence));
}

/* A fact of the record's atom by its label. */
static void put_fact(const struct record *r, const char *label, struct text *t)
{
    const struct comparison *c = r->comparison;
    for (int f = 0; f < c->fact_count; f++)
        if (strcmp(c->facts[f].label, label) == 0)
            text_add(t, c->facts[f].text[r->which]);
}

static void put_caution(const struct record *r, struct text *t)
{
    put_fact(r, "caution", t);
}

static void put_supply(const struct record *r, struct text *t)
{
    put_fact(r, "supply", t);
}

static void put_abundance(const struct record *r, struct text *t)
{
    put_fact(r, "abundance", t);
}

static void put_citation(const struct record *r, struct text *t)
{
    provenance_text(t, r->line->provenance);
}

static void put_version(const struct record *r, struct text *t)
{
    (void)r;
    text_add(t, OUTERSHELL_VERSION);
}

static const struct {
    const char *name;
    void (*put)(const struct record *record, struct text *t);
    bool number;
} fields[] = {
    {"quantity", put_quantity, false},
    {"source_kind", put_kind, false},
    {"source_id", put_source, false},
    {"definition", put_definition, false},
    {"unit", put_unit, false},
    {"z", put_z, true},
    {"symbol", put_symbol, false},
    {"charge", put_charge, true},
    {"configuration", put_configuration, false},
    {"subshell", put_subshell, false},
    {"value", put_value, true},
    {"uncertainty", put_uncertainty, true},
    {"evidence", put_evidence, false},
    {"difference", put_difference, true},
    {"difference_percent", put_percent, true},
    {"state", put_state, false},
    {"remark", put_remark, false},
    {"caution", put_caution, false},
    {"supply", put_supply, false},
    {"abundance", put_abundance, false},
    {"source", put_citation, false},
    {"version", put_version, false},
};
#define FIELD_COUNT ((int)(sizeof fields / sizeof fields[0]))

static struct record record_at(const struct comparison *c, int line, int which)
{
    struct record r = {
        .comparison = c, .line = &c->lines[line], .which = which};
    r.reading = &r.line->readings[which];
    r.differs = comparison_difference(r.line, which, &r.difference);
    return r;
}

static void write_csv_record(FILE *out, const struct record *r)
{
    for (int f = 0; f < FIELD_COUNT; f++) {
        char buffer[FIELD_TEXT_MAX];
        struct text t = text_over(buffer, sizeof buffer);
        fields[f].put(r, &t);
        csv_field(out, buffer, f == 0);
    }
    csv_end(out);
}

static void write_json_record(FILE *out, const struct record *r)
{
    for (int f = 0; f < FIELD_COUNT; f++) {
        char buffer[FIELD_TEXT_MAX];
        struct text t = text_over(buffer, sizeof buffer);
        fields[f].put(r, &t);
        fputs(f ? ", " : "", out);
        json_string(out, fields[f].name);
        fputs(": ", out);
        if (t.length == 0)
            fputs("null", out);
        else if (fields[f].number)
            fputs(buffer, out);
        else
            json_string(out, buffer);
    }
}

static void write_records(FILE *out, enum export_format format,
                          const struct comparison *c)
{
    bool csv = format == EXPORT_CSV;
    for (int f = 0; csv && f < FIELD_COUNT; f++)
        csv_field(out, fields[f].name, f == 0);
    if (csv)
        csv_end(out);
    else
        fputs("{\"schema\": 1, \"comparison\": [", out);
    for (int i = 0; i < c->line_count; i++)
        for (int w = 0; w < c->count; w++) {
            struct record r = record_at(c, i, w);
            if (csv) {
                write_csv_record(out, &r);
                continue;
            }
            fputs(i + w ? ",\n  {" : "\n  {", out);
            write_json_record(out, &r);
            fputs("}", out);
        }
    if (!csv)
        fputs("\n]}\n", out);
}

bool compare_write(FILE *out, enum export_format format,
                   const struct comparison *comparison, struct status *st)
{
    if (format == EXPORT_TEXT)
        return compare_write_text(out, comparison, &table_plain, st);
    write_records(out, format, comparison);
    return true;
}
