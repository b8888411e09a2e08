package dev.couplet.anneal;

/** Argument checks of this package; one place, so that the messages read alike. */
final class Check {
  private Check() {}

  static double temperature(String what, double value) {
    if (!(value > 0) || value == Double.POSITIVE_INFINITY) {
      throw new IllegalArgumentException(
          what + " is " + value + ", it must be a finite number above zero");
    }
    return value;
  }
}
