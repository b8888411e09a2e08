package dev.couplet.lower;

/** An auxiliary bit in the place of a product of two bits before it, in some longer products. */
final class Substitution {
  private final int x;
  private final int y;
  private final int[] carriers;

  /** The two bits, the lower one first, and the numbers of the products. */
  Substitution(int x, int y, int... carriers) {
    this.x = x;
    this.y = y;
    this.carriers = carriers;
  }

  int x() {
    return x;
  }

  int y() {
    return y;
  }

  int[] carriers() {
    return carriers;
  }
}
