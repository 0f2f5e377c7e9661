/* SPDX-License-Identifier: MIT */
#include "element/selection.h"

#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"

#define ACCEPTED                                                               \
    "expected a symbol, name or number, an ion such as Fe3+ or Fe3+@VI, a "    \
    "run "                                                                     \
    "such as Sc-Zn, period:4, group:13, block:d, block:4f or electrons:10"

/* Longer than any word that names something. */
#define WORD_PART_MAX 64

static void add(struct selection *s, struct chosen item)
{
    for (int i = 0; i < s->count; i++)
        if (s->items[i].z == item.z &&
            s->items[i].has_charge == item.has_charge &&
            s->items[i].charge == item.charge &&
            s->items[i].every_site == item.every_site &&
            site_same(s->items[i].site, item.site))
            return;
    if (s->count < SELECTION_MAX)
        s->items[s->count++] = item;
}

void selection_all(struct selection *selection)
{
    for (int z = 1; z <= Z_MAX; z++)
        add(selection, (struct chosen){.z = z});
}

/* "III" or "3" to its number, 0 when it is neither. */
static int oxidation_number(const char *text)
{
    static const char *const roman[] = {"I",  "II",  "III",  "IV", "V",
                                        "VI", "VII", "VIII", "IX"};
    int number = 0;
    for (int i = 0; i < (int)(sizeof roman / sizeof roman[0]); i++)
        if (text_same_ignoring_case(text, roman[i]))
            return i + 1;
    return text_to_int(text, &number) && number > 0 ? number : 0;
}

/* The charge of "3+", "+3", "(III)", "++", "^3+"; 0 when it is none. */
static int charge_meant(const char *text)
{
    char inner[8];
    text += *text == '^';
    size_t length = strlen(text);
    size_t signs = strspn(text, text[0] == '-' ? "-" : "+");
    char last = length ? text[length - 1] : '\0';
    if (length == 0 || length >= sizeof inner)
        return 0;
    if (signs == length)
        return text[0] == '-' ? -(int)signs : (int)signs;
    bool bracket = text[0] == '(' && last == ')';
    bool trailing = last == '+' || last == '-';
    if (!bracket && !trailing && signs != 1)
        return 0;
    size_t from = trailing ? 0 : 1;
    size_t count = length - from - (bracket || trailing ? 1 : 0);
    memcpy(inner, text + from, count);
    inner[count] = '\0';
    int size = oxidation_number(inner);
    return text[0] == '-' || last == '-' ? -size : size;
}

/* An ion that was written in another way: "Co+3", "Co(III)", "cobalt3+",
 * "co3+". False when nothing of the kind can be read in the word. */
static bool ion_meant(const char *word, int *z, int *charge)
{
    char name[16];
    size_t letters = strspn(word, "ABCDEFGHIJKLMNOPQRSTUVWXYZ"
                                  "abcdefghijklmnopqrstuvwxyz");
    if (letters == 0 || letters >= sizeof name)
        return false;
    memcpy(name, word, letters);
    name[letters] = '\0';
    const struct element *e = element_find(name);
    if (!e)
        e = element_nearest(name);
    *charge = charge_meant(word + letters);
    if (!e || *charge == 0 || *charge > e->z)
        return false;
    *z = e->z;
    return true;
}

static bool unknown(const char *word, const char *part, struct status *st)
{
    int z, charge;
    char ion[ION_TEXT_MAX];
    if (ion_meant(word, &z, &charge))
        return status_fail(st, STATUS_USAGE,
                           "%s: an ion is written by symbol, charge and sign; "
                           "did you mean %s?",
                           word, ion_print(z, charge, ion));
    const struct element *near = element_nearest(part);
    if (near)
        return status_fail(st, STATUS_USAGE,
                           "%s: no such element; did you mean %s (%s)?", word,
                           near->symbol, near->name);
    return status_fail(st, STATUS_USAGE, "%s: no such element; %s", word,
                       ACCEPTED);
}

/* "Fe3+" and "O2-": symbol, digits that may be missing, sign. Sets *is_ion
 * when the word has that shape. */
static bool parse_ion(const char *word, struct chosen *item, bool *is_ion,
                      struct status *st)
{
    size_t length = strlen(word);
    size_t letters = strspn(word, "ABCDEFGHIJKLMNOPQRSTUVWXYZ"
                                  "abcdefghijklmnopqrstuvwxyz");
    size_t digits = strspn(word + letters, "0123456789");
    *is_ion = letters > 0 && letters + digits + 1 == length &&
              (word[length - 1] == '+' || word[length - 1] == '-');
    if (!*is_ion)
        return true;
    char symbol[16];
    if (letters >= sizeof symbol || digits > 3)
        return unknown(word, "", st);
    memcpy(symbol, word, letters);
    symbol[letters] = '\0';
    const struct element *e = element_by_symbol(symbol);
    if (!e)
        return unknown(word, symbol, st);
    int charge = digits ? (int)strtol(word + letters, NULL, 10) : 1;
    if (digits && (charge == 0 || word[letters] == '0'))
        return status_fail(st, STATUS_USAGE,
                           "%s: an ion has a charge of 1 or more", word);
    if (word[length - 1] == '-')
        charge = -charge;
    if (charge > e->z)
        return status_fail(st, STATUS_USAGE,
                           "%s: %s has only %d electron%s to lose", word,
                           e->name, e->z, e->z == 1 ? "" : "s");
    *item = (struct chosen){.z = e->z, .charge = charge, .has_charge = true};
    return true;
}

