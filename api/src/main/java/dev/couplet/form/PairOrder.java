package dev.couplet.form;

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
        ? compared(identity, rows, columns)
        : byKey(byKey(identity, columns, size), rows, size);
  }

  private static int[] compared(int[] positions, int[] rows, int[] columns) {
    MergeSort.sort(
        positions,
        (p, q) ->
            rows[p] != rows[q]
                ? Integer.compare(rows[p], rows[q])
                : Integer.compare(columns[p], columns[q]));
    return positions;
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
