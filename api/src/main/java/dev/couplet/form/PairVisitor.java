package dev.couplet.form;

/** Receives the pairs of a quadratic form, one at a time, rows ascending, then columns. */
@FunctionalInterface
public interface PairVisitor {
  /**
   * Receives one pair.
   *
   * @param i the lower variable
   * @param j the higher variable
   * @param value the coefficient of their product
   */
  void visit(int i, int j, double value);
}
