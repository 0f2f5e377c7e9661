/* SPDX-License-Identifier: MIT */
/* Roles to curses pairs and attributes; so few pairs that even a terminal with
 * 64 of them holds them all. */
#include "terminal/inside.h"

enum { PAIRS_MAX = 60 };

enum color_tier colors_capability(void)
{
    /* start_color succeeds without colours too, so ask first */
    if (!has_colors() || start_color() == ERR)
        return TIER_MONO;
    if (capability_direct() && COLORS >= 1 << 24)
        return TIER_DIRECT;
    if (COLOR_PAIRS < ROLE_COUNT + 1)
        return TIER_MONO;
    if (COLORS >= 256)
        return TIER_256;
    return COLORS >= 16 ? TIER_16 : COLORS >= 8 ? TIER_8 : TIER_MONO;
}

static attr_t style_of(unsigned style)
{
    attr_t attributes = A_NORMAL;
    if (style & PAINT_BOLD)
        attributes |= A_BOLD;
    if (style & PAINT_UNDERLINE)
        attributes |= A_UNDERLINE;
    if (style & PAINT_REVERSE)
        attributes |= A_REVERSE;
    return attributes;
}

/* Pairs given out so far; number i + 1 has these colours. */
struct pairs {
    struct paint list[PAIRS_MAX];
    int count;
};

/* The pair of two colours: 0 for the terminal's own, an earlier one when the
 * colours are the same, -1 when there are too many or the terminal refuses. */
static int pair_of(struct pairs *pairs, int fg, int bg)
{
    if (fg == PAINT_DEFAULT && bg == PAINT_DEFAULT)
        return 0;
    for (int i = 0; i < pairs->count; i++)
        if (pairs->list[i].foreground == fg && pairs->list[i].background == bg)
            return i + 1;
    if (pairs->count == PAIRS_MAX ||
        init_extended_pair(pairs->count + 1, fg, bg) == ERR)
        return -1;
    pairs->list[pairs->count++] = (struct paint){fg, bg, 0};
    return pairs->count;
}

static bool assign(struct terminal *t)
{
    struct pairs pairs = {.count = 0};
    struct paint paints[ROLE_COUNT];
    for (int i = 0; i < ROLE_COUNT; i++) {
        struct paint *p = &paints[i];
        *p = palette_paint((enum role)i, t->scheme, t->tier);
        bool half = (p->foreground == PAINT_DEFAULT) !=
                    (p->background == PAINT_DEFAULT);
        if (half && !t->has_default)
            p->foreground = p->background = PAINT_DEFAULT;
        t->style[i] = style_of(p->style);
        t->pair[i] = pair_of(&pairs, p->foreground, p->background);
        if (t->pair[i] < 0)
            return false;
    }
    /* Exchanged colours cost fewer bytes than the reverse attribute, which
     * makes curses set everything anew; where pairs run out it does. */
    for (int i = 0; i < ROLE_COUNT; i++) {
        const struct paint *p = &paints[i];
        bool both = p->foreground != PAINT_DEFAULT &&
                    p->background != PAINT_DEFAULT && p->style == 0;
        t->turned[i] =
            both ? pair_of(&pairs, p->background, p->foreground) : -1;
    }
    return true;
}

void colors_assign(struct terminal *t)
{
    if (assign(t))
        return;
    t->tier = TIER_MONO; /* no pairs: every role still has its attributes */
    if (!assign(t))
        for (int i = 0; i < ROLE_COUNT; i++) {
            t->pair[i] = 0;
            t->turned[i] = -1;
        }
}
