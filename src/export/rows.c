/* SPDX-License-Identifier: MIT */
#include "export/rows.h"

#include <stdlib.h>
#include <string.h>

#include "export/rows_text.h"

#define FIELD_TEXT_MAX 1024
/* A field whose every byte is a quote, and all fields of a row. */
#define CITATION_TEXT_MAX (2 * FIELD_TEXT_MAX + 2)
#define LINE_TEXT_MAX (8 * CITATION_TEXT_MAX)
#define CITATIONS_MAX 16

static void put_z(const struct row *row, struct text *t)
{
    text_addf(t, "%d", row->species.z);
}

static void put_symbol(const struct row *row, struct text *t)
{
    text_add(t, element_at(row->species.z)->symbol);
}

static void put_name(const struct row *row, struct text *t)
{
    text_add(t, element_at(row->species.z)->name);
}

static void put_charge(const struct row *row, struct text *t)
{
    text_addf(t, "%d", row->species.charge);
}

static void put_configuration(const struct row *row, struct text *t)
{
    species_configuration_text(t, &row->species);
}

static void put_subshell(const struct row *row, struct text *t)
{
    char label[SUBSHELL_TEXT_MAX];
    if (row->n)
        text_add(t, subshell_print(row->n, row->l, label));
}

static void put_quantity(const struct row *row, struct text *t)
{
    text_add(t, quantity_at(row->quantity)->id);
}

static void put_unit(const struct row *row, struct text *t)
{
    text_add(t, row->unit->id);
}

static void put_id(const struct provenance *p, struct text *t)
{
    if (p)
        text_add(t, p->id);
}

static void put_number(bool there, struct number n, struct text *t, bool whole)
{
    char out[NUMBER_TEXT_MAX];
    if (there)
        text_add(t, whole ? number_print(n, out) : number_print_short(n, out));
}

static void put_model(const struct row *row, struct text *t)
{
    put_id(row->value.provenance, t);
}

static void put_value(const struct row *row, struct text *t)
{
    put_number(row->value.state == READING_OK, row->value.value, t, false);
}

static void put_uncertainty(const struct row *row, struct text *t)
{
    put_number(row->value.state == READING_OK && row->value.has_u, row->value.u,
               t, false);
}

static void put_reference_set(const struct row *row, struct text *t)
{
    put_id(row->reference.provenance, t);
}

static void put_reference(const struct row *row, struct text *t)
{
    put_number(row->reference.state == READING_OK, row->reference.value, t,
               true);
}

static void put_reference_u(const struct row *row, struct text *t)
{
    put_number(row->reference.state == READING_OK && row->reference.has_u,
               row->reference.u, t, true);
}

static void put_residual(const struct row *row, struct text *t)
{
    put_number(row->state == ROW_OK, row->residual, t, false);
}

static void put_percent(const struct row *row, struct text *t)
{
    put_number(row->state == ROW_OK && row->has_percent, row->percent, t,
               false);
}

static void put_state(const struct row *row, struct text *t)
{
    text_add(t, row_state_id(row->state));
}

static void put_model_source(const struct row *row, struct text *t)
{
    provenance_text(t, row->value.provenance);
}

static void put_reference_source(const struct row *row, struct text *t)
{
    provenance_text(t, row->reference.provenance);
}

static void put_against_set(const struct row *row, struct text *t)
{
    put_id(row->against.provenance, t);
}

static bool has_against(const struct row *row)
{
    return row->against.provenance && row->against.state == READING_OK;
}

static void put_against(const struct row *row, struct text *t)
{
    put_number(has_against(row), row->against.value, t, true);
}

static void put_against_u(const struct row *row, struct text *t)
{
    put_number(has_against(row) && row->against.has_u, row->against.u, t, true);
}

static void put_disagreement(const struct row *row, struct text *t)
{
    put_number(row->disagrees, row->disagreement, t, false);
}

static void put_disagreement_percent(const struct row *row, struct text *t)
{
    put_number(row->disagrees && row->has_disagreement_percent,
               row->disagreement_percent, t, false);
}

static void put_against_source(const struct row *row, struct text *t)
{
    provenance_text(t, row->against.provenance);
}

static void put_version(const struct row *row, struct text *t)
{
    (void)row;
    text_add(t, OUTERSHELL_VERSION);
}

static const struct provenance *model_source(const struct row *row)
{
    return row->value.provenance;
}

static const struct provenance *reference_source(const struct row *row)
{
    return row->reference.provenance;
}

static const struct provenance *against_source(const struct row *row)
{
    return row->against.provenance;
}

/* Numbers stand bare in JSON; an empty field is null there. A field of the
 * species is the same in all rows of it; source: whose citations it is. */
