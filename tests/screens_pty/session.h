/* SPDX-License-Identifier: MIT */
/* The program itself on a pseudo-terminal, in a folder of its own. */
#ifndef SCREENS_PTY_SESSION_H
#define SCREENS_PTY_SESSION_H

#include <check.h>
#include <stddef.h>

#include "support/pty.h"

/* Path of the program; set by main. */
extern const char *outershell;

/* Fixtures of every test: a fresh folder with nothing remembered, and its
 * removal. */
void session_make_folder(void);
void session_remove_folder(void);

/* The folder, and a path in it (valid until the next call). */
const char *session_folder(void);
const char *session_path(const char *name);

/* Starts the program there. arguments and env: NULL at the end, or NULL. */
struct pty *session_start(int rows, int columns, const char *const *arguments,
                          const char *const *env);

/* The same at 24x80 without options, when the map stands. */
struct pty *session_map(void);

/* Everything in the terminal is as before the start. */
void session_restored(struct pty *p);

/* `q` ends it with status 0 and the terminal as found; frees p. */
void session_quit(struct pty *p);

/* The whole file; the caller frees it. Aborts the test when it is not there. */
char *session_read(const char *name, size_t *size);
void session_write(const char *name, const char *text);
/* Files in the folder, other than what is remembered. */
int session_file_count(void);

/* The command that the message of an export names. */
void session_named_command(struct pty *p, char *out, size_t size);

/* What a command prints when it is run in the folder with the program on the
 * path; the caller frees it. */
char *session_output(const char *command, size_t *size);

/* Test cases, one file each. */
TCase *case_shapes(void);
TCase *case_ends(void);
TCase *case_views(void);
TCase *case_exports(void);

#define COUNT(array) (int)(sizeof(array) / sizeof(array)[0])

#endif
