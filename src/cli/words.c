/* SPDX-License-Identifier: MIT */
#include "cli/words.h"

#include <stdint.h>
#include <string.h>

#include "analysis/atom_report.h"
#include "analysis/audit.h"
#include "analysis/order.h"
#include "base/units.h"
#include "element/quantity.h"
#include "element/subshell.h"
#include "model/registry.h"

/* In the order of model_options.average_term: false, true. */
static const char *const terms[] = {"hund", "average"};
/* Bytes of a refused word that a message shows. */
#define WORD_SHOWN_MAX 41

static const char *const formats[] = {"text", "csv", "json", "bibtex"};
static const char *const colors[] = {"auto", "always", "never"};
/* In the order of enum scheme; colors in that of enum color_option. */
static const char *const backgrounds[] = {"terminal", "light", "dark",
                                          "contrast"};
/* Every subshell that an atom up to Z = 118 may hold. */
static const char *const subshells[] = {
    "1s", "2s", "2p", "3s", "3p", "3d", "4s", "4p", "4d",
    "4f", "5s", "5p", "5d", "5f", "6s", "6p", "6d", "6f",
    "7s", "7p", "7d", "7f", "8s", "8p", "8d", "8f"};

static void add(struct words *words, const char *word)
{
    for (int i = 0; i < words->count; i++)
        if (strcmp(words->items[i], word) == 0)
            return;
    if (words->count < WORD_MAX)
        words->items[words->count++] = word;
}

static void add_all(struct words *words, const char *const *items, size_t count)
{
    for (size_t i = 0; i < count; i++)
        add(words, items[i]);
}

#define ADD_ARRAY(words, array)                                                \
    add_all(words, array, sizeof(array) / sizeof(array)[0])

/* Units that a quantity can be converted to: of a dimension that has a
 * choice. */
static void add_units(struct words *words)
{
    for (size_t i = 0; i < unit_count(); i++) {
        enum dimension d = unit_at(i)->dimension;
        if (d == DIMENSION_LENGTH || d == DIMENSION_ENERGY)
            add(words, unit_at(i)->id);
    }
}

void words_fill(struct words *words, enum word_kind kind,
                const struct reference_list *references)
{
    words->count = 0;
    switch (kind) {
    case WORDS_QUANTITY:
        for (int q = 0; q < QUANTITY_COUNT; q++)
            add(words, quantity_at((enum quantity_id)q)->id);
        break;
    case WORDS_MODEL:
        for (int m = 0; m < model_count(); m++)
            add(words, model_at(m)->id);
        break;
    case WORDS_REFERENCE:
        for (int i = 0; references && i < references->count; i++)
            add(words, references->items[i].provenance->id);
        break;
    case WORDS_COORDINATION:
        for (int c = COORDINATION_NONE + 1; c < COORDINATION_COUNT; c++)
            add(words, coordination_id((enum coordination)c));
        break;
    case WORDS_SPIN:
        for (int s = SPIN_NONE + 1; s < SPIN_COUNT; s++)
            add(words, spin_id((enum spin_state)s));
        break;
    case WORDS_EVIDENCE:
        for (int e = 0; e < EVIDENCE_COUNT; e++)
            add(words, evidence_id((enum evidence)e));
        break;
    case WORDS_SORT:
        for (int s = 0; s < ROW_ORDER_COUNT; s++)
            add(words, row_order_id((enum row_order)s));
        break;
    case WORDS_SCOPE:
        for (int s = 0; s < AUDIT_SCOPE_COUNT; s++)
            add(words, audit_scope_id((enum audit_scope)s));
        break;
    case WORDS_UNIT:
        add_units(words);
        break;
    case WORDS_SUBSHELL:
        ADD_ARRAY(words, subshells);
        break;
    case WORDS_TERM:
        ADD_ARRAY(words, terms);
        break;
    case WORDS_FUNCTIONAL:
        for (int f = 0; f < FUNCTIONAL_COUNT; f++)
            add(words, functional_id((enum functional)f));
        break;
    case WORDS_RELATIVITY:
        for (int i = 0; i < RELATIVITY_COUNT; i++)
            add(words, relativity_id((enum relativity)i));
        break;
    case WORDS_FORMAT:
        ADD_ARRAY(words, formats);
        break;
    case WORDS_COLOR:
        ADD_ARRAY(words, colors);
        break;
    case WORDS_BACKGROUND:
        ADD_ARRAY(words, backgrounds);
        break;
    case WORDS_NONE:
    case WORDS_FILE:
        break;
    }
}

const char *word_nearest(const char *word, const char *const *items, int count)
{
    const char *best = NULL;
    size_t least = SIZE_MAX;
    size_t length = strlen(word);
    for (int i = 0; i < count; i++) {
        size_t distance = text_edit_distance(word, items[i]);
        size_t allowed = strlen(items[i]) / 3 + 1;
        if (length >= 2 && text_starts_ignoring_case(items[i], word))
            distance = 1;
        if (distance <= allowed && distance < least && distance < length) {
            least = distance;
            best = items[i];
        }
    }
    return best;
}

void words_join(struct text *t, const char *const *items, int count,
                const char *conjunction)
{
    for (int i = 0; i < count; i++) {
        if (i > 0 && i == count - 1)
            text_addf(t, " %s ", conjunction);
        else if (i > 0)
            text_add(t, ", ");
        text_add(t, items[i]);
    }
}

bool words_next(const char **list, char out[WORD_TEXT_MAX])
{
    size_t length = strcspn(*list, ",");
    if (length >= WORD_TEXT_MAX)
        return false;
    memcpy(out, *list, length);
    out[length] = '\0';
    *list = (*list)[length] ? *list + length + 1 : NULL;
    return true;
}

bool word_refuse(const struct option *option, const char *word,
                 const struct words *words, struct status *st)
{
    char all[WORD_LIST_TEXT_MAX];
    struct text t = text_over(all, sizeof all);
    const char *near = word_nearest(word, words->items, words->count);
    words_join(&t, words->items, words->count, "or");
    char shown[WORD_SHOWN_MAX];
    struct text w = text_over(shown, sizeof shown);
    text_add(&w, word[0] ? word : "an empty word");
    const char *rest = w.cut ? "..." : "";
    if (near && t.cut)
        return status_fail(st, STATUS_USAGE,
                           "--%s %s%s: not accepted; did you mean %s?",
                           option->name, shown, rest, near);
    if (near)
        return status_fail(st, STATUS_USAGE,
                           "--%s %s%s: not accepted; did you mean %s? "
                           "(expected %s)",
                           option->name, shown, rest, near, all);
    return status_fail(st, STATUS_USAGE,
                       "--%s %s%s: not accepted; expected %s%s", option->name,
                       shown, rest, all, t.cut ? "..." : "");
}
