/* SPDX-License-Identifier: MIT */
/* The table of the screen Atom: subshells, energies, levels. */
#include "screens/atom_internal.h"

#define LEVELS_HEAD 7 /* rows of the energies and the blank below them */

/* Columns of the table. where: bits of the forms that have it. */
enum column_kind {
    COLUMN_OCC,
    COLUMN_ENERGY,
    COLUMN_MEAN,
    COLUMN_PEAK,
    COLUMN_ZEFF_ENERGY,
    COLUMN_ZEFF_RADIUS,
    COLUMN_ZEFF_ENCLOSED
};
static const struct {
    enum column_kind kind;
    const char *head;
    const char *below; /* NULL: the unit */
    int narrow, wide;  /* columns; 0: not there */
} columns[] = {
    {COLUMN_OCC, "occ", "", 5, 7},
    {COLUMN_ENERGY, "E", NULL, 11, 13},
    {COLUMN_MEAN, "mean r", NULL, 0, 8},
    {COLUMN_PEAK, "max D", NULL, 7, 8},
    {COLUMN_ZEFF_ENERGY, "Z_eff", "energy", 7, 8},
    {COLUMN_ZEFF_RADIUS, "Z_eff", "size", 0, 8},
    {COLUMN_ZEFF_ENCLOSED, "Z_eff", "Gauss", 0, 8},
};
enum { COLUMN_COUNT = sizeof columns / sizeof columns[0], NAME_WIDTH = 4 };

const struct unit *screen_atom_energy_unit(const struct session *session)
{
    return session_unit(session, QUANTITY_IONIZATION);
}

double screen_atom_energy(const struct session *session, double hartree)
{
    return hartree * HARTREE_EV * screen_atom_energy_unit(session)->per_base;
}

static void number_of(const struct session *session,
                      const struct report_level *s, enum column_kind kind,
                      int width, char out[NUMBER_TEXT_MAX])
{
    int length = session_unit(session, QUANTITY_RADIUS)->decimals + 1;
    switch (kind) {
    case COLUMN_OCC:
        number_print_short(number_round(s->occ, 1, 2), out);
        return;
    case COLUMN_ENERGY:
        number_fit(screen_atom_energy(session, s->energy),
                   screen_atom_energy_unit(session)->decimals, width, out);
        return;
    case COLUMN_MEAN:
        number_fit(s->mean_radius * screen_atom_length(session), length, width,
                   out);
        return;
    case COLUMN_PEAK:
        number_fit(s->peak_radius * screen_atom_length(session), length, width,
                   out);
        return;
    case COLUMN_ZEFF_ENERGY:
        number_fit(s->zeff_energy, 3, width, out);
        return;
    case COLUMN_ZEFF_RADIUS:
        number_fit(s->zeff_radius, 3, width, out);
        return;
    case COLUMN_ZEFF_ENCLOSED:
        number_fit(s->zeff_enclosed, 3, width, out);
        return;
    }
}

static const char *unit_below(const struct session *session, int c)
{
    if (columns[c].below)
        return columns[c].below;
    return columns[c].kind == COLUMN_ENERGY
               ? screen_atom_energy_unit(session)->id
               : session_unit(session, QUANTITY_RADIUS)->id;
}

/* First row of the table that is shown, so that the chosen one is. */
int screen_atom_table_first(int chosen, int rows, int count)
{
    int first = chosen - rows + 2;
    if (first > count - rows)
        first = count - rows;
    return first < 0 ? 0 : first;
}

static void draw_table_row(const struct session *session,
                           const struct atom_state *own, struct canvas *canvas,
                           const struct atom_report *r, struct area a, int row,
                           int shell, bool wide)
{
    char out[NUMBER_TEXT_MAX];
    char label[LEVEL_TEXT_MAX];
    struct report_level all = {
        .occ = configuration_electrons(&r->species.configuration)};
    const struct report_level *s = shell < 0 ? &all : &r->subshells[shell];
    bool chosen = shell == screen_atom_shell(own, r);
    enum role role = shell < 0 ? ROLE_CURVE_5 : screen_atom_role(s->l);
    canvas_put(canvas, row, a.column, ROLE_TITLE, chosen ? '>' : ' ');
    canvas_text(canvas, row, a.column + 1, NAME_WIDTH, role,
                shell < 0 ? "all" : level_print(s, label));
    int column = a.column + NAME_WIDTH;
    for (int c = 0; c < COLUMN_COUNT; c++) {
        int width = wide ? columns[c].wide : columns[c].narrow;
        if (width == 0 || (shell < 0 && columns[c].kind != COLUMN_OCC))
            continue;
        number_of(session, s, columns[c].kind, width - 1, out);
        canvas_right(canvas, row, column, width, ROLE_TEXT, out);
        column += width;
    }
    if (!chosen)
        return;
    canvas_paint(canvas, row, a.column, 1, a.columns, ROLE_CHOSEN);
    canvas->cursor_row = row;
    canvas->cursor_column = a.column + 1;
}

static void draw_table_heads(const struct session *session,
                             struct canvas *canvas, struct area a, bool wide)
{
    int column = a.column + NAME_WIDTH;
    canvas_text(canvas, a.row, a.column, NAME_WIDTH + 2, ROLE_HEADING, "shell");
    for (int c = 0; c < COLUMN_COUNT; c++) {
        int width = wide ? columns[c].wide : columns[c].narrow;
        if (width == 0)
            continue;
        canvas_right(canvas, a.row, column + 1, width - 1, ROLE_HEADING,
                     columns[c].head);
        canvas_right(canvas, a.row + 1, column, width, ROLE_HEADING,
                     unit_below(session, c));
        column += width;
    }
}

