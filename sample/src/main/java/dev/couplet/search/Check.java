package dev.couplet.search;

/** Argument checks of this package; one place, so that the messages read alike. */
final class Check {
  private Check() {}

  static int positive(String what, int value) {
    if (value < 1) {
      throw new IllegalArgumentException(what + " is " + value + ", it must be 1 or more");
    }
    return value;
  }
}
