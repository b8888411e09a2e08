package dev.couplet.bound;

import dev.couplet.form.Qubo;
import dev.couplet.sampling.Vigil;
import java.util.Optional;
import java.util.function.BooleanSupplier;

/**
 * A form in whole numbers, so that arithmetic on it is exact.
 *
 * <p>Coefficients are multiplied by a power of two that brings the sum of their magnitudes to
 * between 2^57 and 2^59, and rounded to whole numbers. If the form is exact nothing is lost by
 * that; otherwise {@link #slack()} covers what is, and the rounding of computed energies with it.
 */
final class ScaledForm {
  private static final int BITS = 58;

  final int size;
  final long constant;
  final long[] linear;
  final int[] first;
  final int[] second;
  final long[] pair;

  /** Every energy in whole numbers is the constant plus a multiple of this; 0 if all are equal. */
  private final long step;

  private final int shift;
  private final double slack;

  ScaledForm(Qubo form) {
    this(form, new boolean[1], () -> false);
  }

  /** The form in whole numbers, unless its run is over before. */
  static Optional<ScaledForm> of(Qubo form, Vigil vigil) {
    boolean[] whole = {false};
    ScaledForm scaled = new ScaledForm(form, whole, vigil::over);
    return whole[0] ? Optional.of(scaled) : Optional.empty();
  }

  /** Tells in {@code whole} whether all pairs were passed before the run was over. */
  private ScaledForm(Qubo form, boolean[] whole, BooleanSupplier over) {
    double magnitude = form.magnitude();
    size = form.size();
    shift = magnitude == 0 ? 0 : BITS - Math.getExponent(magnitude);
    linear = new long[size];
    first = new int[form.pairs()];
    second = new int[form.pairs()];
    pair = new long[form.pairs()];
    constant = whole(form.constant());
    for (int i = 0; i < size; i++) {
      linear[i] = whole(form.linear(i));
    }
    int[] next = {0};
    long[] divisor = {0};
    for (long value : linear) {
      divisor[0] = commonDivisor(divisor[0], Math.abs(value));
    }
    whole[0] =
        form.forEachPairUntil(
            over,
            (i, j, value) -> {
              int p = next[0]++;
              first[p] = i;
              second[p] = j;
              pair[p] = whole(value);
              divisor[0] = commonDivisor(divisor[0], Math.abs(pair[p]));
            });
    step = form.exact() ? divisor[0] : 1;
    slack = form.exact() ? 0 : roundingOf(form);
  }

  private long whole(double value) {
    return (long) Math.rint(Math.scalb(value, shift));
  }

  private double roundingOf(Qubo form) {
    double terms = (double) size + pair.length + 1;
    double ofScaling = Math.scalb(terms, -shift);
    return ofScaling + Rounding.ofEnergy(form) + Rounding.ofSums(form, 16);
  }

  private static long commonDivisor(long a, long b) {
    while (b != 0 && a != b) {
      long rest = a % b;
      a = b;
      b = rest;
    }
    return a;
  }

  /** A number that no energy in whole numbers is below: all that is negative, and the constant. */
  long lowest() {
    long sum = constant;
    for (long value : linear) {
      sum += Math.min(0, value);
    }
    for (long value : pair) {
      sum += Math.min(0, value);
    }
    return sum;
  }

  /** What an energy in whole numbers and a computed energy of the form may differ by. */
  double slack() {
    return slack;
  }

  /** The lowest number that an energy can be, from a number that no energy is below. */
  double raised(double bound) {
    return bound < -0x1p60 * Math.scalb(1.0, -shift)
        ? bound
        : bound((long) Math.floor(Math.scalb(bound, shift)));
  }

  /** A number that no energy of the form is below, from a lower bound in whole numbers. */
  double bound(long whole) {
    if (slack > 0) {
      return Math.scalb((double) whole, -shift) - slack;
    }
    if (step == 0) {
      return Math.scalb((double) constant, -shift);
    }
    // Energies lie a whole number of steps from the constant: the next one up is still a bound.
    long steps = -Math.floorDiv(constant - whole, step);
    return Math.scalb((double) (constant + steps * step), -shift);
  }
}
