/* SPDX-License-Identifier: MIT */
/* Calls: any words are either understood or refused with one clean sentence.
 * One call per line, words parted by blanks; nothing is carried out. */
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "cli/request.h"
#include "fuzz/target.h"

#define WORDS_MAX 64

static void require(bool held)
{
    if (!held)
        abort();
}

/* A request reads standard input and data files; these stay away. */
static bool reads_nothing(const struct call *call)
{
    for (int i = 0; i < call->operand_count; i++)
        if (strcmp(call->operands[i], "-") == 0)
            return false;
    return call_value(call, &option_data) == NULL;
}

static void check_atoms(const struct request *r)
{
    for (int i = 0; i < r->atom_count; i++) {
        struct species species;
        struct status st = status_ok();
        struct ask ask = request_ask(r, i, QUANTITY_ZEFF, NULL);
        require(study_species(r->study, &ask, &species, &st));
        require(species.z == r->atoms[i].z);
    }
}

static void check_call(int argc, char *const *argv)
{
    struct call *call = malloc(sizeof *call);
    struct request *request = malloc(sizeof *request);
    struct status st = status_ok();
    require(call && request);
    bool ok = call_parse(argc, argv, call, &st);
    if (ok && !call->help && !call->version && reads_nothing(call)) {
        ok = request_open(request, call, &st);
        if (ok)
            check_atoms(request);
        request_close(request);
    }
    require(ok || (st.code == STATUS_USAGE && st.message[0] != '\0'));
    require(ok || strlen(st.message) < STATUS_MESSAGE_MAX);
    free(request);
    free(call);
}

int LLVMFuzzerTestOneInput(const uint8_t *data, size_t size)
{
    static char name[] = "outershell";
    char *text = malloc(size + 1);
    if (!text)
        return 0;
    if (size > 0)
        memcpy(text, data, size);
    text[size] = '\0';
    for (char *p = text; p < text + size; p++) {
        char *argv[WORDS_MAX + 1] = {name};
        int argc = 1;
        char *end = p + strcspn(p, "\n");
        *end = '\0';
        while (p < end) {
            p += strspn(p, " \t");
            if (*p && argc < WORDS_MAX)
                argv[argc++] = p;
            p += strcspn(p, " \t");
            *p = '\0';
            p += p < end;
        }
        check_call(argc, argv);
        p = end;
    }
    free(text);
    return 0;
}
