package dev.couplet.lower;

import dev.couplet.form.Polynomial;

/**
 * The square of what is missing to equality: {@code (terms - value)^2} for an equality, and with a
 * slack of exactly the range left for inequalities: {@code (terms + slack - highest)^2} or {@code
 * (terms - slack - lowest)^2}.
 */
final class SquareForm {
  private SquareForm() {}

  static Penalty of(Limits limits, String rule, BitTable bits) {
    if (limits.lowest() == limits.highest()) {
      Polynomial.Builder difference = difference(limits.terms(), bits.size());
      difference.add(-limits.lowest());
      return new Penalty(squared(difference), "square");
    }
    boolean fromAbove = limits.hasHighest();
    double most =
        fromAbove
            ? limits.highest() - Math.max(limits.lowest(), limits.range().lowest())
            : limits.range().highest() - limits.lowest();
    double step = limits.step();
    double steps = Math.ceil(most / step);
    Slack slack = Slack.upTo(steps, "the slack of '" + rule + "'", bits);
    Polynomial.Builder difference = difference(limits.terms(), bits.size());
    slack.addTo(difference, fromAbove ? step : -step);
    difference.add(fromAbove ? -limits.highest() : -limits.lowest());
    bits.completeWith(
        values -> {
          double value = Terms.value(limits.terms(), values);
          double missing = fromAbove ? limits.highest() - value : value - limits.lowest();
          slack.set(Math.rint(missing / step), values);
        });
    String form = "square, slack 0.." + (long) steps + " in " + slack.bits() + " bits";
    return new Penalty(squared(difference), form);
  }

  static Polynomial.Builder difference(Polynomial terms, int size) {
    return Polynomial.builder(size).add(terms, 1);
  }

  static Polynomial squared(Polynomial.Builder difference) {
    Polynomial built = difference.build();
    return built.times(built);
  }
}
