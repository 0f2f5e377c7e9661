/* SPDX-License-Identifier: MIT */
#include "element/derivation.h"

const struct derivation *const derivation_list[] = {
    &derivation_zeff,
    &derivation_mulliken,
    &derivation_hardness,
};
const int derivation_list_count =
    sizeof derivation_list / sizeof derivation_list[0];
