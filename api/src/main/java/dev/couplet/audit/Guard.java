package dev.couplet.audit;

import dev.couplet.audit.LoweringAudit.WeightSlack;
import dev.couplet.lower.Lowered.Weight;
import java.util.OptionalDouble;

/**
 * The penalty of one rule by itself, and the least weight that would do, the others being as they
 * are.
 *
 * <p>Let w be the weight and W(p) the weighted penalty of a pattern p, its own auxiliary bits at
 * their best. With weight v instead, the energy of p is E(p) - W(p) + (v / w) W(p), a line in v,
 * since no other part of the form uses those bits. It has to lie above the best feasible energy for
 * every p that is no feasible plan: v &gt; w (W(p) - excess(p)) / W(p) where W(p) &gt; 0, with
 * excess(p) the energy above the best; patterns with W(p) = 0 are for other rules to guard.
 */
final class Guard implements Flips {
  private final Weight weight;
  private final Landscape part;
  private double infimum;

  /** The weight, and the part of the form that it multiplies. */
  Guard(Weight weight, Landscape part) {
    this.weight = weight;
    this.part = part;
  }

  @Override
  public void reset(long pattern) {
    part.reset(pattern);
  }

  @Override
  public void flip(int bit, long pattern) {
    part.flip(bit, pattern);
  }

  /** The weighted penalty of the pattern walked to. */
  double value() {
    return part.value();
  }

  int effort(int bit) {
    return part.effort(bit);
  }

  /** Takes in the pattern walked to, which is no feasible plan. */
  void take(double excess, double error) {
    double own = part.value();
    if (own > error) {
      double enough = weight.value() * (own - excess) / own;
      infimum = enough > infimum ? enough : infimum;
    } else if (excess <= 0) {
      infimum = Double.POSITIVE_INFINITY;
    }
  }

  WeightSlack slack(boolean compared) {
    OptionalDouble known = compared ? OptionalDouble.of(infimum) : OptionalDouble.empty();
    return new WeightSlack(weight.rule(), weight.value(), known);
  }
}
