/* SPDX-License-Identifier: MIT */
/* What the user takes away: the same rows as the commands print, and the
 * command that prints them. */
#include <stdlib.h>

#include "base/array.h"
#include "base/text.h"
#include "element/subshell.h"
#include "report/audit.h"
#include "report/comparison.h"
#include "report/rows.h"
#include "report/solved.h"
#include "screens/atom.h"
#include "screens/audit.h"
#include "screens/parts.h"
#include "study/facts.h"
#include "write/format.h"

/* Rows of some species under all models, or under the chosen one. */
struct rows {
    struct row *items;
    size_t count, capacity;
};

static bool add_row(const struct ui *ui, struct rows *rows,
                    const struct ask *ask, struct status *st)
{
    if (!array_grow(&rows->items, rows->count, &rows->capacity,
                    sizeof *rows->items))
        return status_fail(st, STATUS_MEMORY, "out of memory");
    rows->items[rows->count++] = study_row(ui->study, ask);
    return true;
}

static bool add_all_models(const struct ui *ui, struct rows *rows, int z,
                           int charge, struct status *st)
{
    struct ask ask;
    bool any = false;
    if (!ui_ask(ui, z, charge, &ask))
        return true;
    for (int m = 0; m < model_count(); m++) {
        ask.model = model_at(m);
        if (model_offer_for(ask.model, ask.quantity, NULL) < 0)
            continue;
        any = true;
        if (!add_row(ui, rows, &ask, st))
            return false;
    }
    ask.model = NULL;
    return any || add_row(ui, rows, &ask, st);
}

/* Every step of the trend under every model that has a curve. */
static bool collect_trend(const struct ui *ui, struct rows *rows,
                          struct status *st)
{
    const struct trend *trend = &ui->trend;
    for (int i = 0; i < trend->walk.count; i++) {
        struct ask ask;
        if (!ui_ask(ui, trend->walk.steps[i].z, trend->walk.steps[i].charge,
                    &ask))
            continue;
        ask.model = NULL;
        if (trend->series_count == 0 && !add_row(ui, rows, &ask, st))
            return false;
        for (int s = 0; s < trend->series_count; s++) {
            ask.model = trend->series[s].model;
            if (!add_row(ui, rows, &ask, st))
                return false;
        }
    }
    return true;
}

static bool collect(const struct ui *ui, struct rows *rows, struct status *st)
{
    const struct choice *c = &ui->choice;
    struct ask ask;
    if (ui->scope == SCOPE_ROW)
        return add_all_models(ui, rows, c->z, c->charge, st);
    if (ui->scope == SCOPE_PINS) {
        for (int i = 0; i < c->pin_count; i++)
            if (!add_all_models(ui, rows, c->pins[i].z, c->pins[i].charge, st))
                return false;
        return true;
    }
    if (ui->scope == SCOPE_TREND)
        return collect_trend(ui, rows, st);
    for (int z = 1; z <= Z_MAX; z++)
        if (ui_ask(ui, z, c->charge, &ask) && !add_row(ui, rows, &ask, st))
            return false;
    return true;
}

/* Writes a report that was filled with records. */
static bool write(struct report *report, FILE *out, struct status *st)
{
    bool ok = format_write(&format_csv, out, report, &write_plain, st);
    report_clear(report);
    return ok;
}

static bool export_comparison(const struct ui *ui, FILE *out, struct status *st)
{
    /* The comparison on screen is up to date: it was drawn before. */
    struct report report;
    report_begin(&report);
    comparison_report(&report, REPORT_RECORDS, &ui->comparison);
    return write(&report, out, st);
}

static bool export_atom(const struct ui *ui, FILE *out, struct status *st)
{
    struct report report;
    const struct atom_report *atom = atom_solved(ui, SLOT_CHOSEN);
    if (!atom)
        return status_fail(st, STATUS_CONVERGENCE, "the atom is not solved");
    report_begin(&report);
    solved_report(
        &report, REPORT_RECORDS, atom, atom_run_source(atom->method.functional),
        ui_unit(ui, QUANTITY_IONIZATION), ui_unit(ui, QUANTITY_RADIUS));
    return write(&report, out, st);
}

static bool export_audit(const struct ui *ui, FILE *out, struct status *st)
{
    struct audit audit = {0};
    struct report report;
    bool ok = audit_fill(ui, &audit, st);
    report_begin(&report);
    if (ok) {
        audit_report(&report, REPORT_RECORDS, &audit, 0);
        ok = write(&report, out, st);
    }
    audit_clear(&audit);
    return ok;
}

static bool export_rows(const struct ui *ui, FILE *out, struct status *st)
{
    struct rows rows = {0};
    struct report report;
    bool ok = collect(ui, &rows, st);
    report_begin(&report);
    if (ok) {
        rows_report(&report, REPORT_RECORDS, rows.items, rows.count);
        ok = write(&report, out, st);
    }
    free(rows.items);
    return ok;
}

