package dev.couplet.kernel;

import java.util.Arrays;

/** Cuts the rows of a form into ranges of which one pass does not outlast a {@link Pace}. */
final class Portions {
  private Portions() {}

  /**
   * Boundaries of ranges of rows, 0 first and n last, each with at most {@link Pace#PORTION} rows
   * and places together, or of one row; {@code start} tells where each row begins.
   */
  static int[] of(int[] start) {
    int size = start.length - 1;
    int[] bounds = new int[16];
    int count = 1;
    for (int i = 0; i < size; i++) {
      int from = bounds[count - 1];
      long work = (long) (i + 1 - from) + start[i + 1] - start[from];
      if (work > Pace.PORTION && i > from) {
        if (count + 1 == bounds.length) {
          bounds = Arrays.copyOf(bounds, 2 * count);
        }
        bounds[count++] = i;
      }
    }
    bounds[count++] = size;
    return Arrays.copyOf(bounds, count);
  }
}
