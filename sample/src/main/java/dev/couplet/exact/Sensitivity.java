package dev.couplet.exact;

import dev.couplet.model.Plan;
import java.util.List;

/**
 * By how much single numbers of a small model may move before the optimal plan is no longer
 * optimal: one at a time, everything else as it is. Immutable.
 *
 * @param plan the optimal plan
 * @param coefficients of the objective, one for each of its products
 * @param limits of the required rules that have one part
 */
public record Sensitivity(Plan plan, List<Coefficient> coefficients, List<Limit> limits) {
  /** Copies the lists. */
  public Sensitivity {
    coefficients = List.copyOf(coefficients);
    limits = List.copyOf(limits);
  }

  /**
   * A coefficient of the objective. As long as it moves by no more, the plan stays optimal.
   *
   * @param product the literals that it is multiplied by, in words
   * @param value what it is
   * @param fall by how much it may fall, 0 or more; infinite if it does not matter
   * @param rise by how much it may rise
   */
  public record Coefficient(List<String> product, double value, double fall, double rise) {
    /** Copies the words. */
    public Coefficient {
      product = List.copyOf(product);
    }
  }

  /**
   * A limit of a required rule. As long as it is tightened by no more than {@code tighter} and
   * loosened by less than {@code looser}, the plan stays optimal; in the condition's own units.
   *
   * @param rule the rule's name
   * @param upper whether it is the upper limit
   * @param tighter by how much it may close in on the plan: what the plan leaves unused
   * @param looser by how much it may give way until a better plan keeps it; infinite if none does
   */
  public record Limit(String rule, boolean upper, double tighter, double looser) {}
}
