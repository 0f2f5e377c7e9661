/* SPDX-License-Identifier: MIT */
/* The state of the screen Atom, shared by its files. */
#ifndef SCREENS_ATOM_INTERNAL_H
#define SCREENS_ATOM_INTERNAL_H

#include "canvas/plot.h"
#include "screens/atom_layout.h"
#include "session/screen.h"
#include "study/atom_run.h"
#include "study/orbital_run.h"

#define ATOM_LABEL_MAX 40

/* What is drawn. */
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

struct atom_state {
    /* What is shown, and how. n, l: the subshell in question; n = 0: the
     * outermost, n = -1: all electrons. over: of OVERLAY_SPECIES. radius: of
     * the cursor, bohr; 0: at the maximum of the subshell. */
    struct atom_method method;
    enum atom_curves curves;
    enum atom_overlay overlay;
    struct pin over;
    int n, l;
    double radius;
    bool root;  /* square-root axis of r in place of the logarithmic one */
    bool whole; /* r from the nucleus on, not from near the subshell */

    /* What is solved. */
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
 * is reported to the user. */
bool screen_atom_pending(const struct session *session,
                         const struct atom_state *own);
void screen_atom_step(struct session *session, struct atom_state *own,
                      bool *changed);
/* Interrupt: stops what runs; false when nothing does. */
bool screen_atom_stop(struct session *session, struct atom_state *own);
/* Takes up again what was stopped; false when nothing was. */
bool screen_atom_resume(struct atom_state *own);
/* Frees the work space. */
void screen_atom_release(struct atom_state *own);

/* Report of a slot that is solved for what the choice asks, else NULL. */
const struct atom_report *screen_atom_solved(const struct session *session,
                                             const struct atom_state *own,
                                             int slot);
/* What a slot is doing for what the choice asks; NULL before it has begun. */
const struct atom_slot *screen_atom_slot(const struct session *session,
                                         const struct atom_state *own,
                                         int slot);
/* Why the overlay cannot be drawn, "" when it can or waits. */
const char *screen_atom_overlay_failure(const struct session *session,
                                        const struct atom_state *own);
/* Orbitals of the overlay in ORBITAL_SOLVED for the chosen species, else NULL.
 */
const struct orbital_run *screen_atom_orbitals(const struct session *session,
                                               const struct atom_state *own);

/* Place of the chosen subshell in a report; -1 for all electrons. */
int screen_atom_shell(const struct atom_state *own,
                      const struct atom_report *report);
/* Place in `over` of the subshell to lay over subshell `shell` of a report: the
 * same n l, or, for the outermost subshell of its l and an element of another
 * period, the n that differs as the periods do (4s of Fe, 5s of Ru). -1 for
 * all electrons, -2 when there is none. */
int screen_atom_other_shell(const struct atom_report *report, int shell,
                            const struct atom_report *over);

/* What the overlay is called: "Ru 5s", "Schrödinger", "slater"; shell is the
 * chosen one. */
const char *screen_atom_overlay_name(const struct session *session,
                                     const struct atom_state *own,
                                     const struct atom_report *report,
                                     char out[ATOM_LABEL_MAX]);

/* Radius of the cursor, bohr. */
double screen_atom_radius(const struct atom_state *own,
                          const struct atom_report *report);
/* The axis of r, in the unit of length shown. */
struct plot_axis screen_atom_axis(const struct session *session,
                                  const struct atom_state *own,
                                  const struct atom_report *report);
/* One bohr in the unit of length shown. */
double screen_atom_length(const struct session *session);

/* The unit of energy shown, and an energy in it. */
const struct unit *screen_atom_energy_unit(const struct session *session);
double screen_atom_energy(const struct session *session, double hartree);

/* Role of the curves of a subshell. */
enum role screen_atom_role(int l);

/* Role of what is laid over a subshell (l = -1: over all electrons): another
 * one than those of the subshell and of all electrons. */
enum role screen_atom_overlay_role(int l);

/* The list of what may be laid over, of methods, of units. */
extern const struct chooser_ops screen_atom_choose_overlay;
extern const struct chooser_ops screen_atom_choose_method;
extern const struct chooser_ops screen_atom_choose_unit;

/* The table of subshells; the rows of its headings, none where hardly more
 * would fit; the first of `count` rows shown where `rows` fit, so that the
 * chosen one is among them. */
void screen_atom_table_draw(const struct session *session,
                            const struct atom_state *own, struct canvas *canvas,
                            struct area a, const struct atom_report *r,
                            bool wide);
int screen_atom_table_heads(struct area a);
int screen_atom_table_first(int chosen, int rows, int count);

/* Energies, and levels as far as there is room. */
void screen_atom_levels_draw(const struct session *session,
                             struct canvas *canvas, struct area a,
                             const struct atom_report *r);

/* Draw the plots, and the numbers at the cursor. */
void screen_atom_plots_draw(const struct session *session,
                            struct atom_state *own, struct canvas *canvas,
                            const struct atom_layout *layout,
                            const struct atom_report *report);
void screen_atom_cursor_draw(const struct session *session,
                             const struct atom_state *own,
                             struct canvas *canvas, struct area area,
                             const struct atom_report *report);

#endif
