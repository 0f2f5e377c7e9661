/* SPDX-License-Identifier: MIT */
/* What the scf model offers, with definitions and sources. */
#ifndef MODEL_SCF_OFFERS_H
#define MODEL_SCF_OFFERS_H

#include "model/model.h"

enum {
    OFFER_ZEFF,
    OFFER_ZEFF_SIZE,
    OFFER_ZEFF_ENCLOSED,
    OFFER_RADIUS,
    OFFER_ISODENSITY,
    OFFER_IONIZATION,
    OFFER_ALLEN,
    OFFER_COUNT
};

extern const struct model_offer scf_offers[OFFER_COUNT];

#endif
