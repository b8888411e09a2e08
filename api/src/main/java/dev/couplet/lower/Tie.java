package dev.couplet.lower;

import dev.couplet.form.Polynomial;

/**
 * The penalty that ties an auxiliary bit w to the product x y: {@code P xy - (P + N) (x + y) w + (P
 * + 2N) w}.
 *
 * <p>It carries {@code w Q}, with Q any function of other bits, where {@code x y Q} stood before.
 * Let P be at least the sum of Q's positive coefficients and N that of the magnitudes of its
 * negative ones, so that {@code -N <= Q <= P}. Then the minimum over w of {@code w Q + penalty} is
 * {@code x y Q} for every pattern:
 *
 * <ul>
 *   <li>x = y = 1: w = 1 gives {@code Q + P - 2 (P + N) + P + 2N = Q}; w = 0 gives P, not less
 *   <li>x + y = 1: w = 0 gives 0; w = 1 gives {@code Q + N}, not less
 *   <li>x = y = 0: w = 0 gives 0; w = 1 gives {@code Q + P + 2N}, not less
 * </ul>
 *
 * <p>So w = x y is always best. With P = N it is the penalty {@code M (xy - 2xw - 2yw + 3w)} of
 * Rosenberg, "Reduction of bivalent maximization to the quadratic case" (1975); apart they keep it
 * as small as the signs allow: {@code (x - w) (y - w)} where no coefficient is negative.
 */
final class Tie {
  /** The spare digits that bounds are rounded up to where coefficients are not whole. */
  private static final int DIGITS = 20;

  private double positive;
  private double negative;

  /** Takes in a coefficient of Q. */
  void carry(double coefficient) {
    positive += Math.max(0, coefficient);
    negative += Math.max(0, -coefficient);
  }

  /** Adds the penalty. */
  void addTo(Polynomial.Builder terms, int x, int y, int w) {
    double p = rounded(positive);
    double n = rounded(negative);
    terms.add(p, x, y).add(-(p + n), x, w).add(-(p + n), y, w).add(p + 2 * n, w);
  }

  /** Not less, with so few digits that the penalty vanishes exactly at w = x y. */
  private double rounded(double bound) {
    double larger = Math.max(positive, negative);
    if (bound == Math.rint(bound) && larger == Math.rint(larger)) {
      return bound;
    }
    double step = Math.scalb(1.0, Math.getExponent(larger) - DIGITS);
    return Math.ceil(bound / step) * step;
  }
}
