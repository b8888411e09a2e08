package dev.couplet.sampling;

import java.time.Duration;

/** Argument checks of this package; one place, so that the messages read alike. */
final class Check {
  private Check() {}

  static void positive(String what, int value) {
    if (value < 1) {
      throw new IllegalArgumentException(what + " is " + value + ", it must be 1 or more");
    }
  }

  static void positive(String what, Duration value) {
    if (value.isNegative() || value.isZero()) {
      throw new IllegalArgumentException(what + " is " + value + ", it must be above zero");
    }
  }

  static void number(String what, double value) {
    if (Double.isNaN(value)) {
      throw new IllegalArgumentException(what + " is NaN, it must be a number");
    }
  }
}
