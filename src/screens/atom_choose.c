/* SPDX-License-Identifier: MIT */
/* What may be chosen on the screen Atom. */
#include "screens/atom_internal.h"

/* value: functional and equation in one number. */
static void fill_methods(struct session *session, void *state,
                         struct chooser *c)
{
    const struct atom_state *own = state;
    struct atom_method now = own->method;
    (void)session;
    for (int f = 0; f < FUNCTIONAL_COUNT; f++)
        for (int r = 0; r < RELATIVITY_COUNT; r++)
            chooser_add(c, f * RELATIVITY_COUNT + r,
                        (int)now.functional == f && (int)now.relativity == r,
                        "%s, %s", functional_title((enum functional)f),
                        relativity_title((enum relativity)r));
}

static void take_method(struct session *session, void *state, int value)
{
    struct atom_state *own = state;
    (void)session;
    own->method.functional = (enum functional)(value / RELATIVITY_COUNT);
    own->method.relativity = (enum relativity)(value % RELATIVITY_COUNT);
}

const struct chooser_ops screen_atom_choose_method = {
    .title = "Method",
    .fill = fill_methods,
    .take = take_method,
};

/* value: the kind of overlay; for another species OVERLAY_COUNT and on. */
static void fill_overlays(struct session *session, void *state,
                          struct chooser *c)
{
    const struct choice *choice = &session->choice;
    const struct atom_state *a = state;
    char ion[ION_TEXT_MAX];
    struct ask ask;
    chooser_add(c, OVERLAY_NONE, a->overlay == OVERLAY_NONE, "nothing");
    for (int i = 0; i < choice->pin_count; i++) {
        const struct pin *p = &choice->pins[i];
        if (p->z != choice->z || p->charge != choice->charge)
            chooser_add(c, OVERLAY_COUNT + i,
                        a->overlay == OVERLAY_SPECIES && a->over.z == p->z &&
                            a->over.charge == p->charge,
                        "%s, pinned", ion_print(p->z, p->charge, ion));
    }
    if (session_ask(session, choice->z, choice->charge + 1, &ask) &&
        choice->charge + 1 < choice->z)
        chooser_add(c, OVERLAY_COUNT + PIN_MAX,
                    a->overlay == OVERLAY_SPECIES && a->over.z == choice->z &&
                        a->over.charge == choice->charge + 1,
                    "%s, one electron less",
                    ion_print(choice->z, choice->charge + 1, ion));
    chooser_add(c, OVERLAY_RELATIVITY, a->overlay == OVERLAY_RELATIVITY,
                "the same by the %s",
                relativity_title(a->method.relativity == RELATIVITY_DIRAC
                                     ? RELATIVITY_NONE
                                     : RELATIVITY_DIRAC));
    chooser_add(c, OVERLAY_SLATER, a->overlay == OVERLAY_SLATER,
                "slater: Slater-type orbitals by Slater's rules");
    chooser_add(c, OVERLAY_ZETA, a->overlay == OVERLAY_ZETA,
                "single-zeta: orbitals of single-zeta Hartree-Fock");
}

static void take_overlay(struct session *session, void *state, int value)
{
    struct atom_state *own = state;
    const struct choice *c = &session->choice;
    if (value < OVERLAY_COUNT) {
        own->overlay = (enum atom_overlay)value;
        return;
    }
    int pin = value - OVERLAY_COUNT;
    own->overlay = OVERLAY_SPECIES;
    own->over =
        pin < PIN_MAX ? c->pins[pin] : (struct pin){c->z, c->charge + 1};
}

const struct chooser_ops screen_atom_choose_overlay = {
    .title = "Laid over",
    .fill = fill_overlays,
    .take = take_overlay,
};

/* Units of everything that is shown: lengths and energies. */
static void fill_units(struct session *session, void *state, struct chooser *c)
{
    (void)state;
    for (size_t u = 0; u < unit_count(); u++) {
        const struct unit *unit = unit_at(u);
        bool length = unit->dimension == DIMENSION_LENGTH;
        if (!length && unit->dimension != DIMENSION_ENERGY)
            continue;
        bool now = unit == session_unit(session, length ? QUANTITY_RADIUS
                                                        : QUANTITY_IONIZATION);
        chooser_add(c, (int)u, now && length, "%s: %s%s", unit->id, unit->title,
                    now ? ", shown" : "");
    }
}

static void take_unit(struct session *session, void *state, int value)
{
    (void)state;
    const struct unit *unit = unit_at((size_t)value);
    session->choice.units[unit->dimension] = unit;
}

const struct chooser_ops screen_atom_choose_unit = {
    .title = "Unit",
    .fill = fill_units,
    .take = take_unit,
};
