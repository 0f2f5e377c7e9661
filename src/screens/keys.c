/* SPDX-License-Identifier: MIT */
/* The screen Keys: what every key does, and how to read the other screens. */
#include "session/keys.h"

#include "canvas/flow.h"
#include "screens/list.h"

struct keys_state {
    int scroll;
};

static void draw_rows(const struct session *session, struct flow *flow)
{
    struct key_help help[KEY_ROWS_MAX];
    const struct area *area = &flow->area;
    int count = session_key_help(session->screens, session->screen_count, help);
    for (int i = 0; i < count; i++) {
        int row = area->row + flow->used - flow->skip;
        char line[SESSION_TEXT_MAX];
        struct text t = text_over(line, sizeof line);
        if (row >= area->row && row < area->row + area->rows)
            canvas_text(flow->canvas, row, area->column, 10, ROLE_KEY,
                        help[i].row->name);
        session_key_explain(session->screens, session->screen_count, help,
                            count, i, &t);
        flow_text(flow, ROLE_TEXT, 11, line);
    }
}

static void draw_words(struct flow *flow)
{
    flow_blank(flow);
    flow_text(flow, ROLE_HEADING, 0, "The map");
    flow_text(
        flow, ROLE_TEXT, 0,
        "Each cell bears the class of its value beside the symbol: 1 to 9 "
        "from low to high; for residuals v - = + ^ from far below the "
        "reference to far above it. A hatched cell has no number, and the "
        "pane says why. A star marks a pin, brackets the selection.");
    flow_blank(flow);
    flow_text(flow, ROLE_HEADING, 0, "Trend and audit");
    flow_text(
        flow, ROLE_TEXT, 0,
        "Each model keeps its mark. A circle is a stored value, a diamond "
        "one that is extrapolated, theoretical or estimated, a square a "
        "second set; bars are one standard uncertainty. What joins the "
        "marks is no value, and a gap is not bridged. In the audit a star "
        "marks the model with the smallest residuals over the species "
        "that all have; a model that gives another thing than the set "
        "holds, one whose calculation the set is, and one with less than "
        "half of the residuals do not take part.");
    flow_blank(flow);
    flow_text(flow, ROLE_HEADING, 0, "The atom");
    flow_text(
        flow, ROLE_TEXT, 0,
        "D(r) is the radial density, electrons per unit of length. Z_eff(r) is "
        "Z less all electrons within r. In the table Z_eff follows from the "
        "energy, n sqrt(-2E/hartree); from the size, hydrogen's mean radius "
        "over this one's; by Gauss's law at max D, the outermost maximum. The "
        "area is the subshell, the solid line all electrons, the broken line "
        "what is laid over.");
    flow_blank(flow);
    flow_text(flow, ROLE_HEADING, 0, "The numbers");
    flow_text(flow, ROLE_TEXT, 0,
              "Residual = model - reference, in the unit shown and in per cent "
              "of the reference. A reference with another definition than the "
              "model's is marked with the sign for unequal: such a residual "
              "holds the difference of the definitions as well.");
}

static void draw(struct session *session, void *state, struct canvas *canvas)
{
    struct keys_state *own = state;
    struct area area = {1, 1, canvas->rows - 3, canvas->columns - 2};
    struct flow flow = {canvas, area, own->scroll, 0};
    draw_rows(session, &flow);
    draw_words(&flow);
    if (own->scroll > flow.used - 1)
        own->scroll = flow.used > 0 ? flow.used - 1 : 0;
}

static enum effect move(struct session *session, void *state, enum move move)
{
    struct keys_state *own = state;
    own->scroll = scroll_move(own->scroll, move, session->rows);
    return EFFECT_REDRAW;
}

static enum effect mouse(struct session *session, void *state,
                         const struct event *event)
{
    struct keys_state *own = state;
    (void)session;
    if (event->button == MOUSE_LEFT)
        return EFFECT_NONE;
    own->scroll = scroll_wheel(own->scroll, event->button == MOUSE_WHEEL_UP);
    return EFFECT_REDRAW;
}

static void wants(struct session *session, void *state)
{
    (void)state;
    session_want_selected(session);
}

const struct screen_ops screen_keys = {
    .id = "keys",
    .title = "Keys",
    .state_size = sizeof(struct keys_state),
    .key = {10, '?', 0, "?", "keys", "what every key does", true, 0, 0, 0, 0,
            0},
    .returns = true,
    .draw = draw,
    .move = move,
    .mouse = mouse,
    .wants = wants,
};
