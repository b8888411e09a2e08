package dev.couplet.audit;

import dev.couplet.form.Polynomial;

/** Whether two polynomials have the same coefficients, up to what rounding can make of them. */
final class Agreement {
  private Agreement() {}

  /** Equal where all numbers are whole; else no coefficient may be off by more than rounding. */
  static boolean of(Polynomial a, Polynomial b) {
    if (a.equals(b)) {
      return true;
    }
    double magnitude = a.magnitude() + b.magnitude();
    if (a.whole() && b.whole() && magnitude < 0x1p53) {
      return false;
    }
    double error = Math.ulp(magnitude) * (a.terms() + b.terms() + 1);
    Polynomial difference = Polynomial.builder(a.size()).add(a, 1).add(b, -1).build();
    boolean[] close = {true};
    difference.forEachTerm((coefficient, variables) -> close[0] &= Math.abs(coefficient) <= error);
    return close[0];
  }
}
