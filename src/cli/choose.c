/* SPDX-License-Identifier: MIT */
#include "cli/choose.h"

#include <errno.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "cli/command.h"

#define LINE_MAX_BYTES 256
#define BLANKS " \t\r\n\f\v"

static bool add_atom(struct request *r, struct request_atom atom,
                     const char *word, struct status *st)
{
    short *place = &r->place[atom.z][atom.charge - CHARGE_LOWEST];
    for (; *place > 0; place = &r->atoms[*place - 1].next) {
        struct request_atom *old = &r->atoms[*place - 1];
        if (!site_same(old->site, atom.site))
            continue;
        old->named = old->named || atom.named;
        return true;
    }
    if (r->atom_count == REQUEST_ATOM_MAX)
        return status_fail(st, STATUS_USAGE,
                           "%s: more than %d atoms and ions chosen", word,
                           REQUEST_ATOM_MAX);
    r->atoms[r->atom_count++] = atom;
    *place = (short)r->atom_count;
    return true;
}

/* Every site that the sets to be read hold for an ion, in their order, each
 * once. none: why there is none, where there is none. */
static bool add_every_site(struct request *r, struct request_atom atom,
                           const char *word, struct status *none,
                           struct status *st)
{
    const struct reference *sets[REFERENCE_MAX];
    char ion[ION_TEXT_MAX];
    int count = request_site_sets(r, atom.charge != 0, sets, REFERENCE_MAX);
    bool any = false;
    for (int s = 0; s < count; s++) {
        const struct dataset *set = sets[s]->set;
        for (int i = set->first[atom.z]; i < set->first[atom.z + 1]; i++) {
            const struct entry *e = &set->values[i];
            if (e->charge != atom.charge || e->gap != GAP_NONE)
                continue;
            any = true;
            atom.site = (struct site){(enum coordination)e->coordination,
                                      (enum spin_state)e->spin};
            if (!add_atom(r, atom, word, st))
                return false;
        }
    }
    if (!any)
        (void)status_fail(none, STATUS_USAGE,
                          "%s: no site of %s is stored; expected an ion such "
                          "as Fe3+, or another --reference",
                          word, ion_print(atom.z, atom.charge, ion));
    return true;
}

/* The atom at the site that it carries or that the options give. */
static bool add_at_site(struct request *r, const struct chosen *c,
                        struct request_atom atom, const char *word,
                        struct status *none, struct status *st)
{
    if (c->every_site)
        return add_every_site(r, atom, word, none, st);
    atom.site = site_filled(c->site, r->site);
    if (c->site.coordination == COORDINATION_NONE)
        r->site_taken.coordination = r->site.coordination;
    if (c->site.spin == SPIN_NONE)
        r->site_taken.spin = r->site.spin;
    return add_atom(r, atom, word, st);
}

/* Whether the atom exists at its charge and holds the configuration. */
static bool exists(const struct request *r, struct request_atom atom,
                   struct status *st)
{
    struct species species;
    struct ask ask = {.z = atom.z, .charge = atom.charge};
    if (r->has_configuration)
        ask.configuration = &r->configuration;
    return study_species(r->study, &ask, &species, st);
}

/* One element at every charge asked for that it has; a range passes over what
 * does not exist, and over the bare nucleus, which has no electron left. */
static bool take_charges(struct request *r, struct chosen c,
                         struct request_charges charges, bool named,
                         const char *word, struct status *st)
{
    struct status why = status_ok();
    bool any = false;
    bool single = charges.low == charges.high;
    if (c.has_charge)
        charges.low = charges.high = c.charge;
    for (int q = charges.low; q <= charges.high && q <= Z_MAX; q++) {
        struct request_atom atom = {.z = c.z, .charge = q, .named = named};
        if (!single && !c.has_charge && !c.every_site && q >= c.z)
            break;
        if (exists(r, atom, &why)) {
            struct status none = status_ok();
            if (!add_at_site(r, &c, atom, word, &none, st))
                return false;
            any = any || none.code == STATUS_OK;
            why = none.code != STATUS_OK ? none : why;
        } else if (why.code != STATUS_USAGE) {
            *st = why;
            return false;
        }
    }
    if (any || !named)
        return true;
    if (why.code == STATUS_OK)
        return status_fail(st, STATUS_USAGE,
                           "--charge: %s has no electron left at charge %d",
                           element_at(c.z)->name, charges.low);
    *st = why;
    return false;
}

