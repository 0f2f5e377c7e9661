/* SPDX-License-Identifier: MIT */
#include "refdata/ground.h"

#include <assert.h>
#include <string.h>

#include "refdata/catalogue.h"

/* The stored configuration of an ion, with the set that holds it. */
static const struct configuration_entry *stored_ion(int z, int charge,
                                                    const struct dataset **set)
{
    const struct catalogue *all = catalogue_builtin();
    for (size_t i = 0; i < catalogue_count(all); i++) {
        *set = catalogue_at(all, i);
        if ((*set)->kind != DATASET_CONFIGURATIONS)
            continue;
        const struct configuration_entry *c =
            dataset_configuration(*set, z, charge);
        if (c)
            return c;
    }
    return NULL;
}

static enum configuration_origin origin_of(unsigned status)
{
    return status == CONFIGURATION_PREDICTED ? ORIGIN_PREDICTED : ORIGIN_STORED;
}

/* Fills species from the tables; false when they do not hold it. */
static bool from_tables(int z, int charge, struct species *species)
{
    const struct dataset *set = catalogue_elements();
    text_offset shells;
    text_offset term;
    if (charge == 0) {
        const struct element_facts *f = dataset_element(set, z);
        assert(f);
        shells = f->shells;
        term = f->term;
        species->origin = origin_of(f->status);
    } else {
        const struct configuration_entry *c = stored_ion(z, charge, &set);
        if (!c)
            return false;
        shells = c->shells;
        term = c->term;
        species->origin = origin_of(c->status);
    }
    configuration_unpack(dataset_text(set, shells), &species->configuration);
    /* Some stored terms ("*", "(1/2,1/2)0") have no L S J to read. */
    (void)term_parse(dataset_text(set, term), &species->term);
    return true;
}

/* Takes the outermost electron away. */
static void lose_one(struct configuration *c)
{
    const struct subshell *outer = configuration_outermost(c);
    bool changed = outer && configuration_change(c, outer->n, outer->l, -1.0);
    assert(changed);
    (void)changed;
}

/* Puts one electron into the first subshell with room, in the order of n + l
 * and then n. */
static void gain_one(struct configuration *c)
{
    for (int sum = 1; sum <= N_MAX + L_MAX; sum++)
        for (int l = (sum - 1) / 2; l >= 0; l--)
            if (l <= L_MAX && sum - l <= N_MAX &&
                configuration_change(c, sum - l, l, 1.0))
                return;
    assert(!"no room in any subshell");
}

/* The nearest charge towards the neutral atom that the tables hold. */
static int nearest_stored(int z, int charge, struct species *s)
{
    int step = charge > 0 ? -1 : 1;
    while (!from_tables(z, charge, s))
        charge += step;
    return charge;
}

bool ground_state(int z, int charge, struct species *species, struct status *st)
{
    assert(z >= 1 && z <= Z_MAX);
    struct species s = {.z = z};
    if (charge > z)
        return status_fail(st, STATUS_USAGE,
                           "charge %d: %s has only %d electron%s to lose",
                           charge, element_at(z)->symbol, z, z == 1 ? "" : "s");
    if (charge < CHARGE_LOWEST)
        return status_fail(st, STATUS_USAGE,
                           "charge %d: no such anion of %s; expected %d or "
                           "above",
                           charge, element_at(z)->symbol, CHARGE_LOWEST);
    int base = nearest_stored(z, charge, &s);
    if (base != charge) {
        for (int q = base; q < charge; q++)
            lose_one(&s.configuration);
        for (int q = base; q > charge; q--)
            gain_one(&s.configuration);
        s.origin = ORIGIN_RULE;
        (void)term_parse("", &s.term);
    }
    s.charge = charge;
    *species = s;
    return true;
}

const char *ground_note(int z, int charge)
{
    const struct dataset *set = catalogue_elements();
    if (charge == 0) {
        const struct element_facts *f = dataset_element(set, z);
        return f ? dataset_text(set, f->note) : "";
    }
    const struct configuration_entry *c = stored_ion(z, charge, &set);
    return c ? dataset_text(set, c->note) : "";
}
