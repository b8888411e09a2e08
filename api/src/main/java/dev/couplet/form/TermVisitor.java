package dev.couplet.form;

/** Receives the terms of a polynomial, one at a time, in the polynomial's order. */
@FunctionalInterface
public interface TermVisitor {
  /**
   * Receives one term.
   *
   * @param coefficient what the product is multiplied by
   * @param variables the variables of the product, ascending, a new array; none for the constant
   */
  void visit(double coefficient, int[] variables);
}