static const struct {
    const char *name;
    void (*put)(const struct row *row, struct text *t);
    bool number;
    bool of_species;
    const struct provenance *(*source)(const struct row *row);
} fields[] = {
    {"z", put_z, true, true, NULL},
    {"symbol", put_symbol, false, true, NULL},
    {"name", put_name, false, true, NULL},
    {"charge", put_charge, true, true, NULL},
    {"configuration", put_configuration, false, true, NULL},
    {"subshell", put_subshell, false, false, NULL},
    {"quantity", put_quantity, false, false, NULL},
    {"unit", put_unit, false, false, NULL},
    {"model", put_model, false, false, NULL},
    {"value", put_value, true, false, NULL},
    {"uncertainty", put_uncertainty, true, false, NULL},
    {"reference_set", put_reference_set, false, false, NULL},
    {"reference_value", put_reference, true, false, NULL},
    {"reference_uncertainty", put_reference_u, true, false, NULL},
    {"residual", put_residual, true, false, NULL},
    {"residual_percent", put_percent, true, false, NULL},
    {"state", put_state, false, false, NULL},
    {"model_source", put_model_source, false, false, model_source},
    {"reference_source", put_reference_source, false, false, reference_source},
    {"version", put_version, false, false, NULL},
    /* Only where a second reference was asked for. */
    {"against_set", put_against_set, false, false, NULL},
    {"against_value", put_against, true, false, NULL},
    {"against_uncertainty", put_against_u, true, false, NULL},
    {"disagreement", put_disagreement, true, false, NULL},
    {"disagreement_percent", put_disagreement_percent, true, false, NULL},
    {"against_source", put_against_source, false, false, against_source},
};
#define FIELD_COUNT 20
#define FIELD_COUNT_AGAINST ((int)(sizeof fields / sizeof fields[0]))

static int fields_of(const struct row *rows, size_t count)
{
    for (size_t i = 0; i < count; i++)
        if (rows[i].against.provenance)
            return FIELD_COUNT_AGAINST;
    return FIELD_COUNT;
}

int row_field_count(void)
{
    return FIELD_COUNT;
}

const char *row_field_name(int field)
{
    return fields[field].name;
}

void row_field_text(const struct row *row, int field, struct text *t)
{
    fields[field].put(row, t);
}

/* Citations as CSV fields, made once each: a sheet has few sources and many
 * rows. The oldest goes first. */
struct citations {
    int count, next;
    struct {
        const struct provenance *source;
        char field[CITATION_TEXT_MAX];
    } items[CITATIONS_MAX];
};

static const char *citation_field(struct citations *c,
                                  const struct provenance *source)
{
    char buffer[FIELD_TEXT_MAX];
    if (!source)
        return "";
    for (int i = 0; i < c->count; i++)
        if (c->items[i].source == source)
            return c->items[i].field;
    int at = c->next++ % CITATIONS_MAX;
    if (c->count < CITATIONS_MAX)
        c->count++;
    struct text t = text_over(buffer, sizeof buffer);
    struct text field = text_over(c->items[at].field, CITATION_TEXT_MAX);
    provenance_text(&t, source);
    csv_text(&field, buffer);
    c->items[at].source = source;
    return c->items[at].field;
}

/* The fields of one row that are of its species, or the others. */
static void put_fields(struct text *line, const struct row *row,
                       bool of_species, int count,
                       struct citations *citations)
{
    for (int f = 0; f < count; f++) {
        char buffer[FIELD_TEXT_MAX];
        struct text t = text_over(buffer, sizeof buffer);
        if (fields[f].of_species != of_species)
            continue;
        if (f > 0)
            text_add_bytes(line, ",", 1);
        if (fields[f].source) {
            text_add(line, citation_field(citations, fields[f].source(row)));
            continue;
        }
        fields[f].put(row, &t);
        csv_text(line, buffer);
    }
}

static bool write_csv(FILE *out, const struct row *rows, size_t count,
                      struct status *st)
{
    int field_count = fields_of(rows, count);
    char head[LINE_TEXT_MAX];
    char tail[LINE_TEXT_MAX];
    struct text species = text_over(head, sizeof head);
    struct citations *citations = calloc(1, sizeof *citations);
    if (!citations)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    for (int f = 0; f < field_count; f++)
        csv_field(out, fields[f].name, f == 0);
    csv_end(out);
    for (size_t i = 0; i < count; i++) {
        struct text line = text_over(tail, sizeof tail);
        /* Padding may differ where nothing else does: no harm. */
        if (i == 0 || memcmp(&rows[i].species, &rows[i - 1].species,
                             sizeof rows[i].species) != 0) {
            species = text_over(head, sizeof head);
            put_fields(&species, &rows[i], true, field_count, citations);
        }
        put_fields(&line, &rows[i], false, field_count, citations);
        text_add_bytes(&line, "\r\n", 2);
        fwrite(head, 1, species.length, out);
        fwrite(tail, 1, line.length, out);
    }
    free(citations);
    return true;
}

static void write_json_field(FILE *out, int f, const struct row *row)
{
    char buffer[FIELD_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    fields[f].put(row, &t);
    json_string(out, fields[f].name);
    fputs(": ", out);
    if (t.length == 0)
        fputs("null", out);
    else if (fields[f].number)
        fputs(buffer, out);
    else
        json_string(out, buffer);
    fputs(", ", out);
}

static void write_json(FILE *out, const struct row *rows, size_t count)
{
    int field_count = fields_of(rows, count);
    fprintf(out, "{\"schema\": 1, \"rows\": [");
    for (size_t i = 0; i < count; i++) {
        fputs(i ? ",\n  {" : "\n  {", out);
        for (int f = 0; f < field_count; f++)
            write_json_field(out, f, &rows[i]);
        fputs("\"reason\": ", out);
        json_string(out, rows[i].reason);
        fputs(", \"model_remark\": ", out);
        json_string(out, rows[i].value.remark);
        fputs(", \"reference_remark\": ", out);
        json_string(out, rows[i].reference.remark);
        fputs("}", out);
    }
    fputs("\n]}\n", out);
}

bool rows_write(FILE *out, enum export_format format, const struct row *rows,
                size_t count, struct status *st)
{
    if (format == EXPORT_TEXT)
        return rows_write_text(out, rows, count, &table_plain, st);
    if (format == EXPORT_CSV)
        return write_csv(out, rows, count, st);
    write_json(out, rows, count);
    return true;
}
