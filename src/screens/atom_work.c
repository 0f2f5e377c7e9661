/* SPDX-License-Identifier: MIT */
/* What the screen Atom solves: the chosen atom, then what is laid over it, one
 * self-consistency cycle at a time. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "screens/atom.h"

void atom_work_free(struct atom_work *work)
{
    if (!work)
        return;
    for (int s = 0; s < SLOT_COUNT; s++)
        atom_run_free(work->slots[s].run);
    orbital_run_free(work->orbitals);
    free(work);
}

/* With the electrons of the user's own where they are this species'. */
static bool species_of(const struct ui *ui, int z, int charge,
                       struct species *species)
{
    struct ask ask;
    struct status st = status_ok();
    return ui_ask(ui, z, charge, &ask) &&
           study_species(ui->study, &ask, species, &st);
}

static bool same_species(const struct species *a, const struct species *b)
{
    return a->z == b->z && a->charge == b->charge &&
           configuration_same(&a->configuration, &b->configuration);
}

static bool same_method(struct atom_method a, struct atom_method b)
{
    return a.functional == b.functional && a.relativity == b.relativity;
}

/* What a slot is to hold; false when nothing. */
static bool wanted(const struct ui *ui, int slot, struct species *species,
                   struct atom_method *method)
{
    const struct choice *c = &ui->choice;
    *method = c->atom.method;
    if (slot == SLOT_CHOSEN)
        return species_of(ui, c->z, c->charge, species);
    if (c->atom.overlay == OVERLAY_RELATIVITY) {
        method->relativity = method->relativity == RELATIVITY_DIRAC
                                 ? RELATIVITY_NONE
                                 : RELATIVITY_DIRAC;
        return species_of(ui, c->z, c->charge, species);
    }
    return c->atom.overlay == OVERLAY_SPECIES &&
           species_of(ui, c->atom.over.z, c->atom.over.charge, species);
}

static bool wants_orbitals(const struct ui *ui, enum orbital_kind *kind)
{
    *kind = ui->choice.atom.overlay == OVERLAY_SLATER ? ORBITAL_SLATER
                                                      : ORBITAL_ZETA;
    return ui->choice.atom.overlay == OVERLAY_SLATER ||
           ui->choice.atom.overlay == OVERLAY_ZETA;
}

/* True when the slot holds what it should. */
static bool is_current(const struct atom_slot *slot,
                       const struct species *species, struct atom_method method)
{
    return slot->begun && same_species(&slot->species, species) &&
           same_method(slot->method, method);
}

static bool slot_pending(const struct ui *ui, int s)
{
    struct species species;
    struct atom_method method;
    if (!wanted(ui, s, &species, &method))
        return false;
    if (!ui->atom)
        return true;
    const struct atom_slot *slot = &ui->atom->slots[s];
    if (!is_current(slot, &species, method))
        return true;
    return !slot->stopped && slot->failure[0] == '\0' &&
           atom_run_report(slot->run)->state == REPORT_RUNNING;
}

static bool orbitals_current(const struct ui *ui, enum orbital_kind kind,
                             const struct species *species)
{
    const struct atom_work *w = ui->atom;
    return w && w->orbitals_begun && w->orbitals_kind == kind &&
           same_species(&w->orbitals_species, species);
}

static bool orbitals_pending(const struct ui *ui)
{
    enum orbital_kind kind;
    struct species species;
    if (!wants_orbitals(ui, &kind) ||
        !species_of(ui, ui->choice.z, ui->choice.charge, &species))
        return false;
    return !orbitals_current(ui, kind, &species) ||
           orbital_run_state(ui->atom->orbitals) == ORBITAL_RUNNING;
}

bool atom_pending(const struct ui *ui)
{
    return ui->screen == SCREEN_ATOM &&
           (slot_pending(ui, SLOT_CHOSEN) || slot_pending(ui, SLOT_OVER) ||
            orbitals_pending(ui));
}

