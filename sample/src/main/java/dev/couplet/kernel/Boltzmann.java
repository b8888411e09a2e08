package dev.couplet.kernel;

/**
 * The Boltzmann factor exp(-x) by a table and a short series, the same on every platform: it uses
 * additions and multiplications of doubles alone.
 *
 * <p>With x = (64 q + j) ln 2 / 64 + r, r from 0 to ln 2 / 64, it is 1/2^q times a table entry
 * times the series of exp(-r) to the fourth order. The relative error is at most r^5/120 and
 * rounding: under 2^-39 together.
 */
public final class Boltzmann {
  /** From here on the factor is below 2^-64 and counts as zero. */
  public static final double NEVER = 44.4;

  private static final int CELLS = 64;
  private static final double CELL = StrictMath.log(2) / CELLS;
  private static final double PER_CELL = 1 / CELL;
  private static final double[] POWER = new double[CELLS];

  static {
    for (int j = 0; j < CELLS; j++) {
      POWER[j] = StrictMath.pow(2, -j / (double) CELLS);
    }
  }

  private Boltzmann() {}

  /** exp(-x) for {@code 0 <= x < NEVER}. */
  public static double factor(double x) {
    int cell = (int) (x * PER_CELL);
    double r = x - cell * CELL;
    double series = 1 - r * (1 - r * (0.5 - r * (1.0 / 6 - r * (1.0 / 24))));
    double scale = Double.longBitsToDouble((long) (Double.MAX_EXPONENT - (cell >> 6)) << 52);
    return POWER[cell & CELLS - 1] * series * scale;
  }
}
