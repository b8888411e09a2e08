package dev.couplet.lower;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.model.Choice;
import dev.couplet.model.Count;
import dev.couplet.model.Decision;
import dev.couplet.model.Model;
import dev.couplet.model.Rule;
import dev.couplet.model.Statement;
import java.util.Collections;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * How a model is lowered to a quadratic form: the settings. Immutable and thread-safe;
 * deterministic: the same model gives the same bits in the same order.
 *
 * <p>What becomes of what, with k options, n literals in a rule, and R the range left to a slack
 * after tightening; coefficients are those of the penalty before its weight:
 *
 * <table>
 *   <caption>Bits and coefficients of each construct</caption>
 *   <tr><th>stated</th><th>bits</th><th>pairs</th><th>largest coefficient</th></tr>
 *   <tr><td>bit, spin, member of a subset</td><td>1</td><td>0</td><td>0</td></tr>
 *   <tr><td>count of a range of width w</td><td>floor(log2 w) + 1</td><td>0</td><td>0</td></tr>
 *   <tr><td>the same, amounts up to a bound u</td><td>about log2 u + w / u</td><td>0</td>
 *     <td>0</td></tr>
 *   <tr><td>the same, unary; by domain walls</td><td>w</td><td>0; w - 1</td><td>0; 1</td></tr>
 *   <tr><td>choice of k, one bit an option</td><td>k</td><td>k(k-1)/2</td><td>2</td></tr>
 *   <tr><td>the same by domain walls</td><td>k - 1</td><td>k - 2</td><td>1</td></tr>
 *   <tr><td>the same in binary</td><td>ceil(log2 k)</td><td>0</td><td>0</td></tr>
 *   <tr><td>order of n items at p places, code alone</td><td>n p</td><td>p n(n-1)/2</td>
 *     <td>2</td></tr>
 *   <tr><td>decision that is fixed</td><td>0</td><td>0</td><td>0</td></tr>
 *   <tr><td>rule on one or two literals</td><td>0</td><td>1</td><td>twice the largest amount</td></tr>
 *   <tr><td>at most one of n (also as any two exceed the limit)</td><td>0</td><td>n(n-1)/2</td>
 *     <td>n - 1</td></tr>
 *   <tr><td>at least one of n &gt; 2 (also as each reaches the limit)</td><td>ceil(log2 n) - 1</td>
 *     <td>at most (n + bits)(n + bits - 1)/2</td><td>at most n(3n - 2)/8</td></tr>
 *   <tr><td>linear equality, coefficients up to c</td><td>0</td><td>n(n-1)/2</td><td>2c^2, or
 *     c |c - 2 value|</td></tr>
 *   <tr><td>linear inequality</td><td>floor(log2 R) + 1</td><td>(n + bits)(n + bits - 1)/2</td>
 *     <td>as for the equality with the slack among its terms</td></tr>
 *   <tr><td>linear inequality, approximate on request</td><td>0</td><td>n(n-1)/2</td>
 *     <td>set by hand</td></tr>
 *   <tr><td>preferred rule on more literals</td><td>those of slack, excess and shortage</td>
 *     <td>as above</td><td>as above</td></tr>
 *   <tr><td>negative product of d &gt; 2</td><td>1</td><td>d</td><td>d - 1</td></tr>
 *   <tr><td>positive product of d &gt; 2</td><td>ceil(log2 d) - 1</td>
 *     <td>at most (d + bits)(d + bits - 1)/2</td><td>at most d(d+2)/8</td></tr>
 *   <tr><td>two bits that products of one sum share</td><td>1 if that saves more</td><td>3</td>
 *     <td>up to twice the sum of what the products count</td></tr>
 * </table>
 *
 * <p>Rules that every plan keeps take nothing. Source of the pair forms and squares: Glover,
 * Kochenberger and Du, "A tutorial on formulating and using QUBO models" (2019).
 */
@CheckReturnValue
public final class Lowering {
  private static final Lowering STANDARD =
      new Lowering(Weights.rangeBound(), Map.of(), Codes.STANDARD, Aim.AUXILIARIES, Map.of());

  private final Weights weights;
  private final Map<String, Double> byName;
  private final Codes codes;
  private final Aim aim;
  private final Map<String, UnbalancedForm> unbalanced;

  private Lowering(
      Weights weights,
      Map<String, Double> byName,
      Codes codes,
      Aim aim,
      Map<String, UnbalancedForm> unbalanced) {
    this.weights = weights;
    this.byName = byName;
    this.codes = codes;
    this.aim = aim;
    this.unbalanced = unbalanced;
  }

  /** The defaults: choices with one bit an option, weights by the range bound. */
  public static Lowering standard() {
    return STANDARD;
  }

  /** These settings with another way to choose weights. */
  public Lowering with(Weights newWeights) {
    return new Lowering(newWeights, byName, codes, aim, unbalanced);
  }

  /** These settings with another code for choices. */
  public Lowering with(ChoiceEncoding newChoices) {
    return with(codes.with(newChoices));
  }

  /** These settings with another code for one choice. */
  public Lowering encode(Choice<?> choice, ChoiceEncoding encoding) {
    return with(codes.with(choice, encoding));
  }

  /** These settings with another code for counts. */
  public Lowering with(CountEncoding newCounts) {
    return with(codes.with(newCounts));
  }

  /** These settings with another code for one count. */
  public Lowering encode(Count count, CountEncoding encoding) {
    return with(codes.with(count, encoding));
  }

  private Lowering with(Codes newCodes) {
    return new Lowering(weights, byName, newCodes, aim, unbalanced);
  }

