/* SPDX-License-Identifier: MIT */
/* What a remembered view keeps of the session: lines `key value`. */
#ifndef SESSION_VIEW_H
#define SESSION_VIEW_H

#include "session/session.h"

void session_save(const struct session *s, struct text *t);

/* Takes one line. False when the key is not the session's; what is impossible
 * is passed over. */
bool session_load(struct session *s, const char *key, const char *value);

/* After the last line: puts right what only the whole view can tell, since
 * lines may come in any order. */
void session_settle(struct session *s);

#endif
