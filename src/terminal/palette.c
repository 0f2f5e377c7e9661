/* SPDX-License-Identifier: MIT */
/* The colours were computed in OKLab (Ottosson 2020) by the rules and the
 * search of tests/terminal/search.c, which also keep the steps apart for eyes
 * that lack one kind of cone (Machado et al. 2009); a test repeats the search
 * and compares. */
#include "terminal/palette.h"

#include <assert.h>
#include <stddef.h>

enum { BLACK = 16, WHITE = 231, CUBE = 16, GREYS = 232, FEW_CLASSES = 5 };

/* Two scales, from the lowest to the highest step. white: the text on it is
 * white, else black, whichever has the higher contrast (at least 4.58:1). */
struct shade {
    uint32_t rgb; /* TIER_DIRECT */
    int index;    /* TIER_256 */
    bool rgb_white, index_white;
};

/* Plum through blue and teal to pale green; lightness rises strictly. */
static const struct shade ramp[RAMP_STEPS] = {
    {0x420B5F, 53, true, true},    {0x422B8B, 55, true, true},
    {0x2F4EA9, 25, true, true},    {0x1E72AC, 27, true, true},
    {0x2890AF, 33, false, false},  {0x31AEB5, 38, false, false},
    {0x3ACCB4, 43, false, false},  {0x6AE8A3, 119, false, false},
    {0xB9FB93, 194, false, false},
};

/* Blue below, orange above, the middle neutral; both sides equally light. */
static const struct shade balance[BALANCE_STEPS] = {
    {0x306CB6, 61, true, true},    {0x5A8DCE, 68, false, false},
    {0x8BAEDA, 110, false, false}, {0xBCCEE5, 153, false, false},
    {0xEEEEEE, 255, false, false}, {0xE0C6B5, 187, false, false},
    {0xD09F7D, 144, false, false}, {0xBF7743, 166, false, false},
    {0xA45300, 94, true, true},
};

/* With 16 and 8 colours the theme decides how light they are; in the usual
 * palettes these rise (ramp), or rise to the middle and fall (balance). */
struct few {
    int color;
    bool white;
};
static const struct few few_ramp[FEW_CLASSES] = {
    {0, true}, {4, true}, {5, false}, {6, false}, {7, false}};
static const struct few few_balance[FEW_CLASSES] = {
    {4, true}, {6, false}, {7, false}, {3, false}, {1, true}};

/* Text of one scheme. Colours are indexes; DEFAULT the terminal's own. */
#define DEFAULT PAINT_DEFAULT
struct text_colors {
    int ink, ground, quiet, field; /* field: ground of a line being typed */
    int key, pin, above, below, caution;
    int curve[5];
};

/* SCHEME_TERMINAL keeps the terminal's ground: its few colours have at least
 * 4:1 (text) or 3:1 (curves) against black and against white alike. The
 * explicit schemes have at least 4.5:1, the high-contrast one 7:1. */
static const struct text_colors many[SCHEME_COUNT] = {
    [SCHEME_TERMINAL] = {DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         130,
                         62,
                         131,
                         {33, 160, 29, 126, 136}},
    [SCHEME_LIGHT] =
        {BLACK, WHITE, 243, 254, 23, 126, 130, 25, 124, {21, 160, 29, 90, 94}},
    [SCHEME_DARK] =
        {253, 234, 245, 238, 44, 212, 208, 111, 210, {33, 173, 115, 199, 184}},
    [SCHEME_CONTRAST] = {WHITE,
                         BLACK,
                         250,
                         236,
                         44,
                         219,
                         215,
                         111,
                         210,
                         {39, 203, 49, 175, 184}},
};

/* The user's theme sets these, so on its own ground nothing is coloured: it
 * could come out white on white. */
static const struct text_colors few[SCHEME_COUNT] = {
    [SCHEME_TERMINAL] = {DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         DEFAULT,
                         {DEFAULT, DEFAULT, DEFAULT, DEFAULT, DEFAULT}},
    [SCHEME_LIGHT] = {0, 7, 0, 7, 4, 5, 1, 4, 1, {4, 1, 5, 0, 4}},
    [SCHEME_DARK] = {7, 0, 7, 0, 6, 5, 3, 6, 3, {6, 3, 2, 5, 7}},
    [SCHEME_CONTRAST] = {7, 0, 7, 0, 6, 5, 3, 6, 3, {6, 3, 2, 5, 7}},
};
#undef DEFAULT

int palette_classes(enum color_tier tier)
{
    if (tier == TIER_MONO)
        return 1;
    return tier <= TIER_16 ? FEW_CLASSES : RAMP_STEPS;
}

int palette_class(int step, enum color_tier tier)
{
    static const int fewer[RAMP_STEPS] = {0, 0, 1, 1, 2, 3, 3, 4, 4};
    assert(step >= 0 && step < RAMP_STEPS);
    if (tier == TIER_MONO)
        return 0;
    return tier <= TIER_16 ? fewer[step] : step;
}

