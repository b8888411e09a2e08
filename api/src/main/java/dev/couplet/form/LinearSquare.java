package dev.couplet.form;

/**
 * The square of a linear polynomial, term by term in the order of the result. Each sum runs in the
 * order in which all pairs of terms would be formed, so that it rounds in the same way.
 */
final class LinearSquare {
  private LinearSquare() {}

  static Polynomial of(Polynomial linear) {
    double constant = linear.constant();
    int first = constant == 0 ? 0 : 1;
    int count = linear.terms() - first;
    Polynomial.Builder square = Polynomial.builder(linear.size());
    square.reserveProducts(count);
    square.add(constant * constant);
    for (int k = first; k < first + count; k++) {
      double one = linear.coefficientAt(k);
      square.add(constant * one + one * constant + one * one, linear.variableAt(k));
    }
    for (int k = first; k < first + count; k++) {
      double one = linear.coefficientAt(k);
      for (int m = k + 1; m < first + count; m++) {
        double product = one * linear.coefficientAt(m);
        square.add(product + product, linear.variableAt(k), linear.variableAt(m));
      }
    }
    return square.build();
  }
}
