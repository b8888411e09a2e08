package dev.couplet.kernel;

import dev.couplet.sampling.Structure;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;

/**
 * Moves within exactly-one sets: the bit that is 1 changes places with one that is 0, in one step,
 * so that the state never leaves the code and the penalty between the two never has to be climbed.
 *
 * <p>A move from i to j changes the energy by {@code field[j] - field[i] - b_ij}. Sets of which not
 * exactly one bit is 1 are left to single flips. Memory: one double for each two bits of a set;
 * sets of more than {@value #LARGEST} bits are left out.
 */
public final class Reassignment {
  private static final int LARGEST = 1 << 11;

  private final LocalFields fields;
  private final int[][] sets;
  private final double[][] between;
  private final long work;

  /** Moves of the given state within the sets of a structure. */
  public Reassignment(LocalFields fields, Structure structure) {
    this.fields = fields;
    List<int[]> kept = new ArrayList<>();
    for (List<Integer> set : structure.exactlyOne()) {
      if (set.size() > 1 && set.size() <= LARGEST) {
        kept.add(set.stream().mapToInt(Integer::intValue).toArray());
      }
    }
    this.sets = kept.toArray(new int[0][]);
    this.between = new double[sets.length][];
    long degrees = 0;
    for (int s = 0; s < sets.length; s++) {
      between[s] = between(fields.rows(), sets[s]);
      degrees += sets[s].length + 2L * fields.rows().degree(sets[s][0]);
    }
    this.work = degrees;
  }

  private static double[] between(Adjacency rows, int[] set) {
    double[] pairs = new double[set.length * set.length];
    for (int a = 0; a < set.length; a++) {
      int from = rows.start()[set[a]];
      int to = rows.start()[set[a] + 1];
      for (int b = 0; b < set.length; b++) {
        int found = Arrays.binarySearch(rows.neighbour(), from, to, set[b]);
        pairs[a * set.length + b] = found < 0 ? 0 : rows.weight()[found];
      }
    }
    return pairs;
  }

  /** Whether there is anything to move. */
  public boolean idle() {
    return sets.length == 0;
  }

  /** One attempt for each set at an inverse temperature; false if the pace ends it. */
  public boolean sweep(double inverseTemperature, SplittableRandom random, Pace pace) {
    for (int s = 0; s < sets.length; s++) {
      int[] set = sets[s];
      int from = only(set);
      if (from < 0) {
        continue;
      }
      int to = random.nextInt(set.length - 1);
      to += to >= from ? 1 : 0;
      double x = change(s, from, to) * inverseTemperature;
      boolean accepted =
          x <= 0
              || (x < Boltzmann.NEVER
                  && (random.nextLong() >>> 11) * 0x1p-53 < Boltzmann.factor(x));
      if (accepted) {
        fields.flip(set[from]);
        fields.flip(set[to]);
      }
    }
    return !pace.after(work);
  }

  /** Moves every set to its best bit, once; whether any moved. */
  public boolean descend(double least) {
    boolean moved = false;
    for (int s = 0; s < sets.length; s++) {
      int from = only(sets[s]);
      if (from < 0) {
        continue;
      }
      int best = from;
      double lowest = least;
      for (int to = 0; to < sets[s].length; to++) {
        double change = to == from ? 0 : change(s, from, to);
        if (change < lowest) {
          lowest = change;
          best = to;
        }
      }
      if (best != from) {
        fields.flip(sets[s][from]);
        fields.flip(sets[s][best]);
        moved = true;
      }
    }
    return moved;
  }

  private double change(int s, int from, int to) {
    int[] set = sets[s];
    double[] field = fields.fields();
    return field[set[to]] - field[set[from]] - between[s][from * set.length + to];
  }

  /** The place of the only bit that is 1; -1 if there is none or another. */
  private int only(int[] set) {
    double[] spin = fields.spins();
    int found = -1;
    for (int k = 0; k < set.length; k++) {
      if (spin[set[k]] < 0) {
        if (found >= 0) {
          return -1;
        }
        found = k;
      }
    }
    return found;
  }
}
