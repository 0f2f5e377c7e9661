/* SPDX-License-Identifier: MIT */
/* The trend: a quantity along a walk, every chosen model a curve against the
 * stored values, the residual below. Stands alone or beside the map. */
#ifndef SCREENS_TREND_H
#define SCREENS_TREND_H

#include "screens/parts.h"

/* Brings ui->trend up to date with the choice. */
void trend_refresh(struct ui *ui);

/* Models that have a curve, in the order of the registry. */
int trend_models(const struct ui *ui, const struct model *models[]);

/* Whether the map shows the trend beside itself now. */
bool trend_on_map(const struct ui *ui);

/* Draws everything into an area. */
void draw_trend(struct ui *ui, struct canvas *canvas, struct area area);

/* The numbers at the selected step: beside the plots, or below them in few
 * rows. */
void draw_trend_table(const struct ui *ui, struct canvas *canvas,
                      struct area area, int at);
void draw_trend_lines(const struct ui *ui, struct canvas *canvas,
                      struct area area, int at);

/* Mark and role of a model, the same on every screen; marks of stored values.
 */
#define MARK_STORED 0x25CB     /* circle */
#define MARK_UNMEASURED 0x25C7 /* diamond: extrapolated, theoretical … */
#define MARK_SECOND 0x25A1     /* square: the second reference */
uint32_t trend_mark(const struct model *model);
enum role trend_role(const struct model *model);

/* Whether a stored value of this kind was not measured. */
bool trend_unmeasured(enum evidence evidence);

#endif
