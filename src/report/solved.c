/* SPDX-License-Identifier: MIT */
#include "report/solved.h"

#include <stddef.h>

#include "base/number.h"
#include "element/selection.h"

#define ENERGY_PLACES 7 /* 1e-7 hartree */
#define DIGITS 9        /* of all other numbers, at least */

/* Places for people, beyond what a screen shows. */
#define ENERGY_PLACES_MORE 3
#define LENGTH_PLACES_MORE 1
#define LINE_TEXT_MAX 320

/* What the unit of a number follows. */
enum number_kind { KIND_ENERGY, KIND_LENGTH, KIND_CHARGE, KIND_COUNT };

/* Quantities of the whole atom, and of a level: one record each. */
struct number_row {
    const char *name;
    enum number_kind kind;
    size_t offset; /* of the double in its struct */
};

static const struct number_row totals[] = {
    {"etot", KIND_ENERGY, offsetof(struct atom_report, etot)},
    {"ekin", KIND_ENERGY, offsetof(struct atom_report, ekin)},
    {"ecoul", KIND_ENERGY, offsetof(struct atom_report, ecoul)},
    {"eenuc", KIND_ENERGY, offsetof(struct atom_report, eenuc)},
    {"exc", KIND_ENERGY, offsetof(struct atom_report, exc)},
};

static const struct number_row numbers[] = {
    {"eigenvalue", KIND_ENERGY, offsetof(struct report_level, energy)},
    {"occupation", KIND_COUNT, offsetof(struct report_level, occ)},
    {"mean_radius", KIND_LENGTH, offsetof(struct report_level, mean_radius)},
    {"peak_radius", KIND_LENGTH, offsetof(struct report_level, peak_radius)},
    {"zeff_energy", KIND_CHARGE, offsetof(struct report_level, zeff_energy)},
    {"zeff_radius", KIND_CHARGE, offsetof(struct report_level, zeff_radius)},
    {"zeff_enclosed", KIND_CHARGE,
     offsetof(struct report_level, zeff_enclosed)},
};

#define COUNT(array) (sizeof(array) / sizeof(array)[0])

/* An atom and the units that it is written in. */
struct solved {
    const struct atom_report *atom;
    const struct unit *energy, *length;
};

/* level: NULL for a number of the whole atom. */
struct record {
    const struct solved *solved;
    const struct number_row *row;
    const struct report_level *level;
    double value;
};

static double number_at(const void *base, size_t offset)
{
    return *(const double *)((const char *)base + offset);
}

static const void *record_at(const void *data, size_t i, void *room)
{
    const struct solved *s = data;
    struct record *r = room;
    if (i < COUNT(totals)) {
        *r = (struct record){s, &totals[i], NULL,
                             number_at(s->atom, totals[i].offset)};
        return r;
    }
    i -= COUNT(totals);
    const struct report_level *level = &s->atom->levels[i / COUNT(numbers)];
    const struct number_row *row = &numbers[i % COUNT(numbers)];
    *r = (struct record){s, row, level, number_at(level, row->offset)};
    return r;
}

static const struct atom_report *atom_of(const void *record)
{
    return ((const struct record *)record)->solved->atom;
}

static void put_z(const void *record, struct text *t)
{
    text_addf(t, "%d", atom_of(record)->species.z);
}

static void put_symbol(const void *record, struct text *t)
{
    text_add(t, element_at(atom_of(record)->species.z)->symbol);
}

static void put_charge(const void *record, struct text *t)
{
    text_addf(t, "%d", atom_of(record)->species.charge);
}

static void put_configuration(const void *record, struct text *t)
{
    species_configuration_text(t, &atom_of(record)->species);
}

static void put_functional(const void *record, struct text *t)
{
    text_add(t, functional_id(atom_of(record)->method.functional));
}

static void put_relativity(const void *record, struct text *t)
{
    text_add(t, relativity_id(atom_of(record)->method.relativity));
}

static void put_quantity(const void *record, struct text *t)
{
    text_add(t, ((const struct record *)record)->row->name);
}

static void put_subshell(const void *record, struct text *t)
{
    const struct record *r = record;
    char label[LEVEL_TEXT_MAX];
    if (r->level)
        text_add(t, level_print(r->level, label));
}

static void put_spin(const void *record, struct text *t)
{
    const struct record *r = record;
    if (r->level)
        text_add(t, level_spin_text(r->level->spin));
}

/* A number in its unit, with the places that belong to it. */
static void put_value(const void *record, struct text *t)
{
    const struct record *r = record;
    char out[NUMBER_TEXT_MAX];
    double value = r->value;
    switch (r->row->kind) {
    case KIND_ENERGY:
        value *= HARTREE_EV * r->solved->energy->per_base;
        text_add(t,
                 number_print(number_round(value, DIGITS, ENERGY_PLACES), out));
        return;
    case KIND_LENGTH:
        value *= BOHR_PM * r->solved->length->per_base;
        break;
    case KIND_CHARGE:
        break;
    case KIND_COUNT:
        text_add(t, number_print_short(number_round(value, DIGITS, 0), out));
        return;
    }
    text_add(t, number_print(number_round(value, DIGITS, 0), out));
}

