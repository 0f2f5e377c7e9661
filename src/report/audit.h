/* SPDX-License-Identifier: MIT */
/* The report of `audit`, and of the screen Audit. */
#ifndef REPORT_AUDIT_H
#define REPORT_AUDIT_H

#include "analysis/audit.h"
#include "report/report.h"

/* Fills the parts (bits of enum report_part) of an empty report from an audit,
 * which must outlive it; scopes as in audit_parts. Records: one per series and
 * part. Blocks: the same as a table, then which model is best where. */
void report_audit(struct report *report, unsigned parts,
                  const struct audit *audit, unsigned scopes);

#endif
