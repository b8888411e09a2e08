package dev.couplet.form;

/**
 * Sorts positions by comparison, stably, without objects: runs of a few by insertion, then merged.
 */
final class MergeSort {
  private static final int RUN = 16;

  /** Compares what lies at two positions: negative, zero or positive. */
  @FunctionalInterface
  interface Comparison {
    int compare(int a, int b);
  }

  private MergeSort() {}

  static void sort(int[] positions, Comparison by) {
    int length = positions.length;
    for (int from = 0; from < length; from += RUN) {
      insert(positions, from, Math.min(length, from + RUN), by);
    }
    int[] from = positions;
    int[] to = length > RUN ? new int[length] : positions;
    for (long width = RUN; width < length; width *= 2) {
      for (long low = 0; low < length; low += 2 * width) {
        int middle = (int) Math.min(length, low + width);
        int high = (int) Math.min(length, low + 2 * width);
        merge(from, (int) low, middle, high, to, by);
      }
      int[] other = from;
      from = to;
      to = other;
    }
    if (from != positions) {
      System.arraycopy(from, 0, positions, 0, length);
    }
  }

  private static void insert(int[] positions, int from, int to, Comparison by) {
    for (int k = from + 1; k < to; k++) {
      int position = positions[k];
      int place = k;
      while (place > from && by.compare(positions[place - 1], position) > 0) {
        positions[place] = positions[place - 1];
        place--;
      }
      positions[place] = position;
    }
  }

  private static void merge(int[] from, int low, int middle, int high, int[] to, Comparison by) {
    int left = low;
    int right = middle;
    for (int k = low; k < high; k++) {
      boolean takeLeft =
          right >= high || (left < middle && by.compare(from[left], from[right]) <= 0);
      to[k] = takeLeft ? from[left++] : from[right++];
    }
  }
}
