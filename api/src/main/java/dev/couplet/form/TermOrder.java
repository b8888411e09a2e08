package dev.couplet.form;

import java.util.Arrays;
import java.util.Comparator;

/**
 * Orders the products of a polynomial by degree, then by their variables.
 *
 * <p>Terms of degree at most 2, nearly all of them in practice, are ordered in linear time; longer
 * ones by comparison. Both are stable, so that sums over equal products follow the order of
 * arrival.
 */
final class TermOrder {
  private TermOrder() {}

  /** Sorts the variables of one product and drops repeats; returns the end of what is left. */
  static int canonical(int[] factor, int from, int to) {
    if (to - from < 2) {
      return to;
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

  /** The variables of both products. */
  static int[] join(int[] left, int[] right) {
    int[] joined = Arrays.copyOf(left, left.length + right.length);
    System.arraycopy(right, 0, joined, left.length, right.length);
    return joined;
  }

  static boolean sameProduct(int[] start, int[] factor, int a, int b) {
    return Arrays.equals(factor, start[a], start[a + 1], factor, start[b], start[b + 1]);
  }

  /** Positions {@code 0 .. terms - 1} in canonical order. */
  static int[] of(int[] start, int[] factor, int terms, int size) {
    int[] order = new int[terms];
    int low = orderOfShort(start, factor, terms, size, order);
    Integer[] long_ = new Integer[terms - low];
    for (int t = 0, p = 0; t < terms; t++) {
      if (start[t + 1] - start[t] > 2) {
        long_[p++] = t;
      }
    }
    Arrays.sort(long_, comparing(start, factor));
    for (int p = 0; p < long_.length; p++) {
      order[low + p] = long_[p];
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

  private static Comparator<Integer> comparing(int[] start, int[] factor) {
    return (a, b) -> compare(factor, start[a], start[a + 1], factor, start[b], start[b + 1]);
  }

  /** Compares two products: by degree, then by their variables. */
  static int compare(int[] left, int from, int to, int[] right, int rightFrom, int rightTo) {
    int byDegree = Integer.compare(to - from, rightTo - rightFrom);
    return byDegree != 0 ? byDegree : Arrays.compare(left, from, to, right, rightFrom, rightTo);
  }
}
