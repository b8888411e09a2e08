package dev.couplet.anneal;

import dev.couplet.kernel.Adjacency;
import dev.couplet.sampling.Effort;

/**
 * How many sweeps each draw makes.
 *
 * <p>Draws of one generation make the same number, and each generation twice as many as the one
 * before, from the number of the first on. In a timed run on a large form a generation is a single
 * draw, and the first is so short that something is found soon.
 */
record Sweeps(int first, int generation) {
  private static final int COUNTED = 1000;
  private static final int SHORTEST = 64;
  private static final int DRAWS_A_GENERATION = 16;
  private static final double STEPS = 0x1p30;

  /** More variables than this make a form large. */
  private static final int LARGE = 1 << 14;

  private static final int FIRST_ATTEMPTS = 1 << 24;

  static Sweeps of(Adjacency rows, Effort effort, int batch) {
    if (effort.sweeps().isPresent()) {
      return new Sweeps(effort.sweeps().getAsInt(), Integer.MAX_VALUE);
    }
    if (effort.draws().isEmpty()) {
      return rows.size() > LARGE && batch == 1
          ? new Sweeps(Math.max(1, Math.min(SHORTEST, FIRST_ATTEMPTS / rows.size())), 1)
          : new Sweeps(SHORTEST, Math.max(batch, DRAWS_A_GENERATION));
    }
    double sweep = 1.0 + rows.size() + 2.0 * rows.pairs();
    int fitting = (int) Math.min(COUNTED, STEPS / sweep);
    return new Sweeps(Math.max(SHORTEST, fitting), Integer.MAX_VALUE);
  }

  /** A timed run makes one draw after the other, each twice as long as the one before. */
  static Sweeps ofLadders(Adjacency rows, Effort effort, int replicas) {
    if (effort.sweeps().isPresent()) {
      return new Sweeps(effort.sweeps().getAsInt(), Integer.MAX_VALUE);
    }
    if (effort.draws().isEmpty()) {
      return new Sweeps(SHORTEST, 1);
    }
    double sweep = replicas * (1.0 + rows.size() + 2.0 * rows.pairs());
    return new Sweeps(
        Math.max(SHORTEST, (int) Math.min(COUNTED, STEPS / sweep)), Integer.MAX_VALUE);
  }

  /** The number of sweeps of one draw. */
  int of(int draw) {
    int doublings = draw / generation;
    return doublings >= 30
        ? Integer.MAX_VALUE
        : (int) Math.min(Integer.MAX_VALUE, (long) first << doublings);
  }
}
