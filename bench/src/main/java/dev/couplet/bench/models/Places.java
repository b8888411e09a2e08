package dev.couplet.bench.models;

import java.util.List;
import java.util.Set;
import java.util.stream.IntStream;

/** Numbers that stand for places, vertices or agents, and the checks of lists of them. */
final class Places {
  private static final long MOST_PRODUCTS = 1L << 26;

  private Places() {}

  /** The numbers 1 to n. */
  static List<Integer> upTo(int n) {
    return IntStream.rangeClosed(1, n).boxed().toList();
  }

  /**
   * Insists that there are so many numbers.
   *
   * @throws IllegalArgumentException if not
   */
  static void requireLength(String what, int length, int wanted) {
    if (length != wanted) {
      throw new IllegalArgumentException(
          "there are " + length + " " + what + ", needed are " + wanted);
    }
  }

  /**
   * Insists that all numbers of a selection are known.
   *
   * @throws IllegalArgumentException naming the first that is not
   */
  static void requireKnown(String what, Set<Integer> selection, Set<Integer> known) {
    for (Integer number : selection) {
      if (!known.contains(number)) {
        throw new IllegalArgumentException(
            "there is no " + what + " " + number + "; they are counted from 1 to " + known.size());
      }
    }
  }

  /**
   * Insists that a model is not too large to be stated.
   *
   * @throws IllegalArgumentException if it is
   */
  static void requireFew(String what, double products) {
    if (products > MOST_PRODUCTS) {
      throw new IllegalArgumentException(
          what
              + " takes "
              + (long) products
              + " products of decisions, more than the "
              + MOST_PRODUCTS
              + " that are stated; take a smaller instance");
    }
  }
}
