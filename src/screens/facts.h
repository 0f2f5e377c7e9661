/* SPDX-License-Identifier: MIT */
#ifndef SCREENS_FACTS_H
#define SCREENS_FACTS_H

#include "canvas/area.h"
#include "canvas/canvas.h"
#include "session/session.h"

/* Facts of the selected element, as far as the area has rows: name,
 * configuration, cautions first. */
void screen_facts_draw(const struct session *session, struct canvas *canvas,
                       struct area area);

#endif
