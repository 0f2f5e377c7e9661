/* SPDX-License-Identifier: MIT */
#include "export/rows_text.h"

#include "element/selection.h"
#include "export/format.h"
#include "export/legend.h"

#define CELL_TEXT_MAX 256

static const char *origin_note(enum configuration_origin origin)
{
    switch (origin) {
    case ORIGIN_PREDICTED:
        return "the ground configuration is a prediction";
    case ORIGIN_RULE:
        return "configuration by rule: electrons go from the highest n, then "
               "the highest l";
    case ORIGIN_USER:
        return "configuration as given";
    case ORIGIN_STORED:
        break;
    }
    return "";
}

static void add_number(struct table *table, bool there, double value,
                       int places, bool with_sign)
{
    char out[NUMBER_TEXT_MAX];
    if (!there) {
        table_cell(table, "-");
        return;
    }
    number_print_places(value, places, out);
    bool plus = with_sign && value > 0.0;
    table_cellf(table, "%s%s", plus ? "+" : "", out);
}

static void add_reference(struct table *table, struct legend *legend,
                          const struct row *row)
{
    char buffer[CELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    if (row->reference.state == READING_OK)
        reading_text(&t, &row->reference);
    table_cell(table, t.length ? buffer : "-");
    t = text_over(buffer, sizeof buffer);
    if (row->reference.provenance)
        legend_set(legend, row->reference.provenance, &t);
    table_cell(table, buffer);
}

static void add_notes(struct table *table, struct legend *legend,
                      const struct row *row)
{
    char buffer[CELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    bool unlike = row->state == ROW_OK && !row->like_with_like;
    bool stored = row->reference.state == READING_OK;
    const struct note notes[] = {
        {"", row->reason},
        {"", row->value.remark},
        {"not like with like; the reference is: ",
         unlike ? row->reference.provenance->definition : ""},
        {"reference: ", stored ? row->reference.remark : ""},
        {"", origin_note(row->species.origin)},
    };
    legend_notes(legend, notes, sizeof notes / sizeof notes[0], &t);
    table_cell(table, buffer);
}

static void add_row(struct table *table, struct legend *legend,
                    const struct row *row)
{
    char ion[ION_TEXT_MAX];
    char shell[SUBSHELL_TEXT_MAX];
    int places = row->unit->decimals;
    bool compared = row->state == ROW_OK;
    table_cell(table, ion_print(row->species.z, row->species.charge, ion));
    table_cell(table, quantity_at(row->quantity)->id);
    table_cell(table, row->n ? subshell_print(row->n, row->l, shell) : "");
    table_cell(table, row->value.provenance ? row->value.provenance->id : "-");
    add_number(table, row->value.state == READING_OK, row->value.value.value,
               places, false);
    add_reference(table, legend, row);
    add_number(table, compared, row->residual.value, places, true);
    add_number(table, compared && row->has_percent, row->percent.value, 1,
               true);
    table_cell(table, row->unit->id);
    add_notes(table, legend, row);
}

bool rows_write_text(FILE *out, const struct row *rows, size_t count,
                     const struct table_style *style, struct status *st)
{
    static const char *const heading[] = {
        "species", "quantity", "shell", "model", "value", "reference",
        "set",     "residual", "%",     "unit",  "notes"};
    struct legend legend = {0};
    struct table table = table_new("llllrrlssll");
    for (size_t i = 0; i < sizeof heading / sizeof heading[0]; i++)
        table_cell(&table, heading[i]);
    for (size_t i = 0; i < count; i++)
        add_row(&table, &legend, &rows[i]);
    bool ok = table_write_styled(&table, out, style, st);
    if (ok && legend.failed)
        ok = status_fail(st, STATUS_MEMORY, "out of memory");
    if (ok)
        legend_write(&legend, "Reference sets", out);
    else
        legend_free(&legend);
    return ok;
}
