/* SPDX-License-Identifier: MIT */
/* The screen Atom: the self-consistent atom of the selection, its subshells,
 * its radial density and the charge within a radius. */
#include <string.h>

#include "base/text.h"
#include "report/solved.h"
#include "screens/atom_internal.h"
#include "screens/list.h"
#include "session/command.h"
#include "session/common.h"

static const char *const curves_names[CURVES_COUNT] = {
    [CURVES_SHELL] = "subshell",
    [CURVES_ALL] = "all",
    [CURVES_CHARGE] = "charge",
};

static void init(struct session *session, void *state)
{
    struct atom_state *own = state;
    (void)session;
    own->method = method_default;
}

static void clear(void *state)
{
    screen_atom_release(state);
}

static struct atom_layout layout_of(const struct session *session)
{
    struct species species;
    int shells =
        session_species(session, &species) ? species.configuration.count : 0;
    return screen_atom_layout(session->rows, session->columns, shells);
}

static void add_method(struct text *t, struct atom_method method)
{
    text_addf(t, "%s, %s", functional_title(method.functional),
              relativity_title(method.relativity));
}

static void draw_atom_title(const struct session *session,
                            const struct atom_state *own, struct canvas *canvas)
{
    char line[SESSION_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    struct text t = text_over(line, sizeof line);
    struct species species;
    const struct element *e = element_at(session->choice.z);
    text_addf(&t, "%s  %d  %s  ", ion_print(e->z, session->choice.charge, ion),
              e->z, e->name);
    if (session_species(session, &species))
        species_configuration_text(&t, &species);
    text_add(&t, "   ");
    add_method(&t, own->method);
    canvas_text(canvas, 0, 6, canvas->columns - 6, ROLE_TITLE, line);
}

/* What a slot is doing, in words. */
static void slot_text(const struct session *session,
                      const struct atom_slot *slot, struct text *t)
{
    const struct atom_report *r = run_atom_report(slot->run);
    char out[NUMBER_TEXT_MAX];
    if (slot->failure[0] != '\0')
        text_addf(t, "no number: %s", slot->failure);
    else if (r->state == REPORT_FAILED)
        text_addf(t, "no number: %s (cycle %d)", r->reason, r->cycles);
    else if (r->state == REPORT_SOLVED)
        text_addf(t, "total energy %s %s; converged in %d cycles",
                  number_print_places(
                      screen_atom_energy(session, r->etot),
                      screen_atom_energy_unit(session)->decimals + 3, out),
                  screen_atom_energy_unit(session)->id, r->cycles);
    else if (slot->stopped)
        text_addf(t, "stopped at cycle %d; Enter goes on", r->cycles);
    else if (r->cycles == 0)
        text_add(t, "solving; Ctrl-C stops");
    else
        text_addf(t, "solving: cycle %d, residual %.1e e; Ctrl-C stops",
                  r->cycles, r->residual);
}

static void draw_state(const struct session *session,
                       const struct atom_state *own, struct canvas *canvas)
{
    char line[SESSION_TEXT_MAX];
    char name[ATOM_LABEL_MAX];
    struct text t = text_over(line, sizeof line);
    const struct atom_slot *slot = screen_atom_slot(session, own, SLOT_CHOSEN);
    const struct atom_slot *over = screen_atom_slot(session, own, SLOT_OVER);
    bool bad = false;
    if (slot) {
        slot_text(session, slot, &t);
        bad = slot->failure[0] != '\0' ||
              run_atom_report(slot->run)->state == REPORT_FAILED;
    } else {
        struct species species;
        bool there = session_species(session, &species);
        text_add(&t, there ? "solving; Ctrl-C stops" : "no such ion");
        bad = !there;
    }
    const char *failure = screen_atom_overlay_failure(session, own);
    if (failure[0] != '\0')
        text_addf(&t, "; %s: %s",
                  screen_atom_overlay_name(session, own, NULL, name), failure);
    else if (over && !screen_atom_solved(session, own, SLOT_OVER))
        text_addf(&t, "; %s: cycle %d",
                  screen_atom_overlay_name(session, own, NULL, name),
                  run_atom_report(over->run)->cycles);
    canvas_text(canvas, 1, 0, canvas->columns,
                bad || failure[0] != '\0' ? ROLE_CAUTION : ROLE_TEXT, line);
}

static void draw(struct session *session, void *state, struct canvas *canvas)
{
    struct atom_state *own = state;
    struct atom_layout l = layout_of(session);
    const struct atom_report *r = screen_atom_solved(session, own, SLOT_CHOSEN);
    draw_atom_title(session, own, canvas);
    draw_state(session, own, canvas);
    if (!r)
        return;
    bool table = l.form == FORM_WHOLE || !session->detail;
    bool plots = l.form == FORM_WHOLE || session->detail;
    if (table)
        screen_atom_table_draw(session, own, canvas, l.table, r, l.wide);
    if (plots) {
        screen_atom_cursor_draw(session, own, canvas, l.cursor, r);
        screen_atom_plots_draw(session, own, canvas, &l, r);
    }
    if (l.levels.rows > 0)
        screen_atom_levels_draw(session, canvas, l.levels, r);
}

/* Chooses the subshell `by` rows away; -1 is all electrons. */
static void choose_shell(struct session *session, struct atom_state *own,
                         int by)
{
    const struct atom_report *r = screen_atom_solved(session, own, SLOT_CHOSEN);
    if (!r)
        return;
    int shell = screen_atom_shell(own, r) + by;
    if (shell < -1 || shell >= r->subshell_count)
        return;
    own->n = shell < 0 ? -1 : r->subshells[shell].n;
    own->l = shell < 0 ? 0 : r->subshells[shell].l;
    own->radius = 0.0;
}

/* Puts the cursor on a column of the plot. */
static void cursor_to(struct session *session, struct atom_state *own,
                      int column)
{
    const struct atom_report *r = screen_atom_solved(session, own, SLOT_CHOSEN);
    const struct plot *plot = r ? &own->plot : NULL;
    if (!r || !own->has_plot)
        return;
    int last = plot->inside.column + plot->inside.columns - 1;
    if (column < plot->inside.column)
        column = plot->inside.column;
    if (column > last)
        column = last;
    own->radius = plot_column_x(plot, column) / screen_atom_length(session);
}

/* Moves the cursor by columns; from beyond an end, back to it. */
static void move_cursor(struct session *session, struct atom_state *own, int by)
{
    const struct atom_report *r = screen_atom_solved(session, own, SLOT_CHOSEN);
    int column;
    if (!r || !own->has_plot)
        return;
    const struct plot *plot = &own->plot;
    double x = screen_atom_radius(own, r) * screen_atom_length(session);
    if (!plot_column(plot, x, &column))
        column = plot_part(&plot->x, x) < 0.5
                     ? plot->inside.column - 1
                     : plot->inside.column + plot->inside.columns;
    cursor_to(session, own, column + by);
}

static void step_element(struct session *session, int by)
{
    int z = session->choice.z + by;
    if (z >= 1 && z <= Z_MAX)
        session_select(session, z);
}

static enum effect move(struct session *session, void *state, enum move move)
{
    struct atom_state *own = state;
    if (move == MOVE_UP || move == MOVE_DOWN)
        choose_shell(session, own, move == MOVE_UP ? -1 : 1);
    else if (move == MOVE_LEFT || move == MOVE_RIGHT)
        move_cursor(session, own, move == MOVE_LEFT ? -1 : 1);
    else if (move == MOVE_HOME || move == MOVE_END)
        cursor_to(session, own, move == MOVE_END ? CANVAS_COLUMNS_MAX : 0);
    else
        step_element(session, move == MOVE_PAGE_UP ? -1 : 1);
    return EFFECT_REDRAW;
}

/* Whether a click is on the plot: then the cursor goes there. */
static bool on_plot(const struct session *session, const struct atom_state *own,
                    const struct event *event)
{
    const struct area *in = &own->plot.inside;
    return (layout_of(session).form == FORM_WHOLE || session->detail) &&
           own->has_plot && event->column >= in->column &&
           event->column < in->column + in->columns && event->row >= in->row;
}

/* A click moves the cursor or chooses a subshell, the wheel goes to the next
 * element. */
static enum effect mouse(struct session *session, void *state,
                         const struct event *event)
{
    struct atom_state *own = state;
    struct atom_layout l = layout_of(session);
    const struct atom_report *r = screen_atom_solved(session, own, SLOT_CHOSEN);
    int heads = screen_atom_table_heads(l.table);
    int row = event->row - l.table.row - heads;
    if (event->button != MOUSE_LEFT) {
        step_element(session, event->button == MOUSE_WHEEL_UP ? -1 : 1);
        return EFFECT_REDRAW;
    }
    if (!r)
        return EFFECT_NONE;
    if (on_plot(session, own, event)) {
        cursor_to(session, own, event->column);
        return EFFECT_REDRAW;
    }
    bool table = l.form == FORM_WHOLE || !session->detail;
    if (!table || event->column >= l.table.columns || row < 0 ||
        row >= l.table.rows - heads)
        return EFFECT_NONE;
    int chosen = screen_atom_shell(own, r);
    int first = screen_atom_table_first(chosen + 1, l.table.rows - heads,
                                        r->subshell_count + 1);
    choose_shell(session, own, first + row - 1 - chosen);
    return EFFECT_REDRAW;
}

static bool has_work(const struct session *session, const void *state)
{
    return screen_atom_pending(session, state);
}

static void step(struct session *session, void *state, bool *changed)
{
    screen_atom_step(session, state, changed);
}

static bool stop(struct session *session, void *state)
{
    if (!screen_atom_stop(session, state))
        return false;
    session_report(session, false, "stopped; Enter goes on");
    return true;
}

static enum effect turn_curves(struct session *session, void *state)
{
    struct atom_state *own = state;
    (void)session;
    own->curves = (enum atom_curves)((own->curves + 1) % CURVES_COUNT);
    return EFFECT_REDRAW;
}

static enum effect turn_axis(struct session *session, void *state)
{
    struct atom_state *own = state;
    (void)session;
    own->root = !own->root;
    return EFFECT_REDRAW;
}

static enum effect turn_range(struct session *session, void *state)
{
    struct atom_state *own = state;
    (void)session;
    own->whole = !own->whole;
    return EFFECT_REDRAW;
}

/* Goes on with what was stopped; else from table to plots and back, where only
 * one of them fits. */
static enum effect turn_detail(struct session *session, void *state)
{
    bool went_on = screen_atom_resume(state);
    if (layout_of(session).form != FORM_WHOLE)
        session->detail = !session->detail;
    else if (!went_on)
        session_report(session, false, "table and plots are both in sight");
    return EFFECT_REDRAW;
}

static const struct key_row keys[] = {
    {130, 'v', 0, "v", "curves",
     "draw the subshell, all subshells, or the charge within r", true, 0,
     turn_curves, 0, 0, 0},
    {140, 'n', 0, "n", "overlay",
     "lay another atom, equation or model's orbital over this one", true, 0, 0,
     &screen_atom_choose_overlay, 0, 0},
    {150, 'b', 0, "b", "method", "choose functional and equation", true, 0, 0,
     &screen_atom_choose_method, 0, 0},
    {160, 'z', 0, "z", "range",
     "the axis of r from near the subshell on, or from the nucleus", true, 0,
     turn_range, 0, 0, 0},
    {170, 'g', 0, "g", "axis", "logarithmic or square-root axis of r", true, 0,
     turn_axis, 0, 0, 0},
    {300, 'u', 0, "u", "unit", SESSION_UNIT_HELP, true, 0, 0,
     &screen_atom_choose_unit, 0, 0},
    {390, 0, KEY_CODE_ENTER, "Enter", "details", SESSION_DETAILS_HELP, false, 0,
     turn_detail, 0, 0, 0},
};

static void export_file(const struct session *session, const void *state,
                        struct text *t)
{
    (void)state;
    char ion[ION_TEXT_MAX];
    text_addf(t, "%s-atom.csv",
              ion_print(session->choice.z, session->choice.charge, ion));
}

static int export_lacks(struct session *session, void *state)
{
    return screen_atom_pending(session, state);
}

static bool export_report(struct session *session, void *state, unsigned parts,
                          struct report *report, struct status *st)
{
    const struct atom_report *atom =
        screen_atom_solved(session, state, SLOT_CHOSEN);
    if (!atom)
        return status_fail(st, STATUS_CONVERGENCE, "the atom is not solved");
    report_solved(report, parts, atom, run_atom_source(atom->method.functional),
                  screen_atom_energy_unit(session),
                  session_unit(session, QUANTITY_RADIUS));
    return true;
}

static void export_command(struct session *session, void *state, struct text *t)
{
    const struct atom_state *own = state;
    const struct choice *c = &session->choice;
    text_add(t, "outershell atom");
    session_command_species(t, c->z, c->charge);
    if (session_is_own(session, c->z, c->charge))
        session_command_own(session, t);
    text_addf(t, " --functional %s --relativity %s --unit %s,%s",
              functional_id(own->method.functional),
              relativity_id(own->method.relativity),
              session_unit(session, QUANTITY_RADIUS)->id,
              screen_atom_energy_unit(session)->id);
    session_command_data(session, t);
}

static const struct export_ops exports[] = {{
    .label = "the atom",
    .file = export_file,
    .lacks = export_lacks,
    .report = export_report,
    .command = export_command,
}};

static void save(const struct session *session, const void *state,
                 struct text *t)
{
    const struct atom_state *own = state;
    (void)session;
    text_addf(t, "functional %s\n", functional_id(own->method.functional));
    text_addf(t, "relativity %s\n", relativity_id(own->method.relativity));
    text_addf(t, "curves %s\n", curves_names[own->curves]);
    text_addf(t, "axis %s\n", own->root ? "root" : "log");
}

static void load_functional(struct atom_state *own, const char *value)
{
    for (int f = 0; f < FUNCTIONAL_COUNT; f++)
        if (strcmp(value, functional_id((enum functional)f)) == 0)
            own->method.functional = (enum functional)f;
}

static void load_relativity(struct atom_state *own, const char *value)
{
    for (int r = 0; r < RELATIVITY_COUNT; r++)
        if (strcmp(value, relativity_id((enum relativity)r)) == 0)
            own->method.relativity = (enum relativity)r;
}

static void load_curves(struct atom_state *own, const char *value)
{
    for (int c = 0; c < CURVES_COUNT; c++)
        if (strcmp(value, curves_names[c]) == 0)
            own->curves = (enum atom_curves)c;
}

static bool load(struct session *session, void *state, const char *key,
                 const char *value)
{
    struct atom_state *own = state;
    (void)session;
    if (strcmp(key, "functional") == 0)
        load_functional(own, value);
    else if (strcmp(key, "relativity") == 0)
        load_relativity(own, value);
    else if (strcmp(key, "curves") == 0)
        load_curves(own, value);
    else if (strcmp(key, "axis") == 0)
        own->root = strcmp(value, "root") == 0;
    else
        return false;
    return true;
}

const struct screen_ops screen_atom = {
    .id = "atom",
    .title = "Atom",
    .state_size = sizeof(struct atom_state),
    .key = {240, 'a', 0, "a", "atom", "the self-consistent atom", true, 0, 0, 0,
            0, 0},
    .groups = KEYS_SPECIES | KEYS_CHARGE | KEYS_CONFIGURATION | KEYS_CURVES |
              KEYS_SIDEWAYS,
    .keys = keys,
    .key_count = sizeof keys / sizeof keys[0],
    .exports = exports,
    .export_count = 1,
    .init = init,
    .clear = clear,
    .draw = draw,
    .move = move,
    .mouse = mouse,
    .has_work = has_work,
    .step = step,
    .stop = stop,
    .save = save,
    .load = load,
};
