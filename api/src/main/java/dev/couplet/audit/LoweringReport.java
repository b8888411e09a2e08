package dev.couplet.audit;

import java.util.List;
import java.util.OptionalDouble;

/**
 * What an audit of a lowered model found. Immutable.
 *
 * @param patterns how many patterns of the decision bits were looked at
 * @param feasible how many of them are feasible plans
 * @param optimum the best value of a feasible plan, in the model's own sense; empty if there is
 *     none
 * @param margin by how much the lowest energy of all other patterns lies above the best feasible
 *     one; negative or 0 if the weights do not suffice, empty if there is nothing to compare
 * @param weights how far each weight is from the least that would do, codes first
 * @param findings what is wrong, if anything
 */
public record LoweringReport(
    long patterns,
    long feasible,
    OptionalDouble optimum,
    OptionalDouble margin,
    List<WeightSlack> weights,
    Findings findings) {
  /** Copies the list. */
  public LoweringReport {
    weights = List.copyOf(weights);
  }

  /**
   * The weight of one rule or code against the least that would do, the other weights being as they
   * are.
   *
   * @param rule the rule's name, or words that name a choice's code
   * @param weight the weight that it has
   * @param infimum every larger weight suffices and no smaller one does; infinite if no weight of
   *     this rule alone would do; empty if the weight cannot be told apart from other parts of the
   *     form (as for preferred rules, whose auxiliary bits carry costs too), or the model has no
   *     feasible plan
   */
  public record WeightSlack(String rule, double weight, OptionalDouble infimum) {
    @Override
    public String toString() {
      String enough =
          infimum.isEmpty()
              ? "not analysed"
              : "enough above " + Numbers.shown(infimum.getAsDouble());
      return "'" + rule + "' weighs " + Numbers.shown(weight) + ", " + enough;
    }
  }

  /** Whether every check held. */
  public boolean passed() {
    return findings.none();
  }

  /**
   * Does nothing if every check held.
   *
   * @throws AssertionError listing the findings, with a counterexample in the model's words each
   */
  public void orThrow() {
    findings.orThrow();
  }

  /** The figures, a line for each weight, and the findings. */
  @Override
  public String toString() {
    StringBuilder text = new StringBuilder();
    text.append(patterns).append(" patterns, ").append(feasible).append(" feasible");
    optimum.ifPresent(value -> text.append(", optimum ").append(Numbers.shown(value)));
    margin.ifPresent(value -> text.append(", margin ").append(Numbers.shown(value)));
    weights.forEach(weight -> text.append("\n  ").append(weight));
    return text.append('\n').append(findings).toString();
  }
}
