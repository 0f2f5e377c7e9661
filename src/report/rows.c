/* SPDX-License-Identifier: MIT */
#include "report/rows.h"

#include <string.h>

#include "element/selection.h"

static void put_z(const void *record, struct text *t)
{
    const struct row *row = record;
    text_addf(t, "%d", row->species.z);
}

static void put_symbol(const void *record, struct text *t)
{
    const struct row *row = record;
    text_add(t, element_at(row->species.z)->symbol);
}

static void put_name(const void *record, struct text *t)
{
    const struct row *row = record;
    text_add(t, element_at(row->species.z)->name);
}

static void put_charge(const void *record, struct text *t)
{
    const struct row *row = record;
    text_addf(t, "%d", row->species.charge);
}

/* The site of the reference value, of which the row speaks; where it has none,
 * that which was asked about. */
static struct site site_of(const struct row *row)
{
    return reading_site(&row->reference, row->species.site);
}

static void put_coordination(const void *record, struct text *t)
{
    text_add(t, coordination_id(site_of(record).coordination));
}

static void put_spin(const void *record, struct text *t)
{
    text_add(t, spin_id(site_of(record).spin));
}

static void put_configuration(const void *record, struct text *t)
{
    const struct row *row = record;
    species_configuration_text(t, &row->species);
}

static void put_subshell(const void *record, struct text *t)
{
    const struct row *row = record;
    char label[SUBSHELL_TEXT_MAX];
    if (row->n)
        text_add(t, subshell_print(row->n, row->l, label));
}

static void put_quantity(const void *record, struct text *t)
{
    const struct row *row = record;
    text_add(t, quantity_at(row->quantity)->id);
}

static void put_unit(const void *record, struct text *t)
{
    const struct row *row = record;
    text_add(t, row->unit->id);
}

static void put_id(const struct provenance *p, struct text *t)
{
    if (p)
        text_add(t, p->id);
}

static void put_number(bool there, struct number n, struct text *t)
{
    char out[NUMBER_TEXT_MAX];
    if (there)
        text_add(t, number_print_short(n, out));
}

/* With all digits of its source. */
static void put_stored(bool there, struct number n, struct text *t)
{
    char out[NUMBER_TEXT_MAX];
    if (there)
        text_add(t, number_print(n, out));
}

static void put_model(const void *record, struct text *t)
{
    const struct row *row = record;
    put_id(row->value.provenance, t);
}

static void put_value(const void *record, struct text *t)
{
    const struct row *row = record;
    put_number(row->value.state == READING_OK, row->value.value, t);
}

static void put_uncertainty(const void *record, struct text *t)
{
    const struct row *row = record;
    put_number(row->value.state == READING_OK && row->value.has_u, row->value.u,
               t);
}

/* The uncertainties that are stored or computed are all of one kind. */
static void put_uncertainty_kind(const void *record, struct text *t)
{
    const struct row *row = record;
    if (row->value.state == READING_OK && row->value.has_u)
        text_add(t, "standard");
}

static void put_definition_of(const struct provenance *p, struct text *t)
{
    if (p)
        text_add(t, p->definition->text);
}

static void put_definition(const void *record, struct text *t)
{
    put_definition_of(((const struct row *)record)->value.provenance, t);
}

static void put_reference_definition(const void *record, struct text *t)
{
    put_definition_of(((const struct row *)record)->reference.provenance, t);
}

/* Of a value that is there, also of one that was left out for its kind. */
static void put_reference_kind(const void *record, struct text *t)
{
    const struct row *row = record;
    if (row->reference.state == READING_OK ||
        row->reference.evidence != EVIDENCE_UNSTATED)
        text_add(t, evidence_id(row->reference.evidence));
}

/* No stored value is suspected yet. */
static void put_suspect(const void *record, struct text *t)
{
    (void)record;
    (void)t;
}

static void put_reference_set(const void *record, struct text *t)
{
    const struct row *row = record;
    put_id(row->reference.provenance, t);
}

static void put_reference(const void *record, struct text *t)
{
    const struct row *row = record;
    put_stored(row->reference.state == READING_OK, row->reference.value, t);
}

static void put_reference_u(const void *record, struct text *t)
{
    const struct row *row = record;
    put_stored(row->reference.state == READING_OK && row->reference.has_u,
               row->reference.u, t);
}

static void put_residual(const void *record, struct text *t)
{
    const struct row *row = record;
    put_number(row->state == ROW_OK, row->residual, t);
}

static void put_percent(const void *record, struct text *t)
{
    const struct row *row = record;
    put_number(row->state == ROW_OK && row->has_percent, row->percent, t);
}

static void put_state(const void *record, struct text *t)
{
    const struct row *row = record;
    text_add(t, row_state_id(row->state));
}

static void put_against_set(const void *record, struct text *t)
{
    const struct row *row = record;
    put_id(row->against.provenance, t);
}

static bool has_against(const struct row *row)
{
    return row->against.provenance && row->against.state == READING_OK;
}

static void put_against(const void *record, struct text *t)
{
    const struct row *row = record;
    put_stored(has_against(row), row->against.value, t);
}

