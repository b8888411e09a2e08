package dev.couplet.bench.models;

import java.util.Arrays;

/**
 * The length of a shortest tour by dynamic programming over subsets of cities: Held and Karp, "A
 * dynamic programming approach to sequencing problems" (1962). O(n^2 2^n); shares nothing with the
 * models.
 */
public final class HeldKarp {
  private HeldKarp() {}

  /** The length. */
  public static double length(NumberTable distances) {
    int last = distances.rows() - 1;
    double[][] best = new double[1 << last][last];
    for (double[] row : best) {
      Arrays.fill(row, Double.POSITIVE_INFINITY);
    }
    for (int city = 0; city < last; city++) {
      best[1 << city][city] = distances.at(last, city);
    }
    double shortest = Double.POSITIVE_INFINITY;
    for (int visited = 1; visited < 1 << last; visited++) {
      for (int at = 0; at < last; at++) {
        for (int next = 0; next < last; next++) {
          if ((visited >> next & 1) == 0) {
            double length = best[visited][at] + distances.at(at, next);
            int then = visited | 1 << next;
            best[then][next] = Math.min(best[then][next], length);
          }
        }
        if (visited == (1 << last) - 1) {
          shortest = Math.min(shortest, best[visited][at] + distances.at(at, last));
        }
      }
    }
    return shortest;
  }
}