static void put_unit(const void *record, struct text *t)
{
    const struct record *r = record;
    switch (r->row->kind) {
    case KIND_ENERGY:
        text_add(t, r->solved->energy->id);
        return;
    case KIND_LENGTH:
        text_add(t, r->solved->length->id);
        return;
    case KIND_CHARGE:
        text_add(t, "e");
        return;
    case KIND_COUNT:
        break;
    }
    text_add(t, "electrons");
}

static const struct report_column columns[] = {
    {"z", COLUMN_NUMBER, .put = put_z},
    {"symbol", COLUMN_TEXT, .put = put_symbol},
    {"charge", COLUMN_NUMBER, .put = put_charge},
    {"configuration", COLUMN_TEXT, .put = put_configuration},
    {"functional", COLUMN_TEXT, .put = put_functional},
    {"relativity", COLUMN_TEXT, .put = put_relativity},
    {"quantity", COLUMN_TEXT, .put = put_quantity},
    {"subshell", COLUMN_TEXT, .put = put_subshell},
    {"spin", COLUMN_TEXT, .put = put_spin},
    {"value", COLUMN_NUMBER, .put = put_value},
    {"unit", COLUMN_TEXT, .put = put_unit},
};

static void add_members(struct report *report, const struct atom_report *a)
{
    char out[NUMBER_TEXT_MAX];
    bool dirac = a->method.relativity == RELATIVITY_DIRAC;
    report_member(report, "state", COLUMN_TEXT, "ok");
    report_member(report, "reason", COLUMN_TEXT, "%s", "");
    report_member(report, "cycles", COLUMN_NUMBER, "%d", a->cycles);
    report_member(report, "residual", COLUMN_NUMBER, "%s",
                  number_print_short(number_round(a->residual, 3, 0), out));
    report_member(
        report, "speed_of_light", COLUMN_NUMBER, "%s",
        dirac ? number_print_short(number_round(a->speed_of_light, 15, 0), out)
              : "");
    report_member(report, "version", COLUMN_TEXT, "%s", OUTERSHELL_VERSION);
}

/* ---- The form for people ---- */

static void energy_cell(struct report *report, struct report_table *table,
                        double hartree, const struct solved *s)
{
    report_cell_number(report, table, true,
                       hartree * HARTREE_EV * s->energy->per_base,
                       s->energy->decimals + ENERGY_PLACES_MORE, false);
}

static void length_cell(struct report *report, struct report_table *table,
                        double bohr, const struct solved *s)
{
    report_cell_number(report, table, true,
                       bohr * BOHR_PM * s->length->per_base,
                       s->length->decimals + LENGTH_PLACES_MORE, false);
}

static void count_cell(struct report *report, struct report_table *table,
                       double electrons)
{
    char out[NUMBER_TEXT_MAX];
    report_cell(report, table,
                number_print_short(number_round(electrons, 1, 4), out));
}

static void add_head(struct report *report, const struct atom_report *a)
{
    const struct element *e = element_at(a->species.z);
    char ion[ION_TEXT_MAX];
    char line[LINE_TEXT_MAX];
    struct text t = text_over(line, sizeof line);
    text_addf(&t, "%s  %s, Z = %d   ", ion_print(e->z, a->species.charge, ion),
              e->name, e->z);
    species_configuration_text(&t, &a->species);
    if (a->species.origin == ORIGIN_USER)
        text_add(&t, " (given)");
    report_line(report, line);
    t = text_over(line, sizeof line);
    text_addf(&t, "%s, %s", functional_title(a->method.functional),
              relativity_title(a->method.relativity));
    if (a->method.relativity == RELATIVITY_DIRAC)
        text_addf(&t, " with c = %.12g", a->speed_of_light);
    report_line(report, line);
    t = text_over(line, sizeof line);
    text_addf(&t, "converged in %d cycles, residual %.1e electrons", a->cycles,
              a->residual);
    report_line(report, line);
    report_gap(report);
}

static void add_energies(struct report *report, const struct solved *s)
{
    static const char *const names[] = {
        "total", "kinetic", "electrons among themselves",
        "electrons and nucleus", "exchange and correlation"};
    const struct table_column heads[] = {
        {"energy", CELL_WORDS}, {"", CELL_WORDS}, {s->energy->id, CELL_NUMBER}};
    struct report_table *table = report_table(report, heads, COUNT(heads));
    for (size_t i = 0; i < COUNT(totals); i++) {
        report_cell(report, table, names[i]);
        report_cell(report, table, totals[i].name);
        energy_cell(report, table, number_at(s->atom, totals[i].offset), s);
    }
    report_gap(report);
}

