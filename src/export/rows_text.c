/* SPDX-License-Identifier: MIT */
#include "export/rows_text.h"

#include <string.h>

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

static void add_stored(struct table *table, struct legend *legend,
                       const struct reading *stored)
{
    char buffer[CELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    if (stored->provenance && stored->state == READING_OK)
        reading_text(&t, stored);
    table_cell(table, t.length ? buffer : "-");
    t = text_over(buffer, sizeof buffer);
    if (stored->provenance)
        legend_set(legend, stored->provenance, &t);
    table_cell(table, buffer);
}

static void add_notes(struct table *table, struct legend *legend,
                      const struct row *row)
{
    char buffer[CELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    bool unlike = row->state == ROW_OK && !row->like_with_like;
    bool stored = row->reference.state == READING_OK;
    bool second = row->against.provenance && row->against.state == READING_OK;
    /* Where two sets are set against each other no model is missed. */
    bool sets = row->state == ROW_REFERENCE_ONLY && row->against.provenance;
    const struct note notes[] = {
        {"", sets ? "" : row->reason},
        {"", row->value.remark},
        {"not like with like; the reference is: ",
         unlike ? row->reference.provenance->definition : ""},
        {"", row->state == ROW_OK && row->repeats
                 ? "the reference is the same calculation, published"
                 : ""},
        {"reference: ", stored ? row->reference.remark : ""},
        {"second: ",
         row->against.provenance && !second ? row->against.reason : ""},
        {"second: ", second ? row->against.remark : ""},
        {"not like with like; the second is: ",
         row->against.provenance && row->reference.provenance &&
                 strcmp(row->against.provenance->definition,
                        row->reference.provenance->definition) != 0
             ? row->against.provenance->definition
             : ""},
        {"", origin_note(row->species.origin)},
    };
    legend_notes(legend, notes, sizeof notes / sizeof notes[0], &t);
    table_cell(table, buffer);
}

/* Which columns a table of rows needs. */
struct columns {
    bool models;  /* some row has a model */
    bool against; /* some row has a second reference */
};

static struct columns columns_of(const struct row *rows, size_t count)
{
    struct columns c = {false, false};
    for (size_t i = 0; i < count; i++) {
        c.models = c.models || rows[i].value.provenance;
        c.against = c.against || rows[i].against.provenance;
    }
    c.models = c.models || !c.against;
    return c;
}

static void add_row(struct table *table, struct legend *legend,
                    const struct row *row, struct columns columns)
{
    char ion[ION_TEXT_MAX];
    char shell[SUBSHELL_TEXT_MAX];
    int places = row->unit->decimals;
    bool compared = row->state == ROW_OK;
    table_cell(table, ion_print(row->species.z, row->species.charge, ion));
    table_cell(table, quantity_at(row->quantity)->id);
    table_cell(table, row->n ? subshell_print(row->n, row->l, shell) : "");
    if (columns.models) {
        table_cell(table,
                   row->value.provenance ? row->value.provenance->id : "-");
        add_number(table, row->value.state == READING_OK,
                   row->value.value.value, places, false);
    }
    add_stored(table, legend, &row->reference);
    if (columns.models) {
        add_number(table, compared, row->residual.value, places, true);
        add_number(table, compared && row->has_percent, row->percent.value, 1,
                   true);
    }
    if (columns.against) {
        add_stored(table, legend, &row->against);
        add_number(table, row->disagrees, row->disagreement.value, places,
                   true);
        add_number(table, row->disagrees && row->has_disagreement_percent,
                   row->disagreement_percent.value, 1, true);
    }
    table_cell(table, row->unit->id);
    add_notes(table, legend, row);
}

/* Heading and alignment of the columns of a table of rows. */
static struct table open_table(struct columns columns)
{
    static const struct {
        const char *name;
        char alignment;
        bool models, against;
    } heads[] = {
        {"species", 'l', false, false}, {"quantity", 'l', false, false},
        {"shell", 'l', false, false},   {"model", 'l', true, false},
        {"value", 'r', true, false},    {"reference", 'r', false, false},
        {"set", 'l', false, false},     {"residual", 's', true, false},
        {"%", 's', true, false},        {"second", 'r', false, true},
        {"set", 'l', false, true},      {"disagreement", 's', false, true},
        {"%", 's', false, true},        {"unit", 'l', false, false},
        {"notes", 'l', false, false},
    };
    const char *names[sizeof heads / sizeof heads[0]];
    char alignment[sizeof heads / sizeof heads[0] + 1] = "";
    size_t count = 0;
    for (size_t i = 0; i < sizeof heads / sizeof heads[0]; i++) {
        if ((heads[i].models && !columns.models) ||
            (heads[i].against && !columns.against))
            continue;
        names[count] = heads[i].name;
        alignment[count++] = heads[i].alignment;
    }
    struct table table = table_new(alignment);
    for (size_t i = 0; i < count; i++)
        table_cell(&table, names[i]);
    return table;
}

bool rows_write_text(FILE *out, const struct row *rows, size_t count,
                     const struct table_style *style, struct status *st)
{
    struct legend legend = {0};
    struct columns columns = columns_of(rows, count);
    struct table table = open_table(columns);
    for (size_t i = 0; i < count; i++)
        add_row(&table, &legend, &rows[i], columns);
    bool ok = table_write_styled(&table, out, style, st);
    if (ok && legend.failed)
        ok = status_fail(st, STATUS_MEMORY, "out of memory");
    if (ok)
        legend_write(&legend, "Reference sets", out);
    else
        legend_free(&legend);
    return ok;
}
