/* SPDX-License-Identifier: MIT */
/* The map: the grid of elements coloured by the chosen quantity, its scale,
 * and in small terminals a list. */
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "screens/parts.h"
#include "screens/trend.h"

#define GLYPH_GAP 0x2571 /* hatching */
#define GLYPH_PIN '*'

static struct map_layout layout_of(const struct ui *ui)
{
    return layout_map(ui->rows, ui->columns, ui->choice.grid);
}

/* The set that the selected species is shown against; where it does not exist,
 * the first one at this charge. NULL when there is none. */
static const struct provenance *shown_set(const struct ui *ui)
{
    struct ask ask;
    int z = ui->choice.z;
    if (!ui_ask(ui, z, ui->choice.charge, &ask))
        for (z = 1; z <= Z_MAX; z++)
            if (ui_ask(ui, z, ui->choice.charge, &ask))
                break;
    return z > Z_MAX ? NULL : study_row(ui->study, &ask).reference.provenance;
}

/* What is shown, in words: "slater", "zeff_1963", "slater - zeff_1963". */
static void shown_text(const struct ui *ui, struct text *t)
{
    const struct choice *c = &ui->choice;
    const struct provenance *set = shown_set(ui);
    char reference[UI_TEXT_MAX];
    struct text r = text_over(reference, sizeof reference);
    text_add(&r, set ? set->id : "no reference");
    if (set)
        add_asked_site(ui, set, &r);
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

/* What the map shows, in one line, and how many elements have a number. */
static void draw_map_title(const struct ui *ui, struct canvas *canvas)
{
    char buffer[UI_TEXT_MAX];
    char label[SUBSHELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    const struct choice *c = &ui->choice;
    const struct quantity *q = quantity_at(c->quantity);
    int with = 0;
    for (int z = 1; z <= Z_MAX; z++)
        with += ui->cells[z].has_value;
    int right = canvas->columns - 8;
    text_addf(&t, "%s, %s   ", q->title, ui_unit(ui, c->quantity)->id);
    shown_text(ui, &t);
    text_add(&t, "   ");
    charge_text(c->charge, &t);
    if (q->per_subshell)
        text_addf(&t, ", %s",
                  c->n ? subshell_print(c->n, c->l, label) : "outermost");
    canvas_text(canvas, 0, 0, right, ROLE_TITLE, buffer);
    snprintf(buffer, sizeof buffer, "%d/%d", with, Z_MAX);
    canvas_right(canvas, 0, right, 8, ROLE_QUIET, buffer);
}

static enum role cell_role(const struct ui *ui, int z)
{
    const struct map_cell *cell = &ui->cells[z];
    return cell->has_value ? scale_role(&ui->scale, cell->class_index)
                           : ROLE_GAP;
}

static uint32_t cell_glyph(const struct ui *ui, int z)
{
    const struct map_cell *cell = &ui->cells[z];
    return cell->has_value
               ? (uint32_t)scale_glyph(&ui->scale, cell->class_index)
               : GLYPH_GAP;
}

/* Lower rows of a high cell: the number, then the residual in per cent. */
static void draw_cell_numbers(const struct ui *ui, struct canvas *canvas, int z,
                              struct area a, enum role role)
{
    const struct map_cell *cell = &ui->cells[z];
    char out[NUMBER_TEXT_MAX];
    char percent[NUMBER_TEXT_MAX + 2];
    if (a.rows < 2 || !cell->has_value)
        return;
    int places = ui_unit(ui, ui->choice.quantity)->decimals;
    number_fit(cell->value, places, a.columns - 1, out);
    canvas_right(canvas, a.row + 1, a.column, a.columns - 1, role, out);
    if (a.rows < 3 || !cell->has_percent)
        return;
    bool is_large = cell->percent > 999.0 || cell->percent < -999.0;
    snprintf(percent, sizeof percent, is_large ? "%+.0e%%" : "%+.0f%%",
             cell->percent);
    canvas_right(canvas, a.row + 2, a.column, a.columns - 1, role, percent);
}

static void draw_cell(const struct ui *ui, struct canvas *canvas,
                      const struct map_layout *l, int z)
{
    struct area a = layout_cell(l, z, ui->choice.group3);
    enum role role = cell_role(ui, z);
    const char *symbol = element_at(z)->symbol;
    bool chosen = z == ui->choice.z;
    bool pinned = ui_pin_place(ui, z, ui->choice.charge) >= 0;
    /* lead, symbol, glyph: the narrower the cell, the fewer of them. */
    int lead = a.columns >= 4 ? 1 : 0;
    int end = a.column + a.columns - 1;
    canvas_fill(canvas, a.row, a.column, a.rows, a.columns, role,
                ui->cells[z].has_value ? ' ' : GLYPH_GAP);
    canvas_text(canvas, a.row, a.column + lead, 2, role, symbol);
    if (symbol[1] == '\0' && ui->cells[z].has_value)
        canvas_put(canvas, a.row, a.column + lead + 1, role, ' ');
    if (a.columns >= 3)
        canvas_put(canvas, a.row, end, role, cell_glyph(ui, z));
    draw_cell_numbers(ui, canvas, z, a, role);
    if (lead)
        canvas_put(canvas, a.row, a.column, role,
                   pinned                   ? GLYPH_PIN
                   : ui->cells[z].has_value ? ' '
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

static void draw_headings(const struct ui *ui, struct canvas *canvas,
                          const struct map_layout *l)
{
    char number[16];
    bool taken[GROUP_MAX + 1] = {false};
    for (int z = 1; z <= Z_MAX; z++) {
        const struct element *e = element_at(z);
        struct area a = layout_cell(l, z, ui->choice.group3);
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
static void draw_class(const struct ui *ui, struct canvas *canvas, int row,
                       int column, int box, int class_index)
{
    const struct map_cell *chosen = &ui->cells[ui->choice.z];
    enum role role = scale_role(&ui->scale, class_index);
    bool here = chosen->has_value && chosen->class_index == class_index;
    canvas_put(canvas, row, column + box / 2, role,
               (uint32_t)scale_glyph(&ui->scale, class_index));
    if (box == 3) {
        canvas_put(canvas, row, column, role, here ? '[' : ' ');
        canvas_put(canvas, row, column + 2, role, here ? ']' : ' ');
    }
    if (here)
        canvas_reverse(canvas, row, column, 1, box);
}

/* The scale: boxes of the classes with the numbers that part them. */
static void draw_scale(const struct ui *ui, struct canvas *canvas,
                       struct area a)
{
    const struct scale *s = &ui->scale;
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
        draw_class(ui, canvas, a.row, column, box, c);
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

/* Where there is no side area the facts stand in the gap of the grid between
 * groups 2 and 13, beside the hydrogen row. */
static struct area gap_area(const struct map_layout *l)
{
    int rows = 3 * l->cell_rows;
    int first = l->grid.column + 3 + 2 * l->cell_columns + 1;
    int columns = (l->width == GRID_18 ? 10 : 24) * l->cell_columns - 2;
    return (struct area){l->grid.row + 1, first, rows, columns};
}

static void draw_grid(const struct ui *ui, struct canvas *canvas,
                      const struct map_layout *l)
{
    draw_headings(ui, canvas, l);
    for (int z = 1; z <= Z_MAX; z++)
        if (z != ui->choice.z)
            draw_cell(ui, canvas, l, z);
    draw_cell(ui, canvas, l, ui->choice.z);
    draw_scale(ui, canvas, l->scale);
}

/* One element per line, the selected one in the middle. */
static void draw_list(const struct ui *ui, struct canvas *canvas, struct area a)
{
    char out[NUMBER_TEXT_MAX];
    int first = ui->choice.z - a.rows / 2;
    if (first > Z_MAX - a.rows + 1)
        first = Z_MAX - a.rows + 1;
    if (first < 1)
        first = 1;
    for (int i = 0; i < a.rows && first + i <= Z_MAX; i++) {
        int z = first + i;
        const struct map_cell *cell = &ui->cells[z];
        int row = a.row + i;
        bool chosen = z == ui->choice.z;
        canvas_textf(canvas, row, 0, a.columns,
                     chosen ? ROLE_CHOSEN : ROLE_TEXT, "%c%3d %-2s ",
                     chosen ? '>' : ' ', z, element_at(z)->symbol);
        if (cell->has_value)
            number_fit(cell->value, ui_unit(ui, ui->choice.quantity)->decimals,
                       10, out);
        canvas_right(canvas, row, 8, 10, cell->has_value ? ROLE_TEXT : ROLE_GAP,
                     cell->has_value ? out : "no number");
        canvas_put(canvas, row, 20, cell_role(ui, z), cell_glyph(ui, z));
        if (chosen) {
            canvas->cursor_row = row;
            canvas->cursor_column = 1;
        }
    }
}

bool trend_on_map(const struct ui *ui)
{
    struct map_layout l = layout_of(ui);
    return ui->screen == SCREEN_MAP && l.form == FORM_WHOLE && l.trend.rows > 0;
}

static void draw(struct ui *ui, struct canvas *canvas)
{
    struct map_layout l = layout_of(ui);
    bool detail = l.form != FORM_WHOLE && ui->detail;
    if (detail)
        draw_pane(ui, canvas,
                  (struct area){1, 0, canvas->rows - 2, canvas->columns});
    else if (l.form == FORM_LIST)
        draw_list(ui, canvas, l.pane);
    else
        draw_grid(ui, canvas, &l);
    draw_map_title(ui, canvas);
    if (l.form == FORM_WHOLE) {
        draw_facts(ui, canvas, l.side.rows ? l.side : gap_area(&l));
        draw_pane(ui, canvas, l.pane);
        /* the cursor stays on the selected cell */
        int row = canvas->cursor_row;
        int column = canvas->cursor_column;
        if (l.trend.rows > 0)
            draw_trend(ui, canvas, l.trend);
        canvas->cursor_row = row;
        canvas->cursor_column = column;
    }
    bool shared = l.message_row == l.key_row;
    bool busy = ui->prompt.kind != PROMPT_NONE || ui->message[0] != '\0' ||
                study_progress(ui->study).total > 0;
    if (!shared || !busy)
        draw_keys(ui, canvas, l.key_row);
    if (!shared || busy)
        draw_message(ui, canvas, l.message_row);
}

static enum effect step_by_z(struct ui *ui, int z)
{
    if (z >= 1 && z <= Z_MAX)
        ui_select(ui, z);
    return EFFECT_REDRAW;
}

static enum effect update(struct ui *ui, enum action action)
{
    struct map_layout l = layout_of(ui);
    int z = ui->choice.z;
    bool list = l.form == FORM_LIST || (l.form == FORM_SINGLE && ui->detail);
    int dx = action == ACTION_LEFT ? -1 : action == ACTION_RIGHT ? 1 : 0;
    int dy = action == ACTION_UP ? -1 : action == ACTION_DOWN ? 1 : 0;
    if (action == ACTION_HOME || action == ACTION_END)
        return step_by_z(ui, action == ACTION_HOME ? 1 : Z_MAX);
    if (action == ACTION_PAGE_UP || action == ACTION_PAGE_DOWN)
        return step_by_z(ui, action == ACTION_PAGE_UP ? z - 1 : z + 1);
    if ((dx || dy) && list)
        return step_by_z(ui, z + dx + dy);
    if (dx || dy)
        ui_select(ui, element_neighbour(z, dx, dy, l.width, ui->choice.group3));
    else if (action == ACTION_OPEN && l.form == FORM_WHOLE)
        ui_report(ui, false, "grid and pane are both in sight");
    else if (action == ACTION_OPEN)
        ui->detail = !ui->detail;
    else if (action == ACTION_BACK && (!ui->detail || l.form == FORM_WHOLE))
        ui_report(ui, false, "this is the map; q quits");
    else if (action == ACTION_BACK)
        ui->detail = false;
    else
        return EFFECT_NONE;
    return EFFECT_REDRAW;
}

/* The element drawn at a place, or 0. */
static int element_under(const struct ui *ui, int row, int column)
{
    struct map_layout l = layout_of(ui);
    for (int z = 1; z <= Z_MAX; z++) {
        struct area a = layout_cell(&l, z, ui->choice.group3);
        if (row >= a.row && row < a.row + a.rows && column >= a.column &&
            column < a.column + a.columns)
            return z;
    }
    return 0;
}

enum effect map_mouse(struct ui *ui, const struct event *event)
{
    if (event->button != MOUSE_LEFT) {
        enum action action =
            event->button == MOUSE_WHEEL_UP ? ACTION_PAGE_UP : ACTION_PAGE_DOWN;
        if (ui->screen == SCREEN_MAP)
            return update(ui, action);
        int *at = &ui->scroll[ui->screen];
        *at += event->button == MOUSE_WHEEL_UP ? -3 : 3;
        *at = *at < 0 ? 0 : *at;
        return EFFECT_REDRAW;
    }
    struct map_layout l = layout_of(ui);
    if (ui->screen != SCREEN_MAP || l.form == FORM_SENTENCE ||
        l.form == FORM_LIST)
        return EFFECT_NONE;
    int z = element_under(ui, event->row, event->column);
    if (z == 0)
        return EFFECT_NONE;
    ui_select(ui, z);
    return EFFECT_REDRAW;
}

const struct screen_ops screen_map = {"Map", update, draw};