/* A site is no idle word: the command and some set that it reads must know
 * sites. */
static bool check_site(const struct request *r, const struct chosen *c,
                       struct request_charges charges, const char *word,
                       struct status *st)
{
    char ion[ION_TEXT_MAX];
    const struct reference *set;
    bool ions =
        c->has_charge ? c->charge != 0 : charges.low != 0 || charges.high != 0;
    if (!c->every_site && !site_named(c->site))
        return true;
    if (!command_takes(r->call->command, &option_coordination))
        return status_fail(
            st, STATUS_USAGE, "%s: %s has no use for a site; expected %s", word,
            r->call->command->name, ion_print(c->z, c->charge, ion));
    if (request_site_sets(r, ions, &set, 1) == 0)
        return status_fail(st, STATUS_USAGE,
                           "%s: none of the sets taken tells sites apart; "
                           "expected an ion and its radius, or another "
                           "--reference",
                           word);
    return !c->every_site || !site_named(r->site) ||
           status_fail(st, STATUS_USAGE,
                       "%s: all sites cannot go with --coordination or --spin",
                       word);
}

static bool take(struct request *r, const struct selection *s,
                 struct request_charges charges, const char *word,
                 struct status *st)
{
    const char *given = charges.text;
    for (int i = 0; i < s->count; i++) {
        const struct chosen *c = &s->items[i];
        if (c->has_charge && given &&
            (c->charge < charges.low || c->charge > charges.high))
            return status_fail(st, STATUS_USAGE,
                               "--charge %s: contradicts %s, which carries its "
                               "own charge",
                               given, word);
        if (!check_site(r, c, charges, word, st) ||
            !take_charges(r, *c, charges, s->count == 1, word, st))
            return false;
    }
    return true;
}

static bool take_word(struct request *r, const char *word,
                      struct request_charges charges, struct status *st)
{
    struct selection s = {0};
    return selection_add(&s, word, st) && take(r, &s, charges, word, st);
}

/* Names from standard input, one per line, blank lines passed over. */
static bool take_lines(struct request *r, struct request_charges charges,
                       struct status *st)
{
    char line[LINE_MAX_BYTES];
    int number = 0;
    bool any = false;
    while (fgets(line, sizeof line, stdin)) {
        size_t length = strlen(line);
        number++;
        if (length == sizeof line - 1 && line[length - 1] != '\n')
            return status_fail(st, STATUS_USAGE,
                               "standard input: line %d: longer than %d bytes; "
                               "expected one element or ion",
                               number, LINE_MAX_BYTES - 2);
        char *word = line + strspn(line, BLANKS);
        length = strlen(word);
        while (length > 0 && strchr(BLANKS, word[length - 1]))
            word[--length] = '\0';
        if (length == 0)
            continue;
        any = true;
        if (!take_word(r, word, charges, st))
            return status_context(st, "standard input: line %d", number);
    }
    if (ferror(stdin))
        return status_fail(st, STATUS_FILE, "standard input: cannot read: %s",
                           strerror(errno));
    return any || status_fail(st, STATUS_USAGE,
                              "-: standard input names no element; expected "
                              "one per line");
}

static bool nothing_chosen(const struct request *r, const char *given,
                           struct status *st)
{
    if (r->has_configuration)
        return status_fail(st, STATUS_USAGE,
                           "--configuration %s: no chosen element holds so "
                           "many electrons at charge %s",
                           call_value(r->call, &option_configuration),
                           given ? given : "0");
    return status_fail(st, STATUS_USAGE,
                       "--charge %s: no chosen element has a known ion of "
                       "this charge",
                       given ? given : "0");
}

bool choose_atoms(struct request *r, struct status *st)
{
    const struct call *call = r->call;
    struct request_charges charges = r->charges;
    bool from_input = false;
    if (call->operand_count == 0) {
        struct selection all = {0};
        selection_all(&all);
        if (!take(r, &all, charges, "all elements", st))
            return false;
    }
    for (int i = 0; i < call->operand_count; i++) {
        const char *word = call->operands[i];
        bool dash = strcmp(word, "-") == 0;
        if (dash && from_input)
            return status_fail(st, STATUS_USAGE,
                               "-: standard input can be read only once");
        from_input = from_input || dash;
        if (dash ? !take_lines(r, charges, st)
                 : !take_word(r, word, charges, st))
            return false;
    }
    return r->atom_count > 0 || nothing_chosen(r, charges.text, st);
}
