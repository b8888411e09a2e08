package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.Optional;
import java.util.function.IntPredicate;

/**
 * The violation of a rule on one or two bits, exactly: any function of two bits is a quadratic
 * polynomial through its four values. No auxiliary bit.
 *
 * <p>Gives the pairs of Glover, Kochenberger and Du (2019): {@code x + y <= 1} is xy, {@code x + y
 * >= 1} is 1 - x - y + xy, {@code x <= y} is x - xy, {@code x = y} is x + y - 2xy.
 */
final class TwoBitForm {
  /** Two bits make no more products than these: none of them, either, both. */
  private static final int MOST_TERMS = 4;

  private TwoBitForm() {}

  static Optional<Penalty> of(Limits limits, int size) {
    if (limits.terms().terms() > MOST_TERMS) {
      return Optional.empty();
    }
    int[] variables = Terms.variables(limits.terms());
    if (variables.length == 0 || variables.length > 2) {
      return Optional.empty();
    }
    int x = variables[0];
    int y = variables[variables.length - 1];
    double none = violation(limits, v -> false);
    double onlyX = violation(limits, v -> v == x);
    Polynomial.Builder terms = Polynomial.builder(size).add(none).add(onlyX - none, x);
    if (x != y) {
      double onlyY = violation(limits, v -> v == y);
      double both = violation(limits, v -> true);
      terms.add(onlyY - none, y).add(both - onlyX - onlyY + none, x, y);
    }
    String form = variables.length == 1 ? "exact on 1 bit" : "exact on 2 bits";
    return Optional.of(new Penalty(terms.build(), form));
  }

  private static double violation(Limits limits, IntPredicate one) {
    return limits.violation(Terms.value(limits.terms(), one));
  }
}
