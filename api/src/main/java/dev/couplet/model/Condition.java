package dev.couplet.model;

import java.util.List;
import java.util.stream.Collectors;

/**
 * A statement about a plan that may hold or not: an expression lies between two limits, or several
 * do.
 *
 * <p>It has no name, and no effect until a {@link Model} requires or prefers it. Immutable.
 */
public final class Condition {
  /**
   * One expression between its limits.
   *
   * @param expr the expression
   * @param lowest the lower limit, or minus infinity
   * @param highest the upper limit, or infinity
   * @param step above 0, the values that count lie on {@code lowest + k step}; 0 if all do
   */
  record Part(Expr expr, double lowest, double highest, double step) {
    @Override
    public String toString() {
      String text = Text.between(expr.toString(), lowest, highest);
      return step == 0 ? text : text + " in steps of " + Text.number(step);
    }
  }

  private static final int SHOWN = 4;

  private final List<Part> parts;

  Condition(List<Part> parts) {
    this.parts = List.copyOf(parts);
  }

  static Condition between(Expr expr, double lowest, double highest) {
    return new Condition(List.of(new Part(expr, lowest, highest, 0)));
  }

  List<Part> parts() {
    return parts;
  }

  @Override
  public String toString() {
    String text = parts.stream().limit(SHOWN).map(Part::toString).collect(Collectors.joining(", "));
    return parts.size() > SHOWN ? text + ", ... " + (parts.size() - SHOWN) + " more" : text;
  }
}
