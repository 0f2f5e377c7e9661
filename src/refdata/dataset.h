/* SPDX-License-Identifier: MIT */
/* Stored reference values: what a data set holds once it has been checked. A
 * data set is const and borrowed; those built in live as long as the program,
 * those of the user as long as their catalogue. */
#ifndef REFDATA_DATASET_H
#define REFDATA_DATASET_H

#include <stdbool.h>
#include <stddef.h>
#include <stdint.h>

#include "base/number.h"
#include "base/units.h"
#include "element/element.h"
#include "element/evidence.h"
#include "element/provenance.h"
#include "element/quantity.h"
#include "element/reading.h"
#include "element/site.h"

/* Which of the arrays a data set fills; its id in the file. */
#define DATASET_KIND_LIST(X)                                                   \
    X(DATASET_VALUES, "values")                                                \
    X(DATASET_ELEMENTS, "elements")                                            \
    X(DATASET_CONFIGURATIONS, "configurations")                                \
    X(DATASET_OXIDATION_STATES, "oxidation_states")                            \
    X(DATASET_AVAILABILITY, "availability")

/* Why an entry has no value; its id in the file, its words. */
#define GAP_LIST(X)                                                            \
    X(GAP_NONE, "", "")                                                        \
    X(GAP_UNBOUND, "unbound", "no stable negative ion")                        \
    X(GAP_CALCULATED, "calculated_only", "only calculated values")             \
    X(GAP_PROVISIONAL, "provisional", "only a provisional value")              \
    X(GAP_NO_DATA, "no_data", "no data")                                       \
    X(GAP_WITHHELD, "withheld", "left out: sources disagree")

/* What is known of a stored configuration. */
#define CONFIGURATION_STATUS_LIST(X)                                           \
    X(CONFIGURATION_LISTED, "listed", "listed by the source")                  \
    X(CONFIGURATION_PREDICTED, "predicted", "predicted")

/* Whether an element is radioactive as it is handled. */
#define RADIOACTIVE_LIST(X)                                                    \
    X(RADIOACTIVE_NO, "no", "has a stable isotope")                            \
    X(RADIOACTIVE_PRACTICALLY_STABLE, "practically_stable",                    \
      "practically stable")                                                    \
    X(RADIOACTIVE_YES, "yes", "no stable isotope")

#define WORD_ENUM3(name, id, words) name,
#define WORD_ENUM2(name, id) name,
enum dataset_kind { DATASET_KIND_LIST(WORD_ENUM2) DATASET_KIND_COUNT };
enum gap { GAP_LIST(WORD_ENUM3) GAP_COUNT };
enum configuration_status {
    CONFIGURATION_STATUS_LIST(WORD_ENUM3) CONFIGURATION_STATUS_COUNT
};
enum radioactive { RADIOACTIVE_LIST(WORD_ENUM3) RADIOACTIVE_COUNT };
#undef WORD_ENUM2
#undef WORD_ENUM3

/* Ids as in the file, and words for a screen; never NULL. */
const char *dataset_kind_id(enum dataset_kind kind);
const char *gap_id(enum gap gap);
const char *gap_word(enum gap gap);
const char *dataset_configuration_status_id(enum configuration_status status);
const char *radioactive_id(enum radioactive radioactive);
const char *radioactive_word(enum radioactive radioactive);

/* Texts of entries are offsets into the data set's `strings`, so that the
 * built-in tables need no relocation at start; dataset_text reads them. Offset
 * 0 is "". */
typedef uint32_t text_offset;

/* One value, or the reason why there is none (gap other than GAP_NONE; then
 * note is not empty and value is meaningless). Of the entries that share z,
 * charge, n, l and coordination exactly one is preferred; the others are
 * variants of it. For an ionization energy charge is that of the species
 * which loses the electron. */
struct entry {
    struct number value; /* in the data set's unit, digits as printed */
    struct number u;     /* meaningless unless has_u */
    text_offset variant; /* "sp3", "valence 5" */
    text_offset note;
    text_offset remark; /* variant, spin, coordination, evidence where it is
                           not the set's own, marks and note in one line */
    uint16_t marks;     /* bit i: the data set's marks[i] */
    int16_t z;
    int8_t charge;
    int8_t n, l; /* n = 0: of no subshell */
    uint8_t coordination;
    uint8_t spin;
    uint8_t evidence;
    uint8_t gap;
    uint8_t source; /* its citation, 1 for the set's first; 0: all of them */
    bool has_u;
    bool preferred;
};

