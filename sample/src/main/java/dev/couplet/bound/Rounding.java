package dev.couplet.bound;

import dev.couplet.form.Qubo;

/**
 * How far computed energies can be from the true ones.
 *
 * <p>A sum of terms in which each term passes through at most k additions has an error of at most
 * {@code k u / (1 - k u)} times the sum of the magnitudes, u = 2^-53 (Higham, Accuracy and
 * Stability of Numerical Algorithms, 2002, section 4.2).
 */
public final class Rounding {
  private static final double UNIT = 0x1p-53;

  private Rounding() {}

  /**
   * The largest error of any energy of the form, as {@link Qubo#value} computes it: 0 if the form
   * is exact; O(n + m).
   */
  public static double ofEnergy(Qubo form) {
    return ofSums(form, (long) form.size() + form.pairs() + 1);
  }

  /**
   * The largest error of a sum of coefficients of the form, each used at most once, in which no
   * coefficient passes through more than {@code additions} additions: 0 if the form is exact.
   */
  public static double ofSums(Qubo form, long additions) {
    if (form.exact()) {
      return 0;
    }
    // The magnitude is itself a rounded sum, hence the factor; below the normal range sums are
    // exact.
    double terms = (double) additions + 2;
    return terms * UNIT * 1.01 * form.magnitude();
  }
}
