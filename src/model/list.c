/* SPDX-License-Identifier: MIT */
#include "model/models.h"

const struct model *const model_list[] = {
    &model_shells,      &model_slater, &model_clementi,
    &model_single_zeta, &model_scf,
};
const int model_list_count = sizeof model_list / sizeof model_list[0];