  /**
   * These settings with products of three and more bits replaced so that auxiliary bits are few,
   * and of the ways that take as many so that the largest coefficient is small. The default.
   */
  public Lowering fewestAuxiliaries() {
    return new Lowering(weights, byName, codes, Aim.AUXILIARIES, unbalanced);
  }

  /**
   * These settings with products of three and more bits replaced so that the largest coefficient is
   * small, and of the ways that reach it so that auxiliary bits are few: for hosts that hold
   * coefficients with few digits.
   */
  public Lowering smallestCoefficients() {
    return new Lowering(weights, byName, codes, Aim.COEFFICIENTS, unbalanced);
  }

  /**
   * These settings with the weight of one required rule, or of the code of one choice by the words
   * that {@link Lowered#weights()} has for it, set by hand. Whether it is enough is not checked
   * here; an audit tells.
   *
   * @throws IllegalArgumentException unless it is positive and finite
   */
  public Lowering weight(String rule, double value) {
    if (!(value > 0) || !Double.isFinite(value)) {
      throw new IllegalArgumentException(
          "the weight of rule '" + rule + "' is " + value + ", it must be positive and finite");
    }
    Map<String, Double> more = new LinkedHashMap<>(byName);
    more.put(rule, value);
    return new Lowering(weights, Collections.unmodifiableMap(more), codes, aim, unbalanced);
  }

  /**
   * These settings with an approximate penalty for one required inequality, instead of a square
   * with a slack: {@code square h^2 - linear h} with h the whole number that is left to the limit
   * (after common factors are taken out). No auxiliary bits; but not exact: feasible plans cost
   * something too, and the lowest energy may belong to a plan that is not the best or breaks the
   * rule. The two numbers are to be tuned on small examples; they replace the rule's weight.
   *
   * <p>A rule for which an exact form without a slack exists, or that says several things, keeps
   * its exact form; {@link Lowered#approximate()} names those that became approximate. Source:
   * Montanez-Barrera et al., "Unbalanced penalization: a new approach to encode inequality
   * constraints of combinatorial problems for quantum optimization algorithms" (2022).
   *
   * @throws IllegalArgumentException unless both numbers are positive and finite
   */
  public Lowering approximate(String rule, double linear, double square) {
    if (!(linear > 0 && square > 0) || !Double.isFinite(linear) || !Double.isFinite(square)) {
      throw new IllegalArgumentException(
          "the approximate penalty of rule '"
              + rule
              + "' is "
              + square
              + " h^2 - "
              + linear
              + " h, both numbers must be positive and finite");
    }
    Map<String, UnbalancedForm> more = new LinkedHashMap<>(unbalanced);
    more.put(rule, new UnbalancedForm(linear, square));
    return new Lowering(weights, byName, codes, aim, Collections.unmodifiableMap(more));
  }

  Optional<UnbalancedForm> unbalanced(String rule) {
    return Optional.ofNullable(unbalanced.get(rule));
  }

  /**
   * Lowers the model as it stands now. Linear in the terms of the penalties, multiplied out.
   *
   * @throws IllegalArgumentException if a weight was set for a rule that the model does not have or
   *     only prefers, or a code for a decision that it does not have, or the form's whole
   *     coefficients would be too large for exact energies, naming the heaviest rule
   */
  public Lowered lower(Model model) {
    return lower(model.snapshot());
  }

  /** Lowers a statement; as for a model. */
  public Lowered lower(Statement statement) {
    requireKnown(statement, byName.keySet(), "a weight");
    requireKnown(statement, unbalanced.keySet(), "an approximate penalty");
    for (String rule : unbalanced.keySet()) {
      if (byName.containsKey(rule)) {
        throw new IllegalArgumentException(
            "rule '" + rule + "' has an approximate penalty and a weight: set one of them");
      }
    }
    codes.requireKnown(statement);
    return new Assembly(statement, this).lowered();
  }

  private static void requireKnown(Statement statement, Set<String> named, String what) {
    if (named.isEmpty()) {
      return;
    }
    Set<String> known = new HashSet<>();
    statement.decisions().stream().map(Decision::code).forEach(known::add);
    statement.rules().stream().map(Rule::name).forEach(known::add);
    for (Rule rule : statement.rules()) {
      if (!rule.required() && named.contains(rule.name())) {
        throw new IllegalArgumentException(
            what
                + " is set for rule '"
                + rule.name()
                + "', which is preferred: its cost a unit is its weight; change that");
      }
    }
    for (String rule : named) {
      if (!known.contains(rule)) {
        throw new IllegalArgumentException(
            what
                + " is set for rule '"
                + rule
                + "', but model '"
                + statement.name()
                + "' has no rule of that name");
      }
    }
  }

  /** These settings for one statement. */
  Lowering begin(Statement statement, boolean literalsAreBits) {
    return with(weights.begin(statement, literalsAreBits));
  }

  Aim aim() {
    return aim;
  }

  Codes codes() {
    return codes;
  }

  Weights.Chosen choose(Weights.Facts facts) {
    Double byHand = byName.get(facts.rule());
    if (byHand != null) {
      return new Weights.Chosen(byHand, "set by hand, not proved to suffice");
    }
    Weights.Chosen chosen = weights.choose(facts);
    if (!(chosen.value() > 0) || !Double.isFinite(chosen.value())) {
      throw new IllegalArgumentException(
          "the weight chosen for '"
              + facts.rule()
              + "' is "
              + chosen.value()
              + ", it must be positive and finite");
    }
    return chosen;
  }
}
