/* SPDX-License-Identifier: MIT */
/* What the closed screening rules have in common. */
#ifndef MODEL_RULE_H
#define MODEL_RULE_H

#include "model/model.h"

/* Work space of a rule: the question is all it needs. */
struct rule_work {
    struct question question;
};

/* model.begin and model.step of every closed rule. */
void rule_begin(void *work, const struct question *question,
                const struct model_options *options);
enum model_progress rule_step(void *work);

/* The subshell that a reader asks about: the outermost for n = 0. NULL, with
 * *reason set, when it holds no electron. */
const struct subshell *rule_subshell(const struct species *species, int n,
                                     int l, const char **reason);

/* Screening constant of one subshell in electrons. False, with *reason set,
 * when the rule does not cover it; *remark (never NULL afterwards) says what
 * to know about the value. */
typedef bool rule_sigma(const struct species *species,
                        const struct subshell *subshell, double *sigma,
                        const char **reason, const char **remark);

/* Z_eff = Z - S of a subshell in elementary charges; a gap when the rule does
 * not cover it or the screening is not below Z. */
struct reading rule_zeff(const struct model_offer *offer,
                         const struct question *question, rule_sigma *sigma,
                         int n, int l);

/* Radius of the maximum of the radial density of a hydrogen-like (Slater-type)
 * orbital, n*^2 a0/Z_eff in pm; n_star(n) > 0. */
struct reading rule_radius(const struct model_offer *offer,
                           const struct question *question, rule_sigma *sigma,
                           double (*n_star)(int n), int n, int l);

/* Ry (Z_eff/n)^2 of the outermost subshell, in eV. */
struct reading rule_ionization(const struct model_offer *offer,
                               const struct question *question,
                               rule_sigma *sigma);

/* n itself: the effective quantum number of a rule that has none of its own. */
double rule_plain_n(int n);

/* The first offers of every rule, in this order; slater has one more. */
enum { RULE_ZEFF, RULE_RADIUS, RULE_IONIZATION, RULE_OFFERS };

/* model.read of a rule whose ionization energy is the outermost subshell's:
 * offers[RULE_OFFERS]. */
struct reading rule_read(const void *work, const struct model_offer *offers,
                         int offer, rule_sigma *sigma, int n, int l);

#endif
