/* SPDX-License-Identifier: MIT */
/* One self-consistent atom for people. */
#include "element/selection.h"
#include "export/atom.h"

#define ENERGY_PLACES_MORE 3 /* beyond what a screen shows: 1e-7 hartree */
#define LENGTH_PLACES_MORE 1
#define LINE_TEXT_MAX 320

/* Reports are written in these units. */
struct units {
    const struct unit *energy, *length;
};

static void energy_cell(struct table *table, double hartree, struct units u)
{
    char out[NUMBER_TEXT_MAX];
    table_cell(table, number_print_places(
                          hartree * HARTREE_EV * u.energy->per_base,
                          u.energy->decimals + ENERGY_PLACES_MORE, out));
}

static void length_cell(struct table *table, double bohr, struct units u)
{
    char out[NUMBER_TEXT_MAX];
    table_cell(table, number_print_places(
                          bohr * BOHR_PM * u.length->per_base,
                          u.length->decimals + LENGTH_PLACES_MORE, out));
}

static void count_cell(struct table *table, double electrons)
{
    char out[NUMBER_TEXT_MAX];
    table_cell(table, number_print_short(number_round(electrons, 1, 4), out));
}

static void write_head(FILE *out, const struct atom_report *r)
{
    const struct element *e = element_at(r->species.z);
    char ion[ION_TEXT_MAX];
    char line[LINE_TEXT_MAX];
    struct text t = text_over(line, sizeof line);
    text_addf(&t, "%s  %s, Z = %d   ", ion_print(e->z, r->species.charge, ion),
              e->name, e->z);
    species_configuration_text(&t, &r->species);
    if (r->species.origin == ORIGIN_USER)
        text_add(&t, " (given)");
    text_addf(&t, "\n%s, %s", functional_title(r->method.functional),
              relativity_title(r->method.relativity));
    if (r->method.relativity == RELATIVITY_DIRAC)
        text_addf(&t, " with c = %.12g", r->speed_of_light);
    fprintf(out, "%s\nconverged in %d cycles, residual %.1e electrons\n\n",
            line, r->cycles, r->residual);
}

static bool write_energies(FILE *out, const struct atom_report *r,
                           struct units u, const struct table_style *style,
                           struct status *st)
{
    const struct {
        const char *name, *id;
        double value;
    } parts[] = {
        {"total", "etot", r->etot},
        {"kinetic", "ekin", r->ekin},
        {"electrons among themselves", "ecoul", r->ecoul},
        {"electrons and nucleus", "eenuc", r->eenuc},
        {"exchange and correlation", "exc", r->exc},
    };
    struct table table = table_new("llr");
    table_cell(&table, "energy");
    table_cell(&table, "");
    table_cell(&table, u.energy->id);
    for (size_t i = 0; i < sizeof parts / sizeof parts[0]; i++) {
        table_cell(&table, parts[i].name);
        table_cell(&table, parts[i].id);
        energy_cell(&table, parts[i].value, u);
    }
    return table_write_styled(&table, out, style, st);
}

static bool write_subshells(FILE *out, const struct atom_report *r,
                            struct units u, const struct table_style *style,
                            struct status *st)
{
    char label[LEVEL_TEXT_MAX];
    struct table table = table_new("lrrrrrrr");
    static const char *const heading[] = {"shell",   "electrons", "energy",
                                          "mean r",  "max D(r)",  "Z_eff 1",
                                          "Z_eff 2", "Z_eff 3"};
    for (size_t i = 0; i < sizeof heading / sizeof heading[0]; i++)
        table_cell(&table, heading[i]);
    const char *const units[] = {"",           "",  u.energy->id, u.length->id,
                                 u.length->id, "e", "e",          "e"};
    for (size_t i = 0; i < sizeof units / sizeof units[0]; i++)
        table_cell(&table, units[i]);
    for (int i = 0; i < r->subshell_count; i++) {
        const struct report_level *s = &r->subshells[i];
        table_cell(&table, level_print(s, label));
        count_cell(&table, s->occ);
        energy_cell(&table, s->energy, u);
        length_cell(&table, s->mean_radius, u);
        length_cell(&table, s->peak_radius, u);
        table_cellf(&table, "%.3f", s->zeff_energy);
        table_cellf(&table, "%.3f", s->zeff_radius);
        table_cellf(&table, "%.3f", s->zeff_enclosed);
    }
    return table_write_styled(&table, out, style, st);
}

/* The level with the same n, l and j in the other spin channel, or NULL. */
static const struct report_level *
partner(const struct atom_report *r, const struct report_level *level, int spin)
{
    for (int i = 0; i < r->level_count; i++) {
        const struct report_level *o = &r->levels[i];
        if (o->n == level->n && o->l == level->l &&
            o->twice_j == level->twice_j && o->spin == spin)
            return o;
    }
    return NULL;
}

static void level_cells(struct table *table, const struct report_level *level,
                        struct units u)
{
    if (!level) {
        table_cell(table, "-");
        table_cell(table, "-");
        return;
    }
    count_cell(table, level->occ);
    energy_cell(table, level->energy, u);
}

/* Levels by spin, by j, or by both: a row for each n l j. A level of which
 * only the majority is occupied has no partner. */
static bool write_levels(FILE *out, const struct atom_report *r, struct units u,
                         const struct table_style *style, struct status *st)
{
    bool spins = r->method.functional != FUNCTIONAL_LDA;
    char label[LEVEL_TEXT_MAX];
    struct table table = table_new(spins ? "lrrrr" : "lrr");
    table_cell(&table, "level");
    table_cell(&table, spins ? "majority" : "electrons");
    table_cellf(&table, "energy, %s", u.energy->id);
    if (spins) {
        table_cell(&table, "minority");
        table_cellf(&table, "energy, %s", u.energy->id);
    }
    for (int i = 0; i < r->level_count; i++) {
        const struct report_level *level = &r->levels[i];
        if (level->spin < 0)
            continue;
        table_cell(&table, level_print(level, label));
        level_cells(&table, level, u);
        if (spins)
            level_cells(&table, partner(r, level, -1), u);
    }
    return table_write_styled(&table, out, style, st);
}

bool atom_write_text(FILE *out, const struct atom_report *r,
                     const struct unit *energy, const struct unit *length,
                     const struct table_style *style, struct status *st)
{
    const struct units u = {energy, length};
    bool levels = r->method.functional != FUNCTIONAL_LDA ||
                  r->method.relativity == RELATIVITY_DIRAC;
    write_head(out, r);
    if (!write_energies(out, r, u, style, st))
        return false;
    putc('\n', out);
    if (!write_subshells(out, r, u, style, st))
        return false;
    fputs("1  from the energy: n sqrt(-2E), E in hartree\n"
          "2  from the size: mean r of hydrogen's n l over this one's\n"
          "3  by Gauss's law: Z less all electrons inside max D(r), the "
          "outermost maximum\n",
          out);
    if (!levels)
        return true;
    putc('\n', out);
    return write_levels(out, r, u, style, st);
}
