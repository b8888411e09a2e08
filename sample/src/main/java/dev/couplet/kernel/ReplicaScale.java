package dev.couplet.kernel;

/**
 * The step in which gains are counted.
 *
 * @param half half a step: it divides all linear coefficients, a whole one all weights; 0 if
 *     coefficients are not integers, or all are zero
 * @param largestGain no gain is more steps than this, up or down
 * @param largestWeight no weight is more steps than this
 */
record ReplicaScale(double half, int largestGain, int largestWeight) {
  private static final double WHOLE = 0x1p31;

  static ReplicaScale of(Adjacency rows) {
    double half = half(rows);
    if (half == 0) {
      return new ReplicaScale(0, 0, 0);
    }
    double gain = 0;
    double weight = 0;
    for (int i = 0; i < rows.size(); i++) {
      double low = rows.linear()[i];
      double high = low;
      for (int k = rows.start()[i]; k < rows.start()[i + 1]; k++) {
        low += Math.min(0, rows.weight()[k]);
        high += Math.max(0, rows.weight()[k]);
        weight = Math.max(weight, Math.abs(rows.weight()[k]));
      }
      gain = Math.max(gain, Math.max(Math.abs(low), Math.abs(high)));
    }
    // A gain of a half step rounds down to none; below zero, to a whole one, which the sign covers.
    return new ReplicaScale(half, whole(gain / half), whole(weight / half));
  }

  private static int whole(double halves) {
    return (int) Math.min(WHOLE - 1, halves) / 2;
  }

  private static double half(Adjacency rows) {
    long weights = divisor(0, rows.weight());
    long all = weights < 0 ? -1 : divisor(weights, rows.linear());
    if (all <= 0) {
      return 0;
    }
    boolean whole = weights % (2 * all) == 0;
    return whole ? all : all / 2.0;
  }

  /** The common divisor, or -1 if a value is not a whole number, or too large. */
  private static long divisor(long first, double[] values) {
    long divisor = first;
    for (double value : values) {
      if (value != Math.rint(value) || Math.abs(value) >= WHOLE) {
        return -1;
      }
      if (divisor != 1) {
        divisor = divisor(divisor, Math.abs((long) value));
      }
    }
    return divisor;
  }

  private static long divisor(long a, long b) {
    long x = a;
    long y = b;
    while (y != 0) {
      long rest = x % y;
      x = y;
      y = rest;
    }
    return x;
  }
}
