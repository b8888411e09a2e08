package dev.couplet.form;

import java.util.Arrays;

/**
 * Orders index pairs by row, then column, in time linear in their number and the largest index, or
 * by comparison where the pairs are few: a small form over many variables must not cost a pass over
 * all of them.
 *
 * <p>Two stable counting sorts, least significant key first, or a stable merge sort, so that equal
 * pairs keep their order of arrival: sums over duplicates then do not depend on anything but that
 * order.
 */
final class PairOrder {
  /** Fewer pairs than this part of the variables are compared. */
  private static final int FEW = 8;

  private PairOrder() {}

  /** Positions {@code 0 .. count - 1} in the order of {@code (rows[p], columns[p])}. */
  static int[] of(int[] rows, int[] columns, int count, int size) {
    int[] identity = new int[count];
    for (int p = 0; p < count; p++) {
      identity[p] = p;
    }
    if (isSorted(rows, columns, count)) {
      return identity;
    }
    return count < size / FEW
        ? compared(rows, columns, count)
        : byKey(byKey(identity, columns, size), rows, size);
  }

  private static int[] compared(int[] rows, int[] columns, int count) {
    Integer[] order = new Integer[count];
    Arrays.setAll(order, p -> p);
    Arrays.sort(
        order,
        (p, q) ->
            rows[p] != rows[q]
                ? Integer.compare(rows[p], rows[q])
                : Integer.compare(columns[p], columns[q]));
    return Arrays.stream(order).mapToInt(Integer::intValue).toArray();
  }

  /** Brings entries into the order of their pairs, in place. */
  static void sort(int[] rows, int[] columns, double[] values, int count, int size) {
    int[] from = of(rows, columns, count, size);
    for (int p = 0; p < count; p++) {
      if (from[p] >= 0) {
        cycle(rows, columns, values, from, p);
      }
    }
  }

  /** Moves the entries of one cycle of the permutation; places done are marked negative. */
  private static void cycle(int[] rows, int[] columns, double[] values, int[] from, int first) {
    int row = rows[first];
    int column = columns[first];
    double value = values[first];
    int to = first;
    while (from[to] != first) {
      int source = from[to];
      rows[to] = rows[source];
      columns[to] = columns[source];
      values[to] = values[source];
      from[to] = ~source;
      to = source;
    }
    rows[to] = row;
    columns[to] = column;
    values[to] = value;
    from[to] = ~first;
  }

  private static boolean isSorted(int[] rows, int[] columns, int count) {
    for (int p = 1; p < count; p++) {
      if (rows[p - 1] > rows[p] || (rows[p - 1] == rows[p] && columns[p - 1] > columns[p])) {
        return false;
      }
    }
    return true;
  }

  private static int[] byKey(int[] positions, int[] keys, int size) {
    int[] next = new int[size + 1];
    for (int p : positions) {
      next[keys[p] + 1]++;
    }
    for (int k = 1; k <= size; k++) {
      next[k] += next[k - 1];
    }
    int[] sorted = new int[positions.length];
    for (int p : positions) {
      sorted[next[keys[p]]++] = p;
    }
    return sorted;
  }
}
