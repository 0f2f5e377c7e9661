/* SPDX-License-Identifier: MIT */
/* The form of a screen: a const struct in a file of its own, with all that it
 * does. Whoever holds screens goes through a list of these and knows none by
 * name. */
#ifndef SESSION_SCREEN_H
#define SESSION_SCREEN_H

#include "canvas/canvas.h"
#include "canvas/event.h"
#include "session/session.h"
#include "widget/chooser.h"
#include "widget/scroll.h"

struct report;

#define NEEDED_ROWS 6 /* below this only a sentence fits */
#define NEEDED_COLUMNS 24

/* What is to be done after an event. Those up to EFFECT_QUIT are for the event
 * loop; the rest is asked of the app. */
enum effect {
    EFFECT_NONE, /* the event meant nothing */
    EFFECT_REDRAW,
    EFFECT_WRITE,   /* the export into its file */
    EFFECT_REPAINT, /* paint everything anew */
    EFFECT_FORGET,  /* remove the remembered view */
    EFFECT_MOUSE,   /* mouse on or off as session.mouse says */
    EFFECT_QUIT,
    EFFECT_BACK,   /* leave this screen */
    EFFECT_NEXT,   /* the next screen */
    EFFECT_EXPORT, /* ask what to export, and into which file */
    EFFECT_AGAIN   /* the line being typed has ended: the event is a key */
};

/* state is everywhere the block of the screen that is shown. */

/* A list that a key opens. take changes the choice; every screen then looks at
 * it anew. */
struct chooser_ops {
    const char *title;
    const char *hint;  /* message while the list is open; NULL: none */
    const char *empty; /* why nothing is offered; NULL: no model computes it */
    bool stays;        /* Enter does not close the list */
    void (*fill)(struct session *s, void *state, struct chooser *list);
    void (*take)(struct session *s, void *state, int value);
};

/* A line that a key opens. Functions but accept may be NULL. */
struct prompt_ops {
    const char *label;
    bool arrows_end; /* another key ends the line and does what it does */
    /* Writes what the line begins with; false, with a message, when there is
     * nothing to type. */
    bool (*begin)(struct session *s, void *state, struct text *start);
    /* After each change of the line. */
    void (*follow)(struct session *s, void *state, const char *line);
    /* Whether this character belongs to the line no more: it is a key again. */
    bool (*ends)(const char *line, uint32_t character);
    /* EFFECT_NONE, with a message, keeps the line to be mended. */
    enum effect (*accept)(struct session *s, void *state, const char *line);
    void (*cancel)(struct session *s, void *state);
    /* Draws, from a column on, what the line would mean. */
    void (*explain)(const char *line, struct canvas *canvas, int row,
                    int column);
};

/* Groups of common keys; each screen says which ones it takes (session/keys.c
 * has the rows). */
enum key_group {
    KEYS_EVERYWHERE = 0,
    KEYS_QUANTITY = 1 << 0, /* quantity, reference, subshell */
    KEYS_MODEL = 1 << 1,
    KEYS_SPECIES = 1 << 2, /* find, pin */
    KEYS_CHARGE = 1 << 3,
    KEYS_UNIT = 1 << 4,
    KEYS_SECOND = 1 << 5, /* the second reference */
    KEYS_CONFIGURATION = 1 << 6,
    KEYS_SITE = 1 << 7,
    KEYS_CURVES = 1 << 8,   /* how curves are drawn */
    KEYS_SIDEWAYS = 1 << 9, /* left and right */
    KEYS_EXPORT = 1 << 10   /* taken by every screen that exports */
};

/* A key: how it is pressed, what is said of it, and one of the things that it
 * may do. */
struct key_row {
    int place;          /* in the line of keys and in the help, small first */
    uint32_t character; /* 0: a key without character */
    enum key key;
    const char *name;  /* "": not listed */
    const char *label; /* "": not listed */
    const char *help;
    bool on_line; /* shown in the line of keys */
    unsigned group;
    enum effect (*act)(struct session *s, void *state);
    const struct chooser_ops *chooser;
    const struct prompt_ops *prompt;
    enum move move;
};

/* One thing that a screen can write to a file, and the command that prints the
 * same. offered and lacks may be NULL: always, nothing to be solved. */
struct export_ops {
    const char *label; /* in the list, where a screen has several */
    bool (*offered)(const struct session *s, const void *state);
    /* Writes the name of the file that is proposed. */
    void (*file)(const struct session *s, const void *state, struct text *t);
    /* Queues what is to be solved first; gives how much that is. */
    int (*lacks)(struct session *s, void *state);
    /* Fills the parts (bits of enum report_part) of an empty report; what it
     * refers to lives as long as the report, or until the next event. */
    bool (*report)(struct session *s, void *state, unsigned parts,
                   struct report *report, struct status *st);
    /* Writes the command as it would be typed; nothing where no single command
     * prints the same, since one species of several has electrons of the
     * user's own. */
    void (*command)(struct session *s, void *state, struct text *t);
};

/* Functions may be NULL where a screen has nothing to say, but for draw. */
struct screen_ops {
    const char *id;
    const char *title;
    size_t state_size;  /* of a block that starts as zeros */
    struct key_row key; /* leads here from everywhere; group, act … unused */
    unsigned groups;    /* of the common keys */
    const struct key_row *keys;
    int key_count;
    const struct export_ops *exports;
    int export_count;
    bool own_title; /* draws row 0 itself, whole */
    bool returns;   /* leaving it leads to where it was opened, not home */

    void (*init)(struct session *s, void *state);
    void (*clear)(void *state);
    void (*draw)(struct session *s, void *state, struct canvas *canvas);
    /* Where message and keys stand, which may be one row; else they are the
     * last two. */
    void (*bottom)(const struct session *s, const void *state, int *message_row,
                   int *key_row);
    enum effect (*move)(struct session *s, void *state, enum move move);
    enum effect (*mouse)(struct session *s, void *state,
                         const struct event *event);
    /* Esc: true when something of the screen itself was closed. */
    bool (*back)(struct session *s, void *state);

    /* Queues what models that iterate are to solve for what is shown. */
    void (*wants)(struct session *s, void *state);
    /* Work of the screen's own, done step by step while it is shown. *changed
     * when the picture moved on; stop: false when nothing runs. */
    bool (*has_work)(const struct session *s, const void *state);
    void (*step)(struct session *s, void *state, bool *changed);
    bool (*stop)(struct session *s, void *state);

    /* Lines `key value` of the remembered view, and back; load gives false
     * when the key is another's, and passes over what is impossible. */
    void (*save)(const struct session *s, const void *state, struct text *t);
    bool (*load)(struct session *s, void *state, const char *key,
                 const char *value);
};

#endif
