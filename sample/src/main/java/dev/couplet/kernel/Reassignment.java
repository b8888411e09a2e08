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
 * sets of more than {@value #LARGEST} bits are left out, and those that would take more than 2^26
 * doubles together.
 */
public final class Reassignment {
  private static final int LARGEST = 1 << 11;

  private static final long MOST_PLACES = 1L << 26;

  private final LocalFields fields;
  private final int[][] sets;
  private final double[][] between;
  private final double[] least;

  /** Moves of the given state within the sets of a structure. */
  public Reassignment(LocalFields fields, Structure structure) {
    this(fields, structure, Pace.free());
  }

  /** As many sets as can be laid out before the pace ends. */
  public Reassignment(LocalFields fields, Structure structure, Pace pace) {
    this.fields = fields;
    Adjacency rows = fields.rows();
    List<int[]> kept = new ArrayList<>();
    List<double[]> pairs = new ArrayList<>();
    int[] place = new int[structure.exactlyOne().isEmpty() ? 0 : rows.size()];
    int[] placeOf = structure.exactlyOne().isEmpty() ? place : places(rows);
    Arrays.fill(place, -1);
    long free = MOST_PLACES;
    for (List<Integer> members : structure.exactlyOne()) {
      int size = members.size();
      boolean fits = size > 1 && size <= LARGEST && (long) size * size <= free;
      if (fits && !pace.ended()) {
        int[] set = members.stream().mapToInt(bit -> placeOf[bit]).toArray();
        free -= (long) size * size;
        kept.add(set);
        pairs.add(between(rows, set, place, pace));
      }
    }
    this.sets = kept.toArray(new int[0][]);
    this.between = pairs.toArray(new double[0][]);
    this.least = new double[sets.length];
    for (int s = 0; !rows.exact() && s < sets.length && !pace.ended(); s++) {
      least[s] = least(rows, sets[s], pace);
    }
  }

  /** Where the row of each variable stands. */
  private static int[] places(Adjacency rows) {
    int[] places = new int[rows.size()];
    for (int p = 0; p < places.length; p++) {
      places[rows.variable(p)] = p;
    }
    return places;
  }

  private Reassignment(LocalFields fields, Reassignment like) {
    this.fields = fields;
    this.sets = like.sets;
    this.between = like.between;
    this.least = like.least;
  }

  /** The same moves of another state of the same form; tables are shared. */
  public Reassignment on(LocalFields other) {
    return new Reassignment(other, this);
  }

  /** The pairs within a set, row by row; {@code place} is -1 everywhere, before and after. */
  private static double[] between(Adjacency rows, int[] set, int[] place, Pace pace) {
    double[] pairs = new double[set.length * set.length];
    for (int a = 0; a < set.length; a++) {
      place[set[a]] = a;
    }
    for (int a = 0; a < set.length && !pace.after(set.length + rows.degree(set[a])); a++) {
      for (int k = rows.start()[set[a]]; k < rows.start()[set[a] + 1]; k++) {
        int b = place[rows.neighbour()[k]];
        if (b >= 0) {
          pairs[a * set.length + b] = rows.weight()[k];
        }
      }
    }
    for (int bit : set) {
      place[bit] = -1;
    }
    return pairs;
  }

  /** What a move within a set must at least gain to count: below 0 by the rounding of two rows. */
  private static double least(Adjacency rows, int[] set, Pace pace) {
    double least = 0;
    for (int bit : set) {
      least = Math.min(least, 2 * Descent.least(rows, bit));
      if (pace.after(rows.degree(bit))) {
        break;
      }
    }
    return least;
  }

  /** Whether there is anything to move. */
  public boolean idle() {
    return sets.length == 0;
  }

  /** One attempt for each set at an inverse temperature; false if the pace ends it. */
  public boolean sweep(double inverseTemperature, SplittableRandom random, Pace pace) {
    for (int s = 0; s < sets.length; s++) {
      int[] set = sets[s];
      if (pace.after(set.length)) {
        return false;
      }
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
        if (pace.after((long) fields.rows().degree(set[from]) + fields.rows().degree(set[to]))) {
          return false;
        }
      }
    }
    return true;
  }

  /** Moves every set to its best bit, once, unless the pace ends it; whether any moved. */
  public boolean descend(Pace pace) {
    boolean moved = false;
    for (int s = 0; s < sets.length && !pace.after(2L * sets[s].length); s++) {
      int from = only(sets[s]);
      if (from < 0) {
        continue;
      }
      int best = from;
      double lowest = least[s];
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
