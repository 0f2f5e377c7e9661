/* SPDX-License-Identifier: MIT */
/* Statistics of residuals as text, CSV and JSON. */
#ifndef EXPORT_AUDIT_H
#define EXPORT_AUDIT_H

#include "analysis/audit.h"
#include "export/format.h"
#include "export/table.h"

/* One record per series and part. scopes as in audit_parts. CSV and JSON carry
 * the same fields; JSON adds the definitions, the mean absolute percentage, the
 * charge of the largest one and the place among the models. Text adds which
 * model is best where. Fails with STATUS_MEMORY. */
MUST_CHECK bool audit_write(FILE *out, enum export_format format,
                            const struct audit *audit, unsigned scopes,
                            struct status *st);

/* Its text, with marks for a terminal. */
MUST_CHECK bool audit_write_text(FILE *out, const struct audit *audit,
                                 unsigned scopes,
                                 const struct table_style *style,
                                 struct status *st);

#endif
