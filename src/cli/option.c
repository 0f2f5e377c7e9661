/* SPDX-License-Identifier: MIT */
#include "cli/option.h"

#include <assert.h>
#include <string.h>

#define ON(command) (1u << (command))
#define SCREENS ON(COMMAND_SCREENS)
#define LIST ON(COMMAND_LIST)
#define COMPARE ON(COMMAND_COMPARE)
#define ATOM ON(COMMAND_ATOM)
#define AUDIT ON(COMMAND_AUDIT)
#define SOURCES ON(COMMAND_SOURCES)
#define ANY_COMMAND (LIST | COMPARE | ATOM | AUDIT | SOURCES)
#define EVERYWHERE (ANY_COMMAND | SCREENS)

/* A new option is one row here and one enumerator; a command that takes it
 * adds its bit. */
static const struct option options[OPTION_COUNT] = {
    {OPTION_QUANTITY, "quantity", 'q', "IDS", OPTION_VALUE, WORDS_QUANTITY,
     true, LIST | COMPARE | AUDIT,
     "quantities to show, parted by commas (list and audit: "
     "zeff,radius,ionization; compare: all)"},
    {OPTION_MODEL, "model", 'm', "IDS", OPTION_VALUE, WORDS_MODEL, true,
     LIST | COMPARE | AUDIT,
     "models to ask, parted by commas; none: stored values alone (default: "
     "all)"},
    {OPTION_CHARGE, "charge", 'c', "N", OPTION_VALUE, WORDS_NONE, false,
     LIST | COMPARE | ATOM | AUDIT,
     "charge of every chosen element that carries none itself, such as 2 or "
     "-1; a range such as 0..5; all: from the atom to its last electron "
     "(default: 0)"},
    {OPTION_SUBSHELL, "subshell", 's', "NL", OPTION_VALUE, WORDS_SUBSHELL,
     false, LIST | COMPARE | AUDIT,
     "subshell asked about, such as 3d (default: the outermost)"},
    {OPTION_CONFIGURATION, "configuration", 'C', "TEXT", OPTION_VALUE,
     WORDS_NONE, false, LIST | COMPARE | ATOM,
     "electron configuration in place of the ground state, such as "
     "'[Ar] 3d6 4s2'"},
    {OPTION_TERM, "term", 't', "TERM", OPTION_VALUE, WORDS_TERM, false,
     LIST | COMPARE,
     "for single-zeta: hund, the term of highest S, then highest L, or "
     "average, "
     "the average of the configuration (default: hund)"},
    {OPTION_REFERENCE, "reference", 'r', "SETS", OPTION_VALUE, WORDS_REFERENCE,
     true, LIST | COMPARE | AUDIT,
     "stored data sets to compare with, in list at most one per quantity "
     "(default: for an ion's radius the effective ionic one, else the first "
     "with the model's own definition; compare: all)"},
    {OPTION_AGAINST, "against", 0, "SETS", OPTION_VALUE, WORDS_REFERENCE, true,
     LIST | COMPARE | AUDIT,
     "a second data set beside the reference, with how far it is from it; "
     "without --model and --quantity the two sets alone"},
    {OPTION_COORDINATION, "coordination", 0, "CN", OPTION_VALUE,
     WORDS_COORDINATION, false, LIST | COMPARE | AUDIT,
     "coordination of the site, for sets of ionic radii: roman or a number, "
     "such as VI, vi or 6, with PY for pyramidal and SQ for square (default: "
     "the set's own, VI)"},
    {OPTION_SPIN, "spin", 0, "STATE", OPTION_VALUE, WORDS_SPIN, false,
     LIST | COMPARE | AUDIT,
     "low or high, the spin state of the ion, for sets of ionic radii "
     "(default: the one that the set prefers)"},
    {OPTION_EVIDENCE, "evidence", 'e', "KINDS", OPTION_VALUE, WORDS_EVIDENCE,
     true, LIST | AUDIT,
     "kinds of reference values to take, parted by commas, such as measured "
     "(default: all)"},
    {OPTION_UNIT, "unit", 'u', "UNITS", OPTION_VALUE, WORDS_UNIT, true,
     LIST | COMPARE | ATOM | AUDIT,
     "units to print in, at most one per kind of quantity (default: pm, eV; "
     "atom: pm, hartree)"},
    {OPTION_FUNCTIONAL, "functional", 0, "NAME", OPTION_VALUE, WORDS_FUNCTIONAL,
     false, ATOM,
     "exchange and correlation: lda (spins alike), lsd or pbe (spin-polarised; "
     "default: lsd)"},
    {OPTION_RELATIVITY, "relativity", 0, "NAME", OPTION_VALUE, WORDS_RELATIVITY,
     false, ATOM,
     "none for the Schrödinger equation, dirac for the Dirac equation "
     "(default: dirac)"},
    {OPTION_SPEED_OF_LIGHT, "speed-of-light", 0, "C", OPTION_VALUE, WORDS_NONE,
     false, ATOM,
     "in atomic units, for the Dirac equation (default: 137.035999177, CODATA "
     "2022)"},
    {OPTION_SORT, "sort", 0, "BY", OPTION_VALUE, WORDS_SORT, false, LIST,
     "largest first: value, or the size of residual, percent, disagreement or "
     "disagreement-percent (default: as chosen)"},
    {OPTION_SCOPE, "scope", 0, "SCOPES", OPTION_VALUE, WORDS_SCOPE, true, AUDIT,
     "parts to give figures for: all, block, period, group, charge, evidence "
     "(default: all, block, period, group; charge and evidence where there is "
     "more than one)"},
    {OPTION_DATA, "data", 'd', "FILE", OPTION_REPEAT, WORDS_FILE, false,
     EVERYWHERE,
     "add a data set of your own, in the form of outershell-data(5); may be "
     "repeated"},
    {OPTION_FORMAT, "format", 'f', "FORMAT", OPTION_VALUE, WORDS_FORMAT, false,
     ANY_COMMAND,
     "text, csv, json or bibtex, the sources alone (default: text)"},
    {OPTION_OUTPUT, "output", 'o', "FILE", OPTION_VALUE, WORDS_FILE, false,
     ANY_COMMAND,
     "write to a new file, whole or not at all (default, or with -: standard "
     "output)"},
    {OPTION_FORCE, "force", 'F', NULL, OPTION_FLAG, WORDS_NONE, false,
     ANY_COMMAND, "let --output replace a file that exists"},
    {OPTION_COLOR, "color", 0, "WHEN", OPTION_VALUE, WORDS_COLOR, false,
     EVERYWHERE,
     "auto, always or never (default: auto, on a terminal unless NO_COLOR is "
     "set)"},
    {OPTION_ASCII, "ascii", 'a', NULL, OPTION_FLAG, WORDS_NONE, false,
     EVERYWHERE, "print and draw with ASCII characters alone"},
    {OPTION_BACKGROUND, "background", 0, "KIND", OPTION_VALUE, WORDS_BACKGROUND,
     false, EVERYWHERE,
     "terminal (default): colours on the terminal's own background; light, "
     "dark, contrast: every colour set"},
    {OPTION_HELP, "help", 'h', NULL, OPTION_FLAG, WORDS_NONE, false, EVERYWHERE,
     "print help, for a command where one is named, and end"},
    {OPTION_VERSION, "version", 'V', NULL, OPTION_FLAG, WORDS_NONE, false,
     EVERYWHERE, "print version, licence and data sets, and end"},
};

const struct option *option_at(int i)
{
    assert(i >= 0 && i < OPTION_COUNT && options[i].id == (enum option_id)i);
    return &options[i];
}

const struct option *option_by_name(const char *name, size_t length)
{
    for (int i = 0; i < OPTION_COUNT; i++)
        if (strlen(options[i].name) == length &&
            memcmp(options[i].name, name, length) == 0)
            return &options[i];
    return NULL;
}

const struct option *option_by_letter(char letter)
{
    for (int i = 0; letter && i < OPTION_COUNT; i++)
        if (options[i].letter == letter)
            return &options[i];
    return NULL;
}

bool option_belongs(const struct option *option, enum command_id command)
{
    return option->commands & ON(command);
}
