/* SPDX-License-Identifier: MIT */
/* The screen Atom: the self-consistent atom of the selection, its subshells,
 * its radial density and the charge within a radius. */
#include "screens/atom.h"

#include <stdio.h>
#include <string.h>

#include "base/text.h"

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

static struct atom_layout layout_of(const struct ui *ui)
{
    struct ask ask;
    struct species species;
    struct status st = status_ok();
    int shells = 0;
    if (ui_ask(ui, ui->choice.z, ui->choice.charge, &ask) &&
        study_species(ui->study, &ask, &species, &st))
        shells = species.configuration.count;
    return layout_atom(ui->rows, ui->columns, shells);
}

static const struct unit *energy_unit(const struct ui *ui)
{
    return ui_unit(ui, QUANTITY_IONIZATION);
}

static double energy_in(const struct ui *ui, double hartree)
{
    return hartree * HARTREE_EV * energy_unit(ui)->per_base;
}

static void number_of(const struct ui *ui, const struct report_level *s,
                      enum column_kind kind, int width,
                      char out[NUMBER_TEXT_MAX])
{
    int length = ui_unit(ui, QUANTITY_RADIUS)->decimals + 1;
    switch (kind) {
    case COLUMN_OCC:
        number_print_short(number_round(s->occ, 1, 2), out);
        return;
    case COLUMN_ENERGY:
        number_fit(energy_in(ui, s->energy), energy_unit(ui)->decimals, width,
                   out);
        return;
    case COLUMN_MEAN:
        number_fit(s->mean_radius * atom_length(ui), length, width, out);
        return;
    case COLUMN_PEAK:
        number_fit(s->peak_radius * atom_length(ui), length, width, out);
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

static const char *unit_below(const struct ui *ui, int c)
{
    if (columns[c].below)
        return columns[c].below;
    return columns[c].kind == COLUMN_ENERGY ? energy_unit(ui)->id
                                            : ui_unit(ui, QUANTITY_RADIUS)->id;
}

/* First row of the table that is shown, so that the chosen one is. */
static int table_first(int chosen, int rows, int count)
{
    int first = chosen - rows + 2;
    if (first > count - rows)
        first = count - rows;
    return first < 0 ? 0 : first;
}

static void draw_table_row(const struct ui *ui, struct canvas *canvas,
                           const struct atom_report *r, struct area a, int row,
                           int shell, bool wide)
{
    char out[NUMBER_TEXT_MAX];
    char label[LEVEL_TEXT_MAX];
    struct report_level all = {
        .occ = configuration_electrons(&r->species.configuration)};
    const struct report_level *s = shell < 0 ? &all : &r->subshells[shell];
    bool chosen = shell == atom_shell(ui, r);
    enum role role = shell < 0 ? ROLE_CURVE_5 : atom_role(s->l);
    canvas_put(canvas, row, a.column, ROLE_TITLE, chosen ? '>' : ' ');
    canvas_text(canvas, row, a.column + 1, NAME_WIDTH, role,
                shell < 0 ? "all" : level_print(s, label));
    int column = a.column + NAME_WIDTH;
    for (int c = 0; c < COLUMN_COUNT; c++) {
        int width = wide ? columns[c].wide : columns[c].narrow;
        if (width == 0 || (shell < 0 && columns[c].kind != COLUMN_OCC))
            continue;
        number_of(ui, s, columns[c].kind, width - 1, out);
        canvas_right(canvas, row, column, width, ROLE_TEXT, out);
        column += width;
    }
    if (!chosen)
        return;
    canvas_paint(canvas, row, a.column, 1, a.columns, ROLE_CHOSEN);
    canvas->cursor_row = row;
    canvas->cursor_column = a.column + 1;
}

static void draw_table_heads(const struct ui *ui, struct canvas *canvas,
                             struct area a, bool wide)
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
                     unit_below(ui, c));
        column += width;
    }
}

/* Rows of the headings: none where hardly more would fit. */
static int head_rows(struct area a)
{
    return a.rows >= 5 ? 2 : 0;
}

