/* SPDX-License-Identifier: MIT */
#include "cli/command.h"

#include <assert.h>
#include <string.h>

#include "cli/commands.h"

#define SELECTION_ABOUT                                                        \
    "A selection is a symbol, name or atomic number (Fe, iron, 26), an ion "   \
    "that carries its charge (Fe3+, Cs+, O2-), a run by atomic number "        \
    "(Sc-Zn), period:4, group:13, block:d, block:4f, or an isoelectronic "     \
    "series (electrons:10); - reads selections from "                          \
    "standard input, one per line. What is chosen twice counts once."

/* A new command is one row here and one enumerator. */
static const struct command commands[COMMAND_COUNT] = {
    {COMMAND_SCREENS, NULL, "", 0, 0, "open the screens",
     "Without a command, on a terminal, the screens open: everything that a "
     "command prints, on one sheet to move about in.",
     "", cli_screens},
    {COMMAND_LIST, "list", "[SELECTION...]", 0, -1,
     "print values, references and residuals, one row each",
     "Prints one row per element, quantity and model that offers the "
     "quantity: the model's value, the stored reference and the residual "
     "between them. Without a selection all elements are listed. Runs, "
     "periods, groups, blocks and the whole table leave out elements that "
     "have no such charge. " SELECTION_ABOUT,
     "list Ti-Zn --quantity radius --model slater", cli_list},
    {COMMAND_COMPARE, "compare", "SELECTION...", 1, -1,
     "print elements or ions side by side",
     "Prints up to twelve elements or ions side by side: all quantities, "
     "each from every model and data set that has a value, with differences "
     "from the first. " SELECTION_ABOUT,
     "compare Fe3+ Al3+ Cr3+ --quantity radius", cli_compare},
    {COMMAND_ATOM, "atom", "ELEMENT", 1, 1,
     "solve one atom or ion and print what it is made of",
     "Solves the Kohn-Sham equations of one atom or ion, spherical and with a "
     "point nucleus, until they are self-consistent. Prints the total energy "
     "and its parts, then for each subshell its electrons, orbital energy, "
     "mean "
     "radius, radius of the outermost maximum of the radial density D(r) and "
     "effective nuclear charge by each definition. The density that the model "
     "scf rests on is the default, LSD with the Dirac equation. An atom that "
     "does not converge or does not bind is a failure and gives no number. "
     "ELEMENT is a symbol, name or atomic number, or an ion that carries its "
     "charge (Fe3+).",
     "atom Fe3+ --functional pbe --format csv", cli_atom},
    {COMMAND_AUDIT, "audit", "[SELECTION...]", 0, -1,
     "print how large the residuals of each model are, and where",
     "Prints statistics of the residuals of each model against a reference "
     "set: count, gaps, mean, mean absolute, root mean square, and the largest "
     "with its species, for all chosen species and by block, period and group, "
     "by charge where several were asked for, by the kind of reference value "
     "where several occur; then which model is best where, over the species "
     "that all of them have. With --against the second set takes the place of "
     "a model. " SELECTION_ABOUT,
     "audit block:d --quantity ionization", cli_audit},
    {COMMAND_SOURCES, "sources", "", 0, 0,
     "print every model and data set with its citation",
     "Prints what every number rests on: models with their domain, data sets "
     "with their terms and notes, all with their citations.",
     "sources --format bibtex --output outershell.bib", cli_sources},
};

const struct command *command_at(int i)
{
    assert(i >= 0 && i < COMMAND_COUNT && commands[i].id == (enum command_id)i);
    return &commands[i];
}

const struct command *command_find(const char *name)
{
    for (int i = 0; i < COMMAND_COUNT; i++)
        if (commands[i].name && strcmp(commands[i].name, name) == 0)
            return &commands[i];
    return NULL;
}
