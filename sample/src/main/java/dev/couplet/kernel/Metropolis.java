package dev.couplet.kernel;

import java.util.Optional;
import java.util.SplittableRandom;

/**
 * Metropolis sweeps over one state: every variable in turn is flipped if that lowers the energy or
 * leaves it, else with probability exp(-gain / temperature).
 *
 * <p>A random number is taken only where the gain is positive and below {@link Boltzmann#NEVER}
 * temperatures, or, in blocks, for each attempt. Source: Metropolis, Rosenbluth, Rosenbluth, Teller
 * and Teller, "Equation of state calculations by fast computing machines" (1953).
 */
public final class Metropolis {
  private final LocalFields fields;
  private final Optional<BlockSweeps> blocks;

  /** Sweeps over the given state, variable after variable. */
  public Metropolis(LocalFields fields) {
    this(fields, SweepOrder.natural(fields.rows()));
  }

  /** Sweeps over the given state in an order; its fields are those of the order's rows. */
  public Metropolis(LocalFields fields, SweepOrder order) {
    this.fields = fields;
    this.blocks = order.inBlocks() ? Optional.of(new BlockSweeps(fields, order)) : Optional.empty();
  }

  /**
   * One sweep at an inverse temperature; false if it was cut short. O(n) attempts, and the degree
   * of each variable that flips.
   */
  public boolean sweep(double inverseTemperature, SplittableRandom random, Pace pace) {
    if (blocks.isPresent()) {
      return blocks.get().sweep(inverseTemperature, random, pace);
    }
    int[] portion = fields.rows().portions();
    for (int p = 0; p + 1 < portion.length; p++) {
      if (pace.after(attempt(portion[p], portion[p + 1], inverseTemperature, random))) {
        return false;
      }
    }
    return true;
  }

  private long attempt(int from, int to, double inverseTemperature, SplittableRandom random) {
    double[] spin = fields.spins();
    double[] field = fields.fields();
    int[] start = fields.rows().start();
    int[] neighbour = fields.rows().neighbour();
    double[] weight = fields.rows().weight();
    long steps = (long) to - from;
    for (int i = from; i < to; i++) {
      double before = spin[i];
      double x = before * field[i] * inverseTemperature;
      if (x > 0
          && (x >= Boltzmann.NEVER
              || (random.nextLong() >>> 11) * 0x1p-53 >= Boltzmann.factor(x))) {
        continue;
      }
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
