/* SPDX-License-Identifier: MIT */
/* The common keys, lists and lines: what they change is in the session. */
#ifndef SESSION_COMMON_H
#define SESSION_COMMON_H

#include "session/screen.h"

/* What the help says of keys that some screens do in their own way. */
#define SESSION_SITE_HELP                                                      \
    "choose coordination and spin of the ion, for sets of ionic radii"
#define SESSION_UNIT_HELP "choose the unit of the quantity"
#define SESSION_DETAILS_HELP                                                   \
    "grid or pane, table or plots, where only one fits; goes on solving"

/* Rows for every screen, and for those that take their group. */
extern const struct key_row session_common_keys[];
extern const int session_common_key_count;

extern const struct chooser_ops session_choose_quantity;
extern const struct chooser_ops session_choose_model;
extern const struct chooser_ops session_choose_reference;
extern const struct chooser_ops session_choose_against;
extern const struct chooser_ops session_choose_subshell;
extern const struct chooser_ops session_choose_unit;

/* Coordination and spin: of the selected ion, where a set of ionic radii takes
 * the place of one that knows no sites; of the pinned ions, whatever the set.
 */
extern const struct chooser_ops session_choose_site;
extern const struct chooser_ops session_choose_compared_site;

extern const struct prompt_ops session_prompt_jump;
extern const struct prompt_ops session_prompt_configuration;

#endif
