package dev.couplet.model;

import dev.couplet.form.CheckReturnValue;
import dev.couplet.form.Polynomial;
import dev.couplet.form.State;
import dev.couplet.model.Statement.Range;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/**
 * A named condition that a model requires or prefers, in whole numbers.
 *
 * <p>Most conditions have one {@link Part}; one that says several things at once has more, and is
 * kept where all of them are. Amounts and costs of the parts add up. Immutable.
 */
@CheckReturnValue
public final class Rule {
  /** What a miss costs: nothing for a required rule, else a price for each unit. */
  record Price(double perUnit, boolean squared) {
    static final Price NONE = new Price(0, false);
  }

  private final String name;
  private final Optional<Price> price;
  private final List<Part> parts;

  Rule(String name, Optional<Price> price, List<Part> parts) {
    this.name = name;
    this.price = price;
    this.parts = List.copyOf(parts);
  }

  /** The same rule in a model that has more literals by now. */
  Rule inLiterals(int literals) {
    return new Rule(name, price, parts.stream().map(part -> part.inLiterals(literals)).toList());
  }

  /** What is left of the rule where decisions are fixed. */
  Rule fixed(Fixing fixing, Function<Polynomial, Range> rangeOf) {
    List<Part> left = parts.stream().map(part -> part.fixed(fixing, rangeOf)).toList();
    for (Part part : left) {
      boolean apart = part.highest() < part.range.lowest() || part.lowest() > part.range.highest();
      boolean between = part.step() == 1 && part.terms().terms() > 0 && !part.divisible();
      if (required() && (apart || between)) {
        throw new IllegalArgumentException(
            "rule '" + name + "' can be kept by no plan with the decisions that are fixed");
      }
    }
    return new Rule(name, price, left);
  }

  /** The name, unique in the model. */
  public String name() {
    return name;
  }

  /** Whether a plan has to keep the rule to be feasible. */
  public boolean required() {
    return price.isEmpty();
  }

  /** What breaking a preferred rule costs for each unit of the amount; 0 for a required one. */
  public double costPerUnit() {
    return price.orElse(Price.NONE).perUnit();
  }

  /** Whether a preferred rule costs its price times the square of the amount. */
  public boolean squared() {
    return price.orElse(Price.NONE).squared();
  }

  /** What has to hold, all of it. */
  public List<Part> parts() {
    return parts;
  }

  /** Whether every plan keeps the rule, so that it asks for nothing. */
  public boolean alwaysKept() {
    return parts.stream().allMatch(Part::alwaysKept);
  }

  /** Whether the literals' values keep the rule. */
  public boolean kept(State literals) {
    return parts.stream().allMatch(part -> part.violation(literals) == 0);
  }

  /** By how much the literals' values miss the rule, in the condition's own units; 0 if kept. */
  public double amount(State literals) {
    double sum = 0;
    for (Part part : parts) {
      sum += part.amount(part.violation(literals));
    }
    return sum;
  }

  /** What the literals' values cost by missing the rule; 0 for a required one. */
  public double cost(State literals) {
    double sum = 0;
    for (Part part : parts) {
      sum += part.cost(part.violation(literals));
    }
    return sum;
  }

  /** The most that any plan can pay for missing the rule. */
  public double largestCost() {
    double sum = 0;
    for (Part part : parts) {
      sum += part.cost(part.largestViolation());
    }
    return sum;
  }

  @Override
  public String toString() {
    String kind = required() ? "require" : "prefer (" + Text.number(costPerUnit()) + " a unit)";
    StringBuilder body = new StringBuilder();
    for (Part part : parts.subList(0, Math.min(3, parts.size()))) {
      Polynomial terms = part.terms();
      body.append(body.isEmpty() ? "" : ", ");
      body.append(Text.between(terms.terms() + " terms", part.lowest(), part.highest()));
    }
    return kind + " '" + name + "': " + body + (parts.size() > 3 ? ", ..." : "");
  }

