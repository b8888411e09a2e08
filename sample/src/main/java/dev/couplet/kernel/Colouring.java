package dev.couplet.kernel;

import java.util.Arrays;
import java.util.BitSet;
import java.util.Comparator;
import java.util.stream.IntStream;

/** A greedy colouring of the pairs' graph: no two neighbours have one colour. */
final class Colouring {
  private Colouring() {}

  /**
   * The variables, colour by colour, those with many neighbours first within a colour; O(n log n +
   * m).
   */
  static int[] order(Adjacency rows) {
    int n = rows.size();
    int[] colour = new int[n];
    colour(rows, colour);
    long[] keys = new long[n];
    for (int i = 0; i < n; i++) {
      keys[i] = ((long) colour[i] << Integer.SIZE) | (Integer.MAX_VALUE - rows.degree(i));
    }
    return sorted(keys);
  }

  /** Positions in the order of their keys; those of equal keys ascending. */
  private static int[] sorted(long[] keys) {
    return IntStream.range(0, keys.length)
        .boxed()
        .sorted(Comparator.comparingLong(i -> keys[i]))
        .mapToInt(Integer::intValue)
        .toArray();
  }

  /** How many variables from a place of an order on are not neighbours, at most {@code most}. */
  static int independent(Adjacency rows, int[] order, int from, int most) {
    int end = Math.min(order.length, from + most);
    BitSet seen = new BitSet();
    for (int p = from; p < end; p++) {
      int i = order[p];
      for (int k = rows.start()[i]; k < rows.start()[i + 1]; k++) {
        if (seen.get(rows.neighbour()[k])) {
          return p - from;
        }
      }
      seen.set(i);
    }
    return end - from;
  }

  /** Gives each variable the lowest colour that none of its lower neighbours has. */
  private static void colour(Adjacency rows, int[] colour) {
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
    }
  }
}