bool ui_export(const struct ui *ui, FILE *out, struct status *st)
{
    if (ui->scope == SCOPE_AUDIT)
        return export_audit(ui, out, st);
    if (ui->scope == SCOPE_ATOM)
        return export_atom(ui, out, st);
    if (ui->scope == SCOPE_COMPARE)
        return export_comparison(ui, out, st);
    return export_rows(ui, out, st);
}

static void add_species(struct text *t, int z, int charge)
{
    char ion[ION_TEXT_MAX];
    text_addf(t, " %s", ion_print(z, charge, ion));
}

static void add_units(const struct ui *ui, struct text *t)
{
    bool begun = false;
    for (int d = 0; d <= DIMENSION_VOLUME; d++) {
        const struct unit *unit = ui->choice.units[d];
        if (!unit || unit == unit_base((enum dimension)d))
            continue;
        text_addf(t, "%s%s", begun ? "," : " --unit ", unit->id);
        begun = true;
    }
}

static void add_data(const struct ui *ui, struct text *t)
{
    if (ui->data_option)
        text_addf(t, " %s", ui->data_option);
    text_add(t, " --format csv");
}

/* Electrons of the user's own. */
static void add_own(const struct ui *ui, struct text *t)
{
    char text[CONFIGURATION_TEXT_MAX];
    configuration_print(&ui->choice.configuration, text);
    text_addf(t, " --configuration '%s'", text);
}

static bool is_own(const struct choice *c, int z, int charge)
{
    return c->configuration.count > 0 && c->configured.z == z &&
           c->configured.charge == charge;
}

static void atom_command(const struct ui *ui, struct text *t)
{
    const struct choice *c = &ui->choice;
    text_add(t, "outershell atom");
    add_species(t, c->z, c->charge);
    if (is_own(c, c->z, c->charge))
        add_own(ui, t);
    text_addf(t, " --functional %s --relativity %s --unit %s,%s",
              functional_id(c->atom.method.functional),
              relativity_id(c->atom.method.relativity),
              ui_unit(ui, QUANTITY_RADIUS)->id,
              ui_unit(ui, QUANTITY_IONIZATION)->id);
    add_data(ui, t);
}

/* How many species the export holds, 0 for many, and whether the configured
 * one is among them. */
static int count_species(const struct ui *ui, bool *own)
{
    const struct choice *c = &ui->choice;
    *own = false;
    if (ui->scope == SCOPE_AUDIT || ui->scope == SCOPE_ATOM)
        return 0;
    if (ui->scope == SCOPE_ROW ||
        (ui->scope == SCOPE_COMPARE && c->pin_count == 0)) {
        *own = is_own(c, c->z, c->charge);
        return 1;
    }
    if (ui->scope == SCOPE_PINS || ui->scope == SCOPE_COMPARE) {
        for (int i = 0; i < c->pin_count; i++)
            *own = *own || is_own(c, c->pins[i].z, c->pins[i].charge);
        return c->pin_count;
    }
    const struct walk *walk = &ui->trend.walk;
    for (int i = 0; ui->scope == SCOPE_TREND && i < walk->count; i++)
        *own = *own || is_own(c, walk->steps[i].z, walk->steps[i].charge);
    if (ui->scope == SCOPE_SHEET)
        *own = is_own(c, c->configured.z, c->charge);
    return 0;
}

/* Whether what is exported holds an ion. */
static bool has_ion(const struct ui *ui)
{
    const struct choice *c = &ui->choice;
    const struct walk *walk = &ui->trend.walk;
    if (ui->scope == SCOPE_PINS || (ui->scope == SCOPE_COMPARE && c->pin_count))
        for (int i = 0; i < c->pin_count; i++)
            if (c->pins[i].charge != 0)
                return true;
    if (ui->scope == SCOPE_TREND)
        for (int i = 0; i < walk->count; i++)
            if (walk->steps[i].charge != 0)
                return true;
    bool one_charge = ui->scope == SCOPE_ROW || ui->scope == SCOPE_SHEET ||
                      ui->scope == SCOPE_AUDIT;
    return one_charge && c->charge != 0;
}

/* Whether a set that tells sites apart is read: the chosen one, or the default
 * one of an ion's radius. */
static bool reads_sites(const struct ui *ui)
{
    const struct choice *c = &ui->choice;
    if (c->against && reference_has_sites(c->against))
        return true;
    return c->reference ? reference_has_sites(c->reference)
                        : c->quantity == QUANTITY_RADIUS && has_ion(ui);
}

static void add_site(const struct ui *ui, struct text *t)
{
    const struct site *site = &ui->choice.site;
    if (site->coordination != COORDINATION_NONE)
        text_addf(t, " --coordination %s", coordination_id(site->coordination));
    if (site->spin != SPIN_NONE)
        text_addf(t, " --spin %s", spin_id(site->spin));
}