/* Makes the slot hold what it should. */
static void begin(struct ui *ui, struct atom_slot *slot,
                  const struct species *species, struct atom_method method)
{
    struct status st = status_ok();
    if (!slot->run)
        slot->run = atom_run_new(&st);
    slot->species = *species;
    slot->method = method;
    slot->begun = true;
    slot->stopped = false;
    slot->failure[0] = '\0';
    if (slot->run && atom_run_begin(slot->run, species, &method, &st))
        return;
    snprintf(slot->failure, sizeof slot->failure, "%s", st.message);
    if (!slot->run) {
        slot->begun = false;
        ui->choice.atom.overlay = OVERLAY_NONE;
        ui_report(ui, true, "%s", st.message);
        ui->screen = SCREEN_MAP;
    }
}

static bool step_slot(struct ui *ui, int s, bool *changed)
{
    struct species species;
    struct atom_method method;
    struct atom_slot *slot = &ui->atom->slots[s];
    if (!slot_pending(ui, s))
        return false;
    if (!wanted(ui, s, &species, &method))
        return false;
    if (!is_current(slot, &species, method)) {
        begin(ui, slot, &species, method);
        *changed = slot->failure[0] != '\0';
        return true;
    }
    *changed = !atom_run_step(slot->run);
    return true;
}

static void step_orbitals(struct ui *ui, bool *changed)
{
    enum orbital_kind kind;
    struct species species;
    struct atom_work *w = ui->atom;
    struct status st = status_ok();
    if (!orbitals_pending(ui) || !wants_orbitals(ui, &kind) ||
        !species_of(ui, ui->choice.z, ui->choice.charge, &species))
        return;
    if (!w->orbitals)
        w->orbitals = orbital_run_new(&st);
    if (!w->orbitals) {
        ui->choice.atom.overlay = OVERLAY_NONE;
        ui_report(ui, true, "%s", st.message);
        *changed = true;
        return;
    }
    if (!orbitals_current(ui, kind, &species)) {
        orbital_run_begin(w->orbitals, kind, &species);
        w->orbitals_begun = true;
        w->orbitals_kind = kind;
        w->orbitals_species = species;
    } else {
        orbital_run_step(w->orbitals);
    }
    *changed = orbital_run_state(w->orbitals) != ORBITAL_RUNNING;
}

void atom_step_work(struct ui *ui, bool *changed)
{
    *changed = false;
    if (!ui->atom)
        ui->atom = calloc(1, sizeof *ui->atom);
    if (!ui->atom) {
        ui_report(ui, true, "out of memory");
        ui->screen = SCREEN_MAP;
        *changed = true;
        return;
    }
    if (!step_slot(ui, SLOT_CHOSEN, changed) &&
        !step_slot(ui, SLOT_OVER, changed))
        step_orbitals(ui, changed);
}

bool atom_stop(struct ui *ui)
{
    bool any = false;
    for (int s = 0; ui->atom && s < SLOT_COUNT; s++) {
        struct atom_slot *slot = &ui->atom->slots[s];
        if (!slot_pending(ui, s) || !slot->begun)
            continue;
        slot->stopped = true;
        any = true;
    }
    return any;
}

bool atom_resume(struct ui *ui)
{
    bool any = false;
    for (int s = 0; ui->atom && s < SLOT_COUNT; s++) {
        any = any || ui->atom->slots[s].stopped;
        ui->atom->slots[s].stopped = false;
    }
    return any;
}

const struct atom_slot *atom_slot_now(const struct ui *ui, int s)
{
    struct species species;
    struct atom_method method;
    if (!ui->atom || !wanted(ui, s, &species, &method) ||
        !is_current(&ui->atom->slots[s], &species, method))
        return NULL;
    return &ui->atom->slots[s];
}

const struct atom_report *atom_solved(const struct ui *ui, int s)
{
    const struct atom_slot *slot = atom_slot_now(ui, s);
    if (!slot)
        return NULL;
    const struct atom_report *r = atom_run_report(slot->run);
    return r->state == REPORT_SOLVED ? r : NULL;
}

