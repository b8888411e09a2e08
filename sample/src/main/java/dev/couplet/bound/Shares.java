package dev.couplet.bound;

import dev.couplet.sampling.Vigil;

/**
 * How the pairs of a form are shared out between their ends.
 *
 * <p>Invariant: {@code own[i]} is the linear coefficient of i plus the shares its pairs gave it,
 * and pair p stands for {@code b x y - left x - right y}. The sum of all is the form, whatever the
 * shares. No number here exceeds four times the sum of the form's magnitudes.
 */
final class Shares {
  private static final int LOOK_EVERY = 1 << 16;

  private final ScaledForm form;
  private final long[] own;
  private final long[] left;
  private final long[] right;

  /**
   * Negative pairs are split evenly, the others not at all; nor is what the run has no time for.
   */
  Shares(ScaledForm form, Vigil vigil) {
    this.form = form;
    own = form.linear.clone();
    left = new long[form.pair.length];
    right = new long[form.pair.length];
    for (int p = 0; p < left.length && !((p + 1) % LOOK_EVERY == 0 && vigil.over()); p++) {
      long value = form.pair[p];
      if (value < 0) {
        give(p, value / 2, value - value / 2);
      }
    }
  }

  private void give(int p, long toFirst, long toSecond) {
    own[form.first[p]] += toFirst - left[p];
    own[form.second[p]] += toSecond - right[p];
    left[p] = toFirst;
    right[p] = toSecond;
  }

  /** The sum of all minima: a lower bound on the form's energies in whole numbers. */
  long bound() {
    long sum = form.constant;
    for (long value : own) {
      sum += Math.min(0, value);
    }
    for (int p = 0; p < left.length; p++) {
      long none = Math.min(0, form.pair[p] - left[p] - right[p]);
      sum += Math.min(none, Math.min(-left[p], -right[p]));
    }
    return sum;
  }

  /** Improves every pair's shares once, in ascending or descending order; false if cut short. */
  boolean improve(boolean ascending, Vigil vigil) {
    int pairs = left.length;
    for (int k = 0; k < pairs; k++) {
      if (k % LOOK_EVERY == 0 && vigil.over()) {
        return false;
      }
      improve(ascending ? k : pairs - 1 - k);
    }
    return true;
  }

  /**
   * Gives each end of a pair half of what the pair and both ends together prefer it to be.
   *
   * <p>Shares stay between 0 and the coefficient: beyond that they only move what the pair cannot
   * carry.
   */
  private void improve(int p) {
    long value = form.pair[p];
    long x = own[form.first[p]] - left[p];
    long y = own[form.second[p]] - right[p];
    long wishX = x + Math.min(0, y + value) - Math.min(0, y);
    long wishY = y + Math.min(0, x + value) - Math.min(0, x);
    give(p, clamp(wishX / 2 - x, value), clamp(wishY / 2 - y, value));
  }

  private static long clamp(long share, long value) {
    return Math.max(Math.min(0, value), Math.min(share, Math.max(0, value)));
  }
}
