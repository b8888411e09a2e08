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
 *
 * @param pairs of the pairs, each twice; 0 within a set
 * @param linear of the variables; in a set, less the lowest of the set
 */
@SuppressWarnings("ArrayRecordComponent") // Passed from one step to the next, never kept.
record Coefficients(double[] pairs, double[] linear) {
  static Coefficients of(Adjacency rows, Structure structure) {
    if (structure.exactlyOne().isEmpty()) {
      return new Coefficients(rows.weight(), rows.linear());
    }
    double[] linear = rows.linear().clone();
    int[] setOf = new int[rows.size()];
    Arrays.fill(setOf, -1);
    for (int s = 0; s < structure.exactlyOne().size(); s++) {
      List<Integer> set = structure.exactlyOne().get(s);
      double lowest = Double.POSITIVE_INFINITY;
      for (int bit : set) {
        setOf[bit] = s;
        lowest = Math.min(lowest, linear[bit]);
      }
      for (int bit : set) {
        linear[bit] -= lowest;
      }
    }
    return new Coefficients(between(rows, setOf), linear);
  }

  private static double[] between(Adjacency rows, int[] setOf) {
    double[] pairs = rows.weight().clone();
    for (int i = 0; i < rows.size(); i++) {
      for (int k = rows.start()[i]; setOf[i] >= 0 && k < rows.start()[i + 1]; k++) {
        if (setOf[rows.neighbour()[k]] == setOf[i]) {
          pairs[k] = 0;
        }
      }
    }
    return pairs;
  }
}
