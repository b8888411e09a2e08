package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.Optional;

/**
 * A named condition that a model requires or prefers, with integer coefficients.
 *
 * <p>The rule says {@code lowest <= terms <= highest}, where {@link #terms()} is a polynomial over
 * the model's literals without a constant, and all numbers are whole. They stand for the
 * condition's own numbers times {@code 1 / unit}: decimals are scaled exactly, common factors taken
 * out. Amounts and costs are in the condition's own units. Immutable.
 */
@CheckReturnValue
public final class Rule {
  private final String name;
  private final Optional<Double> costPerUnit;
  private final Polynomial terms;
  private final double lowest;
  private final double highest;
  private final BigDecimal unit;
  private final Range range;

  Rule(String name, Optional<Double> costPerUnit, ScaledCondition condition, Range range) {
    this(
        name,
        costPerUnit,
        condition.terms(),
        condition.lowest(),
        condition.highest(),
        condition.unit(),
        range);
  }

  private Rule(
      String name,
      Optional<Double> costPerUnit,
      Polynomial terms,
      double lowest,
      double highest,
      BigDecimal unit,
      Range range) {
    this.name = name;
    this.costPerUnit = costPerUnit;
    this.terms = terms;
    this.lowest = lowest;
    this.highest = highest;
    this.unit = unit;
    this.range = range;
  }

  /** The same rule in a model that has more literals by now. */
  Rule inLiterals(int literals) {
    return new Rule(name, costPerUnit, terms.inVariables(literals), lowest, highest, unit, range);
  }

  /** The name, unique in the model. */
  public String name() {
    return name;
  }

  /** Whether a plan has to keep the rule to be feasible. */
  public boolean required() {
    return costPerUnit.isEmpty();
  }

  /** What breaking a preferred rule costs for each unit of the amount; 0 for a required one. */
  public double costPerUnit() {
    return costPerUnit.orElse(0.0);
  }

  /** The polynomial over the model's literals that is limited; whole coefficients, no constant. */
  public Polynomial terms() {
    return terms;
  }

  /** The lower limit, a whole number or minus infinity. */
  public double lowest() {
    return lowest;
  }

  /** The upper limit, a whole number or infinity. */
  public double highest() {
    return highest;
  }

  /** How much of the condition's own units one unit of the whole numbers stands for. */
  public double unit() {
    return unit.doubleValue();
  }

  /** Between which numbers {@link #terms()} lies under any plan. */
  public Range range() {
    return range;
  }

  /** The largest factor common to all coefficients; 0 if there are none. */
  public double divisor() {
    BigInteger[] factor = {BigInteger.ZERO};
    terms.forEachTerm(
        (coefficient, literals) ->
            factor[0] = factor[0].gcd(BigInteger.valueOf((long) coefficient)));
    return factor[0].doubleValue();
  }

  /** Whether some multiple of the coefficients' common factor lies between the limits. */
  boolean divisible() {
    double divisor = divisor();
    return Math.ceil(lowest / divisor) <= Math.floor(highest / divisor);
  }

  /** Whether every plan keeps the rule, so that it asks for nothing. */
  public boolean alwaysKept() {
    return lowest <= range.lowest() && range.highest() <= highest;
  }

  /** By how much the literals' values miss the limits, in whole-number units; 0 if kept. */
  public double violation(State literals) {
    return violation(terms.value(literals));
  }

  /** By how much a value of {@link #terms()} misses the limits; 0 if it keeps them. */
  public double violation(double value) {
    return Math.max(0, Math.max(value - highest, lowest - value));
  }

  /** The most by which any plan can miss the limits, in whole-number units; 0 if none can. */
  public double largestViolation() {
    return Math.max(violation(range.lowest()), violation(range.highest()));
  }

  /** A violation in whole-number units, in the condition's own units. */
  public double amount(double violation) {
    return new BigDecimal(violation).multiply(unit).doubleValue();
  }

  /**
   * What a violation in whole-number units costs; 0 for a required rule. Worked out in decimals and
   * rounded once: ten misses of 0.1, at a cost of 10 each unit, cost 10.
   */
  public double cost(double violation) {
    return new BigDecimal(violation)
        .multiply(unit)
        .multiply(Text.decimal(costPerUnit()))
        .doubleValue();
  }

  @Override
  public String toString() {
    String kind = required() ? "require" : "prefer (" + Text.number(costPerUnit()) + " a unit)";
    String body = Text.between(terms.terms() + " terms", lowest, highest);
    return kind + " '" + name + "': " + body;
  }
}
