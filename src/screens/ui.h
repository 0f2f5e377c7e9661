/* SPDX-License-Identifier: MIT */
/* The state of the screens, and the two functions that change and show it.
 * Nothing here knows a terminal or writes a file: what is to be done outside
 * comes back as an effect. */
#ifndef SCREENS_UI_H
#define SCREENS_UI_H

#include <stdio.h>

#include "analysis/atom_report.h"
#include "analysis/audit.h"
#include "analysis/comparison.h"
#include "base/text.h"
#include "element/element.h"
#include "canvas/canvas.h"
#include "canvas/event.h"
#include "element/selection.h"
#include "canvas/scale.h"
#include "study/study.h"
#include "study/trend.h"

#define UI_TEXT_MAX 256
#define UI_COMMAND_MAX 1024
#define PIN_MAX COMPARISON_MAX

/* Which screen is shown; order of screen_list in ui.c. */
enum screen_id {
    SCREEN_MAP,
    SCREEN_COMPARE,
    SCREEN_TREND,
    SCREEN_AUDIT,
    SCREEN_ATOM,
    SCREEN_SOURCES,
    SCREEN_KEYS
};

/* What the screen Atom draws. */
enum atom_curves { CURVES_SHELL, CURVES_ALL, CURVES_CHARGE, CURVES_COUNT };

/* What is laid over the solved atom for comparison. */
enum atom_overlay {
    OVERLAY_NONE,
    OVERLAY_SPECIES,    /* another element or ion, by the same method */
    OVERLAY_RELATIVITY, /* the same species by the other equation */
    OVERLAY_SLATER,     /* Slater-type orbitals by Slater's rules */
    OVERLAY_ZETA,       /* orbitals of single-zeta Hartree-Fock */
    OVERLAY_COUNT
};

/* The upright axis of Trend: logarithmic where the values span much, or as
 * chosen. */
enum trend_axis {
    TREND_AXIS_AUTO,
    TREND_AXIS_LINEAR,
    TREND_AXIS_LOG,
    TREND_AXIS_COUNT
};

/* Which figure Audit's table holds. */
enum statistic {
    STATISTIC_MEAN_ABSOLUTE,
    STATISTIC_PERCENT,
    STATISTIC_MEAN,
    STATISTIC_RMS,
    STATISTIC_LARGEST,
    STATISTIC_COUNTS,
    STATISTIC_KINDS
};

/* What colours the map. */
enum shown { SHOWN_VALUE, SHOWN_REFERENCE, SHOWN_RESIDUAL, SHOWN_COUNT };

/* What the loop is to do; text is in ui->effect_path where a file is meant. */
enum effect {
    EFFECT_NONE,
    EFFECT_REDRAW,
    EFFECT_WRITE,   /* ui_export into the file ui->path */
    EFFECT_REPAINT, /* paint everything anew */
    EFFECT_FORGET,  /* remove the remembered view */
    EFFECT_MOUSE,   /* mouse on or off as ui->mouse says */
    EFFECT_QUIT
};

/* What an export holds. */
enum export_scope {
    SCOPE_ROW,
    SCOPE_PINS,
    SCOPE_SHEET,
    SCOPE_COMPARE,
    SCOPE_ATOM,
    SCOPE_TREND,
    SCOPE_AUDIT
};

/* A line being typed. */
enum prompt_kind {
    PROMPT_NONE,
    PROMPT_JUMP,
    PROMPT_FILE,
    PROMPT_OVERWRITE,
    PROMPT_CONFIGURATION
};
struct prompt {
    enum prompt_kind kind;
    char text[UI_TEXT_MAX]; /* UTF-8 */
    int length;             /* bytes */
    int from;               /* the element selected when it was opened */
};

/* A list to choose from. */
enum chooser_kind {
    CHOOSER_NONE,
    CHOOSER_QUANTITY,
    CHOOSER_MODEL,
    CHOOSER_REFERENCE,
    CHOOSER_SUBSHELL,
    CHOOSER_UNIT,
    CHOOSER_SITE,
    CHOOSER_EXPORT,
    CHOOSER_METHOD,
    CHOOSER_OVERLAY,
    CHOOSER_AGAINST,
    CHOOSER_CURVES,
    CHOOSER_WALK
};
#define CHOOSER_MAX 64
struct chooser {
    enum chooser_kind kind;
    int count, at, top;
    char labels[CHOOSER_MAX][80];
    int values[CHOOSER_MAX]; /* meaning by kind */
};

struct pin {
    int z, charge;
};

/* What the screen Atom shows, and how. n, l: the subshell in question; n = 0:
 * the outermost, n = -1: all electrons. over: of OVERLAY_SPECIES. radius: of
 * the cursor, bohr; 0: at the maximum of the subshell. */
