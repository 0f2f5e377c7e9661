/* SPDX-License-Identifier: MIT */
/* Mark and role of a model, the same on every screen; marks of stored values.
 */
#ifndef SCREENS_TREND_MARKS_H
#define SCREENS_TREND_MARKS_H

#include <stdint.h>

#include "canvas/role.h"
#include "element/evidence.h"
#include "model/registry.h"

#define MARK_STORED 0x25CB     /* circle */
#define MARK_UNMEASURED 0x25C7 /* diamond: extrapolated, theoretical … */
#define MARK_SECOND 0x25A1     /* square: the second reference */

uint32_t screen_trend_mark(const struct model *model);
enum role screen_trend_role(const struct model *model);

/* Whether a stored value of this kind was not measured. */
bool screen_trend_unmeasured(enum evidence evidence);

#endif
