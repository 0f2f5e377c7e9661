/* SPDX-License-Identifier: MIT */
/* Roles to curses pairs and attributes. At most one pair per role, so that
 * even a terminal with 64 pairs holds them all. */
#include "terminal/inside.h"

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

/* The pair of two colours: 0 for the terminal's own, an earlier one when the
 * colours are the same, -1 when the terminal refuses. */
static int pair_of(const struct paint *paint, const struct paint *earlier,
                   const int *pairs, int count, int *last)
{
    int fg = paint->foreground;
    int bg = paint->background;
    if (fg == PAINT_DEFAULT && bg == PAINT_DEFAULT)
        return 0;
    for (int i = 0; i < count; i++)
        if (earlier[i].foreground == fg && earlier[i].background == bg)
            return pairs[i];
    if (init_extended_pair(*last + 1, fg, bg) == ERR)
        return -1;
    return ++*last;
}

static bool assign(struct terminal *t)
{
    struct paint paints[ROLE_COUNT];
    int last = 0;
    for (int i = 0; i < ROLE_COUNT; i++) {
        paints[i] = palette_paint((enum role)i, t->scheme, t->tier);
        bool half = (paints[i].foreground == PAINT_DEFAULT) !=
                    (paints[i].background == PAINT_DEFAULT);
        if (half && !t->has_default)
            paints[i].foreground = paints[i].background = PAINT_DEFAULT;
        t->style[i] = style_of(paints[i].style);
        t->pair[i] = pair_of(&paints[i], paints, t->pair, i, &last);
        if (t->pair[i] < 0)
            return false;
    }
    return true;
}

void colors_assign(struct terminal *t)
{
    if (assign(t))
        return;
    t->tier = TIER_MONO; /* no pairs: every role still has its attributes */
    if (!assign(t))
        for (int i = 0; i < ROLE_COUNT; i++)
            t->pair[i] = 0;
}