static void put_against_u(const void *record, struct text *t)
{
    const struct row *row = record;
    put_stored(has_against(row) && row->against.has_u, row->against.u, t);
}

static void put_disagreement(const void *record, struct text *t)
{
    const struct row *row = record;
    put_number(row->disagrees, row->disagreement, t);
}

static void put_disagreement_percent(const void *record, struct text *t)
{
    const struct row *row = record;
    put_number(row->disagrees && row->has_disagreement_percent,
               row->disagreement_percent, t);
}

static void put_version(const void *record, struct text *t)
{
    (void)record;
    text_add(t, OUTERSHELL_VERSION);
}

/* Why there is no residual, and what is to be known of the two values. */
static void put_note(const void *record, struct text *t)
{
    const struct row *row = record;
    const char *const parts[] = {row->reason, row->value.remark,
                                 row->reference.remark};
    bool begun = false;
    for (size_t i = 0; i < sizeof parts / sizeof parts[0]; i++)
        if (parts[i][0] != '\0') {
            text_add(t, begun ? "; " : "");
            text_add(t, parts[i]);
            begun = true;
        }
}

static struct cited_source model_source(const void *record)
{
    return reading_cited(&((const struct row *)record)->value);
}

static struct cited_source reference_source(const void *record)
{
    return reading_cited(&((const struct row *)record)->reference);
}

static struct cited_source against_source(const void *record)
{
    return reading_cited(&((const struct row *)record)->against);
}

#define TEXT .kind = COLUMN_TEXT
#define NUMBER .kind = COLUMN_NUMBER
#define OF_SPECIES .repeats = true

const struct report_column report_rows_columns[] = {
    {"z", NUMBER, .put = put_z, OF_SPECIES},
    {"symbol", TEXT, .put = put_symbol, OF_SPECIES},
    {"name", TEXT, .put = put_name, OF_SPECIES},
    {"charge", NUMBER, .put = put_charge, OF_SPECIES},
    {"coordination", TEXT, .put = put_coordination},
    {"spin", TEXT, .put = put_spin},
    {"configuration", TEXT, .put = put_configuration, OF_SPECIES},
    {"subshell", TEXT, .put = put_subshell},
    {"quantity", TEXT, .put = put_quantity},
    {"unit", TEXT, .put = put_unit},
    {"model", TEXT, .put = put_model},
    {"definition", TEXT, .put = put_definition},
    {"value", NUMBER, .put = put_value},
    {"uncertainty", NUMBER, .put = put_uncertainty},
    {"uncertainty_kind", TEXT, .put = put_uncertainty_kind},
    {"state", TEXT, .put = put_state},
    {"note", TEXT, .put = put_note},
    {"reference_set", TEXT, .put = put_reference_set},
    {"reference_definition", TEXT, .put = put_reference_definition},
    {"reference_kind", TEXT, .put = put_reference_kind},
    {"reference_value", NUMBER, .put = put_reference},
    {"reference_uncertainty", NUMBER, .put = put_reference_u},
    {"residual", NUMBER, .put = put_residual},
    {"residual_percent", NUMBER, .put = put_percent},
    {"suspect", TEXT, .put = put_suspect},
    {"model_source", TEXT, .source = model_source},
    {"reference_source", TEXT, .source = reference_source},
    {"version", TEXT, .put = put_version},
    /* Only where a second reference was asked for. */
    {"against_set", TEXT, .put = put_against_set},
    {"against_value", NUMBER, .put = put_against},
    {"against_uncertainty", NUMBER, .put = put_against_u},
    {"disagreement", NUMBER, .put = put_disagreement},
    {"disagreement_percent", NUMBER, .put = put_disagreement_percent},
    {"against_source", TEXT, .source = against_source},
};
#define COLUMNS_AGAINST 6
#define COLUMNS_ALL                                                            \
    ((int)(sizeof report_rows_columns / sizeof report_rows_columns[0]))

static const void *row_at(const void *data, size_t i, void *room)
{
    (void)room;
    return (const struct row *)data + i;
}

static bool same_species(const void *a, const void *b)
{
    const struct row *first = a;
    const struct row *second = b;
    /* Padding may differ where nothing else does: no harm. */
    return memcmp(&first->species, &second->species, sizeof first->species) ==
           0;
}

/* Which parts of the table some row needs. */
struct shown {
    bool models;  /* some row has a model */
    bool against; /* some row has a second reference */
};

static struct shown shown_of(const struct row *rows, size_t count)
{
    struct shown s = {false, false};
    for (size_t i = 0; i < count; i++) {
        s.models = s.models || rows[i].value.provenance;
        s.against = s.against || rows[i].against.provenance;
    }
    s.models = s.models || !s.against;
    return s;
}

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

static void add_stored(struct report *r, struct report_table *table,
                       const struct reading *stored)
{
    char buffer[2 * NUMBER_TEXT_MAX + 4];
    struct text t = text_over(buffer, sizeof buffer);
    if (stored->provenance && stored->state == READING_OK)
        reading_text(&t, stored);
    report_cell(r, table, t.length ? buffer : "-");
    report_cell_set(r, table, stored->provenance);
}