/* Ground configuration of an ion. */
struct configuration_entry {
    text_offset configuration; /* shorthand, checked: holds z - charge */
    text_offset shells;        /* the same, for configuration_unpack */
    text_offset term;          /* "" when unknown */
    text_offset note;
    int16_t z;
    int8_t charge;
    uint8_t status;
    bool irregular; /* not the next lower charge without one electron of its
                       outermost subshell */
};

/* What is stored of a neutral element. */
struct element_facts {
    struct number weight; /* standard atomic weight, abridged, as printed */
    text_offset configuration;
    text_offset shells; /* the same, for configuration_unpack */
    text_offset term;
    text_offset category; /* "transition metal" */
    text_offset note;
    int16_t z;
    int16_t longest_lived; /* mass number; 0 where none is given */
    uint8_t status;
    bool has_weight;
    bool has_stable_isotope;
};

struct oxidation_state {
    int16_t z;
    int8_t state;
    bool main; /* one of the most common */
};

/* Abundances in mg/kg; the lists are joined by "; ", "" for none. */
struct availability {
    struct number abundance;      /* crust */
    struct number abundance_2014; /* bulk continental crust, trace elements */
    text_offset hazards;
    text_offset hazard_basis;
    text_offset critical; /* lists of critical materials that name it */
    int16_t z;
    uint8_t radioactive;
    bool has_abundance;
    bool has_abundance_2014;
};

/* A letter or word that a source puts beside a value, and what it means. */
struct mark {
    const char *id;
    const char *meaning;
};
#define MARK_MAX 16

/* Entries are in order of z, charge, n, l, coordination, the preferred one
 * first; those of element z are first[z] … first[z + 1] - 1. Fields that do
 * not apply to the kind are NULL or 0. */
struct dataset {
    struct provenance provenance; /* id, title, definition, citations */
    enum dataset_kind kind;
    const char *licence;
    const char *const *notes; /* notes[note_count], one sentence each */
    int note_count;
    const char *absent; /* why an element without an entry has none */

    /* values only */
    enum quantity_id quantity;
    const struct unit *unit;
    enum evidence evidence; /* of the entries that do not say */
    enum coordination default_coordination;
    int rank; /* order among the references of the quantity, 1 first; 0 last */
    const struct mark *marks; /* marks[mark_count] */
    int mark_count;

    const char *strings;
    size_t strings_size;
    int count; /* entries, in the array of the kind */
    uint16_t first[Z_MAX + 2];
    const struct entry *values;
    const struct element_facts *elements;
    const struct configuration_entry *configurations;
    const struct oxidation_state *oxidation_states;
    const struct availability *availability;
};

/* The text at an offset. */
const char *dataset_text(const struct dataset *set, text_offset offset);

/* Entries that hold something: all but the gaps. */
int dataset_value_count(const struct dataset *set);

/* The preferred entry (value or gap) of a species, n = l = 0 for none; where
 * the set has coordinations, the one at its default coordination. NULL when
 * there is no entry. set is of kind DATASET_VALUES; 1 <= z <= Z_MAX. */
const struct entry *dataset_lookup(const struct dataset *set, int z, int charge,
                                   int n, int l);

/* The entry of an ion at a site. spin SPIN_NONE takes the preferred one; no
 * other coordination is ever put in its place. NULL when there is none. */
const struct entry *dataset_lookup_site(const struct dataset *set, int z,
                                        int charge,
                                        enum coordination coordination,
                                        enum spin_state spin);

/* An entry as a reading in the base unit of its own unit's dimension (for an
 * electronegativity that is the unit of its scale: 1, or eV on Mulliken's): ok
 * with value, uncertainty and remark, or missing with the reason. entry may be
 * NULL: missing, with the set's `absent` as reason. */
struct reading dataset_entry_reading(const struct dataset *set,
                                     const struct entry *entry);

/* dataset_lookup as a reading. */
struct reading dataset_reading(const struct dataset *set, int z, int charge,
                               int n, int l);

/* Row of an element in a set of kind DATASET_ELEMENTS or
 * DATASET_AVAILABILITY, of an ion in one of DATASET_CONFIGURATIONS; NULL when
 * there is none. */
const struct element_facts *dataset_element(const struct dataset *set, int z);
const struct availability *dataset_availability(const struct dataset *set,
                                                int z);
const struct configuration_entry *
dataset_configuration(const struct dataset *set, int z, int charge);

#endif
