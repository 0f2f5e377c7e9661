/* SPDX-License-Identifier: MIT */
#include "export/legend.h"

#include <assert.h>
#include <stdlib.h>
#include <string.h>

static void *grow(void *items, size_t count, size_t *capacity, size_t size)
{
    if (count < *capacity)
        return items;
    *capacity = *capacity ? 2 * *capacity : 32;
    return realloc(items, *capacity * size);
}

/* Number of a note, from 1; 0 without memory. */
static size_t note_number(struct legend *l, struct note note)
{
    for (size_t i = 0; i < l->note_count; i++)
        if (strcmp(l->notes[i].text, note.text) == 0 &&
            strcmp(l->notes[i].lead, note.lead) == 0)
            return i + 1;
    struct note *notes =
        grow(l->notes, l->note_count, &l->note_capacity, sizeof *notes);
    if (!notes) {
        l->failed = true;
        return 0;
    }
    l->notes = notes;
    l->notes[l->note_count++] = note;
    return l->note_count;
}

void legend_notes(struct legend *legend, const struct note *notes, int count,
                  struct text *t)
{
    size_t numbers[ROW_NOTES_MAX];
    int used = 0;
    assert(count <= ROW_NOTES_MAX);
    for (int i = 0; i < count; i++) {
        if (notes[i].text[0] == '\0')
            continue;
        size_t number = note_number(legend, notes[i]);
        int place = used;
        while (place > 0 && numbers[place - 1] >= number)
            place--;
        if (place < used && numbers[place] == number)
            continue;
        memmove(numbers + place + 1, numbers + place,
                (size_t)(used - place) * sizeof *numbers);
        numbers[place] = number;
        used++;
    }
    for (int i = 0; i < used; i++)
        text_addf(t, i ? ",%zu" : "%zu", numbers[i]);
}

static void put_letter(struct text *t, size_t place)
{
    if (place >= 26)
        put_letter(t, place / 26 - 1);
    text_addf(t, "%c", (int)('a' + place % 26));
}

void legend_set(struct legend *l, const struct provenance *set, struct text *t)
{
    size_t i = 0;
    while (i < l->set_count && l->sets[i] != set)
        i++;
    if (i == l->set_count) {
        const struct provenance **sets =
            grow(l->sets, l->set_count, &l->set_capacity, sizeof *sets);
        if (!sets) {
            l->failed = true;
            return;
        }
        l->sets = sets;
        l->sets[l->set_count++] = set;
    }
    put_letter(t, i);
}

void legend_write(struct legend *l, const char *title, FILE *out)
{
    char letter[16];
    if (l->set_count)
        fprintf(out, "\n%s\n", title);
    for (size_t i = 0; i < l->set_count; i++) {
        struct text t = text_over(letter, sizeof letter);
        put_letter(&t, i);
        fprintf(out, "  %-2s  %s: %s; %s\n", letter, l->sets[i]->id,
                l->sets[i]->title, l->sets[i]->definition);
    }
    if (l->note_count)
        fputs("\nNotes\n", out);
    for (size_t i = 0; i < l->note_count; i++)
        fprintf(out, "  %-2zu  %s%s\n", i + 1, l->notes[i].lead,
                l->notes[i].text);
    legend_free(l);
}

void legend_free(struct legend *legend)
{
    free(legend->notes);
    free(legend->sets);
    *legend = (struct legend){0};
}
