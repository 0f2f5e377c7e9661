/* SPDX-License-Identifier: MIT */
/* Pinned species as columns, everything known as rows, differences against
 * the first. */
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "screens/parts.h"
#include "study/facts.h"

#define ATOM_COLUMNS 24
#define VALUE_COLUMNS 15

/* The pins, or the selection alone. */
static int compared(const struct ui *ui, struct ask asks[COMPARISON_MAX])
{
    const struct choice *c = &ui->choice;
    int count = 0;
    for (int i = 0; i < c->pin_count; i++)
        asks[count++] =
            (struct ask){.z = c->pins[i].z, .charge = c->pins[i].charge};
    if (count == 0)
        asks[count++] = (struct ask){.z = c->z, .charge = c->charge};
    for (int i = 0; i < count; i++) {
        struct ask own;
        if (ui_ask(ui, asks[i].z, asks[i].charge, &own))
            asks[i].configuration = own.configuration;
        asks[i].n = c->n;
        asks[i].l = c->l;
        asks[i].site = c->site;
    }
    return count;
}

/* The second reference less the first set shown, as `compare --against` prints
 * it. */
static bool add_second(struct ui *ui)
{
    const struct reference *against = ui->choice.against;
    struct comparison *c = &ui->comparison;
    struct status st = status_ok();
    for (int i = 0; against && i < c->line_count; i++) {
        const struct provenance *first = c->lines[i].provenance;
        if (c->lines[i].quantity != against->quantity || first->computed)
            continue;
        if (first == against->provenance ||
            comparison_add_pair(c, first, against->provenance, &st))
            return true;
        ui_report(ui, true, "%s", st.message);
        return false;
    }
    return true;
}

bool compare_refresh(struct ui *ui)
{
    struct ask asks[COMPARISON_MAX];
    struct status st = status_ok();
    if (!ui->comparison_stale)
        return ui->comparison.count > 0;
    comparison_clear(&ui->comparison);
    int count = compared(ui, asks);
    if (!study_compare(ui->study, asks, count, false, ui->choice.units,
                       &ui->comparison, &st)) {
        ui_report(ui, true, "%s", st.message);
        return false;
    }
    ui->comparison_stale = false;
    return add_second(ui);
}

/* Columns of the labels: enough for the longest id where there is room. */
static int label_columns(const struct ui *ui)
{
    return ui->columns >= 130 ? 48 : 30;
}

static int atoms_in(const struct ui *ui)
{
    int n = (ui->columns - label_columns(ui)) / ATOM_COLUMNS;
    return n > 0 ? n : 1;
}

/* Column of the i-th shown atom; the first atom always is the first column.
 */
static int atom_at(const struct ui *ui, int i)
{
    return i == 0 ? 0 : i + ui->column_scroll;
}

/* The spin that a stored radius stands for; its coordination is in the label
 * of the line. */
static void add_spin(const struct ui *ui, const struct species *species,
                     const struct reading *stored, struct text *t)
{
    char site[UI_TEXT_MAX];
    struct text s = text_over(site, sizeof site);
    stored_site_text(ui, species, stored, &s);
    for (int spin = SPIN_NONE + 1; spin < SPIN_COUNT; spin++)
        if (strstr(site, spin_word((enum spin_state)spin)))
            text_addf(t, " %s", spin_id((enum spin_state)spin));
}

