/* SPDX-License-Identifier: MIT */
/* What leaves the screens: the same bytes as the command that the message
 * names, never over something else, never half. */
#include <signal.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>
#include <sys/wait.h>
#include <unistd.h>

#include "screens_pty/session.h"

/* Keys up to the field with the file's name, and what must show before each
 * next part; parts are parted by '|', and `<` ends a part with what to await.
 */
static const struct {
    const char *keys[8];   /* typed in turn */
    const char *expect[8]; /* awaited after each */
    const char *file;
} exports[] = {
    {{"e", "\r"}, {"─ Export ─", "write CSV"}, "Fe-zeff.csv"},
    /* an ion in another unit against a chosen set */
    {{
         "w",
         "r\r",
         "Lu\r",
         "+++",
         "u",
         "a\r",
         "r",
         "i\r",
     },
     {"─ Quantity ─", "radius, pm", "lutetium", "Lu3+", "─ Unit ─",
      "radius, angstrom", "─ Reference ─", "reference i"},
     "Lu3+-radius.csv"},
    /* what is pinned */
    {{"Y\r", "p", "Sc\r", "+++", "p", "e", "j\r"},
     {"yttrium", "Y pinned", "scandium", "Sc3+", "Sc3+ pinned", "─ Export ─",
      "write CSV"},
     "pinned-zeff.csv"},
    /* the sheet of a closed model, and of one solved as one looks */
    {{"e", "j\r"}, {"─ Export ─", "write CSV"}, "slater-zeff.csv"},
    {{"b", "ss\r", "e", "j\r"},
     {"─ Model ─", "e   scf", "─ Export ─", "write CSV"},
     "scf-zeff.csv"},
    /* the screens with exports of their own */
    {{"Y\r", "p", "Lu\r", "p", "c", "e"},
     {"yttrium", "Y pinned", "lutetium", "Lu pinned", "4f14", "write CSV"},
     "compare.csv"},
    {{"t", "e"}, {"along the period", "write CSV"}, "trend-zeff.csv"},
    {{"t", "b\r", "j\rj\rj\rj\r", "q", "e"},
     {"along the period", "[ ] shells", "[ ] scf", "no residual along",
      "write CSV"},
     "trend-zeff.csv"},
    {{"d", "e"}, {"Audit", "write CSV"}, "audit-zeff.csv"},
};

static void same_as_the_command(struct pty *p, const char *file)
{
    char command[512];
    size_t size;
    size_t named_size;
    session_named_command(p, command, sizeof command);
    char *written = session_read(file, &size);
    char *named = session_output(command, &named_size);
    ck_assert_msg(size == named_size && memcmp(written, named, size) == 0,
                  "%s differs from: %s (%zu and %zu bytes)", file, command,
                  size, named_size);
    ck_assert_uint_gt(size, 200);
    free(written);
    free(named);
}

START_TEST(an_export_holds_what_the_named_command_prints)
{
    struct pty *p =
        session_start(_i % 2 ? 24 : 60, _i % 2 ? 80 : 200, NULL, NULL);
    pty_expect(p, "? keys");
    for (int i = 0; i < 8 && exports[_i].keys[i]; i++) {
        pty_type(p, exports[_i].keys[i]);
        pty_expect(p, exports[_i].expect[i]);
    }
    if (!pty_shows(p, "write CSV")) {
        pty_type(p, "e");
        pty_expect(p, "─ Export ─");
        pty_type(p, "\r");
    }
    pty_expect(p, exports[_i].file);
    pty_type(p, "\r");
    same_as_the_command(p, exports[_i].file);
    session_quit(p);
    ck_assert_int_eq(session_file_count(), 1);
}
END_TEST

/* Electrons and data of the user's own are part of the command. */
START_TEST(an_export_of_own_electrons_names_them)
{
    struct pty *p = session_map();
    pty_type(p, ":");
    pty_expect(p, "configuration (none: ground state): ");
    for (int i = 0; i < 40; i++)
        pty_type(p, "\177");
    pty_type(p, "[Ar] 3d7 4s1\r");
    pty_expect(p, "configuration as given");
    pty_type(p, "e\r");
    pty_expect(p, "write CSV to: Fe-zeff.csv");
    pty_type(p, "\r");
    same_as_the_command(p, "Fe-zeff.csv");
    session_quit(p);
}
END_TEST

/* One species of several has electrons of its own: no command prints that, and
 * the message says so. */