static void draw_table(const struct ui *ui, struct canvas *canvas,
                       struct area a, const struct atom_report *r, bool wide)
{
    int heads = head_rows(a);
    int rows = a.rows - heads;
    int count = r->subshell_count + 1;
    int first = table_first(atom_shell(ui, r) + 1, rows, count);
    if (heads > 0)
        draw_table_heads(ui, canvas, a, wide);
    for (int i = 0; i < rows && first + i < count; i++)
        draw_table_row(ui, canvas, r, a, a.row + heads + i, first + i - 1,
                       wide);
}

/* Energy and its parts, below the table. */
static void draw_energies(const struct ui *ui, struct canvas *canvas,
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
    const struct unit *unit = energy_unit(ui);
    int count = (int)(sizeof parts / sizeof parts[0]);
    int width = a.columns > 40 ? 40 : a.columns;
    canvas_text(canvas, a.row, a.column, width, ROLE_HEADING, "energy");
    canvas_right(canvas, a.row, a.column, width, ROLE_HEADING, unit->id);
    for (int i = 0; i < count && i + 1 < a.rows; i++) {
        canvas_text(canvas, a.row + 1 + i, a.column + 1, width - 1, ROLE_TEXT,
                    parts[i].name);
        number_fit(energy_in(ui, parts[i].value), unit->decimals, width - 19,
                   out);
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

static void draw_level(const struct ui *ui, struct canvas *canvas, int row,
                       int column, const struct report_level *level)
{
    char out[NUMBER_TEXT_MAX];
    if (!level) {
        canvas_right(canvas, row, column, 22, ROLE_QUIET, "-");
        return;
    }
    number_print_short(number_round(level->occ, 1, 2), out);
    canvas_right(canvas, row, column, 7, ROLE_TEXT, out);
    number_fit(energy_in(ui, level->energy), energy_unit(ui)->decimals, 14,
               out);
    canvas_right(canvas, row, column + 7, 15, ROLE_TEXT, out);
}

/* Levels by j and spin as far as there is room, the outermost ones. */
static void draw_levels(const struct ui *ui, struct canvas *canvas,
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
                 spins ? "majority spin" : "electrons", energy_unit(ui)->id);
    if (spins)
        canvas_textf(canvas, a.row, a.column + 39, 22, ROLE_HEADING,
                     "minority spin, %s", energy_unit(ui)->id);
    for (int i = 0, row = a.row + 1; i < r->level_count; i++) {
        const struct report_level *level = &r->levels[i];
        if (level->spin < 0 || skip-- > 0)
            continue;
        canvas_text(canvas, row, a.column + 1, 8, atom_role(level->l),
                    level_print(level, label));
        draw_level(ui, canvas, row, a.column + 8, level);
        if (spins)
            draw_level(ui, canvas, row, a.column + 32, partner(r, level));
        row++;
    }
}

static void add_method(struct text *t, struct atom_method method)
{
    text_addf(t, "%s, %s", functional_title(method.functional),
              relativity_title(method.relativity));
}

static void draw_atom_title(const struct ui *ui, struct canvas *canvas)
{
    char line[UI_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    struct text t = text_over(line, sizeof line);
    struct ask ask;
    struct species species;
    struct status st = status_ok();
    const struct element *e = element_at(ui->choice.z);
    text_addf(&t, "%s  %d  %s  ", ion_print(e->z, ui->choice.charge, ion), e->z,
              e->name);
    if (ui_ask(ui, e->z, ui->choice.charge, &ask) &&
        study_species(ui->study, &ask, &species, &st))
        species_configuration_text(&t, &species);
    text_add(&t, "   ");
    add_method(&t, ui->choice.atom.method);
    canvas_text(canvas, 0, 6, canvas->columns - 6, ROLE_TITLE, line);
}

/* What a slot is doing, in words. */
static void slot_text(const struct ui *ui, const struct atom_slot *slot,
                      struct text *t)
{
    const struct atom_report *r = atom_run_report(slot->run);
    char out[NUMBER_TEXT_MAX];
    if (slot->failure[0] != '\0')
        text_addf(t, "no number: %s", slot->failure);
    else if (r->state == REPORT_FAILED)
        text_addf(t, "no number: %s (cycle %d)", r->reason, r->cycles);
    else if (r->state == REPORT_SOLVED)
        text_addf(t, "total energy %s %s; converged in %d cycles",
                  number_print_places(energy_in(ui, r->etot),
                                      energy_unit(ui)->decimals + 3, out),
                  energy_unit(ui)->id, r->cycles);
    else if (slot->stopped)
        text_addf(t, "stopped at cycle %d; Enter goes on", r->cycles);
    else if (r->cycles == 0)
        text_add(t, "solving; Ctrl-C stops");
    else
        text_addf(t, "solving: cycle %d, residual %.1e e; Ctrl-C stops",
                  r->cycles, r->residual);
}

static void draw_state(const struct ui *ui, struct canvas *canvas)
{
    char line[UI_TEXT_MAX];
    char name[ATOM_LABEL_MAX];
    struct text t = text_over(line, sizeof line);
    const struct atom_slot *slot = atom_slot_now(ui, SLOT_CHOSEN);
    const struct atom_slot *over = atom_slot_now(ui, SLOT_OVER);
    bool bad = false;
    if (slot) {
        slot_text(ui, slot, &t);
        bad = slot->failure[0] != '\0' ||
              atom_run_report(slot->run)->state == REPORT_FAILED;
    } else {
        struct ask ask;
        bool there = ui_ask(ui, ui->choice.z, ui->choice.charge, &ask);
        text_add(&t, there ? "solving; Ctrl-C stops" : "no such ion");
        bad = !there;
    }
    const char *failure = atom_overlay_failure(ui);
    if (failure[0] != '\0')
        text_addf(&t, "; %s: %s", atom_overlay_name(ui, NULL, name), failure);
    else if (over && !atom_solved(ui, SLOT_OVER))
        text_addf(&t, "; %s: cycle %d", atom_overlay_name(ui, NULL, name),
                  atom_run_report(over->run)->cycles);
    canvas_text(canvas, 1, 0, canvas->columns,
                bad || failure[0] != '\0' ? ROLE_CAUTION : ROLE_TEXT, line);
}

static void draw(struct ui *ui, struct canvas *canvas)
{
    struct atom_layout l = layout_of(ui);
    const struct atom_report *r = atom_solved(ui, SLOT_CHOSEN);
    draw_atom_title(ui, canvas);
    draw_state(ui, canvas);
    if (!r)
        return;
    bool table = l.form == FORM_WHOLE || !ui->detail;
    bool plots = l.form == FORM_WHOLE || ui->detail;
    if (table)
        draw_table(ui, canvas, l.table, r, l.wide);
    if (plots) {
        atom_draw_cursor(ui, canvas, l.cursor, r);
        atom_draw_plots(ui, canvas, &l, r);
    }
    if (l.levels.rows == 0)
        return;
    draw_energies(ui, canvas, l.levels, r);
    l.levels.row += LEVELS_HEAD;
    l.levels.rows -= LEVELS_HEAD;
    draw_levels(ui, canvas, l.levels, r);
}

/* Chooses the subshell `by` rows away; -1 is all electrons. */
static void choose_shell(struct ui *ui, int by)
{
    const struct atom_report *r = atom_solved(ui, SLOT_CHOSEN);
    struct atom_choice *a = &ui->choice.atom;
    if (!r)
        return;
    int shell = atom_shell(ui, r) + by;
    if (shell < -1 || shell >= r->subshell_count)
        return;
    a->n = shell < 0 ? -1 : r->subshells[shell].n;
    a->l = shell < 0 ? 0 : r->subshells[shell].l;
    a->radius = 0.0;
}

/* Puts the cursor on a column of the plot. */
static void cursor_to(struct ui *ui, int column)
{
    const struct atom_report *r = atom_solved(ui, SLOT_CHOSEN);
    const struct plot *plot = r ? &ui->atom->plot : NULL;
    if (!r || !ui->atom->has_plot)
        return;
    int last = plot->inside.column + plot->inside.columns - 1;
    if (column < plot->inside.column)
        column = plot->inside.column;
    if (column > last)
        column = last;
    ui->choice.atom.radius = plot_column_x(plot, column) / atom_length(ui);
}

/* Moves the cursor by columns; from beyond an end, back to it. */
static void move_cursor(struct ui *ui, int by)
{
    const struct atom_report *r = atom_solved(ui, SLOT_CHOSEN);
    int column;
    if (!r || !ui->atom->has_plot)
        return;
    const struct plot *plot = &ui->atom->plot;
    double x = atom_radius(ui, r) * atom_length(ui);
    if (!plot_column(plot, x, &column))
        column = plot_part(&plot->x, x) < 0.5
                     ? plot->inside.column - 1
                     : plot->inside.column + plot->inside.columns;
    cursor_to(ui, column + by);
}

static void cursor_to_end(struct ui *ui, bool last)
{
    if (ui->atom && ui->atom->has_plot)
        cursor_to(ui, last ? CANVAS_COLUMNS_MAX : 0);
}

static void step_element(struct ui *ui, int by)
{
    int z = ui->choice.z + by;
    if (z >= 1 && z <= Z_MAX)
        ui_select(ui, z);
}

/* Actions of the view; false when it is another. */
static bool change_view(struct ui *ui, enum action action)
{
    struct atom_choice *a = &ui->choice.atom;
    if (action == ACTION_CURVES)
        a->curves = (enum atom_curves)((a->curves + 1) % CURVES_COUNT);
    else if (action == ACTION_AXIS)
        a->root = !a->root;
    else if (action == ACTION_WHOLE)
        a->whole = !a->whole;
    else
        return false;
    return true;
}

/* Goes on with what was stopped; else from table to plots and back, where only
 * one of them fits. */
static void open_other(struct ui *ui)
{
    bool went_on = atom_resume(ui);
    if (layout_of(ui).form != FORM_WHOLE)
        ui->detail = !ui->detail;
    else if (!went_on)
        ui_report(ui, false, "table and plots are both in sight");
}

static enum effect update(struct ui *ui, enum action action)
{
    if (change_view(ui, action))
        return EFFECT_REDRAW;
    if (action == ACTION_UP || action == ACTION_DOWN) {
        choose_shell(ui, action == ACTION_UP ? -1 : 1);
    } else if (action == ACTION_LEFT || action == ACTION_RIGHT) {
        move_cursor(ui, action == ACTION_LEFT ? -1 : 1);
    } else if (action == ACTION_HOME || action == ACTION_END) {
        cursor_to_end(ui, action == ACTION_END);
    } else if (action == ACTION_PAGE_UP || action == ACTION_PAGE_DOWN) {
        step_element(ui, action == ACTION_PAGE_UP ? -1 : 1);
    } else if (action == ACTION_OPEN) {
        open_other(ui);
    } else {
        return EFFECT_NONE;
    }
    return EFFECT_REDRAW;
}

enum effect atom_mouse(struct ui *ui, const struct event *event)
{
    struct atom_layout l = layout_of(ui);
    const struct atom_report *r = atom_solved(ui, SLOT_CHOSEN);
    const struct area *in = r ? &ui->atom->plot.inside : NULL;
    int row = event->row - l.table.row - head_rows(l.table);
    bool plots = l.form == FORM_WHOLE || ui->detail;
    if (event->button != MOUSE_LEFT) {
        step_element(ui, event->button == MOUSE_WHEEL_UP ? -1 : 1);
        return EFFECT_REDRAW;
    }
    if (!r)
        return EFFECT_NONE;
    if (plots && ui->atom->has_plot && event->column >= in->column &&
        event->column < in->column + in->columns && event->row >= in->row) {
        cursor_to(ui, event->column);
        return EFFECT_REDRAW;
    }
    bool table = l.form == FORM_WHOLE || !ui->detail;
    if (!table || event->column >= l.table.columns || row < 0 ||
        row >= l.table.rows - head_rows(l.table))
        return EFFECT_NONE;
    int chosen = atom_shell(ui, r);
    int first = table_first(chosen + 1, l.table.rows - head_rows(l.table),
                            r->subshell_count + 1);
    choose_shell(ui, first + row - 1 - chosen);
    return EFFECT_REDRAW;
}

const struct screen_ops screen_atom = {"Atom", update, draw};
