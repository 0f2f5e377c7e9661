/* SPDX-License-Identifier: MIT */
/* The screen Compare: pinned species as columns, everything known as rows,
 * differences against the first. */
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "report/comparison.h"
#include "screens/list.h"
#include "session/command.h"
#include "session/common.h"
#include "session/site.h"
#include "study/facts.h"

#define ATOM_COLUMNS 24
#define VALUE_COLUMNS 15

struct compare_state {
    struct comparison comparison; /* of the pins, or of the selection */
    unsigned choice_version, selection_version, solved_version;
    int scroll;
    int column_scroll; /* first pinned column shown */
};

static void clear(void *state)
{
    struct compare_state *own = state;
    comparison_clear(&own->comparison);
}

/* The pins, or the selection alone. */
static int compared(const struct session *session,
                    struct ask asks[COMPARISON_MAX])
{
    const struct choice *c = &session->choice;
    int count = 0;
    for (int i = 0; i < c->pin_count; i++)
        asks[count++] =
            (struct ask){.z = c->pins[i].z, .charge = c->pins[i].charge};
    if (count == 0)
        asks[count++] = (struct ask){.z = c->z, .charge = c->charge};
    for (int i = 0; i < count; i++) {
        struct ask ask;
        if (session_ask(session, asks[i].z, asks[i].charge, &ask))
            asks[i].configuration = ask.configuration;
        asks[i].n = c->n;
        asks[i].l = c->l;
        asks[i].site = c->site;
    }
    return count;
}

/* The second reference less the first set shown, as `compare --against` prints
 * it. */
static bool add_second(struct session *session, struct compare_state *own)
{
    const struct reference *against = session->choice.against;
    struct comparison *c = &own->comparison;
    struct status st = status_ok();
    for (int i = 0; against && i < c->line_count; i++) {
        const struct provenance *first = c->lines[i].provenance;
        if (c->lines[i].quantity != against->quantity || first->computed)
            continue;
        if (first == against->provenance ||
            comparison_add_pair(c, first, against->provenance, &st))
            return true;
        session_report(session, true, "%s", st.message);
        return false;
    }
    return true;
}

static bool is_fresh(const struct session *session,
                     const struct compare_state *own)
{
    return own->choice_version == session->choice_version &&
           own->selection_version == session->selection_version &&
           own->solved_version == session->solved_version;
}

/* Brings the comparison up to date; false when there is nothing to show. */
static bool refresh(struct session *session, struct compare_state *own)
{
    struct ask asks[COMPARISON_MAX];
    struct status st = status_ok();
    if (is_fresh(session, own))
        return own->comparison.count > 0;
    comparison_clear(&own->comparison);
    int count = compared(session, asks);
    if (!study_compare(session->study, asks, count, false,
                       session->choice.units, &own->comparison, &st)) {
        session_report(session, true, "%s", st.message);
        return false;
    }
    own->choice_version = session->choice_version;
    own->selection_version = session->selection_version;
    own->solved_version = session->solved_version;
    return add_second(session, own);
}

/* Columns of the labels: enough for the longest id where there is room. */
static int label_columns(const struct session *session)
{
    return session->columns >= 130 ? 48 : 30;
}

static int atoms_in(const struct session *session)
{
    int n = (session->columns - label_columns(session)) / ATOM_COLUMNS;
    return n > 0 ? n : 1;
}

/* Column of the i-th shown atom; the first atom always is the first column.
 */
static int atom_at(const struct compare_state *own, int i)
{
    return i == 0 ? 0 : i + own->column_scroll;
}

