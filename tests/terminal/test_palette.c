/* SPDX-License-Identifier: MIT */
/* The colours against colour science of the tests' own (support/oklab). */
#include <check.h>
#include <math.h>
#include <stdlib.h>

#include "canvas/role.h"
#include "search.h"
#include "support/near.h"
#include "support/run.h"
#include "terminal/palette.h"

static const enum color_tier tiers[] = {TIER_MONO, TIER_8, TIER_16, TIER_256,
                                        TIER_DIRECT};
enum { TIERS = 5, MIDDLE = BALANCE_STEPS / 2 };

static uint32_t shown_rgb(int color, enum color_tier tier)
{
    return tier == TIER_DIRECT ? (uint32_t)color : fixed_rgb(color);
}

static uint32_t step_rgb(enum role first, int step, enum color_tier tier)
{
    enum role role = (enum role)((int)first + step);
    return shown_rgb(palette_paint(role, SCHEME_TERMINAL, tier).background,
                     tier);
}

/* Ottosson 2020, the table of test values on his page: XYZ to OKLab; here the
 * white point and the sRGB primaries through the same matrices (from memory:
 * red 0.628, 0.225, 0.126; blue 0.452, -0.032, -0.312). */
START_TEST(the_colour_science_of_the_tests_is_right)
{
    struct oklab white = oklab_of(0xFFFFFF, VISION_FULL);
    near(white.L, 1, 1e-6, 0, "white L");
    near(oklab_chroma(white), 0, 1e-6, 0, "white chroma");
    struct oklab red = oklab_of(0xFF0000, VISION_FULL);
    near(red.L, 0.628, 5e-4, 0, "red L");
    near(red.a, 0.225, 5e-4, 0, "red a");
    near(red.b, 0.126, 5e-4, 0, "red b");
    struct oklab blue = oklab_of(0x0000FF, VISION_FULL);
    near(blue.L, 0.452, 5e-4, 0, "blue L");
    near(blue.a, -0.032, 5e-4, 0, "blue a");
    near(blue.b, -0.312, 5e-4, 0, "blue b");
    /* WCAG 2.2: black on white is 21:1 */
    near(contrast(0x000000, 0xFFFFFF), 21, 1e-9, 0, "black on white");
    /* a missing cone changes no grey */
    for (uint32_t g = 0; g < 256; g += 15)
        for (int v = 0; v < VISION_COUNT; v++) {
            struct oklab c = oklab_of(g * 0x010101, (enum vision)v);
            near(oklab_chroma(c), 0, 1e-4, 0, "grey %u vision %d", g, v);
        }
    for (uint32_t rgb = 0; rgb < 0x1000000; rgb += 0x01357B) {
        bool inside;
        uint32_t back = oklab_rgb(oklab_of(rgb, VISION_FULL), &inside);
        ck_assert_uint_eq(back, rgb);
    }
}
END_TEST

START_TEST(the_fixed_palette_is_the_cube_and_the_greys)
{
    for (int i = 16; i < 256; i++)
        ck_assert_uint_eq(palette_rgb(i), fixed_rgb(i));
}
END_TEST

START_TEST(the_256_colours_are_what_the_search_finds)
{
    int index[RAMP_STEPS];
    search_ramp(index);
    for (int i = 0; i < RAMP_STEPS; i++) {
        enum role role = (enum role)(ROLE_RAMP + i);
        ck_assert_int_eq(
            palette_paint(role, SCHEME_TERMINAL, TIER_256).background,
            index[i]);
    }
    search_balance(index);
    for (int i = 0; i < BALANCE_STEPS; i++) {
        enum role role = (enum role)(ROLE_BALANCE + i);
        ck_assert_int_eq(
            palette_paint(role, SCHEME_TERMINAL, TIER_256).background,
            index[i]);
    }
}
END_TEST

