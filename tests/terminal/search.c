/* SPDX-License-Identifier: MIT */
#include "search.h"

#include <assert.h>
#include <math.h>
#include <stdbool.h>

enum { FIRST = 16, INDEXES = 256 };

/* Rules of the scales. */
static const double ramp_dark = 0.30, ramp_light = 0.92;
static const double ramp_hue_dark = 310, ramp_hue_light = 135;
static const double ramp_share = 0.9, ramp_chroma = 0.15;
static const double balance_middle = 0.95, balance_end = 0.53;
static const double blue_hue = 255, orange_hue = 55, balance_chroma = 0.15;
static const double least_step = 0.045; /* of lightness, between neighbours */
static const double side_difference = 0.02;
static const double side_distance = 0.07; /* of the two sides, any vision */
static const double hue_back = 12; /* that the hue may turn back at most */
static const double least_chroma = 0.05; /* greys belong to the frame */
static const double unreachable = 1e9;

uint32_t fixed_rgb(int index)
{
    assert(index >= FIRST && index < INDEXES);
    if (index >= 232)
        return (uint32_t)(8 + 10 * (index - 232)) * 0x010101u;
    uint32_t rgb = 0;
    int cube = index - FIRST;
    for (int weight = 36; weight > 0; weight /= 6) {
        int level = cube / weight % 6;
        rgb = rgb << 8 | (uint32_t)(level ? 55 + 40 * level : 0);
    }
    return rgb;
}

struct oklab ramp_target(int step)
{
    double t = (double)step / (RAMP_STEPS - 1);
    double L = ramp_dark + t * (ramp_light - ramp_dark);
    double hue = ramp_hue_dark + t * (ramp_hue_light - ramp_hue_dark);
    double chroma = ramp_share * oklab_chroma_max(L, hue);
    return oklab_polar(L, fmin(chroma, ramp_chroma), hue);
}

struct oklab balance_target(int step)
{
    int half = BALANCE_STEPS / 2;
    double t = fabs((double)(step - half)) / half;
    double L = balance_middle + t * (balance_end - balance_middle);
    double most =
        fmin(oklab_chroma_max(L, blue_hue), oklab_chroma_max(L, orange_hue));
    double chroma = fmin(t * balance_chroma, most);
    return oklab_polar(L, chroma, step < half ? blue_hue : orange_hue);
}

static double squared(struct oklab a, struct oklab b)
{
    double d = oklab_distance(a, b);
    return d * d;
}

/* True when `lighter` is lighter by the least step for every vision. */
static bool rises(int darker, int lighter)
{
    for (int v = 0; v < VISION_COUNT; v++)
        if (oklab_of(fixed_rgb(lighter), (enum vision)v).L -
                oklab_of(fixed_rgb(darker), (enum vision)v).L <
            least_step)
            return false;
    return true;
}

/* True when `lighter` may follow `darker` on the sequential scale. */
static bool follows(int darker, int lighter)
{
    struct oklab a = oklab_of(fixed_rgb(darker), VISION_FULL);
    struct oklab b = oklab_of(fixed_rgb(lighter), VISION_FULL);
    return oklab_chroma(a) >= least_chroma && oklab_chroma(b) >= least_chroma &&
           oklab_hue(b) <= oklab_hue(a) + hue_back && rises(darker, lighter);
}

void search_ramp(int index[RAMP_STEPS])
{
    static double cost[RAMP_STEPS][INDEXES];
    static int before[RAMP_STEPS][INDEXES];
    static bool up[INDEXES][INDEXES];
    for (int i = FIRST; i < INDEXES; i++)
        for (int j = FIRST; j < INDEXES; j++)
            up[i][j] = follows(i, j);
    for (int s = 0; s < RAMP_STEPS; s++)
        for (int j = FIRST; j < INDEXES; j++) {
            double best = s == 0 ? 0 : unreachable;
            for (int i = FIRST; s > 0 && i < INDEXES; i++)
                if (up[i][j] && cost[s - 1][i] < best) {
                    best = cost[s - 1][i];
                    before[s][j] = i;
                }
            cost[s][j] = best + squared(ramp_target(s),
                                        oklab_of(fixed_rgb(j), VISION_FULL));
        }
    int last = FIRST;
    for (int j = FIRST; j < INDEXES; j++)
        if (cost[RAMP_STEPS - 1][j] < cost[RAMP_STEPS - 1][last])
            last = j;
    for (int s = RAMP_STEPS - 1; s >= 0; s--) {
        index[s] = last;
        last = before[s][last];
    }
}

/* A blue and an orange of one lightness. */
struct side {
    int blue, orange;
    double cost;
    int before; /* in the list one step nearer to the middle */
};
enum { SIDES_MAX = 4096 };

static bool apart_enough(int blue, int orange)
{
    for (int v = 0; v < VISION_COUNT; v++)
        if (oklab_distance(oklab_of(fixed_rgb(blue), (enum vision)v),
                           oklab_of(fixed_rgb(orange), (enum vision)v)) <
            side_distance)
            return false;
    return true;
}