static void draw_value(struct canvas *canvas, int row, int column,
                       const struct comparison_line *line, int which)
{
    char buffer[SESSION_TEXT_MAX];
    char out[NUMBER_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    const struct reading *r = &line->readings[which];
    struct difference d;
    if (r->state != READING_OK) {
        canvas_right(canvas, row, column, VALUE_COLUMNS, ROLE_GAP, "-");
        return;
    }
    if (!line->provenance->computed) {
        reading_text(&t, r);
        if (r->site.spin != SPIN_NONE) /* the label tells the coordination */
            text_addf(&t, " %s", spin_id(r->site.spin));
    }
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
static const char *short_label(const struct session *session,
                               const struct compare_state *own, int line,
                               char out[SESSION_TEXT_MAX])
{
    struct text t = text_over(out, SESSION_TEXT_MAX);
    const char *quantity =
        quantity_at(own->comparison.lines[line].quantity)->id;
    size_t n = strlen(quantity);
    comparison_label(&own->comparison, line, &t);
    session_asked_site(session, own->comparison.lines[line].provenance, &t);
    return strncmp(out, quantity, n) == 0 && out[n] == '_' ? out + n + 1 : out;
}

static void draw_line(const struct session *session,
                      const struct compare_state *own, struct canvas *canvas,
                      int row, int item, bool first, int atoms)
{
    char label[SESSION_TEXT_MAX];
    const struct comparison_line *line = &own->comparison.lines[item];
    if (first)
        canvas_textf(canvas, row, 0, 9, ROLE_HEADING, "%s %s",
                     quantity_at(line->quantity)->symbol, line->unit->id);
    canvas_text(canvas, row, 10, label_columns(session) - 11, ROLE_TEXT,
                short_label(session, own, item, label));
    for (int i = 0; i < atoms; i++) {
        int which = atom_at(own, i);
        if (which < own->comparison.count)
            draw_value(canvas, row, label_columns(session) + i * ATOM_COLUMNS,
                       line, which);
    }
}

/* Facts, one row each per atom column, cut to the column. */
static void draw_fact_row(const struct session *session,
                          const struct compare_state *own,
                          struct canvas *canvas, int row,
                          const struct comparison_fact *fact, int atoms)
{
    canvas_text(canvas, row, 0, label_columns(session) - 1, ROLE_HEADING,
                fact->label);
    bool caution = strcmp(fact->label, fact_label(FACT_CAUTION)) == 0;
    for (int i = 0; i < atoms; i++) {
        int which = atom_at(own, i);
        if (which < own->comparison.count)
            canvas_text(canvas, row,
                        label_columns(session) + i * ATOM_COLUMNS + 1,
                        ATOM_COLUMNS - 2, caution ? ROLE_CAUTION : ROLE_TEXT,
                        fact->text[which]);
    }
}

static void draw_atoms(const struct session *session,
                       const struct compare_state *own, struct canvas *canvas,
                       int atoms)
{
    char ion[ION_TEXT_MAX];
    const struct comparison *c = &own->comparison;
    for (int i = 0; i < atoms; i++) {
        int which = atom_at(own, i);
        int column = label_columns(session) + i * ATOM_COLUMNS;
        if (which >= c->count)
            continue;
        species_print(&c->species[which], ion);
        canvas_right(canvas, 1, column, VALUE_COLUMNS, ROLE_PIN, ion);
        if (which > 0)
            canvas_right(canvas, 1, column + VALUE_COLUMNS,
                         ATOM_COLUMNS - VALUE_COLUMNS, ROLE_HEADING,
                         "to first");
    }
    if (c->count > atoms)
        canvas_textf(canvas, 1, 0, label_columns(session), ROLE_LABEL,
                     "%d of %d; arrows show others", atoms, c->count);
    else if (session->choice.pin_count == 0)
        canvas_text(canvas, 1, 0, label_columns(session), ROLE_LABEL,
                    "pin species on the map with p");
}

static void draw(struct session *session, void *state, struct canvas *canvas)
{
    struct compare_state *own = state;
    if (!refresh(session, own))
        return;
    const struct comparison *c = &own->comparison;
    int room = canvas->rows - 4;
    int total = c->fact_count + c->line_count;
    int atoms = atoms_in(session);
    int *skip = &own->scroll;
    if (*skip > total - room)
        *skip = total > room ? total - room : 0;
    if (own->column_scroll > c->count - atoms)
        own->column_scroll = c->count > atoms ? c->count - atoms : 0;
    draw_atoms(session, own, canvas, atoms);
    for (int i = 0; i < room && *skip + i < total; i++) {
        int item = *skip + i - c->fact_count;
        if (item < 0) {
            draw_fact_row(session, own, canvas, 2 + i, &c->facts[*skip + i],
                          atoms);
            continue;
        }
        bool first = i == 0 || item == 0 ||
                     c->lines[item].quantity != c->lines[item - 1].quantity ||
                     c->lines[item].unit != c->lines[item - 1].unit;
        draw_line(session, own, canvas, 2 + i, item, first, atoms);
    }
    canvas->cursor_row = 2;
    canvas->cursor_column = 0;
}

static enum effect move(struct session *session, void *state, enum move move)
{
    struct compare_state *own = state;
    if (move == MOVE_RIGHT)
        own->column_scroll++;
    else if (move != MOVE_LEFT)
        own->scroll = scroll_move(own->scroll, move, session->rows);
    else if (own->column_scroll > 0)
        own->column_scroll--;
    return EFFECT_REDRAW;
}

static enum effect mouse(struct session *session, void *state,
                         const struct event *event)
{
    struct compare_state *own = state;
    (void)session;
    if (event->button == MOUSE_LEFT)
        return EFFECT_NONE;
    own->scroll = scroll_wheel(own->scroll, event->button == MOUSE_WHEEL_UP);
    return EFFECT_REDRAW;
}

static void wants(struct session *session, void *state)
{
    (void)state;
    const struct choice *c = &session->choice;
    for (int p = 0; p < c->pin_count; p++)
        for (int m = 0; m < model_count(); m++)
            session_want(session, c->pins[p].z, c->pins[p].charge, model_at(m),
                         true);
    session_want_selected(session);
}

/* The site alone: what is compared is shown against every set. */
static const struct key_row keys[] = {
    {290, '@', 0, "@", "site", SESSION_SITE_HELP, false, 0, 0,
     &session_choose_compared_site, 0, 0},
};

static void export_file(const struct session *session, const void *state,
                        struct text *t)
{
    (void)session;
    (void)state;
    text_add(t, "compare.csv");
}

/* Whether one of the quantities that the ask's model gives waits to be solved:
 * the derived ones need other charge states as well. */
static bool lacks_any(const struct session *session, struct ask *ask)
{
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        ask->quantity = (enum quantity_id)q;
        ask->unit = NULL;
        if (model_gives(ask->model, ask->quantity) &&
            study_row(session->study, ask).state == ROW_NOT_SOLVED)
            return true;
    }
    return false;
}

/* A comparison holds all quantities, whichever is chosen. */
static int lacks(struct session *session, int z, int charge)
{
    int count = 0;
    for (int m = 0; m < model_count(); m++) {
        struct ask ask;
        struct status st = status_ok();
        if (model_at(m)->closed || !session_ask(session, z, charge, &ask))
            continue;
        ask.model = model_at(m);
        ask.reference = ask.against = NULL;
        if (!lacks_any(session, &ask))
            continue;
        count++;
        if (!study_want_all(session->study, &ask, true, &st))
            session_report(session, true, "nothing written: %s", st.message);
    }
    return count;
}

static int export_lacks(struct session *session, void *state)
{
    (void)state;
    const struct choice *c = &session->choice;
    int count = 0;
    if (c->pin_count == 0)
        return lacks(session, c->z, c->charge);
    for (int i = 0; i < c->pin_count; i++)
        count += lacks(session, c->pins[i].z, c->pins[i].charge);
    return count;
}

static bool export_report(struct session *session, void *state, unsigned parts,
                          struct report *report, struct status *st)
{
    struct compare_state *own = state;
    if (!refresh(session, own))
        return status_fail(st, STATUS_MEMORY, "out of memory");
    report_comparison(report, parts, &own->comparison);
    return true;
}

static void export_command(struct session *session, void *state, struct text *t)
{
    (void)state;
    const struct choice *c = &session->choice;
    char label[SUBSHELL_TEXT_MAX];
    bool given = c->pin_count == 0 && session_is_own(session, c->z, c->charge);
    for (int i = 0; i < c->pin_count; i++)
        given =
            given || session_is_own(session, c->pins[i].z, c->pins[i].charge);
    if (given && c->pin_count > 1)
        return;
    text_add(t, "outershell compare");
    if (c->pin_count == 0)
        session_command_species(t, c->z, c->charge);
    for (int i = 0; i < c->pin_count; i++)
        session_command_species(t, c->pins[i].z, c->pins[i].charge);
    if (c->n)
        text_addf(t, " --subshell %s", subshell_print(c->n, c->l, label));
    if (c->against)
        text_addf(t, " --against %s", c->against->provenance->id);
    session_command_site(session, t);
    if (given)
        session_command_own(session, t);
    session_command_units(session, t);
    session_command_data(session, t);
}

static const struct export_ops exports[] = {{
    .label = "the comparison",
    .file = export_file,
    .lacks = export_lacks,
    .report = export_report,
    .command = export_command,
}};

const struct screen_ops screen_compare = {
    .id = "compare",
    .title = "Compare",
    .state_size = sizeof(struct compare_state),
    .key = {210, 'c', 0, "c", "compare", "the pinned species side by side",
            true, 0, 0, 0, 0, 0},
    .groups = KEYS_SPECIES | KEYS_CHARGE | KEYS_UNIT | KEYS_SECOND |
              KEYS_CONFIGURATION | KEYS_SIDEWAYS,
    .keys = keys,
    .key_count = sizeof keys / sizeof keys[0],
    .exports = exports,
    .export_count = 1,
    .clear = clear,
    .draw = draw,
    .move = move,
    .mouse = mouse,
    .wants = wants,
};
