package dev.couplet.examples.rounds;

import java.util.Arrays;

/**
 * The shortest ways from a start through sets of places and back, by dynamic programming over
 * subsets (Held and Karp, "A dynamic programming approach to sequencing problems", 1962). Shares no
 * code with the example or the library.
 */
final class HeldKarp {
  private static final long FAR = Long.MAX_VALUE / 4;

  private final long[] shortest;

  /**
   * All ways at once, in time 2^n n^2.
   *
   * @param start east and north of the start
   * @param places east and north of each place
   */
  HeldKarp(long[] start, long[][] places) {
    int n = places.length;
    shortest = new long[1 << n];
    long[][] ending = new long[1 << n][n];
    for (long[] row : ending) {
      Arrays.fill(row, FAR);
    }
    for (int set = 1; set < 1 << n; set++) {
      shortest[set] = FAR;
      for (int last = 0; last < n; last++) {
        int before = set & ~(1 << last);
        if (before == set) {
          continue;
        }
        long best = before == 0 ? metres(start, places[last]) : FAR;
        for (int p = 0; p < n; p++) {
          if ((before >> p & 1) == 1) {
            best = Math.min(best, ending[before][p] + metres(places[p], places[last]));
          }
        }
        ending[set][last] = best;
        shortest[set] = Math.min(shortest[set], best + metres(places[last], start));
      }
    }
  }

  /** The length of the shortest way through the places of a set. */
  long through(int set) {
    return shortest[set];
  }

  static long metres(long[] one, long[] other) {
    return Math.round(StrictMath.hypot(one[0] - other[0], one[1] - other[1]));
  }
}
