package dev.couplet.kernel;

import java.util.SplittableRandom;

/**
 * Metropolis sweeps over one state, block by block of a {@link SweepOrder}: first all attempts of a
 * block are decided, without a branch that depends on the outcome, then what was accepted flips.
 * Variables of a block have no pairs among them: so that is a sweep in the order of the blocks.
 *
 * <p>A flip that costs x temperatures is accepted if x lies below an exponential random number, -ln
 * u. Of u its first eight bits are drawn first, eight such bytes from one random word: they tell in
 * which of 256 cells of equal probability the number lies. Below the cell x is accepted, above it
 * is not; within it, once in 256 times, the rest of u is drawn and decides, by the {@link
 * Boltzmann} factor of x.
 */
final class BlockSweeps {
  private static final int CELLS = 256;

  /** {@code EDGE[c] = -ln(c / 256)}: cell c reaches from EDGE[c + 1] up to EDGE[c]. */
  private static final double[] EDGE = new double[CELLS + 1];

  static {
    EDGE[0] = Boltzmann.NEVER;
    for (int c = 1; c <= CELLS; c++) {
      EDGE[c] = -StrictMath.log(c / (double) CELLS);
    }
  }

  private final LocalFields fields;
  private final int[] bounds;
  private final int[] accepted = new int[SweepOrder.BLOCK + 1];

  BlockSweeps(LocalFields fields, SweepOrder blocks) {
    this.fields = fields;
    this.bounds = blocks.bounds();
  }

  boolean sweep(double inverseTemperature, SplittableRandom random, Pace pace) {
    for (int b = 0; b + 1 < bounds.length; b++) {
      long steps = flip(decide(bounds[b], bounds[b + 1], inverseTemperature, random));
      if (pace.after(bounds[b + 1] - bounds[b] + steps)) {
        return false;
      }
    }
    return true;
  }

  /** Lists the places of a block that are to flip; returns how many. */
  private int decide(int from, int to, double inverseTemperature, SplittableRandom random) {
    double[] spin = fields.spins();
    double[] field = fields.fields();
    int[] list = accepted;
    int count = 0;
    for (int p = from; p < to; ) {
      long bytes = random.nextLong();
      for (int end = Math.min(to, p + Long.BYTES); p < end; p++, bytes >>>= Byte.SIZE) {
        double x = spin[p] * field[p] * inverseTemperature;
        int cell = (int) bytes & CELLS - 1;
        // The sign bits of the differences: 1 if x lies below the cell, and below its end.
        int below = (int) (Double.doubleToRawLongBits(x - EDGE[cell + 1]) >>> 63);
        int belowEnd = (int) (Double.doubleToRawLongBits(x - EDGE[cell]) >>> 63);
        list[count] = p;
        count += below == belowEnd ? below : within(x, cell, random);
      }
    }
    return count;
  }

  private static int within(double x, int cell, SplittableRandom random) {
    double u = (cell + (random.nextLong() >>> 11) * 0x1p-53) / CELLS;
    return u < Boltzmann.factor(x) ? 1 : 0;
  }

  private long flip(int count) {
    double[] spin = fields.spins();
    double[] field = fields.fields();
    int[] start = fields.rows().start();
    int[] neighbour = fields.rows().neighbour();
    double[] weight = fields.rows().weight();
    long steps = 0;
    for (int a = 0; a < count; a++) {
      int i = accepted[a];
      double before = spin[i];
      spin[i] = -before;
      int end = start[i + 1];
      steps += end - start[i];
      for (int k = start[i]; k < end; k++) {
        field[neighbour[k]] += weight[k] * before;
      }
    }
    return steps;
  }
}
