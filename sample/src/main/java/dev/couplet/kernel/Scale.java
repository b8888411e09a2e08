package dev.couplet.kernel;

import dev.couplet.form.Qubo;

/**
 * How the coefficients of a form become whole numbers: multiplied by 2^exponent, then rounded.
 *
 * @param exponent the largest that keeps every local field below 2^28, and no larger than integer
 *     coefficients need
 * @param exact whether nothing is rounded
 * @param largest the largest magnitude of a pair, as a whole number
 * @param zeros how often every pair can be halved, as a whole number; at most 24
 */
record Scale(int exponent, boolean exact, int largest, int zeros) {
  private static final int FIELD_BITS = 27;
  private static final int MOST_ZEROS = 24;
  private static final Scale UNKNOWN = new Scale(0, false, 0, 0);

  /** The scale of a form; of no use if the pace ends before it is found. */
  static Scale of(Qubo form, Pace pace) {
    double[] magnitude = new double[form.size()];
    boolean[] whole = {true};
    for (int i = 0; i < magnitude.length; i++) {
      magnitude[i] = Math.abs(form.linear(i));
      whole[0] &= form.linear(i) == Math.rint(form.linear(i));
    }
    boolean summed =
        form.forEachPairUntil(
            pace::look,
            (i, j, value) -> {
              magnitude[i] += Math.abs(value);
              magnitude[j] += Math.abs(value);
              whole[0] &= value == Math.rint(value);
            });
    if (!summed) {
      return UNKNOWN;
    }
    double field = 0;
    for (double sum : magnitude) {
      field = Math.max(field, sum);
    }
    int fitting = field == 0 ? 0 : FIELD_BITS - 1 - Math.getExponent(field);
    return measured(form, whole[0] ? Math.min(0, fitting) : fitting, pace);
  }

  private static Scale measured(Qubo form, int exponent, Pace pace) {
    Scale bare = new Scale(exponent, false, 0, 0);
    int[] seen = {0, 0};
    boolean[] exact = {true};
    for (int i = 0; i < form.size(); i++) {
      exact[0] &= bare.keeps(form.linear(i));
    }
    boolean measured =
        form.forEachPairUntil(
            pace::look,
            (i, j, value) -> {
              int number = bare.whole(value);
              seen[0] = Math.max(seen[0], Math.abs(number));
              seen[1] |= number;
              exact[0] &= bare.keeps(value);
            });
    if (!measured) {
      return UNKNOWN;
    }
    int zeros = Math.min(MOST_ZEROS, Integer.numberOfTrailingZeros(seen[1]));
    return new Scale(exponent, exact[0], seen[0], zeros);
  }

  /** A coefficient as a whole number. */
  int whole(double value) {
    return (int) Math.rint(Math.scalb(value, exponent));
  }

  private boolean keeps(double value) {
    return Math.scalb((double) whole(value), -exponent) == value;
  }
}
