package dev.couplet.form;

import java.util.Arrays;

/**
 * Orders the products of a polynomial by degree, then by their variables.
 *
 * <p>Terms of degree at most 2, nearly all of them in practice, are ordered in linear time; longer
 * ones by comparison. Both are stable, so that sums over equal products follow the order of
 * arrival.
 */
final class TermOrder {
  /** So few terms are compared, whatever their degree. */
  private static final int FEW = 64;

  private TermOrder() {}

  /** Sorts the variables of one product and drops repeats; returns the end of what is left. */
  static int canonical(int[] factor, int from, int to) {
    if (to - from < 2) {
      return to;
    }
    if (to - from == 2) {
      return canonicalPair(factor, from);
    }
    Arrays.sort(factor, from, to);
    int end = from + 1;
    for (int k = from + 1; k < to; k++) {
      if (factor[k] != factor[k - 1]) {
        factor[end++] = factor[k];
      }
    }
    return end;
  }

  private static int canonicalPair(int[] factor, int from) {
    int first = factor[from];
    int second = factor[from + 1];
    factor[from] = Math.min(first, second);
    factor[from + 1] = Math.max(first, second);
    return first == second ? from + 1 : from + 2;
  }

  /** The variables of both products. */
  static int[] join(int[] left, int[] right) {
    int[] joined = Arrays.copyOf(left, left.length + right.length);
    System.arraycopy(right, 0, joined, left.length, right.length);
    return joined;
  }

  /** Whether two terms have the same product. */
  static boolean same(int[] start, int[] factor, int a, int b) {
    int first = start[a];
    int other = start[b];
    int width = start[a + 1] - first;
    if (start[b + 1] - other != width) {
      return false;
    }
    for (int k = 0; k < width; k++) {
      if (factor[first + k] != factor[other + k]) {
        return false;
      }
    }
    return true;
  }

  /** Positions {@code 0 .. terms - 1} in canonical order. */
  static int[] of(int[] start, int[] factor, int terms, int size) {
    int[] order = new int[terms];
    if (terms <= FEW) {
      Arrays.setAll(order, p -> p);
      MergeSort.sort(order, (a, b) -> compare(start, factor, a, b));
      return order;
    }
    int low = orderOfShort(start, factor, terms, size, order);
    if (low < terms) {
      int[] others = new int[terms - low];
      for (int t = 0, p = 0; t < terms; t++) {
        if (start[t + 1] - start[t] > 2) {
          others[p++] = t;
        }
      }
      MergeSort.sort(others, (a, b) -> compare(start, factor, a, b));
      System.arraycopy(others, 0, order, low, others.length);
    }
    return order;
  }

  /**
   * Writes the order of the terms of degree at most 2 and returns their number.
   *
   * <p>The constant becomes the pair (0, 0), a single variable i the pair (0, i + 1), and a product
   * of i and j the pair (i + 1, j + 1): degree and variables are then one key.
   */
  private static int orderOfShort(int[] start, int[] factor, int terms, int size, int[] order) {
    int[] position = new int[terms];
    int[] rows = new int[terms];
    int[] columns = new int[terms];
    int count = 0;
    for (int t = 0; t < terms; t++) {
      int width = start[t + 1] - start[t];
      if (width <= 2) {
        position[count] = t;
        rows[count] = width == 2 ? factor[start[t]] + 1 : 0;
        columns[count++] = width == 0 ? 0 : factor[start[t + 1] - 1] + 1;
      }
    }
    int[] sorted = PairOrder.of(rows, columns, count, size + 1);
    for (int p = 0; p < count; p++) {
      order[p] = position[sorted[p]];
    }
    return count;
  }

  /** Compares two terms. */
  static int compare(int[] start, int[] factor, int a, int b) {
    return compare(factor, start[a], start[a + 1], factor, start[b], start[b + 1]);
  }

  /** Compares two products: by degree, then by their variables. */
  static int compare(int[] left, int from, int to, int[] right, int rightFrom, int rightTo) {
    int width = to - from;
    if (width != rightTo - rightFrom) {
      return width < rightTo - rightFrom ? -1 : 1;
    }
    for (int k = 0; k < width; k++) {
      int one = left[from + k];
      int other = right[rightFrom + k];
      if (one != other) {
        return one < other ? -1 : 1;
      }
    }
    return 0;
  }
}
