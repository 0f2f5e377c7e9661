/* SPDX-License-Identifier: MIT */
/* The table of keys, and the screen that explains them. */
#include "screens/parts.h"

#include <string.h>

#define ON_MAP (1u << SCREEN_MAP)
#define ON_COMPARE (1u << SCREEN_COMPARE)
#define ON_TREND (1u << SCREEN_TREND)
#define ON_AUDIT (1u << SCREEN_AUDIT)
#define ON_ATOM (1u << SCREEN_ATOM)
#define ON_SOURCES (1u << SCREEN_SOURCES)
#define ON_KEYS (1u << SCREEN_KEYS)
#define ON_VALUES (ON_MAP | ON_TREND | ON_AUDIT)
#define ON_DATA (ON_MAP | ON_COMPARE | ON_TREND | ON_ATOM)
#define ON_ALL (ON_DATA | ON_AUDIT | ON_SOURCES | ON_KEYS)

/* Capital letters and digits are missing on purpose: they start a jump. */
static const struct key_row rows[] = {
    {ACTION_KEYS, '?', 0, "?", "keys", "what every key does", true, ON_ALL},
    {ACTION_QUIT, 'q', 0, "q", "quit", "leave the program", true, ON_ALL},
    {ACTION_QUANTITY, 'w', 0, "w", "quantity", "choose what is shown", true,
     ON_VALUES},
    {ACTION_MODEL, 'b', 0, "b", "model", "choose by which model", true,
     ON_MAP | ON_AUDIT},
    {ACTION_MODELS, 'b', 0, "b", "curves", "choose which models have a curve",
     true, ON_TREND},
    {ACTION_REFERENCE, 'r', 0, "r", "reference",
     "choose against which stored set, and which kinds of its values", true,
     ON_VALUES},
    {ACTION_WALK, 'z', 0, "z", "walk",
     "along period, group, row of the block, charges, isoelectronic "
     "series",
     true, ON_TREND},
    {ACTION_WALK, 'z', 0, "", "", "", false, ON_MAP},
    {ACTION_PERCENT, 'v', 0, "v", "%",
     "residuals in the unit or in per cent of the reference", true, ON_TREND},
    {ACTION_TREND_AXIS, 'g', 0, "g", "axis",
     "linear or logarithmic axis, or as the values ask for", true, ON_TREND},
    {ACTION_STATISTIC, 'v', 0, "v", "figure",
     "mean size, per cent, mean, root mean square, largest, or counts", true,
     ON_AUDIT},
    {ACTION_SHOWN, 'v', 0, "v", "show",
     "colour by the model's value, the reference, or the residual", true,
     ON_MAP},
    {ACTION_CURVES, 'v', 0, "v", "curves",
     "draw the subshell, all subshells, or the charge within r", true, ON_ATOM},
    {ACTION_OVERLAY, 'n', 0, "n", "overlay",
     "lay another atom, equation or model's orbital over this one", true,
     ON_ATOM},
    {ACTION_METHOD, 'b', 0, "b", "method", "choose functional and equation",
     true, ON_ATOM},
    {ACTION_WHOLE, 'z', 0, "z", "range",
     "the axis of r from near the subshell on, or from the nucleus", true,
     ON_ATOM},
    {ACTION_AXIS, 'g', 0, "g", "axis", "logarithmic or square-root axis of r",
     true, ON_ATOM},
    {ACTION_DOTS, '.', 0, ".", "dots",
     "draw curves in braille dots, or in blocks", false,
     ON_MAP | ON_TREND | ON_ATOM},
    {ACTION_TREND, 't', 0, "t", "trend",
     "the quantity along a period, a group, charges", true, ON_ALL},
    {ACTION_PIN, 'p', 0, "p", "pin", "pin or unpin the selected species", true,
     ON_DATA},
    {ACTION_COMPARE, 'c', 0, "c", "compare", "the pinned species side by side",
     true, ON_ALL},
    {ACTION_AUDIT, 'd', 0, "d", "audit",
     "how large the residuals of each model are, and where", true, ON_ALL},
    {ACTION_AGAINST, 'n', 0, "n", "second",
     "choose a second stored set beside the reference", true,
     ON_MAP | ON_COMPARE | ON_TREND},
    {ACTION_ATOM, 'a', 0, "a", "atom", "the self-consistent atom", true,
     ON_ALL},
    {ACTION_EXPORT, 'e', 0, "e", "export", "write what is shown to a CSV file",
     true, ON_DATA | ON_AUDIT},
    {ACTION_CHARGE_UP, '+', 0, "+", "charge", "one electron less", true,
     ON_DATA | ON_AUDIT},
    {ACTION_CHARGE_UP, '=', 0, "=", "", "", false, ON_DATA | ON_AUDIT},
    {ACTION_CHARGE_DOWN, '-', 0, "-", "charge", "one electron more", false,
     ON_DATA | ON_AUDIT},
    {ACTION_SUBSHELL, 'o', 0, "o", "subshell",
     "choose a subshell, or the outermost", true, ON_VALUES},
    {ACTION_CONFIGURATION, ':', 0, ":", "configuration",
     "type electrons of your own for the selected species", true,
     ON_MAP | ON_COMPARE | ON_TREND | ON_ATOM},
    {ACTION_SITE, '@', 0, "@", "site",
     "choose coordination and spin of the ion, for sets of ionic radii", false,
     ON_MAP | ON_COMPARE | ON_TREND},
    {ACTION_UNIT, 'u', 0, "u", "unit", "choose the unit of the quantity", true,
     ON_DATA | ON_AUDIT},
    {ACTION_MAP, 'm', 0, "m", "map", "the grid of elements", true, ON_ALL},
    {ACTION_SOURCES, 's', 0, "s", "sources", "what the numbers rest on", true,
     ON_ALL},
    {ACTION_NEXT_SCREEN, 0, KEY_CODE_TAB, "Tab", "next screen",
     "go to the next screen", false, ON_ALL},
    {ACTION_JUMP, '/', 0, "/", "find",
     "jump to a symbol, name or number; a capital letter or a digit starts it "
     "too",
     true, ON_DATA},
    {ACTION_UNPIN_ALL, 'x', 0, "x", "unpin all", "drop all pins", false,
     ON_DATA},
    {ACTION_GRID, 'g', 0, "g", "32 columns",
     "18 or 32 columns, where the terminal is wide enough", false, ON_MAP},
    {ACTION_GROUP3, 'y', 0, "y", "group 3",
     "group 3 as Sc Y Lu Lr or as Sc Y La Ac", false, ON_MAP},
    {ACTION_OPEN, 0, KEY_CODE_ENTER, "Enter", "open",
     "to the species of the part, then to the selected one on the map", true,
     ON_AUDIT},
    {ACTION_OPEN, 0, KEY_CODE_ENTER, "Enter", "details",
     "grid or pane, table or plots, where only one fits; goes on solving",
     false, ON_MAP | ON_ATOM},
    {ACTION_BACK, 0, KEY_CODE_ESCAPE, "Esc", "back", "back to the map", false,
     ON_ALL},
    {ACTION_MOUSE, 'i', 0, "i", "mouse",
     "mouse on or off; while it is on the terminal cannot select text", false,
     ON_ALL},
    {ACTION_FORGET, 'f', 0, "f", "forget",
     "forget the remembered view and keep none from now on", false, ON_ALL},
    {ACTION_NONE, 0, KEY_CODE_CLEAR, "Ctrl-U", "clear",
     "empty the line that is being typed", false, ON_ALL},
    {ACTION_REPAINT, 0, KEY_CODE_REPAINT, "Ctrl-L", "repaint",
     "paint the screen anew", false, ON_ALL},
    {ACTION_UP, 0, KEY_CODE_UP, "arrows", "move",
     "move the selection, or scroll", false, ON_ALL},
    {ACTION_DOWN, 0, KEY_CODE_DOWN, "", "", "", false, ON_ALL},
    {ACTION_LEFT, 0, KEY_CODE_LEFT, "", "", "", false, ON_DATA | ON_AUDIT},
    {ACTION_RIGHT, 0, KEY_CODE_RIGHT, "", "", "", false, ON_DATA | ON_AUDIT},
    {ACTION_LEFT, 'h', 0, "h j k l", "move", "the same", false,
     ON_DATA | ON_AUDIT},
    {ACTION_DOWN, 'j', 0, "", "", "", false, ON_ALL},
    {ACTION_UP, 'k', 0, "", "", "", false, ON_ALL},
    {ACTION_RIGHT, 'l', 0, "", "", "", false, ON_DATA | ON_AUDIT},
    {ACTION_HOME, 0, KEY_CODE_HOME, "Home End", "ends",
     "first or last element, top or bottom", false, ON_ALL},
    {ACTION_END, 0, KEY_CODE_END, "", "", "", false, ON_ALL},
    {ACTION_PAGE_UP, 0, KEY_CODE_PAGE_UP, "PgUp PgDn", "element",
     "the element before or after, or one page", false, ON_ALL},
    {ACTION_PAGE_DOWN, 0, KEY_CODE_PAGE_DOWN, "", "", "", false, ON_ALL},
};

