/* SPDX-License-Identifier: MIT */
#include "export/rows.h"

#include <string.h>

#include "export/rows_text.h"

#define FIELD_TEXT_MAX 1024

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

static void put_version(const struct row *row, struct text *t)
{
    (void)row;
    text_add(t, OUTERSHELL_VERSION);
}

/* Numbers stand bare in JSON; an empty field is null there. */
static const struct {
    const char *name;
    void (*put)(const struct row *row, struct text *t);
    bool number;
} fields[] = {
    {"z", put_z, true},
    {"symbol", put_symbol, false},
    {"name", put_name, false},
    {"charge", put_charge, true},
    {"configuration", put_configuration, false},
    {"subshell", put_subshell, false},
    {"quantity", put_quantity, false},
    {"unit", put_unit, false},
    {"model", put_model, false},
    {"value", put_value, true},
    {"uncertainty", put_uncertainty, true},
    {"reference_set", put_reference_set, false},
    {"reference_value", put_reference, true},
    {"reference_uncertainty", put_reference_u, true},
    {"residual", put_residual, true},
    {"residual_percent", put_percent, true},
    {"state", put_state, false},
    {"model_source", put_model_source, false},
    {"reference_source", put_reference_source, false},
    {"version", put_version, false},
};
#define FIELD_COUNT ((int)(sizeof fields / sizeof fields[0]))

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

static void write_csv(FILE *out, const struct row *rows, size_t count)
{
    for (int f = 0; f < FIELD_COUNT; f++)
        csv_field(out, fields[f].name, f == 0);
    csv_end(out);
    for (size_t i = 0; i < count; i++) {
        for (int f = 0; f < FIELD_COUNT; f++) {
            char buffer[FIELD_TEXT_MAX];
            struct text t = text_over(buffer, sizeof buffer);
            fields[f].put(&rows[i], &t);
            csv_field(out, buffer, f == 0);
        }
        csv_end(out);
    }
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
    fprintf(out, "{\"schema\": 1, \"rows\": [");
    for (size_t i = 0; i < count; i++) {
        fputs(i ? ",\n  {" : "\n  {", out);
        for (int f = 0; f < FIELD_COUNT; f++)
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
        write_csv(out, rows, count);
    else
        write_json(out, rows, count);
    return true;
}
