/* SPDX-License-Identifier: MIT */
#include "screens/map_grid.h"

#include <string.h>

#include "session/site.h"

#define GLYPH_GAP 0x2571 /* hatching */
#define GLYPH_PIN '*'

/* The set that the selected species is shown against; where it does not exist,
 * the first one at this charge. NULL when there is none. */
static const struct provenance *shown_set(const struct session *session)
{
    struct ask ask;
    int z = session->choice.z;
    if (!session_ask(session, z, session->choice.charge, &ask))
        for (z = 1; z <= Z_MAX; z++)
            if (session_ask(session, z, session->choice.charge, &ask))
                break;
    return z > Z_MAX ? NULL
                     : study_row(session->study, &ask).reference.provenance;
}

/* What is shown, in words: "slater", "zeff_1963", "slater - zeff_1963". */
static void shown_text(const struct session *session, struct text *t)
{
    const struct choice *c = &session->choice;
    const struct provenance *set = shown_set(session);
    char reference[SESSION_TEXT_MAX];
    struct text r = text_over(reference, sizeof reference);
    text_add(&r, set ? set->id : "no reference");
    if (set)
        session_asked_site(session, set, &r);
    const char *model = c->model ? c->model->id : "no model";
    if (c->shown == SHOWN_VALUE)
        text_add(t, model);
    else if (c->shown == SHOWN_REFERENCE)
        text_add(t, reference);
    else
        text_addf(t, "%s - %s", model, reference);
}

static void charge_text(int charge, struct text *t)
{
    if (charge == 0)
        text_add(t, "neutral");
    else
        text_addf(t, "charge %d%c", charge > 0 ? charge : -charge,
                  charge > 0 ? '+' : '-');
}

