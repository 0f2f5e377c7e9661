/* SPDX-License-Identifier: MIT */
/* What stands below a table for people: remarks and sources, each told once
 * and referred to by number or letter. */
#ifndef EXPORT_LEGEND_H
#define EXPORT_LEGEND_H

#include <stdio.h>

#include "base/text.h"
#include "element/provenance.h"

/* A remark in two borrowed pieces; a row has a few. */
struct note {
    const char *lead;
    const char *text;
};
#define ROW_NOTES_MAX 16

/* Starts as {0}; failed says that memory was short. */
struct legend {
    size_t note_count, note_capacity;
    struct note *notes;
    size_t set_count, set_capacity;
    const struct provenance **sets;
    bool failed;
};

/* Writes the numbers of notes[count] whose text is not empty, "1,4", in rising
 * order; count is at most ROW_NOTES_MAX. */
void legend_notes(struct legend *legend, const struct note *notes, int count,
                  struct text *t);

/* Writes the letter of a source: a … z, aa, ab, … */
void legend_set(struct legend *legend, const struct provenance *set,
                struct text *t);

/* Writes both lists, the sources under `title`, and frees the legend. */
void legend_write(struct legend *legend, const char *title, FILE *out);

void legend_free(struct legend *legend);

#endif
