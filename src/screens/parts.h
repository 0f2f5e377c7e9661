/* SPDX-License-Identifier: MIT */
/* What the screens are made of: the table of keys, the list of screens, and
 * the pieces that several of them draw. */
#ifndef SCREENS_PARTS_H
#define SCREENS_PARTS_H

#include "canvas/flow.h"
#include "screens/layout.h"
#include "screens/ui.h"

/* What a key asks for. */
enum action {
    ACTION_NONE,
    ACTION_UP,
    ACTION_DOWN,
    ACTION_LEFT,
    ACTION_RIGHT,
    ACTION_HOME,
    ACTION_END,
    ACTION_PAGE_UP,
    ACTION_PAGE_DOWN,
    ACTION_OPEN,
    ACTION_BACK,
    ACTION_NEXT_SCREEN,
    ACTION_QUIT,
    ACTION_KEYS,
    ACTION_MAP,
    ACTION_COMPARE,
    ACTION_TREND,
    ACTION_AUDIT,
    ACTION_ATOM,
    ACTION_SOURCES,
    ACTION_JUMP,
    ACTION_QUANTITY,
    ACTION_MODEL,
    ACTION_REFERENCE,
    ACTION_AGAINST,
    ACTION_CONFIGURATION,
    ACTION_WALK,
    ACTION_MODELS,
    ACTION_TREND_AXIS,
    ACTION_PERCENT,
    ACTION_STATISTIC,
    ACTION_SHOWN,
    ACTION_SUBSHELL,
    ACTION_UNIT,
    ACTION_SITE,
    ACTION_METHOD,
    ACTION_OVERLAY,
    ACTION_CURVES,
    ACTION_AXIS,
    ACTION_WHOLE,
    ACTION_DOTS,
    ACTION_CHARGE_UP,
    ACTION_CHARGE_DOWN,
    ACTION_PIN,
    ACTION_UNPIN_ALL,
    ACTION_EXPORT,
    ACTION_GRID,
    ACTION_GROUP3,
    ACTION_MOUSE,
    ACTION_FORGET,
    ACTION_REPAINT,
    ACTION_COUNT
};

/* One way to press an action. on_line: shown in the line of keys. screens: bits
 * 1 << screen_id. */
struct key_row {
    enum action action;
    uint32_t character; /* 0: a key without character */
    enum key key;
    const char *name;
    const char *label;
    const char *help;
    bool on_line;
    unsigned screens;
};

int key_row_count(void);
const struct key_row *key_row_at(int i);

/* What a key does; the screens in front where another does something else. */
void key_explain(const struct key_row *row, struct text *t);

/* Action of an event on a screen; ACTION_NONE when the key means nothing. */
enum action key_action(const struct event *event, enum screen_id screen);

/* Says that a key means nothing on the screen that is shown. */
void key_refuse(struct ui *ui, const struct event *event);

/* One screen. update takes what the ui has not taken itself. */
struct screen_ops {
    const char *name; /* in the title and in the help */
    enum effect (*update)(struct ui *ui, enum action action);
    void (*draw)(struct ui *ui, struct canvas *canvas);
};
extern const struct screen_ops screen_map;
extern const struct screen_ops screen_compare;
extern const struct screen_ops screen_trend;
extern const struct screen_ops screen_audit;
extern const struct screen_ops screen_atom;
extern const struct screen_ops screen_sources;
extern const struct screen_ops screen_keys;

/* Name of a screen, for titles. */
const char *ui_screen_name(enum screen_id screen);

/* A click selects, the wheel goes to the next element or scrolls. */
enum effect map_mouse(struct ui *ui, const struct event *event);

/* A click moves the cursor or chooses a subshell, the wheel goes to the next
 * element. */
enum effect atom_mouse(struct ui *ui, const struct event *event);

/* Rows are filled from the choice: the ask for an element under the chosen
 * model, quantity, reference, subshell and unit. False when the element has no
 * such ion. */
bool ui_ask(const struct ui *ui, int z, int charge, struct ask *ask);

/* The unit in which a quantity is shown. */
const struct unit *ui_unit(const struct ui *ui, enum quantity_id quantity);

/* Behind the id of a set: the site asked of it, where it tells sites apart. */
void add_asked_site(const struct ui *ui, const struct provenance *set,
                    struct text *t);

/* Writes the site of a stored value of a species, "VI, high spin"; nothing
 * where its set tells none apart or holds no value. */
void stored_site_text(const struct ui *ui, const struct species *species,
                      const struct reading *stored, struct text *t);

/* Brings what is derived from the choice up to date. */
void ui_refresh(struct ui *ui);

/* The same for what Compare shows; false when there is nothing to show. */
bool compare_refresh(struct ui *ui);

/* Moves the selection; marks what depends on it. */
void ui_select(struct ui *ui, int z);

/* Selects a species, its charge with it; along says that it stands on the same
 * walk. */
void ui_select_species(struct ui *ui, int z, int charge, bool along);

/* Chooses a quantity. What spoke of the one before goes: references, a
 * subshell where the new one has none, a model that does not offer it. */
void ui_select_quantity(struct ui *ui, enum quantity_id quantity);

/* Place of a pin, or -1. */
int ui_pin_place(const struct ui *ui, int z, int charge);

/* Message (or the line being typed) and keys, on the given rows. */
void draw_message(const struct ui *ui, struct canvas *canvas, int row);
void draw_keys(const struct ui *ui, struct canvas *canvas, int row);

/* Facts of the selected element. */
void draw_facts(const struct ui *ui, struct canvas *canvas, struct area area);

/* Models against reference for the selected element. */
void draw_pane(const struct ui *ui, struct canvas *canvas, struct area area);

/* A list to choose from, over everything else. */
void chooser_open(struct ui *ui, enum chooser_kind kind);
enum effect chooser_update(struct ui *ui, const struct event *event);
void chooser_draw(const struct ui *ui, struct canvas *canvas);

/* The line being typed. */
void prompt_open(struct ui *ui, enum prompt_kind kind, const char *text);
enum effect prompt_update(struct ui *ui, const struct event *event);
void prompt_draw(const struct ui *ui, struct canvas *canvas, int row);

/* Opens the line that asks for a configuration of the selected species. */
void configuration_prompt(struct ui *ui);

/* Opens the line that asks for a file, with a name made from the choice. */
void export_prompt(struct ui *ui, enum export_scope scope);

#endif
