package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.Optional;

/**
 * A linear inequality that says no more than "at least one of these literals": the product of their
 * negations, which is 1 where it is broken and 0 elsewhere. For n = 3 and more literals ({@link
 * TwoBitForm} has those of fewer) the product takes auxiliary bits, {@code ceil(log2 n) - 1} where
 * these are to be few: fewer than any slack.
 *
 * <p>Written as {@code sum c_k l_k >= bound} with all {@code c_k > 0} (a literal l is x or 1 - x),
 * the inequality is one if {@code 0 < bound <= c_k} for all k. Where no literal holds it is missed
 * by the bound, the only amount there is.
 */
final class ClauseForm {
  private ClauseForm() {}

  /** The penalty, or nothing if the inequality says something else. */
  static Optional<Penalty> of(Limits limits, String rule, BitTable bits, Aim aim) {
    return isClause(limits) ? Optional.of(penalty(limits, rule, bits, aim)) : Optional.empty();
  }

  /** By how much it is missed where no literal holds. */
  static double amount(Limits limits) {
    int sign = sign(limits);
    double[] bound = {sign > 0 ? limits.lowest() : -limits.highest()};
    limits
        .terms()
        .forEachTerm((coefficient, variables) -> bound[0] -= Math.min(0, sign * coefficient));
    return bound[0];
  }

  private static int sign(Limits limits) {
    return limits.hasLowest() ? 1 : -1;
  }

  private static boolean isClause(Limits limits) {
    if (limits.terms().degree() != 1
        || limits.terms().terms() < 3
        || limits.hasLowest() == limits.hasHighest()) {
      return false;
    }
    double bound = amount(limits);
    boolean[] each = {bound > 0};
    limits
        .terms()
        .forEachTerm((coefficient, variables) -> each[0] &= Math.abs(coefficient) >= bound);
    return each[0];
  }

  private static Penalty penalty(Limits limits, String rule, BitTable bits, Aim aim) {
    int[] negations = negations(limits);
    int n = negations.length;
    int negated = 0;
    for (int literal : negations) {
      negated += literal < 0 ? 1 : 0;
    }
    ProductForms.Fitted fitted = new ProductForms(aim).of(1, n, negated);
    int first = fitted.addTo(bits, negations, "'" + rule + "'");
    Polynomial.Builder product = Polynomial.builder(bits.size());
    fitted.form().addTo(product, 1, negations, first);
    return new Penalty(product.build(), "at least one of " + n + ", as a product");
  }

  /** The literals that all hold where the inequality is broken. */
  private static int[] negations(Limits limits) {
    int sign = sign(limits);
    int[] negations = Terms.variables(limits.terms());
    for (int k = 0; k < negations.length; k++) {
      boolean plain = sign * limits.terms().coefficient(negations[k]) > 0;
      negations[k] = plain ? ~negations[k] : negations[k];
    }
    return negations;
  }
}
