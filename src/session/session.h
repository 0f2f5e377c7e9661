/* SPDX-License-Identifier: MIT */
/* What all screens share: what is chosen, what is asked of the study, and what
 * is told to the user. No screen is known here; a screen that needs to know
 * whether something has changed keeps the versions that it last saw. */
#ifndef SESSION_SESSION_H
#define SESSION_SESSION_H

#include <stdio.h>

#include "base/text.h"
#include "session/choice.h"

#define SESSION_TEXT_MAX 256
#define SESSION_COMMAND_MAX 1024

struct screen_ops;

struct session {
    struct study *study; /* borrowed */
    struct choice choice;
    bool detail;    /* the pane in place of the rest, where only one fits */
    bool mouse;     /* on or off, as the user wants it */
    bool forgotten; /* keep no view at the end */
    int rows, columns;
    const char *data_option; /* `--data …` of the call, for commands; or NULL */
    char message[SESSION_TEXT_MAX + SESSION_COMMAND_MAX];
    bool caution;  /* the message is a failure or a caution */
    int jump_from; /* the element selected before a jump was begun */

    /* Counted up: the choice; the selected element and the pins; what the
     * models have solved. */
    unsigned choice_version, selection_version, solved_version;

    bool wanting;             /* look what is to be solved */
    bool stopped;             /* by the user; not taken up unasked … */
    unsigned stopped_version; /* … while the choice is still this one */

    /* Asked of the app: the id of a screen to go to, "" for the first one;
     * NULL: stay. */
    const char *go;

    /* The screens in their order, borrowed; for those that tell of others. */
    const struct screen_ops *const *screens;
    int screen_count;
};

/* A session over a study, with the first view: Z_eff by Slater's rules. The
 * study must outlive it. Nothing is to be released. */
void session_init(struct session *s, struct study *study);

/* A message for the message line. */
void session_report(struct session *s, bool caution, const char *format, ...)
    PRINTF_LIKE(3, 4);

/* Asks to go to a screen by its id (a literal); "": the first one. */
void session_go(struct session *s, const char *id);

/* Something of the choice was changed. */
void session_touch(struct session *s);

/* Selects an element, or a species with its charge. */
void session_select(struct session *s, int z);
void session_select_species(struct session *s, int z, int charge);

/* Chooses a quantity. What spoke of the one before goes: references, a
 * subshell where the new one has none, a model that does not offer it. */
void session_select_quantity(struct session *s, enum quantity_id quantity);

/* The unit in which a quantity is shown. */
const struct unit *session_unit(const struct session *s,
                                enum quantity_id quantity);

/* The ask for an element under the chosen model, quantity, references,
 * subshell, site and unit. False when the element has no such ion. */
bool session_ask(const struct session *s, int z, int charge, struct ask *ask);

/* The selected species with its configuration; false when there is no such
 * ion. */
bool session_species(const struct session *s, struct species *species);

/* Whether the user gave a configuration for this species. */
bool session_is_own(const struct session *s, int z, int charge);

/* Place of a pin, or -1. */
int session_pin_place(const struct session *s, int z, int charge);

/* Queues what a model that iterates has not solved yet: of one species, or of
 * the selected one under every model. first: before all that waits. */
void session_want(struct session *s, int z, int charge,
                  const struct model *model, bool first);
void session_want_selected(struct session *s);

#endif
