/* SPDX-License-Identifier: MIT */
/* Keys that mean the same on every screen that has them. */
#include "session/common.h"

#include <string.h>

static enum effect quit(struct session *s, void *state)
{
    (void)s;
    (void)state;
    return EFFECT_QUIT;
}

static enum effect repaint(struct session *s, void *state)
{
    (void)s;
    (void)state;
    return EFFECT_REPAINT;
}

static enum effect back(struct session *s, void *state)
{
    (void)s;
    (void)state;
    return EFFECT_BACK;
}

static enum effect next(struct session *s, void *state)
{
    (void)s;
    (void)state;
    return EFFECT_NEXT;
}

static enum effect export(struct session *s, void *state) {
    (void)s; (void)state; return EFFECT_EXPORT;
}

static enum effect forget(struct session *s, void *state)
{
    (void)state;
    s->forgotten = true;
    session_report(s, false,
                   "the remembered view is forgotten; none is kept at the end");
    return EFFECT_FORGET;
}

static enum effect turn_mouse(struct session *s, void *state)
{
    (void)state;
    s->mouse = !s->mouse;
    session_report(s, false, s->mouse ? "mouse on" : "mouse off");
    return EFFECT_MOUSE;
}

static void drop_pin(struct session *s, int at)
{
    struct choice *c = &s->choice;
    memmove(&c->pins[at], &c->pins[at + 1],
            (size_t)(c->pin_count - at - 1) * sizeof c->pins[0]);
    c->pin_count--;
}

static enum effect toggle_pin(struct session *s, void *state)
{
    (void)state;
    struct choice *c = &s->choice;
    char ion[ION_TEXT_MAX];
    int at = session_pin_place(s, c->z, c->charge);
    ion_print(c->z, c->charge, ion);
    s->selection_version++;
    if (at >= 0) {
        drop_pin(s, at);
        session_report(s, false, "%s unpinned; %d pinned", ion, c->pin_count);
    } else if (c->pin_count == PIN_MAX) {
        session_report(s, true, "%s not pinned: at most %d species at once",
                       ion, PIN_MAX);
    } else {
        c->pins[c->pin_count++] = (struct pin){c->z, c->charge};
        session_report(s, false, "%s pinned; %d pinned, c compares", ion,
                       c->pin_count);
    }
    return EFFECT_REDRAW;
}

static enum effect unpin_all(struct session *s, void *state)
{
    (void)state;
    s->choice.pin_count = 0;
    s->selection_version++;
    session_report(s, false, "no species pinned");
    return EFFECT_REDRAW;
}

static void change_charge(struct session *s, int by)
{
    struct ask ask;
    char ion[ION_TEXT_MAX];
    int charge = s->choice.charge + by;
    if (!session_ask(s, s->choice.z, charge, &ask)) {
        session_report(s, true, "%s has no charge %+d",
                       element_at(s->choice.z)->name, charge);
        return;
    }
    s->choice.charge = charge;
    session_touch(s);
    session_report(s, false, "charge %+d: %s and all others", charge,
                   ion_print(s->choice.z, charge, ion));
}

static enum effect charge_up(struct session *s, void *state)
{
    (void)state;
    change_charge(s, 1);
    return EFFECT_REDRAW;
}

static enum effect charge_down(struct session *s, void *state)
{
    (void)state;
    change_charge(s, -1);
    return EFFECT_REDRAW;
}

static enum effect turn_dots(struct session *s, void *state)
{
    (void)state;
    s->choice.braille = !s->choice.braille;
    session_report(s, false, "curves in %s",
                   s->choice.braille ? "braille dots" : "blocks");
    return EFFECT_REDRAW;
}

