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
#include "write/format.h"

/* In the order of model_options.average_term: false, true. */
static const char *const terms[] = {"hund", "average"};
/* Bytes of a refused word that a message shows. */
#define WORD_SHOWN_MAX 41

static const char *const colors[] = {"auto", "always", "never"};
/* In the order of enum scheme; colors in that of enum color_option. */
static const char *const backgrounds[] = {"terminal", "light", "dark",
                                          "contrast"};
/* Every subshell that an atom up to Z = 118 may hold. */
static const char *const subshells[] = {
    "1s", "2s", "2p", "3s", "3p", "3d", "4s", "4p", "4d",
    "4f", "5s", "5p", "5d", "5f", "6s", "6p", "6d", "6f",
    "7s", "7p", "7d", "7f", "8s", "8p", "8d", "8f"};

static void add_titled(struct words *words, const char *word, const char *title)
{
    for (int i = 0; i < words->count; i++)
        if (strcmp(words->items[i], word) == 0)
            return;
    if (words->count == WORD_MAX)
        return;
    words->titles[words->count] = title;
    words->items[words->count++] = word;
}

static void add(struct words *words, const char *word)
{
    add_titled(words, word, "");
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
            add_titled(words, unit_at(i)->id, unit_at(i)->title);
    }
}

void words_fill(struct words *words, enum word_kind kind,
                const struct reference_list *references)
{
    words->count = 0;
    switch (kind) {
    case WORDS_QUANTITY:
        for (int q = 0; q < QUANTITY_COUNT; q++)
            add_titled(words, quantity_at((enum quantity_id)q)->id,
                       quantity_at((enum quantity_id)q)->title);
        break;
    case WORDS_MODEL:
        for (int m = 0; m < model_count(); m++)
            add_titled(words, model_at(m)->id, model_at(m)->title);
        add(words, WORD_NO_MODEL);
        break;
    case WORDS_REFERENCE:
        for (int i = 0; references && i < references->count; i++)
            add_titled(words, references->items[i].provenance->id,
                       references->items[i].provenance->title);
        break;
    case WORDS_COORDINATION:
        for (int c = COORDINATION_NONE + 1; c < COORDINATION_COUNT; c++)
            add(words, coordination_id((enum coordination)c));
        break;
    case WORDS_SPIN:
        for (int s = SPIN_NONE + 1; s < SPIN_COUNT; s++)
            add_titled(words, spin_id((enum spin_state)s),
                       spin_word((enum spin_state)s));
        break;
    case WORDS_EVIDENCE:
        for (int e = 0; e < EVIDENCE_COUNT; e++)
            add_titled(words, evidence_id((enum evidence)e),
                       evidence_word((enum evidence)e));
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
            add_titled(words, functional_id((enum functional)f),
                       functional_title((enum functional)f));
        break;
    case WORDS_RELATIVITY:
        for (int i = 0; i < RELATIVITY_COUNT; i++)
            add_titled(words, relativity_id((enum relativity)i),
                       relativity_title((enum relativity)i));
        break;
    case WORDS_FORMAT:
        for (int f = 0; f < format_list_count; f++)
            add(words, format_list[f]->id);
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
        size_t other = strlen(items[i]);
        size_t longer = other > length ? other : length;
        size_t shorter = other > length ? length : other;
        size_t distance = text_edit_distance(word, items[i]);
        if (length >= 2 && text_starts_ignoring_case(items[i], word))
            distance = 1;
        if (distance <= longer / 4 + 1 && distance < least &&
            distance < shorter) {
            least = distance;
            best = items[i];
        }
    }
    return best;
}

/* True when `part` stands somewhere in a text, in any case. */
static bool holds(const char *text, const char *part)
{
    for (; *text; text++)
        if (text_starts_ignoring_case(text, part))
            return true;
    return false;
}

int words_holding(const struct words *words, const char *part,
                  const char *found[WORD_MAX])
{
    int count = 0;
    size_t length = strlen(part);
    for (int i = 0; i < words->count; i++)
        if (text_same_ignoring_case(words->items[i], part)) {
            found[0] = words->items[i];
            return 1;
        }
    for (int i = 0; i < words->count && length >= 2; i++) {
        bool any =
            length > 2
                ? holds(words->items[i], part) || holds(words->titles[i], part)
                : text_starts_ignoring_case(words->items[i], part);
        if (any)
            found[count++] = words->items[i];
    }
    return count;
}

void words_join(struct text *t, const char *const *items, int count,
                const char *conjunction)
{
    for (int i = 0; i < count; i++) {
        bool last = i == count - 1;
        size_t more = last ? 0 : strlen(", ...");
        size_t need = strlen(items[i]) + strlen(conjunction) + 2 + more;
        if (t->length + need >= t->capacity) {
            text_add(t, i > 0 ? ", ..." : "...");
            t->cut = true;
            return;
        }
        if (i > 0 && last)
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
    char meant[WORD_LIST_TEXT_MAX];
    const char *near[WORD_MAX];
    struct text t = text_over(all, sizeof all);
    struct text m = text_over(meant, sizeof meant);
    int count = words_holding(words, word + strspn(word, " "), near);
    /* Roman numbers a letter apart are other numbers: none is proposed. */
    if (count == 0 && option->words != WORDS_COORDINATION) {
        near[0] = word_nearest(word, words->items, words->count);
        count = near[0] != NULL;
    }
    words_join(&t, words->items, words->count, "or");
    words_join(&m, near, count, "or");
    char shown[WORD_SHOWN_MAX];
    struct text w = text_over(shown, sizeof shown);
    text_add(&w, word[0] ? word : "an empty word");
    const char *rest = w.cut ? "..." : "";
    if (count > 0 && (t.cut || t.length + m.length > WORD_LIST_TEXT_MAX - 50))
        return status_fail(st, STATUS_USAGE,
                           "--%s %s%s: not accepted; did you mean %s?",
                           option->name, shown, rest, meant);
    if (count > 0)
        return status_fail(st, STATUS_USAGE,
                           "--%s %s%s: not accepted; did you mean %s? "
                           "(expected %s)",
                           option->name, shown, rest, meant, all);
    return status_fail(st, STATUS_USAGE, "--%s %s%s: not accepted; expected %s",
                       option->name, shown, rest, all);
}
