/* SPDX-License-Identifier: MIT */
#include "element/site.h"

#include <stdio.h>
#include <string.h>

#define ID(name, id, words) id,
#define WORDS(name, id, words) words,

const char *spin_id(enum spin_state spin)
{
    static const char *const ids[] = {SPIN_LIST(ID)};
    return ids[spin];
}

const char *spin_word(enum spin_state spin)
{
    static const char *const words[] = {SPIN_LIST(WORDS)};
    return words[spin];
}

const char *coordination_id(enum coordination coordination)
{
    static const char *const ids[] = {COORDINATION_LIST(ID)};
    return ids[coordination];
}

int coordination_number(enum coordination coordination)
{
    static const int numbers[] = {COORDINATION_LIST(WORDS)};
    return numbers[coordination];
}

bool coordination_find(const char *text, enum coordination *found)
{
    size_t digits = strspn(text, "0123456789");
    char number[4];
    for (int c = COORDINATION_NONE + 1; c < COORDINATION_COUNT; c++) {
        enum coordination coordination = (enum coordination)c;
        const char *id = coordination_id(coordination);
        const char *shape = id + strspn(id, "IVX");
        snprintf(number, sizeof number, "%d",
                 coordination_number(coordination));
        bool same = digits > 0
                        ? digits == strlen(number) &&
                              strncmp(text, number, digits) == 0 &&
                              text_same_ignoring_case(text + digits, shape)
                        : text_same_ignoring_case(text, id);
        if (!same)
            continue;
        *found = coordination;
        return true;
    }
    return false;
}

static bool find_spin(const char *text, enum spin_state *found)
{
    for (int s = SPIN_NONE + 1; s < SPIN_COUNT; s++)
        if (text_same_ignoring_case(text, spin_id((enum spin_state)s))) {
            *found = (enum spin_state)s;
            return true;
        }
    return false;
}

bool site_named(struct site site)
{
    return site.coordination != COORDINATION_NONE || site.spin != SPIN_NONE;
}

bool site_same(struct site a, struct site b)
{
    return a.coordination == b.coordination && a.spin == b.spin;
}

struct site site_filled(struct site site, struct site other)
{
    if (site.coordination == COORDINATION_NONE)
        site.coordination = other.coordination;
    if (site.spin == SPIN_NONE)
        site.spin = other.spin;
    return site;
}

bool site_parse(const char *text, const char *word, struct site *site,
                bool *all, struct status *st)
{
    char first[16];
    const char *comma = strchr(text, ',');
    size_t length = comma ? (size_t)(comma - text) : strlen(text);
    *site = (struct site){COORDINATION_NONE, SPIN_NONE};
    *all = text_same_ignoring_case(text, "all");
    bool fits = length > 0 && length < sizeof first;
    if (*all || (!comma && find_spin(text, &site->spin)))
        return true;
    if (fits) {
        memcpy(first, text, length);
        first[length] = '\0';
        fits = coordination_find(first, &site->coordination);
    }
    if (!fits)
        return status_fail(st, STATUS_USAGE,
                           "%s: no such site; expected a coordination behind "
                           "'@', such as VI or 6, alone or with a spin state "
                           "as in VI,low, or all",
                           word);
    return !comma || find_spin(comma + 1, &site->spin) ||
           status_fail(st, STATUS_USAGE,
                       "%s: no such spin state; expected %s or %s behind the "
                       "comma",
                       word, spin_id(SPIN_LOW), spin_id(SPIN_HIGH));
}

const char *site_print(struct site site, char out[SITE_TEXT_MAX])
{
    bool both =
        site.coordination != COORDINATION_NONE && site.spin != SPIN_NONE;
    snprintf(out, SITE_TEXT_MAX, "%s%s%s", coordination_id(site.coordination),
             both ? "," : "", spin_id(site.spin));
    return out;
}

void site_words(struct text *t, struct site site)
{
    text_add(t, coordination_id(site.coordination));
    if (site.spin != SPIN_NONE)
        text_addf(t, "%s%s", site.coordination != COORDINATION_NONE ? ", " : "",
                  spin_word(site.spin));
}
