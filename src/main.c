/* SPDX-License-Identifier: MIT */
#include "cli/run.h"

int main(int argc, char **argv)
{
    return cli_run(argc, argv);
}
