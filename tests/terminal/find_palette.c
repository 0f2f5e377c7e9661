/* SPDX-License-Identifier: MIT */
/* Prints the colours that src/terminal/palette.c holds. */
#include <stdio.h>

#include "search.h"

static void print(const char *name, const int *index, int count)
{
    printf("%s:", name);
    for (int i = 0; i < count; i++)
        printf(" %d", index[i]);
    putchar('\n');
    for (int i = 0; i < count; i++) {
        struct oklab c = oklab_of(fixed_rgb(index[i]), VISION_FULL);
        printf("  %3d #%06x  L %.3f  C %.3f  h %5.1f  Y %.3f  text %s\n",
               index[i], fixed_rgb(index[i]), c.L, oklab_chroma(c),
               oklab_hue(c), luminance(fixed_rgb(index[i])),
               luminance(fixed_rgb(index[i])) > 0.179 ? "black" : "white");
    }
}

static void print_targets(const char *name, struct oklab (*target)(int),
                          int count)
{
    printf("%s:", name);
    for (int i = 0; i < count; i++) {
        bool inside;
        uint32_t rgb = oklab_rgb(target(i), &inside);
        printf(" 0x%06X%s%s", rgb, luminance(rgb) > 0.179 ? "" : "w",
               inside ? "" : "!");
    }
    putchar('\n');
}

static const struct {
    const char *name;
    uint32_t backgrounds[2];
    int count;
    double text, line, most, L;
} schemes[] = {
    {"terminal", {0x000000, 0xFFFFFF}, 2, 4.0, 3.0, 7, 0.57},
    {"light", {0xFFFFFF}, 1, 4.5, 4.5, 9, 0.50},
    {"dark", {0x1C1C1C}, 1, 4.5, 4.5, 13, 0.78},
    {"contrast", {0x000000}, 1, 7.0, 7.0, 17, 0.82},
};

int main(void)
{
    int index[BALANCE_STEPS];
    print_targets("ramp", ramp_target, RAMP_STEPS);
    print_targets("balance", balance_target, BALANCE_STEPS);
    search_ramp(index);
    print("ramp 256", index, RAMP_STEPS);
    search_balance(index);
    print("balance 256", index, BALANCE_STEPS);
    static const double hues[] = {55, 255, 25, 330, 200};
    for (int i = 0; i < 4; i++) {
        for (int h = 0; h < 5; h++)
            index[h] =
                search_accent(schemes[i].L, 0.16, hues[h], schemes[i].text,
                              schemes[i].backgrounds, schemes[i].count);
        printf("%s ", schemes[i].name);
        print("above below caution pin key", index, 5);
        search_curves(schemes[i].line, schemes[i].most, schemes[i].backgrounds,
                      schemes[i].count, index);
        printf("%s ", schemes[i].name);
        print("curves", index, CURVES);
    }
    return 0;
}