/* Capital letters and digits are missing on purpose: they start a jump. */
const struct key_row session_common_keys[] = {
    {20, 'q', 0, "q", "quit", "leave the program", true, 0, quit, 0, 0, 0},
    {30, 'w', 0, "w", "quantity", "choose what is shown", true, KEYS_QUANTITY,
     0, &session_choose_quantity, 0, 0},
    {40, 'b', 0, "b", "model", "choose by which model", true, KEYS_MODEL, 0,
     &session_choose_model, 0, 0},
    {60, 'r', 0, "r", "reference",
     "choose against which stored set, and which kinds of its values", true,
     KEYS_QUANTITY, 0, &session_choose_reference, 0, 0},
    {180, '.', 0, ".", "dots", "draw curves in braille dots, or in blocks",
     false, KEYS_CURVES, turn_dots, 0, 0, 0},
    {200, 'p', 0, "p", "pin", "pin or unpin the selected species", true,
     KEYS_SPECIES, toggle_pin, 0, 0, 0},
    {230, 'n', 0, "n", "second",
     "choose a second stored set beside the reference", true, KEYS_SECOND, 0,
     &session_choose_against, 0, 0},
    {250, 'e', 0, "e", "export", "write what is shown to a CSV file", true,
     KEYS_EXPORT, export, 0, 0, 0},
    {260, '+', 0, "+", "charge", "one electron less", true, KEYS_CHARGE,
     charge_up, 0, 0, 0},
    {261, '=', 0, "=", "", "", false, KEYS_CHARGE, charge_up, 0, 0, 0},
    {262, '-', 0, "-", "charge", "one electron more", false, KEYS_CHARGE,
     charge_down, 0, 0, 0},
    {270, 'o', 0, "o", "subshell", "choose a subshell, or the outermost", true,
     KEYS_QUANTITY, 0, &session_choose_subshell, 0, 0},
    {280, ':', 0, ":", "configuration",
     "type electrons of your own for the selected species", true,
     KEYS_CONFIGURATION, 0, 0, &session_prompt_configuration, 0},
    {290, '@', 0, "@", "site", SESSION_SITE_HELP, false, KEYS_SITE, 0,
     &session_choose_site, 0, 0},
    {300, 'u', 0, "u", "unit", SESSION_UNIT_HELP, true, KEYS_UNIT, 0,
     &session_choose_unit, 0, 0},
    {330, 0, KEY_CODE_TAB, "Tab", "next screen", "go to the next screen", false,
     0, next, 0, 0, 0},
    {340, '/', 0, "/", "find",
     "jump to a symbol, name or number; a capital letter or a digit starts it "
     "too",
     true, KEYS_SPECIES, 0, 0, &session_prompt_jump, 0},
    {350, 'x', 0, "x", "unpin all", "drop all pins", false, KEYS_SPECIES,
     unpin_all, 0, 0, 0},
    {400, 0, KEY_CODE_ESCAPE, "Esc", "back", "back to the map", false, 0, back,
     0, 0, 0},
    {410, 'i', 0, "i", "mouse",
     "mouse on or off; while it is on the terminal cannot select text", false,
     0, turn_mouse, 0, 0, 0},
    {420, 'f', 0, "f", "forget",
     "forget the remembered view and keep none from now on", false, 0, forget,
     0, 0, 0},
    /* Taken by the line that is being typed. */
    {430, 0, KEY_CODE_CLEAR, "Ctrl-U", "clear",
     "empty the line that is being typed", false, 0, 0, 0, 0, 0},
    {440, 0, KEY_CODE_REPAINT, "Ctrl-L", "repaint", "paint the screen anew",
     false, 0, repaint, 0, 0, 0},
    {450, 0, KEY_CODE_UP, "arrows", "move", "move the selection, or scroll",
     false, 0, 0, 0, 0, MOVE_UP},
    {451, 0, KEY_CODE_DOWN, "", "", "", false, 0, 0, 0, 0, MOVE_DOWN},
    {452, 0, KEY_CODE_LEFT, "", "", "", false, KEYS_SIDEWAYS, 0, 0, 0,
     MOVE_LEFT},
    {453, 0, KEY_CODE_RIGHT, "", "", "", false, KEYS_SIDEWAYS, 0, 0, 0,
     MOVE_RIGHT},
    {460, 'h', 0, "h j k l", "move", "the same", false, KEYS_SIDEWAYS, 0, 0, 0,
     MOVE_LEFT},
    {461, 'j', 0, "", "", "", false, 0, 0, 0, 0, MOVE_DOWN},
    {462, 'k', 0, "", "", "", false, 0, 0, 0, 0, MOVE_UP},
    {463, 'l', 0, "", "", "", false, KEYS_SIDEWAYS, 0, 0, 0, MOVE_RIGHT},
    {470, 0, KEY_CODE_HOME, "Home End", "ends",
     "first or last element, top or bottom", false, 0, 0, 0, 0, MOVE_HOME},
    {471, 0, KEY_CODE_END, "", "", "", false, 0, 0, 0, 0, MOVE_END},
    {480, 0, KEY_CODE_PAGE_UP, "PgUp PgDn", "element",
     "the element before or after, or one page", false, 0, 0, 0, 0,
     MOVE_PAGE_UP},
    {481, 0, KEY_CODE_PAGE_DOWN, "", "", "", false, 0, 0, 0, 0, MOVE_PAGE_DOWN},
};
const int session_common_key_count =
    (int)(sizeof session_common_keys / sizeof session_common_keys[0]);
