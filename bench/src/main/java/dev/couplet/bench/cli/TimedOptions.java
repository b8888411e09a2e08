package dev.couplet.bench.cli;

import dev.couplet.sampling.Effort;
import java.time.Duration;
import picocli.CommandLine.Option;

/** The time and the seed of a run: the same options for every verb with a deadline. */
final class TimedOptions {
  private static final double LONGEST = 1e9;

  @Option(
      names = "--seconds",
      paramLabel = "S",
      description = "The time the method may take (default: ${DEFAULT-VALUE}).")
  private double seconds = 10;

  @Option(
      names = "--seed",
      paramLabel = "N",
      description = "The seed of all random numbers (default: ${DEFAULT-VALUE}).")
  private long seed = 1;

  long seed() {
    return seed;
  }

  /**
   * As much work as the time allows.
   *
   * @throws IllegalArgumentException if the time is not above zero, or out of all reason
   */
  Effort effort() {
    return share(1);
  }

  /** As much work as a part of the time allows. */
  Effort share(double part) {
    return within("--seconds", seconds, part).seed(seed);
  }

  /**
   * As much work as a time allows.
   *
   * @param option the option that names the time
   * @throws IllegalArgumentException if the time is not above zero, or out of all reason
   */
  static Effort within(String option, double seconds) {
    return within(option, seconds, 1);
  }

  private static Effort within(String option, double seconds, double part) {
    if (!(seconds > 0 && seconds <= LONGEST)) {
      throw new IllegalArgumentException(
          option + " is " + seconds + ", it must be above 0 and at most a thousand million");
    }
    return Effort.within(Duration.ofNanos(Math.max(1, (long) (seconds * part * 1e9))));
  }
}
