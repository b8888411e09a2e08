package dev.couplet.lower;

import dev.couplet.form.Polynomial;
import java.util.List;
import java.util.Optional;

/**
 * The violation of a rule on one or two bits, exactly: any function of two bits is a quadratic
 * polynomial through its four values. No auxiliary bit.
 *
 * <p>Gives the pairs of Glover, Kochenberger and Du (2019): {@code x + y <= 1} is xy, {@code x + y
 * >= 1} is 1 - x - y + xy, {@code x <= y} is x - xy, {@code x = y} is x + y - 2xy.
 */
final class TwoBitForm {
  private TwoBitForm() {}

  static Optional<Penalty> of(Limits limits, int size) {
    List<Integer> variables = Terms.variables(limits.terms());
    if (variables.isEmpty() || variables.size() > 2) {
      return Optional.empty();
    }
    int x = variables.get(0);
    int y = variables.get(variables.size() - 1);
    double none = violation(limits);
    double onlyX = violation(limits, x);
    Polynomial.Builder terms = Polynomial.builder(size).add(none).add(onlyX - none, x);
    if (x != y) {
      double onlyY = violation(limits, y);
      double both = violation(limits, x, y);
      terms.add(onlyY - none, y).add(both - onlyX - onlyY + none, x, y);
    }
    return Optional.of(new Penalty(terms.build(), "exact on " + variables.size() + " bits"));
  }

  private static double violation(Limits limits, int... ones) {
    boolean[] bits = new boolean[limits.terms().size()];
    for (int one : ones) {
      bits[one] = true;
    }
    return limits.violation(Terms.value(limits.terms(), bits));
  }
}
