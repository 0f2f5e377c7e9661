/* SPDX-License-Identifier: MIT */
#include "element/walk.h"

#include "element/element.h"
#include "element/selection.h"

#define F_ROW 32 /* from an f element to the one below it */

static const struct {
    const char *id;
    const char *words;
} kinds[WALK_COUNT] = {
#define WALK_ROW(kind, id, words) {id, words},
    WALK_LIST(WALK_ROW)
#undef WALK_ROW
};

const char *walk_id(enum walk_kind kind)
{
    return kinds[kind].id;
}

const char *walk_words(enum walk_kind kind)
{
    return kinds[kind].words;
}

static void add(struct walk *walk, int z, int charge)
{
    if (walk->count < WALK_MAX)
        walk->steps[walk->count++] = (struct walk_step){z, charge};
}

static bool is_beside(const struct element *e, const struct element *from,
                      enum walk_kind kind)
{
    if (kind == WALK_PERIOD)
        return e->period == from->period;
    if (kind == WALK_BLOCK)
        return e->period == from->period && e->block == from->block;
    if (from->group == 0)
        return e->group == 0 && (e->z - from->z) % F_ROW == 0;
    return e->group == from->group;
}

void walk_fill(struct walk *walk, enum walk_kind kind, int z, int charge)
{
    const struct element *from = element_at(z);
    *walk = (struct walk){.kind = kind};
    if (kind == WALK_CHARGES) {
        for (int q = charge < 0 ? charge : 0; q < z; q++)
            add(walk, z, q);
        if (charge >= z)
            add(walk, z, charge);
    } else if (kind == WALK_ISOELECTRONIC) {
        int electrons = z - charge;
        int first = electrons > 0 ? selection_first_z(electrons) : z;
        int last = electrons > 0 ? Z_MAX : z;
        for (int i = first < z ? first : z; i <= last; i++)
            add(walk, i, i - electrons);
    } else {
        for (int i = 1; i <= Z_MAX; i++)
            if (i == z || (i >= charge && is_beside(element_at(i), from, kind)))
                add(walk, i, charge);
    }
}

int walk_place(const struct walk *walk, int z, int charge)
{
    for (int i = 0; i < walk->count; i++)
        if (walk->steps[i].z == z && walk->steps[i].charge == charge)
            return i;
    return -1;
}