static void add_subshells(struct report *report, const struct solved *s)
{
    static const struct table_column heads[] = {
        {"shell", CELL_WORDS},     {"electrons", CELL_NUMBER},
        {"energy", CELL_NUMBER},   {"mean r", CELL_NUMBER},
        {"max D(r)", CELL_NUMBER}, {"Z_eff 1", CELL_NUMBER},
        {"Z_eff 2", CELL_NUMBER},  {"Z_eff 3", CELL_NUMBER}};
    const char *const units[] = {
        "", "", s->energy->id, s->length->id, s->length->id, "e", "e", "e"};
    char label[LEVEL_TEXT_MAX];
    struct report_table *table = report_table(report, heads, COUNT(heads));
    for (size_t i = 0; i < COUNT(units); i++)
        report_cell(report, table, units[i]);
    for (int i = 0; i < s->atom->subshell_count; i++) {
        const struct report_level *l = &s->atom->subshells[i];
        report_cell(report, table, level_print(l, label));
        count_cell(report, table, l->occ);
        energy_cell(report, table, l->energy, s);
        length_cell(report, table, l->mean_radius, s);
        length_cell(report, table, l->peak_radius, s);
        report_cellf(report, table, "%.3f", l->zeff_energy);
        report_cellf(report, table, "%.3f", l->zeff_radius);
        report_cellf(report, table, "%.3f", l->zeff_enclosed);
    }
    report_line(report, "1  from the energy: n sqrt(-2E), E in hartree");
    report_line(report, "2  from the size: mean r of hydrogen's n l over this "
                        "one's");
    report_line(report, "3  by Gauss's law: Z less all electrons inside "
                        "max D(r), the outermost maximum");
}

/* The level with the same n, l and j in the other spin channel, or NULL. */
static const struct report_level *
partner(const struct atom_report *a, const struct report_level *level, int spin)
{
    for (int i = 0; i < a->level_count; i++) {
        const struct report_level *o = &a->levels[i];
        if (o->n == level->n && o->l == level->l &&
            o->twice_j == level->twice_j && o->spin == spin)
            return o;
    }
    return NULL;
}

static void level_cells(struct report *report, struct report_table *table,
                        const struct report_level *level,
                        const struct solved *s)
{
    if (!level) {
        report_cell(report, table, "-");
        report_cell(report, table, "-");
        return;
    }
    count_cell(report, table, level->occ);
    energy_cell(report, table, level->energy, s);
}

/* Levels by spin, by j, or by both: a row for each n l j. A level of which
 * only the majority is occupied has no partner. */
static void add_levels(struct report *report, const struct solved *s)
{
    bool spins = s->atom->method.functional != FUNCTIONAL_LDA;
    char label[LEVEL_TEXT_MAX];
    char energy[48];
    struct text t = text_over(energy, sizeof energy);
    text_addf(&t, "energy, %s", s->energy->id);
    const struct table_column heads[] = {
        {"level", CELL_WORDS},
        {spins ? "majority" : "electrons", CELL_NUMBER},
        {energy, CELL_NUMBER},
        {"minority", CELL_NUMBER},
        {energy, CELL_NUMBER}};
    report_gap(report);
    struct report_table *table = report_table(report, heads, spins ? 5 : 3);
    for (int i = 0; i < s->atom->level_count; i++) {
        const struct report_level *level = &s->atom->levels[i];
        if (level->spin < 0)
            continue;
        report_cell(report, table, level_print(level, label));
        level_cells(report, table, level, s);
        if (spins)
            level_cells(report, table, partner(s->atom, level, -1), s);
    }
}

void report_solved(struct report *report, unsigned parts,
                   const struct atom_report *atom,
                   const struct provenance *source, const struct unit *energy,
                   const struct unit *length)
{
    struct solved *s = report_memory(report, sizeof *s);
    if (!s)
        return;
    *s = (struct solved){atom, energy, length};
    report->records = (struct report_records){
        .name = "rows",
        .columns = columns,
        .column_count = COUNT(columns),
        .data = s,
        .count = COUNT(totals) + (size_t)atom->level_count * COUNT(numbers),
        .room_size = sizeof(struct record),
        .at = record_at,
    };
    if (parts & REPORT_RECORDS)
        add_members(report, atom);
    if (parts & REPORT_SOURCES)
        report_source(report, (struct cited_source){source, NULL});
    if (!(parts & REPORT_BLOCKS))
        return;
    add_head(report, atom);
    add_energies(report, s);
    add_subshells(report, s);
    if (atom->method.functional != FUNCTIONAL_LDA ||
        atom->method.relativity == RELATIVITY_DIRAC)
        add_levels(report, s);
}
