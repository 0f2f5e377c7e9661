/* SPDX-License-Identifier: MIT */
#include "cli/choose.h"

#include <errno.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"

#define LINE_MAX_BYTES 256
#define BLANKS " \t\r\n\f\v"

static bool add_atom(struct request *r, struct request_atom atom,
                     const char *word, struct status *st)
{
    for (int i = 0; i < r->atom_count; i++)
        if (r->atoms[i].z == atom.z && r->atoms[i].charge == atom.charge) {
            r->atoms[i].named = r->atoms[i].named || atom.named;
            return true;
        }
    if (r->atom_count == SELECTION_MAX)
        return status_fail(st, STATUS_USAGE,
                           "%s: more than %d atoms and ions chosen", word,
                           SELECTION_MAX);
    r->atoms[r->atom_count++] = atom;
    return true;
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

static bool take(struct request *r, const struct selection *s, int charge,
                 const char *word, struct status *st)
{
    const char *given = r->call->value[OPTION_CHARGE];
    for (int i = 0; i < s->count; i++) {
        const struct chosen *c = &s->items[i];
        struct request_atom atom = {c->z, c->has_charge ? c->charge : charge,
                                    s->count == 1};
        if (c->has_charge && given && c->charge != charge)
            return status_fail(st, STATUS_USAGE,
                               "--charge %s: contradicts %s, which carries its "
                               "own charge",
                               given, word);
        struct status why = status_ok();
        if (exists(r, atom, &why)) {
            if (!add_atom(r, atom, word, st))
                return false;
        } else if (atom.named || why.code != STATUS_USAGE) {
            *st = why;
            return false;
        }
    }
    return true;
}

static bool take_word(struct request *r, const char *word, int charge,
                      struct status *st)
{
    struct selection s = {0};
    return selection_add(&s, word, st) && take(r, &s, charge, word, st);
}

/* Names from standard input, one per line, blank lines passed over. */
static bool take_lines(struct request *r, int charge, struct status *st)
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
        if (!take_word(r, word, charge, st))
            return status_context(st, "standard input: line %d", number);
    }
    if (ferror(stdin))
        return status_fail(st, STATUS_FILE, "standard input: cannot read: %s",
                           strerror(errno));
    return any || status_fail(st, STATUS_USAGE,
                              "-: standard input names no element; expected "
                              "one per line");
}

bool choose_atoms(struct request *r, struct status *st)
{
    const struct call *call = r->call;
    const char *given = call->value[OPTION_CHARGE];
    int charge = 0;
    bool from_input = false;
    if (given && (!text_to_int(given, &charge) || abs(charge) > Z_MAX))
        return status_fail(st, STATUS_USAGE,
                           "--charge %s: expected a whole number from %d to %d",
                           given, -Z_MAX, Z_MAX);
    if (call->operand_count == 0) {
        struct selection all = {0};
        selection_all(&all);
        if (!take(r, &all, charge, "all elements", st))
            return false;
    }
    for (int i = 0; i < call->operand_count; i++) {
        const char *word = call->operands[i];
        bool dash = strcmp(word, "-") == 0;
        if (dash && from_input)
            return status_fail(st, STATUS_USAGE,
                               "-: standard input can be read only once");
        from_input = from_input || dash;
        if (dash ? !take_lines(r, charge, st) : !take_word(r, word, charge, st))
            return false;
    }
    if (r->atom_count == 0 && r->has_configuration)
        return status_fail(st, STATUS_USAGE,
                           "--configuration %s: no chosen element holds so "
                           "many electrons at charge %d",
                           call->value[OPTION_CONFIGURATION], charge);
    if (r->atom_count == 0)
        return status_fail(st, STATUS_USAGE,
                           "--charge %d: no chosen element has a known ion of "
                           "this charge",
                           charge);
    return true;
}
