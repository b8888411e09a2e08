package dev.couplet.kernel;

/**
 * The step in which gains are counted.
 *
 * @param half half a step: it divides all linear coefficients, a whole one all weights; 0 if
 *     coefficients are not integers, or all are zero
 * @param largestGain no gain is more steps than this, up or down
 * @param largestWeight no weight is more steps than this
 * @param odd whether any linear coefficient, and so any gain, is not a whole number of steps
 */
record ReplicaScale(double half, int largestGain, int largestWeight, boolean odd) {
  private static final double WHOLE = 0x1p31;

  /** The step of a form; of no use if the pace ends before it is found. */
  static ReplicaScale of(Adjacency rows, Pace pace) {
    double half = half(rows, pace);
    if (half == 0) {
      return new ReplicaScale(0, 0, 0, false);
    }
    double gain = 0;
    double weight = 0;
    boolean odd = false;
    for (int i = 0; i < rows.size() && !pace.after(1L + rows.degree(i)); i++) {
      double low = rows.linear()[i];
      double high = low;
      odd |= (long) (low / half) % 2 != 0;
      for (int k = rows.start()[i]; k < rows.start()[i + 1]; k++) {
        low += Math.min(0, rows.weight()[k]);
        high += Math.max(0, rows.weight()[k]);
        weight = Math.max(weight, Math.abs(rows.weight()[k]));
      }
      gain = Math.max(gain, Math.max(Math.abs(low), Math.abs(high)));
    }
    // A gain of a half step rounds down to none; below zero, to a whole one, which the sign covers.
    return new ReplicaScale(half, whole(gain / half), whole(weight / half), odd);
  }

  private static int whole(double halves) {
    return (int) Math.min(WHOLE - 1, halves) / 2;
  }

  private static double half(Adjacency rows, Pace pace) {
    long weights = divisor(0, rows.weight(), pace);
    long all = weights < 0 ? -1 : divisor(weights, rows.linear(), pace);
    if (all <= 0) {
      return 0;
    }
    boolean whole = weights % (2 * all) == 0;
    return whole ? all : all / 2.0;
  }

  /** The common divisor, or -1 if a value is not a whole number, or too large. */
  private static long divisor(long first, double[] values, Pace pace) {
    long divisor = first;
    for (double value : values) {
      if (value != Math.rint(value) || Math.abs(value) >= WHOLE || pace.after(1)) {
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