/* Rows of the headings: none where hardly more would fit. */
int screen_atom_table_heads(struct area a)
{
    return a.rows >= 5 ? 2 : 0;
}

void screen_atom_table_draw(const struct session *session,
                            const struct atom_state *own, struct canvas *canvas,
                            struct area a, const struct atom_report *r,
                            bool wide)
{
    int heads = screen_atom_table_heads(a);
    int rows = a.rows - heads;
    int count = r->subshell_count + 1;
    int first =
        screen_atom_table_first(screen_atom_shell(own, r) + 1, rows, count);
    if (heads > 0)
        draw_table_heads(session, canvas, a, wide);
    for (int i = 0; i < rows && first + i < count; i++)
        draw_table_row(session, own, canvas, r, a, a.row + heads + i,
                       first + i - 1, wide);
}

/* Energy and its parts, below the table. */
static void draw_energies(const struct session *session, struct canvas *canvas,
                          struct area a, const struct atom_report *r)
{
    const struct {
        const char *name;
        double value;
    } parts[] = {
        {"total", r->etot},
        {"kinetic", r->ekin},
        {"electron-electron", r->ecoul},
        {"electron-nucleus", r->eenuc},
        {"exchange-corr.", r->exc},
    };
    char out[NUMBER_TEXT_MAX];
    const struct unit *unit = screen_atom_energy_unit(session);
    int count = (int)(sizeof parts / sizeof parts[0]);
    int width = a.columns > 40 ? 40 : a.columns;
    canvas_text(canvas, a.row, a.column, width, ROLE_HEADING, "energy");
    canvas_right(canvas, a.row, a.column, width, ROLE_HEADING, unit->id);
    for (int i = 0; i < count && i + 1 < a.rows; i++) {
        canvas_text(canvas, a.row + 1 + i, a.column + 1, width - 1, ROLE_TEXT,
                    parts[i].name);
        number_fit(screen_atom_energy(session, parts[i].value), unit->decimals,
                   width - 19, out);
        canvas_right(canvas, a.row + 1 + i, a.column, width, ROLE_TEXT, out);
    }
}

static const struct report_level *partner(const struct atom_report *r,
                                          const struct report_level *level)
{
    for (int i = 0; i < r->level_count; i++)
        if (r->levels[i].n == level->n && r->levels[i].l == level->l &&
            r->levels[i].twice_j == level->twice_j &&
            r->levels[i].spin == -level->spin)
            return &r->levels[i];
    return NULL;
}

static void draw_level(const struct session *session, struct canvas *canvas,
                       int row, int column, const struct report_level *level)
{
    char out[NUMBER_TEXT_MAX];
    if (!level) {
        canvas_right(canvas, row, column, 22, ROLE_QUIET, "-");
        return;
    }
    number_print_short(number_round(level->occ, 1, 2), out);
    canvas_right(canvas, row, column, 7, ROLE_TEXT, out);
    number_fit(screen_atom_energy(session, level->energy),
               screen_atom_energy_unit(session)->decimals, 14, out);
    canvas_right(canvas, row, column + 7, 15, ROLE_TEXT, out);
}

/* Levels by j and spin as far as there is room, the outermost ones. */
static void draw_levels(const struct session *session, struct canvas *canvas,
                        struct area a, const struct atom_report *r)
{
    char label[LEVEL_TEXT_MAX];
    bool spins = r->method.functional != FUNCTIONAL_LDA;
    int count = 0;
    if (a.rows < 3 || a.columns < 54 ||
        (!spins && r->method.relativity == RELATIVITY_NONE))
        return;
    for (int i = 0; i < r->level_count; i++)
        count += r->levels[i].spin >= 0;
    int skip = count > a.rows - 1 ? count - (a.rows - 1) : 0;
    canvas_text(canvas, a.row, a.column, a.columns, ROLE_HEADING,
                skip ? "outer levels" : "levels");
    canvas_textf(canvas, a.row, a.column + 15, 22, ROLE_HEADING, "%s, %s",
                 spins ? "majority spin" : "electrons",
                 screen_atom_energy_unit(session)->id);
    if (spins)
        canvas_textf(canvas, a.row, a.column + 39, 22, ROLE_HEADING,
                     "minority spin, %s", screen_atom_energy_unit(session)->id);
    for (int i = 0, row = a.row + 1; i < r->level_count; i++) {
        const struct report_level *level = &r->levels[i];
        if (level->spin < 0 || skip-- > 0)
            continue;
        canvas_text(canvas, row, a.column + 1, 8, screen_atom_role(level->l),
                    level_print(level, label));
        draw_level(session, canvas, row, a.column + 8, level);
        if (spins)
            draw_level(session, canvas, row, a.column + 32, partner(r, level));
        row++;
    }
}

void screen_atom_levels_draw(const struct session *session,
                             struct canvas *canvas, struct area a,
                             const struct atom_report *r)
{
    draw_energies(session, canvas, a, r);
    a.row += LEVELS_HEAD;
    a.rows -= LEVELS_HEAD;
    draw_levels(session, canvas, a, r);
}
