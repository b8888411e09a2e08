package dev.couplet.audit;

/** The lowest value of a quadratic form in a few bits, as a function of its linear coefficients. */
@FunctionalInterface
interface Minimum {
  /** The lowest value when so much is added to the linear coefficients. */
  double of(double[] change);

  /** A way to find it that is exact and suits the form; {@code pair} is symmetric. */
  static Minimum of(double[] base, double[][] pair) {
    Lowest search = new Lowest(base, pair);
    return base.length <= 8 ? search : LowestSquare.of(base, pair, search);
  }
}
