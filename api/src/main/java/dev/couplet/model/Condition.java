package dev.couplet.model;

/**
 * A statement about a plan that may hold or not: an expression lies between two limits.
 *
 * <p>It has no name, and no effect until a {@link Model} requires or prefers it. Immutable.
 */
public final class Condition {
  private final Expr expr;
  private final double lowest;
  private final double highest;

  Condition(Expr expr, double lowest, double highest) {
    this.expr = expr;
    this.lowest = lowest;
    this.highest = highest;
  }

  Expr expr() {
    return expr;
  }

  double lowest() {
    return lowest;
  }

  double highest() {
    return highest;
  }

  @Override
  public String toString() {
    return Text.between(expr.toString(), lowest, highest);
  }
}