void screen_map_title_draw(const struct session *session,
                           const struct map_cells *map, struct canvas *canvas)
{
    char buffer[SESSION_TEXT_MAX];
    char label[SUBSHELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    const struct choice *c = &session->choice;
    const struct quantity *q = quantity_at(c->quantity);
    int with = 0;
    for (int z = 1; z <= Z_MAX; z++)
        with += map->cells[z].has_value;
    int right = canvas->columns - 8;
    text_addf(&t, "%s, %s   ", q->title,
              session_unit(session, c->quantity)->id);
    shown_text(session, &t);
    text_add(&t, "   ");
    charge_text(c->charge, &t);
    if (q->per_subshell)
        text_addf(&t, ", %s",
                  c->n ? subshell_print(c->n, c->l, label) : "outermost");
    canvas_text(canvas, 0, 0, right, ROLE_TITLE, buffer);
    snprintf(buffer, sizeof buffer, "%d/%d", with, Z_MAX);
    canvas_right(canvas, 0, right, 8, ROLE_QUIET, buffer);
}

static enum role cell_role(const struct map_cells *map, int z)
{
    const struct map_cell *cell = &map->cells[z];
    return cell->has_value ? scale_role(&map->scale, cell->class_index)
                           : ROLE_GAP;
}

static uint32_t cell_glyph(const struct map_cells *map, int z)
{
    const struct map_cell *cell = &map->cells[z];
    return cell->has_value
               ? (uint32_t)scale_glyph(&map->scale, cell->class_index)
               : GLYPH_GAP;
}

/* Lower rows of a high cell: the number, then the residual in per cent. */
static void draw_cell_numbers(const struct session *session,
                              const struct map_cells *map,
                              struct canvas *canvas, int z, struct area a,
                              enum role role)
{
    const struct map_cell *cell = &map->cells[z];
    char out[NUMBER_TEXT_MAX];
    char percent[NUMBER_TEXT_MAX + 2];
    if (a.rows < 2 || !cell->has_value)
        return;
    int places = session_unit(session, session->choice.quantity)->decimals;
    number_fit(cell->value, places, a.columns - 1, out);
    canvas_right(canvas, a.row + 1, a.column, a.columns - 1, role, out);
    if (a.rows < 3 || !cell->has_percent)
        return;
    bool is_large = cell->percent > 999.0 || cell->percent < -999.0;
    snprintf(percent, sizeof percent, is_large ? "%+.0e%%" : "%+.0f%%",
             cell->percent);
    canvas_right(canvas, a.row + 2, a.column, a.columns - 1, role, percent);
}

static void draw_cell(const struct session *session,
                      const struct map_cells *map, struct canvas *canvas,
                      const struct map_layout *l, int z)
{
    struct area a = screen_map_cell(l, z, session->choice.group3);
    enum role role = cell_role(map, z);
    const char *symbol = element_at(z)->symbol;
    bool chosen = z == session->choice.z;
    bool pinned = session_pin_place(session, z, session->choice.charge) >= 0;
    /* lead, symbol, glyph: the narrower the cell, the fewer of them. */
    int lead = a.columns >= 4 ? 1 : 0;
    int end = a.column + a.columns - 1;
    canvas_fill(canvas, a.row, a.column, a.rows, a.columns, role,
                map->cells[z].has_value ? ' ' : GLYPH_GAP);
    canvas_text(canvas, a.row, a.column + lead, 2, role, symbol);
    if (symbol[1] == '\0' && map->cells[z].has_value)
        canvas_put(canvas, a.row, a.column + lead + 1, role, ' ');
    if (a.columns >= 3)
        canvas_put(canvas, a.row, end, role, cell_glyph(map, z));
    draw_cell_numbers(session, map, canvas, z, a, role);
    if (lead)
        canvas_put(canvas, a.row, a.column, role,
                   pinned                    ? GLYPH_PIN
                   : map->cells[z].has_value ? ' '
                                             : GLYPH_GAP);
    if (!chosen)
        return;
    if (lead && !pinned)
        canvas_put(canvas, a.row, a.column, role, '[');
    if (a.columns >= 3)
        canvas_put(canvas, a.row, end, role, ']');
    canvas_reverse(canvas, a.row, a.column, a.rows, a.columns);
    canvas->cursor_row = a.row;
    canvas->cursor_column = a.column + lead;
}

static void draw_headings(const struct session *session, struct canvas *canvas,
                          const struct map_layout *l)
{
    char number[16];
    bool taken[GROUP_MAX + 1] = {false};
    for (int z = 1; z <= Z_MAX; z++) {
        const struct element *e = element_at(z);
        struct area a = screen_map_cell(l, z, session->choice.group3);
        if (l->grid.row > 0 && e->group && !taken[e->group]) {
            taken[e->group] = true;
            snprintf(number, sizeof number, "%d", e->group);
            canvas_right(canvas, l->grid.row, a.column, a.columns >= 4 ? 3 : 2,
                         ROLE_HEADING, number);
        }
        snprintf(number, sizeof number, "%d", e->period);
        canvas_text(canvas, a.row, 0, 2, ROLE_HEADING, number);
    }
}

/* The widest number between two classes. */
static int widest_bound(const struct scale *s)
{
    char out[NUMBER_TEXT_MAX];
    int widest = 1;
    for (int i = 0; i + 1 < SCALE_CLASSES; i++) {
        number_print_places(s->inner[i], s->places, out);
        int width = (int)strlen(out);
        widest = width > widest ? width : widest;
    }
    return widest;
}

/* Every bound is written, or every second, fourth … where they do not fit. */
static int bounds_every(const struct scale *s, int box, int ends, int columns)
{
    int every = 1;
    int width = widest_bound(s) + 2;
    while (every < SCALE_CLASSES &&
           (ends + (SCALE_CLASSES - 1) / every) * width + SCALE_CLASSES * box >
               columns)
        every *= 2;
    return every;
}

/* The box of one class; brackets where the selected element belongs. */
static void draw_class(const struct session *session,
                       const struct map_cells *map, struct canvas *canvas,
                       int row, int column, int box, int class_index)
{
    const struct map_cell *chosen = &map->cells[session->choice.z];
    enum role role = scale_role(&map->scale, class_index);
    bool here = chosen->has_value && chosen->class_index == class_index;
    canvas_put(canvas, row, column + box / 2, role,
               (uint32_t)scale_glyph(&map->scale, class_index));
    if (box == 3) {
        canvas_put(canvas, row, column, role, here ? '[' : ' ');
        canvas_put(canvas, row, column + 2, role, here ? ']' : ' ');
    }
    if (here)
        canvas_reverse(canvas, row, column, 1, box);
}

/* The scale: boxes of the classes with the numbers that part them. */
static void draw_scale(const struct session *session,
                       const struct map_cells *map, struct canvas *canvas,
                       struct area a)
{
    const struct scale *s = &map->scale;
    char out[NUMBER_TEXT_MAX];
    if (a.rows == 0)
        return;
    if (s->count == 0) {
        canvas_put(canvas, a.row, 0, ROLE_GAP, GLYPH_GAP);
        canvas_text(canvas, a.row, 2, a.columns - 2, ROLE_TEXT,
                    "no element has a number here");
        return;
    }
    int box = a.columns >= 75 ? 3 : 1;
    int ends = s->balance ? 0 : 2;
    int every = bounds_every(s, box, ends, a.columns);
    int column = 0;
    if (!s->balance)
        column = canvas_text(canvas, a.row, 0, a.columns, ROLE_TEXT,
                             number_print_places(s->lowest, s->places, out)) +
                 1;
    for (int c = 0; c < SCALE_CLASSES; c++) {
        bool last = c + 1 == SCALE_CLASSES;
        draw_class(session, map, canvas, a.row, column, box, c);
        column += box;
        /* A balance is open at both ends; so is a ramp whose last class is
         * empty. */
        if (last ? s->balance || s->highest <= s->inner[c - 1]
                 : (c + 1) % every != 0)
            continue;
        number_print_places(last ? s->highest : s->inner[c], s->places, out);
        column = canvas_text(canvas, a.row, column + 1, a.columns - column - 1,
                             ROLE_TEXT, out) +
                 1;
    }
    if (column + 13 > a.columns)
        return;
    canvas_put(canvas, a.row, column + 1, ROLE_GAP, GLYPH_GAP);
    canvas_text(canvas, a.row, column + 3, 9, ROLE_TEXT, "no number");
}

void screen_map_grid_draw(const struct session *session,
                          const struct map_cells *map, struct canvas *canvas,
                          const struct map_layout *l)
{
    draw_headings(session, canvas, l);
    for (int z = 1; z <= Z_MAX; z++)
        if (z != session->choice.z)
            draw_cell(session, map, canvas, l, z);
    draw_cell(session, map, canvas, l, session->choice.z);
    draw_scale(session, map, canvas, l->scale);
}

void screen_map_list_draw(const struct session *session,
                          const struct map_cells *map, struct canvas *canvas,
                          struct area a)
{
    char out[NUMBER_TEXT_MAX];
    int first = session->choice.z - a.rows / 2;
    if (first > Z_MAX - a.rows + 1)
        first = Z_MAX - a.rows + 1;
    if (first < 1)
        first = 1;
    for (int i = 0; i < a.rows && first + i <= Z_MAX; i++) {
        int z = first + i;
        const struct map_cell *cell = &map->cells[z];
        int row = a.row + i;
        bool chosen = z == session->choice.z;
        canvas_textf(canvas, row, 0, a.columns,
                     chosen ? ROLE_CHOSEN : ROLE_TEXT, "%c%3d %-2s ",
                     chosen ? '>' : ' ', z, element_at(z)->symbol);
        if (cell->has_value)
            number_fit(
                cell->value,
                session_unit(session, session->choice.quantity)->decimals, 10,
                out);
        canvas_right(canvas, row, 8, 10, cell->has_value ? ROLE_TEXT : ROLE_GAP,
                     cell->has_value ? out : "no number");
        canvas_put(canvas, row, 20, cell_role(map, z), cell_glyph(map, z));
        if (chosen) {
            canvas->cursor_row = row;
            canvas->cursor_column = 1;
        }
    }
}