START_TEST(an_export_without_a_command_names_none)
{
    struct pty *p = session_map();
    pty_type(p, "Y\rp");
    pty_expect(p, "Y pinned");
    pty_type(p, "Fe\rp");
    pty_expect(p, "Fe pinned; 2 pinned");
    pty_type(p, ":");
    pty_expect(p, "configuration (none: ground state): ");
    for (int i = 0; i < 40; i++)
        pty_type(p, "\177");
    pty_type(p, "[Ar] 3d7 4s1\r");
    pty_expect(p, "configuration as given");
    pty_type(p, "c");
    pty_expect(p, "[Ar] 3d7 4s1");
    pty_type(p, "e");
    pty_expect(p, "write CSV to: compare.csv");
    pty_type(p, "\r");
    pty_expect(p, "compare.csv written; no one command prints the same");
    session_quit(p);
}
END_TEST

/* What is not solved yet is waited for, and can be given up. */
START_TEST(an_export_that_waits_can_be_given_up)
{
    struct pty *p = session_map();
    pty_type(p, "d");
    pty_expect(p, "solving ");
    pty_type(p, "e");
    pty_expect(p, "write CSV to: audit-zeff.csv");
    pty_type(p, "\r");
    pty_expect(p, "for audit-zeff.csv; any key gives it up");
    ck_assert_int_eq(session_file_count(), 0);
    pty_type(p, _i ? "\003" : "x");
    pty_expect(p, "audit-zeff.csv: nothing written");
    session_quit(p);
    ck_assert_int_eq(session_file_count(), 0);
}
END_TEST

static const char own_data[] =
    "{\"format\": 1, \"id\": \"own_radii\", \"title\": \"Own radii\",\n"
    " \"kind\": \"values\", \"quantity\": \"radius\", \"unit\": \"pm\",\n"
    " \"definition\": \"covalent radius\",\n"
    " \"citations\": [{\"key\": \"own\", \"type\": \"misc\", \"authors\":\n"
    "   [\"A. Nobody\"], \"title\": \"Invented\", \"year\": 2026}],\n"
    " \"entries\": [{\"element\": \"Fe\", \"value\": \"125.5\"}]}\n";

START_TEST(an_export_over_own_data_names_the_file)
{
    session_write("own.json", own_data);
    const char *arguments[] = {"--data", "own.json", NULL};
    struct pty *p = session_start(24, 80, arguments, NULL);
    pty_expect(p, "? keys");
    pty_type(p, "w");
    pty_expect(p, "─ Quantity ─");
    pty_type(p, "r\rr");
    pty_expect(p, "─ Reference ─");
    pty_type(p, "o\r");
    pty_expect(p, "reference own_radii");
    pty_type(p, "e\r");
    pty_expect(p, "write CSV to: Fe-radius.csv");
    pty_type(p, "\r");
    same_as_the_command(p, "Fe-radius.csv");
    session_quit(p);
}
END_TEST

static void ask_to_write(struct pty *p, const char *file)
{
    pty_type(p, "e\r");
    pty_expect(p, "write CSV to: Fe-zeff.csv");
    for (int i = 0; i < 11; i++)
        pty_type(p, "\177");
    pty_type(p, file);
    pty_expect(p, file);
    pty_type(p, "\r");
}

static void holds(const char *file, const char *text)
{
    size_t size;
    char *now = session_read(file, &size);
    ck_assert_str_eq(now, text);
    free(now);
}

START_TEST(nothing_is_overwritten_unasked)
{
    session_write("mine.csv", "mine\n");
    struct pty *p = session_map();
    ask_to_write(p, "mine.csv");
    pty_expect(p, "mine.csv exists; overwrite it? y/n");
    holds("mine.csv", "mine\n");
    pty_type(p, "n");
    pty_expect(p, "mine.csv left as it was");
    holds("mine.csv", "mine\n");
    ask_to_write(p, "mine.csv");
    pty_expect(p, "mine.csv exists; overwrite it? y/n");
    pty_type(p, "\r"); /* only y says yes */
    pty_expect(p, "mine.csv left as it was");
    holds("mine.csv", "mine\n");
    ask_to_write(p, "mine.csv");
    pty_expect(p, "mine.csv exists; overwrite it? y/n");
    pty_type(p, "y");
    same_as_the_command(p, "mine.csv");
    session_quit(p);
    ck_assert_int_eq(session_file_count(), 1);
}
END_TEST

