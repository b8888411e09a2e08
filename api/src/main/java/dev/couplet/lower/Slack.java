package dev.couplet.lower;

import dev.couplet.form.Polynomial;

/**
 * A whole number from 0 to a highest value, both included, held in auxiliary bits: powers of two,
 * and a top coefficient cut so that no higher value exists. {@code floor(log2 highest) + 1} bits.
 */
final class Slack {
  private final int first;
  private final long[] coefficients;

  private Slack(int first, long[] coefficients) {
    this.first = first;
    this.coefficients = coefficients;
  }

  static Slack upTo(double highest, String meaning, BitTable bits) {
    long[] coefficients = coefficients((long) highest);
    int first = bits.size();
    for (long coefficient : coefficients) {
      bits.add(coefficient + " of " + meaning);
    }
    return new Slack(first, coefficients);
  }

  static long[] coefficients(long highest) {
    return BoundedDigits.UNBOUNDED.amounts(highest).stream().mapToLong(Long::longValue).toArray();
  }

  int bits() {
    return coefficients.length;
  }

  /** Adds {@code factor} times the number to a polynomial. */
  void addTo(Polynomial.Builder terms, double factor) {
    for (int k = 0; k < coefficients.length; k++) {
      terms.add(factor * coefficients[k], first + k);
    }
  }

  /** Sets the bits to a number, or to the nearest that can be held. */
  void set(double number, boolean[] bits) {
    long left = (long) Math.max(0, number);
    for (int k = coefficients.length - 1; k >= 0; k--) {
      bits[first + k] = left >= coefficients[k];
      left -= bits[first + k] ? coefficients[k] : 0;
    }
  }
}
