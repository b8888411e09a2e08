package dev.couplet.lower;

import dev.couplet.form.Polynomial;

/**
 * What a rule becomes: a polynomial over bits that, minimised over the auxiliary bits, is zero
 * where the rule is kept and at least 1 where it is not.
 *
 * @param terms the polynomial, not yet multiplied by its weight
 * @param form how it was made, in words
 */
record Penalty(Polynomial terms, String form) {}
