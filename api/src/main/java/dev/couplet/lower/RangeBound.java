package dev.couplet.lower;

import dev.couplet.model.Statement.Range;

/**
 * The range bound. Let L be the lowest value of the objective over all bit patterns and H its
 * highest under any plan. A pattern that breaks a rule is worth at least L + weight; a feasible
 * plan at most H. So weight &gt; H - L suffices, whatever the other rules weigh.
 */
final class RangeBound implements Weights {
  @Override
  public Chosen choose(Facts facts) {
    Range objective = facts.objective();
    double width = Math.max(0, objective.width());
    double weight = above(width, facts);
    String reason =
        "above "
            + Weights.shown(width)
            + ", all that the objective can win: "
            + Weights.shown(objective.lowest())
            + " at the least, "
            + Weights.shown(objective.highest())
            + " at the most";
    return new Chosen(weight, reason);
  }

  /** A weight strictly above what can be won, as the numbers of the objective allow. */
  static double above(double width, Weights.Facts facts) {
    return above(facts.whole() ? width : felt(width, facts.objective()), facts.whole());
  }

  /**
   * The width, or what is left of it beside large values of the objective: a weight that is lost in
   * the rounding of the energies would guard nothing.
   */
  static double felt(double width, Range objective) {
    double largest = Math.max(Math.abs(objective.lowest()), Math.abs(objective.highest()));
    return Math.max(width, Math.scalb(largest, -30));
  }

  /**
   * A number strictly above another, with few digits: the next whole number where all is whole,
   * else about 1/128 more (1/512 at the least, which rounding does not eat up), with eight binary
   * digits.
   */
  static double above(double width, boolean whole) {
    if (width == 0) {
      return 1;
    }
    if (whole && width < 0x1p51) {
      return Math.floor(width) + 1;
    }
    double step = Math.scalb(1.0, Math.getExponent(width) - 7);
    return (Math.floor(width / step + 0.5) + 1) * step;
  }
}
