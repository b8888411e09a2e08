package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Range;
import dev.couplet.model.Rule;

/**
 * What a rule limits, tightened: {@code lowest <= terms <= highest}, all whole. A limit that every
 * plan keeps is infinite.
 *
 * @param terms the polynomial over literals, without a constant
 * @param lowest whole, or minus infinity
 * @param highest whole, or infinity
 * @param range between what the terms lie under any plan
 */
record Limits(Polynomial terms, double lowest, double highest, Range range) {
  /**
   * The limits of a required rule, divided by the coefficients' common factor and rounded inwards.
   */
  static Limits tightened(Rule rule) {
    double divisor = rule.divisor();
    Polynomial.Builder terms = Polynomial.builder(rule.terms().size());
    rule.terms().forEachTerm((coefficient, literals) -> terms.add(coefficient / divisor, literals));
    Range range =
        new Range(
            Math.ceil(rule.range().lowest() / divisor),
            Math.floor(rule.range().highest() / divisor));
    return new Limits(
            terms.build(),
            Math.ceil(rule.lowest() / divisor),
            Math.floor(rule.highest() / divisor),
            range)
        .withoutImplied();
  }

  /** The limits of a preferred rule, as they are: rounding would change the amount of a miss. */
  static Limits exact(Rule rule) {
    return new Limits(rule.terms(), rule.lowest(), rule.highest(), rule.range()).withoutImplied();
  }

  private Limits withoutImplied() {
    return new Limits(
        terms,
        lowest <= range.lowest() ? Double.NEGATIVE_INFINITY : lowest,
        highest >= range.highest() ? Double.POSITIVE_INFINITY : highest,
        range);
  }

  boolean hasLowest() {
    return lowest != Double.NEGATIVE_INFINITY;
  }

  boolean hasHighest() {
    return highest != Double.POSITIVE_INFINITY;
  }

  /** By how much a value of the terms misses the limits. */
  double violation(double value) {
    return Math.max(0, Math.max(value - highest, lowest - value));
  }
}