/* Atoms and ions with so many electrons: from a neutral atom's singly charged
 * anion on; from the triply charged one where the count is that of a noble
 * gas, whose series N3- O2- F- Na+ the trade knows. */
int selection_first_z(int electrons)
{
    static const int closed[] = {2, 10, 18, 36, 54, 86, 118};
    int below = 1;
    for (size_t i = 0; i < sizeof closed / sizeof closed[0]; i++)
        if (closed[i] == electrons)
            below = 3;
    return electrons > below ? electrons - below : 1;
}

static void add_isoelectronic(struct selection *s, int electrons)
{
    for (int z = selection_first_z(electrons); z <= Z_MAX; z++)
        add(s, (struct chosen){
                   .z = z, .charge = z - electrons, .has_charge = true});
}

/* "4f", the block row in which that subshell is filled: its period, or 0. */
static int block_row_period(const char *value)
{
    static const char letters[] = "spdf";
    static const int lead[] = {0, 0, 1, 2};
    const char *l = value[0] ? strchr(letters, value[1]) : NULL;
    if (!l || strlen(value) != 2 || value[0] < '1' || value[0] > '7')
        return 0;
    int period = value[0] - '0' + lead[l - letters];
    return period <= PERIOD_MAX && (l - letters) < value[0] - '0' ? period : 0;
}

static bool parse_keyed(struct selection *s, const char *word,
                        const char *value, struct status *st)
{
    int number = 0;
    bool has_number = text_to_int(value, &number) && value[0] != '+';
    bool period = strncmp(word, "period:", 7) == 0;
    bool group = strncmp(word, "group:", 6) == 0;
    bool block = strncmp(word, "block:", 6) == 0;
    bool electrons = strncmp(word, "electrons:", 10) == 0;
    int row = block ? block_row_period(value) : 0;
    if (electrons && has_number && number >= 1 && number <= Z_MAX) {
        add_isoelectronic(s, number);
        return true;
    }
    bool ok = row ||
              (period && has_number && number >= 1 && number <= PERIOD_MAX) ||
              (group && has_number && number >= 1 && number <= GROUP_MAX) ||
              (block && strlen(value) == 1 && strchr("spdf", value[0]));
    if (!ok)
        return status_fail(st, STATUS_USAGE,
                           "%s: no such part of the table; expected period:1 "
                           "to period:7, group:1 to group:18, or block:s, p, "
                           "d or f",
                           word);
    for (int z = 1; z <= Z_MAX; z++) {
        const struct element *e = element_at(z);
        if ((period && e->period == number) || (group && e->group == number) ||
            (row && e->period == row && e->block == value[1]) ||
            (block && !row && e->block == value[0]))
            add(s, (struct chosen){.z = z});
    }
    return true;
}

static bool parse_run(struct selection *s, const char *word, const char *dash,
                      struct status *st)
{
    char first[32];
    size_t length = (size_t)(dash - word);
    if (length == 0 || length >= sizeof first || dash[1] == '\0')
        return unknown(word, "", st);
    memcpy(first, word, length);
    first[length] = '\0';
    const struct element *a = element_find(first);
    const struct element *b = element_find(dash + 1);
    if (!a)
        return unknown(word, first, st);
    if (!b)
        return unknown(word, dash + 1, st);
    int z, charge;
    char ion[ION_TEXT_MAX];
    if (a->z > b->z && ion_meant(word, &z, &charge))
        return status_fail(st, STATUS_USAGE,
                           "%s: a run goes upwards in atomic number; expected "
                           "%s-%s, or %s for the ion",
                           word, b->symbol, a->symbol,
                           ion_print(z, charge, ion));
    if (a->z > b->z)
        return status_fail(st, STATUS_USAGE,
                           "%s: a run goes upwards in atomic number; expected "
                           "%s-%s",
                           word, b->symbol, a->symbol);
    for (z = a->z; z <= b->z; z++)
        add(s, (struct chosen){.z = z});
    return true;
}

/* What a word without a site names. */
static bool add_plain(struct selection *selection, const char *word,
                      struct status *st)
{
    const char *colon = strchr(word, ':');
    if (colon)
        return parse_keyed(selection, word, colon + 1, st);
    const struct element *e = element_find(word);
    if (e) {
        add(selection, (struct chosen){.z = e->z});
        return true;
    }
    struct chosen item = {0};
    bool is_ion;
    if (!parse_ion(word, &item, &is_ion, st))
        return false;
    if (is_ion) {
        add(selection, item);
        return true;
    }
    const char *dash = strchr(word, '-');
    if (dash)
        return parse_run(selection, word, dash, st);
    return unknown(word, word, st);
}

/* The part before the '@' says which, the part behind it where: the site goes
 * to all that the first part adds. */
static bool add_at_site(struct selection *selection, const char *word,
                        const char *at, struct status *st)
{
    char plain[WORD_PART_MAX];
    struct site site;
    bool every;
    struct selection named = {0};
    size_t length = (size_t)(at - word);
    if (length == 0 || length >= sizeof plain)
        return unknown(word, "", st);
    memcpy(plain, word, length);
    plain[length] = '\0';
    if (!add_plain(&named, plain, st) ||
        !site_parse(at + 1, word, &site, &every, st))
        return false;
    for (int i = 0; i < named.count; i++) {
        named.items[i].site = site;
        named.items[i].every_site = every;
        add(selection, named.items[i]);
    }
    return true;
}

bool selection_add(struct selection *selection, const char *word,
                   struct status *st)
{
    const char *at = strchr(word, '@');
    return at ? add_at_site(selection, word, at, st)
              : add_plain(selection, word, st);
}