/* Places where nothing can be written, and what is said. */
static const struct {
    const char *file, *says;
} refused[] = {
    {"missing/x.csv", "missing/x.csv: cannot create: No such file"},
    {"plain/x.csv", "plain/x.csv: cannot create: Not a directory"},
    {"/proc/x.csv", "/proc/x.csv: cannot create: "},
    {"/dev/full", "/dev/full: is no regular file; not overwritten"},
    {"folder", "folder: is a folder, not a file"},
};

START_TEST(a_place_that_cannot_be_written_is_told_and_loses_nothing)
{
    session_write("plain", "plain\n");
    ck_assert_int_eq(mkdir(session_path("folder"), 0700), 0);
    struct pty *p = session_map();
    pty_type(p, "p");
    pty_expect(p, "Fe pinned");
    ask_to_write(p, refused[_i].file);
    if (_i >= 3) {
        pty_expect(p, "exists; overwrite it? y/n");
        pty_type(p, "y");
    }
    pty_expect(p, "nothing written: ");
    pty_expect(p, refused[_i].says);
    holds("plain", "plain\n");
    ask_to_write(p, "good.csv"); /* and it goes on */
    same_as_the_command(p, "good.csv");
    session_quit(p);
    ck_assert_int_eq(session_file_count(), 3);
}
END_TEST

START_TEST(a_folder_without_permission_is_told)
{
    if (geteuid() == 0)
        return; /* root may write everywhere: /proc stands for it above */
    ck_assert_int_eq(mkdir(session_path("locked"), 0500), 0);
    struct pty *p = session_map();
    ask_to_write(p, "locked/x.csv");
    pty_expect(p, "locked/x.csv: cannot create: Permission denied");
    session_quit(p);
}
END_TEST

/* Files may not grow: what a full disk does to every write. */
static struct pty *start_without_space(void)
{
    static char command[512];
    char home[96];
    char state[96];
    snprintf(command, sizeof command, "trap '' XFSZ; ulimit -f 0; exec '%s'",
             outershell);
    snprintf(home, sizeof home, "HOME=%s", session_folder());
    snprintf(state, sizeof state, "XDG_STATE_HOME=%s/state", session_folder());
    const char *argv[] = {"/bin/sh", "-c", command, NULL};
    const char *env[] = {home, state, NULL};
    struct pty_options options = {.argv = argv,
                                  .rows = 24,
                                  .columns = 80,
                                  .env = env,
                                  .directory = session_folder()};
    struct pty *p = pty_start(&options);
    pty_expect(p, "? keys");
    return p;
}

START_TEST(a_full_disk_leaves_files_and_view_as_they_were)
{
    size_t size;
    struct pty *p = session_map();
    pty_type(p, "Lu\r");
    pty_expect(p, "Lu  71  lutetium");
    session_quit(p);
    session_write("Y-zeff.csv", "mine\n");
    p = start_without_space();
    pty_expect(p, "Lu  71  lutetium");
    pty_type(p, "Y\r");
    pty_expect(p, "Y  39  yttrium");
    pty_type(p, "e\r");
    pty_expect(p, "write CSV to: Y-zeff.csv");
    pty_type(p, "\r");
    pty_expect(p, "exists; overwrite it? y/n");
    pty_type(p, "y");
    pty_expect(p, "nothing written: Y-zeff.csv: cannot write: ");
    holds("Y-zeff.csv", "mine\n");
    pty_type(p, "q");
    int status = pty_end(p);
    ck_assert(WIFEXITED(status) && WEXITSTATUS(status) == 1);
    session_restored(p);
    pty_free(p);
    ck_assert_int_eq(session_file_count(), 1);
    char *view = session_read("state/outershell/view", &size);
    ck_assert_ptr_nonnull(strstr(view, "element Lu\n"));
    free(view);
}
END_TEST

TCase *case_exports(void)
{
    TCase *tc = tcase_create("exports");
    tcase_add_loop_test(tc, an_export_holds_what_the_named_command_prints, 0,
                        COUNT(exports));
    tcase_add_test(tc, an_export_of_own_electrons_names_them);
    tcase_add_test(tc, an_export_without_a_command_names_none);
    tcase_add_loop_test(tc, an_export_that_waits_can_be_given_up, 0, 2);
    tcase_add_test(tc, an_export_over_own_data_names_the_file);
    tcase_add_test(tc, nothing_is_overwritten_unasked);
    tcase_add_loop_test(
        tc, a_place_that_cannot_be_written_is_told_and_loses_nothing, 0,
        COUNT(refused));
    tcase_add_test(tc, a_folder_without_permission_is_told);
    tcase_add_test(tc, a_full_disk_leaves_files_and_view_as_they_were);
    return tc;
}