int key_row_count(void)
{
    return (int)(sizeof rows / sizeof rows[0]);
}

const struct key_row *key_row_at(int i)
{
    return &rows[i];
}

enum action key_action(const struct event *event, enum screen_id screen)
{
    for (int i = 0; i < key_row_count(); i++) {
        const struct key_row *r = &rows[i];
        if (!(r->screens >> screen & 1))
            continue;
        if (event->kind == EVENT_CHARACTER && r->character != 0 &&
            r->character == event->character)
            return r->action;
        if (event->kind == EVENT_KEY && r->character == 0 &&
            r->key == event->key)
            return r->action;
    }
    return ACTION_NONE;
}

void key_refuse(struct ui *ui, const struct event *event)
{
    char name[8] = "";
    for (int i = 0; i < key_row_count(); i++)
        if (event->kind == EVENT_KEY && rows[i].character == 0 &&
            rows[i].key == event->key && rows[i].name[0] != '\0') {
            ui_report(ui, false, "%s does nothing on %s; ? lists the keys",
                      rows[i].name, ui_screen_name(ui->screen));
            return;
        }
    if (event->kind == EVENT_CHARACTER)
        name[utf8_encode(event->character, name)] = '\0';
    ui_report(ui, false, "%s does nothing on %s; ? lists the keys",
              name[0] ? name : "this key", ui_screen_name(ui->screen));
}

