/* SPDX-License-Identifier: MIT */
#include "study/absence.h"

#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/array.h"
#include "base/text.h"

#define ABSENCE_TEXT_MAX 200

struct absence {
    const struct dataset *set;
    struct site site;
    char text[ABSENCE_TEXT_MAX];
};

void absence_clear(struct absence_list *list)
{
    for (size_t i = 0; i < list->count; i++)
        free(list->items[i]);
    free(list->items);
    *list = (struct absence_list){0};
}

static bool is_of(const struct entry *e, const struct species *species)
{
    return e->charge == species->charge && e->n == 0 && e->gap == GAP_NONE;
}

/* The stored coordination next to `from` in a direction (1 or -1), as an
 * enumerator; -1 where there is none. */
static int next_stored(const struct dataset *set, const struct species *species,
                       int from, int direction)
{
    int found = -1;
    for (int i = set->first[species->z]; i < set->first[species->z + 1]; i++) {
        const struct entry *e = &set->values[i];
        int at = e->coordination;
        bool beyond = direction * (at - from) > 0;
        if (is_of(e, species) && beyond &&
            (found < 0 || direction * (found - at) > 0))
            found = at;
    }
    return found;
}

static bool is_stored(const struct dataset *set, const struct species *species,
                      int coordination)
{
    return next_stored(set, species, coordination - 1, 1) == coordination;
}

/* ", VI,high 61" for each spin state stored at a coordination. */
static void add_stored(struct text *t, const struct dataset *set,
                       const struct species *species, int coordination,
                       bool *begun)
{
    char at[SITE_TEXT_MAX];
    char value[NUMBER_TEXT_MAX];
    int last = -1;
    for (int i = set->first[species->z]; i < set->first[species->z + 1]; i++) {
        const struct entry *e = &set->values[i];
        if (!is_of(e, species) || e->coordination != coordination ||
            e->spin == last)
            continue;
        last = e->spin;
        struct site site = {(enum coordination)e->coordination,
                            (enum spin_state)e->spin};
        text_addf(t, "%s%s %s", *begun ? ", " : "", site_print(site, at),
                  number_print(e->value, value));
        *begun = true;
    }
}

static struct site asked_site(const struct dataset *set,
                              const struct species *species)
{
    struct site base = {set->default_coordination, SPIN_NONE};
    return site_filled(species->site, base);
}

/* At most two coordinations to name, in order: the one asked, where it is
 * stored for another spin state; else one from below and one from above, or two
 * from the side that has some. */
static int nearest(const struct dataset *set, const struct species *species,
                   int asked, int found[2])
{
    int below = next_stored(set, species, asked, -1);
    int above = next_stored(set, species, asked, 1);
    int count = 0;
    if (is_stored(set, species, asked)) {
        found[0] = asked;
        return 1;
    }
    if (below < 0 && above >= 0)
        found[count++] = above;
    if (above < 0 && below >= 0)
        found[count++] = next_stored(set, species, below, -1);
    if (below >= 0)
        found[count++] = below;
    if (above >= 0)
        found[count++] =
            below >= 0 ? above : next_stored(set, species, above, 1);
    return count;
}

/* False when the set holds no site of the ion. */
static bool write_text(struct absence *a, const struct species *species)
{
    char at[SITE_TEXT_MAX];
    int found[2];
    bool begun = false;
    struct text t = text_over(a->text, sizeof a->text);
    int count = nearest(a->set, species, (int)a->site.coordination, found);
    text_addf(&t, "%s not stored; ", site_print(a->site, at));
    for (int i = 0; i < count; i++)
        add_stored(&t, a->set, species, found[i], &begun);
    return count > 0;
}

const char *absence_text(struct absence_list *list, const struct dataset *set,
                         const struct species *species)
{
    struct absence made = {.set = set, .site = asked_site(set, species)};
    if (!list || !write_text(&made, species))
        return set->absent;
    for (size_t i = 0; i < list->count; i++) {
        const struct absence *a = list->items[i];
        if (a->set == set && strcmp(a->text, made.text) == 0)
            return a->text;
    }
    struct absence *kept = malloc(sizeof *kept);
    if (!kept || !array_grow(&list->items, list->count, &list->capacity,
                             sizeof *list->items)) {
        free(kept);
        return set->absent;
    }
    *kept = made;
    list->items[list->count++] = kept;
    return kept->text;
}
