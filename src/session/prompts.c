/* SPDX-License-Identifier: MIT */
/* Lines typed for the session: where to jump, and a configuration. */
#include <string.h>

#include "session/common.h"
#include "widget/field.h"

static bool begin_jump(struct session *s, void *state, struct text *start)
{
    (void)state;
    (void)start;
    s->jump_from = s->choice.z;
    return true;
}

/* While a place is typed the selection goes along, so that Enter holds no
 * surprise; where the text fits none it is back where it came from. */
static void follow_jump(struct session *s, void *state, const char *line)
{
    (void)state;
    const struct element *e = element_jump(line);
    session_select(s, e ? e->z : s->jump_from);
}

static void cancel_jump(struct session *s, void *state)
{
    (void)state;
    session_select(s, s->jump_from);
}

/* Behind a whole symbol or number a letter with which no element goes on is a
 * key again: "Ni" and "p" pins nickel. Behind part of a name it is a slip. */
static bool ends_jump(const char *line, uint32_t character)
{
    struct field longer;
    if (character == ' ')
        return false;
    bool whole = element_by_symbol(line) ||
                 (line[0] >= '1' && line[0] <= '9' && element_find(line));
    field_set(&longer, line);
    field_type(&longer, character);
    return whole && !element_jump(longer.text);
}

static enum effect accept_jump(struct session *s, void *state, const char *line)
{
    (void)state;
    if (!element_jump(line) && line[0] != '\0')
        session_report(s, true,
                       "%s: no element has this symbol, name or number", line);
    return EFFECT_REDRAW;
}

static void explain_jump(const char *line, struct canvas *canvas, int row,
                         int column)
{
    int width = canvas->columns;
    const struct element *e = element_jump(line);
    if (e)
        canvas_textf(canvas, row, column + 2, width - column - 2, ROLE_QUIET,
                     "%s %d %s", e->symbol, e->z, e->name);
    else if (line[0] != '\0')
        canvas_text(canvas, row, column + 2, width - column - 2, ROLE_CAUTION,
                    "no such element");
}

const struct prompt_ops session_prompt_jump = {
    .label = "element: ",
    .arrows_end = true,
    .begin = begin_jump,
    .follow = follow_jump,
    .ends = ends_jump,
    .accept = accept_jump,
    .cancel = cancel_jump,
    .explain = explain_jump,
};

static bool begin_configuration(struct session *s, void *state,
                                struct text *start)
{
    (void)state;
    struct species species;
    char text[CONFIGURATION_TEXT_MAX];
    if (!session_species(s, &species)) {
        session_report(s, true, "no such ion");
        return false;
    }
    text_add(start, configuration_print(&species.configuration, text));
    return true;
}

/* An empty line gives the ground state back; a wrong one is told and stays to
 * be mended. */
static enum effect accept_configuration(struct session *s, void *state,
                                        const char *line)
{
    (void)state;
    struct choice *c = &s->choice;
    struct status st = status_ok();
    struct species species;
    struct configuration typed = {0};
    struct ask ask = {.z = c->z, .charge = c->charge, .configuration = &typed};
    bool blank = line[strspn(line, " ")] == '\0';
    if (!blank && (!configuration_parse(line, &typed, &st) ||
                   !study_species(s->study, &ask, &species, &st))) {
        session_report(s, true, "%s", st.message);
        return EFFECT_NONE;
    }
    bool own = !blank && species.origin == ORIGIN_USER;
    c->configuration = own ? typed : (struct configuration){0};
    c->configured = (struct pin){c->z, c->charge};
    session_touch(s);
    session_report(s, false,
                   own ? "configuration as given, for this species alone"
                       : "the ground state");
    return EFFECT_REDRAW;
}

const struct prompt_ops session_prompt_configuration = {
    .label = "configuration (none: ground state): ",
    .begin = begin_configuration,
    .accept = accept_configuration,
};
