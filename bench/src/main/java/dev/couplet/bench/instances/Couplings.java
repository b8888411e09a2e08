package dev.couplet.bench.instances;

import java.util.SplittableRandom;

/**
 * A distribution of random couplings: uniform on the integers from {@code -most} to {@code most}
 * without zero, or standard normal. Immutable.
 */
public final class Couplings {
  private static final int LARGEST = 1_000_000;

  private final int most;

  private Couplings(int most) {
    this.most = most;
  }

  /** Uniform on the integers -most..-1 and 1..most. */
  public static Couplings integers(int most) {
    if (most < 1 || most > LARGEST) {
      throw new IllegalArgumentException(
          "the largest coupling is " + most + ", it must be 1 to " + LARGEST);
    }
    return new Couplings(most);
  }

  /** Normal with mean 0 and variance 1. */
  public static Couplings gauss() {
    return new Couplings(0);
  }

  /**
   * The couplings of a text: {@code gauss}, or the largest integer.
   *
   * @throws IllegalArgumentException if it is neither
   */
  public static Couplings parse(String text) {
    if (text.equals("gauss")) {
      return gauss();
    }
    if (!text.matches("\\d{1,9}")) {
      throw new IllegalArgumentException(
          "the couplings are '"
              + text
              + "'; say gauss, or the largest integer, 1 for plus or minus 1");
    }
    return integers(Integer.parseInt(text));
  }

  /** One coupling. */
  double draw(SplittableRandom random) {
    if (most == 0) {
      return normal(random);
    }
    int magnitude = 1 + random.nextInt(most);
    return random.nextBoolean() ? magnitude : -magnitude;
  }

  /** The polar method of Marsaglia and Bray (1964), from memory; the same on every platform. */
  private static double normal(SplittableRandom random) {
    while (true) {
      double x = 2 * random.nextDouble() - 1;
      double y = 2 * random.nextDouble() - 1;
      double square = x * x + y * y;
      if (square > 0 && square < 1) {
        return x * Math.sqrt(-2 * StrictMath.log(square) / square);
      }
    }
  }

  @Override
  public String toString() {
    return most == 0 ? "gauss" : Integer.toString(most);
  }
}
