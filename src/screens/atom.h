/* SPDX-License-Identifier: MIT */
/* Pieces of the screen Atom, shared by its files. */
#ifndef SCREENS_ATOM_H
#define SCREENS_ATOM_H

#include "screens/parts.h"
#include "canvas/plot.h"
#include "study/atom_run.h"
#include "study/orbital_run.h"

#define ATOM_LABEL_MAX 40

/* One of the two atoms on screen: what it is, and its solution. */
struct atom_slot {
    bool begun;
    bool stopped; /* by the user; Enter goes on */
    struct species species;
    struct atom_method method;
    struct atom_run *run;
    char failure[STATUS_MESSAGE_MAX]; /* why nothing could be begun, or "" */
};

enum { SLOT_CHOSEN, SLOT_OVER, SLOT_COUNT };

struct atom_work {
    struct atom_slot slots[SLOT_COUNT];
    struct orbital_run *orbitals;
    bool orbitals_begun;
    enum orbital_kind orbitals_kind;
    struct species orbitals_species;
    /* Where the plot was drawn last, for the cursor. */
    struct plot plot;
    bool has_plot;
};

/* Whether atoms on screen wait to be solved; one cycle of one of them. *changed
 * when the picture moved on. Work space is made when first needed; a failure
 * is reported to the ui. */
bool atom_pending(const struct ui *ui);
void atom_step_work(struct ui *ui, bool *changed);
/* Interrupt: stops what runs; false when nothing does. */
bool atom_stop(struct ui *ui);
/* Takes up again what was stopped; false when nothing was. */
bool atom_resume(struct ui *ui);
void atom_work_free(struct atom_work *work);

/* Report of a slot that is solved for what the choice asks, else NULL. */
const struct atom_report *atom_solved(const struct ui *ui, int slot);
/* What a slot is doing for what the choice asks; NULL before it has begun. */
const struct atom_slot *atom_slot_now(const struct ui *ui, int slot);
/* Why the overlay cannot be drawn, "" when it can or waits. */
const char *atom_overlay_failure(const struct ui *ui);
/* Orbitals of the overlay in ORBITAL_SOLVED for the chosen species, else NULL.
 */
const struct orbital_run *atom_orbitals(const struct ui *ui);

/* Place of the chosen subshell in a report; -1 for all electrons. */
int atom_shell(const struct ui *ui, const struct atom_report *report);
/* Place in `over` of the subshell to lay over subshell `shell` of a report: the
 * same n l, or, for the outermost subshell of its l and an element of another
 * period, the n that differs as the periods do (4s of Fe, 5s of Ru). -1 for
 * all electrons, -2 when there is none. */
int atom_other_shell(const struct atom_report *report, int shell,
                     const struct atom_report *over);

/* What the overlay is called: "Ru 5s", "Schrödinger", "slater"; shell is the
 * chosen one. */
const char *atom_overlay_name(const struct ui *ui,
                              const struct atom_report *report,
                              char out[ATOM_LABEL_MAX]);

/* Radius of the cursor, bohr. */
double atom_radius(const struct ui *ui, const struct atom_report *report);
/* The axis of r, in the unit of length shown. */
struct plot_axis atom_axis(const struct ui *ui,
                           const struct atom_report *report);
/* One bohr in the unit of length shown. */
double atom_length(const struct ui *ui);

/* Role of the curves of a subshell. */
enum role atom_role(int l);

/* Role of what is laid over a subshell (l = -1: over all electrons): another
 * one than those of the subshell and of all electrons. */
enum role atom_overlay_role(int l);

/* Draw the plots, and the numbers at the cursor. */
void atom_draw_plots(struct ui *ui, struct canvas *canvas,
                     const struct atom_layout *layout,
                     const struct atom_report *report);
void atom_draw_cursor(const struct ui *ui, struct canvas *canvas,
                      struct area area, const struct atom_report *report);

#endif
