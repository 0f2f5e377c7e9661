/* SPDX-License-Identifier: MIT */
/* What the screen Atom solves: the chosen atom, then what is laid over it, one
 * self-consistency cycle at a time. */
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "screens/atom_internal.h"

void screen_atom_release(struct atom_state *own)
{
    for (int i = 0; i < SLOT_COUNT; i++)
        run_atom_free(own->slots[i].run);
    orbital_run_free(own->orbitals);
}

/* With the electrons of the user's own where they are this species'. */
static bool species_of(const struct session *session, int z, int charge,
                       struct species *species)
{
    struct ask ask;
    struct status st = status_ok();
    return session_ask(session, z, charge, &ask) &&
           study_species(session->study, &ask, species, &st);
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
static bool wanted(const struct session *session, const struct atom_state *own,
                   int slot, struct species *species,
                   struct atom_method *method)
{
    const struct choice *c = &session->choice;
    *method = own->method;
    if (slot == SLOT_CHOSEN)
        return species_of(session, c->z, c->charge, species);
    if (own->overlay == OVERLAY_RELATIVITY) {
        method->relativity = method->relativity == RELATIVITY_DIRAC
                                 ? RELATIVITY_NONE
                                 : RELATIVITY_DIRAC;
        return species_of(session, c->z, c->charge, species);
    }
    return own->overlay == OVERLAY_SPECIES &&
           species_of(session, own->over.z, own->over.charge, species);
}

static bool wants_orbitals(const struct atom_state *own,
                           enum orbital_kind *kind)
{
    *kind = own->overlay == OVERLAY_SLATER ? ORBITAL_SLATER : ORBITAL_ZETA;
    return own->overlay == OVERLAY_SLATER || own->overlay == OVERLAY_ZETA;
}

/* True when the slot holds what it should. */
static bool is_current(const struct atom_slot *slot,
                       const struct species *species, struct atom_method method)
{
    return slot->begun && same_species(&slot->species, species) &&
           same_method(slot->method, method);
}

static bool slot_pending(const struct session *session,
                         const struct atom_state *own, int s)
{
    struct species species;
    struct atom_method method;
    if (!wanted(session, own, s, &species, &method))
        return false;
    const struct atom_slot *slot = &own->slots[s];
    if (!is_current(slot, &species, method))
        return true;
    return !slot->stopped && slot->failure[0] == '\0' &&
           run_atom_report(slot->run)->state == REPORT_RUNNING;
}

static bool orbitals_current(const struct atom_state *own,
                             enum orbital_kind kind,
                             const struct species *species)
{
    return own->orbitals_begun && own->orbitals_kind == kind &&
           same_species(&own->orbitals_species, species);
}

static bool orbitals_pending(const struct session *session,
                             const struct atom_state *own)
{
    enum orbital_kind kind;
    struct species species;
    if (!wants_orbitals(own, &kind) ||
        !species_of(session, session->choice.z, session->choice.charge,
                    &species))
        return false;
    return !orbitals_current(own, kind, &species) ||
           orbital_run_state(own->orbitals) == ORBITAL_RUNNING;
}

bool screen_atom_pending(const struct session *session,
                         const struct atom_state *own)
{
    return slot_pending(session, own, SLOT_CHOSEN) ||
           slot_pending(session, own, SLOT_OVER) ||
           orbitals_pending(session, own);
}

/* Makes the slot hold what it should. */
static void begin(struct session *session, struct atom_state *own,
                  struct atom_slot *slot, const struct species *species,
                  struct atom_method method)
{
    struct status st = status_ok();
    if (!slot->run)
        slot->run = run_atom_new(&st);
    slot->species = *species;
    slot->method = method;
    slot->begun = true;
    slot->stopped = false;
    slot->failure[0] = '\0';
    if (slot->run && run_atom_begin(slot->run, species, &method, &st))
        return;
    snprintf(slot->failure, sizeof slot->failure, "%s", st.message);
    if (!slot->run) {
        slot->begun = false;
        own->overlay = OVERLAY_NONE;
        session_report(session, true, "%s", st.message);
        session_go(session, "");
    }
}

static bool step_slot(struct session *session, struct atom_state *own, int s,
                      bool *changed)
{
    struct species species;
    struct atom_method method;
    struct atom_slot *slot = &own->slots[s];
    if (!slot_pending(session, own, s))
        return false;
    if (!wanted(session, own, s, &species, &method))
        return false;
    if (!is_current(slot, &species, method)) {
        begin(session, own, slot, &species, method);
        *changed = slot->failure[0] != '\0';
        return true;
    }
    *changed = !run_atom_step(slot->run);
    return true;
}

static void step_orbitals(struct session *session, struct atom_state *own,
                          bool *changed)
{
    enum orbital_kind kind;
    struct species species;
    struct status st = status_ok();
    if (!orbitals_pending(session, own) || !wants_orbitals(own, &kind) ||
        !species_of(session, session->choice.z, session->choice.charge,
                    &species))
        return;
    if (!own->orbitals)
        own->orbitals = orbital_run_new(&st);
    if (!own->orbitals) {
        own->overlay = OVERLAY_NONE;
        session_report(session, true, "%s", st.message);
        *changed = true;
        return;
    }
    if (!orbitals_current(own, kind, &species)) {
        orbital_run_begin(own->orbitals, kind, &species);
        own->orbitals_begun = true;
        own->orbitals_kind = kind;
        own->orbitals_species = species;
    } else {
        orbital_run_step(own->orbitals);
    }
    *changed = orbital_run_state(own->orbitals) != ORBITAL_RUNNING;
}

void screen_atom_step(struct session *session, struct atom_state *own,
                      bool *changed)
{
    *changed = false;
    if (!step_slot(session, own, SLOT_CHOSEN, changed) &&
        !step_slot(session, own, SLOT_OVER, changed))
        step_orbitals(session, own, changed);
}

bool screen_atom_stop(struct session *session, struct atom_state *own)
{
    bool any = false;
    for (int s = 0; s < SLOT_COUNT; s++) {
        struct atom_slot *slot = &own->slots[s];
        if (!slot_pending(session, own, s) || !slot->begun)
            continue;
        slot->stopped = true;
        any = true;
    }
    return any;
}

bool screen_atom_resume(struct atom_state *own)
{
    bool any = false;
    for (int s = 0; s < SLOT_COUNT; s++) {
        struct atom_slot *slot = &own->slots[s];
        bool failed = slot->failure[0] != '\0';
        any = any || slot->stopped || failed;
        slot->stopped = false;
        /* What could not even begin may lack no memory by now. */
        if (failed)
            slot->begun = false;
    }
    return any;
}

const struct atom_slot *screen_atom_slot(const struct session *session,
                                         const struct atom_state *own, int s)
{
    struct species species;
    struct atom_method method;
    if (!wanted(session, own, s, &species, &method) ||
        !is_current(&own->slots[s], &species, method))
        return NULL;
    return &own->slots[s];
}

const struct atom_report *screen_atom_solved(const struct session *session,
                                             const struct atom_state *own,
                                             int s)
{
    const struct atom_slot *slot = screen_atom_slot(session, own, s);
    if (!slot)
        return NULL;
    const struct atom_report *r = run_atom_report(slot->run);
    return r->state == REPORT_SOLVED ? r : NULL;
}

static const char *slot_failure(const struct atom_slot *slot)
{
    return slot->failure[0] != '\0' ? slot->failure
                                    : run_atom_report(slot->run)->reason;
}

const char *screen_atom_overlay_failure(const struct session *session,
                                        const struct atom_state *own)
{
    enum orbital_kind kind;
    struct species species;
    const struct atom_slot *slot = screen_atom_slot(session, own, SLOT_OVER);
    if (slot)
        return slot_failure(slot);
    if (wants_orbitals(own, &kind) &&
        species_of(session, session->choice.z, session->choice.charge,
                   &species) &&
        orbitals_current(own, kind, &species))
        return orbital_run_reason(own->orbitals);
    return "";
}

const struct orbital_run *screen_atom_orbitals(const struct session *session,
                                               const struct atom_state *own)
{
    enum orbital_kind kind;
    struct species species;
    if (!wants_orbitals(own, &kind) ||
        !species_of(session, session->choice.z, session->choice.charge,
                    &species) ||
        !orbitals_current(own, kind, &species) ||
        orbital_run_state(own->orbitals) != ORBITAL_SOLVED)
        return NULL;
    return own->orbitals;
}

int screen_atom_shell(const struct atom_state *own, const struct atom_report *r)
{
    const struct configuration *c = &r->species.configuration;
    if (own->n < 0)
        return -1;
    const struct subshell *outer = configuration_outermost(c);
    int last = outer ? (int)(outer - c->shells) : -1;
    for (int i = 0; i < c->count && own->n > 0; i++)
        if (c->shells[i].n == own->n && c->shells[i].l == own->l)
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

int screen_atom_other_shell(const struct atom_report *report, int shell,
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
static void species_name(const struct session *session,
                         const struct atom_state *own,
                         const struct atom_report *report, struct text *t)
{
    const struct pin *over = &own->over;
    const struct atom_report *r = screen_atom_solved(session, own, SLOT_OVER);
    char ion[ION_TEXT_MAX];
    char label[LEVEL_TEXT_MAX];
    text_add(t, ion_print(over->z, over->charge, ion));
    int shell =
        r && report
            ? screen_atom_other_shell(report, screen_atom_shell(own, report), r)
            : -1;
    if (shell >= 0)
        text_addf(t, " %s", level_print(&r->subshells[shell], label));
}

const char *screen_atom_overlay_name(const struct session *session,
                                     const struct atom_state *own,
                                     const struct atom_report *report,
                                     char out[ATOM_LABEL_MAX])
{
    struct text t = text_over(out, ATOM_LABEL_MAX);
    switch (own->overlay) {
    case OVERLAY_SPECIES:
        species_name(session, own, report, &t);
        break;
    case OVERLAY_RELATIVITY:
        text_add(&t, own->method.relativity == RELATIVITY_DIRAC ? "Schrödinger"
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
