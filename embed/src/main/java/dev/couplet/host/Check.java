package dev.couplet.host;

import java.util.Locale;

/** Argument checks of this package; one place, so that the messages read alike. */
final class Check {
  private Check() {}

  static int vertex(int vertex, int vertices) {
    if (vertex < 0 || vertex >= vertices) {
      throw new IllegalArgumentException(
          "vertex " + vertex + " is not one of the " + vertices + " vertices 0.." + (vertices - 1));
    }
    return vertex;
  }

  static void size(int vertices) {
    if (vertices < 0) {
      throw new IllegalArgumentException(
          "the number of vertices is " + vertices + ", it must be 0 or more");
    }
  }

  static void positive(String what, int value) {
    if (value < 1) {
      throw new IllegalArgumentException(what + " is " + value + ", it must be 1 or more");
    }
  }

  static void share(String what, double value) {
    if (!(value >= 0 && value <= 1)) {
      throw new IllegalArgumentException(
          String.format(Locale.ROOT, "%s is %s, it must be from 0 to 1", what, value));
    }
  }

  /** The product as a number of vertices or edges that arrays can hold. */
  static int count(String what, long... factors) {
    long product = 1;
    for (long factor : factors) {
      product = Math.multiplyHigh(product, factor) == 0 ? product * factor : Long.MAX_VALUE;
      if (product < 0 || product > 1 << 30) {
        throw new IllegalArgumentException(what + " has more than 2^30 vertices; make it smaller");
      }
    }
    return (int) product;
  }
}
