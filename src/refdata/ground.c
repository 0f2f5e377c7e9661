/* SPDX-License-Identifier: MIT */
#include "refdata/ground.h"

#include <assert.h>
#include <string.h>

#include "element/selection.h"
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

/* Fills species from the tables; false when they do not hold it. The texts
 * were checked when the tables were made, so that they parse. */
static bool from_tables(int z, int charge, struct species *species,
                        struct status *st)
{
    const struct dataset *set = catalogue_elements();
    const char *configuration;
    const char *term;
    if (charge == 0) {
        const struct element_facts *f = dataset_element(set, z);
        assert(f);
        configuration = dataset_text(set, f->configuration);
        term = dataset_text(set, f->term);
        species->origin = origin_of(f->status);
    } else {
        const struct configuration_entry *c = stored_ion(z, charge, &set);
        if (!c)
            return false;
        configuration = dataset_text(set, c->configuration);
        term = dataset_text(set, c->term);
        species->origin = origin_of(c->status);
    }
    /* Some stored terms ("*", "(1/2,1/2)0") have no L S J to read. */
    (void)term_parse(term, &species->term);
    return configuration_parse(configuration, &species->configuration, st);
}

bool ground_state(int z, int charge, struct species *species, struct status *st)
{
    assert(z >= 1 && z <= Z_MAX);
    char ion[ION_TEXT_MAX];
    struct species s = {.z = z, .charge = charge};
    if (charge > z)
        return status_fail(st, STATUS_USAGE,
                           "charge %d: %s has only %d electrons to lose",
                           charge, element_at(z)->symbol, z);
    if (from_tables(z, charge, &s, st)) {
        *species = s;
        return true;
    }
    if (charge < 0)
        return status_fail(st, STATUS_USAGE,
                           "%s: no ground configuration of this anion is "
                           "stored; give one",
                           ion_print(z, charge, ion));
    int base = charge - 1;
    while (!from_tables(z, base, &s, st))
        base--;
    for (; base < charge; base++) {
        const struct subshell *outer =
            configuration_outermost(&s.configuration);
        if (!outer ||
            !configuration_change(&s.configuration, outer->n, outer->l, -1.0))
            assert(!"a neutral atom holds z electrons");
    }
    s.origin = ORIGIN_RULE;
    (void)term_parse("", &s.term);
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
