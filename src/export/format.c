/* SPDX-License-Identifier: MIT */
#include "export/format.h"

#include <math.h>
#include <string.h>

void csv_text(struct text *t, const char *field)
{
    if (field[strcspn(field, ",\"\r\n")] == '\0') {
        text_add(t, field);
        return;
    }
    text_add_bytes(t, "\"", 1);
    while (*field) {
        size_t plain = strcspn(field, "\"");
        text_add_bytes(t, field, plain);
        field += plain;
        if (*field == '"') {
            text_add_bytes(t, "\"\"", 2);
            field++;
        }
    }
    text_add_bytes(t, "\"", 1);
}

void csv_field(FILE *out, const char *text, bool first)
{
    if (!first)
        putc(',', out);
    if (text[strcspn(text, ",\"\r\n")] == '\0') {
        fputs(text, out);
        return;
    }
    putc('"', out);
    for (const char *p = text; *p; p++) {
        if (*p == '"')
            putc('"', out);
        putc(*p, out);
    }
    putc('"', out);
}

void csv_end(FILE *out)
{
    fputs("\r\n", out);
}

void json_string(FILE *out, const char *text)
{
    size_t length = strlen(text);
    putc('"', out);
    for (size_t i = 0; i < length;) {
        uint32_t code;
        size_t n = utf8_decode(text + i, length - i, &code);
        if (code == UTF8_INVALID)
            fputs("\\ufffd", out);
        else if (code == '"' || code == '\\')
            fprintf(out, "\\%c", (int)code);
        else if (code < 0x20)
            fprintf(out, "\\u%04x", (unsigned)code);
        else
            fwrite(text + i, 1, n, out);
        i += n;
    }
    putc('"', out);
}

void citation_text(struct text *t, const struct citation *c)
{
    const char *first = c->authors ? c->authors : c->title;
    /* A container may stand alone: "Journal 1, 2". */
    if (first)
        text_add(t, first);
    /* An article is found by its journal; anything else by its title. */
    if (c->authors && c->title && c->container &&
        strcmp(c->kind, "article") != 0)
        text_addf(t, ", %s", c->title);
    if (c->container)
        text_addf(t, first ? ", %s" : "%s", c->container);
    if (c->volume)
        text_addf(t, " %s", c->volume);
    if (c->pages)
        text_addf(t, ", %s", c->pages);
    if (c->year)
        text_addf(t, " (%d)", c->year);
    if (c->doi)
        text_addf(t, ", doi %s", c->doi);
}

void provenance_text(struct text *t, const struct provenance *provenance)
{
    for (int i = 0; provenance && i < provenance->citation_count; i++) {
        if (i > 0)
            text_add(t, "; ");
        citation_text(t, &provenance->citations[i]);
    }
}

void reading_text(struct text *t, const struct reading *reading)
{
    char value[NUMBER_TEXT_MAX];
    char u[NUMBER_TEXT_MAX];
    if (!reading->has_u || reading->u.decimals > reading->value.decimals) {
        text_add(t, number_print(reading->value, value));
        if (reading->has_u)
            text_addf(t, " +- %s", number_print(reading->u, u));
        return;
    }
    /* A derived value may have more places than its uncertainty. */
    int places = reading->u.decimals;
    double last = reading->u.value * pow(10, places);
    text_addf(t, "%s(%.0f)",
              number_print_places(reading->value.value, places, value), last);
}

void species_configuration_text(struct text *t, const struct species *species)
{
    char out[CONFIGURATION_TEXT_MAX];
    text_add(t, configuration_print(&species->configuration, out));
    if (species->origin == ORIGIN_PREDICTED || species->origin == ORIGIN_RULE)
        text_addf(t, " (%s)", configuration_origin_text(species->origin));
}
