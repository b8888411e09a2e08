package dev.couplet.lower;

import dev.couplet.model.Plan;
import dev.couplet.model.Statement;
import dev.couplet.model.Statement.Range;
import java.util.Locale;

/**
 * A way to choose the weight of a rule's penalty.
 *
 * <p>Every penalty is zero where its rule is kept and at least 1 where it is broken, and nowhere
 * below 0 on a plan. On patterns that stand for no plan, since they break the code of a choice, a
 * rule over options may go below 0: the code is then weighed after the rule, as if the objective
 * could win so much more there. A weight is enough if breaking the rule never pays; it should be no
 * larger, since heavy weights make a form hard to sample and coefficients hard to represent.
 * Implementations are immutable.
 */
@FunctionalInterface
public interface Weights {
  /**
   * What is known when a weight is chosen.
   *
   * @param rule the rule's name, or words that name a choice's code
   * @param statement what is lowered
   * @param objective everything that is minimised beside the penalties: its lowest value over all
   *     bit patterns, broken codes included, and its highest under any plan; for the weight of a
   *     code, lower by what the weighted penalties of rules over its options can be below 0
   * @param whole whether the objective has whole coefficients only
   */
  record Facts(String rule, Statement statement, Range objective, boolean whole) {}

  /**
   * A weight and why it suffices.
   *
   * @param value positive and finite
   * @param reason in words
   */
  record Chosen(double value, String reason) {}

  /**
   * Called once for each lowering, before the first weight is chosen: may give weights that have
   * looked at the statement.
   *
   * @param literalsAreBits whether each literal is the bit of the same number
   */
  default Weights begin(Statement statement, boolean literalsAreBits) {
    return this;
  }

  /** Chooses the weight of one rule. */
  Chosen choose(Facts facts);

  /**
   * Strictly above the whole range of the objective: breaking a rule costs more than anything the
   * objective can win. Always enough.
   */
  static Weights rangeBound() {
    return new RangeBound();
  }

  /**
   * Strictly above what could be won over a known feasible plan, were every rule broken: its value
   * less the lowest that the objective can be. Always enough, and lighter than the range bound if
   * the plan is good: today's plan, or the answer of a first run.
   *
   * @throws IllegalArgumentException if the plan is not feasible, naming a rule; when a model is
   *     lowered also if it is another model, or has become another by later decisions and rules
   */
  static Weights incumbentBound(Plan known) {
    return new IncumbentBound(known);
  }

  /**
   * Strictly above the most that it can cost to repair a broken rule by changing one bit, where
   * such a repair breaks nothing else: for limits on sums of bits (knapsacks, covers) and codes of
   * choices that no other rule holds back. By the range bound for every other rule. Always enough,
   * and lighter than the range bound if the objective has many terms.
   */
  static Weights repairBound() {
    return new RepairBound();
  }

  /**
   * The same weight for every rule and code, set by hand. Whether it is enough is not checked here;
   * an audit tells.
   *
   * @throws IllegalArgumentException unless it is positive and finite
   */
  static Weights fixed(double value) {
    if (!(value > 0) || !Double.isFinite(value)) {
      throw new IllegalArgumentException(
          "the weight is " + value + ", it must be a positive finite number");
    }
    return facts -> new Chosen(value, "set by hand, not proved to suffice");
  }

  /** A number in words that are the same on every JDK. */
  static String shown(double value) {
    return value == Math.rint(value) && Math.abs(value) < 1e15
        ? Long.toString((long) value)
        : String.format(Locale.ROOT, "%.6g", value);
  }
}
