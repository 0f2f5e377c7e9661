/* SPDX-License-Identifier: MIT */
/* All models, in the order in which they are shown. */
#ifndef MODEL_REGISTRY_H
#define MODEL_REGISTRY_H

#include "model/model.h"

/* Number of models; the i-th, 0 <= i < count. */
int model_count(void);
const struct model *model_at(int i);

/* By id, or NULL. */
const struct model *model_find(const char *id);

/* Place of a model in the registry. */
int model_index(const struct model *model);

#endif