START_TEST(the_direct_colours_are_the_computed_ones)
{
    for (int i = 0; i < RAMP_STEPS; i++) {
        bool inside;
        uint32_t want = oklab_rgb(ramp_target(i), &inside);
        ck_assert(inside);
        ck_assert_uint_eq(step_rgb(ROLE_RAMP, i, TIER_DIRECT), want);
        want = oklab_rgb(balance_target(i), &inside);
        ck_assert(inside);
        ck_assert_uint_eq(step_rgb(ROLE_BALANCE, i, TIER_DIRECT), want);
    }
}
END_TEST

static const enum color_tier rich[] = {TIER_256, TIER_DIRECT};

/* Crameri, Shephard, Heron 2020 (doi 10.1038/s41467-020-19160-7): order by
 * lightness, for every eye. */
START_TEST(the_ramp_rises_in_lightness_for_every_vision)
{
    for (int t = 0; t < 2; t++)
        for (int v = 0; v < VISION_COUNT; v++)
            for (int i = 1; i < RAMP_STEPS; i++) {
                double low = oklab_of(step_rgb(ROLE_RAMP, i - 1, rich[t]),
                                      (enum vision)v)
                                 .L;
                double high =
                    oklab_of(step_rgb(ROLE_RAMP, i, rich[t]), (enum vision)v).L;
                ck_assert_msg(high - low >= 0.045,
                              "tier %d vision %d step %d: %.3f to %.3f",
                              rich[t], v, i, low, high);
            }
}
END_TEST

START_TEST(the_balance_is_symmetric_about_a_neutral_middle)
{
    for (int t = 0; t < 2; t++) {
        struct oklab middle =
            oklab_of(step_rgb(ROLE_BALANCE, MIDDLE, rich[t]), VISION_FULL);
        near(oklab_chroma(middle), 0, 1e-3, 0, "middle, tier %d", rich[t]);
        for (int d = 1; d <= MIDDLE; d++) {
            uint32_t below = step_rgb(ROLE_BALANCE, MIDDLE - d, rich[t]);
            uint32_t above = step_rgb(ROLE_BALANCE, MIDDLE + d, rich[t]);
            struct oklab b = oklab_of(below, VISION_FULL);
            struct oklab a = oklab_of(above, VISION_FULL);
            near(a.L, b.L, 0.02, 0, "tier %d step %d", rich[t], d);
            ck_assert(oklab_hue(b) > 230 && oklab_hue(b) < 290);
            ck_assert(oklab_hue(a) > 30 && oklab_hue(a) < 115);
            for (int v = 0; v < VISION_COUNT; v++) {
                enum vision vision = (enum vision)v;
                double inner =
                    oklab_of(step_rgb(ROLE_BALANCE, MIDDLE - d + 1, rich[t]),
                             vision)
                        .L;
                double other =
                    oklab_of(step_rgb(ROLE_BALANCE, MIDDLE + d - 1, rich[t]),
                             vision)
                        .L;
                ck_assert_msg(inner - oklab_of(below, vision).L >= 0.045 &&
                                  other - oklab_of(above, vision).L >= 0.045,
                              "tier %d vision %d step %d", rich[t], v, d);
                ck_assert_msg(oklab_distance(oklab_of(below, vision),
                                             oklab_of(above, vision)) >= 0.05,
                              "tier %d vision %d: sides of step %d", rich[t], v,
                              d);
            }
        }
    }
}
END_TEST

START_TEST(any_two_steps_differ_for_every_vision)
{
    static const enum role firsts[] = {ROLE_RAMP, ROLE_BALANCE};
    for (int f = 0; f < 2; f++)
        for (int t = 0; t < 2; t++)
            for (int v = 0; v < VISION_COUNT; v++)
                for (int i = 0; i < RAMP_STEPS; i++)
                    for (int j = 0; j < i; j++) {
                        struct oklab a = oklab_of(
                            step_rgb(firsts[f], i, rich[t]), (enum vision)v);
                        struct oklab b = oklab_of(
                            step_rgb(firsts[f], j, rich[t]), (enum vision)v);
                        ck_assert_msg(oklab_distance(a, b) >= 0.045,
                                      "scale %d tier %d vision %d: %d, %d", f,
                                      rich[t], v, j, i);
                    }
}
END_TEST