uint32_t palette_rgb(int index)
{
    assert(index >= CUBE && index <= 255);
    static const uint32_t level[6] = {0, 95, 135, 175, 215, 255};
    if (index >= GREYS)
        return UINT32_C(0x010101) * (8 + 10 * (uint32_t)(index - GREYS));
    int place = index - CUBE;
    return level[place / 36] << 16 | level[place / 6 % 6] << 8 |
           level[place % 6];
}

/* An index as the tier names it. Values below 256 without red and green are
 * palette entries on some direct-colour terminals: step out of their way. */
static int color_of(int index, enum color_tier tier)
{
    if (tier == TIER_16 && index == 7)
        return 15; /* bright white */
    if (index == PAINT_DEFAULT || tier != TIER_DIRECT)
        return index;
    uint32_t rgb = palette_rgb(index);
    return (int)(rgb < 256 ? rgb | UINT32_C(0x010100) : rgb);
}

static struct paint scale_paint(const struct shade *shade, enum color_tier tier)
{
    bool direct = tier == TIER_DIRECT;
    bool white = direct ? shade->rgb_white : shade->index_white;
    return (struct paint){.foreground = color_of(white ? WHITE : BLACK, tier),
                          .background =
                              direct ? (int)shade->rgb : shade->index};
}

static struct paint few_paint(const struct few *entry, enum color_tier tier)
{
    int white = tier == TIER_16 ? 15 : 7;
    return (struct paint){.foreground = entry->white ? white : 0,
                          .background = entry->color};
}

static struct paint step_paint(enum role role, enum color_tier tier)
{
    bool diverging = role >= ROLE_BALANCE;
    int step = (int)role - (int)(diverging ? ROLE_BALANCE : ROLE_RAMP);
    if (tier == TIER_MONO)
        return (struct paint){PAINT_DEFAULT, PAINT_DEFAULT, 0};
    if (tier <= TIER_16) {
        int class = palette_class(step, tier);
        return few_paint(diverging ? &few_balance[class] : &few_ramp[class],
                         tier);
    }
    return scale_paint(diverging ? &balance[step] : &ramp[step], tier);
}

/* Attributes of a text role; they are what remains in monochrome. */
static unsigned text_style(enum role role)
{
    switch ((int)role) {
    case ROLE_TITLE:
    case ROLE_KEY:
    case ROLE_ABOVE:
    case ROLE_CURVE_2:
    case ROLE_CURVE_4:
        return PAINT_BOLD;
    case ROLE_HEADING:
    case ROLE_FIELD:
        return PAINT_UNDERLINE;
    case ROLE_PIN:
        return PAINT_BOLD | PAINT_UNDERLINE;
    case ROLE_CAUTION:
        return PAINT_BOLD;
    case ROLE_CHOSEN:
        return PAINT_REVERSE;
    default:
        return 0;
    }
}

static int text_color(const struct text_colors *c, enum role role)
{
    switch ((int)role) {
    case ROLE_QUIET:
    case ROLE_GAP:
        return c->quiet;
    case ROLE_KEY:
        return c->key;
    case ROLE_PIN:
        return c->pin;
    case ROLE_ABOVE:
        return c->above;
    case ROLE_BELOW:
        return c->below;
    case ROLE_CAUTION:
        return c->caution;
    default:
        return role >= ROLE_CURVE_1 ? c->curve[role - ROLE_CURVE_1] : c->ink;
    }
}

struct paint palette_paint(enum role role, enum scheme scheme,
                           enum color_tier tier)
{
    assert((int)role >= 0 && role < ROLE_COUNT);
    if (role >= ROLE_RAMP)
        return step_paint(role, tier);
    struct paint paint = {PAINT_DEFAULT, PAINT_DEFAULT, text_style(role)};
    if (tier == TIER_MONO)
        return paint;
    const struct text_colors *c =
        tier <= TIER_16 ? &few[scheme] : &many[scheme];
    paint.foreground = color_of(text_color(c, role), tier);
    paint.background =
        color_of(role == ROLE_FIELD ? c->field : c->ground, tier);
    /* one mark is enough, and each change of attributes costs bytes */
    bool colored = paint.foreground != color_of(c->ink, tier);
    if (colored && tier >= TIER_256 && role != ROLE_CAUTION)
        paint.style &= ~(unsigned)PAINT_BOLD;
    return paint;
}

enum color_tier terminal_color_choice(enum color_option option,
                                      const char *no_color,
                                      enum color_tier tier)
{
    if (option == COLOR_NEVER)
        return TIER_MONO;
    bool refused = no_color != NULL && *no_color != '\0';
    return refused && option != COLOR_ALWAYS ? TIER_MONO : tier;
}
