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
  private final int[] portion;
  private final double[] least;

  /** Descends from the given state. */
  public Descent(LocalFields fields) {
    Adjacency rows = fields.rows();
    this.fields = fields;
    this.portion = Portions.of(rows);
    this.least = new double[rows.size()];
    for (int i = 0; !rows.exact() && i < least.length; i++) {
      least[i] = -ROUNDING * rows.magnitude(i);
    }
  }

  /** What a change of several variables must at least gain to count: below 0 by all rounding. */
  public double least() {
    double sum = 0;
    for (double own : least) {
      sum = Math.min(sum, own);
    }
    return 2 * sum;
  }

  /** Goes down to a local minimum, unless the pace ends it. O(n) a pass, few passes. */
  public void run(Pace pace) {
    if (!fields.rows().exact()) {
      fields.refresh();
    }
    for (boolean flipped = true; flipped; ) {
      flipped = false;
      for (int p = 0; p + 1 < portion.length; p++) {
        long work = pass(portion[p], portion[p + 1]);
        flipped |= work > portion[p + 1] - portion[p];
        if (pace.after(work)) {
          return;
        }
      }
    }
  }

  /** One pass over a range; returns its length, more if anything flipped. */
  private long pass(int from, int to) {
    double[] spin = fields.spins();
    double[] field = fields.fields();
    long work = (long) to - from;
    for (int i = from; i < to; i++) {
      if (spin[i] * field[i] < least[i]) {
        fields.flip(i);
        work += 1 + fields.rows().degree(i);
      }
    }
    return work;
  }
}
