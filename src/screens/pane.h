/* SPDX-License-Identifier: MIT */
/* The pane of the selected element: each model's value, the reference, the
 * residual. */
#ifndef SCREENS_PANE_H
#define SCREENS_PANE_H

#include "analysis/audit.h"
#include "canvas/area.h"
#include "canvas/canvas.h"
#include "session/session.h"

/* usual: the audit of the chosen model over all elements at the chosen charge;
 * how large residuals usually are is told from it. */
void screen_pane_draw(const struct session *session, const struct audit *usual,
                      struct canvas *canvas, struct area area);

#endif
