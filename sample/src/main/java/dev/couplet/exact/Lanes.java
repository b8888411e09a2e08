package dev.couplet.exact;

/**
 * The inner loops of the enumeration, over one block of energies: element by element on primitive
 * arrays, without a branch, so that the compiler turns them into vector instructions.
 */
final class Lanes {
  private Lanes() {}

  /** {@code to[j] = from[j] + step[j] + shift}. */
  static void add(double[] from, double[] step, double shift, double[] to) {
    for (int j = 0; j < to.length; j++) {
      to[j] = from[j] + (step[j] + shift);
    }
  }

  /**
   * Lowers {@code least[j]} to the lesser of {@code energy[j]} and {@code energy[j] + step[j] +
   * shift}: two states at the price of one.
   */
  static void lower(double[] energy, double[] step, double shift, double[] least) {
    for (int j = 0; j < least.length; j++) {
      double gain = Math.min(0, step[j] + shift);
      least[j] = Math.min(least[j], energy[j] + gain);
    }
  }
}
