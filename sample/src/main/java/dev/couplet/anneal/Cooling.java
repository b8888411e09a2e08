package dev.couplet.anneal;

/**
 * The path of the temperature over a draw, in units of energy. Implementations must be immutable
 * and give the same numbers on every platform.
 */
@FunctionalInterface
public interface Cooling {
  /**
   * The temperature at one moment.
   *
   * @param hot the temperature of the first sweep
   * @param cold the temperature of the last sweep
   * @param passed the share of the draw that has passed, 0 at the first sweep, 1 at the last
   * @return a temperature above zero
   */
  double temperature(double hot, double cold, double passed);

  /** The temperature falls by the same factor each sweep. */
  static Cooling geometric() {
    return Path.GEOMETRIC;
  }

  /** The temperature falls by the same amount each sweep. */
  static Cooling linear() {
    return Path.LINEAR;
  }

  /** The inverse temperature grows by the same amount each sweep. */
  static Cooling inverseLinear() {
    return Path.INVERSE_LINEAR;
  }

  /**
   * A given path: the temperatures are spread evenly over the draw, and joined by straight lines.
   * Hot and cold are ignored.
   *
   * @throws IllegalArgumentException if there is none, or one is not a finite number above zero
   */
  static Cooling through(double... temperatures) {
    return GivenPath.of(temperatures);
  }
}