/* WCAG 2.2, success criterion 1.4.3. */
START_TEST(text_on_every_step_has_the_better_ink)
{
    for (int t = 0; t < 2; t++)
        for (int r = ROLE_RAMP; r < ROLE_COUNT; r++) {
            struct paint p =
                palette_paint((enum role)r, SCHEME_TERMINAL, rich[t]);
            uint32_t ink = shown_rgb(p.foreground, rich[t]);
            uint32_t ground = shown_rgb(p.background, rich[t]);
            double got = contrast(ink, ground);
            double best =
                fmax(contrast(0x000000, ground), contrast(0xFFFFFF, ground));
            ck_assert_msg(got >= 4.5 && got > 0.97 * best,
                          "tier %d role %d: %.2f of %.2f", rich[t], r, got,
                          best);
        }
}
END_TEST

static double least_contrast(enum role role, enum scheme scheme,
                             enum color_tier tier)
{
    struct paint p = palette_paint(role, scheme, tier);
    uint32_t ink = shown_rgb(p.foreground, tier);
    if (p.background != PAINT_DEFAULT)
        return contrast(ink, shown_rgb(p.background, tier));
    return fmin(contrast(ink, 0x000000), contrast(ink, 0xFFFFFF));
}

START_TEST(text_is_readable_in_every_scheme)
{
    static const double wanted[SCHEME_COUNT] = {4.0, 4.5, 4.5, 7.0};
    for (int t = 0; t < 2; t++)
        for (int s = 0; s < SCHEME_COUNT; s++)
            for (int r = 0; r < ROLE_RAMP; r++) {
                enum role role = (enum role)r;
                enum scheme scheme = (enum scheme)s;
                struct paint p = palette_paint(role, scheme, rich[t]);
                if (p.foreground == PAINT_DEFAULT)
                    continue;
                double want = wanted[s];
                /* a curve on an unknown ground: markers and lines, 3:1 */
                if (role >= ROLE_CURVE_1 && scheme == SCHEME_TERMINAL)
                    want = 3.0;
                double got = least_contrast(role, scheme, rich[t]);
                ck_assert_msg(got >= want, "scheme %d role %d: %.2f", s, r,
                              got);
            }
}
END_TEST

START_TEST(curves_and_accents_are_what_the_search_finds)
{
    static const struct {
        uint32_t ground[2];
        int count;
        double least, most;
    } rules[SCHEME_COUNT] = {{{0x000000, 0xFFFFFF}, 2, 3.0, 7},
                             {{0xFFFFFF}, 1, 4.5, 9},
                             {{0x1C1C1C}, 1, 4.5, 13},
                             {{0x000000}, 1, 7.0, 17}};
    for (int s = 0; s < SCHEME_COUNT; s++) {
        int index[CURVES];
        search_curves(rules[s].least, rules[s].most, rules[s].ground,
                      rules[s].count, index);
        for (int i = 0; i < CURVES; i++) {
            enum role role = (enum role)(ROLE_CURVE_1 + i);
            ck_assert_int_eq(
                palette_paint(role, (enum scheme)s, TIER_256).foreground,
                index[i]);
        }
    }
}
END_TEST

/* A colour of ours on a ground or under an ink that is not, is how white on
 * white comes about. Only colours that are readable on black and on white
 * alike may stand on the terminal's own ground. */
