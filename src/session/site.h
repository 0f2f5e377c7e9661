/* SPDX-License-Identifier: MIT */
/* The site of an ion beside what is stored for it. */
#ifndef SESSION_SITE_H
#define SESSION_SITE_H

#include "session/session.h"

/* Behind the id of a set: the site asked of it, " at VI", where it tells sites
 * apart. */
void session_asked_site(const struct session *s, const struct provenance *set,
                        struct text *t);

/* Writes the site of a stored value, "VI, high spin"; nothing where its set
 * tells none apart or holds no value. */
void session_stored_site(const struct reading *stored, struct text *t);

#endif