static void add_notes(struct report *r, struct report_table *table,
                      const struct row *row)
{
    bool unlike = row->state == ROW_OK && !row->like_with_like;
    bool stored = row->reference.state == READING_OK;
    bool second = has_against(row);
    /* Where two sets are set against each other no model is missed. */
    bool sets = row->state == ROW_REFERENCE_ONLY && row->against.provenance;
    const struct report_note notes[] = {
        {"", sets ? "" : row->reason},
        {"", row->value.remark},
        {"not like with like; the reference is: ",
         unlike ? provenance_definition(row->reference.provenance) : ""},
        {"", row->state == ROW_OK && row->repeats
                 ? "the reference is the same calculation, published"
                 : ""},
        {"reference: ", stored ? row->reference.remark : ""},
        {"second: ",
         row->against.provenance && !second ? row->against.reason : ""},
        {"second: ", second ? row->against.remark : ""},
        {"not like with like; the second is: ",
         row->against.provenance && row->reference.provenance &&
                 row->against.provenance->definition !=
                     row->reference.provenance->definition
             ? provenance_definition(row->against.provenance)
             : ""},
        {"", origin_note(row->species.origin)},
    };
    report_cell_notes(r, table, notes, sizeof notes / sizeof notes[0]);
}

static void add_row(struct report *r, struct report_table *table,
                    const struct row *row, struct shown shown)
{
    char ion[ION_TEXT_MAX];
    char shell[SUBSHELL_TEXT_MAX];
    int places = row->unit->decimals;
    bool compared = row->state == ROW_OK;
    report_cell(r, table, species_print(&row->species, ion));
    report_cell(r, table, quantity_at(row->quantity)->id);
    report_cell(r, table, row->n ? subshell_print(row->n, row->l, shell) : "");
    if (shown.models) {
        report_cell(r, table,
                    row->value.provenance ? row->value.provenance->id : "-");
        report_cell_number(r, table, row->value.state == READING_OK,
                           row->value.value.value, places, false);
    }
    add_stored(r, table, &row->reference);
    if (shown.models) {
        report_cell_number(r, table, compared, row->residual.value, places,
                           true);
        report_cell_number(r, table, compared && row->has_percent,
                           row->percent.value, 1, true);
    }
    if (shown.against) {
        add_stored(r, table, &row->against);
        report_cell_number(r, table, row->disagrees, row->disagreement.value,
                           places, true);
        report_cell_number(r, table,
                           row->disagrees && row->has_disagreement_percent,
                           row->disagreement_percent.value, 1, true);
    }
    report_cell(r, table, row->unit->id);
    add_notes(r, table, row);
}

/* The table with the columns that are needed. */
static struct report_table *open_table(struct report *r, struct shown shown)
{
    static const struct {
        struct table_column column;
        bool models, against;
    } heads[] = {
        {{"species", CELL_WORDS}, false, false},
        {{"quantity", CELL_WORDS}, false, false},
        {{"shell", CELL_WORDS}, false, false},
        {{"model", CELL_WORDS}, true, false},
        {{"value", CELL_NUMBER}, true, false},
        {{"reference", CELL_NUMBER}, false, false},
        {{"set", CELL_WORDS}, false, false},
        {{"residual", CELL_SIGNED}, true, false},
        {{"%", CELL_SIGNED}, true, false},
        {{"second", CELL_NUMBER}, false, true},
        {{"set", CELL_WORDS}, false, true},
        {{"disagreement", CELL_SIGNED}, false, true},
        {{"%", CELL_SIGNED}, false, true},
        {{"unit", CELL_WORDS}, false, false},
        {{"notes", CELL_WORDS}, false, false},
    };
    struct table_column columns[sizeof heads / sizeof heads[0]];
    int count = 0;
    for (size_t i = 0; i < sizeof heads / sizeof heads[0]; i++)
        if ((shown.models || !heads[i].models) &&
            (shown.against || !heads[i].against))
            columns[count++] = heads[i].column;
    return report_table(r, columns, count);
}

static void add_blocks(struct report *r, const struct row *rows, size_t count,
                       struct shown shown)
{
    struct report_table *table = open_table(r, shown);
    for (size_t i = 0; i < count; i++)
        add_row(r, table, &rows[i], shown);
    report_legends(r);
}

void report_rows(struct report *report, unsigned parts, const struct row *rows,
                 size_t count)
{
    struct shown shown = shown_of(rows, count);
    report->records = (struct report_records){
        .name = "rows",
        .columns = report_rows_columns,
        .column_count = COLUMNS_ALL - (shown.against ? 0 : COLUMNS_AGAINST),
        .data = rows,
        .count = count,
        .at = row_at,
        .same_group = same_species,
    };
    if (parts & REPORT_BLOCKS)
        add_blocks(report, rows, count, shown);
    for (size_t i = 0; i < count && (parts & REPORT_SOURCES); i++) {
        report_source(report, reading_cited(&rows[i].value));
        report_source(report, reading_cited(&rows[i].reference));
        report_source(report, reading_cited(&rows[i].against));
    }
}