START_TEST(half_default_colours_are_only_the_safe_ones)
{
    for (int t = 0; t < TIERS; t++)
        for (int s = 0; s < SCHEME_COUNT; s++)
            for (int r = 0; r < ROLE_COUNT; r++) {
                struct paint p =
                    palette_paint((enum role)r, (enum scheme)s, tiers[t]);
                bool ink = p.foreground == PAINT_DEFAULT;
                bool ground = p.background == PAINT_DEFAULT;
                if (ink == ground)
                    continue;
                ck_assert_msg(!ink && s == SCHEME_TERMINAL &&
                                  tiers[t] >= TIER_256,
                              "tier %d scheme %d role %d", tiers[t], s, r);
            }
}
END_TEST

START_TEST(explicit_schemes_set_both_colours)
{
    for (int t = 1; t < TIERS; t++)
        for (int s = SCHEME_LIGHT; s < SCHEME_COUNT; s++)
            for (int r = 0; r < ROLE_COUNT; r++) {
                struct paint p =
                    palette_paint((enum role)r, (enum scheme)s, tiers[t]);
                ck_assert(p.foreground != PAINT_DEFAULT &&
                          p.background != PAINT_DEFAULT);
                ck_assert(p.foreground != p.background);
            }
}
END_TEST

START_TEST(indexes_keep_to_what_the_tier_has)
{
    static const int low[TIERS] = {-1, 0, 0, 16, 256};
    static const int high[TIERS] = {-1, 7, 15, 255, 0xFFFFFF};
    for (int t = 0; t < TIERS; t++)
        for (int s = 0; s < SCHEME_COUNT; s++)
            for (int r = 0; r < ROLE_COUNT; r++) {
                struct paint p =
                    palette_paint((enum role)r, (enum scheme)s, tiers[t]);
                int colors[2] = {p.foreground, p.background};
                for (int i = 0; i < 2; i++)
                    ck_assert_msg(
                        colors[i] == PAINT_DEFAULT ||
                            (colors[i] >= low[t] && colors[i] <= high[t]),
                        "tier %d role %d: %d", tiers[t], r, colors[i]);
            }
}
END_TEST

START_TEST(a_scheme_needs_few_pairs)
{
    for (int t = 1; t < TIERS; t++)
        for (int s = 0; s < SCHEME_COUNT; s++) {
            int pairs = 0;
            for (int a = 0; a < ROLE_COUNT; a++) {
                bool fresh = true;
                struct paint p =
                    palette_paint((enum role)a, (enum scheme)s, tiers[t]);
                for (int b = 0; b < a && fresh; b++) {
                    struct paint q =
                        palette_paint((enum role)b, (enum scheme)s, tiers[t]);
                    fresh = p.foreground != q.foreground ||
                            p.background != q.background;
                }
                pairs += fresh;
            }
            ck_assert_int_le(pairs, 60);
        }
}
END_TEST

START_TEST(few_colours_make_five_classes_with_the_middle_alone)
{
    static const enum color_tier few[] = {TIER_8, TIER_16};
    for (int t = 0; t < 2; t++) {
        ck_assert_int_eq(palette_classes(few[t]), 5);
        int members[5] = {0};
        for (int i = 0; i < RAMP_STEPS; i++) {
            int class = palette_class(i, few[t]);
            ck_assert(class >= 0 && class < 5);
            ck_assert(i == 0 || class >= palette_class(i - 1, few[t]));
            ck_assert_int_eq(class,
                             4 - palette_class(RAMP_STEPS - 1 - i, few[t]));
            members[class]++;
        }
        for (int c = 0; c < 5; c++)
            ck_assert_int_gt(members[c], 0);
        ck_assert_int_eq(members[2], 1);
        for (int i = 1; i < RAMP_STEPS; i++)
            for (int f = 0; f < 2; f++) {
                int first = f ? ROLE_BALANCE : ROLE_RAMP;
                struct paint a = palette_paint((enum role)(first + i - 1),
                                               SCHEME_TERMINAL, few[t]);
                struct paint b = palette_paint((enum role)(first + i),
                                               SCHEME_TERMINAL, few[t]);
                bool same =
                    palette_class(i, few[t]) == palette_class(i - 1, few[t]);
                ck_assert_int_eq(same, a.background == b.background);
            }
    }
    ck_assert_int_eq(palette_classes(TIER_256), RAMP_STEPS);
    ck_assert_int_eq(palette_class(7, TIER_DIRECT), 7);
    ck_assert_int_eq(palette_classes(TIER_MONO), 1);
}
END_TEST

