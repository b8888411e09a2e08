package dev.couplet.kernel;

import dev.couplet.form.State;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;

/**
 * Metropolis sweeps over 64 states at once, one in each bit of a word.
 *
 * <p>Gains are sums of bits times small weights, in words: digit b of the gains of all 64 states
 * lies in one word, in two's complement, and is summed by the logic of an adder ({@link
 * ReplicaGains}). A positive gain d with the binary digits d_b is accepted if, for every digit that
 * is 1, a bit that is 1 with probability exp(-2^b h / T) is 1; those are independent, so the
 * product of their probabilities is exp(-d h / T), as it should be. h is the half step of the
 * {@link ReplicaRows}.
 *
 * <p>The bits of different states never meet: each state makes the moves that it would make alone,
 * with random bits of its own ({@link ReplicaNoise}). Source of the way of computing: Jacobs and
 * Rebbi, "Multi-spin coding" (1981), from memory, with random numbers of its own for every state.
 */
public final class ReplicaSweeps {
  private final ReplicaRows rows;
  private final long[] spins;
  private final ReplicaGains gains;
  private final ReplicaNoise noise;
  private final long[] bits;
  private final long[] accepted;

  /** Begins with the given states, at most 64. */
  public ReplicaSweeps(ReplicaRows rows, List<State> states, SplittableRandom random) {
    this.rows = rows;
    this.spins = new long[2 * rows.size()];
    this.gains = new ReplicaGains(rows, spins);
    int longest = rows.longestBlock();
    this.bits = new long[longest];
    this.accepted = new long[longest];
    this.noise = new ReplicaNoise(longest, random);
    long[] variables = BitMatrix.fromStates(states, rows.size());
    int[] order = rows.order();
    for (int p = 0; p < order.length; p++) {
      spins[p] = variables[order[p]];
      spins[order.length + p] = ~spins[p];
    }
  }

  /** One sweep of every state at an inverse temperature; false if it was cut short. */
  public boolean sweep(double inverseTemperature, Pace pace) {
    double[] probability = new double[rows.gainDigits() + 1];
    for (int b = 0; b < probability.length; b++) {
      probability[b] = StrictMath.exp(-inverseTemperature * rows.half() * (1 << b));
    }
    for (ReplicaBlock block : rows.blocks()) {
      gains.sum(block);
      accept(block, probability);
      gains.flip(block, accepted);
      if (pace.after(steps(block))) {
        return false;
      }
    }
    return true;
  }

  private void accept(ReplicaBlock block, double[] probability) {
    int length = block.length;
    Arrays.fill(accepted, 0, length, -1);
    if (rows.halves()) {
      noise.fill(bits, probability[0], length);
      WordLoops.accept(accepted, gains.halves(block), bits, length);
    }
    for (int b = 0; b < rows.gainDigits(); b++) {
      noise.fill(bits, probability[b + 1], length);
      WordLoops.accept(accepted, gains.digit(b), bits, length);
    }
  }

  /** Brings every state to a local minimum by flips that lower its energy, unless cut short. */
  public void descend(Pace pace) {
    Arrays.fill(accepted, 0);
    for (boolean lowered = true; lowered; ) {
      lowered = false;
      for (ReplicaBlock block : rows.blocks()) {
        gains.sum(block);
        lowered |= gains.anyBelowZero(block);
        gains.flip(block, accepted);
        if (pace.after(steps(block))) {
          return;
        }
      }
    }
  }

  /**
   * Every attempt counts, and a neighbour once for all states, since it is read for all at once.
   */
  private static long steps(ReplicaBlock block) {
    return (long) block.length * (Long.SIZE + block.place.length);
  }

  /** The first {@code count} states as they are now. */
  public List<State> states(int count) {
    long[] variables = new long[rows.size()];
    int[] order = rows.order();
    for (int p = 0; p < order.length; p++) {
      variables[order[p]] = spins[p];
    }
    return BitMatrix.toStates(variables, count);
  }
}