static const char *slot_failure(const struct atom_slot *slot)
{
    return slot->failure[0] != '\0' ? slot->failure
                                    : atom_run_report(slot->run)->reason;
}

const char *atom_overlay_failure(const struct ui *ui)
{
    enum orbital_kind kind;
    struct species species;
    const struct atom_slot *slot = atom_slot_now(ui, SLOT_OVER);
    if (slot)
        return slot_failure(slot);
    if (wants_orbitals(ui, &kind) &&
        species_of(ui, ui->choice.z, ui->choice.charge, &species) &&
        orbitals_current(ui, kind, &species))
        return orbital_run_reason(ui->atom->orbitals);
    return "";
}

const struct orbital_run *atom_orbitals(const struct ui *ui)
{
    enum orbital_kind kind;
    struct species species;
    if (!wants_orbitals(ui, &kind) ||
        !species_of(ui, ui->choice.z, ui->choice.charge, &species) ||
        !orbitals_current(ui, kind, &species) ||
        orbital_run_state(ui->atom->orbitals) != ORBITAL_SOLVED)
        return NULL;
    return ui->atom->orbitals;
}

int atom_shell(const struct ui *ui, const struct atom_report *r)
{
    const struct atom_choice *a = &ui->choice.atom;
    const struct configuration *c = &r->species.configuration;
    if (a->n < 0)
        return -1;
    const struct subshell *outer = configuration_outermost(c);
    int last = outer ? (int)(outer - c->shells) : -1;
    for (int i = 0; i < c->count && a->n > 0; i++)
        if (c->shells[i].n == a->n && c->shells[i].l == a->l)
            return i;
    return last;
}

static int find_shell(const struct atom_report *report, int n, int l)
{
    const struct configuration *c = &report->species.configuration;
    for (int i = 0; i < c->count; i++)
        if (c->shells[i].n == n && c->shells[i].l == l)
            return i;
    return -2;
}

int atom_other_shell(const struct atom_report *report, int shell,
                     const struct atom_report *over)
{
    if (shell < 0)
        return -1;
    const struct subshell *s = &report->species.configuration.shells[shell];
    int n = s->n;
    bool outermost = true;
    for (int i = shell + 1; i < report->subshell_count; i++)
        outermost = outermost && report->subshells[i].l != s->l;
    if (outermost)
        n += element_at(over->species.z)->period -
             element_at(report->species.z)->period;
    return find_shell(over, n, s->l);
}

/* "Ru 5s" */
static void species_name(const struct ui *ui, const struct atom_report *report,
                         struct text *t)
{
    const struct pin *over = &ui->choice.atom.over;
    const struct atom_report *r = atom_solved(ui, SLOT_OVER);
    char ion[ION_TEXT_MAX];
    char label[LEVEL_TEXT_MAX];
    text_add(t, ion_print(over->z, over->charge, ion));
    int shell =
        r && report ? atom_other_shell(report, atom_shell(ui, report), r) : -1;
    if (shell >= 0)
        text_addf(t, " %s", level_print(&r->subshells[shell], label));
}

const char *atom_overlay_name(const struct ui *ui,
                              const struct atom_report *report,
                              char out[ATOM_LABEL_MAX])
{
    const struct atom_choice *a = &ui->choice.atom;
    struct text t = text_over(out, ATOM_LABEL_MAX);
    switch (a->overlay) {
    case OVERLAY_SPECIES:
        species_name(ui, report, &t);
        break;
    case OVERLAY_RELATIVITY:
        text_add(&t, a->method.relativity == RELATIVITY_DIRAC ? "Schrödinger"
                                                              : "Dirac");
        break;
    case OVERLAY_SLATER:
        text_add(&t, "slater");
        break;
    case OVERLAY_ZETA:
        text_add(&t, "single-zeta");
        break;
    case OVERLAY_NONE:
    case OVERLAY_COUNT:
        break;
    }
    return out;
}
