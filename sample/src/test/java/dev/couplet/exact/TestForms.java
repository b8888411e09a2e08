package dev.couplet.exact;

import dev.couplet.form.Ising;
import dev.couplet.form.Qubo;
import dev.couplet.form.State;
import java.util.SplittableRandom;
import java.util.function.DoubleSupplier;

/** Random forms of several regimes, and the slow twin of every exact method. */
public final class TestForms {
  /** What kind of coefficients a random form has. */
  public enum Regime {
    SPARSE,
    DENSE,
    TIED,
    HUGE_RANGE,
    ZERO,
    REAL,
    DYADIC,
    SPINS
  }

  private TestForms() {}

  public static Qubo random(Regime regime, int size, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    return switch (regime) {
      case SPARSE -> random(size, 2.5 / Math.max(1, size), random, () -> random.nextInt(-9, 10));
      case DENSE -> random(size, 1, random, () -> random.nextInt(-100, 101));
      case TIED -> random(size, 0.4, random, () -> random.nextInt(-1, 2));
      case HUGE_RANGE ->
          random(
              size, 0.6, random, () -> Math.scalb(random.nextInt(-9, 10), random.nextInt(-60, 60)));
      case ZERO -> Qubo.builder(size).build();
      case REAL -> random(size, 0.7, random, () -> random.nextDouble() * 2 - 1);
      case DYADIC -> random(size, 0.7, random, () -> random.nextInt(-64, 65) / 32.0);
      case SPINS -> spins(size, random);
    };
  }

  private static Qubo random(
      int size, double density, SplittableRandom random, DoubleSupplier coefficient) {
    Qubo.Builder form = Qubo.builder(size).allowRounding().addConstant(coefficient.getAsDouble());
    for (int i = 0; i < size; i++) {
      form.addLinear(i, coefficient.getAsDouble());
      for (int j = i + 1; j < size; j++) {
        if (random.nextDouble() < density) {
          form.addPair(i, j, coefficient.getAsDouble());
        }
      }
    }
    return form.build();
  }

  private static Qubo spins(int size, SplittableRandom random) {
    Ising.Builder form = Ising.builder(size);
    for (int i = 0; i < size; i++) {
      for (int j = i + 1; j < size; j++) {
        if (random.nextInt(3) == 0) {
          form.addPair(i, j, random.nextBoolean() ? 1 : -1);
        }
      }
    }
    return form.build().toQubo();
  }

  public static State state(int size, long number) {
    return size == 0 ? State.zeros(0) : State.ofWords(size, number);
  }

  /** The lowest energy, by looking at every state with {@link Qubo#value}. */
  public static double minimum(Qubo form) {
    double lowest = Double.POSITIVE_INFINITY;
    for (long x = 0; x < 1L << form.size(); x++) {
      lowest = Math.min(lowest, form.value(state(form.size(), x)));
    }
    return lowest;
  }

  /** The three spins of which each two want to differ: minimum -1, six ground states. */
  public static Qubo frustratedTriangle() {
    return Ising.builder(3).addPair(0, 1, 1).addPair(1, 2, 1).addPair(0, 2, 1).build().toQubo();
  }
}
