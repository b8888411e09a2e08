package dev.couplet.kernel;

import java.util.SplittableRandom;

/**
 * Moves of two states of one form at once that keep the sum of their energies: a connected cluster
 * of variables in which they differ trades its values between them.
 *
 * <p>In such a cluster each state is the complement of the other, and around it the two agree: so
 * the trade changes both by opposite amounts. Every variable of a cluster is as likely to be picked
 * before the trade as after, so that no such move needs to be refused. Belongs to one thread.
 *
 * <p>Sources: Houdayer, "A cluster Monte Carlo algorithm for 2-dimensional spin glasses" (2001);
 * Zhu, Ochoa and Katzgraber, "Efficient cluster algorithm for spin glasses in any space dimension"
 * (2015).
 */
public final class ClusterMoves {
  /** Picks of a variable before a move is given up, since the states hardly differ. */
  private static final int PICKS = 64;

  private final Adjacency rows;
  private final int[] seen;
  private final int[] queue;
  private int moves;

  /** Moves of states of a form. */
  public ClusterMoves(Adjacency rows) {
    this.rows = rows;
    this.seen = new int[rows.size()];
    this.queue = new int[rows.size()];
  }

  /**
   * One move; O(n + m) at most.
   *
   * @return the steps taken, 0 if no variable was found in which the states differ
   */
  public long trade(LocalFields one, LocalFields two, SplittableRandom random) {
    int first = pick(one.spins(), two.spins(), random);
    if (first < 0) {
      return 0;
    }
    int size = grow(first, one.spins(), two.spins());
    long steps = 0;
    for (int q = 0; q < size; q++) {
      one.flip(queue[q]);
      two.flip(queue[q]);
      steps += 1 + 3L * rows.degree(queue[q]);
    }
    return steps;
  }

  private static int pick(double[] one, double[] two, SplittableRandom random) {
    for (int k = 0; k < PICKS && one.length > 0; k++) {
      int i = random.nextInt(one.length);
      if (one[i] != two[i]) {
        return i;
      }
    }
    return -1;
  }

  /** Fills the queue with all that is connected to the first by variables that differ. */
  private int grow(int first, double[] one, double[] two) {
    int mark = ++moves;
    seen[first] = mark;
    queue[0] = first;
    int end = 1;
    for (int q = 0; q < end; q++) {
      int i = queue[q];
      for (int k = rows.start()[i]; k < rows.start()[i + 1]; k++) {
        int j = rows.neighbour()[k];
        if (seen[j] != mark && one[j] != two[j]) {
          seen[j] = mark;
          queue[end++] = j;
        }
      }
    }
    return end;
  }
}
