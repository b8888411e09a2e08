package dev.couplet.model;

/** Argument checks of this package; one place, so that the messages read alike. */
final class Check {
  private Check() {}

  static void name(String what, String name) {
    if (name.isBlank()) {
      throw new IllegalArgumentException("the name of " + what + " is blank; give it one");
    }
  }

  static double finite(String what, double value) {
    if (!Double.isFinite(value)) {
      throw new IllegalArgumentException(what + " is " + value + ", it must be a finite number");
    }
    return value;
  }
}
