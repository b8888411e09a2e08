package dev.couplet.lower;

/** A term of degree 3 or more of one of the sources. */
final class Product {
  private final int source;
  private final double coefficient;
  private final int[] variables;

  /** The number of the source, the coefficient as it stands there, the variables ascending. */
  Product(int source, double coefficient, int[] variables) {
    this.source = source;
    this.coefficient = coefficient;
    this.variables = variables;
  }

  int source() {
    return source;
  }

  /** Not yet multiplied by the source's factor. */
  double coefficient() {
    return coefficient;
  }

  int[] variables() {
    return variables;
  }
}