/* Whether the same name stands for something else on another screen. */
static bool has_namesake(const struct key_row *row)
{
    for (int i = 0; i < key_row_count(); i++)
        if (&rows[i] != row && strcmp(rows[i].name, row->name) == 0)
            return true;
    return false;
}

void key_explain(const struct key_row *row, struct text *t)
{
    bool begun = false;
    for (int s = 0; s <= SCREEN_KEYS && has_namesake(row); s++)
        if (row->screens >> s & 1u) {
            text_addf(t, "%s%s", begun ? ", " : "",
                      ui_screen_name((enum screen_id)s));
            begun = true;
        }
    text_addf(t, "%s%s", begun ? ": " : "", row->help);
}

void draw_keys(const struct ui *ui, struct canvas *canvas, int row)
{
    int column = 0;
    /* While a line is typed its error stands where no key is needed. */
    if (ui->prompt.kind != PROMPT_NONE && ui->message[0] != '\0') {
        canvas_text(canvas, row, 0, canvas->columns, ROLE_CAUTION, ui->message);
        return;
    }
    for (int i = 0; i < key_row_count(); i++) {
        const struct key_row *r = &rows[i];
        int need = (int)(strlen(r->name) + 1 + strlen(r->label));
        if (!r->on_line || !(r->screens >> ui->screen & 1))
            continue;
        if (column + need > canvas->columns)
            continue;
        column = canvas_text(canvas, row, column, canvas->columns - column,
                             ROLE_KEY, r->name);
        column =
            canvas_text(canvas, row, column + 1, canvas->columns - column - 1,
                        ROLE_LABEL, r->label) +
            2;
    }
}

