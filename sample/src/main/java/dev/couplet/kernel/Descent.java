package dev.couplet.kernel;

/**
 * Descent by single flips: passes over all variables, each flipped if that lowers the energy, until
 * a whole pass flips none. The state is then a local minimum.
 *
 * <p>Where sums of coefficients are not exact, a flip must gain more than 2^-46 of the magnitude of
 * its row: less is rounding, and could go round in circles.
 */
public final class Descent {
  private static final double ROUNDING = 0x1p-46;

  private final LocalFields fields;

  /** Descends from the given state. */
  public Descent(LocalFields fields) {
    this.fields = fields;
  }

  /** Goes down to a local minimum, unless the pace ends it. O(n) a pass, few passes. */
  public void run(Pace pace) {
    boolean fresh = fields.rows().exact() || fields.refresh(pace);
    while (fresh && pass(pace)) {
      // Goes on until a pass flips nothing.
    }
  }

  /** Goes down a little, about 2^19 steps: for a draw that was told to end. */
  public void close() {
    Pace pace = Pace.closing();
    while (pass(pace)) {
      // Goes on until a pass flips nothing, or the steps are spent.
    }
  }

  /** One pass over all variables; whether another is due. */
  private boolean pass(Pace pace) {
    int[] portion = fields.rows().portions();
    boolean flipped = false;
    for (int p = 0; p + 1 < portion.length; p++) {
      long work = pass(portion[p], portion[p + 1]);
      flipped |= work > portion[p + 1] - portion[p];
      if (pace.after(work)) {
        return false;
      }
    }
    return flipped;
  }

  /** One pass over a range; returns its length, more if anything flipped. */
  private long pass(int from, int to) {
    double[] spin = fields.spins();
    double[] field = fields.fields();
    Adjacency rows = fields.rows();
    boolean exact = rows.exact();
    long work = (long) to - from;
    for (int i = from; i < to; i++) {
      double gain = spin[i] * field[i];
      if (gain < 0 && (exact || gain < least(rows, i))) {
        fields.flip(i);
        work += 1 + rows.degree(i);
      }
    }
    return work;
  }

  /** What a flip must at least gain to count where sums are rounded: below 0 by all rounding. */
  static double least(Adjacency rows, int i) {
    return -ROUNDING * rows.magnitude(i);
  }
}
