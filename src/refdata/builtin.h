/* SPDX-License-Identifier: MIT */
/* The data sets of data/, checked and turned into tables when the program was
 * built (bake.c makes their definitions). Only catalogue.c includes this. */
#ifndef REFDATA_BUILTIN_H
#define REFDATA_BUILTIN_H

#include "refdata/dataset.h"

extern const struct dataset *const refdata_builtin[];
extern const size_t refdata_builtin_count;

#endif
