/* SPDX-License-Identifier: MIT */
/* Solves single-zeta atoms and nothing else, to have its instructions counted:
 *
 *     zeta_count SPECIES.csv
 *     zeta_count Z CONFIGURATION
 *
 * solves the neutral atoms up to Lr of a list (columns z, charge,
 * configuration), or one atom, and prints how many ended in which state. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "base/text.h"
#include "zeta/zeta.h"

#define Z_LAST 103

static bool solve(struct zeta *work, int z, const char *text,
                  int count[ZETA_STATE_COUNT], struct status *st)
{
    struct configuration configuration;
    if (!configuration_parse(text, &configuration, st))
        return false;
    struct zeta_problem problem = {z, &configuration, ZETA_HUND, NULL};
    struct zeta_result result;
    if (zeta_begin(work, &problem))
        while (zeta_step(work))
            ;
    zeta_read(work, &result);
    count[result.state]++;
    return true;
}

/* One row of the list; rows of ions and the heading are passed over. */
static bool solve_row(struct zeta *work, char *row, int count[],
                      struct status *st)
{
    char *charge = strchr(row, ',');
    char *text = charge ? strchr(charge + 1, ',') : NULL;
    char *end = text ? strchr(text + 1, ',') : NULL;
    int z;
    if (!end)
        return true;
    *charge = *text = *end = '\0';
    if (!text_to_int(row, &z) || z > Z_LAST || strcmp(charge + 1, "0") != 0)
        return true;
    return solve(work, z, text + 1, count, st);
}

static bool solve_list(struct zeta *work, const char *path, int count[],
                       struct status *st)
{
    char *data = NULL;
    size_t size;
    if (!file_read(path, 1 << 20, &data, &size, st))
        return false;
    bool ok = true;
    for (char *row = data; ok && row && *row;) {
        char *next = strchr(row, '\n');
        if (next)
            *next++ = '\0';
        ok = solve_row(work, row, count, st);
        row = next;
    }
    free(data);
    return ok;
}

int main(int argc, char **argv)
{
    struct status st = status_ok();
    int count[ZETA_STATE_COUNT] = {0}, z = 0;
    if (argc < 2 || (argc > 2 && (!text_to_int(argv[1], &z) || z < 1))) {
        fprintf(stderr, "usage: zeta_count SPECIES.csv | Z CONFIGURATION\n");
        return EXIT_FAILURE;
    }
    struct zeta *work = zeta_new(&st);
    bool ok = work && (argc > 2 ? solve(work, z, argv[2], count, &st)
                                : solve_list(work, argv[1], count, &st));
    zeta_free(work);
    if (!ok)
        fprintf(stderr, "zeta_count: %s\n", st.message);
    for (int i = 0; i < ZETA_STATE_COUNT; i++)
        if (count[i] > 0)
            printf("%4d %s\n", count[i], zeta_state_text((enum zeta_state)i));
    return ok ? EXIT_SUCCESS : EXIT_FAILURE;
}