struct atom_choice {
    struct atom_method method;
    enum atom_curves curves;
    enum atom_overlay overlay;
    struct pin over;
    int n, l;
    double radius;
    bool root;    /* square-root axis of r in place of the logarithmic one */
    bool braille; /* curves in braille dots */
    bool whole;   /* r from the nucleus on, not from near the subshell */
};

/* What is chosen; everything that a remembered view keeps. */
struct choice {
    int z;
    int charge;
    enum quantity_id quantity;
    const struct model *model;         /* NULL: no model offers the quantity */
    const struct reference *reference; /* NULL: the default one */
    const struct reference *against;   /* NULL: no second one */
    unsigned evidence;                 /* kinds of stored values; 0: all */
    /* The user's own, of one species; no electrons: none. */
    struct configuration configuration;
    struct pin configured;
    enum walk_kind walk;
    unsigned hidden_curves; /* bit by place in the registry */
    enum trend_axis trend_axis;
    bool trend_percent; /* residuals of Trend in per cent */
    enum statistic statistic;
    enum shown shown;
    int n, l;         /* n = 0: outermost */
    struct site site; /* of ions, for sets that tell sites apart */
    const struct unit *units[DIMENSION_VOLUME + 1]; /* NULL: base unit */
    enum grid_width grid;
    enum grid_group3 group3;
    int pin_count;
    struct pin pins[PIN_MAX];
    struct atom_choice atom;
};

/* One element on the map, prepared once per choice. */
struct map_cell {
    enum row_state state;
    bool has_value;
    double value;
    int class_index;
    bool has_percent; /* of the residual */
    double percent;
};

struct atom_work;

struct ui {
    struct study *study;
    struct choice choice;
    enum screen_id screen;
    enum screen_id before_keys; /* where the key help was opened */
    bool detail;                /* FORM_SINGLE: pane instead of grid */
    bool mouse;
    bool forgotten; /* keep no view at the end */
    bool wanting;   /* what is shown has changed: look what is to be solved */
    bool stopped;   /* the user stopped the solving; not taken up unasked */
    int scroll[SCREEN_KEYS + 1];
    int column_scroll; /* first pinned column shown in Compare */
    struct prompt prompt;
    struct chooser chooser;
    enum export_scope scope;
    char path[UI_TEXT_MAX];
    bool replace;
    bool awaiting;           /* an export waits until its atoms are solved */
    const char *data_option; /* `--data …` of the call, for commands; or NULL */
    char message[UI_TEXT_MAX + UI_COMMAND_MAX];
    bool caution; /* the message is a failure or a caution */
    int rows, columns;

    /* Derived from the choice; rebuilt when stale. */
    bool stale;
    bool comparison_stale;
    struct comparison comparison; /* of the pins, or of the selection */
    struct map_cell cells[Z_MAX + 1];
    struct scale scale;
    struct audit usual; /* of the chosen model at the chosen charge */
    bool trend_stale, audit_stale;
    bool trend_keeps; /* only the selection went along the walk */
    struct trend trend;
    struct audit audit; /* of the chosen quantity, all elements */
    struct audit_part audit_part;
    bool audit_points; /* the cursor is among the species of the part */
    int audit_point;
    struct atom_work *atom; /* of the screen Atom, when it was used */
};

/* A ui over a study, with the first view: Z_eff by Slater's rules. The study
 * must outlive it. */
void ui_init(struct ui *ui, struct study *study);

/* Releases what the ui holds; not the study. */
void ui_clear(struct ui *ui);

/* Takes one event and says what is to be done. */
enum effect ui_update(struct ui *ui, const struct event *event);

/* Draws everything; changes nothing but the canvas and what is derived. */
void ui_draw(struct ui *ui, struct canvas *canvas);

/* Work for the models that iterate: queues what the screen wants to show, does
 * one step, says whether more is left; *changed when the picture moved on. */
bool ui_step(struct ui *ui, bool *changed);
bool ui_has_work(const struct ui *ui);

/* Writes the export that the user asked for (ui->scope), as the command of
 * the same choice prints it. */
MUST_CHECK bool ui_export(const struct ui *ui, FILE *out, struct status *st);

/* That command, as it would be typed; nothing where no single command prints
 * the same, since one species of several has electrons of the user's own. */
void ui_export_command(const struct ui *ui, struct text *t);

/* Makes ready what the export holds. False when atoms are to be solved first:
 * they are queued, the last tick of the work comes back as EFFECT_WRITE, and
 * any key gives the export up. */
bool ui_export_ready(struct ui *ui);

/* Result of an effect: a message for the message line. */
void ui_report(struct ui *ui, bool caution, const char *format, ...)
    PRINTF_LIKE(3, 4);

/* The file is there already: asks whether to overwrite it. */
void ui_ask_overwrite(struct ui *ui);

/* The view as text, one `key value` per line, and back. Unknown or impossible
 * lines are passed over: an old view never stops a start. */
void ui_save_view(const struct ui *ui, struct text *t);
void ui_load_view(struct ui *ui, const char *text);

#endif
