/* SPDX-License-Identifier: MIT */
#include "element/species.h"

#include <stddef.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "element/element.h"

const char *configuration_origin_text(enum configuration_origin origin)
{
    static const char *const texts[] = {
        [ORIGIN_STORED] = "stored",
        [ORIGIN_PREDICTED] = "predicted",
        [ORIGIN_RULE] = "by rule",
        [ORIGIN_USER] = "given",
    };
    return texts[origin];
}

/* "4" or "7/2" to 2J; -1 when it is neither. */
static int parse_j(const char *s)
{
    size_t digits = strspn(s, "0123456789");
    if (digits == 0 || digits > 2)
        return -1;
    int value = 0;
    for (size_t i = 0; i < digits; i++)
        value = value * 10 + (s[i] - '0');
    if (s[digits] == '\0')
        return 2 * value;
    return strcmp(s + digits, "/2") == 0 ? value : -1;
}

bool term_parse(const char *text, struct term *term)
{
    static const char letters[] = "SPDFGHIKLMNOQ";
    *term = (struct term){"", -1, -1, -1};
    if (strlen(text) >= TERM_TEXT_MAX)
        return false;
    if (text[0] == '\0')
        return true;
    snprintf(term->text, sizeof term->text, "%s", text);
    if (strncmp(text, "J=", 2) == 0) {
        term->twice_j = parse_j(text + 2);
        return term->twice_j >= 0;
    }
    /* "(15/2,1/2)*8": the core's J with another's, coupled; only J is kept */
    const char *end = text[0] == '(' ? strchr(text, ')') : NULL;
    if (end) {
        term->twice_j = parse_j(end[1] == '*' ? end + 2 : end + 1);
        return term->twice_j >= 0;
    }
    size_t digits = strspn(text, "0123456789");
    const char *letter = text[digits] ? strchr(letters, text[digits]) : NULL;
    if (digits == 0 || digits > 2 || !letter)
        return false;
    int multiplicity = 0;
    for (size_t i = 0; i < digits; i++)
        multiplicity = multiplicity * 10 + (text[i] - '0');
    const char *j = text + digits + 1;
    j += *j == '*';
    term->multiplicity = multiplicity;
    term->big_l = (int)(letter - letters);
    if (*j == '\0')
        return true;
    term->twice_j = parse_j(j);
    return term->twice_j >= 0;
}

const char *ion_print(int z, int charge, char out[ION_TEXT_MAX])
{
    int size = abs(charge);
    const char *symbol = element_at(z)->symbol;
    const char *sign = charge == 0 ? "" : charge > 0 ? "+" : "-";
    if (size <= 1)
        snprintf(out, ION_TEXT_MAX, "%s%s", symbol, sign);
    else
        snprintf(out, ION_TEXT_MAX, "%s%d%s", symbol, size, sign);
    return out;
}

const char *ion_print_at(int z, int charge, struct site site,
                         char out[ION_TEXT_MAX])
{
    char at[SITE_TEXT_MAX];
    ion_print(z, charge, out);
    size_t length = strlen(out);
    if (site_named(site))
        snprintf(out + length, ION_TEXT_MAX - length, "@%s",
                 site_print(site, at));
    return out;
}

const char *species_print(const struct species *species, char out[ION_TEXT_MAX])
{
    return ion_print_at(species->z, species->charge, species->site, out);
}

void species_configuration_text(struct text *t, const struct species *species)
{
    char out[CONFIGURATION_TEXT_MAX];
    text_add(t, configuration_print(&species->configuration, out));
    if (species->origin == ORIGIN_PREDICTED || species->origin == ORIGIN_RULE)
        text_addf(t, " (%s)", configuration_origin_text(species->origin));
}
