/* SPDX-License-Identifier: MIT */
/* A call whose every word has been understood: what a command works from. */
#ifndef CLI_REQUEST_H
#define CLI_REQUEST_H

#include "analysis/atom_report.h"
#include "analysis/audit.h"
#include "analysis/order.h"
#include "base/status.h"
#include "base/units.h"
#include "cli/parse.h"
#include "element/configuration.h"
#include "element/selection.h"
#include "model/registry.h"
#include "refdata/ground.h"
#include "study/study.h"
#include "terminal/palette.h"
#include "write/format.h"

#define REQUEST_MODEL_MAX 16
/* Every element at every charge, from the lowest anion to the bare nucleus. */
#define REQUEST_CHARGES (Z_MAX - CHARGE_LOWEST + 1)
#define REQUEST_ATOM_MAX 8192
#define DIMENSION_COUNT (DIMENSION_VOLUME + 1)

/* A chosen atom or ion. named: chosen by itself, not as part of a run, a
 * period, a group, a block or the whole table. */
struct request_atom {
    int z;
    int charge;
    struct site site; /* none: the default of each set */
    bool named;
    short next; /* another site of the same ion: its place in atoms, plus 1 */
};

/* Charges asked for, both ends included; text: as given, NULL where none was.
 */
struct request_charges {
    const char *text;
    int low, high;
};

/* quantities and models: those asked for, or the command's default (then
 * has_… is false). references[quantity], units[dimension]: NULL where none was
 * chosen; against[quantity] likewise, the second reference. evidence: kinds of
 * reference values, 0 for all. n = 0: the outermost subshell. output: NULL for
 * standard output. site: of the chosen that carry none themselves. */
struct request {
    const struct call *call;
    struct catalogue catalogue;
    struct study *study;
    bool has_quantities, has_models, has_configuration;
    int quantity_count;
    enum quantity_id quantities[QUANTITY_COUNT];
    int model_count;
    const struct model *models[REQUEST_MODEL_MAX];
    const struct reference *references[QUANTITY_COUNT];
    const struct reference *against[QUANTITY_COUNT];
    bool has_against;
    int set_count; /* all sets named as references, in order */
    const struct reference *sets[REFERENCE_MAX];
    bool has_order;
    enum row_order order;
    unsigned scopes; /* bit 1 << audit_scope each; 0: the default ones */
    unsigned evidence;
    const struct unit *units[DIMENSION_COUNT];
    struct configuration configuration;
    int n, l;
    struct site site, site_taken; /* as given; the part that some atom took */
    struct request_charges charges;
    struct atom_method method;
    int atom_count;
    struct request_atom atoms[REQUEST_ATOM_MAX];
    short place[Z_MAX + 1][REQUEST_CHARGES]; /* of the first, plus 1 */
    const struct format *format;
    const char *output;
    bool force;
    enum color_option color; /* words in the order of the enumerators */
    bool ascii;
    enum scheme scheme;
    void *state; /* of the command's own options, owned; NULL for none */
};

/* Understands a call: loads the user's data sets, opens the study, reads every
 * option and operand. Fails with STATUS_USAGE naming option and word, with
 * what would be accepted; STATUS_FILE or STATUS_DATA for a data set;
 * STATUS_MEMORY. request_close is due either way. */
MUST_CHECK bool request_open(struct request *request, const struct call *call,
                             struct status *st);
void request_close(struct request *request);

/* Whether a quantity is among the chosen ones. */
bool request_chooses(const struct request *request, enum quantity_id quantity);

/* Whether a model offers one of the chosen quantities. */
bool request_offers(const struct request *request, const struct model *model);

/* The sets that will be read and tell sites apart, at most max; gives their
 * number. An ion's radius is read from such a set where none is named. */
int request_site_sets(const struct request *request, bool ions,
                      const struct reference **sets, int max);

/* Writes the ids of the chosen quantities. */
void request_quantities(const struct request *request, struct text *t);

/* The question about one chosen atom: quantity and model are left to set. */
struct ask request_ask(const struct request *request, int atom,
                       enum quantity_id quantity, const struct model *model);

#endif
