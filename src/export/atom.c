/* SPDX-License-Identifier: MIT */
#include "export/atom.h"

#include <stddef.h>

#define FIELD_TEXT_MAX 256
#define ENERGY_PLACES 7 /* 1e-7 hartree */
#define DIGITS 9        /* of all other numbers, at least */

/* What the unit of a number follows. */
enum number_kind { KIND_ENERGY, KIND_LENGTH, KIND_CHARGE, KIND_COUNT };

/* Quantities of the whole atom, and of a level: one row each. */
struct quantity_row {
    const char *name;
    enum number_kind kind;
    size_t offset; /* of the double in its struct */
};

static const struct quantity_row totals[] = {
    {"etot", KIND_ENERGY, offsetof(struct atom_report, etot)},
    {"ekin", KIND_ENERGY, offsetof(struct atom_report, ekin)},
    {"ecoul", KIND_ENERGY, offsetof(struct atom_report, ecoul)},
    {"eenuc", KIND_ENERGY, offsetof(struct atom_report, eenuc)},
    {"exc", KIND_ENERGY, offsetof(struct atom_report, exc)},
};

static const struct quantity_row numbers[] = {
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

/* Where the rows go, and what is the same in all of them. */
struct writer {
    FILE *out;
    bool json;
    bool begun;
    const struct atom_report *report;
    const struct unit *energy, *length;
};

static const char *const fields[] = {
    "z",          "symbol",     "charge",   "configuration",
    "functional", "relativity", "quantity", "subshell",
    "spin",       "value",      "unit"};
enum { FIELD_COUNT = COUNT(fields) };

static bool is_number(int field)
{
    return field == 0 || field == 2 || field == 9;
}

static double number_at(const void *base, size_t offset)
{
    return *(const double *)((const char *)base + offset);
}

/* A number in its unit, with the places that belong to it. */
static void number_text(const struct writer *w, enum number_kind kind,
                        double value, char out[NUMBER_TEXT_MAX])
{
    switch (kind) {
    case KIND_ENERGY:
        value *= HARTREE_EV * w->energy->per_base;
        number_print(number_round(value, DIGITS, ENERGY_PLACES), out);
        return;
    case KIND_LENGTH:
        value *= BOHR_PM * w->length->per_base;
        break;
    case KIND_CHARGE:
        break;
    case KIND_COUNT:
        number_print_short(number_round(value, DIGITS, 0), out);
        return;
    }
    number_print(number_round(value, DIGITS, 0), out);
}

static const char *unit_text(const struct writer *w, enum number_kind kind)
{
    switch (kind) {
    case KIND_ENERGY:
        return w->energy->id;
    case KIND_LENGTH:
        return w->length->id;
    case KIND_CHARGE:
        return "e";
    case KIND_COUNT:
        break;
    }
    return "electrons";
}

static void write_csv_row(struct writer *w, const char *const *values)
{
    for (int f = 0; f < FIELD_COUNT; f++)
        csv_field(w->out, values[f], f == 0);
    csv_end(w->out);
}

static void write_json_row(struct writer *w, const char *const *values)
{
    fputs(w->begun ? ",\n  {" : "\n  {", w->out);
    w->begun = true;
    for (int f = 0; f < FIELD_COUNT; f++) {
        fputs(f ? ", " : "", w->out);
        json_string(w->out, fields[f]);
        fputs(": ", w->out);
        if (values[f][0] == '\0')
            fputs("null", w->out);
        else if (is_number(f))
            fputs(values[f], w->out);
        else
            json_string(w->out, values[f]);
    }
    fputs("}", w->out);
}

/* level: NULL for a number of the whole atom. */
static void write_row(struct writer *w, const struct quantity_row *quantity,
                      double value, const struct report_level *level)
{
    const struct species *s = &w->report->species;
    char z[12], charge[12], label[LEVEL_TEXT_MAX], number[NUMBER_TEXT_MAX];
    char configuration[FIELD_TEXT_MAX];
    struct text t = text_over(configuration, sizeof configuration);
    species_configuration_text(&t, s);
    snprintf(z, sizeof z, "%d", s->z);
    snprintf(charge, sizeof charge, "%d", s->charge);
    number_text(w, quantity->kind, value, number);
    const char *const values[] = {z,
                                  element_at(s->z)->symbol,
                                  charge,
                                  configuration,
                                  functional_id(w->report->method.functional),
                                  relativity_id(w->report->method.relativity),
                                  quantity->name,
                                  level ? level_print(level, label) : "",
                                  level ? spin_text(level->spin) : "",
                                  number,
                                  unit_text(w, quantity->kind)};
    if (w->json)
        write_json_row(w, values);
    else
        write_csv_row(w, values);
}

static void write_rows(struct writer *w)
{
    const struct atom_report *r = w->report;
    for (size_t q = 0; q < COUNT(totals); q++)
        write_row(w, &totals[q], number_at(r, totals[q].offset), NULL);
    for (int i = 0; i < r->level_count; i++)
        for (size_t q = 0; q < COUNT(numbers); q++)
            write_row(w, &numbers[q],
                      number_at(&r->levels[i], numbers[q].offset),
                      &r->levels[i]);
}

void atom_write(FILE *out, enum export_format format,
                const struct atom_report *report, const struct unit *energy,
                const struct unit *length)
{
    char number[NUMBER_TEXT_MAX];
    struct writer w = {out,   format == EXPORT_JSON, false, report, energy,
                       length};
    if (!w.json) {
        write_csv_row(&w, fields);
        write_rows(&w);
        return;
    }
    fputs("{\"schema\": 1, \"state\": \"ok\", \"reason\": \"\", ", out);
    fprintf(out, "\"cycles\": %d, \"residual\": %s, ", report->cycles,
            number_print_short(number_round(report->residual, 3, 0), number));
    if (report->method.relativity == RELATIVITY_DIRAC)
        fprintf(out, "\"speed_of_light\": %s, ",
                number_print_short(number_round(report->speed_of_light, 15, 0),
                                   number));
    else
        fputs("\"speed_of_light\": null, ", out);
    fprintf(out, "\"version\": \"%s\", \"rows\": [", OUTERSHELL_VERSION);
    write_rows(&w);
    fputs("\n]}\n", out);
}
