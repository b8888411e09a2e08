package dev.couplet.model;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Statement.Range;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.IntStream;

/**
 * A count that is the largest or the smallest of some expressions, or at least a bound for them.
 *
 * <p>Rules hold it on one side of all of them. To be the extreme itself, it must also be met by one
 * of them: a choice says by which, and where it is an expression's turn, that one holds the count
 * from the other side.
 *
 * @param count the count
 * @param which the choice by which expression it is met, if it has to be
 * @param exprs the expressions
 * @param sign 1 for the largest, -1 for the smallest
 */
record Extreme(Count count, Optional<Choice<Integer>> which, List<Expr> exprs, int sign) {
  private static final double LIMIT = 0x1p51;

  /** No expression lies beyond the count. */
  Condition beyondAll() {
    List<Condition> sides = new ArrayList<>();
    for (Expr expr : exprs) {
      sides.add(sign > 0 ? expr.atMost(count) : expr.atLeast(count));
    }
    return Condition.all(sides);
  }

  /** The count is no further than the expression whose turn it is. */
  Condition met(Choice<Integer> turn) {
    List<Condition> sides = new ArrayList<>();
    for (int k = 0; k < exprs.size(); k++) {
      Condition side = sign > 0 ? exprs.get(k).atLeast(count) : exprs.get(k).atMost(count);
      sides.add(side.when(turn.is(k)));
    }
    return Condition.all(sides);
  }

  static List<Integer> turns(int exprs) {
    return IntStream.range(0, exprs).boxed().toList();
  }

  /** Works out what a plan by hand leaves open, once all else is set. */
  void fillIn(Plan.Draft draft) {
    double extreme = Double.NEGATIVE_INFINITY;
    int turn = 0;
    for (int k = 0; k < exprs.size(); k++) {
      OptionalDouble number = draft.numberIfSet(exprs.get(k));
      if (number.isEmpty()) {
        return;
      }
      double value = sign * number.getAsDouble();
      turn = value > extreme ? k : turn;
      extreme = Math.max(extreme, value);
    }
    if (draft.isOpen(count)) {
      draft.set(count, (long) (sign * extreme));
    }
    if (which.isPresent() && draft.isOpen(which.get())) {
      draft.set(which.get(), turn);
    }
  }

  /** Between which numbers the largest or smallest of the expressions lies under any plan. */
  static Range range(
      String name, List<Expr> exprs, int sign, int literals, Function<Polynomial, Range> ranges) {
    double lowest = Double.NEGATIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    for (Expr expr : exprs) {
      Range own = ranges.apply(whole(name, expr, literals));
      lowest = Math.max(lowest, sign > 0 ? own.lowest() : -own.highest());
      highest = Math.max(highest, sign > 0 ? own.highest() : -own.lowest());
    }
    return sign > 0 ? new Range(lowest, highest) : new Range(-highest, -lowest);
  }

  private static Polynomial whole(String name, Expr expr, int literals) {
    Polynomial.Builder terms = Polynomial.builder(literals);
    double[] magnitude = {0};
    Expansion.walk(
        expr,
        Arithmetic.DECIMALS,
        (coefficient, product) -> {
          requireWhole(name, coefficient);
          magnitude[0] += Math.abs(coefficient.doubleValue());
          terms.add(coefficient.doubleValue(), product);
        });
    if (magnitude[0] >= LIMIT) {
      throw new IllegalArgumentException(
          "count '" + name + "' is made of numbers beyond 2^51; choose a larger unit");
    }
    return terms.build();
  }

  private static void requireWhole(String name, BigDecimal coefficient) {
    if (coefficient.stripTrailingZeros().scale() > 0) {
      throw new IllegalArgumentException(
          "count '"
              + name
              + "' is made of expressions with the number "
              + Text.number(coefficient.doubleValue())
              + ", it takes whole ones; choose a smaller unit, say by times(100)");
    }
  }
}
