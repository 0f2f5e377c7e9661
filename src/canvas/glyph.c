/* SPDX-License-Identifier: MIT */
/* Which characters fill exactly one column, and the ASCII twin of each.
 *
 * The width is a list of our own: wcwidth answers for the locale of the
 * machine, not for the terminal, and gives -1 for everything in the C locale.
 * The list holds whole blocks in which the Unicode Character Database (file
 * EastAsianWidth.txt) knows only narrow, neutral and ambiguous characters, less
 * the combining and the unassigned ones; ambiguous ones take one column on
 * terminals that are not set to an East Asian width. */
#include "canvas/glyph.h"

#include <stddef.h>

struct range {
    uint32_t first, last;
};

static const struct range single[] = {
    {0x20, 0x7E},     {0xA0, 0xAC},     {0xAE, 0x24F},    {0x391, 0x3A1},
    {0x3A3, 0x3CE},   {0x3D1, 0x3D1},   {0x3D5, 0x3D5},   {0x3F5, 0x3F5},
    {0x410, 0x44F},   {0x2010, 0x2027}, {0x2030, 0x2033}, {0x2039, 0x203A},
    {0x2044, 0x2044}, {0x2070, 0x2071}, {0x2074, 0x208E}, {0x2090, 0x209C},
    {0x2113, 0x2113}, {0x2116, 0x2116}, {0x2126, 0x2126}, {0x212B, 0x212B},
    {0x2150, 0x215E}, {0x2190, 0x2199}, {0x21D0, 0x21D5}, {0x2200, 0x22FF},
    {0x2308, 0x230B}, {0x2400, 0x2421}, {0x2500, 0x25FC}, {0x2605, 0x2606},
    {0x2713, 0x2713}, {0x2715, 0x2715}, {0x2717, 0x2717}, {0x271A, 0x271A},
    {0x27E8, 0x27E9}, {0x2800, 0x28FF}, {0xFFFD, 0xFFFD},
};

bool glyph_is_single(uint32_t character)
{
    size_t low = 0;
    size_t high = sizeof single / sizeof single[0];
    while (low < high) {
        size_t middle = (low + high) / 2;
        if (character > single[middle].last)
            low = middle + 1;
        else if (character < single[middle].first)
            high = middle;
        else
            return true;
    }
    return false;
}

/* Runs of twins: characters from `first` on, one letter each; '?' where there
 * is no twin that could not be misread. */
struct run {
    uint32_t first;
    const char *twins;
};

/* Eighths rise through one ladder, so that a longer bar still ends in a
 * heavier mark; each plot marker keeps a twin of its own. */
static const struct run runs[] = {
    {0xA0, " !cL$Y|S\"ca<!?r-o~23'uP.,1o>????"},
    {0xC0, "AAAAAAACEEEEIIIIDNOOOOOxOUUUUYTs"
           "aaaaaaaceeeeiiiidnooooo/ouuuuyty"},
    {0x100, "AaAaAaCcCcCcCcDdDdEeEeEeEeEeGgGgGgGgHhHhIiIiIiIiIiIiJjKkkLlLl"
            "LlLlLlNnNnNnnNnOoOoOoOoRrRrRrSsSsSsSsTtTtTtUuUuUuUuUuUuWwYyYZz"
            "ZzZzs"},
    {0x391, "ABGDEZHTIKLMNXOPR?STUFXYWIUaehiuabgdezhtiklunxoprsstufxyw"
            "iuouw"},
    {0x2010, "------|_'','\"\"\"\"+#*>...."},
    {0x2030, "%?'\""},
    {0x2039, "<>"},
    {0x2044, "/"},
    {0x2070, "0i"},
    {0x2074, "456789+-=()n0123456789+-=()"},
    {0x2090, "aeoxehklmnpst"},
    {0x2113, "l"},
    {0x2126, "W"},
    {0x212B, "A"},
    {0x2190, "<^>v-|\\/\\/"},
    {0x21D0, "<^>v=|"},
    {0x2202, "d"},
    {0x2206, "DV"},
    {0x2211, "S-~"},
    {0x2215, "/\\*o.v"},
    {0x221D, "~"},
    {0x2223, "|"},
    {0x2225, "|"},
    {0x222B, "f"},
    {0x2236, ":"},
    {0x223C, "~"},
    {0x2243, "~"},
    {0x2248, "~"},
    {0x2261, "="},
    {0x2264, "<><>"},
    {0x226A, "<>"},
    {0x22C5, ".*"},
    {0x22EE, ":."},
    {0x2400, "^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ ^"},
    {0x2500, "--||--||--||++++++++++++++++++++++++++++++++++++++++++++++++"
             "++++++++++++++++--||=|+++++++++++++++++++++++++++++++/\\X"
             "-|-|-|-|-|-|"},
    {0x2580, "\".:-=+*%#%*+=-:.=.:%'|++++++++++"},
    {0x25A0, "#%%%%%%%%%..--||//^^^^>>>>>>vvvv<<<<<<*x*@xoo@@@"},
    {0x25E6, "o"},
    {0x2605, "**"},
    {0x2713, "v"},
    {0x2715, "x"},
    {0x2717, "x"},
    {0x271A, "+"},
    {0x27E8, "<>"},
};

static uint32_t braille_twin(uint32_t dots)
{
    static const char ladder[] = " ..::**##";
    int count = 0;
    for (uint32_t rest = dots; rest != 0; rest &= rest - 1)
        count++;
    return (unsigned char)ladder[count];
}

uint32_t glyph_ascii(uint32_t character)
{
    if (character >= 0x20 && character <= 0x7E)
        return character;
    if (character >= 0x2800 && character <= 0x28FF)
        return braille_twin(character - 0x2800);
    for (size_t i = 0; i < sizeof runs / sizeof runs[0]; i++) {
        uint32_t first = runs[i].first;
        if (character < first)
            break;
        uint32_t at = character - first;
        const char *twin = runs[i].twins;
        while (at > 0 && *twin) {
            twin++;
            at--;
        }
        if (*twin)
            return (unsigned char)*twin;
    }
    return '?';
}