/* All pairs that could stand at this distance from the middle. */
static int sides_at(int distance, struct side sides[SIDES_MAX])
{
    int half = BALANCE_STEPS / 2;
    struct oklab blue = balance_target(half - distance);
    struct oklab orange = balance_target(half + distance);
    int count = 0;
    for (int b = FIRST; b < INDEXES; b++) {
        struct oklab lb = oklab_of(fixed_rgb(b), VISION_FULL);
        if (oklab_distance(lb, blue) > 0.12)
            continue;
        for (int o = FIRST; o < INDEXES; o++) {
            struct oklab lo = oklab_of(fixed_rgb(o), VISION_FULL);
            if (oklab_distance(lo, orange) > 0.12 ||
                fabs(lb.L - lo.L) > side_difference || !apart_enough(b, o) ||
                count == SIDES_MAX)
                continue;
            sides[count++] =
                (struct side){.blue = b,
                              .orange = o,
                              .cost = squared(lb, blue) + squared(lo, orange),
                              .before = -1};
        }
    }
    return count;
}

void search_balance(int index[BALANCE_STEPS])
{
    enum { HALF = BALANCE_STEPS / 2 };
    static struct side sides[HALF + 1][SIDES_MAX];
    int count[HALF + 1] = {1};
    struct oklab middle = balance_target(HALF);
    int grey = 232;
    for (int i = 232; i < INDEXES; i++)
        if (squared(oklab_of(fixed_rgb(i), VISION_FULL), middle) <
            squared(oklab_of(fixed_rgb(grey), VISION_FULL), middle))
            grey = i;
    sides[0][0] = (struct side){grey, grey, 0, -1};
    for (int d = 1; d <= HALF; d++) {
        count[d] = sides_at(d, sides[d]);
        for (int j = 0; j < count[d]; j++) {
            struct side *s = &sides[d][j];
            double best = unreachable;
            for (int i = 0; i < count[d - 1]; i++) {
                const struct side *p = &sides[d - 1][i];
                if (p->cost < best && rises(s->blue, p->blue) &&
                    rises(s->orange, p->orange)) {
                    best = p->cost;
                    s->before = i;
                }
            }
            s->cost += best;
        }
    }
    int last = 0;
    for (int j = 0; j < count[HALF]; j++)
        if (sides[HALF][j].cost < sides[HALF][last].cost)
            last = j;
    for (int d = HALF; d >= 0; d--) {
        index[HALF - d] = sides[d][last].blue;
        index[HALF + d] = sides[d][last].orange;
        last = sides[d][last].before;
    }
}

static bool readable(int index, double least, const uint32_t *backgrounds,
                     int count)
{
    for (int i = 0; i < count; i++)
        if (contrast(fixed_rgb(index), backgrounds[i]) < least)
            return false;
    return true;
}

int search_accent(double L, double chroma, double hue, double least,
                  const uint32_t *backgrounds, int count)
{
    struct oklab target = oklab_polar(L, chroma, hue);
    int best = -1;
    double nearest = unreachable;
    for (int i = FIRST; i < INDEXES; i++) {
        double d = squared(oklab_of(fixed_rgb(i), VISION_FULL), target);
        if (d < nearest && readable(i, least, backgrounds, count)) {
            nearest = d;
            best = i;
        }
    }
    return best;
}

static const double curve_hue[CURVES] = {255, 45, 150, 335, 95};
enum { CANDIDATES = 40 };

static int candidates(double hue, double least, double most,
                      const uint32_t *backgrounds, int count,
                      int out[CANDIDATES])
{
    int found = 0;
    for (int i = FIRST; i < 232 && found < CANDIDATES; i++) {
        struct oklab c = oklab_of(fixed_rgb(i), VISION_FULL);
        double turn = fabs(oklab_hue(c) - hue);
        if (oklab_chroma(c) >= 0.08 && fmin(turn, 360 - turn) <= 22 &&
            contrast(fixed_rgb(i), backgrounds[0]) <= most &&
            readable(i, least, backgrounds, count))
            out[found++] = i;
    }
    return found;
}

/* The smallest distance of the last of n colours from those before it. */
static double apart(const int *chosen, int n)
{
    double least = unreachable;
    for (int i = 0; i < n - 1; i++)
        for (int v = 0; v < VISION_COUNT; v++)
            least = fmin(
                least, oklab_distance(
                           oklab_of(fixed_rgb(chosen[i]), (enum vision)v),
                           oklab_of(fixed_rgb(chosen[n - 1]), (enum vision)v)));
    return least;
}

struct curve_search {
    int list[CURVES][CANDIDATES];
    int count[CURVES];
    int chosen[CURVES], best[CURVES];
    double widest;
};

/* Depth first, leaving a branch as soon as it cannot beat the best. */
static void widen(struct curve_search *s, int n, double least)
{
    if (least <= s->widest)
        return;
    if (n == CURVES) {
        s->widest = least;
        for (int i = 0; i < CURVES; i++)
            s->best[i] = s->chosen[i];
        return;
    }
    for (int k = 0; k < s->count[n]; k++) {
        s->chosen[n] = s->list[n][k];
        widen(s, n + 1, fmin(least, apart(s->chosen, n + 1)));
    }
}

void search_curves(double least, double most, const uint32_t *backgrounds,
                   int count, int index[CURVES])
{
    struct curve_search s = {.widest = 0};
    for (int i = 0; i < CURVES; i++)
        s.count[i] = candidates(curve_hue[i], least, most, backgrounds, count,
                                s.list[i]);
    widen(&s, 0, unreachable);
    for (int i = 0; i < CURVES; i++)
        index[i] = s.best[i];
}
