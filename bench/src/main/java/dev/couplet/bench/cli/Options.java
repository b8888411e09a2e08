package dev.couplet.bench.cli;

import java.time.Duration;

/** Checks of options that several verbs have. */
final class Options {
  private static final double LONGEST = 1e9;

  private Options() {}

  /**
   * The value of {@code --seconds} as a time.
   *
   * @throws IllegalArgumentException if it is not above zero, or out of all reason
   */
  static Duration seconds(double seconds) {
    if (!(seconds > 0 && seconds <= LONGEST)) {
      throw new IllegalArgumentException(
          "--seconds is " + seconds + ", it must be above 0 and at most a thousand million");
    }
    return Duration.ofNanos(Math.max(1, (long) (seconds * 1e9)));
  }
}
