package dev.couplet.anneal;

import java.util.OptionalDouble;

/**
 * Argument checks of this package, and how settings are told; one place, so that the messages read
 * alike.
 */
final class Check {
  private Check() {}

  static double temperature(String what, double value) {
    if (!(value > 0) || value == Double.POSITIVE_INFINITY) {
      throw new IllegalArgumentException(
          what + " is " + value + ", it must be a finite number above zero");
    }
    return value;
  }

  /** A setting as it is told. */
  static String text(OptionalDouble setting) {
    return setting.isPresent() ? Double.toString(setting.getAsDouble()) : "from the form";
  }
}
