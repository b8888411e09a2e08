package dev.couplet.kernel;

import java.util.Arrays;
import java.util.Optional;
import java.util.stream.IntStream;

/** A greedy colouring of the pairs' graph: no two neighbours have one colour. */
final class Colouring {
  private Colouring() {}

  /**
   * The variables, colour by colour, those with many neighbours first within a colour; O(n + m).
   * Nothing if the pace ends it.
   */
  static Optional<int[]> order(Adjacency rows, Pace pace) {
    int n = rows.size();
    int[] colour = new int[n];
    if (!colour(rows, colour, pace)) {
      return Optional.empty();
    }
    int[] fewest = new int[n];
    int most = 0;
    for (int i = 0; i < n; i++) {
      most = Math.max(most, rows.degree(i));
    }
    for (int i = 0; i < n; i++) {
      fewest[i] = most - rows.degree(i);
    }
    int[] numbers = IntStream.range(0, n).toArray();
    return Optional.of(sorted(sorted(numbers, fewest), colour));
  }

  /** Variables in ascending order of their keys, small numbers; equals stay in order. */
  private static int[] sorted(int[] variables, int[] key) {
    int[] next = new int[Arrays.stream(key).max().orElse(0) + 2];
    for (int i : variables) {
      next[key[i] + 1]++;
    }
    for (int k = 1; k < next.length; k++) {
      next[k] += next[k - 1];
    }
    int[] ordered = new int[variables.length];
    for (int i : variables) {
      ordered[next[key[i]]++] = i;
    }
    return ordered;
  }

  /**
   * How many variables from a place of an order on are not neighbours, at most {@code most}.
   *
   * @param seen for each variable, no number above {@code from} yet; written to
   */
  static int independent(Adjacency rows, int[] order, int from, int most, int[] seen) {
    int end = Math.min(order.length, from + most);
    int mark = from + 1;
    for (int p = from; p < end; p++) {
      int i = order[p];
      for (int k = rows.start()[i]; k < rows.start()[i + 1]; k++) {
        if (seen[rows.neighbour()[k]] == mark) {
          return p - from;
        }
      }
      seen[i] = mark;
    }
    return end - from;
  }

  /** Gives each variable the lowest colour that none of its lower neighbours has. */
  private static boolean colour(Adjacency rows, int[] colour, Pace pace) {
    int[] usedBy = new int[colour.length + 1];
    Arrays.fill(usedBy, -1);
    for (int i = 0; i < colour.length; i++) {
      for (int k = rows.start()[i]; k < rows.start()[i + 1] && rows.neighbour()[k] < i; k++) {
        usedBy[colour[rows.neighbour()[k]]] = i;
      }
      int lowest = 0;
      while (usedBy[lowest] == i) {
        lowest++;
      }
      colour[i] = lowest;
      if (pace.after(1L + rows.degree(i))) {
        return false;
      }
    }
    return true;
  }
}
