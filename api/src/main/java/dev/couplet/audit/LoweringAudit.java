package dev.couplet.audit;

import dev.couplet.lower.Lowered;
import dev.couplet.model.Plan;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

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
 *   <li>{@code approximate}: no rule has an approximate penalty
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
  public static Report exhaustive(Lowered lowered) {
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

  /**
   * Proves of a model of any size, rule by rule, that its form says what it says, or names what it
   * could not prove.
   *
   * <p>The form is taken apart by its ledger, whose sources have to add up to it, and whose
   * auxiliary bits have to be of one rule each. Then, each by itself:
   *
   * <ul>
   *   <li>the objective is the model's under every plan, coefficient by coefficient
   *   <li>each code is 0 where its bits stand for a value and above 0 elsewhere
   *   <li>each penalty of a required rule, its auxiliary bits at their best, is 0 under plans that
   *       keep the rule, at least some v above 0 under other plans, and below 0, if at all, only
   *       where a code is broken
   *   <li>each preferred rule costs what missing it costs
   * </ul>
   *
   * <p>Few bits are looked at under every pattern; more have to be of a form that is proved for any
   * number of them: a square of whole numbers whose slack covers just the amounts that are allowed,
   * or a form that is symmetric in its literals. The weights put these together: weight times v has
   * to be above what the objective is at the most under the best plan, less what it is at the least
   * under all patterns; for a code with what penalties can be below 0 where it is broken.
   *
   * <p>A certificate without findings holds if the model has a feasible plan at all, which this
   * audit does not look for: then every best state of the form is a best plan. A finding does not
   * mean that the form is wrong: its message begins with "not certified" where it may only be that
   * no proof was found. That a completed plan has its auxiliary bits at their best is left to
   * {@link #exhaustive}.
   *
   * <p>Cost: linear in the terms of form and rules but for sorting, plus 2^b for every rule that
   * has b bits and no known form, b at most 20.
   */
  public static Certificate byRule(Lowered lowered) {
    return new RuleAudit(lowered, Optional.empty()).certificate();
  }

  /**
   * The same, where a feasible plan is known: the best plan is no worse than that, which lighter
   * weights may need.
   *
   * @throws IllegalArgumentException if the plan is not feasible or of another model
   */
  public static Certificate byRule(Lowered lowered, Plan known) {
    return new RuleAudit(lowered, Optional.of(known)).certificate();
  }

  /**
   * What an audit rule by rule proved. Immutable.
   *
   * @param width the objective at the most under the best plan, less the objective at the least
   *     under all bit patterns: what breaking a rule has to cost more than
   * @param proofs the codes and rules that are proved, in the order of the statement, codes first
   * @param findings what is wrong, or could not be proved
   */
  public record Certificate(double width, List<RuleProof> proofs, Findings findings) {
    /** Copies the list. */
    public Certificate {
      proofs = List.copyOf(proofs);
    }

    /** Whether everything is proved. */
    public boolean passed() {
      return findings.none();
    }

    /**
     * Does nothing if everything is proved.
     *
     * @throws AssertionError listing what is not, with the name of the rule and what to do
     */
    public void orThrow() {
      findings.orThrow();
    }

    /** A line for each proof, and the findings. */
    @Override
    public String toString() {
      StringBuilder text = new StringBuilder();
      text.append("the objective can win ").append(Numbers.shown(width));
      proofs.forEach(proof -> text.append("\n  ").append(proof));
      return text.append('\n').append(findings).toString();
    }
  }

  /**
   * A penalty that is proved by itself.
   *
   * @param rule the rule's name, or words that name a choice's code
   * @param how in words
   */
  public record RuleProof(String rule, String how) {
    @Override
    public String toString() {
      return "'" + rule + "': " + how;
    }
  }

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
  public record Report(
      long patterns,
      long feasible,
      OptionalDouble optimum,
      OptionalDouble margin,
      List<WeightSlack> weights,
      Findings findings) {
    /** Copies the list. */
    public Report {
      weights = List.copyOf(weights);
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

  /**
   * The weight of one rule or code against the least that would do, the other weights being as they
   * are.
   *
   * @param rule the rule's name, or words that name a choice's code
   * @param weight the weight that it has
   * @param infimum every larger weight suffices and no smaller one does (a rule whose penalty goes
   *     below 0 where a code is broken may then ask for a heavier code); infinite if no weight of
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
}
