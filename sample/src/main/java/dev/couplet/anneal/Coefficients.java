package dev.couplet.anneal;

import dev.couplet.kernel.Adjacency;
import dev.couplet.sampling.Structure;
import java.util.Arrays;
import java.util.List;

/**
 * The coefficients that tell good states from better ones.
 *
 * <p>Within an exactly-one set, pairs and the common part of the linear coefficients only hold the
 * code together: what counts is how the linear coefficients differ. Elsewhere all count.
 */
final class Coefficients {
  private final Adjacency rows;

  /** For each variable its set, or -1; empty if there are no sets. */
  private final int[] setOf;

  /** For each set the lowest linear coefficient. */
  private final double[] lowest;

  private Coefficients(Adjacency rows, Structure structure) {
    this.rows = rows;
    this.lowest = new double[structure.exactlyOne().size()];
    this.setOf = new int[lowest.length == 0 ? 0 : rows.size()];
    Arrays.fill(setOf, -1);
    Arrays.fill(lowest, Double.POSITIVE_INFINITY);
    int s = 0;
    for (List<Integer> set : structure.exactlyOne()) {
      for (int bit : set) {
        setOf[bit] = s;
        lowest[s] = Math.min(lowest[s], rows.linear()[bit]);
      }
      s++;
    }
  }

  /**
   * Magnitudes above zero of a spread sample of the coefficients that count, ascending: of about
   * {@code most} pairs and as many variables at most. O(n).
   */
  static double[] sample(Adjacency rows, Structure structure, int most) {
    Coefficients all = new Coefficients(rows, structure);
    double[] magnitude = new double[4 * most];
    int count = all.gatherPairs(magnitude, most);
    count = all.gatherLinear(magnitude, count, most);
    Arrays.sort(magnitude, 0, count);
    return Arrays.copyOf(magnitude, count);
  }

  private int gatherPairs(double[] to, int most) {
    int step = 1 + rows.weight().length / most;
    int end = 0;
    int row = 0;
    for (int k = 0; k < rows.weight().length; k += step) {
      while (setOf.length > 0 && rows.start()[row + 1] <= k) {
        row++;
      }
      boolean within = set(row) >= 0 && set(row) == set(rows.neighbour()[k]);
      if (!within && rows.weight()[k] != 0) {
        to[end++] = Math.abs(rows.weight()[k]);
      }
    }
    return end;
  }

  private int set(int i) {
    return setOf.length == 0 ? -1 : setOf[i];
  }

  private int gatherLinear(double[] to, int count, int most) {
    int step = 1 + rows.size() / most;
    int end = count;
    for (int i = 0; i < rows.size(); i += step) {
      double value = rows.linear()[i] - (set(i) < 0 ? 0 : lowest[set(i)]);
      if (value != 0) {
        to[end++] = Math.abs(value);
      }
    }
    return end;
  }
}