static void draw_value(const struct ui *ui, struct canvas *canvas, int row,
                       int column, const struct comparison_line *line,
                       int which)
{
    char buffer[UI_TEXT_MAX];
    char out[NUMBER_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    const struct reading *r = &line->readings[which];
    struct difference d;
    if (r->state != READING_OK) {
        canvas_right(canvas, row, column, VALUE_COLUMNS, ROLE_GAP, "-");
        return;
    }
    if (!line->provenance->computed)
        reading_text(&t, r);
    if (!line->provenance->computed)
        add_spin(ui, &ui->comparison.species[which], r, &t);
    if (t.length == 0 || t.length > VALUE_COLUMNS)
        snprintf(buffer, sizeof buffer, "%s",
                 number_fit(r->value.value, line->unit->decimals, VALUE_COLUMNS,
                            out));
    canvas_right(canvas, row, column, VALUE_COLUMNS, ROLE_TEXT, buffer);
    if (!comparison_difference(line, which, &d))
        return;
    if (d.has_percent)
        snprintf(buffer, sizeof buffer, "%+.1f%%", d.percent.value);
    else
        snprintf(buffer, sizeof buffer, "%+.*f", line->unit->decimals,
                 d.value.value);
    canvas_right(canvas, row, column + VALUE_COLUMNS,
                 ATOM_COLUMNS - VALUE_COLUMNS,
                 d.value.value < 0 ? ROLE_BELOW : ROLE_ABOVE, buffer);
}

/* The label of a line, without the quantity that heads its group. */
static const char *short_label(const struct ui *ui, int line,
                               char out[UI_TEXT_MAX])
{
    struct text t = text_over(out, UI_TEXT_MAX);
    const char *quantity = quantity_at(ui->comparison.lines[line].quantity)->id;
    size_t n = strlen(quantity);
    comparison_label(&ui->comparison, line, &t);
    add_asked_site(ui, ui->comparison.lines[line].provenance, &t);
    return strncmp(out, quantity, n) == 0 && out[n] == '_' ? out + n + 1 : out;
}

static void draw_line(const struct ui *ui, struct canvas *canvas, int row,
                      int item, bool first, int atoms)
{
    char label[UI_TEXT_MAX];
    const struct comparison_line *line = &ui->comparison.lines[item];
    if (first)
        canvas_textf(canvas, row, 0, 9, ROLE_HEADING, "%s %s",
                     quantity_at(line->quantity)->symbol, line->unit->id);
    canvas_text(canvas, row, 10, label_columns(ui) - 11, ROLE_TEXT,
                short_label(ui, item, label));
    for (int i = 0; i < atoms; i++) {
        int which = atom_at(ui, i);
        if (which < ui->comparison.count)
            draw_value(ui, canvas, row, label_columns(ui) + i * ATOM_COLUMNS,
                       line, which);
    }
}

/* Facts, one row each per atom column, cut to the column. */
static void draw_fact_row(const struct ui *ui, struct canvas *canvas, int row,
                          const struct comparison_fact *fact, int atoms)
{
    canvas_text(canvas, row, 0, label_columns(ui) - 1, ROLE_HEADING,
                fact->label);
    bool caution = strcmp(fact->label, fact_label(FACT_CAUTION)) == 0;
    for (int i = 0; i < atoms; i++) {
        int which = atom_at(ui, i);
        if (which < ui->comparison.count)
            canvas_text(canvas, row, label_columns(ui) + i * ATOM_COLUMNS + 1,
                        ATOM_COLUMNS - 2, caution ? ROLE_CAUTION : ROLE_TEXT,
                        fact->text[which]);
    }
}

static void draw_atoms(const struct ui *ui, struct canvas *canvas, int atoms)
{
    char ion[ION_TEXT_MAX];
    const struct comparison *c = &ui->comparison;
    for (int i = 0; i < atoms; i++) {
        int which = atom_at(ui, i);
        int column = label_columns(ui) + i * ATOM_COLUMNS;
        if (which >= c->count)
            continue;
        ion_print(c->species[which].z, c->species[which].charge, ion);
        canvas_right(canvas, 1, column, VALUE_COLUMNS, ROLE_PIN, ion);
        if (which > 0)
            canvas_right(canvas, 1, column + VALUE_COLUMNS,
                         ATOM_COLUMNS - VALUE_COLUMNS, ROLE_HEADING,
                         "to first");
    }
    if (c->count > atoms)
        canvas_textf(canvas, 1, 0, label_columns(ui), ROLE_LABEL,
                     "%d of %d; arrows show others", atoms, c->count);
    else if (ui->choice.pin_count == 0)
        canvas_text(canvas, 1, 0, label_columns(ui), ROLE_LABEL,
                    "pin species on the map with p");
}

static void draw(struct ui *ui, struct canvas *canvas)
{
    if (!compare_refresh(ui))
        return;
    const struct comparison *c = &ui->comparison;
    int room = canvas->rows - 4;
    int total = c->fact_count + c->line_count;
    int atoms = atoms_in(ui);
    int *skip = &ui->scroll[SCREEN_COMPARE];
    if (*skip > total - room)
        *skip = total > room ? total - room : 0;
    if (ui->column_scroll > c->count - atoms)
        ui->column_scroll = c->count > atoms ? c->count - atoms : 0;
    draw_atoms(ui, canvas, atoms);
    for (int i = 0; i < room && *skip + i < total; i++) {
        int item = *skip + i - c->fact_count;
        if (item < 0) {
            draw_fact_row(ui, canvas, 2 + i, &c->facts[*skip + i], atoms);
            continue;
        }
        bool first = i == 0 || item == 0 ||
                     c->lines[item].quantity != c->lines[item - 1].quantity ||
                     c->lines[item].unit != c->lines[item - 1].unit;
        draw_line(ui, canvas, 2 + i, item, first, atoms);
    }
    canvas->cursor_row = 2;
    canvas->cursor_column = 0;
}

static enum effect update(struct ui *ui, enum action action)
{
    if (action == ACTION_LEFT && ui->column_scroll > 0)
        ui->column_scroll--;
    else if (action == ACTION_RIGHT)
        ui->column_scroll++;
    else
        return EFFECT_NONE;
    return EFFECT_REDRAW;
}

const struct screen_ops screen_compare = {"Compare", update, draw};
