package dev.couplet.audit;

import dev.couplet.lower.Lowered;

/**
 * Proves of one lowered model, from a unit test, that the form says what the model says:
 *
 * <pre>{@code
 * LoweringAudit.exhaustive(Lowering.standard().lower(model)).orThrow();
 * }</pre>
 *
 * <p>Every pattern of the decision bits is looked at, with the auxiliary bits at their best. The
 * checks, by the names that findings carry:
 *
 * <ul>
 *   <li>{@code feasible plan}: there is one at all
 *   <li>{@code value}: the energy of a feasible plan is its value, as the rules and objectives say
 *       it; exactly, if the numbers allow that, else up to what rounding can add up to
 *   <li>{@code others}: every other pattern (a rule is broken, or a choice has no option or
 *       several) lies strictly above the best feasible energy
 *   <li>{@code values}: every combination of values of the decisions is stood for by some pattern
 *   <li>{@code reading}: the plan that is read from a pattern says the same as the rules
 *   <li>{@code completion}: completing a plan reaches its lowest energy
 *   <li>{@code ledger}: the ledger's entries add up to every coefficient of the form
 * </ul>
 *
 * <p>The audit shares no code with the lowering: it reads the form, the statement and the ledger.
 */
public final class LoweringAudit {
  /** The most decision bits that an exhaustive audit takes. */
  public static final int MOST_DECISION_BITS = 24;

  private LoweringAudit() {}

  /**
   * Looks at all patterns of the decision bits.
   *
   * <p>Cost: 2^d patterns for d decision bits, each in time linear in the coefficients that one bit
   * has in the form and in the rules: seconds for 24 bits. Auxiliary bits are minimised in groups
   * that share no pair, by depth-first search with a bound; that takes longer for groups of dozens
   * of bits that are all coupled. Memory does not grow with d. Reading and completion are checked
   * on at most 65,536 plans, evenly spread if there are more.
   *
   * @throws IllegalArgumentException if there are more than {@value #MOST_DECISION_BITS} decision
   *     bits
   */
  public static LoweringReport exhaustive(Lowered lowered) {
    int bits = lowered.decisionBits();
    if (bits > MOST_DECISION_BITS) {
      throw new IllegalArgumentException(
          "model '"
              + lowered.statement().name()
              + "' has "
              + bits
              + " decision bits, an exhaustive audit takes at most "
              + MOST_DECISION_BITS
              + "; audit a smaller model made by the same code (fewer keys, fewer options), or a"
              + " part of this one with some of its rules");
    }
    return new ExhaustiveAudit(lowered).report();
  }
}