/* The choices that list and audit share. */
static void add_choices(const struct ui *ui, struct text *t)
{
    const struct choice *c = &ui->choice;
    char label[SUBSHELL_TEXT_MAX];
    bool begun = false;
    if (c->n)
        text_addf(t, " --subshell %s", subshell_print(c->n, c->l, label));
    if (c->reference)
        text_addf(t, " --reference %s", c->reference->provenance->id);
    if (reads_sites(ui))
        add_site(ui, t);
    if (c->against && ui->scope != SCOPE_AUDIT)
        text_addf(t, " --against %s", c->against->provenance->id);
    for (int e = 0; e < EVIDENCE_COUNT && c->evidence; e++)
        if (c->evidence >> e & 1u) {
            text_addf(t, "%s%s", begun ? "," : " --evidence ",
                      evidence_id((enum evidence)e));
            begun = true;
        }
}

/* The words that choose the steps of a walk. */
static void add_walk(const struct ui *ui, struct text *t)
{
    const struct choice *c = &ui->choice;
    const struct element *e = element_at(c->z);
    int lead = e->block == 'd' ? 1 : e->block == 'f' ? 2 : 0;
    if (c->walk == WALK_PERIOD)
        text_addf(t, " period:%d", e->period);
    else if (c->walk == WALK_BLOCK)
        text_addf(t, " block:%d%c", e->period - lead, e->block);
    else if (c->walk == WALK_ISOELECTRONIC)
        text_addf(t, " electrons:%d", c->z - c->charge);
    else if (c->walk == WALK_CHARGES)
        text_addf(t, " %s --charge all", e->symbol);
    else if (e->group)
        text_addf(t, " group:%d", e->group);
    else
        for (int i = 0; i < ui->trend.walk.count; i++)
            text_addf(t, " %s", element_at(ui->trend.walk.steps[i].z)->symbol);
    if (c->charge && c->walk < WALK_CHARGES)
        text_addf(t, " --charge %d", c->charge);
}

static void trend_command(const struct ui *ui, struct text *t)
{
    text_add(t, "outershell list");
    add_walk(ui, t);
    text_addf(t, " --quantity %s", quantity_at(ui->choice.quantity)->id);
    for (int s = 0; s < ui->trend.series_count; s++)
        text_addf(t, "%s%s", s ? "," : " --model ",
                  ui->trend.series[s].model->id);
    if (ui->trend.series_count == 0 &&
        quantity_at(ui->choice.quantity)->modelled)
        text_add(t, " --model none");
    add_choices(ui, t);
    add_units(ui, t);
    add_data(ui, t);
}

static void audit_command(const struct ui *ui, struct text *t)
{
    text_addf(t, "outershell audit --quantity %s",
              quantity_at(ui->choice.quantity)->id);
    if (ui->choice.charge)
        text_addf(t, " --charge %d", ui->choice.charge);
    add_choices(ui, t);
    add_units(ui, t);
    add_data(ui, t);
}

void ui_export_command(const struct ui *ui, struct text *t)
{
    const struct choice *c = &ui->choice;
    bool own;
    int species = count_species(ui, &own);
    if (own && species != 1)
        return;
    if (ui->scope == SCOPE_TREND || ui->scope == SCOPE_AUDIT) {
        if (ui->scope == SCOPE_TREND)
            trend_command(ui, t);
        else
            audit_command(ui, t);
        return;
    }
    if (ui->scope == SCOPE_ATOM) {
        atom_command(ui, t);
        return;
    }
    bool compare = ui->scope == SCOPE_COMPARE;
    text_add(t, compare ? "outershell compare" : "outershell list");
    if (ui->scope == SCOPE_ROW || (compare && c->pin_count == 0))
        add_species(t, c->z, c->charge);
    for (int i = 0; i < c->pin_count && (compare || ui->scope == SCOPE_PINS);
         i++)
        add_species(t, c->pins[i].z, c->pins[i].charge);
    if (!compare) {
        text_addf(t, " --quantity %s", quantity_at(c->quantity)->id);
        if (ui->scope == SCOPE_SHEET && c->model)
            text_addf(t, " --model %s", c->model->id);
        if (ui->scope == SCOPE_SHEET && c->charge)
            text_addf(t, " --charge %d", c->charge);
        add_choices(ui, t);
    } else {
        char label[SUBSHELL_TEXT_MAX];
        if (c->n)
            text_addf(t, " --subshell %s", subshell_print(c->n, c->l, label));
        if (c->against)
            text_addf(t, " --against %s", c->against->provenance->id);
        add_site(ui, t);
    }
    if (own)
        add_own(ui, t);
    add_units(ui, t);
    add_data(ui, t);
}
