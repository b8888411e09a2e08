package dev.couplet.model;

import dev.couplet.form.Polynomial;
import dev.couplet.model.Statement.Range;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;

/**
 * A condition that matters only where its guards hold, as limits that every plan keeps elsewhere.
 *
 * <p>Let H be the highest value of the terms. Then {@code terms <= highest} where g holds is {@code
 * terms + (H - highest) g <= H}; missed, where g holds, by as much as before. With several guards
 * {@code terms + (H - highest) (g1 + .. + gk) <= highest + k (H - highest)} says the same. The
 * lower limit likewise; a condition with both becomes two.
 */
final class Relaxed {
  private final String rule;
  private final ScaledCondition condition;
  private final Polynomial guards;
  private final double held;

  private Relaxed(String rule, ScaledCondition condition, List<Literal> guards) {
    this.rule = rule;
    this.condition = condition;
    List<? extends Expr> needed =
        Literal.allOf(guards) instanceof Compound all && all.kind() == Compound.Kind.ALL
            ? all.parts()
            : List.of(Literal.allOf(guards));
    double[] constant = {0};
    Polynomial.Builder sum = Polynomial.builder(condition.terms().size());
    Expansion.walk(
        Expr.sum(needed),
        Arithmetic.DOUBLES,
        (coefficient, product) -> {
          if (product.length == 0) {
            constant[0] += coefficient;
          } else {
            sum.add(coefficient, product);
          }
        });
    this.guards = sum.build();
    this.held = needed.size() - constant[0];
  }

  /** The conditions, one or two, that say the same without guards. */
  static List<ScaledCondition> of(
      String rule,
      ScaledCondition condition,
      List<Literal> guards,
      Function<Polynomial, Range> ranges) {
    if (guards.isEmpty()) {
      return List.of(condition);
    }
    Relaxed relaxed = new Relaxed(rule, condition, guards);
    Range range = ranges.apply(condition.terms());
    List<ScaledCondition> sides = new ArrayList<>(2);
    if (condition.highest() < range.highest() || condition.lowest() <= range.lowest()) {
      double room = Math.max(0, range.highest() - condition.highest());
      sides.add(relaxed.side(room, Double.NEGATIVE_INFINITY, condition.highest()));
    }
    if (condition.lowest() > range.lowest()) {
      double room = condition.lowest() - range.lowest();
      sides.add(relaxed.side(-room, condition.lowest(), Double.POSITIVE_INFINITY));
    }
    return sides;
  }

  private ScaledCondition side(double room, double lowest, double highest) {
    Polynomial.Builder sum = Polynomial.builder(guards.size()).add(condition.terms(), 1);
    sum.add(guards, room);
    double[] magnitude = {Math.abs(room * held)};
    condition.terms().forEachTerm((coefficient, product) -> magnitude[0] += Math.abs(coefficient));
    guards.forEachTerm((coefficient, product) -> magnitude[0] += Math.abs(room * coefficient));
    ScaledCondition.requireExact(rule, new BigDecimal(magnitude[0]));
    return new ScaledCondition(
            sum.build(), lowest + room * held, highest + room * held, 1, condition.unit())
        .reduced();
  }
}
