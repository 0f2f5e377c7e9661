/* SPDX-License-Identifier: MIT */
/* Reference values as every row sees them: stored sets, and quantities that
 * follow from a stored one by definition. */
#ifndef STUDY_REFERENCE_H
#define STUDY_REFERENCE_H

#include "base/text.h"
#include "element/derivation.h"
#include "element/reading.h"
#include "element/species.h"
#include "refdata/catalogue.h"
#include "study/absence.h"

/* Z_eff = n sqrt(I/Ry), of the subshell that loses the electron: the one that
 * holds fewer in the stored configuration of the ion than in that of the
 * atom. */
#define REFERENCE_ZEFF_FROM_IONIZATION CATALOGUE_ZEFF_FROM_IONIZATION

#define REFERENCE_MAX 128

/* One reference for one quantity. set: the stored set it is; for a quantity
 * that follows from others (derivation, else NULL) the built-in set of its
 * first input, while firsts[quantity] has those of all. Sets that the user adds
 * have no such companions: what is cited for one id never depends on what else
 * was loaded. rank: order among the references of its quantity, 1 first; sets
 * that the user added stand behind the built-in ones, whatever rank they claim.
 * outermost_only: it says nothing of inner subshells. absences: where reasons
 * for gaps are kept that name the nearest stored sites; NULL for none. */
struct reference {
    const struct provenance *provenance;
    enum quantity_id quantity;
    const struct dataset *set;
    int rank;
    const struct derivation *derivation;
    const struct dataset *const *firsts;
    bool outermost_only;
    struct absence_list *absences;
};

/* All references of a catalogue, sorted by quantity, then rank, then their
 * order there. */
#define DERIVED_CITATIONS_MAX 64
struct reference_list {
    int count;
    struct reference items[REFERENCE_MAX];
    /* The first built-in set of each quantity, or NULL. Items point here, so a
     * list is not copied. */
    const struct dataset *firsts[QUANTITY_COUNT];
    /* By place in derivation_list: cites the formula, then the sets that it
     * works on. */
    struct derived_source {
        struct provenance provenance;
        struct citation citations[DERIVED_CITATIONS_MAX];
    } derived[DERIVATION_MAX];
};

/* absences: see struct reference; borrowed, may be NULL. */
void reference_list_fill(struct reference_list *list,
                         const struct catalogue *catalogue,
                         struct absence_list *absences);

/* By the id of its data set (or of the derived one); NULL when none. */
const struct reference *reference_find(const struct reference_list *list,
                                       const char *id);

/* The reference that a row takes when none was chosen: the first set with the
 * model's own definition (NULL: none) that holds a value for the species at its
 * site; for an ion else the first that was found for ions; else the first with
 * that definition, else the first of the quantity that covers such a subshell.
 * NULL when the quantity has none. n, l as in reference_read; inner: the
 * subshell asked about is neither the outermost nor the one that loses the
 * electron. */
const struct reference *
reference_default(const struct reference_list *list, enum quantity_id quantity,
                  const struct species *species, int n, int l,
                  const struct definition *definition, bool inner);

/* True when the set tells sites apart. */
bool reference_has_sites(const struct reference *reference);

/* Writes the site that is asked of a set, whatever the ion: "VI", and the spin
 * where one was chosen; nothing when it knows none. */
void reference_asked_site(const struct reference *reference, struct site site,
                          struct text *t);

/* The subshell that loses the electron between the ground configurations of a
 * species and of its ion, in species->configuration; NULL when it is none or
 * not one alone. */
const struct subshell *reference_emptied(const struct species *species);

/* Its value for a species, in base units; n = 0 asks for the outermost
 * subshell or for a quantity without subshells. A set that tells sites apart is
 * read at the species' own; no other site is ever put in its place. Always a
 * reading; a gap says why. */
struct reading reference_read(const struct reference *reference,
                              const struct species *species, int n, int l);

#endif