static void draw(struct ui *ui, struct canvas *canvas)
{
    struct area area = {1, 1, canvas->rows - 3, canvas->columns - 2};
    struct flow flow = {canvas, area, ui->scroll[SCREEN_KEYS], 0};
    for (int i = 0; i < key_row_count(); i++) {
        const struct key_row *r = &rows[i];
        int row = area.row + flow.used - flow.skip;
        if (r->name[0] == '\0' || r->label[0] == '\0')
            continue;
        if (row >= area.row && row < area.row + area.rows)
            canvas_text(canvas, row, area.column, 10, ROLE_KEY, r->name);
        char line[UI_TEXT_MAX];
        struct text t = text_over(line, sizeof line);
        key_explain(r, &t);
        flow_text(&flow, ROLE_TEXT, 11, line);
    }
    flow_blank(&flow);
    flow_text(&flow, ROLE_HEADING, 0, "The map");
    flow_text(
        &flow, ROLE_TEXT, 0,
        "Each cell bears the class of its value beside the symbol: 1 to 9 "
        "from low to high; for residuals v - = + ^ from far below the "
        "reference to far above it. A hatched cell has no number, and the "
        "pane says why. A star marks a pin, brackets the selection.");
    flow_blank(&flow);
    flow_text(&flow, ROLE_HEADING, 0, "Trend and audit");
    flow_text(
        &flow, ROLE_TEXT, 0,
        "Each model keeps its mark. A circle is a stored value, a diamond "
        "one that is extrapolated, theoretical or estimated, a square a "
        "second set; bars are one standard uncertainty. What joins the "
        "marks is no value, and a gap is not bridged. In the audit a star "
        "marks the model with the smallest residuals over the species "
        "that all have; a model that gives another thing than the set "
        "holds, one whose calculation the set is, and one with less than "
        "half of the residuals do not take part.");
    flow_blank(&flow);
    flow_text(&flow, ROLE_HEADING, 0, "The atom");
    flow_text(
        &flow, ROLE_TEXT, 0,
        "D(r) is the radial density, electrons per unit of length. Z_eff(r) is "
        "Z less all electrons within r. In the table Z_eff follows from the "
        "energy, n sqrt(-2E/hartree); from the size, hydrogen's mean radius "
        "over this one's; by Gauss's law at max D, the outermost maximum. The "
        "area is the subshell, the solid line all electrons, the broken line "
        "what is laid over.");
    flow_blank(&flow);
    flow_text(&flow, ROLE_HEADING, 0, "The numbers");
    flow_text(&flow, ROLE_TEXT, 0,
              "Residual = model - reference, in the unit shown and in per cent "
              "of the reference. A reference with another definition than the "
              "model's is marked with the sign for unequal: such a residual "
              "holds the difference of the definitions as well.");
    if (ui->scroll[SCREEN_KEYS] > flow.used - 1)
        ui->scroll[SCREEN_KEYS] = flow.used > 0 ? flow.used - 1 : 0;
}

static enum effect update(struct ui *ui, enum action action)
{
    if (action != ACTION_BACK && action != ACTION_KEYS && action != ACTION_OPEN)
        return EFFECT_NONE;
    ui->screen = ui->before_keys;
    return EFFECT_REDRAW;
}

const struct screen_ops screen_keys = {"Keys", update, draw};