/* Without colours the roles that matter are told apart by attributes; the
 * others by their words, signs and glyphs. */
START_TEST(monochrome_keeps_attributes)
{
    static const enum role marked[] = {ROLE_TITLE,  ROLE_HEADING, ROLE_KEY,
                                       ROLE_CHOSEN, ROLE_PIN,     ROLE_FIELD,
                                       ROLE_CAUTION};
    for (int r = 0; r < ROLE_COUNT; r++) {
        struct paint p = palette_paint((enum role)r, SCHEME_DARK, TIER_MONO);
        ck_assert_int_eq(p.foreground, PAINT_DEFAULT);
        ck_assert_int_eq(p.background, PAINT_DEFAULT);
    }
    for (size_t i = 0; i < sizeof marked / sizeof marked[0]; i++)
        ck_assert_uint_ne(
            palette_paint(marked[i], SCHEME_TERMINAL, TIER_MONO).style, 0);
    ck_assert_uint_eq(
        palette_paint(ROLE_CHOSEN, SCHEME_TERMINAL, TIER_MONO).style,
        PAINT_REVERSE);
}
END_TEST

START_TEST(the_command_line_comes_before_no_color)
{
    for (int t = 0; t < TIERS; t++) {
        enum color_tier tier = tiers[t];
        ck_assert_int_eq(terminal_color_choice(COLOR_AUTO, NULL, tier), tier);
        ck_assert_int_eq(terminal_color_choice(COLOR_AUTO, "", tier), tier);
        ck_assert_int_eq(terminal_color_choice(COLOR_AUTO, "1", tier),
                         TIER_MONO);
        ck_assert_int_eq(terminal_color_choice(COLOR_AUTO, "0", tier),
                         TIER_MONO);
        ck_assert_int_eq(terminal_color_choice(COLOR_ALWAYS, "1", tier), tier);
        ck_assert_int_eq(terminal_color_choice(COLOR_NEVER, NULL, tier),
                         TIER_MONO);
        ck_assert_int_eq(terminal_color_choice(COLOR_NEVER, "", tier),
                         TIER_MONO);
    }
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("palette");
    TCase *tc = tcase_create("palette");
    tcase_set_timeout(tc, 30);
    tcase_add_test(tc, the_colour_science_of_the_tests_is_right);
    tcase_add_test(tc, the_fixed_palette_is_the_cube_and_the_greys);
    tcase_add_test(tc, the_256_colours_are_what_the_search_finds);
    tcase_add_test(tc, the_direct_colours_are_the_computed_ones);
    tcase_add_test(tc, the_ramp_rises_in_lightness_for_every_vision);
    tcase_add_test(tc, the_balance_is_symmetric_about_a_neutral_middle);
    tcase_add_test(tc, any_two_steps_differ_for_every_vision);
    tcase_add_test(tc, text_on_every_step_has_the_better_ink);
    tcase_add_test(tc, text_is_readable_in_every_scheme);
    tcase_add_test(tc, curves_and_accents_are_what_the_search_finds);
    tcase_add_test(tc, half_default_colours_are_only_the_safe_ones);
    tcase_add_test(tc, explicit_schemes_set_both_colours);
    tcase_add_test(tc, indexes_keep_to_what_the_tier_has);
    tcase_add_test(tc, a_scheme_needs_few_pairs);
    tcase_add_test(tc, few_colours_make_five_classes_with_the_middle_alone);
    tcase_add_test(tc, monochrome_keeps_attributes);
    tcase_add_test(tc, the_command_line_comes_before_no_color);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