  /**
   * One thing that a rule says: {@code lowest <= terms <= highest}, and where {@code step} is above
   * 1 that the terms lie on {@code lowest + k step}.
   *
   * <p>{@link #terms()} is a polynomial over the model's literals without a constant; all numbers
   * are whole. They stand for the condition's own numbers times {@code 1 / unit}: decimals are
   * scaled exactly, common factors taken out. Violations are in these whole numbers, amounts and
   * costs in the condition's own units. Immutable.
   */
  public static final class Part {
    private final ScaledCondition condition;
    private final Price price;
    private final Range range;

    Part(ScaledCondition condition, Price price, Range range) {
      this.condition = condition;
      this.price = price;
      this.range = range;
    }

    private Part fixed(Fixing fixing, Function<Polynomial, Range> rangeOf) {
      ScaledCondition left = condition.fixed(fixing);
      return new Part(left, price, rangeOf.apply(left.terms()));
    }

    /** The same in a model that has more literals by now. */
    Part inLiterals(int literals) {
      return new Part(condition.inLiterals(literals), price, range);
    }

    /**
     * The polynomial over the model's literals that is limited; whole coefficients, no constant.
     */
    public Polynomial terms() {
      return condition.terms();
    }

    /** The lower limit, a whole number or minus infinity. */
    public double lowest() {
      return condition.lowest();
    }

    /** The upper limit, a whole number or infinity. */
    public double highest() {
      return condition.highest();
    }

    /**
     * The distance between values that keep the limits: 1 where every whole number does; above 1
     * only where both limits are finite and lie a multiple of it apart.
     */
    public double step() {
      return condition.step();
    }

    /** How much of the condition's own units one unit of the whole numbers stands for. */
    public double unit() {
      return condition.unit().doubleValue();
    }

    /** Between which numbers {@link #terms()} lies under any plan. */
    public Range range() {
      return range;
    }

    /** The largest factor common to all coefficients; 0 if there are none. */
    public double divisor() {
      long[] factor = {0};
      terms()
          .forEachTerm(
              (coefficient, literals) -> factor[0] = common(factor[0], (long) coefficient));
      return (double) factor[0];
    }

    /** The largest factor of both; the other if one is 0. */
    private static long common(long a, long b) {
      long left = Math.abs(a);
      long right = Math.abs(b);
      while (right != 0) {
        long rest = left % right;
        left = right;
        right = rest;
      }
      return left;
    }

    /** Whether some multiple of the coefficients' common factor keeps the limits. */
    boolean divisible() {
      double divisor = divisor();
      if (step() > 1) {
        return lowest() % (double) common((long) divisor, (long) step()) == 0;
      }
      return Math.ceil(lowest() / divisor) <= Math.floor(highest() / divisor);
    }

    /** Whether every plan keeps the limits. */
    public boolean alwaysKept() {
      boolean within = lowest() <= range.lowest() && range.highest() <= highest();
      return within && (step() == 1 || (range.width() == 0 && violation(range.lowest()) == 0));
    }

    /** By how much the literals' values miss the limits; 0 if they keep them. */
    public double violation(State literals) {
      return violation(terms().value(literals));
    }

    /** By how much a value of {@link #terms()} misses the nearest value that keeps the limits. */
    public double violation(double value) {
      if (step() == 1 || value <= lowest() || value >= highest()) {
        return Math.max(0, Math.max(value - highest(), lowest() - value));
      }
      double beyond = (value - lowest()) % step();
      return Math.min(beyond, step() - beyond);
    }

    /** The most by which any plan can miss the limits; 0 if none can. */
    public double largestViolation() {
      double ends = Math.max(violation(range.lowest()), violation(range.highest()));
      return step() == 1 ? ends : Math.max(ends, Math.floor(step() / 2));
    }

    /** A violation in the condition's own units. */
    public double amount(double violation) {
      return new BigDecimal(violation).multiply(condition.unit()).doubleValue();
    }

    /**
     * What a violation costs; 0 for a required rule. Worked out in decimals and rounded once: ten
     * misses of 0.1, at a cost of 10 each unit, cost 10.
     */
    public double cost(double violation) {
      if (violation == 0 || price.perUnit() == 0) {
        return 0;
      }
      BigDecimal amount = new BigDecimal(violation).multiply(condition.unit());
      BigDecimal counted = price.squared() ? amount.multiply(amount) : amount;
      return counted.multiply(Text.decimal(price.perUnit())).doubleValue();
    }
  }
}
