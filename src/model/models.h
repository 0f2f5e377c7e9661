/* SPDX-License-Identifier: MIT */
/* The models that the registry lists; nothing else needs these names. */
#ifndef MODEL_MODELS_H
#define MODEL_MODELS_H

#include "model/model.h"

extern const struct model model_shells;
extern const struct model model_slater;
extern const struct model model_clementi;
extern const struct model model_single_zeta;
extern const struct model model_scf;

/* All of them, in the order in which they are shown. */
extern const struct model *const model_list[];
extern const int model_list_count;

#endif
