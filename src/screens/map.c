/* SPDX-License-Identifier: MIT */
/* The screen Map: the grid of elements coloured by the chosen quantity, its
 * scale, and in small terminals a list. */
#include "screens/facts.h"
#include "screens/list.h"
#include "screens/map_grid.h"
#include "screens/pane.h"
#include "screens/trend_view.h"
#include "session/command.h"
#include "session/common.h"
#include "session/rows.h"

struct map_state {
    struct map_cells cells;
    struct trend_view trend; /* beside the grid of a large terminal */
};

static void clear(void *state)
{
    struct map_state *map = state;
    audit_clear(&map->cells.usual);
}

static struct map_layout layout_of(const struct session *session)
{
    return screen_map_layout(session->rows, session->columns,
                             session->choice.grid);
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

static void draw_parts(struct session *session, struct map_state *map,
                       struct canvas *canvas, const struct map_layout *l)
{
    screen_facts_draw(session, canvas, l->side.rows ? l->side : gap_area(l));
    screen_pane_draw(session, &map->cells.usual, canvas, l->pane);
    /* the cursor stays on the selected cell */
    int row = canvas->cursor_row;
    int column = canvas->cursor_column;
    if (l->trend.rows > 0)
        screen_trend_draw(session, &map->trend, canvas, l->trend);
    canvas->cursor_row = row;
    canvas->cursor_column = column;
}

static void draw(struct session *session, void *state, struct canvas *canvas)
{
    struct map_state *map = state;
    struct map_layout l = layout_of(session);
    bool detail = l.form != FORM_WHOLE && session->detail;
    screen_map_refresh(session, &map->cells);
    if (detail)
        screen_pane_draw(
            session, &map->cells.usual, canvas,
            (struct area){1, 0, canvas->rows - 2, canvas->columns});
    else if (l.form == FORM_LIST)
        screen_map_list_draw(session, &map->cells, canvas, l.pane);
    else
        screen_map_grid_draw(session, &map->cells, canvas, &l);
    screen_map_title_draw(session, &map->cells, canvas);
    if (l.form == FORM_WHOLE)
        draw_parts(session, map, canvas, &l);
}

static void bottom(const struct session *session, const void *state,
                   int *message_row, int *key_row)
{
    (void)state;
    struct map_layout l = layout_of(session);
    *message_row = l.message_row;
    *key_row = l.key_row;
}

static enum effect step_by_z(struct session *session, int z)
{
    if (z >= 1 && z <= Z_MAX)
        session_select(session, z);
    return EFFECT_REDRAW;
}

static enum effect move(struct session *session, void *state, enum move move)
{
    (void)state;
    struct map_layout l = layout_of(session);
    int z = session->choice.z;
    bool list =
        l.form == FORM_LIST || (l.form == FORM_SINGLE && session->detail);
    int dx = move == MOVE_LEFT ? -1 : move == MOVE_RIGHT ? 1 : 0;
    int dy = move == MOVE_UP ? -1 : move == MOVE_DOWN ? 1 : 0;
    if (move == MOVE_HOME || move == MOVE_END)
        return step_by_z(session, move == MOVE_HOME ? 1 : Z_MAX);
    if (move == MOVE_PAGE_UP || move == MOVE_PAGE_DOWN)
        return step_by_z(session, move == MOVE_PAGE_UP ? z - 1 : z + 1);
    if (list)
        return step_by_z(session, z + dx + dy);
    session_select(
        session, element_neighbour(z, dx, dy, l.width, session->choice.group3));
    return EFFECT_REDRAW;
}

/* The element drawn at a place, or 0. */
static int element_under(const struct session *session, int row, int column)
{
    struct map_layout l = layout_of(session);
    for (int z = 1; z <= Z_MAX; z++) {
        struct area a = screen_map_cell(&l, z, session->choice.group3);
        if (row >= a.row && row < a.row + a.rows && column >= a.column &&
            column < a.column + a.columns)
            return z;
    }
    return 0;
}

/* A click selects, the wheel goes to the next element. */
static enum effect mouse(struct session *session, void *state,
                         const struct event *event)
{
    struct map_layout l = layout_of(session);
    if (event->button != MOUSE_LEFT)
        return move(session, state,
                    event->button == MOUSE_WHEEL_UP ? MOVE_PAGE_UP
                                                    : MOVE_PAGE_DOWN);
    if (l.form == FORM_SENTENCE || l.form == FORM_LIST)
        return EFFECT_NONE;
    int z = element_under(session, event->row, event->column);
    if (z == 0)
        return EFFECT_NONE;
    session_select(session, z);
    return EFFECT_REDRAW;
}

static bool back(struct session *session, void *state)
{
    (void)state;
    if (!session->detail || layout_of(session).form == FORM_WHOLE)
        session_report(session, false, "this is the map; q quits");
    else
        session->detail = false;
    return true;
}

static bool has_trend(const struct session *session)
{
    struct map_layout l = layout_of(session);
    return l.form == FORM_WHOLE && l.trend.rows > 0;
}

static void wants(struct session *session, void *state)
{
    (void)state;
    const struct choice *c = &session->choice;
    if (has_trend(session))
        screen_trend_want(session);
    if (c->model && !c->model->closed)
        for (int z = 1; z <= Z_MAX; z++)
            session_want(session, z, c->charge, c->model, false);
    session_want_selected(session);
}

static enum effect show_next(struct session *session, void *state)
{
    (void)state;
    struct choice *c = &session->choice;
    if (!c->model) {
        session_report(session, false,
                       "no model computes %s: the reference is shown",
                       quantity_at(c->quantity)->id);
        return EFFECT_REDRAW;
    }
    c->shown = (enum shown)((c->shown + 1) % SHOWN_COUNT);
    session_touch(session);
    return EFFECT_REDRAW;
}

static enum effect turn_grid(struct session *session, void *state)
{
    (void)state;
    struct choice *c = &session->choice;
    c->grid = c->grid == GRID_18 ? GRID_32 : GRID_18;
    if (layout_of(session).width != c->grid)
        session_report(session, false,
                       "32 columns, where the terminal is wide enough");
    return EFFECT_REDRAW;
}

static enum effect turn_group3(struct session *session, void *state)
{
    (void)state;
    struct choice *c = &session->choice;
    c->group3 = c->group3 == GRID_LU_LR ? GRID_LA_AC : GRID_LU_LR;
    return EFFECT_REDRAW;
}

static enum effect turn_detail(struct session *session, void *state)
{
    (void)state;
    if (layout_of(session).form == FORM_WHOLE)
        session_report(session, false, "grid and pane are both in sight");
    else
        session->detail = !session->detail;
    return EFFECT_REDRAW;
}

static const struct key_row keys[] = {
    {80, 'z', 0, "", "", "", false, 0, 0, &screen_trend_choose_walk, 0, 0},
    {120, 'v', 0, "v", "show",
     "colour by the model's value, the reference, or the residual", true, 0,
     show_next, 0, 0, 0},
    {360, 'g', 0, "g", "32 columns",
     "18 or 32 columns, where the terminal is wide enough", false, 0, turn_grid,
     0, 0, 0},
    {370, 'y', 0, "y", "group 3", "group 3 as Sc Y Lu Lr or as Sc Y La Ac",
     false, 0, turn_group3, 0, 0, 0},
    {390, 0, KEY_CODE_ENTER, "Enter", "details", SESSION_DETAILS_HELP, false, 0,
     turn_detail, 0, 0, 0},
};

static void row_file(const struct session *session, const void *state,
                     struct text *t)
{
    (void)state;
    char ion[ION_TEXT_MAX];
    const struct choice *c = &session->choice;
    text_addf(t, "%s-%s.csv", ion_print(c->z, c->charge, ion),
              quantity_at(c->quantity)->id);
}

static int row_lacks(struct session *session, void *state)
{
    (void)state;
    return session_lacks_models(session, session->choice.z,
                                session->choice.charge);
}

static bool row_report(struct session *session, void *state, unsigned parts,
                       struct report *report, struct status *st)
{
    (void)state;
    struct rows rows = {0};
    bool ok = session_rows_models(session, &rows, session->choice.z,
                                  session->choice.charge, st);
    return session_rows_report(&rows, ok, parts, report, st);
}

/* What all commands of the map end with. */
static void end_command(const struct session *session, bool ions, bool own,
                        struct text *t)
{
    session_command_choices(session, t, ions, true);
    if (own)
        session_command_own(session, t);
    session_command_units(session, t);
    session_command_data(session, t);
}

static void row_command(struct session *session, void *state, struct text *t)
{
    (void)state;
    const struct choice *c = &session->choice;
    text_add(t, "outershell list");
    session_command_species(t, c->z, c->charge);
    session_command_quantity(session, t);
    end_command(session, c->charge != 0,
                session_is_own(session, c->z, c->charge), t);
}

static bool has_pins(const struct session *session, const void *state)
{
    (void)state;
    return session->choice.pin_count > 0;
}

static void pins_file(const struct session *session, const void *state,
                      struct text *t)
{
    (void)state;
    text_addf(t, "pinned-%s.csv", quantity_at(session->choice.quantity)->id);
}

static int pins_lack(struct session *session, void *state)
{
    (void)state;
    const struct choice *c = &session->choice;
    int count = 0;
    for (int i = 0; i < c->pin_count; i++)
        count += session_lacks_models(session, c->pins[i].z, c->pins[i].charge);
    return count;
}

static bool pins_report(struct session *session, void *state, unsigned parts,
                        struct report *report, struct status *st)
{
    (void)state;
    const struct choice *c = &session->choice;
    struct rows rows = {0};
    bool ok = true;
    for (int i = 0; ok && i < c->pin_count; i++)
        ok = session_rows_models(session, &rows, c->pins[i].z,
                                 c->pins[i].charge, st);
    return session_rows_report(&rows, ok, parts, report, st);
}

static void pins_command(struct session *session, void *state, struct text *t)
{
    (void)state;
    const struct choice *c = &session->choice;
    bool own = false;
    bool ions = false;
    for (int i = 0; i < c->pin_count; i++) {
        own = own || session_is_own(session, c->pins[i].z, c->pins[i].charge);
        ions = ions || c->pins[i].charge != 0;
    }
    if (own && c->pin_count != 1)
        return;
    text_add(t, "outershell list");
    for (int i = 0; i < c->pin_count; i++)
        session_command_species(t, c->pins[i].z, c->pins[i].charge);
    session_command_quantity(session, t);
    end_command(session, ions, own, t);
}

static void sheet_file(const struct session *session, const void *state,
                       struct text *t)
{
    (void)state;
    const struct choice *c = &session->choice;
    text_addf(t, "%s-%s.csv", c->model ? c->model->id : "reference",
              quantity_at(c->quantity)->id);
}

static int sheet_lacks(struct session *session, void *state)
{
    (void)state;
    const struct choice *c = &session->choice;
    int count = 0;
    for (int z = 1; c->model && z <= Z_MAX; z++)
        count += session_lacks(session, z, c->charge, c->model);
    return count;
}

static bool sheet_report(struct session *session, void *state, unsigned parts,
                         struct report *report, struct status *st)
{
    (void)state;
    struct rows rows = {0};
    struct ask ask;
    bool ok = true;
    for (int z = 1; ok && z <= Z_MAX; z++)
        if (session_ask(session, z, session->choice.charge, &ask))
            ok = session_rows_add(session, &rows, &ask, st);
    return session_rows_report(&rows, ok, parts, report, st);
}

static void sheet_command(struct session *session, void *state, struct text *t)
{
    (void)state;
    const struct choice *c = &session->choice;
    if (session_is_own(session, c->configured.z, c->charge))
        return;
    text_add(t, "outershell list");
    session_command_quantity(session, t);
    if (c->model)
        text_addf(t, " --model %s", c->model->id);
    if (c->charge)
        text_addf(t, " --charge %d", c->charge);
    end_command(session, c->charge != 0, false, t);
}

static const struct export_ops exports[] = {
    {
        .label = "the selected species, all models",
        .file = row_file,
        .lacks = row_lacks,
        .report = row_report,
        .command = row_command,
    },
    {
        .label = "the pinned species, all models",
        .offered = has_pins,
        .file = pins_file,
        .lacks = pins_lack,
        .report = pins_report,
        .command = pins_command,
    },
    {
        .label = "the sheet: all elements, the chosen model",
        .file = sheet_file,
        .lacks = sheet_lacks,
        .report = sheet_report,
        .command = sheet_command,
    },
};

const struct screen_ops screen_map = {
    .id = "map",
    .title = "Map",
    .state_size = sizeof(struct map_state),
    .key = {310, 'm', 0, "m", "map", "the grid of elements", true, 0, 0, 0, 0,
            0},
    .groups = KEYS_QUANTITY | KEYS_MODEL | KEYS_SPECIES | KEYS_CHARGE |
              KEYS_UNIT | KEYS_SECOND | KEYS_CONFIGURATION | KEYS_SITE |
              KEYS_CURVES | KEYS_SIDEWAYS,
    .keys = keys,
    .key_count = sizeof keys / sizeof keys[0],
    .exports = exports,
    .export_count = sizeof exports / sizeof exports[0],
    .own_title = true,
    .clear = clear,
    .draw = draw,
    .bottom = bottom,
    .move = move,
    .mouse = mouse,
    .back = back,
    .wants = wants,
};
